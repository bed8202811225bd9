// Time and memory of the network, stage by stage. Run: npm run bench -- network [segments…]
//
// Each kind in a fresh process. Seconds are processor time; beside them the time the same process takes to
// sort ten million random doubles, and how both grow from one size to the next.
import { execFileSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { readDrawing } from '../../dist/core/drawing/readDrawing.js';
import { buildNetwork } from '../../dist/core/network/buildNetwork.js';
import { splitWhereLinesCross } from '../../dist/core/network/crossings.js';
import { strokeEnds } from '../../dist/core/network/marks.js';
import { splitWhereLinesOverlap } from '../../dist/core/network/overlaps.js';
import { cutIntoPieces } from '../../dist/core/network/pieces.js';
import { splitWhereJointsPart } from '../../dist/core/network/sharedJoints.js';
import { snapMarks } from '../../dist/core/network/snap.js';
import { splitWhereEndsTouch } from '../../dist/core/network/touches.js';
import { createRandom } from '../../dist/core/structures/random.js';

const OPTIONS = {
  snapMm: 0.05,
  accuracyMm: 0.02,
  junctions: 'touching',
  repeats: 'once',
  repeatToleranceMm: 0.01,
};

/** Path data of about n segments on a sheet that grows with them, so that crowding stays the same. */
const KINDS = {
  // Strokes of 50 short lines.
  winding(n, side, random) {
    return many(n / 50, () => {
      let [x, y, angle] = [side * random(), side * random(), 6.28 * random()];
      let d = `M${x.toFixed(3)} ${y.toFixed(3)}`;
      for (let k = 0; k < 50; k++) {
        angle += random() - 0.5;
        x += 0.5 * Math.cos(angle);
        y += 0.5 * Math.sin(angle);
        d += `L${x.toFixed(3)} ${y.toFixed(3)}`;
      }
      return d;
    });
  },
  // Closed curves of four cubics.
  blobs(n, side, random) {
    return many(n / 4, () => {
      const [x, y, r] = [side * random(), side * random(), 0.5 + 2 * random()];
      const k = 0.55 * r;
      return `M${x} ${y}m${r} 0c0 ${k} ${k - r} ${r} ${-r} ${r}s${-r} ${k - r} ${-r} ${-r} ${r - k} ${-r} ${r} ${-r} ${r} ${r - k} ${r} ${r}z`;
    });
  },
  // Squares side by side: every border stands twice.
  cells(n, side) {
    const row = Math.ceil(Math.sqrt(n / 4));
    const size = side / row;
    return many(
      n / 4,
      (k) =>
        `M${((k % row) * size).toFixed(3)} ${(Math.floor(k / row) * size).toFixed(3)}h${size.toFixed(3)}v${size.toFixed(3)}h-${size.toFixed(3)}z`,
    );
  },
  // Lines by themselves whose ends touch the next one's inside.
  comb(n) {
    const row = Math.ceil(Math.sqrt(n));
    return many(n, (k) => {
      const [x, y] = [(k % row) * 1.5, Math.floor(k / row) * 1.5];
      return k % 2 === 0 ? `M${x} ${y}h1.5` : `M${x - 0.7} ${y}v1.2`;
    });
  },
};

function many(count, draw) {
  return Array.from({ length: Math.round(count) }, (_, k) => draw(k));
}

function drawingOf(kind, n) {
  const side = Math.sqrt(n) * 1.5;
  const paths = KINDS[kind](n, side, createRandom(5));
  const body = paths.map((d) => `<path d="${d}"/>`).join('');
  const page = `width="${side}mm" height="${side}mm" viewBox="0 0 ${side} ${side}"`;
  const text = `<svg xmlns="http://www.w3.org/2000/svg" ${page} fill="none" stroke="#000">${body}</svg>`;
  return readDrawing(text, { pageEdge: 'ignore' });
}

function cpu(run) {
  const before = process.cpuUsage();
  const result = run();
  const { user, system } = process.cpuUsage(before);
  return [result, (user + system) / 1e6];
}

function one(kind, n) {
  const drawing = drawingOf(kind, n);
  const all = Uint32Array.from({ length: drawing.strokes.count }, (_, i) => i);
  const seconds = {};
  const stage = (name, run) => {
    const [result, spent] = cpu(run);
    seconds[name] = spent;
    return result;
  };
  const pieces = stage('pieces', () => cutIntoPieces(drawing, all, OPTIONS.accuracyMm));
  const marks = stage('ends', () => strokeEnds(drawing, all));
  stage('touching', () => splitWhereEndsTouch(marks, drawing, pieces, OPTIONS.snapMm));
  stage('joints', () => splitWhereJointsPart(marks, drawing, all));
  stage('overlaps', () =>
    splitWhereLinesOverlap(marks, drawing, pieces, OPTIONS.repeatToleranceMm, OPTIONS.snapMm),
  );
  stage('snapping', () => snapMarks(marks, OPTIONS.snapMm));
  stage('crossings', () => splitWhereLinesCross(strokeEnds(drawing, all), drawing, pieces, OPTIONS.snapMm));
  const network = stage('whole', () => buildNetwork(drawing, all, OPTIONS));
  const doubles = new Float64Array(1e7);
  const random = createRandom(1);
  for (let i = 0; i < doubles.length; i++) doubles[i] = random();
  const [, sort] = cpu(() => doubles.sort());
  return { segments: drawing.strokes.segments.count, edges: network.edgeCount, seconds, sort };
}

/** The peak of a process that builds the network once and does nothing else, MB. */
function peakOfWhole(kind, n) {
  const drawing = drawingOf(kind, n);
  const all = Uint32Array.from({ length: drawing.strokes.count }, (_, i) => i);
  const network = buildNetwork(drawing, all, OPTIONS);
  return { edges: network.edgeCount, peakMb: process.resourceUsage().maxRSS / 1024 };
}

const [first, second, third] = process.argv.slice(2);
if (first in KINDS) {
  console.log(JSON.stringify(third ? peakOfWhole(first, Number(second)) : one(first, Number(second))));
} else {
  const sizes = process.argv.slice(2).map(Number);
  for (const kind of Object.keys(KINDS)) {
    let before = null;
    for (const n of sizes.length > 0 ? sizes : [10_000, 100_000, 1_000_000]) {
      const run = (...more) =>
        JSON.parse(
          execFileSync(process.execPath, [fileURLToPath(import.meta.url), kind, `${n}`, ...more], {
            encoding: 'utf8',
          }),
        );
      const now = run();
      const { peakMb } = run('whole');
      const stages = Object.entries(now.seconds).map(([name, s]) => `${name} ${s.toFixed(2)}`);
      const grows = before
        ? `, ${(now.seconds.whole / before.seconds.whole).toFixed(1)} times the size before`
        : '';
      console.log(
        `${kind} ${now.segments} segments, ${now.edges} edges: ${stages.join(', ')} s; sort ${now.sort.toFixed(2)} s; peak ${peakMb.toFixed(0)} MB${grows}`,
      );
      before = now;
    }
  }
}
