/// <reference path="../vendor.d.ts" />
import parsePath, { type ParsedCommand } from 'svg-path-parser';
import { ARITY, type PathCommands } from './pathCommands.js';

/** The parser's time grows with the square of the sub-paths it is given at once, its stack with the commands. */
const LETTERS_PER_CHUNK = 1000;

/**
 * Reads path data into `out` by the grammar of svg-path-parser.
 *
 * @returns false where the grammar refuses the data or a number is not finite; `out` is then of no use.
 */
export function readPathByGrammar(data: string, out: PathCommands): boolean {
  out.clear();
  for (let from = 0; from < data.length; ) {
    const to = chunkEnd(data, from);
    let commands: ParsedCommand[];
    try {
      commands = parsePath(from === 0 ? data.slice(0, to) : `M0 0${data.slice(from, to)}`);
    } catch {
      return false;
    }
    for (let i = from === 0 ? 0 : 1; i < commands.length; i++) {
      if (!append(commands[i], out)) return false;
    }
    from = to;
  }
  return true;
}

/** Where the chunk from `from` ends: before a command letter, or at the end of the data. */
function chunkEnd(data: string, from: number): number {
  let letters = 0;
  for (let at = from; at < data.length; at++) {
    const code = data.charCodeAt(at);
    if (code < 65 || code >= 128 || ARITY[code] === 255) continue;
    if (letters++ === LETTERS_PER_CHUNK) return at;
  }
  return data.length;
}

function append(command: ParsedCommand, out: PathCommands): boolean {
  const code = command.code.charCodeAt(0);
  const base = out.push(code);
  let at = base;
  const put = (value: number | undefined): void => {
    if (value !== undefined) out.numbers[at++] = value + 0;
  };
  put(command.rx);
  put(command.ry);
  put(command.xAxisRotation);
  if (command.largeArc !== undefined) put(command.largeArc ? 1 : 0);
  if (command.sweep !== undefined) put(command.sweep ? 1 : 0);
  put(command.x1);
  put(command.y1);
  put(command.x2);
  put(command.y2);
  put(command.x);
  put(command.y);
  if (at - base !== ARITY[code]) return false;
  while (--at >= base) if (!Number.isFinite(out.numbers[at])) return false;
  return true;
}
