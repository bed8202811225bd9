import type { Network } from './network.js';
import { pointIndex } from './snap.js';

/** Ends that stop just short of another end: the gap, and where. */
export interface NearMiss {
  readonly gapMm: number;
  readonly x: number;
  readonly y: number;
}

/**
 * Loose ends (vertices of degree 1) with another vertex nearer than `reachMm` that is not the other end
 * of their own edge: most likely meant to meet, and left apart by the snap distance. Each pair once,
 * narrowest gap first. One search of the index for each loose end.
 */
export function findNearMisses(network: Network, reachMm: number): NearMiss[] {
  const { vertexCount, vertexX, vertexY, halfEdgeVertex } = network;
  if (vertexCount < 2) return [];
  const degree = new Int32Array(vertexCount);
  const across = new Int32Array(vertexCount);
  halfEdgeVertex.forEach((v, h) => {
    degree[v]++;
    across[v] = halfEdgeVertex[h ^ 1];
  });
  const index = pointIndex(vertexX, vertexY);
  const misses: NearMiss[] = [];
  const seen = new Set<number>();
  for (let v = 0; v < vertexCount; v++) {
    if (degree[v] !== 1) continue;
    const near = index.neighbors(vertexX[v], vertexY[v], 1, reachMm, (u) => u !== v && u !== across[v]);
    if (near.length === 0) continue;
    const u = near[0];
    const pair = Math.min(u, v) * vertexCount + Math.max(u, v);
    if (seen.has(pair)) continue;
    seen.add(pair);
    const dx = vertexX[u] - vertexX[v];
    const dy = vertexY[u] - vertexY[v];
    misses.push({ gapMm: Math.sqrt(dx * dx + dy * dy), x: vertexX[v], y: vertexY[v] });
  }
  return misses.sort((a, b) => a.gapMm - b.gapMm || a.x - b.x || a.y - b.y);
}
