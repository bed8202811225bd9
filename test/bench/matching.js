// Pairing, measured: npm run bench -- matching [what …] [repeat=3]
//
// what: beside  n = 10,000 and 100,000, each in a process of its own, back to back with LEMON's
//               MaxWeightedPerfectMatching (Debian liblemon-dev and g++; left out where they are not there)
//       stress  every input at 50,000, as a multiple of uniform points
//       large   a million uniform points, as a multiple of 100,000
//       greedy  greedy and greedy with exchanges, against the optimum
// All of them without a word; n=… and input=… narrow `beside` and `stress` down.
//
// Times are the user's share of processor time of the whole process, start of Node and compilation included;
// medians of `repeat` runs. LEMON gets the candidate edges and the k-d order for its pricing from a file, for
// nothing; its vertices are numbered as the points come and, in the next column, in our k-d order, which suits
// its memory better than any order a caller would have.
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { inputNames, makeInput } from './matchingInputs.js';
import { greedyAgainstOptimum, writeLemonInput, writePoints } from './matchingWork.js';

const here = (name) => fileURLToPath(new URL(name, import.meta.url));
const words = process.argv.slice(2);
const given = (name) => words.find((word) => word.startsWith(`${name}=`))?.slice(name.length + 1);
const parts = words.filter((word) => !word.includes('='));
const wants = (part) => parts.length === 0 || parts.includes(part);
const repeat = Number(given('repeat') ?? 3);

/** What we aim at: our time as a share of LEMON's, at most. */
const TARGETS = {
  100000: { uniform: 0.15, clustered: 0.15, voronoi: 0.15, lattice: 0.3, 'broken lattice': 0.3, hatch: 0.6 },
  10000: {
    uniform: 1.2,
    clustered: 1.2,
    voronoi: 1.2,
    lattice: 1.2,
    'broken lattice': 1.2,
    hatch: 1.2,
  },
};

const folder = mkdtempSync(join(tmpdir(), 'fewlift-bench-'));
try {
  const lemon = wants('beside') ? compileLemon() : null;
  if (wants('beside')) beside(lemon);
  if (wants('stress')) stress();
  if (wants('large')) large();
  if (wants('greedy')) greedyAgainstOptimum(10000, ['uniform', 'clustered', 'lattice', 'voronoi', 'hatch']);
} finally {
  rmSync(folder, { recursive: true, force: true });
}

function compileLemon() {
  const program = join(folder, 'lemon');
  const flags = ['-O2', '-DNDEBUG', '-ffp-contract=off', '-o', program, here('matchingLemon.cpp')];
  const compiled = spawnSync('g++', flags, { encoding: 'utf8' });
  if (compiled.status === 0) return program;
  console.log(
    compiled.error || !compiled.stderr.includes('lemon/')
      ? `LEMON left out: g++ ${compiled.error ? 'is not installed' : `fails: ${compiled.stderr}`}`
      : 'LEMON left out: its headers are not installed (Debian: liblemon-dev)',
  );
  return null;
}

function run(program, args) {
  const done = spawnSync(program, args, { encoding: 'utf8', maxBuffer: 2 ** 26 });
  if (done.status !== 0) throw new Error(`${program} ${args.join(' ')}: ${done.stderr || done.error}`);
  return JSON.parse(done.stdout);
}

function ours(points) {
  const result = run(process.execPath, [here('matchingOurs.js'), points]);
  if (!result.tight) throw new Error('primal and dual differ');
  return result;
}

function median(values) {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[sorted.length >> 1];
}

function row(cells) {
  const widths = [9, 24, 9, 8, 9, 8, 9, 8, 8, 6];
  console.log(cells.map((cell, i) => String(cell)[i === 1 ? 'padEnd' : 'padStart'](widths[i])).join(' '));
}

function beside(lemon) {
  console.log('\nBeside LEMON: user CPU seconds of the whole process, ratios ours / LEMON');
  row(['n', 'input', 'ours', 'MB', 'LEMON', 'ratio', '(k-d)', 'ratio', 'target', '']);
  for (const n of given('n') ? [Number(given('n'))] : [10000, 100000]) {
    for (const kind of given('input') ? [given('input')] : Object.keys(TARGETS[100000])) {
      const input = makeInput(kind, n);
      const points = writePoints(folder, input);
      const files =
        lemon === null ? [] : [true, false].map((asGiven) => writeLemonInput(folder, input, asGiven));
      const rounds = Array.from({ length: repeat }, () => {
        const mine = ours(points);
        const theirs = files.map((file) => run(lemon, [file]));
        for (const { total } of theirs) {
          if (total !== mine.total) throw new Error(`totals differ: ${mine.total} and LEMON's ${total}`);
        }
        return {
          mine: mine.userSeconds,
          peak: mine.peakKb,
          theirs: theirs.map(({ userSeconds }) => userSeconds),
        };
      });
      const cells = [median(rounds.map(({ mine }) => mine)), median(rounds.map(({ peak }) => peak)) / 1024];
      for (let k = 0; k < files.length; k++) {
        cells.push(median(rounds.map(({ theirs }) => theirs[k])));
        cells.push(median(rounds.map(({ mine, theirs }) => mine / theirs[k])));
      }
      const target = TARGETS[n]?.[kind];
      const verdict =
        files.length === 0 || target === undefined ? '' : cells[3] <= target ? 'met' : 'not met';
      row([n, kind, ...cells.map((cell, i) => cell.toFixed(i === 1 ? 0 : 2)), target ?? '', verdict]);
    }
  }
}

function stress() {
  const n = Number(given('n') ?? 50000);
  console.log(`\nEvery input at ${n}: user CPU seconds, as a multiple of uniform points (target: at most 4)`);
  let uniform = 0;
  for (const kind of given('input') ? ['uniform', given('input')] : inputNames) {
    const points = writePoints(folder, makeInput(kind, n));
    const runs = Array.from({ length: repeat }, () => ours(points));
    const seconds = median(runs.map(({ userSeconds }) => userSeconds));
    if (kind === 'uniform') uniform = seconds;
    const times = seconds / uniform;
    row([
      n,
      kind,
      seconds.toFixed(2),
      (runs[0].peakKb / 1024).toFixed(0),
      times.toFixed(2),
      times <= 4 ? '' : 'above 4',
    ]);
  }
}

function large() {
  console.log('\nA million uniform points (target: at most 1,536 MB and 13 times 100,000)');
  const measured = [100000, 1000000].map((n) => {
    const points = writePoints(folder, makeInput('uniform', n));
    const runs = Array.from({ length: n > 100000 ? 1 : repeat }, () => ours(points));
    const seconds = median(runs.map(({ userSeconds }) => userSeconds));
    row([n, 'uniform', seconds.toFixed(2), (runs[0].peakKb / 1024).toFixed(0)]);
    return seconds;
  });
  console.log(`${(measured[1] / measured[0]).toFixed(1)} times`);
}
