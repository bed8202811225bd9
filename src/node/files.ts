import { randomBytes } from 'node:crypto';
import {
  closeSync,
  fsyncSync,
  openSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  writeSync,
} from 'node:fs';
import { basename, dirname, join } from 'node:path';

/** All bytes of a file, or of standard input for `-`. Throws as the file system does. */
export function readBytes(path: string): Uint8Array {
  return path === '-' ? readFileSync(0) : readFileSync(path);
}

/**
 * Writes files so that each appears whole or not at all: everything is written beside its place first,
 * then all are renamed. Where anything fails before the renaming, nothing is left behind.
 */
export function writeWhole(files: readonly { readonly path: string; readonly text: string }[]): void {
  const beside: { from: string; to: string }[] = [];
  try {
    for (const { path, text } of files) {
      if (isDirectory(path)) throw Object.assign(new Error('is a directory'), { code: 'EISDIR', path });
      const from = join(dirname(path), `.${basename(path)}.${randomBytes(4).toString('hex')}`);
      beside.push({ from, to: path });
      const file = openSync(from, 'wx');
      try {
        writeAll(file, text);
        fsyncSync(file);
      } finally {
        closeSync(file);
      }
    }
    for (const { from, to } of beside) renameSync(from, to);
  } catch (error) {
    for (const { from } of beside) rmSync(from, { force: true });
    throw error;
  }
}

function isDirectory(path: string): boolean {
  return statSync(path, { throwIfNoEntry: false })?.isDirectory() ?? false;
}

function writeAll(file: number, text: string): void {
  const bytes = Buffer.from(text);
  for (let done = 0; done < bytes.length; ) done += writeSync(file, bytes, done);
}
