import { lstatSync, readFileSync, statSync, symlinkSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import type { Report } from '../../src/core/index.ts';
import { fewlift, inFolder, SAMPLES, svgOf } from '../support/runCli.ts';

const HOUSE = join(SAMPLES, 'one-stroke-house.svg');

describe('fewlift tour', () => {
  test('without -o, SVG goes to standard output and the table to standard error', () => {
    const { code, out, err } = fewlift(['tour', HOUSE]);
    expect(code).toBe(0);
    expect(out).toMatch(/^<\?xml[\s\S]*<svg[\s\S]*<\/svg>\n$/);
    expect(err).toMatch(/runs\s+8\s+1\s+-87\.5 %/);
    expect(err).toMatch(/bound .*, reached: no order that lifts at ends and joints travels less/);
  });

  test('in a pipe, quietly, twice over: the same bytes', () => {
    const text = readFileSync(HOUSE, 'utf8');
    const once = fewlift(['tour', '-', '--quiet'], text);
    expect(once).toMatchObject({ code: 0, err: '' });
    expect(fewlift(['tour', '-', '--quiet'], text).out).toBe(once.out);
  });

  test('several outputs, each whole, and the report in its fixed order', () => {
    inFolder((folder, names) => {
      const args = ['tour', HOUSE, '-o', 'h.svg', '-o', 'h.gcode', '-o', 'h.json'];
      const { code, out, err } = fewlift(args, '', folder);
      expect([code, err]).toEqual([0, '']);
      expect(out).toMatch(/wrote h\.svg\nwrote h\.gcode\nwrote h\.json/);
      expect(out).toMatch(/caution/);
      expect(out).toMatch(/manual, local codes and licensed practice/);
      expect(names()).toEqual(['h.gcode', 'h.json', 'h.svg']);
      const report = JSON.parse(readFileSync(join(folder, 'h.json'), 'utf8')) as Report;
      expect(Object.keys(report)).toEqual([
        'schema',
        'version',
        'settings',
        'drawing',
        'network',
        'before',
        'after',
        'bound',
        'gap',
        'stopped',
        'audit',
        'pens',
        'findings',
      ]);
      expect(Object.keys(report.drawing)).toEqual([
        'name',
        'widthMm',
        'heightMm',
        'elements',
        'strokes',
        'drawnMm',
      ]);
      expect(Object.keys(report.network)).toEqual([
        'vertices',
        'edges',
        'components',
        'oddVertices',
        'repeatedMm',
        'bridgedMm',
        'snapMaxMm',
      ]);
      expect(Object.keys(report.before)).toEqual(['runs', 'travelMm', 'drawnMm', 'seconds']);
      expect(Object.keys(report.after)).toEqual(['runs', 'travelMm', 'drawnMm', 'seconds', 'retracedMm']);
      expect(Object.keys(report.bound)).toEqual(['objective', 'value', 'method', 'exact']);
      expect(Object.keys(report.audit)).toEqual(['ok', 'missingMm', 'extraMm', 'twiceMm', 'maxDeviationMm']);
      expect(Object.keys(report.pens[0])).toEqual(['pen', 'runs', 'drawnMm', 'travelMm', 'seconds']);
      expect(report).toMatchObject({
        schema: 'fewlift/1',
        settings: { homeMm: [0, 180] },
        network: { vertices: 5, edges: 8, components: 1, oddVertices: 2 },
        after: { runs: 1 },
        gap: 0,
        stopped: 'proven',
        audit: { ok: true },
        findings: [],
      });
      expect(report.drawing.drawnMm).toBeCloseTo(824.264, 3);
      expect(JSON.stringify(report)).not.toContain(folder);
    });
  });

  test('--json prints the report alone', () => {
    const { code, out, err } = fewlift(['tour', HOUSE, '--json', '--minimise', 'lifts', '--home', '60,170']);
    expect([code, err]).toEqual([0, '']);
    expect(JSON.parse(out)).toMatchObject({
      settings: { minimise: 'lifts', homeMm: [60, 170] },
      bound: { objective: 'lifts', value: 1, exact: true },
      gap: 0,
    });
  });

  test('the written file, ordered again, is not made worse', () => {
    const first = fewlift(['tour', HOUSE, '--quiet']).out;
    const again = JSON.parse(fewlift(['tour', '-', '--json'], first).out) as Report;
    expect(again.before.runs).toBe(1);
    expect(again.after.travelMm).toBeCloseTo(again.before.travelMm, 6);
  });

  test('several drawings go to a folder; one that fails does not stop the others', () => {
    inFolder((folder, names) => {
      writeFileSync(join(folder, 'a.svg'), svgOf('<path d="M0 0L9 9"/>'));
      writeFileSync(join(folder, 'bad.svg'), 'no');
      const { code, err } = fewlift(
        ['tour', 'a.svg', 'bad.svg', HOUSE, '--out-dir', 'done', '--quiet'],
        '',
        folder,
      );
      expect(code).toBe(3);
      expect(err).toMatch(/bad\.svg/);
      expect(names()).toEqual(['a.svg', 'bad.svg', 'done']);
      expect(readFileSync(join(folder, 'done', 'a.svg'), 'utf8')).toContain('M');
      expect(readFileSync(join(folder, 'done', 'one-stroke-house.svg'), 'utf8')).toContain('path');
    });
  });

  test('--in-place overwrites the input', () => {
    inFolder((folder, names) => {
      writeFileSync(join(folder, 'a.svg'), svgOf('<path d="M0 0L9 9"/><path d="M0 0L9 0"/>'));
      expect(fewlift(['tour', 'a.svg', '-o', 'a.svg', '--in-place', '--quiet'], '', folder).code).toBe(0);
      expect(names()).toEqual(['a.svg']);
      expect(readFileSync(join(folder, 'a.svg'), 'utf8')).toContain('fewlift:label');
    });
  });

  test('--in-place alone writes back; a link to the input is the input, and keeps its mode', () => {
    inFolder((folder, names) => {
      const path = join(folder, 'a.svg');
      writeFileSync(path, svgOf('<path d="M0 0L9 9"/><path d="M0 0L9 0"/>'), { mode: 0o600 });
      symlinkSync('a.svg', join(folder, 'link.svg'));
      const refused = fewlift(['tour', 'link.svg', '-o', 'a.svg'], '', folder);
      expect([refused.code, refused.err]).toEqual([2, expect.stringMatching(/overwrite its input/)]);
      expect(fewlift(['tour', 'link.svg', '--in-place', '--quiet'], '', folder)).toMatchObject({
        code: 0,
        out: '',
      });
      expect(names()).toEqual(['a.svg', 'link.svg']);
      expect(lstatSync(join(folder, 'link.svg')).isSymbolicLink()).toBe(true);
      expect(statSync(path).mode & 0o777).toBe(0o600);
      expect(readFileSync(path, 'utf8')).toContain('fewlift:label');
    });
  });

  test('home on a corner: the fewest lifts are one run, and said to be', () => {
    const { out } = fewlift(
      ['tour', '-', '--minimise', 'lifts', '--json'],
      svgOf('<path d="M0 80V20"/><path d="M0 80H80"/>'),
    );
    expect(JSON.parse(out)).toMatchObject({
      after: { runs: 1 },
      bound: { value: 1, exact: true },
      gap: 0,
      stopped: 'proven',
    });
  });

  test('odd stroke widths are written so that they can be read', () => {
    for (const width of ['0.00000001', '1e13']) {
      const body = `<path d="M9 9L20 9" stroke-width="${width}"/>`;
      expect(fewlift(['tour', '-', '--quiet'], svgOf(body))).toMatchObject({ code: 0, err: '' });
    }
  });

  test('help and version', () => {
    expect(fewlift(['--version']).out).toMatch(/^\d+\.\d+\.\d+\n$/);
    const help = fewlift(['help', 'tour']);
    expect(help.code).toBe(0);
    expect(help.out).toMatch(/Examples:[\s\S]*fewlift tour drawing\.svg -o ordered\.svg/);
    expect(fewlift([]).code).toBe(0);
  });
});
