import { BoxChain, type Work } from './boxChain.js';
import { pointAt } from './evaluate.js';
import { monotoneCuts } from './monotone.js';
import { nearestOnSegment } from './nearest.js';
import { LINE, type Segments } from './segments.js';

/** A rectangle along the axes: minX, minY, maxX, maxY. */
export type Box = readonly [number, number, number, number];

/** Where a place or a box lies: inside, on the edge (or across it), outside. */
export type Side = 1 | 0 | -1;

const CURVE_WORK = 100;
const HALVINGS = 60;

/**
 * What closed chains of segments enclose, by the nonzero or the even-odd rule. The edge belongs to it.
 * Joints have to agree bit for bit; then no place is inside of one segment and outside of the next.
 */
export class Outline {
  readonly box: Box;
  /** It is a rectangle along the axes, and `box` is all there is to it. */
  readonly isBox: boolean;
  private readonly pieces: Pieces;
  private readonly index: BoxChain;

  constructor(
    readonly segments: Segments,
    private readonly evenOdd: boolean,
  ) {
    this.pieces = piecesOf(segments);
    const { boxes } = this.pieces;
    this.index = new BoxChain(boxes);
    const box: [number, number, number, number] = [Infinity, Infinity, -Infinity, -Infinity];
    for (let k = 0; k < boxes.length; k += 4) {
      box[0] = Math.min(box[0], boxes[k]);
      box[1] = Math.min(box[1], boxes[k + 1]);
      box[2] = Math.max(box[2], boxes[k + 2]);
      box[3] = Math.max(box[3], boxes[k + 3]);
    }
    this.box = box;
    this.isBox = isRectangle(segments);
  }

  /** Where a box lies; 0 also where that is not plain. */
  sideOfBox(minX: number, minY: number, maxX: number, maxY: number, tolerance: number, work: Work): Side {
    const { box } = this;
    work.left -= 1;
    if (minX > box[2] + tolerance || maxX < box[0] - tolerance) return -1;
    if (minY > box[3] + tolerance || maxY < box[1] - tolerance) return -1;
    if (this.isBox) {
      const isInside =
        minX >= box[0] - tolerance &&
        maxX <= box[2] + tolerance &&
        minY >= box[1] - tolerance &&
        maxY <= box[3] + tolerance;
      return isInside ? 1 : 0;
    }
    const isNear = this.index.search(
      minX - tolerance,
      minY - tolerance,
      maxX + tolerance,
      maxY + tolerance,
      work,
      () => true,
    );
    return isNear ? 0 : this.side(minX / 2 + maxX / 2, minY / 2 + maxY / 2, tolerance, work);
  }

  /** Where a place lies; on the edge within the tolerance. */
  side(x: number, y: number, tolerance: number, work: Work): Side {
    const { segments, pieces, index } = this;
    const isOn = index.search(x - tolerance, y - tolerance, x + tolerance, y + tolerance, work, (k) => {
      work.left -= CURVE_WORK;
      const { t0, t1, segment } = pieces;
      return nearestOnSegment(segments, segment[k], x, y, t0[k], t1[k]).distance <= tolerance;
    });
    if (isOn) return 0;
    let winding = 0;
    index.search(x, y, Infinity, y, work, (k) => {
      // Half open, so that a joint counts once.
      const from = pieces.y0[k] <= y;
      const to = pieces.y1[k] <= y;
      if (from !== to && (pieces.boxes[4 * k] > x || this.crossingX(k, y, work) > x))
        winding += from ? 1 : -1;
      return false;
    });
    return (this.evenOdd ? winding % 2 !== 0 : winding !== 0) ? 1 : -1;
  }

  /** The segments whose box comes near the given one, each once, in order. */
  segmentsNear(box: Float64Array, tolerance: number, work: Work): number[] {
    const near: number[] = [];
    const { segment } = this.pieces;
    this.index.search(
      box[0] - tolerance,
      box[1] - tolerance,
      box[2] + tolerance,
      box[3] + tolerance,
      work,
      (k) => {
        if (near[near.length - 1] !== segment[k]) near.push(segment[k]);
        return false;
      },
    );
    return near;
  }

