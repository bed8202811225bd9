import type { Ancestry } from './ancestry.js';
import { pairCostOf } from './cost.js';
import { type Forest, pairRing, split } from './forest.js';
import type { Layout } from './layout.js';
import type { Certificate, MatchingProblem } from './problem.js';
import { DoubleSum, IntegerSum, roundedDown } from './sums.js';

/** The duals as the certificate states them: y(v) = π(v) − Σ z/2 over the blossoms around v, and Y = z/2. */
export function certificateOf(f: Forest, layout: Layout, scale: number, nests: Ancestry): Certificate {
  const { z, firstVertex, size } = f;
  const sum = new IntegerSum();
  const vertexDual = vertexDuals(f, layout.original, nests, sum);
  const { setMembers, position } = memberList(f, layout.original, nests);
  let sets = 0;
  for (const blossom of nests.blossoms) if (z[blossom] > 0) sets++;
  const setDual = new Float64Array(sets);
  const setFirst = new Uint32Array(sets);
  const setEnd = new Uint32Array(sets);
  let i = 0;
  for (const blossom of nests.blossoms) {
    if (z[blossom] <= 0) continue;
    setDual[i] = z[blossom] / 2;
    sum.add(setDual[i]);
    setFirst[i] = position[firstVertex[blossom]];
    setEnd[i] = setFirst[i] + size[blossom];
    i++;
  }
  const lowerBound = roundedDown(sum.value()) / (2 * scale);
  return { scale, vertexDual, setDual, setFirst, setEnd, setMembers, lowerBound };
}

function vertexDuals(f: Forest, original: Int32Array, nests: Ancestry, sum: IntegerSum): Float64Array {
  const { n, pi, off, set } = f;
  const { inner, zSum } = nests;
  const vertexDual = new Float64Array(n);
  for (let v = 0; v < n; v++) {
    const around = inner[v];
    const dual = pi[v] + off[set[v]] - (around < 0 ? 0 : zSum[around] / 2);
    vertexDual[original[v]] = dual;
    sum.add(dual);
  }
  return vertexDual;
}

/** A blossom's vertices are a run of its outermost blossom's chain. */
function memberList(
  f: Forest,
  original: Int32Array,
  nests: Ancestry,
): { setMembers: Uint32Array; position: Int32Array } {
  const { n, next, firstVertex, lastVertex } = f;
  const setMembers = new Uint32Array(n);
  const position = new Int32Array(n);
  let at = 0;
  for (const blossom of nests.blossoms) {
    if (nests.outermost[blossom] !== blossom) continue;
    for (let v = firstVertex[blossom]; ; v = next[v]) {
      position[v] = at;
      setMembers[at++] = original[v];
      if (v === lastVertex[blossom]) break;
    }
  }
  return { setMembers: setMembers.slice(0, at), position };
}

/** Opens every blossom and reads each vertex's mate, in the problem's numbering. Destroys the forest. */
export function matesOf(f: Forest, layout: Layout): Int32Array {
  const { n, set, node, mateOut } = f;
  const stack: number[] = [];
  for (let v = 0; v < n; v++) {
    if (node[set[v]] >= n && f.firstVertex[node[set[v]]] === v) stack.push(set[v]);
  }
  while (stack.length > 0) open(f, stack.pop() as number, stack);
  const mate = new Int32Array(n);
  const { original } = layout;
  for (let v = 0; v < n; v++) mate[original[v]] = original[mateOut[set[v]]];
  return mate;
}

function open(f: Forest, s: number, stack: number[]): void {
  const { n, set, node, mateIn, mateOut } = f;
  const inner = mateIn[s];
  const outer = mateOut[s];
  const start = f.firstChild[node[s]];
  split(f, s);
  pairRing(f, node[set[inner]]);
  mateIn[set[inner]] = inner;
  mateOut[set[inner]] = outer;
  let child = start;
  do {
    if (child >= n) stack.push(set[f.firstVertex[child]]);
    child = f.sibling[child];
  } while (child !== start);
}

/**
 * The sum of the pairs' costs, rounded once; null where the pairs' whole costs do not add up to the duals
 * exactly, which would prove both optimal.
 */
export function provenTotal(
  certificate: Certificate,
  mate: Int32Array,
  problem: MatchingProblem,
): number | null {
  const { scale, vertexDual, setDual } = certificate;
  const cost = pairCostOf(problem);
  const rest = new IntegerSum();
  const total = new DoubleSum();
  for (let v = 0; v < problem.n; v++) {
    rest.add(vertexDual[v]);
    if (v > mate[v]) continue;
    const priced = cost(v, mate[v]);
    total.add(priced);
    rest.add(-2 * Math.floor(scale * priced));
  }
  for (const dual of setDual) rest.add(dual);
  return rest.value() === 0n ? total.value() : null;
}
