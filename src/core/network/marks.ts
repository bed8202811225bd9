import type { Drawing } from '../drawing/drawing.js';
import { pointAt } from '../geometry/evaluate.js';

/**
 * Marks: the places on strokes where an edge starts or ends, one column per property. A mark is a
 * place on a stroke (segment, t) with its position; `ends` is how many edge ends will meet there:
 * 1 at a stroke's own end, 2 where a stroke is split.
 */
export interface Marks {
  count: number;
  stroke: number[];
  segment: number[];
  t: number[];
  x: number[];
  y: number[];
  ends: number[];
}

/** Both ends of every stroke that is not a dot, in order: marks 2i and 2i + 1 of the i-th such stroke. */
export function strokeEnds(drawing: Drawing, strokes: Uint32Array): Marks {
  const { first, dot, segments } = drawing.strokes;
  const marks: Marks = { count: 0, stroke: [], segment: [], t: [], x: [], y: [], ends: [] };
  for (const s of strokes) {
    if (dot[s]) continue;
    const from = first[s];
    const last = first[s + 1] - 1;
    const o = segments.offset[from];
    const p = segments.offset[last];
    push(marks, s, from, 0, segments.data[o], segments.data[o + 1], 1);
    push(marks, s, last, 1, segments.data[p + 2], segments.data[p + 3], 1);
  }
  return marks;
}

/** Adds a split of a stroke; a place at the end of one segment is named as the start of the next. */
export function addSplit(marks: Marks, drawing: Drawing, stroke: number, segment: number, t: number): void {
  const at = new Float64Array(2);
  const next = t === 1 && segment + 1 < drawing.strokes.first[stroke + 1];
  const seg = next ? segment + 1 : segment;
  const u = next ? 0 : t;
  pointAt(drawing.strokes.segments, seg, u, at);
  push(marks, stroke, seg, u, at[0], at[1], 2);
}

function push(m: Marks, stroke: number, segment: number, t: number, x: number, y: number, ends: number) {
  m.count++;
  m.stroke.push(stroke);
  m.segment.push(segment);
  m.t.push(t);
  m.x.push(x);
  m.y.push(y);
  m.ends.push(ends);
}
