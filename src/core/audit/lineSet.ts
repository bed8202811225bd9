import type { Chains } from '../geometry/segments.js';

/**
 * Lines to hold against others: chains of segments in mm, the pen of each, and which are dots (a dot is
 * one LINE from a point to itself).
 */
export interface LineSet extends Chains {
  readonly pen: Uint32Array;
  readonly dot: Uint8Array;
}
