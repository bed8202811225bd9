import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../src/core/index.ts';
import { type BrowserDrawing, CHROMIUM, drawInBrowser, useBrowser } from '../support/browser.ts';
import { BROWSER_CASES, SAID_OTHERWISE } from '../support/browserCases.ts';
import { disagreement, WHOLE_LINES } from '../support/readerAndBrowser.ts';

/**
 * One small drawing for each thing that a drawing may hold: either we read it as Chromium shows it, or a
 * finding says what was not done. Roots whose size is not a whole number of px are rounded to 1/64 px by
 * the browser, hence the allowances.
 */
const ALLOWED = { length: 1e-4, boxMm: 0.005 };
const browser = useBrowser();

describe.runIf(CHROMIUM !== null)('each thing by itself', () => {
  test('is read as a browser shows it, or said to be read otherwise', async () => {
    const names = Object.keys(BROWSER_CASES);
    const outside = await drawInBrowser(browser(), Object.values(BROWSER_CASES));
    const wrong = names.filter((name, i) => !SAID_OTHERWISE.has(name) && howItDiffers(name, outside[i]));
    expect(wrong.map((name) => [name, howItDiffers(name, outside[names.indexOf(name)])])).toEqual([]);
    const silent = [...SAID_OTHERWISE].filter(
      ([name, code]) => howItDiffers(name, outside[names.indexOf(name)]) && !codesOf(name).includes(code),
    );
    expect(silent).toEqual([]);
    const strokes = outside.reduce((sum, drawing) => sum + drawing.strokes.length, 0);
    console.log(
      `${names.length} small drawings, ${strokes} strokes: ${names.length - SAID_OTHERWISE.size} as shown, ${SAID_OTHERWISE.size} said`,
    );
  });
});

function howItDiffers(name: string, outside: BrowserDrawing): string | null {
  return disagreement(readDrawing(BROWSER_CASES[name], WHOLE_LINES), outside.strokes, ALLOWED);
}

function codesOf(name: string): string[] {
  return readDrawing(BROWSER_CASES[name], WHOLE_LINES).findings.map(({ code }) => code);
}
