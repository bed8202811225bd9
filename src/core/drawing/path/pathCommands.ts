import { orTooLarge } from '../tooLarge.js';

const M = 77;
const Z = 90;

/** How many numbers each command takes, by the character code of its capital; 255 where there is none. */
export const ARITY: Readonly<Uint8Array> = (() => {
  const arity = new Uint8Array(128).fill(255);
  for (const [letter, n] of Object.entries({ M: 2, L: 2, H: 1, V: 1, C: 6, S: 4, Q: 4, T: 2, A: 7, Z: 0 })) {
    arity[letter.charCodeAt(0)] = n;
    arity[letter.toLowerCase().charCodeAt(0)] = n;
  }
  return arity;
})();

/**
 * Path data as columns: one code (the letter as written; `Z` for both) per segment, repeats spelled
 * out, and the numbers of all of them in a row. Kept and cleared from path to path.
 */
export class PathCommands {
  count = 0;
  used = 0;
  /** Whether the path has begun, though its first commands may have been dropped. */
  begun = false;
  codes = new Uint8Array(256);
  numbers = new Float64Array(1024);

  clear(): void {
    this.begun = false;
    this.drop();
  }

  /** Makes room for further commands of the same path. */
  drop(): void {
    this.count = 0;
    this.used = 0;
  }

  /** Adds a command and makes room for its numbers, which the caller writes from the index returned. */
  push(code: number): number {
    if (this.count === this.codes.length) {
      const codes = new Uint8Array(2 * this.count);
      codes.set(this.codes);
      this.codes = codes;
    }
    const at = this.used;
    if (at + 8 > this.numbers.length) {
      this.numbers = grown(this.numbers);
    }
    // A first `m` is absolute (SVG 2, "The moveto commands").
    this.codes[this.count] = !this.begun && code === M + 32 ? M : code === Z + 32 ? Z : code;
    this.begun = true;
    this.count++;
    this.used = at + ARITY[code];
    return at;
  }

  /** Takes the last command back. */
  pop(): void {
    this.count--;
    this.used -= ARITY[this.codes[this.count]];
  }
}

function grown(from: Float64Array): Float64Array<ArrayBuffer> {
  const to = orTooLarge(() => new Float64Array(2 * from.length));
  to.set(from);
  return to;
}
