import Delaunator from 'delaunator';
import Flatbush from 'flatbush';
import { distance, type TourGraph } from './problem.js';

/**
 * Pairs of vertices that are neighbours in the Delaunay triangulation of the drawing's vertices
 * (home left out), as u0 v0 u1 v1 …. For any split of the vertices in two the shortest pair across is among them,
 * hence also a minimum spanning tree of the components (Preparata & Shamos 1985, §5.3, from memory).
 *
 * Coincident vertices are linked to the first of them; points in line are linked in order.
 */
export function delaunayPairs(graph: TourGraph): Int32Array {
  const n = graph.home;
  const { x, y } = graph;
  const order = Array.from({ length: n }, (_, i) => i).sort((a, b) => x[a] - x[b] || y[a] - y[b] || a - b);
  const pairs: number[] = [];
  const single: number[] = [];
  for (const v of order) {
    const last = single[single.length - 1];
    if (last !== undefined && x[last] === x[v] && y[last] === y[v]) pairs.push(last, v);
    else single.push(v);
  }
  const coords = new Float64Array(2 * single.length);
  single.forEach((v, i) => {
    coords[2 * i] = x[v];
    coords[2 * i + 1] = y[v];
  });
  const { triangles, halfedges } = new Delaunator(coords);
  if (triangles.length === 0) {
    for (let i = 1; i < single.length; i++) pairs.push(single[i - 1], single[i]);
  }
  for (let t = 0; t < triangles.length; t++) {
    if (halfedges[t] > t) continue;
    const to = triangles[t % 3 === 2 ? t - 2 : t + 1];
    pairs.push(single[triangles[t]], single[to]);
  }
  return Int32Array.from(pairs);
}

/** Neighbours worth a connector: those of v are `near[first[v]]` up to `near[first[v + 1]]`, nearest first. */
export interface NearVertices {
  readonly first: Uint32Array;
  readonly near: Int32Array;
}

/** Places of one other component among the neighbours of a vertex: more would crowd out the others. */
const PER_COMPONENT = 2;

/**
 * For every vertex the Delaunay neighbours and the nearest few, at most `limit` of them. Two vertices of
 * one component are neighbours only where both are odd or one is home: any other connector between them
 * could be left out or bent to an odd vertex. O(n log n).
 */
export function nearVertices(graph: TourGraph, delaunay: Int32Array, limit: number): NearVertices {
  const n = graph.vertexCount;
  const isOdd = new Uint8Array(n);
  for (const v of graph.odd) isOdd[v] = 1;
  const worthwhile = (u: number, v: number) =>
    graph.component[u] !== graph.component[v] || (isOdd[u] === 1 && isOdd[v] === 1);

  const lists: number[][] = Array.from({ length: n }, () => []);
  for (let p = 0; p < delaunay.length; p += 2) {
    const u = delaunay[p];
    const v = delaunay[p + 1];
    if (!worthwhile(u, v)) continue;
    lists[u].push(v);
    lists[v].push(u);
  }
  const index = new Flatbush(graph.home + 1);
  for (let v = 0; v <= graph.home; v++) index.add(graph.x[v], graph.y[v], graph.x[v], graph.y[v]);
  index.finish();
  const first = new Uint32Array(n + 1);
  const near: number[] = [];
  for (let v = 0; v <= graph.home; v++) {
    const list = lists[v];
    for (const u of index.neighbors(graph.x[v], graph.y[v], 3 * limit)) {
      if (u !== v && worthwhile(u, v) && !list.includes(u)) list.push(u);
    }
    list.sort((a, b) => distance(graph, v, a) - distance(graph, v, b) || a - b);
    const taken = new Map<number, number>();
    for (const u of list) {
      if (near.length - first[v] === limit) break;
      const there = taken.get(graph.component[u]) ?? 0;
      if (there === PER_COMPONENT && graph.component[u] !== graph.component[v]) continue;
      taken.set(graph.component[u], there + 1);
      near.push(u);
    }
    first[v + 1] = near.length;
  }
  for (let v = graph.home + 1; v < n; v++) first[v + 1] = near.length;
  return { first, near: Int32Array.from(near) };
}
