import { type Affine, determinant } from '../../geometry/affine.js';
import { reportClipping } from '../clip/clipping.js';
import type { SvgElement } from '../markup/svgTree.js';
import { type ShapeInput, traceShape } from '../path/traceShape.js';
import { type Context, type Session, shown } from '../session.js';
import { dashesOf } from '../stroke/dashesOf.js';
import type { PathSink } from '../stroke/subPathSink.js';
import { readOpacity, type Style } from '../style/computedStyle.js';
import { type Axis, readLength, toUserUnits } from '../style/length.js';
import type { Paint } from '../style/paint.js';

export const SHAPES: ReadonlySet<string> = new Set([
  ...['path', 'line', 'rect', 'circle', 'ellipse', 'polyline', 'polygon'],
]);
const NOT_NEGATIVE: ReadonlySet<string> = new Set(['width', 'height', 'r', 'rx', 'ry']);
const WITH_MARKERS: ReadonlySet<string> = new Set(['path', 'line', 'polyline', 'polygon']);

type Specified = ReadonlyMap<string, string>;

/** A shape in its place: what is said of it, computed and inherited. */
export interface Shape {
  readonly session: Session;
  readonly element: SvgElement;
  readonly specified: Specified;
  readonly style: Style;
  readonly map: Affine;
  readonly context: Context;
}

/** Draws one shape, or says why not: every shape ends as strokes or in a finding. */
export function drawElement(
  session: Session,
  element: SvgElement,
  specified: Specified,
  style: Style,
  map: Affine,
  context: Context,
): void {
  session.elementCount++;
  const shape: Shape = { session, element, specified, style, map, context };
  const colour = colourOf(style.stroke, style);
  const fill = element.name === 'line' || style.fillOpacity === 0 ? null : colourOf(style.fill, style);
  if (!style.visible || readOpacity(specified.get('opacity') ?? '') === 0) {
    session.report('invisible', element);
  } else if (colour === null && fill && session.rules.fills === 'outline' && isInvertible(map)) {
    if (drawLines(shape, fill) > 0) session.report('fill-drawn-as-outline', element);
  } else if (colour === null && fill) {
    measureOutline(shape);
  } else if (!colour || style.strokeWidth === 0 || style.strokeOpacity === 0) {
    session.report('invisible', element);
  } else if (!isInvertible(map)) {
    session.report('flattened-to-nothing', element);
  } else if (drawLines(shape, colour) > 0) {
    if (style.dashes && session.rules.dashes === 'solid') session.report('dashes-drawn-solid', element);
    if (style.markers !== 0 && WITH_MARKERS.has(element.name)) session.report('markers-not-drawn', element);
    if (style.stroke.kind === 'server') {
      session.report('paint-server-drawn-as-line', element, { paint: shown(colour) });
    }
    if (colour === '#ffffff') session.report('white-strokes', element);
    if (fill && session.sink.hasArea) session.report('fill-ignored', element);
  }
}

/** null where nothing is painted, '' where the paint is transparent. */
function colourOf(paint: Paint, style: Style): string | null {
  switch (paint.kind) {
    case 'none':
      return null;
    case 'current':
      return style.colourVisible ? style.colour : '';
    case 'server':
      return paint.id;
    case 'colour':
      return paint.visible ? paint.hex : '';
  }
}

/** A map without an inverse displays nothing (CSS Transforms Module Level 1, §8). */
function isInvertible(map: Affine): boolean {
  const det = determinant(map);
  return Number.isFinite(det) ? det !== 0 : map.every(Number.isFinite);
}

/** With `map` null the width is that of the root's user units, whatever the element's. */
function strokeWidthMm(style: Style, map: Affine | null, context: Context): number {
  const scale = map ? Math.sqrt(Math.abs(determinant(map))) : 25.4 / context.pxPerInch;
  const width = style.strokeWidth * scale;
  return Number.isFinite(width) ? width : 0;
}

