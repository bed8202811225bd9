import { ARC, LINE } from '../../src/core/geometry/segments.ts';
import { randomBelow } from '../../src/core/structures/random.ts';
import { bulgeOf, mirrored } from './bulges.ts';
import { type Chain, isClosed, moved, polyline, reversed, type Segment, spanOf, startOf } from './chains.ts';
import type { DrawnStroke } from './lineDrawings.ts';

/**
 * One way to spoil a drawing: gives the strokes to draw instead, or null where the drawing has nothing
 * to do it to. `tau` is the match tolerance of the audit.
 */
export type Spoil = (
  strokes: readonly DrawnStroke[],
  random: () => number,
  tau: number,
) => DrawnStroke[] | null;

/** Strokes that are wanted once only, so that losing or doubling them is an error. */
const SINGLE = ['line', 'cubic', 'arc', 'dot', 'hatch', 'tiny', 'gapped'];
const LONG = ['line', 'cubic', 'arc', 'hatch', 'gapped'];

function pick(
  strokes: readonly DrawnStroke[],
  random: () => number,
  kinds: readonly string[],
  fits: (chain: Chain) => boolean = () => true,
): number {
  const found = strokes.flatMap((s, i) => (kinds.includes(s.kind) && fits(s.chain) ? [i] : []));
  return found.length === 0 ? -1 : found[randomBelow(random, found.length)];
}

function replaced(strokes: readonly DrawnStroke[], i: number, ...chains: Chain[]): DrawnStroke[] {
  const { kind } = strokes[i];
  return strokes.flatMap((s, k) => (k === i ? chains.map((chain) => ({ kind, chain })) : [s]));
}

function withChain(
  kinds: readonly string[],
  change: (chain: Chain, random: () => number, tau: number) => Chain[],
  fits?: (chain: Chain) => boolean,
): Spoil {
  return (strokes, random, tau) => {
    const i = pick(strokes, random, kinds, fits);
    return i < 0 ? null : replaced(strokes, i, ...change(strokes[i].chain, random, tau));
  };
}

function sizeOf({ data, kind }: Segment): number {
  const [x0, y0, x1, y1] = data;
  return kind === LINE ? Math.sqrt((x1 - x0) ** 2 + (y1 - y0) ** 2) : 0;
}

function withSegment(chain: Chain, k: number, ...segments: Segment[]): Chain {
  return { ...chain, segments: [...chain.segments.slice(0, k), ...segments, ...chain.segments.slice(k + 1)] };
}

const drop = withChain(SINGLE, () => []);
const double = withChain(SINGLE, (chain) => [chain, chain]);
const loseTiny = withChain(['tiny'], () => []);
const doubleTiny = withChain(['tiny'], (chain) => [chain, chain]);
const loseDot = withChain(['dot'], () => []);
const wrongPen = withChain(SINGLE, (chain) => [{ ...chain, pen: chain.pen === 0 ? 1 : 0 }]);
const newPen = withChain(SINGLE, (chain) => [{ ...chain, pen: 7 }]);

const shift = withChain(SINGLE, (chain, random, tau) => {
  const angle = 6.28 * random();
  const by = tau * (2 + 5 * random());
  return [moved(chain, by * Math.cos(angle), by * Math.sin(angle))];
});

/** A hatch line on top of the next one. */
const shiftOnNeighbour: Spoil = (strokes, random) => {
  const i = pick(strokes.slice(0, -1), random, ['hatch']);
  if (i < 0 || strokes[i + 1].kind !== 'hatch') return null;
  return replaced(strokes, i, strokes[i + 1].chain);
};

/** Two hatch lines that change places half-way. */
const crossOver: Spoil = (strokes, random) => {
  const i = pick(strokes.slice(0, -1), random, ['hatch'], (c) => c.segments[0].kind === LINE);
  const other = strokes[i + 1];
  if (i < 0 || other.kind !== 'hatch' || other.chain.segments[0].kind !== LINE) return null;
  const [a, b] = [strokes[i].chain.segments[0], other.chain.segments[0]];
  const change = (from: Segment, to: Segment): Chain => {
    const [head, tail] = [spanOf(from, 0, 0.5), spanOf(to, 0.5, 1)];
    const link = { kind: LINE, data: [head.data[2], head.data[3], tail.data[0], tail.data[1]] };
    return { pen: strokes[i].chain.pen, segments: [head, link, tail] };
  };
  return replaced(replaced(strokes, i + 1, change(b, a)), i, change(a, b));
};

