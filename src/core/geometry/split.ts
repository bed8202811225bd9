import { chordEnds } from './evaluate.js';
import { CUBIC, LINE, type SegmentBuilder, type Segments } from './segments.js';

/**
 * Appends the piece of segment i from t0 to t1, both in [0, 1]; reversed where t1 < t0.
 *
 * The piece is the same curve exactly, up to rounding: its ends equal `pointAt` bit for bit, and
 * (0, 1) and (1, 0) keep every control point bit for bit. Its own parameter s in [0, 1] stands for
 * t0 + s·(t1 − t0).
 *
 * Source: for cubics the blossom (polar form), of which de Casteljau's algorithm is the case t0 = 0;
 * Ramshaw, L. (1987), Blossoming: a connect-the-dots approach to splines (from memory).
 */
export function appendSpan(
  builder: SegmentBuilder,
  segments: Segments,
  i: number,
  t0: number,
  t1: number,
): void {
  const d = segments.data;
  const o = segments.offset[i];
  const kind = segments.kind[i];
  const ends = new Float64Array(4);
  chordEnds(segments, i, t0, t1, ends);
  const [x0, y0, x1, y1] = ends;
  if (kind === LINE) {
    builder.line(x0, y0, x1, y1);
  } else if (kind === CUBIC) {
    builder.cubic(
      x0,
      y0,
      blossom(d[o], d[o + 4], d[o + 6], d[o + 2], t0, t1),
      blossom(d[o + 1], d[o + 5], d[o + 7], d[o + 3], t0, t1),
      blossom(d[o], d[o + 4], d[o + 6], d[o + 2], t1, t0),
      blossom(d[o + 1], d[o + 5], d[o + 7], d[o + 3], t1, t0),
      x1,
      y1,
    );
  } else {
    const sweep = d[o + 11];
    builder.arc(
      x0,
      y0,
      x1,
      y1,
      d[o + 4],
      d[o + 5],
      d[o + 6],
      d[o + 7],
      d[o + 8],
      d[o + 9],
      d[o + 10] + t0 * sweep,
      (t1 - t0) * sweep,
    );
  }
}

/** The polar form of a cubic at (r, r, s): the control point next to parameter r of the piece from r to s. */
export function blossom(p0: number, a: number, b: number, p1: number, r: number, s: number): number {
  const q = 1 - r;
  const c0 = q * p0 + r * a;
  const c1 = q * a + r * b;
  const c2 = q * b + r * p1;
  return (1 - s) * (q * c0 + r * c1) + s * (q * c1 + r * c2);
}
