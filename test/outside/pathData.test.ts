import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../src/core/index.ts';
import { type BrowserStroke, CHROMIUM, drawInBrowser, useBrowser } from '../support/browser.ts';
import { pathText, pathTextWithSlip } from '../support/pathTexts.ts';
import { disagreement, WHOLE_LINES } from '../support/readerAndBrowser.ts';

/** Random path data, sound and with one character wrong, read as Chromium reads it. */
const COUNT = 1000;
const ALLOWED = { length: 1e-5, boxMm: 0.01 };
const browser = useBrowser();

describe.runIf(CHROMIUM !== null)('path data', () => {
  test.each([
    { what: 'by the grammar', texts: pathText },
    { what: 'with a slip, up to the error', texts: pathTextWithSlip },
  ])('$what', async ({ what, texts }) => {
    const paths = fc.sample(texts, { numRuns: COUNT, seed: 7 });
    const [outside] = await drawInBrowser(browser(), [drawingOf(paths)], true);
    expect(outside.arcsDiffer).toBeLessThan(1e-3);
    expect(outside.wholesDiffer).toBeLessThan(1e-3);
    const perPath: BrowserStroke[][] = paths.map(() => []);
    for (const stroke of outside.strokes) perPath[stroke.element].push(stroke);
    let withError = 0;
    const wrong = paths.flatMap((path, i) => {
      const drawing = readDrawing(drawingOf([path]), WHOLE_LINES);
      if (drawing.findings.some(({ code }) => code === 'path-error')) withError++;
      const difference = disagreement(drawing, perPath[i], ALLOWED);
      return difference ? [[path, difference]] : [];
    });
    console.log(
      `${COUNT} paths ${what}: ${outside.strokes.length} strokes held against the browser, ${withError} paths with an error`,
    );
    expect(wrong).toEqual([]);
    if (texts === pathText) expect(withError).toBe(0);
  });
});

function drawingOf(paths: readonly string[]): string {
  const drawn = paths.map((d) => `<path d="${d}"/>`).join('\n');
  return `<svg xmlns="http://www.w3.org/2000/svg" width="600" height="600" fill="none" stroke="black" stroke-linecap="round">${drawn}</svg>`;
}
