import type { Finding } from '../finding.js';
import { type HeaderNotes, readHeaderNote } from '../machine/headerNotes.js';
import { flipY, type Placement } from '../machine/placement.js';
import { GcodeFindings } from './gcodeFindings.js';
import { markingHeight } from './gcodeHeights.js';
import { GcodeMachine } from './gcodeMachine.js';
import { gatherRuns } from './gcodeRuns.js';
import { GcodeWords } from './gcodeWords.js';
import type { Program } from './program.js';

/** Each goes before what the file's head says. */
export interface GcodeReadOptions {
  readonly pageWidthMm?: number;
  readonly pageHeightMm?: number;
  /** Home on the page, mm, y down; both or neither. */
  readonly homeX?: number;
  readonly homeY?: number;
  /** The tool marks at or below this height. */
  readonly markingHeightMm?: number;
}

export interface GcodeReading {
  /** The moves in page mm; null where a finding is an error. Bridges are not told apart. */
  readonly program: Program | null;
  /** Where the page lies, or null where neither the file nor the options say. */
  readonly placement: Placement | null;
  /** Lifted travel along the sheet as moved: more than the program's own where legs are not straight. */
  readonly travelMm: number;
  readonly findings: readonly Finding[];
}

/**
 * Reads the motion of an RS-274/NGC program (NISTIR 6556) back onto its page.
 *
 * Known: G0 to G3 (arcs by I and J or by R, in the XY plane), G20 and G21, G90 and G91, modal words,
 * comments, line numbers, percent signs, M0 (a pen change) and M2; words that move nothing are passed
 * over. Whatever would move the tool otherwise is an error. Placement, home and heights come from the
 * options, else from comments at the head as `writeGcode` leaves them, else: home at the machine's
 * zero, heights told apart by use, and y = 0 taken as the page's top, with a warning. Chains of lines
 * stay lines; nothing is fitted to them. O(characters).
 */
export function readGcode(text: string, options: GcodeReadOptions = {}): GcodeReading {
  const findings = new GcodeFindings();
  const notes = readNotes(text);
  const pageHeightMm = options.pageHeightMm ?? notes.pageHeightMm;
  const placed = pageHeightMm !== undefined;
  const placement = {
    pageWidthMm: options.pageWidthMm ?? notes.pageWidthMm ?? 0,
    pageHeightMm: pageHeightMm ?? 0,
  };
  const homeXMm = options.homeX ?? notes.homeXMm ?? 0;
  const homeYMm = options.homeY === undefined ? (notes.homeYMm ?? 0) : flipY(placement, options.homeY);

  const machine = new GcodeMachine(homeXMm, homeYMm, findings);
  let line = 0;
  for (let from = 0; from < text.length && !machine.ended; ) {
    const end = lineEnd(text, from);
    machine.execute(text.slice(from, end), ++line);
    from = end + 1;
  }
  if (!machine.ended) findings.add('gcode-no-end', 0);
  if (!placed) findings.add('gcode-no-placement', 0);

  const { raisedHeightMm, downHeightMm } = notes;
  const noted =
    raisedHeightMm === undefined || downHeightMm === undefined ? null : (raisedHeightMm + downHeightMm) / 2;
  const markingHeightMm = options.markingHeightMm ?? noted ?? markingHeight(machine.moves);
  if (markingHeightMm === null) findings.add('gcode-no-heights', 0);
  const failed = { program: null, placement: placed ? placement : null, travelMm: 0 };
  if (markingHeightMm === null || findings.failed) return { ...failed, findings: findings.list() };

  const settings = { placement, homeXMm, homeYMm, markingHeightMm };
  const { program, travelMm } = gatherRuns(machine.moves, settings, findings);
  return { ...failed, program, travelMm, findings: findings.list() };
}

/** The notes at the head: in the comments before the first word. */
function readNotes(text: string): Partial<HeaderNotes> {
  const notes: Partial<HeaderNotes> = {};
  const words = new GcodeWords();
  for (let from = 0; from < text.length; ) {
    const end = lineEnd(text, from);
    words.read(text.slice(from, end));
    if (words.letter.length > 0 || words.problem !== null) break;
    for (const comment of words.comments) Object.assign(notes, readHeaderNote(comment));
    from = end + 1;
  }
  return notes;
}

function lineEnd(text: string, from: number): number {
  const end = text.indexOf('\n', from);
  return end < 0 ? text.length : end;
}
