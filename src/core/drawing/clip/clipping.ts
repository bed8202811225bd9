import { type Affine, applyX, applyY, IDENTITY } from '../../geometry/affine.js';
import { Outline } from '../../geometry/outline.js';
import { bothOf, type Region } from '../../geometry/region.js';
import { SegmentBuilder } from '../../geometry/segments.js';
import type { SvgElement } from '../markup/svgTree.js';
import type { ViewBox } from '../page/viewBox.js';
import { type Context, type Session, shown } from '../session.js';
import type { Clipping } from '../stroke/strokeClipper.js';
import type { Bounds } from './elementBounds.js';

/**
 * What is left of an element within the clip around it and its own `clip-path`, whose value is given.
 * `inside` is where its content stands: past the x and y of a `use` and the viewBox of a viewport, which is
 * user space as browsers have it. `box` is its box there, where it is not that of what it holds.
 */
export function clipWithin(
  session: Session,
  element: SvgElement,
  value: string | undefined,
  inside: Context,
  box: Bounds | null = null,
): Region | null {
  if (value === undefined || session.rules.clips === 'ignore') return inside.clip;
  const own = session.clips.regionFor(element, value, inside, box);
  if (own !== 'unread') return bothOf(inside.clip, own);
  session.report('clip-not-applied', element, { clip: shown(value) });
  return inside.clip;
}

/** The clip inside a viewport: its own rectangle too, unless what overflows it is shown. */
export function viewportClip(
  session: Session,
  specified: ReadonlyMap<string, string>,
  { x, y, width, height }: ViewBox,
  { map, clip }: Context,
): Region | null {
  const overflow = specified.get('overflow')?.trim().toLowerCase().split(/\s+/)[0] ?? 'hidden';
  if (session.rules.clips === 'ignore' || SHOWN_OVERFLOW.has(overflow)) return clip;
  return bothOf(clip, rectangle(x, y, width, height, map));
}

const SHOWN_OVERFLOW: ReadonlySet<string> = new Set(['visible', 'auto']);

/** The paper; or, where the outermost svg is transformed, what that makes of its box. */
export function pageRegion(page: { widthMm: number; heightMm: number }, map: Affine = IDENTITY): Region {
  return rectangle(0, 0, page.widthMm, page.heightMm, map);
}

function rectangle(x: number, y: number, width: number, height: number, map: Affine): Region {
  const builder = new SegmentBuilder();
  const corners = [
    [x, y],
    [x + width, y],
    [x + width, y + height],
    [x, y + height],
  ].map(([px, py]) => [applyX(map, px, py), applyY(map, px, py)]);
  for (let k = 0; k < 4; k++) {
    const [from, to] = [corners[k], corners[(k + 1) % 4]];
    builder.line(from[0], from[1], to[0], to[1]);
  }
  return { kind: 'outline', outline: new Outline(builder.finish(), false) };
}

/** Says what edges took away from one element. */
export function reportClipping(session: Session, element: SvgElement, clipping: Clipping): void {
  const { byClip, byPage, gaveUp } = clipping;
  if (byClip.strokes > 0) {
    session.report('clipped', element, {}, byClip.strokes);
    session.log.sum('clipped', 'clippedMm', byClip.mm);
  }
  if (byPage.strokes > 0) {
    session.report('page-edge-cut', element, {}, byPage.strokes);
    session.log.sum('page-edge-cut', 'clippedMm', byPage.mm);
  }
  if (gaveUp > 0) session.report('cut-limit', element, {}, gaveUp);
}
