import { describe, expect, test } from 'vitest';
import { BoxIndex } from '../../../src/core/audit/boxIndex.ts';
import { createRandom } from '../../../src/core/structures/random.ts';

function randomBoxes(count: number, outliers: readonly number[], random: () => number): Float64Array {
  const boxes = new Float64Array(4 * count);
  for (let i = 0; i < count; i++) {
    const far = i < outliers.length ? outliers[i] : 0;
    const x = far + 100 * random();
    const y = 100 * random();
    boxes.set([x, y, x + random(), y + random()], 4 * i);
  }
  return boxes;
}

describe.each([
  ['even', []],
  ['one far outlier', [1e9]],
  ['outliers on both sides', [1e9, -1e12, 5e5]],
] as const)('%s', (_, outliers) => {
  test('finds exactly what a look at every box finds', () => {
    const random = createRandom(5);
    const boxes = randomBoxes(500, outliers, random);
    const index = new BoxIndex(boxes);
    const queries = [...randomBoxes(200, outliers, random)];
    queries.push(-1e15, -1e15, 1e15, 1e15, ...boxes.slice(0, 4));
    for (let q = 0; q < queries.length; q += 4) {
      const [x0, y0, x1, y1] = queries.slice(q, q + 4);
      const touches = (i: number) =>
        boxes[4 * i] <= x1 && boxes[4 * i + 2] >= x0 && boxes[4 * i + 1] <= y1 && boxes[4 * i + 3] >= y0;
      const wanted = Array.from({ length: 500 }, (_, i) => i).filter(touches);
      const found = new Set<number>();
      index.visit(x0, y0, x1, y1, (i) => {
        found.add(i);
        return false;
      });
      for (const i of wanted) expect(found.has(i)).toBe(true);
      // A rescaled axis may let a few more through, where numbers fall together.
      for (const i of found) expect(touches(i) || outliers.length > 0).toBe(true);
    }
  });
});

test('an outlier does not make searches slow', () => {
  const random = createRandom(6);
  const index = new BoxIndex(randomBoxes(20_000, [1e12], random));
  let visited = 0;
  for (let q = 0; q < 500; q++) {
    const x = 100 * random();
    const y = 100 * random();
    index.visit(x, y, x + 0.1, y + 0.1, () => {
      visited++;
      return false;
    });
  }
  // 20,000 boxes of half a mm on 100 mm × 100 mm: about 0.7 touch each.
  expect(visited).toBeLessThan(500 * 5);
});

test('stops when told to, and may be empty', () => {
  const index = new BoxIndex(randomBoxes(100, [], createRandom(7)));
  let visited = 0;
  index.visit(0, 0, 200, 200, () => ++visited === 3);
  expect(visited).toBe(3);
  new BoxIndex(new Float64Array(0)).visit(0, 0, 1, 1, () => expect.fail('there is nothing to visit'));
});
