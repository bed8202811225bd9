import { describe, expect, test } from 'vitest';
import type { Drawing } from '../../../../src/core/drawing/drawing.ts';
import { type ReadOptions, readDrawing } from '../../../../src/core/drawing/readDrawing.ts';
import { segmentLength } from '../../../../src/core/geometry/length.ts';

const page = (body: string, attributes = '') =>
  `<svg xmlns="http://www.w3.org/2000/svg" width="100mm" height="80mm" viewBox="0 0 100 80" fill="none" stroke="black" ${attributes}>${body}</svg>`;
const CLIP = '<clipPath id="c"><rect x="20" y="20" width="50" height="40"/></clipPath>';

const read = (body: string, options: ReadOptions = {}): Drawing => readDrawing(page(body), options);

const found = (drawing: Drawing, code: string) => drawing.findings.find((one) => one.code === code);

/** Start and end of each stroke. */
function ends({ strokes }: Drawing): [number, number, number, number][] {
  const { data, offset } = strokes.segments;
  return Array.from({ length: strokes.count }, (_, s) => {
    const from = offset[strokes.first[s]];
    const to = offset[strokes.first[s + 1] - 1];
    return [data[from], data[from + 1], data[to + 2], data[to + 3]];
  });
}

const lengthOf = ({ strokes }: Drawing): number =>
  Array.from({ length: strokes.segments.count }, (_, i) => segmentLength(strokes.segments, i)).reduce(
    (a, b) => a + b,
    0,
  );

describe('what is cut is said', () => {
  test('with how many strokes and how much of them, and where', () => {
    const drawing = read(
      `${CLIP}<g clip-path="url(#c)"><path d="M0 30H100M0 40H100"/><path d="M30 30H40"/><path d="M1 1h5"/></g>`,
    );
    expect(ends(drawing)).toEqual([
      [20, 30, 70, 30],
      [20, 40, 70, 40],
      [30, 30, 40, 30],
    ]);
    expect(found(drawing, 'clipped')).toMatchObject({
      severity: 'note',
      values: { count: 3, clippedMm: 105 },
    });
    expect(found(drawing, 'clipped')?.places).toHaveLength(2);
    expect(found(drawing, 'nothing-to-draw')).toBeUndefined();
    expect(found(drawing, 'page-edge-cut')).toBeUndefined();
  });

  test('at the edge of the page for itself', () => {
    const drawing = read('<path d="M90 10H120V70"/><path d="M200 10H300"/><path d="M1 1h5"/>');
    expect(ends(drawing)).toEqual([
      [90, 10, 100, 10],
      [1, 1, 6, 1],
    ]);
    expect(found(drawing, 'page-edge-cut')).toMatchObject({
      severity: 'warning',
      values: { count: 2, clippedMm: 180 },
    });
    expect(found(drawing, 'clipped')).toBeUndefined();
  });

  test('a clip path first, then the page: nothing is counted twice', () => {
    const drawing = read(
      `<clipPath id="c"><rect x="-20" y="20" width="50" height="40"/></clipPath><path clip-path="url(#c)" d="M-30 30H60"/>`,
    );
    expect(ends(drawing)).toEqual([[0, 30, 30, 30]]);
    expect(found(drawing, 'clipped')?.values.clippedMm).toBe(40);
    expect(found(drawing, 'page-edge-cut')?.values.clippedMm).toBe(20);
  });
});

describe('what is asked for', () => {
  const BODY = `${CLIP}<path clip-path="url(#c)" d="M-10 30H110"/><svg x="10" y="10" width="9" height="9"><path d="M0 5H40"/></svg>`;

  test('clips ignored: only the page cuts', () => {
    expect(ends(read(BODY, { clips: 'ignore' }))).toEqual([
      [0, 30, 100, 30],
      [10, 15, 50, 15],
    ]);
  });

  test('the edge of the page ignored: only clips cut', () => {
    const drawing = read(`${BODY}<path d="M-5 5H5"/>`, { pageEdge: 'ignore' });
    expect(ends(drawing)).toEqual([
      [20, 30, 70, 30],
      [10, 15, 19, 15],
      [-5, 5, 5, 5],
    ]);
  });

  test('both ignored: nothing cuts, and nothing is said', () => {
    const drawing = read(BODY, { clips: 'ignore', pageEdge: 'ignore' });
    expect(ends(drawing)).toEqual([
      [-10, 30, 110, 30],
      [10, 15, 50, 15],
    ]);
    expect(drawing.findings).toEqual([]);
  });
});

