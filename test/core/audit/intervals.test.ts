import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  addInterval,
  gapsIn,
  type Intervals,
  partsIn,
  totalLength,
} from '../../../src/core/audit/intervals.ts';

const interval = fc
  .tuple(fc.integer({ min: 0, max: 40 }), fc.integer({ min: 1, max: 8 }))
  .map(([from, size]) => [from, from + size] as const);

/** Which of the unit steps from 0 to 49 the intervals cover. */
function steps(list: readonly (readonly [number, number])[]): boolean[] {
  return Array.from({ length: 50 }, (_, k) => list.some(([a, b]) => a <= k && k + 1 <= b));
}

function pairs(list: Intervals): [number, number][] {
  return Array.from({ length: list.length / 2 }, (_, i) => [list[2 * i], list[2 * i + 1]]);
}

test('intervals added one by one cover what they cover together, in order and apart', () => {
  fc.assert(
    fc.property(fc.array(interval, { maxLength: 12 }), (added) => {
      const list: Intervals = [];
      for (const [from, to] of added) addInterval(list, from, to, 0);
      expect(steps(pairs(list))).toEqual(steps(added));
      for (let i = 1; i < list.length; i++) expect(list[i]).toBeGreaterThan(list[i - 1]);
    }),
  );
});

test('parts and gaps make up the whole', () => {
  fc.assert(
    fc.property(fc.array(interval, { maxLength: 8 }), interval, (added, [from, to]) => {
      const list: Intervals = [];
      for (const [a, b] of added) addInterval(list, a, b, 0);
      const parts = partsIn(list, from, to);
      const gaps = gapsIn(list, from, to);
      expect(totalLength(parts) + totalLength(gaps)).toBe(to - from);
      const inside = steps([[from, to]]);
      expect(steps(pairs(parts))).toEqual(steps(added).map((covered, k) => covered && inside[k]));
    }),
  );
});

test('near intervals join across the slack', () => {
  const list: Intervals = [];
  addInterval(list, 0, 1, 0.1);
  addInterval(list, 1.05, 2, 0.1);
  addInterval(list, 2.2, 3, 0.1);
  expect(list).toEqual([0, 2, 2.2, 3]);
});
