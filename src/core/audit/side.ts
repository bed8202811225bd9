import { pointAt } from '../geometry/evaluate.js';
import { flattenSegment } from '../geometry/flatten.js';
import { BoxIndex } from './boxIndex.js';
import { addInterval, gapsIn, type Intervals, partsIn } from './intervals.js';
import type { LineSet } from './lineSet.js';
import { boxesOf, cutToSpans, type Spans } from './spans.js';
import type { Tolerances } from './tolerances.js';

const NOTHING: Intervals = [];

/** How much of a piece is paired. */
const FREE = 0;
const PART = 1;
const DONE = 2;

/**
 * One of the two line sets, ready to be held against the other: its spans, their polylines (made when
 * first asked for), and which parts of them are paired already.
 *
 * A polyline's vertices are numbered throughout the side; piece v runs from vertex v to v + 1, and a
 * place on it is a fraction from 0 to 1.
 */
export class Side {
  readonly spans: Spans;
  /** Largest deviation of what was paired on each span. */
  readonly deviation: Float64Array;
  /** 1 where all of a span is paired. */
  readonly whole: Uint8Array;
  /** 1 where any of a span is paired. */
  readonly touched: Uint8Array;
  /** 1 for each segment that was paired whole, unflattened. */
  readonly wholeSegment: Uint8Array;
  x = new Float64Array(1024);
  y = new Float64Array(1024);
  private vertices = 0;
  private pieceState = new Uint8Array(1024);
  private readonly paired = new Map<number, Intervals>();
  /** What counts as paired because it repeats what is: whole spans, and parts of pieces. */
  private readonly excusedSpan: Uint8Array;
  private readonly excusedParts = new Map<number, Intervals>();
  private readonly firstVertex: Int32Array;
  private readonly pieces: Uint32Array;
  private readonly piecesLeft: Uint32Array;
  private boxIndex: BoxIndex | null = null;
  private spanBoxes: Float64Array | null = null;

  /** @param wholeDeviation deviation of each segment that has a partner already, else −1. */
  constructor(
    readonly lines: LineSet,
    wholeDeviation: Float64Array,
    private readonly tolerances: Tolerances,
  ) {
    this.spans = cutToSpans(lines, wholeDeviation, tolerances.flatMm);
    const { count, segment } = this.spans;
    this.deviation = new Float64Array(count);
    this.whole = new Uint8Array(count);
    this.touched = new Uint8Array(count);
    this.excusedSpan = new Uint8Array(count);
    this.wholeSegment = new Uint8Array(wholeDeviation.length);
    for (let i = 0; i < wholeDeviation.length; i++) if (wholeDeviation[i] >= 0) this.wholeSegment[i] = 1;
    for (let span = 0; span < count; span++) {
      const deviation = wholeDeviation[segment[span]];
      if (deviation < 0) continue;
      this.deviation[span] = deviation;
      this.whole[span] = this.touched[span] = 1;
    }
    this.firstVertex = new Int32Array(count).fill(-1);
    this.pieces = new Uint32Array(count);
    this.piecesLeft = new Uint32Array(count);
  }

  /** minX, minY, maxX, maxY of each span, never too small. */
  get boxes(): Float64Array {
    this.spanBoxes ??= boxesOf(this.spans, this.lines.segments, this.tolerances.flatMm);
    return this.spanBoxes;
  }

  get index(): BoxIndex {
    if (this.boxIndex === null) this.boxIndex = new BoxIndex(this.boxes);
    return this.boxIndex;
  }

  penOf(span: number): number {
    return this.lines.pen[this.spans.chain[span]];
  }

  /** First vertex of a span's polyline; its pieces are the `pieceCount(span)` from there. */
  flatten(span: number): number {
    if (this.firstVertex[span] >= 0) return this.firstVertex[span];
    const { segment, t0, t1 } = this.spans;
    const { segments } = this.lines;
    const first = this.vertices;
    const at = new Float64Array(2);
    pointAt(segments, segment[span], t0[span], at);
    this.push(at[0], at[1]);
    flattenSegment(segments, segment[span], t0[span], t1[span], this.tolerances.flatMm, (x, y) =>
      this.push(x, y),
    );
    this.firstVertex[span] = first;
    this.pieces[span] = this.piecesLeft[span] = this.vertices - first - 1;
    return first;
  }

  /** How many pieces a flattened span has. */
  pieceCount(span: number): number {
    return this.pieces[span];
  }

  pieceLength(v: number): number {
    const dx = this.x[v + 1] - this.x[v];
    const dy = this.y[v + 1] - this.y[v];
    return Math.sqrt(dx * dx + dy * dy);
  }

