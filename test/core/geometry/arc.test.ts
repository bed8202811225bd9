import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type ArcCentre, arcFromEndpoints, ellipseAxes } from '../../../src/core/geometry/arc.ts';
import vectors from '../../support/vectors.json' with { type: 'json' };

function pointOf(arc: ArcCentre, t: number): [number, number] {
  const cos = Math.cos(arc.theta0 + t * arc.sweep);
  const sin = Math.sin(arc.theta0 + t * arc.sweep);
  return [arc.cx + arc.ux * cos + arc.vx * sin, arc.cy + arc.uy * cos + arc.vy * sin];
}

function fromNumbers(a: readonly number[]): ArcCentre | 'line' | 'omit' {
  const [x0, y0, rx, ry, rotation, large, sweep, x1, y1] = a as Nine;
  return arcFromEndpoints(x0, y0, rx, ry, rotation, large === 1, sweep === 1, x1, y1);
}

type Nine = [number, number, number, number, number, number, number, number, number];

const degrees = 180 / Math.PI;
const coordinate = fc.double({ min: -100, max: 100, noNaN: true });
const radius = fc.double({ min: 0.1, max: 300, noNaN: true });

describe('arcFromEndpoints', () => {
  // SVG 2, Elliptical arc implementation notes, eq. 5.1–6.3, worked independently.
  test.each(vectors.svgArc)('the standard, worked: $arc', ({ arc, result }) => {
    const got = fromNumbers(arc);
    if (result.kind !== 'arc' || typeof got === 'string') {
      expect(got).toBe(result.kind);
      return;
    }
    const axes = ellipseAxes(got.ux, got.uy, got.vx, got.vy);
    expect(axes.rx).toBeCloseTo(result.rx as number, 12);
    expect(axes.ry).toBeCloseTo(result.ry as number, 12);
    expect(got.cx).toBeCloseTo(result.cx as number, 12);
    expect(got.cy).toBeCloseTo(result.cy as number, 12);
    const turns = (got.theta0 * degrees - (result.theta1Deg as number)) / 360;
    expect(turns - Math.round(turns)).toBeCloseTo(0, 13);
    expect(got.sweep * degrees).toBeCloseTo(result.deltaDeg as number, 11);
    const [x, y] = pointOf(got, 0.5);
    expect(x).toBeCloseTo(result.mid?.[0] as number, 12);
    expect(y).toBeCloseTo(result.mid?.[1] as number, 12);
  });

  test('meets both ends, turns as the flags say, and keeps the radii or scales both alike', () => {
    fc.assert(
      fc.property(
        fc.tuple(coordinate, coordinate, coordinate, coordinate),
        fc.tuple(radius, radius, fc.double({ min: -400, max: 400, noNaN: true })),
        fc.boolean(),
        fc.boolean(),
        ([x0, y0, x1, y1], [rx, ry, rotation], large, sweep) => {
          fc.pre(Math.hypot(x1 - x0, y1 - y0) > 1e-3);
          const arc = arcFromEndpoints(x0, y0, rx, ry, rotation, large, sweep, x1, y1) as ArcCentre;
          const a = Math.hypot(arc.ux, arc.uy);
          const b = Math.hypot(arc.vx, arc.vy);
          const [sx, sy] = pointOf(arc, 0);
          const [ex, ey] = pointOf(arc, 1);
          expect(Math.hypot(sx - x0, sy - y0)).toBeLessThan(2e-14 * (100 + Math.max(a, b)));
          expect(Math.hypot(ex - x1, ey - y1)).toBeLessThan(2e-14 * (100 + Math.max(a, b)));
          expect(arc.sweep > 0).toBe(sweep);
          expect(Math.abs(arc.sweep)).toBeLessThanOrEqual(2 * Math.PI);
          expect(large ? Math.abs(arc.sweep) >= Math.PI : Math.abs(arc.sweep) <= Math.PI).toBe(true);
          expect(Math.abs(a / rx - b / ry)).toBeLessThan(1e-12 * (a / rx));
          expect(a / rx).toBeGreaterThan(1 - 1e-12);
          // Scaled up only as far as needed: then the arc is half the ellipse.
          if (a / rx > 1 + 1e-12) expect(Math.abs(arc.sweep)).toBeCloseTo(Math.PI, 12);
        },
      ),
      { numRuns: 2000 },
    );
  });

  test('turned by a quarter it is the ellipse with the radii exchanged', () => {
    const turned = fromNumbers([0, 0, 20, 10, 90, 0, 1, 15, 5]) as ArcCentre;
    const exchanged = fromNumbers([0, 0, 10, 20, 0, 0, 1, 15, 5]) as ArcCentre;
    expect(turned.cx).toBeCloseTo(exchanged.cx, 12);
    expect(turned.cy).toBeCloseTo(exchanged.cy, 12);
    expect(turned.sweep).toBeCloseTo(exchanged.sweep, 12);
  });

  test('a tiny arc of a huge circle never takes the long way round', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 1e12, noNaN: true }),
        fc.double({ min: 1e-6, max: 1, noNaN: true }),
        fc.boolean(),
        (r, chord, sweep) => {
          const arc = arcFromEndpoints(1, 2, r, r, 0, false, sweep, 1 + chord, 2);
          return typeof arc === 'string' || chord > r || Math.abs(arc.sweep) <= (Math.PI / 2) * (chord / r);
        },
      ),
    );
  });

  test('an arc too flat to tell from its chord is a line, unless it is the large one', () => {
    expect(fromNumbers([0, 0, 1e10, 1e10, 0, 0, 1, 1, 0])).toBe('line');
    expect(fromNumbers([0, 0, 1e6, 1e6, 0, 0, 1, 1, 0])).not.toBe('line');
    const large = fromNumbers([0, 0, 1e10, 1e10, 0, 1, 1, 1, 0]) as ArcCentre;
    expect(large.sweep).toBeCloseTo(2 * Math.PI, 9);
  });

  test('no number in it is ever anything but finite', () => {
    const wild = fc.double({ min: -1e308, max: 1e308, noNaN: true });
    fc.assert(
      fc.property(fc.array(wild, { minLength: 7, maxLength: 7 }), fc.boolean(), fc.boolean(), (n, l, s) => {
        const [x0, y0, rx, ry, rotation, x1, y1] = n as number[] & { length: 7 };
        const arc = arcFromEndpoints(x0, y0, rx, ry, rotation, l, s, x1, y1);
        return typeof arc === 'string' || Object.values(arc).every(Number.isFinite);
      }),
      { numRuns: 2000 },
    );
  });
});