  private crossingX(k: number, y: number, work: Work): number {
    const { segments, pieces } = this;
    const i = pieces.segment[k];
    const p = new Float64Array(2);
    let low = pieces.t0[k];
    let high = pieces.t1[k];
    if (segments.kind[i] === LINE) {
      const o = segments.offset[i];
      const d = segments.data;
      return d[o] + ((y - d[o + 1]) / (d[o + 3] - d[o + 1])) * (d[o + 2] - d[o]);
    }
    work.left -= CURVE_WORK;
    const rising = pieces.y1[k] > pieces.y0[k];
    for (let step = 0; step < HALVINGS; step++) {
      const mid = (low + high) / 2;
      if (mid <= low || mid >= high) break;
      pointAt(segments, i, mid, p);
      if (p[1] <= y === rising) low = mid;
      else high = mid;
    }
    pointAt(segments, i, (low + high) / 2, p);
    return p[0];
  }
}

/** Pieces that rise or fall all along, in both coordinates. */
interface Pieces {
  readonly segment: Uint32Array;
  readonly t0: Float64Array;
  readonly t1: Float64Array;
  readonly y0: Float64Array;
  readonly y1: Float64Array;
  readonly boxes: Float64Array;
}

const ROUNDING = 16 * Number.EPSILON;

function piecesOf(segments: Segments): Pieces {
  const cuts = Array.from({ length: segments.count }, (_, i) => monotoneCuts(segments, i));
  const count = cuts.reduce((sum, { length }) => sum + length - 1, 0);
  const segment = new Uint32Array(count);
  const t0 = new Float64Array(count);
  const t1 = new Float64Array(count);
  const y0 = new Float64Array(count);
  const y1 = new Float64Array(count);
  const boxes = new Float64Array(4 * count);
  const p = new Float64Array(2);
  let k = 0;
  for (let i = 0; i < segments.count; i++) {
    for (let c = 1; c < cuts[i].length; c++, k++) {
      segment[k] = i;
      t0[k] = cuts[i][c - 1];
      t1[k] = cuts[i][c];
      pointAt(segments, i, t0[k], p);
      const [xFrom, yFrom] = p;
      y0[k] = yFrom;
      pointAt(segments, i, t1[k], p);
      const [xTo, yTo] = p;
      y1[k] = yTo;
      const size = Math.max(Math.abs(xFrom), Math.abs(yFrom), Math.abs(xTo), Math.abs(yTo));
      const margin = segments.kind[i] === LINE ? 0 : ROUNDING * size;
      boxes[4 * k] = Math.min(xFrom, xTo) - margin;
      boxes[4 * k + 1] = Math.min(yFrom, yTo) - margin;
      boxes[4 * k + 2] = Math.max(xFrom, xTo) + margin;
      boxes[4 * k + 3] = Math.max(yFrom, yTo) + margin;
    }
  }
  return { segment, t0, t1, y0, y1, boxes };
}

/** Four lines, along one axis and the other in turn, that return to where they begin. */
function isRectangle({ count, kind, offset, data }: Segments): boolean {
  if (count !== 4) return false;
  const isAlong = (i: number, axis: number): boolean =>
    kind[i] === LINE && data[offset[i] + 1 - axis] === data[offset[i] + 3 - axis];
  const axis = isAlong(0, 0) ? 0 : 1;
  for (let i = 0; i < 4; i++) if (!isAlong(i, (axis + i) % 2)) return false;
  const last = offset[3];
  if (data[last + 2] !== data[offset[0]] || data[last + 3] !== data[offset[0] + 1]) return false;
  for (let i = 1; i < 4; i++) {
    if (data[offset[i]] !== data[offset[i - 1] + 2] || data[offset[i] + 1] !== data[offset[i - 1] + 3]) {
      return false;
    }
  }
  return true;
}
