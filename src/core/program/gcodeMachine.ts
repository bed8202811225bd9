import { readPenNote } from '../machine/headerNotes.js';
import { centreFromOffset, centreFromRadius, RADII_TOLERANCE_MM } from './gcodeArc.js';
import type { GcodeFindings } from './gcodeFindings.js';
import {
  CLOCKWISE,
  COUNTERCLOCKWISE,
  FEED,
  type GcodeMoves,
  newGcodeMoves,
  PEN,
  RAPID,
  STOP,
} from './gcodeMoves.js';
import { GcodeWords } from './gcodeWords.js';

/**
 * G codes that change nothing here, times 10: plane XY, compensations off, work system 1, path modes,
 * feed a minute, return levels; and G91.1, not in the standard, which states that I and J are steps.
 */
const NO_EFFECT_G = new Set([170, 400, 490, 540, 610, 611, 640, 911, 940, 980, 990]);
/** Spindle, coolant, overrides, optional stop: no move. */
const NO_EFFECT_M = new Set([1, 3, 4, 5, 7, 8, 9, 48, 49]);
const STOPS = new Set([0, 6, 60]);
const ENDS = new Set([2, 30]);
const MM_PER_INCH = 25.4;
const MOVES = 'XYZIJ';
const ROTARY = 'ABC';

/**
 * What the words do: keeps the state of the machine and writes down its moves. Only motion in the XY
 * plane is known; whatever else would move the tool elsewhere (offsets, canned cycles, homing, rotary
 * axes, feed by inverse time) is an error. Order on a line as in NISTIR 6556 §3.8: units and distance
 * mode before motion, stops after it.
 */
export class GcodeMachine {
  readonly moves: GcodeMoves = newGcodeMoves();
  ended = false;

  private readonly words = new GcodeWords();
  private percentSigns = 0;
  private line = 0;
  private x: number;
  private y: number;
  private z = Number.POSITIVE_INFINITY;
  private scale = 1;
  private absolute = true;
  /** Motion in force, or null after G80. After M2 it is G1 (§3.6.1), so a program begins with that. */
  private motion: number | null = FEED;

  constructor(
    homeX: number,
    homeY: number,
    private readonly findings: GcodeFindings,
  ) {
    this.x = homeX;
    this.y = homeY;
  }

  execute(text: string, line: number): void {
    this.line = line;
    const { words, findings } = this;
    words.read(text);
    if (words.problem !== null) {
      findings.add(words.problem, line, words.problemWord, words.problemColumn);
      return;
    }
    if (words.percent) {
      if (++this.percentSigns === 2) this.ended = true;
      return;
    }
    if (words.optional) findings.add('gcode-optional-line', line);
    for (const comment of words.comments) {
      const pen = readPenNote(comment);
      if (pen === null) continue;
      this.moves.pens.push(pen);
      this.note(PEN);
    }
    if (words.letter.length > 0) this.executeWords();
  }

  private executeWords(): void {
    const { words } = this;
    const { letter, value } = words;
    let motions = 0;
    let dwell = false;
    let along = false;
    let stops = false;
    for (let k = 0; k < letter.length; k++) {
      const name = letter[k];
      if (name === 'M') {
        stops = true;
      } else if (name !== 'G') {
        if (letter.indexOf(name) < k) this.findings.add('gcode-word-twice', this.line, name);
        if (MOVES.includes(name)) along = true;
        if (ROTARY.includes(name)) this.findings.add('gcode-not-supported', this.line, name);
      } else {
        const code = Math.round(value[k] * 10);
        if (code === 0 || code === 10 || code === 20 || code === 30) {
          this.motion = code / 10;
          motions++;
        } else if (code === 40) {
          dwell = true;
        } else {
          this.setMode(code);
        }
      }
    }
    if (motions > 1) this.findings.add('gcode-same-group', this.line);
    if ((along || motions > 0) && !dwell) this.move(words);
    if (stops) for (let k = 0; k < letter.length; k++) if (letter[k] === 'M') this.stopOrNot(value[k]);
  }

  private setMode(code: number): void {
    if (code === 200) this.scale = MM_PER_INCH;
    else if (code === 210) this.scale = 1;
    else if (code === 900) this.absolute = true;
    else if (code === 910) this.absolute = false;
    else if (code === 800) this.motion = null;
    else if (!NO_EFFECT_G.has(code)) this.findings.add('gcode-not-supported', this.line, `G${code / 10}`);
  }

  private stopOrNot(code: number): void {
    if (STOPS.has(code)) this.note(STOP);
    else if (ENDS.has(code)) this.ended = true;
    else if (!NO_EFFECT_M.has(code)) this.findings.add('gcode-word-ignored', this.line, `M${code}`);
  }

  private move(words: GcodeWords): void {
    if (this.motion === null) {
      this.findings.add('gcode-not-supported', this.line, 'G80');
      return;
    }
    const x = this.target(words.numberOf('X'), this.x);
    const y = this.target(words.numberOf('Y'), this.y);
    const z = this.target(words.numberOf('Z'), this.z);
    if (this.motion === CLOCKWISE || this.motion === COUNTERCLOCKWISE) {
      const centre = this.centre(words, x, y);
      if (centre === null) {
        this.findings.add('gcode-arc-error', this.line);
        return;
      }
      if (centre.radiiDifferMm > RADII_TOLERANCE_MM) this.findings.add('gcode-arc-radii', this.line);
      this.moves.centreX.push(centre.x);
      this.moves.centreY.push(centre.y);
    } else if (x === this.x && y === this.y && z === this.z) {
      return;
    }
    this.x = x;
    this.y = y;
    this.z = z;
    this.note(this.motion === RAPID ? RAPID : this.motion);
  }

  private target(value: number | undefined, current: number): number {
    if (value === undefined) return current;
    if (this.absolute) return value * this.scale;
    if (current === Number.POSITIVE_INFINITY) {
      this.findings.add('gcode-no-heights', this.line);
      return current;
    }
    return current + value * this.scale;
  }

  private centre(words: GcodeWords, x: number, y: number) {
    const i = words.numberOf('I');
    const j = words.numberOf('J');
    const r = words.numberOf('R');
    if (words.numberOf('K') !== undefined || (r !== undefined && (i !== undefined || j !== undefined)))
      return null;
    if (r !== undefined) {
      return centreFromRadius(this.x, this.y, x, y, r * this.scale, this.motion === CLOCKWISE);
    }
    if (i === undefined && j === undefined) return null;
    return centreFromOffset(this.x, this.y, x, y, (i ?? 0) * this.scale, (j ?? 0) * this.scale);
  }

  private note(kind: number): void {
    const { moves } = this;
    moves.kind.push(kind);
    moves.x.push(this.x);
    moves.y.push(this.y);
    moves.z.push(this.z);
    moves.line.push(this.line);
  }
}
