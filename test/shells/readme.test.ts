import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import {
  DEFAULT_SETTINGS,
  PEN_ON_Z,
  perfectMatching,
  readDrawing,
  tour,
  writeAudited,
} from '../../src/core/index.ts';
import { fewlift, inFolder, SAMPLES } from '../support/runCli.ts';

const README = readFileSync(new URL('../../README.md', import.meta.url), 'utf8');

test('the command and its output stand by line 20 of the README, as they are', () => {
  const head = README.split('\n').slice(0, 20).join('\n');
  const shown = head.slice(head.indexOf('hatched-leaf.svg: '), head.lastIndexOf('\n```')).split('\n');
  const { out } = inFolder((folder) =>
    fewlift(['tour', `${SAMPLES}hatched-leaf.svg`, '-o', 'leaf.svg', '-o', 'leaf.gcode'], '', folder),
  );
  expect(shown.length).toBeGreaterThanOrEqual(8);
  for (const line of shown) expect(out).toContain(line);
});

test('the example of the library does what it says', () => {
  const svgText = readFileSync(`${SAMPLES}hatched-leaf.svg`, 'utf8');
  const drawing = readDrawing(svgText, { name: 'leaf' });
  const ordered = tour(drawing, { ...DEFAULT_SETTINGS, end: 'anywhere' }, PEN_ON_Z);
  const { text, audit } = writeAudited(ordered, 'svg');
  expect(audit.ok).toBe(true);
  expect(ordered.after.measure.travelMm).toBeGreaterThan(0);
  expect(text).toContain('<svg');
  const { pairs, total } = perfectMatching([
    [0, 0],
    [0, 1],
    [5, 0],
    [5, 1],
  ]);
  expect(pairs).toEqual([
    [0, 1],
    [2, 3],
  ]);
  expect(total).toBeCloseTo(2, 12);
});
