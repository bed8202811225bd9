/**
 * Absolute lengths as SVG and CSS write them, in millimetres.
 * Source: CSS Values and Units Level 3, §5.2 Absolute lengths, which SVG 2 cites.
 */
export type LengthUnit = 'in' | 'cm' | 'mm' | 'Q' | 'pt' | 'pc' | 'px';

/** How many of a unit make an inch. For `px` by CSS; a drawing may have been made for another number. */
export const UNITS_PER_INCH: Readonly<Record<LengthUnit, number>> = {
  in: 1,
  cm: 2.54,
  mm: 25.4,
  Q: 101.6,
  pt: 72,
  pc: 6,
  px: 96,
};

/** A length read from text: `value` in mm, and the unit it was written in (px where it had none). */
export interface Length {
  readonly value: number;
  readonly unit: LengthUnit;
}

/** mm; `pxPerInch` is for px only, the other units have one meaning. Accuracy: rounding. */
export function toMm(value: number, unit: LengthUnit, pxPerInch = UNITS_PER_INCH.px): number {
  switch (unit) {
    case 'mm':
      return value;
    case 'cm':
      return value * 10;
    case 'Q':
      return value / 4;
    default:
      // An inch is 127/5 mm: whole numbers stay exact until the one division.
      return (value * 127) / (5 * (unit === 'px' ? pxPerInch : UNITS_PER_INCH[unit]));
  }
}

/**
 * An absolute length of SVG or CSS: a number, with or without a unit at once after it, in any case.
 * null for anything else: percentages, font-relative units, words, numbers that are not finite.
 * A point without digits after it is accepted, as SVG 1.1 allows.
 */
export function parseLength(text: string, pxPerInch = UNITS_PER_INCH.px): Length | null {
  return parse(text, STRICT, 'px', pxPerInch);
}

/** A length from a person, in mm; a bare number is mm, a space before the unit does no harm. null where it is none. */
export function parseLengthMm(text: string): number | null {
  return parse(text, LENIENT, 'mm', UNITS_PER_INCH.px)?.value ?? null;
}

const STRICT = /^[ \t\r\n\f]*([+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?)([a-z]*)[ \t\r\n\f]*$/i;
const LENIENT = /^\s*([+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?)\s*([a-z]*)\s*$/i;

function parse(text: string, shape: RegExp, bare: LengthUnit, pxPerInch: number): Length | null {
  const match = shape.exec(text);
  if (match === null) return null;
  const unit = match[2] === '' ? bare : unitNamed(match[2] ?? '');
  if (unit === null) return null;
  const value = toMm(Number(match[1]), unit, pxPerInch);
  return Number.isFinite(value) ? { value, unit } : null;
}

function unitNamed(name: string): LengthUnit | null {
  const lower = name.toLowerCase();
  if (lower === 'q') return 'Q';
  return Object.hasOwn(UNITS_PER_INCH, lower) ? (lower as LengthUnit) : null;
}
