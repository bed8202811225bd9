import { describe, expect, test } from 'vitest';
import { intersectSegments } from '../../../src/core/geometry/intersect.ts';
import { createRandom } from '../../../src/core/structures/random.ts';
import { crossingsBySampling, moved, partOf, tangent } from '../../support/crossings.ts';
import { build, type Curve, circle, place } from '../../support/curves.ts';

const TOLERANCE = 1e-7;

interface Found {
  readonly meetings: [number, number][];
  readonly overlaps: [number, number, number, number][];
}

function meet(a: Curve, b: Curve, tolerance = TOLERANCE): Found {
  const found: Found = { meetings: [], overlaps: [] };
  intersectSegments(
    build(a),
    0,
    build(b),
    0,
    tolerance,
    (s, t) => found.meetings.push([s, t]),
    (a0, a1, b0, b1) => found.overlaps.push([a0, a1, b0, b1]),
  );
  return found;
}

const distance = (p: readonly [number, number], q: readonly [number, number]): number =>
  Math.hypot(p[0] - q[0], p[1] - q[1]);

function randomCurve(random: () => number, only?: Curve['kind']): Curve {
  const near = (width: number): number => (random() - 0.5) * width;
  const kind = only ?? (['line', 'cubic', 'arc'] as const)[Math.floor(random() * 3)];
  if (kind === 'arc') {
    const r = 5 + random() * 60;
    const flat = 0.2 + 0.8 * random();
    const turn = random() * 2 * Math.PI;
    const [c, s] = [Math.cos(turn), Math.sin(turn)];
    const skew = near(0.6);
    return {
      kind,
      c: [near(60), near(60), r * c, r * s, flat * r * (skew * c - s), flat * r * (skew * s + c)],
      theta0: near(20),
      sweep: near(4 * Math.PI) || 1,
    };
  }
  return { kind, points: Array.from({ length: kind === 'line' ? 4 : 8 }, () => near(110)) };
}

/** The angle between the two where they meet, as its sine. */
const angleAt = (a: Curve, s: number, b: Curve, t: number): number => {
  const u = tangent(a, s);
  const v = tangent(b, t);
  return Math.abs(u[0] * v[1] - u[1] * v[0]);
};

