const START = 64;

/**
 * A binary min-heap of entries (key, a, b) in typed arrays, ordered by key, then a, then b, so that the
 * order of equal keys does not hang on the order of pushes. Keys must not be NaN; a and b are 32-bit
 * integers. Logarithmic time a push or pop; 16 bytes an entry.
 */
export class PairHeap {
  private keys = new Float64Array(START);
  private as = new Int32Array(START);
  private bs = new Int32Array(START);
  size = 0;
  /** The entry taken out last, or the key of the one put in after it. */
  key = 0;
  a = 0;
  b = 0;

  clear(): void {
    this.size = 0;
  }

  /** The least key; Infinity where the heap is empty. */
  minKey(): number {
    return this.size === 0 ? Number.POSITIVE_INFINITY : this.keys[0];
  }

  push(key: number, a: number, b: number): void {
    this.key = key;
    this.put(a, b);
  }

  /** Pushes the entry (`this.key`, a, b): a double set as a field need not be boxed for the call. */
  put(a: number, b: number): void {
    if (this.size === this.keys.length) this.grow();
    const { keys, as, bs, key } = this;
    let hole = this.size++;
    while (hole > 0) {
      const up = (hole - 1) >> 1;
      const other = keys[up];
      if (other < key || (other === key && (as[up] < a || (as[up] === a && bs[up] <= b)))) break;
      keys[hole] = other;
      as[hole] = as[up];
      bs[hole] = bs[up];
      hole = up;
    }
    keys[hole] = key;
    as[hole] = a;
    bs[hole] = b;
  }

  /** Takes the least entry out into `key`, `a`, `b`; false where the heap is empty. */
  pop(): boolean {
    if (this.size === 0) return false;
    const { keys, as, bs } = this;
    this.key = keys[0];
    this.a = as[0];
    this.b = bs[0];
    const size = --this.size;
    const key = keys[size];
    const a = as[size];
    const b = bs[size];
    let hole = 0;
    for (;;) {
      let down = 2 * hole + 1;
      if (down >= size) break;
      const right = down + 1;
      if (right < size && before(keys, as, bs, right, keys[down], as[down], bs[down])) down = right;
      if (!before(keys, as, bs, down, key, a, b)) break;
      keys[hole] = keys[down];
      as[hole] = as[down];
      bs[hole] = bs[down];
      hole = down;
    }
    keys[hole] = key;
    as[hole] = a;
    bs[hole] = b;
    return true;
  }

  private grow(): void {
    const capacity = 2 * this.keys.length;
    const keys = new Float64Array(capacity);
    const as = new Int32Array(capacity);
    const bs = new Int32Array(capacity);
    keys.set(this.keys);
    as.set(this.as);
    bs.set(this.bs);
    this.keys = keys;
    this.as = as;
    this.bs = bs;
  }
}

function before(
  keys: Float64Array,
  as: Int32Array,
  bs: Int32Array,
  i: number,
  key: number,
  a: number,
  b: number,
): boolean {
  const k = keys[i];
  return k < key || (k === key && (as[i] < a || (as[i] === a && bs[i] < b)));
}
