import { type Curve, place } from './curves.ts';

/**
 * Where two curves cross, the slow way: dense chords on both, and pairs of chords that cross are halved
 * until nothing is left of them. Tangencies are beyond it. Shares no code with the product.
 */
export function crossingsBySampling(a: Curve, b: Curve, samples: number): [number, number][] {
  const pa = sampled(a, samples);
  const pb = sampled(b, samples);
  const found: [number, number][] = [];
  for (let k = 0; k < samples; k++) {
    for (let l = 0; l < samples; l++) {
      const [p, q, r, s] = [pa[k], pa[k + 1], pb[l], pb[l + 1]];
      if (!chordsCross(p, q, r, s)) continue;
      const pair = bisect(a, b, k / samples, (k + 1) / samples, l / samples, (l + 1) / samples);
      if (pair) found.push(pair);
    }
  }
  return found;
}

type Point = readonly [number, number];

function sampled(curve: Curve, samples: number): Point[] {
  return Array.from({ length: samples + 1 }, (_, k) => place(curve, k / samples));
}

function chordsCross(p: Point, q: Point, r: Point, s: Point): boolean {
  if (Math.max(p[0], q[0]) < Math.min(r[0], s[0]) || Math.max(r[0], s[0]) < Math.min(p[0], q[0]))
    return false;
  if (Math.max(p[1], q[1]) < Math.min(r[1], s[1]) || Math.max(r[1], s[1]) < Math.min(p[1], q[1]))
    return false;
  return side(p, q, r) * side(p, q, s) <= 0 && side(r, s, p) * side(r, s, q) <= 0;
}

function side(p: Point, q: Point, r: Point): number {
  return Math.sign((q[0] - p[0]) * (r[1] - p[1]) - (q[1] - p[1]) * (r[0] - p[0]));
}

/** Halves overlap a little, so that a chord's bow does not put the crossing between them. */
const OVERLAP = 0.1;

function bisect(a: Curve, b: Curve, s0: number, s1: number, t0: number, t1: number): [number, number] | null {
  for (let depth = 0; depth < 64; depth++) {
    let hit: [number, number, number, number] | null = null;
    for (const [p, q] of halvesOf(s0, s1)) {
      for (const [r, s] of halvesOf(t0, t1)) {
        if (!hit && chordsCross(place(a, p), place(a, q), place(b, r), place(b, s))) hit = [p, q, r, s];
      }
    }
    // The chords cross where the curves do not, or rounding is reached.
    if (!hit) return depth > 40 ? [(s0 + s1) / 2, (t0 + t1) / 2] : null;
    [s0, s1, t0, t1] = hit;
  }
  return [(s0 + s1) / 2, (t0 + t1) / 2];
}

function halvesOf(low: number, high: number): [number, number][] {
  const mid = (low + high) / 2;
  const more = OVERLAP * (high - low);
  return [
    [Math.max(0, low - more), mid + more],
    [mid - more, Math.min(1, high + more)],
  ];
}

/** The unit tangent: from the hodograph's control points, or the derivative of the ellipse. */
export function tangent(curve: Curve, t: number): [number, number] {
  if (curve.kind === 'arc') {
    const [, , ux, uy, vx, vy] = curve.c as [number, number, number, number, number, number];
    const angle = curve.theta0 + t * curve.sweep;
    const sign = Math.sign(curve.sweep);
    return unit(
      sign * (vx * Math.cos(angle) - ux * Math.sin(angle)),
      sign * (vy * Math.cos(angle) - uy * Math.sin(angle)),
    );
  }
  const { points } = curve;
  const hodograph = points.slice(2).map((value, k) => value - points[k]);
  return unit(...place({ kind: curve.kind, points: hodograph }, t));
}

function unit(x: number, y: number): [number, number] {
  const length = Math.hypot(x, y);
  return [x / length, y / length];
}

/** The curve turned by the unit vector (c, s) about the origin and moved by (x, y). */
export function moved(curve: Curve, c: number, s: number, x: number, y: number): Curve {
  const turn = (p: readonly number[], shift: number): number[] =>
    p.flatMap((_, k) =>
      k % 2 === 0 ? [c * p[k] - s * p[k + 1] + shift * x, s * p[k] + c * p[k + 1] + shift * y] : [],
    );
  if (curve.kind !== 'arc') return { ...curve, points: turn(curve.points, 1) };
  return { ...curve, c: [...turn(curve.c.slice(0, 2), 1), ...turn(curve.c.slice(2), 0)] };
}

/** The same curve from parameter t0 to t1, by de Casteljau's construction. */
export function partOf(curve: Curve, t0: number, t1: number): Curve {
  if (curve.kind === 'arc') {
    return { ...curve, theta0: curve.theta0 + t0 * curve.sweep, sweep: (t1 - t0) * curve.sweep };
  }
  const start = halves(curve.points, t0)[1];
  return { ...curve, points: halves(start, (t1 - t0) / (1 - t0))[0] };
}

function halves(points: readonly number[], t: number): [number[], number[]] {
  const row = [...points];
  const left: number[] = [];
  const right: number[] = [];
  for (let n = row.length; n > 0; n -= 2) {
    left.push(row[0], row[1]);
    right.unshift(row[n - 2], row[n - 1]);
    for (let k = 0; k + 2 < n; k++) row[k] = (1 - t) * row[k] + t * row[k + 2];
  }
  return [left, right];
}