  /**
   * The length along the chain between two places on flattened spans of one chain, infinite where it
   * exceeds `limit`.
   */
  lengthBetween(
    spanA: number,
    v: number,
    fractionA: number,
    spanB: number,
    w: number,
    fractionB: number,
    limit: number,
  ): number {
    if (v === w) return Math.abs(fractionB - fractionA) * this.pieceLength(v);
    if (spanA > spanB || (spanA === spanB && v > w)) {
      return this.lengthBetween(spanB, w, fractionB, spanA, v, fractionA, limit);
    }
    let length = (1 - fractionA) * this.pieceLength(v);
    let span = spanA;
    let at = v + 1;
    while (length <= limit) {
      if (at >= this.firstVertex[span] + this.pieces[span]) {
        span++;
        if (span > spanB) return Number.POSITIVE_INFINITY;
        at = this.flatten(span);
        continue;
      }
      if (at === w) {
        length += fractionB * this.pieceLength(w);
        break;
      }
      length += this.pieceLength(at);
      at++;
    }
    return length <= limit ? length : Number.POSITIVE_INFINITY;
  }

  isPieceDone(v: number): boolean {
    return this.pieceState[v] === DONE;
  }

  isPieceFree(v: number): boolean {
    return this.pieceState[v] === FREE;
  }

  /** The parts of piece v of a span from fraction `from` to `to` that are not paired yet. */
  unpaired(span: number, v: number, from: number, to: number): Intervals {
    if (this.whole[span] === 1 || this.pieceState[v] === DONE) return NOTHING;
    const list = this.paired.get(v);
    return list === undefined ? [from, to] : gapsIn(list, from, to);
  }

  /** The parts of piece v of a span from fraction `from` to `to` that are paired. */
  pairedParts(span: number, v: number, from: number, to: number): Intervals {
    if (this.whole[span] === 1 || this.pieceState[v] === DONE) return [from, to];
    const list = this.paired.get(v);
    return list === undefined ? NOTHING : partsIn(list, from, to);
  }

  /** Marks part of a piece as paired. Gaps shorter than a hair close. */
  pair(span: number, v: number, from: number, to: number, deviation: number): void {
    if (deviation > this.deviation[span]) this.deviation[span] = deviation;
    this.touched[span] = 1;
    if (this.pieceState[v] === DONE) return;
    const slack = this.tolerances.hairMm / this.pieceLength(v);
    const low = from <= slack ? 0 : from;
    const high = to >= 1 - slack ? 1 : to;
    if (low > 0 || high < 1) {
      const list = this.paired.get(v);
      if (list === undefined) {
        this.paired.set(v, [low, high]);
        this.pieceState[v] = PART;
        return;
      }
      addInterval(list, low, high, slack);
      if (list.length > 2 || list[0] > 0 || list[1] < 1) return;
      this.paired.delete(v);
    }
    this.pieceState[v] = DONE;
    this.piecesLeft[span]--;
    if (this.piecesLeft[span] === 0) this.whole[span] = 1;
  }

  /** Marks all of a span as repeating what is paired. */
  excuseSpan(span: number, deviation: number): void {
    if (deviation > this.deviation[span]) this.deviation[span] = deviation;
    this.excusedSpan[span] = this.touched[span] = this.whole[span] = 1;
  }

  /** Marks part of a piece as repeating what is paired. */
  excuse(span: number, v: number, from: number, to: number, deviation: number): void {
    const list = this.excusedParts.get(v);
    if (list === undefined) this.excusedParts.set(v, [from, to]);
    else addInterval(list, from, to, 0);
    this.pair(span, v, from, to, deviation);
  }

  /** Whether what is paired next to a place on a piece only repeats something; v < 0 is the span's last piece. */
  isExcused(span: number, v: number, at: number): boolean {
    if (this.excusedSpan[span] === 1) return true;
    if (this.firstVertex[span] < 0) return false;
    const piece = v >= 0 ? v : this.firstVertex[span] + this.pieces[span] - 1;
    const slack = this.tolerances.hairMm / this.pieceLength(piece);
    const list = this.excusedParts.get(piece);
    return list !== undefined && partsIn(list, at - slack, at + slack).length > 0;
  }

  private push(x: number, y: number): void {
    const v = this.vertices++;
    if (v === this.x.length) {
      this.x = doubled(this.x, new Float64Array(2 * v));
      this.y = doubled(this.y, new Float64Array(2 * v));
      this.pieceState = doubled(this.pieceState, new Uint8Array(2 * v));
    }
    this.x[v] = x;
    this.y[v] = y;
  }
}

function doubled<T extends Float64Array | Uint8Array>(from: T, to: T): T {
  to.set(from);
  return to;
}
