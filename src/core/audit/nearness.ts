import { addInterval, type Intervals } from './intervals.js';
import type { Side } from './side.js';
import type { Stretch } from './stretches.js';

/**
 * The parts of a stretch that lie within `reach` of any line of the same pen on a side, as intervals
 * of the length along it. Exact for the polylines: what is near a piece is convex, so an interval.
 */
export function nearParts(stretch: Pick<Stretch, 'x' | 'y' | 'pen'>, side: Side, reach: number): Intervals {
  const parts: Intervals = [];
  const hit = { from: 0, to: 0 };
  let along = 0;
  for (let k = 0; k + 1 < stretch.x.length; k++) {
    const ax = stretch.x[k];
    const ay = stretch.y[k];
    const bx = stretch.x[k + 1];
    const by = stretch.y[k + 1];
    const length = Math.sqrt((bx - ax) * (bx - ax) + (by - ay) * (by - ay));
    const here: Intervals = [];
    visitPieces(side, side.index, stretch.pen, ax, ay, bx, by, reach, (v) => {
      if (!nearPiece(ax, ay, bx, by, side, v, reach, hit)) return false;
      addInterval(here, along + hit.from * length, along + hit.to * length, 0);
      return here[0] <= along && here[1] >= along + length;
    });
    for (let i = 0; i < here.length; i += 2) addInterval(parts, here[i], here[i + 1], 1e-12);
    along += length;
  }
  return parts;
}

/** Whether a line of the pen passes within `reach` of a point. */
export function isNear(x: number, y: number, side: Side, pen: number, reach: number): boolean {
  const hit = { from: 0, to: 0 };
  let near = false;
  visitPieces(side, side.index, pen, x, y, x, y, reach, (v) => {
    near = nearPiece(x, y, x, y, side, v, reach, hit);
    return near;
  });
  return near;
}

/** What can be searched for the spans around a box. */
export interface SpanIndex {
  visit(minX: number, minY: number, maxX: number, maxY: number, visit: (span: number) => boolean): void;
}

/** Calls `visit(piece, span)` for the pieces of a pen around a straight line, until it returns true. */
export function visitPieces(
  side: Side,
  index: SpanIndex,
  pen: number,
  ax: number,
  ay: number,
  bx: number,
  by: number,
  reach: number,
  visit: (v: number, span: number) => boolean,
): void {
  const minX = Math.min(ax, bx) - reach;
  const minY = Math.min(ay, by) - reach;
  const maxX = Math.max(ax, bx) + reach;
  const maxY = Math.max(ay, by) + reach;
  const ex = bx - ax;
  const ey = by - ay;
  const limit = reach * reach * (ex * ex + ey * ey);
  index.visit(minX, minY, maxX, maxY, (span) => {
    if (side.penOf(span) !== pen) return false;
    const first = side.flatten(span);
    const last = first + side.pieceCount(span);
    const { x, y } = side;
    for (let v = first; v < last; v++) {
      if ((x[v] < minX && x[v + 1] < minX) || (x[v] > maxX && x[v + 1] > maxX)) continue;
      if ((y[v] < minY && y[v + 1] < minY) || (y[v] > maxY && y[v + 1] > maxY)) continue;
      // All of the piece to one side of the line, beyond reach: the boxes of long lines say little.
      const s = (x[v] - ax) * ey - (y[v] - ay) * ex;
      const t = (x[v + 1] - ax) * ey - (y[v + 1] - ay) * ex;
      if (s > 0 === t > 0 && s * s > limit && t * t > limit) continue;
      if (visit(v, span)) return true;
    }
    return false;
  });
}

/** The fractions of the line from a to b that lie within `reach` of piece v; false where none do. */
function nearPiece(
  ax: number,
  ay: number,
  bx: number,
  by: number,
  side: Side,
  v: number,
  reach: number,
  out: { from: number; to: number },
): boolean {
  const px = side.x[v];
  const py = side.y[v];
  const dx = bx - ax;
  const dy = by - ay;
  const ex = side.x[v + 1] - px;
  const ey = side.y[v + 1] - py;
  out.from = Number.POSITIVE_INFINITY;
  out.to = Number.NEGATIVE_INFINITY;
  // The set within reach of a piece: a disc about either end, and the strip between them.
  withinDisc(ax - px, ay - py, dx, dy, reach, out);
  withinDisc(ax - px - ex, ay - py - ey, dx, dy, reach, out);
  const length = Math.sqrt(ex * ex + ey * ey);
  if (length > 0) {
    const strip = { from: 0, to: 1 };
    const ux = ex / length;
    const uy = ey / length;
    clipTo(strip, (ax - px) * ux + (ay - py) * uy, dx * ux + dy * uy, 0, length);
    clipTo(strip, (ay - py) * ux - (ax - px) * uy, dy * ux - dx * uy, -reach, reach);
    if (strip.from <= strip.to) widen(out, strip.from, strip.to);
  }
  return out.from <= out.to;
}

function withinDisc(
  x: number,
  y: number,
  dx: number,
  dy: number,
  reach: number,
  out: { from: number; to: number },
): void {
  const a = dx * dx + dy * dy;
  const c = x * x + y * y - reach * reach;
  if (a === 0) {
    if (c <= 0) widen(out, 0, 1);
    return;
  }
  const b = x * dx + y * dy;
  const squared = b * b - a * c;
  if (squared < 0) return;
  const root = Math.sqrt(squared);
  const from = Math.max(0, (-b - root) / a);
  const to = Math.min(1, (-b + root) / a);
  if (from <= to) widen(out, from, to);
}

/** Keeps the parameters at which start + t·slope lies in [low, high]. */
function clipTo(
  strip: { from: number; to: number },
  start: number,
  slope: number,
  low: number,
  high: number,
) {
  if (slope === 0) {
    if (start < low || start > high) strip.to = Number.NEGATIVE_INFINITY;
    return;
  }
  const one = (low - start) / slope;
  const other = (high - start) / slope;
  strip.from = Math.max(strip.from, Math.min(one, other));
  strip.to = Math.min(strip.to, Math.max(one, other));
}

function widen(out: { from: number; to: number }, from: number, to: number): void {
  if (from < out.from) out.from = from;
  if (to > out.to) out.to = to;
}
