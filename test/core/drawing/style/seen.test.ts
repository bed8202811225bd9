import { describe, expect, test } from 'vitest';
import { codesOf, readBody } from '../../../support/readStrokes.ts';

/** A stroke of 255 steps of opacity (an 8-bit channel) is nothing below half a step: 1/510 = 0.00196. */
describe('what shows on no screen is not drawn', () => {
  test.each([
    'stroke="rgba(192,192,192,0.0001)"',
    'stroke="rgb(1 2 3 / 0.1%)"',
    'stroke="red" stroke-opacity="0.0019"',
    'stroke="red" opacity="1e-6"',
    'stroke="red" style="opacity:0.1%"',
    'stroke="currentColor" color="#ff000000"',
    'stroke="currentColor" color="rgba(255,0,0,0.001)"',
  ])('%s', (attributes) => {
    const drawing = readBody(`<path fill="none" ${attributes} d="M1 1h9"/>`);
    expect(drawing.strokes.count).toBe(0);
    expect(codesOf(drawing)).toEqual(['invisible']);
  });

  test.each([
    'stroke="rgba(9,9,9,0.002)"',
    'stroke="red" stroke-opacity="0.01"',
    'stroke="red" opacity="1%"',
  ])('what just shows is drawn in full: %s', (attributes) => {
    const drawing = readBody(`<path fill="none" ${attributes} d="M1 1h9"/>`);
    expect([drawing.strokes.count, codesOf(drawing)]).toEqual([1, []]);
  });
});
