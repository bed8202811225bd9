import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { atan2, sinCos, sinCosDegrees } from '../../../src/core/geometry/trig.ts';

const out = new Float64Array(2);

describe('sinCos', () => {
  test('agrees with the engine within 1e-15 for angles up to 100', () => {
    fc.assert(
      fc.property(fc.double({ min: -100, max: 100, noNaN: true }), (angle) => {
        sinCos(angle, out);
        return Math.abs(out[0] - Math.sin(angle)) <= 1e-15 && Math.abs(out[1] - Math.cos(angle)) <= 1e-15;
      }),
      { numRuns: 20000 },
    );
  });

  // Abramowitz & Stegun (1964), table 4.6.
  test('sin 1 and cos 1 as tabulated', () => {
    sinCos(1, out);
    expect(out[0]).toBe(0.8414709848078965);
    expect(out[1]).toBe(0.5403023058681398);
  });

  // 355/113 and 103993/33102 are convergents of π, so nearly all digits cancel in the reduction:
  // 355 − 113π and 103993 − 33102π, of which sin differs by a cube. π to 40 digits.
  test.each([
    [355, 3.014435336405372e-5, -1],
    [103993, 1.9129335779590421e-5, 1],
  ])('keeps its relative accuracy next to a multiple of π: %d', (n, rest, sign) => {
    sinCos(n, out);
    const sine = rest - rest ** 3 / 6;
    expect(Math.abs(Math.abs(out[0]) / sine - 1)).toBeLessThan(1e-13);
    expect(Math.sign(out[1])).toBe(sign);
  });

  test('is NaN where there is no angle', () => {
    for (const angle of [Number.NaN, Number.POSITIVE_INFINITY]) {
      sinCos(angle, out);
      expect([...out]).toEqual([Number.NaN, Number.NaN]);
    }
  });

  test('stays on the unit circle for huge angles', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e300, max: 1e300, noNaN: true }), (angle) => {
        sinCos(angle, out);
        return Math.abs(out[0] * out[0] + out[1] * out[1] - 1) <= 1e-15;
      }),
    );
  });
});

describe('sinCosDegrees', () => {
  test.each([
    [0, 0, 1],
    [90, 1, 0],
    [180, 0, -1],
    [270, -1, 0],
    [-90, -1, 0],
    [450, 1, 0],
    [-1080, 0, 1],
    [3.6e18, 0, 1],
  ])('%d degrees exactly', (degrees, sin, cos) => {
    sinCosDegrees(degrees, out);
    expect(out[0] + 0).toBe(sin);
    expect(out[1] + 0).toBe(cos);
  });

  test('agrees with sinCos', () => {
    fc.assert(
      fc.property(fc.double({ min: -720, max: 720, noNaN: true }), (degrees) => {
        sinCosDegrees(degrees, out);
        const radians = (degrees / 180) * Math.PI;
        return Math.abs(out[0] - Math.sin(radians)) <= 4e-15 && Math.abs(out[1] - Math.cos(radians)) <= 4e-15;
      }),
    );
  });
});

describe('atan2', () => {
  test('agrees with the engine within 1e-15 relative', () => {
    const number = fc.oneof(
      fc.double({ min: -1e6, max: 1e6, noNaN: true }),
      fc.double({ min: -2, max: 2, noNaN: true }),
    );
    fc.assert(
      fc.property(number, number, (y, x) => {
        const want = Math.atan2(y, x);
        const got = atan2(y, x);
        return Object.is(got, want) || Math.abs(got - want) <= 1e-15 * Math.abs(want);
      }),
      { numRuns: 20000 },
    );
  });

  // ECMAScript 2022, section Math.atan2, which lists these cases.
  test('zeros and infinities as in ECMAScript', () => {
    const odd = [0, -0, 1, -1, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY, Number.NaN];
    for (const y of odd) for (const x of odd) expect(atan2(y, x)).toBe(Math.atan2(y, x));
  });

  test('is the inverse of sinCos', () => {
    fc.assert(
      fc.property(fc.double({ min: -3, max: 3, noNaN: true }), (angle) => {
        sinCos(angle, out);
        return Math.abs(atan2(out[0], out[1]) - angle) <= 1e-15;
      }),
    );
  });
});
