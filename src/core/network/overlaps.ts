import type { Drawing } from '../drawing/drawing.js';
import { pointAt } from '../geometry/evaluate.js';
import { flattenSegment } from '../geometry/flatten.js';
import { segmentLength } from '../geometry/length.js';
import { nearestOnSegment } from '../geometry/nearest.js';
import { LINE } from '../geometry/segments.js';
import { alongside } from './alongside.js';
import { addSplit, type Marks } from './marks.js';
import type { Pieces } from './pieces.js';
import { walkSpan } from './walkSpan.js';

/** Lines that run together for less than this many tolerances merely cross or touch. */
const LEAST_STRETCH = 25;
/** How far back from the end of a stretch a joint is taken for the place where the lines part, in tolerances. */
const PARTING = 50;
/** Parameters that differ by less are one: rounding where a stretch goes on over a joint. */
const SEAM = 1e-9;

/**
 * Adds splits to `marks` where two lines begin or cease to run on each other, on both of them, so that
 * what they have in common becomes spans between the same vertices: a board's outline drawn over a longer
 * line, a border of many points over the same border cut elsewhere. Ends of strokes are left to
 * `splitWhereEndsTouch`, which splits the other line there.
 *
 * Lines run on each other where they are at most half of `toleranceMm` apart, so that the spans, compared
 * later with all of it, cannot fail by a rounding. The search goes through the box index piece by piece; only
 * segments with chords that lie along each other are looked at closely. O(n log n) for bounded crowding.
 */
export function splitWhereLinesOverlap(
  marks: Marks,
  drawing: Drawing,
  pieces: Pieces,
  toleranceMm: number,
  snapMm: number,
): void {
  if (!pieces.index || pieces.count < 2) return;
  const search = new OverlapSearch(drawing, pieces, toleranceMm, snapMm);
  for (const { stroke, segment, t } of search.run()) addSplit(marks, drawing, stroke, segment, t);
}

/** Where a line runs on another: from u0 to u1 (segment plus parameter), beside segments j0 and j1 there. */
interface Stretch {
  readonly u0: number;
  readonly u1: number;
  readonly j0: number;
  readonly j1: number;
}

/** A segment as a polyline: parameter, x, y of each point. */
type Chords = readonly number[];

class OverlapSearch {
  private readonly reachMm: number;
  private readonly leastMm: number;
  private readonly chords = new Map<number, Chords>();
  private readonly share = new Float64Array(2);
  private readonly at = new Float64Array(2);
  private readonly splits: { stroke: number; segment: number; t: number }[] = [];

  constructor(
    private readonly drawing: Drawing,
    private readonly pieces: Pieces,
    toleranceMm: number,
    private readonly snapMm: number,
  ) {
    this.reachMm = toleranceMm / 2;
    this.leastMm = Math.max(LEAST_STRETCH * toleranceMm, 4 * snapMm);
  }

  run(): OverlapSearch['splits'] {
    const { stroke, segment, count } = this.pieces;
    for (let from = 0; from < count; ) {
      const own = stroke[from];
      const stretches = new Map<number, Stretch[]>();
      while (from < count && stroke[from] === own) {
        const start = from;
        while (from < count && segment[from] === segment[start]) from++;
        this.gather(start, from, stretches);
      }
      for (const [other, list] of stretches) this.split(own, other, list);
      this.chords.clear();
    }
    return this.splits;
  }

  /** Finds the later segments that run along one segment, the pieces from `start` up to `end`. */
  private gather(start: number, end: number, stretches: Map<number, Stretch[]>): void {
    const { segment, stroke } = this.pieces;
    const i = segment[start];
    /** Each later segment beside this one, and its stroke. */
    const beside = new Map<number, number>();
    for (let p = start; p < end; p++) {
      const [x0, y0, x1, y1] = this.endsOf(p);
      const curved = this.chordErrorOf(p);
      const reach = this.reachMm + curved + this.pieces.chordErrorMm;
      const isOther = (q: number) =>
        segment[q] > i && !beside.has(segment[q]) && !this.isNext(i, segment[q], stroke[q]);
      const found =
        this.pieces.index?.search(
          Math.min(x0, x1) - reach,
          Math.min(y0, y1) - reach,
          Math.max(x0, x1) + reach,
          Math.max(y0, y1) + reach,
          isOther,
        ) ?? [];
      for (const q of found) {
        const [px, py, qx, qy] = this.endsOf(q);
        const within = this.reachMm + curved + this.chordErrorOf(q);
        if (!alongside(x0, y0, x1, y1, px, py, qx, qy, within, this.share)) continue;
        const size = distance(x0, y0, x1, y1);
        const lengthMm = (this.share[1] - this.share[0]) * size;
        if (lengthMm >= Math.min(this.leastMm, 0.9 * size, 0.9 * distance(px, py, qx, qy))) {
          beside.set(segment[q], stroke[q]);
        }
      }
    }
    for (const [j, other] of [...beside].sort((a, b) => a[0] - b[0])) {
      const found = this.stretchesOn(i, j);
      const list = stretches.get(other);
      if (list) for (const stretch of found) list.push(stretch);
      else if (found.length > 0) stretches.set(other, found);
    }
  }

  /** Whether segment j follows i on its stroke, or closes it: they always meet. */
  private isNext(i: number, j: number, stroke: number): boolean {
    const { first, closed } = this.drawing.strokes;
    const from = first[stroke];
    return i >= from && (j === i + 1 || (closed[stroke] === 1 && i === from && j === first[stroke + 1] - 1));
  }

