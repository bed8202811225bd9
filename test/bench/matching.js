// Time of pairing, and its cost against the optimum. Run: npm run build && node test/bench/matching.js [n …]
//
// Milliseconds of processor time hang on the machine, so each is also given as a multiple of the time that
// the same machine takes to sort as many random doubles.
import { exactMatching } from '../../dist/core/matching/exact.js';
import { improveByExchange } from '../../dist/core/matching/exchange.js';
import { greedyMatching } from '../../dist/core/matching/greedy.js';
import { createRandom } from '../../dist/core/structures/random.js';

const kinds = {
  uniform: (n, random) => Array.from({ length: n }, () => [random(), random()]),
  clustered(n, random) {
    const centres = Array.from({ length: Math.ceil(Math.sqrt(n) / 3) }, () => [random(), random()]);
    const near = () => (random() + random() + random() + random() - 2) / 50;
    return Array.from({ length: n }, () => {
      const [x, y] = centres[Math.floor(random() * centres.length)];
      return [x + near(), y + near()];
    });
  },
  lattice(n, random) {
    const side = Math.ceil(Math.sqrt(n / 0.65));
    const cells = Array.from({ length: side * side }, (_, i) => i);
    for (let i = 0; i < n; i++) {
      const j = i + Math.floor(random() * (cells.length - i));
      [cells[i], cells[j]] = [cells[j], cells[i]];
    }
    return cells.slice(0, n).map((cell) => [cell % side, Math.floor(cell / side)]);
  },
  // Blocks of level lines 0.5 apart, each block a tilted shape of its own with an odd number of lines.
  hatch(n, random) {
    const rows = 2 * Math.floor(Math.sqrt(n) / 8) + 1;
    const points = [];
    for (let block = 0; points.length < n; block++) {
      const x = 60 * (block % 20) + 10 * random();
      const y = rows * Math.floor(block / 20) + 10 * random();
      const slope = random() - 0.5;
      for (let row = 0; row < rows && points.length < n; row++) {
        points.push([x + slope * row, y + 0.5 * row], [x + slope * row + 30 + random(), y + 0.5 * row]);
      }
    }
    return points.slice(0, n);
  },
};

function timed(work) {
  const start = process.cpuUsage();
  const result = work();
  const used = process.cpuUsage(start);
  return { result, ms: (used.user + used.system) / 1000 };
}

function sortingMs(n) {
  const random = createRandom(1);
  const columns = Array.from({ length: 5 }, () => Float64Array.from({ length: n }, random));
  return Math.min(...columns.map((column) => timed(() => column.sort()).ms));
}

const sizes = process.argv.length > 2 ? process.argv.slice(2).map(Number) : [2000, 10000, 100000];
const row = (cells) => cells.map((cell, i) => String(cell).padStart(i < 2 ? 10 : 12)).join('');
console.log(
  row(['n', 'kind', 'exact ms', '× sorting', 'greedy ms', '+ exchange', 'greedy/opt', 'exch./opt']),
);
for (const n of sizes) {
  const sorting = sortingMs(n);
  for (const [kind, make] of Object.entries(kinds)) {
    const points = make(n, createRandom(5));
    const problem = {
      n,
      x: Float64Array.from(points, (point) => point[0]),
      y: Float64Array.from(points, (point) => point[1]),
      weigh: (distance) => distance,
      special: 0,
      specialCost: () => Number.NaN,
    };
    const exact = timed(() => exactMatching(problem));
    const greedy = timed(() => greedyMatching(problem));
    const exchanged = timed(() => improveByExchange(problem, greedy.result));
    const ratio = (matching) => (matching.total / exact.result.total).toFixed(3);
    console.log(
      row([
        n,
        kind,
        exact.ms.toFixed(0),
        (exact.ms / sorting).toFixed(0),
        greedy.ms.toFixed(0),
        exchanged.ms.toFixed(0),
        ratio(greedy.result),
        ratio(exchanged.result),
      ]),
    );
  }
}
