import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../src/core/index.ts';
import { CHROMIUM, useBrowser } from '../support/browser.ts';
import { comparePictures, wrongPicture } from '../support/pixels.ts';

const browser = useBrowser();
const page = (body: string, size = 'width="60mm" height="40mm" viewBox="0 0 60 40"') =>
  `<svg xmlns="http://www.w3.org/2000/svg" ${size} fill="none" stroke="black" stroke-width=".4">${body}</svg>`;
const ARC = '<path d="M5 30C15 -10 40 60 54 8A9 4 20 0 0 40 5"/>';

describe.runIf(CHROMIUM !== null)('the judge of pictures', () => {
  test('finds nothing in the same lines, however they are put on the page', async () => {
    const texts = [
      page(`${ARC}<circle cx="30" cy="20" r="12" stroke="#e33"/><path d="M1 1H59V39H1z" stroke="white"/>`),
      page(ARC, 'width="161" height="100" viewBox="0 0 60 40"'),
      page(`<g transform="scale(3.7)">${ARC}</g>`, 'width="60.3mm" height="39.7mm"'),
      page(
        '<g transform="rotate(20 30 20)skewX(8)scale(1.1 .9)"><rect x="14" y="9" width="24" height="18" rx="3"/></g>',
      ),
    ];
    const jobs = texts.map((text, i) => ({ name: `same ${i}`, text, drawing: readDrawing(text) }));
    const found = await comparePictures(browser(), jobs);
    expect(found.map((one) => wrongPicture(one, 1e-3))).toEqual(texts.map(() => null));
    expect(Math.min(...found.map(({ inkPx }) => inkPx))).toBeGreaterThan(2000);
  });

  test('finds what is missing, too much, shifted, of another colour or drawn solid', async () => {
    const pairs = [
      [`${ARC}<path d="M20 20h4"/>`, ARC, 'missing'],
      [ARC, `${ARC}<path d="M20 20h4"/>`, 'extra'],
      [ARC, `<g transform="translate(0 .3)">${ARC}</g>`, 'missing'],
      [ARC, `<g stroke="#00f">${ARC}</g>`, 'missing'],
      [`<g stroke-dasharray="1">${ARC}</g>`, ARC, 'extra'],
    ] as const;
    const jobs = pairs.map(([theirs, ours], i) => ({
      name: `other ${i}`,
      text: page(theirs),
      drawing: readDrawing(page(ours)),
    }));
    const found = await comparePictures(browser(), jobs);
    for (const [i, [, , kind]] of pairs.entries()) expect(found[i][kind], jobs[i].name).toBeGreaterThan(0.02);
  });
});
