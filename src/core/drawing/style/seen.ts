/** Half a step of the 255 that a channel of a screen has: below it nothing is painted. */
const LEAST_SEEN = 1 / 510;

/**
 * Whether anything of this opacity, 0 to 1, shows on a screen. Charts lay strokes of opacity 0.0001 over their
 * lines to catch the pointer.
 */
export function isSeen(opacity: number): boolean {
  return opacity >= LEAST_SEEN;
}
