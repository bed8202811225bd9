import { InvalidArgumentError } from 'commander';
import { LIMIT_NAMES, parseLengthMm, type ReadingLimits } from '../core/index.js';

/** A length of at least 0, with or without a unit; bare numbers are mm. */
export function lengthMm(text: string): number {
  const value = parseLengthMm(text);
  if (value === null) throw new InvalidArgumentError('Give a length such as 0.1mm, 2in, 4pt or 0.05 (mm).');
  if (!(value >= 0)) throw new InvalidArgumentError('A length here cannot be below 0.');
  return value;
}

export function positiveLengthMm(text: string): number {
  const value = lengthMm(text);
  if (value === 0) throw new InvalidArgumentError('It must be above 0.');
  return value;
}

const FARTHEST_MM = 1e6;

/** Two lengths, `X,Y`. */
export function placeMm(text: string): [number, number] {
  const parts = text.split(',').map((part) => parseLengthMm(part.trim()));
  const [x, y] = parts;
  if (parts.length !== 2 || x === null || y === null || x === undefined || y === undefined) {
    throw new InvalidArgumentError('Give two lengths from the top left of the page, such as 0,297.');
  }
  if (Math.max(Math.abs(x), Math.abs(y)) > FARTHEST_MM) {
    throw new InvalidArgumentError('Home cannot be more than a kilometre away.');
  }
  return [x, y];
}

export function wholeNumber(text: string): number {
  if (!/^\d{1,9}$/.test(text)) throw new InvalidArgumentError('Give a whole number of at least 0.');
  return Number(text);
}

export function numberAtLeastZero(text: string): number {
  const value = Number(text);
  if (text.trim() === '' || !(value >= 0) || value === Number.POSITIVE_INFINITY) {
    throw new InvalidArgumentError('Give a number of at least 0.');
  }
  return value;
}

export function positiveNumber(text: string): number {
  const value = numberAtLeastZero(text);
  if (value === 0) throw new InvalidArgumentError('It must be above 0.');
  return value;
}

/** Names parted by commas; the option may be given again; write `\\,` for a comma in a name. */
export function names(text: string, before: string[] = []): string[] {
  const all = text.split(/(?<!\\),/).map((name) => name.replaceAll('\\,', ',').trim());
  if (all.includes('')) throw new InvalidArgumentError('Give names parted by commas, such as red,#0000ff.');
  return [...before, ...all];
}

/** `OLD=NEW`. */
export function pairOfNames(text: string, before: [string, string][] = []): [string, string][] {
  const at = text.lastIndexOf('=');
  const [old, name] = [text.slice(0, at).trim(), text.slice(at + 1).trim()];
  if (at < 0 || old === '' || name === '') throw new InvalidArgumentError('Give it as OLD=NEW.');
  return [...before, [old, name]];
}

/** `NAME=N`, added to the limits given before it: the option may be repeated. */
export function readingLimit(text: string, before: Partial<ReadingLimits> = {}): Partial<ReadingLimits> {
  const [name, value = ''] = text.split('=', 2);
  const known = LIMIT_NAMES.find((limit) => limit === name.trim());
  if (known === undefined) {
    throw new InvalidArgumentError(`Give NAME=N, where NAME is one of ${LIMIT_NAMES.join(', ')}.`);
  }
  if (!/^\d{1,15}$/.test(value.trim())) {
    throw new InvalidArgumentError(`Give a whole number of at least 0 for ${known}, such as ${known}=1000.`);
  }
  return { ...before, [known]: Number(value) };
}
