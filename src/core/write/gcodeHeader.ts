import { formatDecimal, formatSteps } from '../geometry/decimal.js';
import { toComment } from '../machine/commentText.js';
import { formatHeaderNotes } from '../machine/headerNotes.js';
import { flipY } from '../machine/placement.js';
import type { MachineProfile } from '../machine/profile.js';
import type { Program } from '../program/program.js';
import { CAUTIONS } from './cautions.js';
import type { GcodeBody } from './gcodeBody.js';
import type { GcodeOptions } from './gcodeOptions.js';

/** The head of the file, as comment lines: what it is, where it goes, how much it is, what to mind. */
export function gcodeHeader(
  program: Program,
  profile: MachineProfile,
  options: GcodeOptions,
  box: Pick<GcodeBody, 'minX' | 'minY' | 'maxX' | 'maxY'>,
): string[] {
  const { facts } = options;
  const { decimals } = profile;
  const short = (value: number) => formatDecimal(value, 1);
  const at = (steps: number) => formatSteps(steps, decimals);
  const pens = facts.perPen.filter((pen) => pen.runs > 0).length;
  const bounds =
    program.count === 0
      ? 'bounds: no move'
      : `bounds: X${at(box.minX)} to X${at(box.maxX)}, Y${at(box.minY)} to Y${at(box.maxY)}, in mm from the zero`;
  const notes = formatHeaderNotes(
    {
      pageWidthMm: options.pageWidthMm,
      pageHeightMm: options.pageHeightMm,
      homeXMm: program.homeX,
      homeYMm: flipY(options, program.homeY),
      raisedHeightMm: profile.raisedHeightMm,
      downHeightMm: profile.downHeightMm,
    },
    decimals,
  );
  return [
    `Fewlift: the strokes of ${toComment(options.name, 120)}`,
    'language: word address format in the family of ISO 6983-1, as NISTIR 6556 describes RS-274/NGC',
    ...notes,
    bounds,
    `counts: ${pens} ${pens === 1 ? 'pen' : 'pens'}, ${facts.runs} ${facts.runs === 1 ? 'run' : 'runs'}`,
    `lengths in mm: drawn ${short(facts.drawnMm)}, of that across gaps ${short(facts.bridgedMm)}, travel ${short(facts.travelMm)}`,
    `time: about ${short(facts.seconds)} s, pen changes not counted`,
    `time assumes: drawing ${speed(profile.drawSpeedMmPerS)}, travel ${speed(profile.travelSpeedMmPerS)}, down ${speed(profile.plungeSpeedMmPerS)}, up ${speed(profile.liftSpeedMmPerS)}, acceleration ${formatDecimal(profile.accelerationMmPerS2, 3)} mm per s squared, each run and travel from rest to rest`,
    `curves: lines within ${formatDecimal(profile.accuracyMm, 6)} mm`,
    program.endAtHome ? 'end: pen raised, at home' : 'end: pen raised, where the last run ends',
    ...CAUTIONS,
  ].map((text) => `(${text})`);
}

function speed(mmPerS: number): string {
  return `${formatDecimal(mmPerS, 3)} mm per s`;
}
