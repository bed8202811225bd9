import type { MatchingProblem } from '../../src/core/matching/problem.ts';
import { randomBelow } from '../../src/core/structures/random.ts';

/** Least total over all perfect matchings, by dynamic programming over sets of vertices: 2ⁿ, for n to about 16. */
export function bruteForce(n: number, cost: (i: number, j: number) => number): number {
  const best = new Float64Array(2 ** n).fill(Number.POSITIVE_INFINITY);
  best[0] = 0;
  for (let done = 0; done < 2 ** n; done++) {
    if (best[done] === Number.POSITIVE_INFINITY) continue;
    let i = 0;
    while (((done >> i) & 1) === 1) i++;
    for (let j = i + 1; j < n; j++) {
      if (((done >> j) & 1) === 1) continue;
      const next = done | (1 << i) | (1 << j);
      best[next] = Math.min(best[next], best[done] + cost(i, j));
    }
  }
  return best[2 ** n - 1];
}

/** The cost of a pair by the contract in problem.ts. */
export function costOf(problem: MatchingProblem, i: number, j: number): number {
  const placed = problem.n - problem.special;
  if (Math.max(i, j) >= placed) return problem.specialCost(Math.min(i, j), Math.max(i, j));
  let cost = problem.weigh(
    Math.sqrt((problem.x[i] - problem.x[j]) ** 2 + (problem.y[i] - problem.y[j]) ** 2),
  );
  problem.ways?.cost.forEach((other, k) => {
    const [u, v] = [problem.ways?.u[k], problem.ways?.v[k]];
    if ((u === i && v === j) || (u === j && v === i)) cost = Math.min(cost, other);
  });
  return cost;
}

export function plane(points: readonly (readonly [number, number])[]): MatchingProblem {
  return {
    n: points.length,
    x: Float64Array.from(points, (point) => point[0]),
    y: Float64Array.from(points, (point) => point[1]),
    weigh: (distance) => distance,
    special: 0,
    specialCost: () => Number.NaN,
  };
}

/** The same points with home as two copies (a closed tour) or home and a free end (an open one). */
export function withHome(
  points: readonly (readonly [number, number])[],
  home: readonly [number, number],
  end: 'closed' | 'open',
  weigh: (distance: number) => number = (distance) => distance,
): MatchingProblem {
  const base = plane(points);
  const placed = points.length;
  const fromHome = (v: number): number =>
    weigh(Math.sqrt((base.x[v] - home[0]) ** 2 + (base.y[v] - home[1]) ** 2));
  let nearest = Number.POSITIVE_INFINITY;
  for (let v = 0; v < placed; v++) nearest = Math.min(nearest, fromHome(v));
  const specialCost = (i: number, j: number): number => {
    if (end === 'closed') return i >= placed ? 2 * nearest : fromHome(i);
    if (i >= placed) return nearest;
    return j === placed ? fromHome(i) : 0;
  };
  return { ...base, weigh, n: placed + 2, special: 2, specialCost };
}

type Random = () => number;
type Point = [number, number];

function many(n: number, point: (i: number) => Point): Point[] {
  return Array.from({ length: n }, (_, i) => point(i));
}

/** Sets of points of the kinds that have been hard for matching codes. */
export const pointSets: Record<string, (n: number, random: Random) => Point[]> = {
  uniform: (n, random) => many(n, () => [random(), random()]),
  clustered(n, random) {
    const centres = many(Math.ceil(Math.sqrt(n) / 3), () => [random(), random()]);
    const near = (): number => (random() + random() + random() - 1.5) / 30;
    return many(n, () => {
      const [x, y] = centres[randomBelow(random, centres.length)];
      return [x + near(), y + near()];
    });
  },
  lattice: (n) => many(n, (i) => [i % Math.ceil(Math.sqrt(n)), Math.floor(i / Math.ceil(Math.sqrt(n)))]),
  'lattice with holes'(n, random) {
    const side = Math.ceil(Math.sqrt(n / 0.65));
    const cells = Array.from({ length: side * side }, (_, i) => i);
    for (let i = 0; i < n; i++) {
      const j = i + randomBelow(random, cells.length - i);
      [cells[i], cells[j]] = [cells[j], cells[i]];
    }
    return many(n, (i) => [cells[i] % side, Math.floor(cells[i] / side)]);
  },
  'level line': (n, random) => many(n, () => [random(), 3]),
  'sloping line': (n) => many(n, (i) => [i, 2 * i]),
  circle: (n) =>
    many(n, (i) => [100 * Math.cos((2 * Math.PI * i) / n), 100 * Math.sin((2 * Math.PI * i) / n)]),
  'exponential spread': (n, random) => many(n, () => [2 ** (-40 * random()), 2 ** (-40 * random())]),
  '500 copies on a place'(n, random) {
    const places = many(Math.ceil(n / 500), () => [random(), random()]);
    return many(n, (i) => [...(places[i % places.length] as Point)]);
  },
  'some copies on a place'(n, random) {
    const places = many(Math.ceil(n / 3), () => [random(), random()]);
    return many(n, () => [...(places[randomBelow(random, places.length)] as Point)]);
  },
  'odd tight clusters'(n, random) {
    const places = many(Math.ceil(n / 7), () => [random(), random()]);
    return many(n, (i) => {
      const [x, y] = places[Math.floor(i / 7)];
      return [x + 1e-6 * random(), y + 1e-6 * random()];
    });
  },
  'two far odd clouds': (n, random) => many(n, (i) => [random() + (i < n / 2 - 1 ? 0 : 1000), random()]),
  'ends of hatching'(n, random) {
    const rows = 2 * Math.ceil(Math.sqrt(n) / 2) + 1;
    return many(n, (i) => {
      const line = i >> 1;
      const row = line % rows;
      const block = Math.floor(line / rows);
      return [block * 40 + (i % 2 === 0 ? 0 : 30 + random()), 0.5 * row];
    });
  },
};

/** A small problem with many ties: points on a coarse grid, on a line or free; all kinds of weighing; special vertices. */
export function smallProblem(random: Random, maximum: number): MatchingProblem {
  const n = 2 * (1 + randomBelow(random, maximum / 2));
  const special = randomBelow(random, 3) === 0 ? randomBelow(random, n + 1) : randomBelow(random, 3);
  const side = 1 + randomBelow(random, 7);
  const kind = randomBelow(random, 3);
  const coordinate = (): number => (kind === 2 ? random() : randomBelow(random, side));
  const placed = Math.max(0, n - special);
  const x = Float64Array.from({ length: placed }, coordinate);
  const y = Float64Array.from({ length: placed }, () => (kind === 1 ? 0 : coordinate()));
  const table = Array.from({ length: n * n }, () => randomBelow(random, 6));
  const weighs: ((distance: number) => number)[] = [
    (distance) => distance,
    (distance) => (distance > 0 ? 1000 + distance : 0),
    (distance) => Math.round(distance * distance),
    (distance) => 2 + Math.sqrt(distance),
    (distance) => Math.floor(distance),
  ];
  const weigh = weighs[randomBelow(random, weighs.length)];
  return { n, x, y, weigh, special: n - placed, specialCost: (i, j) => table[n * i + j] };
}
