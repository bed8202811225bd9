import { randomBelow } from '../../src/core/structures/random.ts';
import { type Chain, cubic, dotAt, ellipseArc, polyline } from './chains.ts';

type Point = readonly [number, number];

/** A made-up drawing; `kind` of a stroke tells what may be done to it. */
export interface DrawnStroke {
  readonly chain: Chain;
  readonly kind: 'line' | 'cubic' | 'arc' | 'dot' | 'dot-on-line' | 'hatch' | 'lattice' | 'tiny' | 'gapped';
}

/** Cells of 12 mm, each with one figure, so that what is spoilt in one is not made good by another. */
const CELL = 12;

/** A drawing of `cells`² figures of every kind, for one or two pens. */
export function randomStrokes(random: () => number, cells = 4): DrawnStroke[] {
  const strokes: DrawnStroke[] = [];
  for (let row = 0; row < cells; row++) {
    for (let column = 0; column < cells; column++) {
      const figure = FIGURES[randomBelow(random, FIGURES.length)];
      const pen = random() < 0.8 ? 0 : 1;
      const at = (): Point => [CELL * (column + 0.1 + 0.8 * random()), CELL * (row + 0.1 + 0.8 * random())];
      strokes.push(...figure(random, at, pen));
    }
  }
  return strokes;
}

type Figure = (random: () => number, at: () => Point, pen: number) => DrawnStroke[];

const FIGURES: readonly Figure[] = [
  (random, at, pen) => [
    { kind: 'line', chain: polyline(Array.from({ length: 3 + randomBelow(random, 6) }, at), pen) },
  ],
  (_, at, pen) => {
    const points = [at(), at(), at()];
    return [{ kind: 'line', chain: polyline([...points, points[0]], pen) }];
  },
  (_, at, pen) => [{ kind: 'cubic', chain: cubic([at(), at(), at(), at()], pen) }],
  (_, at, pen) => {
    const [a, b] = [cubic([at(), at(), at(), at()], pen), cubic([at(), at(), at(), at()], pen)];
    const { data: d } = a.segments[0];
    const { data: e, kind } = b.segments[0];
    const joined = { kind, data: [d[2], d[3], ...e.slice(2)] };
    return [{ kind: 'cubic', chain: { pen, segments: [...a.segments, joined] } }];
  },
  arcs,
  arcs,
  (random, at, pen) =>
    Array.from({ length: 1 + randomBelow(random, 8) }, () => ({
      kind: 'dot' as const,
      chain: dotAt(...at(), pen),
    })),
  (random, at, pen) => {
    const [a, b] = [at(), at()];
    const t = 0.1 + 0.8 * random();
    const off = 0.03 * (random() - 0.5);
    const on = dotAt(a[0] + t * (b[0] - a[0]) + off, a[1] + t * (b[1] - a[1]) + off, pen);
    return [
      { kind: 'line', chain: polyline([a, b], pen) },
      { kind: 'dot-on-line', chain: on },
    ];
  },
  hatch,
  ringHatch,
  lattice,
  tiny,
  tiny,
  gapped,
  gapped,
];

function arcs(random: () => number, at: () => Point, pen: number): DrawnStroke[] {
  const [x, y] = at();
  const rx = 0.3 + 2 * random();
  const ry = random() < 0.5 ? rx : 0.3 + 2 * random();
  const full = random() < 0.4;
  const sweep = full ? 2 * Math.PI : (random() < 0.5 ? 1 : -1) * (0.5 + 5 * random());
  const chain = ellipseArc(x, y, rx, ry, 6 * random(), sweep, 1 + randomBelow(random, 4), pen);
  return [{ kind: 'arc', chain }];
}

/** Straight hatching at a pitch of 0.05 mm: the default snap distance. */
function hatch(random: () => number, at: () => Point, pen: number): DrawnStroke[] {
  const [x, y] = at();
  const angle = 6.28 * random();
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  const length = 2 + 3 * random();
  return Array.from({ length: 4 + randomBelow(random, 12) }, (_, i) => {
    const [px, py] = [x - 0.05 * i * s, y + 0.05 * i * c];
    const ends: Point[] = [
      [px, py],
      [px + length * c, py + length * s],
    ];
    return { kind: 'hatch' as const, chain: polyline(ends, pen) };
  });
}

/** Rings 0.05 mm apart. */
function ringHatch(random: () => number, at: () => Point, pen: number): DrawnStroke[] {
  const [x, y] = at();
  const r = 0.5 + random();
  return Array.from({ length: 3 + randomBelow(random, 6) }, (_, i) => ({
    kind: 'hatch' as const,
    chain: ellipseArc(x, y, r + 0.05 * i, r + 0.05 * i, 6 * random(), 2 * Math.PI, 2, pen),
  }));
}

/** Squares that share their sides exactly. */
function lattice(random: () => number, at: () => Point, pen: number): DrawnStroke[] {
  const [x, y] = at();
  const side = 0.4 + random();
  const strokes: DrawnStroke[] = [];
  for (let i = 0; i < 3; i++) {
    for (let j = 0; j < 2; j++) {
      const [x0, x1] = [x + side * i, x + side * (i + 1)];
      const [y0, y1] = [y + side * j, y + side * (j + 1)];
      const corners: Point[] = [
        [x0, y0],
        [x1, y0],
        [x1, y1],
        [x0, y1],
        [x0, y0],
      ];
      strokes.push({ kind: 'lattice', chain: polyline(corners, pen) });
    }
  }
  return strokes;
}

/** Strokes shorter than the snap distance, alone and growing from another stroke's end. */
function tiny(random: () => number, at: () => Point, pen: number): DrawnStroke[] {
  const [a, b] = [at(), at()];
  const way = (): Point => {
    const angle = 6.28 * random();
    const size = 0.03 + 0.015 * random();
    return [size * Math.cos(angle), size * Math.sin(angle)];
  };
  const strokes: DrawnStroke[] = [{ kind: 'line', chain: polyline([a, b], pen) }];
  // Away from the line that it grows from, not along it.
  const size = Math.sqrt((b[0] - a[0]) ** 2 + (b[1] - a[1]) ** 2);
  const across: Point = [(-0.04 * (b[1] - a[1])) / size, (0.04 * (b[0] - a[0])) / size];
  strokes.push({ kind: 'tiny', chain: polyline([b, [b[0] + across[0], b[1] + across[1]]], pen) });
  const alone = at();
  const w = way();
  strokes.push({ kind: 'tiny', chain: polyline([alone, [alone[0] + w[0], alone[1] + w[1]]], pen) });
  const [x, y] = at();
  strokes.push({ kind: 'tiny', chain: ellipseArc(x, y, 0.03, 0.03, 6 * random(), 4, 1, pen) });
  return strokes;
}

/** Lines in a row whose ends miss each other by less than the snap distance. */
function gapped(random: () => number, at: () => Point, pen: number): DrawnStroke[] {
  const strokes: DrawnStroke[] = [];
  let from = at();
  for (let k = 0; k < 2 + randomBelow(random, 4); k++) {
    const to = at();
    strokes.push({ kind: 'gapped', chain: polyline([from, to], pen) });
    const angle = 6.28 * random();
    const gap = 0.045 * random();
    from = [to[0] + gap * Math.cos(angle), to[1] + gap * Math.sin(angle)];
  }
  return strokes;
}
