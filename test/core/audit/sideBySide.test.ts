import fc from 'fast-check';
import { expect, test } from 'vitest';
import { findOverlap, newOverlap } from '../../../src/core/audit/sideBySide.ts';

const coordinate = fc.double({ min: -10, max: 10, noNaN: true });
const piece = fc.tuple(coordinate, coordinate, coordinate, coordinate);

function at(p: readonly number[], t: number): [number, number] {
  return [p[0] + t * (p[2] - p[0]), p[1] + t * (p[3] - p[1])];
}

function length(p: readonly number[]): number {
  return Math.sqrt((p[2] - p[0]) ** 2 + (p[3] - p[1]) ** 2);
}

function find(a: readonly number[], b: readonly number[], reach: number, leastCosine = 0.5) {
  const o = newOverlap();
  const [ax, ay, ax1, ay1] = a;
  const [bx, by, bx1, by1] = b;
  return findOverlap(ax, ay, ax1, ay1, bx, by, bx1, by1, reach, leastCosine, o) ? o : null;
}

test('opposite points are within reach, as the offsets say, and as much of one piece as of the other', () => {
  fc.assert(
    fc.property(piece, piece, fc.double({ min: 0.01, max: 20, noNaN: true }), (a, b, reach) => {
      fc.pre(length(a) > 0.01 && length(b) > 0.01);
      const o = find(a, b, reach);
      if (!o) return;
      for (const s of [0, 0.3, 1]) {
        const p = at(a, o.from0 + s * (o.to0 - o.from0));
        const q = at(b, o.from1 + s * (o.to1 - o.from1));
        const distance = Math.sqrt((p[0] - q[0]) ** 2 + (p[1] - q[1]) ** 2);
        const offset = o.offsetFrom + s * (o.offsetTo - o.offsetFrom);
        expect(distance).toBeLessThanOrEqual(reach + 1e-9);
        expect(Math.abs(distance - Math.abs(offset))).toBeLessThan(1e-9);
      }
      expect((o.to0 - o.from0) * length(a)).toBeCloseTo(o.lengthMm, 9);
      expect(Math.abs(o.to1 - o.from1) * length(b)).toBeCloseTo(o.lengthMm, 9);
      expect(find(b, a, reach)?.lengthMm ?? 0).toBeCloseTo(o.lengthMm, 9);
    }),
    { numRuns: 2000 },
  );
});

test('a piece lies beside itself and its reverse whole', () => {
  fc.assert(
    fc.property(piece, (a) => {
      fc.pre(length(a) > 0.01);
      expect(find(a, a, 1e-6)).toMatchObject({ from0: 0, to0: 1, opposed: false });
      const reverse = [a[2], a[3], a[0], a[1]];
      const o = find(a, reverse, 1e-6);
      expect(o).toMatchObject({ opposed: true });
      expect((o?.lengthMm ?? 0) / length(a)).toBeCloseTo(1, 6);
    }),
  );
});

test('nothing beside what is too far, end to end, across, or no line', () => {
  expect(find([0, 0, 10, 0], [0, 0.011, 10, 0.011], 0.01)).toBeNull();
  expect(find([0, 0, 10, 0], [10, 0, 20, 0], 0.01)).toBeNull();
  expect(find([0, 0, 10, 0], [5, -5, 5, 5], 0.01)).toBeNull();
  expect(find([0, 0, 10, 0], [5, 0, 5, 0], 0.01)).toBeNull();
  expect(find([0, 0, 10, 0], [0, 0, 10, 3], 0.01, 0.98)).toBeNull();
});

test('lines that cross are side by side as far as the reach goes', () => {
  // At an angle of 30°, offsets across the bisector grow by 2 tan 15° along it.
  const o = find([-10, 0, 10, 0], [-10 * Math.cos(Math.PI / 6), -5, 10 * Math.cos(Math.PI / 6), 5], 0.1);
  const half = 0.1 / (2 * Math.tan(Math.PI / 12)) / Math.cos(Math.PI / 12);
  expect(o?.lengthMm).toBeCloseTo(2 * half, 9);
});
