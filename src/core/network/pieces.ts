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
  readonly stroke: Uint32Array;
  readonly segment: Uint32Array;
  readonly t0: Float64Array;
  readonly t1: Float64Array;
  readonly index: Flatbush | null;
  /** How far a curve may lie from its chord, mm: boxes must be searched that much wider. */
  readonly chordErrorMm: number;
}

/** Chords as they come, and how far each reaches in x and y together. */
interface RawPieces {
  readonly stroke: number[];
  readonly segment: number[];
  readonly t0: number[];
  readonly t1: number[];
  readonly spread: number[];
}

/**
 * Cuts the strokes (dots left out) at `chordErrorMm`. Pieces longer than four times the mean are cut
 * again, because a long diagonal box answers every search; this adds at most a quarter more pieces.
 */
export function cutIntoPieces(drawing: Drawing, strokes: Uint32Array, chordErrorMm: number): Pieces {
  const columns = evenedOut(chordsOf(drawing, strokes, chordErrorMm));
  return { ...columns, index: indexOf(columns, drawing), chordErrorMm };
}

function chordsOf(drawing: Drawing, strokes: Uint32Array, chordErrorMm: number): RawPieces {
  const { first, dot, segments } = drawing.strokes;
  const raw: RawPieces = { stroke: [], segment: [], t0: [], t1: [], spread: [] };
  const at = new Float64Array(2);
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
        raw.spread.push(Math.abs(x - x0) + Math.abs(y - y0));
        x0 = x;
        y0 = y;
        t0 = t;
      });
    }
  }
  return raw;
}

type Columns = Omit<Pieces, 'index' | 'chordErrorMm'>;

function evenedOut(raw: RawPieces): Columns {
  const { spread } = raw;
  let total = 0;
  for (const size of spread) total += size;
  const longest = (4 * total) / Math.max(1, spread.length);
  const partsOf = (p: number): number => (longest > 0 ? Math.max(1, Math.ceil(spread[p] / longest)) : 1);
  let count = 0;
  for (let p = 0; p < spread.length; p++) count += partsOf(p);
  const stroke = new Uint32Array(count);
  const segment = new Uint32Array(count);
  const t0 = new Float64Array(count);
  const t1 = new Float64Array(count);
  let at = 0;
  for (let p = 0; p < spread.length; p++) {
    const parts = partsOf(p);
    const step = (raw.t1[p] - raw.t0[p]) / parts;
    for (let k = 0; k < parts; k++, at++) {
      stroke[at] = raw.stroke[p];
      segment[at] = raw.segment[p];
      t0[at] = raw.t0[p] + k * step;
      t1[at] = k === parts - 1 ? raw.t1[p] : raw.t0[p] + (k + 1) * step;
    }
  }
  return { count, stroke, segment, t0, t1 };
}

function indexOf({ count, segment, t0, t1 }: Columns, drawing: Drawing): Flatbush | null {
  if (count === 0) return null;
  const { segments } = drawing.strokes;
  const ends = new Float64Array(4);
  const index = new Flatbush(count);
  for (let p = 0; p < count; p++) {
    chordEnds(segments, segment[p], t0[p], t1[p], ends);
    const [x0, y0, x1, y1] = ends;
    index.add(Math.min(x0, x1), Math.min(y0, y1), Math.max(x0, x1), Math.max(y0, y1));
  }
  index.finish();
  return index;
}
