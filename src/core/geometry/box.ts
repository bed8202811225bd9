import { bernstein3 } from './evaluate.js';
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

function include(value: number, axis: number, out: Float64Array): void {
  if (value < out[axis]) out[axis] = value;
  if (value > out[axis + 2]) out[axis + 2] = value;
}

/** The extremes lie where the derivative, a quadratic, vanishes. */
function cubicExtremes(p0: number, a: number, b: number, p1: number, axis: number, out: Float64Array): void {
  const c0 = a - p0;
  const c1 = b - a;
  const c2 = p1 - b;
  // (c0 − 2 c1 + c2) t² + 2 (c1 − c0) t + c0 = 0, without cancellation.
  const qa = c0 - 2 * c1 + c2;
  const half = c1 - c0;
  const under = half * half - qa * c0;
  if (!(under >= 0)) return;
  const q = -(half + (half < 0 ? -1 : 1) * Math.sqrt(under));
  for (const t of [q / qa, c0 / q]) {
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
