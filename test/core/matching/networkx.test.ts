import { expect, test } from 'vitest';
import { checkCertificate } from '../../../src/core/matching/certificate.ts';
import { exactMatching } from '../../../src/core/matching/exact.ts';
import { tableProblem } from '../../../src/core/matching/perfectMatching.ts';
import type { MatchingProblem } from '../../../src/core/matching/problem.ts';
import { createRandom, randomBelow } from '../../../src/core/structures/random.ts';
import { costOf, plane, withHome } from '../../support/matchingProblems.ts';
import { networkxMissing, networkxTotals } from '../../support/networkx.ts';

const SETS = 340;
/** Lengths are handed over as whole multiples of this. */
const GRAIN = 2 ** -30;

interface Case {
  readonly problem: MatchingProblem;
  readonly grain: number;
}

function randomCase(random: () => number, kind: number): Case {
  const n = 2 * (1 + randomBelow(random, 20)) + (kind === 2 ? 2 : 0);
  const side = 2 + randomBelow(random, 30);
  const points = Array.from({ length: n }, (): [number, number] => [
    randomBelow(random, side),
    randomBelow(random, side),
  ]);
  // Squares of distances between whole points are whole: totals must be equal to the last digit.
  if (kind === 0) return { problem: { ...plane(points), weigh: (d) => Math.round(d * d) }, grain: 1 };
  if (kind === 1) return { problem: plane(points), grain: GRAIN };
  if (kind === 2) return { problem: withHome(points.slice(2), [0.5, -3], 'open'), grain: GRAIN };
  const table = Array.from({ length: n * n }, () => randomBelow(random, 50));
  return { problem: tableProblem(n, (i, j) => table[n * i + j]), grain: 1 };
}

test(`${SETS} random sets of 2 to 42 agree with networkx (Galil's blossom method, an independent solver)`, ({
  skip,
}) => {
  const missing = networkxMissing();
  if (missing !== null) {
    if (process.env.CI) throw new Error(`${missing}; continuous integration must have it`);
    skip(missing);
  }
  const random = createRandom(2024);
  const cases = Array.from({ length: SETS }, (_, i) => randomCase(random, i % 4));
  const totals = networkxTotals(
    cases.map(({ problem, grain }) => {
      const cost: number[] = [];
      for (let i = 0; i < problem.n; i++) {
        for (let j = i + 1; j < problem.n; j++) cost.push(Math.floor(costOf(problem, i, j) / grain));
      }
      return { n: problem.n, cost };
    }),
  );
  for (let i = 0; i < SETS; i++) {
    const { problem, grain } = cases[i];
    const found = exactMatching(problem);
    expect(checkCertificate(problem, found).reason).toBe(null);
    if (grain === 1) expect(found.total).toBe(totals[i]);
    else expect(Math.abs(found.total - totals[i] * grain)).toBeLessThanOrEqual(problem.n * grain);
  }
});
