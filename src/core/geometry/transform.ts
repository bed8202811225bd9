import { type Affine, applyX, applyY } from './affine.js';
import { CUBIC, LINE, type SegmentBuilder, type Segments } from './segments.js';

/**
 * Appends segments `from` up to, not including, `to`, mapped by m.
 *
 * A line, cubic or arc stays one: Bézier curves and conjugate half-diameters are affinely invariant.
 * The image of a point depends on its coordinates only, so joints that are equal bit for bit stay so.
 */
export function appendTransformed(
  builder: SegmentBuilder,
  segments: Segments,
  from: number,
  to: number,
  m: Affine,
): void {
  const d = segments.data;
  for (let i = from; i < to; i++) {
    const o = segments.offset[i];
    const kind = segments.kind[i];
    const x0 = applyX(m, d[o], d[o + 1]);
    const y0 = applyY(m, d[o], d[o + 1]);
    const x1 = applyX(m, d[o + 2], d[o + 3]);
    const y1 = applyY(m, d[o + 2], d[o + 3]);
    if (kind === LINE) {
      builder.line(x0, y0, x1, y1);
    } else if (kind === CUBIC) {
      const ax = applyX(m, d[o + 4], d[o + 5]);
      const ay = applyY(m, d[o + 4], d[o + 5]);
      const bx = applyX(m, d[o + 6], d[o + 7]);
      const by = applyY(m, d[o + 6], d[o + 7]);
      builder.cubic(x0, y0, ax, ay, bx, by, x1, y1);
    } else {
      builder.arc(
        x0,
        y0,
        x1,
        y1,
        applyX(m, d[o + 4], d[o + 5]),
        applyY(m, d[o + 4], d[o + 5]),
        m[0] * d[o + 6] + m[2] * d[o + 7],
        m[1] * d[o + 6] + m[3] * d[o + 7],
        m[0] * d[o + 8] + m[2] * d[o + 9],
        m[1] * d[o + 8] + m[3] * d[o + 9],
        d[o + 10],
        d[o + 11],
      );
    }
  }
}
