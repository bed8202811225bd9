import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Browser } from 'playwright-core';
import type { Drawing } from '../../src/core/drawing/drawing.ts';
import { flattenSegment } from '../../src/core/geometry/flatten.ts';

/**
 * The judge of what outlines alone do not show: dashes, clip paths, the edges of pages and viewports.
 * Chromium paints the original and our strokes, as plain paths in mm, on transparent canvases of the same
 * size, and what is inked in one picture is looked for in the other, within a few px.
 */

/** Across the longer side; a line of 0.3 mm on a page of 60 mm is 3 px wide. */
const LONGER_SIDE_PX = 600;
const ACCURACY_MM = 0.002;
const IN_PAGE = readFileSync(new URL('./picturesInPage.js', import.meta.url), 'utf8');

export interface Judged {
  readonly name: string;
  /** The drawing's text. */
  readonly text: string;
  /** As it was read, under the rules that are to be judged. */
  readonly drawing: Drawing;
  /** The caps of its lines, which strokes as read no longer know. */
  readonly caps?: 'butt' | 'round' | 'square';
  /**
   * Takes out of the original what is no stroke: fills, texts, images, markers. For drawings as other
   * programs write them; their lines stay as they are.
   */
  readonly strokesOnly?: boolean;
}

export interface PictureDifference {
  /** Px inked in the original. */
  readonly inkPx: number;
  /** Shares of the ink of the original not found in ours, and of ours not found in the original. */
  readonly missing: number;
  readonly extra: number;
  /** Middles of the places where most is missing and extra, mm. */
  readonly missingAt: string;
  readonly extraAt: string;
}

/**
 * Compares the pictures, in the order of the jobs. A px counts as inked from a quarter of its area on, as
 * found where within 2 px the other picture has ink of like colour: so antialiasing never counts, and a
 * line shifted by 0.1 mm does. Where FEWLIFT_PICTURES names a folder, pairs are written there as PNG.
 */
export async function comparePictures(
  browser: Browser,
  jobs: readonly Judged[],
): Promise<PictureDifference[]> {
  const folder = process.env.FEWLIFT_PICTURES;
  const context = await browser.newContext({ offline: true });
  try {
    const page = await context.newPage();
    const tasks = jobs.map(({ text, drawing, caps, strokesOnly }) => {
      const { widthMm, heightMm } = drawing;
      const pxPerMm = LONGER_SIDE_PX / Math.max(widthMm, heightMm);
      return {
        original: text,
        ours: pictureOf(drawing, caps ?? 'butt', pxPerMm),
        widthMm,
        heightMm,
        pxPerMm,
        strokesOnly: strokesOnly ?? false,
        keepPicture: folder !== undefined,
      };
    });
    const found = await page.evaluate<(PictureDifference & { picture: string })[]>(
      `(async (tasks) => {
        const compare = ${IN_PAGE.trimEnd().replace(/;$/, '')};
        const found = [];
        for (const task of tasks) found.push(await compare(task));
        return found;
      })(${JSON.stringify(tasks)})`,
    );
    return found.map(({ picture, ...difference }, i) => {
      if (folder !== undefined) keepPicture(folder, jobs[i].name, picture);
      return difference;
    });
  } finally {
    await context.close();
  }
}

function keepPicture(folder: string, name: string, picture: string): void {
  mkdirSync(folder, { recursive: true });
  const bytes = Buffer.from(picture.slice(picture.indexOf(',') + 1), 'base64');
  writeFileSync(join(folder, `${name.replace(/\W+/g, '-')}.png`), bytes);
}

/** What is wrong with a picture beyond `tolerance`, a share of the ink; null where nothing is. */
export function wrongPicture(found: PictureDifference, tolerance: number): string | null {
  const wrong: string[] = [];
  if (found.missing > tolerance) wrong.push(`${share(found.missing)} missing, at ${found.missingAt}`);
  if (found.extra > tolerance) wrong.push(`${share(found.extra)} extra, at ${found.extraAt}`);
  return wrong.length > 0 ? wrong.join('; ') : null;
}

function share(value: number): string {
  return `${(100 * value).toFixed(2)} %`;
}

/** The strokes as they were read, each with its colour and width, on a page of the drawing's size. */
export function pictureOf(drawing: Drawing, caps: 'butt' | 'round' | 'square', pxPerMm: number): string {
  const { strokes, colours, widthMm, heightMm } = drawing;
  const paths: string[] = [];
  for (let s = 0; s < strokes.count; s++) {
    const points: string[] = [];
    const add = (x: number, y: number) => points.push(`${x.toFixed(4)} ${y.toFixed(4)}`);
    for (let i = strokes.first[s]; i < strokes.first[s + 1]; i++) {
      if (points.length === 0) {
        const at = strokes.segments.offset[i];
        add(strokes.segments.data[at], strokes.segments.data[at + 1]);
      }
      flattenSegment(strokes.segments, i, 0, 1, ACCURACY_MM, add);
    }
    const colour = colours[strokes.colour[s]];
    const paint = colour.startsWith('#') ? colour : '#000';
    const d = `M${points.join('L')}${strokes.closed[s] ? 'Z' : ''}`;
    paths.push(`<path d="${d}" stroke="${paint}" stroke-width="${strokes.widthMm[s].toFixed(4)}"/>`);
  }
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${Math.round(widthMm * pxPerMm)}" height="${Math.round(heightMm * pxPerMm)}" preserveAspectRatio="none" viewBox="0 0 ${widthMm} ${heightMm}" fill="none" stroke-linecap="${caps}">${paths.join('\n')}</svg>`;
}
