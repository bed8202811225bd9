import { type Affine, IDENTITY, multiply, scaling, translation } from '../geometry/affine.js';
import { sinCosDegrees } from '../geometry/trig.js';
import { TextCursor } from './textCursor.js';

const FUNCTION = /\s*([A-Za-z]+)\s*\(([^()]*)\)/y;

/**
 * The map of a transform list (SVG 2, "The transform property"; CSS Transforms Module Level 1, §8):
 * the last function acts first. The functions of the attribute, and those of CSS in two dimensions;
 * angles without a unit are degrees, lengths without one user units.
 *
 * null where the list is wrong anywhere or a number is not finite.
 */
export function readTransformList(text: string): Affine | null {
  if (/^\s*(none\s*)?$/i.test(text)) return IDENTITY;
  let result = IDENTITY;
  let at = 0;
  while (at < text.length) {
    FUNCTION.lastIndex = at;
    const match = FUNCTION.exec(text);
    if (!match) return null;
    const map = mapOf(match[1].toLowerCase(), match[2]);
    if (!map) return null;
    result = multiply(result, map);
    at = FUNCTION.lastIndex;
    const separator = /\s*,?\s*/y;
    separator.lastIndex = at;
    separator.test(text);
    const comma = text.slice(at, separator.lastIndex).includes(',');
    at = separator.lastIndex;
    if (comma && at >= text.length) return null;
  }
  return result.every(Number.isFinite) ? result : null;
}

function mapOf(name: string, list: string): Affine | null {
  const n = argumentsOf(list);
  if (!n) return null;
  const [a, b, c, d, e, f] = n as [number, number, number, number, number, number];
  const count = n.length;
  switch (name) {
    case 'matrix':
      return count === 6 ? [a, b, c, d, e, f] : null;
    case 'translate':
      return count === 1 ? translation(a, 0) : count === 2 ? translation(a, b) : null;
    case 'translatex':
      return count === 1 ? translation(a, 0) : null;
    case 'translatey':
      return count === 1 ? translation(0, a) : null;
    case 'scale':
      return count === 1 ? scaling(a, a) : count === 2 ? scaling(a, b) : null;
    case 'scalex':
      return count === 1 ? scaling(a, 1) : null;
    case 'scaley':
      return count === 1 ? scaling(1, a) : null;
    case 'rotate':
      if (count === 1) return rotate(a);
      return count === 3 ? multiply(multiply(translation(b, c), rotate(a)), translation(-b, -c)) : null;
    case 'skew':
      return count === 1
        ? [1, 0, tangent(a), 1, 0, 0]
        : count === 2
          ? [1, tangent(b), tangent(a), 1, 0, 0]
          : null;
    case 'skewx':
      return count === 1 ? [1, 0, tangent(a), 1, 0, 0] : null;
    case 'skewy':
      return count === 1 ? [1, tangent(a), 0, 1, 0, 0] : null;
    default:
      return null;
  }
}

const UNIT_FACTORS: ReadonlyMap<string, number> = new Map([
  ['', 1],
  ['px', 1],
  ['deg', 1],
  ['grad', 0.9],
  ['turn', 360],
  ['rad', 180 / Math.PI],
]);

function argumentsOf(list: string): number[] | null {
  const cursor = new TextCursor().reset(list);
  const numbers: number[] = [];
  cursor.skipSpace();
  for (let comma = false; ; comma = cursor.skipCommaSpace()) {
    if (cursor.atEnd()) return comma ? null : numbers;
    if (!cursor.number() || numbers.length === 6) return null;
    const unit = /[a-z]*/iy;
    unit.lastIndex = cursor.at;
    const factor = UNIT_FACTORS.get(unit.exec(list)![0].toLowerCase());
    if (factor === undefined || !Number.isFinite(cursor.value)) return null;
    cursor.at = unit.lastIndex;
    numbers.push(cursor.value * factor);
  }
}

/** Exact for whole quarter turns, so that turned drawings keep their straight lines straight. */
function rotate(degrees: number): Affine {
  const sc = new Float64Array(2);
  sinCosDegrees(degrees, sc);
  return [sc[1], sc[0], -sc[0] + 0, sc[1], 0, 0];
}

function tangent(degrees: number): number {
  const sc = new Float64Array(2);
  sinCosDegrees(degrees, sc);
  return sc[0] / sc[1];
}
