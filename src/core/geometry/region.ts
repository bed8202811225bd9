import type { Work } from './boxChain.js';
import type { Outline, Side } from './outline.js';

/**
 * A part of the plane, its edge belonging to it: what an outline encloses, what lies in all of several
 * parts (everything, where there are none), or in any of them (nothing, where there are none).
 */
export type Region =
  | { readonly kind: 'outline'; readonly outline: Outline }
  | { readonly kind: 'all'; readonly parts: readonly Region[] }
  | { readonly kind: 'any'; readonly parts: readonly Region[] };

export const NOWHERE: Region = { kind: 'any', parts: [] };

/** Inside both; null stands for everything. */
export function bothOf(one: Region | null, other: Region | null): Region | null {
  if (!one || !other) return one ?? other;
  return { kind: 'all', parts: [one, other] };
}

/** Where a place lies; on the edge within `tolerance`. */
export function sideOf(region: Region, x: number, y: number, tolerance: number, work: Work): Side {
  return combine(region, (outline) => outline.side(x, y, tolerance, work));
}

/** Where a box lies: 1 wholly inside, −1 wholly outside, 0 otherwise or where that is not plain. */
export function sideOfBox(region: Region, box: Float64Array, tolerance: number, work: Work): Side {
  return combine(region, (outline) => outline.sideOfBox(box[0], box[1], box[2], box[3], tolerance, work));
}

function combine(region: Region, sideFor: (outline: Outline) => Side): Side {
  if (region.kind === 'outline') return sideFor(region.outline);
  const first: Side = region.kind === 'all' ? 1 : -1;
  let side: Side = first;
  for (const part of region.parts) {
    const next = combine(part, sideFor);
    if (next === -first) return next;
    if (next === 0) side = 0;
  }
  return side;
}

/** Calls `visit` with every outline that the region is made of. */
export function eachOutline(region: Region, visit: (outline: Outline) => void): void {
  if (region.kind === 'outline') visit(region.outline);
  else for (const part of region.parts) eachOutline(part, visit);
}

/** How many outlines and combinations the region is made of, those that are shared counted each time; at most `most`. */
export function outlinesIn(region: Region, most: number): number {
  if (region.kind === 'outline') return 1;
  let count = 1;
  for (const part of region.parts) {
    if (count >= most) return most;
    count += outlinesIn(part, most - count);
  }
  return Math.min(count, most);
}
