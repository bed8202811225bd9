import { expect, test } from 'vitest';
import {
  cubeRoot,
  power563Over256,
  powerFiveTwelfths,
  powerNineFifths,
  powerTwelveFifths,
  powerTwentyNinths,
} from '../../../../src/core/drawing/style/fractionalPowers.ts';

// Held against the engine's own, whose last digits are not the same everywhere.
test.each([
  ['cube root', cubeRoot, Math.cbrt],
  ['to the 12/5', powerTwelveFifths, (x: number) => x ** 2.4],
  ['to the 5/12', powerFiveTwelfths, (x: number) => x ** (1 / 2.4)],
  ['to the 9/5', powerNineFifths, (x: number) => x ** 1.8],
  ['to the 20/9', powerTwentyNinths, (x: number) => x ** (20 / 9)],
  ['to the 563/256', power563Over256, (x: number) => x ** (563 / 256)],
])('%s', (_, ours, theirs) => {
  for (let x = 0; x <= 3; x += 1 / 64) expect(ours(x)).toBeCloseTo(theirs(x), 12);
});

test('the cube root of a negative number is negative', () => {
  expect(cubeRoot(-27)).toBe(-3);
});
