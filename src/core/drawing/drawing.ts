import type { Finding, Place } from '../finding.js';
import type { Chains } from '../geometry/segments.js';
import type { ReadingRules } from './readingRules.js';

/**
 * A line drawing after reading. You may rely on:
 *
 * - lengths in mm, y down, the origin at the page's top left; every transform, viewBox and unit resolved;
 * - one stroke per sub-path, or per dash or piece that a clip or the edge of the page leaves of it, in
 *   document order; finite numbers only;
 * - consecutive segments of a stroke share their joint bit for bit;
 * - no segment of zero length, except that a dot is one LINE from a point to itself;
 * - a closed stroke ends bit for bit where it starts (the closing line is a segment of its own);
 * - lines, cubics and arcs are kept as they are, quadratics raised to cubics exactly.
 */
export interface Drawing {
  readonly name: string;
  readonly title: string | null;
  readonly description: string | null;
  readonly widthMm: number;
  readonly heightMm: number;
  /** Elements that could draw: shapes and paths met, instances of `use` counted each. */
  readonly elementCount: number;
  readonly strokes: Strokes;
  /** Canonical stroke colours (`#rrggbb`, or a paint server's name), as first met. */
  readonly colours: readonly string[];
  /** Top-level groups, in order; `layer` of a stroke is an index here. */
  readonly layers: readonly Layer[];
  /** Where each drawn element stands in the text; `element` of a stroke is an index here. */
  readonly places: readonly Place[];
  readonly findings: readonly Finding[];
  /** What was asked of the reading. */
  readonly reading: ReadingRules;
}

/** One column per property; stroke i owns segments `first[i]` up to `first[i + 1]`. */
export interface Strokes extends Chains {
  readonly closed: Uint8Array;
  readonly dot: Uint8Array;
  /** The line is dashed in the drawing, so that it may mean something else than a solid one. */
  readonly dashed: Uint8Array;
  readonly colour: Uint32Array;
  /** Index into `layers`, or NO_LAYER. */
  readonly layer: Uint32Array;
  readonly element: Uint32Array;
  /** The stroke's own width after transforms, mm. */
  readonly widthMm: Float64Array;
}

export const NO_LAYER = 0xffffffff;

/** A group at the top of the drawing; `label` is what people called it. */
export interface Layer {
  readonly id: string | null;
  readonly label: string | null;
}
