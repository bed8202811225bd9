import { randomBytes } from 'node:crypto';
import {
  accessSync,
  closeSync,
  constants,
  fchmodSync,
  fsyncSync,
  openSync,
  readFileSync,
  realpathSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
  writeSync,
} from 'node:fs';
import { basename, dirname, join, resolve } from 'node:path';
import { NotText } from './notText.js';

/**
 * All bytes of a file, or of standard input for `-`. Throws as the file system does, or NotText where there
 * are more than Node.js reads at once.
 */
export function readBytes(path: string): Uint8Array {
  try {
    return readFileSync(path === '-' ? 0 : path);
  } catch (error) {
    if ((error as { code?: unknown }).code !== 'ERR_FS_FILE_TOO_LARGE') throw error;
    throw new NotText('is larger than Node.js reads at once (2 GB): split it');
  }
}

/**
 * Writes files so that each appears whole or not at all: everything is written beside its place first,
 * then all are renamed. Where anything fails before the renaming, nothing is left behind. A link keeps
 * pointing where it did and a file keeps its mode; what is no plain file (a device, a pipe) is written
 * straight to.
 */
export function writeWhole(files: readonly { readonly path: string; readonly text: string }[]): void {
  const beside: { from: string; to: string }[] = [];
  const straight: { path: string; text: string }[] = [];
  try {
    for (const { path, text } of files) {
      const to = realPath(path);
      const there = statSync(to, { throwIfNoEntry: false });
      if (there?.isDirectory()) throw Object.assign(new Error('is a directory'), { code: 'EISDIR' });
      if (there && !there.isFile()) {
        straight.push({ path: to, text });
        continue;
      }
      if (there) accessSync(to, constants.W_OK);
      const from = join(dirname(to), `.fewlift-${randomBytes(6).toString('hex')}`);
      beside.push({ from, to });
      writeNew(from, text, there?.mode);
    }
    for (const { path, text } of straight) writeFileSync(path, text);
    for (const { from, to } of beside) renameSync(from, to);
  } catch (error) {
    for (const { from } of beside) rmSync(from, { force: true });
    throw error;
  }
}

/** Where a path leads, links followed; the path itself, made absolute, where nothing is there yet. */
export function realPath(path: string): string {
  try {
    return realpathSync(path);
  } catch {
    const absolute = resolve(path);
    try {
      return join(realpathSync(dirname(absolute)), basename(absolute));
    } catch {
      return absolute;
    }
  }
}

function writeNew(path: string, text: string, mode: number | undefined): void {
  const file = openSync(path, 'wx');
  try {
    const bytes = Buffer.from(text);
    for (let done = 0; done < bytes.length; ) done += writeSync(file, bytes, done);
    if (mode !== undefined) fchmodSync(file, mode & 0o777);
    fsyncSync(file);
  } finally {
    closeSync(file);
  }
}
