import { type Nest, nestOf } from './certificateNest.js';
import { pairsFail } from './certificatePairs.js';
import type { Certificate, CertifiedMatching, MatchingProblem } from './problem.js';

/** Doubles of at most this size keep every sum of a few exact. */
const EXACT = 2 ** 50;
/** Room for rounding in the sum of the total, per pair and relative. */
const ROUNDING = 2 ** -51;

export interface CertificateCheck {
  readonly ok: boolean;
  /** What fails first, in words; null where nothing does. */
  readonly reason: string | null;
}

/**
 * Checks from the definitions alone that a matching is perfect and that no perfect matching has a lower integer
 * cost: linear-programming duality (Edmonds 1965). For every pair u, v the cost c less y(u), y(v) and the duals
 * of the sets that hold exactly one of them must not be negative; it must be 0 on the pairs of the matching, and
 * every set with a dual above 0 must be left by exactly one of them. The floor in the integer costs makes a true
 * cost at least integer cost / (2·scale). Of a matching that is not said to be optimal, only the bound is checked.
 *
 * Shares no code with the solver but the order in which points are put into boxes, on which nothing hangs. Pairs
 * of boxes that are far apart for their duals are passed over together: about n·log n and the sizes of the sets;
 * n more for each special vertex.
 */
export function checkCertificate(problem: MatchingProblem, matching: CertifiedMatching): CertificateCheck {
  const reason = firstFault(problem, matching);
  return { ok: reason === null, reason };
}

function firstFault(problem: MatchingProblem, matching: CertifiedMatching): string | null {
  const { certificate, mate } = matching;
  const shape =
    matesFail(problem, mate) ?? shapeFails(problem.n, certificate) ?? membersFail(problem.n, matching);
  if (shape !== null) return shape;
  const nest = nestOf(problem.n, certificate);
  if (nest === null) return 'two sets overlap';
  const cost = pairCosts(problem);
  return (
    wholeFails(nest) ??
    pairsFail(problem, certificate.scale, nest) ??
    (matching.optimal ? matchedFail(matching, nest, cost) : null) ??
    sumsFail(problem, matching, cost)
  );
}

function matesFail(problem: MatchingProblem, mate: Int32Array): string | null {
  if (mate.length !== problem.n) return 'there is not one mate a vertex';
  for (let v = 0; v < problem.n; v++) {
    const m = mate[v];
    if (m < 0 || m >= problem.n || m === v || mate[m] !== v) return `vertex ${v} is not in exactly one pair`;
  }
  return null;
}

function shapeFails(n: number, certificate: Certificate): string | null {
  const { scale, vertexDual, setDual, setFirst, setEnd, setMembers } = certificate;
  if (!(scale > 0 && Number.isFinite(2 * scale)) || 2 ** Math.round(Math.log2(scale)) !== scale) {
    return 'the scale is no power of two';
  }
  const sets = setDual.length;
  if (vertexDual.length !== n || setFirst.length !== sets || setEnd.length !== sets) {
    return 'the columns do not fit together';
  }
  for (let i = 0; i < sets; i++) {
    if (setFirst[i] > setEnd[i] || setEnd[i] > setMembers.length) return `set ${i} leaves its column`;
  }
  for (const dual of vertexDual) {
    if (!Number.isInteger(dual) || Math.abs(dual) > EXACT) return 'a vertex dual is no exact integer';
  }
  for (const dual of setDual) {
    if (!Number.isInteger(dual) || dual > EXACT) return 'a set dual is no exact integer';
    if (dual < 0) return 'a set dual is negative';
  }
  return null;
}

/** Sets must be odd, and left by one pair where their dual counts. */
function membersFail(n: number, matching: CertifiedMatching): string | null {
  const { mate, optimal } = matching;
  const { setDual, setFirst, setEnd, setMembers } = matching.certificate;
  const inSet = new Int32Array(n).fill(-1);
  for (let i = 0; i < setDual.length; i++) {
    const size = setEnd[i] - setFirst[i];
    if (size < 3 || size % 2 === 0) return `set ${i} is not odd`;
    for (let k = setFirst[i]; k < setEnd[i]; k++) {
      const v = setMembers[k];
      if (v >= n || inSet[v] === i) return `set ${i} has a wrong member`;
      inSet[v] = i;
    }
    let leaving = 0;
    for (let k = setFirst[i]; k < setEnd[i]; k++) if (inSet[mate[setMembers[k]]] !== i) leaving++;
    if (optimal && setDual[i] > 0 && leaving !== 1) return `set ${i} is left by ${leaving} pairs`;
  }
  return null;
}

function wholeFails(nest: Nest): string | null {
  for (const value of nest.whole) if (Math.abs(value) > EXACT) return 'the duals outgrow exact integers';
  return null;
}

/** The cost of a pair by the contract in problem.ts. */
function pairCosts(problem: MatchingProblem): (i: number, j: number) => number {
  const { n, x, y, special, ways } = problem;
  const key = (i: number, j: number): number => Math.min(i, j) * n + Math.max(i, j);
  const other = new Map<number, number>();
  if (ways !== undefined) {
    for (let i = 0; i < ways.cost.length; i++) {
      const k = key(ways.u[i], ways.v[i]);
      other.set(k, Math.min(ways.cost[i], other.get(k) ?? Number.POSITIVE_INFINITY));
    }
  }
  return (i, j) => {
    if (Math.max(i, j) >= n - special) return problem.specialCost(Math.min(i, j), Math.max(i, j));
    const dx = x[i] - x[j];
    const dy = y[i] - y[j];
    const direct = problem.weigh(Math.sqrt(dx * dx + dy * dy));
    return other.size === 0 ? direct : Math.min(direct, other.get(key(i, j)) ?? direct);
  };
}

/** The pairs of the matching have no slack. */
function matchedFail(
  matching: CertifiedMatching,
  nest: Nest,
  cost: (i: number, j: number) => number,
): string | null {
  const { mate, certificate } = matching;
  for (let v = 0; v < mate.length; v++) {
    const m = mate[v];
    if (m < v) continue;
    const integer = 2 * Math.floor(certificate.scale * cost(v, m));
    if (integer - nest.whole[v] - nest.whole[m] + 2 * nest.sharedBy(v, m) !== 0) {
      return `the matched pair ${v}, ${m} has slack`;
    }
  }
  return null;
}

/** What is claimed in the problem's unit follows from the duals; primal and dual integer sums are equal. */
function sumsFail(
  problem: MatchingProblem,
  matching: CertifiedMatching,
  cost: (i: number, j: number) => number,
): string | null {
  const { scale, vertexDual, setDual, lowerBound } = matching.certificate;
  let primal = 0n;
  let total = 0;
  let size = 0;
  for (let v = 0; v < problem.n; v++) {
    if (matching.mate[v] < v) continue;
    const priced = cost(v, matching.mate[v]);
    primal += 2n * BigInt(Math.floor(scale * priced));
    total += priced;
    size += Math.abs(priced);
  }
  let dual = 0n;
  for (const value of vertexDual) dual += BigInt(value);
  for (const value of setDual) dual += BigInt(value);
  if (matching.optimal && primal !== dual) return 'the duals do not add up to the cost of the pairs';
  if (!Number.isFinite(lowerBound) || BigInt(Math.ceil(lowerBound * scale * 2)) > dual) {
    return 'the lower bound is above the duals';
  }
  if (Math.abs(total - matching.total) > size * problem.n * ROUNDING)
    return 'the total is not that of the pairs';
  if (lowerBound > matching.total) return 'the lower bound is above the total';
  return null;
}
