import type { Side } from './side.js';
import { findThreads, type ThreadOverlap } from './threads.js';
import { fringeMm, type Tolerances } from './tolerances.js';

/** Crowds of hundreds of lines on one place are settled over several rounds. */
const MOST_ROUNDS = 64;

/**
 * Pairs what is drawn with what is wanted, point by point along their length: no point is used twice,
 * the pens are the same, and paired points are at most `matchMm` apart. So what is paired is a proof;
 * what is left over is looked at afterwards.
 *
 * The best threads go first. Among lines that all lie within the tolerance of each other any order
 * leaves nothing over. Where lines lie closer than two tolerances without all doing so, the length of
 * threads and the place of the corners decide; that is a choice, and could leave over what another
 * choice would not. Of a thread that is mostly used up, crumbs no longer than a fringe are left: they
 * would make a line drawn once too often look as if it were there for a reason. Returns the largest
 * deviation.
 */
export function pairAlongThreads(wanted: Side, drawn: Side, tolerances: Tolerances): number {
  let largest = 0;
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const { threads, crowded } = findThreads(wanted, drawn, tolerances);
    let progress = false;
    for (const thread of threads) {
      const matches = freeMatches(wanted, drawn, thread.overlaps);
      const free = matches.reduce((sum, m) => sum + m.lengthMm, 0);
      if (free < Math.min(thread.lengthMm / 2, fringeMm(0, tolerances))) continue;
      for (const match of matches) {
        const { overlap: o, deviation } = match;
        drawn.pair(o.drawnSpan, o.drawnPiece, match.from0, match.to0, deviation);
        wanted.pair(o.wantedSpan, o.wantedPiece, match.from1, match.to1, deviation);
        progress = true;
        if (deviation > largest) largest = deviation;
      }
    }
    if (!crowded || !progress) break;
  }
  return largest;
}

/** Opposite parts of an overlap that are free on both sides; from1 < to1. */
interface Match {
  readonly overlap: ThreadOverlap;
  readonly from0: number;
  readonly to0: number;
  readonly from1: number;
  readonly to1: number;
  readonly lengthMm: number;
  readonly deviation: number;
}

/**
 * What is free along a thread. Overlaps of one thread may share a little of a piece at its corners; so
 * what is found may be paired twice by a hair there, which pairing leaves as it is.
 */
function freeMatches(wanted: Side, drawn: Side, overlaps: readonly ThreadOverlap[]): Match[] {
  const matches: Match[] = [];
  for (const o of overlaps) {
    const width0 = o.to0 - o.from0;
    const width1 = o.to1 - o.from1;
    const opposed = width1 < 0;
    const slope = o.offsetTo - o.offsetFrom;
    const free0 = drawn.unpaired(o.drawnSpan, o.drawnPiece, o.from0, o.to0);
    for (let i = 0; i < free0.length; i += 2) {
      const a = o.from1 + ((free0[i] - o.from0) / width0) * width1;
      const b = o.from1 + ((free0[i + 1] - o.from0) / width0) * width1;
      const free1 = wanted.unpaired(o.wantedSpan, o.wantedPiece, opposed ? b : a, opposed ? a : b);
      for (let j = 0; j < free1.length; j += 2) {
        const s = (free1[j] - o.from1) / width1;
        const t = (free1[j + 1] - o.from1) / width1;
        const low = Math.max(0, Math.min(s, t));
        const high = Math.min(1, Math.max(s, t));
        if (!(high > low)) continue;
        matches.push({
          overlap: o,
          from0: o.from0 + width0 * low,
          to0: o.from0 + width0 * high,
          from1: free1[j],
          to1: free1[j + 1],
          lengthMm: (high - low) * width0 * drawn.pieceLength(o.drawnPiece),
          deviation: Math.max(Math.abs(o.offsetFrom + slope * low), Math.abs(o.offsetFrom + slope * high)),
        });
      }
    }
  }
  return matches;
}
