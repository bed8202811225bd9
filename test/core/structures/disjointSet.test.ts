import { expect, test } from 'vitest';
import { DisjointSet } from '../../../src/core/structures/disjointSet.ts';
import { createRandom, randomBelow } from '../../../src/core/structures/random.ts';

test('union says whether two sets became one, and find agrees', () => {
  const sets = new DisjointSet(5);
  expect(sets.union(0, 1)).toBe(true);
  expect(sets.union(3, 4)).toBe(true);
  expect(sets.union(1, 0)).toBe(false);
  expect(sets.find(0)).toBe(sets.find(1));
  expect(sets.find(0)).not.toBe(sets.find(3));
  expect(sets.count).toBe(3);
  expect([sets.size(0), sets.size(2), sets.size(4)]).toEqual([2, 1, 2]);
});

test('agrees with labels rewritten one by one on random unions', () => {
  const random = createRandom(11);
  for (let round = 0; round < 50; round++) {
    const n = 1 + randomBelow(random, 40);
    const sets = new DisjointSet(n);
    const label = Array.from({ length: n }, (_, i) => i);
    for (let step = 0; step < n; step++) {
      const i = randomBelow(random, n);
      const j = randomBelow(random, n);
      const from = label[i];
      const to = label[j];
      expect(sets.union(i, j)).toBe(from !== to);
      for (let v = 0; v < n; v++) if (label[v] === from) label[v] = to;
    }
    expect(sets.count).toBe(new Set(label).size);
    for (let v = 0; v < n; v++) {
      expect(sets.size(v)).toBe(label.filter((other) => other === label[v]).length);
      const together = label.map((other) => other === label[v]);
      expect(label.map((_, w) => sets.find(v) === sets.find(w))).toEqual(together);
    }
  }
});

test('a chain of 200,000 unions needs no deep stack', () => {
  const n = 200000;
  const sets = new DisjointSet(n);
  for (let i = 1; i < n; i++) sets.union(i - 1, i);
  expect(sets.find(0)).toBe(sets.find(n - 1));
});
