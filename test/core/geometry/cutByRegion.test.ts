import { describe, expect, test } from 'vitest';
import { type Cut, cutByRegion } from '../../../src/core/geometry/cutByRegion.ts';
import { segmentLength } from '../../../src/core/geometry/length.ts';
import { Outline } from '../../../src/core/geometry/outline.ts';
import { NOWHERE, type Region, sideOf } from '../../../src/core/geometry/region.ts';
import type { Segments } from '../../../src/core/geometry/segments.ts';
import { createRandom } from '../../../src/core/structures/random.ts';
import { build, type Curve, circle, place } from '../../support/curves.ts';

type Point = readonly [number, number];

const work = () => ({ left: 1e9 });
const line = (...points: number[]): Curve => ({ kind: 'line', points });

const outlineOf = (curves: readonly Curve[], evenOdd = false): Region => ({
  kind: 'outline',
  outline: new Outline(build(...curves), evenOdd),
});

function polygon(...points: Point[]): Curve[] {
  return points.map(([x, y], k) => {
    const [toX, toY] = points[(k + 1) % points.length];
    return line(x, y, toX, toY);
  });
}

const box = (x0: number, y0: number, x1: number, y1: number): Curve[] =>
  polygon([x0, y0], [x1, y0], [x1, y1], [x0, y1]);

function cut(chain: readonly Curve[], region: Region, closed = false): Cut {
  const result = cutByRegion(build(...chain), closed, region, work());
  if (!result) throw new Error('gave up');
  return result;
}

const lengthOf = (segments: Segments): number =>
  Array.from({ length: segments.count }, (_, i) => segmentLength(segments, i)).reduce((a, b) => a + b, 0);

const keptLength = (chain: readonly Curve[], { kept, segments }: Cut): number =>
  kept === 'all' ? lengthOf(build(...chain)) : lengthOf(segments);

/** Ends of the pieces. */
function pieces({ segments, first }: Cut): [number, number, number, number][] {
  const { data, offset } = segments;
  return first.slice(1).map((end, k) => {
    const from = offset[first[k]];
    const to = offset[end - 1];
    return [data[from], data[from + 1], data[to + 2], data[to + 3]];
  });
}

describe('lines and rectangles', () => {
  test('inside, outside, across', () => {
    const region = outlineOf(box(0, 0, 10, 10));
    expect(cut([line(1, 1, 9, 9)], region).kept).toBe('all');
    expect(cut([line(11, 1, 19, 9)], region)).toMatchObject({ kept: 'none', removedMm: Math.sqrt(128) });
    const across = cut([line(-5, 5, 15, 5)], region);
    expect(pieces(across)).toEqual([[0, 5, 10, 5]]);
    expect(across.removedMm).toBeCloseTo(10, 12);
  });

  test('a line on the edge stays, an end that rounding put outside too', () => {
    const region = outlineOf(box(0, 0, 10, 10));
    expect(cut([line(0, 0, 10, 0)], region).kept).toBe('all');
    expect(pieces(cut([line(-3, 0, 13, 0)], region))).toEqual([[0, 0, 10, 0]]);
    expect(cut([line(5, 5, 10 + 1e-9, 5)], region).kept).toBe('all');
    expect(cut([line(5, 5, 10.001, 5)], region).kept).toBe('some');
    // The same where the rectangle is turned, and boxes say nothing.
    const turned = outlineOf(polygon([10, 0], [20, 10], [10, 20], [0, 10]));
    expect(cut([line(10, 0, 20, 10)], turned).kept).toBe('all');
    expect(cut([line(10, 10, 15 + 1e-9, 5)], turned).kept).toBe('all');
  });

  test('a closed chain: the piece across its start is joined and comes last', () => {
    const square = box(0, 0, 10, 10);
    const result = cut(square, outlineOf(box(-5, -5, 15, 5)), true);
    expect(pieces(result)).toEqual([[0, 5, 10, 5]]);
    expect(result.segments.count).toBe(3);
    const strip = cut(square, outlineOf(box(-5, 2, 15, 8)), true);
    expect(pieces(strip)).toEqual([
      [10, 2, 10, 8],
      [0, 8, 0, 2],
    ]);
    const ends = cut(square, outlineOf([...box(-5, -5, 3, 15), ...box(7, -5, 15, 15)]), true);
    expect(pieces(ends)).toEqual([
      [7, 0, 7, 10],
      [3, 10, 3, 0],
    ]);
  });

  test('a union without a seam, a hole, nothing at all', () => {
    const union: Region = { kind: 'any', parts: [outlineOf(box(0, 0, 5, 10)), outlineOf(box(5, 0, 10, 10))] };
    expect(pieces(cut([line(-5, 5, 15, 5)], union))).toEqual([[0, 5, 10, 5]]);
    expect(cut([line(1, 5, 9, 5)], union).kept).toBe('all');
    const hole = outlineOf([...box(0, 0, 10, 10), ...box(4, 4, 6, 6)], true);
    expect(pieces(cut([line(-5, 5, 15, 5)], hole))).toEqual([
      [0, 5, 4, 5],
      [6, 5, 10, 5],
    ]);
    expect(cut([line(0, 0, 1, 1)], NOWHERE)).toMatchObject({ kept: 'none', removedMm: Math.SQRT2 });
    expect(cut([line(0, 0, 1, 1)], { kind: 'all', parts: [] }).kept).toBe('all');
  });

  test('an intersection', () => {
    const both: Region = {
      kind: 'all',
      parts: [outlineOf(box(0, 0, 8, 10)), outlineOf([circle(5, 5, 4)])],
    };
    const [[x0, , x1]] = pieces(cut([line(-5, 5, 15, 5)], both));
    expect([x0, x1]).toEqual([expect.closeTo(1, 12), 8]);
  });

  test('a circle that touches a line from inside is not cut', () => {
    expect(cut([circle(5, 5, 5)], outlineOf(box(0, 0, 10, 10)), true).kept).toBe('all');
    const lens = cut([circle(5, 5, 5)], outlineOf(polygon([0, 0], [10, 0], [10, 5], [0, 5])), true);
    expect(pieces(lens)).toHaveLength(1);
    expect(lengthOf(lens.segments)).toBeCloseTo(5 * Math.PI, 9);
  });
});

