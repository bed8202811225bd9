import { LINE } from '../../src/core/geometry/segments.ts';
import { appendTransformed } from '../../src/core/geometry/transform.ts';
import { randomBelow } from '../../src/core/structures/random.ts';
import { built, type Chain, endOf, lineSetOf, moved, type Segment, spanOf, startOf } from './chains.ts';
import { backwards, distance, lineFrom, type OutputSheet, type Pick, type Spot } from './outputSheet.ts';

/** One way to spoil an output at a place drawn at random; null where nothing there can be spoilt so. */
export type OutputSpoil = (sheet: OutputSheet) => Spot | null;

/** The segment of a pick replaced by parts and runs of their own. */
function instead(
  sheet: OutputSheet,
  pick: Pick,
  parts: readonly (readonly Segment[])[],
  alone: readonly Segment[][] = [],
  pen = sheet.penOf(pick),
): Spot {
  const extra = alone.map((segments) => ({ pen, segments }));
  const edit = { chain: pick.c, from: pick.k, to: pick.k + 1, parts, extra };
  return { edits: [edit], marks: [pick.segment, ...parts.flat(), ...alone.flat()] };
}

/** Runs added to the output. */
function added(pen: number, ...runs: readonly Segment[][]): Spot {
  const extra = runs.map((segments) => ({ pen, segments }));
  return { edits: [{ chain: -1, from: 0, to: 0, parts: [], extra }], marks: runs.flat() };
}

function longerThan(least: number): (pick: Pick) => boolean {
  return (pick) => pick.size > least;
}

function lineLongerThan(least: number): (pick: Pick) => boolean {
  return ({ segment, size }) => segment.kind === LINE && size > least;
}

/** Makes a spoil of what can be done to one segment that fits. */
function onSegment(
  fits: (tau: number) => (pick: Pick) => boolean,
  spoil: (sheet: OutputSheet, pick: Pick) => Spot | null,
): OutputSpoil {
  return (sheet) => {
    const pick = sheet.pick(fits(sheet.tau));
    return pick && spoil(sheet, pick);
  };
}

function onDot(spoil: (sheet: OutputSheet, c: number, dot: Chain) => Spot): OutputSpoil {
  return (sheet) => {
    if (sheet.dots.length === 0) return null;
    const c = sheet.dots[randomBelow(sheet.random, sheet.dots.length)];
    return spoil(sheet, c, sheet.chains[c]);
  };
}

function mapped(segment: Segment, m: readonly [number, number, number, number, number, number]): Segment {
  const { segments } = lineSetOf([{ pen: 0, segments: [segment] }]);
  return built((b) => appendTransformed(b, segments, 0, 1, m))[0];
}

/** A place within a segment: from t0 to t1, `length` long, if it were gone along at one speed. */
function within(sheet: OutputSheet, pick: Pick, length: number): [number, number] {
  const share = Math.min(0.8, length / pick.size);
  const t0 = sheet.between(0.05, 0.95 - share);
  return [t0, t0 + share];
}

const drop = onSegment(
  (tau) => longerThan(6 * tau),
  (sheet, pick) => instead(sheet, pick, [[], []]),
);

const dropRun: OutputSpoil = (sheet) => {
  const pick = sheet.pick(longerThan(6 * sheet.tau));
  if (!pick) return null;
  const { segments } = sheet.chains[pick.c];
  return { edits: [{ chain: pick.c, from: 0, to: segments.length, parts: [] }], marks: segments };
};

const dropPart = onSegment(
  (tau) => longerThan(24 * tau),
  (sheet, pick) => {
    const [t0, t1] = within(sheet, pick, sheet.tau * sheet.between(6, 20));
    const { segment } = pick;
    if (isTip(sheet, segment, (t0 + t1) / 2)) return null;
    return {
      ...instead(sheet, pick, [[spanOf(segment, 0, t0)], [spanOf(segment, t1, 1)]]),
      marks: [spanOf(segment, t0, t1)],
    };
  },
);

const double = onSegment(
  (tau) => longerThan(9 * tau),
  (sheet, pick) => added(sheet.penOf(pick), ...copies(sheet, pick, pick.segment)),
);

const doublePart = onSegment(
  (tau) => longerThan(24 * tau),
  (sheet, pick) => {
    const [t0, t1] = within(sheet, pick, sheet.tau * sheet.between(9, 20));
    return added(sheet.penOf(pick), ...copies(sheet, pick, spanOf(pick.segment, t1, t0)));
  },
);

