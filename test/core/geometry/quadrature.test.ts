import { describe, expect, test } from 'vitest';
import { integrate } from '../../../src/core/geometry/quadrature.ts';

describe('integrate', () => {
  // A Gauss rule of n points is exact for polynomials of degree 2n − 1 (Gauss 1814).
  test.each([0, 1, 2, 5, 10, 18, 19])('t^%d over [−1, 3]', (k) => {
    const want = (3 ** (k + 1) - (-1) ** (k + 1)) / (k + 1);
    expect(Math.abs(integrate((t) => t ** k, -1, 3, []) / want - 1)).toBeLessThan(1e-14);
  });

  // ∫₋₁¹ √(t² + b²) dt = √(1 + b²) + b²·asinh(1/b), with branch points at ± b·i.
  test.each([10, 1, 0.1, 1e-2, 1e-3, 1e-4, 1e-5, 1e-6, 1e-7, 0])('a dip of depth %d', (b) => {
    const want = Math.sqrt(1 + b * b) + (b > 0 ? b * b * Math.asinh(1 / b) : 0);
    const got = integrate((t) => Math.sqrt(t * t + b * b), -1, 1, [0, b]);
    expect(Math.abs(got / want - 1)).toBeLessThan(2e-11);
  });

  test('a corner away from the middle, and branch points outside or nowhere', () => {
    const corner = integrate((t) => Math.abs(t - 0.3), 0, 1, [0.3, 0, Number.NaN, 0, 1.001, 1e-3]);
    expect(corner).toBeCloseTo((0.3 * 0.3 + 0.7 * 0.7) / 2, 14);
    expect(integrate((t) => t, 2, 2, [2, 0])).toBe(0);
  });
});
