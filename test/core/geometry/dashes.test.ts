import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { parameterAtLength } from '../../../src/core/geometry/alongLength.ts';
import { cutDashes, type Dashes } from '../../../src/core/geometry/dashes.ts';
import { segmentLength } from '../../../src/core/geometry/length.ts';
import { SegmentBuilder, type Segments } from '../../../src/core/geometry/segments.ts';
import { aCurve, build } from '../../support/curves.ts';

const MOST = 10_000;

function line(...xs: number[]): Segments {
  const builder = new SegmentBuilder();
  for (let i = 1; i < xs.length; i++) builder.line(xs[i - 1], 0, xs[i], 0);
  return builder.finish();
}

function rounded(value: number): number {
  return Math.round(value * 1e9) / 1e9;
}

/** Dashes on a straight line along x as [from, to]. */
function spansOf(dashes: Dashes | null): [number, number][] {
  if (!dashes) throw new Error('too many');
  const { segments, dot } = dashes;
  return dot.map((_, k) => {
    const a = segments.offset[dashes.first[k]];
    const b = segments.offset[dashes.first[k + 1] - 1];
    return [rounded(segments.data[a]), rounded(segments.data[b + 2])];
  });
}

function pieceLengths({ segments, first, dot }: Dashes): number[] {
  return dot.map((_, k) => {
    let sum = 0;
    for (let i = first[k]; i < first[k + 1]; i++) sum += segmentLength(segments, i);
    return sum;
  });
}

describe('cutDashes on straight lines', () => {
  const cut = (lengths: number[], offset = 0, closed = false, ...xs: number[]) =>
    spansOf(cutDashes(line(...(xs.length > 0 ? xs : [0, 10])), closed, { lengths, offset }, MOST));

  test('begins with a dash and ends where the line does', () => {
    expect(cut([3, 2])).toEqual([
      [0, 3],
      [5, 8],
    ]);
    expect(cut([3, 1])).toEqual([
      [0, 3],
      [4, 7],
      [8, 10],
    ]);
  });

  test('an offset moves the pattern against the line, below 0 too', () => {
    expect(cut([3, 2], 1)).toEqual([
      [0, 2],
      [4, 7],
      [9, 10],
    ]);
    expect(cut([3, 2], -1)).toEqual([
      [1, 4],
      [6, 9],
    ]);
    expect(cut([3, 2], 5001)).toEqual(cut([3, 2], 1));
  });

  test('goes on over joints', () => {
    expect(cut([3, 2], 0, false, 0, 1, 6, 10)).toEqual(cut([3, 2]));
  });

  test('dashes of zero length are dots, one at the very start too', () => {
    const dashes = cutDashes(line(0, 10), false, { lengths: [0, 4], offset: 0 }, MOST);
    expect(spansOf(dashes)).toEqual([
      [0, 0],
      [4, 4],
      [8, 8],
    ]);
    expect(dashes?.dot).toEqual([true, true, true]);
  });

  test('a gap of zero length parts two dashes that touch', () => {
    expect(cut([4, 0])).toEqual([
      [0, 4],
      [4, 8],
      [8, 10],
    ]);
  });

  test('a dash longer than the line leaves it whole, a gap longer than the line leaves nothing', () => {
    expect(cutDashes(line(0, 10), false, { lengths: [10, 5], offset: 0 }, MOST)).toMatchObject({
      whole: true,
    });
    expect(cut([1, 99], 1)).toEqual([]);
  });

  test('is refused where there would be too many', () => {
    expect(cutDashes(line(0, 10), false, { lengths: [1e-6, 1e-6], offset: 0 }, 1000)).toBeNull();
  });

  test('on a closed line the dash at the end goes on into the one at the start', () => {
    const square = new SegmentBuilder();
    square.line(0, 0, 10, 0);
    square.line(10, 0, 10, 10);
    square.line(10, 10, 0, 10);
    square.line(0, 10, 0, 0);
    const dashes = cutDashes(square.finish(), true, { lengths: [6, 5], offset: 3 }, MOST);
    // On from -3: dashes at 0-3, 8-14, 19-25, 30-36 of 40; 41 would be next, so the gap reaches 40.
    expect(dashes && pieceLengths(dashes).map(rounded)).toEqual([6, 6, 6, 3]);
    const joined = cutDashes(square.finish(), true, { lengths: [6, 5], offset: 2 }, MOST);
    // On from -2: 0-4, 9-15, 20-26, 31-37; the gap to 42.
    expect(joined && pieceLengths(joined).map(rounded)).toEqual([6, 6, 6, 4]);
    const wrapped = cutDashes(square.finish(), true, { lengths: [6, 5], offset: 5 }, MOST);
    // On from -5: 0-1, 6-12, 17-23, 28-34, 39-40 and on over the start.
    expect(wrapped && pieceLengths(wrapped).map(rounded)).toEqual([6, 6, 6, 2]);
    expect(wrapped?.first).toEqual([0, 2, 4, 6, 8]);
  });
});

describe('cutDashes on curves', () => {
  test('dashes and gaps add up to the curve, each dash as long as the pattern says', () => {
    fc.assert(
      fc.property(
        aCurve,
        fc.double({ min: 0.03, max: 0.4, noNaN: true }),
        fc.boolean(),
        (curve, share, wide) => {
          const segments = build(curve);
          const total = segmentLength(segments, 0);
          if (!(total > 1e-3)) return true;
          const on = total * share;
          const off = wide ? on * 1.5 : on / 3;
          const dashes = cutDashes(segments, false, { lengths: [on, off], offset: 0 }, MOST);
          const lengths = dashes ? pieceLengths(dashes) : [];
          const whole = Math.floor(total / (on + off));
          const rest = Math.min(total - whole * (on + off), on);
          const drawn = lengths.reduce((sum, length) => sum + length, 0);
          return Math.abs(drawn - (whole * on + rest)) <= 1e-6 * total;
        },
      ),
      { numRuns: 400 },
    );
  });

  test('parameterAtLength undoes segmentLength', () => {
    fc.assert(
      fc.property(aCurve, fc.double({ min: 0, max: 1, noNaN: true }), (curve, share) => {
        const segments = build(curve);
        const total = segmentLength(segments, 0);
        const t = parameterAtLength(segments, 0, 0, share * total);
        return Math.abs(segmentLength(segments, 0, 0, t) - share * total) <= 1e-8 * total;
      }),
      { numRuns: 400 },
    );
  });
});
