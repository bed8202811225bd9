/**
 * Radii at the two ends of an arc may differ by this much (NISTIR 6556 §3.5.3.2). Interpreters in use
 * allow more, so a larger difference is told, not refused.
 */
export const RADII_TOLERANCE_MM = 0.002;

export interface ArcCentrePoint {
  readonly x: number;
  readonly y: number;
  /** How far the radii at the two ends differ. */
  readonly radiiDifferMm: number;
}

/**
 * Centre of an arc in centre format: i and j are steps from the start, always (NISTIR 6556 §3.5.3.2).
 * Null where the radius is 0.
 */
export function centreFromOffset(
  x0: number,
  y0: number,
  x1: number,
  y1: number,
  i: number,
  j: number,
): ArcCentrePoint | null {
  const x = x0 + i;
  const y = y0 + j;
  const startRadius = Math.sqrt(i * i + j * j);
  const endRadius = Math.sqrt((x1 - x) * (x1 - x) + (y1 - y) * (y1 - y));
  if (startRadius === 0 || endRadius === 0) return null;
  return { x, y, radiiDifferMm: Math.abs(startRadius - endRadius) };
}

/**
 * Centre of an arc in radius format: a positive radius turns half a turn or less, a negative one half
 * a turn or more; equal ends are an error (NISTIR 6556 §3.5.3.1). A radius that falls short of half the
 * chord by rounding, at most the tolerance, makes a half turn. Null where there is no such arc.
 */
export function centreFromRadius(
  x0: number,
  y0: number,
  x1: number,
  y1: number,
  radius: number,
  clockwise: boolean,
): ArcCentrePoint | null {
  const dx = x1 - x0;
  const dy = y1 - y0;
  const chord = Math.sqrt(dx * dx + dy * dy);
  const short = chord / 2 - Math.abs(radius);
  if (chord === 0 || radius === 0 || short > RADII_TOLERANCE_MM) return null;
  const depth = short >= 0 ? 0 : Math.sqrt((radius - chord / 2) * (radius + chord / 2));
  // Seen along the chord, the centre of a short clockwise arc is on the right.
  const side = radius > 0 === clockwise ? depth / chord : -depth / chord;
  return { x: (x0 + x1) / 2 + side * dy, y: (y0 + y1) / 2 - side * dx, radiiDifferMm: 0 };
}
