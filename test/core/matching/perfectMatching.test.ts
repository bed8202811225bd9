import { describe, expect, test } from 'vitest';
import { perfectMatching } from '../../../src/core/matching/perfectMatching.ts';
import { createRandom } from '../../../src/core/structures/random.ts';
import { bruteForce } from '../../support/matchingProblems.ts';

/** Shortest ways between all letters of a graph written "AB5 AC9 …" (Floyd 1962). */
function shortestWays(edges: string): (from: string, to: string) => number {
  const way = new Map<string, number>();
  const letters = [...new Set(edges.replace(/[^A-Z]/g, ''))];
  const get = (a: string, b: string): number => (a === b ? 0 : (way.get(a + b) ?? Number.POSITIVE_INFINITY));
  for (const edge of edges.split(' ')) {
    way.set(edge[0] + edge[1], Number(edge.slice(2)));
    way.set(edge[1] + edge[0], Number(edge.slice(2)));
  }
  for (const k of letters) {
    for (const i of letters) {
      for (const j of letters) way.set(i + j, Math.min(get(i, j), get(i, k) + get(k, j)));
    }
  }
  return get;
}

function pairLetters(
  letters: string,
  cost: (a: string, b: string) => number,
): { pairs: string[]; total: number } {
  const { pairs, total } = perfectMatching(letters.length, (i, j) => cost(letters[i], letters[j]));
  return { pairs: pairs.map(([i, j]) => letters[i] + letters[j]), total };
}

describe('worked examples from teaching', () => {
  test('the Chinese postman of a student script: AD + EH = 16', () => {
    // Student notes on the Chinese postman problem, recomputed by hand; the closed walk is then 93 + 16 = 109.
    const edges = 'AB5 AC9 AD6 BC5 CD4 CF18 DE7 EF4 FG6 GH7 FH12 EH10';
    expect(pairLetters('ADEH', shortestWays(edges))).toEqual({ pairs: ['AD', 'EH'], total: 16 });
  });

  test('four odd vertices of a route inspection question: AB + DE = 55, not 75 or 97', () => {
    const direct: Record<string, number> = { AB: 20, AD: 30, AE: 25, BD: 72, BE: 45, DE: 35 };
    expect(pairLetters('ABDE', (a, b) => direct[a + b])).toEqual({ pairs: ['AB', 'DE'], total: 55 });
    const edges = Object.entries(direct).map(([name, cost]) => name + cost);
    expect(pairLetters('ABDE', shortestWays(edges.join(' '))).total).toBe(55);
  });
});

describe('the forms of the input', () => {
  const points: [number, number][] = [
    [0, 0],
    [10, 0],
    [0, 1],
    [10, 2],
    [5, 5],
    [5, 6],
  ];

  test('points as pairs and as columns', () => {
    const expected = {
      pairs: [
        [0, 2],
        [1, 3],
        [4, 5],
      ],
      total: 4,
    };
    expect(perfectMatching(points)).toMatchObject(expected);
    const columns = { x: points.map(([x]) => x), y: Float32Array.from(points, ([, y]) => y) };
    expect(perfectMatching(columns)).toMatchObject(expected);
  });

  test('a cost function is asked with the lower index first, and may be anything finite', () => {
    const random = createRandom(17);
    for (let round = 0; round < 200; round++) {
      const n = 2 + 2 * (round % 5);
      const table = Array.from({ length: n * n }, () => Math.floor(200 * random()) - 100);
      const cost = (i: number, j: number): number => {
        if (i >= j) throw new Error('asked the wrong way round');
        return table[n * i + j];
      };
      expect(perfectMatching(n, cost).total).toBe(bruteForce(n, cost));
    }
  });

  test('candidates, good or bad, do not change the optimum', () => {
    const random = createRandom(19);
    for (let round = 0; round < 60; round++) {
      const n = 2 + 2 * (round % 7);
      const table = Array.from({ length: n * n }, () => Math.floor(100 * random()));
      const cost = (i: number, j: number): number => table[n * i + j];
      const candidates = Array.from({ length: round % 9 }, (): [number, number] => {
        const i = Math.floor(n * random());
        return [i, (i + 1 + Math.floor((n - 1) * random())) % n];
      });
      const found = perfectMatching(n, cost, { candidates });
      expect(found.total).toBe(bruteForce(n, cost));
      expect(found.optimal).toBe(true);
    }
    expect(() => perfectMatching(4, () => 1, { candidates: [[0, 4]] })).toThrow(RangeError);
    expect(() => perfectMatching(4, () => 1, { candidates: [[1, 1]] })).toThrow(RangeError);
    expect(() => perfectMatching(4, () => 1, { candidates: [[0.5, 1]] })).toThrow(RangeError);
  });

  test('a few hundred vertices under costs without geometry', () => {
    const random = createRandom(18);
    const n = 300;
    const table = Array.from({ length: n * n }, () => 1 + random());
    const { pairs, total, certificate } = perfectMatching(n, (i, j) => table[n * i + j]);
    expect(new Set(pairs.flat()).size).toBe(n);
    expect(certificate.lowerBound).toBeLessThanOrEqual(total);
    expect(total - certificate.lowerBound).toBeLessThan(1e-9);
  });

  test('costs uniform in 0 … 1 and independent: the total tends to π²/12', () => {
    // Mézard & Parisi 1985; proved by Wästlund, "Random matching problems on the complete graph" (2008).
    let sum = 0;
    for (let seed = 1; seed <= 4; seed++) {
      const random = createRandom(seed);
      const n = 600;
      const table = Array.from({ length: n * n }, random);
      sum += perfectMatching(n, (i, j) => table[n * i + j]).total;
    }
    expect(Math.abs(sum / 4 / (Math.PI ** 2 / 12) - 1)).toBeLessThan(0.06);
  });

  test('misuse throws', () => {
    expect(() => perfectMatching(3, () => 1)).toThrow(RangeError);
    expect(() => perfectMatching(2, () => Number.POSITIVE_INFINITY)).toThrow(RangeError);
    expect(() => perfectMatching({ x: [1, 2], y: [1] })).toThrow(RangeError);
    expect(() => perfectMatching([[0, 0]])).toThrow(RangeError);
  });
});