describe('ellipseAxes', () => {
  test('finds the axes again from any pair of conjugate half-diameters', () => {
    const anAngle = fc.double({ min: -7, max: 7, noNaN: true });
    fc.assert(
      fc.property(radius, radius, anAngle, anAngle, fc.boolean(), (p, q, tilt, phase, mirrored) => {
        const a = Math.max(p, q);
        const b = Math.min(p, q);
        const [ax, ay] = [a * Math.cos(tilt), a * Math.sin(tilt)];
        const [bx, by] = mirrored
          ? [b * Math.sin(tilt), -b * Math.cos(tilt)]
          : [-b * Math.sin(tilt), b * Math.cos(tilt)];
        const cos = Math.cos(phase);
        const sin = Math.sin(phase);
        const got = ellipseAxes(
          ax * cos + bx * sin,
          ay * cos + by * sin,
          bx * cos - ax * sin,
          by * cos - ay * sin,
        );
        expect(Math.abs(got.rx - a)).toBeLessThan(1e-12 * a);
        expect(Math.abs(got.ry - b)).toBeLessThan(1e-12 * a);
        expect(got.rx).toBeGreaterThanOrEqual(got.ry);
        expect(got.rotationDeg).toBeGreaterThanOrEqual(0);
        expect(got.rotationDeg).toBeLessThan(180);
        // The rounder, the less the direction means: weigh it by the difference of the axes.
        const turned = Math.sin(got.rotationDeg / degrees - tilt) * (a - b);
        expect(Math.abs(turned)).toBeLessThan(2e-12 * a);
      }),
      { numRuns: 2000 },
    );
  });

  test.each([
    ['a circle', [5, 0, 0, 5], { rx: 5, ry: 5, rotationDeg: 0 }],
    ['a circle, mirrored', [0, 5, 5, 0], { rx: 5, ry: 5, rotationDeg: 0 }],
    ['upright', [2, 0, 0, 7], { rx: 7, ry: 2, rotationDeg: 90 }],
    ['backwards', [-7, 0, 0, -2], { rx: 7, ry: 2, rotationDeg: 0 }],
    ['squeezed to a line', [3, 3, 0, 0], { rx: Math.sqrt(18), ry: 0, rotationDeg: 45 }],
    ['a point', [0, 0, 0, 0], { rx: 0, ry: 0, rotationDeg: 0 }],
  ] as const)('%s', (_, [ux, uy, vx, vy], want) => {
    const got = ellipseAxes(ux, uy, vx, vy);
    expect(got.rx).toBeCloseTo(want.rx, 14);
    expect(got.ry).toBeCloseTo(want.ry, 14);
    expect(got.rotationDeg).toBeCloseTo(want.rotationDeg, 12);
  });
});
