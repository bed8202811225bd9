import { expect, test } from 'vitest';
import { candidateGraph } from '../../../src/core/matching/candidates.ts';
import { checkCertificate } from '../../../src/core/matching/certificate.ts';
import { largestCost, powerScale } from '../../../src/core/matching/cost.ts';
import { exactMatching } from '../../../src/core/matching/exact.ts';
import { Forest } from '../../../src/core/matching/forest.ts';
import { IntegerCosts, layOut } from '../../../src/core/matching/layout.ts';
import { exposedSets } from '../../../src/core/matching/passes.ts';
import { planeProblem } from '../../../src/core/matching/perfectMatching.ts';
import type { MatchingProblem } from '../../../src/core/matching/problem.ts';
import { contractPlaces, firstDuals, raiseExposed } from '../../../src/core/matching/start.ts';
import { augmentTight } from '../../../src/core/matching/tight.ts';
import { createRandom } from '../../../src/core/structures/random.ts';

/** Cells of a square grid, each kept with probability `share`; an even number of them. */
function cells(side: number, share: number, seed: number): MatchingProblem {
  const random = createRandom(seed);
  const kept: [number, number][] = [];
  for (let i = 0; i < side * side; i++) if (random() < share) kept.push([i % side, Math.floor(i / side)]);
  if (kept.length % 2 === 1) kept.pop();
  return planeProblem(kept);
}

function started(problem: MatchingProblem): { f: Forest; between: (u: number, v: number) => number } {
  const layout = layOut(problem);
  const costs = new IntegerCosts(layout, powerScale(largestCost(problem), 43));
  const f = new Forest(problem.n, candidateGraph(layout, costs));
  firstDuals(f, layout.placed);
  contractPlaces(f, layout, costs);
  raiseExposed(f);
  return { f, between: (u, v) => costs.between(u, v) };
}

test('a full lattice is paired without moving a dual', () => {
  const { f } = started(cells(60, 1, 1));
  const before = exposedSets(f).length;
  expect(before).toBeGreaterThan(0);
  expect(augmentTight(f)).toBe(true);
  expect(exposedSets(f)).toEqual([]);
});

test('what is paired is paired both ways and along tight edges', () => {
  for (const share of [0.3, 0.5, 0.65, 0.9]) {
    const { f, between } = started(cells(70, share, 2));
    const before = exposedSets(f).length;
    augmentTight(f);
    expect(exposedSets(f).length).toBeLessThan(before);
    for (let v = 0; v < f.n; v++) {
      const w = f.mateOut[v];
      if (w < 0) continue;
      expect(f.mateOut[w]).toBe(v);
      expect(f.pi[v] + f.off[v] + f.pi[w] + f.off[w]).toBe(between(v, w));
    }
  }
});

test('points without ties: it is given up', () => {
  const random = createRandom(3);
  const { f } = started(planeProblem(Array.from({ length: 4000 }, () => [random(), random()] as const)));
  expect(augmentTight(f)).toBe(false);
});

test('with ties the certificate still holds', () => {
  for (let seed = 10; seed < 50; seed++) {
    const problem = cells(4 + (seed % 37), [0.3, 0.5, 0.65, 0.8, 1][seed % 5], seed);
    const found = exactMatching(problem);
    expect(found.optimal).toBe(true);
    expect(checkCertificate(problem, found)).toEqual({ ok: true, reason: null });
  }
});
