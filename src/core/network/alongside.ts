/**
 * The part of one straight piece that lies within `reach` of another, beside it or up to `reach` beyond
 * its ends: shares of the first piece's length in out[0] and out[1].
 *
 * @returns false where there is none, or the other has no length.
 */
export function alongside(
  ax: number,
  ay: number,
  bx: number,
  by: number,
  px: number,
  py: number,
  qx: number,
  qy: number,
  reach: number,
  out: Float64Array,
): boolean {
  const dx = qx - px;
  const dy = qy - py;
  const size = Math.sqrt(dx * dx + dy * dy);
  if (!(size > 0)) return false;
  const ex = dx / size;
  const ey = dy / size;
  out[0] = 0;
  out[1] = 1;
  // Distance from the other's line, and place along it, both linear in the share.
  const across = ex * (ay - py) - ey * (ax - px);
  const along = ex * (ax - px) + ey * (ay - py);
  return (
    keepWithin(across, ex * (by - ay) - ey * (bx - ax), -reach, reach, out) &&
    keepWithin(along, ex * (bx - ax) + ey * (by - ay), -reach, size + reach, out)
  );
}

/** Narrows out[0] to out[1] to where low <= start + share · slope <= high; false where nothing is left. */
function keepWithin(start: number, slope: number, low: number, high: number, out: Float64Array): boolean {
  if (slope === 0) return start >= low && start <= high;
  const a = (low - start) / slope;
  const b = (high - start) / slope;
  out[0] = Math.max(out[0], Math.min(a, b));
  out[1] = Math.min(out[1], Math.max(a, b));
  return out[1] > out[0];
}
