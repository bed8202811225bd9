import { LINE, type Segments } from '../geometry/segments.js';
import type { LineSet } from './lineSet.js';
import { deviationOf } from './sameSegment.js';

/** Cells of the grid of midpoints, in tolerances: wide enough that most look-ups see one cell. */
const CELL = 16;

/** How far each segment deviates from its partner on the other side; −1 where it has none. */
export interface WholePairs {
  readonly wanted: Float64Array;
  readonly drawn: Float64Array;
}

/**
 * Pairs drawn segments with wanted ones of the same pen that are the same from end to end, in either
 * direction, within `sameMm`; the closest first where several are. Most of a drawing is settled here
 * without being flattened. Dots and lines of no length are left to others.
 *
 * Segments are hashed by the middle of their ends: O(segments), where few share a middle.
 */
export function pairWholeSegments(wanted: LineSet, drawn: LineSet, sameMm: number): WholePairs {
  const grid = new MiddleGrid(wanted, sameMm);
  const pairs: WholePairs = {
    wanted: new Float64Array(wanted.segments.count).fill(-1),
    drawn: new Float64Array(drawn.segments.count).fill(-1),
  };
  for (let c = 0; c < drawn.count; c++) {
    if (drawn.dot[c]) continue;
    for (let i = drawn.first[c]; i < drawn.first[c + 1]; i++) {
      if (isPoint(drawn.segments, i)) continue;
      const partner = grid.takeClosest(drawn.segments, i, drawn.pen[c]);
      if (partner < 0) continue;
      pairs.wanted[partner] = grid.deviation;
      pairs.drawn[i] = grid.deviation;
    }
  }
  return pairs;
}

/**
 * The unpaired wanted segments that are the same as a paired one of their pen from end to end within
 * `sameMm`: their deviations from it, −1 for all others. O(segments), where few share a middle.
 */
export function twinsOfPaired(lines: LineSet, paired: Uint8Array, sameMm: number): Float64Array {
  const twins = new Float64Array(paired.length).fill(-1);
  const grid = new MiddleGrid(lines, sameMm, (i) => paired[i] === 0);
  for (let c = 0; c < lines.count; c++) {
    if (lines.dot[c]) continue;
    for (let i = lines.first[c]; i < lines.first[c + 1]; i++) {
      if (paired[i] === 0 || isPoint(lines.segments, i)) continue;
      for (;;) {
        const twin = grid.takeClosest(lines.segments, i, lines.pen[c]);
        if (twin < 0) break;
        twins[twin] = grid.deviation;
      }
    }
  }
  return twins;
}

function isPoint({ kind, offset, data: d }: Segments, i: number): boolean {
  const o = offset[i];
  return kind[i] === LINE && d[o] === d[o + 2] && d[o + 1] === d[o + 3];
}

/** The segments of a line set in buckets, by the middle of their ends. */
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
    lines: LineSet,
    private readonly sameMm: number,
    belongs: (i: number) => boolean = () => true,
  ) {
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
      if (lines.dot[c]) continue;
      for (let i = lines.first[c]; i < lines.first[c + 1]; i++) {
        this.pen[i] = lines.pen[c];
        if (!belongs(i) || isPoint(this.segments, i)) continue;
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
