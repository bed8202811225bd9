/**
 * The one thing that a program is drawn with: whatever writes a format takes these calls. Page mm,
 * y down; every call goes on from where the last one ended.
 *
 * Order: for each pen `beginPen`, then `travel` and a run in turn, a last `travel` home where there is
 * one, `endPen`. A run is `beginRun`, its segments, `endRun`; a dot is one `line` to where it began.
 */
export interface LineStylus {
  beginPen(pen: number): void;
  travel(x0: number, y0: number, x1: number, y1: number): void;
  beginRun(run: number, x: number, y: number): void;
  line(x: number, y: number): void;
  endRun(): void;
  endPen(pen: number): void;
}

/** A stylus that takes curves as they are; an arc as in `Segments`, ending at (x, y). */
export interface CurveStylus extends LineStylus {
  cubic(ax: number, ay: number, bx: number, by: number, x: number, y: number): void;
  arc(
    cx: number,
    cy: number,
    ux: number,
    uy: number,
    vx: number,
    vy: number,
    theta0: number,
    sweep: number,
    x: number,
    y: number,
  ): void;
}
