import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  type LengthUnit,
  parseLength,
  parseLengthMm,
  toMm,
  UNITS_PER_INCH,
} from '../../../src/core/geometry/unit.ts';
import vectors from '../../support/vectors.json' with { type: 'json' };

describe('toMm', () => {
  // CSS Values and Units Level 3, §5.2: 1in = 2.54cm = 25.4mm = 101.6Q = 72pt = 6pc = 96px.
  test.each(Object.entries(UNITS_PER_INCH))('an inch in %s is %d of them, exactly', (unit, perInch) => {
    expect(toMm(perInch, unit as LengthUnit)).toBe(25.4);
  });

  // Pixels of each unit, as worked from the standard.
  test.each(Object.entries(vectors.units))('1%s is %d px', (unit, px) => {
    expect(toMm(1, unit as LengthUnit)).toBeCloseTo((px * 25.4) / 96, 14);
  });

  test('another number of px to the inch changes px only', () => {
    expect(toMm(90, 'px', 90)).toBe(25.4);
    expect(toMm(72, 'pt', 90)).toBe(25.4);
  });
});

describe('parseLength', () => {
  test.each([
    ['210mm', 210, 'mm'],
    ['2in', 50.8, 'in'],
    ['1cm', 10, 'cm'],
    ['4Q', 1, 'Q'],
    ['4q', 1, 'Q'],
    ['72pt', 25.4, 'pt'],
    ['6PC', 25.4, 'pc'],
    ['96px', 25.4, 'px'],
    ['96', 25.4, 'px'],
    [' 96\n', 25.4, 'px'],
    ['-.5mm', -0.5, 'mm'],
    ['+1.mm', 1, 'mm'],
    ['1e1mm', 10, 'mm'],
    ['1E-1mm', 0.1, 'mm'],
    ['0', 0, 'px'],
  ] as const)('%j is %d mm', (text, value, unit) => {
    expect(parseLength(text)).toEqual({ value, unit });
  });

  test.each([
    ...['', ' ', 'mm', '100%', '2em', '2ex', '2rem', '1vw', 'auto', 'none', '1 mm', '1mm 2mm', '1,5mm'],
    ...[
      '--1mm',
      '.mm',
      '1e',
      '1e999',
      'NaN',
      'Infinity',
      '0x10',
      '1mm;',
      'calc(1mm)',
      '1constructor',
      '1__proto__',
    ],
  ])('%j is none', (text) => {
    expect(parseLength(text)).toBeNull();
  });

  test('px follow the resolution asked for', () => {
    expect(parseLength('90', 90)).toEqual({ value: 25.4, unit: 'px' });
    expect(parseLength('1in', 90)).toEqual({ value: 25.4, unit: 'in' });
  });

  test('reads back what any number is written as', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        expect(parseLength(`${value}mm`)?.value).toBe(value + 0);
      }),
    );
  });
});

describe('parseLengthMm', () => {
  test.each([
    ['0.1', 0.1],
    ['0.1mm', 0.1],
    ['0.1 mm', 0.1],
    ['2in', 50.8],
    ['18pt', 6.35],
    ['  3cm ', 30],
  ])('%j is %d', (text, value) => {
    expect(parseLengthMm(text)).toBe(value);
  });

  test.each(['', 'x', '10%', '1 2', '2em', 'mm'])('%j is none', (text) => {
    expect(parseLengthMm(text)).toBeNull();
  });
});
