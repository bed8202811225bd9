import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { pointAt } from '../../../src/core/geometry/evaluate.ts';
import { buildNetwork } from '../../../src/core/network/buildNetwork.ts';
import type { JunctionRule, Network } from '../../../src/core/network/network.ts';
import { drawingOf, type StrokeSpec } from '../../support/drawings.ts';

const SNAP_MM = 0.5;

/** Coordinates in steps of a third of the snap distance, so that ends crowd, touch and just miss. */
const place = fc
  .tuple(fc.integer({ min: 0, max: 30 }), fc.integer({ min: 0, max: 30 }))
  .map(([x, y]) => [x / 6, y / 6] as const);
const stroke: fc.Arbitrary<StrokeSpec> = fc.oneof(
  { weight: 6, arbitrary: fc.array(place, { minLength: 2, maxLength: 5 }).map((line) => ({ line })) },
  {
    weight: 1,
    arbitrary: fc.array(place, { minLength: 3, maxLength: 4 }).map((line) => ({ line, closed: true })),
  },
  { weight: 2, arbitrary: fc.tuple(place, place, place, place).map((cubic) => ({ cubic: [...cubic] })) },
  {
    weight: 1,
    arbitrary: fc
      .tuple(fc.integer({ min: 1, max: 8 }), place)
      .map(([r, [x, y]]) => ({ circle: [x, y, r / 12] as const })),
  },
  { weight: 1, arbitrary: place.map((dot) => ({ dot })) },
);
const strokes = fc.array(stroke.filter(hasLength), { minLength: 2, maxLength: 14 });
const rule = fc.constantFrom<JunctionRule>('ends', 'touching', 'crossing');

function hasLength(spec: StrokeSpec): boolean {
  const points = 'line' in spec ? spec.line : 'cubic' in spec ? spec.cubic : null;
  if (!points) return true;
  return points.every((p, i) => i === 0 || p[0] !== points[i - 1][0] || p[1] !== points[i - 1][1]);
}

function networkOf(specs: readonly StrokeSpec[], junctions: JunctionRule) {
  const drawing = drawingOf(specs);
  const all = Uint32Array.from({ length: specs.length }, (_, i) => i);
  const options = {
    snapMm: SNAP_MM,
    accuracyMm: 0.02,
    junctions,
    repeats: 'keep',
    repeatToleranceMm: 0.01,
  } as const;
  return { drawing, network: buildNetwork(drawing, all, options) };
}

function vertexSet({ vertexX, vertexY }: Network): string[] {
  return [...new Set(Array.from(vertexX, (x, v) => `${x.toFixed(9)} ${vertexY[v].toFixed(9)}`))].sort();
}

describe('laws of snapping on whole drawings', () => {
  test('no end of a piece lies farther than the snap distance from its vertex, touching and crossing included', () => {
    fc.assert(
      fc.property(strokes, rule, (specs, junctions) => {
        const { drawing, network } = networkOf(specs, junctions);
        const at = new Float64Array(2);
        let furthest = 0;
        for (let h = 0; h < 2 * network.edgeCount; h++) {
          const e = h >> 1;
          const [segment, t] =
            h % 2 === 0
              ? [network.startSegment[e], network.startT[e]]
              : [network.endSegment[e], network.endT[e]];
          pointAt(drawing.strokes.segments, segment, t, at);
          const v = network.halfEdgeVertex[h];
          furthest = Math.max(furthest, Math.hypot(at[0] - network.vertexX[v], at[1] - network.vertexY[v]));
        }
        expect(furthest).toBeLessThanOrEqual(SNAP_MM * (1 + 1e-9));
        expect(network.snapMaxMm).toBeGreaterThanOrEqual(furthest - 1e-9);
      }),
      { numRuns: 300 },
    );
  });

  test('every stroke is there in full: its pieces follow each other from its start to its end', () => {
    fc.assert(
      fc.property(strokes, rule, (specs, junctions) => {
        const { drawing, network } = networkOf(specs, junctions);
        const { first, dot } = drawing.strokes;
        const pieces = new Map<number, [number, number][]>();
        for (let e = 0; e < network.edgeCount; e++) {
          const list = pieces.get(network.edgeStroke[e]) ?? [];
          list.push([network.startSegment[e] + network.startT[e], network.endSegment[e] + network.endT[e]]);
          pieces.set(network.edgeStroke[e], list);
        }
        for (let s = 0; s < specs.length; s++) {
          const list = (pieces.get(s) ?? []).sort((a, b) => a[0] - b[0]);
          if (dot[s]) continue;
          expect(list[0]?.[0]).toBe(first[s]);
          expect(list.at(-1)?.[1]).toBe(first[s + 1]);
          for (let k = 1; k < list.length; k++) expect(list[k][0]).toBe(list[k - 1][1]);
        }
      }),
      { numRuns: 300 },
    );
  });

  test('the vertices do not depend on the order of the strokes', () => {
    fc.assert(
      fc.property(strokes, fc.infiniteStream(fc.nat()), (specs, stream) => {
        const shuffled = specs
          .map((spec) => ({ spec, key: stream.next().value ?? 0 }))
          .sort((a, b) => a.key - b.key)
          .map(({ spec }) => spec);
        const before = networkOf(specs, 'touching').network;
        const after = networkOf(shuffled, 'touching').network;
        expect(vertexSet(after)).toEqual(vertexSet(before));
        expect(after.componentCount).toBe(before.componentCount);
        expect(after.oddVertices.length).toBe(before.oddVertices.length);
      }),
      { numRuns: 300 },
    );
  });

  test('a degree is even or odd as the ends that meet there: their sum is twice the edges', () => {
    fc.assert(
      fc.property(strokes, rule, (specs, junctions) => {
        const { network } = networkOf(specs, junctions);
        const degree = new Int32Array(network.vertexCount);
        for (const v of network.halfEdgeVertex) degree[v]++;
        expect(Math.min(...degree)).toBeGreaterThan(0);
        const odd = Array.from(degree.keys()).filter((v) => degree[v] % 2 === 1);
        expect(odd).toEqual([...network.oddVertices]);
        expect(odd.length % 2).toBe(0);
      }),
      { numRuns: 200 },
    );
  });
});
