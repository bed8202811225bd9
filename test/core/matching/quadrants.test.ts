import { describe, expect, test } from 'vitest';
import { nearInQuadrants, QUADRANT_NEIGHBOURS } from '../../../src/core/matching/quadrants.ts';
import { buildBoxTree } from '../../../src/core/structures/boxTree.ts';
import { createRandom } from '../../../src/core/structures/random.ts';
import { pointSets } from '../../support/matchingProblems.ts';

const quadrants: ((dx: number, dy: number) => boolean)[] = [
  (dx, dy) => (dx > 0 && dy > 0) || (dx >= 0 && dy === 0),
  (dx, dy) => dx <= 0 && dy > 0,
  (dx, dy) => (dx < 0 && dy < 0) || (dx < 0 && dy === 0),
  (dx, dy) => dx >= 0 && dy < 0,
];

describe('the two nearest in every quadrant, by trying all pairs', () => {
  for (const [name, points] of Object.entries(pointSets)) {
    test(name, () => {
      for (const n of [1, 2, 7, 9, 150]) {
        const places = [...new Map(points(n, createRandom(4)).map((p) => [`${p}`, p])).values()];
        const tree = buildBoxTree(
          places.map(([x]) => x),
          places.map(([, y]) => y),
        );
        const near = nearInQuadrants(tree);
        const squared = (p: number, q: number): number =>
          (tree.x[q] - tree.x[p]) ** 2 + (tree.y[q] - tree.y[p]) ** 2;
        for (let p = 0; p < places.length; p++) {
          for (let k = 0; k < 4; k++) {
            const inside = Array.from({ length: places.length }, (_, q) => q)
              .filter((q) => q !== p && quadrants[k](tree.x[q] - tree.x[p], tree.y[q] - tree.y[p]))
              .map((q) => squared(p, q))
              .sort((a, b) => a - b);
            const at = QUADRANT_NEIGHBOURS * p + 2 * k;
            const found = [...near.subarray(at, at + 2)].filter((q) => q >= 0).map((q) => squared(p, q));
            expect(found).toEqual(inside.slice(0, 2));
          }
        }
      }
    });
  }
});
