import { type Affine, IDENTITY, multiply, translation } from '../../geometry/affine.js';
import type { SvgElement } from '../markup/svgTree.js';
import { type Box, type Context, type Session, shown } from '../session.js';
import type { Specified } from '../style/cascade.js';
import type { Style } from '../style/computedStyle.js';
import { toUserUnits, type WrittenLength } from '../style/length.js';
import { cssTransform } from './cssTransform.js';
import { readTransformList } from './transformList.js';
import { type Origin, readTransformOrigin } from './transformOrigin.js';

/** Where percentages and the origin of a transform are measured. */
interface ReferenceBox {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** The box of what an element fills, in its own user space. */
export type BoundsOf = (session: Session, element: SvgElement, context: Context) => Box;

/** Elements measured by their own boxes inside one another; real ones have one or two. */
const DEEPEST_BOXES = 16;
const CORNER: Origin = { x: { value: 0, unit: '' }, y: { value: 0, unit: '' } };
const MIDDLE: Origin = { x: { value: 50, unit: '%' }, y: { value: 50, unit: '%' } };
const NOWHERE: ReferenceBox = { x: 0, y: 0, width: 0, height: 0 };

/**
 * The map of an element's own transform: the attribute or, where style says so, the CSS properties, about
 * their origin (CSS Transforms Module Level 2, §9, "Current Transformation Matrix"). `context` is where the
 * element stands. What is wrong is reported and maps nothing; null where there is nothing to map.
 */
export function transformOf(
  session: Session,
  element: SvgElement,
  specified: Specified,
  style: Style,
  context: Context,
  boundsOf: BoundsOf,
): Affine | null {
  if (specified.get('transform') === undefined && specified.styled.size === 0) return null;
  // An element without a box of its own is not transformed (CSS Display Module Level 3, "contents").
  if (specified.get('display') === 'contents') return null;
  return mapped(session, element, specified, style, context, CORNER, () =>
    referenceBox(session, element, specified, style, context, boundsOf),
  );
}

/** The same for the outermost svg, a CSS box: its middle is the origin, and its size the reference box. */
export function rootTransformOf(
  session: Session,
  specified: Specified,
  style: Style,
  outside: Context,
): Affine | null {
  const { viewportWidth: width, viewportHeight: height } = outside;
  const box = { x: 0, y: 0, width, height };
  return mapped(session, session.tree.root, specified, style, outside, MIDDLE, () => box);
}

function mapped(
  session: Session,
  element: SvgElement,
  specified: Specified,
  style: Style,
  context: Context,
  otherwise: Origin,
  boxOf: () => ReferenceBox,
): Affine | null {
  const text = specified.get('transform');
  const only = (name: string): string | null =>
    specified.styled.has(name) ? (specified.get(name) ?? null) : null;
  const motion = only('offset-path');
  if (motion !== null && motion.toLowerCase() !== 'none') {
    session.report('motion-path-not-applied', element, { motion: shown(motion) });
  }
  const parts = {
    translate: only('translate'),
    rotate: only('rotate'),
    scale: only('scale'),
    list: only('transform'),
  };
  const isInStyle = Object.values(parts).some((part) => part !== null);
  const attribute = parts.list === null && text !== undefined ? readTransformList(text) : IDENTITY;
  if (attribute === null) session.report('transform-error', element, { transform: shown(text ?? '') });
  if (!isInStyle && (attribute === null || attribute === IDENTITY)) return null;
  const origin = originOf(session, element, specified, otherwise);
  const box = boxOf();
  const units = (length: WrittenLength, axis: 'x' | 'y' | 'z'): number => {
    const size = axis === 'x' ? box.width : box.height;
    const within = { ...context, viewportWidth: size, viewportHeight: size };
    return toUserUnits(length, 'x', within, style.fontSize);
  };
  const inStyle = isInStyle ? cssTransform(parts, units) : IDENTITY;
  if (inStyle === null) session.report('transform-error', element, { transform: shown(text ?? '') });
  const map = multiply(inStyle ?? IDENTITY, attribute ?? IDENTITY);
  if (origin === CORNER && box.x === 0 && box.y === 0) return map;
  const x = box.x + units(origin.x, 'x');
  const y = box.y + units(origin.y, 'y');
  return multiply(multiply(translation(x, y), map), translation(-x, -y));
}

function originOf(session: Session, element: SvgElement, specified: Specified, otherwise: Origin): Origin {
  const text = specified.get('transform-origin');
  if (text === undefined) return otherwise;
  const origin = readTransformOrigin(text, !specified.styled.has('transform-origin'));
  if (!origin) session.report('transform-origin-ignored', element, { origin: shown(text) });
  return origin ?? otherwise;
}

/** In the user space where the element stands, whose origin is that of the viewBox. */
function referenceBox(
  session: Session,
  element: SvgElement,
  specified: Specified,
  style: Style,
  context: Context,
  boundsOf: BoundsOf,
): ReferenceBox {
  const given = specified.styled.has('transform-box') ? specified.get('transform-box') : undefined;
  const keyword = given?.toLowerCase() ?? 'view-box';
  if (keyword === 'view-box') {
    return { x: 0, y: 0, width: context.viewportWidth, height: context.viewportHeight };
  }
  const bounds = boxOf(session, element, context, boundsOf);
  if (bounds === null) return NOWHERE;
  const widened = keyword === 'stroke-box' || keyword === 'border-box';
  const spread = widened && style.stroke.kind !== 'none' ? style.strokeWidth / 2 : 0;
  // How far a line reaches beyond the outline is known of these only: others have joins and caps.
  const isKnown = spread === 0 || ['rect', 'circle', 'ellipse'].includes(element.name);
  if (bounds === 'unknown' || !isKnown) {
    session.report('transform-origin-ignored', element, { origin: keyword });
    return NOWHERE;
  }
  const [left, top, right, bottom] = bounds;
  return {
    x: left - spread,
    y: top - spread,
    width: right - left + 2 * spread,
    height: bottom - top + 2 * spread,
  };
}

function boxOf(session: Session, element: SvgElement, context: Context, boundsOf: BoundsOf): Box {
  const known = context.copies ? undefined : session.boxes.get(element);
  if (known !== undefined) return known;
  if (session.measuring >= DEEPEST_BOXES) return 'unknown';
  session.measuring++;
  const box = session.cascade.apart(() => boundsOf(session, element, context));
  session.measuring--;
  if (!context.copies) session.boxes.set(element, box);
  return box;
}
