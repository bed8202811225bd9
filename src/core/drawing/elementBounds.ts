import { type Affine, IDENTITY, multiply, translation } from '../geometry/affine.js';
import { segmentBox } from '../geometry/box.js';
import { firstThatHolds, holds } from './conditions.js';
import { lengthOf, SHAPES, traceShapeInto } from './drawElement.js';
import { OutlineSink } from './outlineSink.js';
import { hrefOf } from './references.js';
import type { Context, Session } from './session.js';
import { styleOf } from './styleReading.js';
import type { SvgElement } from './svgTree.js';
import { readTransformList } from './transformList.js';
import { enterViewport, type UseSize } from './viewport.js';

/** Least x and y, greatest x and y. */
export type Bounds = [number, number, number, number];

/** Deeper than any drawing in earnest goes. */
const MOST_DEEP = 100;
const MOST_ELEMENTS = 100_000;
/** Elements that draw nothing where they stand, and so have no box. */
const WITHOUT_BOX: ReadonlySet<string> = new Set([
  ...['defs', 'symbol', 'clipPath', 'mask', 'pattern', 'marker', 'linearGradient', 'radialGradient'],
  ...['filter', 'title', 'desc', 'metadata', 'style', 'script', 'animate', 'set', 'animateTransform'],
  ...['animateMotion', 'view'],
]);

/**
 * The box of what an element fills, in its own user space (SVG 2, "Bounding boxes": no strokes, no
 * clipping, hidden shapes included). null where it is empty; 'unknown' where a text, image or the like
 * takes part, or too much does.
 */
export function boundsOf(session: Session, element: SvgElement, context: Context): Bounds | null | 'unknown' {
  const bounds: Bounds = [Infinity, Infinity, -Infinity, -Infinity];
  const search = new Search(session, bounds);
  const isKnown = search.add(element, { ...context, map: IDENTITY, clip: null }, null, 0);
  if (!isKnown) return 'unknown';
  return bounds[0] <= bounds[2] ? bounds : null;
}

class Search {
  private left = MOST_ELEMENTS;
  private readonly box = new Float64Array(4);

  constructor(
    private readonly session: Session,
    private readonly bounds: Bounds,
  ) {}

  /** `context.map` holds the element's own transform already. False where the box cannot be known. */
  add(element: SvgElement, context: Context, useSize: UseSize | null, depth: number): boolean {
    const { session } = this;
    if (--this.left < 0 || depth > MOST_DEEP) return false;
    const specified = session.cascade.specifiedOn(element, context.copies?.target);
    const style = styleOf(session, element, specified, context);
    const inner: Context = { ...context, style };
    if (SHAPES.has(element.name)) {
      const sink = new OutlineSink(context.map);
      traceShapeInto({ session, element, specified, style, map: context.map, context }, sink, false);
      return this.include(sink);
    }
    switch (element.name) {
      case 'g':
      case 'a':
        return this.addChildren(element, inner, depth);
      case 'switch': {
        const chosen = firstThatHolds(element, (child) =>
          session.cascade.specifiedOn(child, context.copies?.target),
        ).chosen;
        return !chosen || WITHOUT_BOX.has(chosen.name) || this.addChild(chosen, inner, null, depth);
      }
      case 'svg':
      case 'symbol': {
        const entered = enterViewport(session, element, specified, inner, useSize);
        return !entered || this.addChildren(element, entered, depth);
      }
      case 'use':
        return this.addCopy(element, specified, inner, depth);
      default:
        return WITHOUT_BOX.has(element.name) || !element.isSvg;
    }
  }

  private addChildren(element: SvgElement, context: Context, depth: number): boolean {
    for (const child of element.children) {
      if (typeof child === 'string' || !child.isSvg || WITHOUT_BOX.has(child.name)) continue;
      if (!this.addChild(child, context, null, depth)) return false;
    }
    return true;
  }

  private addChild(child: SvgElement, context: Context, useSize: UseSize | null, depth: number): boolean {
    const specified = this.session.cascade.specifiedOn(child, context.copies?.target);
    if (!holds(specified)) return true;
    if (specified.get('display')?.trim() === 'none' && child.name !== 'symbol') return true;
    const own = readTransformList(specified.get('transform') ?? '');
    const map: Affine = own ? multiply(context.map, own) : context.map;
    return this.add(child, { ...context, map }, useSize, depth + 1);
  }

  private addCopy(
    element: SvgElement,
    specified: ReadonlyMap<string, string>,
    context: Context,
    depth: number,
  ): boolean {
    const { session } = this;
    const href = hrefOf(session, element);
    const target = href?.startsWith('#') ? session.tree.byId.get(href.slice(1)) : undefined;
    if (!target) return true;
    const at = (name: 'x' | 'y'): number =>
      lengthOf(session, element, specified, name, name, context.style, context) ?? 0;
    const map = multiply(context.map, translation(at('x'), at('y')));
    const size = { width: specified.get('width') ?? null, height: specified.get('height') ?? null };
    const copies = { target, use: element, depth: (context.copies?.depth ?? 0) + 1, outer: context.copies };
    return this.addChild(target, { ...context, map, copies }, size, depth);
  }

  private include(sink: OutlineSink): boolean {
    const { bounds, box } = this;
    const segments = sink.finish();
    for (let i = 0; i < segments.count; i++) {
      segmentBox(segments, i, box);
      bounds[0] = Math.min(bounds[0], box[0]);
      bounds[1] = Math.min(bounds[1], box[1]);
      bounds[2] = Math.max(bounds[2], box[2]);
      bounds[3] = Math.max(bounds[3], box[3]);
    }
    return !sink.overflows;
  }
}
