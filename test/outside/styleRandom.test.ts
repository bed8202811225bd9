import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import type { Drawing } from '../../src/core/drawing/drawing.ts';
import { readColour } from '../../src/core/drawing/style/colour.ts';
import { segmentBox } from '../../src/core/geometry/box.ts';
import { readDrawing } from '../../src/core/index.ts';
import { askBrowser, CHROMIUM, useBrowser } from '../support/browser.ts';
import { randomStyledDrawing } from '../support/randomStyles.ts';
import { MM_PER_PX, WHOLE_LINES } from '../support/readerAndBrowser.ts';

type Box = readonly [number, number, number, number];

interface SeenStyle {
  /** Ids of what the copies are of. */
  readonly copied: readonly string[];
  /** Those that are drawn. */
  readonly shapes: readonly { readonly id: string; readonly box: Box; readonly stroke: string }[];
  readonly copies: readonly { readonly id: string; readonly box: Box }[];
}

const IN_PAGE = readFileSync(new URL('../support/styleInPage.js', import.meta.url), 'utf8');
const DRAWINGS = 300;
/** Positions are floats in browsers. */
const ALLOWED_PX = 0.01;
const ALLOWED_SHARE = 1e-5;
const browser = useBrowser();

describe.runIf(CHROMIUM !== null)('random style sheets on random drawings', () => {
  test('shapes are drawn where and as a browser has them, in copies too', async () => {
    const texts = Array.from({ length: DRAWINGS }, (_, i) => randomStyledDrawing(i, i % 2 === 1));
    const seen = await askBrowser<SeenStyle>(browser(), texts, IN_PAGE);
    const wrong = texts.flatMap((text, i) => {
      const difference = differenceOf(readDrawing(text, WHOLE_LINES), seen[i]);
      return difference === null ? [] : [`drawing ${i}: ${difference}\n${text}`];
    });
    expect(wrong.slice(0, 3)).toEqual([]);
    const shapes = seen.reduce((sum, drawing) => sum + drawing.shapes.length, 0);
    const copies = seen.reduce((sum, drawing) => sum + drawing.copies.length, 0);
    console.log(`${DRAWINGS} drawings, ${shapes} shapes and ${copies} copies as in the browser`);
    expect(shapes).toBeGreaterThan(DRAWINGS);
    expect(copies).toBeGreaterThan(DRAWINGS / 4);
  });
});

interface Read {
  readonly id: string;
  readonly box: Box;
  readonly colour: string;
}

function differenceOf(drawing: Drawing, seen: SeenStyle): string | null {
  const read = readShapes(drawing);
  const own = read.filter(({ id }) => !seen.copied.includes(id));
  if (own.length !== seen.shapes.length) return `${idsOf(own)} drawn, ${idsOf(seen.shapes)} in the browser`;
  for (const [i, { id, box, stroke }] of seen.shapes.entries()) {
    if (own[i].id !== id) return `${idsOf(own)} drawn, ${idsOf(seen.shapes)} in the browser`;
    if (isApart(own[i].box, box)) return `${id} at ${own[i].box}, in the browser at ${box}`;
    const hex = readColour(stroke)?.hex;
    if (own[i].colour !== hex) return `${id} in ${own[i].colour}, in the browser ${stroke}`;
  }
  for (const { id, box } of seen.copies) {
    const parts = read.filter((part) => seen.copied.includes(part.id));
    const whole: [number, number, number, number] = [Infinity, Infinity, -Infinity, -Infinity];
    for (const { box: part } of parts) {
      for (const k of [0, 1]) {
        whole[k] = Math.min(whole[k], part[k]);
        whole[k + 2] = Math.max(whole[k + 2], part[k + 2]);
      }
    }
    const isEmpty = box[0] === box[2] && box[1] === box[3];
    if (isEmpty ? parts.length > 0 : isApart(whole, box))
      return `${id} at ${whole}, in the browser at ${box}`;
  }
  return null;
}

function readShapes({ strokes, colours, places }: Drawing): Read[] {
  const side = new Float64Array(4);
  return Array.from({ length: strokes.count }, (_, s) => {
    const box: [number, number, number, number] = [Infinity, Infinity, -Infinity, -Infinity];
    for (let i = strokes.first[s]; i < strokes.first[s + 1]; i++) {
      segmentBox(strokes.segments, i, side);
      for (const k of [0, 1]) {
        box[k] = Math.min(box[k], side[k] / MM_PER_PX);
        box[k + 2] = Math.max(box[k + 2], side[k + 2] / MM_PER_PX);
      }
    }
    return { id: places[strokes.element[s]].id ?? '', box, colour: colours[strokes.colour[s]] };
  });
}

function isApart(a: Box, b: Box): boolean {
  return a.some((side, k) => !(Math.abs(side - b[k]) <= ALLOWED_PX + ALLOWED_SHARE * Math.abs(side)));
}

function idsOf(shapes: readonly { readonly id: string }[]): string {
  return shapes.map(({ id }) => id).join(' ');
}
