import { orTooLarge } from './tooLarge.js';

/** Below this a column grows fourfold. */
const LARGE = 1 << 22;

/** Whole numbers in a typed array that grows by doubling, or faster. */
export class Column {
  length = 0;
  values = new Uint32Array(1024);

  push(value: number): number {
    if (this.length === this.values.length) {
      const values = orTooLarge(() => new Uint32Array(this.length * (this.length < LARGE ? 4 : 2)));
      values.set(this.values);
      this.values = values;
    }
    this.values[this.length] = value;
    return this.length++;
  }
}
