// Travel of the tour beside nearest-neighbour ordering, on seeded drawings: `npm run bench -- tour [strokes]`.
import { performance } from 'node:perf_hooks';
import {
  DEFAULT_SETTINGS,
  PEN_ON_Z,
  readDrawing,
  reportOf,
  tour,
  writeAudited,
} from '../../dist/core/index.js';
import { createRandom } from '../../dist/core/structures/random.js';

const KINDS = {
  lines(random, count, side) {
    const reach = (4 * side) / Math.sqrt(count);
    return Array.from({ length: count }, () => {
      const [x, y] = [side * random(), side * random()];
      return `M${fixed(x)} ${fixed(y)}L${fixed(x + reach * (random() - 0.5))} ${fixed(y + reach * (random() - 0.5))}`;
    });
  },
  hatch(random, count, side) {
    return Array.from({ length: count }, (_, i) => {
      const x = (side * i) / count;
      const [a, b] = [side * 0.4 * random(), side * (0.6 + 0.4 * random())];
      return `M${fixed(x)} ${fixed(a)}V${fixed(b)}`;
    });
  },
  dots(random, count, side) {
    return Array.from({ length: count }, () => `M${fixed(side * random())} ${fixed(side * random())}h0`);
  },
  circles(random, count, side) {
    const r = (0.3 * side) / Math.sqrt(count);
    return Array.from({ length: count }, () => {
      const [x, y] = [side * random(), side * random()];
      return `M${fixed(x - r)} ${fixed(y)}a${fixed(r)} ${fixed(r)} 0 1 0 ${fixed(2 * r)} 0a${fixed(r)} ${fixed(r)} 0 1 0 ${fixed(-2 * r)} 0`;
    });
  },
};

function fixed(value) {
  return value.toFixed(3);
}

/** Always to the nearest end of a stroke not yet drawn, from home and back: travel in mm. */
function nearestNeighbour(drawing, homeX, homeY) {
  const { first, segments, count } = drawing.strokes;
  const ends = [];
  for (let s = 0; s < count; s++) {
    const a = segments.offset[first[s]];
    const b = segments.offset[first[s + 1] - 1] + 2;
    ends.push([segments.data[a], segments.data[a + 1], segments.data[b], segments.data[b + 1]]);
  }
  let [x, y, travel] = [homeX, homeY, 0];
  while (ends.length > 0) {
    let best = 0;
    let least = Number.POSITIVE_INFINITY;
    let flip = false;
    ends.forEach(([ax, ay, bx, by], i) => {
      const toStart = Math.hypot(ax - x, ay - y);
      const toEnd = Math.hypot(bx - x, by - y);
      if (Math.min(toStart, toEnd) < least) {
        least = Math.min(toStart, toEnd);
        best = i;
        flip = toEnd < toStart;
      }
    });
    const [ax, ay, bx, by] = ends[best];
    ends[best] = ends[ends.length - 1];
    ends.pop();
    travel += least;
    [x, y] = flip ? [ax, ay] : [bx, by];
  }
  return travel + Math.hypot(homeX - x, homeY - y);
}

const count = Number(process.argv[2] ?? 1000);
const side = 200;
console.log('kind     strokes  nearest mm  found mm   ratio  bound mm   gap %  order s  write+audit s');
for (const [kind, make] of Object.entries(KINDS)) {
  const paths = make(createRandom(42), count, side);
  const text = `<svg xmlns="http://www.w3.org/2000/svg" width="${side}mm" height="${side}mm" viewBox="0 0 ${side} ${side}" fill="none" stroke="black" stroke-linecap="round"><path d="${paths.join('')}"/></svg>`;
  const drawing = readDrawing(text, { name: kind });
  const nearest = nearestNeighbour(drawing, 0, side);
  const began = performance.now();
  const ordered = tour(drawing, DEFAULT_SETTINGS, PEN_ON_Z);
  const middle = performance.now();
  const { audit } = writeAudited(ordered, 'svg');
  const ended = performance.now();
  const { after, bound, gap } = reportOf(ordered, [audit], 'bench');
  console.log(
    [
      kind.padEnd(8),
      String(drawing.strokes.count).padStart(7),
      nearest.toFixed(0).padStart(11),
      after.travelMm.toFixed(0).padStart(9),
      (after.travelMm / nearest).toFixed(3).padStart(7),
      bound.value.toFixed(0).padStart(9),
      (100 * gap).toFixed(1).padStart(7),
      ((middle - began) / 1000).toFixed(2).padStart(8),
      ((ended - middle) / 1000).toFixed(2).padStart(14),
      audit.ok ? '' : '  AUDIT FAILED',
    ].join(' '),
  );
}
