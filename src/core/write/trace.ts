import { flattenSegment } from '../geometry/flatten.js';
import { ARC, CUBIC, LINE } from '../geometry/segments.js';
import { followProgram } from '../program/followProgram.js';
import type { Program } from '../program/program.js';
import type { CurveStylus, LineStylus } from './stylus.js';

/** Draws the program with its own curves. O(segments). */
export function traceCurves(program: Program, stylus: CurveStylus): void {
  const { kind, offset, data: d } = program.segments;
  trace(program, stylus, (i) => {
    const o = offset[i];
    const x = d[o + 2];
    const y = d[o + 3];
    if (kind[i] === LINE) {
      stylus.line(x, y);
    } else if (kind[i] === CUBIC) {
      stylus.cubic(d[o + 4], d[o + 5], d[o + 6], d[o + 7], x, y);
    } else if (kind[i] === ARC) {
      const [cx, cy, ux, uy] = [d[o + 4], d[o + 5], d[o + 6], d[o + 7]];
      stylus.arc(cx, cy, ux, uy, d[o + 8], d[o + 9], d[o + 10], d[o + 11], x, y);
    }
  });
}

/** Draws the program in straight lines that stay within `accuracyMm` of its curves. */
export function traceLines(program: Program, stylus: LineStylus, accuracyMm: number): void {
  const line = (x: number, y: number) => stylus.line(x, y);
  trace(program, stylus, (i) => flattenSegment(program.segments, i, 0, 1, accuracyMm, line));
}

function trace(program: Program, stylus: LineStylus, segment: (i: number) => void): void {
  const { segments, first } = program;
  followProgram(program, {
    beginPen: (pen) => stylus.beginPen(pen),
    travel: (x0, y0, x1, y1) => stylus.travel(x0, y0, x1, y1),
    run(run) {
      const from = first[run];
      const start = segments.offset[from];
      stylus.beginRun(run, segments.data[start], segments.data[start + 1]);
      for (let i = from; i < first[run + 1]; i++) segment(i);
      stylus.endRun();
    },
    endPen: (pen) => stylus.endPen(pen),
  });
}