/** As many as the drawing has lines on that place: with the one drawn already, one too many. */
function copies(sheet: OutputSheet, pick: Pick, segment: Segment): Segment[][] {
  return Array.from({ length: Math.max(1, sheet.standing(pick)) }, () => [segment]);
}

/** Out and back in one run. */
const retrace = onSegment(
  (tau) => longerThan(9 * tau),
  (sheet, pick) => {
    const { segment } = pick;
    return instead(sheet, pick, [[segment, ...backwards([segment]), segment]]);
  },
);

const shift = onSegment(
  (tau) => longerThan(6 * tau),
  (sheet, pick) => {
    const angle = sheet.between(0, 6.28);
    // Of a line that stands twice a gap up to the repeat tolerance passes for the fringe of a repeat.
    const by = sheet.tau * (sheet.standing(pick) > 1 ? sheet.between(5, 8) : sheet.between(2.2, 6));
    const away = moved(
      { pen: 0, segments: [pick.segment] },
      by * Math.cos(angle),
      by * Math.sin(angle),
    ).segments;
    return instead(sheet, pick, [[], []], [[...away]]);
  },
);

/** A segment up to a tenth larger or smaller, about its middle. */
const scale = onSegment(
  (tau) => longerThan(100 * tau),
  (sheet, pick) => {
    const { segment, size } = pick;
    // Where lines stand twice a longer one may lie on its neighbours.
    const sign = sheet.standing(pick) > 1 || sheet.random() < 0.5 ? -2 : 2;
    const by = 1 + (sign * sheet.tau * sheet.between(10, 14)) / size;
    const [x, y] = [(segment.data[0] + segment.data[2]) / 2, (segment.data[1] + segment.data[3]) / 2];
    const m = [by, 0, 0, by, x - by * x, y - by * y] as const;
    return instead(sheet, pick, [[], []], [[mapped(segment, m)]]);
  },
);

const newPen = onSegment(
  (tau) => longerThan(6 * tau),
  (sheet, pick) => instead(sheet, pick, [[], []], [[pick.segment]], 7),
);

/** Two segments each drawn by the other's pen. */
const swapPens: OutputSpoil = (sheet) => {
  const a = sheet.pick(longerThan(6 * sheet.tau));
  const b = a && sheet.pick((p) => p.size > 6 * sheet.tau && sheet.penOf(p) !== sheet.penOf(a));
  if (!a || !b) return null;
  const one = instead(sheet, a, [[], []], [[a.segment]], sheet.penOf(b));
  const other = instead(sheet, b, [[], []], [[b.segment]], sheet.penOf(a));
  return { edits: [...one.edits, ...other.edits], marks: [...one.marks, ...other.marks] };
};

/** Two segments of other shapes, each about the other's middle. */
const swapShapes: OutputSpoil = (sheet) => {
  const { tau } = sheet;
  const a = sheet.pick(longerThan(12 * tau));
  const b = a && sheet.pick((p) => p.size > 12 * tau && unlike(a.segment, p.segment) > 12 * tau);
  if (!a || !b) return null;
  const [ma, mb] = [middleOf(a.segment), middleOf(b.segment)];
  const [dx, dy] = [mb[0] - ma[0], mb[1] - ma[1]];
  if (distance(0, 0, dx, dy) < 12 * tau) return null;
  const toB = moved({ pen: 0, segments: [a.segment] }, dx, dy).segments;
  const toA = moved({ pen: 0, segments: [b.segment] }, -dx, -dy).segments;
  const one = instead(sheet, a, [[], []], [[...toA]]);
  const other = instead(sheet, b, [[], []], [[...toB]]);
  return { edits: [...one.edits, ...other.edits], marks: [...one.marks, ...other.marks] };
};

function middleOf({ data }: Segment): [number, number] {
  return [(data[0] + data[2]) / 2, (data[1] + data[3]) / 2];
}

/** How far the ways from end to end differ, whichever way round. */
function unlike(a: Segment, b: Segment): number {
  const [ax, ay] = [a.data[2] - a.data[0], a.data[3] - a.data[1]];
  const [bx, by] = [b.data[2] - b.data[0], b.data[3] - b.data[1]];
  return Math.min(distance(ax, ay, bx, by), distance(ax, ay, -bx, -by));
}

