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
 * A stretch of a drawn chain that follows a stretch of a wanted chain without a break on either, within
 * the match tolerance and in one direction. The longer it is, and the nearer the drawn corners lie, the more
 * likely it is that this stroke was meant: lines that merely cross share short threads.
 */
export interface Thread {
  readonly overlaps: readonly ThreadOverlap[];
  readonly lengthMm: number;
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
  const threads = spinner.threads.flatMap((t) => withoutFrayedEnds(t, drawn, tolerances));
  threads.sort((a, b) => b.score - a.score);
  return { threads, crowded: spinner.crowded };
}

/**
 * The length, less where drawn corners lie off the wanted line: a curve replaced by chords keeps its
 * corners on the curve it was made from, and off the neighbours.
 */
function weighed(overlaps: readonly ThreadOverlap[], drawn: Side, matchMm: number): Thread {
  let lengthMm = 0;
  let cornerOffsets = 0;
  let corners = 0;
  let offsets = 0;
  for (const o of overlaps) {
    lengthMm += (o.to0 - o.from0) * drawn.pieceLength(o.drawnPiece);
    const from = Math.abs(o.offsetFrom);
    const to = Math.abs(o.offsetTo);
    offsets += (from + to) / 2;
    if (o.from0 === 0) {
      cornerOffsets += from;
      corners++;
    }
    if (o.to0 === 1) {
      cornerOffsets += to;
      corners++;
    }
  }
  const offset = corners > 0 ? cornerOffsets / corners : offsets / overlaps.length;
  return { overlaps, lengthMm, score: lengthMm * (1.05 - offset / matchMm) };
}

/**
 * Where a drawn line turns off at a small angle, as a bridge does, its thread goes on until it is a match
 * tolerance away, and would pair the bridge with what comes next on the wanted line. So an end that lies
 * off the wanted line is cut back to where the thread last lay on it, and is a thread of its own.
 */
function withoutFrayedEnds(thread: GrowingThread, drawn: Side, { matchMm, sameMm }: Tolerances): Thread[] {
  const { overlaps } = thread;
  let from = 0;
  while (from < overlaps.length && isOff(overlaps[from], sameMm)) from++;
  let to = overlaps.length;
  while (to > from && isOff(overlaps[to - 1], sameMm)) to--;
  if (from === to) return [weighed(overlaps, drawn, matchMm)];
  const head = overlaps.slice(0, from);
  const body = overlaps.slice(from, to);
  const tail = overlaps.slice(to);
  if (Math.abs(body[0].offsetFrom) > sameMm) {
    const [off, on] = cutAt(body[0], placeWithin(body[0], sameMm, true));
    head.push(off);
    body[0] = on;
  }
  const last = body.length - 1;
  if (Math.abs(body[last].offsetTo) > sameMm) {
    const [on, off] = cutAt(body[last], placeWithin(body[last], sameMm, false));
    tail.unshift(off);
    body[last] = on;
  }
  return [head, body, tail].filter((part) => part.length > 0).map((part) => weighed(part, drawn, matchMm));
}

/** Whether all of an overlap lies off by more than `sameMm`, to one side. */
function isOff({ offsetFrom: a, offsetTo: b }: ThreadOverlap, sameMm: number): boolean {
  return (a > sameMm && b > sameMm) || (a < -sameMm && b < -sameMm);
}

/** The first, or last, share of an overlap where it lies within `sameMm`; it is not off. */
function placeWithin({ offsetFrom: a, offsetTo: b }: ThreadOverlap, sameMm: number, first: boolean): number {
  const one = (sameMm - a) / (b - a);
  const other = (-sameMm - a) / (b - a);
  return first ? Math.max(0, Math.min(one, other)) : Math.min(1, Math.max(one, other));
}

function cutAt(o: ThreadOverlap, share: number): [ThreadOverlap, ThreadOverlap] {
  const at0 = o.from0 + share * (o.to0 - o.from0);
  const at1 = o.from1 + share * (o.to1 - o.from1);
  const offset = o.offsetFrom + share * (o.offsetTo - o.offsetFrom);
  return [
    { ...o, to0: at0, to1: at1, offsetTo: offset },
    { ...o, from0: at0, from1: at1, offsetFrom: offset },
  ];
}

interface GrowingThread {
  readonly overlaps: ThreadOverlap[];
  /** Where it has come to along the drawn chain: the length, and the number of the piece. */
  drawnAt: number;
  piece: number;
}

interface Candidate extends ThreadOverlap {
  readonly lengthMm: number;
  readonly opposed: boolean;
  readonly weight: number;
}

class Spinner {
  readonly threads: GrowingThread[] = [];
  crowded = false;
  /** Counts the drawn pieces gone along. */
  private piece = 0;
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
        this.piece++;
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
    const start = along + found.from0 * length;
    const gap = this.tolerances.matchMm;
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
      if (this.piece > mate.piece + 1 || start - mate.drawnAt > gap) {
        mates[m] = mates[mates.length - 1];
        mates.pop();
        if (best === mates.length) best = m;
        continue;
      }
      const last = mate.overlaps[mate.overlaps.length - 1];
      const off =
        Math.abs(start - mate.drawnAt) +
        wanted.lengthBetween(
          last.wantedSpan,
          last.wantedPiece,
          last.to1,
          found.wantedSpan,
          found.wantedPiece,
          found.from1,
          gap,
        );
      if (off < least) {
        best = m;
        least = off;
      }
    }
    let thread: GrowingThread;
    if (best >= 0) thread = mates[best];
    else {
      thread = { overlaps: [], drawnAt: 0, piece: 0 };
      threads.push(thread);
      mates.push(thread);
    }
    thread.overlaps.push(found);
    thread.piece = this.piece;
    thread.drawnAt = along + found.to0 * length;
  }
}
