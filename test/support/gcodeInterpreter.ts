import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { homedir, tmpdir } from 'node:os';
import { join } from 'node:path';

/**
 * The stand-alone RS-274/NGC interpreter of Debian's linuxcnc-uspace package, where
 * test/support/fetchInterpreter.sh has put it; null where it has not.
 */
export const INTERPRETER: string | null = (() => {
  const folder = process.env.FEWLIFT_TOOLS || join(homedir(), '.cache', 'fewlift-tools');
  const path = join(folder, 'rs274');
  return existsSync(path) ? path : null;
})();

export interface CanonicalMove {
  readonly kind: 'traverse' | 'feed' | 'arc';
  readonly x: number;
  readonly y: number;
  readonly z: number;
  /** Arcs only: centre, and full turns counted counter-clockwise as positive. */
  readonly centreX: number;
  readonly centreY: number;
  readonly rotation: number;
}

export interface Canonical {
  readonly moves: readonly CanonicalMove[];
  readonly stops: number;
  readonly messages: readonly string[];
  readonly ended: boolean;
  /** Null where there was no error. */
  readonly error: string | null;
}

/** Runs the program and takes its canonical commands (NISTIR 6556 §4) apart; numbers have four places. */
export function interpret(text: string): Canonical {
  if (INTERPRETER === null) throw new Error('no interpreter here');
  const folder = mkdtempSync(join(tmpdir(), 'fewlift-gcode-'));
  try {
    const file = join(folder, 'program.ngc');
    writeFileSync(file, text);
    const result = spawnSync(INTERPRETER, [file], { encoding: 'utf8', maxBuffer: 1 << 28 });
    const moves: CanonicalMove[] = [];
    const messages: string[] = [];
    let stops = 0;
    let ended = false;
    for (const [, name, list] of result.stdout.matchAll(/([A-Z_]+)\((.*)\)\s*$/gm)) {
      const n = list.split(',').map(Number);
      if (name === 'STRAIGHT_TRAVERSE' || name === 'STRAIGHT_FEED') {
        const kind = name === 'STRAIGHT_FEED' ? 'feed' : 'traverse';
        moves.push({ kind, x: n[0], y: n[1], z: n[2], centreX: 0, centreY: 0, rotation: 0 });
      } else if (name === 'ARC_FEED') {
        // ARC_FEED(first end, second end, first axis, second axis, rotation, axis end point, …)
        moves.push({ kind: 'arc', x: n[0], y: n[1], z: n[5], centreX: n[2], centreY: n[3], rotation: n[4] });
      } else if (name === 'PROGRAM_STOP') stops++;
      else if (name === 'PROGRAM_END') ended = true;
      else if (name === 'MESSAGE') messages.push(list);
    }
    const error = result.status === 0 ? null : result.stderr || `exit ${result.status}`;
    return { moves, stops, messages, ended, error };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
