import { exactMatching } from '../matching/exact.js';
import { improveByExchange } from '../matching/exchange.js';
import { greedyMatching } from '../matching/greedy.js';
import type { CertifiedMatching, Matching, MatchingProblem } from '../matching/problem.js';
import { connectorCost, nearestToHome, type TourGraph } from './problem.js';

export type MatchingRule = 'exact' | 'greedy';

/** Connectors that make every degree even, as u0 v0 u1 v1 …, and what no such set can cost less than. */
export interface Pairing {
  readonly connectors: Int32Array;
  readonly certified: CertifiedMatching | null;
}

/**
 * Pairs the odd vertices of the drawing, and brings home in:
 *
 * - closed: two copies of home with c(h1, h2) = 2 · the least way from home to a vertex. Matched with each
 *   other they stand for a way out and back;
 * - open: home and the free end D with c(D, odd) = 0 and c(home, D) = the least way from home to a vertex:
 *   then there is no odd vertex to end at, and the walk ends where it began.
 *
 * The cost of an exact pairing is a lower bound on every tour; with one component it is the optimum
 * (minimum-weight perfect matching, Edmonds 1965).
 */
export function pairWithHome(graph: TourGraph, rule: MatchingRule, shouldStop?: () => boolean): Pairing {
  const { home, free, odd } = graph;
  const closed = free < 0;
  const nearest = nearestToHome(graph);
  const wayOut = connectorCost(graph, home, nearest);
  const p = odd.length;
  const isFree = (i: number) => !closed && i === p + 1;
  const problem: MatchingProblem = {
    n: p + 2,
    ...positions(graph, odd),
    weigh: graph.weigh,
    special: 2,
    specialCost: (i, j) => {
      if (i >= p && j >= p) return closed ? 2 * wayOut : wayOut;
      const [vertex, end] = i < p ? [i, j] : [j, i];
      return isFree(end) ? 0 : connectorCost(graph, odd[vertex], home);
    },
  };
  const { matching, certified } = solve(problem, rule, shouldStop);
  const connectors: number[] = [];
  for (let i = 0; i < p; i++) {
    const j = matching.mate[i];
    if (j < i) continue;
    connectors.push(odd[i], j < p ? odd[j] : isFree(j) ? free : home);
  }
  if (matching.mate[p] === p + 1) connectors.push(home, nearest, nearest, closed ? home : free);
  return { connectors: Int32Array.from(connectors), certified };
}

/**
 * Pairs the odd vertices of edges and given connectors together, home and D among them where odd.
 */
export function pairGiven(
  graph: TourGraph,
  given: Int32Array,
  rule: MatchingRule,
  shouldStop?: () => boolean,
): Pairing {
  const degree = new Int32Array(graph.vertexCount);
  for (const v of graph.halfEdgeVertex) degree[v] = degree[v] + 1;
  for (const v of given) degree[v] = degree[v] + 1;
  const odd: number[] = [];
  for (let v = 0; v < graph.vertexCount; v++) if (degree[v] % 2 === 1) odd.push(v);
  // Home and D have the highest numbers, so they stand last.
  const special = odd.filter((v) => v >= graph.home).length;
  const problem: MatchingProblem = {
    n: odd.length,
    ...positions(graph, odd),
    weigh: graph.weigh,
    special,
    specialCost: (i, j) => connectorCost(graph, odd[i], odd[j]),
  };
  const { matching, certified } = solve(problem, rule, shouldStop);
  const connectors: number[] = [];
  matching.mate.forEach((j, i) => {
    if (j > i) connectors.push(odd[i], odd[j]);
  });
  return { connectors: Int32Array.from(connectors), certified };
}

function positions(graph: TourGraph, vertices: ArrayLike<number>): { x: Float64Array; y: Float64Array } {
  const x = new Float64Array(vertices.length);
  const y = new Float64Array(vertices.length);
  for (let i = 0; i < vertices.length; i++) {
    x[i] = graph.x[vertices[i]];
    y[i] = graph.y[vertices[i]];
  }
  return { x, y };
}

function solve(
  problem: MatchingProblem,
  rule: MatchingRule,
  shouldStop: (() => boolean) | undefined,
): { matching: Matching; certified: CertifiedMatching | null } {
  if (rule === 'exact') {
    const certified = exactMatching(problem, shouldStop ? { shouldStop } : {});
    return { matching: certified, certified };
  }
  return { matching: improveByExchange(problem, greedyMatching(problem)), certified: null };
}
