import { expect, test } from 'vitest';
import { PEN_ON_Z } from '../../../src/core/machine/penOnZ.ts';
import { flipY } from '../../../src/core/machine/placement.ts';

test('the built-in profile is plain data with sound figures', () => {
  expect(JSON.parse(JSON.stringify(PEN_ON_Z))).toEqual(PEN_ON_Z);
  for (const [field, value] of Object.entries(PEN_ON_Z)) {
    if (/Speed|acceleration|Deviation|snap|accuracy|decimals/.test(field)) expect(value).toBeGreaterThan(0);
  }
  expect(PEN_ON_Z.raisedHeightMm).toBeGreaterThan(PEN_ON_Z.downHeightMm);
  // What rounding may add must be small beside the accuracy.
  expect(10 ** -PEN_ON_Z.decimals).toBeLessThan(PEN_ON_Z.accuracyMm / 10);
});

test('the page is flipped about its height', () => {
  const page = { pageWidthMm: 210, pageHeightMm: 297 };
  expect(flipY(page, 297)).toBe(0);
  expect(flipY(page, 0)).toBe(297);
  expect(flipY(page, flipY(page, 12.5))).toBe(12.5);
});
