import { segmentBox } from '../geometry/box.js';
import { flattenSegment } from '../geometry/flatten.js';
import { ARC, CUBIC, LINE, type Segments } from '../geometry/segments.js';
import type { LineSet } from './lineSet.js';

/**
 * Segments cut to similar sizes, in order: span k is segment `segment[k]` from `t0[k]` to `t1[k]`, on
 * chain `chain[k]`. Chain c owns spans `firstOfChain[c]` up to `firstOfChain[c + 1]`, segment i owns
 * `firstOfSegment[i]` up to `firstOfSegment[i + 1]`. Dots and segments of no extent own none.
 */
export interface Spans {
  readonly count: number;
  readonly segment: Uint32Array;
  readonly t0: Float64Array;
  readonly t1: Float64Array;
  readonly chain: Uint32Array;
  readonly firstOfChain: Uint32Array;
  readonly firstOfSegment: Uint32Array;
}

/**
 * Cutting long segments adds a quarter more spans at most, or so many per segment and in all: a small
 * drawing of long curves is worth more cuts.
 */
const MORE_SHARE = 1 / 4;
const MORE_EACH = 4;
const MORE_IN_ALL = 200_000;
/** Straight pieces of a curve in one span, about. */
const PIECES = 8;

/**
 * Cuts the segments of all chains so that no box is much longer than the others: a long diagonal box
 * would answer every search. Curves that have no partner yet (`deviation` below 0) will be flattened,
 * and are cut to a few pieces each. O(segments).
 */
export function cutToSpans(lines: LineSet, deviation: Float64Array, flatMm: number): Spans {
  const { segments, first, dot } = lines;
  const parts = partsOfSegments(lines, deviation, flatMm);
  const firstOfSegment = new Uint32Array(segments.count + 1);
  for (let i = 0; i < segments.count; i++) firstOfSegment[i + 1] = firstOfSegment[i] + parts[i];
  const count = firstOfSegment[segments.count];
  const segment = new Uint32Array(count);
  const t0 = new Float64Array(count);
  const t1 = new Float64Array(count);
  const chain = new Uint32Array(count);
  const firstOfChain = new Uint32Array(lines.count + 1);
  let at = 0;
  for (let c = 0; c < lines.count; c++) {
    firstOfChain[c] = at;
    if (dot[c]) continue;
    for (let i = first[c]; i < first[c + 1]; i++) {
      for (let k = 0; k < parts[i]; k++) {
        segment[at] = i;
        chain[at] = c;
        t0[at] = k / parts[i];
        t1[at] = (k + 1) / parts[i];
        at++;
      }
    }
  }
  firstOfChain[lines.count] = at;
  return { count, segment, t0, t1, chain, firstOfChain, firstOfSegment };
}

/** minX, minY, maxX, maxY of each span, never too small. O(spans). */
export function boxesOf({ count, segment, t0, t1 }: Spans, segments: Segments, flatMm: number): Float64Array {
  const boxes = new Float64Array(4 * count);
  const box = new Float64Array(4);
  for (let span = 0; span < count; span++) {
    spanBox(segments, segment[span], t0[span], t1[span], flatMm, box);
    for (let j = 0; j < 4; j++) boxes[4 * span + j] = box[j];
  }
  return boxes;
}

function partsOfSegments(lines: LineSet, deviation: Float64Array, flatMm: number): Uint32Array {
  const { segments, first, dot } = lines;
  const parts = new Uint32Array(segments.count);
  const size = new Float64Array(segments.count);
  let total = 0;
  let counted = 0;
  for (let c = 0; c < lines.count; c++) {
    if (dot[c]) continue;
    for (let i = first[c]; i < first[c + 1]; i++) {
      size[i] = roughLength(segments, i);
      if (size[i] === 0) continue;
      total += size[i];
      counted++;
    }
  }
  const more = Math.max(1, counted * MORE_SHARE, Math.min(counted * MORE_EACH, MORE_IN_ALL));
  const longest = total / more;
  for (let i = 0; i < segments.count; i++) {
    if (size[i] === 0) continue;
    const byLength = isUpright(segments, i) ? 1 : Math.ceil(size[i] / longest);
    const byPieces = deviation[i] < 0 ? Math.ceil(roughPieces(segments, i, flatMm) / PIECES) : 1;
    parts[i] = Math.max(byLength, byPieces);
  }
  return parts;
}

/** Whether a segment is a line along an axis: its box is as narrow as it is, however long. */
function isUpright({ kind, offset, data: d }: Segments, i: number): boolean {
  const o = offset[i];
  return kind[i] === LINE && (d[o] === d[o + 2] || d[o + 1] === d[o + 3]);
}

/** About how many pieces a segment is flattened to. */
function roughPieces(segments: Segments, i: number, flatMm: number): number {
  const d = segments.data;
  const o = segments.offset[i];
  if (segments.kind[i] === LINE) return 1;
  if (segments.kind[i] === ARC) {
    const radius = Math.max(Math.abs(d[o + 6]) + Math.abs(d[o + 8]), Math.abs(d[o + 7]) + Math.abs(d[o + 9]));
    return Math.abs(d[o + 11]) * Math.sqrt(radius / (8 * flatMm)) + 1;
  }
  const bend = Math.max(
    Math.abs(d[o] - 2 * d[o + 4] + d[o + 6]) + Math.abs(d[o + 1] - 2 * d[o + 5] + d[o + 7]),
    Math.abs(d[o + 4] - 2 * d[o + 6] + d[o + 2]) + Math.abs(d[o + 5] - 2 * d[o + 7] + d[o + 3]),
  );
  return Math.sqrt((0.75 * bend) / flatMm) + 1;
}

/** At least the length, and 0 only where the segment is a single point. */
export function roughLength(segments: Segments, i: number): number {
  const d = segments.data;
  const o = segments.offset[i];
  const kind = segments.kind[i];
  if (kind === ARC) {
    const sum = Math.abs(d[o + 6]) + Math.abs(d[o + 7]) + Math.abs(d[o + 8]) + Math.abs(d[o + 9]);
    return Math.abs(d[o + 11]) * sum;
  }
  if (kind !== CUBIC) return between(d, o, o + 2);
  return between(d, o, o + 4) + between(d, o + 4, o + 6) + between(d, o + 6, o + 2);
}

function between(d: Float64Array, a: number, b: number): number {
  const dx = d[b] - d[a];
  const dy = d[b + 1] - d[a + 1];
  return Math.sqrt(dx * dx + dy * dy);
}

function spanBox(s: Segments, i: number, t0: number, t1: number, flatMm: number, box: Float64Array): void {
  if (t0 === 0 && t1 === 1) {
    segmentBox(s, i, box);
    return;
  }
  box.fill(Number.POSITIVE_INFINITY, 0, 2);
  box.fill(Number.NEGATIVE_INFINITY, 2, 4);
  const include = (x: number, y: number): void => {
    box[0] = Math.min(box[0], x);
    box[1] = Math.min(box[1], y);
    box[2] = Math.max(box[2], x);
    box[3] = Math.max(box[3], y);
  };
  flattenSegment(s, i, t1, t0, flatMm, include);
  flattenSegment(s, i, t0, t1, flatMm, include);
  const spare = s.kind[i] === LINE ? 0 : flatMm;
  box[0] -= spare;
  box[1] -= spare;
  box[2] += spare;
  box[3] += spare;
}
