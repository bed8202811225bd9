import { formatDecimal, formatSteps, toSteps } from '../geometry/decimal.js';
import { toComment } from '../machine/commentText.js';
import { formatPenNote } from '../machine/headerNotes.js';
import { flipY, type Placement } from '../machine/placement.js';
import type { MachineProfile } from '../machine/profile.js';
import type { Program } from '../program/program.js';
import type { LineStylus } from './stylus.js';

/**
 * The moves of a program as RS-274/NGC lines. The pen is raised before anything else, and again after
 * each stop; G0 along the sheet only when raised, G1 along the sheet only when down; every descent and every first
 * line of a run states its feed, so that a file can be taken up again at any run.
 */
export class GcodeBody implements LineStylus {
  readonly lines: string[] = [];
  /** Box of all written X and Y, in steps of the last decimal; empty (min above max) without moves. */
  minX = Infinity;
  minY = Infinity;
  maxX = -Infinity;
  maxY = -Infinity;

  private readonly raise: string;
  private readonly lower: string;
  private readonly drawFeed: string;
  private readonly pensUsed: readonly number[];
  private penPosition = 0;
  private x = 0;
  private y = 0;
  /** Whether (x, y) is where the tool stands: not so at the start and after a pen change. */
  private placed = false;
  private feedStated = false;

  constructor(
    private readonly program: Program,
    private readonly profile: MachineProfile,
    private readonly placement: Placement,
  ) {
    const height = (mm: number) => formatDecimal(mm, profile.decimals);
    const feed = (mmPerS: number) => formatDecimal(mmPerS * 60, 3);
    this.raise = `G0 Z${height(profile.raisedHeightMm)}`;
    this.lower = `G1 Z${height(profile.downHeightMm)} F${feed(profile.plungeSpeedMmPerS)}`;
    this.drawFeed = ` F${feed(profile.drawSpeedMmPerS)}`;
    this.pensUsed = penOrder(program);
    this.lines.push(this.raise);
  }

  beginPen(pen: number): void {
    const { pens } = this.program;
    const position = ++this.penPosition;
    const count = this.pensUsed.length;
    const note = formatPenNote(position, count, pens[pen]);
    if (position > 1) {
      const { name, colour } = pens[pen];
      const words = `MSG, fit pen ${position} of ${count}, ${toComment(name, 80)} ${toComment(colour, 40)}`;
      this.lines.push(`(${words}, then start again)`, 'M0', `(${note})`, this.raise);
    } else {
      this.lines.push(`(${note})`);
    }
    this.placed = false;
  }

  travel(_x0: number, _y0: number, x1: number, y1: number): void {
    this.moveTo(x1, y1, 'G0', '');
    this.placed = true;
  }

  beginRun(run: number): void {
    this.lines.push(`(run ${run + 1})`, this.lower);
    this.feedStated = false;
  }

  line(x: number, y: number): void {
    if (this.moveTo(x, y, 'G1', this.feedStated ? '' : this.drawFeed)) this.feedStated = true;
  }

  endRun(): void {
    this.lines.push(this.raise);
  }

  endPen(): void {}

  private moveTo(x: number, y: number, code: string, feed: string): boolean {
    const { decimals } = this.profile;
    const stepsX = toSteps(x, decimals);
    const stepsY = toSteps(flipY(this.placement, y), decimals);
    if (this.placed && stepsX === this.x && stepsY === this.y) return false;
    this.x = stepsX;
    this.y = stepsY;
    this.minX = Math.min(this.minX, stepsX);
    this.minY = Math.min(this.minY, stepsY);
    this.maxX = Math.max(this.maxX, stepsX);
    this.maxY = Math.max(this.maxY, stepsY);
    this.lines.push(`${code} X${formatSteps(stepsX, decimals)} Y${formatSteps(stepsY, decimals)}${feed}`);
    return true;
  }
}

function penOrder(program: Program): number[] {
  const order: number[] = [];
  for (let r = 0; r < program.count; r++) {
    if (r === 0 || program.pen[r] !== program.pen[r - 1]) order.push(program.pen[r]);
  }
  return order;
}
