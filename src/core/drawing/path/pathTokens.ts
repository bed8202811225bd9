import { ARITY, type PathCommands } from './pathCommands.js';
import type { TextCursor } from './textCursor.js';

const M = 77;
const A = 65;

/**
 * Reads path data into `out` up to its first error (SVG 2, "Error handling in path data": every
 * segment before the error is drawn, also those of the command that has it).
 *
 * @returns the offset of the error, or -1. A number outside the range of a double is an error.
 * Cost: O(length), no memory but the columns.
 */
export function readPathTokens(data: string, cursor: TextCursor, out: PathCommands): number {
  const tokens = new PathTokens(cursor, out);
  tokens.begin(data);
  tokens.next(Number.POSITIVE_INFINITY);
  return tokens.error;
}

/** The same, some commands at a time, so that long data needs no long columns. */
export class PathTokens {
  /** Offset of the error that ended the data, or -1. */
  error = -1;
  /** The command letter whose further argument sets may follow, or 0. */
  private letter = 0;
  /** As what the next set counts: pairs after a moveto are linetos. */
  private code = 0;
  /** No set has to follow. */
  private mayEnd = false;

  constructor(
    private readonly cursor: TextCursor,
    private readonly out: PathCommands,
  ) {}

  begin(data: string): void {
    this.error = -1;
    this.letter = 0;
    this.out.clear();
    this.cursor.reset(data).skipSpace();
  }

  /** Puts the next commands, about `most` of them, in the place of the last; false where there are none. */
  next(most: number): boolean {
    const { cursor, out } = this;
    out.drop();
    if (this.letter !== 0) this.readSets(most);
    while (this.error < 0 && out.count < most && !cursor.atEnd()) {
      const code = cursor.text.charCodeAt(cursor.at);
      const arity = code < 128 ? ARITY[code] : 255;
      if (arity === 255 || (!out.begun && (code & ~32) !== M)) {
        this.error = cursor.at;
        break;
      }
      cursor.at++;
      if (arity === 0) out.push(code);
      else {
        cursor.skipSpace();
        this.letter = this.code = code;
        this.mayEnd = false;
        this.readSets(most);
      }
      if (this.letter === 0) cursor.skipSpace();
    }
    return out.count > 0;
  }

  /** Reads the argument sets of one command letter; `letter` is left where there may be more. */
  private readSets(most: number): void {
    const { cursor, out, letter } = this;
    const capital = letter & ~32;
    const arity = ARITY[letter];
    while (out.count < most) {
      const base = out.push(this.code);
      for (let k = 0; k < arity; k++) {
        if (k > 0) cursor.skipCommaSpace();
        const start = cursor.at;
        const isFlag = capital === A && (k === 3 || k === 4);
        if (isFlag ? cursor.flag() : cursor.number()) {
          if (Number.isFinite(cursor.value)) {
            out.numbers[base + k] = cursor.value;
            continue;
          }
        } else if (k === 0 && this.mayEnd) {
          out.pop();
          this.letter = 0;
          cursor.skipSpace();
          return;
        }
        out.pop();
        this.error = start;
        this.letter = 0;
        return;
      }
      // A comma before the next command is an error by the grammar, and passed over by browsers.
      this.mayEnd = !cursor.skipCommaSpace() || cursor.atEnd() || isLetter(cursor.text.charCodeAt(cursor.at));
      if (capital === M) this.code = letter === M ? 76 : 108;
    }
  }
}

function isLetter(c: number): boolean {
  return (c | 32) >= 97 && (c | 32) <= 122;
}
