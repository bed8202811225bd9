import { describe, expect, test } from 'vitest';
import { evaluate, type Quantity } from '../../../../src/core/drawing/style/calc.ts';

const px = (value: number, unit: string): Quantity | null => {
  if (unit === '') return { kind: 'number', value };
  if (unit === 'px') return { kind: 'length', value };
  return unit === '%' ? { kind: 'length', value: 2 * value } : null;
};

// CSS Values and Units Module Level 4, §10, "Mathematical Expressions".
describe('sums', () => {
  test.each([
    ['3px', 'length', 3],
    ['calc(3px + 5%)', 'length', 13],
    ['calc(1px - -2px)', 'length', 3],
    ['calc(2 * (3px + 1px) / 4)', 'length', 2],
    ['calc(2px + 3px * 4)', 'length', 14],
    ['CALC( 1 + 2 )', 'number', 3],
    ['min(20px, 3px, 7px)', 'length', 3],
    ['max(1px, calc(2px + 3px))', 'length', 5],
    ['clamp(5px, 50px, 30px)', 'length', 30],
    ['clamp(none, -4px, 30px)', 'length', -4],
    ['calc(min(1px, 2px) + max(3px, 4px))', 'length', 5],
    ['calc(2 * pi)', 'number', 2 * Math.PI],
    ['calc(calc(1px))', 'length', 1],
  ])('%s', (text, kind, value) => {
    expect(evaluate(text, px)).toEqual({ kind, value });
  });

  test.each([
    ...[
      'calc(1px+2px)',
      'calc(1px + 2)',
      'calc(1px * 2px)',
      'calc(1 / 2px)',
      'calc()',
      'calc(1px',
      'calc(1px 2px)',
    ],
    ...[
      'min()',
      'clamp(1px, 2px)',
      'calc(1xx + 1px)',
      'calc(1px +)',
      'nope(1px)',
      '1xx',
      'calc(1px / 0)',
      '',
    ],
  ])('%j is none', (text) => {
    expect(evaluate(text, px)).toBeNull();
  });

  test('brackets without end are refused', () => {
    expect(evaluate(`calc(${'('.repeat(100)}1${')'.repeat(100)})`, px)).toBeNull();
  });
});
