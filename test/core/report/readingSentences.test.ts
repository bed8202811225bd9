import { expect, test } from 'vitest';
import { readDrawing } from '../../../src/core/drawing/readDrawing.ts';
import { sentence } from '../../../src/core/report/sentences.ts';
import { IN_MM } from '../../support/readStrokes.ts';

/** What a person is told of a drawing, worst first as it was found. */
function told(text: string): string[] {
  return readDrawing(text).findings.map((finding) => sentence(finding));
}

const svg = (body: string) => `<svg ${IN_MM} stroke="black" fill="none">${body}</svg>`;

test.each([
  ['<svg width=4/>', 'the attribute "width" has a value without quotes'],
  ['<svg wide/>', 'the attribute "wide" has no value'],
  ['<svg a="1>\n<g/></svg>', 'the attribute "a" holds a "<": most often its closing quote is missing'],
  ['<svg>\n <path>\n</svg>', '</svg> stands where </path> was due, opened in line 2, column 2'],
  [
    '<svg>\n <path d="M0',
    'the file is cut off: it ends inside an attribute of the tag that begins in line 2, column 2, with 1 element still open',
  ],
  [
    '<svg>\n <g>\n',
    'the file is cut off: it ends inside an element that begins in line 2, column 2, with 2 elements still open',
  ],
])('%j says what is wrong with it', (text, message) => {
  expect(told(text)[0]).toBe(message);
});

test('what stands in no name space is told apart from a root that does', () => {
  const prefixed = `<s:svg xmlns:s="http://www.w3.org/2000/svg" width="9mm" height="9mm" viewBox="0 0 9 9"><path d="M1 1h1" stroke="red"/></s:svg>`;
  expect(told(prefixed)).toEqual([
    '<path> is in no name space: read as SVG all the same; a browser does not show it',
  ]);
  const plain = '<svg width="9mm" height="9mm" viewBox="0 0 9 9"><path d="M1 1h1" stroke="red"/></svg>';
  expect(told(plain)[0]).toMatch(/^the root does not name the SVG name space \(xmlns="/);
});

test('a corner of negative radius is ignored, and the shape is not said to be left out', () => {
  const drawing = readDrawing(svg('<rect width="9" height="9" rx="-3" ry="2"/>'));
  expect(drawing.strokes.count).toBe(1);
  expect(drawing.findings.map(sentence)).toEqual(['rx="-3" may not be negative: taken as not given']);
});
