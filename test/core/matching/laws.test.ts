import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { checkCertificate } from '../../../src/core/matching/certificate.ts';
import { exactMatching } from '../../../src/core/matching/exact.ts';
import { improveByExchange } from '../../../src/core/matching/exchange.ts';
import { greedyMatching } from '../../../src/core/matching/greedy.ts';
import { costOf, plane, withHome } from '../../support/matchingProblems.ts';

type Point = [number, number];

const coordinate = fc.oneof(
  fc.integer({ min: 0, max: 9 }),
  fc.double({ min: -100, max: 100, noNaN: true, noDefaultInfinity: true }),
);
const points = fc
  .array(fc.tuple(coordinate, coordinate), { minLength: 2, maxLength: 60 })
  .map((list): Point[] => list.slice(0, list.length - (list.length % 2)));
const problem = fc.oneof(
  points.map(plane),
  fc
    .tuple(points, fc.tuple(coordinate, coordinate), fc.constantFrom('closed' as const, 'open' as const))
    .map(([list, home, end]) => withHome(list, home, end)),
  points.map((list) => ({ ...plane(list), weigh: (d: number) => (d > 0 ? 4096 + d : 0) })),
);

describe('laws of pairing', () => {
  test('every exact matching has a sound certificate, and exact ≤ exchanged ≤ greedy', () => {
    fc.assert(
      fc.property(problem, (given) => {
        const exact = exactMatching(given);
        expect(checkCertificate(given, exact).reason).toBe(null);
        const greedy = greedyMatching(given);
        const exchanged = improveByExchange(given, greedy);
        const room = given.n / exact.certificate.scale;
        expect(exact.total).toBeLessThanOrEqual(exchanged.total + room);
        expect(exchanged.total).toBeLessThanOrEqual(greedy.total);
        for (let v = 0; v < given.n; v++) expect(exchanged.mate[exchanged.mate[v]]).toBe(v);
      }),
      { seed: 31, numRuns: 300 },
    );
  });

  test('the optimum does not depend on the order of the points', () => {
    const shuffled = points.chain((list) =>
      fc.tuple(fc.constant(list), fc.shuffledSubarray(list, { minLength: list.length })),
    );
    fc.assert(
      fc.property(shuffled, ([list, other]) => {
        const a = exactMatching(plane(list)).certificate;
        const b = exactMatching(plane(other)).certificate;
        expect(b.scale).toBe(a.scale);
        expect(b.lowerBound).toBe(a.lowerBound);
      }),
      { seed: 32, numRuns: 200 },
    );
  });

  test('few vertices: after the exchanges no exchange at all helps', () => {
    const few = points.map((list) => plane(list.slice(0, 10)));
    fc.assert(
      fc.property(few, (given) => {
        const { mate } = improveByExchange(given, greedyMatching(given));
        const cost = (i: number, j: number): number => costOf(given, i, j);
        for (let a = 0; a < given.n; a++) {
          for (let c = 0; c < given.n; c++) {
            if (c === a || c === mate[a]) continue;
            const now = cost(a, mate[a]) + cost(c, mate[c]);
            expect(cost(a, c) + cost(mate[a], mate[c])).toBeGreaterThanOrEqual(now * (1 - 1e-9));
          }
        }
      }),
      { seed: 33, numRuns: 200 },
    );
  });
});
