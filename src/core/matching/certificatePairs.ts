import { buildBoxTree } from '../structures/boxTree.js';
import type { Nest } from './certificateNest.js';
import type { MatchingProblem } from './problem.js';

/** Doubles of at most this size keep every sum of a few exact. */
const EXACT = 2 ** 50;
/** Points in the smallest boxes. */
const FEW = 8;

/** What the points at a run of the order have in common. */
interface Box {
  readonly from: number;
  readonly to: number;
  readonly x0: number;
  readonly y0: number;
  readonly x1: number;
  readonly y1: number;
  readonly highest: number;
  /** First and last place in the nest. */
  readonly first: number;
  readonly last: number;
  readonly halves: readonly [Box, Box] | null;
}

/**
 * The reduced cost of every pair: with d(v) = y(v) + Σ Y around v, it is c − d(u) − d(v) + 2·Σ Y around both, and
 * must not be negative. Placed vertices go by pairs of boxes: where `weigh` of the boxes' distance suffices for
 * the highest d in each and the least that any two of their vertices share, all their pairs are sound.
 */
export function pairsFail(problem: MatchingProblem, scale: number, nest: Nest): string | null {
  const placed = problem.n - problem.special;
  return (
    (placed > 1 ? placedPairsFail(problem, placed, scale, nest) : null) ??
    waysFail(problem, placed, scale, nest) ??
    specialPairsFail(problem, placed, scale, nest)
  );
}

function fault(nest: Nest, u: number, v: number, cost: number, scale: number): string | null {
  const integer = 2 * Math.floor(scale * cost);
  if (!(Math.abs(integer) <= EXACT)) return 'the costs outgrow exact integers';
  const reduced = integer - nest.whole[u] - nest.whole[v] + 2 * nest.sharedBy(u, v);
  return reduced < 0 ? `the pair ${u}, ${v} has a negative reduced cost` : null;
}

function specialPairsFail(
  problem: MatchingProblem,
  placed: number,
  scale: number,
  nest: Nest,
): string | null {
  for (let v = placed; v < problem.n; v++) {
    for (let u = 0; u < v; u++) {
      const found = fault(nest, u, v, problem.specialCost(u, v), scale);
      if (found !== null) return found;
    }
  }
  return null;
}

function waysFail(problem: MatchingProblem, placed: number, scale: number, nest: Nest): string | null {
  const { ways } = problem;
  if (ways === undefined) return null;
  for (let i = 0; i < ways.cost.length; i++) {
    const u = ways.u[i];
    const v = ways.v[i];
    if (!(u >= 0 && v >= 0 && u < placed && v < placed && u !== v))
      return `way ${i} joins no two placed vertices`;
    const found = fault(nest, u, v, ways.cost[i], scale);
    if (found !== null) return found;
  }
  return null;
}

function placedPairsFail(problem: MatchingProblem, placed: number, scale: number, nest: Nest): string | null {
  const { x, y } = problem;
  const { order } = buildBoxTree(x.subarray(0, placed), y.subarray(0, placed));
  const seen = new Uint8Array(placed);
  for (const v of order) seen[v] = 1;
  if (order.length !== placed || seen.includes(0)) throw new Error('the order of the points is none');
  const whole = boxOver(problem, nest, order, 0, placed);
  const stack: Box[] = [whole, whole];
  while (stack.length > 0) {
    const b = stack.pop() as Box;
    const a = stack.pop() as Box;
    if (boxesAreSound(problem, scale, nest, a, b)) continue;
    if (a.halves === null && b.halves === null) {
      const found = boxesFail(problem, scale, nest, order, a, b);
      if (found !== null) return found;
    } else if (a === b) {
      const [left, right] = (a as Box & { halves: [Box, Box] }).halves;
      stack.push(left, left, left, right, right, right);
    } else {
      const [large, small] =
        b.halves === null || (a.halves !== null && a.to - a.from > b.to - b.from) ? [a, b] : [b, a];
      for (const half of large.halves as readonly Box[]) stack.push(half, small);
    }
  }
  return null;
}

function boxesAreSound(problem: MatchingProblem, scale: number, nest: Nest, a: Box, b: Box): boolean {
  const dx = Math.max(0, b.x0 - a.x1, a.x0 - b.x1);
  const dy = Math.max(0, b.y0 - a.y1, a.y0 - b.y1);
  const least = 2 * Math.floor(scale * problem.weigh(Math.sqrt(dx * dx + dy * dy)));
  if (least >= a.highest + b.highest) return true;
  const first = Math.min(a.first, b.first);
  const last = Math.max(a.last, b.last);
  return first < last && least + 2 * nest.sharedAlong(first, last) >= a.highest + b.highest;
}

function boxesFail(
  problem: MatchingProblem,
  scale: number,
  nest: Nest,
  order: Int32Array,
  a: Box,
  b: Box,
): string | null {
  const { x, y } = problem;
  for (let i = a.from; i < a.to; i++) {
    const u = order[i];
    for (let j = a === b ? i + 1 : b.from; j < b.to; j++) {
      const v = order[j];
      const dx = x[u] - x[v];
      const dy = y[u] - y[v];
      const found = fault(nest, u, v, problem.weigh(Math.sqrt(dx * dx + dy * dy)), scale);
      if (found !== null) return found;
    }
  }
  return null;
}

/** Halves fall on powers of two, so that the depth is logarithmic. */
function boxOver(problem: MatchingProblem, nest: Nest, order: Int32Array, from: number, to: number): Box {
  if (to - from > FEW) {
    let half = FEW;
    while (2 * half < to - from) half *= 2;
    const a = boxOver(problem, nest, order, from, from + half);
    const b = boxOver(problem, nest, order, from + half, to);
    return {
      from,
      to,
      x0: Math.min(a.x0, b.x0),
      y0: Math.min(a.y0, b.y0),
      x1: Math.max(a.x1, b.x1),
      y1: Math.max(a.y1, b.y1),
      highest: Math.max(a.highest, b.highest),
      first: Math.min(a.first, b.first),
      last: Math.max(a.last, b.last),
      halves: [a, b],
    };
  }
  const points = Array.from(order.subarray(from, to));
  const xs = points.map((v) => problem.x[v]);
  const ys = points.map((v) => problem.y[v]);
  const places = points.map((v) => nest.position[v]);
  return {
    from,
    to,
    x0: Math.min(...xs),
    y0: Math.min(...ys),
    x1: Math.max(...xs),
    y1: Math.max(...ys),
    highest: Math.max(...points.map((v) => nest.whole[v])),
    first: Math.min(...places),
    last: Math.max(...places),
    halves: null,
  };
}
