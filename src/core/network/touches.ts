import type { Drawing } from '../drawing/drawing.js';
import { nearestOnSegment } from '../geometry/nearest.js';
import { addSplit, type Marks } from './marks.js';
import type { Pieces } from './pieces.js';
import { gatherSites } from './snap.js';

/**
 * Adds a split to `marks` wherever a stroke's end lies within `snapMm` of another stroke's interior, or
 * of its own further along: the place of the curve nearest to the end, found on the exact curve.
 *
 * No split is made where the end can meet the other stroke at one of that stroke's own ends: snapping
 * sees to that. Each end point is looked at once, however many strokes end there. One search of the
 * box index per end point; O(n log n) for bounded crowding.
 */
export function splitWhereEndsTouch(marks: Marks, drawing: Drawing, pieces: Pieces, snapMm: number): void {
  if (!pieces.index) return;
  const { siteX, siteY, siteOfMark } = gatherSites(marks);
  const endsHere = strokesEndingAt(marks, siteOfMark, siteX.length);
  const reach = snapMm + pieces.chordErrorMm;
  const splits: { stroke: number; segment: number; t: number }[] = [];
  for (let site = 0; site < siteX.length; site++) {
    const x = siteX[site];
    const y = siteY[site];
    const found = pieces.index.search(x - reach, y - reach, x + reach, y + reach).sort((a, b) => a - b);
    for (let i = 0; i < found.length; ) {
      const j = endOfContiguous(found, i, pieces);
      const stroke = pieces.stroke[found[i]];
      const meetsAtEnd =
        reachesStrokeEnd(found[i], found[j - 1], pieces, drawing) &&
        (endsHere[site].includes(stroke) || nearStrokeEnd(drawing, stroke, x, y, snapMm));
      if (!meetsAtEnd) {
        const place = nearestOnPieces(found, i, j, pieces, drawing, x, y, snapMm);
        if (place) splits.push({ stroke, ...place });
      }
      i = j;
    }
  }
  for (const { stroke, segment, t } of splits) addSplit(marks, drawing, stroke, segment, t);
}

/** Strokes that end on each site. */
function strokesEndingAt(marks: Marks, siteOfMark: Int32Array, sites: number): number[][] {
  const lists: number[][] = Array.from({ length: sites }, () => []);
  for (let m = 0; m < marks.count; m++) lists[siteOfMark[m]].push(marks.stroke[m]);
  return lists;
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

/** Whether a group of pieces holds the stroke's first or last piece: then it is the end's own surroundings. */
function reachesStrokeEnd(from: number, to: number, pieces: Pieces, drawing: Drawing): boolean {
  const stroke = pieces.stroke[from];
  const { first } = drawing.strokes;
  const startsHere = pieces.segment[from] === first[stroke] && pieces.t0[from] === 0;
  const endsHere = pieces.segment[to] === first[stroke + 1] - 1 && pieces.t1[to] === 1;
  return startsHere || endsHere;
}

function nearStrokeEnd(drawing: Drawing, stroke: number, x: number, y: number, snapMm: number): boolean {
  const { first, segments } = drawing.strokes;
  const a = segments.offset[first[stroke]];
  const b = segments.offset[first[stroke + 1] - 1] + 2;
  for (const o of [a, b]) {
    const dx = segments.data[o] - x;
    const dy = segments.data[o + 1] - y;
    if (dx * dx + dy * dy <= snapMm * snapMm) return true;
  }
  return false;
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
