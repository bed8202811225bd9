import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { fewlift, inFolder, SAMPLES, svgOf } from '../support/runCli.ts';

const HOUSE = join(SAMPLES, 'one-stroke-house.svg');

describe('fewlift survey', () => {
  test('shows what is in a drawing and writes nothing', () => {
    inFolder((folder, names) => {
      const { code, out, err } = fewlift(['survey', HOUSE], '', folder);
      expect([code, err]).toEqual([0, '']);
      expect(out).toMatch(/odd vertices +2\n/);
      expect(out).toMatch(/fewest runs +1\n/);
      expect(names()).toEqual([]);
    });
  });

  test('names what is not drawn', () => {
    const { code, out } = fewlift(['survey', '-'], svgOf('<path d="M0 0H9"/><text id="t">Hello</text>'));
    expect(code).toBe(0);
    expect(out).toMatch(/warning: 1 text not drawn, first: "Hello".*line 1, column 135, <text> id t/);
  });

  test('--json, and the same refusals as tour', () => {
    expect(JSON.parse(fewlift(['survey', HOUSE, '--json']).out)).toMatchObject({
      schema: 'fewlift-survey/1',
      drawing: { strokes: 8, widthMm: 120 },
    });
    expect(fewlift(['survey', 'none.svg']).code).toBe(3);
    expect(fewlift(['survey', HOUSE, '--snap', '-1']).code).toBe(2);
  });
});

describe('fewlift compare', () => {
  test('the drawing and what was made of it: the same lines, in SVG with travel shown and in G-code', () => {
    inFolder((folder) => {
      fewlift(['tour', HOUSE, '-o', 'h.svg', '-o', 'h.gcode', '--show-travel', '--quiet'], '', folder);
      for (const after of ['h.svg', 'h.gcode']) {
        const { code, out } = fewlift(['compare', HOUSE, after], '', folder);
        expect(code).toBe(0);
        expect(out).toMatch(/runs +8 +1 +-87\.5 %/);
        expect(out).toMatch(/the same, none lost or added/);
      }
    });
  });

  test('a line taken away: exit code 1, with its place', () => {
    inFolder((folder) => {
      const text = readFileSync(HOUSE, 'utf8').split('\n');
      text.splice(3, 1);
      writeFileSync(join(folder, 'less.svg'), text.join('\n'));
      const { code, out } = fewlift(['compare', HOUSE, 'less.svg'], '', folder);
      expect(code).toBe(1);
      expect(out).toMatch(/141\.[34]\d* mm near x 60, y 120 .* not drawn/);
      const json = fewlift(['compare', HOUSE, 'less.svg', '--json'], '', folder);
      expect(json.code).toBe(1);
      expect(JSON.parse(json.out)).toMatchObject({ same: false, differences: [{ code: 'line-missing' }] });
    });
  });

  test('what cannot be read ends with 3 and a line that says why', () => {
    const bad = fewlift(['compare', HOUSE, 'none.gcode']);
    expect(bad).toMatchObject({ code: 3, out: '' });
    inFolder((folder) => {
      writeFileSync(join(folder, 'odd.gcode'), 'G21\nG0 X1e-3\n');
      const odd = fewlift(['compare', HOUSE, 'odd.gcode'], '', folder);
      expect(odd.code).toBe(3);
      expect(odd.err.trimEnd().split('\n').length).toBe(1);
    });
  });
});
