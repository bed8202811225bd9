import { type Affine, determinant, multiply, scaling, translation } from '../../geometry/affine.js';
import { Outline } from '../../geometry/outline.js';
import { bothOf, NOWHERE, outlinesIn, type Region } from '../../geometry/region.js';
import type { SvgElement } from '../markup/svgTree.js';
import { traceBasicShape } from '../path/basicShape.js';
import type { Context, Session } from '../session.js';
import { OutlineSink } from '../stroke/outlineSink.js';
import { holds } from '../structure/conditions.js';
import { lengthOf, SHAPES, type Shape, traceShapeInto } from '../structure/drawElement.js';
import { hrefOf } from '../structure/references.js';
import { INITIAL_STYLE } from '../style/computedStyle.js';
import { styleOf } from '../style/styleReading.js';
import { transformOf } from '../transform/transformOf.js';
import { readClipValue } from './clipValue.js';
import { type Bounds, boundsInside, boundsOf } from './elementBounds.js';

/** What a clip path costs to build, in steps of `Work` per segment. */
const SEGMENT_WORK = 50;

/** And beyond its segments; more where it is asked for by another, since there are no billions of these. */
const CLIP_WORK = 2000;
const INNER_CLIP_WORK = 10_000;
/** Clip paths clipped by clip paths, deeper than any drawing in earnest. */
const MOST_DEEP = 64;

/** Shapes in one clip. */
const MOST_PARTS = 50_000;

/** A clip that cannot be evaluated. */
class NotRead extends Error {}

/** Clip paths clip one another; `latest` is the last of them in the document. */
class Loop extends Error {
  constructor(readonly latest: SvgElement) {
    super();
  }
}

/** What a clip path is applied to: user space, and the box of what it fills there. */
interface Applied {
  readonly element: SvgElement;
  readonly map: Affine;
  readonly context: Context;
  /** Where it is not that of what it holds. */
  readonly box: Bounds | null;
}

interface Known {
  readonly map: Affine;
  readonly region: Region | null;
}

/**
 * The regions that `clip-path` leaves (CSS Masking Module Level 1): the union of what the children of a
 * clipPath fill, each by its clip-rule and within its own clip, all within the clipPath's own; or a basic
 * shape. In page mm.
 */
export class ClipRegions {
  /** The last one of each clipPath: many elements in a row share one in the same user space. */
  private readonly known = new Map<SvgElement, Known>();
  private readonly active = new Set<SvgElement>();
  /** What is being evaluated depends on more than the map: on a box, or on where a loop was entered. */
  private isPeculiar = false;

  constructor(private readonly session: Session) {}

  /**
   * What the `clip-path` on an element leaves of it; null where it clips nothing, `unread` where it
   * cannot be evaluated. `context` is that of what stands inside the element; `box`, its box in that user
   * space, is worked out where it is null.
   */
  regionFor(
    element: SvgElement,
    value: string,
    context: Context,
    box: Bounds | null = null,
  ): Region | null | 'unread' {
    const { map } = context;
    try {
      return this.session.cascade.apart(() => this.valueRegion(value, { element, map, context, box }));
    } catch (error) {
      if (error instanceof NotRead) return 'unread';
      throw error;
    } finally {
      this.active.clear();
      this.isPeculiar = false;
    }
  }

  private valueRegion(text: string, applied: Applied): Region | null {
    const value = readClipValue(text);
    switch (value.kind) {
      case 'none':
      case 'unknown':
        return null;
      case 'elsewhere':
        throw new NotRead();
      case 'reference': {
        const target = this.session.tree.byId.get(value.id);
        return target?.name === 'clipPath' && target.isSvg ? this.reference(target, applied) : null;
      }
      case 'shape': {
        const { x, y, width, height } = this.referenceBox(value.box, applied);
        const sink = new OutlineSink(multiply(applied.map, translation(x, y)));
        const rule = traceBasicShape(
          value.shape,
          width,
          height,
          applied.context,
          applied.context.style.fontSize,
          sink,
        );
        if (rule === null) throw new NotRead();
        return this.outline(sink, rule === 'evenodd');
      }
    }
  }

