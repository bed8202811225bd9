import { type Affine, IDENTITY, multiply, scaling, translation } from '../../geometry/affine.js';
import { TextCursor } from '../path/textCursor.js';
import { tangent, turned } from './turn.js';

/** Names in this grammar are as written, unlike those of CSS. */
const NAMES = ['matrix', 'translate', 'scale', 'rotate', 'skewX', 'skewY'] as const;

/**
 * The map of a `transform` attribute (CSS Transforms Module Level 1, §8.1, "SVG transform attribute"): the
 * last function acts first. Angles are in degrees, lengths in user units, both without a unit; the commas
 * between functions may be left out. The property of CSS has a grammar of its own: `cssTransform`.
 *
 * null where the list is wrong anywhere or a number is not finite. O(text).
 */
export function readTransformList(text: string): Affine | null {
  const cursor = new TextCursor().reset(text);
  let result = IDENTITY;
  cursor.skipSpace();
  if (text.startsWith('none', cursor.at) && text.slice(cursor.at).trim() === 'none') return IDENTITY;
  for (let comma = false; !cursor.atEnd() || comma; comma = cursor.skipCommaSpace()) {
    const map = readFunction(cursor, text);
    if (!map) return null;
    result = multiply(result, map);
  }
  return result.every(Number.isFinite) ? result : null;
}

function readFunction(cursor: TextCursor, text: string): Affine | null {
  const name = NAMES.find((known) => text.startsWith(known, cursor.at));
  if (name === undefined) return null;
  cursor.at += name.length;
  cursor.skipSpace();
  if (text[cursor.at] !== '(') return null;
  cursor.at++;
  const numbers = readNumbers(cursor, text);
  return numbers && mapOf(name, numbers);
}

/** What stands in the brackets, the closing one passed; null where it is more or less than numbers. */
function readNumbers(cursor: TextCursor, text: string): number[] | null {
  const numbers: number[] = [];
  cursor.skipSpace();
  for (let comma = false; ; comma = cursor.skipCommaSpace()) {
    if (text[cursor.at] === ')') {
      cursor.at++;
      return comma ? null : numbers;
    }
    if (numbers.length === 6 || !cursor.number() || !Number.isFinite(cursor.value)) return null;
    numbers.push(cursor.value);
  }
}

function mapOf(name: (typeof NAMES)[number], n: readonly number[]): Affine | null {
  const [a, b, c, d, e, f] = n;
  const count = n.length;
  switch (name) {
    case 'matrix':
      return count === 6 ? [a, b, c, d, e, f] : null;
    case 'translate':
      return count === 1 ? translation(a, 0) : count === 2 ? translation(a, b) : null;
    case 'scale':
      return count === 1 ? scaling(a, a) : count === 2 ? scaling(a, b) : null;
    case 'rotate':
      if (count === 1) return turned(a);
      return count === 3 ? multiply(multiply(translation(b, c), turned(a)), translation(-b, -c)) : null;
    case 'skewX':
      return count === 1 ? [1, 0, tangent(a), 1, 0, 0] : null;
    case 'skewY':
      return count === 1 ? [1, tangent(a), 0, 1, 0, 0] : null;
  }
}
