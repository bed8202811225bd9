import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { pointAt } from '../../../src/core/geometry/evaluate.ts';
import { flattenSegment } from '../../../src/core/geometry/flatten.ts';
import type { Segments } from '../../../src/core/geometry/segments.ts';
import {
  aCurve,
  aParameter,
  build,
  type Curve,
  circle,
  degenerateCurves,
  place,
} from '../../support/curves.ts';
import vectors from '../../support/vectors.json' with { type: 'json' };

type Vertex = readonly [x: number, y: number, t: number];

function vertices(segments: Segments, t0: number, t1: number, accuracy: number): Vertex[] {
  const list: Vertex[] = [];
  flattenSegment(segments, 0, t0, t1, accuracy, (x, y, t) => list.push([x, y, t]));
  return list;
}

function distanceToChord(x: number, y: number, a: Vertex, b: Vertex): number {
  const dx = b[0] - a[0];
  const dy = b[1] - a[1];
  const squared = dx * dx + dy * dy;
  const s = squared === 0 ? 0 : ((x - a[0]) * dx + (y - a[1]) * dy) / squared;
  const c = Math.max(0, Math.min(1, s));
  return Math.hypot(x - a[0] - c * dx, y - a[1] - c * dy);
}

/** The largest distance of points of the curve from the chord over the same parameters, by sampling. */
function worstDeviation(curve: Curve, t0: number, polyline: readonly Vertex[]): number {
  let worst = 0;
  let a: Vertex = [...place(curve, t0), t0];
  const samples = Math.max(3, Math.min(40, Math.floor(4000 / polyline.length)));
  for (const b of polyline) {
    for (let k = 1; k < samples; k++) {
      const [x, y] = place(curve, a[2] + ((b[2] - a[2]) * k) / samples);
      worst = Math.max(worst, distanceToChord(x, y, a, b));
    }
    a = b;
  }
  return worst;
}

const anAccuracy = fc.constantFrom(0.001, 0.02, 0.1, 1, 30, 1000);

describe('flattenSegment', () => {
  test('no sampled point is farther from its chord than the accuracy', () => {
    fc.assert(
      fc.property(aCurve, aParameter, aParameter, anAccuracy, (curve, t0, t1, accuracy) => {
        const polyline = vertices(build(curve), t0, t1, accuracy);
        expect(worstDeviation(curve, t0, polyline)).toBeLessThanOrEqual(accuracy * (1 + 1e-9) + 1e-12);
      }),
      { numRuns: 400 },
    );
  });

  test('vertices are points of the curve, in order, ending at the end', () => {
    const out = new Float64Array(2);
    fc.assert(
      fc.property(aCurve, aParameter, aParameter, anAccuracy, (curve, t0, t1, accuracy) => {
        const segments = build(curve);
        const polyline = vertices(segments, t0, t1, accuracy);
        let last = t0;
        for (const [x, y, t] of polyline) {
          pointAt(segments, 0, t, out);
          expect([x, y]).toEqual([...out]);
          expect(t1 < t0 ? t <= last : t >= last).toBe(true);
          last = t;
        }
        expect(last).toBe(t1);
      }),
      { numRuns: 300 },
    );
  });

  test('backwards it passes the very same vertices', () => {
    fc.assert(
      fc.property(aCurve, aParameter, aParameter, anAccuracy, (curve, t0, t1, accuracy) => {
        const inner = vertices(build(curve), t0, t1, accuracy).slice(0, -1);
        const back = vertices(build(curve), t1, t0, accuracy).slice(0, -1);
        expect(back.reverse()).toEqual(inner);
      }),
      { numRuns: 300 },
    );
  });

  // Sagitta r·(1 − cos(π/n)): the least n that keeps it, worked independently; at least 3.
  test.each(vectors.circleFlatten)('a circle of radius $r within $e takes $n sides', ({ r, e, n, err }) => {
    const curve = circle(3, 4, r);
    const polyline = vertices(build(curve), 0, 1, e);
    expect(polyline.length).toBe(n);
    const sagitta = r * (1 - Math.cos(Math.PI / n));
    expect(sagitta).toBeCloseTo(err, 12);
    expect(worstDeviation(curve, 0, polyline)).toBeLessThanOrEqual(err * (1 + 1e-9));
  });

  // Wang's formula: Goldman, R. (2003), Pyramid Algorithms, §5.6.3. Quadratics raised to cubics
  // exactly, which leaves the bound unchanged.
  test.each(vectors.wang)('$points within $tol takes $n pieces', ({ points, tol, n, deviation }) => {
    const cubic = points.length === 4 ? points : raised(points as Point[]);
    const curve: Curve = { kind: 'cubic', points: cubic.flat() };
    const polyline = vertices(build(curve), 0, 1, tol);
    expect(polyline.length).toBe(n);
    expect(worstDeviation(curve, 0, polyline)).toBeLessThanOrEqual(Math.max(1e-12, deviation * 1.001));
  });

  test('a line is its end', () => {
    const line = build({ kind: 'line', points: [1, 2, 3, 4] });
    expect(vertices(line, 0, 1, 0.1)).toEqual([[3, 4, 1]]);
    expect(vertices(line, 1, 0.5, 0.1)).toEqual([[2, 3, 0.5]]);
  });

  test('half a circle is never a single chord, however coarse', () => {
    expect(vertices(build(circle(0, 0, 1, 0, Math.PI)), 0, 1, 1e9).length).toBe(2);
  });

  test('a part of a curve takes no more pieces than the whole', () => {
    fc.assert(
      fc.property(aCurve, aParameter, aParameter, (curve, t0, t1) => {
        const segments = build(curve);
        return vertices(segments, t0, t1, 0.05).length <= vertices(segments, 0, 1, 0.05).length;
      }),
    );
  });

  test('stops at about a million pieces', () => {
    let count = 0;
    flattenSegment(build(circle(0, 0, 1)), 0, 0, 1, Number.MIN_VALUE, () => {
      count++;
    });
    expect(count).toBe(1 << 20);
  });

  test.each([0, -1, Number.NaN])('refuses an accuracy of %d', (accuracy) => {
    expect(() => vertices(build(circle(0, 0, 1)), 0, 1, accuracy)).toThrow(RangeError);
  });

  test.each(degenerateCurves)('%s becomes numbers', (_, curve) => {
    const polyline = vertices(build(curve), 0, 1, 0.01);
    expect(polyline.length).toBeGreaterThan(0);
    expect(polyline.flat().every(Number.isFinite)).toBe(true);
    expect(polyline.at(-1)?.slice(0, 2)).toEqual([...build(curve).data.slice(2, 4)]);
  });
});

type Point = [number, number];

/** Degree elevation: control points 1/3 P0 + 2/3 P1 and 2/3 P1 + 1/3 P2. */
function raised([p, q, r]: Point[]): number[][] {
  const [p0, p1, p2] = [p, q, r] as [Point, Point, Point];
  return [
    p0,
    [(p0[0] + 2 * p1[0]) / 3, (p0[1] + 2 * p1[1]) / 3],
    [(2 * p1[0] + p2[0]) / 3, (2 * p1[1] + p2[1]) / 3],
    p2,
  ];
}