/** A line and another beside it, nearly parallel, at most 2 mm away and farther than they could be mistaken. */
function pickNeighbours(sheet: OutputSheet): { a: Pick; b: Pick; opposed: boolean } | null {
  const a = sheet.pick(lineLongerThan(0.6));
  if (!a) return null;
  const [x0, y0, x1, y1] = a.segment.data;
  const [ux, uy] = [(x1 - x0) / a.size, (y1 - y0) / a.size];
  const [mx, my] = middleOf(a.segment);
  const b = sheet.pick(({ segment, size, c }) => {
    const [px, py] = middleOf(segment);
    if (segment.kind !== LINE || size < 0.6 || sheet.chains[c].pen !== sheet.penOf(a)) return false;
    if (Math.abs(px - mx) > 2 || Math.abs(py - my) > 2) return false;
    const across = Math.abs((px - mx) * uy - (py - my) * ux);
    const [dx, dy] = [segment.data[2] - segment.data[0], segment.data[3] - segment.data[1]];
    return across > 4 * sheet.tau && Math.abs(dx * ux + dy * uy) > 0.95 * size;
  });
  if (!b) return null;
  const { data: d } = b.segment;
  return { a, b, opposed: (d[2] - d[0]) * ux + (d[3] - d[1]) * uy < 0 };
}

/** A line not drawn, and its neighbour drawn twice. */
const standIn: OutputSpoil = (sheet) => {
  const found = pickNeighbours(sheet);
  return found && instead(sheet, found.a, [[], []], [[found.b.segment]]);
};

/** Two neighbours that change places half-way. */
const crossOver: OutputSpoil = (sheet) => {
  const found = pickNeighbours(sheet);
  if (!found) return null;
  const { a, b } = found;
  const other = found.opposed ? backwards([b.segment])[0] : b.segment;
  const change = (from: Segment, to: Segment): Segment[] => {
    const [head, tail] = [spanOf(from, 0, 0.5), spanOf(to, 0.5, 1)];
    return [head, lineFrom(head.data[2], head.data[3], tail.data[0], tail.data[1]), tail];
  };
  const one = instead(sheet, a, [[], []], [change(a.segment, other)]);
  const two = instead(sheet, b, [[], []], [change(other, a.segment)]);
  return { edits: [...one.edits, ...two.edits], marks: [...one.marks, ...two.marks] };
};

const cutCorner: OutputSpoil = (sheet) => {
  const { chains, tau } = sheet;
  const a = sheet.pick(({ c, k, segment, size }) => {
    const next = chains[c].segments[k + 1];
    if (segment.kind !== LINE || next?.kind !== LINE || size < 12 * tau) return false;
    const [x0, y0, x1, y1] = segment.data;
    const [, , x2, y2] = next.data;
    const long = distance(x1, y1, x2, y2);
    const cosine = ((x1 - x0) * (x2 - x1) + (y1 - y0) * (y2 - y1)) / (size * long);
    return long > 12 * tau && cosine < 0.5 && cosine > -0.87;
  });
  if (!a) return null;
  const b = chains[a.c].segments[a.k + 1];
  const leg = tau * sheet.between(6, 10);
  if (isTip(sheet, a.segment, 1 - leg / a.size, b)) return null;
  const head = spanOf(a.segment, 0, 1 - leg / a.size);
  const tail = spanOf(b, leg / distance(b.data[0], b.data[1], b.data[2], b.data[3]), 1);
  const short = lineFrom(head.data[2], head.data[3], tail.data[0], tail.data[1]);
  const edit = { chain: a.c, from: a.k, to: a.k + 2, parts: [[head, short, tail]] };
  const legs = [spanOf(a.segment, 1 - leg / a.size, 1), short];
  return { edits: [edit], marks: legs };
};

/** A window of up to twelve segments whose way bulges beyond the tolerance to a side of its chord. */
function pickBulge(sheet: OutputSheet): { c: number; from: number; to: number; chord: Segment } | null {
  const { chains, tau } = sheet;
  let found: { c: number; from: number; to: number; chord: Segment } | null = null;
  sheet.pick(({ c, k }) => {
    const { segments } = chains[c];
    const to = Math.min(segments.length, k + 1 + randomBelow(sheet.random, 12));
    const [x0, y0] = segments[k].data;
    const [, , x1, y1] = segments[to - 1].data;
    const size = distance(x0, y0, x1, y1);
    if (size < 0.1) return false;
    let [least, most] = [0, 0];
    for (const segment of segments.slice(k, to)) {
      for (const t of segment.kind === LINE ? [1] : [0.25, 0.5, 0.75, 1]) {
        const [x, y] = t === 1 ? segment.data.slice(2, 4) : spanOf(segment, 0, t).data.slice(2, 4);
        const across = ((x - x0) * (y1 - y0) - (y - y0) * (x1 - x0)) / size;
        least = Math.min(least, across);
        most = Math.max(most, across);
      }
    }
    // A way that is alike on both sides would be no worse for being mirrored.
    if (Math.abs(most + least) < 2 * tau) return false;
    found = { c, from: k, to, chord: lineFrom(x0, y0, x1, y1) };
    return true;
  });
  return found;
}