/** The first corner of a polyline cut off, its legs far longer than the tolerance. */
const cutCorner = withChain(
  ['line'],
  (chain, random, tau) => {
    const k = chain.segments.findIndex((_, i) => cornerSharp(chain, i));
    const [a, b] = [chain.segments[k], chain.segments[k + 1]];
    const leg = tau * (6 + 4 * random());
    const head = spanOf(a, 0, 1 - leg / sizeOf(a));
    const tail = spanOf(b, leg / sizeOf(b), 1);
    const short = { kind: LINE, data: [head.data[2], head.data[3], tail.data[0], tail.data[1]] };
    return [
      {
        ...chain,
        segments: [...chain.segments.slice(0, k), head, short, tail, ...chain.segments.slice(k + 2)],
      },
    ];
  },
  (chain) => chain.segments.some((_, i) => cornerSharp(chain, i)),
);

/** Whether segments i and i + 1 are lines over 1 mm that turn by some 60° to 150°. */
function cornerSharp(chain: Chain, i: number): boolean {
  const [a, b] = [chain.segments[i], chain.segments[i + 1]];
  if (!b || sizeOf(a) < 1 || sizeOf(b) < 1) return false;
  const dot =
    (a.data[2] - a.data[0]) * (b.data[2] - b.data[0]) + (a.data[3] - a.data[1]) * (b.data[3] - b.data[1]);
  const cosine = dot / (sizeOf(a) * sizeOf(b));
  return cosine < 0.5 && cosine > -0.87;
}

/** An arc or cubic mirrored in its chord: the bulge on the other side. */
const flipBulge: Spoil = (strokes, random, tau) => {
  const bulges = (chain: Chain) => chain.segments.some((s) => bulgeOf(s) > 2 * tau);
  const i = pick(strokes, random, ['arc', 'cubic'], bulges);
  if (i < 0) return null;
  const { chain } = strokes[i];
  const k = chain.segments.findIndex((s) => bulgeOf(s) > 2 * tau);
  return replaced(strokes, i, withSegment(chain, k, mirrored(chain.segments[k])));
};

/** The last part of a stroke not drawn, four tolerances and more. */
const stopShort = withChain(
  ['line', 'hatch'],
  (chain, random, tau) => {
    const k = chain.segments.length - 1;
    const left = tau * (4 + 10 * random());
    return [withSegment(chain, k, spanOf(chain.segments[k], 0, 1 - left / sizeOf(chain.segments[k])))];
  },
  (chain) => !isClosed(chain) && sizeOf(chain.segments[chain.segments.length - 1]) > 1,
);

/** A gap within a stroke. */
const gap = withChain(
  ['line', 'cubic', 'arc', 'hatch'],
  (chain, random, tau) => {
    const { data, kind } = chain.segments[0];
    const rough = kind === ARC ? Math.abs(data[11]) * 0.3 : Math.max(0.5, sizeOf(chain.segments[0]));
    const width = (tau * (10 + 10 * random())) / rough;
    const [head, tail] = [spanOf(chain.segments[0], 0, 0.4), spanOf(chain.segments[0], 0.4 + width, 1)];
    return [
      { ...chain, segments: [head] },
      { ...chain, segments: [tail, ...chain.segments.slice(1)] },
    ];
  },
  (chain) => chain.segments[0].kind !== LINE || sizeOf(chain.segments[0]) > 1,
);

/** A stroke from nowhere, short or long. */
const addLine: Spoil = (strokes, random) => {
  const i = pick(strokes, random, LONG);
  if (i < 0) return null;
  const [x, y] = startOf(strokes[i].chain);
  const angle = 6.28 * random();
  const size = random() < 0.5 ? 0.05 : 3;
  const from: [number, number] = [x + 5 + random(), y + 60];
  const chain = polyline([from, [from[0] + size * Math.cos(angle), from[1] + size * Math.sin(angle)]]);
  return [...strokes, { kind: 'line', chain }];
};

/** A short mark of its own at a stroke's start: as long as a bridge, but no run is all bridge. */
const strayMark: Spoil = (strokes, random, tau) => {
  const i = pick(strokes, random, ['line', 'gapped', 'cubic']);
  if (i < 0) return null;
  const [x, y] = startOf(strokes[i].chain);
  const angle = 6.28 * random();
  const size = 3 * tau;
  const mark = polyline(
    [
      [x, y],
      [x + size * Math.cos(angle), y + size * Math.sin(angle)],
    ],
    strokes[i].chain.pen,
  );
  return [...strokes, { kind: 'tiny', chain: mark }];
};

