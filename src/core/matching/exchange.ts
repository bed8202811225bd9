import { buildBoxTree } from '../structures/boxTree.js';
import { NearestSearch } from '../structures/nearest.js';
import { type PairCost, pairCostOf, waysByVertex } from './cost.js';
import type { Matching, MatchingProblem } from './problem.js';
import { totalOf } from './total.js';

/** Neighbours of a vertex that are tried as its partner. */
const NEAR = 10;
/** Least share by which an exchange must save, so that rounding cannot go round in circles. */
const LEAST_SAVING = 1e-12;

/**
 * Improves a matching by exchanges: two pairs a–b, c–d become a–c, b–d where that is cheaper, a and c being
 * near one another, until none is. The result is never dearer. Linear in n in practice; no bound on the quality.
 */
export function improveByExchange(problem: MatchingProblem, matching: Matching): Matching {
  const { n } = problem;
  const mate = matching.mate.slice();
  const cost = pairCostOf(problem);
  const near = nearVertices(problem, cost);
  const ways = waysByVertex(problem);
  const queued = new Uint8Array(n).fill(1);
  const queue: number[] = [];
  for (let v = n - 1; v >= 0; v--) queue.push(v);
  const exchange = (v: number, w: number): boolean => {
    const m = mate[v];
    if (w < 0 || w === m) return false;
    const before = cost(v, m) + cost(w, mate[w]);
    const after = cost(v, w) + cost(m, mate[w]);
    if (after >= before - LEAST_SAVING * Math.abs(before)) return false;
    const four = [v, w, m, mate[w]];
    join(mate, m, mate[w]);
    join(mate, v, w);
    for (const u of four) {
      if (queued[u] === 0) {
        queued[u] = 1;
        queue.push(u);
      }
    }
    return true;
  };
  while (queue.length > 0) {
    const v = queue.pop() as number;
    queued[v] = 0;
    const present = cost(v, mate[v]);
    let found = false;
    for (let i = NEAR * v; !found && i < NEAR * v + NEAR; i++) {
      if (near[i] >= 0 && cost(v, near[i]) >= present) break;
      found = exchange(v, near[i]);
    }
    if (ways === null || v >= ways.first.length - 1) continue;
    for (let i = ways.first[v]; !found && i < ways.first[v + 1]; i++) {
      if (ways.cost[i] < present) found = exchange(v, ways.other[i]);
    }
  }
  const total = totalOf(problem, mate);
  return total < matching.total ? { mate, total } : matching;
}

function join(mate: Int32Array, u: number, v: number): void {
  mate[u] = v;
  mate[v] = u;
}

/** The near vertices of each vertex, cheapest first, padded with −1; for a special one the cheapest of all. */
function nearVertices(problem: MatchingProblem, pairCost: PairCost): Int32Array {
  const { n, special, x, y } = problem;
  const placed = n - special;
  const near = new Int32Array(NEAR * n).fill(-1);
  const tree = buildBoxTree(x.subarray(0, placed), y.subarray(0, placed));
  const search = new NearestSearch(tree, NEAR, 1);
  for (let i = 0; i < placed; i++) {
    const found = search.around(tree.x[i], tree.y[i], i);
    for (let j = 0; j < NEAR; j++) if (found[j] >= 0) near[NEAR * tree.order[i] + j] = tree.order[found[j]];
  }
  const cost = new Float64Array(NEAR);
  for (let s = placed; s < n; s++) {
    cost.fill(Number.POSITIVE_INFINITY);
    for (let v = 0; v < n; v++) {
      const c = v === s ? Number.POSITIVE_INFINITY : pairCost(s, v);
      let at = NEAR - 1;
      if (c >= cost[at]) continue;
      for (; at > 0 && cost[at - 1] > c; at--) {
        cost[at] = cost[at - 1];
        near[NEAR * s + at] = near[NEAR * s + at - 1];
      }
      cost[at] = c;
      near[NEAR * s + at] = v;
    }
  }
  return near;
}
