import { CUBIC, LINE, type Segments } from './segments.js';
import { sinCos } from './trig.js';

/**
 * The point of segment i at parameter t in [0, 1]: out[0] = x, out[1] = y.
 * t = 0 and t = 1 give the stored ends bit for bit. Accuracy elsewhere: a few ulps of the largest
 * coordinate of the segment's control points (of the centre plus the half-diameters for an arc).
 */
export function pointAt(segments: Segments, i: number, t: number, out: Float64Array): void {
  const d = segments.data;
  const o = segments.offset[i];
  if (t === 0 || t === 1) {
    const end = o + 2 * t;
    out[0] = d[end];
    out[1] = d[end + 1];
    return;
  }
  const kind = segments.kind[i];
  if (kind === LINE) {
    out[0] = d[o] + t * (d[o + 2] - d[o]);
    out[1] = d[o + 1] + t * (d[o + 3] - d[o + 1]);
  } else if (kind === CUBIC) {
    out[0] = bernstein3(d[o], d[o + 4], d[o + 6], d[o + 2], t);
    out[1] = bernstein3(d[o + 1], d[o + 5], d[o + 7], d[o + 3], t);
  } else {
    sinCos(d[o + 10] + t * d[o + 11], out);
    const sin = out[0];
    const cos = out[1];
    out[0] = d[o + 4] + (d[o + 6] * cos + d[o + 8] * sin);
    out[1] = d[o + 5] + (d[o + 7] * cos + d[o + 9] * sin);
  }
}

/** Both ends of the piece of segment i from t0 to t1, as `pointAt` has them: x, y of t0, then of t1, into `out`. */
export function chordEnds(segments: Segments, i: number, t0: number, t1: number, out: Float64Array): void {
  pointAt(segments, i, t1, out);
  out[2] = out[0];
  out[3] = out[1];
  pointAt(segments, i, t0, out);
}

/**
 * The derivative of segment i by t at t in [0, 1]: out[0] = dx/dt, out[1] = dy/dt.
 * It can vanish: on a dot, at a cusp, at an end of a cubic whose control point lies on that end.
 */
export function derivativeAt(segments: Segments, i: number, t: number, out: Float64Array): void {
  const d = segments.data;
  const o = segments.offset[i];
  const kind = segments.kind[i];
  if (kind === LINE) {
    out[0] = d[o + 2] - d[o];
    out[1] = d[o + 3] - d[o + 1];
  } else if (kind === CUBIC) {
    out[0] = bernstein3Slope(d[o], d[o + 4], d[o + 6], d[o + 2], t);
    out[1] = bernstein3Slope(d[o + 1], d[o + 5], d[o + 7], d[o + 3], t);
  } else {
    sinCos(d[o + 10] + t * d[o + 11], out);
    const sin = out[0];
    const cos = out[1];
    out[0] = d[o + 11] * (d[o + 8] * cos - d[o + 6] * sin);
    out[1] = d[o + 11] * (d[o + 9] * cos - d[o + 7] * sin);
  }
}

/** The cubic with Bernstein coefficients p0, a, b, p1 at t. */
export function bernstein3(p0: number, a: number, b: number, p1: number, t: number): number {
  const s = 1 - t;
  return s * s * (s * p0 + 3 * t * a) + t * t * (3 * s * b + t * p1);
}

function bernstein3Slope(p0: number, a: number, b: number, p1: number, t: number): number {
  const s = 1 - t;
  return 3 * (s * s * (a - p0) + 2 * s * t * (b - a) + t * t * (p1 - b));
}
