import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Affine, applyX, applyY } from '../../../src/core/geometry/affine.ts';
import { ellipseAxes } from '../../../src/core/geometry/arc.ts';
import { pointAt } from '../../../src/core/geometry/evaluate.ts';
import { SegmentBuilder, type Segments } from '../../../src/core/geometry/segments.ts';
import { appendTransformed } from '../../../src/core/geometry/transform.ts';
import { aCurve, aParameter, build, circle, place } from '../../support/curves.ts';

const entry = fc.double({ min: -3, max: 3, noNaN: true });
const anAffine = fc.tuple(entry, entry, entry, entry, entry, entry) as fc.Arbitrary<Affine>;

function mapped(segments: Segments, m: Affine, from = 0, to = segments.count): Segments {
  const builder = new SegmentBuilder();
  appendTransformed(builder, segments, from, to, m);
  return builder.finish();
}

describe('appendTransformed', () => {
  test('the point of the image is the image of the point', () => {
    const out = new Float64Array(2);
    fc.assert(
      fc.property(aCurve, anAffine, aParameter, (curve, m, t) => {
        pointAt(mapped(build(curve), m), 0, t, out);
        const [x, y] = place(curve, t);
        return Math.abs(out[0] - applyX(m, x, y)) <= 1e-11 && Math.abs(out[1] - applyY(m, x, y)) <= 1e-11;
      }),
      { numRuns: 2000 },
    );
  });

  test('joints stay equal bit for bit', () => {
    fc.assert(
      fc.property(fc.array(entry, { minLength: 10, maxLength: 10 }), anAffine, (p, m) => {
        const [x0, y0, x1, y1, x2, y2, ax, ay, bx, by] = p as number[] & { length: 10 };
        const image = mapped(
          build(
            { kind: 'line', points: [x0, y0, x1, y1] },
            { kind: 'cubic', points: [x1, y1, ax, ay, bx, by, x2, y2] },
          ),
          m,
        );
        const second = image.offset[1];
        expect([...image.data.slice(2, 4)]).toEqual([...image.data.slice(second, second + 2)]);
      }),
    );
  });

  test('takes the segments asked for, in order', () => {
    const lines = build(
      { kind: 'line', points: [0, 0, 1, 0] },
      { kind: 'line', points: [1, 0, 2, 0] },
      { kind: 'line', points: [2, 0, 3, 0] },
    );
    const image = mapped(lines, [2, 0, 0, 2, 1, 0], 1, 3);
    expect(image.count).toBe(2);
    expect([...image.data]).toEqual([3, 0, 5, 0, 5, 0, 7, 0]);
  });

  // An affine image of a circle is an ellipse; scaled along the axes it has the scaled radii.
  test('a circle scaled unevenly is an ellipse, and a shear keeps its area', () => {
    const scaled = mapped(build(circle(0, 0, 5)), [2, 0, 0, 0.5, 0, 0]).data;
    expect(ellipseAxes(scaled[6], scaled[7], scaled[8], scaled[9])).toEqual({
      rx: 10,
      ry: 2.5,
      rotationDeg: 0,
    });
    const sheared = mapped(build(circle(0, 0, 5)), [1, 0, 0.7, 1, 0, 0]).data;
    const { rx, ry } = ellipseAxes(sheared[6], sheared[7], sheared[8], sheared[9]);
    expect(rx * ry).toBeCloseTo(25, 12);
  });
});
