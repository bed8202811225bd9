import type { Severity } from '../finding.js';

/**
 * Every code that reading can report, with its severity. All but the errors carry `count`, how often
 * it was met; the place and the other values are those of the first time, unless said to be sums.
 */
export const READING_FINDINGS = {
  // The text could not be read at all: the drawing is empty.
  'empty-input': 'error',
  'not-xml': 'error', // found: the first characters
  'not-svg': 'error', // root: name of the root element
  'xml-bad-character': 'error', // codePoint
  'xml-bad-tag': 'error',
  'xml-bad-doctype': 'error',
  'xml-bad-entity': 'error', // entity: its text opens an element and does not close it
  'xml-bad-attribute': 'error', // attribute, why: no value | no quotes | less-than | name
  'xml-duplicate-attribute': 'error', // attribute
  'xml-tag-mismatch': 'error', // expected, found; openedLine, openedColumn: of what was to be closed
  'xml-unopened-tag': 'error', // found
  'xml-cut-off': 'error', // inside: what the text ends in the middle of; open: elements not closed; startLine, startColumn
  'xml-two-roots': 'error', // found: name of the second
  'xml-text-outside-root': 'error', // found
  'xml-unreadable': 'error',
  'too-large': 'error',
  'past-limit': 'error', // limit: its name; value
  'entity-limit': 'error', // entity; limit, value
  'entity-loop': 'error', // entity

  // The text is read, but not quite as it stands.
  'unknown-entity': 'warning', // entity
  'external-entity': 'warning', // entity
  'xml-not-strict': 'warning', // what
  'svg-namespace-missing': 'warning', // element, isRoot: 1 or 0
  'undeclared-prefix': 'warning', // prefix
  'style-rule-not-read': 'warning', // rule
  'style-sheet-not-read': 'warning', // type
  'style-value-not-read': 'warning', // property, found
  'style-limit': 'warning', // limit: its name; value; no rule was applied, or sheet read, after it
  'path-error': 'warning', // offset: characters from the start of the data; found
  'points-error': 'warning', // offset, found
  'points-odd': 'warning',
  'transform-error': 'warning', // transform
  'transform-origin-ignored': 'warning', // origin
  'motion-path-not-applied': 'warning', // motion
  'length-error': 'warning', // attribute, found
  'viewbox-error': 'warning', // viewBox
  'viewbox-empty': 'warning', // viewBox
  'aspect-ratio-error': 'warning', // preserveAspectRatio
  'colour-not-read': 'warning', // found
  'size-guessed': 'warning', // widthMm, heightMm, basis: viewBox | extent | default
  'user-unit-assumed': 'warning', // pxPerInch
  'font-unit-assumed': 'warning', // attribute, found
  'coordinate-overflow': 'warning', // count: strokes left out
  'use-missing': 'warning', // href
  'use-external': 'warning', // href
  'use-loop': 'warning', // href
  'use-limit': 'warning', // limit: its name; value
  'text-cut': 'warning', // element; limit, value
  'switch-without-match': 'warning',
  'language-assumed': 'note', // asked: the first languages that a switch asks for

  // Read, and not drawn, or drawn otherwise than on a screen.
  'filled-not-stroked': 'warning', // outlineMm: sum
  'text-not-drawn': 'warning', // text
  'image-not-drawn': 'warning', // href
  'foreign-object-not-drawn': 'warning',
  'markers-not-drawn': 'warning',
  'clip-not-applied': 'warning', // clip
  clipped: 'note', // count: strokes; clippedMm: sum
  'page-edge-cut': 'warning', // count: strokes; clippedMm: sum
  'cut-limit': 'warning', // count: strokes left whole
  'mask-not-applied': 'warning', // mask
  'filter-not-applied': 'note', // filter
  'blend-mode-not-applied': 'note', // mode
  'dashes-drawn-solid': 'note',
  'too-many-dashes': 'warning', // count: lines drawn solid for it; limit: its name; value
  'fill-drawn-as-outline': 'note',
  'paint-server-drawn-as-line': 'note', // paint
  'fill-ignored': 'note',
  'white-strokes': 'note',
  'butt-dots-not-drawn': 'note',
  hidden: 'note',
  'condition-not-met': 'note',
  invisible: 'note',
  'flattened-to-nothing': 'note', // a transform without an inverse
  'shape-error': 'warning', // attribute, found
  'nothing-to-draw': 'note',
  'unknown-element': 'note', // name
} as const satisfies Record<string, Severity>;

export type ReadingCode = keyof typeof READING_FINDINGS;
