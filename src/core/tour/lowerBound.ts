import type { Pairing } from './pairing.js';
import { connectorCost, nearestToHome, type TourGraph } from './problem.js';
import { connectorsCost } from './spanningTree.js';
import type { LowerBound } from './tour.js';

/** Sums of many costs are compared with this much slack: the rounding of n additions, generously. */
export const ROUNDING = 1e-9;

/**
 * The better of two bounds that hold for every tour with connectors from vertex to vertex: the dual of
 * the exact pairing, and a minimum spanning tree of the components with the way from and to home. (By the
 * triangle inequality home needs to be visited only once; what remains without it is still connected.)
 */
export function quickBound(graph: TourGraph, pairing: Pairing, tree: Int32Array): LowerBound {
  const certified = pairing.certified;
  const byMatching = certified ? certified.certificate.lowerBound : 0;
  const wayOut = connectorCost(graph, graph.home, nearestToHome(graph));
  const ways = graph.free < 0 ? 2 : 1;
  const byTree = Math.max(0, (connectorsCost(graph, tree) + ways * wayOut) * (1 - ROUNDING));
  return byMatching >= byTree
    ? { value: byMatching, method: 'matching', exact: false, certified }
    : { value: byTree, method: 'tree', exact: false, certified };
}

export const NO_BOUND: LowerBound = { value: 0, method: 'none', exact: false, certified: null };
