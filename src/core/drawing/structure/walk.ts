import { type Affine, multiply, translation } from '../../geometry/affine.js';
import type { Region } from '../../geometry/region.js';
import { clipWithin } from '../clip/clipping.js';
import { boundsOf } from '../clip/elementBounds.js';
import { type SvgElement, textOf } from '../markup/svgTree.js';
import type { LimitName } from '../readingLimits.js';
import { type Context, type Session, shown } from '../session.js';
import type { Specified } from '../style/cascade.js';
import { readOpacity, type Style } from '../style/computedStyle.js';
import { styleOf } from '../style/styleReading.js';
import { transformOf } from '../transform/transformOf.js';
import { firstThatHolds, holds } from './conditions.js';
import { CopyLimits } from './copyLimits.js';
import { drawElement, lengthOf, SHAPES } from './drawElement.js';
import { NOT_RENDERED } from './notRendered.js';
import { hrefOf, isLoop, labelOf } from './references.js';
import { enterViewport, type UseSize } from './viewport.js';

const NO_BLENDING: ReadonlySet<string> = new Set(['', 'normal', 'inherit', 'initial', 'unset', 'revert']);

/** Elements whose children are being drawn. */
interface Frame {
  readonly children: readonly (SvgElement | string)[];
  readonly context: Context;
  /** What a `use` says of the size of the `svg` or `symbol` it copies, the only child here. */
  readonly useSize: UseSize | null;
  next: number;
}

/**
 * Draws everything below the root in document order, `use` copies in their place. The walk keeps its
 * own stack, so neither depth nor copies in copies can overflow the engine's.
 */
export function walk(session: Session, root: SvgElement, context: Context): void {
  new Walk(session).run(root, context);
}

/** A shape is nothing but its box, which `contents` takes away (CSS Display Module Level 3, appendix B). */
function isUndisplayed(specified: Specified, name: string): boolean {
  const display = specified.get('display');
  return (display === 'none' && name !== 'symbol') || (display === 'contents' && SHAPES.has(name));
}

class Walk {
  private readonly frames: Frame[] = [];
  private readonly limits: CopyLimits;
  private readonly shapeCounts = new Map<SvgElement, number>();

  constructor(private readonly session: Session) {
    this.limits = new CopyLimits(session.limits);
  }

  run(root: SvgElement, context: Context): void {
    this.enter(root.children, context);
    while (this.frames.length > 0) {
      const frame = this.frames[this.frames.length - 1];
      const child = frame.children[frame.next++];
      if (child === undefined) this.frames.pop();
      else if (typeof child !== 'string') this.visit(child, frame);
    }
  }

  private enter(children: Frame['children'], context: Context, useSize: UseSize | null = null): void {
    if (children.length > 0) this.frames.push({ children, context, useSize, next: 0 });
  }

  private visit(element: SvgElement, frame: Frame): void {
    const { session } = this;
    const { context } = frame;
    const { name } = element;
    const copied = frame.useSize !== null;
    if (!element.isSvg || (NOT_RENDERED.has(name) && !(name === 'symbol' && copied))) return;
    if (context.copies) {
      const size = session.tree.attributes.sizeOf(element.number) + element.children.length;
      if (this.isPast(this.limits.passedByElement(size), element)) return;
    }
    const isLayer = context.atTop && name === 'g';
    const layer = isLayer ? this.addLayer(element) : context.layer;
    const specified = session.cascade.specifiedOn(element, context.copies);
    if (!holds(specified)) {
      this.reportShapes('condition-not-met', element);
      return;
    }
    if (isUndisplayed(specified, name)) {
      this.reportShapes('hidden', element);
      return;
    }
    const style = styleOf(session, element, specified, context);
    const map = this.mapOf(element, specified, style, context);
    const clipPath = specified.get('clip-path');
    const within = (inside: Context): Region | null => clipWithin(session, element, clipPath, inside);
    const hasOwnSpace = name === 'use' || name === 'svg' || name === 'symbol';
    const clip = clipPath === undefined || hasOwnSpace ? context.clip : within({ ...context, map, style });
    this.reportEffects(element, specified);
    if (SHAPES.has(name)) {
      const before = session.sink.segmentsSeen;
      drawElement(
        session,
        element,
        specified,
        style,
        map,
        clip === context.clip ? context : { ...context, clip },
      );
      if (context.copies) this.limits.addSegments(session.sink.segmentsSeen - before);
      return;
    }
    if (readOpacity(specified.get('opacity') ?? '') === 0) {
      this.reportShapes('invisible', element);
      return;
    }
    const inner: Context = { ...context, map, style, layer, clip, atTop: false };
    switch (name) {
      case 'g':
      case 'a':
        this.enter(element.children, inner);
        break;
      case 'svg':
      case 'symbol': {
        const entered = enterViewport(session, element, specified, inner, frame.useSize);
        if (!entered) break;
        // A viewport's own clip path takes the place of its rectangle in Chromium.
        const own = clipPath === undefined ? context.clip : within({ ...entered, clip: context.clip });
        this.enter(element.children, own === context.clip ? entered : { ...entered, clip: own });
        break;
      }
      case 'switch':
        this.enterSwitch(element, inner);
        break;
      case 'use':
        this.enterUse(element, specified, inner, within);
        break;
      default:
        this.reportNotDrawn(element, style);
    }
  }

