import { type Affine, determinant } from '../geometry/affine.js';
import { readOpacity, type Style } from './computedStyle.js';
import { type Axis, readLength, toUserUnits } from './length.js';
import { type Context, type Session, shown } from './session.js';
import type { StrokeProperties } from './strokeSink.js';
import type { SvgElement } from './svgTree.js';
import { tracePath } from './tracePath.js';
import { type ShapeInput, traceShape } from './traceShape.js';

export const SHAPES: ReadonlySet<string> = new Set([
  ...['path', 'line', 'rect', 'circle', 'ellipse', 'polyline', 'polygon'],
]);
const WITH_MARKERS: ReadonlySet<string> = new Set(['path', 'line', 'polyline', 'polygon']);

type Specified = ReadonlyMap<string, string>;

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
  const colour = strokeColour(style);
  const fillVisible = element.name !== 'line' && isFillVisible(style);
  if (!style.visible || readOpacity(specified.get('opacity') ?? '') === 0) {
    session.report('invisible', element);
  } else if (colour === null) {
    if (fillVisible) measureOutline(session, element, specified, style, map, context);
    else session.report('invisible', element);
  } else if (colour === '' || style.strokeWidth === 0 || style.strokeOpacity === 0) {
    session.report('invisible', element);
  } else if (!isInvertible(map)) {
    session.report('flattened-to-nothing', element);
  } else {
    const nonScaling = specified.get('vector-effect')?.trim() === 'non-scaling-stroke';
    const drawn = trace(session, element, specified, style, map, context, {
      colour: session.colourNumber(colour),
      layer: context.layer,
      element: session.placeNumber(element),
      widthMm: strokeWidthMm(style, nonScaling ? null : map, context),
      dots: style.dots,
    });
    if (drawn === 0) return;
    if (style.dashed) session.report('dashes-drawn-solid', element);
    if (style.markers !== 0 && WITH_MARKERS.has(element.name)) session.report('markers-not-drawn', element);
    if (style.stroke.kind === 'server') {
      session.report('paint-server-drawn-as-line', element, { paint: shown(colour) });
    }
    if (colour === '#ffffff') session.report('white-strokes', element);
    if (fillVisible) session.report('fill-ignored', element);
  }
}

/** null where there is no stroke, '' where it is transparent. */
function strokeColour(style: Style): string | null {
  const { stroke } = style;
  switch (stroke.kind) {
    case 'none':
      return null;
    case 'current':
      return style.colourVisible ? style.colour : '';
    case 'server':
      return stroke.id;
    case 'colour':
      return stroke.visible ? stroke.hex : '';
  }
}

function isFillVisible(style: Style): boolean {
  const { fill } = style;
  if (fill.kind === 'none' || style.fillOpacity === 0) return false;
  return fill.kind === 'current' ? style.colourVisible : fill.kind === 'server' || fill.visible;
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

function measureOutline(
  session: Session,
  element: SvgElement,
  specified: Specified,
  style: Style,
  map: Affine,
  context: Context,
): void {
  session.report('filled-not-stroked', element);
  const outlineMm = trace(session, element, specified, style, map, context, null);
  session.log.sum('filled-not-stroked', 'outlineMm', outlineMm);
}

/** Draws; returns the number of strokes, or the length in mm where `properties` is null. */
function trace(
  session: Session,
  element: SvgElement,
  specified: Specified,
  style: Style,
  map: Affine,
  context: Context,
  properties: StrokeProperties | null,
): number {
  const { sink } = session;
  sink.begin(map, properties);
  let reported = false;
  if (element.name === 'path') {
    const data = specified.get('d') ?? '';
    const offset = session.paths.read(data);
    if (offset >= 0) {
      session.report('path-error', element, { offset, found: shown(data.slice(offset, offset + 12)) });
      reported = true;
    }
    tracePath(session.paths.commands, sink);
  } else {
    const input = shapeInput(session, element, specified, style, context);
    traceShape(element.name, input, sink);
    reported = input.reported();
  }
  const drawn = sink.end();
  if (!properties) return drawn.outlineMm;
  if (drawn.buttDots > 0) session.report('butt-dots-not-drawn', element, {}, drawn.buttDots);
  if (drawn.overflows > 0) session.report('coordinate-overflow', element, {}, drawn.overflows);
  if (drawn.strokes + drawn.buttDots + drawn.overflows === 0 && !reported) {
    session.report('nothing-to-draw', element);
  }
  return drawn.strokes;
}

function shapeInput(
  session: Session,
  element: SvgElement,
  specified: Specified,
  style: Style,
  context: Context,
): ShapeInput & { reported(): boolean } {
  let reported = false;
  return {
    reported: () => reported,
    length: (name, axis) => lengthOf(session, element, specified, name, axis, style, context),
    text: (name) => specified.get(name) ?? null,
    report: (code, values) => {
      reported = true;
      session.report(code, element, values);
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
  if (length) return toUserUnits(length, axis, context, style.fontSize);
  session.report('length-error', element, { attribute: name, found: shown(text) });
  return null;
}
