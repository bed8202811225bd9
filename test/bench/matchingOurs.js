// One pairing in a process of its own: reads points, prints one line of JSON. Argument: a file with
// float64 x[n], y[n]. Started by matching.js, or by hand.
import { readFileSync } from 'node:fs';

const core = new URL(process.env.FEWLIFT_CORE ?? '../../dist/core/', import.meta.url);
const { exactMatching } = await import(new URL('matching/exact.js', core));
const { planeProblem } = await import(new URL('matching/perfectMatching.js', core));

const bytes = readFileSync(process.argv[2]);
const columns = new Float64Array(bytes.buffer, bytes.byteOffset, bytes.byteLength / 8);
const n = columns.length / 2;
const problem = planeProblem({ x: columns.subarray(0, n), y: columns.subarray(n) });
const before = process.cpuUsage().user;
const found = exactMatching(problem);
const { userCPUTime, systemCPUTime, maxRSS } = process.resourceUsage();

const { scale } = found.certificate;
let total = 0n;
for (let v = 0; v < n; v++) {
  const w = found.mate[v];
  if (v > w) continue;
  const dx = problem.x[v] - problem.x[w];
  const dy = problem.y[v] - problem.y[w];
  total += 2n * BigInt(Math.floor(scale * Math.sqrt(dx * dx + dy * dy)));
}
let dual = 0n;
for (const value of found.certificate.vertexDual) dual += BigInt(value);
for (const value of found.certificate.setDual) dual += BigInt(value);
console.log(
  JSON.stringify({
    userSeconds: userCPUTime / 1e6,
    systemSeconds: systemCPUTime / 1e6,
    callSeconds: (userCPUTime - before) / 1e6,
    peakKb: maxRSS,
    total: String(total),
    tight: total === dual,
  }),
);
