import { type Affine, multiply, translation } from '../../geometry/affine.js';
import { viewportClip } from '../clip/clipping.js';
import type { SvgElement } from '../markup/svgTree.js';
import {
  type AspectRatio,
  readAspectRatio,
  readViewBox,
  type ViewBox,
  viewBoxTransform,
  XMIDYMID_MEET,
} from '../page/viewBox.js';
import { type Context, type Session, shown } from '../session.js';
import { styleInViewport } from '../style/computedStyle.js';
import { readLength, toUserUnits } from '../style/length.js';
import { lengthOf } from './drawElement.js';

/** Width and height that a `use` gives to what it copies; null where it gives none. */
export interface UseSize {
  readonly width: string | null;
  readonly height: string | null;
}

/**
 * The context inside a nested `svg` or a copied `symbol`: a viewport of its own (SVG 2, "Establishing
 * a new SVG viewport"). null where nothing in it is drawn, because it has no size.
 */
export function enterViewport(
  session: Session,
  element: SvgElement,
  specified: ReadonlyMap<string, string>,
  outer: Context,
  useSize: UseSize | null,
): Context | null {
  const { style } = outer;
  const at = (name: string, axis: 'x' | 'y'): number =>
    lengthOf(session, element, specified, name, axis, style, outer) ?? 0;
  const size = (name: 'width' | 'height', axis: 'x' | 'y'): number => {
    const ofUse = useSize?.[name]?.trim() ?? 'auto';
    const text = ofUse === 'auto' ? (specified.get(name) ?? 'auto') : ofUse;
    const length = text.trim() === 'auto' ? null : readLength(text);
    if (!length && text.trim() !== 'auto') {
      session.report('length-error', element, { attribute: name, found: shown(text) });
    }
    return toUserUnits(length ?? { value: 100, unit: '%' }, axis, outer, style.fontSize);
  };
  const rectangle = {
    x: at('x', 'x'),
    y: at('y', 'y'),
    width: size('width', 'x'),
    height: size('height', 'y'),
  };
  if (!(rectangle.width > 0 && rectangle.height > 0)) {
    session.report('nothing-to-draw', element);
    return null;
  }
  const viewBox = viewBoxOf(session, element);
  if (viewBox && (viewBox.width === 0 || viewBox.height === 0)) return null;
  const clip = viewportClip(session, specified, rectangle, outer);
  return { ...contextInside(outer, outer.map, rectangle, viewBox, aspectOf(session, element)), clip };
}

/** Inside a viewport: percentages are of the viewBox, or of the viewport where there is none. */
export function contextInside(
  outer: Context,
  map: Affine,
  rectangle: ViewBox,
  viewBox: ViewBox | null,
  aspect: AspectRatio,
): Context {
  const inner = viewBox
    ? viewBoxTransform(viewBox, rectangle, aspect)
    : translation(rectangle.x, rectangle.y);
  const inside: Context = {
    ...outer,
    map: multiply(map, inner),
    viewportWidth: viewBox?.width ?? rectangle.width,
    viewportHeight: viewBox?.height ?? rectangle.height,
  };
  return { ...inside, style: styleInViewport(outer.style, inside) };
}

/** null where there is none or it is wrong; one that is empty, and so draws nothing, is reported too. */
export function viewBoxOf(session: Session, element: SvgElement): ViewBox | null {
  const text = session.tree.attributeOf(element, 'viewBox');
  if (text === null) return null;
  const viewBox = readViewBox(text);
  if (!viewBox) session.report('viewbox-error', element, { viewBox: shown(text) });
  else if (viewBox.width === 0 || viewBox.height === 0) {
    session.report('viewbox-empty', element, { viewBox: shown(text) });
  }
  return viewBox;
}

/** As `preserveAspectRatio` says, or by default; one that is wrong is reported. */
export function aspectOf(session: Session, element: SvgElement): AspectRatio {
  const text = session.tree.attributeOf(element, 'preserveAspectRatio');
  const aspect = text === null ? XMIDYMID_MEET : readAspectRatio(text);
  if (aspect) return aspect;
  session.report('aspect-ratio-error', element, { preserveAspectRatio: shown(text ?? '') });
  return XMIDYMID_MEET;
}
