import { expect, test } from 'vitest';
import { PairHeap } from '../../../src/core/structures/heap.ts';
import { createRandom, randomBelow } from '../../../src/core/structures/random.ts';

test('gives entries back by key, then first number, then second, whatever the order of pushes', () => {
  const random = createRandom(1);
  for (let round = 0; round < 40; round++) {
    const entries = Array.from({ length: randomBelow(random, 300) }, () => [
      randomBelow(random, 5) - 2.5,
      randomBelow(random, 4),
      randomBelow(random, 4),
    ]);
    const heap = new PairHeap();
    for (const [key, a, b] of entries) heap.push(key, a, b);
    entries.sort((p, q) => p[0] - q[0] || p[1] - q[1] || p[2] - q[2]);
    expect(heap.minKey()).toBe(entries.length > 0 ? entries[0][0] : Number.POSITIVE_INFINITY);
    const out: number[][] = [];
    while (heap.pop()) out.push([heap.key, heap.a, heap.b]);
    expect(out).toEqual(entries);
  }
});

test('pushes and pops in between agree with a sorted list', () => {
  const random = createRandom(2);
  const heap = new PairHeap();
  let list: number[] = [];
  for (let step = 0; step < 2000; step++) {
    if (random() < 0.6) {
      const key = random();
      heap.push(key, step, -step);
      list.push(key);
    } else {
      const least = Math.min(...list);
      expect(heap.minKey()).toBe(least);
      expect(heap.pop()).toBe(list.length > 0);
      if (list.length > 0) expect([heap.key, heap.b]).toEqual([least, -heap.a]);
      list = list.filter((key) => key !== least);
    }
  }
  expect(heap.size).toBe(list.length);
  heap.clear();
  expect(heap.pop()).toBe(false);
});
