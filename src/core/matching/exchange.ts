import { buildBoxTree } from '../structures/boxTree.js';
import { NearestSearch } from '../structures/nearest.js';
import { pairCost } from './cost.js';
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
  const near = nearVertices(problem);
  const queued = new Uint8Array(n).fill(1);
  const queue: number[] = [];
  for (let v = n - 1; v >= 0; v--) queue.push(v);
  while (queue.length > 0) {
    const v = queue.pop() as number;
    queued[v] = 0;
    const m = mate[v];
    const present = pairCost(problem, v, m);
    for (let i = NEAR * v; i < NEAR * v + NEAR; i++) {
      const w = near[i];
      if (w < 0 || w === m) continue;
      const wish = pairCost(problem, v, w);
      if (wish >= present) break;
      const before = present + pairCost(problem, w, mate[w]);
      const after = wish + pairCost(problem, m, mate[w]);
      if (after >= before - LEAST_SAVING * Math.abs(before)) continue;
      const four = [v, w, m, mate[w]];
      join(mate, m, mate[w]);
      join(mate, v, w);
      for (const u of four) {
        if (queued[u] === 0) {
          queued[u] = 1;
          queue.push(u);
        }
      }
      break;
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
function nearVertices(problem: MatchingProblem): Int32Array {
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
      const c = v === s ? Number.POSITIVE_INFINITY : pairCost(problem, s, v);
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
