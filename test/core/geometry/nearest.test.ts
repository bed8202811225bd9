import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { pointAt } from '../../../src/core/geometry/evaluate.ts';
import { nearestOnSegment } from '../../../src/core/geometry/nearest.ts';
import {
  aCurve,
  aParameter,
  build,
  type Curve,
  circle,
  degenerateCurves,
  place,
} from '../../support/curves.ts';

function nearest(curve: Curve, x: number, y: number, t0 = 0, t1 = 1): { t: number; distance: number } {
  return nearestOnSegment(build(curve), 0, x, y, t0, t1);
}

const aPlace = fc.double({ min: -300, max: 300, noNaN: true });

/** The least distance at n + 1 samples, then at finer ones about the best of them. */
function sampled(curve: Curve, x: number, y: number, t0: number, t1: number): number {
  const n = 500;
  const at = (u: number): number => {
    const [px, py] = place(curve, t0 + (t1 - t0) * Math.min(1, Math.max(0, u)));
    return Math.hypot(px - x, py - y);
  };
  let best = 0;
  for (let k = 1; k <= n; k++) if (at(k / n) < at(best)) best = k / n;
  for (let h = 1 / n; h > 1e-12; h /= 2) {
    for (const u of [best - h, best + h]) if (at(u) < at(best)) best = Math.min(1, Math.max(0, u));
  }
  return at(best);
}

describe('nearestOnSegment', () => {
  // 1e-8 mm is 1e-10 of these curves' size: what rounding leaves where all of P′ and P″ vanishes.
  test('no sampled point of the span is nearer, and the distance is that of its own point', () => {
    const out = new Float64Array(2);
    fc.assert(
      fc.property(aCurve, aPlace, aPlace, aParameter, aParameter, (curve, x, y, t0, t1) => {
        const { t, distance } = nearest(curve, x, y, t0, t1);
        expect(t).toBeGreaterThanOrEqual(Math.min(t0, t1));
        expect(t).toBeLessThanOrEqual(Math.max(t0, t1));
        pointAt(build(curve), 0, t, out);
        expect(Math.abs(Math.hypot(out[0] - x, out[1] - y) - distance)).toBeLessThan(1e-12);
        expect(distance).toBeLessThanOrEqual(sampled(curve, x, y, t0, t1) + 1e-8);
      }),
      { numRuns: 1500 },
    );
  });

  test('a point of the curve is at no distance, its control points and cusps included', () => {
    fc.assert(
      fc.property(aCurve, aParameter, (curve, t) => {
        const [x, y] = place(curve, t);
        expect(nearest(curve, x, y).distance).toBeLessThan(1e-9);
      }),
      { numRuns: 2000 },
    );
  });

  test('a line: its foot or its nearer end', () => {
    const line: Curve = { kind: 'line', points: [0, 0, 10, 0] };
    expect(nearest(line, 4, 3)).toEqual({ t: 0.4, distance: 3 });
    expect(nearest(line, 13, 4)).toEqual({ t: 1, distance: 5 });
    expect(nearest(line, 4, 3, 0.8, 0.5)).toEqual({ t: 0.5, distance: Math.sqrt(10) });
  });

  test('a point of the curve where two quarters meet', () => {
    for (const start of [0, 0.1, 1, -2.5]) {
      for (let k = 0; k <= 8; k++) {
        const [x, y] = place(circle(3, 4, 20, start), k / 8);
        expect(nearest(circle(3, 4, 20, start), x, y).distance).toBeLessThan(1e-12);
      }
    }
  });

  test('a circle: the radius less or more', () => {
    fc.assert(
      fc.property(aPlace, aPlace, (x, y) => {
        const want = Math.abs(Math.hypot(x - 3, y - 4) - 20);
        return Math.abs(nearest(circle(3, 4, 20, 1), x, y).distance - want) < 1e-11;
      }),
      { numRuns: 1000 },
    );
    expect(nearest(circle(3, 4, 20), 3, 4).distance).toBeCloseTo(20, 13);
  });

  // On the major axis within (a² − b²)/a of the centre the nearest point of an ellipse is at
  // x·a²/(a² − b²), off the axis; beyond it, the vertex.
  test('an ellipse seen from its major axis', () => {
    const wide: Curve = { kind: 'arc', c: [0, 0, 2, 0, 0, 1], theta0: -3, sweep: 2 * Math.PI };
    expect(nearest(wide, 1, 0).distance).toBeCloseTo(Math.sqrt(2 / 3), 13);
    expect(nearest(wide, 0, 0).distance).toBeCloseTo(1, 13);
    expect(nearest(wide, 1.5, 0).distance).toBeCloseTo(0.5, 13);
    expect(nearest(wide, 1.75, 0).distance).toBeCloseTo(0.25, 13);
    expect(nearest(wide, -1.6, 0).distance).toBeCloseTo(0.4, 13);
  });

  // x′ and y′ both vanish in the middle of this one.
  test('the tip of a cusp, from ahead and from within', () => {
    const cusp: Curve = { kind: 'cubic', points: [0, 0, 100, 100, 0, 100, 100, 0] };
    expect(nearest(cusp, 50, 75).distance).toBeLessThan(1e-12);
    expect(nearest(cusp, 50, 95)).toEqual({ t: 0.5, distance: 20 });
  });

  test('of the two passes of a loop, the nearer', () => {
    const loop: Curve = { kind: 'cubic', points: [0, 0, 150, 100, -50, 100, 100, 0] };
    const left = nearest(loop, 40, 40);
    const right = nearest(loop, 60, 40);
    expect(left.distance).toBeCloseTo(right.distance, 12);
    expect(left.t + right.t).toBeCloseTo(1, 12);
  });

  test('very far away it still finds the right place', () => {
    fc.assert(
      fc.property(aCurve, fc.double({ min: 0, max: 6.28, noNaN: true }), (curve, direction) => {
        const x = 1e7 * Math.cos(direction);
        const y = 1e7 * Math.sin(direction);
        return nearest(curve, x, y).distance <= sampled(curve, x, y, 0, 1) + 1e-7;
      }),
    );
  });

  test.each(degenerateCurves)('%s has a nearest point', (_, curve) => {
    for (const [x, y] of [
      [3, 4],
      [0, 0],
      [-7, 11],
    ] as const) {
      const { t, distance } = nearest(curve, x, y);
      expect(t >= 0 && t <= 1).toBe(true);
      expect(Math.abs(distance - sampled(curve, x, y, 0, 1))).toBeLessThan(1e-9);
    }
  });
});
