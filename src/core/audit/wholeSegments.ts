import { pointAt } from '../geometry/evaluate.js';
import { ARC, LINE, type Segments } from '../geometry/segments.js';
import type { Side } from './side.js';

/** Cells of the grid of midpoints, in tolerances: wide enough that most look-ups see one cell. */
const CELL = 16;
/** Places between the ends at which arcs are compared. */
const ARC_SAMPLES = 6;

/**
 * Pairs drawn segments with wanted ones of the same pen that are the same from end to end, in either
 * direction, within `sameMm`; the closest first where several are. Most of a drawing is settled here
 * without being flattened. Returns the largest deviation.
 *
 * Lines and cubics are compared by their control points: no point of one is farther from the point of
 * the other with the same parameter than the farthest pair of control points (convex hull property).
 * Arcs are compared at six places between the ends: the difference of two arcs with nearly the same
 * angles is nearly a + b·cos + c·sin, which three places decide.
 *
 * Segments are hashed by the middle of their ends: O(segments), where few share a middle.
 */
export function pairWholeSegments(wanted: Side, drawn: Side, sameMm: number): number {
  const grid = new MiddleGrid(wanted, sameMm);
  let largest = 0;
  const { lines, spans } = drawn;
  for (let c = 0; c < lines.count; c++) {
    if (lines.dot[c]) continue;
    for (let i = lines.first[c]; i < lines.first[c + 1]; i++) {
      if (spans.firstOfSegment[i] === spans.firstOfSegment[i + 1]) continue;
      const partner = grid.takeClosest(lines.segments, i, lines.pen[c]);
      if (partner < 0) continue;
      pairAll(drawn, i, grid.deviation);
      pairAll(wanted, partner, grid.deviation);
      if (grid.deviation > largest) largest = grid.deviation;
    }
  }
  return largest;
}

function pairAll(side: Side, segment: number, deviation: number): void {
  const { firstOfSegment } = side.spans;
  for (let k = firstOfSegment[segment]; k < firstOfSegment[segment + 1]; k++) side.pairSpan(k, deviation);
}

/** The segments of a side in buckets, by the middle of their ends. */
class MiddleGrid {
  /** How far the segment taken last deviates. */
  deviation = 0;
  private readonly segments: Segments;
  private readonly pen: Uint32Array;
  private readonly head: Int32Array;
  private readonly next: Int32Array;
  private readonly cell: number;
  private best = -1;
  private bestBefore = -1;
  private bestBucket = 0;

  constructor(
    side: Side,
    private readonly sameMm: number,
  ) {
    const { lines, spans } = side;
    this.segments = lines.segments;
    this.cell = CELL * sameMm;
    const { count } = this.segments;
    let size = 16;
    while (size < count) size *= 2;
    this.head = new Int32Array(size).fill(-1);
    this.next = new Int32Array(count).fill(-1);
    this.pen = new Uint32Array(count);
    const { offset, data: d } = this.segments;
    for (let c = 0; c < lines.count; c++) {
      for (let i = lines.first[c]; i < lines.first[c + 1]; i++) {
        this.pen[i] = lines.pen[c];
        if (spans.firstOfSegment[i] === spans.firstOfSegment[i + 1]) continue;
        const o = offset[i];
        const bucket = this.bucketOf(
          Math.floor((d[o] + d[o + 2]) / 2 / this.cell),
          Math.floor((d[o + 1] + d[o + 3]) / 2 / this.cell),
        );
        this.next[i] = this.head[bucket];
        this.head[bucket] = i;
      }
    }
  }

  takeClosest(segments: Segments, i: number, pen: number): number {
    const o = segments.offset[i];
    const d = segments.data;
    const x = (d[o] + d[o + 2]) / 2;
    const y = (d[o + 1] + d[o + 3]) / 2;
    const x0 = Math.floor((x - this.sameMm) / this.cell);
    const x1 = Math.floor((x + this.sameMm) / this.cell);
    const y0 = Math.floor((y - this.sameMm) / this.cell);
    const y1 = Math.floor((y + this.sameMm) / this.cell);
    this.best = -1;
    this.deviation = this.sameMm;
    for (let ix = x0; ix <= x1; ix++) {
      for (let iy = y0; iy <= y1; iy++) this.searchBucket(this.bucketOf(ix, iy), segments, i, pen);
    }
    if (this.best < 0) return -1;
    if (this.bestBefore < 0) this.head[this.bestBucket] = this.next[this.best];
    else this.next[this.bestBefore] = this.next[this.best];
    return this.best;
  }

  private searchBucket(bucket: number, segments: Segments, i: number, pen: number): void {
    let before = -1;
    for (let j = this.head[bucket]; j >= 0; j = this.next[j]) {
      if (this.pen[j] === pen) {
        const deviation = deviationOf(this.segments, j, segments, i, this.deviation);
        if (deviation < this.deviation || (this.best < 0 && deviation === this.deviation)) {
          this.best = j;
          this.bestBefore = before;
          this.bestBucket = bucket;
          this.deviation = deviation;
          if (deviation === 0) return;
        }
      }
      before = j;
    }
  }

  private bucketOf(ix: number, iy: number): number {
    const mixed = Math.imul(ix, 0x9e3779b1) ^ Math.imul(iy, 0x85ebca6b);
    return (mixed ^ (mixed >>> 15)) & (this.head.length - 1);
  }
}

/** The largest distance of two segments taken as they run or reversed; infinite where it exceeds `limit`. */
function deviationOf(a: Segments, i: number, b: Segments, j: number, limit: number): number {
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
