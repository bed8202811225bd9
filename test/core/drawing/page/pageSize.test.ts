import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../../../src/core/drawing/readDrawing.ts';
import { codesOf, findingOf, textsOf } from '../../../support/readStrokes.ts';

const NS = 'xmlns="http://www.w3.org/2000/svg"';
const LINE = '<path d="M10 20H30" stroke="black" fill="none"/>';

function page(attributes: string, pxPerInch?: number) {
  return readDrawing(`<svg ${NS} ${attributes}>${LINE}</svg>`, pxPerInch === undefined ? {} : { pxPerInch });
}

function sizeOf(attributes: string, pxPerInch?: number): number[] {
  const { widthMm, heightMm } = page(attributes, pxPerInch);
  return [widthMm, heightMm].map((v) => Math.round(v * 1e9) / 1e9);
}

describe('the page', () => {
  // CSS Values and Units Level 3, §5.2: 1in = 2.54cm = 25.4mm = 101.6Q = 72pt = 6pc = 96px.
  test.each([
    ['96', '192px'],
    ['1in', '2in'],
    ['25.4mm', '50.8mm'],
    ['2.54cm', '5.08cm'],
    ['101.6Q', '203.2q'],
    ['72pt', '144pt'],
    ['6pc', '12PC'],
  ])('width %s and height %s are one inch and two', (width, height) => {
    expect(sizeOf(`width="${width}" height="${height}" viewBox="0 0 1 2"`)).toEqual([25.4, 50.8]);
    expect(codesOf(page(`width="${width}" height="${height}" viewBox="0 0 1 2"`))).not.toContain(
      'size-guessed',
    );
  });

  // CSS Values and Units Level 3, §5.1.1: em is the font size of the element, rem that of the root.
  test('a size in units of the font is of the font of the root', () => {
    expect(sizeOf('width="9.6em" height="19.2rem" font-size="10" viewBox="0 0 1 2"')).toEqual([25.4, 50.8]);
    expect(sizeOf('width="6em" height="12rem" viewBox="0 0 1 2"')).toEqual([25.4, 50.8]);
  });

  test('a viewBox in mm gives coordinates exactly as they are written', () => {
    expect(textsOf(page('width="210mm" height="297mm" viewBox="0 0 210 297"'), 15)).toEqual([
      '10,20 L 30,20',
    ]);
  });

  test('without a viewBox a unit is 1/96 inch', () => {
    expect(textsOf(page('width="96" height="96"'))).toEqual(['2.645833,5.291667 L 7.9375,5.291667']);
  });

  test('sides that differ from the viewBox: in the middle, as xMidYMid meet', () => {
    // Scale 1 by the height; (200 − 100)/2 mm left free at each side.
    expect(textsOf(page('width="200mm" height="100mm" viewBox="0 0 100 100"'))).toEqual(['60,20 L 80,20']);
    expect(
      textsOf(page('width="200mm" height="100mm" viewBox="0 0 100 100" preserveAspectRatio="none"')),
    ).toEqual(['20,20 L 60,20']);
  });

  test('one side given: the other keeps the viewBox’s proportions', () => {
    expect(sizeOf('width="50mm" viewBox="0 0 100 30"')).toEqual([50, 15]);
    expect(sizeOf('height="auto" width="50mm" viewBox="0 0 100 30"')).toEqual([50, 15]);
    expect(sizeOf('height="15mm" viewBox="0 0 100 30"')).toEqual([50, 15]);
    expect(codesOf(page('width="50mm" viewBox="0 0 100 30"'))).toEqual([]);
  });

  test('style over attribute', () => {
    expect(sizeOf('width="1mm" height="1mm" style="width:5mm;height:4mm" viewBox="0 0 1 1"')).toEqual([5, 4]);
  });
});

