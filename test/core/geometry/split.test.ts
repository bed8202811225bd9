import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { pointAt } from '../../../src/core/geometry/evaluate.ts';
import { segmentLength } from '../../../src/core/geometry/length.ts';
import { SegmentBuilder, type Segments } from '../../../src/core/geometry/segments.ts';
import { appendSpan } from '../../../src/core/geometry/split.ts';
import { aCubic, aCurve, aParameter, build, degenerateCurves, place } from '../../support/curves.ts';

const out = new Float64Array(2);

function span(segments: Segments, t0: number, t1: number): Segments {
  const builder = new SegmentBuilder();
  appendSpan(builder, segments, 0, t0, t1);
  return builder.finish();
}

function at(segments: Segments, t: number): number[] {
  pointAt(segments, 0, t, out);
  return [...out];
}

describe('appendSpan', () => {
  test('is the same curve, either way round', () => {
    fc.assert(
      fc.property(aCurve, aParameter, aParameter, aParameter, (curve, t0, t1, s) => {
        const [x, y] = at(span(build(curve), t0, t1), s) as [number, number];
        const [wantX, wantY] = place(curve, t0 + s * (t1 - t0));
        return Math.abs(x - wantX) <= 1e-11 && Math.abs(y - wantY) <= 1e-11;
      }),
      { numRuns: 2000 },
    );
  });

  test('ends where pointAt says, bit for bit', () => {
    fc.assert(
      fc.property(aCurve, aParameter, aParameter, (curve, t0, t1) => {
        const segments = build(curve);
        const piece = span(segments, t0, t1);
        expect(at(piece, 0)).toEqual(at(segments, t0));
        expect(at(piece, 1)).toEqual(at(segments, t1));
      }),
    );
  });

  test('the whole keeps every number, and the whole backwards keeps every control point', () => {
    fc.assert(
      fc.property(aCurve, (curve) => {
        const segments = build(curve);
        expect([...span(segments, 0, 1).data].map((v) => v + 0)).toEqual(
          [...segments.data].map((v) => v + 0),
        );
      }),
    );
    fc.assert(
      fc.property(aCubic, (curve) => {
        const d = [...build(curve).data].map((v) => v + 0) as Eight;
        const back = [...span(build(curve), 1, 0).data].map((v) => v + 0);
        expect(back).toEqual([d[2], d[3], d[0], d[1], d[6], d[7], d[4], d[5]]);
      }),
    );
  });

  test('lengths of the parts add up to the whole', () => {
    fc.assert(
      fc.property(aCurve, aParameter, (curve, t) => {
        const segments = build(curve);
        const whole = segmentLength(segments, 0);
        const parts = segmentLength(span(segments, 0, t), 0) + segmentLength(span(segments, t, 1), 0);
        return Math.abs(parts - whole) <= 1e-9 * whole + 1e-12;
      }),
      { numRuns: 1000 },
    );
  });

  // Farin, G., Curves and Surfaces for CAGD, de Casteljau's algorithm at 1/2: by midpoints.
  test('the first half of a cubic by midpoints', () => {
    const half = span(build({ kind: 'cubic', points: [0, 0, 0, 8, 8, 8, 8, 0] }), 0, 0.5);
    expect([...half.data]).toEqual([0, 0, 4, 6, 0, 4, 2, 6]);
  });

  test.each(degenerateCurves)('%s splits into numbers, also where the span is a point', (_, curve) => {
    for (const [t0, t1] of [
      [0.25, 0.75],
      [1, 0.5],
      [0.5, 0.5],
    ] as const) {
      expect(span(build(curve), t0, t1).data.every(Number.isFinite)).toBe(true);
    }
  });
});

type Eight = [number, number, number, number, number, number, number, number];