/** A bulge on the other side of its chord. */
const reverseArc: OutputSpoil = (sheet) => {
  const found = pickBulge(sheet);
  if (!found) return null;
  const { c, from, to, chord } = found;
  const old = sheet.chains[c].segments.slice(from, to);
  const [x0, y0, x1, y1] = chord.data;
  const squared = (x1 - x0) ** 2 + (y1 - y0) ** 2;
  const [p, q] = [((x1 - x0) ** 2 - (y1 - y0) ** 2) / squared, (2 * (x1 - x0) * (y1 - y0)) / squared];
  const m = [p, q, q, -p, x0 - p * x0 - q * y0, y0 - q * x0 + p * y0] as const;
  const flipped = old.map((segment) => mapped(segment, m));
  return { edits: [{ chain: c, from, to, parts: [flipped] }], marks: [...old, ...flipped] };
};

/** A chord in the place of a curve beyond the accuracy. */
const straighten: OutputSpoil = (sheet) => {
  const found = pickBulge(sheet);
  if (!found) return null;
  const { c, from, to, chord } = found;
  const old = sheet.chains[c].segments.slice(from, to);
  return { edits: [{ chain: c, from, to, parts: [[chord]] }], marks: [...old, chord] };
};

/** Whether a place lies so near other lines that these stand for all that comes after it. */
function isTip(sheet: OutputSheet, segment: Segment, t: number, ...except: Segment[]): boolean {
  const { data } = spanOf(segment, 0, t);
  return sheet.isBeside(data[2], data[3], 0.01 + 1.2 * sheet.tau, [segment, ...except]);
}

/** The last part of a run not drawn. */
const stopShort: OutputSpoil = (sheet) => {
  const { chains, tau } = sheet;
  const pick = sheet.pick(({ c, k, size }) => k === chains[c].segments.length - 1 && size > 18 * tau);
  if (!pick) return null;
  const end = 1 - (tau * sheet.between(4, 14)) / pick.size;
  const { segment } = pick;
  if (isTip(sheet, segment, end)) return null;
  return { ...instead(sheet, pick, [[spanOf(segment, 0, end)]]), marks: [spanOf(segment, end, 1)] };
};

/** A line that runs on beyond its end, farther than any bridge. */
const runOn: OutputSpoil = (sheet) => {
  const { chains } = sheet;
  const pick = sheet.pick(
    ({ c, k, segment, size }) =>
      segment.kind === LINE && size > 12 * sheet.tau && k === chains[c].segments.length - 1,
  );
  if (!pick) return null;
  const [x0, y0, x1, y1] = pick.segment.data;
  const by = sheet.between(0.3, 0.6) / pick.size;
  const more = lineFrom(x1, y1, x1 + by * (x1 - x0), y1 + by * (y1 - y0));
  return { ...instead(sheet, pick, [[pick.segment, more]]), marks: [more] };
};

const addLine: OutputSpoil = (sheet) => {
  const pick = sheet.pick(() => true) ?? null;
  const [x, y] = pick ? middleOf(pick.segment) : startOf(sheet.chains[0]);
  const angle = sheet.between(0, 6.28);
  const size = sheet.random() < 0.5 ? 4 * sheet.tau : 3;
  const [x0, y0] = [x + sheet.between(-2, 2), y + sheet.between(-2, 2)];
  return added(pick ? sheet.penOf(pick) : 0, [
    lineFrom(x0, y0, x0 + size * Math.cos(angle), y0 + size * Math.sin(angle)),
  ]);
};

/** A mark of its own at a run's start: as long as a bridge may be, but no run is all bridge. */
const strayMark: OutputSpoil = (sheet) => {
  const chain = sheet.chains[randomBelow(sheet.random, sheet.chains.length)];
  const [x, y] = startOf(chain);
  const angle = sheet.between(0, 6.28);
  const size = 3 * sheet.tau;
  const [x1, y1] = [x + size * Math.cos(angle), y + size * Math.sin(angle)];
  return sheet.isBeside(x1, y1, 1.5 * sheet.tau, []) ? null : added(chain.pen, [lineFrom(x, y, x1, y1)]);
};

