/**
 * Seconds for a straight move of `distance` with a trapezoidal speed profile, entered at speed v0 and
 * left at v1; any one unit of length.
 *
 * From rest to rest T = d/v + v/a where the speed v is reached (d ≥ v²/a), else T = 2·√(d/a). In
 * general the speed peaks at vp = √((v0² + v1²)/2 + a·d): below v, T = (2·vp − v0 − v1)/a; else the
 * ramps to v and from it, and the rest of the way at v. Source: Biagiotti, L., Melchiorri, C. (2008),
 * Trajectory Planning for Automatic Machines and Robots, Springer, ch. 3 (from memory).
 *
 * Where the distance is too short for the change of speed (|v1² − v0²| > 2·a·d) the time of the
 * change, |v1 − v0|/a, is returned. v0 and v1 above the speed count as the speed.
 * Infinite acceleration is allowed. RangeError on a negative or NaN distance or end speed, or unless
 * speed and acceleration are above 0. Accuracy: rounding.
 */
export function moveSeconds(distance: number, speed: number, acceleration: number, v0 = 0, v1 = 0): number {
  if (!(distance >= 0 && v0 >= 0 && v1 >= 0 && speed > 0 && acceleration > 0)) {
    throw new RangeError('moveSeconds: distance and end speeds must be ≥ 0, speed and acceleration > 0');
  }
  const from = Math.min(v0, speed);
  const to = Math.min(v1, speed);
  const change = Math.abs(to - from) / acceleration;
  if (distance === 0) return change;
  const peak = Math.sqrt((from * from + to * to) / 2 + acceleration * distance);
  if (peak <= speed) return Math.max(change, (2 * peak - (from + to)) / acceleration);
  const ramps = (2 * speed * speed - (from * from + to * to)) / (2 * acceleration);
  return (2 * speed - (from + to)) / acceleration + (distance - ramps) / speed;
}
