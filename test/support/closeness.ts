import { pointAt } from '../../src/core/geometry/evaluate.ts';
import { nearestOnSegment } from '../../src/core/geometry/nearest.ts';
import type { Segments } from '../../src/core/geometry/segments.ts';

/** The largest distance from points of segments a, `samples` on each, to the nearest of segments b. */
export function farthestFrom(
  a: { readonly segments: Segments; readonly from: number; readonly to: number },
  b: { readonly segments: Segments; readonly from: number; readonly to: number },
  samples = 24,
): number {
  const p = new Float64Array(2);
  let farthest = 0;
  for (let i = a.from; i < a.to; i++) {
    for (let k = 0; k <= samples; k++) {
      pointAt(a.segments, i, k / samples, p);
      let nearest = Infinity;
      for (let j = b.from; j < b.to; j++) {
        nearest = Math.min(nearest, nearestOnSegment(b.segments, j, p[0], p[1], 0, 1).distance);
      }
      farthest = Math.max(farthest, nearest);
    }
  }
  return farthest;
}
