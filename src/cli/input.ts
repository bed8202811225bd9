import { basename } from 'node:path';
import {
  choosePens,
  type Drawing,
  findingLines,
  readDrawing,
  type Settings,
  sentence,
  withoutTravel,
} from '../core/index.js';
import { decodeText, NotText } from '../node/decodeText.js';
import { readBytes } from '../node/files.js';
import { Ending, EXIT } from './exitCodes.js';
import type { Reading } from './readingOptions.js';

/** The text of an input, `-` for standard input; throws an Ending where it cannot be had. */
export function readText(path: string, { limits }: Reading): string {
  try {
    return decodeText(readBytes(path), limits?.unpackedBytes);
  } catch (error) {
    if (error instanceof NotText) {
      throw new Ending(EXIT.notRead, `${shownName(path)} ${error.why}`);
    }
    throw new Ending(EXIT.notRead, `${shownName(path)} could not be read: ${reason(error)}`);
  }
}

/** The drawing in a text; throws an Ending where it cannot be read. The travel that we draw is no line of it. */
export function drawingFrom(text: string, path: string, reading: Reading): Drawing {
  const name = path === '-' ? 'drawing' : basename(path);
  const drawing = readDrawing(withoutTravel(text), { ...reading, name });
  const stop = drawing.findings.find((finding) => finding.severity === 'error');
  if (stop) {
    const { line, column } = stop.place ?? { line: null, column: null };
    const where = line === null ? '' : ` (line ${line}, column ${column})`;
    throw new Ending(EXIT.notRead, `${shownName(path)} could not be read: ${sentence(stop)}${where}`);
  }
  return drawing;
}

/** What may explain that nothing is drawn, the likeliest first. */
const WHY_NOTHING = [
  'path-error',
  'points-error',
  'coordinate-overflow',
  'filled-not-stroked',
  'page-edge-cut',
  'clipped',
  'text-not-drawn',
  'image-not-drawn',
  'foreign-object-not-drawn',
  'hidden',
  'invisible',
  'condition-not-met',
  'switch-without-match',
  'flattened-to-nothing',
  'shape-error',
  'length-error',
  'colour-not-read',
  'viewbox-empty',
  'style-sheet-not-read',
  'style-rule-not-read',
  'butt-dots-not-drawn',
  'nothing-to-draw',
  'use-missing',
  'use-external',
  'use-loop',
  'unknown-element',
];

/** The same, where there must be something to draw. */
export function strokedDrawingFrom(
  text: string,
  path: string,
  reading: Reading,
  settings: Settings,
): Drawing {
  const drawing = drawingFrom(text, path, reading);
  if (drawing.strokes.count > 0) {
    const chosen = choosePens(drawing, settings.pens, settings);
    if (chosen.strokes.count > 0) return drawing;
    const why = chosen.findings.slice(drawing.findings.length).map((finding) => `\n  ${sentence(finding)}`);
    throw new Ending(EXIT.notRead, `${shownName(path)}: no pen is left to draw${why.join('')}`);
  }
  const why = WHY_NOTHING.flatMap((code) => drawing.findings.filter((finding) => finding.code === code));
  const nothing = sentence({ code: 'nothing-stroked', severity: 'error', place: null, values: {} });
  const lines = findingLines(why.map((finding) => ({ ...finding, message: sentence(finding) })));
  throw new Ending(EXIT.notRead, [`${shownName(path)}: ${nothing}`, ...lines].join('\n  '));
}

function shownName(path: string): string {
  return path === '-' ? 'standard input' : path;
}

/** The file system's own reason, without a stack. */
export function reason(error: unknown): string {
  const code = (error as { code?: unknown }).code;
  const known: Readonly<Record<string, string>> = {
    ENOENT: 'there is no such file or directory',
    EISDIR: 'it is a directory',
    EACCES: 'permission denied',
    EPERM: 'permission denied',
    ENAMETOOLONG: 'the name is too long',
    ENOTDIR: 'part of the path is not a directory',
    ENOSPC: 'no space is left',
    EROFS: 'the file system is read-only',
  };
  if (typeof code === 'string') return known[code] ?? code;
  return error instanceof Error ? error.message : String(error);
}
