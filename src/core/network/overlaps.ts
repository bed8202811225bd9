import type { Drawing } from '../drawing/drawing.js';
import { chordEnds, pointAt } from '../geometry/evaluate.js';
import { flattenSegment } from '../geometry/flatten.js';
import { segmentLength } from '../geometry/length.js';
import { nearestOnSegment } from '../geometry/nearest.js';
import { LINE } from '../geometry/segments.js';
import { alongside } from './alongside.js';
import { addSplit, type Marks } from './marks.js';
import type { Pieces } from './pieces.js';
import { distance, isNearOwnEnd, segmentOfPlace } from './strokePlace.js';
import { walkSpan } from './walkSpan.js';

/** Lines that run together for less than this many tolerances merely cross or touch. */
const LEAST_STRETCH = 25;
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

/** Where a line runs on another, from u0 to u1: segment plus parameter. */
interface Stretch {
  readonly u0: number;
  readonly u1: number;
}

/** A joint or end of either line that lies on the other: u on the own line, w on the other. */
interface Corner {
  readonly u: number;
  readonly w: number;
}

interface Together {
  readonly stretches: Stretch[];
  readonly corners: Corner[];
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
      const together = new Map<number, Together>();
      while (from < count && stroke[from] === own) {
        const start = from;
        while (from < count && segment[from] === segment[start]) from++;
        this.gather(start, from, together);
      }
      for (const [other, found] of together) this.split(own, other, found);
      this.chords.clear();
    }
    return this.splits;
  }

  /** Finds the later segments that run along one segment, the pieces from `start` up to `end`. */
  private gather(start: number, end: number, together: Map<number, Together>): void {
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
      let found = together.get(other);
      if (!found) {
        found = { stretches: [], corners: [] };
        together.set(other, found);
      }
      this.addStretches(i, j, found.stretches);
      this.addCorners(i, j, found.corners);
    }
  }

  /** Whether segment j follows i on its stroke, or closes it: they always meet. */
  private isNext(i: number, j: number, stroke: number): boolean {
    const { first, closed } = this.drawing.strokes;
    const from = first[stroke];
    return i >= from && (j === i + 1 || (closed[stroke] === 1 && i === from && j === first[stroke + 1] - 1));
  }

  private addStretches(i: number, j: number, stretches: Stretch[]): void {
    const own = this.chordsOf(i);
    const other = this.chordsOf(j);
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
        stretches.push({ u0: i + t0 + this.share[0] * run, u1: i + t0 + this.share[1] * run });
      }
    }
  }

  private addCorners(i: number, j: number, corners: Corner[]): void {
    for (const t of [0, 1]) {
      const w = this.placeOn(j, i, t);
      if (w !== null) corners.push({ u: i + t, w });
      const u = this.placeOn(i, j, t);
      if (u !== null) corners.push({ u, w: j + t });
    }
  }

  /** Where segment i passes within reach of the point at t on segment `from`; null where it does not. */
  private placeOn(i: number, from: number, t: number): number | null {
    const { segments } = this.drawing.strokes;
    pointAt(segments, from, t, this.at);
    const near = nearestOnSegment(segments, i, this.at[0], this.at[1], 0, 1);
    return near.distance <= this.reachMm ? i + near.t : null;
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

  /**
   * Splits both strokes at the first and the last corner of each stretch. Where lines part with no corner
   * they cross at a small angle, or touch: what they share there is not worth a joint.
   */
  private split(own: number, other: number, { stretches, corners }: Together): void {
    stretches.sort((a, b) => a.u0 - b.u0 || a.u1 - b.u1);
    corners.sort((a, b) => a.u - b.u || a.w - b.w);
    let c = 0;
    for (let k = 0; k < stretches.length; ) {
      const { u0 } = stretches[k];
      let { u1 } = stretches[k];
      for (k++; k < stretches.length && stretches[k].u0 <= u1 + SEAM; k++) u1 = Math.max(u1, stretches[k].u1);
      while (c < corners.length && corners[c].u < u0 - SEAM) c++;
      const from = corners[c];
      while (c < corners.length && corners[c].u <= u1 + SEAM) c++;
      const to = corners[c - 1];
      if (!from || !to || from.u > u1 || this.lengthBetween(from.u, to.u) < this.leastMm) continue;
      for (const { u, w } of [from, to]) {
        this.splitAt(own, u);
        this.splitAt(other, w);
      }
    }
  }

  /** Near an end of the stroke nothing is split: the end is a mark already, and splits what it touches. */
  private splitAt(stroke: number, u: number): void {
    if (isNearOwnEnd(this.drawing, stroke, u, this.snapMm)) return;
    const segment = segmentOfPlace(this.drawing, stroke, u);
    this.splits.push({ stroke, segment, t: u - segment });
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

  private endsOf(p: number): Float64Array {
    const { segment, t0, t1 } = this.pieces;
    const ends = new Float64Array(4);
    chordEnds(this.drawing.strokes.segments, segment[p], t0[p], t1[p], ends);
    return ends;
  }

  private chordErrorOf(p: number): number {
    return this.drawing.strokes.segments.kind[this.pieces.segment[p]] === LINE ? 0 : this.pieces.chordErrorMm;
  }
}
