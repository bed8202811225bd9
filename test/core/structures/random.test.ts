import { describe, expect, test } from 'vitest';
import { createRandom, randomBelow, xoshiro128 } from '../../../src/core/structures/random.ts';

describe('xoshiro128++', () => {
  test('gives the published words for the state 1, 2, 3, 4', () => {
    // Produced with the authors' reference C code; the vector of the Rust crate rand_xoshiro (from memory).
    const word = xoshiro128(1, 2, 3, 4);
    const words = Array.from({ length: 10 }, () => word());
    expect(words).toEqual([
      641, 1573767, 3222811527, 3517856514, 836907274, 4247214768, 3867114732, 1355841295, 495546011,
      621204420,
    ]);
  });

  test('refuses a state of zeros, which would never move', () => {
    expect(() => xoshiro128(0, 0, 0, 0)).toThrow(RangeError);
  });
});

describe('createRandom', () => {
  test('the same seed gives the same stream, another seed another', () => {
    const a = createRandom(7);
    const b = createRandom(7);
    const c = createRandom(8);
    const first = Array.from({ length: 50 }, () => a());
    expect(Array.from({ length: 50 }, () => b())).toEqual(first);
    expect(Array.from({ length: 50 }, () => c())).not.toEqual(first);
  });

  test('is uniform: the chi-square of 256 cells stays within five deviations', () => {
    for (const seed of [0, 1, 2, -1, 123456789]) {
      const random = createRandom(seed);
      const cells = new Float64Array(256);
      const draws = 256 * 400;
      let outside = 0;
      for (let i = 0; i < draws; i++) {
        const value = random();
        if (!(value >= 0 && value < 1)) outside++;
        cells[Math.floor(value * 256)]++;
      }
      expect(outside).toBe(0);
      let chi = 0;
      for (const seen of cells) chi += (seen - 400) ** 2 / 400;
      expect(Math.abs(chi - 255)).toBeLessThan(5 * Math.sqrt(2 * 255));
    }
  });

  test('the first numbers of neighbouring seeds do not follow one another', () => {
    let sum = 0;
    const n = 4000;
    for (let seed = 0; seed < n; seed++) {
      sum += (createRandom(seed)() - 0.5) * (createRandom(seed + 1)() - 0.5);
    }
    expect(Math.abs((sum / n) * 12)).toBeLessThan(5 / Math.sqrt(n));
  });
});

test('randomBelow reaches every integer below its bound and no other', () => {
  const random = createRandom(3);
  const seen = new Set(Array.from({ length: 400 }, () => randomBelow(random, 7)));
  expect([...seen].sort()).toEqual([0, 1, 2, 3, 4, 5, 6]);
});
