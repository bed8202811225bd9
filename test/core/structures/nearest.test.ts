import { describe, expect, test } from 'vitest';
import { type BoxTree, boxDistance, buildBoxTree, LEAF } from '../../../src/core/structures/boxTree.ts';
import { NearestSearch } from '../../../src/core/structures/nearest.ts';
import { createRandom, randomBelow } from '../../../src/core/structures/random.ts';

type Random = () => number;

const coordinates: Record<string, (random: Random) => [number, number]> = {
  free: (random) => [random(), random()],
  'coarse grid, many copies': (random) => [randomBelow(random, 6), randomBelow(random, 6)],
  'level line': (random) => [random(), 2],
  'upright line': (random) => [-1, random()],
  'one place': () => [3, 4],
};

function treeOf(n: number, draw: (random: Random) => [number, number], random: Random): BoxTree {
  const points = Array.from({ length: n }, () => draw(random));
  return buildBoxTree(
    points.map((point) => point[0]),
    points.map((point) => point[1]),
  );
}

for (const [name, draw] of Object.entries(coordinates)) {
  describe(name, () => {
    test('every point has one position, and lies in the box of every node above it', () => {
      const random = createRandom(1);
      for (const n of [0, 1, 7, 8, 9, 64, 65, 200]) {
        const tree = treeOf(n, draw, random);
        expect([...tree.order].sort((a, b) => a - b)).toEqual(Array.from({ length: n }, (_, i) => i));
        expect(tree.root).toBe(tree.minX.length - 1);
        const inside = (node: number, i: number): boolean =>
          tree.x[i] >= tree.minX[node] &&
          tree.x[i] <= tree.maxX[node] &&
          tree.y[i] >= tree.minY[node] &&
          tree.y[i] <= tree.maxY[node];
        const seen = new Set<number>();
        const walk = (node: number, above: number[]): void => {
          if (node < tree.leaves) {
            for (let i = LEAF * node; i < Math.min(n, LEAF * node + LEAF); i++) {
              seen.add(i);
              expect([...above, node].every((box) => inside(box, i))).toBe(true);
            }
            return;
          }
          for (const child of [tree.left[node], tree.right[node]])
            if (child >= 0) walk(child, [...above, node]);
        };
        if (tree.root >= 0) walk(tree.root, []);
        expect(seen.size).toBe(n);
      }
    });

    test('the distance of two boxes is at most that of any two of their points', () => {
      const tree = treeOf(200, draw, createRandom(2));
      for (let a = 0; a < tree.leaves; a++) {
        for (let b = 0; b < tree.leaves; b++) {
          let least = Number.POSITIVE_INFINITY;
          for (let i = LEAF * a; i < LEAF * a + LEAF; i++) {
            for (let j = LEAF * b; j < LEAF * b + LEAF; j++) {
              least = Math.min(least, Math.sqrt((tree.x[i] - tree.x[j]) ** 2 + (tree.y[i] - tree.y[j]) ** 2));
            }
          }
          expect(boxDistance(tree, a, b) <= least).toBe(true);
        }
      }
    });

    test('the nearest of all, and of each quadrant, are those of a plain search', () => {
      const random = createRandom(3);
      for (const n of [1, 2, 10, 150]) {
        const tree = treeOf(n, draw, random);
        for (const quadrants of [1, 4] as const) {
          const search = new NearestSearch(tree, 3, quadrants);
          for (let p = 0; p < n; p++) {
            const found = search.around(tree.x[p], tree.y[p], p);
            for (let q = 0; q < quadrants; q++) {
              const distances = squaredDistances(tree, p, quadrants === 1 ? null : q);
              const got = [...found.subarray(3 * q, 3 * q + 3)].filter((i) => i >= 0);
              expect(new Set(got).size).toBe(got.length);
              expect(got.map((i) => (tree.x[i] - tree.x[p]) ** 2 + (tree.y[i] - tree.y[p]) ** 2)).toEqual(
                distances.slice(0, 3),
              );
            }
          }
        }
      }
    });
  });
}

/** Sorted, of all other points or of those in a quadrant: right of the way up, and so on against the clock. */
function squaredDistances(tree: BoxTree, p: number, quadrant: number | null): number[] {
  const distances: number[] = [];
  for (let i = 0; i < tree.x.length; i++) {
    if (i === p) continue;
    const dx = tree.x[i] - tree.x[p];
    const dy = tree.y[i] - tree.y[p];
    const sectors = [
      (dx > 0 && dy >= 0) || (dx === 0 && dy === 0),
      dx <= 0 && dy > 0,
      dx < 0 && dy <= 0,
      dx >= 0 && dy < 0,
    ];
    if (sectors.filter(Boolean).length !== 1) throw new Error('the quadrants do not part the plane');
    if (quadrant === null || sectors[quadrant]) distances.push(dx * dx + dy * dy);
  }
  return distances.sort((a, b) => a - b);
}

test('a level line of 20,000 is searched by quadrants in about linear time', () => {
  const n = 20000;
  const tree = buildBoxTree(
    Array.from({ length: n }, (_, i) => i),
    new Float64Array(n),
  );
  const search = new NearestSearch(tree, 2, 4);
  let found = 0;
  for (let p = 0; p < n; p++) for (const q of search.around(tree.x[p], 0, p)) if (q >= 0) found++;
  expect(found).toBe(4 * n - 6);
});
