import { type ExactOptions, exactMatching } from './exact.js';
import type { Certificate, MatchingProblem } from './problem.js';

export interface PerfectMatching {
  /** Every vertex in one pair, the lower index first, pairs by their lower index. */
  readonly pairs: [number, number][];
  /** Sum of the pairs' costs. */
  readonly total: number;
  /** Proof that no perfect matching costs less than `certificate.lowerBound`. */
  readonly certificate: Certificate;
}

/** Points as columns. */
export interface PointColumns {
  readonly x: ArrayLike<number>;
  readonly y: ArrayLike<number>;
}

export type Points = PointColumns | readonly (readonly [number, number])[];

/**
 * A minimum-weight perfect matching with the proof of its optimality (Edmonds 1965):
 *
 * - `perfectMatching(points)` pairs points in the plane by their distance;
 * - `perfectMatching(n, cost)` pairs 0 … n − 1 under any finite costs, `cost(i, j)` being asked with i < j only;
 *   all n²/2 costs are read, several times, so it serves a few thousand vertices.
 *
 * Throws RangeError where the number of vertices is odd or a coordinate or cost is not finite.
 */
export function perfectMatching(points: Points, options?: ExactOptions): PerfectMatching;
export function perfectMatching(
  n: number,
  cost: (i: number, j: number) => number,
  options?: ExactOptions,
): PerfectMatching;
export function perfectMatching(
  what: Points | number,
  second?: ((i: number, j: number) => number) | ExactOptions,
  third?: ExactOptions,
): PerfectMatching {
  const table = typeof what === 'number';
  if (table && typeof second !== 'function') throw new TypeError('n vertices need a cost function');
  const problem = table ? tableProblem(what, second as (i: number, j: number) => number) : planeProblem(what);
  const options = table ? third : (second as ExactOptions | undefined);
  const { mate, total, certificate } = exactMatching(problem, options ?? {});
  const pairs: [number, number][] = [];
  for (let v = 0; v < mate.length; v++) if (v < mate[v]) pairs.push([v, mate[v]]);
  return { pairs, total, certificate };
}

/** The matching problem of points under their distance. */
export function planeProblem(points: Points): MatchingProblem {
  const columns = 'x' in points;
  const x = columns ? Float64Array.from(points.x) : Float64Array.from(points, (point) => point[0]);
  const y = columns ? Float64Array.from(points.y) : Float64Array.from(points, (point) => point[1]);
  if (x.length !== y.length) throw new RangeError('as many x as y are needed');
  return { n: x.length, x, y, weigh: (distance) => distance, special: 0, specialCost: () => Number.NaN };
}

/** The matching problem of a complete table of costs. */
export function tableProblem(n: number, cost: (i: number, j: number) => number): MatchingProblem {
  const none = new Float64Array(0);
  return { n, x: none, y: none, weigh: (distance) => distance, special: n, specialCost: cost };
}
