import { CUBIC, LINE, type Segments } from './segments.js';
import { atan2 } from './trig.js';

/**
 * The parameters at which segment i has to be cut, 0 and 1 included, so that x and y each only rise or
 * only fall on every piece, but for rounding.
 */
export function monotoneCuts(segments: Segments, i: number): number[] {
  const kind = segments.kind[i];
  const cuts = [0, 1];
  if (kind === LINE) return cuts;
  const d = segments.data;
  const o = segments.offset[i];
  for (let axis = 0; axis < 2; axis++) {
    const a = d[o + 4 + axis];
    const b = d[o + 6 + axis];
    if (kind === CUBIC) {
      const turns = cubicTurns(d[o + axis], a, b, d[o + 2 + axis]);
      for (const t of turns ?? []) if (t > 0 && t < 1) cuts.push(t);
    } else addExtremes(b, d[o + 8 + axis], d[o + 10], d[o + 11], cuts);
  }
  return cuts.sort((s, t) => s - t).filter((t, k) => k === 0 || t > cuts[k - 1]);
}

/**
 * Where the derivative of the cubic with Bernstein coefficients p0, a, b, p1 vanishes, in [0, 1] or not; null
 * where it does nowhere. One of the two may be infinite or NaN.
 */
export function cubicTurns(p0: number, a: number, b: number, p1: number): readonly [number, number] | null {
  const c0 = a - p0;
  const c1 = b - a;
  const c2 = p1 - b;
  // (c0 − 2 c1 + c2) t² + 2 (c1 − c0) t + c0 = 0, without cancellation.
  const quadratic = c0 - 2 * c1 + c2;
  const half = c1 - c0;
  const under = half * half - quadratic * c0;
  if (!(under >= 0)) return null;
  const q = -(half + (half < 0 ? -1 : 1) * Math.sqrt(under));
  return [q / quadratic, c0 / q];
}

/** c + u·cos θ + v·sin θ turns at the angle of (u, v) and every half turn from there. */
function addExtremes(u: number, v: number, theta0: number, sweep: number, cuts: number[]): void {
  const top = atan2(v, u);
  const low = Math.min(theta0, theta0 + sweep);
  const high = Math.max(theta0, theta0 + sweep);
  for (let k = Math.ceil((low - top) / Math.PI); top + k * Math.PI < high; k++) {
    const t = (top + k * Math.PI - theta0) / sweep;
    if (t > 0 && t < 1) cuts.push(t);
  }
}
