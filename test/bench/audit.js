// Time of the audit. Run: npm run build && node test/bench/audit.js [segments]
//
// Seconds of processor time hang on the machine, so each is also given as a multiple of the time that the
// same machine takes to sort ten million random doubles.
import { auditLines } from '../../dist/core/audit/audit.js';
import { flattenSegment } from '../../dist/core/geometry/flatten.js';
import { SegmentBuilder } from '../../dist/core/geometry/segments.js';
import { createRandom } from '../../dist/core/structures/random.js';

const SVG = { snapMm: 0.05, accuracyMm: 0.002, repeats: 'once', repeatToleranceMm: 0.01 };
const COARSE = { ...SVG, accuracyMm: 0.02 };

function lineSet(draw) {
  const builder = new SegmentBuilder();
  const first = [0];
  draw(builder, () => first.push(builder.count));
  const count = first.length - 1;
  return {
    segments: builder.finish(),
    count,
    first: Uint32Array.from(first),
    pen: new Uint32Array(count),
    dot: new Uint8Array(count),
  };
}

const round = (v, step) => Math.round(v / step) * step;

/** Last stroke first, backwards, numbers rounded; curves as lines where `chordError` is given. */
function backwards({ segments, first, count }, step, chordError) {
  const { data: d, offset, kind } = segments;
  return lineSet((builder, end) => {
    for (let c = count - 1; c >= 0; c--) {
      for (let i = first[c + 1] - 1; i >= first[c]; i--) {
        const r = (k) => round(d[offset[i] + k], step);
        if (kind[i] === 0) builder.line(r(2), r(3), r(0), r(1));
        else if (!chordError) builder.cubic(r(2), r(3), r(6), r(7), r(4), r(5), r(0), r(1));
        else {
          let [x0, y0] = [r(2), r(3)];
          flattenSegment(segments, i, 1, 0, chordError, (px, py) => {
            const [x, y] = [round(px, step), round(py, step)];
            builder.line(x0, y0, x, y);
            [x0, y0] = [x, y];
          });
        }
      }
      end();
    }
  });
}

/** Winding strokes of 50 segments of half a mm on a sheet of 300 mm × 400 mm. */
function winding(segments, curved) {
  const random = createRandom(3);
  return lineSet((builder, end) => {
    for (let c = 0; c < segments / 50; c++) {
      let [x, y, angle] = [300 * random(), 400 * random(), 6.28 * random()];
      for (let k = 0; k < 50; k++) {
        angle += random() - 0.5;
        const [dx, dy] = [0.5 * Math.cos(angle), 0.5 * Math.sin(angle)];
        const [bx, by] = [0.2 * (random() - 0.5), 0.2 * (random() - 0.5)];
        if (!curved) builder.line(x, y, x + dx, y + dy);
        else {
          const [ax, ay] = [x + dx / 3 + bx, y + dy / 3 + by];
          builder.cubic(x, y, ax, ay, x + (2 * dx) / 3 - bx, y + (2 * dy) / 3 - by, x + dx, y + dy);
        }
        x += dx;
        y += dy;
      }
      end();
    }
  });
}

/** Long lines of a mesh, and the sides of its cells drawn one by one. */
function mesh(segments) {
  const m = Math.floor(Math.sqrt(segments / 2));
  const wanted = lineSet((builder, end) => {
    for (let i = 0; i <= m; i++) {
      builder.line(0, 0.4 * i, 0.4 * m, 0.4 * i);
      end();
      builder.line(0.4 * i, 0, 0.4 * i, 0.4 * m);
      end();
    }
  });
  const drawn = lineSet((builder, end) => {
    for (let i = 0; i <= m; i++) {
      for (let j = 0; j < m; j++) {
        builder.line(0.4 * j, 0.4 * i, 0.4 * (j + 1), 0.4 * i);
        end();
        builder.line(0.4 * i, 0.4 * (j + 1), 0.4 * i, 0.4 * j);
        end();
      }
    }
  });
  return [wanted, drawn];
}

function cpuSeconds(work) {
  const start = process.cpuUsage();
  const result = work();
  const used = process.cpuUsage(start);
  return [result, (used.user + used.system) / 1e6];
}

const random = createRandom(1);
const doubles = Float64Array.from({ length: 1e7 }, random);
const [, sorting] = cpuSeconds(() => doubles.sort());

function report(name, wanted, drawn, options) {
  const [result, seconds] = cpuSeconds(() => auditLines(wanted, drawn, options));
  const counts = `${wanted.segments.count} / ${drawn.segments.count}`;
  const times = `${seconds.toFixed(2)} s ${(seconds / sorting).toFixed(1)}`.padStart(14);
  console.log(`${name.padEnd(44)}${counts.padStart(20)}${times}  ${result.ok ? 'ok' : 'REFUSED'}`);
}

const n = Number(process.argv[2] ?? 1e6);
console.log('drawing; segments wanted / drawn; processor time, and as a multiple of sorting');
const lines = winding(n, false);
report('lines with four decimals', lines, backwards(lines, 1e-4), SVG);
const curves = winding(n, true);
report('cubics with four decimals', curves, backwards(curves, 1e-4), SVG);
const fewer = winding(n / 4, true);
report('a quarter of the cubics, as lines', fewer, backwards(fewer, 1e-3, 0.019), COARSE);
report('mesh of long lines, drawn cell by cell', ...mesh(n), SVG);
const same = lineSet((builder, end) => {
  for (let i = 0; i < 10_000; i++) {
    builder.line(10, 10, 60, 20);
    end();
  }
});
report('10,000 lines on one spot, kept', same, backwards(same, 1e-4), { ...SVG, repeats: 'keep' });
