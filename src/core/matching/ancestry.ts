import type { Forest } from './forest.js';

/**
 * The nests of blossoms at one moment: which blossom lies in which, and the sum of z from the outermost down.
 * Skip pointers (Myers, Information Processing Letters 17, 1983) find the innermost blossom common to two
 * in logarithmic time, however deep they nest.
 */
export interface Ancestry {
  /** Blossoms, outer ones before those inside them. */
  readonly blossoms: number[];
  /** By vertex: the innermost blossom around it, or −1. */
  readonly inner: Int32Array;
  /** By node. */
  readonly outermost: Int32Array;
  readonly parent: Int32Array;
  readonly depth: Int32Array;
  readonly skip: Int32Array;
  readonly zSum: Float64Array;
}

/**
 * Room for the nests of a forest, to be read anew after every change: what is thrown away between rounds takes
 * the code compiled for it along in some engines.
 */
export function roomForNests(f: Forest): Ancestry {
  const nodes = f.z.length;
  return {
    blossoms: [],
    inner: new Int32Array(f.n),
    outermost: new Int32Array(nodes),
    parent: new Int32Array(nodes),
    depth: new Int32Array(nodes),
    skip: new Int32Array(nodes),
    zSum: new Float64Array(nodes),
  };
}

/** Reads the forest between searches; linear time. */
export function readNests(f: Forest, nests: Ancestry): void {
  const { n, set, node } = f;
  const { blossoms } = nests;
  blossoms.length = 0;
  nests.inner.fill(-1);
  let known = 0;
  for (let v = 0; v < n; v++) {
    const top = node[set[v]];
    if (top < n || f.firstVertex[top] !== v) continue;
    enterOutermost(f, nests, top);
    while (known < blossoms.length) enterChildren(f, nests, blossoms[known++]);
  }
}

function enterOutermost(f: Forest, nests: Ancestry, top: number): void {
  nests.outermost[top] = top;
  nests.parent[top] = -1;
  nests.depth[top] = 0;
  nests.skip[top] = top;
  nests.zSum[top] = f.z[top];
  nests.blossoms.push(top);
}

function enterChildren(f: Forest, nests: Ancestry, blossom: number): void {
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