/** How often the dense outline winds about the point, by summed angles. */
function windings(outline: readonly Point[], [x, y]: Point): number {
  let turned = 0;
  for (let k = 0; k < outline.length; k++) {
    const [ax, ay] = outline[k];
    const [bx, by] = outline[(k + 1) % outline.length];
    turned += Math.atan2(
      (ax - x) * (by - y) - (ay - y) * (bx - x),
      (ax - x) * (bx - x) + (ay - y) * (by - y),
    );
  }
  return Math.round(turned / (2 * Math.PI));
}

function randomOutline(random: () => number): Curve[] {
  const near = (): number => (random() - 0.5) * 100;
  const corners = Array.from({ length: 3 + Math.floor(random() * 4) }, (): Point => [near(), near()]);
  return corners.map(([x, y], k) => {
    const [toX, toY] = corners[(k + 1) % corners.length];
    if (random() < 0.4) return line(x, y, toX, toY);
    return { kind: 'cubic', points: [x, y, near(), near(), near(), near(), toX, toY] };
  });
}

const dense = (curves: readonly Curve[]): Point[] =>
  curves.flatMap((curve) => Array.from({ length: 200 }, (_, k) => place(curve, k / 200)));

describe('random chains and outlines', () => {
  test('what is kept is what lies inside by summed angles; kept and removed make up the whole', () => {
    const random = createRandom(11);
    let asked = 0;
    for (let n = 0; n < 100; n++) {
      const curves =
        random() < 0.3 ? [circle(random() * 40 - 20, random() * 40 - 20, 25)] : randomOutline(random);
      const evenOdd = random() < 0.5;
      const region = outlineOf(curves, evenOdd);
      const chain = randomOutline(random);
      const result = cut(chain, region, random() < 0.5);
      const whole = lengthOf(build(...chain));
      expect(keptLength(chain, result) + result.removedMm).toBeCloseTo(whole, 6);

      const polygonal = dense(curves);
      for (let k = 0; k < 20; k++) {
        const point = place(chain[Math.floor(random() * chain.length)], random());
        const off = Math.min(...polygonal.map(([x, y]) => Math.hypot(x - point[0], y - point[1])));
        if (off < 1) continue;
        const turns = windings(polygonal, point);
        const isInside = evenOdd ? turns % 2 !== 0 : turns !== 0;
        expect(sideOf(region, point[0], point[1], 1e-6, work()), `outline ${n}`).toBe(isInside ? 1 : -1);
        expect(isOn(chain, result, point), `outline ${n}`).toBe(isInside);
        asked++;
      }

      // Cut twice is cut once.
      if (result.kept !== 'some') continue;
      for (let p = 1; p < result.first.length; p++) {
        const piece = sliceOf(result.segments, result.first[p - 1], result.first[p]);
        expect(cutByRegion(piece, false, region, work())?.kept, `outline ${n}`).toBe('all');
      }
    }
    expect(asked).toBeGreaterThan(1000);
  });

  test('a region and its complement share the chain between them', () => {
    const random = createRandom(12);
    for (let n = 0; n < 100; n++) {
      const curves = randomOutline(random);
      const inside = outlineOf(curves, true);
      const outside = outlineOf([...box(-500, -500, 500, 500), ...curves], true);
      const chain = randomOutline(random);
      const [one, other] = [cut(chain, inside), cut(chain, outside)];
      const whole = lengthOf(build(...chain));
      expect(keptLength(chain, one) + keptLength(chain, other)).toBeCloseTo(whole, 4);
      expect(one.removedMm).toBeCloseTo(keptLength(chain, other), 4);
    }
  });
});

function sliceOf(segments: Segments, from: number, to: number): Segments {
  const { kind, offset, data } = segments;
  return { count: to - from, kind: kind.subarray(from, to), offset: offset.subarray(from, to), data };
}

/** Whether a kept piece passes the point, by its dense points. */
function isOn(chain: readonly Curve[], { kept, segments }: Cut, [x, y]: Point): boolean {
  if (kept !== 'some') return kept === 'all';
  const { data, offset, kind } = segments;
  for (let i = 0; i < segments.count; i++) {
    const d = data.subarray(offset[i], offset[i] + 8);
    const curve: Curve =
      kind[i] === 0
        ? line(d[0], d[1], d[2], d[3])
        : { kind: 'cubic', points: [d[0], d[1], d[4], d[5], d[6], d[7], d[2], d[3]] };
    for (let k = 0; k <= 400; k++) {
      const [px, py] = place(curve, k / 400);
      if (Math.hypot(px - x, py - y) < 0.6) return true;
    }
  }
  return chain.length === 0;
}

test('far too much work is given up, not done', () => {
  const teeth: Point[] = Array.from({ length: 2000 }, (_, k) => [k / 100, k % 2 === 0 ? 0 : 100]);
  const comb = outlineOf(polygon(...teeth));
  expect(cutByRegion(build(line(0, 50, 20, 50.1)), false, comb, { left: 10_000 })).toBeNull();
  expect(cutByRegion(build(line(0, 50, 20, 50.1)), false, comb, work())?.kept).toBe('some');
});
