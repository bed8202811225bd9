import { type ArcCentre, ellipseAxes } from '../geometry/arc.js';
import { formatDecimal, formatSteps, toSteps } from '../geometry/decimal.js';
import { arcAsCubics, arcPieceCount, pointOnArc, survivesRounding } from './arcPieces.js';

/** One command in both spellings. */
interface Command {
  readonly absolute: string;
  readonly relative: string;
}

/**
 * The path data of one run (SVG 2, "The grammar for path data"), one moveto. Each command is written
 * absolute or relative, whichever is shorter; the last one absolute, so that both ends of the run are read
 * as the very numbers that meet other runs. Differences are of what is written, so none adds up, and
 * rounding opens no gap between segments. A line or arc that ends where it starts as written is left out;
 * where nothing is left, the run is written as a dot, so that it is not lost.
 */
export class PathText {
  private parts: Command[] = [];
  private startX = 0;
  private startY = 0;
  private x = 0;
  private y = 0;
  private lastIsLine = false;
  /** The second control point of the last command where that was a cubic, steps. */
  private control: readonly [number, number] | null = null;
  private readonly step: number;
  private readonly at = new Float64Array(2);

  constructor(private readonly decimals: number) {
    this.step = Number(`1e-${decimals}`);
  }

  begin(x: number, y: number): void {
    this.startX = this.x = toSteps(x, this.decimals);
    this.startY = this.y = toSteps(y, this.decimals);
    this.parts = [];
    this.lastIsLine = false;
    this.control = null;
  }

  line(x: number, y: number): void {
    const { x: x0, y: y0 } = this;
    if (!this.moveTo(x, y)) return;
    if (this.y === y0) this.add('H', [this.x], 'h', [this.x - x0]);
    else if (this.x === x0) this.add('V', [this.y], 'v', [this.y - y0]);
    else this.add('L', [this.x, this.y], 'l', [this.x - x0, this.y - y0]);
    this.lastIsLine = true;
    this.control = null;
  }

  cubic(ax: number, ay: number, bx: number, by: number, x: number, y: number): void {
    const { decimals, x: x0, y: y0 } = this;
    const aX = toSteps(ax, decimals);
    const aY = toSteps(ay, decimals);
    const bX = toSteps(bx, decimals);
    const bY = toSteps(by, decimals);
    const moved = this.moveTo(x, y);
    if (!moved && aX === x0 && aY === y0 && bX === x0 && bY === y0) return;
    const { control, x: x1, y: y1 } = this;
    const rest = [bX - x0, bY - y0, x1 - x0, y1 - y0];
    // A first control point that mirrors the last one is not written.
    if (control && aX === 2 * x0 - control[0] && aY === 2 * y0 - control[1]) {
      this.add('S', [bX, bY, x1, y1], 's', rest);
    } else {
      this.add('C', [aX, aY, bX, bY, x1, y1], 'c', [aX - x0, aY - y0, ...rest]);
    }
    this.lastIsLine = false;
    this.control = [bX, bY];
  }

  arc(arc: ArcCentre, x: number, y: number): void {
    if (!survivesRounding(arc, this.step)) {
      this.flatArc(arc, x, y);
      return;
    }
    const { rx, ry, rotationDeg } = ellipseAxes(arc.ux, arc.uy, arc.vx, arc.vy);
    const { decimals, at } = this;
    const longer = short(formatDecimal(rx, decimals));
    const shorter = short(formatDecimal(ry, decimals));
    const turned = longer === shorter ? '0' : formatDecimal(rotationDeg, decimals);
    const positive = arc.sweep > 0 === arc.ux * arc.vy - arc.uy * arc.vx > 0;
    const head = `${longer} ${shorter} ${turned} 0 ${positive ? 1 : 0}`;
    const count = arcPieceCount(arc.sweep);
    for (let i = 1; i <= count; i++) {
      at[0] = x;
      at[1] = y;
      if (i < count) pointOnArc(arc, arc.theta0 + (arc.sweep * i) / count, at);
      const { x: x0, y: y0 } = this;
      if (!this.moveTo(at[0], at[1])) continue;
      this.add(`A${head}`, [this.x, this.y], `a${head}`, [this.x - x0, this.y - y0]);
      this.lastIsLine = false;
      this.control = null;
    }
  }

  /** The path data. A run that ends where it starts is closed: Z takes the place of a last line. */
  finish(): string {
    const { parts } = this;
    const start = `M${this.numbers('M', [this.startX, this.startY])}`;
    if (parts.length === 0) return `${start}h0`;
    const closes = this.x === this.startX && this.y === this.startY;
    if (closes && this.lastIsLine && parts.length > 1) parts.pop();
    const words = parts.map(({ absolute, relative }, i) =>
      i === parts.length - 1 || absolute.length <= relative.length ? absolute : relative,
    );
    return `${start}${words.join('')}${closes ? 'Z' : ''}`;
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

  private add(capital: string, absolute: number[], small: string, relative: number[]): void {
    this.parts.push({
      absolute: capital + this.numbers(capital, absolute),
      relative: small + this.numbers(small, relative),
    });
  }

  /** Parted by a space; a minus sign parts by itself. */
  private numbers(command: string, steps: readonly number[]): string {
    let text = '';
    for (const step of steps) {
      const number = short(formatSteps(step, this.decimals));
      const parted = number.startsWith('-') || (text === '' && command.length === 1);
      text += parted ? number : ` ${number}`;
    }
    return text;
  }
}

/** Without a zero before the point, as the grammar allows. */
function short(number: string): string {
  return number.replace(/^(-?)0\./, '$1.');
}
