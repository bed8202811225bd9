import type { TourGraph } from './problem.js';

/** Unused half-edges looked at when choosing where to go on: bounds the time at vertices of huge degree. */
const LOOKED_AT = 64;

/**
 * A closed walk over all edges and connectors (Hierholzer & Wiener 1873), then only its edges in order:
 * connectors follow from it, and two in a row become one.
 *
 * At each vertex the walk leaves by the unused edge that turns least, and by a connector only where no
 * edge is left; splicing a detour in may undo that at one vertex. The walk starts with the home edge.
 * Needs even degrees and a connected graph; throws RangeError otherwise. Linear, but for vertices of
 * high degree.
 *
 * @param connectors u0 v0 u1 v1 …
 * @returns one half-edge for every edge of the graph, in walking order, the home edge first
 */
export function eulerWalk(graph: TourGraph, connectors: ArrayLike<number>): Int32Array {
  const { vertexCount, direction } = graph;
  const required = 2 * graph.edgeCount;
  const total = required + connectors.length;
  const startOf = (h: number) => (h < required ? graph.halfEdgeVertex[h] : connectors[h - required]);

  const first = new Uint32Array(vertexCount + 1);
  for (let h = 0; h < total; h++) first[startOf(h) + 1] = first[startOf(h) + 1] + 1;
  for (let v = 0; v < vertexCount; v++) first[v + 1] = first[v + 1] + first[v];
  const here = new Int32Array(total);
  const fill = first.slice(0, vertexCount);
  // Connectors are filed first, so that edges stand last, where the choice looks first.
  for (let k = 0; k < total; k++) {
    const h = (k + required) % total;
    const v = startOf(h);
    here[fill[v]] = h;
    fill[v] = fill[v] + 1;
  }
  const end = first.slice(1);
  const used = new Uint8Array(total / 2);

  const leaveFrom = (vertex: number, arrived: number): number => {
    const from = first[vertex];
    let to = end[vertex];
    while (to > from && used[here[to - 1] >> 1]) to--;
    end[vertex] = to;
    const byEdge = arrived >= 0 && arrived < required;
    let best = -1;
    let straightest = Number.NEGATIVE_INFINITY;
    for (let k = to - 1; k >= Math.max(from, to - LOOKED_AT); k--) {
      const h = here[k];
      if (used[h >> 1]) continue;
      let fit = -3;
      if (h < required) {
        fit = byEdge
          ? -(
              direction[2 * h] * direction[2 * (arrived ^ 1)] +
              direction[2 * h + 1] * direction[2 * (arrived ^ 1) + 1]
            )
          : 0;
      }
      if (fit > straightest) {
        straightest = fit;
        best = h;
      }
    }
    return best;
  };

  const stack: number[] = [2 * graph.homeEdge];
  used[graph.homeEdge] = 1;
  const walk: number[] = [];
  while (stack.length > 0) {
    const arrived = stack[stack.length - 1];
    const next = leaveFrom(startOf(arrived ^ 1), arrived);
    if (next >= 0) {
      used[next >> 1] = 1;
      stack.push(next);
    } else {
      stack.pop();
      walk.push(arrived);
    }
  }
  walk.reverse();
  if (walk.length !== total / 2) throw new RangeError('edges and connectors are not connected');
  for (let k = 1; k < walk.length; k++) {
    if (startOf(walk[k]) !== startOf(walk[k - 1] ^ 1)) throw new RangeError('a vertex has an odd degree');
  }
  return Int32Array.from(walk.filter((h) => h < required));
}
