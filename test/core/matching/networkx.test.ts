import { expect, test } from 'vitest';
import { checkCertificate } from '../../../src/core/matching/certificate.ts';
import { exactMatching } from '../../../src/core/matching/exact.ts';
import { tableProblem } from '../../../src/core/matching/perfectMatching.ts';
import type { MatchingProblem } from '../../../src/core/matching/problem.ts';
import { createRandom, randomBelow } from '../../../src/core/structures/random.ts';
import { costOf, plane, withHome } from '../../support/matchingProblems.ts';
import { networkxMissing, networkxTotals } from '../../support/networkx.ts';

const SETS = 520;
/** Lengths are handed over as whole multiples of this. */
const GRAIN = 2 ** -30;

interface Case {
  readonly problem: MatchingProblem;
  readonly grain: number;
}

type Point = [number, number];

/** Points with ties, on a line, in clusters or with copies. */
function randomPoints(random: () => number, n: number, kind: number): Point[] {
  const side = 2 + randomBelow(random, 12);
  const grid = (): Point => [randomBelow(random, side), randomBelow(random, side)];
  if (kind === 0) return Array.from({ length: n }, grid);
  if (kind === 1) return Array.from({ length: n }, (): Point => [randomBelow(random, 3 * n), 0]);
  if (kind === 2) {
    const centres = [grid(), grid(), grid()];
    return Array.from({ length: n }, (): Point => {
      const [x, y] = centres[randomBelow(random, 3)];
      return [x + randomBelow(random, 64) / 4096, y + randomBelow(random, 64) / 4096];
    });
  }
  const places = Array.from({ length: Math.max(1, n >> 1) }, grid);
  return Array.from({ length: n }, (): Point => [...(places[randomBelow(random, places.length)] as Point)]);
}

function randomCase(random: () => number, round: number): Case {
  // Python takes cubic time: mostly to 14, some to 36.
  const n = 2 * (1 + randomBelow(random, round % 20 === 0 ? 18 : 7));
  const points = randomPoints(random, n, (round >> 2) % 4);
  // Squares of distances between whole points are whole: totals must be equal to the last digit.
  if (round % 4 === 0) return { problem: { ...plane(points), weigh: (d) => Math.round(d * d) }, grain: 1 };
  if (round % 4 === 1) return { problem: plane(points), grain: GRAIN };
  if (round % 4 === 2) return { problem: withHome(points, [0.5, -3], 'open'), grain: GRAIN };
  const table = Array.from({ length: n * n }, () => randomBelow(random, 50));
  return { problem: tableProblem(n, (i, j) => table[n * i + j]), grain: 1 };
}

test(`${SETS} random sets agree with networkx (Galil's blossom method, an independent solver)`, ({
  skip,
}) => {
  const missing = networkxMissing();
  if (missing !== null) {
    if (process.env.CI) throw new Error(`${missing}; continuous integration must have it`);
    skip(missing);
  }
  const random = createRandom(2024);
  const cases = Array.from({ length: SETS }, (_, i) => randomCase(random, i));
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
