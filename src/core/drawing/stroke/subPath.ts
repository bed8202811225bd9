import { type Affine, applyX, applyY } from '../../geometry/affine.js';
import type { ArcCentre } from '../../geometry/arc.js';
import { ARC, CUBIC, LINE, SEGMENT_SIZE, type Segments } from '../../geometry/segments.js';
import { Unreadable } from '../findingLog.js';
import { DEFAULT_LIMITS } from '../readingLimits.js';
import { orTooLarge } from '../tooLarge.js';

/** Below this the columns grow fourfold: what is not touched costs nothing. */
const LARGE = 1 << 21;

/** What is thrown where a drawing has more segments than the limit. */
export function pastSegments(value: number): Unreadable {
  return new Unreadable('past-limit', null, { limit: 'segments', value });
}

/** Coordinates beyond this (1000 km) are taken for an overflow: nothing after reading could use them. */
const FURTHEST_MM = 1e9;

/**
 * The sub-path being drawn, its points mapped to page mm, in buffers that are kept and cleared.
 * Segments of zero length are left out, and noted: they may make a dot.
 */
export class SubPath {
  count = 0;
  started = false;
  closed = false;
  /** Something was drawn, if only a segment of zero length. */
  drew = false;
  startX = 0;
  startY = 0;
  private map: Affine = [1, 0, 0, 1, 0, 0];
  private x = 0;
  private y = 0;
  private used = 0;
  private kind = new Uint8Array(256);
  private offset = new Uint32Array(256);
  private data = new Float64Array(2048);

  /** Throws Unreadable past `limit` segments. */
  constructor(private readonly limit: number = DEFAULT_LIMITS.segments) {}

  setMap(map: Affine): void {
    this.map = map;
  }

  clear(): void {
    this.count = 0;
    this.used = 0;
    this.started = false;
    this.closed = false;
    this.drew = false;
  }

  begin(x: number, y: number): void {
    this.clear();
    this.started = true;
    this.x = this.startX = applyX(this.map, x, y);
    this.y = this.startY = applyY(this.map, x, y);
  }

  lineTo(x: number, y: number): void {
    this.mappedLineTo(applyX(this.map, x, y), applyY(this.map, x, y));
  }

  cubicTo(ax: number, ay: number, bx: number, by: number, x: number, y: number): void {
    const m = this.map;
    const px = applyX(m, ax, ay);
    const py = applyY(m, ax, ay);
    const qx = applyX(m, bx, by);
    const qy = applyY(m, bx, by);
    const x1 = applyX(m, x, y);
    const y1 = applyY(m, x, y);
    this.drew = true;
    const { x: x0, y: y0 } = this;
    if (same(x0, y0, x1, y1) && same(x0, y0, px, py) && same(x0, y0, qx, qy)) return;
    const o = this.push(CUBIC, x1, y1);
    this.data[o + 4] = px;
    this.data[o + 5] = py;
    this.data[o + 6] = qx;
    this.data[o + 7] = qy;
  }

  /** The image of an elliptical arc: an affine map acts on its centre and conjugate half-diameters. */
  arcTo(arc: ArcCentre, x: number, y: number): void {
    const m = this.map;
    this.drew = true;
    const x1 = applyX(m, x, y);
    const y1 = applyY(m, x, y);
    if (same(this.x, this.y, x1, y1) && Math.abs(arc.sweep) < Math.PI) return;
    const o = this.push(ARC, x1, y1);
    const d = this.data;
    d[o + 4] = applyX(m, arc.cx, arc.cy);
    d[o + 5] = applyY(m, arc.cx, arc.cy);
    d[o + 6] = m[0] * arc.ux + m[2] * arc.uy;
    d[o + 7] = m[1] * arc.ux + m[3] * arc.uy;
    d[o + 8] = m[0] * arc.vx + m[2] * arc.vy;
    d[o + 9] = m[1] * arc.vx + m[3] * arc.vy;
    d[o + 10] = arc.theta0;
    d[o + 11] = arc.sweep;
  }

  /**
   * Ends at the start: by a line, or by moving the last end there where it missed by rounding only
   * (`onlyRounding`), since a line of 1e-16 mm would be none.
   */
  close(onlyRounding: boolean): void {
    this.closed = true;
    this.drew = true;
    const { startX, startY, data } = this;
    if (same(this.x, this.y, startX, startY)) return;
    if (!onlyRounding || this.count === 0) {
      this.mappedLineTo(startX, startY);
      return;
    }
    const o = this.offset[this.count - 1];
    if (this.kind[this.count - 1] === LINE && same(data[o], data[o + 1], startX, startY)) {
      this.count--;
      this.used = o;
    } else {
      data[o + 2] = startX;
      data[o + 3] = startY;
    }
    this.x = startX;
    this.y = startY;
  }

  /** The segments in place, until the next change. */
  view(): Segments {
    return { count: this.count, kind: this.kind, offset: this.offset, data: this.data };
  }

  private mappedLineTo(x: number, y: number): void {
    this.drew = true;
    if (!same(this.x, this.y, x, y)) this.push(LINE, x, y);
  }

  private push(kind: number, x: number, y: number): number {
    const i = this.count++;
    const o = this.used;
    if (i === this.kind.length) this.growSegments(i);
    if (o + 12 > this.data.length) this.growData(this.data.length);
    this.kind[i] = kind;
    this.offset[i] = o;
    this.data[o] = this.x;
    this.data[o + 1] = this.y;
    this.data[o + 2] = this.x = x;
    this.data[o + 3] = this.y = y;
    this.used = o + SEGMENT_SIZE[kind];
    return o;
  }

  private growSegments(count: number): void {
    if (count >= this.limit) throw pastSegments(this.limit);
    const length = Math.min(count * (count < LARGE ? 4 : 2), this.limit);
    this.kind = grown(this.kind, new Uint8Array(length));
    this.offset = grown(this.offset, new Uint32Array(length));
  }

  private growData(length: number): void {
    const data = orTooLarge(() => new Float64Array(length * (length < 4 * LARGE ? 4 : 2)));
    this.data = grown(this.data, data);
  }
}

/** Every number is finite, every point on this side of the limit. */
export function isDrawable({ count, kind, offset, data }: Segments, startX: number, startY: number): boolean {
  if (!(Math.abs(startX) <= FURTHEST_MM && Math.abs(startY) <= FURTHEST_MM)) return false;
  for (let i = 0; i < count; i++) {
    const o = offset[i];
    const isArc = kind[i] === ARC;
    const points = o + (isArc ? 4 : SEGMENT_SIZE[kind[i]]);
    for (let k = o; k < points; k++) if (!(Math.abs(data[k]) <= FURTHEST_MM)) return false;
    if (isArc) for (let k = points; k < o + 12; k++) if (!Number.isFinite(data[k])) return false;
  }
  return true;
}

function same(x0: number, y0: number, x1: number, y1: number): boolean {
  return x0 === x1 && y0 === y1;
}

function grown<T extends Uint8Array | Uint32Array | Float64Array>(from: T, to: T): T {
  to.set(from);
  return to;
}
