import { orTooLarge } from './tooLarge.js';

/** Whole numbers in a typed array that grows by doubling. */
export class Column {
  length = 0;
  values = new Uint32Array(1024);

  push(value: number): number {
    if (this.length === this.values.length) {
      const values = orTooLarge(() => new Uint32Array(2 * this.length));
      values.set(this.values);
      this.values = values;
    }
    this.values[this.length] = value;
    return this.length++;
  }
}
