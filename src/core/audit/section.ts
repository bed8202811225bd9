import { pointAt } from '../geometry/evaluate.js';
import { nearestOnSegment } from '../geometry/nearest.js';
import { ARC, CUBIC, LINE, type Segments } from '../geometry/segments.js';
import { blossom } from '../geometry/split.js';

/** Arcs are compared at so many places between the ends. */
const ARC_SAMPLES = 6;
/** A chord stands for an arc of at most this angle, so that its middle is where it is farthest off. */
const MOST_CHORD_ANGLE = 2;

/** Which part of a segment another one is: from `t0` to `t1`, and how far off. */
export interface Section {
  t0: number;
  t1: number;
  deviation: number;
}

/**
 * Whether segment j is a part of segment i: its ends lie on i within `sameMm`, and between them it is the
 * same curve within `sameMm`, or a chord that i leaves by at most `matchMm`. `knownT0` is the parameter
 * of its start where that is known, else negative.
 *
 * Cubics are compared by their control points, which bounds the distance everywhere (convex hull
 * property); a cubic lies within 3/4 of the larger distance of its control points from the chord of its
 * ends. The chord must be run along without turning back.
 */
export function isSectionOf(
  a: Segments,
  i: number,
  b: Segments,
  j: number,
  knownT0: number,
  sameMm: number,
  matchMm: number,
  out: Section,
): boolean {
  const chord = b.kind[j] === LINE;
  if (!chord && a.kind[i] !== b.kind[j]) return false;
  const o = b.offset[j];
  const d = b.data;
  const t0 = knownT0 >= 0 ? knownT0 : parameterOf(a, i, d[o], d[o + 1], sameMm, out);
  if (t0 < 0) return false;
  const atStart = knownT0 >= 0 ? 0 : out.deviation;
  const t1 = parameterOf(a, i, d[o + 2], d[o + 3], sameMm, out);
  if (t1 < 0 || t1 === t0) return false;
  const atEnds = Math.max(atStart, out.deviation);
  let off = 0;
  if (a.kind[i] === CUBIC) off = chord ? cubicOffChord(a, i, b, j, t0, t1) : cubicOff(a, i, b, j, t0, t1);
  else if (a.kind[i] === ARC) off = chord ? arcOffChord(a, i, b, j, t0, t1) : arcOff(a, i, b, j, t0, t1);
  if (!(off <= (chord ? matchMm - atEnds : sameMm))) return false;
  out.t0 = t0;
  out.t1 = t1;
  out.deviation = chord ? off + atEnds : Math.max(off, atEnds);
  return true;
}

/** The parameter of the point of segment i nearest to a place, −1 where it is farther than `reach`. */
function parameterOf(s: Segments, i: number, x: number, y: number, reach: number, out: Section): number {
  const o = s.offset[i];
  const d = s.data;
  for (let end = 0; end < 2; end++) {
    const distance = between(d[o + 2 * end], d[o + 2 * end + 1], x, y);
    if (distance > reach) continue;
    out.deviation = distance;
    return end;
  }
  if (s.kind[i] === CUBIC && isOutside(d, o, x, y, reach)) return -1;
  const { t, distance } = nearestOnSegment(s, i, x, y, 0, 1);
  out.deviation = distance;
  return distance <= reach ? t : -1;
}

/** Whether a place lies beyond reach of the box of a cubic's control points. */
function isOutside(d: Float64Array, o: number, x: number, y: number, reach: number): boolean {
  return (
    x < Math.min(d[o], d[o + 2], d[o + 4], d[o + 6]) - reach ||
    x > Math.max(d[o], d[o + 2], d[o + 4], d[o + 6]) + reach ||
    y < Math.min(d[o + 1], d[o + 3], d[o + 5], d[o + 7]) - reach ||
    y > Math.max(d[o + 1], d[o + 3], d[o + 5], d[o + 7]) + reach
  );
}

function cubicOff(a: Segments, i: number, b: Segments, j: number, t0: number, t1: number): number {
  const [d, o] = [a.data, a.offset[i]];
  const [e, q] = [b.data, b.offset[j]];
  let worst = 0;
  for (let end = 0; end < 2; end++) {
    const [r, s] = end === 0 ? [t0, t1] : [t1, t0];
    const x = blossom(d[o], d[o + 4], d[o + 6], d[o + 2], r, s);
    const y = blossom(d[o + 1], d[o + 5], d[o + 7], d[o + 3], r, s);
    worst = Math.max(worst, between(x, y, e[q + 4 + 2 * end], e[q + 5 + 2 * end]));
  }
  return worst;
}

function cubicOffChord(a: Segments, i: number, b: Segments, j: number, t0: number, t1: number): number {
  const [d, o] = [a.data, a.offset[i]];
  const [e, q] = [b.data, b.offset[j]];
  const [x0, y0] = [e[q], e[q + 1]];
  const length = between(x0, y0, e[q + 2], e[q + 3]);
  if (!(length > 0)) return Number.POSITIVE_INFINITY;
  const [ux, uy] = [(e[q + 2] - x0) / length, (e[q + 3] - y0) / length];
  let worst = 0;
  let from = 0;
  for (let end = 0; end < 2; end++) {
    const [r, s] = end === 0 ? [t0, t1] : [t1, t0];
    const x = blossom(d[o], d[o + 4], d[o + 6], d[o + 2], r, s) - x0;
    const y = blossom(d[o + 1], d[o + 5], d[o + 7], d[o + 3], r, s) - y0;
    const along = x * ux + y * uy;
    if (along < from || along > length) return Number.POSITIVE_INFINITY;
    from = along;
    worst = Math.max(worst, Math.abs(x * uy - y * ux));
  }
  return 0.75 * worst;
}

function arcOff(a: Segments, i: number, b: Segments, j: number, t0: number, t1: number): number {
  const p = new Float64Array(2);
  const q = new Float64Array(2);
  let worst = 0;
  for (let k = 1; k <= ARC_SAMPLES; k++) {
    const s = k / (ARC_SAMPLES + 1);
    pointAt(a, i, t0 + s * (t1 - t0), p);
    pointAt(b, j, s, q);
    worst = Math.max(worst, between(p[0], p[1], q[0], q[1]));
  }
  return worst;
}

/** An affine image of a circle is farthest from a chord half-way between the angles of its ends. */
function arcOffChord(a: Segments, i: number, b: Segments, j: number, t0: number, t1: number): number {
  if (Math.abs((t1 - t0) * a.data[a.offset[i] + 11]) > MOST_CHORD_ANGLE) return Number.POSITIVE_INFINITY;
  const [e, q] = [b.data, b.offset[j]];
  const [dx, dy] = [e[q + 2] - e[q], e[q + 3] - e[q + 1]];
  const length = Math.sqrt(dx * dx + dy * dy);
  if (!(length > 0)) return Number.POSITIVE_INFINITY;
  const p = new Float64Array(2);
  pointAt(a, i, (t0 + t1) / 2, p);
  return Math.abs((p[0] - e[q]) * dy - (p[1] - e[q + 1]) * dx) / length;
}

function between(ax: number, ay: number, bx: number, by: number): number {
  const dx = bx - ax;
  const dy = by - ay;
  return Math.sqrt(dx * dx + dy * dy);
}
