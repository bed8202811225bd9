import type { Drawing } from '../drawing/drawing.js';
import { nearestOnSegment } from '../geometry/nearest.js';
import { addSplit, type Marks } from './marks.js';
import type { Pieces } from './pieces.js';
import { snapMarks } from './snap.js';
import { distance } from './strokePlace.js';

/**
 * An end just at the snap distance is met as an end: otherwise the last bit of rounding would decide, and
 * the stroke could be split a hair before its own end.
 */
const ROUNDING = 1e-9;

/**
 * Adds a split to `marks` wherever a stroke's end lies within `snapMm` of another stroke's interior, or
 * of its own further along: the place of the curve nearest to the end, found on the exact curve.
 *
 * No split is made where the end can meet the other stroke at one of that stroke's own ends: snapping
 * sees to that. Ends that snap together are looked at once. One search of the box index per vertex;
 * O(n log n) for bounded crowding.
 */
export function splitWhereEndsTouch(marks: Marks, drawing: Drawing, pieces: Pieces, snapMm: number): void {
  if (!pieces.index) return;
  // Ends that will meet in one vertex are looked at once, from there.
  const { vertexX: siteX, vertexY: siteY } = snapMarks(marks, snapMm);
  const reach = snapMm + pieces.chordErrorMm;
  const splits: { stroke: number; segment: number; t: number }[] = [];
  for (let site = 0; site < siteX.length; site++) {
    const x = siteX[site];
    const y = siteY[site];
    const found = pieces.index.search(x - reach, y - reach, x + reach, y + reach).sort((a, b) => a - b);
    for (let i = 0; i < found.length; ) {
      const j = endOfContiguous(found, i, pieces);
      const stroke = pieces.stroke[found[i]];
      const meetsAtEnd = reachesNearEnd(found[i], found[j - 1], pieces, drawing, x, y, snapMm);
      if (!meetsAtEnd) {
        const place = nearestOnPieces(found, i, j, pieces, drawing, x, y, snapMm);
        if (place) splits.push({ stroke, ...place });
      }
      i = j;
    }
  }
  for (const { stroke, segment, t } of splits) addSplit(marks, drawing, stroke, segment, t);
}

/** First index after `i` whose piece does not follow the one before it on the same stroke. */
function endOfContiguous(found: number[], i: number, pieces: Pieces): number {
  let j = i + 1;
  while (
    j < found.length &&
    found[j] === found[j - 1] + 1 &&
    pieces.stroke[found[j]] === pieces.stroke[found[i]]
  ) {
    j++;
  }
  return j;
}

/**
 * Whether a group of pieces holds an end of its stroke that lies within the snap distance: then that end
 * is what is met (or, on the own stroke, it is the end's own surroundings).
 */
function reachesNearEnd(
  from: number,
  to: number,
  pieces: Pieces,
  drawing: Drawing,
  x: number,
  y: number,
  snapMm: number,
): boolean {
  const { first, segments } = drawing.strokes;
  const start = first[pieces.stroke[from]];
  const last = first[pieces.stroke[from] + 1] - 1;
  const near = (o: number) =>
    distance(x, y, segments.data[o], segments.data[o + 1]) <= snapMm * (1 + ROUNDING);
  const holdsStart = pieces.segment[from] === start && pieces.t0[from] === 0;
  const holdsEnd = pieces.segment[to] === last && pieces.t1[to] === 1;
  return (holdsStart && near(segments.offset[start])) || (holdsEnd && near(segments.offset[last] + 2));
}

function nearestOnPieces(
  found: number[],
  from: number,
  to: number,
  pieces: Pieces,
  drawing: Drawing,
  x: number,
  y: number,
  snapMm: number,
): { segment: number; t: number } | null {
  let best = snapMm;
  let place: { segment: number; t: number } | null = null;
  for (let k = from; k < to; k++) {
    const p = found[k];
    const segment = pieces.segment[p];
    const near = nearestOnSegment(drawing.strokes.segments, segment, x, y, pieces.t0[p], pieces.t1[p]);
    if (near.distance < best || (near.distance === best && !place)) {
      best = near.distance;
      place = { segment, t: near.t };
    }
  }
  return place;
}
