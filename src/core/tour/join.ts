import { DisjointSet } from '../structures/disjointSet.js';
import { connectorCost, type TourGraph } from './problem.js';

/**
 * Joins what connectors leave apart, at the least extra cost found, keeping every degree even.
 *
 * A slot is one end of a connector at a vertex. Every vertex also has two slots joined to each other by
 * a connector of no length. Then three ways of joining are one operation on two connectors u–u' and
 * v–v' of different parts, which become u–v and u'–v':
 *
 * - both real: an exchange;
 * - one of no length: a detour of the other through that vertex;
 * - both of no length: a doubled connector.
 *
 * It never takes a part asunder: a connected graph whose degrees are even has no bridge. Passes over the
 * near pairs, cheapest first; a pair that an earlier join made dearer waits for the next pass.
 *
 * @param connectors u0 v0 u1 v1 …, making all degrees even
 * @param pairs near pairs that hold a spanning tree of the components and home
 * @returns connectors that also connect everything
 */
export function joinComponents(graph: TourGraph, connectors: Int32Array, pairs: Int32Array): Int32Array {
  const slots = new Slots(graph, connectors);
  const parts = new DisjointSet(graph.componentCount);
  const part = (v: number) => parts.find(graph.component[v]);
  for (let c = 0; c < connectors.length; c += 2) {
    parts.union(graph.component[connectors[c]], graph.component[connectors[c + 1]]);
  }
  let open = Array.from({ length: pairs.length / 2 }, (_, p) => p);
  while (parts.count > 1) {
    open = open.filter((p) => part(pairs[2 * p]) !== part(pairs[2 * p + 1]));
    if (open.length === 0) throw new RangeError('the near pairs do not connect the components');
    const ranked = open.map((p) => ({ p, extra: slots.cheapest(pairs[2 * p], pairs[2 * p + 1]).extra }));
    ranked.sort((a, b) => a.extra - b.extra || a.p - b.p);
    for (const { p, extra } of ranked) {
      const u = pairs[2 * p];
      const v = pairs[2 * p + 1];
      if (part(u) === part(v)) continue;
      const choice = slots.cheapest(u, v);
      if (choice.extra > extra) continue;
      slots.cross(choice.a, choice.b);
      parts.union(graph.component[u], graph.component[v]);
    }
  }
  return slots.connectors();
}

class Slots {
  private readonly first: Uint32Array;
  private readonly slotsOf: Uint32Array;
  private readonly vertex: Int32Array;
  private readonly mate: Int32Array;

  constructor(
    private readonly graph: TourGraph,
    connectors: Int32Array,
  ) {
    const n = graph.vertexCount;
    const real = connectors.length;
    this.vertex = new Int32Array(real + 2 * n);
    this.mate = new Int32Array(real + 2 * n);
    this.vertex.set(connectors);
    for (let s = 0; s < real; s++) this.mate[s] = s ^ 1;
    for (let v = 0; v < n; v++) {
      const s = real + 2 * v;
      this.vertex[s] = this.vertex[s + 1] = v;
      this.mate[s] = s + 1;
      this.mate[s + 1] = s;
    }
    this.first = new Uint32Array(n + 1);
    for (const v of this.vertex) this.first[v + 1] = this.first[v + 1] + 1;
    for (let v = 0; v < n; v++) this.first[v + 1] = this.first[v + 1] + this.first[v];
    const fill = this.first.slice(0, n);
    this.slotsOf = new Uint32Array(this.vertex.length);
    this.vertex.forEach((v, s) => {
      this.slotsOf[fill[v]] = s;
      fill[v] = fill[v] + 1;
    });
  }

  /** The slots of u and v whose connectors to cross for the least extra cost. */
  cheapest(u: number, v: number): { a: number; b: number; extra: number } {
    const { graph, first, slotsOf, vertex, mate } = this;
    const link = connectorCost(graph, u, v);
    let best = { a: -1, b: -1, extra: Number.POSITIVE_INFINITY };
    for (let i = first[u]; i < first[u + 1]; i++) {
      const a = slotsOf[i];
      const farU = vertex[mate[a]];
      const saved = connectorCost(graph, u, farU);
      for (let j = first[v]; j < first[v + 1]; j++) {
        const b = slotsOf[j];
        const farV = vertex[mate[b]];
        const extra = link + connectorCost(graph, farU, farV) - saved - connectorCost(graph, v, farV);
        if (extra < best.extra) best = { a, b, extra };
      }
    }
    return best;
  }

  cross(a: number, b: number): void {
    const { mate } = this;
    const farA = mate[a];
    const farB = mate[b];
    mate[a] = b;
    mate[b] = a;
    mate[farA] = farB;
    mate[farB] = farA;
  }

  connectors(): Int32Array {
    const out: number[] = [];
    for (let s = 0; s < this.mate.length; s++) {
      const t = this.mate[s];
      if (s < t && this.vertex[s] !== this.vertex[t]) out.push(this.vertex[s], this.vertex[t]);
    }
    return Int32Array.from(out);
  }
}
