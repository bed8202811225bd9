/**
 * Where the page lies on the machine: zero at the page's bottom left corner, machine y up.
 *
 * The flip is about the page's height, not about the drawing's own box: sheets drawn one over the
 * other would not register otherwise (common practice, no source).
 */
export interface Placement {
  readonly pageWidthMm: number;
  readonly pageHeightMm: number;
}

/** Machine y of a page y, and back: the map is its own inverse. x is the same in both. */
export function flipY(placement: Placement, y: number): number {
  return placement.pageHeightMm - y;
}
