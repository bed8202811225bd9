import { describe, expect, test } from 'vitest';
import type { Drawing } from '../../src/core/drawing/drawing.ts';
import { readDrawing } from '../../src/core/index.ts';
import { type BrowserDrawing, CHROMIUM, drawInBrowser, useBrowser } from '../support/browser.ts';
import { disagreement, WHOLE_LINES } from '../support/readerAndBrowser.ts';
import { STYLE_CASES, STYLE_SAID_OTHERWISE } from '../support/styleCases.ts';

const ALLOWED = { length: 1e-4, boxMm: 0.005 };
/** Colours outside sRGB are worked out in single precision by the browser. */
const MOST_APART = 1;
const browser = useBrowser();

describe.runIf(CHROMIUM !== null)('each thing of style by itself', () => {
  test('is read as a browser shows it, or said to be read otherwise', async () => {
    const names = Object.keys(STYLE_CASES);
    const outside = await drawInBrowser(browser(), Object.values(STYLE_CASES));
    const rows = names.map((name, i) => ({
      name,
      result: resultOf(name, readDrawing(STYLE_CASES[name], WHOLE_LINES), outside[i]),
    }));
    console.log(rows.map(({ name, result }) => `${name} | ${result}`).join('\n'));
    expect(rows.filter(({ result }) => result.startsWith('WRONG'))).toEqual([]);
    expect(names.length).toBeGreaterThanOrEqual(90);
  });
});

function resultOf(name: string, drawing: Drawing, outside: BrowserDrawing): string {
  const difference = disagreement(drawing, outside.strokes, ALLOWED) ?? colourDifference(drawing, outside);
  const codes = drawing.findings.map(({ code }) => code);
  const told = codes.length > 0 ? ` (${codes.join(', ')})` : '';
  if (difference === null) return `as shown, ${outside.strokes.length} strokes${told}`;
  const said = STYLE_SAID_OTHERWISE.get(name);
  return said !== undefined && codes.includes(said)
    ? `said otherwise: ${said}`
    : `WRONG: ${difference}${told}`;
}

function colourDifference({ strokes, colours }: Drawing, outside: BrowserDrawing): string | null {
  for (const [s, { colour, tag, id }] of outside.strokes.entries()) {
    const ours = colours[strokes.colour[s]];
    if (colour === null) continue;
    const bytes = (hex: string): number[] =>
      [1, 3, 5].map((at) => Number.parseInt(hex.slice(at, at + 2), 16));
    const [a, b] = [bytes(ours), bytes(colour)];
    if (a.some((byte, k) => !(Math.abs(byte - b[k]) <= MOST_APART))) {
      return `stroke ${s}, ${tag} ${id}: ${ours} read, ${colour} seen`;
    }
  }
  return null;
}
