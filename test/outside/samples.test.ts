import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../src/core/index.ts';
import { CHROMIUM, drawInBrowser, useBrowser } from '../support/browser.ts';
import { disagreement, WHOLE_LINES } from '../support/readerAndBrowser.ts';

/** The samples as Chromium shows them; it rounds a root in mm to 1/64 px and tells positions to six digits. */
const ALLOWED = { length: 1e-3, boxMm: 0.005 };
const FOLDER = new URL('../../samples/', import.meta.url);
const browser = useBrowser();

describe.runIf(CHROMIUM !== null)('samples', () => {
  test('are read as a browser shows them', async () => {
    const names = readdirSync(FOLDER).filter((name) => name.endsWith('.svg'));
    const texts = names.map((name) => readFileSync(new URL(name, FOLDER), 'utf8'));
    const outside = await drawInBrowser(browser(), texts);
    const wrong = texts.map((text, i) =>
      disagreement(readDrawing(text, WHOLE_LINES), outside[i].strokes, ALLOWED),
    );
    const strokes = outside.reduce((sum, drawing) => sum + drawing.strokes.length, 0);
    console.log(`${names.length} samples: ${strokes} strokes`);
    expect(strokes).toBeGreaterThan(0);
    expect(names.map((name, i) => [name, wrong[i]])).toEqual(names.map((name) => [name, null]));
  });
});
