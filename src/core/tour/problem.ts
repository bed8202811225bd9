import type { Weigh } from '../metric/metric.js';
import type { Network } from '../network/network.js';

/** Where to start, how to end, and what a connector costs. */
export interface TourTask {
  readonly homeX: number;
  readonly homeY: number;
  readonly end: 'home' | 'anywhere';
  readonly weigh: Weigh;
  /** What a leg to or from home costs; as any connector where left out. */
  readonly weighHome?: Weigh;
}

/**
 * The network with home in it, the form in which the tour is sought: one closed walk over all edges.
 *
 * Home is vertex `home`, joined by one more edge (the last, `homeEdge`). A tour that returns makes it a
 * loop at home; a tour that may end anywhere makes it an edge from the free end D, vertex `free`, to
 * home, and D lies at cost 0 from everything: the closed walk's connector into D is where the tour ends.
 * Nothing passes through D, since it has no other edge and only one connector ends there.
 */
export interface TourGraph {
  readonly vertexCount: number;
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly edgeCount: number;
  readonly halfEdgeVertex: Int32Array;
  readonly direction: Float64Array;
  readonly component: Int32Array;
  readonly componentCount: number;
  /** Odd vertices of the network, home and D left out. */
  readonly odd: Int32Array;
  readonly home: number;
  readonly homeEdge: number;
  /** D, or -1 where the tour returns home. */
  readonly free: number;
  readonly weigh: Weigh;
  readonly weighHome: Weigh;
}

export function withHome(network: Network, task: TourTask): TourGraph {
  const n = network.vertexCount;
  const m = network.edgeCount;
  const free = task.end === 'anywhere' ? n + 1 : -1;
  const vertexCount = free < 0 ? n + 1 : n + 2;
  const x = new Float64Array(vertexCount).fill(task.homeX);
  const y = new Float64Array(vertexCount).fill(task.homeY);
  x.set(network.vertexX);
  y.set(network.vertexY);
  const halfEdgeVertex = new Int32Array(2 * m + 2);
  halfEdgeVertex.set(network.halfEdgeVertex);
  halfEdgeVertex[2 * m] = free < 0 ? n : free;
  halfEdgeVertex[2 * m + 1] = n;
  const direction = new Float64Array(4 * m + 4);
  direction.set(network.halfEdgeDirection);
  const component = new Int32Array(vertexCount).fill(network.componentCount);
  component.set(network.componentOfVertex);
  return {
    vertexCount,
    x,
    y,
    edgeCount: m + 1,
    halfEdgeVertex,
    direction,
    component,
    componentCount: network.componentCount + 1,
    odd: network.oddVertices,
    home: n,
    homeEdge: m,
    free,
    weigh: task.weigh,
    weighHome: task.weighHome ?? task.weigh,
  };
}

/** What a connector between two vertices costs. */
export function connectorCost(graph: TourGraph, u: number, v: number): number {
  if (u === v || u === graph.free || v === graph.free) return 0;
  const weigh = u === graph.home || v === graph.home ? graph.weighHome : graph.weigh;
  return weigh(distance(graph, u, v));
}

export function distance(graph: TourGraph, u: number, v: number): number {
  const dx = graph.x[u] - graph.x[v];
  const dy = graph.y[u] - graph.y[v];
  return Math.sqrt(dx * dx + dy * dy);
}

/** The vertex of the drawing nearest to home; the lowest where several are. */
export function nearestToHome(graph: TourGraph): number {
  let best = 0;
  let least = Number.POSITIVE_INFINITY;
  for (let v = 0; v < graph.home; v++) {
    const d = distance(graph, graph.home, v);
    if (d < least) {
      least = d;
      best = v;
    }
  }
  return best;
}