  private mapOf(element: SvgElement, specified: Specified, style: Style, context: Context): Affine {
    const own = transformOf(this.session, element, specified, style, context, boundsOf);
    return own ? multiply(context.map, own) : context.map;
  }

  private enterSwitch(element: SvgElement, context: Context): void {
    const { chosen, passedOver, languages } = firstThatHolds(element, (child) =>
      this.session.cascade.specifiedOn(child, context.copies),
    );
    if (languages !== null) this.session.report('language-assumed', element, { asked: shown(languages) });
    for (const foreign of passedOver) this.session.report('foreign-object-not-drawn', foreign);
    // A title or defs before them all is chosen too, and nothing drawn: so says SVG 2, and browsers do.
    if (chosen && !NOT_RENDERED.has(chosen.name)) this.enter([chosen], context);
    else if (element.children.length > 0) this.session.report('switch-without-match', element);
  }

  private enterUse(
    element: SvgElement,
    specified: Specified,
    context: Context,
    clipWithin: (inside: Context) => Region | null,
  ): void {
    const { session } = this;
    const href = hrefOf(session, element);
    if (href === null || href === '' || href === '#') {
      session.report('use-missing', element, { href: '' });
      return;
    }
    const first = { href: shown(href) };
    const target = href.startsWith('#') ? session.tree.byId.get(href.slice(1)) : undefined;
    if (!href.startsWith('#')) session.report('use-external', element, first);
    else if (!target) session.report('use-missing', element, first);
    else if (isLoop(element, context, target)) session.report('use-loop', element, first);
    else if (
      !this.isPast(this.limits.passedByDepth(context.copies?.depth ?? 0), element) &&
      !this.isPast(this.limits.passedByCopy(), element)
    ) {
      const length = (name: string, axis: 'x' | 'y'): number =>
        lengthOf(session, element, specified, name, axis, context.style, context) ?? 0;
      const map = multiply(context.map, translation(length('x', 'x'), length('y', 'y')));
      const copies = { target, use: element, depth: (context.copies?.depth ?? 0) + 1, outer: context.copies };
      const size = { width: specified.get('width') ?? null, height: specified.get('height') ?? null };
      const clip = clipWithin({ ...context, map });
      this.enter([target], { ...context, map, copies, clip }, size);
    }
  }

  private isPast(limit: LimitName | null, element: SvgElement): boolean {
    if (limit === null) return false;
    this.session.report('use-limit', element, { limit, value: this.session.limits[limit] });
    return true;
  }

  private addLayer(element: SvgElement): number {
    const { session } = this;
    const id = session.tree.attributeOf(element, 'id');
    return session.layers.push({ id, label: labelOf(session, element) }) - 1;
  }

  private reportShapes(code: 'hidden' | 'invisible' | 'condition-not-met', element: SvgElement): void {
    const count = this.shapesIn(element);
    if (count > 0) this.session.report(code, element, {}, count);
    this.session.elementCount += count;
  }

  private reportEffects(element: SvgElement, specified: Specified): void {
    const mode = specified.get('mix-blend-mode')?.trim().toLowerCase() ?? '';
    if (!NO_BLENDING.has(mode)) this.session.report('blend-mode-not-applied', element, { mode: shown(mode) });
    for (const property of ['mask', 'filter'] as const) {
      const value = specified.get(property)?.trim();
      if (value === undefined || value === '' || ['none', 'inherit', 'initial', 'unset'].includes(value))
        continue;
      // A reference to nothing has no effect (CSS Masking Module Level 1).
      const id = /^url\(\s*["']?#([^"')]*)/.exec(value)?.[1];
      if (id !== undefined && !this.session.tree.byId.has(id)) continue;
      this.session.report(`${property}-not-applied` as const, element, { [property]: shown(value) });
    }
  }

  private reportNotDrawn(element: SvgElement, style: Style): void {
    const { session } = this;
    switch (element.name) {
      case 'text':
        if (style.visible) session.report('text-not-drawn', element, () => ({ text: textOf(element, 60) }));
        break;
      case 'image': {
        const href = hrefOf(session, element) ?? '';
        if (style.visible) {
          session.report('image-not-drawn', element, {
            href: href.startsWith('data:') ? 'data:' : shown(href),
          });
        }
        break;
      }
      case 'foreignObject':
        session.report('foreign-object-not-drawn', element);
        break;
      default:
        session.report('unknown-element', element, { name: shown(element.name) });
    }
  }

  /** Shapes in an element that is left out, copies not made; remembered, since copies may ask again. */
  private shapesIn(element: SvgElement): number {
    let count = this.shapeCounts.get(element);
    if (count !== undefined) return count;
    count = 0;
    const pending: SvgElement[] = [element];
    for (let next = pending.pop(); next; next = pending.pop()) {
      if (SHAPES.has(next.name) || next.name === 'use') count++;
      for (const child of next.children) {
        if (typeof child !== 'string' && child.isSvg && !NOT_RENDERED.has(child.name)) pending.push(child);
      }
    }
    this.shapeCounts.set(element, count);
    return count;
  }
}
