import { parameterAtLength } from './alongLength.js';
import { pointAt } from './evaluate.js';
import { segmentLength } from './length.js';
import { SegmentBuilder, type Segments } from './segments.js';
import { appendSpan } from './split.js';

/** Lengths of dash and gap by turns, an even number of them with a sum above 0, and where to begin. */
export interface DashPattern {
  readonly lengths: readonly number[];
  readonly offset: number;
}

/** The dashes of one line: piece k owns segments `first[k]` up to `first[k + 1]`; a dot has zero length. */
export interface Dashes {
  readonly segments: Segments;
  readonly first: readonly number[];
  readonly dot: readonly boolean[];
  /** The pattern leaves the whole line as it was: no gap falls on it. */
  readonly whole: boolean;
}

/** Pieces shorter than this share of the line come from rounding where a dash begins at its very end. */
const SLIVER = 1e-9;

/**
 * Cuts a line (segments that join) into its dashes. The pattern begins at the line's start; on a closed
 * line a dash that reaches the end goes on into one that begins at the start, as one piece.
 * Dashes of zero length come out as dots.
 *
 * Accuracy: ends of dashes lie where they should to 1e-9 of a segment's length; the pieces are the same
 * curves. Source: SVG 2 §13.7.3, "Computing the shape of an element's stroke".
 *
 * @returns null where there would be more than `most` dashes.
 */
export function cutDashes(
  segments: Segments,
  closed: boolean,
  pattern: DashPattern,
  most: number,
): Dashes | null {
  const lengths = Float64Array.from({ length: segments.count }, (_, i) => segmentLength(segments, i));
  const total = lengths.reduce((sum, length) => sum + length, 0);
  const period = pattern.lengths.reduce((sum, length) => sum + length, 0);
  if (!((total / period) * pattern.lengths.length < 2 * most)) return null;
  return new Cutter(segments, lengths, total, pattern, period).run(closed);
}

interface Spot {
  readonly segment: number;
  readonly t: number;
}

class Cutter {
  private readonly builder = new SegmentBuilder();
  private readonly first: number[] = [];
  private readonly dot: boolean[] = [];
  /** Which length of the pattern holds here, and how much of it is left. */
  private turn = 0;
  private left: number;
  private begin: Spot | null = null;
  /** Distance along the line of the dash that is open. */
  private beganAt = 0;
  /** Where the first dash ends, if one begins at the start of a closed line: kept to be drawn last. */
  private held: Spot | null = null;
  private readonly ends = [new Float64Array(2), new Float64Array(2)];

  constructor(
    private readonly segments: Segments,
    private readonly lengths: Float64Array,
    private readonly total: number,
    private readonly pattern: DashPattern,
    period: number,
  ) {
    let into = pattern.offset % period;
    if (into < 0) into += period;
    // A dash of zero length at the very start is a dot there.
    while (into > pattern.lengths[this.turn] || (into === pattern.lengths[this.turn] && into > 0)) {
      if (this.turn === pattern.lengths.length - 1) break;
      into -= pattern.lengths[this.turn++];
    }
    this.left = Math.max(pattern.lengths[this.turn] - into, 0);
  }

  run(closed: boolean): Dashes {
    const { segments, lengths } = this;
    const start: Spot = { segment: 0, t: 0 };
    const startsOn = this.isOn;
    if (startsOn) this.begin = start;
    let cuts = 0;
    let before = 0;
    for (let i = 0; i < segments.count; i++) {
      let t = 0;
      let rest = lengths[i];
      while (this.left < rest) {
        t = this.left === 0 ? t : parameterAtLength(segments, i, t, this.left);
        rest -= this.left;
        this.cut({ segment: i, t }, before + lengths[i] - rest, closed && startsOn && cuts === 0);
        cuts++;
      }
      this.left -= rest;
      before += lengths[i];
    }
    if (cuts === 0 && startsOn) return { segments, first: [0, segments.count], dot: [false], whole: true };
    this.finish();
    this.first.push(this.builder.count);
    return { segments: this.builder.finish(), first: this.first, dot: this.dot, whole: false };
  }

  private get isOn(): boolean {
    return this.turn % 2 === 0;
  }

  /** Ends the dash or the gap at a spot and goes on to the next length of the pattern. */
  private cut(spot: Spot, distance: number, isFirstOfClosed: boolean): void {
    if (this.begin && isFirstOfClosed) this.held = spot;
    else if (this.begin) this.piece(this.begin, spot, this.pattern.lengths[this.turn] === 0);
    this.turn = (this.turn + 1) % this.pattern.lengths.length;
    this.left = this.pattern.lengths[this.turn];
    this.begin = this.isOn ? spot : null;
    this.beganAt = distance;
  }

  private finish(): void {
    const end: Spot = { segment: this.segments.count - 1, t: 1 };
    const start: Spot = { segment: 0, t: 0 };
    const reachesEnd = this.begin !== null && this.total - this.beganAt > SLIVER * this.total;
    if (this.begin && reachesEnd) this.piece(this.begin, end, false);
    if (!this.held) return;
    if (this.begin && reachesEnd) this.spans(start, this.held);
    else this.piece(start, this.held, this.isAt(this.held, start));
  }

  private isAt(a: Spot, b: Spot): boolean {
    return a.segment === b.segment && a.t === b.t;
  }

  private piece(from: Spot, to: Spot, dot: boolean): void {
    const before = this.builder.count;
    if (dot) appendSpan(this.builder, this.segments, from.segment, from.t, from.t);
    else this.spans(from, to);
    if (this.builder.count === before) return;
    this.first.push(before);
    this.dot.push(dot);
  }

  private spans(from: Spot, to: Spot): void {
    for (let i = from.segment; i <= to.segment; i++) {
      const t0 = i === from.segment ? from.t : 0;
      const t1 = i === to.segment ? to.t : 1;
      if (t1 > t0 && !this.isNothing(i, t0, t1)) appendSpan(this.builder, this.segments, i, t0, t1);
    }
  }

  /** A span that rounding makes a point of: without it the joints still meet. */
  private isNothing(i: number, t0: number, t1: number): boolean {
    if ((t1 - t0) * this.lengths[i] > SLIVER * this.total) return false;
    pointAt(this.segments, i, t0, this.ends[0]);
    pointAt(this.segments, i, t1, this.ends[1]);
    return this.ends[0][0] === this.ends[1][0] && this.ends[0][1] === this.ends[1][1];
  }
}
