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
});
describe('atan2', () => {
  test('agrees with the engine within 1e-15', () => {
    const number = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(number, number, (y, x) => {
        const want = Math.atan2(y, x);
        return (
          Object.is(atan2(y, x), want) || Math.abs(atan2(y, x) - want) <= 1e-15 * Math.max(1, Math.abs(want))
        );
      }),
      { numRuns: 20000 },
    );
  });
});
test('degrees', () => {
  sinCosDegrees(450, out);
  expect([...out]).toEqual([1, 0]);
});
