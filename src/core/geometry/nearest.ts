import { bernstein5Roots } from './bernstein.js';
import { pointAt } from './evaluate.js';
import { CUBIC, LINE, type Segments } from './segments.js';
import { blossom } from './split.js';
import { atan2, sinCos } from './trig.js';

/**
 * Rounding of the products below, as a share of the largest distance times the largest speed.
 */
const NOISE = 16 * Number.EPSILON;

/**
 * The point of segment i nearest to (x, y) between parameters t0 and t1 (in either order): its
 * parameter, and its distance. The nearest of all, not just a local one; of equally near ones an end.
 *
 * At an interior nearest point (P − q)·P′ = 0. For a cubic that is a quintic in t, for an arc a quartic
 * in tan(θ/2); both in Bernstein form, whose roots are isolated without fail (`bernstein5Roots`).
 * Source: Schneider, P. J. (1990), Solving the nearest-point-on-curve problem, Graphics Gems,
 * pp. 607–611 (from memory). Accuracy of the distance: 1e-9 of the size of segment and distance,
 * at cusps too, usually 1e-14. Cost: about a microsecond.
 */
export function nearestOnSegment(
  segments: Segments,
  i: number,
  x: number,
  y: number,
  t0: number,
  t1: number,
): { t: number; distance: number } {
  const low = Math.min(t0, t1);
  const high = Math.max(t0, t1);
  const p = new Float64Array(2);
  let t = t0;
  let squared = Number.POSITIVE_INFINITY;
  const visit = (candidate: number): void => {
    const c = Math.min(Math.max(candidate, low), high);
    pointAt(segments, i, c, p);
    const dx = p[0] - x;
    const dy = p[1] - y;
    const next = dx * dx + dy * dy;
    if (next < squared) {
      squared = next;
      t = c;
    }
  };
  visit(t0);
  visit(t1);
  if (low < high) {
    const kind = segments.kind[i];
    const d = segments.data;
    const o = segments.offset[i];
    if (kind === LINE) visit(footOnLine(d, o, x, y));
    else if (kind === CUBIC) feetOnCubic(d, o, x, y, low, high, visit);
    else feetOnArc(d, o, x, y, low, high, visit);
  }
  return { t, distance: Math.sqrt(squared) };
}

function footOnLine(d: Float64Array, o: number, x: number, y: number): number {
  const dx = d[o + 2] - d[o];
  const dy = d[o + 3] - d[o + 1];
  const squared = dx * dx + dy * dy;
  return squared > 0 ? ((x - d[o]) * dx + (y - d[o + 1]) * dy) / squared : 0;
}

function feetOnCubic(
  d: Float64Array,
  o: number,
  x: number,
  y: number,
  low: number,
  high: number,
  visit: (t: number) => void,
): void {
  const x0 = d[o] - x;
  const y0 = d[o + 1] - y;
  const x1 = d[o + 4] - x;
  const y1 = d[o + 5] - y;
  const x2 = d[o + 6] - x;
  const y2 = d[o + 7] - y;
  const x3 = d[o + 2] - x;
  const y3 = d[o + 3] - y;
  // The span's own control points, seen from (x, y).
  const ax = blossom(x0, x1, x2, x3, low, low);
  const ay = blossom(y0, y1, y2, y3, low, low);
  const bx = blossom(x0, x1, x2, x3, low, high);
  const by = blossom(y0, y1, y2, y3, low, high);
  const cx = blossom(x0, x1, x2, x3, high, low);
  const cy = blossom(y0, y1, y2, y3, high, low);
  const ex = blossom(x0, x1, x2, x3, high, high);
  const ey = blossom(y0, y1, y2, y3, high, high);
  const ux = bx - ax;
  const uy = by - ay;
  const vx = cx - bx;
  const vy = cy - by;
  const wx = ex - cx;
  const wy = ey - cy;
  const far = Math.sqrt(Math.max(ax * ax + ay * ay, bx * bx + by * by, cx * cx + cy * cy, ex * ex + ey * ey));
  const fast = Math.sqrt(Math.max(ux * ux + uy * uy, vx * vx + vy * vy, wx * wx + wy * wy));
  bernstein5Roots(
    ax * ux + ay * uy,
    (3 * (bx * ux + by * uy) + 2 * (ax * vx + ay * vy)) / 5,
    (3 * (cx * ux + cy * uy) + 6 * (bx * vx + by * vy) + (ax * wx + ay * wy)) / 10,
    (ex * ux + ey * uy + 6 * (cx * vx + cy * vy) + 3 * (bx * wx + by * wy)) / 10,
    (2 * (ex * vx + ey * vy) + 3 * (cx * wx + cy * wy)) / 5,
    ex * wx + ey * wy,
    low,
    high,
    NOISE * far * fast,
    visit,
  );
}

