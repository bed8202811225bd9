import { describe, expect, test } from 'vitest';
import { checkCertificate } from '../../../src/core/matching/certificate.ts';
import { exactMatching } from '../../../src/core/matching/exact.ts';
import { tableProblem } from '../../../src/core/matching/perfectMatching.ts';
import type { MatchingProblem } from '../../../src/core/matching/problem.ts';
import { createRandom } from '../../../src/core/structures/random.ts';
import {
  bruteForce,
  costOf,
  plane,
  pointSets,
  smallProblem,
  withHome,
} from '../../support/matchingProblems.ts';

function expectOptimal(problem: MatchingProblem, optimum: number): void {
  const found = exactMatching(problem);
  expect(checkCertificate(problem, found)).toEqual({ ok: true, reason: null });
  expect(found.optimal).toBe(true);
  expect(Math.abs(found.total - optimum)).toBeLessThanOrEqual(1e-9 * (1 + optimum));
}

describe('against brute force, n to 10', () => {
  test('1,000 random sets: grids with ties, copies, lines, special vertices, five ways of weighing', () => {
    const random = createRandom(1);
    for (let i = 0; i < 1000; i++) {
      const problem = smallProblem(random, 10);
      expectOptimal(
        problem,
        bruteForce(problem.n, (a, b) => costOf(problem, a, b)),
      );
    }
  });

  test('home and its copy, home and a free end', () => {
    const random = createRandom(2);
    for (let i = 0; i < 300; i++) {
      const points = pointSets.uniform(2 * (1 + (i % 4)), random);
      for (const end of ['closed', 'open'] as const) {
        const problem = withHome(points, [random(), random()], end);
        expectOptimal(
          problem,
          bruteForce(problem.n, (a, b) => costOf(problem, a, b)),
        );
      }
    }
  });
});

describe('hard sets of 2,000', () => {
  for (const [name, points] of Object.entries(pointSets)) {
    test(`${name}: the certificate holds, alone and with home`, () => {
      const set = points(2000, createRandom(5));
      const seconds = (distance: number): number => (distance > 0 ? 0.2 + Math.sqrt(distance) : 0);
      const problems = [plane(set), withHome(set.slice(0, 998), [-0.1, -0.2], 'open', seconds)];
      for (const problem of problems) {
        expect(checkCertificate(problem, exactMatching(problem)).reason).toBe(null);
      }
    });
  }

  test('on a line the optimum pairs neighbours', () => {
    const set = pointSets['level line'](2000, createRandom(6));
    const xs = set.map((point) => point[0]).sort((a, b) => a - b);
    let optimum = 0;
    for (let i = 0; i < xs.length; i += 2) optimum += xs[i + 1] - xs[i];
    expect(exactMatching(plane(set)).total).toBeCloseTo(optimum, 9);
  });

  test('a full lattice with an even side is tiled by dominoes', () => {
    expect(exactMatching(plane(pointSets.lattice(1600, createRandom(0)))).total).toBe(800);
  });
});

test('large enough for special vertices to see only some of the others', () => {
  for (const name of ['uniform', 'some copies on a place']) {
    const problem = withHome(pointSets[name](2998, createRandom(9)), [0.5, 0.5], 'closed');
    expect(checkCertificate(problem, exactMatching(problem)).reason).toBe(null);
  }
});

test('lifts first: a row of 1,500 places with two vertices each, one vertex at either end', () => {
  // Mates on their own place cost nothing, so one connector is left; a way through every place costs 1,501.
  const row = Array.from({ length: 1500 }, (_, i): [number, number] => [i + 1, 0]);
  const problem = plane([[0, 0], ...row, ...row, [1501, 0]]);
  const lift = 2 ** 20;
  const found = exactMatching({ ...problem, weigh: (distance) => (distance > 0 ? lift + distance : 0) });
  expect(found.total).toBe(lift + 1501);
  expect(found.certificate.lowerBound).toBe(lift + 1501);
});

