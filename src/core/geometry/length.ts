import { ellipseAxes } from './arc.js';
import { integrate } from './quadrature.js';
import { CUBIC, LINE, type Segments } from './segments.js';
import { atan2, sinCos } from './trig.js';

/** Deviation from a circle, relative, below which an arc is measured as one. */
const ROUND = 1e-12;

/**
 * The length of segment i between parameters t0 and t1, in either order.
 *
 * Accuracy: relative 1e-9, at cusps, folds and near them too; lines and circular arcs to rounding.
 * (A span much shorter than its curve and beside a cusp is as good as the rounding of its points.)
 * Cubics and elliptical arcs are integrals of the speed, whose branch points are known in closed form
 * (`cubicBranches`, `ellipseLength`), so that `integrate` can place its pieces before it begins.
 * Cost: 10 to 40 speeds for a smooth curve, some hundreds where the speed nearly vanishes.
 */
export function segmentLength(segments: Segments, i: number, t0 = 0, t1 = 1): number {
  const d = segments.data;
  const o = segments.offset[i];
  const kind = segments.kind[i];
  const low = Math.min(t0, t1);
  const high = Math.max(t0, t1);
  if (kind === LINE) return (high - low) * norm(d[o + 2] - d[o], d[o + 3] - d[o + 1]);
  if (kind === CUBIC) return cubicLength(d, o, low, high);
  const u2 = d[o + 6] * d[o + 6] + d[o + 7] * d[o + 7];
  const v2 = d[o + 8] * d[o + 8] + d[o + 9] * d[o + 9];
  const uv = d[o + 6] * d[o + 8] + d[o + 7] * d[o + 9];
  if (Math.abs(u2 - v2) <= ROUND * u2 && Math.abs(uv) <= ROUND * u2) {
    return (high - low) * Math.abs(d[o + 11]) * Math.sqrt((u2 + v2) / 2);
  }
  const { rx, ry } = ellipseAxes(d[o + 6], d[o + 7], d[o + 8], d[o + 9]);
  // |P′| is least where P lies on the major axis: there tan 2θ = 2 u·v / (|u|² − |v|²).
  const major = atan2(2 * uv, u2 - v2) / 2;
  const a = d[o + 10] - major + low * d[o + 11];
  return ellipseLength(rx, ry, a, a + (high - low) * d[o + 11]);
}

function cubicLength(d: Float64Array, o: number, low: number, high: number): number {
  const ax = 3 * (d[o + 4] - d[o]);
  const ay = 3 * (d[o + 5] - d[o + 1]);
  const bx = 3 * (d[o + 6] - d[o + 4]);
  const by = 3 * (d[o + 7] - d[o + 5]);
  const cx = 3 * (d[o + 2] - d[o + 6]);
  const cy = 3 * (d[o + 3] - d[o + 7]);
  const speed = (t: number): number => {
    const s = 1 - t;
    return norm(s * (s * ax + 2 * t * bx) + t * t * cx, s * (s * ay + 2 * t * by) + t * t * cy);
  };
  const branches = cubicBranches(ax, ay, 2 * (bx - ax), 2 * (by - ay), ax - 2 * bx + cx, ay - 2 * by + cy);
  return integrate(speed, low, high, branches);
}

/**
 * x′ + i·y′ = a + b·t + c·t² is a quadratic with complex coefficients, and the speed is its modulus:
 * |c|·|t − z1|·|t − z2|, which branches at the two roots and their conjugates.
 */
function cubicBranches(ax: number, ay: number, bx: number, by: number, cx: number, cy: number): number[] {
  const rootX = bx * bx - by * by - 4 * (ax * cx - ay * cy);
  const rootY = 2 * bx * by - 4 * (ax * cy + ay * cx);
  const size = norm(rootX, rootY);
  const large = Math.sqrt((size + Math.abs(rootX)) / 2);
  const small = large > 0 ? Math.abs(rootY) / (2 * large) : 0;
  let sx = rootX >= 0 ? large : small;
  let sy = (rootX >= 0 ? small : large) * (rootY < 0 ? -1 : 1);
  // Of the two square roots the one that adds to b without cancellation.
  if (bx * sx + by * sy < 0) {
    sx = -sx;
    sy = -sy;
  }
  const qx = -(bx + sx) / 2;
  const qy = -(by + sy) / 2;
  const c2 = cx * cx + cy * cy;
  const q2 = qx * qx + qy * qy;
  return [
    (qx * cx + qy * cy) / c2,
    (qy * cx - qx * cy) / c2,
    (ax * qx + ay * qy) / q2,
    (ay * qx - ax * qy) / q2,
  ];
}

/**
 * The length of an ellipse's arc between angles counted from the major axis. The speed
 * √(rx²·sin² + ry²·cos²) branches at multiples of π ± i·artanh(ry/rx), and artanh q ≥ q. Taken half
 * turn by half turn about those multiples, so that others stay away by more than the piece's half.
 */
function ellipseLength(rx: number, ry: number, from: number, to: number): number {
  const a = Math.min(from, to);
  const b = Math.max(from, to);
  const sc = new Float64Array(2);
  const speed = (angle: number): number => {
    sinCos(angle, sc);
    return norm(rx * sc[0], ry * sc[1]);
  };
  const im = rx > 0 ? ry / rx : 0;
  let total = 0;
  let start = a;
  for (let k = Math.floor(a / Math.PI + 0.5); start < b; k++) {
    const end = Math.min(b, (k + 0.5) * Math.PI);
    if (end > start) {
      total += integrate(speed, start, end, [k * Math.PI, im]);
      start = end;
    }
  }
  return total;
}

function norm(x: number, y: number): number {
  return Math.sqrt(x * x + y * y);
}
