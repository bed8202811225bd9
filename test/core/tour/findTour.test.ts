import { describe, expect, test } from 'vitest';
import { liftsFirst } from '../../../src/core/metric/metric.ts';
import { buildNetwork } from '../../../src/core/network/buildNetwork.ts';
import { fewestRuns } from '../../../src/core/network/fewestRuns.ts';
import type { Network } from '../../../src/core/network/network.ts';
import { createRandom } from '../../../src/core/structures/random.ts';
import { findTour, type TourOptions } from '../../../src/core/tour/findTour.ts';
import type { Tour } from '../../../src/core/tour/tour.ts';
import { drawingOf, type StrokeSpec } from '../../support/drawings.ts';
import { leastCost } from '../../support/exhaustive.ts';

const OPTIONS: TourOptions = {
  matching: 'exact',
  bound: 'quick',
  kicksPerEnd: 10,
  seed: 1,
  shouldStop: () => false,
  onProgress: () => {},
};

function networkOf(specs: readonly StrokeSpec[]): Network {
  const drawing = drawingOf(specs);
  const all = Uint32Array.from({ length: drawing.strokes.count }, (_, i) => i);
  return buildNetwork(drawing, all, {
    snapMm: 0.05,
    accuracyMm: 0.02,
    junctions: 'touching',
    repeats: 'once',
    repeatToleranceMm: 0.01,
  });
}

/** One to six strokes on a coarse grid, so that ends often meet and lines often touch. */
function randomDrawing(random: () => number): StrokeSpec[] {
  const size = 3 + Math.floor(10 * random());
  const at = (): [number, number] => [Math.floor(size * random()), Math.floor(size * random())];
  const count = 1 + Math.floor(6 * random());
  return Array.from({ length: count }, (): StrokeSpec => {
    const kind = random();
    if (kind < 0.15) return { dot: at() };
    const a = at();
    let b = at();
    while (a[0] === b[0] && a[1] === b[1]) b = [b[0] + 1, b[1]];
    if (kind < 0.75) return { line: [a, b] };
    return { line: [a, b, [b[0] + 1, b[1] + 2]] };
  });
}

/** Every edge once, runs joined at their vertices, and the cost as told. */
function checkTour(network: Network, tour: Tour, home: [number, number], end: 'home' | 'anywhere'): void {
  const drawn = Array.from(tour.halfEdges, (h) => h >> 1).sort((a, b) => a - b);
  expect(drawn).toEqual(Array.from({ length: network.edgeCount }, (_, e) => e));
  let travel = 0;
  let [x, y] = home;
  for (let r = 0; r + 1 < tour.runFirst.length; r++) {
    for (let k = tour.runFirst[r]; k < tour.runFirst[r + 1]; k++) {
      const v = network.halfEdgeVertex[tour.halfEdges[k]];
      if (k > tour.runFirst[r]) expect(network.halfEdgeVertex[tour.halfEdges[k - 1] ^ 1]).toBe(v);
      else travel += Math.hypot(network.vertexX[v] - x, network.vertexY[v] - y);
      const w = network.halfEdgeVertex[tour.halfEdges[k] ^ 1];
      x = network.vertexX[w];
      y = network.vertexY[w];
    }
  }
  if (end === 'home') travel += Math.hypot(home[0] - x, home[1] - y);
  expect(tour.cost).toBeCloseTo(travel, 6);
}

describe('against every order there is', () => {
  test.each(['home', 'anywhere'] as const)('300 small drawings, ending at: %s', (end) => {
    const random = createRandom(end === 'home' ? 11 : 12);
    let compared = 0;
    let optimal = 0;
    let proven = 0;
    for (let k = 0; compared < 300; k++) {
      const network = networkOf(randomDrawing(random));
      if (network.edgeCount > 10) continue;
      const home: [number, number] = k % 3 === 0 ? [0, 0] : [-2.5, 14];
      compared++;
      const tour = findTour(network, { homeX: home[0], homeY: home[1], end, weigh: (d) => d }, OPTIONS);
      checkTour(network, tour, home, end);
      const best = leastCost(network, home, end, (d) => d);
      expect(tour.cost).toBeGreaterThanOrEqual(best - 1e-9);
      expect(tour.bound.value).toBeLessThanOrEqual(best + 1e-9);
      if (network.componentCount === 1) expect(tour.bound.exact).toBe(true);
      if (tour.bound.exact) {
        proven++;
        expect(tour.cost).toBeCloseTo(best, 7);
      }
      if (tour.cost <= best + 1e-7) optimal++;
      expect(tour.runFirst.length - 1).toBeGreaterThanOrEqual(fewestRuns(network));
    }
    // The search is no proof, but on drawings this small it has no excuse.
    expect(optimal).toBeGreaterThanOrEqual(297);
    expect(proven).toBeGreaterThan(60);
  });

  test('60 drawings with a circle or two, which may be entered at eight places', () => {
    const random = createRandom(5);
    for (let k = 0; k < 60; k++) {
      const at = () => Math.floor(40 * random()) + 0.5;
      const specs: StrokeSpec[] = [{ circle: [at(), at(), 3] }];
      for (let i = 0; i < 3; i++) specs.push({ line: [[at(), at()] as const, [at() + 50, at()] as const] });
      const network = networkOf(specs);
      const tour = findTour(network, { homeX: 0, homeY: 0, end: 'home', weigh: (d) => d }, OPTIONS);
      checkTour(network, tour, [0, 0], 'home');
      const best = leastCost(network, [0, 0], 'home', (d) => d);
      expect(tour.cost).toBeGreaterThanOrEqual(best - 1e-9);
      expect(tour.cost).toBeLessThanOrEqual(best * 1.02 + 1e-9);
    }
  });

  test.each(['home', 'anywhere'] as const)('200 small drawings with lifts first, ending at: %s', (end) => {
    const random = createRandom(13);
    let compared = 0;
    let optimal = 0;
    for (let k = 0; compared < 200; k++) {
      const network = networkOf(randomDrawing(random));
      if (network.edgeCount > 9) continue;
      compared++;
      const { weigh, weighHome, liftCost } = liftsFirst(100, network.edgeCount);
      // Now and then home is a vertex itself: its legs cost nothing in length, but runs are still counted.
      const v = k % network.vertexCount;
      const [homeX, homeY] = k % 2 ? [-2, 3] : [network.vertexX[v], network.vertexY[v]];
      const tour = findTour(network, { homeX, homeY, end, weigh, weighHome }, OPTIONS);
      const best = leastCost(network, [homeX, homeY], end, weigh, weighHome);
      expect(tour.cost).toBeGreaterThanOrEqual(best - 1e-6);
      expect(tour.bound.value).toBeLessThanOrEqual(best + 1e-6);
      const legs = end === 'home' ? 1 : 0;
      expect(Math.floor(tour.cost / liftCost) - legs).toBe(tour.runFirst.length - 1);
      if (tour.cost <= best + 1e-6) optimal++;
    }
    expect(optimal).toBeGreaterThanOrEqual(193);
  });
});