  private stretchesOn(i: number, j: number): Stretch[] {
    const own = this.chordsOf(i);
    const other = this.chordsOf(j);
    const found: Stretch[] = [];
    for (let a = 3; a < own.length; a += 3) {
      for (let b = 3; b < other.length; b += 3) {
        const is = alongside(
          own[a - 2],
          own[a - 1],
          own[a + 1],
          own[a + 2],
          other[b - 2],
          other[b - 1],
          other[b + 1],
          other[b + 2],
          this.reachMm,
          this.share,
        );
        if (!is) continue;
        const t0 = own[a - 3];
        const run = own[a] - t0;
        found.push({ u0: i + t0 + this.share[0] * run, u1: i + t0 + this.share[1] * run, j0: j, j1: j });
      }
    }
    return found;
  }

  private chordsOf(i: number): Chords {
    let chords = this.chords.get(i);
    if (!chords) {
      const { segments } = this.drawing.strokes;
      pointAt(segments, i, 0, this.at);
      const points = [0, this.at[0], this.at[1]];
      flattenSegment(segments, i, 0, 1, this.reachMm / 4, (x, y, t) => points.push(t, x, y));
      chords = points;
      this.chords.set(i, chords);
    }
    return chords;
  }

  /** Splits both strokes at the ends of what they have in common. */
  private split(own: number, other: number, list: Stretch[]): void {
    list.sort((a, b) => a.u0 - b.u0 || a.u1 - b.u1);
    for (let k = 0; k < list.length; ) {
      const { u0, j0 } = list[k];
      let { u1, j1 } = list[k];
      for (k++; k < list.length && list[k].u0 <= u1 + SEAM; k++) {
        if (list[k].u1 >= u1) ({ u1, j1 } = list[k]);
      }
      if (this.lengthBetween(u0, u1) < this.leastMm) continue;
      this.part(own, other, u0, j0, Math.ceil(u0), u1);
      this.part(own, other, u1, j1, Math.floor(u1), u0);
    }
  }

  /**
   * The lines part at `u`; `joint` is the joint of the own line next to it inside the stretch, which ends
   * at `far`. Where that joint is near it is the corner at which they part, `u` only where they are too far apart.
   */
  private part(own: number, other: number, u: number, j: number, joint: number, far: number): void {
    const { segments, first } = this.drawing.strokes;
    const isInside = Math.min(u, far) < joint && joint < Math.max(u, far);
    const backMm = isInside
      ? this.lengthBetween(Math.min(u, joint), Math.max(u, joint))
      : Number.POSITIVE_INFINITY;
    const place = backMm <= PARTING * 2 * this.reachMm ? joint : u;
    const segment = Math.min(Math.floor(place), first[own + 1] - 1);
    const t = place - segment;
    pointAt(segments, segment, t, this.at);
    const [x, y] = this.at;
    let there = j;
    let near = nearestOnSegment(segments, j, x, y, 0, 1);
    // Going back to a joint may lead to the segment before or after it.
    for (const next of [j - 1, j + 1]) {
      if (next < first[other] || next >= first[other + 1]) continue;
      const beside = nearestOnSegment(segments, next, x, y, 0, 1);
      if (beside.distance < near.distance) {
        near = beside;
        there = next;
      }
    }
    if (near.distance > 2 * this.reachMm) return;
    if (!this.isNearEnd(own, x, y)) this.splits.push({ stroke: own, segment, t });
    pointAt(segments, there, near.t, this.at);
    if (!this.isNearEnd(other, this.at[0], this.at[1])) {
      this.splits.push({ stroke: other, segment: there, t: near.t });
    }
  }

  /** An end of the stroke is that near: it is a mark already, and splits what it touches. */
  private isNearEnd(stroke: number, x: number, y: number): boolean {
    const { segments, first } = this.drawing.strokes;
    const a = segments.offset[first[stroke]];
    const b = segments.offset[first[stroke + 1] - 1] + 2;
    return (
      distance(x, y, segments.data[a], segments.data[a + 1]) <= this.snapMm ||
      distance(x, y, segments.data[b], segments.data[b + 1]) <= this.snapMm
    );
  }

  private lengthBetween(u0: number, u1: number): number {
    const { segments } = this.drawing.strokes;
    let lengthMm = 0;
    const last = Math.ceil(u1) - 1;
    walkSpan(Math.floor(u0), u0 - Math.floor(u0), last, u1 - last, (i, t0, t1) => {
      lengthMm += segmentLength(segments, i, t0, t1);
    });
    return lengthMm;
  }

  private endsOf(p: number): [number, number, number, number] {
    const { segment, t0, t1 } = this.pieces;
    const { segments } = this.drawing.strokes;
    pointAt(segments, segment[p], t0[p], this.at);
    const [x, y] = this.at;
    pointAt(segments, segment[p], t1[p], this.at);
    return [x, y, this.at[0], this.at[1]];
  }

  private chordErrorOf(p: number): number {
    return this.drawing.strokes.segments.kind[this.pieces.segment[p]] === LINE ? 0 : this.pieces.chordErrorMm;
  }
}

function distance(ax: number, ay: number, bx: number, by: number): number {
  return Math.sqrt((bx - ax) * (bx - ax) + (by - ay) * (by - ay));
}
