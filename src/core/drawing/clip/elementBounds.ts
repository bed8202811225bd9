import { type Affine, IDENTITY, multiply, translation } from '../../geometry/affine.js';
import { boxOfSegments } from '../../geometry/box.js';
import type { SvgElement } from '../markup/svgTree.js';
import type { Context, Session } from '../session.js';
import { OutlineSink } from '../stroke/outlineSink.js';
import { firstThatHolds, holds } from '../structure/conditions.js';
import { lengthOf, SHAPES, traceShapeInto } from '../structure/drawElement.js';
import { NOT_RENDERED } from '../structure/notRendered.js';
import { hrefOf } from '../structure/references.js';
import { enterViewport, type UseSize } from '../structure/viewport.js';
import type { Style } from '../style/computedStyle.js';
import { styleOf } from '../style/styleReading.js';
import { transformOf } from '../transform/transformOf.js';

/** Least x and y, greatest x and y. */
export type Bounds = [number, number, number, number];

/** Deeper than any drawing in earnest goes. */
const MOST_DEEP = 100;
/** What an element costs, in steps of `Work`. */
const ELEMENT_WORK = 200;
/**
 * The box of what an element fills, in its own user space (SVG 2, "Bounding boxes": no strokes, no
 * clipping, hidden shapes included). null where it is empty; 'unknown' where a text, image or the like
 * takes part, or too much does.
 */
export function boundsOf(session: Session, element: SvgElement, context: Context): Bounds | null | 'unknown' {
  return search(session, context, false, (bounds, at) => bounds.add(element, at, null, 0));
}

/**
 * The same in the user space of its content: past the x and y of a `use`, the viewBox of a viewport. With
 * strokes they reach half their width around; what joins and caps reach beyond that is left out.
 */
export function boundsInside(
  session: Session,
  element: SvgElement,
  context: Context,
  withStrokes: boolean,
): Bounds | null | 'unknown' {
  return search(session, context, withStrokes, (bounds, at) => {
    if (element.name === 'svg' || element.name === 'symbol') return bounds.addChildren(element, at, 0);
    return element.name === 'use' ? bounds.addCopy(element, at, false, 0) : bounds.add(element, at, null, 0);
  });
}

function search(
  session: Session,
  context: Context,
  withStrokes: boolean,
  add: (bounds: Search, at: Context) => boolean,
): Bounds | null | 'unknown' {
  const bounds: Bounds = [Infinity, Infinity, -Infinity, -Infinity];
  if (!add(new Search(session, bounds, withStrokes), { ...context, map: IDENTITY, clip: null }))
    return 'unknown';
  return bounds[0] <= bounds[2] ? bounds : null;
}

class Search {
  private readonly box = new Float64Array(4);

  constructor(
    private readonly session: Session,
    private readonly bounds: Bounds,
    private readonly withStrokes: boolean,
  ) {}

  /** `context.map` holds the element's own transform already. False where the box cannot be known. */
  add(element: SvgElement, context: Context, useSize: UseSize | null, depth: number): boolean {
    const { session } = this;
    const { work } = session.sink.clipper;
    work.left -= ELEMENT_WORK;
    if (work.left < 0 || depth > MOST_DEEP) return false;
    const specified = session.cascade.specifiedOn(element, context.copies);
    const style = styleOf(session, element, specified, context);
    const inner: Context = { ...context, style };
    if (SHAPES.has(element.name)) {
      const sink = new OutlineSink(context.map);
      traceShapeInto({ session, element, specified, style, map: context.map, context }, sink, false);
      return this.include(sink, this.withStrokes ? reachOf(style, context.map) : NO_REACH);
    }
    switch (element.name) {
      case 'g':
      case 'a':
        return this.addChildren(element, inner, depth);
      case 'switch': {
        const chosen = firstThatHolds(element, (child) =>
          session.cascade.specifiedOn(child, context.copies),
        ).chosen;
        return !chosen || NOT_RENDERED.has(chosen.name) || this.addChild(chosen, inner, null, depth);
      }
      case 'svg':
      case 'symbol': {
        const entered = enterViewport(session, element, specified, inner, useSize);
        return !entered || this.addChildren(element, entered, depth);
      }
      case 'use':
        return this.addCopy(element, inner, true, depth);
      default:
        return NOT_RENDERED.has(element.name) || !element.isSvg;
    }
  }

  addChildren(element: SvgElement, context: Context, depth: number): boolean {
    for (const child of element.children) {
      if (typeof child === 'string' || !child.isSvg || NOT_RENDERED.has(child.name)) continue;
      if (!this.addChild(child, context, null, depth)) return false;
    }
    return true;
  }

  private addChild(child: SvgElement, context: Context, useSize: UseSize | null, depth: number): boolean {
    const specified = this.session.cascade.specifiedOn(child, context.copies);
    if (!holds(specified)) return true;
    if (specified.get('display') === 'none' && child.name !== 'symbol') return true;
    const own = transformOf(this.session, child, specified, context.style, context, boundsOf);
    const map: Affine = own ? multiply(context.map, own) : context.map;
    return this.add(child, { ...context, map }, useSize, depth + 1);
  }

  addCopy(element: SvgElement, context: Context, isMoved: boolean, depth: number): boolean {
    const { session } = this;
    const href = hrefOf(session, element);
    const target = href?.startsWith('#') ? session.tree.byId.get(href.slice(1)) : undefined;
    if (!target) return true;
    const specified = session.cascade.specifiedOn(element, context.copies);
    const at = (name: 'x' | 'y'): number =>
      isMoved ? (lengthOf(session, element, specified, name, name, context.style, context) ?? 0) : 0;
    const map = multiply(context.map, translation(at('x'), at('y')));
    const size = { width: specified.get('width') ?? null, height: specified.get('height') ?? null };
    const copies = { target, use: element, depth: (context.copies?.depth ?? 0) + 1, outer: context.copies };
    return this.addChild(target, { ...context, map, copies }, size, depth);
  }

  private include(sink: OutlineSink, [reachX, reachY]: readonly [number, number]): boolean {
    const { bounds, box } = this;
    const segments = sink.finish();
    boxOfSegments(segments, 0, segments.count, box);
    bounds[0] = Math.min(bounds[0], box[0] - reachX);
    bounds[1] = Math.min(bounds[1], box[1] - reachY);
    bounds[2] = Math.max(bounds[2], box[2] + reachX);
    bounds[3] = Math.max(bounds[3], box[3] + reachY);
    return !sink.overflows;
  }
}

const NO_REACH = [0, 0] as const;

/** How far a line reaches across and down: half its width is a circle, and that an ellipse when mapped. */
function reachOf({ stroke, strokeWidth }: Style, [a, b, c, d]: Affine): readonly [number, number] {
  if (stroke.kind === 'none') return NO_REACH;
  const half = strokeWidth / 2;
  return [half * Math.sqrt(a * a + c * c), half * Math.sqrt(b * b + d * d)];
}
