import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../src/core/index.ts';
import { fewestRuns } from '../../src/core/network/fewestRuns.ts';
import { type BrowserStroke, CHROMIUM, drawInBrowser, useBrowser } from '../support/browser.ts';
import {
  cellOf,
  cellPx,
  ICON_SETS,
  readIcons,
  sheetAsTheyAre,
  sheetTransformed,
  spread,
} from '../support/icons.ts';
import { expectSound, inWords, orderAndAudit } from '../support/ordering.ts';
import { type Differences, differences, MM_PER_PX, WHOLE_LINES } from '../support/readerAndBrowser.ts';

/**
 * Our reading of stroke icons (npm packages lucide-static 1.62.0, ISC licence, parts of it MIT; heroicons
 * 2.2.0 and iconoir 7.12.1, both MIT) against Chromium's: how many sub-paths, how long each is, where it lies. The browser's getTotalLength is right to 1e-6 on lines and
 * Bezier curves once they are enlarged, and 1.4e-4 too long on arcs, which it draws as cubics; arcs are
 * therefore integrated from the `d` it has parsed, and held against its own to that accuracy.
 */
const COLUMNS = 40;
const transformed = spread(readIcons(), 200);
const browser = useBrowser();

describe.runIf(CHROMIUM !== null)('icons read as a browser shows them', () => {
  test.each(Object.entries(ICON_SETS))('%s: each file by itself, and all on one sheet', async (set, from) => {
    const icons = spread(readIcons(set as keyof typeof ICON_SETS), 320);
    const text = sheetAsTheyAre(icons, COLUMNS);
    const [outside] = await drawInBrowser(browser(), [text], true);
    expect(outside.arcsDiffer).toBeLessThan(5e-4);
    expect(outside.wholesDiffer).toBeLessThan(1e-3);
    const perCell: BrowserStroke[][] = icons.map(() => []);
    for (const stroke of outside.strokes) perCell[cellOf(stroke.boxPx, COLUMNS)].push(stroke);
    const files = icons.map(({ name, text }, i) => {
      const drawing = readDrawing(text, WHOLE_LINES);
      expect(drawing.strokes.count, name).toBe(perCell[i].length);
      return differences(drawing, perCell[i], cellPx(i, COLUMNS));
    });
    const sheet = differences(readDrawing(text, WHOLE_LINES), outside.strokes);
    for (const found of [...files, sheet]) expectAgreement(found);
    const figuresOfBoth = `each: ${figures(files)}; on one sheet: ${figures([sheet])}`;
    console.log(`${icons.length} files of ${from.package} (${from.licence}), ${figuresOfBoth}`);
  });

  test('turned, mirrored, stretched, skewed, fitted into viewports and copied', async () => {
    const text = sheetTransformed(transformed, COLUMNS);
    const [outside] = await drawInBrowser(browser(), [text], true);
    expect(outside.copies).toBe(transformed.length / 5);
    expect(outside.copiesDiffer).toBeLessThan(1e-3);
    expect(outside.wholesDiffer).toBeLessThan(1e-3);
    const found = differences(readDrawing(text, WHOLE_LINES), outside.strokes);
    expectAgreement(found);
    console.log(`${transformed.length} icons transformed: ${figures([found])}`);
  });
});

describe.each([
  { what: 'as they are', make: sheetAsTheyAre },
  { what: 'transformed', make: sheetTransformed },
])('200 icons on one sheet, $what', ({ what, make }) => {
  const drawing = readDrawing(make(spread(readIcons(), 200), 20));

  test('are ordered well, and every line is still there', async () => {
    const found = orderAndAudit(drawing, { effort: 2 });
    console.log(`200 icons ${what}: ${inWords(found)}`);
    expectSound(
      found,
      found.networks.reduce((sum, network) => sum + fewestRuns(network), 0),
    );
    if (CHROMIUM === null) return;
    const [outside] = await drawInBrowser(browser(), [found.svg.text]);
    expect(outside.strokes).toHaveLength(found.after.runs);
    const drawnPx = outside.strokes.reduce((sum, stroke) => sum + stroke.lengthPx, 0);
    expect((drawnPx * MM_PER_PX) / found.after.drawnMm).toBeCloseTo(1, 4);
  });
});

/** Far finer than what is asked of a reader, 0.02 % and 0.02 mm: there is no noise to hide in. */
function expectAgreement({ plain, withArcs, boxMm, dots, worst }: Differences): void {
  expect(plain, worst).toBeLessThan(1e-5);
  expect(withArcs, worst).toBeLessThan(1e-5);
  expect(boxMm, worst).toBeLessThan(1e-4);
  expect(dots).toBe(0);
}

function figures(all: readonly Differences[]): string {
  const most = (key: 'plain' | 'withArcs' | 'boxMm') =>
    Math.max(...all.map((found) => found[key])).toExponential(1);
  const strokes = all.reduce((sum, found) => sum + found.strokes, 0);
  return `${strokes} strokes, lengths differ by ${most('plain')} at most (${most('withArcs')} with arcs), boxes by ${most('boxMm')} mm`;
}
