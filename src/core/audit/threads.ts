import { LINE } from '../geometry/segments.js';
import { OverlapFinder } from './overlapFinder.js';
import { OverlapTable } from './overlapTable.js';
import type { Side } from './side.js';
import type { Tolerances } from './tolerances.js';

/**
 * A stretch of a drawn chain that follows a stretch of a wanted chain without a break on either, within
 * the match tolerance and in one direction. The longer it is, and the nearer the drawn corners lie, the
 * more likely it is that this stroke was meant: lines that merely cross share short threads.
 */
export interface Thread {
  /** Rows of the table, in order. */
  readonly overlaps: readonly number[];
  readonly lengthMm: number;
  readonly score: number;
}

export interface Threads {
  readonly table: OverlapTable;
  /** Best first. */
  readonly threads: readonly Thread[];
  /** Overlaps were left out somewhere: look again once the best are paired. */
  readonly crowded: boolean;
}

/**
 * Finds all threads between what is unpaired on either side.
 *
 * Cost: a search of the wanted index for each unpaired drawn span, and the pieces of what it finds.
 */
export function findThreads(wanted: Side, drawn: Side, tolerances: Tolerances, round: number): Threads {
  const table = new OverlapTable();
  const finder = new OverlapFinder(wanted, drawn, tolerances, table, round);
  const spinner = new Spinner(wanted, drawn, finder, table, tolerances);
  for (let c = 0; c < drawn.lines.count; c++) spinner.followChain(c);
  const threads: Thread[] = [];
  for (const { overlaps } of spinner.threads) {
    for (const part of withoutFrayedEnds(overlaps, table, tolerances.sameMm)) {
      threads.push(weighed(part, table, drawn, tolerances.matchMm));
    }
  }
  threads.sort((a, b) => b.score - a.score);
  return { table, threads, crowded: finder.crowded };
}

/**
 * The score is the length, less where drawn corners lie off the wanted line: a curve replaced by chords
 * keeps its corners on the curve it was made from, and off the neighbours.
 */
function weighed(overlaps: readonly number[], table: OverlapTable, drawn: Side, matchMm: number): Thread {
  let lengthMm = 0;
  let cornerOffsets = 0;
  let corners = 0;
  let offsets = 0;
  const { t0, t1 } = drawn.spans;
  for (const i of overlaps) {
    lengthMm += (table.to0[i] - table.from0[i]) * drawn.pieceLength(table.drawnPiece[i]);
    const from = Math.abs(table.offsetFrom[i]);
    const to = Math.abs(table.offsetTo[i]);
    offsets += (from + to) / 2;
    // Places where only a span was cut are no corners.
    if (table.from0[i] === 0 && (t0[table.drawnSpan[i]] === 0 || !isLine(drawn, table.drawnSpan[i]))) {
      cornerOffsets += from;
      corners++;
    }
    if (table.to0[i] === 1 && (t1[table.drawnSpan[i]] === 1 || !isLine(drawn, table.drawnSpan[i]))) {
      cornerOffsets += to;
      corners++;
    }
  }
  const offset = corners > 0 ? cornerOffsets / corners : offsets / overlaps.length;
  return { overlaps, lengthMm, score: lengthMm * (1.05 - offset / matchMm) };
}

function isLine(side: Side, span: number): boolean {
  return side.lines.segments.kind[side.spans.segment[span]] === LINE;
}

/**
 * Where a drawn line turns off at a small angle, as a bridge does, its thread goes on until it is a match
 * tolerance away, and would pair the bridge with what comes next on the wanted line. So an end that lies
 * off the wanted line is cut back to where the thread last lay on it, and is a thread of its own.
 */
function withoutFrayedEnds(overlaps: readonly number[], table: OverlapTable, sameMm: number): number[][] {
  const { offsetFrom, offsetTo } = table;
  const isOff = (i: number): boolean =>
    (offsetFrom[i] > sameMm && offsetTo[i] > sameMm) || (offsetFrom[i] < -sameMm && offsetTo[i] < -sameMm);
  let from = 0;
  while (from < overlaps.length && isOff(overlaps[from])) from++;
  let to = overlaps.length;
  while (to > from && isOff(overlaps[to - 1])) to--;
  if (from === to) return [[...overlaps]];
  const head = overlaps.slice(0, from);
  const body = overlaps.slice(from, to);
  const tail = overlaps.slice(to);
  const first = body[0];
  if (Math.abs(offsetFrom[first]) > sameMm) {
    head.push(first);
    body[0] = table.cut(first, shareWithin(table, first, sameMm, true));
  }
  const last = body[body.length - 1];
  if (Math.abs(table.offsetTo[last]) > sameMm) {
    tail.unshift(table.cut(last, shareWithin(table, last, sameMm, false)));
  }
  return [head, body, tail].filter((part) => part.length > 0);
}

