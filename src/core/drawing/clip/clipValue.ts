import { splitOutside } from '../style/cssText.js';

/** The boxes that a basic shape may be measured in (CSS Masking Module Level 1, "clip-path"). */
export type ReferenceBox = 'fill-box' | 'stroke-box' | 'view-box';

/** What a `clip-path` says. */
export type ClipValue =
  | { readonly kind: 'none' }
  | { readonly kind: 'reference'; readonly id: string }
  /** Another document's. */
  | { readonly kind: 'elsewhere' }
  | { readonly kind: 'shape'; readonly shape: BasicShape | null; readonly box: ReferenceBox }
  | { readonly kind: 'unknown' };

/** A basic shape of CSS: its name in lower case, and what stands in its brackets. */
export interface BasicShape {
  readonly name: string;
  readonly text: string;
}

const KEYWORDS_FOR_NONE: ReadonlySet<string> = new Set([
  ...['', 'none', 'inherit', 'initial', 'unset', 'revert', 'revert-layer'],
]);
const SHAPE_NAMES: ReadonlySet<string> = new Set(['inset', 'circle', 'ellipse', 'polygon', 'path']);
const BOXES: Readonly<Record<string, ReferenceBox>> = {
  'fill-box': 'fill-box',
  'content-box': 'fill-box',
  'padding-box': 'fill-box',
  'stroke-box': 'stroke-box',
  'border-box': 'stroke-box',
  'margin-box': 'stroke-box',
  'view-box': 'view-box',
};

const URL = /^url\(\s*(?:"([^"]*)"|'([^']*)'|([^)]*?))\s*\)$/i;

/** Reads a value of `clip-path`; what is not valid is `unknown`. */
export function readClipValue(text: string): ClipValue {
  const value = text.trim();
  if (KEYWORDS_FOR_NONE.has(value.toLowerCase())) return { kind: 'none' };
  const url = URL.exec(value);
  if (url) {
    const reference = url[1] ?? url[2] ?? url[3] ?? '';
    if (reference === '') return { kind: 'none' };
    return reference.startsWith('#') ? { kind: 'reference', id: reference.slice(1) } : { kind: 'elsewhere' };
  }
  let shape: BasicShape | null = null;
  let box: ReferenceBox | null = null;
  for (const word of splitOutside(value.replace(/\s+/g, ' '), ' ')) {
    const call = /^([a-z]+)\((.*)\)$/i.exec(word);
    const name = call?.[1].toLowerCase() ?? '';
    if (call && !shape && SHAPE_NAMES.has(name)) shape = { name, text: call[2].trim() };
    else if (!call && !box && Object.hasOwn(BOXES, word.toLowerCase())) box = BOXES[word.toLowerCase()];
    else return { kind: 'unknown' };
  }
  // SVG elements take border-box, the default, for stroke-box.
  return { kind: 'shape', shape, box: box ?? 'stroke-box' };
}
