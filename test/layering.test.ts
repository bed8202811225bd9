import { readdirSync, readFileSync, statSync } from 'node:fs';
import { dirname, join, relative, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';

const SRC = resolve(dirname(fileURLToPath(import.meta.url)), '../src');

/** Which folders each folder may import, besides itself. Files at the root of core may import all of core. */
const MAY_IMPORT: Readonly<Record<string, readonly string[]>> = {
  'core/geometry': [],
  'core/structures': [],
  'core/drawing': ['core/geometry', 'core/finding'],
  'core/network': ['core/geometry', 'core/structures', 'core/drawing', 'core/finding'],
  'core/metric': ['core/geometry', 'core/structures', 'core/network'],
  'core/matching': ['core/structures', 'core/metric'],
  'core/tour': ['core/geometry', 'core/structures', 'core/network', 'core/metric', 'core/matching'],
  'core/machine': ['core/geometry', 'core/finding'],
  'core/program': [
    'core/geometry',
    'core/drawing',
    'core/network',
    'core/tour',
    'core/machine',
    'core/finding',
  ],
  'core/measure': ['core/geometry', 'core/drawing', 'core/network', 'core/tour', 'core/program'],
  'core/write': ['core/geometry', 'core/machine', 'core/program', 'core/measure'],
  'core/audit': ['core/geometry', 'core/structures', 'core/drawing', 'core/program', 'core/finding'],
  'core/report': ['core/measure', 'core/audit', 'core/check', 'core/program', 'core/finding'],
  node: ['core/index'],
  cli: ['core/index', 'node'],
};

/** Packages from outside that a folder may import. */
const PACKAGES: Readonly<Record<string, readonly string[]>> = {
  'core/drawing': ['svg-parser', 'svg-path-parser', 'css-tree/selector-parser'],
  'core/network': ['flatbush'],
  'core/tour': ['flatbush', 'delaunator'],
  'core/matching': [],
  'core/audit': ['flatbush'],
  cli: ['commander'],
};

interface Import {
  readonly from: string;
  readonly file: string;
  readonly to: string;
}

function filesBelow(folder: string): string[] {
  return readdirSync(folder).flatMap((name) => {
    const path = join(folder, name);
    if (statSync(path).isDirectory()) return filesBelow(path);
    return path.endsWith('.ts') && !path.endsWith('.d.ts') ? [path] : [];
  });
}

/** `core/tour/join.ts` is in room `core/tour`; `core/pipeline.ts` in `core`; `core/finding.ts` is its own. */
function roomOf(path: string): string {
  const parts = relative(SRC, path)
    .replace(/\.(ts|js)$/, '')
    .split('/');
  if (parts[0] !== 'core') return parts[0];
  if (parts.length > 2) return `core/${parts[1]}`;
  return ['finding', 'index'].includes(parts[1]) ? `core/${parts[1]}` : 'core';
}

function importsOf(file: string): Import[] {
  const text = readFileSync(file, 'utf8');
  const found: Import[] = [];
  for (const [, to] of text.matchAll(
    /^\s*(?:import|export)\b[^'"`;]*?from\s*'([^']+)'|^\s*import\s*'([^']+)'/gm,
  )) {
    if (to) found.push({ from: roomOf(file), file: relative(SRC, file), to });
  }
  for (const [, to] of text.matchAll(/\bimport\(\s*'([^']+)'\s*\)/g)) {
    found.push({ from: roomOf(file), file: relative(SRC, file), to });
  }
  return found;
}

function breaks({ from, file, to }: Import): boolean {
  if (to.startsWith('.')) {
    const room = roomOf(resolve(SRC, dirname(file), to));
    if (room === from) return false;
    if (from === 'core' || from === 'core/index') return !room.startsWith('core');
    return !(MAY_IMPORT[from] ?? []).includes(room);
  }
  if (to.startsWith('node:')) return from.startsWith('core');
  return !(PACKAGES[from] ?? []).includes(to);
}

describe('who may import whom', () => {
  const all = filesBelow(SRC).flatMap(importsOf);

  test('every import goes the way of the data', () => {
    expect(all.length).toBeGreaterThan(100);
    expect(all.filter(breaks)).toEqual([]);
  });

  test('every folder has a rule', () => {
    const rooms = new Set(filesBelow(SRC).map(roomOf));
    for (const room of ['core', 'core/index', 'core/finding']) rooms.delete(room);
    expect([...rooms].filter((room) => !(room in MAY_IMPORT))).toEqual([]);
  });

  test('the rules refuse what they should', () => {
    const bad: Import[] = [
      { from: 'core/matching', file: 'core/matching/x.ts', to: '../drawing/drawing.js' },
      { from: 'core/audit', file: 'core/audit/x.ts', to: '../network/network.js' },
      { from: 'core/geometry', file: 'core/geometry/x.ts', to: 'node:fs' },
      { from: 'core/geometry', file: 'core/geometry/x.ts', to: '../finding.js' },
      { from: 'cli', file: 'cli/x.ts', to: '../core/pipeline.js' },
      { from: 'core/tour', file: 'core/tour/x.ts', to: 'commander' },
    ];
    expect(bad.filter(breaks)).toEqual(bad);
  });
});
