import { type Forest, TIME } from './forest.js';
import { scanGrown } from './scan.js';

/** Where the tree paths from two grown sets to the root meet. Time in the length of the cycle. */
function meeting(f: Forest, s: number, t: number): number {
  const { mark, mateOut, parentEnd, set } = f;
  const stamp = ++f.marks;
  let a = s;
  let b = t;
  for (;;) {
    if (a >= 0) {
      if (mark[a] === stamp) return a;
      mark[a] = stamp;
      a = mateOut[a] < 0 ? -1 : set[parentEnd[set[mateOut[a]]]];
    }
    const swap = a;
    a = b;
    b = swap;
  }
}

/** Lays the odd cycle closed by the tight edge u–w into `ring`, as sets, with its links and siblings. */
function layRing(f: Forest, u: number, w: number): number {
  const { set, node, mateIn, mateOut, parentEnd, childEnd, linkHere, linkThere, sibling, ring } = f;
  const top = meeting(f, set[u], set[w]);
  ring.length = 0;
  for (let s = set[w]; s !== top; ) {
    const m = set[mateOut[s]];
    ring.push(s, m);
    s = set[parentEnd[m]];
  }
  ring.push(top);
  // So far from w's set up to the top; turned round, links lead down from the top to w's set.
  ring.reverse();
  for (let i = 0; i + 1 < ring.length; i += 2) {
    const m = ring[i + 1];
    const s = ring[i + 2];
    linkHere[node[ring[i]]] = parentEnd[m];
    linkThere[node[ring[i]]] = childEnd[m];
    linkHere[node[m]] = mateOut[s];
    linkThere[node[m]] = mateIn[s];
  }
  linkHere[node[set[w]]] = w;
  linkThere[node[set[w]]] = u;
  for (let s = set[u]; s !== top; ) {
    const m = set[mateOut[s]];
    linkHere[node[s]] = mateIn[s];
    linkThere[node[s]] = mateOut[s];
    linkHere[node[m]] = childEnd[m];
    linkThere[node[m]] = parentEnd[m];
    ring.push(s, m);
    s = set[parentEnd[m]];
  }
  for (let i = 0; i < ring.length; i++) sibling[node[ring[i]]] = node[ring[(i + 1) % ring.length]];
  return top;
}

/** Makes one blossom of the sets in `ring`; their vertices move to the largest one's set, which is returned. */
export function mergeRing(f: Forest): number {
  const { set, node, sign, off, pi, z, next, firstVertex, lastVertex, size, ring } = f;
  const time = f.clock[TIME];
  const blossom = f.takeBlossom();
  let keep = ring[0];
  let total = 0;
  for (const s of ring) {
    total += size[node[s]];
    if (size[node[s]] > size[node[keep]]) keep = s;
  }
  const level = off[keep] + sign[keep] * time;
  let last = -1;
  for (const s of ring) {
    const child = node[s];
    if (child >= f.n) z[child] += 2 * sign[s] * time;
    if (s !== keep) {
      const shift = off[s] + sign[s] * time - level;
      for (let v = firstVertex[child]; ; v = next[v]) {
        pi[v] += shift;
        set[v] = keep;
        if (v === lastVertex[child]) break;
      }
    }
    if (last >= 0) next[last] = firstVertex[child];
    last = lastVertex[child];
  }
  firstVertex[blossom] = firstVertex[node[ring[0]]];
  lastVertex[blossom] = last;
  size[blossom] = total;
  f.firstChild[blossom] = node[ring[0]];
  z[blossom] = 0;
  for (const s of ring) {
    sign[s] = 0;
    if (s !== keep) f.dropSet(s);
  }
  node[keep] = blossom;
  off[keep] = level;
  return keep;
}

/** The tight edge u–w joins two grown sets: their cycle becomes one grown blossom. */
export function shrink(f: Forest, u: number, w: number): void {
  const { node, sign, mateIn, mateOut, ring, firstVertex, lastVertex } = f;
  const top = layRing(f, u, w);
  const inner = mateIn[top];
  const outer = mateOut[top];
  const fresh: number[] = [];
  for (const s of ring) if (sign[s] < 0) fresh.push(node[s]);
  const s = mergeRing(f);
  mateIn[s] = inner;
  mateOut[s] = outer;
  sign[s] = 1;
  f.off[s] -= f.clock[TIME];
  f.z[node[s]] = -2 * f.clock[TIME];
  f.touched.push(s);
  for (const child of fresh) scanGrown(f, firstVertex[child], lastVertex[child], s);
}
