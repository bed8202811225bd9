import { describe, expect, test } from 'vitest';
import { planPens } from '../../../../src/core/drawing/pens.ts';
import { type ReadOptions, readDrawing } from '../../../../src/core/drawing/readDrawing.ts';
import { segmentLength } from '../../../../src/core/geometry/length.ts';

const MM = 'width="100mm" height="50mm" viewBox="0 0 100 50"';

function read(body: string, options: ReadOptions = {}) {
  return readDrawing(
    `<svg xmlns="http://www.w3.org/2000/svg" ${MM} fill="none" stroke="black">${body}</svg>`,
    options,
  );
}

/** Lengths of the strokes, mm, to a nanometre. */
function lengths({ strokes }: ReturnType<typeof read>): number[] {
  return Array.from({ length: strokes.count }, (_, s) => {
    let sum = 0;
    for (let i = strokes.first[s]; i < strokes.first[s + 1]; i++) sum += segmentLength(strokes.segments, i);
    return Math.round(sum * 1e6) / 1e6;
  });
}

describe('dashed lines', () => {
  test('are cut in user units, before the transform', () => {
    expect(lengths(read('<path d="M0 5H10" stroke-dasharray="3 2"/>'))).toEqual([3, 3]);
    const scaled = read('<g transform="scale(2 1)"><path d="M0 5H10M0 0V10" stroke-dasharray="3 2"/></g>');
    expect(lengths(scaled)).toEqual([6, 6, 3, 3]);
  });

  test('begin anew at every sub-path; an odd list is taken twice', () => {
    expect(lengths(read('<path d="M0 5H10M0 9H4" stroke-dasharray="3 2"/>'))).toEqual([3, 3, 3]);
    expect(lengths(read('<path d="M0 5H20" stroke-dasharray="4 1 2"/>'))).toEqual([4, 2, 1, 4, 1]);
  });

  // CSS Values and Units Module Level 4, §10: calc() stands wherever a length may.
  test.each([
    ['3px calc(1px + 1px)', [3, 3]],
    ['calc( 1px*3 ), calc(4px / 2)', [3, 3]],
    ['max(3px, 1px),2', [3, 3]],
  ])('may be sums: %s', (array, expected) => {
    const drawing = read(`<path d="M0 5H10" style="stroke-dasharray:${array}"/>`);
    expect(lengths(drawing)).toEqual(expected);
    expect(drawing.findings).toEqual([]);
  });

  test.each(['3px,,2px', 'calc(3px),', ', calc(3px)', 'calc(3px) calc(2)px'])(
    'are drawn solid where the list is wrong, and that is said: %s',
    (array) => {
      const drawing = read(`<path d="M0 5H10" style="stroke-dasharray:${array}"/>`);
      expect(lengths(drawing)).toEqual([10]);
      expect(drawing.findings.map(({ code }) => code)).toEqual(['style-value-not-read']);
    },
  );

  test('follow percentages, em and the offset', () => {
    // A percentage is of the viewport's diagonal over √2: sqrt((100² + 50²) / 2) = 79.0569 (SVG 2, "Units").
    expect(lengths(read('<path d="M0 5H10" stroke-dasharray="10%"/>'))).toEqual([7.905694]);
    expect(lengths(read('<path d="M0 5H10" font-size="2" stroke-dasharray="1em 2"/>'))).toEqual([2, 2, 2]);
    const moved = '<path d="M0 5H10" stroke-dasharray="3 2" style="stroke-dashoffset:-1"/>';
    expect(lengths(read(moved))).toEqual([3, 3]);
  });

  test('pathLength stretches the pattern over the whole path', () => {
    expect(lengths(read('<path d="M0 5H10M0 9H10" pathLength="4" stroke-dasharray="1"/>'))).toEqual([5, 5]);
    expect(lengths(read('<path d="M0 5H10" pathLength="0" stroke-dasharray="1"/>'))).toEqual([10]);
    expect(lengths(read('<path d="M0 5H10" pathLength="-4" stroke-dasharray="6"/>'))).toEqual([6]);
  });

  test('with vector-effect the pattern is one of px, not of user units', () => {
    const body =
      '<g transform="scale(3)"><path d="M0 5H10" vector-effect="non-scaling-stroke" stroke-dasharray="48"/></g>';
    expect(lengths(read(body))).toEqual([12.7, 4.6]);
  });

  test('dashes of zero length are dots with round and square caps, nothing with butt ones', () => {
    const body = (cap: string) => `<path d="M0 5H10" stroke-linecap="${cap}" stroke-dasharray="0 4"/>`;
    const dots = read(body('round'));
    expect([...dots.strokes.dot]).toEqual([1, 1, 1]);
    expect(read(body('square')).strokes.count).toBe(3);
    expect(read(body('butt')).strokes.count).toBe(0);
  });

  test('are drawn solid where asked, and that is said; a wrong or zero list is a solid line', () => {
    const solid = read('<path d="M0 5H10" stroke-dasharray="3 2"/>', { dashes: 'solid' });
    expect(lengths(solid)).toEqual([10]);
    expect(solid.findings.map((f) => f.code)).toEqual(['dashes-drawn-solid']);
    expect(lengths(read('<path d="M0 5H10" stroke-dasharray="0 0"/>'))).toEqual([10]);
    const wrong = read('<path d="M0 5H10" stroke-dasharray="3 -2"/>');
    expect(lengths(wrong)).toEqual([10]);
    expect(wrong.findings.map((f) => f.code)).toEqual(['length-error']);
  });

  test('more dashes than can be drawn are refused, not tried', () => {
    const drawing = read('<path d="M0 5H10" stroke-dasharray="0.000001"/>');
    expect(lengths(drawing)).toEqual([10]);
    expect(drawing.findings.map((f) => [f.code, f.values.count])).toEqual([['too-many-dashes', 1]]);
  });

  test('have a pen of their own beside solid lines of the same colour', () => {
    const body = '<path d="M0 5H10"/><path d="M0 9H10" stroke-dasharray="3 2"/><path d="M0 7H10"/>';
    expect(planPens(read(body), 'colour').pens.map((pen) => pen.name)).toEqual(['#000000', '#000000 dashed']);
    expect(planPens(read(body, { dashes: 'solid' }), 'colour').pens.length).toBe(2);
    expect(planPens(read(body), 'one').pens.length).toBe(1);
  });
});
