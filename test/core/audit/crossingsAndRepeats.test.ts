import { describe, expect, test } from 'vitest';
import { type AuditOptions, auditLines } from '../../../src/core/audit/audit.ts';
import { createRandom, randomBelow } from '../../../src/core/structures/random.ts';
import {
  type Chain,
  cubic,
  ellipseArc,
  flattened,
  lineSetOf,
  moved,
  polyline,
  reversed,
  rounded,
  type Segment,
  spanOf,
} from '../../support/chains.ts';
import { shuffled } from '../../support/redrawing.ts';

type Point = readonly [number, number];

const SVG: AuditOptions = { snapMm: 0.05, accuracyMm: 0.002, repeats: 'once', repeatToleranceMm: 0.01 };
const GCODE: AuditOptions = { ...SVG, accuracyMm: 0.02 };
const MEDIA = [
  { name: 'curves', options: SVG, tau: 0.003, write: (chain: Chain) => rounded(chain, 1e-4) },
  {
    name: 'chords',
    options: GCODE,
    tau: 0.024,
    write: (chain: Chain) => rounded(flattened(chain, 0.019), 1e-3),
  },
];
const SEED = Number(process.env.FEWLIFT_SEED ?? 20_260);

/** Lines, cubics and arcs all over a small sheet, so that they cross many times. */
function tangle(random: () => number): Chain[] {
  const at = (): Point => [40 * random(), 40 * random()];
  return Array.from({ length: 24 }, (_, i) => {
    if (i % 3 === 0) return polyline([at(), at(), at(), at()]);
    if (i % 3 === 1) return cubic([at(), at(), at(), at()]);
    return ellipseArc(...at(), 2 + 8 * random(), 2 + 8 * random(), 6 * random(), 1 + 4 * random(), 3);
  });
}

/** Every segment cut at up to five places; the parts as runs of their own, turning where two parts meet at will. */
function cutApart(chains: readonly Chain[], random: () => number): Segment[][] {
  return chains.flatMap((chain) =>
    chain.segments.flatMap((segment) => {
      const cuts = Array.from({ length: randomBelow(random, 6) }, random).sort((a, b) => a - b);
      const bounds = [0, ...cuts.filter((t, i) => t > 0.01 && t < 0.99 && t - (cuts[i - 1] ?? 0) > 0.01), 1];
      return bounds.slice(1).map((t, i) => [spanOf(segment, bounds[i], t)]);
    }),
  );
}

describe.each(MEDIA)('cut where lines cross, $name', ({ options, tau, write }) => {
  const drawn = (parts: readonly Segment[][], random: () => number): Chain[] =>
    shuffled(parts, random).map((segments) => {
      const chain = write({ pen: 0, segments });
      return random() < 0.5 ? reversed(chain) : chain;
    });

  test('nothing is flagged', () => {
    for (let k = 0; k < 25; k++) {
      const random = createRandom(SEED + k);
      const chains = tangle(random);
      const result = auditLines(
        lineSetOf(chains),
        lineSetOf(drawn(cutApart(chains, random), random)),
        options,
      );
      expect(result.findings, `${k}`).toEqual([]);
      expect(result.maxDeviationMm).toBeLessThanOrEqual(tau);
    }
  });

  test('a part lost, doubled, moved aside or drawn by another pen is told', () => {
    for (let k = 0; k < 60; k++) {
      const random = createRandom(SEED + 1000 + k);
      const chains = tangle(random);
      const parts = cutApart(chains, random);
      const runs = drawn(parts, random);
      const long = runs.findIndex(({ segments }) => {
        const [x0, y0, x1, y1] = segments[0].data;
        return (x1 - x0) ** 2 + (y1 - y0) ** 2 > (16 * tau) ** 2;
      });
      const run = runs[long];
      const rest = runs.filter((_, i) => i !== long);
      const [x0, y0, x1, y1] = run.segments[0].data;
      const size = Math.sqrt((x1 - x0) ** 2 + (y1 - y0) ** 2);
      const aside = moved(run, (2.5 * tau * (y1 - y0)) / size, (2.5 * tau * (x0 - x1)) / size);
      const spoils: Chain[][] = [
        rest,
        [...runs, reversed(run)],
        [...rest, aside],
        [...rest, { ...run, pen: 1 }],
      ];
      const result = auditLines(lineSetOf(chains), lineSetOf(spoils[k % 4]), options);
      expect(result.ok, `${k}`).toBe(false);
    }
  });
});

/** A way across the sheet as points. */
function border(random: () => number): Point[] {
  let [x, y] = [0, 20];
  return Array.from({ length: 12 }, () => {
    x += 1 + 3 * random();
    y += 4 * (random() - 0.5);
    return [x, y] as const;
  });
}

