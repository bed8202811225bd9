import type { Drawing } from '../drawing/drawing.js';
import { derivativeAt, pointAt } from '../geometry/evaluate.js';
import { segmentLength } from '../geometry/length.js';
import { findComponents } from './components.js';
import { splitWhereLinesCross } from './crossings.js';
import { sortDots } from './dots.js';
import { addEntries } from './entries.js';
import { strokeEnds } from './marks.js';
import type { Network, NetworkOptions } from './network.js';
import { splitWhereLinesOverlap } from './overlaps.js';
import { cutIntoPieces } from './pieces.js';
import { findRepeats } from './repeats.js';
import { splitWhereJointsPart } from './sharedJoints.js';
import { snapMarks } from './snap.js';
import { addSpan, cutAtMarks, noSpans, type Spans } from './spans.js';
import { splitWhereEndsTouch } from './touches.js';
import { walkSpan } from './walkSpan.js';

/**
 * Turns some strokes of a drawing (those of one pen) into a network: ends snapped, strokes split where
 * ends touch them, repeats left out, closed curves given places to enter, dots kept. O(n log n) in
 * strokes and flattened pieces for bounded crowding.
 */
export function buildNetwork(drawing: Drawing, strokes: Uint32Array, options: NetworkOptions): Network {
  const { segments } = drawing.strokes;
  const lengthOfPiece = (i: number, t0: number, t1: number) => segmentLength(segments, i, t0, t1);

  const pieces = cutIntoPieces(drawing, strokes, options.accuracyMm);
  const marks = strokeEnds(drawing, strokes);
  if (options.junctions !== 'ends') {
    splitWhereEndsTouch(marks, drawing, pieces, options.snapMm);
    splitWhereJointsPart(marks, drawing, strokes);
    if (options.repeats === 'once') {
      splitWhereLinesOverlap(marks, drawing, pieces, options.repeatToleranceMm, options.snapMm);
    }
  }
  const crossings =
    options.junctions === 'crossing' ? splitWhereLinesCross(marks, drawing, pieces, options.snapMm) : 0;
  const snapped = snapMarks(marks, options.snapMm);
  const spans = cutAtMarks(marks, snapped, drawing, strokes, options.snapMm);

  const lengthMm = spanLengths(spans, lengthOfPiece);
  const repeated =
    options.repeats === 'once'
      ? findRepeats(spans, drawing, lengthMm, options.repeatToleranceMm)
      : new Uint8Array(spans.count);
  let repeatedMm = 0;
  for (let e = 0; e < spans.count; e++) if (repeated[e]) repeatedMm += lengthMm[e];

  const vertexX = Array.from(snapped.vertexX);
  const vertexY = Array.from(snapped.vertexY);
  const joined = options.junctions === 'crossing';
  const edges = addEntries(without(spans, repeated), drawing, lengthOfPiece, vertexX, vertexY, joined);

  const dots = sortDots(drawing, strokes, pieces, options);
  for (const stroke of dots.kept) {
    const segment = drawing.strokes.first[stroke];
    const o = segments.offset[segment];
    const vertex = vertexX.length;
    vertexX.push(segments.data[o]);
    vertexY.push(segments.data[o + 1]);
    addSpan(edges, stroke, { segment, t: 0, vertex }, { segment, t: 1, vertex });
  }

  const halfEdgeVertex = new Int32Array(2 * edges.count);
  for (let e = 0; e < edges.count; e++) {
    halfEdgeVertex[2 * e] = edges.startVertex[e];
    halfEdgeVertex[2 * e + 1] = edges.endVertex[e];
  }
  return {
    vertexCount: vertexX.length,
    vertexX: Float64Array.from(vertexX),
    vertexY: Float64Array.from(vertexY),
    edgeCount: edges.count,
    halfEdgeVertex,
    halfEdgeDirection: directions(edges, drawing),
    edgeStroke: Uint32Array.from(edges.stroke),
    startSegment: Uint32Array.from(edges.startSegment),
    startT: Float64Array.from(edges.startT),
    endSegment: Uint32Array.from(edges.endSegment),
    endT: Float64Array.from(edges.endT),
    edgeLengthMm: spanLengths(edges, lengthOfPiece),
    ...findComponents(vertexX.length, halfEdgeVertex),
    repeatedMm,
    snapMaxMm: snapped.snapMaxMm,
    dotsOnLines: dots.onLines,
    repeatedDots: dots.repeated,
    crossings,
  };
}

function spanLengths(
  spans: Spans,
  lengthOfPiece: (i: number, t0: number, t1: number) => number,
): Float64Array {
  const lengths = new Float64Array(spans.count);
  for (let e = 0; e < spans.count; e++) {
    let sum = 0;
    walkSpan(spans.startSegment[e], spans.startT[e], spans.endSegment[e], spans.endT[e], (i, t0, t1) => {
      sum += lengthOfPiece(i, t0, t1);
    });
    lengths[e] = sum;
  }
  return lengths;
}

function without(spans: Spans, leftOut: Uint8Array): Spans {
  const kept = noSpans();
  for (let e = 0; e < spans.count; e++) {
    if (leftOut[e]) continue;
    addSpan(
      kept,
      spans.stroke[e],
      { segment: spans.startSegment[e], t: spans.startT[e], vertex: spans.startVertex[e] },
      { segment: spans.endSegment[e], t: spans.endT[e], vertex: spans.endVertex[e] },
    );
  }
  return kept;
}

/** Unit tangents leaving both ends of every span; where the derivative vanishes, the way to a near point. */
function directions(spans: Spans, drawing: Drawing): Float64Array {
  const { segments } = drawing.strokes;
  const out = new Float64Array(4 * spans.count);
  const d = new Float64Array(2);
  const a = new Float64Array(2);
  const b = new Float64Array(2);
  const set = (h: number, x: number, y: number): boolean => {
    const size = Math.sqrt(x * x + y * y);
    if (!(size > 0)) return false;
    out[2 * h] = x / size;
    out[2 * h + 1] = y / size;
    return true;
  };
  const leave = (h: number, segment: number, t: number, towards: number) => {
    derivativeAt(segments, segment, t, d);
    const sign = towards > t ? 1 : -1;
    if (set(h, sign * d[0], sign * d[1])) return;
    pointAt(segments, segment, t, a);
    pointAt(segments, segment, t + (towards - t) / 64, b);
    set(h, b[0] - a[0], b[1] - a[1]);
  };
  for (let e = 0; e < spans.count; e++) {
    const [s0, t0] = [spans.startSegment[e], spans.startT[e]];
    let [s1, t1] = [spans.endSegment[e], spans.endT[e]];
    if (t1 === 0 && s1 > s0) [s1, t1] = [s1 - 1, 1];
    leave(2 * e, s0, t0, s1 === s0 ? t1 : 1);
    leave(2 * e + 1, s1, t1, s1 === s0 ? t0 : 0);
  }
  return out;
}
