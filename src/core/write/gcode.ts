import { toSteps } from '../geometry/decimal.js';
import type { MachineProfile } from '../machine/profile.js';
import type { Program } from '../program/program.js';
import { GcodeBody } from './gcodeBody.js';
import { gcodeHeader } from './gcodeHeader.js';
import type { GcodeOptions } from './gcodeOptions.js';
import { traceLines } from './trace.js';

export type { GcodeOptions };

/**
 * The program as RS-274/NGC text, as T. R. Kramer, F. M. Proctor, E. Messina, "The NIST RS274NGC
 * Interpreter - Version 3", NISTIR 6556 (2000) describes it: units and modes stated first (§3.5.7,
 * §3.5.17), absolute mm, one move a line, numbers without exponent (§3.3.2.1), M0 between pens and M2
 * at the end (§3.6.1), lines far below the 256 characters of §3.3.
 *
 * Curves become lines within `accuracyMm` of the profile, rounding included; points that are written
 * alike are one point, and a run that shrinks to a point still goes down once. Neither clock time nor
 * path: the same program gives the same bytes. Throws RangeError on a profile that cannot be written.
 * O(points).
 */
export function writeGcode(program: Program, profile: MachineProfile, options: GcodeOptions): string {
  const { decimals, accuracyMm } = profile;
  if (toSteps(profile.raisedHeightMm, decimals) <= toSteps(profile.downHeightMm, decimals)) {
    throw new RangeError('raisedHeightMm must be above downHeightMm');
  }
  const rounding = Math.SQRT1_2 * Number(`1e-${decimals}`);
  if (!(accuracyMm > rounding)) throw new RangeError('accuracyMm is finer than the decimals');
  if (!(profile.drawSpeedMmPerS >= 0.001 && profile.plungeSpeedMmPerS >= 0.001)) {
    throw new RangeError('drawSpeedMmPerS and plungeSpeedMmPerS must be at least 0.001');
  }
  const body = new GcodeBody(program, profile, options);
  traceLines(program, body, accuracyMm - rounding);
  const header = gcodeHeader(program, profile, options, body);
  const modes = ['G21', 'G90', 'G17', 'G94'];
  return [...header, ...modes, body.lines.join('\n'), 'M2', ''].join('\n');
}
