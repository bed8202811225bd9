import { type ArcCentre, ellipseAxes } from '../geometry/arc.js';
import { sinCos } from '../geometry/trig.js';

const WIDEST_PIECE = (2 * Math.PI) / 3 + 1e-9;
const RADIANS_PER_DEGREE = Math.PI / 180;

/**
 * In how many equal pieces to write an arc from end to end. The reader finds the centre from the ends
 * and the radii (SVG 2, "Conversion from endpoint to center parameterization"); an error in the chord
 * moves it by tan(sweep/2) times as much, so near half a turn rounding throws it far off. A third of a
 * turn keeps the factor below 2.
 */
export function arcPieceCount(sweep: number): number {
  return Math.max(1, Math.ceil(Math.abs(sweep) / WIDEST_PIECE));
}

/**
 * Whether the written numbers, each off by half of `step`, would still give the arc within 20 steps.
 * A flat ellipse does not: across it the same rounding is a larger part of the radius.
 */
export function survivesRounding(arc: ArcCentre, step: number): boolean {
  const { rx, ry } = ellipseAxes(arc.ux, arc.uy, arc.vx, arc.vy);
  const long = Math.max(rx, ry);
  const short = Math.min(rx, ry);
  if (short < 10 * step) return false;
  const centre = 2 * step * (long / short);
  const turn = long === short ? 0 : long * (step / 2) * RADIANS_PER_DEGREE;
  return centre + turn <= 20 * step;
}

/** The point at angle `theta`, into out[0], out[1]. */
export function pointOnArc(arc: ArcCentre, theta: number, out: Float64Array): void {
  sinCos(theta, out);
  const sin = out[0];
  const cos = out[1];
  out[0] = arc.cx + arc.ux * cos + arc.vx * sin;
  out[1] = arc.cy + arc.uy * cos + arc.vy * sin;
}

/**
 * Cubics that follow an arc within `accuracyMm`, as (ax, ay, bx, by, x, y) each; the end of the last is
 * computed, so a caller that knows the exact end puts it there.
 *
 * Handles are 4/3·tan(Δ/4) of the derivative; for a unit circle that keeps within
 * 2/27·sin⁶(Δ/4)/cos²(Δ/4) of it (Goldapp, "Approximation of circular arcs by cubic polynomials",
 * CAGD 8, 1991; formula from memory, tested here), and an affine map scales that by the longer radius.
 */
export function arcAsCubics(
  arc: ArcCentre,
  accuracyMm: number,
  emit: (ax: number, ay: number, bx: number, by: number, x: number, y: number) => void,
): void {
  const { rx, ry } = ellipseAxes(arc.ux, arc.uy, arc.vx, arc.vy);
  const radius = Math.max(rx, ry);
  const turn = new Float64Array(2);
  let count = Math.max(1, Math.ceil(Math.abs(arc.sweep) / (Math.PI / 2)));
  for (;;) {
    sinCos(arc.sweep / count / 4, turn);
    const s2 = turn[0] * turn[0];
    if (((2 / 27) * s2 * s2 * s2 * radius) / (turn[1] * turn[1]) <= accuracyMm) break;
    count++;
  }
  const handle = ((4 / 3) * turn[0]) / turn[1];
  const at = new Float64Array(2);
  let sin: number;
  let cos: number;
  [sin, cos] = sinAndCos(arc.theta0, at);
  for (let i = 1; i <= count; i++) {
    const [sin1, cos1] = sinAndCos(arc.theta0 + (arc.sweep * i) / count, at);
    const a = cos - handle * sin;
    const b = sin + handle * cos;
    const c = cos1 + handle * sin1;
    const d = sin1 - handle * cos1;
    emit(
      arc.cx + arc.ux * a + arc.vx * b,
      arc.cy + arc.uy * a + arc.vy * b,
      arc.cx + arc.ux * c + arc.vx * d,
      arc.cy + arc.uy * c + arc.vy * d,
      arc.cx + arc.ux * cos1 + arc.vx * sin1,
      arc.cy + arc.uy * cos1 + arc.vy * sin1,
    );
    sin = sin1;
    cos = cos1;
  }
}

function sinAndCos(theta: number, out: Float64Array): [number, number] {
  sinCos(theta, out);
  return [out[0], out[1]];
}
