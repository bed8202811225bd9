import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { ClosedWalk } from '../../../src/core/tour/closedWalk.ts';
import { improveWalk } from '../../../src/core/tour/improve.ts';
import { delaunayPairs, nearVertices } from '../../../src/core/tour/nearPairs.ts';
import type { TourGraph } from '../../../src/core/tour/problem.ts';
import type { StrokeSpec } from '../../support/drawings.ts';
import { graphOf } from '../../support/tourGraphs.ts';

const strokes: fc.Arbitrary<StrokeSpec[]> = fc.array(
  fc.oneof(
    fc
      .tuple(fc.nat(40), fc.nat(40), fc.nat(40), fc.nat(40))
      .filter(([a, b, c, d]) => a !== c || b !== d)
      .map(([a, b, c, d]): StrokeSpec => ({ line: [[a, b] as const, [c, d] as const] })),
    fc.tuple(fc.nat(40), fc.nat(40)).map(([x, y]): StrokeSpec => ({ dot: [x, y] })),
    fc.tuple(fc.nat(40), fc.nat(40), fc.integer({ min: 1, max: 4 })).map((c): StrokeSpec => ({ circle: c })),
  ),
  { minLength: 2, maxLength: 14 },
);

const HOME = { homeX: -3, homeY: 7 };

/** The walk in document order, home first. */
function inOrder(graph: TourGraph): Int32Array {
  const order = [2 * graph.homeEdge];
  for (let e = 0; e < graph.homeEdge; e++) order.push(2 * e);
  return Int32Array.from(order);
}

function edgesOf(order: Int32Array): number[] {
  return Array.from(order, (h) => h >> 1).sort((a, b) => a - b);
}

describe('a closed walk', () => {
  test('an exchange changes the cost by what it says, keeps every edge, and can be taken back', () => {
    fc.assert(
      fc.property(strokes, fc.infiniteStream(fc.nat()), (specs, stream) => {
        const graph = graphOf(specs, { ...HOME, end: 'home' });
        const walk = new ClosedWalk(graph, inOrder(graph));
        const start = walk.totalCost();
        const before = Array.from(walk.order);
        for (let k = 0; k < 10; k++) {
          const a = (stream.next().value as number) % (2 * walk.length);
          const c = (stream.next().value as number) % (2 * walk.length);
          if (a === c || walk.isExit(a) !== walk.isExit(c)) continue;
          const [b, d] = [walk.partner(a), walk.partner(c)];
          walk.exchange(a, c);
          expect(walk.partner(a)).toBe(c);
          expect(walk.partner(c)).toBe(a);
          expect(walk.partner(b)).toBe(d);
        }
        expect(edgesOf(walk.order)).toEqual(edgesOf(Int32Array.from(before)));
        expect(walk.totalCost()).toBeCloseTo(start + walk.change, 6);
        walk.undo();
        expect(walk.totalCost()).toBeCloseTo(start, 6);
        expect(walk.change).toBe(0);
      }),
    );
  });

  test('improving keeps every edge, never makes the walk longer, and the seed decides the bytes', () => {
    fc.assert(
      fc.property(strokes, fc.constantFrom('home' as const, 'anywhere' as const), (specs, end) => {
        const graph = graphOf(specs, { ...HOME, end });
        const near = nearVertices(graph, delaunayPairs(graph), 8);
        const order = inOrder(graph);
        const effort = { kicksPerEnd: 5, seed: 7, shouldStop: () => false, onProgress: () => {} };
        const improved = improveWalk(graph, order, near, effort);
        expect(edgesOf(improved.order)).toEqual(edgesOf(order));
        const cost = (list: Int32Array) => new ClosedWalk(graph, list).totalCost();
        expect(cost(improved.order)).toBeLessThanOrEqual(cost(order) + 1e-9);
        expect(Array.from(improveWalk(graph, order, near, effort).order)).toEqual(Array.from(improved.order));
      }),
      { numRuns: 60 },
    );
  });

  test('told to stop, it stops and still returns a whole walk', () => {
    const specs = Array.from({ length: 60 }, (_, i): StrokeSpec => ({ dot: [(i * 37) % 41, (i * 17) % 43] }));
    const graph = graphOf(specs, { ...HOME, end: 'home' });
    const near = nearVertices(graph, delaunayPairs(graph), 8);
    const order = inOrder(graph);
    const effort = { kicksPerEnd: 1e6, seed: 1, shouldStop: () => true, onProgress: () => {} };
    const improved = improveWalk(graph, order, near, effort);
    expect(improved.stopped).toBe(true);
    expect(edgesOf(improved.order)).toEqual(edgesOf(order));
  });
});
