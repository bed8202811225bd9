import { CUBIC, LINE, type Segments } from './segments.js';
import { sinCos } from './trig.js';

/** Deviation from a circle, relative, below which an arc is measured as one. */
const ROUND = 1e-12;
/** Largest difference of two estimates, as a share of the whole length, that ends the refinement. */
const TOLERANCE = 1e-11;
const ROUNDING = 4 * Number.EPSILON;
const DEEPEST = 48;

/**
 * The length of segment i between parameters t0 and t1, in either order.
 *
 * Accuracy: relative 1e-9, cusps and folded curves included; lines and circular arcs are exact up to
 * rounding. Cubics and elliptical arcs by Gauss–Legendre quadrature of the speed, halving where two
 * estimates differ: the speed is analytic away from cusps, where 10 points converge like h²⁰; at a
 * cusp it is like |t − c|, whose error falls fourfold with each halving.
 * Cost: 30 speeds for a smooth curve, some hundreds at cusps.
 */
export function segmentLength(segments: Segments, i: number, t0 = 0, t1 = 1): number {
  const d = segments.data;
  const o = segments.offset[i];
  const kind = segments.kind[i];
  const low = Math.min(t0, t1);
  const high = Math.max(t0, t1);
  if (kind === LINE) return (high - low) * norm(d[o + 2] - d[o], d[o + 3] - d[o + 1]);
  if (kind === CUBIC) return integrate(cubicSpeed(d, o), low, high, 1, cubicPeak(d, o));
  const sweep = Math.abs(d[o + 11]);
  const u2 = d[o + 6] * d[o + 6] + d[o + 7] * d[o + 7];
  const v2 = d[o + 8] * d[o + 8] + d[o + 9] * d[o + 9];
  const uv = d[o + 6] * d[o + 8] + d[o + 7] * d[o + 9];
  if (Math.abs(u2 - v2) <= ROUND * u2 && Math.abs(uv) <= ROUND * u2) {
    return (high - low) * sweep * Math.sqrt((u2 + v2) / 2);
  }
  const quarters = Math.max(1, Math.ceil(((high - low) * sweep) / (Math.PI / 2) - 1e-9));
  return integrate(arcSpeed(d, o), low, high, quarters, sweep * Math.sqrt(u2 + v2));
}

type Speed = (t: number) => number;

function cubicSpeed(d: Float64Array, o: number): Speed {
  const ax = 3 * (d[o + 4] - d[o]);
  const ay = 3 * (d[o + 5] - d[o + 1]);
  const bx = 3 * (d[o + 6] - d[o + 4]);
  const by = 3 * (d[o + 7] - d[o + 5]);
  const cx = 3 * (d[o + 2] - d[o + 6]);
  const cy = 3 * (d[o + 3] - d[o + 7]);
  return (t) => {
    const s = 1 - t;
    const x = s * (s * ax + 2 * t * bx) + t * t * cx;
    const y = s * (s * ay + 2 * t * by) + t * t * cy;
    return Math.sqrt(x * x + y * y);
  };
}

/** No point of a cubic is faster than three times its longest control leg. */
function cubicPeak(d: Float64Array, o: number): number {
  return (
    3 *
    Math.max(
      norm(d[o + 4] - d[o], d[o + 5] - d[o + 1]),
      norm(d[o + 6] - d[o + 4], d[o + 7] - d[o + 5]),
      norm(d[o + 2] - d[o + 6], d[o + 3] - d[o + 7]),
    )
  );
}

function arcSpeed(d: Float64Array, o: number): Speed {
  const sc = new Float64Array(2);
  const sweep = Math.abs(d[o + 11]);
  return (t) => {
    sinCos(d[o + 10] + t * d[o + 11], sc);
    const x = d[o + 8] * sc[1] - d[o + 6] * sc[0];
    const y = d[o + 9] * sc[1] - d[o + 7] * sc[0];
    return sweep * Math.sqrt(x * x + y * y);
  };
}

/**
 * The integral of a speed from a to b, begun on equal parts. `peak` bounds the speeds: they are rounded
 * to a few ulps of it, and differences below that are not pursued.
 */
function integrate(speed: Speed, a: number, b: number, parts: number, peak: number): number {
  const step = (b - a) / parts;
  const first = new Float64Array(parts);
  let estimate = 0;
  for (let k = 0; k < parts; k++) {
    first[k] = gauss(speed, a + k * step, a + (k + 1) * step);
    estimate += first[k];
  }
  const tolerance = Math.max(TOLERANCE * estimate, ROUNDING * peak * (b - a));
  let total = 0;
  for (let k = 0; k < parts; k++) {
    total += refine(speed, a + k * step, a + (k + 1) * step, first[k], tolerance, DEEPEST);
  }
  return total;
}

function refine(speed: Speed, a: number, b: number, whole: number, tolerance: number, depth: number): number {
  const m = (a + b) / 2;
  const left = gauss(speed, a, m);
  const right = gauss(speed, m, b);
  if (depth === 0 || !(Math.abs(left + right - whole) > tolerance)) return left + right;
  return refine(speed, a, m, left, tolerance, depth - 1) + refine(speed, m, b, right, tolerance, depth - 1);
}

// Abramowitz, M., Stegun, I. A. (1964), Handbook of Mathematical Functions, table 25.4, n = 10.
const NODES = [
  0.1488743389816312, 0.4333953941292472, 0.6794095682990244, 0.8650633666889845, 0.9739065285171717,
] as const;
const WEIGHTS = [
  0.2955242247147529, 0.2692667193099964, 0.219086362515982, 0.1494513491505806, 0.0666713443086881,
] as const;

/** Ten-point Gauss–Legendre quadrature from a to b. */
function gauss(speed: Speed, a: number, b: number): number {
  const m = (a + b) / 2;
  const h = (b - a) / 2;
  let sum = 0;
  for (let k = 0; k < 5; k++) sum += WEIGHTS[k] * (speed(m - h * NODES[k]) + speed(m + h * NODES[k]));
  return h * sum;
}

function norm(x: number, y: number): number {
  return Math.sqrt(x * x + y * y);
}
