import { BEST, type Forest, pairRing, relabel, split } from './forest.js';
import { scanGrown, scanReleased } from './scan.js';

/**
 * A shrinking blossom's dual has run out: it is taken apart. The even way round its cycle, from the child
 * the tree came in at to the child with the blossom's mate, stays in the tree; the other children are released
 * in matched pairs.
 */
export function expand(f: Forest, s: number): void {
  const { set, node, mateIn, mateOut, parentEnd, childEnd, sibling, linkHere, linkThere, firstVertex } = f;
  const outerEnd = parentEnd[s];
  const entry = childEnd[s];
  const inner = mateIn[s];
  const outer = mateOut[s];
  split(f, s);
  const base = node[set[inner]];
  pairRing(f, base);
  mateIn[set[inner]] = inner;
  mateOut[set[inner]] = outer;

  // The cycle from the base on; pairs are (1, 2), (3, 4), …
  const cycle: number[] = [base];
  for (let child = sibling[base]; child !== base; child = sibling[child]) cycle.push(child);
  const count = cycle.length;
  const enters = cycle.indexOf(node[set[entry]]);
  const forward = enters % 2 === 1;
  const steps = forward ? count - enters : enters;

  parentEnd[set[entry]] = outerEnd;
  childEnd[set[entry]] = entry;
  for (let i = 1; i <= steps; i++) {
    const at = cycle[(forward ? enters + i : enters - i) % count];
    const before = cycle[forward ? enters + i - 1 : enters - i + 1];
    const id = set[firstVertex[at]];
    if (i % 2 === 1) relabel(f, id, 1);
    else {
      parentEnd[id] = forward ? linkHere[before] : linkThere[at];
      childEnd[id] = forward ? linkThere[before] : linkHere[at];
    }
  }
  const released: number[] = [];
  if (forward) for (let i = 1; i < enters; i++) released.push(cycle[i]);
  else for (let i = enters + 1; i < count; i++) released.push(cycle[i]);
  for (const child of released) relabel(f, set[firstVertex[child]], 0);

  for (let i = 0; i <= steps; i++) {
    const child = cycle[(forward ? enters + i : enters - i) % count];
    const id = set[firstVertex[child]];
    f.touched.push(id);
    if (i % 2 === 1) scanGrown(f, firstVertex[child], f.lastVertex[child], id);
    else promiseExpansion(f, id);
  }
  f.labelled += steps;
  for (const child of released) scanReleased(f, set[firstVertex[child]]);
}

/** A set has begun to shrink: if it is a blossom, promises when its dual will have run out (~ a vertex, no arc). */
export function promiseExpansion(f: Forest, s: number): void {
  const blossom = f.node[s];
  if (blossom < f.n) return;
  // While shrinking z is z[blossom] − 2·time.
  const when = f.z[blossom] / 2;
  if (when < f.clock[BEST]) f.events.push(when, f.promises++, ~f.firstVertex[blossom]);
}
