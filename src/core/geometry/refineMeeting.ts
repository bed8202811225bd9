import { derivativeAt, pointAt } from './evaluate.js';
import { secondDerivativeAt } from './secondDerivative.js';
import type { Segments } from './segments.js';

const MOST_STEPS = 40;
/** Steps below this share of the parameter no longer matter. */
const STILL = 4 * Number.EPSILON;

/**
 * Two segments and a pair of parameters that is moved to where they meet or come nearest. `s` and `t`
 * stay in [0, 1]; `gap` is the distance between the two points afterwards.
 */
export class MeetingSolver {
  s = 0;
  t = 0;
  gap = 0;
  private readonly p = new Float64Array(2);
  private readonly q = new Float64Array(2);
  private readonly v = new Float64Array(2);
  private readonly w = new Float64Array(2);
  private readonly k = new Float64Array(2);
  private readonly l = new Float64Array(2);

  constructor(
    private readonly a: Segments,
    private readonly i: number,
    private readonly b: Segments,
    private readonly j: number,
  ) {}

  /** Newton's method on A(s) = B(t) from (s, t). */
  toCrossing(s: number, t: number): void {
    const { p, q, v, w } = this;
    let bestS = s;
    let bestT = t;
    let best = Number.POSITIVE_INFINITY;
    for (let step = 0; step < MOST_STEPS; step++) {
      this.points(s, t);
      const rx = q[0] - p[0];
      const ry = q[1] - p[1];
      const gap = rx * rx + ry * ry;
      if (gap < best) {
        best = gap;
        bestS = s;
        bestT = t;
      }
      if (gap === 0) break;
      derivativeAt(this.a, this.i, s, v);
      derivativeAt(this.b, this.j, t, w);
      const det = v[1] * w[0] - v[0] * w[1];
      const ds = (ry * w[0] - rx * w[1]) / det;
      const dt = (v[0] * ry - v[1] * rx) / det;
      if (!Number.isFinite(ds) || !Number.isFinite(dt)) break;
      const nextS = clamp(s + ds);
      const nextT = clamp(t + dt);
      if (Math.abs(nextS - s) <= STILL && Math.abs(nextT - t) <= STILL) break;
      s = nextS;
      t = nextT;
    }
    this.s = bestS;
    this.t = bestT;
    this.gap = Math.sqrt(best);
  }

  /**
   * Newton's method to where the tangents are parallel and the line between the points is normal to
   * them: A′(s) × B′(t) = 0 and (A(s) − B(t))·A′(s) = 0. False where that does not settle.
   */
  toContact(s: number, t: number): boolean {
    const { p, q, v, w, k, l } = this;
    let settled = false;
    for (let step = 0; step < MOST_STEPS && !settled; step++) {
      this.points(s, t);
      derivativeAt(this.a, this.i, s, v);
      derivativeAt(this.b, this.j, t, w);
      secondDerivativeAt(this.a, this.i, s, k);
      secondDerivativeAt(this.b, this.j, t, l);
      const rx = p[0] - q[0];
      const ry = p[1] - q[1];
      const f = v[0] * w[1] - v[1] * w[0];
      const g = rx * v[0] + ry * v[1];
      const fs = k[0] * w[1] - k[1] * w[0];
      const ft = v[0] * l[1] - v[1] * l[0];
      const gs = v[0] * v[0] + v[1] * v[1] + rx * k[0] + ry * k[1];
      const gt = -(w[0] * v[0] + w[1] * v[1]);
      const det = fs * gt - ft * gs;
      const ds = (ft * g - gt * f) / det;
      const dt = (gs * f - fs * g) / det;
      if (!Number.isFinite(ds) || !Number.isFinite(dt)) return false;
      const nextS = clamp(s + ds);
      const nextT = clamp(t + dt);
      settled = Math.abs(nextS - s) <= 1e-15 && Math.abs(nextT - t) <= 1e-15;
      // Rounding may keep the last step from vanishing.
      if (step > 8 && Math.abs(nextS - s) <= 1e-13 && Math.abs(nextT - t) <= 1e-13) settled = true;
      s = nextS;
      t = nextT;
    }
    this.s = s;
    this.t = t;
    this.gap = this.gapAt(s, t);
    return settled;
  }

  /** The distance between the two points. */
  gapAt(s: number, t: number): number {
    this.points(s, t);
    const rx = this.p[0] - this.q[0];
    const ry = this.p[1] - this.q[1];
    return Math.sqrt(rx * rx + ry * ry);
  }

  private points(s: number, t: number): void {
    pointAt(this.a, this.i, s, this.p);
    pointAt(this.b, this.j, t, this.q);
  }
}

function clamp(t: number): number {
  return Math.min(Math.max(t, 0), 1);
}
