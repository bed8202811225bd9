import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { describe, expect, test } from 'vitest';
import { fewlift, inFolder, svgOf } from '../support/runCli.ts';

const COLOURED = svgOf(
  '<path d="M5 5H25" stroke="red"/><path d="M5 9H25" stroke="blue"/><path d="M5 7H25" stroke="red" stroke-dasharray="4 2"/>',
);

function pensOf(args: string[], text = COLOURED): string[] {
  const { code, out, err } = fewlift(['tour', '-', '--json', ...args], text);
  expect([code, err]).toEqual([0, '']);
  return JSON.parse(out).pens.map(({ pen }: { pen: string }) => pen);
}

describe('pens', () => {
  test('are chosen, left out, ordered and renamed', () => {
    expect(pensOf([])).toEqual(['#ff0000', '#0000ff', '#ff0000 dashed']);
    expect(pensOf(['--only-pens', 'red, blue'])).toEqual(['#ff0000', '#0000ff']);
    expect(pensOf(['--skip-pens', '#f00'])).toEqual(['#0000ff', '#ff0000 dashed']);
    expect(pensOf(['--pen-order', 'blue'])).toEqual(['#0000ff', '#ff0000', '#ff0000 dashed']);
    expect(pensOf(['--rename-pen', 'red dashed=crease', '--rename-pen', 'blue=crease'])).toEqual([
      '#ff0000',
      'crease',
    ]);
  });

  test('that are not there are named beside those that are; without any there is nothing to draw', () => {
    const some = fewlift(['tour', '-'], COLOURED, undefined);
    expect(some.code).toBe(0);
    const { code, err } = fewlift(['tour', '-', '--only-pens', 'green'], COLOURED);
    expect(code).toBe(3);
    expect(err).toMatch(
      /no pen is left to draw\n {2}no pen is called "green"; the drawing has #ff0000, #0000ff/,
    );
    expect(fewlift(['tour', '-', '--rename-pen', 'green'], COLOURED).code).toBe(2);
    expect(fewlift(['tour', '-', '--only-pens', ','], COLOURED).code).toBe(2);
  });
});

describe('ways of reading', () => {
  test('are in the report with the other settings', () => {
    const { out } = fewlift(['tour', '-', '--json', '--dashes', 'solid', '--px-per-inch', '90'], COLOURED);
    expect(JSON.parse(out).settings).toMatchObject({
      pxPerInch: 90,
      dashes: 'solid',
      clips: 'cut',
      pageEdge: 'cut',
      fills: 'skip',
    });
    expect(JSON.parse(out).drawing.strokes).toBe(3);
  });

  test('lines past the page are cut and said, or drawn', () => {
    const wide = svgOf('<path d="M90 5H150"/>');
    const cut = fewlift(['survey', '-'], wide);
    expect(cut.out).toMatch(
      /warning: 1 stroke cut at the edge of the page, 50 mm not drawn; --page-edge ignore/,
    );
    const whole = fewlift(['tour', '-', '--page-edge', 'ignore', '--json'], wide);
    expect(JSON.parse(whole.out)).toMatchObject({ drawing: { drawnMm: 60 }, audit: { ok: true } });
  });

  test('filled shapes are drawn as outlines on request', () => {
    const filled = svgOf('<rect x="5" y="5" width="10" height="10" stroke="none" fill="red"/>');
    expect(fewlift(['tour', '-'], filled).code).toBe(3);
    const { code, out } = fewlift(['tour', '-', '--fills', 'outline', '--json'], filled);
    expect(code).toBe(0);
    expect(JSON.parse(out).drawing).toMatchObject({ strokes: 1, drawnMm: 40 });
  });

  test('strokes wider than the tool are a warning where its width is given', () => {
    const wide = svgOf('<path d="M5 5H25" stroke-width="3"/>');
    const { out } = fewlift(['survey', '-', '--pen-width', '0.5mm'], wide);
    expect(out).toMatch(
      /warning: 1 stroke wider than 0.5 mm, up to 3 mm: .* a mill would mill such a track away \(line 1/,
    );
  });

  test('a limit that a message names can be lifted', () => {
    const deep = svgOf(`${'<g>'.repeat(1500)}<path d="M5 5H25"/>${'</g>'.repeat(1500)}`);
    const refused = fewlift(['survey', '-'], deep);
    expect(refused.code).toBe(3);
    expect(refused.err).toMatch(/past the limit depth \(1024\); --limit depth=N lifts it/);
    expect(fewlift(['survey', '-', '--limit', 'depth=2000'], deep).code).toBe(0);
    expect(fewlift(['survey', '-', '--limit', 'height=2000'], deep).err).toMatch(
      /one of unpackedBytes, depth/,
    );
  });

  test('packed drawings open, to a limit', () => {
    inFolder((folder) => {
      writeFileSync(join(folder, 'a.svgz'), gzipSync(COLOURED));
      expect(fewlift(['tour', 'a.svgz', '-o', 'a.svg'], '', folder).code).toBe(0);
      expect(readFileSync(join(folder, 'a.svg'), 'utf8')).toMatch(/fewlift:label="#ff0000 dashed"/);
      const { code, err } = fewlift(['survey', 'a.svgz', '--limit', 'unpackedBytes=100'], '', folder);
      expect(code).toBe(3);
      expect(err).toMatch(/--limit unpackedBytes=N lifts it/);
    });
  });
});

describe('joining at crossings', () => {
  test('says what it saved', () => {
    const rings = svgOf('<circle cx="30" cy="30" r="15"/><circle cx="45" cy="30" r="15"/>');
    const { err } = fewlift(['tour', '-', '--junctions', 'crossing'], rings);
    expect(err).toMatch(
      /note: joining lines at 2 crossings: \d+ runs? fewer, travel \d+(\.\d+)? mm (less|more)/,
    );
  });
});
