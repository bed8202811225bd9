import type { Intervals } from './intervals.js';
import type { Side } from './side.js';
import { findThreads, type ThreadOverlap } from './threads.js';
import type { Tolerances } from './tolerances.js';

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
 * choice would not. Returns the largest deviation.
 */
export function pairAlongThreads(wanted: Side, drawn: Side, tolerances: Tolerances): number {
  let largest = 0;
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const { threads, crowded } = findThreads(wanted, drawn, tolerances);
    let progress = false;
    for (const thread of threads) {
      for (const overlap of thread.overlaps) {
        const deviation = pairOverlap(wanted, drawn, overlap);
        if (deviation < 0) continue;
        progress = true;
        if (deviation > largest) largest = deviation;
      }
    }
    if (!crowded || !progress) break;
  }
  return largest;
}

/** Pairs what is free on both sides of an overlap; −1 where nothing is, else the largest deviation there. */
function pairOverlap(wanted: Side, drawn: Side, o: ThreadOverlap): number {
  const width0 = o.to0 - o.from0;
  const width1 = o.to1 - o.from1;
  const opposed = width1 < 0;
  const free0 = drawn.unpaired(o.drawnSpan, o.drawnPiece, o.from0, o.to0);
  let largest = -1;
  for (let i = 0; i < free0.length; i += 2) {
    const a = o.from1 + ((free0[i] - o.from0) / width0) * width1;
    const b = o.from1 + ((free0[i + 1] - o.from0) / width0) * width1;
    const free1: Intervals = wanted.unpaired(o.wantedSpan, o.wantedPiece, opposed ? b : a, opposed ? a : b);
    for (let j = 0; j < free1.length; j += 2) {
      const s = (free1[j] - o.from1) / width1;
      const t = (free1[j + 1] - o.from1) / width1;
      const low = Math.max(0, Math.min(s, t));
      const high = Math.min(1, Math.max(s, t));
      if (!(high > low)) continue;
      const slope = o.offsetTo - o.offsetFrom;
      const deviation = Math.max(Math.abs(o.offsetFrom + slope * low), Math.abs(o.offsetFrom + slope * high));
      drawn.pair(o.drawnSpan, o.drawnPiece, o.from0 + width0 * low, o.from0 + width0 * high, deviation);
      wanted.pair(o.wantedSpan, o.wantedPiece, free1[j], free1[j + 1], deviation);
      if (deviation > largest) largest = deviation;
    }
  }
  return largest;
}
