import { PairHeap } from '../structures/heap.js';
import type { Weigh } from './metric.js';

/** Lines that may be drawn again: edge e joins from[e] and to[e]; vertices stand at x, y. */
export interface DrawnGraph {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly from: Int32Array;
  readonly to: Int32Array;
  readonly lengthMm: Float64Array;
}

/** Pairs of places in `ends` that are joined more cheaply along lines; `edges` of pair i: first[i] … first[i + 1] − 1. */
export interface Retraced {
  readonly u: Int32Array;
  readonly v: Int32Array;
  readonly cost: Float64Array;
  readonly first: Int32Array;
  readonly edges: Int32Array;
}

/**
 * For which two of `ends` drawing a shortest way along the lines again, at `drawSpeedMmPerS`, takes less time than
 * lifting, which takes `weigh`(distance): then a connector may be retraced (the Chinese postman's way, Kwan 1962).
 * The result fits `MatchingProblem.ways`, `ends` being the placed vertices in order.
 *
 * Dijkstra's method (1959) from every end, no farther than retracing can pay: a way of length l costs l / speed and
 * lifting at most weigh(l), and since weigh is concave above 0 no longer way pays once it has stopped to pay.
 */
export function retracedWays(
  graph: DrawnGraph,
  ends: ArrayLike<number>,
  weigh: Weigh,
  drawSpeedMmPerS: number,
): Retraced {
  const n = graph.x.length;
  const { first, edge } = edgesByVertex(graph);
  const place = new Int32Array(n).fill(-1);
  for (let i = 0; i < ends.length; i++) place[ends[i]] = i;
  const found = { u: [] as number[], v: [] as number[], cost: [] as number[] };
  const firstEdge = [0];
  const edges: number[] = [];
  const length = new Float64Array(n).fill(Number.POSITIVE_INFINITY);
  const arrivedBy = new Int32Array(n);
  const heap = new PairHeap();
  for (let i = 0; i < ends.length; i++) {
    const root = ends[i];
    const reached: number[] = [root];
    length[root] = 0;
    heap.clear();
    heap.push(0, root, -1);
    while (heap.pop()) {
      const { key, a: v } = heap;
      if (key > length[v]) continue;
      const seconds = key / drawSpeedMmPerS;
      if (key > 0 && seconds >= weigh(key)) break;
      if (place[v] > i) {
        const dx = graph.x[v] - graph.x[root];
        const dy = graph.y[v] - graph.y[root];
        if (seconds < weigh(Math.sqrt(dx * dx + dy * dy))) {
          found.u.push(i);
          found.v.push(place[v]);
          found.cost.push(seconds);
          for (let w = v; w !== root; ) {
            const e = arrivedBy[w];
            edges.push(e);
            w = graph.from[e] === w ? graph.to[e] : graph.from[e];
          }
          firstEdge.push(edges.length);
        }
      }
      for (let k = first[v]; k < first[v + 1]; k++) {
        const e = edge[k];
        const w = graph.from[e] === v ? graph.to[e] : graph.from[e];
        const longer = key + graph.lengthMm[e];
        if (longer >= length[w]) continue;
        if (length[w] === Number.POSITIVE_INFINITY) reached.push(w);
        length[w] = longer;
        arrivedBy[w] = e;
        heap.push(longer, w, e);
      }
    }
    for (const v of reached) length[v] = Number.POSITIVE_INFINITY;
  }
  return {
    u: Int32Array.from(found.u),
    v: Int32Array.from(found.v),
    cost: Float64Array.from(found.cost),
    first: Int32Array.from(firstEdge),
    edges: Int32Array.from(edges),
  };
}

/** The edges at each vertex: those of v are edge[first[v]] … edge[first[v + 1] − 1]. */
function edgesByVertex(graph: DrawnGraph): { first: Int32Array; edge: Int32Array } {
  const { from, to } = graph;
  const first = new Int32Array(graph.x.length + 1);
  for (const ends of [from, to]) for (const v of ends) first[v]++;
  for (let v = 1; v < first.length; v++) first[v] += first[v - 1];
  const edge = new Int32Array(2 * from.length);
  for (let e = from.length - 1; e >= 0; e--) {
    edge[--first[from[e]]] = e;
    edge[--first[to[e]]] = e;
  }
  return { first, edge };
}
