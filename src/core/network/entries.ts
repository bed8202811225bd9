import type { Drawing } from '../drawing/drawing.js';
import { pointAt } from '../geometry/evaluate.js';
import { LINE } from '../geometry/segments.js';
import { findComponents } from './components.js';
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
 * split: their corners are the better places for a pen to start. With `alsoJoined` the same goes for
 * strokes that hang together and have no odd vertex, each split at as many places.
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
  alsoJoined: boolean,
): Spans {
  const isOpen = alsoJoined ? evenSpans(spans, vertexX.length) : loneSpans(spans, vertexX.length);
  const spansOfStroke = new Map<number, number>();
  for (const stroke of spans.stroke) spansOfStroke.set(stroke, (spansOfStroke.get(stroke) ?? 0) + 1);
  const out = noSpans();
  const at = new Float64Array(2);
  for (let e = 0; e < spans.count; e++) {
    const stroke = spans.stroke[e];
    const start = { segment: spans.startSegment[e], t: spans.startT[e], vertex: spans.startVertex[e] };
    const end = { segment: spans.endSegment[e], t: spans.endT[e], vertex: spans.endVertex[e] };
    const share = 1 / (spansOfStroke.get(stroke) ?? 1);
    let before = start;
    for (const place of isOpen[e] ? entryPlaces(start, end, share, drawing, lengthOfPiece) : []) {
      pointAt(drawing.strokes.segments, place.segment, place.t, at);
      const here = { segment: place.segment, t: place.t, vertex: vertexX.length };
      vertexX.push(at[0]);
      vertexY.push(at[1]);
      addSpan(out, stroke, before, here);
      before = here;
    }
    addSpan(out, stroke, before, end);
  }
  return out;
}

/** 1 for each span that ends where it begins and meets nothing else there. */
function loneSpans({ count, startVertex, endVertex }: Spans, vertexCount: number): Uint8Array {
  const degree = new Int32Array(vertexCount);
  for (let e = 0; e < count; e++) {
    degree[startVertex[e]]++;
    degree[endVertex[e]]++;
  }
  return Uint8Array.from({ length: count }, (_, e) =>
    startVertex[e] === endVertex[e] && degree[startVertex[e]] === 2 ? 1 : 0,
  );
}

/** 1 for each span whose component has no odd vertex. */
function evenSpans(spans: Spans, vertexCount: number): Uint8Array {
  const ends = new Int32Array(2 * spans.count);
  for (let e = 0; e < spans.count; e++) {
    ends[2 * e] = spans.startVertex[e];
    ends[2 * e + 1] = spans.endVertex[e];
  }
  const { componentCount, componentOfVertex, oddVertices } = findComponents(vertexCount, ends);
  const isOdd = new Uint8Array(componentCount);
  for (const v of oddVertices) isOdd[componentOfVertex[v]] = 1;
  return Uint8Array.from(
    { length: spans.count },
    (_, e) => 1 - isOdd[componentOfVertex[spans.startVertex[e]]],
  );
}

/** `share` is the part of its stroke that this piece is, more or less. */
function entryPlaces(
  start: { segment: number; t: number },
  end: { segment: number; t: number },
  share: number,
  drawing: Drawing,
  lengthOfPiece: (segment: number, t0: number, t1: number) => number,
): Place[] {
  const { kind } = drawing.strokes.segments;
  const parts: { segment: number; t0: number; t1: number }[] = [];
  walkSpan(start.segment, start.t, end.segment, end.t, (segment, t0, t1) => parts.push({ segment, t0, t1 }));
  const few = Math.ceil(FEW_ENTRIES * share);
  const many = Math.ceil(MANY_ENTRIES * share);
  const split = parts.length < few ? Math.ceil(few / parts.length) : 1;
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
  return places.length < many ? places : spreadEvenly(places, atMm, many);
}

/** The places nearest to equal shares of the length. */
function spreadEvenly(places: Place[], lengthMm: number, many: number): Place[] {
  const chosen: Place[] = [];
  let i = 0;
  for (let k = 1; k < many; k++) {
    const target = (lengthMm * k) / many;
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
