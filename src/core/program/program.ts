import type { Chains } from '../geometry/segments.js';

/**
 * What the tool does, in order, in page mm (y down): item i of the chains is run i, drawn without
 * lifting from the start of its first segment to the end of its last. Between runs the tool travels
 * lifted in a straight line. A dot is a run of one LINE from a point to itself.
 *
 * Each pen's runs stand together; each pen starts at home and, but for the last where `endAtHome`
 * is false, returns there.
 */
export interface Program extends Chains {
  /** 1 where a segment is a bridge: a short line that closes a snapped gap, not in the drawing. */
  readonly bridge: Uint8Array;
  /** Pen of each run. */
  readonly pen: Uint32Array;
  readonly pens: readonly { readonly name: string; readonly colour: string; readonly widthMm?: number }[];
  readonly homeX: number;
  readonly homeY: number;
  readonly endAtHome: boolean;
}
