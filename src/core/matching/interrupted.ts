import { NearestSearch } from '../structures/nearest.js';
import { wayEdges } from './candidates.js';
import { greedyMatching } from './greedy.js';
import type { IntegerCosts, Layout } from './layout.js';
import type { CertifiedMatching } from './problem.js';
import { IntegerSum, roundedDown } from './sums.js';

/**
 * What there is to give at once: the greedy matching, and a valid bound below it. Half the way to the nearest
 * neighbour at every placed vertex, and at a special one what its edges leave, is a dual without sets.
 */
export function interrupted(layout: Layout, costs: IntegerCosts): CertifiedMatching {
  const { n, placed, original } = layout;
  const dual = halfNearest(layout, costs);
  for (let s = placed; s < n; s++) {
    let least = Number.POSITIVE_INFINITY;
    for (let v = 0; v < n; v++) {
      if (v === s) continue;
      const cost = costs.between(v, s);
      least = Math.min(least, v < placed ? cost - dual[v] : cost / 2);
    }
    dual[s] = least;
  }
  const sum = new IntegerSum();
  const vertexDual = new Float64Array(n);
  for (let v = 0; v < n; v++) {
    vertexDual[original[v]] = dual[v];
    sum.add(dual[v]);
  }
  const certificate = {
    scale: costs.scale,
    vertexDual,
    setDual: new Float64Array(0),
    setFirst: new Uint32Array(0),
    setEnd: new Uint32Array(0),
    setMembers: new Uint32Array(0),
    lowerBound: roundedDown(sum.value()) / (2 * costs.scale),
  };
  return { ...greedyMatching(layout.problem), certificate, optimal: false };
}

function halfNearest(layout: Layout, costs: IntegerCosts): Float64Array {
  const { tree, first } = layout;
  const dual = new Float64Array(layout.n);
  const search = new NearestSearch(tree, 1, 1);
  for (let p = 0; p < tree.x.length; p++) {
    const crowded = first[p + 1] - first[p] > 1;
    const q = crowded ? p : search.around(tree.x[p], tree.y[p], p)[0];
    const cost = q < 0 ? 0 : costs.between(first[p], first[q]);
    for (let v = first[p]; v < first[p + 1]; v++) dual[v] = cost / 2;
  }
  wayEdges(layout, costs.scale, (u, v, cost) => {
    dual[u] = Math.min(dual[u], cost / 2);
    dual[v] = Math.min(dual[v], cost / 2);
  });
  return dual;
}
