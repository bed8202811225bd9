import { atan2, sinCosDegrees } from './trig.js';

/**
 * An elliptical arc by its centre: P(θ) = c + u·cos θ + v·sin θ for θ from theta0 to theta0 + sweep,
 * radians. u and v are the half-axes here, conjugate half-diameters after an affine map.
 */
export interface ArcCentre {
  readonly cx: number;
  readonly cy: number;
  readonly ux: number;
  readonly uy: number;
  readonly vx: number;
  readonly vy: number;
  readonly theta0: number;
  readonly sweep: number;
}

/**
 * Below this half-chord, on the circle of radius 1, a small arc bulges less from its chord
 * (chord × h/4) than its points are rounded (radius × 2⁻⁵² = chord × 2⁻⁵³/h).
 */
const FLAT_HALF_CHORD = 1e-8;

/**
 * The arc of SVG's A command from its end points, or 'omit' (nothing is to be drawn), or 'line'
 * (a straight line is).
 *
 * Out-of-range parameters are treated as SVG 2, Elliptical arc implementation notes, Correction of
 * out-of-range radii, says: equal ends omit the arc, a zero radius makes a line, negative radii lose
 * their sign, radii too small are scaled up until they just reach (eq. 6.1–6.3). A small arc so flat
 * that rounding outweighs its bulge is a line as well, and so is one whose centre is not finite.
 * Source: the same, Conversion from endpoint to center parameterization (eq. 5.1–5.6; SVG 1.1 F.6.5),
 * worked on the unit circle. |sweep| is 2·asin(half-chord) or 2π less that: unlike a difference of two
 * angles it cannot lose or gain a turn by rounding. Accuracy: the ends are met within a few ulps of
 * the larger radius.
 */
export function arcFromEndpoints(
  x0: number,
  y0: number,
  rx: number,
  ry: number,
  rotationDeg: number,
  largeArc: boolean,
  sweep: boolean,
  x1: number,
  y1: number,
): ArcCentre | 'line' | 'omit' {
  if (x0 === x1 && y0 === y1) return 'omit';
  if (rx === 0 || ry === 0) return 'line';
  let a = Math.abs(rx);
  let b = Math.abs(ry);
  const sc = new Float64Array(2);
  sinCosDegrees(rotationDeg, sc);
  const sin = sc[0];
  const cos = sc[1];
  // Eq. 5.1, divided by the radii: the half-chord on the unit circle.
  const dx = x0 / 2 - x1 / 2;
  const dy = y0 / 2 - y1 / 2;
  let px = (cos * dx + sin * dy) / a;
  let py = (cos * dy - sin * dx) / b;
  let h = Math.sqrt(px * px + py * py);
  if (h > 1) {
    a *= h;
    b *= h;
    px /= h;
    py /= h;
    h = 1;
  }
  if (h < FLAT_HALF_CHORD && !largeArc) return 'line';
  // Eq. 5.2: the centre lies at `depth` from the chord, on the side that the flags choose.
  const depth = Math.sqrt((1 - h) * (1 + h));
  const side = (largeArc === sweep ? -1 : 1) * (depth / h);
  const qx = side * py;
  const qy = -side * px;
  const small = 2 * atan2(h, depth);
  const turn = largeArc ? 2 * Math.PI - small : small;
  const ux = a * cos;
  const uy = a * sin;
  const vx = -b * sin;
  const vy = b * cos;
  const cx = x0 / 2 + x1 / 2 + (qx * ux + qy * vx);
  const cy = y0 / 2 + y1 / 2 + (qx * uy + qy * vy);
  if (!Number.isFinite(cx) || !Number.isFinite(cy)) return 'line';
  return { cx, cy, ux, uy, vx, vy, theta0: atan2(py - qy, px - qx), sweep: sweep ? turn : -turn };
}

/** Relative difference of the half-axes below which an ellipse counts as a circle, whose rotation is 0. */
const ROUND = 1e-12;

/**
 * The half-axes of the ellipse with conjugate half-diameters u and v: rx ≥ ry ≥ 0, and the angle of
 * the major axis from x towards y in [0, 180) degrees, as the A command wants them.
 *
 * The image of the unit circle under the matrix [u v]: its singular values and left singular vector,
 * in closed form (Blinn, J. (1996), Consider the lowly 2×2 matrix, IEEE CG&A 16(2); from memory).
 * Accuracy: a few ulps of rx.
 */
export function ellipseAxes(
  ux: number,
  uy: number,
  vx: number,
  vy: number,
): { rx: number; ry: number; rotationDeg: number } {
  const e = (ux + vy) / 2;
  const f = (ux - vy) / 2;
  const g = (uy + vx) / 2;
  const h = (uy - vx) / 2;
  // [u v] is a similarity of size q plus a mirrored one of size r.
  const q = Math.sqrt(e * e + h * h);
  const r = Math.sqrt(f * f + g * g);
  const rx = q + r;
  const ry = Math.abs(q - r);
  if (rx - ry <= ROUND * rx) return { rx, ry, rotationDeg: 0 };
  const degrees = ((atan2(h, e) + atan2(g, f)) / 2) * (180 / Math.PI);
  const positive = degrees < 0 ? degrees + 180 : degrees;
  return { rx, ry, rotationDeg: positive >= 180 ? positive - 180 : positive };
}
