// The audit's share of a run, its growth and memory. Run: npm run bench -- audit [segments…]
// (10,000, 100,000 and 1,000,000 where none are given; each drawing in a process of its own).
//
// Processor time, not wall time. A run is reading, ordering, writing, reading back and the audit. It is
// ordered with --effort 0, without improvement: the shortest run there is, so the share printed is the
// largest that the audit can have. With the default effort 100,000 strokes take about a minute more.
import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { auditLines } from '../../dist/core/audit/audit.js';
import { linesOfDrawing, linesOfProgram } from '../../dist/core/audit/lines.js';
import { planPens } from '../../dist/core/drawing/pens.js';
import { readDrawing } from '../../dist/core/drawing/readDrawing.js';
import { PEN_ON_Z } from '../../dist/core/machine/penOnZ.js';
import { orderDrawing } from '../../dist/core/pipeline.js';
import { readGcode } from '../../dist/core/program/readGcode.js';
import { DEFAULT_SETTINGS, REPEAT_TOLERANCE_MM } from '../../dist/core/settings.js';
import { writeGcode } from '../../dist/core/write/gcode.js';
import { withoutTravel, writeSvg } from '../../dist/core/write/svg.js';
import { KINDS } from './auditInputs.js';

function clock() {
  let last = process.cpuUsage();
  return () => {
    const used = process.cpuUsage(last);
    last = process.cpuUsage();
    return (used.user + used.system) / 1e6;
  };
}

function runOne(kind, n, medium) {
  const text = KINDS[kind](n);
  const lap = clock();
  const drawing = readDrawing(text);
  const ordered = orderDrawing(drawing, { ...DEFAULT_SETTINGS, effort: 0 }, PEN_ON_Z);
  const order = lap();
  const { program, measure: facts } = ordered.after;
  const { widthMm, heightMm, name } = drawing;
  const written =
    medium === 'svg'
      ? writeSvg(program, { widthMm, heightMm, title: null, description: null, travel: false })
      : writeGcode(program, PEN_ON_Z, { pageWidthMm: widthMm, pageHeightMm: heightMm, name, facts });
  const write = lap();
  let lines;
  if (medium === 'svg') {
    const back = readDrawing(withoutTravel(written));
    lines = linesOfDrawing(back, planPens(back, 'layer'));
  } else lines = linesOfProgram(readGcode(written).program);
  const readBack = lap();
  const before = process.resourceUsage().maxRSS / 1024;
  const { ok } = auditLines(linesOfDrawing(drawing, ordered.plan), lines, {
    snapMm: 0.05,
    accuracyMm: medium === 'svg' ? 0.002 : PEN_ON_Z.accuracyMm,
    repeats: 'once',
    repeatToleranceMm: REPEAT_TOLERANCE_MM,
  });
  const audit = lap();
  const run = order + write + readBack + audit;
  const peak = process.resourceUsage().maxRSS / 1024;
  return {
    segments: drawing.strokes.segments.count,
    drawn: lines.segments.count,
    ok,
    audit,
    run,
    before,
    peak,
  };
}

function report(kind, medium, r, previous) {
  const share = `${((100 * r.audit) / r.run).toFixed(0)} %`;
  const growth = previous === null ? '' : `×${(r.audit / previous.audit).toFixed(1)}`;
  console.log(
    [
      `${kind} ${medium}`.padEnd(14),
      String(r.segments).padStart(9),
      String(r.drawn).padStart(9),
      `${r.audit.toFixed(2)} s`.padStart(9),
      `${r.run.toFixed(2)} s`.padStart(9),
      share.padStart(6),
      growth.padStart(7),
      `${r.before.toFixed(0)} MB`.padStart(9),
      `${r.peak.toFixed(0)} MB`.padStart(9),
      r.ok ? '' : '  REFUSED',
    ].join(' '),
  );
}

const [, , ...given] = process.argv;
if (given[0] === 'one') {
  console.log(JSON.stringify(runOne(given[1], Number(given[2]), given[3])));
} else {
  const sizes = given.length > 0 ? given.map(Number) : [10_000, 100_000, 1_000_000];
  console.log('drawing         segments     drawn     audit       run  share  growth    before      peak');
  for (const kind of Object.keys(KINDS)) {
    for (const medium of ['svg', 'gcode']) {
      let previous = null;
      for (const n of sizes) {
        const run = [
          '--max-old-space-size=8192',
          fileURLToPath(import.meta.url),
          'one',
          kind,
          `${n}`,
          medium,
        ];
        const { stdout, stderr } = spawnSync(process.execPath, run, { encoding: 'utf8' });
        if (stdout === '') throw new Error(stderr);
        const result = JSON.parse(stdout);
        report(kind, medium, result, previous);
        previous = result;
      }
    }
  }
}
