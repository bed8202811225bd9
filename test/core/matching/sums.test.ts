import { expect, test } from 'vitest';
import { DoubleSum, IntegerSum, roundedDown } from '../../../src/core/matching/sums.ts';
import { createRandom } from '../../../src/core/structures/random.ts';

test('integers add up exactly beyond 2⁵³, negative ones too', () => {
  const random = createRandom(1);
  const sum = new IntegerSum();
  let exact = 0n;
  for (let i = 0; i < 5000; i++) {
    const value = Math.floor((random() - 0.3) * 2 ** 51);
    sum.add(value);
    exact += BigInt(value);
  }
  expect(exact > 2n ** 53n).toBe(true);
  expect(sum.value()).toBe(exact);
});

test('four million integers of 32 bits add up exactly', () => {
  const sum = new IntegerSum();
  for (let i = 0; i < 2 ** 22; i++) sum.add(2 ** 32 - 1);
  expect(sum.value()).toBe(2n ** 22n * (2n ** 32n - 1n));
});

test('rounding down gives the greatest double not above an integer', () => {
  expect(roundedDown(0n)).toBe(0);
  expect(roundedDown(2n ** 53n - 1n)).toBe(2 ** 53 - 1);
  expect(roundedDown(2n ** 60n - 1n)).toBe(2 ** 60 - 2 ** 7);
  expect(roundedDown(2n ** 60n + 1n)).toBe(2 ** 60);
  expect(roundedDown(-(2n ** 60n) - 1n)).toBe(-(2 ** 60) - 2 ** 8);
  expect(roundedDown(-(2n ** 60n) + 1n)).toBe(-(2 ** 60));
});

test('a sum of doubles is rounded once', () => {
  // Ten tenths: the exact sum of the doubles lies within half a unit in the last place of 1.
  const tenths = new DoubleSum();
  for (let i = 0; i < 10; i++) tenths.add(0.1);
  expect(tenths.value()).toBe(1);
  const large = new DoubleSum();
  for (const value of [1e16, 1, 1, 1, 1, -1e16]) large.add(value);
  expect(large.value()).toBe(4);
});
