import { pairCostOf } from './cost.js';
import type { MatchingProblem } from './problem.js';
import { DoubleSum } from './sums.js';

/** The sum of the pairs' costs, rounded once. */
export function totalOf(problem: MatchingProblem, mate: Int32Array): number {
  const cost = pairCostOf(problem);
  const sum = new DoubleSum();
  for (let v = 0; v < problem.n; v++) if (v < mate[v]) sum.add(cost(v, mate[v]));
  return sum.value();
}
