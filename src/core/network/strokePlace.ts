import type { Drawing } from '../drawing/drawing.js';
import { pointAt } from '../geometry/evaluate.js';

/** The segment of a place on a stroke: `u` is a segment plus a parameter; a stroke's end is its last segment's. */
export function segmentOfPlace({ strokes }: Drawing, stroke: number, u: number): number {
  return Math.min(Math.floor(u), strokes.first[stroke + 1] - 1);
}

/** Whether the place is within `reachMm` of an end of its own stroke, in a straight line. */
export function isNearOwnEnd(drawing: Drawing, stroke: number, u: number, reachMm: number): boolean {
  const { segments, first } = drawing.strokes;
  const { data, offset } = segments;
  const at = new Float64Array(2);
  const segment = segmentOfPlace(drawing, stroke, u);
  pointAt(segments, segment, u - segment, at);
  const start = offset[first[stroke]];
  const end = offset[first[stroke + 1] - 1] + 2;
  return (
    distance(at[0], at[1], data[start], data[start + 1]) <= reachMm ||
    distance(at[0], at[1], data[end], data[end + 1]) <= reachMm
  );
}

/** Between two points, in a straight line. */
export function distance(ax: number, ay: number, bx: number, by: number): number {
  return Math.sqrt((bx - ax) * (bx - ax) + (by - ay) * (by - ay));
}