describe('5,000 random pairs against an independent method', () => {
  test('3,000 pairs of all kinds: the same crossings, to 1e-6 mm', () => {
    const random = createRandom(1);
    let compared = 0;
    let all = 0;
    for (let n = 0; n < 3000; n++) {
      const a = randomCurve(random);
      const b = randomCurve(random);
      const expected = crossingsBySampling(a, b, 128);
      const { meetings, overlaps } = meet(a, b);
      expect(overlaps).toEqual([]);
      all += meetings.length;
      for (const [s, t] of meetings) expect(distance(place(a, s), place(b, t))).toBeLessThan(1e-11);
      for (const [s, t] of expected) {
        const at = place(a, s);
        if (distance(at, place(b, t)) > 1e-9) continue;
        const hit = meetings.some(
          ([p, q]) => distance(place(a, p), at) < 1e-6 && distance(place(b, q), at) < 1e-6,
        );
        expect(hit, `pair ${n}: ${s}, ${t} is missing`).toBe(true);
        compared++;
      }
      // Long chords miss some: then with shorter ones. Near contacts are for the next test.
      const sharp = meetings.filter(([s, t]) => angleAt(a, s, b, t) > 0.05);
      for (const [s, t] of sharp) {
        const at = place(a, s);
        const isThere = ([p]: [number, number]): boolean => distance(place(a, p), at) < 1e-6;
        const hit = expected.some(isThere) || crossingsBySampling(a, b, 1500).some(isThere);
        expect(hit, `pair ${n}: ${s}, ${t} is too much`).toBe(true);
      }
    }
    // Nearly all that there are, so that nothing hides behind the slow method's own misses.
    expect(compared).toBeGreaterThan(0.99 * all);
    expect(all).toBeGreaterThan(1300);
  });

  test('1,000 pairs tangent by construction: the contact, to 1e-6 mm', () => {
    const random = createRandom(2);
    for (let n = 0; n < 1000; n++) {
      const a = randomCurve(random, n % 3 === 0 ? 'line' : n % 3 === 1 ? 'cubic' : 'arc');
      const other = randomCurve(random, n % 2 === 0 ? 'cubic' : 'arc');
      const s = 0.1 + 0.8 * random();
      const t = 0.1 + 0.8 * random();
      const u = tangent(a, s);
      const v = tangent(other, t);
      const c = u[0] * v[0] + u[1] * v[1];
      const d = u[1] * v[0] - u[0] * v[1];
      const turned = moved(other, c, d, 0, 0);
      const at = place(a, s);
      const from = place(turned, t);
      const b = moved(turned, 1, 0, at[0] - from[0], at[1] - from[1]);
      const { meetings } = meet(a, b);
      for (const [p, q] of meetings) expect(distance(place(a, p), place(b, q))).toBeLessThan(1e-6);
      const nearest = Math.min(...meetings.map(([p]) => distance(place(a, p), at)));
      expect(nearest, `pair ${n} (${a.kind}, ${b.kind})`).toBeLessThan(1e-6);
      const here = meetings.filter(([p]) => distance(place(a, p), at) < 1e-3);
      expect(here.length, `pair ${n}`).toBeLessThanOrEqual(2);
    }
  });

  test('500 pairs that share an end, some smoothly: met at exactly that end', () => {
    const random = createRandom(3);
    for (let n = 0; n < 500; n++) {
      const a = randomCurve(random);
      const turned = randomCurve(random, n % 2 === 0 ? 'cubic' : 'line') as Extract<
        Curve,
        { points: readonly number[] }
      >;
      const end = place(a, 1);
      const points = [...turned.points];
      points[0] = end[0];
      points[1] = end[1];
      if (n % 4 === 0) {
        const [x, y] = tangent(a, 1);
        points[2] = end[0] + 20 * x;
        points[3] = end[1] + 20 * y;
      }
      const { meetings } = meet(a, { kind: turned.kind, points });
      expect(
        meetings.filter(([s, t]) => s === 1 && t === 0),
        `pair ${n}`,
      ).toHaveLength(1);
      for (const [s, t] of meetings) {
        expect(distance(place(a, s), place({ kind: turned.kind, points }, t))).toBeLessThan(1e-7);
      }
    }
  });

  test('500 pairs of parts of one curve: one overlap, from end to end', () => {
    const random = createRandom(4);
    for (let n = 0; n < 500; n++) {
      const whole = randomCurve(random);
      const cuts = [random(), random(), random(), random()].map((x) => 0.02 + 0.96 * x).sort();
      const [p0, p1, p2, p3] = cuts;
      if (Math.min(p1 - p0, p2 - p1, p3 - p2) < 0.02) continue;
      const turn = whole.kind === 'arc' ? Math.abs(whole.sweep) : 0;
      if (turn > 6.2) continue;
      const a = partOf(whole, p0, p2);
      const b = partOf(whole, p1, p3);
      const [from, to] = n % 2 === 0 ? [b, b] : [b, reversed(b)];
      expect(from.kind).toBe(to.kind);
      const { overlaps, meetings } = meet(a, to);
      expect(overlaps, `pair ${n} (${whole.kind})`).toHaveLength(1);
      const [a0, a1, b0, b1] = overlaps[0];
      const ends = [place(a, a0), place(to, b0), place(a, a1), place(to, b1)] as const;
      expect(distance(ends[0], ends[1])).toBeLessThan(1e-6);
      expect(distance(ends[2], ends[3])).toBeLessThan(1e-6);
      expect(distance(ends[0], place(whole, p1))).toBeLessThan(1e-6);
      expect(distance(ends[2], place(whole, p2))).toBeLessThan(1e-6);
      expect(b0 < b1).toBe(n % 2 === 0);
      // A loop of the curve may cross the other part besides.
      expect(meetings.length, `pair ${n} (${whole.kind})`).toBeLessThanOrEqual(
        whole.kind === 'cubic' ? 2 : 0,
      );
    }
  });
});

function reversed(curve: Curve): Curve {
  if (curve.kind === 'arc') return { ...curve, theta0: curve.theta0 + curve.sweep, sweep: -curve.sweep };
  const { points } = curve;
  const turned: number[] = [];
  for (let k = points.length - 2; k >= 0; k -= 2) turned.push(points[k], points[k + 1]);
  return { ...curve, points: turned };
}

const line = (...points: number[]): Curve => ({ kind: 'line', points });
const cubic = (...points: number[]): Curve => ({ kind: 'cubic', points });

