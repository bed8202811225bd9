/**
 * A stream of 32-bit words from four words of state, not all zero: xoshiro128++ 1.0
 * (Blackman & Vigna, "Scrambled linear pseudorandom number generators", ACM TOMS 47, 2021).
 * Each call returns an integer in [0, 2³²).
 */
export function xoshiro128(a: number, b: number, c: number, d: number): () => number {
  let s0 = a | 0;
  let s1 = b | 0;
  let s2 = c | 0;
  let s3 = d | 0;
  if ((s0 | s1 | s2 | s3) === 0) throw new RangeError('the state must not be all zero');
  return () => {
    const sum = (s0 + s3) | 0;
    const word = (((sum << 7) | (sum >>> 25)) + s0) | 0;
    const shifted = s1 << 9;
    s2 ^= s0;
    s3 ^= s1;
    s1 ^= s2;
    s0 ^= s3;
    s2 ^= shifted;
    s3 = (s3 << 11) | (s3 >>> 21);
    return word >>> 0;
  };
}

/**
 * A seeded generator: `random()` is uniform in [0, 1), a multiple of 2⁻³²; the same seed gives the
 * same numbers in every engine. The seed (any finite number; its integer part modulo 2³² counts) is
 * spread over the state by a Weyl sequence through the 32-bit finaliser of MurmurHash3
 * (Appleby, public domain), as xoshiro's authors advise to seed from a generator of another kind.
 */
export function createRandom(seed: number): () => number {
  let weyl = seed | 0;
  const spread = (): number => {
    weyl = (weyl + 0x9e3779b9) | 0;
    let h = weyl;
    h = Math.imul(h ^ (h >>> 16), 0x85ebca6b);
    h = Math.imul(h ^ (h >>> 13), 0xc2b2ae35);
    return h ^ (h >>> 16);
  };
  const word = xoshiro128(spread(), spread(), spread(), spread());
  return () => word() / 0x100000000;
}

/** An integer in [0, bound), bound ≤ 2³²; the bias is below bound · 2⁻³². */
export function randomBelow(random: () => number, bound: number): number {
  return Math.floor(random() * bound);
}
