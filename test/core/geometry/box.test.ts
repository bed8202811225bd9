import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { segmentBox } from '../../../src/core/geometry/box.ts';
import { pointAt } from '../../../src/core/geometry/evaluate.ts';
import { aCurve, aLine, build, type Curve, circle, degenerateCurves, place } from '../../support/curves.ts';

function boxOf(curve: Curve): [number, number, number, number] {
  const out = new Float64Array(4);
  segmentBox(build(curve), 0, out);
  return [...out] as [number, number, number, number];
}

/** The largest value of `value` over the curve: the best of many samples, then halving steps about it. */
function largest(curve: Curve, value: (p: readonly number[]) => number): number {
  const at = (t: number): number => value(place(curve, Math.min(1, Math.max(0, t))));
  let best = 0;
  const consider = (t: number): void => {
    if (at(t) > at(best)) best = t;
  };
  for (let k = 0; k <= 400; k++) consider(k / 400);
  // Small bumps hide beside the ends.
  for (let h = 1 / 400; h > 1e-10; h /= 2) {
    consider(h);
    consider(1 - h);
  }
  for (let h = 1 / 400; h > 1e-10; h /= 2) {
    consider(best - h);
    consider(best + h);
  }
  return at(best);
}

describe('segmentBox', () => {
  test('contains every point that pointAt gives', () => {
    const out = new Float64Array(2);
    fc.assert(
      fc.property(aCurve, (curve) => {
        const [minX, minY, maxX, maxY] = boxOf(curve);
        const segments = build(curve);
        for (let k = 0; k <= 300; k++) {
          pointAt(segments, 0, k / 300, out);
          if (!(out[0] >= minX && out[0] <= maxX && out[1] >= minY && out[1] <= maxY)) return false;
        }
        return true;
      }),
      { numRuns: 500 },
    );
  });

  test('touches the curve on all four sides within 1e-9', () => {
    fc.assert(
      fc.property(aCurve, (curve) => {
        const [minX, minY, maxX, maxY] = boxOf(curve);
        expect(maxX - largest(curve, (p) => p[0])).toBeLessThan(1e-9);
        expect(maxY - largest(curve, (p) => p[1])).toBeLessThan(1e-9);
        expect(-minX - largest(curve, (p) => -p[0])).toBeLessThan(1e-9);
        expect(-minY - largest(curve, (p) => -p[1])).toBeLessThan(1e-9);
      }),
      { numRuns: 500 },
    );
  });

  test('holds where numbers are so small that products underflow', () => {
    const curve: Curve = { kind: 'cubic', points: [0, 0, 0, 0, 0, -5e-323, 0, 0] };
    const out = new Float64Array(2);
    pointAt(build(curve), 0, 0.5, out);
    expect(boxOf(curve)[1]).toBeLessThanOrEqual(out[1]);
  });

  test('a line: its ends exactly', () => {
    fc.assert(
      fc.property(aLine, (curve) => {
        const [x0, y0, x1, y1] = build(curve).data as unknown as [number, number, number, number];
        expect(boxOf(curve)).toEqual([
          Math.min(x0, x1),
          Math.min(y0, y1),
          Math.max(x0, x1),
          Math.max(y0, y1),
        ]);
      }),
    );
  });

  // y = 300·t(1 − t) has its top, 75, in the middle.
  test('an arch', () => {
    const box = boxOf({ kind: 'cubic', points: [0, 0, 0, 100, 100, 100, 100, 0] });
    [0, 0, 100, 75].forEach((want, k) => {
      expect(box[k]).toBeCloseTo(want, 12);
    });
  });

  test.each([
    ['a whole circle', circle(10, 20, 5), [5, 15, 15, 25]],
    ['a quarter', circle(10, 20, 5, 0, Math.PI / 2), [10, 20, 15, 25]],
    [
      'a quarter backwards over the axis',
      circle(10, 20, 5, Math.PI / 4, -Math.PI / 2),
      [13.5355339059, 16.4644660941, 15, 23.5355339059],
    ],
    ['three quarters', circle(0, 0, 1, 0, 1.5 * Math.PI), [-1, -1, 1, 1]],
    [
      'begun three turns on',
      circle(0, 0, 1, 6 * Math.PI + 0.1, 0.1),
      [0.98006657784, 0.09983341665, 0.99500416528, 0.1986693308],
    ],
  ] as const)('%s', (_, curve, want) => {
    const box = boxOf(curve);
    want.forEach((value, k) => {
      expect(box[k]).toBeCloseTo(value, 9);
    });
  });

  test.each(degenerateCurves)('%s has a box', (_, curve) => {
    expect(boxOf(curve).every(Number.isFinite)).toBe(true);
  });
});
