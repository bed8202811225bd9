import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../src/core/index.ts';
import { CHROMIUM, useBrowser } from '../support/browser.ts';
import { CLIP_CASES } from '../support/clipCases.ts';
import { comparePictures, wrongPicture } from '../support/pixels.ts';

/** Of the ink: at a slanted edge a browser cuts a line slantwise, and a pen ends it square. */
const TOLERANCE = 0.004;
const browser = useBrowser();

describe.runIf(CHROMIUM !== null)('clip paths, viewports and the edge of the page', () => {
  test('leave what a browser leaves', async () => {
    const jobs = Object.entries(CLIP_CASES).map(([name, text]) => ({
      name,
      text,
      drawing: readDrawing(text),
    }));
    const found = await comparePictures(browser(), jobs);
    const wrong = found.map((one, i) => [jobs[i].name, wrongPicture(one, TOLERANCE)] as const);
    expect(wrong.filter(([, what]) => what !== null)).toEqual([]);
    expect(jobs.length).toBeGreaterThanOrEqual(60);
    console.log(`${jobs.length} drawings cut as a browser cuts them`);
  });
});
