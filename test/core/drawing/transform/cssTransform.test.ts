import { describe, expect, test } from 'vitest';
import type { WrittenLength } from '../../../../src/core/drawing/style/length.ts';
import { cssTransform } from '../../../../src/core/drawing/transform/cssTransform.ts';

const NONE = { translate: null, rotate: null, scale: null, list: null };
const along = ({ value, unit }: WrittenLength, axis: string): number =>
  unit === '%' ? (value / 100) * (axis === 'x' ? 200 : 100) : value;
const map = (written: Partial<typeof NONE> | Record<string, string>): number[] | null =>
  cssTransform({ ...NONE, ...written }, along)?.map((v) => Math.round(v * 1e6) / 1e6 + 0) ?? null;

// CSS Transforms Module Level 1, §8, and Level 2, §§5 and 13.
describe('functions', () => {
  test.each([
    ['translate(3px)', [1, 0, 0, 1, 3, 0]],
    ['translate(50%, 10%)', [1, 0, 0, 1, 100, 10]],
    ['translateX(3px) translateY(4px)', [1, 0, 0, 1, 3, 4]],
    ['scale(2)', [2, 0, 0, 2, 0, 0]],
    ['scale(50%, 3)', [0.5, 0, 0, 3, 0, 0]],
    ['rotate(90deg)', [0, 1, -1, 0, 0, 0]],
    ['rotate(0.25turn)translate(1px)', [0, 1, -1, 0, 0, 1]],
    ['rotate(100grad)', [0, 1, -1, 0, 0, 0]],
    ['rotate(0)', [1, 0, 0, 1, 0, 0]],
    ['SkewX(45deg)', [1, 0, 1, 1, 0, 0]],
    ['skew(0, 45deg)', [1, 1, 0, 1, 0, 0]],
    ['matrix(1, 2, 3, 4, 5, 6)', [1, 2, 3, 4, 5, 6]],
    ['none', [1, 0, 0, 1, 0, 0]],
    // Three dimensions, as they lie on the page.
    ['rotateX(60deg)', [1, 0, 0, 0.5, 0, 0]],
    ['rotate3d(0, 0, 2, 90deg)', [0, 1, -1, 0, 0, 0]],
    ['rotateX(90deg) translateZ(7px)', [1, 0, 0, 0, 0, -7]],
    ['scale3d(2, 3, 4) translate3d(1px, 1px, 1px)', [2, 0, 0, 3, 2, 3]],
    ['matrix3d(1,2,0,0, 3,4,0,0, 0,0,1,0, 5,6,0,1)', [1, 2, 3, 4, 5, 6]],
  ])('%s', (list, expected) => {
    expect(map({ list })).toEqual(expected);
  });

  test.each([
    ...['rotate(45)', 'translate(5)', 'translate(1px 2px)', 'rotate(1deg), scale(2)', 'scale()', 'nope(1)'],
    ...['matrix(1 2 3 4 5 6)', 'rotate(1deg, 2px, 3px)', 'translateZ(5%)', 'scale(2', '', 'translate(1px,)'],
  ])('%j is wrong', (list) => {
    expect(map({ list })).toBeNull();
  });
});

test('translate, then rotate, then scale, then the list', () => {
  expect(map({ translate: '10px 20px', rotate: '90deg', scale: '2', list: 'translate(1px)' })).toEqual([
    0, 2, -2, 0, 10, 22,
  ]);
  expect(map({ rotate: 'x 60deg' })).toEqual([1, 0, 0, 0.5, 0, 0]);
  expect(map({ rotate: '0 1 0 60deg' })).toEqual([0.5, 0, 0, 1, 0, 0]);
  expect(map({ translate: 'none', rotate: 'none', scale: 'none' })).toEqual([1, 0, 0, 1, 0, 0]);
  expect(map({ rotate: '1 2 30deg' })).toBeNull();
});
