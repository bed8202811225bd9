import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { derivativeAt, pointAt } from '../../../src/core/geometry/evaluate.ts';
import { aCurve, aParameter, build, circle, degenerateCurves, place } from '../../support/curves.ts';

const out = new Float64Array(2);

describe('pointAt', () => {
  test('agrees with de Casteljau and with Math.sin and Math.cos', () => {
    fc.assert(
      fc.property(aCurve, aParameter, (curve, t) => {
        pointAt(build(curve), 0, t, out);
        const [x, y] = place(curve, t);
        return Math.abs(out[0] - x) <= 1e-12 && Math.abs(out[1] - y) <= 1e-12;
      }),
      { numRuns: 2000 },
    );
  });

  test('gives the stored ends bit for bit', () => {
    fc.assert(
      fc.property(aCurve, aCurve, (before, curve) => {
        const segments = build(before, curve);
        const o = segments.offset[1];
        const ends = [...segments.data.slice(o, o + 4)];
        pointAt(segments, 1, 0, out);
        const start = [...out];
        pointAt(segments, 1, 1, out);
        expect([...start, ...out]).toEqual(ends);
      }),
    );
  });

  test('a quarter of a circle', () => {
    pointAt(build(circle(10, 20, 5)), 0, 0.25, out);
    expect(out[0]).toBeCloseTo(10, 14);
    expect(out[1]).toBeCloseTo(25, 14);
  });
});

describe('derivativeAt', () => {
  test('is the slope of a short chord', () => {
    const h = 1e-5;
    fc.assert(
      fc.property(aCurve, fc.double({ min: 0.01, max: 0.99, noNaN: true }), (curve, t) => {
        derivativeAt(build(curve), 0, t, out);
        const [xa, ya] = place(curve, t - h);
        const [xb, yb] = place(curve, t + h);
        return (
          Math.abs(out[0] - (xb - xa) / (2 * h)) <= 1e-4 && Math.abs(out[1] - (yb - ya) / (2 * h)) <= 1e-4
        );
      }),
      { numRuns: 1000 },
    );
  });

  // A Bézier curve leaves along its first leg at three times its length.
  test('at the ends of a cubic', () => {
    const segments = build({ kind: 'cubic', points: [0, 0, 1, 2, 5, 6, 9, 7] });
    derivativeAt(segments, 0, 0, out);
    expect([...out]).toEqual([3, 6]);
    derivativeAt(segments, 0, 1, out);
    expect([...out]).toEqual([12, 3]);
  });
});

test.each(degenerateCurves)('%s has points and slopes that are numbers', (_, curve) => {
  for (const t of [0, 0.3, 1]) {
    pointAt(build(curve), 0, t, out);
    expect(out.every(Number.isFinite)).toBe(true);
    derivativeAt(build(curve), 0, t, out);
    expect(out.every(Number.isFinite)).toBe(true);
  }
});
