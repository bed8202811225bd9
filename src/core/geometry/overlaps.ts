import { pointAt } from './evaluate.js';
import { nearestOnSegment } from './nearest.js';
import type { Segments } from './segments.js';

/** Two segments run along one another between these parameters; b1 < b0 where in opposite directions. */
export interface Overlap {
  readonly a0: number;
  readonly a1: number;
  readonly b0: number;
  readonly b1: number;
}

/** Two cubics that share more than nine points are the same cubic (Bézout's theorem). */
const SAMPLES = 10;

/**
 * Where the two segments run along one another within `tolerance`. Curves of these kinds part only
 * where one of them ends, so that the ends of a stretch are among the parameters `cutsA` and `cutsB`
 * at which an end of the other one lies (both sorted, each with 0 and 1).
 */
export function overlapsOf(
  a: Segments,
  i: number,
  b: Segments,
  j: number,
  cutsA: readonly number[],
  cutsB: readonly number[],
  tolerance: number,
): Overlap[] {
  const overlaps: Overlap[] = [];
  for (let k = 1; k < cutsA.length; k++) {
    const a0 = cutsA[k - 1];
    const a1 = cutsA[k];
    if (isShort(a, i, a0, a1, 4 * tolerance)) continue;
    const middle = partnerOf(a, i, (a0 + a1) / 2, b, j, tolerance);
    if (middle < 0) continue;
    const l = cutsB.findIndex((cut) => cut > middle);
    if (l < 1 || isShort(b, j, cutsB[l - 1], cutsB[l], 2 * tolerance)) continue;
    const low = cutsB[l - 1];
    const high = cutsB[l];
    let isAlong = true;
    let before = -1;
    let rises = 0;
    for (let n = 1; n <= SAMPLES && isAlong; n++) {
      const t = partnerOf(a, i, a0 + ((a1 - a0) * n) / (SAMPLES + 1), b, j, tolerance);
      isAlong = t >= low && t <= high;
      if (before >= 0) rises += Math.sign(t - before);
      before = t;
    }
    if (isAlong) overlaps.push(rises >= 0 ? { a0, a1, b0: low, b1: high } : { a0, a1, b0: high, b1: low });
  }
  return overlaps;
}

/** The parameter of b at the point of a, or −1 where b does not pass there. */
function partnerOf(a: Segments, i: number, s: number, b: Segments, j: number, tolerance: number): number {
  const p = new Float64Array(2);
  pointAt(a, i, s, p);
  const { t, distance } = nearestOnSegment(b, j, p[0], p[1], 0, 1);
  return distance <= tolerance ? t : -1;
}

/** The piece between the two parameters stays within `reach` of its ends. */
export function isShort(segments: Segments, i: number, t0: number, t1: number, reach: number): boolean {
  if (t0 === t1) return true;
  const p = new Float64Array(2);
  const q = new Float64Array(2);
  pointAt(segments, i, t0, p);
  for (const t of [t1, (t0 + t1) / 2]) {
    pointAt(segments, i, t, q);
    const dx = q[0] - p[0];
    const dy = q[1] - p[1];
    if (dx * dx + dy * dy > reach * reach) return false;
  }
  return true;
}
