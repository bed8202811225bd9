import type { Drawing } from '../drawing/drawing.js';
import type { PenPlan } from '../drawing/pens.js';
import { SegmentBuilder } from '../geometry/segments.js';
import type { Program } from '../program/program.js';
import type { LineSet } from './lineSet.js';

/** The strokes of a drawing with the pen of each. */
export function linesOfDrawing(drawing: Drawing, plan: PenPlan): LineSet {
  const { segments, count, first, dot } = drawing.strokes;
  return { segments, count, first, dot, pen: plan.penOfStroke };
}

/** The runs of a program; no program at all is no line. */
export function linesOfProgram(program: Program | null): LineSet {
  if (!program) {
    const none = new Uint8Array(0);
    return {
      segments: new SegmentBuilder().finish(),
      count: 0,
      first: new Uint32Array(1),
      dot: none,
      pen: new Uint32Array(0),
    };
  }
  const { segments, count, first, pen } = program;
  const dot = new Uint8Array(count);
  for (let run = 0; run < count; run++) {
    const o = segments.offset[first[run]];
    const d = segments.data;
    const single = first[run + 1] - first[run] === 1;
    if (single && d[o] === d[o + 2] && d[o + 1] === d[o + 3] && segments.kind[first[run]] === 0) dot[run] = 1;
  }
  return { segments, count, first, dot, pen };
}
