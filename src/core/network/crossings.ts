import type { Drawing } from '../drawing/drawing.js';
import { segmentBox } from '../geometry/box.js';
import { selfIntersections } from '../geometry/cubicLoop.js';
import { chordEnds } from '../geometry/evaluate.js';
import { intersectSegments } from '../geometry/intersect.js';
import { CUBIC, LINE } from '../geometry/segments.js';
import { addSplit, type Marks } from './marks.js';
import type { Pieces } from './pieces.js';
import { isNearOwnEnd, segmentOfPlace } from './strokePlace.js';

/** Lines this near meet: what is left of rounding after transforms. */
const SAME_POINT_MM = 1e-6;
/** More crossings than this would take the memory of a browser's worker: a mesh of 2,000 by 2,000 lines. */
export const MOST_CROSSINGS = 4_000_000;

/**
 * Adds a split to `marks` on both lines wherever two lines cross or touch, or one crosses itself: found
 * through the box index on straight pieces, then on the exact curves. Where a stroke's own end is within
 * the snap distance nothing is added: the end splits what it touches. O(n log n + crossings) for bounded
 * crowding.
 *
 * @returns the number of places where lines cross; above MOST_CROSSINGS none of them is split.
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
    for (let k = 0; k < this.stroke.length; k++) {
      const segment = segmentOfPlace(this.drawing, this.stroke[k], this.place[k]);
      addSplit(this.marks, this.drawing, this.stroke[k], segment, this.place[k] - segment);
    }
    return this.count;
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
