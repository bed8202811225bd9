import type { Program } from './program.js';

/** What happens in turn. Every leg is told, those of no length too. Page mm. */
export interface Follower {
  beginPen(pen: number): void;
  /** A lifted straight move. */
  travel(x0: number, y0: number, x1: number, y1: number): void;
  run(run: number): void;
  endPen(pen: number): void;
}

/**
 * Tells the runs and the lifted legs between them, in order: each pen that has runs starts at home and
 * returns there, but for the last where `endAtHome` is false. The one place that knows this rule.
 * O(runs).
 */
export function followProgram(program: Program, follower: Follower): void {
  const { segments, first, pen, homeX, homeY } = program;
  const { offset, data } = segments;
  let x = homeX;
  let y = homeY;
  for (let r = 0; r < program.count; r++) {
    const current = pen[r];
    if (r === 0 || pen[r - 1] !== current) follower.beginPen(current);
    const start = offset[first[r]];
    follower.travel(x, y, data[start], data[start + 1]);
    follower.run(r);
    const end = offset[first[r + 1] - 1];
    x = data[end + 2];
    y = data[end + 3];
    const lastRun = r === program.count - 1;
    if (!lastRun && pen[r + 1] === current) continue;
    if (!lastRun || program.endAtHome) {
      follower.travel(x, y, homeX, homeY);
      x = homeX;
      y = homeY;
    }
    follower.endPen(current);
  }
}
