import type { Affine } from '../../geometry/affine.js';
import { TextCursor } from '../path/textCursor.js';

/** A rectangle in user units; width and height are not negative. */
export interface ViewBox {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Where the viewBox stands in a viewport of another shape: none stretches it. */
export interface AspectRatio {
  /** Share of the free width and height left of and above it: 0, 0.5 or 1. */
  readonly alignX: number;
  readonly alignY: number;
  readonly mode: 'none' | 'meet' | 'slice';
}

export const XMIDYMID_MEET: AspectRatio = { alignX: 0.5, alignY: 0.5, mode: 'meet' };

/** Four numbers, width and height not negative; null otherwise (SVG 2, "The viewBox attribute"). */
export function readViewBox(text: string): ViewBox | null {
  const cursor = new TextCursor().reset(text);
  const numbers: number[] = [];
  cursor.skipSpace();
  while (numbers.length < 4) {
    if (!cursor.number() || !Number.isFinite(cursor.value)) return null;
    numbers.push(cursor.value);
    if (numbers.length < 4) cursor.skipCommaSpace();
  }
  cursor.skipSpace();
  const [x, y, width, height] = numbers as [number, number, number, number];
  return cursor.atEnd() && width >= 0 && height >= 0 ? { x, y, width, height } : null;
}

const ASPECT = /^\s*(?:(none)|x(Min|Mid|Max)Y(Min|Mid|Max))(?:\s+(meet|slice))?\s*$/;

/** null where the attribute is wrong (SVG 2, "The preserveAspectRatio attribute"). */
export function readAspectRatio(text: string): AspectRatio | null {
  const match = ASPECT.exec(text);
  if (!match) return null;
  if (match[1]) return { alignX: 0, alignY: 0, mode: 'none' };
  return {
    alignX: shareOf(match[2]),
    alignY: shareOf(match[3]),
    mode: match[4] === 'slice' ? 'slice' : 'meet',
  };
}

function shareOf(word: string): number {
  return word === 'Min' ? 0 : word === 'Mid' ? 0.5 : 1;
}

/**
 * The map from viewBox units to those of the viewport, a rectangle at x, y.
 * Source: SVG 2 §8.2, "Computing the equivalent transform of an SVG viewport".
 */
export function viewBoxTransform(viewBox: ViewBox, viewport: ViewBox, aspect: AspectRatio): Affine {
  let sx = viewport.width / viewBox.width;
  let sy = viewport.height / viewBox.height;
  if (aspect.mode !== 'none') {
    const s = aspect.mode === 'meet' ? Math.min(sx, sy) : Math.max(sx, sy);
    sx = s;
    sy = s;
  }
  const freeWidth = viewport.width - viewBox.width * sx;
  const freeHeight = viewport.height - viewBox.height * sy;
  return [
    sx,
    0,
    0,
    sy,
    viewport.x - viewBox.x * sx + freeWidth * aspect.alignX,
    viewport.y - viewBox.y * sy + freeHeight * aspect.alignY,
  ];
}
