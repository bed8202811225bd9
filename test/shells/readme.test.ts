import { spawnSync } from 'node:child_process';
import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
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

test('the example of the library compiles', () => {
  const code = /```ts\n([\s\S]*?)```/.exec(README)?.[1] ?? '';
  expect(code).toContain("from 'fewlift'");
  inFolder((folder) => {
    const core = fileURLToPath(new URL('../../dist/core/index.js', import.meta.url));
    const example = `declare const svgText: string;\ndeclare const console: { log(...values: unknown[]): void };\n${code}export {};\n`;
    writeFileSync(join(folder, 'example.ts'), example.replace("'fewlift'", `'${core}'`));
    const options = {
      strict: true,
      noEmit: true,
      module: 'nodenext',
      target: 'es2022',
      lib: ['es2022'],
      types: [],
    };
    writeFileSync(
      join(folder, 'tsconfig.json'),
      JSON.stringify({ compilerOptions: options, files: ['example.ts'] }),
    );
    const tsc = fileURLToPath(new URL('../../node_modules/.bin/tsc', import.meta.url));
    const { status, stdout } = spawnSync(tsc, ['-p', folder], { encoding: 'utf8' });
    expect({ status, stdout }).toEqual({ status: 0, stdout: '' });
  });
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
