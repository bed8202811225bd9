import type { Drawing } from '../drawing/drawing.js';
import type { Marks } from './marks.js';

/** Edges before repeats are looked for: pieces of strokes between vertices; see Network for the columns. */
export interface Spans {
  count: number;
  stroke: number[];
  startSegment: number[];
  startT: number[];
  endSegment: number[];
  endT: number[];
  startVertex: number[];
  endVertex: number[];
}

export function noSpans(): Spans {
  return {
    count: 0,
    stroke: [],
    startSegment: [],
    startT: [],
    endSegment: [],
    endT: [],
    startVertex: [],
    endVertex: [],
  };
}

export function addSpan(
  spans: Spans,
  stroke: number,
  from: { segment: number; t: number; vertex: number },
  to: { segment: number; t: number; vertex: number },
): void {
  spans.count++;
  spans.stroke.push(stroke);
  spans.startSegment.push(from.segment);
  spans.startT.push(from.t);
  spans.endSegment.push(to.segment);
  spans.endT.push(to.t);
  spans.startVertex.push(from.vertex);
  spans.endVertex.push(to.vertex);
}

/**
 * Cuts each stroke at its marks. Marks on the same place of a stroke count once, and a split at the
 * start or end of the stroke itself cuts nothing. O(m log m) for m marks.
 */
export function cutAtMarks(
  marks: Marks,
  vertexOfMark: Int32Array,
  drawing: Drawing,
  strokes: Uint32Array,
): Spans {
  const { dot } = drawing.strokes;
  const { segment, t } = marks;
  const marksOf = new Map<number, number[]>();
  for (let m = 0; m < marks.count; m++) {
    const list = marksOf.get(marks.stroke[m]);
    if (list) list.push(m);
    else marksOf.set(marks.stroke[m], [m]);
  }
  const spans = noSpans();
  const place = (m: number) => ({ segment: segment[m], t: t[m], vertex: vertexOfMark[m] });
  for (const s of strokes) {
    if (dot[s]) continue;
    const list = marksOf.get(s)!;
    const [start, end] = [list[0], list[1]];
    const inner = list.slice(2).sort((a, b) => segment[a] - segment[b] || t[a] - t[b]);
    let before = start;
    for (const m of [...inner, end]) {
      const samePlace = segment[m] === segment[before] && t[m] === t[before];
      if (samePlace) continue;
      addSpan(spans, s, place(before), place(m));
      before = m;
    }
  }
  return spans;
}
