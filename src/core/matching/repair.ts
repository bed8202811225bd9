import { type Forest, pairRing, split } from './forest.js';

/**
 * Makes room for an edge u–v of this cost with negative slack, at the price of exposing a few sets: blossoms
 * around both ends are taken apart, then one end's dual is lowered. Other slacks only grow, but the matched edges
 * of what was lowered are no longer tight and are given up. Pushes a vertex of every set exposed to `exposed`.
 */
export function makeRoom(f: Forest, u: number, v: number, cost: number, exposed: number[]): void {
  const { n, set, node, pi, off, z, mateOut } = f;
  while (set[u] === set[v]) takeApart(f, u, exposed);
  let short = pi[u] + off[set[u]] + pi[v] + off[set[v]] - cost;
  if (short <= 0) return;
  const side = cheaperSide(f, u, v, short);
  for (;;) {
    const s = set[side];
    if (node[s] < n || z[node[s]] >= 2 * short) {
      off[s] -= short;
      if (node[s] >= n) z[node[s]] -= 2 * short;
      if (mateOut[s] >= 0) expose(f, s, exposed);
      return;
    }
    short -= z[node[s]] / 2;
    takeApart(f, side, exposed);
  }
}

/** The end that can be lowered with the least harm: exposed already, else a blossom with room, else the smaller. */
function cheaperSide(f: Forest, u: number, v: number, short: number): number {
  const harm = (w: number): number => {
    const s = f.set[w];
    const room = f.node[s] < f.n || f.z[f.node[s]] >= 2 * short;
    return (f.mateOut[s] < 0 ? 0 : f.n) + (room ? 0 : f.n) + f.size[f.node[s]];
  };
  return harm(u) <= harm(v) ? u : v;
}

/** Uses up the outermost blossom around u and opens it; the child with u is left exposed. */
function takeApart(f: Forest, u: number, exposed: number[]): void {
  const { set, node, off, z, mateOut } = f;
  const s = set[u];
  if (mateOut[s] >= 0) expose(f, s, exposed);
  off[s] -= z[node[s]] / 2;
  z[node[s]] = 0;
  split(f, s);
  pairRing(f, node[set[u]]);
  exposed.push(u);
}

function expose(f: Forest, s: number, exposed: number[]): void {
  const { set, mateIn, mateOut } = f;
  const inner = mateIn[s];
  const outer = mateOut[s];
  exposed.push(inner, outer);
  mateIn[s] = -1;
  mateOut[s] = -1;
  mateIn[set[outer]] = -1;
  mateOut[set[outer]] = -1;
}
