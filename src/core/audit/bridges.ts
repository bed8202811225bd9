import { LINE } from '../geometry/segments.js';
import { BoxIndex } from './boxIndex.js';
import { totalLength } from './intervals.js';
import { isNear, nearParts, visitPieces } from './nearness.js';
import type { Side } from './side.js';
import type { Stretch } from './stretches.js';
import type { Tolerances } from './tolerances.js';

/** Pieces around a bridge that are tried for a crossing at most. */
const MOST_PIECES = 64;

/** Straight parts of an unpaired stretch with bridges: two bridges, and what either may have displaced. */
const MOST_LEGS = 4;
const MOST_BRIDGES = 2;
/** Segments of a run before and after a stretch among which the bridge is looked for. */
const CLOSE_BY = 3;
/** Points of a stretch that is looked at: bridges have few. */
const MOST_POINTS = 64;

/**
 * Tells bridges from lines that were added.
 *
 * Where strokes were snapped together the tool draws straight from a stroke's end to the vertex, and on
 * to the start of the next, each at most the snap distance; a vertex stands on a wanted line, within the
 * snap distance of a stroke's end, or where lines cross. Where a bridge runs along a wanted line it may
 * be paired in the place of the line that was meant, which is then left over beside it. So an unpaired
 * stretch of a run is taken for bridges if
 *
 * - something is paired before or after it on its run: no run is all bridge;
 * - it consists of at most four straight legs, each no longer than the snap distance (plus a match
 *   tolerance at each end, where what is paired leaves off), that meet within `matchMm` of wanted lines;
 *   where the run starts or ends, its free end is there as well;
 * - at most two of the legs are bridges: the others lie within `matchMm` of wanted lines all along;
 * - an end of a wanted stroke, or a crossing of two wanted lines, lies within snap distance and match
 *   tolerance of it. In the midst of neighbours there is nothing to bridge;
 * - where all of it lies beside wanted lines, so that it may as well be a line drawn too far, it leads
 *   from one place where a bridge may start to another (an end of a stroke, a crossing, or the point of a
 *   wanted line that is nearest to a stroke's end), or lines of its run close by do.
 */
export class BridgeInspector {
  private ends: { index: BoxIndex; boxes: Float64Array; pen: Uint32Array } | null = null;

  constructor(
    private readonly wanted: Side,
    private readonly drawn: Side,
    private readonly tolerances: Tolerances,
  ) {}

  isBridge(stretch: Stretch): boolean {
    const { snapMm, matchMm } = this.tolerances;
    if (stretch.atStart && stretch.atEnd) return false;
    if (stretch.lengthMm > MOST_LEGS * (snapMm + 2 * matchMm) || stretch.x.length > MOST_POINTS) return false;
    const bridges = this.fewestBridges(stretch);
    if (bridges > MOST_BRIDGES) return false;
    if (bridges === 0) return this.leadsAcross(stretch) || this.isDisplaced(stretch);
    const reach = snapMm + matchMm;
    return this.isNearEnd(stretch, reach) || this.isNearCrossing(stretch, reach);
  }

  private leadsAcross({ x, y, pen }: Stretch): boolean {
    const last = x.length - 1;
    return this.isAnchor(x[0], y[0], pen) && this.isAnchor(x[last], y[last], pen);
  }

  /** Whether its run has, close by, lines that may be bridges of at least its length. */
  private isDisplaced({ chain, span, pen, lengthMm }: Stretch): boolean {
    const { snapMm, matchMm } = this.tolerances;
    const { lines, spans } = this.drawn;
    const { kind, offset, data: d } = lines.segments;
    const low = Math.max(lines.first[chain], spans.segment[span[0]] - CLOSE_BY);
    const high = Math.min(lines.first[chain + 1], spans.segment[span[span.length - 1]] + CLOSE_BY + 1);
    for (let i = low; i < high; i++) {
      const o = offset[i];
      if (kind[i] !== LINE || !this.isAnchor(d[o], d[o + 1], pen)) continue;
      let length = 0;
      for (let j = i; j < Math.min(high, i + MOST_LEGS) && kind[j] === LINE; j++) {
        const q = offset[j];
        length += between(d[q], d[q + 1], d[q + 2], d[q + 3]);
        if (length > MOST_BRIDGES * (snapMm + 2 * matchMm)) break;
        if (length + 2 * matchMm >= lengthMm && this.isAnchor(d[q + 2], d[q + 3], pen)) return true;
      }
    }
    return false;
  }

  /** Whether a bridge may start at a place. */
  private isAnchor(x: number, y: number, pen: number): boolean {
    const { snapMm, matchMm, hairMm } = this.tolerances;
    const reach = matchMm + hairMm;
    const at = { x: [x, x], y: [y, y], pen };
    if (this.isNearEnd(at, reach) || this.isNearCrossing(at, reach)) return true;
    let found = false;
    this.visitEnds(x, y, x, y, pen, snapMm + matchMm, (px, py) => {
      visitPieces(this.wanted, this.wanted.index, pen, x, y, x, y, reach, (v) => {
        found = Math.abs(alongPiece(this.wanted, v, px - x, py - y)) <= reach;
        return found;
      });
      return found;
    });
    return found;
  }

