import { bernstein3 } from './evaluate.js';
import { cubicTurns } from './monotone.js';
import { CUBIC, LINE, type Segments } from './segments.js';
import { atan2 } from './trig.js';

/** Twice the most that `pointAt` is off, as a share of the largest coordinate. */
const ROUNDING = 16 * Number.EPSILON;
/** Covers what underflow loses. */
const UNDERFLOW = 1e-300;
/** An extreme this near beyond an arc's end is counted in; it is higher than the end by half the square. */
const ANGLE_SLACK = 1e-9;

/**
 * The bounding box of segment i: out = minX, minY, maxX, maxY.
 * Never smaller than the points that `pointAt` gives; larger by at most 1e-14 of the largest coordinate
 * (lines: exact).
 */
export function segmentBox(segments: Segments, i: number, out: Float64Array): void {
  const d = segments.data;
  const o = segments.offset[i];
  const kind = segments.kind[i];
  for (let axis = 0; axis < 2; axis++) {
    const p0 = d[o + axis];
    const p1 = d[o + 2 + axis];
    out[axis] = Math.min(p0, p1);
    out[axis + 2] = Math.max(p0, p1);
    if (kind === LINE) continue;
    const a = d[o + 4 + axis];
    const b = d[o + 6 + axis];
    let size: number;
    if (kind === CUBIC) {
      cubicExtremes(p0, a, b, p1, axis, out);
      size = Math.max(Math.abs(p0), Math.abs(a), Math.abs(b), Math.abs(p1));
    } else {
      const v = d[o + 8 + axis];
      arcExtremes(a, b, v, d[o + 10], d[o + 11], axis, out);
      size = Math.max(Math.abs(a) + Math.abs(b) + Math.abs(v), Math.abs(p0), Math.abs(p1));
    }
    const margin = ROUNDING * size + UNDERFLOW;
    out[axis] -= margin;
    out[axis + 2] += margin;
  }
}

/**
 * The bounding box of the segments from `from` up to `to`, as `segmentBox` has them, into `out`; where there
 * are none, from +Infinity to -Infinity.
 */
export function boxOfSegments(segments: Segments, from: number, to: number, out: Float64Array): void {
  const box = new Float64Array(4);
  let [minX, minY, maxX, maxY] = [Infinity, Infinity, -Infinity, -Infinity];
  for (let i = from; i < to; i++) {
    segmentBox(segments, i, box);
    minX = Math.min(minX, box[0]);
    minY = Math.min(minY, box[1]);
    maxX = Math.max(maxX, box[2]);
    maxY = Math.max(maxY, box[3]);
  }
  out[0] = minX;
  out[1] = minY;
  out[2] = maxX;
  out[3] = maxY;
}

function include(value: number, axis: number, out: Float64Array): void {
  if (value < out[axis]) out[axis] = value;
  if (value > out[axis + 2]) out[axis + 2] = value;
}

function cubicExtremes(p0: number, a: number, b: number, p1: number, axis: number, out: Float64Array): void {
  for (const t of cubicTurns(p0, a, b, p1) ?? []) {
    if (t > 0 && t < 1) include(bernstein3(p0, a, b, p1, t), axis, out);
  }
}

/** c + u·cos θ + v·sin θ is extreme at the angle of (u, v) and opposite to it. */
function arcExtremes(
  c: number,
  u: number,
  v: number,
  theta0: number,
  sweep: number,
  axis: number,
  out: Float64Array,
): void {
  const turn = 2 * Math.PI;
  const reach = Math.sqrt(u * u + v * v);
  const start = sweep < 0 ? theta0 + sweep : theta0;
  const top = atan2(v, u);
  for (const side of [1, -1]) {
    const past = (side > 0 ? top : top + Math.PI) - start + ANGLE_SLACK;
    const along = past - turn * Math.floor(past / turn);
    if (along <= Math.abs(sweep) + 2 * ANGLE_SLACK) include(c + side * reach, axis, out);
  }
}
