import type { Ancestry } from './ancestry.js';
import { pairCostOf } from './cost.js';
import { type Forest, pairRing, split } from './forest.js';
import type { IntegerCosts, Layout } from './layout.js';
import type { Certificate } from './problem.js';
import { IntegerSum, roundedDown } from './sums.js';

/** The duals as the certificate states them: y(v) = π(v) − Σ z/2 over the blossoms around v, and Y = z/2. */
export function certificateOf(f: Forest, layout: Layout, scale: number, nests: Ancestry): Certificate {
  const { n, pi, off, set, z, next, firstVertex, lastVertex, size } = f;
  const { original } = layout;
  const vertexDual = new Float64Array(n);
  const sum = new IntegerSum();
  for (let v = 0; v < n; v++) {
    const around = nests.inner[v];
    const dual = pi[v] + off[set[v]] - (around < 0 ? 0 : nests.zSum[around] / 2);
    vertexDual[original[v]] = dual;
    sum.add(dual);
  }
  const sets = nests.blossoms.filter((blossom) => z[blossom] > 0);
  const setDual = Float64Array.from(sets, (blossom) => z[blossom] / 2);
  for (const dual of setDual) sum.add(dual);
  // A blossom's vertices are a run of its outermost blossom's chain.
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
  const setFirst = Uint32Array.from(sets, (blossom) => position[firstVertex[blossom]]);
  const setEnd = Uint32Array.from(sets, (blossom) => position[firstVertex[blossom]] + size[blossom]);
  const lowerBound = roundedDown(sum.value()) / (2 * scale);
  return { scale, vertexDual, setDual, setFirst, setEnd, setMembers: setMembers.slice(0, at), lowerBound };
}

/** Opens every blossom and reads each vertex's mate, in the problem's numbering. Destroys the forest. */
export function matesOf(f: Forest, layout: Layout): Int32Array {
  const { n, set, node, mateIn, mateOut } = f;
  const stack: number[] = [];
  for (let v = 0; v < n; v++) {
    if (node[set[v]] >= n && f.firstVertex[node[set[v]]] === v) stack.push(set[v]);
  }
  while (stack.length > 0) {
    const s = stack.pop() as number;
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
  const mate = new Int32Array(n);
  for (let v = 0; v < n; v++) mate[layout.original[v]] = layout.original[mateOut[set[v]]];
  return mate;
}

/** Whether the pairs' integer costs add up to the duals exactly, which proves both optimal. */
export function tallies(
  certificate: Certificate,
  mate: Int32Array,
  layout: Layout,
  costs: IntegerCosts,
): boolean {
  const cost = pairCostOf(layout.problem);
  const sum = new IntegerSum();
  for (let v = 0; v < layout.n; v++) {
    const u = layout.original[v];
    if (u < mate[u]) sum.add(-2 * Math.floor(costs.scale * cost(u, mate[u])));
    sum.add(certificate.vertexDual[u]);
  }
  for (const dual of certificate.setDual) sum.add(dual);
  return sum.value() === 0n;
}
