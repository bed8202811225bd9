import { derivativeAt, pointAt } from './evaluate.js';
import { CUBIC, type Segments } from './segments.js';

/**
 * Where segment i crosses itself: calls `emit` with the two parameters, t0 < t1. Only a cubic can, and
 * only once; an end that lies on the curve counts, the joint of a cubic that ends where it starts does
 * not, nor does a cubic that runs to and fro on a straight line.
 *
 * With P = p0 + c1 t + c2 t² + c3 t³, P(s) = P(t) and s ≠ t give
 * c3 (s² + s t + t²) + c2 (s + t) + c1 = 0: two equations in s + t and s t, the first of them linear
 * after a cross product with c3. The pair is then refined by Newton's method. Accuracy: the points agree
 * within 1e-13 of the control points' size where the loop is not a cusp.
 */
export function selfIntersections(
  segments: Segments,
  i: number,
  emit: (t0: number, t1: number) => void,
): void {
  if (segments.kind[i] !== CUBIC) return;
  const d = segments.data;
  const o = segments.offset[i];
  const c1x = 3 * (d[o + 4] - d[o]);
  const c1y = 3 * (d[o + 5] - d[o + 1]);
  const c2x = 3 * (d[o + 6] - d[o + 4]) - c1x;
  const c2y = 3 * (d[o + 7] - d[o + 5]) - c1y;
  const c3x = d[o + 2] - d[o] - 3 * (d[o + 6] - d[o + 4]);
  const c3y = d[o + 3] - d[o + 1] - 3 * (d[o + 7] - d[o + 5]);
  const squared = c3x * c3x + c3y * c3y;
  const sum = -(c1x * c3y - c1y * c3x) / (c2x * c3y - c2y * c3x);
  const product = sum * sum + ((c2x * sum + c1x) * c3x + (c2y * sum + c1y) * c3y) / squared;
  const under = sum * sum - 4 * product;
  if (!(under > 0)) return;
  // The larger root first, the other from the product: no cancellation.
  const far = (sum + (sum < 0 ? -1 : 1) * Math.sqrt(under)) / 2;
  const near = product / far;
  if (!Number.isFinite(near)) return;
  const [t0, t1] = refined(segments, i, Math.min(near, far), Math.max(near, far));
  if (t0 < 0 || t1 > 1 || !(t0 < t1) || (t0 === 0 && t1 === 1)) return;
  emit(t0, t1);
}

/** An end missed by this much of the parameter is meant. */
const AT_END = 1e-13;

function refined(segments: Segments, i: number, s: number, t: number): [number, number] {
  const p = new Float64Array(2);
  const q = new Float64Array(2);
  for (let step = 0; step < 4; step++) {
    pointAt(segments, i, s, p);
    pointAt(segments, i, t, q);
    const rx = q[0] - p[0];
    const ry = q[1] - p[1];
    derivativeAt(segments, i, s, p);
    derivativeAt(segments, i, t, q);
    const det = p[1] * q[0] - p[0] * q[1];
    const ds = (ry * q[0] - rx * q[1]) / det;
    const dt = (p[0] * ry - p[1] * rx) / det;
    // Far off, the closed form is the better of the two: near a cusp the equations are degenerate.
    if (!(Math.abs(ds) < 1e-6 && Math.abs(dt) < 1e-6)) break;
    s += ds;
    t += dt;
  }
  return [nearEnd(s), nearEnd(t)];
}

function nearEnd(t: number): number {
  if (Math.abs(t) <= AT_END) return 0;
  return Math.abs(t - 1) <= AT_END ? 1 : t;
}
