import { type LengthUnit, toMm, UNITS_PER_INCH } from '../../geometry/unit.js';
import { evaluate, isMath, type Quantity } from './calc.js';

/** Which side of the viewport a percentage is taken of (SVG 2, "Units"). */
export type Axis = 'x' | 'y' | 'other';

/** What lengths depend on where an element stands. */
export interface LengthContext {
  /** Size of the nearest viewport, user units. */
  readonly viewportWidth: number;
  readonly viewportHeight: number;
  readonly pxPerInch: number;
  /** What `rem` stands for, user units; 16 where the root says nothing. */
  readonly rootFontSize?: number | undefined;
}

/** A number with a unit as written; `%`, `em`, `ex`, `ch` and `rem` are relative to something. */
export interface WrittenLength {
  readonly value: number;
  readonly unit: LengthUnit | '%' | 'em' | 'ex' | 'ch' | 'rem' | '' | 'calc';
  /** Of unit `calc`, whose value is 0 here: what is to be worked out, and whether it is a plain number. */
  readonly sum?: string;
  readonly isNumber?: boolean;
}

/** A number of CSS: no trailing point, nothing between it and its unit. */
const SHAPE = /^([+-]?(?:\d+|\d*\.\d+)(?:e[+-]?\d+)?)(%|[a-z]*)$/i;
/** Longer than any length in earnest; matching takes time with the square of a hostile one. */
const LONGEST = 400;

/** null for anything but a finite number and a unit known here. */
export function readLength(text: string): WrittenLength | null {
  const trimmed = text.trim();
  if (isMath(trimmed)) {
    const kind = kindOfSum(trimmed);
    if (kind === null || kind === 'angle') return null;
    return { value: 0, unit: 'calc', sum: trimmed, isNumber: kind === 'number' };
  }
  const match = trimmed.length > LONGEST ? null : SHAPE.exec(trimmed);
  if (!match) return null;
  const value = Number(match[1]) + 0;
  if (!Number.isFinite(value)) return null;
  const unit = unitOf(match[2]);
  return unit === null ? null : { value, unit };
}

function unitOf(text: string): WrittenLength['unit'] | null {
  const unit = text.toLowerCase();
  if (unit === 'q') return 'Q';
  return isUnit(unit) ? unit : null;
}

/** Worked out with lengths of no size, which shows whether it can be worked out at all. */
function kindOfSum(sum: string): Quantity['kind'] | null {
  const reader = (value: number, unit: string): Quantity | null =>
    unitOf(unit) === null ? null : { kind: unit === '' ? 'number' : 'length', value };
  return evaluate(sum, reader)?.kind ?? null;
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
  const { value, unit, sum } = length;
  switch (unit) {
    case 'calc': {
      const part = (v: number, text: string): Quantity | null => {
        const u = unitOf(text);
        if (u === null) return null;
        return u === ''
          ? { kind: 'number', value: v }
          : { kind: 'length', value: toUserUnits({ value: v, unit: u }, axis, context, fontSize) };
      };
      return evaluate(sum ?? '', part)?.value ?? 0;
    }
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
      return value * (context.rootFontSize ?? 16);
    default:
      return (toMm(value, unit) * context.pxPerInch) / 25.4;
  }
}
