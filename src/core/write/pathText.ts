import { type ArcCentre, ellipseAxes } from '../geometry/arc.js';
import { formatDecimal, formatSteps, toSteps } from '../geometry/decimal.js';
import { arcAsCubics, arcPieceCount, pointOnArc, survivesRounding } from './arcPieces.js';

/**
 * The path data of one run (SVG 2, "The grammar for path data"): absolute commands, one moveto.
 * Segments share the coordinates that are written, so rounding opens no gap. A line or arc that ends
 * where it starts as written is left out; where nothing is left, the run is written as a dot, so that
 * it is not lost.
 */
export class PathText {
  private parts: string[] = [];
  private startX = 0;
  private startY = 0;
  private x = 0;
  private y = 0;
  private lastIsLine = false;
  private readonly step: number;
  private readonly at = new Float64Array(2);

  constructor(private readonly decimals: number) {
    this.step = Number(`1e-${decimals}`);
  }

  begin(x: number, y: number): void {
    this.startX = this.x = toSteps(x, this.decimals);
    this.startY = this.y = toSteps(y, this.decimals);
    this.parts = [`M${this.here()}`];
    this.lastIsLine = false;
  }

  line(x: number, y: number): void {
    if (!this.moveTo(x, y)) return;
    this.parts.push(`L${this.here()}`);
    this.lastIsLine = true;
  }

  cubic(ax: number, ay: number, bx: number, by: number, x: number, y: number): void {
    const { decimals, x: x0, y: y0 } = this;
    const aX = toSteps(ax, decimals);
    const aY = toSteps(ay, decimals);
    const bX = toSteps(bx, decimals);
    const bY = toSteps(by, decimals);
    const moved = this.moveTo(x, y);
    if (!moved && aX === x0 && aY === y0 && bX === x0 && bY === y0) return;
    this.parts.push(`C${this.pair(aX, aY)} ${this.pair(bX, bY)} ${this.here()}`);
    this.lastIsLine = false;
  }

  arc(arc: ArcCentre, x: number, y: number): void {
    if (!survivesRounding(arc, this.step)) {
      this.flatArc(arc, x, y);
      return;
    }
    const { rx, ry, rotationDeg } = ellipseAxes(arc.ux, arc.uy, arc.vx, arc.vy);
    const { decimals, at } = this;
    const longer = formatDecimal(rx, decimals);
    const shorter = formatDecimal(ry, decimals);
    const turned = longer === shorter ? '0' : formatDecimal(rotationDeg, decimals);
    const positive = arc.sweep > 0 === arc.ux * arc.vy - arc.uy * arc.vx > 0;
    const head = `A${longer} ${shorter} ${turned} 0 ${positive ? 1 : 0}`;
    const count = arcPieceCount(arc.sweep);
    for (let i = 1; i <= count; i++) {
      at[0] = x;
      at[1] = y;
      if (i < count) pointOnArc(arc, arc.theta0 + (arc.sweep * i) / count, at);
      if (!this.moveTo(at[0], at[1])) continue;
      this.parts.push(`${head} ${this.here()}`);
      this.lastIsLine = false;
    }
  }

  /** The path data. A run that ends where it starts is closed: Z takes the place of a last line. */
  finish(): string {
    const { parts } = this;
    if (parts.length === 1) return `${parts[0]}h0`;
    if (this.x === this.startX && this.y === this.startY) {
      if (this.lastIsLine && parts.length > 2) parts.pop();
      parts.push('Z');
    }
    return parts.join('');
  }

  private flatArc(arc: ArcCentre, x: number, y: number): void {
    const cubics: number[][] = [];
    arcAsCubics(arc, this.step, (...cubic) => cubics.push(cubic));
    cubics.forEach(([ax, ay, bx, by, x1, y1], i) => {
      const last = i === cubics.length - 1;
      this.cubic(ax, ay, bx, by, last ? x : x1, last ? y : y1);
    });
  }

  /** Whether (x, y) is written differently from where the path stands; the path then stands there. */
  private moveTo(x: number, y: number): boolean {
    const stepsX = toSteps(x, this.decimals);
    const stepsY = toSteps(y, this.decimals);
    const moved = stepsX !== this.x || stepsY !== this.y;
    this.x = stepsX;
    this.y = stepsY;
    return moved;
  }

  private here(): string {
    return this.pair(this.x, this.y);
  }

  private pair(x: number, y: number): string {
    return `${formatSteps(x, this.decimals)} ${formatSteps(y, this.decimals)}`;
  }
}