describe('a page that is not said is guessed, and that is said', () => {
  test.each([
    ['viewBox="0 0 96 48"', [25.4, 12.7]],
    ['width="100%" height="100%" viewBox="0 0 96 48"', [25.4, 12.7]],
    ['width="50%" height="50%" viewBox="0 0 96 48"', [12.7, 6.35]],
    ['width="0" height="0" viewBox="0 0 96 48"', [25.4, 12.7]],
    ['width="-3" height="x" viewBox="0 0 96 48"', [25.4, 12.7]],
    ['width="1e999" height="1e-99" viewBox="0 0 96 48"', [25.4, 12.7]],
  ])('from the viewBox: %s', (attributes, expected) => {
    expect(sizeOf(attributes)).toEqual(expected);
    const [widthMm, heightMm] = expected;
    expect(findingOf(page(attributes), 'size-guessed')).toMatchObject({
      severity: 'warning',
      values: { widthMm, heightMm, basis: 'viewBox' },
    });
  });

  test.each([
    ['', [30 * (25.4 / 96), 20 * (25.4 / 96)]],
    ['width="100%" height="100%"', [30 * (25.4 / 96), 20 * (25.4 / 96)]],
    ['width="96"', [25.4, 20 * (25.4 / 96)]],
  ])('from what is drawn: %s', (attributes, expected) => {
    expect(sizeOf(attributes)).toEqual(expected.map((v) => Math.round(v * 1e9) / 1e9));
    expect(findingOf(page(attributes), 'size-guessed').values.basis).toBe('extent');
  });

  test('an empty drawing has the default size of CSS, 300 × 150 px', () => {
    const drawing = readDrawing(`<svg ${NS}/>`);
    expect(drawing.widthMm).toBeCloseTo(79.375, 12);
    expect(drawing.heightMm).toBeCloseTo(39.6875, 12);
  });
});

test.each([
  ['width="100,5mm" height="50mm" viewBox="0 0 96 48"', { attribute: 'width', found: '100,5mm' }],
  ['width="50mm" height="-3" viewBox="0 0 96 48"', { attribute: 'height', found: '-3' }],
  ['width="4 furlongs" viewBox="0 0 96 48"', { attribute: 'width', found: '4 furlongs' }],
])('a size that is none is told: %s', (attributes, values) => {
  expect(findingOf(page(attributes), 'length-error').values).toEqual({ ...values, count: 1 });
});

test.each(['width="auto" height="100%"', 'width="0" height="5mm"', 'width="" height="2em"'])(
  'a size that says nothing is no error: %s',
  (attributes) => {
    expect(codesOf(page(`${attributes} viewBox="0 0 96 48"`))).not.toContain('length-error');
  },
);

describe('pixels per inch', () => {
  test('an older editor’s 90 changes px, not the page in mm', () => {
    expect(sizeOf('width="90" height="45"', 90)).toEqual([25.4, 12.7]);
    expect(sizeOf('width="210mm" height="297mm"', 90)).toEqual([210, 297]);
    expect(textsOf(page('width="210mm" height="297mm"', 90))).toEqual([
      '2.822222,5.644444 L 8.466667,5.644444',
    ]);
  });

  test('a physical size without a viewBox leaves them open, and that is said', () => {
    const drawing = page('width="210mm" height="297mm"');
    expect(findingOf(drawing, 'user-unit-assumed').values.pxPerInch).toBe(96);
    expect(codesOf(page('width="210mm" height="297mm"', 96))).not.toContain('user-unit-assumed');
    expect(codesOf(page('width="210" height="297"'))).not.toContain('user-unit-assumed');
  });

  test('nonsense is a mistake of the caller', () => {
    expect(() => page('', 0)).toThrow(RangeError);
    expect(() => page('', Number.NaN)).toThrow(RangeError);
  });
});

describe('a viewBox', () => {
  // SVG 2, "The viewBox attribute": zero disables rendering, a negative side is an error.
  test('without area draws nothing', () => {
    const drawing = page('width="10mm" height="10mm" viewBox="0 0 0 5"');
    expect(drawing.strokes.count).toBe(0);
    expect(codesOf(drawing)).toContain('viewbox-empty');
  });

  test('that is wrong is left aside', () => {
    const drawing = page('width="96" height="96" viewBox="0 0 -5 5"');
    expect(textsOf(drawing)).toEqual(['2.645833,5.291667 L 7.9375,5.291667']);
    expect(codesOf(drawing)).toContain('viewbox-error');
  });
});

// CSS Transforms Module Level 1, "transform-origin": the middle of the box for the outermost svg.
test('a transform on the root acts about the middle of the page', () => {
  expect(textsOf(page('width="100mm" height="100mm" viewBox="0 0 100 100" transform="rotate(180)"'))).toEqual(
    ['90,80 L 70,80'],
  );
});