describe('published walks', () => {
  // Euler, "Solutio problematis ad geometriam situs pertinentis", 1736 (E53): degrees 5, 3, 3, 3.
  test('Koenigsberg: its seven bridges cannot be walked in one run, but in two', () => {
    const [A, B, C, D] = [
      [10, 10],
      [10, 0],
      [10, 20],
      [30, 10],
    ] as const;
    const bent = (a: readonly [number, number], b: readonly [number, number], by: number): StrokeSpec => ({
      line: [a, [(a[0] + b[0]) / 2 + by, (a[1] + b[1]) / 2], b],
    });
    const network = networkOf([
      bent(A, B, 2),
      bent(A, B, -2),
      bent(A, C, 2),
      bent(A, C, -2),
      { line: [A, D] },
      { line: [B, D] },
      { line: [C, D] },
    ]);
    expect([network.vertexCount, network.edgeCount, network.oddVertices.length]).toEqual([4, 7, 4]);
    expect(fewestRuns(network)).toBe(2);
    const { weigh, weighHome } = liftsFirst(100, 7);
    const task = { homeX: 10, homeY: 10, end: 'anywhere' as const, weigh, weighHome };
    const tour = findTour(network, task, OPTIONS);
    expect(tour.runFirst.length - 1).toBe(2);
    expect(tour.bound.exact).toBe(true);
  });

  test('straight on at a crossing of two strokes that were cut there', () => {
    const network = networkOf([
      { line: [[0, 5] as const, [5, 5] as const] },
      { line: [[5, 0] as const, [5, 5] as const] },
      { line: [[5, 5] as const, [10, 5] as const] },
      { line: [[5, 5] as const, [5, 10] as const] },
    ]);
    const tour = findTour(network, { homeX: 0, homeY: 5, end: 'anywhere', weigh: (d) => d }, OPTIONS);
    const runs = Array.from({ length: tour.runFirst.length - 1 }, (_, r) =>
      Array.from(tour.halfEdges.subarray(tour.runFirst[r], tour.runFirst[r + 1]), (h) => h >> 1)
        .sort()
        .join(),
    );
    expect(runs.sort()).toEqual(['0,2', '1,3']);
  });
});

describe('a drawing in one piece', () => {
  test('with 2,000 odd vertices is solved, and says so', () => {
    const random = createRandom(3);
    const teeth = Array.from({ length: 1000 }, (_, i): StrokeSpec => {
      const x = 1 + 0.2 * i;
      const up = random() < 0.5 ? -1 : 1;
      return { line: [[x, 50] as const, [x, 50 + up * (2 + 45 * random())] as const] };
    });
    const network = networkOf([{ line: [[0, 50] as const, [201, 50] as const] }, ...teeth]);
    expect([network.componentCount, network.oddVertices.length]).toEqual([1, 2002]);
    const home: [number, number] = [0, 100];
    const tour = findTour(network, { homeX: 0, homeY: 100, end: 'home', weigh: (d) => d }, OPTIONS);
    checkTour(network, tour, home, 'home');
    expect(tour.bound).toMatchObject({ exact: true, method: 'matching' });
    expect(tour.stopped).toBe('proven');
    const { certified } = tour.bound;
    expect(certified).not.toBeNull();
    expect(tour.cost).toBeCloseTo(certified?.total ?? 0, 6);
    expect(tour.runFirst.length - 1).toBeGreaterThanOrEqual(1001);
  });
});
