import type { Forest } from './forest.js';

/** Grown vertices a tree may hold. */
const LIMIT = 2000;
/** From so many trees on they are given up where fewer than this share of them found a way: few edges are tight then. */
const TRIAL = 256;
const WORTH = 1 / 5;

/**
 * More pairs along tight edges alone, before any dual moves on or a blossom is formed: from each exposed vertex a
 * shortest alternating way to another, breadth first, odd cycles and blossoms passed over. Where there are none
 * this is all that tight edges give (Kuhn 1955), and a tree that found no way out need not be entered again; it
 * is not anywhere, for the search proper takes up what is left. Pays on lattices, where nearly all edges are tight.
 * False where it was given up, for few are.
 */
export function augmentTight(f: Forest): boolean {
  const { n, node, set, mateOut } = f;
  const seen = new Uint8Array(n);
  const from = new Int32Array(n);
  const queue = new Int32Array(LIMIT + 1);
  let trees = 0;
  let found = 0;
  for (let v = 0; v < n; v++) {
    if (mateOut[set[v]] >= 0 || node[set[v]] >= n || seen[v] !== 0) continue;
    trees++;
    if (reach(f, v, seen, from, queue)) found++;
    if (trees >= TRIAL && found < WORTH * trees) return false;
  }
  return found > 0 && found >= WORTH * trees;
}

/** Grows a tree from an exposed vertex; true where it found another one and both are matched now. */
function reach(f: Forest, root: number, seen: Uint8Array, from: Int32Array, queue: Int32Array): boolean {
  const { n, pi, off, set, node, mateOut } = f;
  const { first, head, cost } = f.graph;
  queue[0] = root;
  seen[root] = 1;
  let count = 1;
  let at = 0;
  for (; at < count && count < LIMIT; at++) {
    const v = queue[at];
    const value = pi[v] + off[set[v]];
    for (let arc = first[v]; arc < first[v + 1]; arc++) {
      const w = head[arc];
      if (seen[w] !== 0 || cost[arc] - value - pi[w] - off[set[w]] !== 0 || node[set[w]] >= n) continue;
      const mate = mateOut[set[w]];
      if (mate < 0) {
        flip(f, v, w, from);
        forget(f, seen, queue, count);
        return true;
      }
      if (node[set[mate]] >= n || count === LIMIT) continue;
      seen[w] = 1;
      seen[mate] = 1;
      from[w] = v;
      queue[count++] = mate;
    }
  }
  if (at < count) forget(f, seen, queue, count);
  return false;
}

/** Matches v with w and the rest of the way anew, back to the root. */
function flip(f: Forest, v: number, w: number, from: Int32Array): void {
  const { set, mateIn, mateOut } = f;
  for (let u = v, x = w; ; ) {
    const before = mateOut[set[u]];
    mateIn[set[u]] = u;
    mateOut[set[u]] = x;
    mateIn[set[x]] = x;
    mateOut[set[x]] = u;
    if (before < 0) return;
    x = before;
    u = from[x];
  }
}

/** Lets the tree be entered again: its grown vertices and their mates, who are the same ones after a flip. */
function forget(f: Forest, seen: Uint8Array, queue: Int32Array, count: number): void {
  for (let i = 0; i < count; i++) {
    seen[queue[i]] = 0;
    const mate = f.mateOut[f.set[queue[i]]];
    if (mate >= 0) seen[mate] = 0;
  }
}
