import type { BasicShape } from '../clip/clipValue.js';
import type { PathSink } from '../stroke/subPathSink.js';
import { splitOutside, wordsOf } from '../style/cssText.js';
import { type Axis, type LengthContext, readLength, toUserUnits } from '../style/length.js';
import { PathReader } from './pathReader.js';
import { tracePath } from './tracePath.js';

export type FillRule = 'nonzero' | 'evenodd';

/** The box that a basic shape is measured in, its corner at the origin. */
interface ReferenceSize {
  readonly width: number;
  readonly height: number;
  readonly context: LengthContext;
  readonly fontSize: number;
}

/**
 * Draws a basic shape (CSS Shapes Module Level 1, "Supported Shapes") in a box from (0, 0) to
 * (width, height), or that box where there is none. Returns by which rule it is filled, null where the
 * shape is written in a way that is not read here.
 */
export function traceBasicShape(
  shape: BasicShape | null,
  width: number,
  height: number,
  outer: LengthContext,
  fontSize: number,
  sink: PathSink,
): FillRule | null {
  const context = { ...outer, viewportWidth: width, viewportHeight: height };
  const size: ReferenceSize = { width, height, context, fontSize };
  switch (shape?.name) {
    case undefined:
      roundedRectangle(0, 0, width, height, [0, 0, 0, 0], [0, 0, 0, 0], sink);
      return 'nonzero';
    case 'inset':
      return inset(shape?.text ?? '', size, sink);
    case 'circle':
    case 'ellipse':
      return ellipse(shape?.text ?? '', shape?.name === 'circle', size, sink);
    case 'polygon':
      return polygon(shape?.text ?? '', size, sink);
    case 'path':
      return path(shape?.text ?? '', sink);
    default:
      return null;
  }
}

function lengthIn(text: string, axis: Axis, { context, fontSize }: ReferenceSize): number | null {
  const length = readLength(text);
  if (!length || (length.unit === '' && length.value !== 0)) return null;
  const value = toUserUnits(length, axis, context, fontSize);
  return Number.isFinite(value) ? value : null;
}

/** One to four values for top, right, bottom and left, as in `margin`. */
function four<T>(values: readonly T[]): [T, T, T, T] | null {
  if (values.length < 1 || values.length > 4) return null;
  const [top, right = top, bottom = top, left = right] = values as [T, T?, T?, T?];
  return [top, right, bottom, left];
}

function inset(text: string, size: ReferenceSize, sink: PathSink): FillRule | null {
  const [sides, radii, ...more] = ` ${text} `.split(/\sround\s/i);
  if (more.length > 0) return null;
  const words = four(wordsOf(sides));
  const offsets = words?.map((word, k) => lengthIn(word, k % 2 === 0 ? 'y' : 'x', size));
  if (!offsets || offsets.includes(null)) return null;
  let [top, right, bottom, left] = offsets as [number, number, number, number];
  // Offsets that leave nothing are reduced in proportion.
  if (left + right > size.width) {
    const share = size.width / (left + right);
    left *= share;
    right *= share;
  }
  if (top + bottom > size.height) {
    const share = size.height / (top + bottom);
    top *= share;
    bottom *= share;
  }
  const [across, down = across, ...rest] = (radii ?? '0').split('/');
  if (rest.length > 0) return null;
  const rx = four(wordsOf(across).map((word) => lengthIn(word, 'x', size)));
  const ry = four(wordsOf(down).map((word) => lengthIn(word, 'y', size)));
  if (!rx || !ry || rx.includes(null) || ry.includes(null)) return null;
  roundedRectangle(
    left,
    top,
    size.width - left - right,
    size.height - top - bottom,
    rx as [number, number, number, number],
    ry as [number, number, number, number],
    sink,
  );
  return 'nonzero';
}

type Four = readonly [number, number, number, number];

/** Corners from the top left, clockwise; too large radii are scaled down together (CSS Backgrounds 3). */
function roundedRectangle(
  x: number,
  y: number,
  width: number,
  height: number,
  rx: Four,
  ry: Four,
  sink: PathSink,
): void {
  if (!(width > 0 && height > 0)) return;
  let scale = 1;
  for (const [sum, side] of [
    [rx[0] + rx[1], width],
    [rx[2] + rx[3], width],
    [ry[1] + ry[2], height],
    [ry[3] + ry[0], height],
  ]) {
    if (sum > side) scale = Math.min(scale, side / sum);
  }
  // Directions from a corner's centre to where its arc begins.
  const begins = [
    [-1, 0],
    [0, -1],
    [1, 0],
    [0, 1],
  ];
  for (let k = 0; k < 4; k++) {
    const a = rx[k] * scale;
    const b = ry[k] * scale;
    const isRound = a > 0 && b > 0;
    const right = k === 1 || k === 2;
    const below = k >= 2;
    const cx = right ? x + width - a : x + a;
    const cy = below ? y + height - b : y + b;
    const [ux, uy] = begins[k];
    if (!isRound) {
      const cornerX = right ? x + width : x;
      const cornerY = below ? y + height : y;
      if (k === 0) sink.moveTo(cornerX, cornerY);
      else sink.lineTo(cornerX, cornerY);
      continue;
    }
    // A quarter turn clockwise on the screen.
    const [vx, vy] = [-uy, ux];
    const startX = cx + a * ux;
    const startY = cy + b * uy;
    if (k === 0) sink.moveTo(startX, startY);
    else sink.lineTo(startX, startY);
    const arc = { cx, cy, ux: a * ux, uy: b * uy, vx: a * vx, vy: b * vy, theta0: 0, sweep: Math.PI / 2 };
    sink.arcTo(arc, cx + a * vx, cy + b * vy);
  }
  sink.closePath(false);
}

