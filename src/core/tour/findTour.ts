import type { Network } from '../network/network.js';
import { eulerWalk } from './eulerWalk.js';
import { type Effort, improveWalk } from './improve.js';
import { joinComponents } from './join.js';
import { NO_BOUND, quickBound, ROUNDING } from './lowerBound.js';
import { delaunayPairs, nearVertices } from './nearPairs.js';
import { type MatchingRule, type Pairing, pairGiven, pairWithHome } from './pairing.js';
import { nearestToHome, type TourGraph, type TourTask, withHome } from './problem.js';
import { componentTree, connectorsCost } from './spanningTree.js';
import type { LowerBound, Tour } from './tour.js';

export interface TourOptions extends Effort {
  readonly matching: MatchingRule;
  readonly bound: 'none' | 'quick';
}

/** Neighbours of a vertex that the search may connect it to. */
const NEIGHBOURS = 8;

/**
 * A short closed (or open) tour over all edges of a network: the rural postman problem.
 *
 * One component: pairing the odd vertices exactly and walking it is the optimum. More: the components
 * are joined in two ways (a spanning tree with a pairing of what is odd then, Frederickson 1979; the
 * pairing first and cheapest joins after), both are improved, and the better one is kept.
 */
export function findTour(network: Network, task: TourTask, options: TourOptions): Tour {
  const graph = withHome(network, task);
  const pairing = pairWithHome(graph, options.matching, options.shouldStop);
  const boundOf = (tree: Int32Array) =>
    options.bound === 'none' ? NO_BOUND : quickBound(graph, pairing, tree);
  if (network.componentCount === 1 && options.matching === 'exact') {
    return finished(graph, eulerWalk(graph, pairing.connectors), boundOf(new Int32Array(0)), false);
  }
  const delaunay = delaunayPairs(graph);
  const tree = componentTree(graph, delaunay);
  const near = nearVertices(graph, delaunay, NEIGHBOURS);
  const bound = boundOf(tree);

  const starts = [byTree(graph, tree, options), byJoining(graph, pairing, tree, near)];
  // The drawing's own order is there to be beaten: what comes out is never worse.
  let best = asGiven(graph, network);
  let least = connectorsCost(graph, connectorsOf(graph, best));
  let stopped = false;
  starts.forEach((connectors, k) => {
    const improved = improveWalk(graph, eulerWalk(graph, connectors), near, {
      ...options,
      kicksPerEnd: options.kicksPerEnd / starts.length,
      onProgress: (share, cost) => options.onProgress((k + share) / starts.length, Math.min(cost, least)),
    });
    const cost = connectorsCost(graph, connectorsOf(graph, improved.order));
    stopped ||= improved.stopped;
    if (cost < least) {
      least = cost;
      best = improved.order;
    }
  });
  // Walked afresh over the same connectors, now straight on at every junction where that is free.
  return finished(graph, eulerWalk(graph, connectorsOf(graph, best)), bound, stopped);
}

/** All edges in document order, each as it was drawn. */
function asGiven(graph: TourGraph, network: Network): Int32Array {
  const edges = Array.from({ length: network.edgeCount }, (_, e) => e);
  // Pieces of a stroke follow each other already; only dots stand behind their turn.
  edges.sort((a, b) => network.edgeStroke[a] - network.edgeStroke[b] || a - b);
  return Int32Array.from([2 * graph.homeEdge, ...edges.map((e) => 2 * e)]);
}

/** The lower bound alone, without looking for a tour. */
export function boundOnly(network: Network, task: TourTask): LowerBound {
  const graph = withHome(network, task);
  const tree = network.componentCount === 1 ? new Int32Array(0) : componentTree(graph, delaunayPairs(graph));
  return quickBound(graph, pairWithHome(graph, 'exact'), tree);
}

/** Spanning tree of the components, home's way in, then a pairing of what is odd. */
function byTree(graph: TourGraph, tree: Int32Array, options: TourOptions): Int32Array {
  const joined = Int32Array.from([...tree, graph.home, nearestToHome(graph)]);
  return concat(joined, pairGiven(graph, joined, options.matching, options.shouldStop).connectors);
}

/** The pairing first, then what it leaves apart is joined at the least extra cost. */
function byJoining(
  graph: TourGraph,
  pairing: Pairing,
  tree: Int32Array,
  near: { first: Uint32Array; near: Int32Array },
): Int32Array {
  const pairs: number[] = [graph.home, nearestToHome(graph)];
  for (const v of tree) pairs.push(v);
  for (let u = 0; u < graph.vertexCount; u++) {
    for (let k = near.first[u]; k < near.first[u + 1]; k++) {
      const v = near.near[k];
      if (graph.component[u] !== graph.component[v]) pairs.push(u, v);
    }
  }
  return joinComponents(graph, pairing.connectors, Int32Array.from(pairs));
}

/** Transitions of a walk that lead from one vertex to another, as u0 v0 u1 v1 …. */
function connectorsOf(graph: TourGraph, order: Int32Array): Int32Array {
  const connectors: number[] = [];
  for (let p = 0; p < order.length; p++) {
    const u = graph.halfEdgeVertex[order[p] ^ 1];
    const v = graph.halfEdgeVertex[order[p + 1 === order.length ? 0 : p + 1]];
    if (u !== v) connectors.push(u, v);
  }
  return Int32Array.from(connectors);
}

/** Cuts the walk at home and at its connectors. */
function finished(graph: TourGraph, order: Int32Array, bound: LowerBound, stopped: boolean): Tour {
  const { homeEdge, halfEdgeVertex } = graph;
  const at = order.findIndex((h) => h >> 1 === homeEdge);
  const forward = graph.free < 0 || order[at] === 2 * homeEdge;
  const halfEdges = new Int32Array(order.length - 1);
  for (let k = 1; k < order.length; k++) {
    const h = forward ? order[(at + k) % order.length] : order[(at - k + order.length) % order.length] ^ 1;
    halfEdges[k - 1] = h;
  }
  const runFirst: number[] = [0];
  for (let k = 1; k < halfEdges.length; k++) {
    if (halfEdgeVertex[halfEdges[k]] !== halfEdgeVertex[halfEdges[k - 1] ^ 1]) runFirst.push(k);
  }
  runFirst.push(halfEdges.length);
  const cost = connectorsCost(graph, connectorsOf(graph, order));
  const exact = bound.method !== 'none' && cost <= bound.value * (1 + ROUNDING) + ROUNDING;
  return {
    runFirst: Uint32Array.from(runFirst),
    halfEdges,
    cost,
    bound: { ...bound, exact },
    stopped: exact ? 'proven' : stopped ? 'clock' : 'effort',
  };
}

function concat(a: Int32Array, b: Int32Array): Int32Array {
  const out = new Int32Array(a.length + b.length);
  out.set(a);
  out.set(b, a.length);
  return out;
}