/** Returns the number of strokes drawn. */
function drawLines(shape: Shape, colour: string): number {
  const { session, element, specified, style, map, context } = shape;
  const { sink } = session;
  const nonScaling = specified.get('vector-effect')?.trim() === 'non-scaling-stroke';
  const lengthUnder = (by: Affine): number => {
    sink.begin(by, null);
    traceShapeInto(shape, sink, false);
    return sink.end().outlineMm;
  };
  const pathLength = specified.get('pathLength');
  const properties = {
    colour: session.colourNumber(colour),
    layer: context.layer,
    element: session.placeNumber(element),
    widthMm: strokeWidthMm(style, nonScaling ? null : map, context),
    clip: context.clip,
    dots: style.dots,
    dashed: style.dashes !== null,
    dash: dashesOf(session, style, pathLength, nonScaling, context, lengthUnder, map),
  };
  sink.begin(map, properties);
  const reported = traceShapeInto(shape, sink, true);
  const drawn = sink.end();
  reportClipping(session, element, drawn.clipping);
  if (drawn.buttDots > 0) session.report('butt-dots-not-drawn', element, {}, drawn.buttDots);
  if (drawn.overflows > 0) session.report('coordinate-overflow', element, {}, drawn.overflows);
  if (drawn.undashed > 0) {
    const values = { limit: 'dashes', value: session.limits.dashes };
    session.report('too-many-dashes', element, values, drawn.undashed);
  }
  const gone = drawn.clipping.byClip.strokes + drawn.clipping.byPage.strokes;
  if (drawn.strokes + gone + drawn.buttDots + drawn.overflows === 0 && !reported) {
    session.report('nothing-to-draw', element);
  }
  return drawn.strokes;
}

function measureOutline(shape: Shape): void {
  const { session, element, map } = shape;
  session.report('filled-not-stroked', element);
  session.sink.begin(map, null);
  traceShapeInto(shape, session.sink, true);
  session.log.sum('filled-not-stroked', 'outlineMm', session.sink.end().outlineMm);
}

/**
 * Sends the shape to the sink. `tells` is false where its errors have been or will be told elsewhere.
 * Returns whether there were any.
 */
export function traceShapeInto(shape: Shape, sink: PathSink, tells: boolean): boolean {
  const { session, element, specified } = shape;
  if (element.name !== 'path') {
    const input = shapeInput(shape, tells);
    traceShape(element.name, input, sink);
    return input.reported();
  }
  const data = specified.get('d') ?? '';
  const offset = session.paths.draw(data, sink);
  if (offset >= 0 && tells) {
    session.report('path-error', element, { offset, found: shown(data.slice(offset, offset + 12)) });
  }
  return offset >= 0;
}

function shapeInput(shape: Shape, tells: boolean): ShapeInput & { reported(): boolean } {
  const { session, element, specified, style, context } = shape;
  let reported = false;
  return {
    reported: () => reported,
    length: (name, axis) => lengthOf(session, element, specified, name, axis, style, context),
    text: (name) => specified.get(name) ?? null,
    report: (code, values) => {
      reported = true;
      if (tells) session.report(code, element, values);
    },
  };
}

/** A geometry attribute in user units; null where it is missing, `auto` or wrong (which is reported). */
export function lengthOf(
  session: Session,
  element: SvgElement,
  specified: Specified,
  name: string,
  axis: Axis,
  style: Style,
  context: Context,
): number | null {
  const text = specified.get(name);
  if (text === undefined || text.trim() === 'auto') return null;
  const length = readLength(text);
  if (length) {
    if (length.unit === 'ex' || length.unit === 'ch') {
      session.report('font-unit-assumed', element, { attribute: name, found: shown(text) });
    }
    const value = toUserUnits(length, axis, context, style.fontSize);
    // A sum that comes out negative where it may not be counts as 0 (CSS Values and Units 4, §10.5).
    return length.unit === 'calc' && NOT_NEGATIVE.has(name) ? Math.max(0, value) : value;
  }
  session.report('length-error', element, { attribute: name, found: shown(text) });
  return null;
}
