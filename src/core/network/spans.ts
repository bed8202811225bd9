import type { Drawing } from '../drawing/drawing.js';
import { segmentLength } from '../geometry/length.js';
import type { Marks } from './marks.js';
import type { Snapped } from './snap.js';
import { walkSpan } from './walkSpan.js';

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
 * Cuts each stroke at its marks. Marks of a stroke that follow each other within twice the snap distance
 * and went to one vertex count once: the stroke's own end, or else the mark nearest to the vertex.
 * Otherwise the tool would leave the vertex for a hair's breadth and come back over the same place.
 * O(m log m) for m marks.
 */
export function cutAtMarks(
  marks: Marks,
  snapped: Snapped,
  drawing: Drawing,
  strokes: Uint32Array,
  snapMm: number,
): Spans {
  const { dot, segments } = drawing.strokes;
  const { segment, t } = marks;
  const { vertexOfMark } = snapped;
  const marksOf = new Map<number, number[]>();
  for (let m = 0; m < marks.count; m++) {
    const list = marksOf.get(marks.stroke[m]);
    if (list) list.push(m);
    else marksOf.set(marks.stroke[m], [m]);
  }
  const spans = noSpans();
  const place = (m: number) => ({ segment: segment[m], t: t[m], vertex: vertexOfMark[m] });
  const apart = (m: number, n: number) => {
    let lengthMm = 0;
    walkSpan(segment[m], t[m], segment[n], t[n], (i, t0, t1) => {
      if (lengthMm <= 2 * snapMm) lengthMm += segmentLength(segments, i, t0, t1);
    });
    return lengthMm;
  };
  for (const s of strokes) {
    if (dot[s]) continue;
    const [start, end, ...splits] = marksOf.get(s)!;
    splits.sort((a, b) => segment[a] - segment[b] || t[a] - t[b]);
    const kept = [start];
    for (const m of splits) {
      const last = kept[kept.length - 1];
      if (vertexOfMark[last] !== vertexOfMark[m] || apart(last, m) > 2 * snapMm) kept.push(m);
      else if (last !== start && offVertex(marks, snapped, m) < offVertex(marks, snapped, last)) {
        kept[kept.length - 1] = m;
      }
    }
    const last = kept[kept.length - 1];
    if (last !== start && vertexOfMark[last] === vertexOfMark[end] && apart(last, end) <= 2 * snapMm)
      kept.pop();
    kept.push(end);
    for (let k = 1; k < kept.length; k++) addSpan(spans, s, place(kept[k - 1]), place(kept[k]));
  }
  return spans;
}

/** Squared distance of a mark from its vertex. */
function offVertex(marks: Marks, { vertexX, vertexY, vertexOfMark }: Snapped, m: number): number {
  const dx = marks.x[m] - vertexX[vertexOfMark[m]];
  const dy = marks.y[m] - vertexY[vertexOfMark[m]];
  return dx * dx + dy * dy;
}
