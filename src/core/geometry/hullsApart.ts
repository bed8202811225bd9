import { ARC, CUBIC, type Segments } from './segments.js';

/** From a segment's offset: where its points stand along the control polygon. */
const POINTS_OF_LINE = [0, 2] as const;
const POINTS_OF_CUBIC = [0, 4, 6, 2] as const;

/**
 * Whether two segments are known to be further apart than `reach`, without looking at the curves: a side of
 * the control polygon of one, or its chord, parts it from the other's. False for arcs, and says nothing then.
 * Allocates nothing; most pairs whose boxes meet are sent away here.
 */
export function hullsApart(a: Segments, i: number, b: Segments, j: number, reach: number): boolean {
  if (a.kind[i] === ARC || b.kind[j] === ARC) return false;
  return isParted(a, i, b, j, reach) || isParted(b, j, a, i, reach);
}

/** By a line along the polygon of the first. */
function isParted(a: Segments, i: number, b: Segments, j: number, reach: number): boolean {
  const d = a.data;
  const o = a.offset[i];
  if (parts(d[o], d[o + 1], d[o + 2], d[o + 3], a, i, b, j, reach)) return true;
  if (a.kind[i] !== CUBIC) return false;
  return (
    parts(d[o], d[o + 1], d[o + 4], d[o + 5], a, i, b, j, reach) ||
    parts(d[o + 6], d[o + 7], d[o + 2], d[o + 3], a, i, b, j, reach)
  );
}

function parts(
  x0: number,
  y0: number,
  x1: number,
  y1: number,
  a: Segments,
  i: number,
  b: Segments,
  j: number,
  reach: number,
): boolean {
  const nx = y0 - y1;
  const ny = x1 - x0;
  const gap = reach * (Math.abs(nx) + Math.abs(ny));
  if (!(gap > 0)) return false;
  let lowA = Number.POSITIVE_INFINITY;
  let highA = Number.NEGATIVE_INFINITY;
  const o = a.offset[i];
  for (const k of a.kind[i] === CUBIC ? POINTS_OF_CUBIC : POINTS_OF_LINE) {
    const across = nx * (a.data[o + k] - x0) + ny * (a.data[o + k + 1] - y0);
    lowA = Math.min(lowA, across);
    highA = Math.max(highA, across);
  }
  let lowB = Number.POSITIVE_INFINITY;
  let highB = Number.NEGATIVE_INFINITY;
  const q = b.offset[j];
  for (const k of b.kind[j] === CUBIC ? POINTS_OF_CUBIC : POINTS_OF_LINE) {
    const across = nx * (b.data[q + k] - x0) + ny * (b.data[q + k + 1] - y0);
    lowB = Math.min(lowB, across);
    highB = Math.max(highB, across);
  }
  return lowB > highA + gap || highB < lowA - gap;
}
