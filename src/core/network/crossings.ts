import type { Drawing } from '../drawing/drawing.js';
import { segmentBox } from '../geometry/box.js';
import { selfIntersections } from '../geometry/cubicLoop.js';
import { chordEnds, pointAt } from '../geometry/evaluate.js';
import { intersectSegments } from '../geometry/intersect.js';
import { CUBIC, LINE } from '../geometry/segments.js';
import { addSplit, type Marks } from './marks.js';
import type { Pieces } from './pieces.js';
import { pointIndex } from './snap.js';
import { isNearOwnEnd, segmentOfPlace } from './strokePlace.js';

/** Lines this near meet: what is left of rounding after transforms. */
const SAME_POINT_MM = 1e-6;
/** Crossings this near are one: three lines through a point, as rounding leaves them. */
const SAME_VERTEX_MM = 1e-5;
/** More crossings than this would take the memory of a browser's worker: a mesh of 2,000 by 2,000 lines. */
export const MOST_CROSSINGS = 4_000_000;

/**
 * Adds a split to `marks` on both lines wherever two lines cross or touch, or one crosses itself: found
 * through the box index on straight pieces, then on the exact curves. Where a stroke's own end is within
 * the snap distance nothing is added: the end splits what it touches. O(n log n + crossings) for bounded
 * crowding.
 *
 * A crossing within the snap distance of another vertex, and not in its place, is left alone.
 *
 * @returns the number of places split where lines cross; above MOST_CROSSINGS none of them is.
 */
export function splitWhereLinesCross(marks: Marks, drawing: Drawing, pieces: Pieces, snapMm: number): number {
  if (!pieces.index) return 0;
  return new CrossingSearch(marks, drawing, pieces, snapMm).run();
}

class CrossingSearch {
  private count = 0;
  private readonly stroke: number[] = [];
  private readonly place: number[] = [];
  private readonly box = new Float64Array(4);

  constructor(
    private readonly marks: Marks,
    private readonly drawing: Drawing,
    private readonly pieces: Pieces,
    private readonly snapMm: number,
  ) {}

  run(): number {
    const { count, segment, stroke } = this.pieces;
    const { segments } = this.drawing.strokes;
    for (let from = 0; from < count && this.count <= MOST_CROSSINGS; ) {
      const start = from;
      const i = segment[start];
      while (from < count && segment[from] === i) from++;
      const own = stroke[start];
      if (segments.kind[i] === CUBIC) {
        selfIntersections(segments, i, (t, s) => this.meet(own, i + t, own, i + s));
      }
      for (const [j, other] of this.beside(start, from)) {
        const meet = (s: number, t: number) => this.meet(own, i + s, other, j + t);
        intersectSegments(segments, i, segments, j, SAME_POINT_MM, meet, (a0, a1, b0, b1) => {
          meet(a0, b0);
          meet(a1, b1);
        });
      }
    }
    if (this.count > MOST_CROSSINGS) return this.count;
    const isClear = this.clearCrossings();
    let kept = 0;
    for (let k = 0; k < this.stroke.length; k++) {
      if (!isClear[k >> 1]) continue;
      kept++;
      const segment = segmentOfPlace(this.drawing, this.stroke[k], this.place[k]);
      addSplit(this.marks, this.drawing, this.stroke[k], segment, this.place[k] - segment);
    }
    return kept / 2;
  }

  /**
   * 1 for each crossing that is to be split. One that stands by another vertex without being in the same
   * place would be snapped to it, and a joint that is there to save travel is not worth a bridge.
   */
  private clearCrossings(): Uint8Array {
    const { marks, snapMm } = this;
    const n = this.stroke.length / 2;
    const isClear = new Uint8Array(n);
    if (n === 0) return isClear;
    const x = new Float64Array(n + marks.count);
    const y = new Float64Array(n + marks.count);
    const at = new Float64Array(2);
    for (let k = 0; k < n; k++) {
      const segment = segmentOfPlace(this.drawing, this.stroke[2 * k], this.place[2 * k]);
      pointAt(this.drawing.strokes.segments, segment, this.place[2 * k] - segment, at);
      x[k] = at[0];
      y[k] = at[1];
    }
    x.set(marks.x, n);
    y.set(marks.y, n);
    const index = pointIndex(x, y);
    const order = Array.from({ length: n }, (_, k) => k).sort((a, b) => x[a] - x[b] || y[a] - y[b]);
    for (const k of order) {
      const near = index.search(x[k] - snapMm, y[k] - snapMm, x[k] + snapMm, y[k] + snapMm);
      const isInTheWay = (m: number): boolean => {
        if (m < n && !isClear[m]) return false;
        const apart = Math.sqrt((x[m] - x[k]) * (x[m] - x[k]) + (y[m] - y[k]) * (y[m] - y[k]));
        return apart > SAME_VERTEX_MM && apart <= snapMm;
      };
      if (!near.some(isInTheWay)) isClear[k] = 1;
    }
    return isClear;
  }

  /** Later segments, with their strokes, whose pieces come near the pieces of one from `start` up to `end`. */
  private beside(start: number, end: number): Map<number, number> {
    const { segment, stroke, t0, t1, index, chordErrorMm } = this.pieces;
    const { segments } = this.drawing.strokes;
    const i = segment[start];
    const found = new Map<number, number>();
    const isNew = (q: number) => segment[q] > i && !found.has(segment[q]);
    for (let p = start; p < end; p++) {
      if (segments.kind[i] === LINE && end - start === 1) segmentBox(segments, i, this.box);
      else this.boxOf(i, t0[p], t1[p]);
      const reach = chordErrorMm * (segments.kind[i] === LINE ? 1 : 2) + SAME_POINT_MM;
      const [minX, minY, maxX, maxY] = this.box;
      for (const q of index?.search(minX - reach, minY - reach, maxX + reach, maxY + reach, isNew) ?? []) {
        found.set(segment[q], stroke[q]);
      }
    }
    return found;
  }

  private boxOf(i: number, t0: number, t1: number): void {
    const { box } = this;
    chordEnds(this.drawing.strokes.segments, i, t0, t1, box);
    const [x0, y0, x1, y1] = box;
    box[0] = Math.min(x0, x1);
    box[1] = Math.min(y0, y1);
    box[2] = Math.max(x0, x1);
    box[3] = Math.max(y0, y1);
  }

  /** Two places meet: u on one stroke, w on the other, each a segment plus a parameter. */
  private meet(own: number, u: number, other: number, w: number): void {
    if (own === other && this.isJoint(own, u, w)) return;
    this.count++;
    if (this.count > MOST_CROSSINGS || this.isNearEnd(own, u) || this.isNearEnd(other, w)) return;
    this.stroke.push(own, other);
    this.place.push(u, w);
  }

  /** Both places are the same joint of the stroke, or its two ends, which meet. */
  private isJoint(stroke: number, u: number, w: number): boolean {
    const { first } = this.drawing.strokes;
    return u === w || (u === first[stroke] && w === first[stroke + 1]);
  }

  private isNearEnd(stroke: number, u: number): boolean {
    return isNearOwnEnd(this.drawing, stroke, u, this.snapMm);
  }
}
