import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { liftsFirst } from '../../../src/core/metric/metric.ts';
import { type LiftedMotion, liftedSeconds } from '../../../src/core/metric/seconds.ts';

const motion: LiftedMotion = {
  liftSeconds: 0.15,
  lowerSeconds: 0.1,
  travelSpeedMmPerS: 100,
  accelerationMmPerS2: 500,
};
const anyMotion = fc.record({
  liftSeconds: fc.double({ min: 0, max: 2, noNaN: true }),
  lowerSeconds: fc.double({ min: 0, max: 2, noNaN: true }),
  travelSpeedMmPerS: fc.double({ min: 1, max: 1000, noNaN: true }),
  accelerationMmPerS2: fc.oneof(
    fc.double({ min: 1, max: 1e5, noNaN: true }),
    fc.constant(Number.POSITIVE_INFINITY),
  ),
});
const length = fc.double({ min: 0, max: 5000, noNaN: true });

describe('seconds of a connector', () => {
  test('by hand: 0, ramps only, ramps and a straight', () => {
    const weigh = liftedSeconds(motion);
    expect(weigh(0)).toBe(0);
    // 5 mm: up to 50 mm/s and down again, 2·√(5/500) s. 20 mm is the whole of the ramps: 2·100/500 s.
    expect(weigh(5)).toBeCloseTo(0.25 + 0.2, 12);
    expect(weigh(20)).toBeCloseTo(0.25 + 0.4, 12);
    expect(weigh(120)).toBeCloseTo(0.25 + 0.4 + 1, 12);
    expect(liftedSeconds({ ...motion, accelerationMmPerS2: Number.POSITIVE_INFINITY })(50)).toBe(0.75);
  });

  test('never falls, to the last bit, also where the formulas meet', () => {
    const bits = new BigInt64Array(1);
    const double = new Float64Array(bits.buffer);
    fc.assert(
      fc.property(anyMotion, (given) => {
        const weigh = liftedSeconds(given);
        double[0] = given.travelSpeedMmPerS ** 2 / given.accelerationMmPerS2;
        bits[0] = bits[0] > 50n ? bits[0] - 50n : 0n;
        let before = weigh(double[0]);
        for (let step = 0; step < 100; step++) {
          bits[0]++;
          const now = weigh(double[0]);
          if (now < before) throw new Error(`falls at ${double[0]}`);
          before = now;
        }
      }),
      { numRuns: 200 },
    );
  });

  test('a detour never costs less', () => {
    fc.assert(
      fc.property(anyMotion, length, length, (given, a, b) => {
        const weigh = liftedSeconds(given);
        expect(weigh(a + b)).toBeLessThanOrEqual((weigh(a) + weigh(b)) * (1 + 1e-12));
      }),
      { numRuns: 500 },
    );
  });

  test('refuses times below 0 and speeds of 0', () => {
    expect(() => liftedSeconds({ ...motion, liftSeconds: -1 })).toThrow(RangeError);
    expect(() => liftedSeconds({ ...motion, lowerSeconds: Number.POSITIVE_INFINITY })).toThrow(RangeError);
    expect(() => liftedSeconds({ ...motion, travelSpeedMmPerS: 0 })).toThrow(RangeError);
    expect(() => liftedSeconds({ ...motion, accelerationMmPerS2: Number.NaN })).toThrow(RangeError);
  });
});

test('lifts first: one lift fewer outweighs every length', () => {
  const { weigh, weighHome, liftCost } = liftsFirst(500, 40);
  expect(weigh(0)).toBe(0);
  expect(weighHome(0)).toBe(liftCost);
  expect(40 * 500).toBeLessThan(liftCost);
  expect(39 * weigh(500)).toBeLessThan(40 * weigh(1e-9));
});