function ellipse(text: string, isCircle: boolean, size: ReferenceSize, sink: PathSink): FillRule | null {
  const [before, after, ...more] = ` ${text} `.split(/\sat\s/i);
  if (more.length > 0) return null;
  const at = position(after === undefined ? ['center'] : wordsOf(after), size);
  const words = wordsOf(before);
  if (!at || words.length > (isCircle ? 1 : 2) || (!isCircle && words.length === 1)) return null;
  const [cx, cy] = at;
  const alongX = [Math.abs(cx), Math.abs(size.width - cx)];
  const alongY = [Math.abs(cy), Math.abs(size.height - cy)];
  const radius = (word: string, axis: 'x' | 'y' | 'other'): number | null => {
    const sides = axis === 'x' ? alongX : axis === 'y' ? alongY : [...alongX, ...alongY];
    if (word === 'closest-side') return Math.min(...sides);
    if (word === 'farthest-side') return Math.max(...sides);
    const length = lengthIn(word, axis, size);
    return length !== null && length >= 0 ? length : null;
  };
  const [first = 'closest-side', second = 'closest-side'] = words.map((word) => word.toLowerCase());
  const rx = radius(first, isCircle ? 'other' : 'x');
  const ry = isCircle ? rx : radius(second, 'y');
  if (rx === null || ry === null) return null;
  if (rx === 0 || ry === 0) return 'nonzero';
  sink.moveTo(cx + rx, cy);
  for (const half of [0, 1]) {
    const arc = { cx, cy, ux: rx, uy: 0, vx: 0, vy: ry, theta0: half * Math.PI, sweep: Math.PI };
    sink.arcTo(arc, half === 0 ? cx - rx : cx + rx, cy);
  }
  sink.closePath(false);
  return 'nonzero';
}

const ALONG_X: Readonly<Record<string, number>> = { left: 0, center: 0.5, right: 1 };
const ALONG_Y: Readonly<Record<string, number>> = { top: 0, center: 0.5, bottom: 1 };

function position(words: readonly string[], size: ReferenceSize): [number, number] | null {
  let [first = 'center', second = 'center'] = words.map((word) => word.toLowerCase());
  if (words.length > 2) return null;
  const swaps = Object.hasOwn(ALONG_Y, first) && first !== 'center' && words.length < 3;
  if (swaps) [first, second] = [second, first];
  const x = ALONG_X[first] !== undefined ? ALONG_X[first] * size.width : lengthIn(first, 'x', size);
  const y = ALONG_Y[second] !== undefined ? ALONG_Y[second] * size.height : lengthIn(second, 'y', size);
  return x === null || y === null ? null : [x, y];
}

function ruleAndRest(text: string): [FillRule, string] {
  const match = /^\s*(nonzero|evenodd)\s*,/i.exec(text);
  if (!match) return ['nonzero', text];
  return [match[1].toLowerCase() as FillRule, text.slice(match[0].length)];
}

function polygon(text: string, size: ReferenceSize, sink: PathSink): FillRule | null {
  const [rule, list] = ruleAndRest(text);
  const points: number[] = [];
  for (const pair of splitOutside(list, ',')) {
    const [x, y, ...more] = wordsOf(pair);
    if (y === undefined || more.length > 0) return null;
    const px = lengthIn(x, 'x', size);
    const py = lengthIn(y, 'y', size);
    if (px === null || py === null) return null;
    points.push(px, py);
  }
  sink.moveTo(points[0], points[1]);
  for (let k = 2; k < points.length; k += 2) sink.lineTo(points[k], points[k + 1]);
  sink.closePath(false);
  return rule;
}

function path(text: string, sink: PathSink): FillRule | null {
  const [rule, rest] = ruleAndRest(text);
  const data = /^\s*(?:"([^"]*)"|'([^']*)')\s*$/.exec(rest);
  if (!data) return null;
  const reader = new PathReader();
  if (reader.read(data[1] ?? data[2] ?? '') >= 0) return null;
  tracePath(reader.commands, sink);
  return rule;
}