describe('published facts', () => {
  test('two circles meet as the closed form says', () => {
    const [r, q, d] = [7, 5, 9];
    const x = (d * d + r * r - q * q) / (2 * d);
    const y = Math.sqrt(r * r - x * x);
    const a = circle(1, 2, r, 0.3);
    const { meetings } = meet(a, circle(1 + d, 2, q, -1.1));
    const points = meetings.map(([s]) => place(a, s)).sort((p, o) => p[1] - o[1]);
    expect(points).toHaveLength(2);
    expect(distance(points[0], [1 + x, 2 - y])).toBeLessThan(1e-12);
    expect(distance(points[1], [1 + x, 2 + y])).toBeLessThan(1e-12);
  });

  test('circles touch once, from outside and from inside', () => {
    for (const [d, q] of [
      [12, 5],
      [2, 5],
      [3, 10],
    ]) {
      const a = circle(0, 0, 7, 1);
      const { meetings } = meet(a, circle(d, 0, q, 2.5));
      expect(meetings).toHaveLength(1);
      const at = place(a, meetings[0][0]);
      expect(distance(at, [q === 10 ? -7 : 7, 0])).toBeLessThan(1e-6);
    }
  });

  test("Bézout's nine: two cubics, each the other turned by a quarter", () => {
    // y = 4x³ − 3x and x = 4y³ − 3y (Chebyshev's T3): x = T9(x) has nine roots in [−1, 1], the points
    // cos(kπ/4) and cos(kπ/5). As cubics on [−1, 1].
    const [y0, ya, yb, y1] = [-1, 5, -5, 1];
    const third = 1 / 3;
    const a = cubic(-1, y0, -third, ya, third, yb, 1, y1);
    const b = cubic(y0, -1, ya, -third, yb, third, y1, 1);
    const { meetings } = meet(a, b);
    expect(meetings).toHaveLength(9);
    const xs = meetings.map(([s]) => place(a, s)[0]).sort((p, q) => p - q);
    const roots = [
      ...[0, 1, 2, 3, 4].map((k) => Math.cos((k * Math.PI) / 4)),
      ...[1, 2, 3, 4].map((k) => Math.cos((k * Math.PI) / 5)),
    ].sort((p, q) => p - q);
    for (let k = 0; k < 9; k++) expect(Math.abs(xs[k] - roots[k])).toBeLessThan(1e-12);
  });

  test('a line meets a cubic three times and an ellipse twice at most', () => {
    const s = cubic(0, 0, 10, 40, 20, -40, 30, 0);
    expect(meet(line(-5, 0.5, 35, -0.5), s).meetings).toHaveLength(3);
    const e: Curve = { kind: 'arc', c: [0, 0, 9, 0, 0, 4], theta0: 0, sweep: 2 * Math.PI };
    expect(meet(line(-20, 1, 20, 2), e).meetings).toHaveLength(2);
    const upright = meet(line(-20, 4, 20, 4), e).meetings;
    expect(upright).toHaveLength(1);
    expect(upright[0][0]).toBeCloseTo(0.5, 9);
  });

  test('two ellipses meet four times', () => {
    const e: Curve = { kind: 'arc', c: [0, 0, 9, 0, 0, 4], theta0: 0.2, sweep: 2 * Math.PI };
    const f: Curve = { kind: 'arc', c: [0, 0, 4, 0, 0, 9], theta0: 0.2, sweep: 2 * Math.PI };
    // x = y there: x² (1/81 + 1/16) = 1.
    const x = Math.sqrt(1 / (1 / 81 + 1 / 16));
    const { meetings } = meet(e, f);
    expect(meetings).toHaveLength(4);
    for (const [s] of meetings) expect(Math.abs(Math.abs(place(e, s)[0]) - x)).toBeLessThan(1e-12);
  });
});

describe('lines', () => {
  test('cross, touch, miss, overlap', () => {
    expect(meet(line(0, 0, 4, 4), line(0, 4, 4, 0)).meetings).toEqual([[0.5, 0.5]]);
    expect(meet(line(0, 0, 4, 0), line(1, 0, 1, 5)).meetings).toEqual([[0.25, 0]]);
    expect(meet(line(0, 0, 4, 0), line(1, 0.001, 1, 5)).meetings).toEqual([]);
    expect(meet(line(0, 0, 4, 0), line(0, 1, 4, 1)).meetings).toEqual([]);
    expect(meet(line(0, 0, 4, 0), line(3, 0, 1, 0))).toEqual({
      meetings: [],
      overlaps: [[0.25, 0.75, 1, 0]],
    });
    expect(meet(line(0, 0, 4, 0), line(4, 0, 8, 0))).toEqual({ meetings: [[1, 0]], overlaps: [] });
    expect(meet(line(0, 0, 4, 0), line(0, 0, 4, 0)).overlaps).toEqual([[0, 1, 0, 1]]);
  });

  test('nearly parallel ones cross at the right place', () => {
    const { meetings } = meet(line(0, 0, 100, 1e-6), line(0, 1e-6, 100, 0), 1e-9);
    expect(meetings).toHaveLength(1);
    expect(Math.abs(meetings[0][0] - 0.5)).toBeLessThan(1e-9);
  });
});

test('a curve that begins on a line and bows back to it', () => {
  const bow = cubic(-2, 0, 0, 0, 0, -1, 1, 0);
  const { meetings } = meet(bow, line(3, -1, -2, 0));
  // x + 5y + 2 = 6t − 21t² + 18t³ = 3t (2t − 1)(3t − 2) along it.
  expect(meetings.map(([s]) => s)).toEqual([0, expect.closeTo(0.5, 12), expect.closeTo(2 / 3, 12)]);
});

