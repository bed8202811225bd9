import { boxOfSegments } from '../geometry/box.js';
import type { Program } from '../program/program.js';

/** A box in page mm. */
export interface Bounds {
  readonly minX: number;
  readonly minY: number;
  readonly maxX: number;
  readonly maxY: number;
}

/** Page mm. `drawn` is null where there is no run; `reached` takes in home, so every move lies in it. */
export interface ProgramBounds {
  readonly drawn: Bounds | null;
  readonly reached: Bounds;
}

/** How far the tool goes; tight for curves as `segmentBox` is, never smaller. O(segments). */
export function programBounds(program: Program): ProgramBounds {
  const box = new Float64Array(4);
  boxOfSegments(program.segments, program.first[0], program.first[program.count], box);
  const [minX, minY, maxX, maxY] = box;
  const { homeX, homeY } = program;
  return {
    drawn: program.count === 0 ? null : { minX, minY, maxX, maxY },
    reached: {
      minX: Math.min(minX, homeX),
      minY: Math.min(minY, homeY),
      maxX: Math.max(maxX, homeX),
      maxY: Math.max(maxY, homeY),
    },
  };
}
