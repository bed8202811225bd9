import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../src/core/index.ts';
import { CHROMIUM, drawInBrowser, useBrowser } from '../support/browser.ts';
import { EXPORTS } from '../support/cases/exports.ts';
import { comparePictures, wrongPicture } from '../support/pixels.ts';
import { disagreement, WHOLE_LINES } from '../support/readerAndBrowser.ts';

/** The browser tells places to six digits, and rounds a root that is no whole number of px. */
const ALLOWED = { length: 1e-3, boxMm: 0.02 };
/** Share of the ink. */
const TOLERANCE = 0.005;
const browser = useBrowser();

describe.runIf(CHROMIUM !== null)('drawings as other programs write them', () => {
  test('have the outlines that a browser draws', async () => {
    const outside = await drawInBrowser(
      browser(),
      EXPORTS.map(({ text }) => text),
    );
    const found = EXPORTS.map(({ name, text }, i) => [
      name,
      disagreement(readDrawing(text, WHOLE_LINES), outside[i].strokes, ALLOWED),
    ]);
    expect(found).toEqual(EXPORTS.map(({ name }) => [name, null]));
    for (const { strokes } of outside) expect(strokes.length).toBeGreaterThan(7);
  });

  test('are painted as a browser paints their lines', async () => {
    const jobs = EXPORTS.map((file) => ({ ...file, drawing: readDrawing(file.text), strokesOnly: true }));
    const found = await comparePictures(browser(), jobs);
    const rows = jobs.map(({ name, drawing }, i) => {
      const codes = drawing.findings.map(({ code }) => code).join(', ');
      return `${name} | ${drawing.strokes.count} strokes | ${wrongPicture(found[i], TOLERANCE) ?? 'as shown'} | ${codes}`;
    });
    console.log(rows.join('\n'));
    expect(rows.filter((row) => !row.includes('as shown'))).toEqual([]);
  });
});
