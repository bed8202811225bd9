import type { Forest } from './forest.js';
import type { IntegerCosts, Layout } from './layout.js';
import { mergeRing } from './shrink.js';

/**
 * Duals to begin with: half the cheapest edge to another placed vertex, then for each special vertex as much
 * as the rest leaves. No edge has negative slack.
 */
export function firstDuals(f: Forest, placed: number): void {
  const { n, pi } = f;
  const { first, head, cost } = f.graph;
  for (let v = 0; v < n; v++) {
    let cheapest = Number.POSITIVE_INFINITY;
    for (let arc = first[v]; arc < first[v + 1]; arc++) {
      if (v < placed === head[arc] < placed && cost[arc] < cheapest) cheapest = cost[arc];
    }
    let value = cheapest / 2;
    if (v >= placed) {
      for (let arc = first[v]; arc < first[v + 1]; arc++) {
        if (head[arc] < placed) value = Math.min(value, cost[arc] - pi[head[arc]]);
      }
    }
    pi[v] = value === Number.POSITIVE_INFINITY ? 0 : value;
  }
}

/**
 * Vertices on one place all have edges of one cost between them, tight from the start: an odd number of them
 * is a blossom already, and of an even number the last is left over as its mate.
 */
export function contractPlaces(f: Forest, layout: Layout, costs: IntegerCosts): void {
  const { first } = layout;
  for (let p = 0; p + 1 < first.length; p++) {
    const start = first[p];
    const size = first[p + 1] - start;
    const odd = size % 2 === 0 ? size - 1 : size;
    if (size > 1 && !tight(f, start, start + size, costs.between(start, start + 1))) continue;
    let s = start;
    if (odd >= 3) {
      f.ring.length = 0;
      for (let i = 0; i < odd; i++) {
        const v = start + i;
        f.linkHere[v] = v;
        f.linkThere[v] = start + ((i + 1) % odd);
        f.sibling[v] = f.linkThere[v];
        f.ring.push(v);
      }
      s = mergeRing(f);
    }
    if (odd !== size) matchAlong(f, start, start + odd);
    else f.mateOut[s] = -1;
  }
}

/** Whether the edges between vertices on one place are tight: another way from one of them may be cheaper. */
function tight(f: Forest, start: number, end: number, cost: number): boolean {
  for (let v = start; v < end; v++) if (2 * f.pi[v] !== cost) return false;
  return true;
}

/** Raises every exposed set's dual until an edge is tight, and matches where that one's other end is exposed too. */
export function raiseExposed(f: Forest): void {
  const { n, set, node, pi, off, z, mateOut, next, firstVertex, lastVertex } = f;
  const { first, head, cost } = f.graph;
  for (let vertex = 0; vertex < n; vertex++) {
    const s = set[vertex];
    if (mateOut[s] >= 0 || firstVertex[node[s]] !== vertex) continue;
    let least = Number.POSITIVE_INFINITY;
    let here = -1;
    let there = -1;
    for (let v = vertex; ; v = next[v]) {
      for (let arc = first[v]; arc < first[v + 1]; arc++) {
        const w = head[arc];
        if (set[w] === s) continue;
        const slack = cost[arc] - pi[v] - off[s] - pi[w] - off[set[w]];
        if (slack < least || (slack === least && mateOut[set[w]] < 0 && mateOut[set[there]] >= 0)) {
          least = slack;
          here = v;
          there = w;
        }
      }
      if (v === lastVertex[node[s]]) break;
    }
    if (here < 0) continue;
    off[s] += least;
    if (node[s] >= n) z[node[s]] += 2 * least;
    if (mateOut[set[there]] < 0) matchAlong(f, here, there);
  }
}

/** Matches the sets of u and v along the edge u–v. */
export function matchAlong(f: Forest, u: number, v: number): void {
  const { set, mateIn, mateOut } = f;
  mateIn[set[u]] = u;
  mateOut[set[u]] = v;
  mateIn[set[v]] = v;
  mateOut[set[v]] = u;
}
