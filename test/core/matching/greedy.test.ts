import { describe, expect, test } from 'vitest';
import { checkCertificate } from '../../../src/core/matching/certificate.ts';
import { exactMatching } from '../../../src/core/matching/exact.ts';
import { improveByExchange } from '../../../src/core/matching/exchange.ts';
import { greedyMatching } from '../../../src/core/matching/greedy.ts';
import type { MatchingProblem } from '../../../src/core/matching/problem.ts';
import { createRandom, randomBelow } from '../../../src/core/structures/random.ts';
import { costOf, plane, pointSets, smallProblem } from '../../support/matchingProblems.ts';

/** The definition: all pairs by cost, then lower index, then higher index; take each whose ends are free. */
function greedyByDefinition(problem: MatchingProblem): Int32Array {
  const pairs: [number, number, number][] = [];
  for (let i = 0; i < problem.n; i++) {
    for (let j = i + 1; j < problem.n; j++) pairs.push([costOf(problem, i, j), i, j]);
  }
  pairs.sort((a, b) => a[0] - b[0] || a[1] - b[1] || a[2] - b[2]);
  const mate = new Int32Array(problem.n).fill(-1);
  for (const [, i, j] of pairs) {
    if (mate[i] >= 0 || mate[j] >= 0) continue;
    mate[i] = j;
    mate[j] = i;
  }
  return mate;
}

describe('is the greedy matching of the definition', () => {
  test('on 800 small sets full of ties, with special vertices', () => {
    const random = createRandom(21);
    for (let i = 0; i < 800; i++) {
      const problem = smallProblem(random, 24);
      expect(greedyMatching(problem).mate).toEqual(greedyByDefinition(problem));
    }
  });

  test('on every hard kind of 160', () => {
    for (const points of Object.values(pointSets)) {
      const problem = plane(points(160, createRandom(8)));
      expect(greedyMatching(problem).mate).toEqual(greedyByDefinition(problem));
    }
  });
});

test('takes other ways into account, and so do the exchanges', () => {
  const random = createRandom(23);
  for (let round = 0; round < 200; round++) {
    const base = plane(pointSets.lattice(2 * (1 + randomBelow(random, 12)), random));
    const u = Array.from({ length: randomBelow(random, base.n) }, () => randomBelow(random, base.n));
    const v = u.map((a) => (a + 1 + randomBelow(random, base.n - 1)) % base.n);
    const ways = {
      u: Int32Array.from(u),
      v: Int32Array.from(v),
      cost: Float64Array.from(u, () => randomBelow(random, 8) / 4),
    };
    const problem = { ...base, ways };
    const greedy = greedyMatching(problem);
    expect(greedy.mate).toEqual(greedyByDefinition(problem));
    const exact = exactMatching(problem);
    const exchanged = improveByExchange(problem, greedy);
    expect(exchanged.total).toBeLessThanOrEqual(greedy.total);
    expect(exact.certificate.lowerBound).toBeLessThanOrEqual(exchanged.total);
    const early = exactMatching(problem, { shouldStop: () => true });
    expect(early.certificate.lowerBound).toBeLessThanOrEqual(exact.total);
    expect(checkCertificate(problem, early).reason).toBe(null);
    expect(checkCertificate(problem, exact).reason).toBe(null);
  }
});

/** S(1) = {0, 1}; S(k + 1) is S(k) and a copy of it after a gap just shorter than S(k) is long. */
function worstLine(k: number, epsilon: number): number[] {
  let line = [0, 1];
  for (let i = 1; i < k; i++) {
    const length = line[line.length - 1];
    const shift = length + length * (1 - epsilon);
    line = [...line, ...line.map((x) => x + shift)];
  }
  return line;
}

test("Reingold & Tarjan's lines: greedy pays (4/3)·n^lg 1.5 − 1 times the optimum", () => {
  // Reingold & Tarjan, "On a greedy heuristic for complete matching", SIAM J. Comput. 10, 1981.
  for (let k = 1; k <= 12; k++) {
    const problem = plane(worstLine(k, 1e-9).map((x): [number, number] => [x, 0]));
    const n = 2 ** k;
    const best = exactMatching(problem);
    expect(best.total).toBeCloseTo(n / 2, 6);
    expect(best.certificate.lowerBound).toBeCloseTo(n / 2, 6);
    const ratio = (4 / 3) * n ** Math.log2(1.5) - 1;
    expect(greedyMatching(problem).total / best.total).toBeCloseTo(ratio, 3);
  }
  // Values of the same family worked out by hand, to be sure of the formula.
  for (const [n, ratio] of [
    [4, 2],
    [8, 3.5],
    [16, 5.75],
  ]) {
    expect((4 / 3) * n ** Math.log2(1.5) - 1).toBeCloseTo(ratio, 12);
  }
});

test('refuses an odd number of vertices', () => {
  expect(() =>
    greedyMatching(
      plane([
        [0, 0],
        [1, 0],
        [2, 0],
      ]),
    ),
  ).toThrow(RangeError);
});

test('no vertex gives no pair', () => {
  expect(greedyMatching(plane([]))).toEqual({ mate: new Int32Array(0), total: 0 });
});
