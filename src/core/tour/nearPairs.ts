import Delaunator from 'delaunator';
import Flatbush from 'flatbush';
import { distance, type TourGraph } from './problem.js';

/**
 * Pairs of vertices that are neighbours in the Delaunay triangulation of the drawing's vertices
 * (home left out), as u0 v0 u1 v1 …. For any split of the vertices in two the shortest pair across is among them,
 * hence also a minimum spanning tree of the components (Preparata & Shamos 1985, §5.3, from memory).
 *
 * Coincident vertices are linked to the first of them; points in line are linked in order, also where they
 * are in line but for rounding, as dashes cut from one line are: a triangulation then leaves some out.
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
  const left = leftOut(single, triangles);
  if (left.length > 0) {
    for (const v of [...inLine(graph, single), ...toNearest(graph, single, left)]) pairs.push(v);
  }
  for (let t = 0; t < triangles.length; t++) {
    if (halfedges[t] > t) continue;
    const to = triangles[t % 3 === 2 ? t - 2 : t + 1];
    pairs.push(single[triangles[t]], single[to]);
  }
  return Int32Array.from(pairs);
}

/** Vertices that are in no triangle: all of them where all are in line. */
function leftOut(vertices: readonly number[], triangles: Uint32Array): number[] {
  const isIn = new Uint8Array(vertices.length);
  for (const corner of triangles) isIn[corner] = 1;
  return vertices.filter((_, i) => isIn[i] === 0);
}

/** Pairs that follow each other along the longer side of the box: what is in line, in its order. */
function inLine({ x, y }: TourGraph, vertices: readonly number[]): number[] {
  const side = (at: Float64Array) => {
    let least = Number.POSITIVE_INFINITY;
    let most = Number.NEGATIVE_INFINITY;
    for (const v of vertices) {
      least = Math.min(least, at[v]);
      most = Math.max(most, at[v]);
    }
    return most - least;
  };
  const [along, across] = side(x) >= side(y) ? [x, y] : [y, x];
  const order = [...vertices].sort((a, b) => along[a] - along[b] || across[a] - across[b] || a - b);
  const pairs: number[] = [];
  for (let i = 1; i < order.length; i++) pairs.push(order[i - 1], order[i]);
  return pairs;
}

/** A point left out amid others has a twin but for rounding: the nearest. */
function toNearest({ x, y }: TourGraph, vertices: readonly number[], from: readonly number[]): number[] {
  const index = new Flatbush(vertices.length);
  for (const v of vertices) index.add(x[v], y[v], x[v], y[v]);
  index.finish();
  const pairs: number[] = [];
  for (const v of from) {
    for (const i of index.neighbors(x[v], y[v], 2)) if (vertices[i] !== v) pairs.push(v, vertices[i]);
  }
  return pairs;
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
