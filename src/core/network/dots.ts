import Flatbush from 'flatbush';
import type { Drawing } from '../drawing/drawing.js';
import { nearestOnSegment } from '../geometry/nearest.js';
import type { NetworkOptions } from './network.js';
import type { Pieces } from './pieces.js';

export interface Dots {
  /** Strokes that stay as dots. */
  readonly kept: number[];
  /** Dots that a line of the same pen passes over, within the repeat tolerance: drawn with it. */
  readonly onLines: number;
  /** Dots that stand on another and are drawn with that. */
  readonly repeated: number;
}

/**
 * Sorts the dots: one on a line is drawn with the line; one that repeats another (within the repeat
 * tolerance) is drawn once unless repeats are kept. Dots are never snapped: each keeps its exact place.
 */
export function sortDots(
  drawing: Drawing,
  strokes: Uint32Array,
  pieces: Pieces,
  options: NetworkOptions,
): Dots {
  const { first, dot, segments } = drawing.strokes;
  const all = Array.from(strokes).filter((s) => dot[s]);
  const x = all.map((s) => segments.data[segments.offset[first[s]]]);
  const y = all.map((s) => segments.data[segments.offset[first[s]] + 1]);
  const offLine: number[] = [];
  let onLines = 0;
  for (let i = 0; i < all.length; i++) {
    if (isOnLine(x[i], y[i], drawing, pieces, options.repeatToleranceMm)) onLines++;
    else offLine.push(i);
  }
  const single =
    options.repeats === 'once' ? withoutRepeats(offLine, x, y, options.repeatToleranceMm) : offLine;
  return { kept: single.map((i) => all[i]), onLines, repeated: offLine.length - single.length };
}

function isOnLine(x: number, y: number, drawing: Drawing, pieces: Pieces, toleranceMm: number): boolean {
  const reach = toleranceMm + pieces.chordErrorMm;
  const found = pieces.index?.search(x - reach, y - reach, x + reach, y + reach) ?? [];
  const { segments } = drawing.strokes;
  return found.some((p) => {
    const near = nearestOnSegment(segments, pieces.segment[p], x, y, pieces.t0[p], pieces.t1[p]);
    return near.distance <= toleranceMm;
  });
}

function withoutRepeats(dots: number[], x: number[], y: number[], toleranceMm: number): number[] {
  if (dots.length < 2) return dots;
  const index = new Flatbush(dots.length);
  for (const i of dots) index.add(x[i], y[i], x[i], y[i]);
  index.finish();
  const dropped = new Uint8Array(dots.length);
  for (let a = 0; a < dots.length; a++) {
    if (dropped[a]) continue;
    const i = dots[a];
    const [x0, y0] = [x[i], y[i]];
    for (const b of index.search(x0 - toleranceMm, y0 - toleranceMm, x0 + toleranceMm, y0 + toleranceMm)) {
      if (b <= a) continue;
      const dx = x[dots[b]] - x0;
      const dy = y[dots[b]] - y0;
      if (dx * dx + dy * dy <= toleranceMm * toleranceMm) dropped[b] = 1;
    }
  }
  return dots.filter((_, a) => !dropped[a]);
}