  /** Of references that go round in a loop the last one in the document clips nothing, as in Chromium. */
  private reference(clipPath: SvgElement, applied: Applied): Region | null {
    const from = [...this.active].pop();
    try {
      return this.clipPathRegion(clipPath, applied);
    } catch (error) {
      if (error instanceof Loop && error.latest === from) return null;
      throw error;
    }
  }

  private latestSince(clipPath: SvgElement): SvgElement {
    const active = [...this.active];
    return active
      .slice(active.indexOf(clipPath))
      .reduce((latest, next) => (next.number > latest.number ? next : latest));
  }

  private clipPathRegion(clipPath: SvgElement, applied: Applied): Region | null {
    if (this.active.has(clipPath)) {
      this.isPeculiar = true;
      throw new Loop(this.latestSince(clipPath));
    }
    const known = this.known.get(clipPath);
    if (known?.map.every((v, k) => v === applied.map[k])) return known.region;
    this.spend(this.active.size > 0 ? INNER_CLIP_WORK : CLIP_WORK);
    if (this.active.size > MOST_DEEP) throw new NotRead();
    const before = this.isPeculiar;
    this.isPeculiar = false;
    this.active.add(clipPath);
    let region: Region | null;
    try {
      region = this.evaluate(clipPath, applied);
    } finally {
      this.active.delete(clipPath);
    }
    if (region) this.spend(this.sizeOf(region));
    if (!this.isPeculiar) this.known.set(clipPath, { map: applied.map, region });
    this.isPeculiar ||= before;
    return region;
  }

  /** Shared parts multiply where clip paths ask for one another twice. */
  private sizeOf(region: Region): number {
    const size = outlinesIn(region, MOST_PARTS);
    if (size >= MOST_PARTS) throw new NotRead();
    return size;
  }

  private evaluate(clipPath: SvgElement, applied: Applied): Region | null {
    const { session } = this;
    const { style, evenOdd } = this.inherited(clipPath, applied.context);
    const specified = session.cascade.specifiedOn(clipPath);
    const own = specified.get('clip-path') ?? '';
    const transform = transformOf(session, clipPath, specified, style, applied.context, boundsOf);
    let map = transform ? multiply(applied.map, transform) : applied.map;
    if (specified.get('clipPathUnits')?.trim() === 'objectBoundingBox') {
      const [x0, y0, x1, y1] = this.boundsOf(applied);
      map = multiply(multiply(map, translation(x0, y0)), scaling(x1 - x0, y1 - y0));
    }
    const context: Context = { ...applied.context, style, map, copies: null, clip: null };
    const parts: Region[] = [];
    for (const child of clipPath.children) {
      if (typeof child !== 'string' && child.isSvg) this.addChild(child, context, evenOdd, parts);
    }
    const region: Region = parts.length === 1 ? parts[0] : { kind: 'any', parts };
    return own === '' ? region : bothOf(region, this.valueRegion(own, applied));
  }

  /** Adds what a child of a clipPath, or what such a child copies, fills. */
  private addChild(child: SvgElement, outer: Context, outerEvenOdd: boolean, parts: Region[]): void {
    const { session } = this;
    const isShape = SHAPES.has(child.name);
    if (!isShape && child.name !== 'use' && child.name !== 'text') return;
    const specified = session.cascade.specifiedOn(child, outer.copies);
    if (specified.get('display') === 'none' || !holds(specified)) return;
    const style = styleOf(session, child, specified, outer);
    const evenOdd = ruleOf(specified, outerEvenOdd);
    const transform = transformOf(session, child, specified, style, outer, boundsOf);
    const map = transform ? multiply(outer.map, transform) : outer.map;
    const context: Context = { ...outer, style, map };
    const own = specified.get('clip-path') ?? '';
    const found: Region[] = [];
    let inside = context;
    if (child.name === 'use') inside = this.addCopy(child, specified, context, evenOdd, found);
    else if (!style.visible) return;
    else if (child.name === 'text') throw new NotRead();
    else if (determinant(map) !== 0) {
      const sink = new OutlineSink(map);
      const shape: Shape = { session, element: child, specified, style, map, context: outer };
      traceShapeInto(shape, sink, false);
      found.push(this.outline(sink, evenOdd));
    }
    if (found.length === 0) return;
    const clip =
      own === ''
        ? null
        : this.valueRegion(own, { element: child, map: inside.map, context: inside, box: null });
    parts.push(bothOf(found[0], clip) ?? found[0]);
  }

