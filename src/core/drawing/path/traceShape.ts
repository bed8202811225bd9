import type { PathSink } from '../stroke/subPathSink.js';
import type { Axis } from '../style/length.js';
import { TextCursor } from './textCursor.js';

/** What a shape is asked for; lengths in user units. */
export interface ShapeInput {
  /** null where the attribute is missing, `auto` or wrong. */
  length(name: string, axis: Axis): number | null;
  text(name: string): string | null;
  report(code: 'shape-error' | 'points-error' | 'points-odd', values: Record<string, string | number>): void;
}

const QUARTER = Math.PI / 2;

/**
 * Draws a basic shape by its equivalent path (SVG 2, chapter "Basic Shapes"): where it starts and which
 * way it goes are the standard's, arcs go clockwise on the screen.
 *
 * @returns false where `name` is no basic shape.
 */
export function traceShape(name: string, input: ShapeInput, sink: PathSink): boolean {
  switch (name) {
    case 'line':
      sink.moveTo(input.length('x1', 'x') ?? 0, input.length('y1', 'y') ?? 0);
      sink.lineTo(input.length('x2', 'x') ?? 0, input.length('y2', 'y') ?? 0);
      return true;
    case 'rect':
      traceRect(input, sink);
      return true;
    case 'circle': {
      const r = sizeOf(input, 'r', 'other');
      if (r !== null) traceEllipse(input, r, r, sink);
      return true;
    }
    case 'ellipse': {
      const rx = sizeOf(input, 'rx', 'x');
      const ry = sizeOf(input, 'ry', 'y');
      traceEllipse(input, rx ?? ry ?? 0, ry ?? rx ?? 0, sink);
      return true;
    }
    case 'polyline':
    case 'polygon':
      if (tracePoints(input, sink) && name === 'polygon') sink.closePath(false);
      return true;
    default:
      return false;
  }
}

/** A size; null where it is missing, or negative, which is an error and ignored. */
function sizeOf(input: ShapeInput, name: string, axis: Axis): number | null {
  const value = input.length(name, axis);
  if (value === null || value >= 0) return value;
  input.report('shape-error', { attribute: name, found: value });
  return null;
}

function traceEllipse(input: ShapeInput, rx: number, ry: number, sink: PathSink): void {
  if (rx === 0 || ry === 0) return;
  const cx = input.length('cx', 'x') ?? 0;
  const cy = input.length('cy', 'y') ?? 0;
  sink.moveTo(cx + rx, cy);
  quarterArc(sink, cx, cy, rx, ry, 0, cx, cy + ry);
  quarterArc(sink, cx, cy, rx, ry, 1, cx - rx, cy);
  quarterArc(sink, cx, cy, rx, ry, 2, cx, cy - ry);
  quarterArc(sink, cx, cy, rx, ry, 3, cx + rx, cy);
  sink.closePath(false);
}

function traceRect(input: ShapeInput, sink: PathSink): void {
  const x = input.length('x', 'x') ?? 0;
  const y = input.length('y', 'y') ?? 0;
  const width = sizeOf(input, 'width', 'x') ?? 0;
  const height = sizeOf(input, 'height', 'y') ?? 0;
  if (width === 0 || height === 0) return;
  const givenX = sizeOf(input, 'rx', 'x');
  const givenY = sizeOf(input, 'ry', 'y');
  const rx = Math.min(givenX ?? givenY ?? 0, width / 2);
  const ry = Math.min(givenY ?? givenX ?? 0, height / 2);
  const right = x + width;
  const bottom = y + height;
  if (rx === 0 || ry === 0) {
    sink.moveTo(x, y);
    sink.lineTo(right, y);
    sink.lineTo(right, bottom);
    sink.lineTo(x, bottom);
    sink.closePath(false);
    return;
  }
  // At half the side the straight parts vanish, also where x + rx and right - rx round apart.
  const left = x + rx;
  const innerRight = 2 * rx === width ? left : right - rx;
  const top = y + ry;
  const innerBottom = 2 * ry === height ? top : bottom - ry;
  sink.moveTo(left, y);
  sink.lineTo(innerRight, y);
  quarterArc(sink, innerRight, top, rx, ry, 3, right, top);
  sink.lineTo(right, innerBottom);
  quarterArc(sink, innerRight, innerBottom, rx, ry, 0, innerRight, bottom);
  sink.lineTo(left, bottom);
  quarterArc(sink, left, innerBottom, rx, ry, 1, x, innerBottom);
  sink.lineTo(x, top);
  quarterArc(sink, left, top, rx, ry, 2, left, y);
  sink.closePath(false);
}

/** A quarter from angle `quarter`·90°, clockwise on the screen, to the end given. */
function quarterArc(
  sink: PathSink,
  cx: number,
  cy: number,
  rx: number,
  ry: number,
  quarter: number,
  x: number,
  y: number,
): void {
  sink.arcTo({ cx, cy, ux: rx, uy: 0, vx: 0, vy: ry, theta0: quarter * QUARTER, sweep: QUARTER }, x, y);
}

/** Draws the points up to the first error; false where there is none. */
function tracePoints(input: ShapeInput, sink: PathSink): boolean {
  const text = input.text('points') ?? '';
  const cursor = new TextCursor().reset(text);
  const finite = (): boolean => cursor.number() && Number.isFinite(cursor.value);
  let count = 0;
  cursor.skipSpace();
  while (!cursor.atEnd()) {
    let start = cursor.at;
    const hasX = finite();
    const x = cursor.value;
    if (hasX) {
      cursor.skipCommaSpace();
      start = cursor.at;
    }
    if (!hasX || !finite()) {
      if (hasX && start >= text.length) input.report('points-odd', {});
      else input.report('points-error', { offset: start, found: text.slice(start, start + 12) });
      break;
    }
    if (count++ === 0) sink.moveTo(x, cursor.value);
    else sink.lineTo(x, cursor.value);
    cursor.skipCommaSpace();
  }
  return count > 0;
}
