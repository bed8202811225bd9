import { type ExactOptions, exactMatching } from './exact.js';
import type { Certificate, MatchingProblem } from './problem.js';

export interface PerfectMatching {
  /** Every vertex in one pair, the lower index first, pairs by their lower index. */
  readonly pairs: [number, number][];
  /** Sum of the pairs' costs. */
  readonly total: number;
  /** Proof that no perfect matching costs less than `certificate.lowerBound`. */
  readonly certificate: Certificate;
  /** False only where `shouldStop` ended the work early: the bound is then below the total. */
  readonly optimal: boolean;
}

/** Points as columns. */
export interface PointColumns {
  readonly x: ArrayLike<number>;
  readonly y: ArrayLike<number>;
}

export type Points = PointColumns | readonly (readonly [number, number])[];

export interface MatchingOptions extends ExactOptions {
  /**
   * Pairs worth looking at first where costs are a function; good ones (the cheapest at each vertex) save time.
   * The optimum is that over all pairs in any case.
   */
  readonly candidates?: Iterable<readonly [number, number]>;
}

/**
 * A minimum-weight perfect matching with the proof of its optimality (Edmonds 1965):
 *
 * - `perfectMatching(points)` pairs points in the plane by their distance;
 * - `perfectMatching(n, cost)` pairs 0 … n − 1 under any finite costs, `cost(i, j)` being asked with i < j only;
 *   all n²/2 costs are read, several times, so it serves a few thousand vertices.
 *
 * Throws RangeError where the number of vertices is odd, a coordinate or cost is not finite, or a candidate is no
 * pair of vertices.
 */
export function perfectMatching(points: Points, options?: ExactOptions): PerfectMatching;
export function perfectMatching(
  n: number,
  cost: (i: number, j: number) => number,
  options?: MatchingOptions,
): PerfectMatching;
export function perfectMatching(
  what: Points | number,
  second?: ((i: number, j: number) => number) | ExactOptions,
  third?: MatchingOptions,
): PerfectMatching {
  const table = typeof what === 'number';
  if (table && typeof second !== 'function') throw new TypeError('n vertices need a cost function');
  const problem = table
    ? tableProblem(what, second as (i: number, j: number) => number, third?.candidates)
    : planeProblem(what);
  const options = table ? third : (second as ExactOptions | undefined);
  const { mate, total, certificate, optimal } = exactMatching(problem, options ?? {});
  const pairs: [number, number][] = [];
  for (let v = 0; v < mate.length; v++) if (v < mate[v]) pairs.push([v, mate[v]]);
  return { pairs, total, certificate, optimal };
}

/** The matching problem of points under their distance. */
export function planeProblem(points: Points): MatchingProblem {
  const x = 'x' in points ? new Float64Array(points.x) : Float64Array.from(points, (point) => point[0]);
  const y = 'y' in points ? new Float64Array(points.y) : Float64Array.from(points, (point) => point[1]);
  if (x.length !== y.length) throw new RangeError('as many x as y are needed');
  return { n: x.length, x, y, weigh: (distance) => distance, special: 0, specialCost: () => Number.NaN };
}

/** The matching problem of a complete table of costs. */
export function tableProblem(
  n: number,
  cost: (i: number, j: number) => number,
  candidates?: Iterable<readonly [number, number]>,
): MatchingProblem {
  const none = new Float64Array(0);
  const problem = { n, x: none, y: none, weigh: (d: number) => d, special: n, specialCost: cost };
  if (candidates === undefined) return problem;
  const flat: number[] = [];
  for (const [i, j] of candidates) flat.push(i, j);
  // As doubles, so that what is no whole number is refused and not cut off.
  if (flat.some((v) => !Number.isInteger(v))) throw new RangeError('candidates are pairs of whole numbers');
  return { ...problem, hints: Int32Array.from(flat) };
}
