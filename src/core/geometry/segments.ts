/**
 * Exact curve geometry as columns: lines, cubic Béziers and elliptical arcs.
 *
 * Every segment has its start and end stored as given, so that joints are equal bit for bit:
 * trigonometry never decides whether two curves meet.
 *
 * Layout of `data` from `offset[i]`, in the unit of the caller (mm once a drawing is read):
 *
 * - every kind: `x0 y0 x1 y1` (start, end)
 * - CUBIC adds `ax ay bx by` (the two control points)
 * - ARC adds `cx cy ux uy vx vy theta0 sweep`:
 *   P(θ) = c + u·cos θ + v·sin θ with θ = theta0 + t·sweep, t in [0, 1], angles in radians.
 *   u and v are conjugate half-diameters, so an affine map of the arc is the map of c, u and v.
 */
export interface Segments {
  readonly count: number;
  readonly kind: Uint8Array;
  readonly offset: Uint32Array;
  readonly data: Float64Array;
}

export const LINE = 0;
export const CUBIC = 1;
export const ARC = 2;

/** Numbers that each kind takes in `data`, indexed by kind. */
export const SEGMENT_SIZE: readonly number[] = [4, 8, 12];

/**
 * A range of segments per item: item i owns segments `first[i]` up to, not including, `first[i + 1]`.
 * Consecutive segments of an item join exactly.
 */
export interface Chains {
  readonly segments: Segments;
  readonly count: number;
  readonly first: Uint32Array;
}

/** Doubles in a chunk once the first ones are full. */
const CHUNK = 1 << 17;

/** Columns that are full, in order, each as long as what is used of it. */
interface Chunk {
  readonly kind: Uint8Array;
  readonly offset: Uint32Array;
  readonly data: Float64Array;
}

/**
 * Collects segments one by one. Small columns grow by doubling, large ones in chunks, so n segments cost
 * O(n) and are moved once.
 */
export class SegmentBuilder {
  count = 0;
  private used = 0;
  private readonly full: Chunk[] = [];
  /** Segments and doubles in the full chunks. */
  private fullCount = 0;
  private fullUsed = 0;
  private kind = new Uint8Array(64);
  private offset = new Uint32Array(64);
  private data = new Float64Array(512);

  line(x0: number, y0: number, x1: number, y1: number): void {
    const o = this.begin(LINE, x0, y0, x1, y1);
    this.used = o + 4;
  }

  cubic(
    x0: number,
    y0: number,
    ax: number,
    ay: number,
    bx: number,
    by: number,
    x1: number,
    y1: number,
  ): void {
    const o = this.begin(CUBIC, x0, y0, x1, y1);
    const d = this.data;
    d[o + 4] = ax;
    d[o + 5] = ay;
    d[o + 6] = bx;
    d[o + 7] = by;
    this.used = o + 8;
  }

  arc(
    x0: number,
    y0: number,
    x1: number,
    y1: number,
    cx: number,
    cy: number,
    ux: number,
    uy: number,
    vx: number,
    vy: number,
    theta0: number,
    sweep: number,
  ): void {
    const o = this.begin(ARC, x0, y0, x1, y1);
    const d = this.data;
    d[o + 4] = cx;
    d[o + 5] = cy;
    d[o + 6] = ux;
    d[o + 7] = uy;
    d[o + 8] = vx;
    d[o + 9] = vy;
    d[o + 10] = theta0;
    d[o + 11] = sweep;
    this.used = o + 12;
  }

  /** Appends segments `from` up to, not including, `to` as they are. O(segments). */
  append({ count, kind, offset, data }: Segments, from = 0, to = count): void {
    for (let i = from; i < to; i++) {
      const at = offset[i];
      const size = SEGMENT_SIZE[kind[i]];
      const o = this.begin(kind[i], data[at], data[at + 1], data[at + 2], data[at + 3]);
      const d = this.data;
      for (let k = 4; k < size; k++) d[o + k] = data[at + k];
      this.used = o + size;
    }
  }

  /** The columns so far, copied to their exact size; the builder may go on. */
  finish(): Segments {
    const { count, full } = this;
    const last = this.lastChunk();
    if (full.length === 0) {
      return { count, kind: last.kind.slice(), offset: last.offset.slice(), data: last.data.slice() };
    }
    const kind = new Uint8Array(count);
    const offset = new Uint32Array(count);
    const data = new Float64Array(this.fullUsed + this.used);
    let i = 0;
    let o = 0;
    for (const chunk of [...full, last]) {
      kind.set(chunk.kind, i);
      offset.set(chunk.offset, i);
      data.set(chunk.data, o);
      i += chunk.kind.length;
      o += chunk.data.length;
    }
    return { count, kind, offset, data };
  }

  /** Makes room for a segment and writes its ends; returns where in `data` its numbers stand. */
  private begin(kind: number, x0: number, y0: number, x1: number, y1: number): number {
    if (this.used + 12 > this.data.length) this.growData();
    const i = this.count++ - this.fullCount;
    if (i === this.kind.length) {
      this.kind = grown(this.kind, new Uint8Array(2 * i));
      this.offset = grown(this.offset, new Uint32Array(2 * i));
    }
    const o = this.used;
    this.kind[i] = kind;
    this.offset[i] = this.fullUsed + o;
    const d = this.data;
    d[o] = x0;
    d[o + 1] = y0;
    d[o + 2] = x1;
    d[o + 3] = y1;
    return o;
  }

  private growData(): void {
    if (this.data.length < CHUNK) {
      this.data = grown(this.data, new Float64Array(2 * this.data.length));
      return;
    }
    const { kind, offset, data } = this.lastChunk();
    // Short columns are copied, since what they have room for would stay with them.
    this.full.push({ kind: kind.slice(), offset: offset.slice(), data });
    this.fullCount = this.count;
    this.fullUsed += this.used;
    this.used = 0;
    this.data = new Float64Array(CHUNK);
  }

  private lastChunk(): Chunk {
    const count = this.count - this.fullCount;
    return {
      kind: this.kind.subarray(0, count),
      offset: this.offset.subarray(0, count),
      data: this.data.subarray(0, this.used),
    };
  }
}

function grown<T extends Uint8Array | Uint32Array | Float64Array>(from: T, to: T): T {
  to.set(from);
  return to;
}
