import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../src/core/index.ts';
import { CHROMIUM, useBrowser } from '../support/browser.ts';
import { DASHES, ROUND_DASHES } from '../support/cases/dashes.ts';
import { CLIPS, EDGES } from '../support/cases/edges.ts';
import { comparePictures, wrongPicture } from '../support/pixels.ts';

/** Share of the ink; what is left is where lines end slanted at an edge, and square in our picture. */
const TOLERANCE = 0.005;
const browser = useBrowser();

describe.runIf(CHROMIUM !== null)('drawn as a browser paints it', () => {
  test.each([
    { feature: 'dashes', cases: DASHES, caps: 'butt' },
    { feature: 'dots as dashes', cases: ROUND_DASHES, caps: 'round' },
    { feature: 'clip paths', cases: CLIPS, caps: 'butt' },
    { feature: 'edges of page and viewports', cases: EDGES, caps: 'butt' },
  ] as const)('$feature', async ({ feature, cases, caps }) => {
    const jobs = Object.entries(cases).map(([name, text]) => ({
      name,
      text,
      drawing: readDrawing(text),
      caps,
    }));
    const found = await comparePictures(browser(), jobs);
    const rows = jobs.map(({ name, drawing }, i) => {
      const wrong = wrongPicture(found[i], TOLERANCE);
      const codes = drawing.findings.map(({ code }) => code);
      const result = wrong
        ? `WRONG: ${wrong} (${codes.join(', ')})`
        : `as shown, ${drawing.strokes.count} strokes`;
      return `${feature} | ${name.replace(/\W+/g, '-')}.svg | ${result}`;
    });
    const most = (key: 'missing' | 'extra') =>
      `${(100 * Math.max(...found.map((f) => f[key]))).toFixed(3)} %`;
    console.log(
      `${rows.join('\n')}\n${rows.length} pictures, missing ${most('missing')}, extra ${most('extra')}`,
    );
    expect(rows.filter((row) => row.includes('WRONG'))).toEqual([]);
    expect(found.some(({ inkPx }) => inkPx > 0)).toBe(true);
  });
});
