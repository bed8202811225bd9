import { PairHeap } from '../structures/heap.js';
import { largestCost, pairCost } from './cost.js';
import { FreePoints } from './freePoints.js';
import type { Matching, MatchingProblem } from './problem.js';
import { totalOf } from './total.js';

/**
 * The greedy matching: again and again the cheapest pair of what is left; of equally cheap pairs the one with
 * the lowest index, then the lowest other index. At worst (4/3)·n^0.585 − 1 times the optimum, n even
 * (Reingold & Tarjan 1981), and never known to be near it. About n·log n for the placed vertices and for each
 * special one; throws RangeError as `exactMatching` does.
 */
export function greedyMatching(problem: MatchingProblem): Matching {
  largestCost(problem);
  const { n, special } = problem;
  const placed = n - special;
  const points = new FreePoints(problem);
  const rankings = Array.from({ length: special }, (_, i) => ranking(problem, placed + i));
  const ranked = new Int32Array(special);
  const mate = new Int32Array(n).fill(-1);
  // The partner each free vertex has its one entry in the heap for.
  const partner = new Int32Array(n).fill(-1);
  const heap = new PairHeap();

  const announce = (v: number): void => {
    if (v < placed) {
      partner[v] = points.nearest(v);
    } else {
      const list = rankings[v - placed];
      let at = ranked[v - placed];
      while (at < list.length && mate[list[at]] >= 0) at++;
      ranked[v - placed] = at;
      partner[v] = at < list.length ? list[at] : -1;
    }
    const w = partner[v];
    if (w >= 0) heap.push(pairCost(problem, v, w), Math.min(v, w), Math.max(v, w));
  };

  for (let v = 0; v < n; v++) announce(v);
  // An entry's cost never falls as vertices go, so the least entry with both ends free is the cheapest pair.
  while (heap.pop()) {
    const { a, b } = heap;
    if (mate[a] < 0 && mate[b] < 0) {
      mate[a] = b;
      mate[b] = a;
      if (a < placed) points.remove(a);
      if (b < placed) points.remove(b);
    } else if (mate[a] < 0 && partner[a] === b) announce(a);
    else if (mate[b] < 0 && partner[b] === a) announce(b);
  }
  return { mate, total: totalOf(problem, mate) };
}

/** All other vertices by their cost with the special vertex s, lowest index first among equals. */
function ranking(problem: MatchingProblem, s: number): Int32Array {
  const cost = new Float64Array(problem.n);
  const others = new Int32Array(problem.n - 1);
  for (let v = 0, at = 0; v < problem.n; v++) {
    if (v === s) continue;
    cost[v] = pairCost(problem, s, v);
    others[at++] = v;
  }
  return others.sort((a, b) => cost[a] - cost[b] || a - b);
}
