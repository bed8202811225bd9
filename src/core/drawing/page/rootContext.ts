import { type Affine, IDENTITY, multiply, scaling } from '../../geometry/affine.js';
import { bothOf } from '../../geometry/region.js';
import { clipWithin, pageRegion } from '../clip/clipping.js';
import type { Bounds } from '../clip/elementBounds.js';
import { NO_LAYER } from '../drawing.js';
import { type Context, type Session, shown } from '../session.js';
import { aspectOf, contextInside, viewBoxOf } from '../structure/viewport.js';
import type { Specified } from '../style/cascade.js';
import { INITIAL_STYLE, readOpacity, type Style } from '../style/computedStyle.js';
import { readLength } from '../style/length.js';
import { styleOf } from '../style/styleReading.js';
import { rootTransformOf } from '../transform/transformOf.js';
import { type PageSize, pageSize } from './pageSize.js';

const CSS_PX_PER_INCH = 96;

/** The page, and what the root's children inherit; `inside` is null where the root draws nothing. */
export interface Root {
  readonly page: PageSize;
  readonly inside: Context | null;
}

/** The root's size, units and style. */
export function rootContext(session: Session): Root {
  const { pxPerInch } = session.rules;
  const { root } = session.tree;
  const units = pxPerInch ?? CSS_PX_PER_INCH;
  const unitMm = 25.4 / units;
  const specified = session.cascade.specifiedOn(root);
  const viewBox = viewBoxOf(session, root);
  const [width, height] = [rootSize(session, specified, 'width'), rootSize(session, specified, 'height')];
  const fontSize = rootFontSize(session, specified, units, `${width} ${height}`);
  const page = pageSize(width, height, viewBox, units, fontSize);
  if (!page.widthGiven) tellWrongSize(session, 'width', width);
  if (!page.heightGiven) tellWrongSize(session, 'height', height);
  if (page.physical && !viewBox && pxPerInch === null) {
    session.report('user-unit-assumed', root, { pxPerInch: units });
  }
  const outside = outermost(page.widthMm / unitMm, page.heightMm / unitMm, units);
  const style = styleOf(session, root, specified, outside);
  const styled: Context = { ...outside, style, rootFontSize: style.fontSize };
  if (specified.get('display') === 'none' || readOpacity(specified.get('opacity') ?? '') === 0) {
    session.report('hidden', root);
    return { page, inside: null };
  }
  const map = rootTransform(session, specified, style, outside);
  const aspect = aspectOf(session, root);
  // The outermost svg is a CSS box to its own clip path: in px, whatever the viewBox.
  const inPx = { ...styled, map: multiply(map, scaling(unitMm, unitMm)) };
  const { viewportWidth, viewportHeight } = outside;
  const box: Bounds = [0, 0, viewportWidth, viewportHeight];
  const isCut = session.rules.pageEdge === 'cut' && page.guess !== 'extent';
  const moved = isCut && map !== IDENTITY ? pageRegion(page, map) : null;
  const clip = bothOf(moved, clipWithin(session, root, specified.get('clip-path'), inPx, box));
  if (!viewBox) return { page, inside: { ...inPx, clip } };
  if (viewBox.width === 0 || viewBox.height === 0) return { page, inside: null };
  // The viewport is in mm here, so that a viewBox in mm comes out with a scale of exactly 1.
  const rectangle = { x: 0, y: 0, width: page.widthMm, height: page.heightMm };
  return { page, inside: contextInside({ ...styled, clip }, map, rectangle, viewBox, aspect) };
}

/** A size that style takes back, or sets to `auto`, is still the natural size of the drawing. */
function rootSize(session: Session, specified: Specified, name: 'width' | 'height'): string | null {
  const text = specified.get(name);
  if (text !== undefined && text.trim().toLowerCase() !== 'auto') return text;
  return session.tree.attributeOf(session.tree.root, name);
}

/** A size that is there and is none, as `100,5mm`: what is taken for it is a guess. */
function tellWrongSize(session: Session, attribute: string, text: string | null): void {
  if (text === null || text.trim() === '' || text.trim().toLowerCase() === 'auto') return;
  const length = readLength(text);
  if (length && length.value >= 0) return;
  session.report('length-error', session.tree.root, { attribute, found: shown(text) });
}

/** Asked only where the size is in units of the font: styles need the page's size, and it theirs. */
function rootFontSize(
  session: Session,
  specified: ReadonlyMap<string, string>,
  pxPerInch: number,
  sizes: string,
): number {
  if (!/\d(?:r?em|ex|ch)\b/i.test(sizes)) return INITIAL_STYLE.fontSize;
  const font = [...specified].filter(([name]) => name.startsWith('font'));
  return styleOf(session, session.tree.root, new Map(font), outermost(0, 0, pxPerInch)).fontSize;
}

/** Where the root element stands: a viewport in px with nothing inherited. */
function outermost(viewportWidth: number, viewportHeight: number, pxPerInch: number): Context {
  return {
    map: IDENTITY,
    style: INITIAL_STYLE,
    layer: NO_LAYER,
    atTop: true,
    copies: null,
    clip: null,
    viewportWidth,
    viewportHeight,
    pxPerInch,
  };
}

/**
 * A transform on the outermost svg acts on its box as on any CSS box, by default about the middle of it (CSS
 * Transforms Module Level 1, "transform-origin"); in mm.
 */
function rootTransform(session: Session, specified: Specified, style: Style, outside: Context): Affine {
  const unitMm = 25.4 / outside.pxPerInch;
  const inUnits = rootTransformOf(session, specified, style, outside);
  if (!inUnits) return IDENTITY;
  const [a, b, c, d, e, f] = inUnits;
  return [a, b, c, d, e * unitMm, f * unitMm];
}
