import type { SvgElement } from '../markup/svgTree.js';
import { type Context, type Session, shown } from '../session.js';
import { computeStyle, type Style } from './computedStyle.js';

const PAINT_SERVERS: ReadonlySet<string> = new Set([
  ...['linearGradient', 'radialGradient', 'pattern', 'meshgradient', 'hatch', 'solidcolor', 'solidColor'],
]);

/** The style of an element from what is specified on it and its parent's. */
export function styleOf(
  session: Session,
  element: SvgElement,
  specified: ReadonlyMap<string, string>,
  context: Context,
): Style {
  // The table of ids is made when first asked for: most drawings never need it.
  const named = (id: string) => session.tree.byId.get(id)?.name ?? '';
  return computeStyle(specified, context.style, {
    viewportWidth: context.viewportWidth,
    viewportHeight: context.viewportHeight,
    pxPerInch: context.pxPerInch,
    rootFontSize: context.rootFontSize,
    isPaintServer: (id) => PAINT_SERVERS.has(named(id)),
    isMarker: (id) => named(id) === 'marker',
    reportColour: (found) => session.report('colour-not-read', element, { found: shown(found) }),
    reportLength: (attribute, found) =>
      session.report('length-error', element, { attribute, found: shown(found) }),
  });
}
