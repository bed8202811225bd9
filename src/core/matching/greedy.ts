import { PairHeap } from '../structures/heap.js';
import { largestCost, pairCostOf, waysByVertex } from './cost.js';
import { FreePoints } from './freePoints.js';
import type { Matching, MatchingProblem } from './problem.js';
import { totalOf } from './total.js';

/**
 * The greedy matching: again and again the cheapest pair of what is left; of equally cheap pairs the one with
 * the lowest index, then the lowest other index. At worst (4/3)·n^0.585 − 1 times the optimum, n even
 * (Reingold & Tarjan 1981), and never known to be near it. About n·log n, and n more for each special
 * vertex; throws RangeError as `exactMatching` does.
 */
export function greedyMatching(problem: MatchingProblem): Matching {
  largestCost(problem);
  const { n, special } = problem;
  const placed = n - special;
  const points = new FreePoints(problem);
  const mate = new Int32Array(n).fill(-1);
  const heap = new PairHeap();
  const pairCost = pairCostOf(problem);
  const ways = waysByVertex(problem);

  // The entry (cost, v, partner) of a free vertex v: its cheapest pair, of equal ones with the lowest partner.
  // Special vertices look among themselves only; the placed ones look at them.
  const cheapest = (v: number): number => {
    let best = v < placed ? points.nearest(v) : -1;
    let cost = best < 0 ? Number.POSITIVE_INFINITY : points.cost;
    if (ways !== null && v < placed) {
      for (let i = ways.first[v]; i < ways.first[v + 1]; i++) {
        const w = ways.other[i];
        if (mate[w] >= 0 || ways.cost[i] > cost || (ways.cost[i] === cost && w > best)) continue;
        best = w;
        cost = ways.cost[i];
      }
    }
    for (let s = placed; s < n; s++) {
      if (mate[s] >= 0 || s === v) continue;
      const other = pairCost(v, s);
      if (other < cost) {
        best = s;
        cost = other;
      }
    }
    return best;
  };
  for (let v = 0; v < n; v++) {
    const w = cheapest(v);
    if (w >= 0) heap.push(pairCost(v, w), v, w);
  }
  // Costs only rise as vertices go, so entries are lower bounds: the least one that still holds is the cheapest
  // pair, and among equal costs every lower vertex has had its turn.
  while (heap.pop()) {
    const { key, a } = heap;
    if (mate[a] >= 0) continue;
    const b = mate[heap.b] < 0 ? heap.b : cheapest(a);
    if (b < 0) continue;
    const cost = pairCost(a, b);
    if (cost > key) {
      heap.push(cost, a, b);
      continue;
    }
    mate[a] = b;
    mate[b] = a;
    if (a < placed) points.remove(a);
    if (b < placed) points.remove(b);
  }
  return { mate, total: totalOf(problem, mate) };
}
