import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readTransformList } from '../../../../src/core/drawing/transform/transformList.ts';
import { IDENTITY, multiply } from '../../../../src/core/geometry/affine.ts';

function rounded(text: string): number[] | null {
  return readTransformList(text)?.map((v) => Math.round(v * 1e9) / 1e9 + 0) ?? null;
}

// CSS Transforms Module Level 1, "The Transform Functions" and "Mathematical Description".
describe('functions', () => {
  test.each([
    ['matrix(1 2 3 4 5 6)', [1, 2, 3, 4, 5, 6]],
    ['translate(3)', [1, 0, 0, 1, 3, 0]],
    ['translate(3 4)', [1, 0, 0, 1, 3, 4]],
    ['scale(2)', [2, 0, 0, 2, 0, 0]],
    ['scale(2 -3)', [2, 0, 0, -3, 0, 0]],
    ['rotate(90)', [0, 1, -1, 0, 0, 0]],
    ['rotate(-180)', [-1, 0, 0, -1, 0, 0]],
    ['rotate(30)', [0.866025404, 0.5, -0.5, 0.866025404, 0, 0]],
    ['rotate(90 10 20)', [0, 1, -1, 0, 30, 10]],
    ['skewX(45)', [1, 0, 1, 1, 0, 0]],
    ['skewY(45)', [1, 1, 0, 1, 0, 0]],
    ['', [1, 0, 0, 1, 0, 0]],
    ['none', [1, 0, 0, 1, 0, 0]],
  ])('%s', (text, expected) => {
    expect(rounded(text)).toEqual(expected);
  });

  test('the last of a list acts first', () => {
    expect(rounded('translate(10 0) scale(2)')).toEqual([2, 0, 0, 2, 10, 0]);
    expect(rounded('scale(2) translate(10 0)')).toEqual([2, 0, 0, 2, 20, 0]);
  });

  test.each([
    'translate(10,20)scale(2)',
    'translate(10 20) scale(2)',
    ' translate (10 , 20),scale(2) ',
    'translate(10\n20)\t,\n scale( 2 )',
    'translate(1e1+20)scale(2)',
  ])('separators: %j', (text) => {
    expect(rounded(text)).toEqual([2, 0, 0, 2, 10, 20]);
  });

  test('whole quarter turns are exact', () => {
    expect(readTransformList('rotate(90)')).toEqual([0, 1, -1, 0, 0, 0]);
    expect(readTransformList('rotate(270)')).toEqual([0, -1, 1, 0, 0, 0]);
  });

  test.each([
    'translate()',
    'translate(1 2 3)',
    'translate(1,,2)',
    'translate(1 2,)',
    'translate(1 2) , , scale(1)',
    'translate(1 2),',
    'rotate(1 2)',
    'matrix(1 2 3 4 5)',
    'matrix(1 2 3 4 5 6 7)',
    'turn(1)',
    'translate 1 2',
    'translate(1 2',
    'scale(1e999)',
    'scale(1e200) scale(1e200)',
    'translate(50%)',
    // Of the grammar of CSS, which the attribute does not have.
    'rotate(0.5turn)',
    'translate(1px, 2px)',
    'ROTATE(90)',
    'translateX(3)',
  ])('%j is wrong', (text) => {
    expect(readTransformList(text)).toBeNull();
  });
});

test('a list is the product of its parts', () => {
  const part = fc
    .tuple(fc.constantFrom('translate', 'scale', 'rotate', 'skewX'), fc.integer({ min: -80, max: 80 }))
    .map(([name, n]) => `${name}(${n})`);
  fc.assert(
    fc.property(fc.array(part, { maxLength: 6 }), (parts) => {
      const product = parts.map((p) => readTransformList(p)!).reduce(multiply, IDENTITY);
      expect(readTransformList(parts.join(' '))).toEqual(product);
    }),
  );
});
