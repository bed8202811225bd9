/** Where two straight pieces run side by side. */
export interface Overlap {
  /** Fractions of the first piece, from0 < to0. */
  from0: number;
  to0: number;
  /** The fractions of the second that lie opposite: from1 > to1 where it runs the other way. */
  from1: number;
  to1: number;
  /** Signed distance across at both ends; linear between. */
  offsetFrom: number;
  offsetTo: number;
  /** The length of the overlap, the same on both. */
  lengthMm: number;
  opposed: boolean;
}

export function newOverlap(): Overlap {
  return {
    from0: 0,
    to0: 0,
    from1: 0,
    to1: 0,
    offsetFrom: 0,
    offsetTo: 0,
    lengthMm: 0,
    opposed: false,
  };
}

/**
 * Finds where pieces a and b run within `reach` of each other, at an angle of at most `1 / least cosine`.
 *
 * Both are projected on the bisector of their directions: points with the same foot are opposite each
 * other, which makes the pairing symmetrical, and as long on one piece as on the other. The distance
 * of opposite points is linear in the foot, so the part within `reach` is an interval.
 * False where there is none of positive length, or a piece has no length.
 */
export function findOverlap(
  ax: number,
  ay: number,
  ax1: number,
  ay1: number,
  bx: number,
  by: number,
  bx1: number,
  by1: number,
  reach: number,
  leastCosine: number,
  out: Overlap,
): boolean {
  let ex = ax1 - ax;
  let ey = ay1 - ay;
  const squareA = ex * ex + ey * ey;
  // All of b beyond reach on one side of a's line: most pairs end here.
  const limit = reach * reach * squareA;
  const side0 = (bx - ax) * ey - (by - ay) * ex;
  const side1 = (bx1 - ax) * ey - (by1 - ay) * ex;
  if (side0 > 0 === side1 > 0 && side0 * side0 > limit && side1 * side1 > limit) return false;
  let fx = bx1 - bx;
  let fy = by1 - by;
  const lengthA = Math.sqrt(squareA);
  const lengthB = Math.sqrt(fx * fx + fy * fy);
  if (!(lengthA > 0 && lengthB > 0)) return false;
  ex /= lengthA;
  ey /= lengthA;
  fx /= lengthB;
  fy /= lengthB;
  const cosine = ex * fx + ey * fy;
  if (Math.abs(cosine) < leastCosine) return false;
  const opposed = cosine < 0;
  const sign = opposed ? -1 : 1;
  let ux = ex + sign * fx;
  let uy = ey + sign * fy;
  const size = Math.sqrt(ux * ux + uy * uy);
  ux /= size;
  uy /= size;
  const along = ex * ux + ey * uy;
  const feetA = lengthA * along;
  const feetB = sign * lengthB * along;
  const px = bx - ax;
  const py = by - ay;
  const startB = px * ux + py * uy;
  let low = Math.max(0, Math.min(startB, startB + feetB));
  let high = Math.min(feetA, Math.max(startB, startB + feetB));
  if (!(high > low)) return false;
  const slope = (sign * (fy * ux - fx * uy) - (ey * ux - ex * uy)) / along;
  const slopeB = (sign * (fy * ux - fx * uy)) / along;
  // Across at foot 0: b's line there less a's, which is 0.
  const across = py * ux - px * uy - startB * slopeB;
  if (slope !== 0) {
    const one = (-reach - across) / slope;
    const other = (reach - across) / slope;
    low = Math.max(low, Math.min(one, other));
    high = Math.min(high, Math.max(one, other));
    if (!(high > low)) return false;
  } else if (Math.abs(across) > reach) return false;
  out.from0 = low / feetA;
  out.to0 = Math.min(1, high / feetA);
  out.from1 = clamp((low - startB) / feetB);
  out.to1 = clamp((high - startB) / feetB);
  out.offsetFrom = across + slope * low;
  out.offsetTo = across + slope * high;
  out.lengthMm = (high - low) / along;
  out.opposed = opposed;
  return true;
}

function clamp(v: number): number {
  return Math.max(0, Math.min(1, v));
}
