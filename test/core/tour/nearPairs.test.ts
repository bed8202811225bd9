import { describe, expect, test } from 'vitest';
import { delaunayPairs } from '../../../src/core/tour/nearPairs.ts';
import type { TourGraph } from '../../../src/core/tour/problem.ts';
import { componentTree, connectorsCost } from '../../../src/core/tour/spanningTree.ts';
import type { StrokeSpec } from '../../support/drawings.ts';
import { graphOf } from '../../support/tourGraphs.ts';

type Point = readonly [number, number];

const HOME = { homeX: 0, homeY: 100, end: 'home' } as const;

/** Pieces of a line with gaps of their length between them, as a pattern of dashes cuts it. */
function dashed([x0, y0]: Point, [x1, y1]: Point, pieces: number): StrokeSpec[] {
  const at = (k: number): Point => {
    const t = k / (2 * pieces - 1);
    return [x0 + t * (x1 - x0), y0 + t * (y1 - y0)];
  };
  return Array.from({ length: pieces }, (_, k) => ({ line: [at(2 * k), at(2 * k + 1)] }));
}

/** A minimum spanning tree of the components over all pairs of vertices (Prim 1957). */
function leastTree(graph: TourGraph): number {
  const { x, y, component, home } = graph;
  const count = graph.componentCount - 1;
  const away = new Float64Array(count).fill(Number.POSITIVE_INFINITY);
  const isIn = new Uint8Array(count);
  let sum = 0;
  for (let c = 0; ; ) {
    isIn[c] = 1;
    for (let u = 0; u < home; u++) {
      if (component[u] !== c) continue;
      for (let v = 0; v < home; v++) {
        if (isIn[component[v]]) continue;
        const distance = Math.sqrt((x[u] - x[v]) ** 2 + (y[u] - y[v]) ** 2);
        away[component[v]] = Math.min(away[component[v]], distance);
      }
    }
    let next = -1;
    for (let d = 0; d < count; d++) if (!isIn[d] && (next < 0 || away[d] < away[next])) next = d;
    if (next < 0) return sum;
    sum += away[next];
    c = next;
  }
}

describe('neighbours in a drawing', () => {
  // In line but for rounding, where a triangulation leaves points out.
  test.each<[string, Point, Point]>([
    ['down the diagonal', [0, 100], [100, 0]],
    ['from a corner of a letter page', [0, 279.4], [215.9, 0]],
    ['nearly upright', [10, 0], [10 + 1e-13, 97]],
    ['nearly level', [3, 10.1], [98, 10.1 + 1e-13]],
    ['on a slope', [1, 2], [90.3, 33.7]],
  ])('hold a least tree of the dashes of a line %s', (_, from, to) => {
    for (let pieces = 2; pieces < 80; pieces += 7) {
      const graph = graphOf(dashed(from, to, pieces), HOME);
      const tree = componentTree(graph, delaunayPairs(graph));
      expect(tree.length / 2).toBe(pieces - 1);
      expect(connectorsCost(graph, tree)).toBeCloseTo(leastTree(graph), 9);
    }
  });

  test('hold a least tree where most is in line and some is not', () => {
    const specs = [
      ...dashed([0, 100], [100, 0], 37),
      ...dashed([5, 1], [5, 30], 9),
      { dot: [70, 71] as const },
    ];
    const graph = graphOf(specs, HOME);
    const tree = componentTree(graph, delaunayPairs(graph));
    expect(tree.length / 2).toBe(graph.componentCount - 2);
    expect(connectorsCost(graph, tree)).toBeCloseTo(leastTree(graph), 9);
  });
});
