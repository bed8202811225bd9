import { expect, test } from 'vitest';
import { addEdges, buildGraph, EdgeList, type Graph } from '../../../src/core/matching/graph.ts';
import { createRandom, randomBelow } from '../../../src/core/structures/random.ts';

function arcsOf(graph: Graph): string[] {
  const { first, tail, head, cost } = graph;
  const arcs: string[] = [];
  for (let v = 0; v + 1 < first.length; v++) {
    for (let arc = first[v]; arc < first[v + 1]; arc++) {
      expect(tail[arc]).toBe(v);
      arcs.push(`${v} ${head[arc]} ${cost[arc]}`);
    }
  }
  return arcs.sort();
}

function bothWays(edges: readonly [number, number, number][]): string[] {
  return edges.flatMap(([u, v, cost]) => [`${u} ${v} ${cost}`, `${v} ${u} ${cost}`]).sort();
}

test('edges added bit by bit stand beside those there from the start', () => {
  const random = createRandom(3);
  for (let round = 0; round < 60; round++) {
    const n = 2 + randomBelow(random, 20);
    const draw = (count: number): [number, number, number][] =>
      Array.from({ length: count }, () => {
        const u = randomBelow(random, n);
        return [u, (u + 1 + randomBelow(random, n - 1)) % n, randomBelow(random, 100)];
      });
    const all = draw(randomBelow(random, 40));
    const list = new EdgeList(1);
    for (const [u, v, cost] of all) list.add(u, v, cost);
    const graph = buildGraph(n, list);
    expect(arcsOf(graph)).toEqual(bothWays(all));
    for (let more = 0; more < 4; more++) {
      const fresh = draw(randomBelow(random, 30));
      const added = new EdgeList(1);
      for (const [u, v, cost] of fresh) added.add(u, v, cost);
      addEdges(graph, added);
      all.push(...fresh);
      expect(arcsOf(graph)).toEqual(bothWays(all));
    }
  }
});
