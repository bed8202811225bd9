import type { Side } from './side.js';
import { findOverlap, newOverlap, type Overlap } from './sideBySide.js';
import type { Tolerances } from './tolerances.js';

/** Pieces that differ in direction by more than 60° are not paired. */
const LEAST_COSINE = 0.5;
/** A drawn piece keeps its best overlaps only, so that crowds stay within bounds. */
const MOST_OVERLAPS = 48;

/** Where a drawn piece runs beside a wanted one; `next` is the following overlap of the same thread. */
export interface ThreadOverlap {
  readonly drawnSpan: number;
  readonly drawnPiece: number;
  readonly wantedSpan: number;
  readonly wantedPiece: number;
  readonly from0: number;
  readonly to0: number;
  readonly from1: number;
  readonly to1: number;
  readonly offsetFrom: number;
  readonly offsetTo: number;
}

/**
 * A stretch of a drawn chain that follows a stretch of a wanted chain without a break, within the match
 * tolerance and in one direction. The longer it is, and the nearer the drawn corners lie, the more
 * likely it is that this stroke was meant: lines that merely cross share short threads.
 */
export interface Thread {
  readonly overlaps: ThreadOverlap[];
  readonly score: number;
}

/**
 * Finds all threads between what is unpaired on either side, best first. `crowded` tells that overlaps
 * were left out somewhere: then look again once the best are paired.
 *
 * Cost: a search of the wanted index for each unpaired drawn span, and the pieces of what it finds.
 */
export function findThreads(
  wanted: Side,
  drawn: Side,
  tolerances: Tolerances,
): { threads: Thread[]; crowded: boolean } {
  const spinner = new Spinner(wanted, drawn, tolerances);
  for (let c = 0; c < drawn.lines.count; c++) spinner.followChain(c);
  const threads = spinner.threads.map((t) => ({ overlaps: t.overlaps, score: t.score(tolerances.matchMm) }));
  threads.sort((a, b) => b.score - a.score);
  return { threads, crowded: spinner.crowded };
}

class GrowingThread {
  readonly overlaps: ThreadOverlap[] = [];
  lengthMm = 0;
  /** Where it has come to: along the drawn chain, and on the wanted line. */
  drawnAt = 0;
  wantedX = 0;
  wantedY = 0;
  private cornerOffsets = 0;
  private corners = 0;
  private offsets = 0;

  add(overlap: ThreadOverlap, lengthMm: number): void {
    this.overlaps.push(overlap);
    this.lengthMm += lengthMm;
    const from = Math.abs(overlap.offsetFrom);
    const to = Math.abs(overlap.offsetTo);
    this.offsets += (from + to) / 2;
    if (overlap.from0 === 0) {
      this.cornerOffsets += from;
      this.corners++;
    }
    if (overlap.to0 === 1) {
      this.cornerOffsets += to;
      this.corners++;
    }
  }

  /**
   * The length, less where drawn corners lie off the wanted line: a curve replaced by chords keeps its
   * corners on the curve it was made from, and off the neighbours.
   */
  score(matchMm: number): number {
    const offset = this.corners > 0 ? this.cornerOffsets / this.corners : this.offsets / this.overlaps.length;
    return this.lengthMm * (1.05 - offset / matchMm);
  }
}

interface Candidate extends ThreadOverlap {
  readonly lengthMm: number;
  readonly opposed: boolean;
  readonly weight: number;
}

class Spinner {
  readonly threads: GrowingThread[] = [];
  crowded = false;
  private open = new Map<number, GrowingThread[]>();
  private readonly overlap: Overlap = newOverlap();
  private candidates: Candidate[] = [];

  constructor(
    private readonly wanted: Side,
    private readonly drawn: Side,
    private readonly tolerances: Tolerances,
  ) {}

  followChain(chain: number): void {
    const { drawn } = this;
    const { firstOfChain } = drawn.spans;
    this.open = new Map();
    let along = 0;
    for (let span = firstOfChain[chain]; span < firstOfChain[chain + 1]; span++) {
      if (drawn.whole[span] === 1) {
        if (this.open.size > 0) this.open = new Map();
        continue;
      }
      const near = this.wantedNear(span, drawn.lines.pen[chain]);
      if (near.length === 0) continue;
      const first = drawn.flatten(span);
      for (let v = first; v < first + drawn.pieceCount(span); v++) {
        const length = drawn.pieceLength(v);
        if (!drawn.isPieceDone(v)) this.followPiece(span, v, near, along, length);
        along += length;
      }
    }
  }