describe('degenerate curves', () => {
  test('a dot on a curve meets it once', () => {
    const e = circle(0, 0, 5);
    expect(meet(line(3, 4, 3, 4), e).meetings).toHaveLength(1);
    expect(meet(line(0, 0, 0, 0), e).meetings).toHaveLength(0);
    expect(meet(line(2, 2, 2, 2), line(2, 2, 2, 2)).meetings).toEqual([[0, 0]]);
  });

  test('a cusp and coincident control points', () => {
    // Control points crossed so that the speed vanishes at the middle, at (15, 7.5).
    const cusp = cubic(0, 0, 30, 10, 0, 10, 30, 0);
    const through = meet(line(0, 7.5, 30, 7.5), cusp).meetings;
    expect(through).toHaveLength(1);
    for (const [s, t] of through) {
      expect(distance(place(line(0, 7.5, 30, 7.5), s), place(cusp, t))).toBeLessThan(1e-6);
    }
    expect(meet(line(15, 0, 15, 20), cusp).meetings).toHaveLength(1);
    const straight = cubic(0, 0, 0, 0, 10, 10, 10, 10);
    expect(meet(straight, line(0, 10, 10, 0)).meetings).toEqual([[0.5, 0.5]]);
    expect(meet(straight, line(0, 0, 10, 10)).overlaps).toEqual([[0, 1, 0, 1]]);
    expect(meet(cubic(1, 1, 1, 1, 1, 1, 1, 1), line(0, 0, 2, 2)).meetings).toHaveLength(1);
  });

  test('a cubic that runs to and fro on a line', () => {
    const fro = cubic(0, 0, 20, 0, -10, 0, 10, 0);
    expect(meet(fro, line(5, -5, 5, 5)).meetings.length).toBeGreaterThanOrEqual(1);
    const { overlaps } = meet(fro, line(-5, 0, 15, 0));
    expect(overlaps.length).toBeGreaterThanOrEqual(1);
  });

  test('a flat arc is a line to and fro', () => {
    const flat: Curve = { kind: 'arc', c: [0, 0, 5, 0, 0, 0], theta0: 0, sweep: Math.PI };
    expect(meet(flat, line(1, -1, 1, 1)).meetings).toHaveLength(1);
  });

  test('huge and small', () => {
    for (const scale of [1e6, 1e-3]) {
      const a = cubic(...[-1, -1, -1 / 3, 5, 1 / 3, -5, 1, 1].map((v) => v * scale));
      const b = cubic(...[-1, -1, 5, -1 / 3, -5, 1 / 3, 1, 1].map((v) => v * scale));
      expect(meet(a, b, 1e-9).meetings).toHaveLength(9);
    }
  });

  test('curves that nearly run along one another end in bounded time', () => {
    const k = 0.5522847498;
    const bow = cubic(10, 0, 10, 10 * k, 10 * k, 10, 0, 10);
    const quarter = circle(0, 0, 10, 0, Math.PI / 2);
    const touching = meet(bow, quarter).meetings;
    expect(touching.length).toBeGreaterThanOrEqual(2);
    const shifted = cubic(10 + 3e-7, 0, 10, 10 * k, 10 * k, 10, 0, 10);
    expect(meet(bow, shifted).meetings.length).toBeLessThan(20);
    const loop = cubic(0, 0, 100, 100, -50, 100, 50, 0);
    expect(meet(loop, loop).overlaps).toEqual([[0, 1, 0, 1]]);
  });
});

test('the same circle twice, begun elsewhere: it overlaps all round', () => {
  const a = circle(3, 4, 10, 0);
  const b = circle(3, 4, 10, 2, -2 * Math.PI);
  const { overlaps, meetings } = meet(a, b);
  expect(meetings).toEqual([]);
  const covered = overlaps.reduce((sum, [a0, a1]) => sum + a1 - a0, 0);
  expect(covered).toBeCloseTo(1, 9);
  for (const [a0, a1, b0, b1] of overlaps) {
    expect(distance(place(a, a0), place(b, b0))).toBeLessThan(1e-9);
    expect(distance(place(a, a1), place(b, b1))).toBeLessThan(1e-9);
  }
});

test('an overlap does not hide a crossing elsewhere', () => {
  // Three quarters of a circle and a cubic are two segments of one figure: the arc again, and a chord.
  const a = circle(0, 0, 10, 0, 1.5 * Math.PI);
  const b = circle(0, 0, 10, 1, 0.5);
  expect(meet(a, b).overlaps).toHaveLength(1);
  const loop = cubic(0, 0, 60, 60, -30, 60, 30, 0);
  const head = partOf(loop, 0, 0.6);
  const { overlaps, meetings } = meet(loop, head);
  expect(overlaps).toHaveLength(1);
  expect(meetings.length).toBeGreaterThanOrEqual(1);
});