/**
 * Quarter turn by quarter turn: about the middle angle of a piece, s = tan(θ/2) gives
 * cos θ = (1 − s²)/(1 + s²) and sin θ = 2s/(1 + s²), so that
 * (1 + s²)²·(P − q)·P′ = (e + u + 2v·s + (e − u)·s²)·(v − 2u·s − v·s²), with e = centre − q.
 */
function feetOnArc(
  d: Float64Array,
  o: number,
  x: number,
  y: number,
  low: number,
  high: number,
  visit: (t: number) => void,
): void {
  const ex = d[o + 4] - x;
  const ey = d[o + 5] - y;
  const theta0 = d[o + 10];
  const sweep = d[o + 11];
  const span = (high - low) * sweep;
  if (span === 0) return;
  const pieces = Math.max(1, Math.ceil(Math.abs(span) / (Math.PI / 2) - 1e-9));
  const sc = new Float64Array(2);
  sinCos(span / pieces / 4, sc);
  const w = sc[0] / sc[1];
  for (let k = 0; k < pieces; k++) {
    // A foot on the seam of two pieces may fall between them by rounding.
    if (k > 0) visit(low + ((high - low) * k) / pieces);
    const middle = low + ((high - low) * (k + 0.5)) / pieces;
    sinCos(theta0 + middle * sweep, sc);
    const ux = d[o + 6] * sc[1] + d[o + 8] * sc[0];
    const uy = d[o + 7] * sc[1] + d[o + 9] * sc[0];
    const vx = d[o + 8] * sc[1] - d[o + 6] * sc[0];
    const vy = d[o + 9] * sc[1] - d[o + 7] * sc[0];
    feetOnPiece(ex, ey, ux, uy, vx, vy, w, (s) => visit(middle + (2 * atan2(s, 1)) / sweep));
  }
}

function feetOnPiece(
  ex: number,
  ey: number,
  ux: number,
  uy: number,
  vx: number,
  vy: number,
  w: number,
  visit: (s: number) => void,
): void {
  const w2 = w * w;
  // Both factors in Bernstein form on [−w, w].
  const p0x = ex + ux - 2 * w * vx + w2 * (ex - ux);
  const p0y = ey + uy - 2 * w * vy + w2 * (ey - uy);
  const p1x = ex + ux - w2 * (ex - ux);
  const p1y = ey + uy - w2 * (ey - uy);
  const p2x = ex + ux + 2 * w * vx + w2 * (ex - ux);
  const p2y = ey + uy + 2 * w * vy + w2 * (ey - uy);
  const q0x = vx + 2 * w * ux - w2 * vx;
  const q0y = vy + 2 * w * uy - w2 * vy;
  const q1x = vx + w2 * vx;
  const q1y = vy + w2 * vy;
  const q2x = vx - 2 * w * ux - w2 * vx;
  const q2y = vy - 2 * w * uy - w2 * vy;
  const c0 = p0x * q0x + p0y * q0y;
  const c1 = (p1x * q0x + p1y * q0y + p0x * q1x + p0y * q1y) / 2;
  const c2 = (p2x * q0x + p2y * q0y + 4 * (p1x * q1x + p1y * q1y) + p0x * q2x + p0y * q2y) / 6;
  const c3 = (p2x * q1x + p2y * q1y + p1x * q2x + p1y * q2y) / 2;
  const c4 = p2x * q2x + p2y * q2y;
  const size = Math.abs(ux) + Math.abs(uy) + Math.abs(vx) + Math.abs(vy);
  const noise = NOISE * size * (size + Math.abs(ex) + Math.abs(ey));
  // Raised to degree 5.
  bernstein5Roots(
    c0,
    (c0 + 4 * c1) / 5,
    (2 * c1 + 3 * c2) / 5,
    (3 * c2 + 2 * c3) / 5,
    (4 * c3 + c4) / 5,
    c4,
    -w,
    w,
    noise,
    visit,
  );
}
