import { auditLines } from './audit/audit.js';
import type { LineSet } from './audit/lineSet.js';
import { linesOfDrawing, linesOfProgram } from './audit/lines.js';
import type { Drawing } from './drawing/drawing.js';
import { type PenRule, planPens, solidPenName, strokesOfPens } from './drawing/pens.js';
import { choosePens, type PenWishes } from './drawing/penWishes.js';
import type { MachineProfile } from './machine/profile.js';
import { type Measure, measureProgram } from './measure/measure.js';
import { programAsDrawn } from './program/fromTours.js';
import type { Program } from './program/program.js';
import { type Comparison, pairMoved } from './report/comparison.js';
import { REPEAT_TOLERANCE_MM } from './settings.js';

/** What two files are held against each other by. */
export interface CompareSettings extends PenWishes {
  /** How far lines may deviate and still be the same, mm. */
  readonly accuracyMm: number;
  /** Gaps up to this may have been drawn across, mm. */
  readonly snapMm: number;
  readonly repeats: 'once' | 'keep';
  readonly pens: PenRule;
  /** Null: the bottom left corner of each page. */
  readonly homeMm: readonly [number, number] | null;
  readonly end: 'home' | 'anywhere';
}

/** One of the two files: its lines with the names of their pens, and its moves as they stand. */
export interface ComparedSide {
  readonly name: string;
  readonly program: Program;
  readonly lines: LineSet;
}

/** A drawing as it stands, for comparison. */
export function sideOfDrawing(whole: Drawing, settings: CompareSettings): ComparedSide {
  const drawing = choosePens(whole, settings.pens, settings);
  const plan = planPens(drawing, settings.pens, settings);
  const [homeX, homeY] = settings.homeMm ?? [0, drawing.heightMm];
  const home = { homeX, homeY, endAtHome: settings.end === 'home' };
  return {
    name: drawing.name,
    program: programAsDrawn(drawing, plan.pens, strokesOfPens(plan), home),
    lines: linesOfDrawing(drawing, plan),
  };
}

/** A program read back from G-code, for comparison. */
export function sideOfProgram(name: string, program: Program, settings: CompareSettings): ComparedSide {
  const lines = linesOfProgram(program);
  const one = settings.pens === 'one';
  return { name, program, lines: one ? { ...lines, pen: new Uint32Array(lines.count) } : lines };
}

/**
 * Whether two files draw the same lines, and what either costs to draw. The lines are held against each
 * other as in the audit: one to one along their length, pens told apart by name.
 */
export function compareSides(
  before: ComparedSide,
  after: ComparedSide,
  settings: CompareSettings,
  profile: MachineProfile,
  version: string,
): Comparison {
  const pens: string[] = [];
  const numbered = (side: ComparedSide): LineSet => {
    if (settings.pens === 'one') return side.lines;
    const numberOf = uniqueNames(side).map((unique) => {
      // Once dashes are drawn as lines of their own, nothing tells them from solid lines of that colour.
      const name = settings.pens === 'colour' ? solidPenName(unique) : unique;
      const known = pens.indexOf(name);
      return known >= 0 ? known : pens.push(name) - 1;
    });
    return { ...side.lines, pen: side.lines.pen.map((p) => numberOf[p]) };
  };
  const audit = auditLines(numbered(before), numbered(after), {
    ...settings,
    repeatToleranceMm: REPEAT_TOLERANCE_MM,
  });
  return {
    schema: 'fewlift-comparison/1',
    version,
    before: { name: before.name, ...figures(measureProgram(before.program, profile)) },
    after: { name: after.name, ...figures(measureProgram(after.program, profile)) },
    same: audit.ok,
    missingMm: audit.missingMm,
    extraMm: audit.extraMm,
    twiceMm: audit.twiceMm,
    bridgedMm: audit.bridgedMm,
    maxDeviationMm: audit.maxDeviationMm,
    differences: pairMoved(audit.findings, pens),
  };
}

/** The names of a side's pens; of equal names the second is told apart by its turn. */
function uniqueNames({ program }: ComparedSide): string[] {
  const names: string[] = [];
  for (const { name } of program.pens) {
    let unique = name;
    for (let turn = 2; names.includes(unique); turn++) unique = `${name} (${turn})`;
    names.push(unique);
  }
  return names;
}

function figures({ runs, travelMm, drawnMm, seconds }: Measure) {
  return { runs, travelMm, drawnMm, seconds };
}
