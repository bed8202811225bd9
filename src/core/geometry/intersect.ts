import { segmentBox } from './box.js';
import { curveMeetings, type Range } from './curveMeetings.js';
import { nearestOnSegment } from './nearest.js';
import { isShort, type Overlap, overlapsOf } from './overlaps.js';
import { LINE, type Segments } from './segments.js';

/**
 * The meetings of segment i of a and segment j of b, each a pair of parameters, in the order of the
 * first: crossings, ends on the other's line, contacts without crossing. Where the two run along one
 * another (parts of the same line, ellipse or cubic, in either direction) they meet in an overlap
 * instead, given by `overlap` with the parameters of both at its two ends.
 *
 * Ends within `toleranceMm` of the other segment count as meeting it, as do curves that pass that near
 * without crossing; an end is given as exactly 0 or 1. Elsewhere the two points agree within rounding
 * (some 1e-14 of the largest coordinate), and so does the place, except that a contact of third order
 * is known only to the cube root of that. Crossings of two curves that come within rounding of one
 * another along a stretch are not told apart.
 *
 * Only exactly rounded operations decide. Cost: some microseconds, bounded for any input.
 */
export function intersectSegments(
  a: Segments,
  i: number,
  b: Segments,
  j: number,
  toleranceMm: number,
  emit: (tA: number, tB: number) => void,
  overlap: (a0: number, a1: number, b0: number, b1: number) => void = ignore,
): void {
  const boxA = new Float64Array(4);
  const boxB = new Float64Array(4);
  segmentBox(a, i, boxA);
  segmentBox(b, j, boxB);
  const size = Math.max(largest(boxA), largest(boxB));
  const tolerance = Math.max(toleranceMm, 64 * Number.EPSILON * size);
  if (!isNear(boxA, boxB, tolerance)) return;
  const meetings = new Meetings(a, i, b, j, 4 * tolerance);
  const cutsA = [0, 1];
  const cutsB = [0, 1];
  for (let end = 0; end < 2; end++) {
    const t = endOn(a, i, end, b, j, boxB, tolerance);
    if (t >= 0) {
      meetings.add(end, t);
      addCut(cutsB, meetings.lastB);
    }
    const s = endOn(b, j, end, a, i, boxA, tolerance);
    if (s >= 0) {
      meetings.add(s, end);
      addCut(cutsA, meetings.lastA);
    }
  }
  const overlaps = meetings.count > 0 ? overlapsOf(a, i, b, j, cutsA, cutsB, tolerance) : [];
  const add = (s: number, t: number): void => meetings.add(s, t);
  if (a.kind[i] === LINE && b.kind[j] === LINE) {
    if (overlaps.length === 0) crossLines(a, i, b, j, add);
  } else if (!isPoint(boxA, tolerance) && !isPoint(boxB, tolerance)) {
    for (const [rangeA, rangeB] of apartFrom(overlaps)) {
      curveMeetings(a, i, rangeA, b, j, rangeB, tolerance, size, add);
    }
  }
  meetings.emit(overlaps, emit);
  for (const { a0, a1, b0, b1 } of overlaps) overlap(a0, a1, b0, b1);
}

function ignore(): void {}

function largest(box: Float64Array): number {
  return Math.max(Math.abs(box[0]), Math.abs(box[1]), Math.abs(box[2]), Math.abs(box[3]));
}

/** Its ends say all there is to say. */
function isPoint(box: Float64Array, tolerance: number): boolean {
  return box[2] - box[0] <= tolerance && box[3] - box[1] <= tolerance;
}

function isNear(p: Float64Array, q: Float64Array, margin: number): boolean {
  return p[0] <= q[2] + margin && q[0] <= p[2] + margin && p[1] <= q[3] + margin && q[1] <= p[3] + margin;
}

/** The parameter of segment j of b nearest to an end of segment i of a; −1 beyond the tolerance. */
function endOn(
  a: Segments,
  i: number,
  end: number,
  b: Segments,
  j: number,
  box: Float64Array,
  tolerance: number,
): number {
  const o = a.offset[i] + 2 * end;
  const x = a.data[o];
  const y = a.data[o + 1];
  if (x < box[0] - tolerance || x > box[2] + tolerance) return -1;
  if (y < box[1] - tolerance || y > box[3] + tolerance) return -1;
  const { t, distance } = nearestOnSegment(b, j, x, y, 0, 1);
  return distance <= tolerance ? t : -1;
}

function addCut(cuts: number[], t: number): void {
  if (cuts.includes(t)) return;
  cuts.push(t);
  cuts.sort((p, q) => p - q);
}

