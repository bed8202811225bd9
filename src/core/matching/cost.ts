import type { MatchingProblem } from './problem.js';

/** The cost of the pair i, j in the problem's own unit; special costs are asked with the lower index first. */
export function pairCost(problem: MatchingProblem, i: number, j: number): number {
  const placed = problem.n - problem.special;
  if (i >= placed || j >= placed) return i < j ? problem.specialCost(i, j) : problem.specialCost(j, i);
  const dx = problem.x[i] - problem.x[j];
  const dy = problem.y[i] - problem.y[j];
  return problem.weigh(Math.sqrt(dx * dx + dy * dy));
}

/**
 * A bound on the size of every cost. Throws RangeError where n is odd, negative or no integer, where
 * there are fewer coordinates than placed vertices, or where a cost is not finite.
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
  for (let j = placed; j < n; j++) {
    for (let i = 0; i < j; i++) largest = Math.max(largest, Math.abs(problem.specialCost(i, j)));
  }
  if (!Number.isFinite(largest)) throw new RangeError('every cost must be finite');
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
