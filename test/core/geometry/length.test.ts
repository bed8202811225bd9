import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { arcFromEndpoints } from '../../../src/core/geometry/arc.ts';
import { segmentLength } from '../../../src/core/geometry/length.ts';
import {
  aCubic,
  aCurve,
  aParameter,
  build,
  type Curve,
  chordSum,
  circle,
  degenerateCurves,
} from '../../support/curves.ts';
import { ellipticE } from '../../support/elliptic.ts';
import vectors from '../../support/vectors.json' with { type: 'json' };

const lengthOf = (curve: Curve, t0 = 0, t1 = 1): number => segmentLength(build(curve), 0, t0, t1);
const relative = (got: number, want: number): number => Math.abs(got / want - 1);

/** The ellipse with half-axes a, b, its major axis turned by `tilt`. */
function ellipse(a: number, b: number, tilt: number, theta0: number, sweep: number): Curve {
  const cos = Math.cos(tilt);
  const sin = Math.sin(tilt);
  return { kind: 'arc', c: [7, 9, a * cos, a * sin, -b * sin, b * cos], theta0, sweep };
}

/** Control points of the cubic with x(s), y(s) given by power coefficients in s = 2t − 1. */
function cubicOfPowers(x: readonly number[], y: readonly number[]): Curve {
  // The blossom of s³, s², s, 1 at −1,−1,−1 … 1,1,1.
  const control = (c: readonly number[], k: number): number => {
    const s = [0, 1, 2].map((j) => (j < k ? 1 : -1)) as [number, number, number];
    return (
      c[0] +
      (c[1] * (s[0] + s[1] + s[2])) / 3 +
      (c[2] * (s[0] * s[1] + s[1] * s[2] + s[0] * s[2])) / 3 +
      c[3] * s[0] * s[1] * s[2]
    );
  };
  return { kind: 'cubic', points: [0, 1, 2, 3].flatMap((k) => [control(x, k), control(y, k)]) };
}

describe('segmentLength: closed forms', () => {
  test('a 3-4-5 line, and part of it', () => {
    expect(lengthOf({ kind: 'line', points: [1, 1, 4, 5] })).toBe(5);
    expect(lengthOf({ kind: 'line', points: [1, 1, 4, 5] }, 0.75, 0.25)).toBe(2.5);
  });

  test('a circle: radius times angle', () => {
    expect(lengthOf(circle(3, 4, 7))).toBe(14 * Math.PI);
    expect(lengthOf(circle(3, 4, 7, 1, -2), 0.25, 0.5)).toBeCloseTo(3.5, 14);
  });

  // Half-axes 2 and 1: 8·E(3/4) = 9.688448220547676... (Abramowitz & Stegun 1964, table 17.1, gives E).
  test('the ellipse twice as wide as high', () => {
    expect(relative(lengthOf(ellipse(2, 1, 0.3, 0, 2 * Math.PI)), 9.688448220547675)).toBeLessThan(1e-12);
  });

  // y = x²/2 over [−1, 1]: √2 + asinh 1.
  test('a parabola', () => {
    const parabola = cubicOfPowers([0, 1, 0, 0], [0, 0, 0.5, 0]);
    expect(relative(lengthOf(parabola), Math.SQRT2 + Math.asinh(1))).toBeLessThan(1e-12);
  });

  // The semicubical parabola (s², s³), with a cusp: from it to s = 1 it is (13√13 − 8)/27 (Neile 1657).
  test('a cusp', () => {
    const neile = cubicOfPowers([0, 0, 1, 0], [0, 0, 0, 1]);
    const half = (13 * Math.sqrt(13) - 8) / 27;
    expect(relative(lengthOf(neile), 2 * half)).toBeLessThan(1e-12);
    expect(relative(lengthOf(neile, 0.5, 1), half)).toBeLessThan(1e-12);
  });

  // x′ = 600·(1 − 5t + 5t²) turns at (5 ± √5)/10: the way there, back, and on.
  test('a straight cubic that folds back twice', () => {
    const x = (t: number): number => 600 * t - 1500 * t * t + 1000 * t ** 3;
    const turn = (5 - Math.sqrt(5)) / 10;
    const ways = 2 * x(turn) - 2 * x(1 - turn) + x(1);
    const across: Curve = { kind: 'cubic', points: [0, 0, 200, 400, -100, -200, 100, 200] };
    expect(relative(lengthOf(across), Math.sqrt(5) * ways)).toBeLessThan(1e-12);
  });

  // A Pythagorean hodograph: x′ = s² − b², y′ = 2bs has the speed s² + b² (Farouki & Sakkalis 1990).
  test.each([1, 0.1, 1e-3, 1e-6, 1e-9])('two near-cusps at distance %d', (b) => {
    const curve = cubicOfPowers([0, -b * b, 0, 1 / 3], [0, 0, b, 0]);
    expect(relative(lengthOf(curve), 2 / 3 + 2 * b * b)).toBeLessThan(1e-10);
  });

  // Lengths found by dense sampling, to 5 decimals.
  test.each(vectors.svgArc.filter(({ result }) => result.kind === 'arc'))(
    'the arc $arc',
    ({ arc, result }) => {
      const [x0, y0, rx, ry, rotation, large, sweep, x1, y1] = arc as number[] & { length: 9 };
      const a = arcFromEndpoints(x0, y0, rx, ry, rotation, large === 1, sweep === 1, x1, y1);
      if (typeof a === 'string') throw new Error(a);
      const curve: Curve = {
        kind: 'arc',
        c: [a.cx, a.cy, a.ux, a.uy, a.vx, a.vy],
        theta0: a.theta0,
        sweep: a.sweep,
      };
      expect(lengthOf(curve)).toBeCloseTo(result.length as number, 4);
    },
  );
});

