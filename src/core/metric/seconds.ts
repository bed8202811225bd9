import { moveSeconds } from '../geometry/motion.js';
import type { Weigh } from './metric.js';

/** How a lifted tool travels. */
export interface LiftedMotion {
  /** Going up at the start and coming down at the end, waits included, s. */
  readonly liftSeconds: number;
  readonly lowerSeconds: number;
  readonly travelSpeedMmPerS: number;
  /** Infinity where the tool is at once at speed. */
  readonly accelerationMmPerS2: number;
}

/**
 * Seconds for a connector of that length: nothing at 0 (the tool stays down), else up, across from rest to rest
 * with limited acceleration, and down. Nondecreasing, as computed too, and concave above 0, hence a metric: the
 * root of the ramps and the straight line beyond them have one slope where they meet, 1 / speed. RangeError where
 * a time is negative or not finite, or a speed or acceleration is not above 0.
 */
export function liftedSeconds(motion: LiftedMotion): Weigh {
  const { liftSeconds, lowerSeconds, travelSpeedMmPerS: speed, accelerationMmPerS2: acceleration } = motion;
  const waits = liftSeconds + lowerSeconds;
  if (!(liftSeconds >= 0 && lowerSeconds >= 0 && Number.isFinite(waits))) {
    throw new RangeError('lifting and lowering take a finite time, not below 0');
  }
  const ramps = (speed * speed) / acceleration;
  const rampSeconds = moveSeconds(ramps, speed, acceleration);
  return (distanceMm) => {
    if (distanceMm <= 0) return 0;
    const seconds = moveSeconds(distanceMm, speed, acceleration);
    // Rounding must not let the time fall where the one formula takes over from the other.
    return waits + (distanceMm <= ramps ? Math.min(seconds, rampSeconds) : Math.max(seconds, rampSeconds));
  };
}
