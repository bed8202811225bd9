import { pointAt } from '../geometry/evaluate.js';
import { ARC, LINE, type Segments } from '../geometry/segments.js';

/** Places between the ends at which arcs are compared. */
const ARC_SAMPLES = 6;

/**
 * The largest distance of two segments from end to end, taken as they run or reversed; infinite where it
 * exceeds `limit` or their kinds differ.
 *
 * Lines and cubics are compared by their control points: no point of one is farther from the point of
 * the other with the same parameter than the farthest pair of control points (convex hull property).
 * Arcs are compared at six places between the ends: the difference of two arcs with nearly the same
 * angles is nearly a + b·cos + c·sin, which three places decide.
 */
export function deviationOf(a: Segments, i: number, b: Segments, j: number, limit: number): number {
  if (a.kind[i] !== b.kind[j]) return Number.POSITIVE_INFINITY;
  const forward = deviationAlong(a, i, b, j, false, limit);
  return forward <= limit ? forward : deviationAlong(a, i, b, j, true, limit);
}

function deviationAlong(
  a: Segments,
  i: number,
  b: Segments,
  j: number,
  reversed: boolean,
  limit: number,
): number {
  const da = a.data;
  const db = b.data;
  const oa = a.offset[i];
  const ob = b.offset[j];
  let worst = Math.max(
    distance(da, oa, db, reversed ? ob + 2 : ob),
    distance(da, oa + 2, db, reversed ? ob : ob + 2),
  );
  if (!(worst <= limit)) return Number.POSITIVE_INFINITY;
  if (a.kind[i] === LINE) return worst;
  if (a.kind[i] === ARC) return Math.max(worst, arcDeviation(a, i, b, j, reversed));
  worst = Math.max(
    worst,
    distance(da, oa + 4, db, reversed ? ob + 6 : ob + 4),
    distance(da, oa + 6, db, reversed ? ob + 4 : ob + 6),
  );
  return worst <= limit ? worst : Number.POSITIVE_INFINITY;
}

function arcDeviation(a: Segments, i: number, b: Segments, j: number, reversed: boolean): number {
  const p = new Float64Array(2);
  const q = new Float64Array(2);
  let worst = 0;
  for (let k = 1; k <= ARC_SAMPLES; k++) {
    const t = k / (ARC_SAMPLES + 1);
    pointAt(a, i, t, p);
    pointAt(b, j, reversed ? 1 - t : t, q);
    worst = Math.max(worst, distance(p, 0, q, 0));
  }
  return worst;
}

function distance(p: Float64Array, i: number, q: Float64Array, j: number): number {
  const dx = p[i] - q[j];
  const dy = p[i + 1] - q[j + 1];
  return Math.sqrt(dx * dx + dy * dy);
}
