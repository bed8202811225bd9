import fc from 'fast-check';
import { SegmentBuilder, type Segments } from '../../src/core/geometry/segments.ts';

/**
 * Segments for laws, with a second opinion on where their points lie: de Casteljau's construction for
 * cubics, the engine's own Math.sin and Math.cos for arcs.
 */
export type Curve =
  | { readonly kind: 'line'; readonly points: readonly number[] }
  | { readonly kind: 'cubic'; readonly points: readonly number[] }
  | { readonly kind: 'arc'; readonly c: readonly number[]; readonly theta0: number; readonly sweep: number };

export function build(...curves: readonly Curve[]): Segments {
  const builder = new SegmentBuilder();
  for (const curve of curves) {
    if (curve.kind === 'line') {
      const [x0, y0, x1, y1] = curve.points as [number, number, number, number];
      builder.line(x0, y0, x1, y1);
    } else if (curve.kind === 'cubic') {
      const [x0, y0, ax, ay, bx, by, x1, y1] = curve.points as Eight;
      builder.cubic(x0, y0, ax, ay, bx, by, x1, y1);
    } else {
      const [cx, cy, ux, uy, vx, vy] = curve.c as [number, number, number, number, number, number];
      const [x0, y0] = place(curve, 0);
      const [x1, y1] = place(curve, 1);
      builder.arc(x0, y0, x1, y1, cx, cy, ux, uy, vx, vy, curve.theta0, curve.sweep);
    }
  }
  return builder.finish();
}

type Eight = [number, number, number, number, number, number, number, number];

export function place(curve: Curve, t: number): [number, number] {
  if (curve.kind === 'arc') {
    const [cx, cy, ux, uy, vx, vy] = curve.c as [number, number, number, number, number, number];
    const cos = Math.cos(curve.theta0 + t * curve.sweep);
    const sin = Math.sin(curve.theta0 + t * curve.sweep);
    return [cx + ux * cos + vx * sin, cy + uy * cos + vy * sin];
  }
  const p = [...curve.points];
  for (let left = p.length - 2; left > 0; left -= 2) {
    for (let k = 0; k < left; k++) p[k] = (1 - t) * p[k] + t * p[k + 2];
  }
  return [p[0], p[1]];
}

/** The sum of n chords at even steps of t: never longer than the curve. */
export function chordSum(curve: Curve, n: number, t0 = 0, t1 = 1, spread = (u: number): number => u): number {
  let [x, y] = place(curve, t0 + (t1 - t0) * spread(0));
  let sum = 0;
  for (let k = 1; k <= n; k++) {
    const [nx, ny] = place(curve, t0 + (t1 - t0) * spread(k / n));
    sum += Math.hypot(nx - x, ny - y);
    x = nx;
    y = ny;
  }
  return sum;
}

/** A circle or a part of one. */
export function circle(cx: number, cy: number, r: number, theta0 = 0, sweep = 2 * Math.PI): Curve {
  return { kind: 'arc', c: [cx, cy, r, 0, 0, r], theta0, sweep };
}

// Coarse integers beside any number, so that coincident points, straight cubics and cusps turn up.
const coordinate = fc.oneof(
  fc.integer({ min: -3, max: 3 }).map((n) => n * 50),
  // Below 1e-9 nothing is drawn, and squares underflow: 0 stands for it.
  fc.double({ min: -200, max: 200, noNaN: true }).map((x) => (Math.abs(x) < 1e-9 ? 0 : x)),
);

export const aLine: fc.Arbitrary<Curve> = fc
  .array(coordinate, { minLength: 4, maxLength: 4 })
  .map((points) => ({ kind: 'line', points }));

export const aCubic: fc.Arbitrary<Curve> = fc
  .array(coordinate, { minLength: 8, maxLength: 8 })
  .map((points) => ({ kind: 'cubic', points }));

export const anArc: fc.Arbitrary<Curve> = fc.record({
  kind: fc.constant('arc' as const),
  c: fc.array(coordinate, { minLength: 6, maxLength: 6 }),
  theta0: fc.double({ min: -7, max: 7, noNaN: true }),
  sweep: fc.double({ min: -2 * Math.PI, max: 2 * Math.PI, noNaN: true }),
});

export const aCurve: fc.Arbitrary<Curve> = fc.oneof(aLine, aCubic, anArc);

export const aParameter: fc.Arbitrary<number> = fc.oneof(
  fc.constantFrom(0, 1, 0.5),
  fc.double({ min: 0, max: 1, noNaN: true }),
);

/** Curves without extent, or with less than their kind allows. */
export const degenerateCurves: readonly (readonly [string, Curve])[] = [
  ['a line of no length', { kind: 'line', points: [3, 4, 3, 4] }],
  ['a cubic of one point', { kind: 'cubic', points: [3, 4, 3, 4, 3, 4, 3, 4] }],
  ['a straight cubic', { kind: 'cubic', points: [0, 0, 10, 0, 20, 0, 30, 0] }],
  ['a cubic that runs out and back', { kind: 'cubic', points: [0, 0, 30, 40, 30, 40, 0, 0] }],
  ['a cubic with both control points on its ends', { kind: 'cubic', points: [0, 0, 0, 0, 30, 40, 30, 40] }],
  ['an arc of no sweep', { kind: 'arc', c: [0, 0, 5, 0, 0, 5], theta0: 1, sweep: 0 }],
  ['an arc of no radius', { kind: 'arc', c: [3, 4, 0, 0, 0, 0], theta0: 0, sweep: 6 }],
  ['an ellipse squeezed to a line', { kind: 'arc', c: [0, 0, 5, 5, 3, 3], theta0: 0, sweep: 6 }],
  ['an ellipse squeezed to its major axis', { kind: 'arc', c: [0, 0, 5, 0, 0, 0], theta0: 0, sweep: 6 }],
];
