import { ARITY, type PathCommands } from './pathCommands.js';
import type { TextCursor } from './textCursor.js';

const M = 77;
const Z = 90;
const A = 65;

/**
 * Reads path data into `out` up to its first error (SVG 2, "Error handling in path data": every
 * segment before the error is drawn, also those of the command that has it).
 *
 * @returns the offset of the error, or -1. A number outside the range of a double is an error.
 * Cost: O(length), no memory but the columns.
 */
export function readPathTokens(data: string, cursor: TextCursor, out: PathCommands): number {
  out.clear();
  cursor.reset(data).skipSpace();
  while (!cursor.atEnd()) {
    const code = data.charCodeAt(cursor.at);
    const arity = code < 128 ? ARITY[code] : 255;
    if (arity === 255 || (out.count === 0 && (code & ~32) !== M)) return cursor.at;
    cursor.at++;
    if ((code & ~32) === Z) out.push(code);
    else {
      const error = readRepeats(code, arity, cursor, out);
      if (error >= 0) return error;
    }
    cursor.skipSpace();
  }
  return -1;
}

/** Reads the argument sets of one command letter. */
function readRepeats(letter: number, arity: number, cursor: TextCursor, out: PathCommands): number {
  cursor.skipSpace();
  let code = letter;
  let mayEnd = false;
  for (;;) {
    const base = out.push(code);
    for (let k = 0; k < arity; k++) {
      if (k > 0) cursor.skipCommaSpace();
      const start = cursor.at;
      const isFlag = (letter & ~32) === A && (k === 3 || k === 4);
      if (isFlag ? cursor.flag() : cursor.number()) {
        if (Number.isFinite(cursor.value)) {
          out.numbers[base + k] = cursor.value;
          continue;
        }
      } else if (k === 0 && mayEnd) {
        out.pop();
        return -1;
      }
      out.pop();
      return start;
    }
    // A comma before the next command is an error by the grammar, and passed over by browsers.
    mayEnd = !cursor.skipCommaSpace() || cursor.atEnd() || isLetter(cursor.text.charCodeAt(cursor.at));
    // Pairs after a moveto are linetos.
    if ((letter & ~32) === M) code = letter === M ? 76 : 108;
  }
}

function isLetter(c: number): boolean {
  return (c | 32) >= 97 && (c | 32) <= 122;
}
