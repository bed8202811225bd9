import type { Cases } from './cases/make.ts';
import { MARKUP } from './cases/markup.ts';
import { ARCS, PATH_ERRORS, PATH_SYNTAX } from './cases/paths.ts';
import { DOTS, POINTS, SHAPES } from './cases/shapes.ts';
import { ROOT_SIZES, UNITS, VIEW_BOXES } from './cases/sizes.ts';
import { CONDITIONS, COPIES, GROUPS, SYMBOLS } from './cases/structure.ts';
import { STYLES } from './cases/styles.ts';
import { TRANSFORMS } from './cases/transforms.ts';

/** What drawings hold, and for each small drawings whose outlines a browser and we must see alike. */
export const FEATURES: Readonly<Record<string, Cases>> = {
  'size of the root': ROOT_SIZES,
  'viewBox, preserveAspectRatio': VIEW_BOXES,
  'units and percentages': UNITS,
  transforms: TRANSFORMS,
  'basic shapes': SHAPES,
  'lists of points': POINTS,
  'dots and caps': DOTS,
  'path syntax': PATH_SYNTAX,
  arcs: ARCS,
  'errors in path data': PATH_ERRORS,
  'style and style sheets': STYLES,
  use: COPIES,
  'symbol, nested svg': SYMBOLS,
  'switch, conditions': CONDITIONS,
  'groups, layers, what is not drawn': GROUPS,
  'markup, entities, prefixes': MARKUP,
};

/** What we read otherwise than the browser draws it; then a finding has to say so, with this code. */
export const SAID_OTHERWISE: ReadonlyMap<string, string> = new Map([
  ['units of the letters', 'font-unit-assumed'],
  ['units of the window', 'length-error'],
  ['points with an error', 'points-error'],
  ['a prefix for SVG', 'svg-namespace-missing'],
]);

/** Where Chromium leaves the standard and we do not. */
export const BY_THE_STANDARD: ReadonlyMap<string, string> = new Map([
  ['rect with a radius of auto', 'SVG 2, "rx" and "ry": auto in the attribute too'],
  ['ellipse with auto', 'SVG 2, "rx" and "ry": auto in the attribute too'],
  ['entities in entities', 'XML 1.0, 4.4.5: replaced in literals too'],
]);