/** Two lines whose ends lie strictly on either side of one another. */
function crossLines(
  a: Segments,
  i: number,
  b: Segments,
  j: number,
  add: (s: number, t: number) => void,
): void {
  const p = a.offset[i];
  const q = b.offset[j];
  const ux = a.data[p + 2] - a.data[p];
  const uy = a.data[p + 3] - a.data[p + 1];
  const vx = b.data[q + 2] - b.data[q];
  const vy = b.data[q + 3] - b.data[q + 1];
  const wx = b.data[q] - a.data[p];
  const wy = b.data[q + 1] - a.data[p + 1];
  const det = ux * vy - uy * vx;
  const s = (wx * vy - wy * vx) / det;
  const t = (wx * uy - wy * ux) / det;
  // Where rounding could put an end on the wrong side it lies on the other line, and has been found.
  if (s >= 0 && s <= 1 && t >= 0 && t <= 1) add(s, t);
}

/** The parts of the two that do not run along one another. */
function apartFrom(overlaps: readonly Overlap[]): [Range, Range][] {
  if (overlaps.length === 0) return [[WHOLE, WHOLE]];
  const pairs: [Range, Range][] = [];
  let from = 0;
  const others = overlaps.map(({ b0, b1 }) => ({ t0: Math.min(b0, b1), t1: Math.max(b0, b1) }));
  for (const { a0, a1, b0, b1 } of overlaps) {
    if (a0 > from) pairs.push([{ t0: from, t1: a0 }, WHOLE]);
    for (const rest of restOf(Math.min(b0, b1), Math.max(b0, b1), others)) {
      pairs.push([{ t0: a0, t1: a1 }, rest]);
    }
    from = a1;
  }
  if (from < 1) pairs.push([{ t0: from, t1: 1 }, WHOLE]);
  return pairs;
}

const WHOLE: Range = { t0: 0, t1: 1 };

function restOf(low: number, high: number, others: readonly Range[]): Range[] {
  const rest: Range[] = [];
  const edges = [0, low, high, 1];
  for (let k = 0; k < 3; k += 2) {
    const t0 = edges[k];
    const t1 = edges[k + 1];
    // Another overlap's stretch is the same curve again, and met in its own right.
    if (t0 < t1 && !others.some((other) => other.t0 <= t0 && other.t1 >= t1)) rest.push({ t0, t1 });
  }
  return rest;
}

/** Pairs of parameters, those at the same place of both segments taken for one. */
class Meetings {
  count = 0;
  lastA = 0;
  lastB = 0;
  private readonly s: number[] = [];
  private readonly t: number[] = [];

  constructor(
    private readonly a: Segments,
    private readonly i: number,
    private readonly b: Segments,
    private readonly j: number,
    private readonly reach: number,
  ) {}

  /** Parameters at an end's place are taken for the end; of two meetings in one place the one with more ends stays. */
  add(s: number, t: number): void {
    const snappedS = this.atEnd(this.a, this.i, s);
    const snappedT = this.atEnd(this.b, this.j, t);
    this.lastA = snappedS;
    this.lastB = snappedT;
    for (let k = 0; k < this.count; k++) {
      if (!isShort(this.a, this.i, this.s[k], snappedS, this.reach)) continue;
      if (!isShort(this.b, this.j, this.t[k], snappedT, this.reach)) continue;
      if (ends(snappedS, snappedT) > ends(this.s[k], this.t[k])) {
        this.s[k] = snappedS;
        this.t[k] = snappedT;
      }
      return;
    }
    this.s.push(snappedS);
    this.t.push(snappedT);
    this.count++;
  }

  emit(overlaps: readonly Overlap[], emit: (s: number, t: number) => void): void {
    const order = Array.from(this.s.keys()).sort((p, q) => this.s[p] - this.s[q] || this.t[p] - this.t[q]);
    for (const k of order) {
      const isWithin = overlaps.some(
        ({ a0, a1, b0, b1 }) =>
          this.isIn(this.a, this.i, this.s[k], a0, a1) &&
          this.isIn(this.b, this.j, this.t[k], Math.min(b0, b1), Math.max(b0, b1)),
      );
      if (!isWithin) emit(this.s[k], this.t[k]);
    }
  }

  private isIn(segments: Segments, i: number, t: number, low: number, high: number): boolean {
    if (t >= low && t <= high) return true;
    return isShort(segments, i, t, t < low ? low : high, this.reach);
  }

  private atEnd(segments: Segments, i: number, t: number): number {
    if (isShort(segments, i, 0, t, this.reach)) return 0;
    return isShort(segments, i, t, 1, this.reach) ? 1 : t;
  }
}

function ends(s: number, t: number): number {
  return (s === 0 || s === 1 ? 1 : 0) + (t === 0 || t === 1 ? 1 : 0);
}
