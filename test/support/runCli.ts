import { spawnSync } from 'node:child_process';
import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

export const BIN = fileURLToPath(new URL('../../bin/fewlift.js', import.meta.url));

export const SAMPLES = fileURLToPath(new URL('../../samples/', import.meta.url));

export interface CliResult {
  readonly code: number | null;
  readonly out: string;
  readonly err: string;
}

/** Runs the built command line as a user would. */
export function fewlift(args: readonly string[], input = '', cwd = tmpdir()): CliResult {
  const { status, stdout, stderr } = spawnSync(process.execPath, [BIN, ...args], {
    cwd,
    input,
    encoding: 'utf8',
  });
  return { code: status, out: stdout, err: stderr };
}

/** A folder of its own for one test, removed after it. */
export function inFolder<T>(work: (folder: string, names: () => string[]) => T): T {
  const folder = mkdtempSync(join(tmpdir(), 'fewlift-test-'));
  try {
    return work(folder, () => readdirSync(folder).sort());
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

export function svgOf(body: string, attributes = 'width="100mm" height="80mm" viewBox="0 0 100 80"'): string {
  return `<svg xmlns="http://www.w3.org/2000/svg" ${attributes} fill="none" stroke="black">${body}</svg>`;
}