/** The same way with more points on it. */
function splitElsewhere(points: readonly Point[], random: () => number): Point[] {
  return points.flatMap((p, i) => {
    const q = points[i + 1];
    if (!q || random() < 0.3) return [p];
    const t = 0.1 + 0.8 * random();
    return [p, [p[0] + t * (q[0] - p[0]), p[1] + t * (q[1] - p[1])] as const];
  });
}

describe.each(MEDIA)('borders that stand twice, $name', ({ options, write }) => {
  /** Two borders that share the middle, split at other places, up to 0.009 mm apart. */
  const pairOf = (random: () => number): { wanted: Chain[]; once: Chain[]; shared: Point[] } => {
    const shared = border(random);
    const ends = (by: number): [Point, Point] => [
      [shared[0][0] - 3, shared[0][1] + by],
      [shared[11][0] + 3, shared[11][1] + by],
    ];
    const [a0, a1] = ends(4);
    const [b0, b1] = ends(-4);
    const angle = 6.28 * random();
    const off = 0.009 * random();
    const apart = splitElsewhere(shared, random).map(
      ([x, y]) => [x + off * Math.cos(angle), y + off * Math.sin(angle)] as const,
    );
    const a = polyline([a0, ...splitElsewhere(shared, random), a1]);
    const b = polyline([b0, ...apart, b1]);
    const legs = [polyline([b0, apart[0]]), polyline([apart[apart.length - 1], b1])];
    return { wanted: [a, b], once: [a, ...legs], shared };
  };

  test('once is enough, as long as all of it is drawn', () => {
    for (let k = 0; k < 60; k++) {
      const random = createRandom(SEED + k);
      const { wanted, once } = pairOf(random);
      const result = auditLines(lineSetOf(wanted), lineSetOf(once.map(write)), options);
      expect(result.findings, `${k}`).toEqual([]);
      expect(auditLines(lineSetOf(wanted), lineSetOf(wanted.map(write)), options).ok, `${k} both`).toBe(true);
    }
  });

  test('a part of it that is not drawn at all, or drawn a third time, is told', () => {
    for (let k = 0; k < 60; k++) {
      const random = createRandom(SEED + 500 + k);
      const { wanted, once, shared } = pairOf(random);
      const i = 2 + randomBelow(random, 7);
      const piece = polyline([shared[i], shared[i + 1]]);
      const [a, ...legs] = once;
      const at = a.segments.findIndex(({ data }) => data[0] === shared[i][0] && data[1] === shared[i][1]);
      const next = a.segments.findIndex(
        ({ data }) => data[0] === shared[i + 1][0] && data[1] === shared[i + 1][1],
      );
      const open = [
        { pen: 0, segments: a.segments.slice(0, at) },
        { pen: 0, segments: a.segments.slice(next) },
        ...legs,
      ];
      const result = auditLines(lineSetOf(wanted), lineSetOf(open.map(write)), options);
      expect(
        result.findings.map((f) => f.code),
        `${k}`,
      ).toContain('line-missing');
      const thrice = [...wanted, piece].map(write);
      expect(auditLines(lineSetOf(wanted), lineSetOf(thrice), options).ok, `${k} thrice`).toBe(false);
    }
  });

  test('arcs and cubics that stand twice in part, left out once', () => {
    for (let k = 0; k < 40; k++) {
      const random = createRandom(SEED + 900 + k);
      const r = 1 + 20 * random();
      const [from, sweep] = [6 * random(), 1 + 3 * random()];
      const whole = ellipseArc(30, 30, r, r, from, sweep, 1 + randomBelow(random, 3));
      const off = 0.009 * random();
      const part = ellipseArc(30, 30, r + off, r + off, from + 0.3 * sweep, 0.4 * sweep, 1);
      expect(
        auditLines(lineSetOf([whole, part]), lineSetOf([write(whole)]), options).findings,
        `arc ${k}`,
      ).toEqual([]);
      const at = (): Point => [40 * random(), 40 * random()];
      const curve = cubic([at(), at(), at(), at()]);
      const [t0, t1] = [0.1 + 0.3 * random(), 0.6 + 0.3 * random()];
      const again = moved({ pen: 0, segments: [spanOf(curve.segments[0], t1, t0)] }, 0.6 * off, 0.6 * off);
      expect(
        auditLines(lineSetOf([curve, again]), lineSetOf([write(curve)]), options).findings,
        `cubic ${k}`,
      ).toEqual([]);
    }
  });
});
