import { describe, expect, test } from 'vitest';
import { customValues, substituted } from '../../../../src/core/drawing/style/customProperties.ts';

const of = (declared: Record<string, string>, parent: Record<string, string> = {}): Record<string, string> =>
  Object.fromEntries(customValues(new Map(Object.entries(declared)), new Map(Object.entries(parent))));

// CSS Custom Properties for Cascading Variables Module Level 1, §§2 and 3.
describe('custom properties', () => {
  test('refer to others, of the parent too', () => {
    expect(of({ '--a': 'var(--b) 1', '--b': 'var(--c)' }, { '--c': 'x', '--d': 'y' })).toEqual({
      '--a': 'x  1',
      '--b': 'x',
      '--c': 'x',
      '--d': 'y',
    });
  });

  test('that refer to themselves have no value', () => {
    expect(of({ '--a': 'var(--b)', '--b': 'var(--a)' })).toEqual({});
    expect(of({ '--a': 'var(--a)' }, { '--a': '1' })).toEqual({});
  });

  test('inherit, unset and initial', () => {
    expect(
      of({ '--a': 'inherit', '--b': 'unset', '--c': 'initial' }, { '--a': '1', '--b': '2', '--c': '3' }),
    ).toEqual({
      '--a': '1',
      '--b': '2',
    });
  });

  test('that would grow without end have no value', () => {
    const declared: Record<string, string> = { '--a0': 'x' };
    for (let i = 1; i < 16; i++) declared[`--a${i}`] = `var(--a${i - 1})`.repeat(10);
    expect(Object.keys(of(declared)).length).toBeLessThan(8);
  });
});

describe('var()', () => {
  const custom = new Map([
    ['--a', '1'],
    ['--e', ''],
  ]);
  test.each([
    ['var(--a)', '1'],
    ['VAR( --a , 2)', '1'],
    ['var(--b, 2)', '2'],
    ['var(--b, var(--a))', '1'],
    ['var(--b,)', ''],
    ['var(--e)x', 'x'],
    ['calc(var(--a)*2)', 'calc( 1 *2)'],
    ['"var(--a)"', '"var(--a)"'],
    ['var(--A)', null],
    ['var(--b)', null],
    ['var(a)', null],
    ['var()', null],
  ])('%s', (value, expected) => {
    expect(substituted(value, custom)).toBe(expected);
  });
});
