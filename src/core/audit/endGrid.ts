import type { Segments } from '../geometry/segments.js';

/** Cells of the grid, in tolerances: wide enough that most look-ups see one cell. */
const CELL = 16;
/** Ends on one spot that are looked at. */
const MOST_ENDS = 32;

/** Segments by the places of their two ends. O(segments). */
export class EndGrid {
  private readonly head: Int32Array;
  private readonly next: Int32Array;
  private readonly cell: number;

  /** @param belongs whether a segment is to be found */
  constructor(
    private readonly segments: Segments,
    private readonly reach: number,
    belongs: (i: number) => boolean,
  ) {
    this.cell = CELL * reach;
    const { count, offset, data: d } = segments;
    let size = 16;
    while (size < 2 * count) size *= 2;
    this.head = new Int32Array(size).fill(-1);
    this.next = new Int32Array(2 * count).fill(-1);
    for (let end = 0; end < 2 * count; end++) {
      if (!belongs(end >> 1)) continue;
      const o = offset[end >> 1] + 2 * (end & 1);
      const bucket = this.bucketOf(Math.floor(d[o] / this.cell), Math.floor(d[o + 1] / this.cell));
      this.next[end] = this.head[bucket];
      this.head[bucket] = end;
    }
  }

  /** Calls `visit(segment, t)` with ends near a place, t 0 or 1, until it returns true. */
  visit(x: number, y: number, visit: (i: number, t: number) => boolean): void {
    const { reach, cell } = this;
    const x1 = Math.floor((x + reach) / cell);
    const y1 = Math.floor((y + reach) / cell);
    let left = MOST_ENDS;
    for (let ix = Math.floor((x - reach) / cell); ix <= x1; ix++) {
      for (let iy = Math.floor((y - reach) / cell); iy <= y1; iy++) {
        for (let end = this.head[this.bucketOf(ix, iy)]; end >= 0; end = this.next[end]) {
          if (!this.isAt(end, x, y)) continue;
          if (visit(end >> 1, end & 1) || --left === 0) return;
        }
      }
    }
  }

  private isAt(end: number, x: number, y: number): boolean {
    const { offset, data: d } = this.segments;
    const o = offset[end >> 1] + 2 * (end & 1);
    const dx = d[o] - x;
    const dy = d[o + 1] - y;
    return dx * dx + dy * dy <= this.reach * this.reach;
  }

  private bucketOf(ix: number, iy: number): number {
    const mixed = Math.imul(ix, 0x9e3779b1) ^ Math.imul(iy, 0x85ebca6b);
    return (mixed ^ (mixed >>> 15)) & (this.head.length - 1);
  }
}