describe('what is kept', () => {
  test('what lies inside is left bit for bit, what lies on the edge too', () => {
    const inside =
      '<path d="M30 30C35 20 60 55 69.3 58.7A29 24 20 0 1 33 44z"/><circle cx="40" cy="40" r="15"/><rect x="20" y="20" width="50" height="40"/>';
    const clipped = read(`${CLIP}<g clip-path="url(#c)">${inside}</g>`);
    const whole = read(inside);
    expect(clipped.strokes.segments).toEqual(whole.strokes.segments);
    expect([...clipped.strokes.closed]).toEqual([1, 1, 1]);
    expect(clipped.findings).toEqual([]);
  });

  test('a frame on the edge of the page is whole, one off by what four decimals lose too', () => {
    const frame = (w: string, h: string) =>
      readDrawing(
        `<svg xmlns="http://www.w3.org/2000/svg" width="60.3333mm" height="40.6667mm" viewBox="0 0 60.3333 40.6667" fill="none" stroke="#000"><path d="M0 0H${w}V${h}H0z"/></svg>`,
      );
    for (const drawing of [frame('60.3333', '40.6667'), frame('60.33335', '40.66675')]) {
      expect(drawing.strokes.count).toBe(1);
      expect(drawing.strokes.closed[0]).toBe(1);
      expect(drawing.findings).toEqual([]);
    }
  });

  test('a closed line is open once it is cut, and its piece across the start is one', () => {
    const drawing = read(`${CLIP}<path clip-path="url(#c)" d="M40 30H90V50H10V30z"/>`);
    expect([...drawing.strokes.closed]).toEqual([0, 0]);
    expect(ends(drawing)).toEqual([
      [70, 50, 20, 50],
      [20, 30, 70, 30],
    ]);
  });

  test('dots inside, not outside', () => {
    const drawing = read(
      `${CLIP}<path stroke-linecap="round" clip-path="url(#c)" d="M30 30zM10 10zM20 40z"/>`,
    );
    expect(ends(drawing)).toEqual([
      [30, 30, 30, 30],
      [20, 40, 20, 40],
    ]);
    expect(found(drawing, 'clipped')?.values).toEqual({ count: 1, clippedMm: 0 });
  });

  test('dashes are cut first, then clipped: the pattern does not start anew at the edge', () => {
    const drawing = read(`${CLIP}<path stroke-dasharray="6" clip-path="url(#c)" d="M7 30H80"/>`);
    expect(ends(drawing).map(([x0, , x1]) => [x0, x1])).toEqual([
      [20, 25],
      [31, 37],
      [43, 49],
      [55, 61],
      [67, 70],
    ]);
  });

  test('arcs stay arcs, cubics cubics; no end is off the edge', () => {
    const drawing = read(
      `<clipPath id="c"><circle cx="50" cy="40" r="30"/></clipPath><g clip-path="url(#c)"><ellipse cx="50" cy="40" rx="45" ry="12"/><path d="M5 10C50 90 50 -20 95 70"/></g>`,
    );
    expect(new Set(drawing.strokes.segments.kind)).toEqual(new Set([1, 2]));
    for (const [x0, y0, x1, y1] of ends(drawing)) {
      expect(Math.hypot(x0 - 50, y0 - 40)).toBeCloseTo(30, 9);
      expect(Math.hypot(x1 - 50, y1 - 40)).toBeCloseTo(30, 9);
    }
  });

  test('a clip and its complement make up the whole', () => {
    const shape = 'M50 5L90 70 10 30 90 30 10 70z';
    const lines = '<path d="M3 3C140 20 -40 60 97 77M3 40L97 44"/><ellipse cx="50" cy="40" rx="40" ry="20"/>';
    const by = (d: string) =>
      lengthOf(
        read(
          `<clipPath id="c"><path clip-rule="evenodd" d="${d}"/></clipPath><g clip-path="url(#c)">${lines}</g>`,
        ),
      );
    expect(by(shape) + by(`M-9-9H109V89H-9z${shape}`)).toBeCloseTo(lengthOf(read(lines)), 6);
  });
});