  private wantedNear(span: number, pen: number): number[] {
    const { wanted } = this;
    const { boxes } = this.drawn.spans;
    const reach = this.tolerances.matchMm;
    const near: number[] = [];
    const o = 4 * span;
    wanted.index.visit(
      boxes[o] - reach,
      boxes[o + 1] - reach,
      boxes[o + 2] + reach,
      boxes[o + 3] + reach,
      (w) => {
        if (wanted.whole[w] === 0 && wanted.penOf(w) === pen) near.push(w);
        return false;
      },
    );
    return near;
  }

  private followPiece(span: number, v: number, near: number[], along: number, length: number): void {
    this.candidates = [];
    for (const w of near) this.compare(span, v, w);
    let found = this.candidates;
    if (found.length > MOST_OVERLAPS) {
      this.crowded = true;
      found.sort((a, b) => b.weight - a.weight);
      found = found.slice(0, MOST_OVERLAPS);
    }
    if (found.length > 1) found.sort((a, b) => a.from0 - b.from0);
    for (const candidate of found) this.extend(candidate, along, length);
  }

  private compare(span: number, v: number, w: number): void {
    const { wanted, drawn, overlap } = this;
    const reach = this.tolerances.matchMm;
    const ax = drawn.x[v];
    const ay = drawn.y[v];
    const bx = drawn.x[v + 1];
    const by = drawn.y[v + 1];
    const minX = Math.min(ax, bx) - reach;
    const minY = Math.min(ay, by) - reach;
    const maxX = Math.max(ax, bx) + reach;
    const maxY = Math.max(ay, by) + reach;
    const first = wanted.flatten(w);
    const last = first + wanted.pieceCount(w);
    const { x, y } = wanted;
    for (let p = first; p < last; p++) {
      const cx = x[p];
      const dx = x[p + 1];
      if ((cx < minX && dx < minX) || (cx > maxX && dx > maxX)) continue;
      const cy = y[p];
      const dy = y[p + 1];
      if ((cy < minY && dy < minY) || (cy > maxY && dy > maxY)) continue;
      if (wanted.isPieceDone(p)) continue;
      if (!findOverlap(ax, ay, bx, by, cx, cy, dx, dy, reach, LEAST_COSINE, overlap)) continue;
      this.candidates.push({
        drawnSpan: span,
        drawnPiece: v,
        wantedSpan: w,
        wantedPiece: p,
        from0: overlap.from0,
        to0: overlap.to0,
        from1: overlap.from1,
        to1: overlap.to1,
        offsetFrom: overlap.offsetFrom,
        offsetTo: overlap.offsetTo,
        lengthMm: overlap.lengthMm,
        opposed: overlap.opposed,
        weight: overlap.lengthMm * this.spread(span, w),
      });
    }
  }

  /** Near 1, different for every pair of chains: in a crowd of equals, everyone prefers someone else. */
  private spread(drawnSpan: number, wantedSpan: number): number {
    const a = this.drawn.spans.chain[drawnSpan];
    const b = this.wanted.spans.chain[wantedSpan];
    let h = Math.imul(a, 0x9e3779b1) ^ Math.imul(b, 0x85ebca6b);
    h = Math.imul(h ^ (h >>> 15), 0x2c1b3c6d);
    return 1 - ((h >>> 8) & 0xffff) / 0x80000;
  }

  private extend(found: Candidate, along: number, length: number): void {
    const { wanted, threads } = this;
    const w = found.wantedPiece;
    const dx = wanted.x[w + 1] - wanted.x[w];
    const dy = wanted.y[w + 1] - wanted.y[w];
    const startX = wanted.x[w] + found.from1 * dx;
    const startY = wanted.y[w] + found.from1 * dy;
    const start = along + found.from0 * length;
    const gap = 4 * this.tolerances.matchMm;
    const key = 2 * wanted.spans.chain[found.wantedSpan] + (found.opposed ? 1 : 0);
    let mates = this.open.get(key);
    if (mates === undefined) {
      mates = [];
      this.open.set(key, mates);
    }
    let best = -1;
    let least = gap;
    for (let m = mates.length - 1; m >= 0; m--) {
      const mate = mates[m];
      if (start - mate.drawnAt > gap) {
        mates[m] = mates[mates.length - 1];
        mates.pop();
        if (best === mates.length) best = m;
        continue;
      }
      const off =
        Math.abs(start - mate.drawnAt) + Math.abs(startX - mate.wantedX) + Math.abs(startY - mate.wantedY);
      if (off < least) {
        best = m;
        least = off;
      }
    }
    let thread: GrowingThread;
    if (best >= 0) thread = mates[best];
    else {
      thread = new GrowingThread();
      threads.push(thread);
      mates.push(thread);
    }
    thread.add(found, found.lengthMm);
    thread.drawnAt = along + found.to0 * length;
    thread.wantedX = wanted.x[w] + found.to1 * dx;
    thread.wantedY = wanted.y[w] + found.to1 * dy;
  }
}
