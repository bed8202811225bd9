import type { Drawing } from '../drawing/drawing.js';
import type { Pen } from '../drawing/pens.js';
import { pointAt } from '../geometry/evaluate.js';
import type { Network } from '../network/network.js';
import { walkSpan } from '../network/walkSpan.js';
import type { Tour } from '../tour/tour.js';
import type { Program } from './program.js';
import { RunBuilder } from './runBuilder.js';

export interface HomeRule {
  readonly homeX: number;
  readonly homeY: number;
  readonly endAtHome: boolean;
}

/** The tours of all pens, in order, as what the tool does. Linear in what is drawn. */
export function programFromTours(
  drawing: Drawing,
  pens: readonly Pen[],
  networks: readonly Network[],
  tours: readonly Tour[],
  home: HomeRule,
): Program {
  const runs = new RunBuilder(drawing.strokes.segments);
  const penOfRun: number[] = [];
  tours.forEach((tour, pen) => {
    for (let r = 0; r + 1 < tour.runFirst.length; r++) {
      const halfEdges = tour.halfEdges.subarray(tour.runFirst[r], tour.runFirst[r + 1]);
      drawRun(runs, drawing, networks[pen], halfEdges);
      runs.endRun();
      penOfRun.push(pen);
    }
  });
  return { ...runs.finish(), pen: Uint32Array.from(penOfRun), pens, ...home };
}

/** The drawing as it stands: within a pen each stroke is a run, in document order, as directed. */
export function programAsDrawn(
  drawing: Drawing,
  pens: readonly Pen[],
  strokesOfPen: readonly Uint32Array[],
  home: HomeRule,
): Program {
  const { first, dot, segments } = drawing.strokes;
  const runs = new RunBuilder(segments);
  const penOfRun: number[] = [];
  strokesOfPen.forEach((strokes, pen) => {
    for (const s of strokes) {
      const o = segments.offset[first[s]];
      if (dot[s]) runs.dot(segments.data[o], segments.data[o + 1]);
      else for (let i = first[s]; i < first[s + 1]; i++) runs.piece(i, 0, 1);
      runs.endRun();
      penOfRun.push(pen);
    }
  });
  return { ...runs.finish(), pen: Uint32Array.from(penOfRun), pens, ...home };
}

function drawRun(runs: RunBuilder, drawing: Drawing, network: Network, halfEdges: Int32Array): void {
  const { dot } = drawing.strokes;
  const { segments } = drawing.strokes;
  const at = new Float64Array(2);
  halfEdges.forEach((h, k) => {
    const e = h >> 1;
    const vertex = network.halfEdgeVertex[h];
    if (dot[network.edgeStroke[e]]) {
      runs.dot(network.vertexX[vertex], network.vertexY[vertex]);
      return;
    }
    const parts: [number, number, number][] = [];
    walkSpan(network.startSegment[e], network.startT[e], network.endSegment[e], network.endT[e], (i, a, b) =>
      parts.push([i, a, b]),
    );
    if (h & 1) {
      parts.reverse();
      for (const part of parts) [part[1], part[2]] = [part[2], part[1]];
    }
    const [segment, from] = parts[0];
    pointAt(segments, segment, from, at);
    // Two pieces of one curve meet on the curve itself: no way round by the vertex.
    if (k === 0 || !runs.standsAt(at[0], at[1])) {
      runs.reach(network.vertexX[vertex], network.vertexY[vertex]);
      runs.reach(at[0], at[1]);
    }
    for (const [i, a, b] of parts) runs.piece(i, a, b);
  });
  const last = halfEdges[halfEdges.length - 1];
  if (!dot[network.edgeStroke[last >> 1]]) {
    const vertex = network.halfEdgeVertex[last ^ 1];
    runs.reach(network.vertexX[vertex], network.vertexY[vertex]);
  }
}