describe('what cannot be evaluated is drawn whole, with a warning', () => {
  test.each([
    [
      'text in a clip path',
      '<clipPath id="c"><text y="20">A</text><rect width="9" height="9"/></clipPath>',
      'url(#c)',
    ],
    ['a clip path of another file', '', 'url(other.svg#c)'],
    ['parts of the box of a text', '', 'inset(10%)'],
    ['a shape that is not read here', '', 'polygon(0 0, calc(1 +) 2)'],
  ])('%s', (_, before, clip) => {
    const drawing = read(`${before}<g clip-path="${clip}"><path d="M0 30H90"/><text>A</text></g>`);
    expect(ends(drawing)).toEqual([[0, 30, 90, 30]]);
    expect(found(drawing, 'clip-not-applied')).toMatchObject({ severity: 'warning', values: { clip } });
  });

  test('a mask', () => {
    const drawing = read(
      '<mask id="m"><rect width="9" height="9"/></mask><path mask="url(#m)" d="M0 30H90"/>',
    );
    expect(ends(drawing)).toEqual([[0, 30, 90, 30]]);
    expect(found(drawing, 'mask-not-applied')).toBeDefined();
  });
});

describe('clips made to hurt', () => {
  const comb = Array.from({ length: 500 }, (_, k) => `${k / 6.5} ${k % 2 === 0 ? 0 : 80}`).join(' ');

  test('a comb of a clip over a hatch ends, cut or said to be whole', () => {
    const rows = Array.from({ length: 500 }, (_, k) => `M0 ${k / 6.5}H90`).join('');
    const drawing = read(
      `<clipPath id="c"><polygon points="${comb}"/></clipPath><path clip-path="url(#c)" d="${rows}"/>`,
    );
    expect(found(drawing, 'cut-limit') ?? found(drawing, 'clipped')).toBeDefined();
    expect(drawing.strokes.count).toBeGreaterThan(0);
  });

  test('clip paths that ask for one another a billion times', () => {
    const levels = Array.from(
      { length: 30 },
      (_, k) =>
        `<clipPath id="c${k}"><rect width="50" height="50" clip-path="url(#c${k + 1})"/><rect width="9" height="9" clip-path="url(#c${k + 1})"/></clipPath>`,
    );
    const drawing = read(
      `${levels.join('')}<clipPath id="c30"><rect width="40" height="40"/></clipPath><path clip-path="url(#c0)" d="M0 5H90"/>`,
    );
    expect(found(drawing, 'clip-not-applied') ?? found(drawing, 'clipped')).toBeDefined();
  });

  test('a chain of 20,000 clip paths', () => {
    const chain = Array.from(
      { length: 20_000 },
      (_, k) => `<clipPath id="c${k}" clip-path="url(#c${k + 1})"><rect width="50" height="50"/></clipPath>`,
    );
    const drawing = read(`${chain.join('')}<path clip-path="url(#c0)" d="M0 5H90"/>`);
    expect(found(drawing, 'clip-not-applied')).toBeDefined();
  });

  test('parts of the box of groups in groups, each clipped so', () => {
    const depth = 60;
    const drawing = read(
      `<clipPath id="c" clipPathUnits="objectBoundingBox"><rect width=".9" height=".9"/></clipPath>${'<g clip-path="url(#c)">'.repeat(depth)}<path d="M10 10H90V70"/>${'</g>'.repeat(depth)}`,
    );
    expect(found(drawing, 'clipped')).toBeDefined();
  });
});
