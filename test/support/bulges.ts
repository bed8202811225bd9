import { pointAt } from '../../src/core/geometry/evaluate.ts';
import { CUBIC, LINE } from '../../src/core/geometry/segments.ts';
import { lineSetOf, type Segment } from './chains.ts';

/** How far the middle of a curve lies off its chord; 0 for lines and where the ends nearly meet. */
export function bulgeOf(segment: Segment): number {
  const [x0, y0, x1, y1] = segment.data;
  const size = Math.sqrt((x1 - x0) ** 2 + (y1 - y0) ** 2);
  if (segment.kind === LINE || size < 0.1) return 0;
  const { segments } = lineSetOf([{ pen: 0, segments: [segment] }]);
  const p = new Float64Array(2);
  // A curve that is alike on both sides of its chord would be no worse for it: the middle must bulge.
  pointAt(segments, 0, 0.5, p);
  return Math.abs((p[0] - x0) * (y1 - y0) - (p[1] - y0) * (x1 - x0)) / size;
}

/** A curve mirrored in its chord: the bulge on the other side. */
export function mirrored({ kind, data }: Segment): Segment {
  const [x0, y0, x1, y1] = data;
  const [dx, dy] = [x1 - x0, y1 - y0];
  const squared = dx * dx + dy * dy;
  const vector = (x: number, y: number): [number, number] => {
    const along = (x * dx + y * dy) / squared;
    return [2 * along * dx - x, 2 * along * dy - y];
  };
  const point = (x: number, y: number): [number, number] => {
    const [vx, vy] = vector(x - x0, y - y0);
    return [x0 + vx, y0 + vy];
  };
  const ends = data.slice(0, 4);
  if (kind === CUBIC)
    return { kind, data: [...ends, ...point(data[4], data[5]), ...point(data[6], data[7])] };
  return {
    kind,
    data: [
      ...ends,
      ...point(data[4], data[5]),
      ...vector(data[6], data[7]),
      ...vector(data[8], data[9]),
      data[10],
      data[11],
    ],
  };
}
