import { expect, test } from 'vitest';
import { checkCertificate } from '../../../src/core/matching/certificate.ts';
import { exactMatching } from '../../../src/core/matching/exact.ts';
import { type DrawnGraph, retracedWays } from '../../../src/core/metric/retrace.ts';
import { createRandom, randomBelow } from '../../../src/core/structures/random.ts';
import { bruteForce, plane } from '../../support/matchingProblems.ts';

function graphOf(points: [number, number][], lines: [number, number, number][]): DrawnGraph {
  return {
    x: Float64Array.from(points, ([x]) => x),
    y: Float64Array.from(points, ([, y]) => y),
    from: Int32Array.from(lines, ([a]) => a),
    to: Int32Array.from(lines, ([, b]) => b),
    lengthMm: Float64Array.from(lines, ([, , length]) => length),
  };
}

/** Shortest ways between all vertices (Floyd 1962). */
function shortestWays(graph: DrawnGraph): number[][] {
  const n = graph.x.length;
  const way = Array.from({ length: n }, (_, i) =>
    Array.from({ length: n }, (_, j) => (i === j ? 0 : Number.POSITIVE_INFINITY)),
  );
  graph.from.forEach((a, e) => {
    const b = graph.to[e];
    way[a][b] = way[b][a] = Math.min(way[a][b], graph.lengthMm[e]);
  });
  for (let k = 0; k < n; k++) {
    for (let i = 0; i < n; i++)
      for (let j = 0; j < n; j++) way[i][j] = Math.min(way[i][j], way[i][k] + way[k][j]);
  }
  return way;
}

test('a student script: where lifting is dear, the Chinese postman draws AD and EH again, 16', () => {
  // Student notes on the Chinese postman problem, recomputed by hand: odd A D E H, the closed walk 93 + 16 = 109.
  const letters = 'ABCDEFGH';
  const lines = 'AB5 AC9 AD6 BC5 CD4 CF18 DE7 EF4 FG6 GH7 FH12 EH10'
    .split(' ')
    .map((name): [number, number, number] => [
      letters.indexOf(name[0]),
      letters.indexOf(name[1]),
      +name.slice(2),
    ]);
  const points = [...letters].map((_, i): [number, number] => [i / 100, 0]);
  const ends = [0, 3, 4, 7];
  const lifting = (distance: number): number => (distance > 0 ? 1000 + distance : 0);
  const ways = retracedWays(graphOf(points, lines), ends, lifting, 1);
  const problem = { ...plane(ends.map((v) => points[v])), weigh: lifting, ways };
  const found = exactMatching(problem);
  expect(found.total).toBe(16);
  expect([...found.mate]).toEqual([1, 0, 3, 2]);
  expect(checkCertificate(problem, found).reason).toBe(null);
  // What is drawn again, pair by pair: A–D and E–H themselves.
  const drawn = (u: number, v: number): string[] => {
    const i = ways.u.findIndex((a, k) => a === u && ways.v[k] === v);
    return [...ways.edges.subarray(ways.first[i], ways.first[i + 1])].map(
      (e) => letters[lines[e][0]] + letters[lines[e][1]],
    );
  };
  expect([drawn(0, 1), drawn(2, 3)]).toEqual([['AD'], ['EH']]);
});

test('400 random networks: the cheaper of lifting and retracing, against brute force', () => {
  const random = createRandom(5);
  let retraced = 0;
  for (let round = 0; round < 400; round++) {
    const n = 4 + randomBelow(random, 10);
    const points = Array.from({ length: n }, (): [number, number] => [
      randomBelow(random, 8),
      randomBelow(random, 8),
    ]);
    const lines = Array.from({ length: n + randomBelow(random, n) }, (): [number, number, number] => {
      const a = randomBelow(random, n);
      const b = randomBelow(random, n);
      const straight = Math.hypot(points[a][0] - points[b][0], points[a][1] - points[b][1]);
      return [a, b, straight * (1 + randomBelow(random, 3) / 4)];
    });
    const graph = graphOf(points, lines);
    const ends = Array.from({ length: n }, (_, v) => v).slice(0, 2 * Math.min(4, n >> 1));
    const lift = randomBelow(random, 6);
    const weigh = (distance: number): number => (distance > 0 ? lift + Math.sqrt(distance) : 0);
    const ways = retracedWays(graph, ends, weigh, 2);
    const problem = { ...plane(ends.map((v) => points[v])), weigh, ways };
    const way = shortestWays(graph);
    const cost = (i: number, j: number): number => {
      const straight = weigh(Math.hypot(points[i][0] - points[j][0], points[i][1] - points[j][1]));
      return Math.min(straight, way[i][j] / 2);
    };
    const found = exactMatching(problem);
    expect(checkCertificate(problem, found).reason).toBe(null);
    const best = bruteForce(ends.length, cost);
    expect(Math.abs(found.total - best)).toBeLessThanOrEqual(1e-9 * (1 + best));
    ways.cost.forEach((seconds, i) => {
      let length = 0;
      for (const e of ways.edges.subarray(ways.first[i], ways.first[i + 1])) length += graph.lengthMm[e];
      expect(length / 2).toBeCloseTo(seconds, 9);
      expect(seconds).toBeCloseTo(way[ends[ways.u[i]]][ends[ways.v[i]]] / 2, 9);
    });
    found.mate.forEach((m, v) => {
      const straight = weigh(Math.hypot(points[m][0] - points[v][0], points[m][1] - points[v][1]));
      if (cost(m, v) < straight) retraced++;
    });
  }
  expect(retraced).toBeGreaterThan(200);
});