describe('random points: the constant of the random Euclidean matching', () => {
  // Houdayer, Boutet de Monvel & Martin, Eur. Phys. J. B 6, 1998 (from memory): the total tends to 0.3104·√(nA).
  test('on a torus, where there is no edge: 0.3104', () => {
    const n = 400;
    let sum = 0;
    for (let seed = 1; seed <= 8; seed++) {
      const points = pointSets.uniform(n, createRandom(seed));
      const across = (a: number, b: number): number => Math.min(Math.abs(a - b), 1 - Math.abs(a - b));
      const cost = (i: number, j: number): number =>
        Math.hypot(across(points[i][0], points[j][0]), across(points[i][1], points[j][1]));
      sum += exactMatching(tableProblem(n, cost)).total / Math.sqrt(n);
    }
    expect(Math.abs(sum / 8 / 0.3104 - 1)).toBeLessThan(0.03);
  });

  test('in a square of 2,000 points, where the edge brings it to 0.315', () => {
    let sum = 0;
    for (let seed = 1; seed <= 6; seed++) {
      sum += exactMatching(plane(pointSets.uniform(2000, createRandom(seed)))).total / Math.sqrt(2000);
    }
    expect(Math.abs(sum / 6 / 0.315 - 1)).toBeLessThan(0.03);
  });
});

describe('edges of the domain', () => {
  test('no vertex, and two', () => {
    const none = exactMatching(plane([]));
    expect(none.mate.length).toBe(0);
    expect(none.total).toBe(0);
    expect(none.certificate.lowerBound).toBe(0);
    const two = exactMatching(
      plane([
        [0, 0],
        [3, 4],
      ]),
    );
    expect([...two.mate]).toEqual([1, 0]);
    expect(two.total).toBe(5);
  });

  test('all on one place costs nothing', () => {
    const points = Array.from({ length: 500 }, (): [number, number] => [7, -0]);
    expect(exactMatching(plane(points)).total).toBe(0);
  });

  test('minus zero is the place of zero', () => {
    expectOptimal(
      plane([
        [0, 0],
        [-0, -0],
        [5, 5],
        [5, 5],
      ]),
      0,
    );
  });

  test('very large and very small units', () => {
    for (const unit of [2 ** -500, 1e-12, 1e12, 2 ** 500]) {
      const points = pointSets
        .uniform(60, createRandom(4))
        .map(([x, y]): [number, number] => [x * unit, y * unit]);
      const problem = plane(points);
      expect(checkCertificate(problem, exactMatching(problem)).reason).toBe(null);
    }
  });

  test('refuses odd numbers and costs that are not finite', () => {
    expect(() => exactMatching(plane([[0, 0]]))).toThrow(RangeError);
    expect(() =>
      exactMatching(
        plane([
          [0, 0],
          [Number.NaN, 0],
        ]),
      ),
    ).toThrow(RangeError);
    expect(() =>
      exactMatching(
        plane([
          [0, 0],
          [1e300, 1e300],
        ]),
      ),
    ).toThrow(RangeError);
    expect(() =>
      exactMatching({ ...plane([[0, 0]]), n: 2, special: 1, specialCost: () => Number.NaN }),
    ).toThrow(RangeError);
  });
});

describe('while it works', () => {
  test('the same input gives the same bytes', () => {
    const problem = plane(pointSets.clustered(1000, createRandom(3)));
    const a = exactMatching(problem);
    const b = exactMatching(problem);
    expect(b).toEqual(a);
  });

  test('progress never falls and ends at 1', () => {
    const shares: number[] = [];
    exactMatching(plane(pointSets.uniform(2000, createRandom(3))), {
      onProgress: (share) => shares.push(share),
    });
    expect(shares.length).toBeGreaterThan(2);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    expect(shares[shares.length - 1]).toBe(1);
  });

  test('stopped early it gives a perfect matching and a bound that is true, only lower', () => {
    const sets = [plane(pointSets['some copies on a place'](200, createRandom(3)))];
    sets.push(withHome(pointSets.uniform(198, createRandom(4)), [2, 2], 'open'));
    for (const problem of sets) {
      const best = exactMatching(problem);
      let asked = 0;
      const found = exactMatching(problem, { shouldStop: () => ++asked > 1 });
      const first = exactMatching(problem, { shouldStop: () => true });
      expect(first.optimal).toBe(false);
      for (const early of [found, first]) {
        expect(early.total).toBeGreaterThanOrEqual(best.total);
        expect(early.certificate.lowerBound).toBeLessThanOrEqual(best.total);
        expect(early.certificate.lowerBound).toBeGreaterThan(0);
      }
      const { scale, vertexDual } = first.certificate;
      for (let v = 0; v < problem.n; v++) {
        expect(first.mate[first.mate[v]]).toBe(v);
        for (let u = 0; u < v; u++) {
          const cost = 2 * Math.floor(scale * costOf(problem, u, v));
          if (vertexDual[u] + vertexDual[v] > cost) throw new Error(`the pair ${u}, ${v} is overpaid`);
        }
      }
    }
  });
});
