import { describe, expect, test } from 'vitest';
import { readAspectRatio, readViewBox, viewBoxTransform } from '../../../../src/core/drawing/page/viewBox.ts';
import vectors from '../../../support/vectors.json' with { type: 'json' };

// Worked from SVG 2 §8.2, "Computing the equivalent transform of an SVG viewport".
test.each(vectors.preserveAspectRatio)('$align $mode: viewBox $viewBox in $viewport', (worked) => {
  const [x, y, width, height] = worked.viewBox;
  const [left, top, w, h] = worked.viewport;
  const aspect = readAspectRatio(`${worked.align} ${worked.mode}`);
  expect(aspect).not.toBeNull();
  const map = viewBoxTransform({ x, y, width, height }, { x: left, y: top, width: w, height: h }, aspect!);
  const [sx, sy, tx, ty] = worked.scaleTranslate;
  for (const [i, expected] of [sx, 0, 0, sy, tx, ty].entries()) expect(map[i]).toBeCloseTo(expected, 7);
});

describe('preserveAspectRatio', () => {
  test.each([
    ['xMinYMax', { alignX: 0, alignY: 1, mode: 'meet' }],
    [' xMaxYMid  slice ', { alignX: 1, alignY: 0.5, mode: 'slice' }],
    ['none', { alignX: 0, alignY: 0, mode: 'none' }],
    ['none slice', { alignX: 0, alignY: 0, mode: 'none' }],
  ])('%j', (text, expected) => {
    expect(readAspectRatio(text)).toEqual(expected);
  });

  test.each(['', 'xmidymid', 'xMidYMid meet slice', 'meet', 'xMid'])('%j is wrong', (text) => {
    expect(readAspectRatio(text)).toBeNull();
  });
});

describe('viewBox', () => {
  test.each(['0 0 10 20', '0,0,10,20', ' 0 , 0\n10\t20 ', '0-0+10 2e1'])('%j', (text) => {
    expect(readViewBox(text)).toEqual({ x: 0, y: 0, width: 10, height: 20 });
  });

  // SVG 2, "The viewBox attribute": a negative width or height is an error.
  test.each(['', '0 0 10', '0 0 10 20 30', '0 0 -10 20', '0 0 10 -1', '0 0 10px 20', '0 0 1e999 1', 'none'])(
    '%j is wrong',
    (text) => {
      expect(readViewBox(text)).toBeNull();
    },
  );
});
