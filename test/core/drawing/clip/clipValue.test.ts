import { describe, expect, test } from 'vitest';
import { readClipValue } from '../../../../src/core/drawing/clip/clipValue.ts';
import { traceBasicShape } from '../../../../src/core/drawing/path/basicShape.ts';
import { OutlineSink } from '../../../../src/core/drawing/stroke/outlineSink.ts';
import { segmentLength } from '../../../../src/core/geometry/length.ts';

describe('a value of clip-path', () => {
  test.each([
    ['none', { kind: 'none' }],
    [' inherit ', { kind: 'none' }],
    ['url(#a)', { kind: 'reference', id: 'a' }],
    ['url( "#a b" )', { kind: 'reference', id: 'a b' }],
    ["URL('#a')", { kind: 'reference', id: 'a' }],
    ['url(other.svg#a)', { kind: 'elsewhere' }],
    ['url()', { kind: 'none' }],
    ['circle(3px)', { kind: 'shape', shape: { name: 'circle', text: '3px' }, box: 'stroke-box' }],
    ['fill-box inset( 1px )', { kind: 'shape', shape: { name: 'inset', text: '1px' }, box: 'fill-box' }],
    [
      'polygon(0 0, 1px 0, 1px 1px) view-box',
      { kind: 'shape', shape: { name: 'polygon', text: '0 0, 1px 0, 1px 1px' }, box: 'view-box' },
    ],
    ['fill-box', { kind: 'shape', shape: null, box: 'fill-box' }],
    ['circle(1px) circle(2px)', { kind: 'unknown' }],
    ['nonsense', { kind: 'unknown' }],
  ])('%s', (text, expected) => {
    expect(readClipValue(text)).toEqual(expected);
  });
});

/** In a box of 40 × 20 user units: box of the outline, its length, and the rule. */
function traced(name: string, text: string) {
  const sink = new OutlineSink([1, 0, 0, 1, 0, 0]);
  const context = { viewportWidth: 1000, viewportHeight: 1000, pxPerInch: 96 };
  const rule = traceBasicShape({ name, text }, 40, 20, context, 16, sink);
  const segments = sink.finish();
  let length = 0;
  for (let i = 0; i < segments.count; i++) length += segmentLength(segments, i);
  const { data, offset, kind } = segments;
  const starts = Array.from(offset, (o) => [data[o], data[o + 1]]);
  return { rule, length, starts, kinds: [...kind] };
}

describe('basic shapes (CSS Shapes Module Level 1)', () => {
  test('inset: one to four sides, percentages of the box', () => {
    expect(traced('inset', '2px 10% 25% 4px').starts).toEqual([
      [4, 2],
      [36, 2],
      [36, 15],
      [4, 15],
    ]);
    expect(traced('inset', '5px').length).toBe(80);
    expect(traced('inset', '0').length).toBe(120);
  });

  test('inset: round corners, too large ones scaled down', () => {
    const { length, kinds } = traced('inset', '0 round 5px');
    expect(length).toBeCloseTo(120 - 8 * 5 + 2 * Math.PI * 5, 9);
    expect(kinds).toEqual([2, 0, 2, 0, 2, 0, 2, 0]);
    expect(traced('inset', '0 round 100px').length).toBeCloseTo(2 * Math.PI * 10 + 40, 9);
  });

  test('inset: sides that pass one another leave nothing', () => {
    expect(traced('inset', '50% 30px 60% 30px').length).toBe(0);
  });

  test('circle: a share of the diagonal, the nearest side, the farthest', () => {
    // CSS Shapes: percentages are of √(width² + height²)/√2.
    expect(traced('circle', '10%').length).toBeCloseTo(2 * Math.PI * 0.1 * Math.sqrt((1600 + 400) / 2), 9);
    expect(traced('circle', '').length).toBeCloseTo(2 * Math.PI * 10, 9);
    expect(traced('circle', 'farthest-side at left 5px').length).toBeCloseTo(2 * Math.PI * 40, 9);
    expect(traced('circle', '3px at right bottom').starts[0]).toEqual([43, 20]);
    expect(traced('circle', '3px at bottom 25%').starts[0]).toEqual([13, 20]);
  });

  test('ellipse, polygon, path', () => {
    expect(traced('ellipse', '5px 25% at 50% 50%').starts).toEqual([
      [25, 10],
      [15, 10],
    ]);
    expect(traced('polygon', 'evenodd, 0 0, 100% 0, 4px 50%')).toMatchObject({
      rule: 'evenodd',
      starts: [
        [0, 0],
        [40, 0],
        [4, 10],
      ],
    });
    expect(traced('path', "evenodd, 'M1 1h4v5z'")).toMatchObject({ rule: 'evenodd', kinds: [0, 0, 0] });
  });

  test.each([
    ['inset', ''],
    ['inset', '1px 2px 3px 4px 5px'],
    ['inset', '1px round'],
    ['inset', '3'],
    ['circle', '3px 4px'],
    ['circle', '-3px'],
    ['ellipse', '3px'],
    ['polygon', '0 0, 1px'],
    ['path', 'M0 0'],
    ['path', "'M0 0 x'"],
    ['shape', ''],
  ])('%s(%s) is not read', (name, text) => {
    expect(traced(name, text).rule).toBeNull();
  });
});
