import { orTooLarge } from './tooLarge.js';

/** Below this a column grows fourfold. */
const LARGE = 1 << 22;

/** Whole numbers in a typed array that grows by doubling, or faster. */
export class Column {
  length = 0;
  values = new Uint32Array(1024);

  push(value: number): number {
    if (this.length === this.values.length) {
      this.values = grown(this.values);
    }
    this.values[this.length] = value;
    return this.length++;
  }
}

function grown(from: Uint32Array): Uint32Array<ArrayBuffer> {
  const { length } = from;
  const to = orTooLarge(() => new Uint32Array(length * (length < LARGE ? 4 : 2)));
  to.set(from);
  return to;
}