  /** The fewest bridges among the legs that it falls into, by dynamic programming over its points. */
  private fewestBridges(stretch: Stretch): number {
    const { x, y, pen, atStart, atEnd } = stretch;
    const { matchMm } = this.tolerances;
    const last = x.length - 1;
    const joint = x.map((_, k) => isNear(x[k], y[k], this.wanted, pen, matchMm));
    if ((atStart && !joint[0]) || (atEnd && !joint[last])) return Number.POSITIVE_INFINITY;
    // The fewest bridges among the legs that lead to each point, by the number of legs.
    let fewest = new Float64Array(last + 1).fill(Number.POSITIVE_INFINITY);
    fewest[0] = 0;
    for (let legs = 0; legs < MOST_LEGS; legs++) {
      const next = fewest.slice();
      for (let i = 0; i < last; i++) {
        if (!(fewest[i] <= MOST_BRIDGES)) continue;
        for (let j = i + 1; j <= last; j++) {
          if (j < last && !joint[j]) continue;
          if (fewest[i] >= next[j]) continue;
          const cost = this.costOfLeg(stretch, i, j);
          if (fewest[i] + cost < next[j]) next[j] = fewest[i] + cost;
        }
      }
      fewest = next;
    }
    return fewest[last];
  }

  /** 1 for a straight leg that is a bridge, 0 for one beside wanted lines, else infinite. */
  private costOfLeg(stretch: Stretch, i: number, j: number): number {
    const { snapMm, matchMm, hairMm } = this.tolerances;
    if (!isStraight(stretch, i, j, snapMm + 2 * matchMm, matchMm)) return Number.POSITIVE_INFINITY;
    const leg = { x: stretch.x.slice(i, j + 1), y: stretch.y.slice(i, j + 1), pen: stretch.pen };
    const near = totalLength(nearParts(leg, this.wanted, matchMm));
    return pathLength(leg.x, leg.y) - near > hairMm ? 1 : 0;
  }

  private isNearEnd({ x, y, pen }: Way, reach: number): boolean {
    let near = false;
    for (let k = 0; k + 1 < x.length && !near; k++) {
      this.visitEnds(x[k], y[k], x[k + 1], y[k + 1], pen, reach, () => {
        near = true;
        return true;
      });
    }
    return near;
  }

  /** Calls `visit` with the stroke ends within reach of a line, until it returns true. */
  private visitEnds(
    ax: number,
    ay: number,
    bx: number,
    by: number,
    ofPen: number,
    reach: number,
    visit: (x: number, y: number) => boolean,
  ): void {
    this.ends ??= strokeEnds(this.wanted);
    const { index, boxes, pen } = this.ends;
    const [minX, minY] = [Math.min(ax, bx) - reach, Math.min(ay, by) - reach];
    const [maxX, maxY] = [Math.max(ax, bx) + reach, Math.max(ay, by) + reach];
    index.visit(minX, minY, maxX, maxY, (i) => {
      const px = boxes[4 * i];
      const py = boxes[4 * i + 1];
      if (pen[i] !== ofPen || distanceToLine(px, py, ax, ay, bx, by) > reach) return false;
      return visit(px, py);
    });
  }

  private isNearCrossing({ x, y, pen }: Way, reach: number): boolean {
    const { wanted } = this;
    const pieces: number[] = [];
    for (let k = 0; k + 1 < x.length; k++) {
      visitPieces(wanted, wanted.index, pen, x[k], y[k], x[k + 1], y[k + 1], reach, (v) => {
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

/** Points joined by straight lines. */
type Way = Pick<Stretch, 'x' | 'y' | 'pen'>;

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

function pathLength(x: readonly number[], y: readonly number[]): number {
  let length = 0;
  for (let k = 0; k + 1 < x.length; k++) {
    const dx = x[k + 1] - x[k];
    const dy = y[k + 1] - y[k];
    length += Math.sqrt(dx * dx + dy * dy);
  }
  return length;
}

function distanceToLine(px: number, py: number, ax: number, ay: number, bx: number, by: number): number {
  const dx = bx - ax;
  const dy = by - ay;
  const squared = dx * dx + dy * dy;
  const along = squared > 0 ? ((px - ax) * dx + (py - ay) * dy) / squared : 0;
  const t = Math.max(0, Math.min(1, along));
  return between(ax + t * dx, ay + t * dy, px, py);
}

function between(ax: number, ay: number, bx: number, by: number): number {
  return Math.sqrt((bx - ax) * (bx - ax) + (by - ay) * (by - ay));
}

/** How far a vector goes along piece v. */
function alongPiece(side: Side, v: number, x: number, y: number): number {
  const dx = side.x[v + 1] - side.x[v];
  const dy = side.y[v + 1] - side.y[v];
  return (x * dx + y * dy) / side.pieceLength(v);
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
