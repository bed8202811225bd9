import type { Drawing } from '../../src/core/drawing/drawing.ts';
import type { ReadingRules } from '../../src/core/drawing/readingRules.ts';
import { segmentBox } from '../../src/core/geometry/box.ts';
import { segmentLength } from '../../src/core/geometry/length.ts';
import type { BrowserStroke } from './browser.ts';

/** CSS Values and Units, "Absolute lengths": 1 in = 25.4 mm = 96 px. */
export const MM_PER_PX = 25.4 / 96;

/** The browser is asked for whole outlines: lines neither dashed nor cut at edges. Pictures judge those. */
export const WHOLE_LINES: Partial<ReadingRules> = { dashes: 'solid', clips: 'ignore', pageEdge: 'ignore' };

/** Lengths smaller than this are compared as if they were this long: positions are floats in browsers. */
const SHORTEST_PX = 0.1;

export interface Differences {
  readonly strokes: number;
  /** Largest relative difference in length of strokes of lines and Bezier curves, and of those with arcs. */
  readonly plain: number;
  readonly withArcs: number;
  /** Largest difference of a side of a box. */
  readonly boxMm: number;
  /** Strokes that are a dot to one and not to the other. */
  readonly dots: number;
  /** The strokes that differ most in length and in box, in words. */
  readonly worst: string;
}

/** Holds strokes `from` up to `to` of a drawing against as many of the browser's, moved by `shiftPx`. */
export function differences(
  drawing: Drawing,
  outside: readonly BrowserStroke[],
  shiftPx: readonly [number, number] = [0, 0],
): Differences {
  const { strokes } = drawing;
  if (strokes.count !== outside.length) {
    throw new Error(`${strokes.count} strokes read, ${outside.length} in the browser`);
  }
  const found = { plain: 0, withArcs: 0, boxMm: 0, dots: 0 };
  const worst = { length: '', box: '' };
  outside.forEach((theirs, s) => {
    const { lengthPx, boxPx } = measuresOf(drawing, s);
    const length = Math.abs(lengthPx - theirs.lengthPx) / Math.max(theirs.lengthPx, SHORTEST_PX);
    if (length > Math.max(found.plain, found.withArcs)) {
      worst.length = `${theirs.tag} ${theirs.id} stroke ${s}: ${lengthPx} px read, ${theirs.lengthPx} px seen`;
    }
    const kind = theirs.arcs ? 'withArcs' : 'plain';
    found[kind] = Math.max(found[kind], length);
    const box = boxPx.map((v, side) => Math.abs(v + shiftPx[side % 2] - theirs.boxPx[side]) * MM_PER_PX);
    if (Math.max(...box) > found.boxMm) {
      worst.box = `${theirs.tag} ${theirs.id} stroke ${s}: box ${boxPx.join(' ')} read, ${theirs.boxPx.join(' ')} seen`;
    }
    found.boxMm = Math.max(found.boxMm, ...box);
    if ((strokes.dot[s] === 1) !== theirs.dot) found.dots++;
  });
  return { ...found, strokes: strokes.count, worst: [worst.length, worst.box].join('\n') };
}

/** What a drawing and the browser's disagree on beyond what is allowed, in words; null where they agree. */
export function disagreement(
  drawing: Drawing,
  outside: readonly BrowserStroke[],
  allowed: { readonly length: number; readonly boxMm: number },
): string | null {
  if (drawing.strokes.count !== outside.length) {
    return `${drawing.strokes.count} strokes read, ${outside.length} in the browser`;
  }
  const { plain, withArcs, boxMm, dots, worst } = differences(drawing, outside);
  const agree = Math.max(plain, withArcs) <= allowed.length && boxMm <= allowed.boxMm && dots === 0;
  return agree ? null : `lengths ${plain} and ${withArcs}, boxes ${boxMm} mm, dots ${dots}\n${worst}`;
}

/** Length and box of one stroke as we read it, in px. */
function measuresOf({ strokes }: Drawing, s: number): { lengthPx: number; boxPx: number[] } {
  const side = new Float64Array(4);
  const box = [Infinity, Infinity, -Infinity, -Infinity];
  let length = 0;
  for (let i = strokes.first[s]; i < strokes.first[s + 1]; i++) {
    length += segmentLength(strokes.segments, i);
    segmentBox(strokes.segments, i, side);
    for (const k of [0, 1]) {
      box[k] = Math.min(box[k], side[k]);
      box[k + 2] = Math.max(box[k + 2], side[k + 2]);
    }
  }
  return { lengthPx: length / MM_PER_PX, boxPx: box.map((v) => v / MM_PER_PX) };
}

/** Length of each stroke, mm. */
export function lengthsOf({ strokes }: Drawing): number[] {
  return Array.from({ length: strokes.count }, (_, s) => {
    let length = 0;
    for (let i = strokes.first[s]; i < strokes.first[s + 1]; i++)
      length += segmentLength(strokes.segments, i);
    return length;
  });
}