/** The way from a run to the next drawn. */
const drawTravel: OutputSpoil = (sheet) => {
  const { chains } = sheet;
  const c = randomBelow(sheet.random, chains.length);
  const next = chains[c + 1];
  if (!next || next.pen !== chains[c].pen) return null;
  const link = lineFrom(...endOf(chains[c]), ...startOf(next));
  if (distance(link.data[0], link.data[1], link.data[2], link.data[3]) < 0.3) return null;
  if (sheet.standing({ c, k: 0, segment: link, size: 0 }) > 1) return null;
  const at = chains[c].segments.length;
  if (chains[c].dot) return added(next.pen, [link]);
  return { edits: [{ chain: c, from: at, to: at, parts: [[link]] }], marks: [link] };
};

/** Out and back from the middle of a line. */
const spur = onSegment(
  (tau) => lineLongerThan(60 * tau),
  (sheet, pick) => {
    const [head, tail] = [spanOf(pick.segment, 0, 0.5), spanOf(pick.segment, 0.5, 1)];
    const [x, y] = tail.data;
    const [ux, uy] = [(x - head.data[0]) / distanceOf(head), (y - head.data[1]) / distanceOf(head)];
    const angle = (sheet.random() < 0.5 ? -1 : 1) * sheet.between(0.5, 2.6);
    const [c, s] = [Math.cos(angle), Math.sin(angle)];
    const by = sheet.between(4 * sheet.tau, 0.4);
    const out = lineFrom(x, y, x + by * (c * ux - s * uy), y + by * (s * ux + c * uy));
    return {
      ...instead(sheet, pick, [[head, out, ...backwards([out]), tail]]),
      marks: [out],
    };
  },
);

function distanceOf({ data: d }: Segment): number {
  return distance(d[0], d[1], d[2], d[3]);
}

/** A line that leaves its way for a little and comes back. */
const detour = onSegment(
  (tau) => lineLongerThan(60 * tau),
  (sheet, pick) => {
    const share = (8 * sheet.tau) / pick.size;
    const [head, tail] = [spanOf(pick.segment, 0, 0.5), spanOf(pick.segment, 0.5 + share, 1)];
    const [x0, y0, x1, y1] = [head.data[2], head.data[3], tail.data[0], tail.data[1]];
    const [x, y] = [(x0 + x1 + y1 - y0) / 2, (y0 + y1 + x0 - x1) / 2];
    const way = [lineFrom(x0, y0, x, y), lineFrom(x, y, x1, y1)];
    return { ...instead(sheet, pick, [[head, ...way, tail]]), marks: way };
  },
);

/** A line pulled aside at a place. */
const dent = onSegment(
  (tau) => lineLongerThan(40 * tau),
  (sheet, pick) => {
    const { segment, size } = pick;
    const [x0, y0, x1, y1] = segment.data;
    const t = sheet.between(0.2, 0.8);
    const by = ((sheet.random() < 0.5 ? -1 : 1) * sheet.tau * sheet.between(1.5, 5)) / size;
    const [x, y] = [x0 + t * (x1 - x0) - by * (y1 - y0), y0 + t * (y1 - y0) + by * (x1 - x0)];
    return instead(sheet, pick, [[lineFrom(x0, y0, x, y), lineFrom(x, y, x1, y1)]]);
  },
);

const loseDot = onDot((_, c, { segments }) => ({
  edits: [{ chain: c, from: 0, to: 1, parts: [] }],
  marks: segments,
}));

const doubleDot = onDot((_, __, dot) => ({
  edits: [{ chain: -1, from: 0, to: 0, parts: [], extra: [dot] }],
  marks: dot.segments,
}));

const shiftDot = onDot((sheet, c, dot) => {
  const angle = sheet.between(0, 6.28);
  const by = sheet.tau * sheet.between(1.2, 6);
  const away = moved(dot, by * Math.cos(angle), by * Math.sin(angle));
  return {
    edits: [{ chain: c, from: 0, to: 1, parts: [], extra: [away] }],
    marks: [...dot.segments, ...away.segments],
  };
});

export const OUTPUT_SPOILS: Readonly<Record<string, OutputSpoil>> = {
  drop,
  dropRun,
  dropPart,
  double,
  doublePart,
  retrace,
  shift,
  scale,
  newPen,
  swapPens,
  swapShapes,
  standIn,
  crossOver,
  cutCorner,
  reverseArc,
  straighten,
  stopShort,
  runOn,
  addLine,
  strayMark,
  drawTravel,
  spur,
  detour,
  dent,
  loseDot,
  doubleDot,
  shiftDot,
};
