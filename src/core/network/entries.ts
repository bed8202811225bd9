import type { Drawing } from '../drawing/drawing.js';
import { pointAt } from '../geometry/evaluate.js';
import { LINE } from '../geometry/segments.js';
import { addSpan, noSpans, type Spans } from './spans.js';
import { walkSpan } from './walkSpan.js';

/** A closed curve gets about this many places to enter it where its own segments give fewer. */
const FEW_ENTRIES = 8;
/** … and at most this many where it has more segments. */
const MANY_ENTRIES = 32;

interface Place {
  segment: number;
  t: number;
  atMm: number;
}

/**
 * Gives every curve that is closed and touches nothing else more vertices, so that a tour may enter it
 * where that is nearest: the joints of its segments, at most 32, spread evenly along its length; a curve
 * of few segments is also split inside its cubics and arcs, to about 8 pieces. Straight sides are not
 * split: their corners are the better places for a pen to start.
 *
 * The pieces are drawn as one line again where the tour does not lift between them. New vertices go at
 * the end of `vertexX` and `vertexY`.
 */
export function addEntries(
  spans: Spans,
  drawing: Drawing,
  lengthOfPiece: (segment: number, t0: number, t1: number) => number,
  vertexX: number[],
  vertexY: number[],
): Spans {
  const degree = new Int32Array(vertexX.length);
  for (let e = 0; e < spans.count; e++) {
    for (const v of [spans.startVertex[e], spans.endVertex[e]]) degree[v] = degree[v] + 1;
  }
  const out = noSpans();
  const at = new Float64Array(2);
  for (let e = 0; e < spans.count; e++) {
    const vertex = spans.startVertex[e];
    const start = { segment: spans.startSegment[e], t: spans.startT[e], vertex };
    const end = { segment: spans.endSegment[e], t: spans.endT[e], vertex: spans.endVertex[e] };
    const alone = vertex === end.vertex && degree[vertex] === 2;
    let before = start;
    for (const place of alone ? entryPlaces(start, end, drawing, lengthOfPiece) : []) {
      pointAt(drawing.strokes.segments, place.segment, place.t, at);
      const here = { segment: place.segment, t: place.t, vertex: vertexX.length };
      vertexX.push(at[0]);
      vertexY.push(at[1]);
      addSpan(out, spans.stroke[e], before, here);
      before = here;
    }
    addSpan(out, spans.stroke[e], before, end);
  }
  return out;
}

function entryPlaces(
  start: { segment: number; t: number },
  end: { segment: number; t: number },
  drawing: Drawing,
  lengthOfPiece: (segment: number, t0: number, t1: number) => number,
): Place[] {
  const { kind } = drawing.strokes.segments;
  const parts: { segment: number; t0: number; t1: number }[] = [];
  walkSpan(start.segment, start.t, end.segment, end.t, (segment, t0, t1) => parts.push({ segment, t0, t1 }));
  const split = parts.length < FEW_ENTRIES ? Math.ceil(FEW_ENTRIES / parts.length) : 1;
  const places: Place[] = [];
  let atMm = 0;
  for (const { segment, t0, t1 } of parts) {
    const pieces = kind[segment] === LINE ? 1 : split;
    for (let k = 0; k < pieces; k++) {
      const from = t0 + ((t1 - t0) * k) / pieces;
      const to = k === pieces - 1 ? t1 : t0 + ((t1 - t0) * (k + 1)) / pieces;
      places.push({ segment, t: from, atMm });
      atMm += lengthOfPiece(segment, from, to);
    }
  }
  places.shift();
  return places.length < MANY_ENTRIES ? places : spreadEvenly(places, atMm);
}

/** The places nearest to equal shares of the length. */
function spreadEvenly(places: Place[], lengthMm: number): Place[] {
  const chosen: Place[] = [];
  let i = 0;
  for (let k = 1; k < MANY_ENTRIES; k++) {
    const target = (lengthMm * k) / MANY_ENTRIES;
    while (
      i + 1 < places.length &&
      Math.abs(places[i + 1].atMm - target) <= Math.abs(places[i].atMm - target)
    ) {
      i++;
    }
    if (chosen[chosen.length - 1] !== places[i]) chosen.push(places[i]);
  }
  return chosen;
}
