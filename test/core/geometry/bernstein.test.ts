import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { bernstein5Roots } from '../../../src/core/geometry/bernstein.ts';

/** Bernstein coefficients on [0, 1] of the product of (t − r): by polar forms, each a mean over the roots. */
function coefficients(roots: readonly number[]): Six {
  const subsets = (k: number, from = 0): number[][] =>
    k === 0
      ? [[]]
      : roots.slice(from).flatMap((_, j) => subsets(k - 1, from + j + 1).map((rest) => [from + j, ...rest]));
  return [0, 1, 2, 3, 4, 5].map((k) => {
    const chosen = subsets(k);
    const terms = chosen.map((ones) =>
      roots.reduce((product, r, j) => product * ((ones.includes(j) ? 1 : 0) - r), 1),
    );
    return terms.reduce((sum, term) => sum + term, 0) / chosen.length;
  }) as Six;
}

type Six = [number, number, number, number, number, number];

function rootsOf(c: Six, low = 0, high = 1): number[] {
  const found: number[] = [];
  bernstein5Roots(...c, low, high, 1e-17, (t) => found.push(t));
  return found.sort((a, b) => a - b);
}

describe('bernstein5Roots', () => {
  test('finds every root that lies apart from the others', () => {
    const aRoot = fc.integer({ min: -20, max: 40 }).map((n) => n / 20 + 0.013);
    fc.assert(
      fc.property(fc.uniqueArray(aRoot, { minLength: 5, maxLength: 5 }), (roots) => {
        const want = roots.filter((r) => r > 0 && r < 1).sort((a, b) => a - b);
        const found = rootsOf(coefficients(roots));
        expect(found.length).toBe(want.length);
        want.forEach((r, k) => {
          expect(found[k]).toBeCloseTo(r, 9);
        });
      }),
      { numRuns: 1000 },
    );
  });

  test('gives them on the interval asked for', () => {
    const found = rootsOf(coefficients([0.25, 0.5, 2, 3, 4]), 10, 14);
    expect(found.some((t) => Math.abs(t - 11) < 1e-12)).toBe(true);
    expect(found.some((t) => Math.abs(t - 12) < 1e-12)).toBe(true);
  });

  test('a triple root is found, to the accuracy that it has', () => {
    const found = rootsOf(coefficients([0.3, 0.3, 0.3, -1, 2]));
    expect(found.length).toBeGreaterThan(0);
    for (const t of found) expect(Math.abs(t - 0.3)).toBeLessThan(1e-4);
  });

  test('nothing where the polynomial keeps its sign, or is zero', () => {
    expect(rootsOf([1, 2, 1, 3, 1, 1])).toEqual([]);
    expect(rootsOf([0, 0, 0, 0, 0, 0])).toEqual([]);
  });
});