/** Two strokes far apart drawn as one, the way between them too. */
const drawTravel: Spoil = (strokes, random) => {
  const i = pick(strokes, random, LONG);
  const j = pick(strokes, random, LONG);
  if (i < 0 || i === j || strokes[i].chain.pen !== strokes[j].chain.pen) return null;
  const [a, b] = [strokes[i].chain, strokes[j].chain];
  const { data } = a.segments[a.segments.length - 1];
  const link = { kind: LINE, data: [data[2], data[3], ...startOf(b)] };
  if (sizeOf(link) < 0.3) return null;
  const joined = { ...a, segments: [...a.segments, link, ...b.segments] };
  return replaced(strokes, i, joined).filter((s) => s.chain !== b);
};

/** Out and back from the middle of a stroke, no longer than a bridge. */
const spur = withChain(
  ['line', 'hatch'],
  (chain, random, tau) => {
    const angle = 6.28 * random();
    const [head, tail] = [spanOf(chain.segments[0], 0, 0.5), spanOf(chain.segments[0], 0.5, 1)];
    const [x, y] = tail.data;
    const [dx, dy] = [3 * tau * Math.cos(angle), 3 * tau * Math.sin(angle)];
    const out = { kind: LINE, data: [x, y, x + dx, y + dy] };
    const back = { kind: LINE, data: [x + dx, y + dy, x, y] };
    return [{ ...chain, segments: [head, out, back, tail, ...chain.segments.slice(1)] }];
  },
  (chain) => sizeOf(chain.segments[0]) > 1,
);

/** A stroke that leaves its way for a little and comes back. */
const detour = withChain(
  ['line', 'hatch'],
  (chain, _, tau) => {
    const segment = chain.segments[0];
    const share = (8 * tau) / sizeOf(segment);
    const [head, tail] = [spanOf(segment, 0, 0.5), spanOf(segment, 0.5 + share, 1)];
    const [x0, y0, x1, y1] = [head.data[2], head.data[3], tail.data[0], tail.data[1]];
    const [x, y] = [(x0 + x1 + y1 - y0) / 2, (y0 + y1 + x0 - x1) / 2];
    const out = { kind: LINE, data: [x0, y0, x, y] };
    const back = { kind: LINE, data: [x, y, x1, y1] };
    return [{ ...chain, segments: [head, out, back, tail, ...chain.segments.slice(1)] }];
  },
  (chain) => sizeOf(chain.segments[0]) > 1,
);

/** There and back again in one run. */
const retrace = withChain(LONG, (chain) => [
  { ...chain, segments: [...chain.segments, ...reversed(chain).segments] },
]);

/** A curve replaced by its chord. */
const straighten: Spoil = (strokes, random, tau) => {
  const i = pick(strokes, random, ['arc', 'cubic'], (c) => c.segments.some((s) => bulgeOf(s) > 2 * tau));
  if (i < 0) return null;
  const { chain } = strokes[i];
  const k = chain.segments.findIndex((s) => bulgeOf(s) > 2 * tau);
  const line = { kind: LINE, data: chain.segments[k].data.slice(0, 4) };
  return replaced(strokes, i, withSegment(chain, k, line));
};

/** A side of the lattice lost on both of its squares, or drawn a third time. */
const lattice: Spoil = (strokes, random) => {
  const i = pick(strokes, random, ['lattice']);
  if (i < 0) return null;
  const side = strokes[i].chain.segments[randomBelow(random, 4)];
  const mid = (s: Segment) => `${(s.data[0] + s.data[2]).toFixed(6)} ${(s.data[1] + s.data[3]).toFixed(6)}`;
  if (random() < 0.5) {
    const thrice = { kind: 'line' as const, chain: { ...strokes[i].chain, segments: [side] } };
    return [...strokes, thrice, thrice];
  }
  return strokes.flatMap((s) => {
    if (s.kind !== 'lattice') return [s];
    const kept = s.chain.segments.map((segment) => (mid(segment) === mid(side) ? null : segment));
    if (!kept.includes(null)) return [s];
    const at = kept.indexOf(null);
    return [kept.slice(0, at), kept.slice(at + 1)]
      .filter((part) => part.length > 0)
      .map((part) => ({ kind: 'line' as const, chain: { ...s.chain, segments: part as Segment[] } }));
  });
};

export const SPOILS: Readonly<Record<string, Spoil>> = {
  drop,
  double,
  loseTiny,
  doubleTiny,
  loseDot,
  wrongPen,
  newPen,
  shift,
  shiftOnNeighbour,
  crossOver,
  cutCorner,
  flipBulge,
  stopShort,
  gap,
  addLine,
  strayMark,
  drawTravel,
  straighten,
  spur,
  detour,
  retrace,
  lattice,
};
