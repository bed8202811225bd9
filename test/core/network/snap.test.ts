import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Marks } from '../../../src/core/network/marks.ts';
import { snapMarks } from '../../../src/core/network/snap.ts';

function marksAt(points: readonly (readonly [number, number])[], ends?: readonly number[]): Marks {
  return {
    count: points.length,
    stroke: points.map((_, i) => i),
    segment: points.map((_, i) => i),
    t: points.map(() => 0),
    x: points.map(([x]) => x),
    y: points.map(([, y]) => y),
    ends: points.map((_, i) => ends?.[i] ?? 1),
  };
}

const points = fc.array(
  fc
    .tuple(fc.integer({ min: 0, max: 60 }), fc.integer({ min: 0, max: 60 }))
    .map(([x, y]) => [x / 10, y / 10] as const),
  { minLength: 1, maxLength: 60 },
);

describe('snapping', () => {
  test('no mark is moved by more than the snap distance, and a vertex stands on one of its marks', () => {
    fc.assert(
      fc.property(points, fc.constantFrom(0, 0.05, 0.15, 0.5, 2), (at, snapMm) => {
        const { vertexOfMark, vertexX, vertexY, snapMaxMm, vertexCount } = snapMarks(marksAt(at), snapMm);
        const onMark = new Set<number>();
        let furthest = 0;
        at.forEach(([x, y], m) => {
          const v = vertexOfMark[m];
          const moved = Math.hypot(x - vertexX[v], y - vertexY[v]);
          furthest = Math.max(furthest, moved);
          expect(moved).toBeLessThanOrEqual(snapMm + 1e-12);
          if (moved === 0) onMark.add(v);
        });
        expect(onMark.size).toBe(vertexCount);
        expect(snapMaxMm).toBeCloseTo(furthest, 9);
      }),
    );
  });

  test('two vertices never stand within the snap distance of each other', () => {
    fc.assert(
      fc.property(points, fc.constantFrom(0.05, 0.15, 0.5), (at, snapMm) => {
        const { vertexX, vertexY, vertexCount } = snapMarks(marksAt(at), snapMm);
        for (let a = 0; a < vertexCount; a++) {
          for (let b = 0; b < a; b++) {
            expect(Math.hypot(vertexX[a] - vertexX[b], vertexY[a] - vertexY[b])).toBeGreaterThan(
              snapMm - 1e-12,
            );
          }
        }
      }),
    );
  });

  test('the order of the marks does not matter', () => {
    fc.assert(
      fc.property(points, fc.constantFrom(0.15, 0.5), fc.infiniteStream(fc.nat()), (at, snapMm, stream) => {
        const shuffled = at.map((p) => ({ p, key: stream.next().value as number }));
        shuffled.sort((a, b) => a.key - b.key);
        const sortedVertices = (list: readonly (readonly [number, number])[]) => {
          const s = snapMarks(marksAt(list), snapMm);
          return Array.from(s.vertexX, (x, v) => `${x},${s.vertexY[v]}`).sort();
        };
        expect(sortedVertices(shuffled.map(({ p }) => p))).toEqual(sortedVertices(at));
      }),
    );
  });

  test('a row of ends 0.9 times the snap distance apart does not drift together', () => {
    const snapMm = 0.1;
    const row = Array.from({ length: 50 }, (_, i) => [0.09 * i, 0] as const);
    const { vertexCount, snapMaxMm } = snapMarks(marksAt(row), snapMm);
    expect(vertexCount).toBe(25);
    expect(snapMaxMm).toBeCloseTo(0.09, 12);
  });

  test('where ends already meet is where others snap to', () => {
    const at = [
      [0, 0],
      [0.04, 0],
      [0.04, 0],
      [0.08, 0],
    ] as const;
    const { vertexCount, vertexX } = snapMarks(marksAt(at), 0.05);
    expect(vertexCount).toBe(1);
    expect(vertexX[0]).toBe(0.04);
  });
});
