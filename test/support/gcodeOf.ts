import { PEN_ON_Z } from '../../src/core/machine/penOnZ.ts';
import type { MachineProfile } from '../../src/core/machine/profile.ts';
import { measureProgram } from '../../src/core/measure/measure.ts';
import type { Program } from '../../src/core/program/program.ts';
import { writeGcode } from '../../src/core/write/gcode.ts';

export const PAGE = { pageWidthMm: 200, pageHeightMm: 100 };

export function gcodeOf(program: Program, profile: MachineProfile = PEN_ON_Z, name = 'a test'): string {
  return writeGcode(program, profile, { ...PAGE, name, facts: measureProgram(program, profile) });
}

/** The lines that are not comments. */
export function codeOf(gcode: string): string[] {
  return gcode.split('\n').filter((line) => line !== '' && !line.startsWith('('));
}
