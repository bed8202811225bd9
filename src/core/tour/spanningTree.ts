import { DisjointSet } from '../structures/disjointSet.js';
import { connectorCost, distance, type TourGraph } from './problem.js';

/**
 * A minimum spanning tree of the components, joined vertex to vertex (Kruskal 1956 on the Delaunay
 * pairs, which hold one), home left out, as u0 v0 u1 v1 ….
 */
export function componentTree(graph: TourGraph, delaunay: Int32Array): Int32Array {
  const count = delaunay.length / 2;
  const length = new Float64Array(count);
  const order = new Uint32Array(count);
  for (let p = 0; p < count; p++) {
    order[p] = p;
    length[p] = distance(graph, delaunay[2 * p], delaunay[2 * p + 1]);
  }
  order.sort((a, b) => length[a] - length[b] || a - b);
  const sets = new DisjointSet(graph.componentCount);
  const tree: number[] = [];
  for (const p of order) {
    const u = delaunay[2 * p];
    const v = delaunay[2 * p + 1];
    if (sets.union(graph.component[u], graph.component[v])) tree.push(u, v);
  }
  return Int32Array.from(tree);
}

export function connectorsCost(graph: TourGraph, connectors: ArrayLike<number>): number {
  let sum = 0;
  for (let c = 0; c < connectors.length; c += 2) {
    sum += connectorCost(graph, connectors[c], connectors[c + 1]);
  }
  return sum;
}
