import type { Forest } from './forest.js';

/**
 * The nests of blossoms at one moment: which blossom lies in which, and the sum of z from the outermost down.
 * Skip pointers (Myers, Information Processing Letters 17, 1983) find the innermost blossom common to two
 * in logarithmic time, however deep they nest.
 */
export interface Ancestry {
  /** Blossoms, outer ones before those inside them. */
  readonly blossoms: readonly number[];
  /** By vertex: the innermost blossom around it, or −1. */
  readonly inner: Int32Array;
  /** By node. */
  readonly outermost: Int32Array;
  readonly parent: Int32Array;
  readonly depth: Int32Array;
  readonly skip: Int32Array;
  readonly zSum: Float64Array;
}

/** Reads the forest between searches; linear time. */
export function nestsOf(f: Forest): Ancestry {
  const { n, set, node } = f;
  const nodes = f.z.length;
  const nests = {
    blossoms: [] as number[],
    inner: new Int32Array(n).fill(-1),
    outermost: new Int32Array(nodes),
    parent: new Int32Array(nodes).fill(-1),
    depth: new Int32Array(nodes),
    skip: new Int32Array(nodes),
    zSum: new Float64Array(nodes),
  };
  const { blossoms } = nests;
  let known = 0;
  for (let v = 0; v < n; v++) {
    const top = node[set[v]];
    if (top < n || f.firstVertex[top] !== v) continue;
    nests.outermost[top] = top;
    nests.skip[top] = top;
    nests.zSum[top] = f.z[top];
    blossoms.push(top);
    while (known < blossoms.length) enterChildren(f, nests, blossoms[known++]);
  }
  return nests;
}

function enterChildren(f: Forest, nests: Ancestry & { blossoms: number[] }, blossom: number): void {
  const { n, z, firstChild, sibling } = f;
  const { blossoms, inner, outermost, parent, depth, skip, zSum } = nests;
  const far = skip[blossom];
  const balanced = depth[blossom] - depth[far] === depth[far] - depth[skip[far]];
  let child = firstChild[blossom];
  do {
    if (child < n) inner[child] = blossom;
    else {
      parent[child] = blossom;
      outermost[child] = outermost[blossom];
      depth[child] = depth[blossom] + 1;
      skip[child] = balanced ? skip[far] : blossom;
      zSum[child] = zSum[blossom] + z[child];
      blossoms.push(child);
    }
    child = sibling[child];
  } while (child !== firstChild[blossom]);
}

/** The innermost blossom that holds both, or −1; either argument may be −1. */
export function commonBlossom(nests: Ancestry, a: number, b: number): number {
  if (a === b) return a;
  const { outermost, parent, depth, skip } = nests;
  if (a < 0 || b < 0 || outermost[a] !== outermost[b]) return -1;
  let i = a;
  let j = b;
  while (depth[i] > depth[j]) i = depth[skip[i]] >= depth[j] ? skip[i] : parent[i];
  while (depth[j] > depth[i]) j = depth[skip[j]] >= depth[i] ? skip[j] : parent[j];
  while (i !== j) {
    if (skip[i] !== skip[j]) {
      i = skip[i];
      j = skip[j];
    } else {
      i = parent[i];
      j = parent[j];
    }
  }
  return i;
}
