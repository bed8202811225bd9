import { SegmentBuilder } from '../geometry/segments.js';
import { atan2 } from '../geometry/trig.js';
import { flipY, type Placement } from '../machine/placement.js';
import type { GcodeFindings } from './gcodeFindings.js';
import { CLOCKWISE, COUNTERCLOCKWISE, type GcodeMoves, PEN, RAPID, STOP } from './gcodeMoves.js';
import type { Program } from './program.js';

/** What a run-gatherer has to know beyond the moves. Home in machine mm. */
export interface RunSettings {
  readonly placement: Placement;
  readonly homeXMm: number;
  readonly homeYMm: number;
  /** The tool marks at or below this height. */
  readonly markingHeightMm: number;
}

export interface GatheredRuns {
  readonly program: Program;
  /** Lifted travel along the sheet exactly as moved, which may be more than the straight legs. */
  readonly travelMm: number;
}

/**
 * Makes runs of moves: a run is a longest chain of moves along the sheet at or below the marking
 * height; a way down and up again without one is a dot. A move that goes up or down on its way counts
 * as drawn, since it may mark. A stop begins a new pen where runs follow. O(moves).
 */
export function gatherRuns(moves: GcodeMoves, settings: RunSettings, findings: GcodeFindings): GatheredRuns {
  const gatherer = new RunGatherer(settings, findings);
  let arc = 0;
  let pen = 0;
  for (let i = 0; i < moves.kind.length; i++) {
    const kind = moves.kind[i];
    if (kind === STOP) gatherer.stop(moves.line[i]);
    else if (kind === PEN) gatherer.namePen(moves.pens[pen++]);
    else if (kind === CLOCKWISE || kind === COUNTERCLOCKWISE) {
      gatherer.arc(moves, i, moves.centreX[arc], moves.centreY[arc]);
      arc++;
    } else gatherer.straight(moves, i);
  }
  return gatherer.finish();
}

class RunGatherer {
  private readonly builder = new SegmentBuilder();
  private readonly first: number[] = [0];
  private readonly penOfRun: number[] = [];
  private readonly pens: { name: string; colour: string }[] = [];
  private penName: { name: string; colour: string } | null = null;
  private penBegun = false;
  private travelMm = 0;
  private x: number;
  private y: number;
  private down = false;
  private open = false;

  constructor(
    private readonly settings: RunSettings,
    private readonly findings: GcodeFindings,
  ) {
    this.x = settings.homeXMm;
    this.y = settings.homeYMm;
  }

  straight(moves: GcodeMoves, i: number): void {
    const [x, y] = [moves.x[i], moves.y[i]];
    const along = x !== this.x || y !== this.y;
    const marks = this.beginMove(moves, i, along);
    if (marks) this.builder.line(this.x, this.pageY(this.y), x, this.pageY(y));
    else if (along) this.travelMm += distance(this.x, this.y, x, y);
    this.endMove(moves, i);
  }

  arc(moves: GcodeMoves, i: number, cx: number, cy: number): void {
    const [x, y] = [moves.x[i], moves.y[i]];
    const marks = this.beginMove(moves, i, true);
    const startRadius = distance(this.x, this.y, cx, cy);
    const radius = (startRadius + distance(x, y, cx, cy)) / 2;
    // On the page y points down: the angle grows clockwise as seen, so G2 has a positive sweep.
    const pageCy = this.pageY(cy);
    const theta0 = atan2(this.pageY(this.y) - pageCy, this.x - cx);
    const theta1 = atan2(this.pageY(y) - pageCy, x - cx);
    const sweep = sweepOf(theta0, theta1, moves.kind[i] === CLOCKWISE, x === this.x && y === this.y);
    if (marks) {
      const [y0, y1] = [this.pageY(this.y), this.pageY(y)];
      this.builder.arc(this.x, y0, x, y1, cx, pageCy, radius, 0, 0, radius, theta0, sweep);
    } else {
      this.travelMm += radius * Math.abs(sweep);
    }
    this.endMove(moves, i);
  }

  stop(line: number): void {
    if (this.open) this.findings.add('gcode-stop-down', line);
    this.closeRun();
    this.nextPen(null);
  }

  /** A name given after runs begins a new pen even where no stop stands before it. */
  namePen(pen: { readonly name: string; readonly colour: string }): void {
    this.nextPen(pen);
  }

  finish(): GatheredRuns {
    this.closeRun();
    const { homeXMm, homeYMm } = this.settings;
    const segments = this.builder.finish();
    if (this.penOfRun.length === 0) this.findings.add('gcode-nothing-drawn', 0);
    const program: Program = {
      segments,
      count: this.penOfRun.length,
      first: Uint32Array.from(this.first),
      bridge: new Uint8Array(segments.count),
      pen: Uint32Array.from(this.penOfRun),
      pens: this.pens,
      homeX: homeXMm,
      homeY: this.pageY(homeYMm),
      endAtHome: this.x === homeXMm && this.y === homeYMm,
    };
    return { program, travelMm: this.travelMm };
  }

  /** Opens a run where the move begins to mark; returns whether it marks along the sheet. */
  private beginMove(moves: GcodeMoves, i: number, along: boolean): boolean {
    const goesDown = moves.z[i] <= this.settings.markingHeightMm;
    if (along && goesDown !== this.down) this.findings.add('gcode-slanted-move', moves.line[i]);
    const touches = this.down || goesDown;
    if (along && moves.kind[i] !== RAPID && moves.z[i] === Infinity) {
      this.findings.add('gcode-height-unknown', moves.line[i]);
    }
    if (along && touches && moves.kind[i] === RAPID) this.findings.add('gcode-rapid-down', moves.line[i]);
    if (touches && (along || !this.down)) this.openRun();
    return along && touches;
  }

  private endMove(moves: GcodeMoves, i: number): void {
    const isDown = moves.z[i] <= this.settings.markingHeightMm;
    if (!isDown) this.closeRun();
    this.down = isDown;
    this.x = moves.x[i];
    this.y = moves.y[i];
  }

  private openRun(): void {
    if (this.open) return;
    this.open = true;
    if (!this.penBegun) {
      this.penBegun = true;
      this.pens.push(this.penName ?? { name: `pen ${this.pens.length + 1}`, colour: '#000000' });
    }
    this.penOfRun.push(this.pens.length - 1);
  }

  private closeRun(): void {
    if (!this.open) return;
    this.open = false;
    const { builder, x, y } = this;
    if (builder.count === this.first[this.first.length - 1]) {
      builder.line(x, this.pageY(y), x, this.pageY(y));
    }
    this.first.push(builder.count);
  }

  private nextPen(pen: { readonly name: string; readonly colour: string } | null): void {
    this.closeRun();
    this.penName = pen;
    this.penBegun = false;
  }

  private pageY(y: number): number {
    return flipY(this.settings.placement, y);
  }
}

function sweepOf(theta0: number, theta1: number, clockwise: boolean, fullTurn: boolean): number {
  const turn = 2 * Math.PI;
  if (fullTurn) return clockwise ? turn : -turn;
  const difference = theta1 - theta0;
  if (clockwise) return difference > 0 ? difference : difference + turn;
  return difference < 0 ? difference : difference - turn;
}

function distance(x0: number, y0: number, x1: number, y1: number): number {
  return Math.sqrt((x1 - x0) * (x1 - x0) + (y1 - y0) * (y1 - y0));
}
