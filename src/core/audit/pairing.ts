import type { OverlapTable } from './overlapTable.js';
import type { Side } from './side.js';
import { findThreads } from './threads.js';
import type { Tolerances } from './tolerances.js';

/** Crowds of hundreds of lines on one place are settled in rounds; few are ever needed. */
const MOST_ROUNDS = 16;

/**
 * Pairs what is drawn with what is wanted, point by point along their length: no point is used twice,
 * the pens are the same, and paired points are at most `matchMm` apart. So what is paired is a proof;
 * what is left over is looked at afterwards.
 *
 * The best threads go first. Among lines that all lie within the tolerance of each other any order
 * leaves nothing over. Where lines lie closer than two tolerances without all doing so, the length of
 * threads and the place of the corners decide; that is a choice, and could leave over what another
 * choice would not. Of a thread that is mostly used up, crumbs no longer than the tolerance are left: they
 * would make a line drawn once too often look as if it were there for a reason. Returns the largest
 * deviation.
 */
export function pairAlongThreads(wanted: Side, drawn: Side, tolerances: Tolerances): number {
  let largest = 0;
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const { table, threads, crowded } = findThreads(wanted, drawn, tolerances, round);
    const matcher = new Matcher(wanted, drawn, table);
    let roundMm = 0;
    for (const { overlaps, lengthMm } of threads) {
      const freeMm = matcher.gatherFree(overlaps);
      if (freeMm < Math.min(lengthMm / 2, tolerances.matchMm)) continue;
      matcher.pairGathered();
      roundMm += freeMm;
    }
    largest = Math.max(largest, matcher.deviation);
    if (!crowded || roundMm <= tolerances.hairMm) break;
  }
  return largest;
}

/** Numbers of a match: row, from0, to0, from1, to1, deviation. */
const FIELDS = 6;

class Matcher {
  /** Largest deviation paired. */
  deviation = 0;
  /** Opposite parts that are free on both sides; from1 < to1. */
  private readonly matches: number[] = [];

  constructor(
    private readonly wanted: Side,
    private readonly drawn: Side,
    private readonly table: OverlapTable,
  ) {}

  /**
   * Gathers what is free along a thread; returns its length. Overlaps of one thread may share a little
   * of a piece at its corners, which pairing leaves as it is.
   */
  gatherFree(overlaps: readonly number[]): number {
    const { table, wanted, drawn } = this;
    this.matches.length = 0;
    let freeMm = 0;
    for (const row of overlaps) {
      const from0 = table.from0[row];
      const from1 = table.from1[row];
      const width0 = table.to0[row] - from0;
      const width1 = table.to1[row] - from1;
      const piece0 = table.drawnPiece[row];
      const piece1 = table.wantedPiece[row];
      if (drawn.isPieceFree(piece0) && wanted.isPieceFree(piece1)) {
        const [low, high] = width1 < 0 ? [table.to1[row], from1] : [from1, table.to1[row]];
        this.addMatch(row, 0, 1, low, high);
        freeMm += width0 * drawn.pieceLength(piece0);
        continue;
      }
      const free0 = drawn.unpaired(table.drawnSpan[row], piece0, from0, table.to0[row]);
      for (let i = 0; i < free0.length; i += 2) {
        const a = from1 + ((free0[i] - from0) / width0) * width1;
        const b = from1 + ((free0[i + 1] - from0) / width0) * width1;
        const free1 = wanted.unpaired(table.wantedSpan[row], piece1, Math.min(a, b), Math.max(a, b));
        for (let j = 0; j < free1.length; j += 2) {
          const s = (free1[j] - from1) / width1;
          const t = (free1[j + 1] - from1) / width1;
          const low = Math.max(0, Math.min(s, t));
          const high = Math.min(1, Math.max(s, t));
          if (!(high > low)) continue;
          this.addMatch(row, low, high, free1[j], free1[j + 1]);
          freeMm += (high - low) * width0 * drawn.pieceLength(piece0);
        }
      }
    }
    return freeMm;
  }

  pairGathered(): void {
    const { table, wanted, drawn, matches } = this;
    for (let m = 0; m < matches.length; m += FIELDS) {
      const row = matches[m];
      const deviation = matches[m + 5];
      drawn.pair(table.drawnSpan[row], table.drawnPiece[row], matches[m + 1], matches[m + 2], deviation);
      wanted.pair(table.wantedSpan[row], table.wantedPiece[row], matches[m + 3], matches[m + 4], deviation);
      if (deviation > this.deviation) this.deviation = deviation;
    }
  }

  private addMatch(row: number, low: number, high: number, from1: number, to1: number): void {
    const { table } = this;
    const from0 = table.from0[row];
    const width0 = table.to0[row] - from0;
    const offset = table.offsetFrom[row];
    const slope = table.offsetTo[row] - offset;
    const deviation = Math.max(Math.abs(offset + slope * low), Math.abs(offset + slope * high));
    this.matches.push(row, from0 + width0 * low, from0 + width0 * high, from1, to1, deviation);
  }
}
