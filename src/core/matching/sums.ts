const WORD = 2 ** 32;
/** 2²⁰ words: what the low word hands on before it would lose digits. */
const CARRY = 2 ** 52;

/** An exact sum of integers below 2⁵³, in two words. */
export class IntegerSum {
  private high = 0;
  private low = 0;

  add(value: number): void {
    const high = Math.floor(value / WORD);
    this.high += high;
    this.low += value - high * WORD;
    if (this.low >= CARRY) {
      this.high += 2 ** 20;
      this.low -= CARRY;
    }
  }

  value(): bigint {
    return BigInt(this.high) * BigInt(WORD) + BigInt(this.low);
  }
}

/** The greatest double not above an integer. */
export function roundedDown(integer: bigint): number {
  const near = Number(integer);
  if (BigInt(near) <= integer) return near;
  const bits = new BigInt64Array(1);
  const double = new Float64Array(bits.buffer);
  double[0] = near;
  bits[0] += near > 0 ? -1n : 1n;
  return double[0];
}

/**
 * A sum of doubles kept as an unevaluated pair (Dekker 1971; Knuth, Seminumerical Algorithms, 4.2.2, theorem B),
 * so that rounding it once at the end is all the error that shows.
 */
export class DoubleSum {
  private high = 0;
  private low = 0;

  add(value: number): void {
    const sum = this.high + value;
    const back = sum - this.high;
    const rest = this.high - (sum - back) + (value - back) + this.low;
    this.high = sum + rest;
    this.low = rest - (this.high - sum);
  }

  value(): number {
    return this.high;
  }
}
