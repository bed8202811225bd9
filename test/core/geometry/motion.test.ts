import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { moveSeconds } from '../../../src/core/geometry/motion.ts';
import vectors from '../../support/vectors.json' with { type: 'json' };

describe('moveSeconds', () => {
  // Biagiotti & Melchiorri (2008), ch. 3, each time held against a numeric integral of the profile.
  test.each(vectors.trapezoid)('d=$d v=$v a=$a from $v0 to $v1 takes $t s', ({ d, v, a, v0, v1, t }) => {
    expect(moveSeconds(d, v, a, v0, v1)).toBeCloseTo(t, 12);
  });

  const positive = fc.double({ min: 0.01, max: 1000, noNaN: true });

  test('is the same move backwards, takes longer for a longer way, and is no faster than its speed', () => {
    fc.assert(
      fc.property(positive, positive, positive, positive, positive, (d, v, a, p, q) => {
        const v0 = Math.min(p, v);
        const v1 = Math.min(q, v);
        const t = moveSeconds(d, v, a, v0, v1);
        expect(moveSeconds(d, v, a, v1, v0)).toBe(t);
        expect(moveSeconds(2 * d, v, a, v0, v1)).toBeGreaterThanOrEqual(t);
        expect(t).toBeGreaterThanOrEqual((d / v) * (1 - 1e-12));
      }),
    );
  });

  test('cut where it cruises, the parts take as long as the whole', () => {
    fc.assert(
      fc.property(positive, positive, fc.double({ min: 0.1, max: 0.9, noNaN: true }), (v, a, share) => {
        const ramp = (v * v) / (2 * a);
        const d = 20 * ramp;
        const parts = moveSeconds(d * share, v, a, 0, v) + moveSeconds(d * (1 - share), v, a, v, 0);
        return Math.abs(parts / moveSeconds(d, v, a) - 1) < 1e-12;
      }),
    );
  });

  // A concave cost of distance that is 0 at 0 keeps the triangle inequality.
  test('from rest to rest two moves never take less than one', () => {
    fc.assert(
      fc.property(positive, positive, positive, positive, (d1, d2, v, a) => {
        const whole = moveSeconds(d1 + d2, v, a);
        return whole <= (moveSeconds(d1, v, a) + moveSeconds(d2, v, a)) * (1 + 1e-12);
      }),
    );
  });

  test('no way, no time; unless the speed has to change', () => {
    expect(moveSeconds(0, 50, 1000)).toBe(0);
    expect(moveSeconds(0, 50, Number.POSITIVE_INFINITY, 10, 0)).toBe(0);
    expect(moveSeconds(0.001, 50, 100, 40, 0)).toBe(0.4);
  });

  test('without limit to the acceleration it is distance by speed', () => {
    expect(moveSeconds(100, 50, Number.POSITIVE_INFINITY)).toBe(2);
  });

  test.each([
    [-1, 1, 1, 0, 0],
    [1, 0, 1, 0, 0],
    [1, 1, 0, 0, 0],
    [1, 1, 1, -1, 0],
    [Number.NaN, 1, 1, 0, 0],
    [1, 1, 1, 0, Number.NaN],
  ])('refuses d=%d v=%d a=%d from %d to %d', (d, v, a, v0, v1) => {
    expect(() => moveSeconds(d, v, a, v0, v1)).toThrow(RangeError);
  });
});
