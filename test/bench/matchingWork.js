// What the bench of pairing does in its own process: files for the others, and greedy against the optimum.
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { candidateGraph, edgesOf } from '../../dist/core/matching/candidates.js';
import { largestCost, powerScale } from '../../dist/core/matching/cost.js';
import { exactMatching } from '../../dist/core/matching/exact.js';
import { improveByExchange } from '../../dist/core/matching/exchange.js';
import { greedyMatching } from '../../dist/core/matching/greedy.js';
import { IntegerCosts, layOut } from '../../dist/core/matching/layout.js';
import { planeProblem } from '../../dist/core/matching/perfectMatching.js';
import { makeInput } from './matchingInputs.js';

export function writePoints(folder, { x, y }) {
  const file = join(folder, 'points');
  const columns = new Float64Array(2 * x.length);
  columns.set(x);
  columns.set(y, x.length);
  writeFileSync(file, columns);
  return file;
}

/** The points with our candidate edges, as matchingLemon.cpp reads them; numbered as given or in k-d order. */
export function writeLemonInput(folder, points, asGiven) {
  const file = join(folder, asGiven ? 'given' : 'near');
  const problem = planeProblem(points);
  const { n } = problem;
  const layout = layOut(problem);
  const costs = new IntegerCosts(layout, powerScale(largestCost(problem), 43));
  const edges = edgesOf(candidateGraph(layout, costs));
  const name = (v) => (asGiven ? layout.original[v] : v);
  const pairs = Array.from({ length: edges.count }, (_, i) => {
    const u = name(edges.from[i]);
    const v = name(edges.to[i]);
    return u < v ? [u, v] : [v, u];
  });
  pairs.sort((a, b) => a[0] - b[0] || a[1] - b[1]);
  const x = new Float64Array(n);
  const y = new Float64Array(n);
  for (let v = 0; v < n; v++) {
    x[name(v)] = points.x[layout.original[v]];
    y[name(v)] = points.y[layout.original[v]];
  }
  const columns = [
    Int32Array.of(n, pairs.length),
    Float64Array.of(costs.scale),
    x,
    y,
    Int32Array.from(pairs, ([u]) => u),
    Int32Array.from(pairs, ([, v]) => v),
    Int32Array.from({ length: n }, (_, v) => name(v)),
  ];
  writeFileSync(file, Buffer.concat(columns.map(({ buffer }) => Buffer.from(buffer))));
  return file;
}

export function greedyAgainstOptimum(n, kinds) {
  console.log(`\nGreedy and greedy with exchanges, per cent above the optimum at ${n}`);
  for (const kind of kinds) {
    const problem = planeProblem(makeInput(kind, n));
    const best = exactMatching(problem).total;
    const greedy = greedyMatching(problem);
    const exchanged = improveByExchange(problem, greedy);
    const above = ({ total }) => (100 * (total / best - 1)).toFixed(1).padStart(8);
    console.log(`${kind.padEnd(20)}${above(greedy)}${above(exchanged)}`);
  }
}
