import { describe, expect, test } from 'vitest';
import type { Drawing } from '../../src/core/drawing/drawing.ts';
import { readDrawing } from '../../src/core/index.ts';
import { type BrowserDrawing, CHROMIUM, drawInBrowser, useBrowser } from '../support/browser.ts';
import { BY_THE_STANDARD, FEATURES, SAID_OTHERWISE } from '../support/browserCases.ts';
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
    const files = Object.entries(FEATURES).flatMap(([feature, cases]) =>
      Object.entries(cases).map(([name, text]) => ({ feature, name, text })),
    );
    expect(new Set(files.map(({ name }) => name)).size).toBe(files.length);
    const outside = await drawInBrowser(
      browser(),
      files.map(({ text }) => text),
    );
    const rows = files.map(({ feature, name, text }, i) => {
      const result = resultOf(name, readDrawing(text, WHOLE_LINES), outside[i]);
      return { feature, name, result, line: `${feature} | ${fileName(name)} | ${result}` };
    });
    console.log(`feature | file | result\n${rows.map(({ line }) => line).join('\n')}`);
    const counted = (kind: string) => rows.filter(({ result }) => result.startsWith(kind)).length;
    console.log(
      `${rows.length} files: ${counted('as shown')} as shown, ${counted('said')} said otherwise, ${counted('by the standard')} by the standard`,
    );
    expect(rows.filter(({ result }) => result.startsWith('WRONG')).map(({ line }) => line)).toEqual([]);
    expect(rows.length).toBeGreaterThanOrEqual(120);
  });
});

function resultOf(name: string, drawing: Drawing, outside: BrowserDrawing): string {
  const difference = disagreement(drawing, outside.strokes, ALLOWED);
  const codes = drawing.findings.map(({ code }) => code);
  const said = SAID_OTHERWISE.get(name);
  if (difference === null) {
    return `as shown, ${outside.strokes.length} strokes${codes.length > 0 ? ` (${codes.join(', ')})` : ''}`;
  }
  if (said !== undefined && codes.includes(said)) return `said otherwise: ${said}`;
  const why = BY_THE_STANDARD.get(name);
  return why === undefined ? `WRONG: ${difference} (${codes.join(', ')})` : `by the standard: ${why}`;
}

function fileName(name: string): string {
  return `${name.replace(/\W+/g, '-')}.svg`;
}
