import { derivativeAt } from './evaluate.js';
import { segmentLength } from './length.js';
import type { Segments } from './segments.js';

const MOST_STEPS = 60;

/**
 * The parameter that lies `distance` along segment i after parameter `from`; 1 where the segment ends
 * before.
 *
 * Accuracy: the length between the two is `distance` to a relative 1e-9, that of `segmentLength`.
 * Newton's method on the length, kept within the bracket known so far by halving it.
 */
export function parameterAtLength(segments: Segments, i: number, from: number, distance: number): number {
  const rest = segmentLength(segments, i, from, 1);
  if (!(distance < rest)) return 1;
  const velocity = new Float64Array(2);
  let low = from;
  let high = 1;
  let t = from + (1 - from) * (distance / rest);
  for (let step = 0; step < MOST_STEPS; step++) {
    const error = segmentLength(segments, i, from, t) - distance;
    if (Math.abs(error) <= 1e-12 * rest) break;
    if (error > 0) high = t;
    else low = t;
    derivativeAt(segments, i, t, velocity);
    const speed = Math.sqrt(velocity[0] * velocity[0] + velocity[1] * velocity[1]);
    const next = t - error / speed;
    const inside = next > low && next < high;
    const to = inside ? next : (low + high) / 2;
    if (to === t) break;
    t = to;
  }
  return t;
}