  /** A `use` in a clipPath may only copy a shape or text, not a group. Returns where the copy stands. */
  private addCopy(
    element: SvgElement,
    specified: ReadonlyMap<string, string>,
    context: Context,
    evenOdd: boolean,
    found: Region[],
  ): Context {
    const { session } = this;
    if (context.copies) return context;
    const href = hrefOf(session, element);
    const target = href?.startsWith('#') ? session.tree.byId.get(href.slice(1)) : undefined;
    if (!target || target.name === 'use') return context;
    const at = (name: 'x' | 'y'): number =>
      lengthOf(session, element, specified, name, name, context.style, context) ?? 0;
    const map = multiply(context.map, translation(at('x'), at('y')));
    const copies = { target, use: element, depth: 1, outer: null };
    this.addChild(target, { ...context, map, copies }, evenOdd, found);
    return { ...context, map };
  }

  private outline(sink: OutlineSink, evenOdd: boolean): Region {
    const segments = sink.finish();
    if (sink.overflows) throw new NotRead();
    this.spend(SEGMENT_WORK * (1 + segments.count));
    if (segments.count === 0) return NOWHERE;
    return { kind: 'outline', outline: new Outline(segments, evenOdd) };
  }

  private spend(steps: number): void {
    const { work } = this.session.sink.clipper;
    work.left -= steps;
    if (work.left < 0) throw new NotRead();
  }

  private boundsOf({ element, context, box }: Applied, withStrokes = false): Bounds {
    this.isPeculiar = true;
    if (box) return box;
    this.spend(CLIP_WORK);
    const bounds = boundsInside(this.session, element, context, withStrokes);
    if (bounds === 'unknown') throw new NotRead();
    return bounds ?? [0, 0, 0, 0];
  }

  private referenceBox(
    box: 'fill-box' | 'stroke-box' | 'view-box',
    applied: Applied,
  ): { x: number; y: number; width: number; height: number } {
    if (box === 'view-box') {
      const { viewportWidth, viewportHeight } = applied.context;
      return { x: 0, y: 0, width: viewportWidth, height: viewportHeight };
    }
    const [x0, y0, x1, y1] = this.boundsOf(applied, box === 'stroke-box');
    return { x: x0, y: y0, width: x1 - x0, height: y1 - y0 };
  }

  /** What the children of a clipPath inherit where it stands, not where it is used. */
  private inherited(clipPath: SvgElement, context: Context): { style: Context['style']; evenOdd: boolean } {
    const { session } = this;
    const chain: SvgElement[] = [];
    for (let e: SvgElement | null = clipPath; e !== null; e = e.parent) chain.unshift(e);
    let style = INITIAL_STYLE;
    let evenOdd = false;
    for (const element of chain) {
      const specified = session.cascade.specifiedOn(element);
      style = styleOf(session, element, specified, { ...context, style });
      evenOdd = ruleOf(specified, evenOdd);
    }
    return { style, evenOdd };
  }
}

function ruleOf(specified: ReadonlyMap<string, string>, inherited: boolean): boolean {
  const rule = specified.get('clip-rule')?.trim().toLowerCase();
  if (rule === 'evenodd') return true;
  return rule === 'nonzero' || rule === 'initial' ? false : inherited;
}
