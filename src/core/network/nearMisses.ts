import type { Drawing } from '../drawing/drawing.js';
import { nearestOnSegment } from '../geometry/nearest.js';
import type { Network } from './network.js';
import { cutIntoPieces, type Pieces } from './pieces.js';
import { pointIndex } from './snap.js';
import { distance } from './strokePlace.js';

/** Ends that stop just short of another end or line: the gap, and where. */
export interface NearMiss {
  readonly gapMm: number;
  readonly x: number;
  readonly y: number;
}

/**
 * Loose ends (vertices of degree 1) with another vertex nearer than `reachMm` that is not the other end
 * of their own edge, or else with another stroke that near: most likely meant to meet, and left apart by
 * the snap distance. Each pair once, narrowest gap first. One search of each index for each loose end.
 */
export function findNearMisses(
  network: Network,
  drawing: Drawing,
  strokes: Uint32Array,
  reachMm: number,
  accuracyMm: number,
): NearMiss[] {
  const { vertexCount, vertexX, vertexY, halfEdgeVertex, edgeStroke } = network;
  if (vertexCount < 2) return [];
  const degree = new Int32Array(vertexCount);
  const halfEdgeTo = new Int32Array(vertexCount);
  halfEdgeVertex.forEach((v, h) => {
    degree[v]++;
    halfEdgeTo[v] = h;
  });
  const index = pointIndex(vertexX, vertexY);
  const pieces = cutIntoPieces(drawing, strokes, accuracyMm);
  const misses: NearMiss[] = [];
  const seen = new Set<number>();
  for (let v = 0; v < vertexCount; v++) {
    if (degree[v] !== 1) continue;
    const [x, y] = [vertexX[v], vertexY[v]];
    const across = halfEdgeVertex[halfEdgeTo[v] ^ 1];
    const near = index.neighbors(x, y, 1, reachMm, (u) => u !== v && u !== across);
    if (near.length > 0) {
      const u = near[0];
      const pair = Math.min(u, v) * vertexCount + Math.max(u, v);
      if (seen.has(pair)) continue;
      seen.add(pair);
      misses.push({ gapMm: distance(x, y, vertexX[u], vertexY[u]), x, y });
      continue;
    }
    const gapMm = gapToLine(drawing, pieces, x, y, edgeStroke[halfEdgeTo[v] >> 1], reachMm);
    if (gapMm <= reachMm) misses.push({ gapMm, x, y });
  }
  return misses.sort((a, b) => a.gapMm - b.gapMm || a.x - b.x || a.y - b.y);
}

/** Distance from a point to the nearest stroke but its own; beyond reach it may be anything larger. */
function gapToLine(
  drawing: Drawing,
  pieces: Pieces,
  x: number,
  y: number,
  own: number,
  reachMm: number,
): number {
  const reach = reachMm + pieces.chordErrorMm;
  const isOther = (p: number) => pieces.stroke[p] !== own;
  let least = Number.POSITIVE_INFINITY;
  for (const p of pieces.index?.search(x - reach, y - reach, x + reach, y + reach, isOther) ?? []) {
    const { segment, t0, t1 } = pieces;
    const near = nearestOnSegment(drawing.strokes.segments, segment[p], x, y, t0[p], t1[p]);
    least = Math.min(least, near.distance);
  }
  return least;
}