/** The first, or last, share of an overlap at which it lies within `sameMm`; it is not off all along. */
function shareWithin(table: OverlapTable, i: number, sameMm: number, first: boolean): number {
  const a = table.offsetFrom[i];
  const b = table.offsetTo[i];
  const one = (sameMm - a) / (b - a);
  const other = (-sameMm - a) / (b - a);
  return first ? Math.max(0, Math.min(one, other)) : Math.min(1, Math.max(one, other));
}

interface GrowingThread {
  readonly overlaps: number[];
  /** Where it has come to along the drawn chain: the length, and the number of the piece. */
  drawnAt: number;
  piece: number;
}

class Spinner {
  readonly threads: GrowingThread[] = [];
  /** Threads that may go on, by wanted chain and direction. */
  private open = new Map<number, GrowingThread[]>();
  /** Counts the drawn pieces gone along. */
  private piece = 0;

  constructor(
    private readonly wanted: Side,
    private readonly drawn: Side,
    private readonly finder: OverlapFinder,
    private readonly table: OverlapTable,
    private readonly tolerances: Tolerances,
  ) {}

  followChain(chain: number): void {
    const { drawn, finder } = this;
    const { firstOfChain } = drawn.spans;
    this.open = new Map();
    let along = 0;
    for (let span = firstOfChain[chain]; span < firstOfChain[chain + 1]; span++) {
      if (drawn.whole[span] === 1 || !finder.lookAbout(span)) {
        if (this.open.size > 0) this.open = new Map();
        continue;
      }
      const first = drawn.flatten(span);
      for (let v = first; v < first + drawn.pieceCount(span); v++) {
        const length = drawn.pieceLength(v);
        this.piece++;
        if (!drawn.isPieceDone(v)) {
          for (const row of finder.along(span, v)) this.extend(row, along, length);
        }
        along += length;
      }
    }
  }

  /** Adds an overlap to the open thread that it continues, or begins one with it. */
  private extend(row: number, along: number, length: number): void {
    const { table, wanted } = this;
    const opposed = table.from1[row] > table.to1[row];
    const key = 2 * wanted.spans.chain[table.wantedSpan[row]] + (opposed ? 1 : 0);
    let mates = this.open.get(key);
    if (mates === undefined) {
      mates = [];
      this.open.set(key, mates);
    }
    let thread = this.continued(row, mates, along + table.from0[row] * length);
    if (thread === null) {
      thread = { overlaps: [], drawnAt: 0, piece: 0 };
      this.threads.push(thread);
      mates.push(thread);
    }
    thread.overlaps.push(row);
    thread.piece = this.piece;
    thread.drawnAt = along + table.to0[row] * length;
  }

  /** The thread that ends nearest to where an overlap starts, on both chains; those left behind go. */
  private continued(row: number, mates: GrowingThread[], start: number): GrowingThread | null {
    const { table, wanted } = this;
    const gap = this.tolerances.matchMm;
    let best: GrowingThread | null = null;
    let least = gap;
    for (let m = mates.length - 1; m >= 0; m--) {
      const mate = mates[m];
      if (this.piece > mate.piece + 1 || start - mate.drawnAt > gap) {
        mates[m] = mates[mates.length - 1];
        mates.pop();
        continue;
      }
      const last = mate.overlaps[mate.overlaps.length - 1];
      const off =
        Math.abs(start - mate.drawnAt) +
        wanted.lengthBetween(
          table.wantedSpan[last],
          table.wantedPiece[last],
          table.to1[last],
          table.wantedSpan[row],
          table.wantedPiece[row],
          table.from1[row],
          gap,
        );
      if (off < least) {
        best = mate;
        least = off;
      }
    }
    return best;
  }
}
