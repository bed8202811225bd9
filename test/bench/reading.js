// Time and memory of reading. Run: npm run bench -- reading [case…]   (all cases: about five minutes)
//
// Each case is a file made from a seed in a folder of its own. It is read in a fresh process, as a command
// does it: bytes, text, drawing. Where the case is for it, svg-parser alone parses the same text in fresh
// processes of its own, before and after, and the ratio of processor times is printed.
import { spawnSync } from 'node:child_process';
import { closeSync, mkdtempSync, openSync, readFileSync, rmSync, statSync, writeSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const MB = 1e6;
const HEAD =
  '<svg xmlns="http://www.w3.org/2000/svg" width="400mm" height="300mm" viewBox="0 0 400 300" fill="none">';

/** name: [size in bytes, what the file repeats, its wrapping, whether svg-parser is fit to be compared] */
const CASES = {
  small: [50 * MB, smallPath, [`${HEAD}\n<g stroke="#000000">\n`, '</g>\n</svg>\n'], true],
  styled: [
    50 * MB,
    styledPath,
    [`${HEAD}\n<style>.a{stroke:red}.b{stroke:blue}</style>\n`, '</svg>\n'],
    true,
  ],
  map: [50 * MB, polyline, [`${HEAD}\n<g stroke="#000000">\n`, '</g>\n</svg>\n'], true],
  path10: [10 * MB, curve, [`${HEAD}<path stroke="#000000" d="M200 150`, '"/></svg>\n'], false],
  path100: [100 * MB, curve, [`${HEAD}<path stroke="#000000" d="M200 150`, '"/></svg>\n'], false],
  map300: [300 * MB, polyline, [`${HEAD}\n<g stroke="#000000">\n`, '</g>\n</svg>\n'], false],
  small300: [300 * MB, smallPath, [`${HEAD}\n<g stroke="#000000">\n`, '</g>\n</svg>\n'], false],
};

/** A linear congruential generator (Numerical Recipes, "quick and dirty"): the files need no better. */
function generator() {
  let state = 20261201;
  return (below) => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return Math.floor((state / 4294967296) * below);
  };
}

const decimal = (next, below, places) => (next(below * 10 ** places) / 10 ** places).toFixed(places);

function smallPath(next, i) {
  const n = (below) => decimal(next, below, 3);
  return `<path id="p${i}" d="M${n(400)} ${n(300)}c${n(9)} ${n(9)} ${n(9)}-${n(9)} ${n(9)} ${n(9)}L${n(400)},${n(300)}z"/>\n`;
}

function styledPath(next, i) {
  const n = (below) => decimal(next, below, 2);
  const style = `stroke-width:${n(3)};stroke-linecap:round`;
  return `<path class="${i % 2 ? 'a' : 'b'}" style="${style}" d="M${n(400)} ${n(300)}L${n(400)} ${n(300)} ${n(9)} ${n(9)}"/>\n`;
}

function polyline(next) {
  const points = Array.from({ length: 40 }, () => `${decimal(next, 400, 4)},${decimal(next, 300, 4)}`);
  return `<polyline points="${points.join(' ')}"/>\n`;
}

function curve(next) {
  const n = (below) => decimal(next, below, 3);
  return `C${n(400)} ${n(300)} ${n(400)} ${n(300)} ${n(400)} ${n(300)}L${n(400)} ${n(300)}`;
}

function makeFile(path, [size, piece, [head, tail]]) {
  const file = openSync(path, 'w');
  const next = generator();
  let written = writeSync(file, head);
  for (let i = 0; written < size; ) {
    const pieces = [];
    for (let k = 0; k < 1000; k++) pieces.push(piece(next, i++));
    written += writeSync(file, pieces.join(''));
  }
  writeSync(file, tail);
  closeSync(file);
}

/** In the fresh process: prints what it took. */
async function measure(how, path) {
  const { decodeText } = await import('../../dist/node/decodeText.js');
  const { readDrawing } = await import('../../dist/core/index.js');
  const { parse } = await import('svg-parser');
  const text = decodeText(readFileSync(path));
  const start = process.cpuUsage();
  const before = performance.now();
  const result = how === 'read' ? readDrawing(text) : parse(text);
  const wall = performance.now() - before;
  const { user, system } = process.cpuUsage(start);
  const facts =
    how === 'read'
      ? { strokes: result.strokes.count, findings: result.findings.map((f) => f.code) }
      : { elements: result.children[0].children.length };
  const peak = process.resourceUsage().maxRSS * 1024;
  console.log(JSON.stringify({ cpu: (user + system) / 1e6, wall: wall / 1e3, peak, ...facts }));
}

function inFreshProcess(how, path) {
  const self = fileURLToPath(import.meta.url);
  const run = spawnSync(process.execPath, [self, how, path], { encoding: 'utf8', maxBuffer: MB });
  if (run.status === 0) return JSON.parse(run.stdout);
  return { failed: run.signal ?? run.stderr.split('\n').find((line) => /error/i.test(line)) ?? run.status };
}

function runCases(names) {
  const folder = mkdtempSync(join(tmpdir(), 'fewlift-bench-'));
  try {
    console.log('case       MB   CPU s   s/10 MB   peak MB   peak/size   svg-parser s   ratio   result');
    for (const name of names) {
      const path = join(folder, `${name}.svg`);
      makeFile(path, CASES[name]);
      const compared = CASES[name][3];
      const size = statSync(path).size;
      const alone = compared ? [inFreshProcess('alone', path)] : [];
      const read = inFreshProcess('read', path);
      if (compared) alone.push(inFreshProcess('alone', path));
      rmSync(path);
      const sum = alone.reduce((s, a) => s + a.cpu, 0) / (alone.length || 1);
      const cells = [
        [name, -8],
        [(size / MB).toFixed(0), 5],
        [read.cpu?.toFixed(2) ?? '-', 8],
        [read.cpu ? ((read.cpu * 10 * MB) / size).toFixed(2) : '-', 10],
        [read.peak ? (read.peak / MB).toFixed(0) : '-', 10],
        [read.peak ? (read.peak / size).toFixed(1) : '-', 12],
        [compared ? sum.toFixed(2) : '-', 15],
        [compared && read.cpu ? (read.cpu / sum).toFixed(2) : '-', 8],
      ];
      const padded = cells.map(([text, width]) => (width < 0 ? text.padEnd(-width) : text.padStart(width)));
      const outcome = read.failed ?? `${read.strokes} strokes ${read.findings.join(' ')}`;
      console.log(`${padded.join('')}   ${outcome}`);
    }
  } finally {
    rmSync(folder, { recursive: true });
  }
}

const [mode, ...rest] = process.argv.slice(2);
if (mode === 'read' || mode === 'alone') await measure(mode, rest[0]);
else {
  const names = [mode, ...rest].filter((name) => name !== undefined);
  runCases(names.length > 0 ? names : Object.keys(CASES));
}
