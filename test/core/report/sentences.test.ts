import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';
import { READING_FINDINGS } from '../../../src/core/drawing/findingKinds.ts';
import { GCODE_FINDINGS } from '../../../src/core/program/gcodeFindings.ts';
import { hasSentence, sentence } from '../../../src/core/report/sentences.ts';

const CORE = fileURLToPath(new URL('../../../src/core/', import.meta.url));

function textsBelow(folder: string): string[] {
  return readdirSync(folder).flatMap((name) => {
    const path = join(folder, name);
    if (statSync(path).isDirectory()) return textsBelow(path);
    return name.endsWith('.ts') ? [readFileSync(path, 'utf8')] : [];
  });
}

test('every code that can be found has its sentence', () => {
  const codes = [...Object.keys(READING_FINDINGS), ...Object.keys(GCODE_FINDINGS)];
  for (const text of textsBelow(CORE)) {
    for (const [, code] of text.matchAll(/\bcode: '([a-z-]+)'/g)) codes.push(code);
    for (const [, code] of text.matchAll(/\bnote\('([a-z-]+)'/g)) codes.push(code);
  }
  expect(codes.length).toBeGreaterThan(60);
  expect(codes.filter((code) => !hasSentence(code))).toEqual([]);
});

test('a sentence never shows a value that is not there', () => {
  for (const code of [...Object.keys(READING_FINDINGS), ...Object.keys(GCODE_FINDINGS)]) {
    const text = sentence({ code, severity: 'note', place: null, values: { count: 2 } });
    expect(text).not.toMatch(/\[object|NaN/);
  }
});

test('long values are cut, counts are spelled out', () => {
  const finding = (code: string, values: Record<string, string | number>) =>
    sentence({ code, severity: 'warning', place: null, values });
  expect(finding('text-not-drawn', { count: 2, text: 'x'.repeat(200) }).length).toBeLessThan(160);
  expect(finding('image-not-drawn', { count: 1 })).toBe('1 image not drawn');
  expect(finding('image-not-drawn', { count: 3 })).toBe('3 images not drawn');
});
