import { expand, promiseExpansion } from './expand.js';
import { BEST, type Forest, relabel, TIME } from './forest.js';
import { scanGrown } from './scan.js';
import { shrink } from './shrink.js';

/**
 * Grows one alternating tree from an exposed set until it reaches another exposed set and the matching is
 * augmented, or until more than `limit` sets are in it; with `handOver` also until it closes an odd cycle, which
 * becomes the exposed set in place of the root. Changes of duals and new blossoms are kept either way. Returns a
 * vertex of the set that is left exposed, −1 where the matching was augmented. One tree at a time: every event
 * then falls on a whole number, since costs are even and all vertices of the tree have duals of one parity.
 */
export function search(f: Forest, root: number, limit: number, handOver: boolean): number {
  const { clock, events } = f;
  f.round++;
  f.labelled = 1;
  f.touched.length = 0;
  f.promises = 0;
  events.clear();
  clock[TIME] = 0;
  clock[BEST] = Number.POSITIVE_INFINITY;
  const start = f.firstVertex[f.node[root]];
  join(f, root, 1);
  scanGrown(f, start, f.lastVertex[f.node[root]], root);
  for (;;) {
    const now = events.minKey();
    if (now >= clock[BEST]) {
      if (clock[BEST] === Number.POSITIVE_INFINITY)
        throw new Error('the candidates hold no perfect matching');
      clock[TIME] = clock[BEST];
      augment(f);
      leave(f);
      return -1;
    }
    clock[TIME] = now;
    if (f.labelled > limit) {
      leave(f);
      return start;
    }
    events.pop();
    const formed = happen(f, events.b);
    if (handOver && formed >= 0) {
      exposeInstead(f, f.set[formed]);
      leave(f);
      return formed;
    }
  }
}

/**
 * An event is due; one that later changes have overtaken shows by the slack that is left, and is dropped. Returns
 * a vertex of the blossom formed, −1 where none was.
 */
function happen(f: Forest, what: number): number {
  const { set, sign, node, pi, off, clock } = f;
  const time = clock[TIME];
  if (what < 0) {
    const s = set[~what];
    if (sign[s] < 0 && node[s] >= f.n && f.z[node[s]] === 2 * time) expand(f, s);
    return -1;
  }
  const { tail, head, cost } = f.graph;
  const v = tail[what];
  const w = head[what];
  const s = set[v];
  const r = set[w];
  if (s === r || sign[s] + sign[r] <= 0) return -1;
  const slack = cost[what] - pi[v] - off[s] - pi[w] - off[r] - (sign[s] + sign[r]) * time;
  if (slack !== 0) return -1;
  if (sign[s] === sign[r]) {
    shrink(f, v, w);
    return v;
  }
  if (sign[s] > 0) grow(f, v, w);
  else grow(f, w, v);
  return -1;
}

/** The tree takes in the set of w along the tight edge u–w, and that set's mate. */
function grow(f: Forest, u: number, w: number): void {
  const s = f.set[w];
  join(f, s, -1);
  f.parentEnd[s] = u;
  f.childEnd[s] = w;
  promiseExpansion(f, s);
  const mate = f.set[f.mateOut[s]];
  join(f, mate, 1);
  scanGrown(f, f.firstVertex[f.node[mate]], f.lastVertex[f.node[mate]], mate);
  f.labelled += 2;
}

function join(f: Forest, s: number, sign: number): void {
  relabel(f, s, sign);
  f.touched.push(s);
}

/** Takes every set out of the tree; duals stay as they are now. */
function leave(f: Forest): void {
  for (const s of f.touched) if (f.sign[s] !== 0) relabel(f, s, 0);
}

/** Swaps matched and unmatched edges on the way from the exposed set just reached back to the root. */
function augment(f: Forest): void {
  const { set, mateIn, mateOut, parentEnd, childEnd } = f;
  let u = f.bestInner;
  let w = f.bestOuter;
  mateIn[set[w]] = w;
  mateOut[set[w]] = u;
  for (;;) {
    const s = set[u];
    const before = mateOut[s];
    mateIn[s] = u;
    mateOut[s] = w;
    if (before < 0) return;
    const m = set[before];
    w = childEnd[m];
    u = parentEnd[m];
    mateIn[m] = w;
    mateOut[m] = u;
  }
}

/** Swaps matched and unmatched edges on the way from a grown set back to the root: it is exposed instead. */
function exposeInstead(f: Forest, s: number): void {
  const { set, mateIn, mateOut, parentEnd, childEnd } = f;
  let before = mateOut[s];
  mateIn[s] = -1;
  mateOut[s] = -1;
  while (before >= 0) {
    const m = set[before];
    const u = parentEnd[m];
    const r = set[u];
    before = mateOut[r];
    mateIn[m] = childEnd[m];
    mateOut[m] = u;
    mateIn[r] = u;
    mateOut[r] = childEnd[m];
  }
}
