import type { Affine } from '../../geometry/affine.js';
import { sinCosDegrees } from '../../geometry/trig.js';

/** A rotation; exact for whole quarter turns, so that turned drawings keep their straight lines straight. */
export function turned(degrees: number): Affine {
  const sc = new Float64Array(2);
  sinCosDegrees(degrees, sc);
  return [sc[1], sc[0], -sc[0] + 0, sc[1], 0, 0];
}

/** The tangent of an angle; infinite or very large at a right angle. */
export function tangent(degrees: number): number {
  const sc = new Float64Array(2);
  sinCosDegrees(degrees, sc);
  return sc[0] / sc[1];
}
