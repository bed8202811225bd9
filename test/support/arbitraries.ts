import fc from 'fast-check';
import type { StrokeSpec } from './drawings.ts';

type Point = readonly [number, number];

/** Whole mm, so that ends meet, lines cross and strokes repeat often. */
const gridPoint = fc.tuple(fc.integer({ min: 5, max: 45 }), fc.integer({ min: 5, max: 45 }));
const colour = fc.constantFrom('#000000', '#000000', '#c0392b');

const polyline = fc
  .tuple(fc.array(gridPoint, { minLength: 2, maxLength: 5 }), fc.boolean(), colour)
  .map(([points, closed, c]): StrokeSpec | null => {
    const line = points.filter((p, i) => i === 0 || p[0] !== points[i - 1][0] || p[1] !== points[i - 1][1]);
    if (line.length < 2) return null;
    const ring = closed && line.length > 2 && !same(line[0], line[line.length - 1]);
    return { line, closed: ring, colour: c };
  })
  .filter((spec): spec is StrokeSpec => spec !== null);

const cubic = fc
  .tuple(gridPoint, gridPoint, gridPoint, gridPoint, colour)
  .filter(([a, , , d]) => !same(a, d))
  .map(([a, b, c, d, stroke]): StrokeSpec => ({ cubic: [a, b, c, d], colour: stroke }));

const circle = fc
  .tuple(gridPoint, fc.integer({ min: 1, max: 4 }), colour)
  .map(([[x, y], r, c]): StrokeSpec => ({ circle: [x, y, r], colour: c }));

const dot = fc.tuple(gridPoint, colour).map(([at, c]): StrokeSpec => ({ dot: at, colour: c }));

/** Drawings of up to 14 strokes of every kind in two colours on a page of 50 mm. */
export const anyDrawing = fc.array(fc.oneof(polyline, polyline, cubic, circle, dot), {
  minLength: 1,
  maxLength: 14,
});

/** Lines that grow from one point, each from an end or a corner of one before: one component. */
export const connectedDrawing = fc
  .array(fc.tuple(fc.nat(), gridPoint), { minLength: 1, maxLength: 12 })
  .map((steps) => {
    const known: Point[] = [[25, 25]];
    const specs: StrokeSpec[] = [];
    for (const [pick, to] of steps) {
      const from = known[pick % known.length];
      if (same(from, to)) continue;
      specs.push({ line: [from, to] });
      known.push(to);
    }
    return specs;
  })
  .filter((specs) => specs.length > 0);

/** A stroke with every point mapped; circles keep their kind under similar maps only. */
export function mapped(spec: StrokeSpec, point: (p: Point) => Point, scale: number): StrokeSpec {
  if ('line' in spec) return { ...spec, line: spec.line.map(point) };
  if ('cubic' in spec) return { ...spec, cubic: spec.cubic.map(point) };
  if ('dot' in spec) return { ...spec, dot: point(spec.dot) };
  const [x, y] = point([spec.circle[0], spec.circle[1]]);
  return { ...spec, circle: [x, y, spec.circle[2] * scale] };
}

export function reversed(spec: StrokeSpec): StrokeSpec {
  if ('line' in spec) return { ...spec, line: [...spec.line].reverse() };
  if ('cubic' in spec) return { ...spec, cubic: [...spec.cubic].reverse() };
  return spec;
}

function same(a: Point, b: Point): boolean {
  return a[0] === b[0] && a[1] === b[1];
}
