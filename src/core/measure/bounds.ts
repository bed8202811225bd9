import { segmentBox } from '../geometry/box.js';
import type { Program } from '../program/program.js';

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
  let minX = Infinity;
  let minY = Infinity;
  let maxX = -Infinity;
  let maxY = -Infinity;
  for (let i = program.first[0]; i < program.first[program.count]; i++) {
    segmentBox(program.segments, i, box);
    minX = Math.min(minX, box[0]);
    minY = Math.min(minY, box[1]);
    maxX = Math.max(maxX, box[2]);
    maxY = Math.max(maxY, box[3]);
  }
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
