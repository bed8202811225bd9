import type { MatchingProblem } from './problem.js';

/** The cost of a pair in the problem's own unit; special costs are asked with the lower index first. */
export type PairCost = (i: number, j: number) => number;

export function pairCostOf(problem: MatchingProblem): PairCost {
  const ways = waysByVertex(problem);
  if (ways === null) return (i, j) => directCost(problem, i, j);
  return (i, j) => {
    let cost = directCost(problem, i, j);
    if (i >= ways.first.length - 1) return cost;
    for (let k = ways.first[i]; k < ways.first[i + 1]; k++) {
      if (ways.other[k] === j && ways.cost[k] < cost) cost = ways.cost[k];
    }
    return cost;
  };
}

function directCost(problem: MatchingProblem, i: number, j: number): number {
  const placed = problem.n - problem.special;
  if (i >= placed || j >= placed) return i < j ? problem.specialCost(i, j) : problem.specialCost(j, i);
  const dx = problem.x[i] - problem.x[j];
  const dy = problem.y[i] - problem.y[j];
  return problem.weigh(Math.sqrt(dx * dx + dy * dy));
}

/** The ways that end at each placed vertex: those of v are first[v] … first[v + 1] − 1. */
export interface WaysByVertex {
  readonly first: Int32Array;
  readonly other: Int32Array;
  readonly cost: Float64Array;
}

export function waysByVertex(problem: MatchingProblem): WaysByVertex | null {
  const { ways } = problem;
  if (ways === undefined || ways.cost.length === 0) return null;
  const placed = problem.n - problem.special;
  const first = new Int32Array(placed + 1);
  for (const ends of [ways.u, ways.v]) for (const v of ends) first[v]++;
  for (let v = 1; v <= placed; v++) first[v] += first[v - 1];
  const other = new Int32Array(first[placed]);
  const cost = new Float64Array(first[placed]);
  for (let i = ways.cost.length - 1; i >= 0; i--) {
    other[--first[ways.u[i]]] = ways.v[i];
    cost[first[ways.u[i]]] = ways.cost[i];
    other[--first[ways.v[i]]] = ways.u[i];
    cost[first[ways.v[i]]] = ways.cost[i];
  }
  return { first, other, cost };
}

/**
 * A bound on the size of every cost. Throws RangeError where n is odd, negative or no integer, where
 * there are fewer coordinates than placed vertices, where a way or hint joins no two vertices, or where a cost
 * is not finite.
 */
export function largestCost(problem: MatchingProblem): number {
  const { n, special, x, y } = problem;
  const placed = n - special;
  if (!Number.isInteger(n) || n < 0 || n % 2 !== 0) {
    throw new RangeError(`a perfect matching needs an even number of vertices, not ${n}`);
  }
  if (!Number.isInteger(special) || special < 0 || placed < 0 || x.length < placed || y.length < placed) {
    throw new RangeError('the numbers of vertices, special vertices and coordinates do not fit together');
  }
  let largest = 0;
  if (placed > 0) {
    let x0 = x[0];
    let x1 = x0;
    let y0 = y[0];
    let y1 = y0;
    for (let i = 0; i < placed; i++) {
      if (!Number.isFinite(x[i]) || !Number.isFinite(y[i])) throw new RangeError(`vertex ${i} has no place`);
      x0 = Math.min(x0, x[i]);
      x1 = Math.max(x1, x[i]);
      y0 = Math.min(y0, y[i]);
      y1 = Math.max(y1, y[i]);
    }
    const diagonal = Math.sqrt((x1 - x0) * (x1 - x0) + (y1 - y0) * (y1 - y0));
    largest = Math.max(Math.abs(problem.weigh(0)), Math.abs(problem.weigh(diagonal)));
  }
  largest = Math.max(largest, largestWay(problem, placed));
  for (let j = placed; j < n; j++) {
    for (let i = 0; i < j; i++) largest = Math.max(largest, Math.abs(problem.specialCost(i, j)));
  }
  if (!Number.isFinite(largest)) throw new RangeError('every cost must be finite');
  return largest;
}

function largestWay(problem: MatchingProblem, placed: number): number {
  const { ways, hints, n } = problem;
  const pair = (u: number, v: number, below: number): boolean =>
    Number.isInteger(u) && Number.isInteger(v) && u >= 0 && v >= 0 && u < below && v < below && u !== v;
  for (let i = 0; i < (hints?.length ?? 0); i += 2) {
    if (!pair(hints![i], hints![i + 1], n)) throw new RangeError(`hint ${i / 2} is no pair of vertices`);
  }
  if (ways === undefined) return 0;
  if (ways.u.length !== ways.cost.length || ways.v.length !== ways.cost.length) {
    throw new RangeError('the columns of the ways do not fit together');
  }
  let largest = 0;
  for (let i = 0; i < ways.cost.length; i++) {
    if (!pair(ways.u[i], ways.v[i], placed)) throw new RangeError(`way ${i} joins no two placed vertices`);
    // Math.max lets NaN through, to be refused with all that is not finite.
    largest = Math.max(largest, Math.abs(ways.cost[i]));
  }
  return largest;
}

/** Keeps the scale and its double finite for costs near the smallest doubles. */
const LARGEST_SCALE = 2 ** 1000;

/** The power of two nearest to 1 that brings `largest` into (2^(bits − 1), 2^bits]; 1 where it is 0. */
export function powerScale(largest: number, bits: number): number {
  const top = 2 ** bits;
  let scale = 1;
  if (largest > 0) {
    while (largest * scale > top) scale /= 2;
    while (largest * scale * 2 <= top && scale < LARGEST_SCALE) scale *= 2;
  }
  return scale;
}
