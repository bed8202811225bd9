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
 * cost at least integer cost / (2·scale). Shares no code with the solver. Time n² and the sizes of the sets.
 */
export function checkCertificate(problem: MatchingProblem, matching: CertifiedMatching): CertificateCheck {
  const reason =
    matesFail(problem, matching.mate) ??
    shapeFails(problem.n, matching.certificate) ??
    setsFail(problem.n, matching) ??
    pairsFail(problem, matching) ??
    sumsFail(problem, matching);
  return { ok: reason === null, reason };
}

function cost(problem: MatchingProblem, i: number, j: number): number {
  const low = Math.min(i, j);
  const high = Math.max(i, j);
  if (high >= problem.n - problem.special) return problem.specialCost(low, high);
  const dx = problem.x[high] - problem.x[low];
  const dy = problem.y[high] - problem.y[low];
  return problem.weigh(Math.sqrt(dx * dx + dy * dy));
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

/** Sets must be odd, laminar (either apart or one in the other), and left by one pair where their dual counts. */
function setsFail(n: number, matching: CertifiedMatching): string | null {
  const { setDual, setFirst, setEnd, setMembers } = matching.certificate;
  const inSet = new Int32Array(n).fill(-1);
  for (let i = 0; i < setDual.length; i++) {
    const size = setEnd[i] - setFirst[i];
    if (size < 3 || size % 2 === 0) return `set ${i} is not odd`;
    const members = setMembers.subarray(setFirst[i], setEnd[i]);
    for (const v of members) {
      if (v >= n || inSet[v] === i) return `set ${i} has a wrong member`;
      inSet[v] = i;
    }
    let leaving = 0;
    for (const v of members) if (inSet[matching.mate[v]] !== i) leaving++;
    if (setDual[i] > 0 && leaving !== 1) return `set ${i} is left by ${leaving} pairs`;
  }
  return nesting(n, matching.certificate) === null ? 'two sets overlap' : null;
}

interface Nesting {
  /** Sets from large to small. */
  readonly order: readonly number[];
  /** The smallest larger set around each set, −1 for none; the smallest set around each vertex. */
  readonly around: Int32Array;
  readonly innermost: Int32Array;
}

/** Null where two sets overlap: taken from large to small, all members of a set must lie in the same set so far. */
function nesting(n: number, certificate: Certificate): Nesting | null {
  const { setDual, setFirst, setEnd, setMembers } = certificate;
  const order = Array.from(setDual, (_, i) => i);
  order.sort((a, b) => setEnd[b] - setFirst[b] - (setEnd[a] - setFirst[a]) || a - b);
  const around = new Int32Array(setDual.length);
  const innermost = new Int32Array(n).fill(-1);
  for (const i of order) {
    const members = setMembers.subarray(setFirst[i], setEnd[i]);
    around[i] = innermost[members[0]];
    for (const v of members) {
      if (innermost[v] !== around[i]) return null;
      innermost[v] = i;
    }
  }
  return { order, around, innermost };
}

/** The reduced cost of every pair: with d(v) = y(v) + Σ Y around v, it is c − d(u) − d(v) + 2·Σ Y around both. */
function pairsFail(problem: MatchingProblem, matching: CertifiedMatching): string | null {
  const { n } = problem;
  const { scale, vertexDual, setDual } = matching.certificate;
  const nest = nesting(n, matching.certificate);
  if (nest === null) return 'two sets overlap';
  const { order, around, innermost } = nest;
  const depthDual = new Float64Array(setDual.length);
  for (const i of order) depthDual[i] = setDual[i] + (around[i] < 0 ? 0 : depthDual[around[i]]);
  const whole = vertexDual.map((dual, v) => dual + (innermost[v] < 0 ? 0 : depthDual[innermost[v]]));
  for (const value of whole) if (Math.abs(value) > EXACT) return 'the duals outgrow exact integers';
  const shared = new Float64Array(setDual.length);
  const holdsU = new Uint8Array(setDual.length);
  for (let u = 0; u < n; u++) {
    holdsU.fill(0);
    for (let i = innermost[u]; i >= 0; i = around[i]) holdsU[i] = 1;
    for (const i of order) shared[i] = holdsU[i] === 1 ? depthDual[i] : around[i] < 0 ? 0 : shared[around[i]];
    for (let v = u + 1; v < n; v++) {
      const integer = 2 * Math.floor(scale * cost(problem, u, v));
      if (!(Math.abs(integer) <= EXACT)) return 'the costs outgrow exact integers';
      const both = innermost[v] < 0 ? 0 : shared[innermost[v]];
      const reduced = integer - whole[u] - whole[v] + 2 * both;
      if (reduced < 0) return `the pair ${u}, ${v} has a negative reduced cost`;
      if (matching.mate[u] === v && reduced !== 0) return `the matched pair ${u}, ${v} has slack`;
    }
  }
  return null;
}

/** Primal and dual integer sums are equal, and what is claimed in the problem's unit follows from them. */
function sumsFail(problem: MatchingProblem, matching: CertifiedMatching): string | null {
  const { scale, vertexDual, setDual, lowerBound } = matching.certificate;
  let primal = 0n;
  let total = 0;
  let size = 0;
  for (let v = 0; v < problem.n; v++) {
    if (matching.mate[v] < v) continue;
    const priced = cost(problem, v, matching.mate[v]);
    primal += 2n * BigInt(Math.floor(scale * priced));
    total += priced;
    size += Math.abs(priced);
  }
  let dual = 0n;
  for (const value of vertexDual) dual += BigInt(value);
  for (const value of setDual) dual += BigInt(value);
  if (primal !== dual) return 'the duals do not add up to the cost of the pairs';
  if (!Number.isFinite(lowerBound) || BigInt(Math.ceil(lowerBound * scale * 2)) > dual) {
    return 'the lower bound is above the duals';
  }
  if (Math.abs(total - matching.total) > size * problem.n * ROUNDING)
    return 'the total is not that of the pairs';
  if (lowerBound > matching.total) return 'the lower bound is above the total';
  return null;
}
