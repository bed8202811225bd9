import { expect, test } from 'vitest';
import { readDrawing } from '../../../../src/core/drawing/readDrawing.ts';
import { sentence } from '../../../../src/core/report/sentences.ts';
import { IN_MM } from '../../../support/readStrokes.ts';

const SHEETS = [`.a{stroke:red}`, `${' '.repeat(200)}.a{stroke:lime}`, `.a{stroke:blue}`];
const TEXT = `<svg ${IN_MM}>${SHEETS.map((sheet) => `<style>${sheet}</style>`).join('\n')}<path class="a" d="M1 1h5"/></svg>`;

test('a style sheet past the limit of characters is left aside whole, the limit and its place told', () => {
  expect(readDrawing(TEXT).colours).toEqual(['#0000ff']);
  const drawing = readDrawing(TEXT, { limits: { styleCharacters: 100 } });
  expect(drawing.colours).toEqual(['#ff0000']);
  const [finding, ...others] = drawing.findings;
  expect(others).toEqual([]);
  expect(finding).toMatchObject({
    code: 'style-limit',
    severity: 'warning',
    place: { element: 'style', line: 2 },
    values: { limit: 'styleCharacters', value: 100, count: 2 },
  });
  expect(sentence(finding)).toBe(
    'style sheets went past the limit styleCharacters (100); --limit styleCharacters=N lifts it: the rest of their rules was left aside',
  );
});

test('the limit lifts', () => {
  const drawing = readDrawing(TEXT, { limits: { styleCharacters: 1000 } });
  expect([drawing.colours, drawing.findings]).toEqual([['#0000ff'], []]);
});
