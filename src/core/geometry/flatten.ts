import { pointAt } from './evaluate.js';
import { CUBIC, LINE, type Segments } from './segments.js';
import { atan2 } from './trig.js';

/**
 * Even the coarsest polygon of a full turn has three sides, so that it encloses something; and n² of
 * the finest is 10¹², where rounding takes over.
 */
const LARGEST_STEP = (2 * Math.PI) / 3;
const MOST_PIECES = 1 << 20;

/** Takes one vertex of a polyline: x, y, and its parameter on the segment it came from. */
export type EmitPoint = (x: number, y: number, t: number) => void;

/**
 * Replaces the span of segment i from t0 to t1 by a polyline, and emits its vertices after the start,
 * up to and including the end. t1 < t0 walks back over the very same vertices. Vertices are points of
 * the curve (`pointAt`, bit for bit) at parameters spaced evenly.
 *
 * Accuracy: no point of the curve is farther than `accuracyMm` from the chord with the same
 * parameters, nor any point of a chord from the curve (beyond rounding):
 *
 * - cubic: a chord over a parameter interval h deviates at most h²/8 · max|P″| (linear interpolation);
 *   |P″| is convex in t, so its maximum on the span is at one of the span's ends. On a whole cubic this
 *   is Wang's formula, n = √(6/8 · max|P(k+2) − 2P(k+1) + P(k)| / accuracy) (Goldman, R. (2003),
 *   Pyramid Algorithms, §5.6.3).
 * - arc: P is the image of the unit circle under [u v], where a step Δ has the sagitta 1 − cos(Δ/2);
 *   the map stretches distances by at most its larger singular value, the larger half-axis.
 *
 * A million pieces are the limit, with an error near 10⁻¹² of the curve's size; a finer accuracy is
 * not reached. RangeError unless accuracyMm > 0. Cost: one evaluation per vertex.
 */
export function flattenSegment(
  segments: Segments,
  i: number,
  t0: number,
  t1: number,
  accuracyMm: number,
  emit: EmitPoint,
): void {
  if (!(accuracyMm > 0)) throw new RangeError('flattenSegment: accuracyMm must be greater than 0');
  const p = new Float64Array(2);
  const n = pieceCount(segments, i, t0, t1, accuracyMm);
  const low = Math.min(t0, t1);
  const width = Math.abs(t1 - t0);
  for (let k = 1; k < n; k++) {
    const t = low + width * ((t1 < t0 ? n - k : k) / n);
    pointAt(segments, i, t, p);
    emit(p[0], p[1], t);
  }
  pointAt(segments, i, t1, p);
  emit(p[0], p[1], t1);
}

function pieceCount(segments: Segments, i: number, t0: number, t1: number, accuracy: number): number {
  const kind = segments.kind[i];
  if (kind === LINE) return 1;
  const d = segments.data;
  const o = segments.offset[i];
  const wanted = kind === CUBIC ? cubicPieces(d, o, t0, t1, accuracy) : arcPieces(d, o, t0, t1, accuracy);
  // A hair less before rounding up: an error above the accuracy by 2·10⁻¹² of it is rounding.
  return Math.max(1, Math.min(MOST_PIECES, Math.ceil(wanted * (1 - 1e-12))));
}

function cubicPieces(d: Float64Array, o: number, t0: number, t1: number, accuracy: number): number {
  const ax = d[o] - 2 * d[o + 4] + d[o + 6];
  const ay = d[o + 1] - 2 * d[o + 5] + d[o + 7];
  const bx = d[o + 4] - 2 * d[o + 6] + d[o + 2];
  const by = d[o + 5] - 2 * d[o + 7] + d[o + 3];
  const m2 = Math.max(squaredBlend(ax, ay, bx, by, t0), squaredBlend(ax, ay, bx, by, t1));
  return Math.abs(t1 - t0) * Math.sqrt((0.75 * Math.sqrt(m2)) / accuracy);
}

function squaredBlend(ax: number, ay: number, bx: number, by: number, t: number): number {
  const x = (1 - t) * ax + t * bx;
  const y = (1 - t) * ay + t * by;
  return x * x + y * y;
}

function arcPieces(d: Float64Array, o: number, t0: number, t1: number, accuracy: number): number {
  const sweep = Math.abs((t1 - t0) * d[o + 11]);
  const radius = largerHalfAxis(d[o + 6], d[o + 7], d[o + 8], d[o + 9]);
  // radius · (1 − cos(Δ/2)) = 2 radius · sin²(Δ/4) = accuracy
  const s2 = accuracy / (2 * radius);
  const step = s2 < 0.25 ? Math.min(LARGEST_STEP, 4 * atan2(Math.sqrt(s2), Math.sqrt(1 - s2))) : LARGEST_STEP;
  return sweep / step;
}

/** The larger singular value of [u v]. */
function largerHalfAxis(ux: number, uy: number, vx: number, vy: number): number {
  const e = ux + vy;
  const f = ux - vy;
  const g = uy + vx;
  const h = uy - vx;
  return (Math.sqrt(e * e + h * h) + Math.sqrt(f * f + g * g)) / 2;
}
