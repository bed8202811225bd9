import fc from 'fast-check';
import { expect, test } from 'vitest';
import { formatDecimal, formatSteps, toSteps } from '../../../src/core/geometry/decimal.ts';

test('writes plain digits', () => {
  expect(formatDecimal(1.5, 3)).toBe('1.5');
  expect(formatDecimal(-0.0004, 3)).toBe('0');
  expect(formatDecimal(-0.001, 3)).toBe('-0.001');
  expect(formatDecimal(1e-9, 4)).toBe('0');
  expect(formatDecimal(123456789.12345, 4)).toBe('123456789.1235');
  expect(formatDecimal(100, 0)).toBe('100');
  expect(formatDecimal(-0.05, 2)).toBe('-0.05');
});

test('refuses what has no plain decimal', () => {
  for (const value of [Number.NaN, Infinity, 1e16]) expect(() => formatDecimal(value, 3)).toThrow(RangeError);
});

test('agrees with the exact rounding of Number.prototype.toFixed but at ties', () => {
  fc.assert(
    fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.integer({ min: 0, max: 6 }), (x, d) => {
      const text = formatDecimal(x, d);
      expect(text).toMatch(/^(0|-?(?!0(\.0*)?$)(0|[1-9]\d*)(\.\d*[1-9])?)$/);
      expect(Math.abs(Number(text) - Number(x.toFixed(d)))).toBeLessThan(
        Math.abs(Math.abs((x * 10 ** d) % 1) - 0.5) < 1e-6 ? 1.01 * 10 ** -d : 1e-9,
      );
    }),
  );
});

test('steps and text are the same number', () => {
  fc.assert(
    fc.property(fc.maxSafeInteger(), fc.integer({ min: 0, max: 9 }), (steps, d) => {
      const text = formatSteps(steps, d);
      const [whole, rest = ''] = text.replace('-', '').split('.');
      const digits = BigInt(whole + rest.padEnd(d, '0'));
      expect(text.startsWith('-') ? -digits : digits).toBe(BigInt(steps));
    }),
  );
});

test('rounds to the nearest step', () => {
  expect(toSteps(0.12349, 4)).toBe(1235);
  expect(Object.is(toSteps(-1e-9, 4), 0)).toBe(true);
});
