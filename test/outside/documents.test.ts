import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../src/core/index.ts';
import { CHROMIUM, drawInBrowser, useBrowser } from '../support/browser.ts';
import { comparePictures, wrongPicture } from '../support/pixels.ts';
import { anyDocument, withThinLines } from '../support/randomDocuments.ts';
import { disagreement, WHOLE_LINES } from '../support/readerAndBrowser.ts';

/** Groups, viewports, copies, conditions, styles and shapes put together by chance, read as Chromium shows them. */
const COUNT = 500;
const PICTURES = 30;
/** Share of the ink. */
const TOLERANCE = 0.02;
const ALLOWED = { length: 1e-4, boxMm: 0.005 };
const browser = useBrowser();

describe.runIf(CHROMIUM !== null)('documents put together by chance', () => {
  test('are read as a browser shows them', async () => {
    const texts = fc.sample(anyDocument, { numRuns: COUNT, seed: 11 });
    const outside = await drawInBrowser(browser(), texts);
    const wrong = texts.flatMap((text, i) => {
      const difference = disagreement(readDrawing(text, WHOLE_LINES), outside[i].strokes, ALLOWED);
      return difference ? [[text, difference]] : [];
    });
    const total = (of: (drawing: (typeof outside)[number]) => number) =>
      outside.reduce((sum, drawing) => sum + of(drawing), 0);
    const strokes = total((drawing) => drawing.strokes.length);
    const copies = total((drawing) => drawing.copies);
    console.log(`${COUNT} random documents: ${strokes} strokes, ${copies} copies held against the browser`);
    expect(Math.min(strokes, copies)).toBeGreaterThan(COUNT);
    expect(wrong).toEqual([]);
    expect(Math.max(...outside.map(({ copiesDiffer }) => copiesDiffer))).toBeLessThan(1e-3);
  });

  test('are painted as a browser paints them: dashes, clip paths and viewports too', async () => {
    const texts = fc.sample(anyDocument, { numRuns: PICTURES, seed: 12 }).map(withThinLines);
    const jobs = texts.map((text, i) => ({ name: `random ${i}`, text, drawing: readDrawing(text) }));
    const found = await comparePictures(browser(), jobs);
    const wrong = found.flatMap((one, i) => {
      const difference = wrongPicture(one, TOLERANCE);
      return difference ? [[jobs[i].name, difference, texts[i]]] : [];
    });
    const inked = found.filter(({ inkPx }) => inkPx > 0).length;
    console.log(`${PICTURES} random documents painted, ${inked} with ink`);
    expect(inked).toBeGreaterThan(PICTURES / 2);
    expect(wrong).toEqual([]);
  });
});