describe('segmentLength: second opinions', () => {
  test('elliptical arcs, down to needles, against the elliptic integral', () => {
    const anExponent = fc.double({ min: -10, max: 0, noNaN: true });
    const anAngle = fc.double({ min: -3, max: 3, noNaN: true });
    // Shorter ones lose their digits in the difference of two integrals.
    const aSweep = fc.double({ min: 0.1, max: 6.28, noNaN: true });
    fc.assert(
      fc.property(
        anExponent,
        anAngle,
        anAngle,
        aSweep,
        fc.boolean(),
        (exponent, tilt, theta0, turn, back) => {
          const q = 10 ** exponent;
          const sweep = back ? -turn : turn;
          const m = (1 - q) * (1 + q);
          // The speed is √(1 − m·sin²) of the angle counted from the minor axis.
          const from = theta0 - Math.PI / 2;
          const want = 50 * Math.abs(ellipticE(from + sweep, m) - ellipticE(from, m));
          expect(relative(lengthOf(ellipse(50, 50 * q, tilt, theta0, sweep)), want)).toBeLessThan(1e-9);
        },
      ),
      { numRuns: 1000 },
    );
  });

  test('near-cusps against graded sums of chords, extrapolated', () => {
    const graded = (u: number): number => 0.5 + 4 * (u - 0.5) ** 3;
    for (let k = 0; k <= 8; k++) {
      const e = 10 ** -k;
      const curve: Curve = { kind: 'cubic', points: [0, 0, 100, 100 + e, 0, 100 + e / 3, 100, 0] };
      const coarse = chordSum(curve, 4000, 0, 1, graded);
      const fine = chordSum(curve, 8000, 0, 1, graded);
      expect(relative(lengthOf(curve), fine + (fine - coarse) / 3)).toBeLessThan(1e-9);
    }
  });

  test('any curve: between the sum of many chords and a little more', () => {
    fc.assert(
      fc.property(aCurve, (curve) => {
        const length = lengthOf(curve);
        // The chords are rounded to 1e-13 or so each.
        const chords = chordSum(curve, 2000);
        expect(length).toBeGreaterThanOrEqual(chords * (1 - 1e-10) - 1e-9);
        expect(length).toBeLessThanOrEqual(chords * (1 + 2e-4) + 1e-9);
      }),
      { numRuns: 300 },
    );
  });

  test('a cubic is no longer than its control polygon and no shorter than its chord', () => {
    fc.assert(
      fc.property(aCubic, (curve) => {
        const p = (curve as { points: readonly number[] }).points;
        const leg = (a: number, b: number): number =>
          Math.hypot(p[2 * b] - p[2 * a], p[2 * b + 1] - p[2 * a + 1]);
        const length = lengthOf(curve);
        expect(length).toBeLessThanOrEqual((leg(0, 1) + leg(1, 2) + leg(2, 3)) * (1 + 1e-9));
        expect(length).toBeGreaterThanOrEqual(leg(0, 3) * (1 - 1e-9));
      }),
      { numRuns: 1000 },
    );
  });

  test('spans add up, in either direction', () => {
    fc.assert(
      fc.property(aCurve, aParameter, aParameter, (curve, t0, t1) => {
        const whole = lengthOf(curve);
        const low = Math.min(t0, t1);
        const high = Math.max(t0, t1);
        expect(lengthOf(curve, t1, t0)).toBe(lengthOf(curve, t0, t1));
        const sum = lengthOf(curve, 0, low) + lengthOf(curve, low, high) + lengthOf(curve, high, 1);
        expect(Math.abs(sum - whole)).toBeLessThanOrEqual(1e-9 * whole + 1e-12);
      }),
      { numRuns: 1000 },
    );
  });
});

test.each(degenerateCurves)('%s has a length', (_, curve) => {
  const length = lengthOf(curve);
  expect(Number.isFinite(length)).toBe(true);
  expect(Math.abs(length - chordSum(curve, 20000))).toBeLessThan(1e-5);
});
