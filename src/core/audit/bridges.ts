import { BoxIndex } from './boxIndex.js';
import { isNear, visitPieces } from './nearness.js';
import type { Side } from './side.js';
import type { Stretch } from './stretches.js';
import type { Tolerances } from './tolerances.js';

/** Pieces around a bridge that are tried for a crossing at most. */
const MOST_PIECES = 64;

/**
 * Tells bridges from lines that were added.
 *
 * Where strokes were snapped together the tool draws straight from a stroke's end to the vertex, and on
 * to the start of the next, each at most the snap distance; a vertex stands on a wanted line, within the
 * snap distance of a stroke's end, or where lines cross. So an unpaired stretch of a run is a bridge if
 *
 * - something is paired before or after it on its run: no run is all bridge;
 * - it is straight, or straight to some point within `matchMm` of a wanted line and straight from there,
 *   neither part longer than the snap distance (plus a match tolerance at each end, where what is paired
 *   leaves off); at the start or end of a run it is straight, and that point is its free end;
 * - an end of a wanted stroke, or a crossing of two wanted lines, lies within snap distance and match
 *   tolerance of it. In the midst of neighbours there is nothing to bridge.
 */
export class BridgeInspector {
  private ends: { index: BoxIndex; boxes: Float64Array; pen: Uint32Array } | null = null;

  constructor(
    private readonly wanted: Side,
    private readonly tolerances: Tolerances,
  ) {}

  isBridge(stretch: Stretch): boolean {
    const { snapMm, matchMm } = this.tolerances;
    if (stretch.atStart && stretch.atEnd) return false;
    if (stretch.lengthMm > 2 * (snapMm + 2 * matchMm)) return false;
    return this.hasVertex(stretch) && (this.isNearEnd(stretch) || this.isNearCrossing(stretch));
  }

  /** Whether a point of it can be the vertex that both straight parts lead to. */
  private hasVertex(stretch: Stretch): boolean {
    const { x, y, pen, atStart, atEnd } = stretch;
    const { snapMm, matchMm } = this.tolerances;
    const last = x.length - 1;
    for (let k = atEnd ? last : 0; k <= (atStart ? 0 : last); k++) {
      if (!isStraight(stretch, 0, k, snapMm + 2 * matchMm, matchMm)) continue;
      if (!isStraight(stretch, k, last, snapMm + 2 * matchMm, matchMm)) continue;
      if (isNear(x[k], y[k], this.wanted, pen, matchMm)) return true;
    }
    return false;
  }

  private isNearEnd(stretch: Stretch): boolean {
    this.ends ??= strokeEnds(this.wanted);
    const { index, boxes, pen } = this.ends;
    const reach = this.tolerances.snapMm + this.tolerances.matchMm;
    const { x, y } = stretch;
    let near = false;
    for (let k = 0; k + 1 < x.length && !near; k++) {
      index.visit(
        Math.min(x[k], x[k + 1]) - reach,
        Math.min(y[k], y[k + 1]) - reach,
        Math.max(x[k], x[k + 1]) + reach,
        Math.max(y[k], y[k + 1]) + reach,
        (i) => {
          const px = boxes[4 * i];
          const py = boxes[4 * i + 1];
          near = pen[i] === stretch.pen && distanceToLine(px, py, x[k], y[k], x[k + 1], y[k + 1]) <= reach;
          return near;
        },
      );
    }
    return near;
  }

  private isNearCrossing(stretch: Stretch): boolean {
    const { wanted } = this;
    const reach = this.tolerances.snapMm + this.tolerances.matchMm;
    const { x, y, pen } = stretch;
    const pieces: number[] = [];
    for (let k = 0; k + 1 < x.length; k++) {
      visitPieces(wanted, pen, x[k], y[k], x[k + 1], y[k + 1], reach, (v) => {
        pieces.push(v);
        return pieces.length >= MOST_PIECES;
      });
    }
    const at = new Float64Array(2);
    for (let i = 0; i < pieces.length; i++) {
      for (let j = 0; j < i; j++) {
        if (!crossing(wanted, pieces[i], pieces[j], at)) continue;
        for (let k = 0; k + 1 < x.length; k++) {
          if (distanceToLine(at[0], at[1], x[k], y[k], x[k + 1], y[k + 1]) <= reach) return true;
        }
      }
    }
    return false;
  }
}

/** Both ends of every wanted chain that is not a dot. */
function strokeEnds(side: Side): { index: BoxIndex; boxes: Float64Array; pen: Uint32Array } {
  const { segments, first, count, dot, pen } = side.lines;
  const boxes: number[] = [];
  const pens: number[] = [];
  for (let c = 0; c < count; c++) {
    if (dot[c] || first[c] === first[c + 1]) continue;
    const a = segments.offset[first[c]];
    const b = segments.offset[first[c + 1] - 1] + 2;
    for (const o of [a, b]) {
      const px = segments.data[o];
      const py = segments.data[o + 1];
      boxes.push(px, py, px, py);
      pens.push(pen[c]);
    }
  }
  const exact = Float64Array.from(boxes);
  return { index: new BoxIndex(exact), boxes: exact, pen: Uint32Array.from(pens) };
}

/** Whether the stretch from point i to point j keeps within `slack` of a straight line no longer than `longest`. */
function isStraight(stretch: Stretch, i: number, j: number, longest: number, slack: number): boolean {
  const { x, y } = stretch;
  const dx = x[j] - x[i];
  const dy = y[j] - y[i];
  if (dx * dx + dy * dy > longest * longest) return false;
  let length = 0;
  for (let k = i; k < j; k++) {
    if (distanceToLine(x[k], y[k], x[i], y[i], x[j], y[j]) > slack) return false;
    const ex = x[k + 1] - x[k];
    const ey = y[k + 1] - y[k];
    length += Math.sqrt(ex * ex + ey * ey);
  }
  return length <= longest + slack;
}

function distanceToLine(px: number, py: number, ax: number, ay: number, bx: number, by: number): number {
  const dx = bx - ax;
  const dy = by - ay;
  const squared = dx * dx + dy * dy;
  const along = squared > 0 ? ((px - ax) * dx + (py - ay) * dy) / squared : 0;
  const t = Math.max(0, Math.min(1, along));
  const ex = ax + t * dx - px;
  const ey = ay + t * dy - py;
  return Math.sqrt(ex * ex + ey * ey);
}

/** Whether two pieces that are not neighbours on a chain cross or touch, and where. */
function crossing(side: Side, v: number, w: number, at: Float64Array): boolean {
  const { x, y } = side;
  const dx = x[v + 1] - x[v];
  const dy = y[v + 1] - y[v];
  const ex = x[w + 1] - x[w];
  const ey = y[w + 1] - y[w];
  for (const a of [v, v + 1]) {
    for (const b of [w, w + 1]) if (x[a] === x[b] && y[a] === y[b]) return false;
  }
  const cross = dx * ey - dy * ex;
  if (cross === 0) return false;
  const px = x[w] - x[v];
  const py = y[w] - y[v];
  const s = (px * ey - py * ex) / cross;
  const t = (px * dy - py * dx) / cross;
  if (s < 0 || s > 1 || t < 0 || t > 1) return false;
  at[0] = x[v] + s * dx;
  at[1] = y[v] + s * dy;
  return true;
}
