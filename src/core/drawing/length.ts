import { type LengthUnit, toMm, UNITS_PER_INCH } from '../geometry/unit.js';

/** Which side of the viewport a percentage is taken of (SVG 2, "Units"). */
export type Axis = 'x' | 'y' | 'other';

/** What lengths depend on where an element stands. */
export interface LengthContext {
  /** Size of the nearest viewport, user units. */
  readonly viewportWidth: number;
  readonly viewportHeight: number;
  readonly pxPerInch: number;
}

/** A number with a unit as written; `%`, `em`, `ex`, `ch` and `rem` are relative to something. */
export interface WrittenLength {
  readonly value: number;
  readonly unit: LengthUnit | '%' | 'em' | 'ex' | 'ch' | 'rem' | '';
}

const SHAPE = /^([+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?)\s*(%|[a-z]*)$/i;
/** Longer than any length in earnest; matching takes time with the square of a hostile one. */
const LONGEST = 400;

/** null for anything but a finite number and a unit known here. */
export function readLength(text: string): WrittenLength | null {
  const trimmed = text.trim();
  const match = trimmed.length > LONGEST ? null : SHAPE.exec(trimmed);
  if (!match) return null;
  const value = Number(match[1]) + 0;
  if (!Number.isFinite(value)) return null;
  const unit = match[2].toLowerCase();
  if (unit === 'q') return { value, unit: 'Q' };
  return isUnit(unit) ? { value, unit } : null;
}

function isUnit(unit: string): unit is WrittenLength['unit'] {
  return (
    unit === '' ||
    ['%', 'em', 'ex', 'ch', 'rem'].includes(unit) ||
    (unit !== 'Q' && Object.hasOwn(UNITS_PER_INCH, unit))
  );
}

/** User units. `fontSize` in user units; ex and ch count as half an em, as CSS allows where a font is not known. */
export function toUserUnits(
  length: WrittenLength,
  axis: Axis,
  context: LengthContext,
  fontSize = 16,
): number {
  const { value, unit } = length;
  switch (unit) {
    case '':
    case 'px':
      return value;
    case '%': {
      const { viewportWidth: w, viewportHeight: h } = context;
      return (value / 100) * (axis === 'x' ? w : axis === 'y' ? h : Math.sqrt((w * w + h * h) / 2));
    }
    case 'em':
      return value * fontSize;
    case 'ex':
    case 'ch':
      return (value * fontSize) / 2;
    case 'rem':
      return value * 16;
    default:
      return (toMm(value, unit) * context.pxPerInch) / 25.4;
  }
}
