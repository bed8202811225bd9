import { chordEnds, derivativeAt } from './evaluate.js';
import { CUBIC, LINE, type Segments } from './segments.js';
import { blossom } from './split.js';
import { sinCos } from './trig.js';

/** A part of a segment within a hull, its directions within a cone. */
export interface CurvePiece {
  readonly t0: number;
  readonly t1: number;
  /** Points whose convex hull holds the piece: x, y, x, y … */
  readonly hull: readonly number[];
  /** Vectors whose cone holds every direction of the piece; none where it is a point. */
  readonly cone: readonly number[];
  /** The longer side of the hull's box. */
  readonly extent: number;
}

const NOISE = 8 * Number.EPSILON;
/** An arc's hull is the triangle of its end tangents, so its angle must stay well below half a turn. */
export const MOST_PIECE_TURN = Math.PI / 2 + 1e-6;

/**
 * The piece of segment i from t0 to t1. Hulls and cones are those of the Bézier form: the control
 * polygon, rational for an arc, which may turn by no more than `MOST_PIECE_TURN`.
 */
export function curvePiece(segments: Segments, i: number, t0: number, t1: number): CurvePiece {
  const d = segments.data;
  const o = segments.offset[i];
  const kind = segments.kind[i];
  const ends = new Float64Array(4);
  chordEnds(segments, i, t0, t1, ends);
  const [x0, y0, x1, y1] = ends;
  if (kind === LINE) {
    return finish(t0, t1, [x0, y0, x1, y1], [x1 - x0, y1 - y0]);
  }
  if (kind === CUBIC) {
    const ax = blossom(d[o], d[o + 4], d[o + 6], d[o + 2], t0, t1);
    const ay = blossom(d[o + 1], d[o + 5], d[o + 7], d[o + 3], t0, t1);
    const bx = blossom(d[o], d[o + 4], d[o + 6], d[o + 2], t1, t0);
    const by = blossom(d[o + 1], d[o + 5], d[o + 7], d[o + 3], t1, t0);
    const cone = [ax - x0, ay - y0, bx - ax, by - ay, x1 - bx, y1 - by];
    return finish(t0, t1, [x0, y0, ax, ay, bx, by, x1, y1], cone);
  }
  const half = ((t1 - t0) * d[o + 11]) / 2;
  const sc = new Float64Array(2);
  sinCos(half, sc);
  const cosHalf = sc[1];
  sinCos(d[o + 10] + t0 * d[o + 11] + half, sc);
  const qx = d[o + 4] + (d[o + 6] * sc[1] + d[o + 8] * sc[0]) / cosHalf;
  const qy = d[o + 5] + (d[o + 7] * sc[1] + d[o + 9] * sc[0]) / cosHalf;
  derivativeAt(segments, i, t0, sc);
  const [ux, uy] = sc;
  derivativeAt(segments, i, t1, sc);
  return finish(t0, t1, [x0, y0, qx, qy, x1, y1], [ux, uy, sc[0], sc[1]]);
}

/** Vectors that are no more than rounding have no direction and are left out. */
function finish(t0: number, t1: number, hull: number[], vectors: number[]): CurvePiece {
  let minX = hull[0];
  let maxX = hull[0];
  let minY = hull[1];
  let maxY = hull[1];
  for (let k = 2; k < hull.length; k += 2) {
    minX = Math.min(minX, hull[k]);
    maxX = Math.max(maxX, hull[k]);
    minY = Math.min(minY, hull[k + 1]);
    maxY = Math.max(maxY, hull[k + 1]);
  }
  const noise = NOISE * Math.max(Math.abs(minX), Math.abs(maxX), Math.abs(minY), Math.abs(maxY));
  let kept = 0;
  for (let k = 0; k < vectors.length; k += 2) {
    if (Math.abs(vectors[k]) <= noise && Math.abs(vectors[k + 1]) <= noise) continue;
    vectors[kept] = vectors[k];
    vectors[kept + 1] = vectors[k + 1];
    kept += 2;
  }
  vectors.length = kept;
  return { t0, t1, hull, cone: vectors, extent: Math.max(maxX - minX, maxY - minY) };
}

/**
 * A line separates the two hulls by more than `margin`: one along an axis, or along a side of either
 * hull's control polygon or its chord. False says nothing.
 */
export function areApart(p: CurvePiece, q: CurvePiece, margin: number): boolean {
  if (separates(p, q, 1, 0, margin) || separates(p, q, 0, 1, margin)) return true;
  return separatedAlong(p, p, q, margin) || separatedAlong(q, p, q, margin);
}

function separatedAlong(of: CurvePiece, p: CurvePiece, q: CurvePiece, margin: number): boolean {
  const h = of.hull;
  const end = h.length - 2;
  if (separates(p, q, h[1] - h[end + 1], h[end] - h[0], margin)) return true;
  if (h.length === 4) return false;
  return (
    separates(p, q, h[1] - h[3], h[2] - h[0], margin) ||
    separates(p, q, h[end - 1] - h[end + 1], h[end] - h[end - 2], margin)
  );
}

function separates(p: CurvePiece, q: CurvePiece, nx: number, ny: number, margin: number): boolean {
  const length = Math.sqrt(nx * nx + ny * ny);
  if (!(length > 0)) return false;
  let pLow = Number.POSITIVE_INFINITY;
  let pHigh = Number.NEGATIVE_INFINITY;
  let qLow = Number.POSITIVE_INFINITY;
  let qHigh = Number.NEGATIVE_INFINITY;
  for (let k = 0; k < p.hull.length; k += 2) {
    const along = nx * p.hull[k] + ny * p.hull[k + 1];
    pLow = Math.min(pLow, along);
    pHigh = Math.max(pHigh, along);
  }
  for (let k = 0; k < q.hull.length; k += 2) {
    const along = nx * q.hull[k] + ny * q.hull[k + 1];
    qLow = Math.min(qLow, along);
    qHigh = Math.max(qHigh, along);
  }
  const gap = margin * length;
  return pLow > qHigh + gap || qLow > pHigh + gap;
}

/**
 * No direction of the one is parallel to one of the other, so that they meet at most once: the chord
 * between two meetings would lie in both cones (Sederberg, T. W. and Meyers, R. J. (1988), Loop
 * detection in surface patch intersections, Computer Aided Geometric Design 5, 161–171; from memory).
 */
export function meetAtMostOnce(p: CurvePiece, q: CurvePiece): boolean {
  let side = 0;
  for (let k = 0; k < p.cone.length; k += 2) {
    for (let l = 0; l < q.cone.length; l += 2) {
      const cross = p.cone[k] * q.cone[l + 1] - p.cone[k + 1] * q.cone[l];
      const next = Math.sign(cross);
      if (next === 0 || (side !== 0 && next !== side)) return false;
      side = next;
    }
  }
  return side !== 0;
}

/** All directions within 60° of one another or so: the piece is a plain bow. */
export function isNearlyStraight(p: CurvePiece): boolean {
  const c = p.cone;
  if (c.length === 0) return false;
  for (let k = 2; k < c.length; k += 2) {
    const dot = c[0] * c[k] + c[1] * c[k + 1];
    const cross = c[0] * c[k + 1] - c[1] * c[k];
    if (!(dot > 0) || Math.abs(cross) > 0.5 * dot) return false;
  }
  return true;
}
