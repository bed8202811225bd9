import { readColour } from './colour.js';
import { withBracketsClosed } from './cssText.js';
import { isSeen } from './seen.js';

/** What a line is drawn or an area filled with, before `currentColor` is looked up. */
export type Paint =
  | { readonly kind: 'none' }
  | { readonly kind: 'current' }
  | { readonly kind: 'colour'; readonly hex: string; readonly visible: boolean }
  | { readonly kind: 'server'; readonly id: string };

export const NONE: Paint = { kind: 'none' };
export const BLACK: Paint = { kind: 'colour', hex: '#000000', visible: true };

/** Longer than any paint in earnest; matching takes time with the square of a hostile one. */
const LONGEST = 1000;
const URL = /^url\(\s*(?:"([^"]*)"|'([^']*)'|([^)]*?))\s*\)\s*/i;
/** Colour functions that are valid CSS and not evaluated here. */
const UNEVALUATED =
  /^(?:color-mix|contrast-color|light-dark|rgba?|hsla?|hwb|lab|lch|oklab|oklch|color)\((?:\s*from\b|.*\bin\b|.*\b(?:currentcolor|var)\b)/i;

/**
 * A value of `stroke` or `fill` (SVG 2, "Specifying paint"): a paint server that is missing gives way
 * to the fallback after it, and to none without one.
 *
 * @returns null where the value is invalid, and so to be ignored; `exact` is false where a colour was
 * valid but beyond this reader, and black stands for it.
 */
export function readPaint(
  text: string,
  isServer: (id: string) => boolean,
): { readonly paint: Paint; readonly exact: boolean } | null {
  if (text.length > LONGEST) return null;
  const t = withBracketsClosed(text.trim());
  const lower = t.toLowerCase();
  if (lower === 'none') return { paint: NONE, exact: true };
  if (lower === 'currentcolor') return { paint: { kind: 'current' }, exact: true };
  // They refer to the element that uses a marker, and markers are not drawn.
  if (lower === 'context-fill' || lower === 'context-stroke') return { paint: NONE, exact: true };
  const url = URL.exec(t);
  if (url) {
    const reference = url[1] ?? url[2] ?? url[3] ?? '';
    const fallback = t.slice(url[0].length);
    const id = reference.startsWith('#') ? reference.slice(1) : null;
    const otherwise = fallback === '' ? { paint: NONE, exact: true } : readPaint(fallback, isServer);
    if (id !== null && isServer(id) && otherwise) return { paint: { kind: 'server', id }, exact: true };
    return otherwise;
  }
  const colour = readColour(t.replace(/\s+(?:icc-color|device-\w+)\([^)]*\)\s*$/i, ''));
  if (colour) {
    return { paint: { kind: 'colour', hex: colour.hex, visible: isSeen(colour.alpha) }, exact: true };
  }
  return UNEVALUATED.test(t) ? { paint: BLACK, exact: false } : null;
}
