import { existsSync, readFileSync } from 'node:fs';
import { type Browser, chromium } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';

/**
 * Debian's Chromium is the outside truth for what a drawing shows. Without it these tests cannot be made
 * and say so; in CI that is a failure.
 */

/** Where the browser is that drawings are held against; null where there is none. */
export const CHROMIUM: string | null = (() => {
  const path = process.env.FEWLIFT_CHROMIUM || '/usr/bin/chromium';
  return existsSync(path) ? path : null;
})();

/** One sub-path as the browser draws it; lengths in px of the page, after all transforms. */
export interface BrowserStroke {
  /** Number of the shape in document order, those not drawn counted too. */
  readonly element: number;
  readonly tag: string;
  readonly id: string;
  readonly lengthPx: number;
  /** Least x and y, greatest x and y. */
  readonly boxPx: readonly [number, number, number, number];
  readonly arcs: boolean;
  readonly dot: boolean;
  /** `#rrggbb`; null where it is a paint server. */
  readonly colour: string | null;
}

export interface BrowserDrawing {
  readonly strokes: readonly BrowserStroke[];
  /** How far the middles of the browser's arcs lie off the arcs measured, relative to their size. */
  readonly arcsDiffer: number;
  /** Largest relative difference of an element's length in pieces from the browser's own in one. */
  readonly wholesDiffer: number;
  /** How many times a `use` was met outside other copies. */
  readonly copies: number;
  /** Largest difference, in px, of the box of a `use` from that of the group put in its place. */
  readonly copiesDiffer: number;
}

const IN_PAGE = readFileSync(new URL('./strokesInPage.js', import.meta.url), 'utf8');

async function openBrowser(): Promise<Browser> {
  if (CHROMIUM === null) throw new Error('no browser here');
  const quiet = ['background-networking', 'component-update', 'sync', 'gpu'].map(
    (what) => `--disable-${what}`,
  );
  return chromium.launch({
    executablePath: CHROMIUM,
    args: ['--headless=new', '--no-sandbox', '--no-first-run', ...quiet],
  });
}

/**
 * What each of the texts draws. With `measuredTwice` lengths and arcs are also held against the browser's
 * own measures (`arcsDiffer`, `wholesDiffer`, else 0), which takes most of the time.
 */
export function drawInBrowser(
  browser: Browser,
  texts: readonly string[],
  measuredTwice = false,
): Promise<BrowserDrawing[]> {
  const expression = `(${IN_PAGE.trimEnd().replace(/;$/, '')})(${measuredTwice})`;
  return askBrowser<BrowserDrawing>(browser, texts, expression);
}

/**
 * Puts the texts one after the other in the place of the root of one SVG document, without scripts and
 * network, and gives the value of an expression for each. That gives the same figures as opening each as a
 * document of its own, at a third of the time.
 */
export async function askBrowser<T>(
  browser: Browser,
  texts: readonly string[],
  expression: string,
): Promise<T[]> {
  const viewport = { width: 1000, height: 1000 };
  const context = await browser.newContext({ javaScriptEnabled: false, offline: true, viewport });
  try {
    const page = await context.newPage();
    await page.goto('data:image/svg+xml,<svg xmlns="http://www.w3.org/2000/svg"/>');
    const ask = `(text) => {
      const parsed = new DOMParser().parseFromString(text, 'image/svg+xml');
      const error = parsed.querySelector('parsererror');
      if (error) throw new Error(error.textContent + text);
      document.replaceChild(document.adoptNode(parsed.documentElement), document.documentElement);
      return (${expression.trimEnd().replace(/;$/, '')});
    }`;
    return await page.evaluate<T[]>(`${JSON.stringify(texts)}.map(${ask})`);
  } finally {
    await context.close();
  }
}

/** A browser for the tests of a file: opened before the first and closed after the last of them. */
export function useBrowser(): () => Browser {
  let browser: Browser | null = null;
  beforeAll(async () => {
    if (CHROMIUM !== null) browser = await openBrowser();
  });
  afterAll(async () => {
    await browser?.close();
  });
  if (CHROMIUM === null) console.warn('No Chromium here (FEWLIFT_CHROMIUM): no outside check of the reader.');
  test('in CI the browser is there', () => {
    expect(CHROMIUM !== null || !process.env.CI, 'install chromium first').toBe(true);
  });
  return () => browser!;
}
