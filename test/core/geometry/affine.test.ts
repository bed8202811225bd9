import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  type Affine,
  applyX,
  applyY,
  determinant,
  IDENTITY,
  multiply,
  rotation,
  scaling,
  translation,
} from '../../../src/core/geometry/affine.ts';

const number = fc.integer({ min: -100, max: 100 });
const anAffine = fc.tuple(number, number, number, number, number, number) as fc.Arbitrary<Affine>;

describe('multiply', () => {
  test('maps by the second first, exactly on integers', () => {
    fc.assert(
      fc.property(anAffine, anAffine, number, number, (m, n, x, y) => {
        const both = multiply(m, n);
        const nx = applyX(n, x, y);
        const ny = applyY(n, x, y);
        return (
          applyX(both, x, y) === applyX(m, nx, ny) &&
          applyY(both, x, y) === applyY(m, nx, ny) &&
          determinant(both) === determinant(m) * determinant(n)
        );
      }),
    );
  });

  test('the identity changes nothing', () => {
    fc.assert(
      fc.property(anAffine, (m) => {
        expect(multiply(m, IDENTITY)).toEqual(multiply(IDENTITY, m));
        expect(multiply(m, IDENTITY).map((v) => v + 0)).toEqual(m.map((v) => v + 0));
      }),
    );
  });

  // SVG 1.1, section 7.4, nested transformations: translate(50,90), rotate(-45), translate(130,160)
  // make [.707 -.707 .707 .707 255.03 111.21] (from memory; the standard rounded on the way).
  test("the standard's nested transformation", () => {
    const m = multiply(multiply(translation(50, 90), rotation(-Math.PI / 4)), translation(130, 160));
    [Math.SQRT1_2, -Math.SQRT1_2, Math.SQRT1_2, Math.SQRT1_2].forEach((want, k) => {
      expect(m[k]).toBeCloseTo(want, 15);
    });
    expect(m[4]).toBeCloseTo(255.03, 1);
    expect(m[5]).toBeCloseTo(111.21, 2);
  });
});

test('scaling scales areas by the product, a mirror negatively', () => {
  expect(determinant(scaling(2, 3))).toBe(6);
  expect(determinant(scaling(-1, 1))).toBe(-1);
  expect(determinant(rotation(1))).toBeCloseTo(1, 15);
});

// SVG 2, coords: a positive angle turns the x axis towards the y axis.
test('rotation turns x towards y', () => {
  const m = rotation(Math.PI / 6);
  expect(applyX(m, 2, 0)).toBeCloseTo(Math.sqrt(3), 15);
  expect(applyY(m, 2, 0)).toBeCloseTo(1, 15);
});
