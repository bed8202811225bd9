import Flatbush from 'flatbush';
import type { Drawing } from '../drawing/drawing.js';
import { chordEnds, pointAt } from '../geometry/evaluate.js';
import { flattenSegment } from '../geometry/flatten.js';

/**
 * The strokes cut into short straight pieces with a box index over them. Piece p is the chord of
 * segment `segment[p]` from `t0[p]` to `t1[p]`; the pieces of a stroke follow each other.
 */
export interface Pieces {
  readonly count: number;
  readonly stroke: number[];
  readonly segment: number[];
  readonly t0: number[];
  readonly t1: number[];
  readonly index: Flatbush | null;
  /** How far a curve may lie from its chord, mm: boxes must be searched that much wider. */
  readonly chordErrorMm: number;
}

/**
 * Cuts the strokes (dots left out) at `chordErrorMm`. Pieces longer than four times the mean are cut
 * again, because a long diagonal box answers every search; this adds at most a quarter more pieces.
 */
export function cutIntoPieces(drawing: Drawing, strokes: Uint32Array, chordErrorMm: number): Pieces {
  const { first, dot, segments } = drawing.strokes;
  const at = new Float64Array(2);
  const raw = { stroke: [] as number[], segment: [] as number[], t0: [] as number[], t1: [] as number[] };
  const spread: number[] = [];
  let total = 0;
  for (const s of strokes) {
    if (dot[s]) continue;
    for (let i = first[s]; i < first[s + 1]; i++) {
      pointAt(segments, i, 0, at);
      let x0 = at[0];
      let y0 = at[1];
      let t0 = 0;
      flattenSegment(segments, i, 0, 1, chordErrorMm, (x, y, t) => {
        raw.stroke.push(s);
        raw.segment.push(i);
        raw.t0.push(t0);
        raw.t1.push(t);
        const size = Math.abs(x - x0) + Math.abs(y - y0);
        spread.push(size);
        total += size;
        x0 = x;
        y0 = y;
        t0 = t;
      });
    }
  }
  const longest = (4 * total) / Math.max(1, spread.length);
  const stroke: number[] = [];
  const segment: number[] = [];
  const t0: number[] = [];
  const t1: number[] = [];
  for (let p = 0; p < spread.length; p++) {
    const parts = longest > 0 ? Math.max(1, Math.ceil(spread[p] / longest)) : 1;
    const step = (raw.t1[p] - raw.t0[p]) / parts;
    for (let k = 0; k < parts; k++) {
      stroke.push(raw.stroke[p]);
      segment.push(raw.segment[p]);
      t0.push(raw.t0[p] + k * step);
      t1.push(k === parts - 1 ? raw.t1[p] : raw.t0[p] + (k + 1) * step);
    }
  }
  const count = stroke.length;
  let index: Flatbush | null = null;
  if (count > 0) {
    index = new Flatbush(count);
    const ends = new Float64Array(4);
    for (let p = 0; p < count; p++) {
      chordEnds(segments, segment[p], t0[p], t1[p], ends);
      const [x0, y0, x1, y1] = ends;
      index.add(Math.min(x0, x1), Math.min(y0, y1), Math.max(x0, x1), Math.max(y0, y1));
    }
    index.finish();
  }
  return { count, stroke, segment, t0, t1, index, chordErrorMm };
}
