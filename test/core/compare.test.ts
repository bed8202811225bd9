import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';
import {
  type Comparison,
  compareSides,
  DEFAULT_SETTINGS,
  type Drawing,
  PEN_ON_Z,
  readDrawing,
  sideOfDrawing,
  writeSvg,
} from '../../src/core/index.ts';
import { createRandom } from '../../src/core/structures/random.ts';

const SAMPLES = fileURLToPath(new URL('../../samples/', import.meta.url));
const names = readdirSync(SAMPLES).filter((name) => name.endsWith('.svg'));

function compare(before: Drawing, after: Drawing, repeats: 'once' | 'keep' = 'once'): Comparison {
  const settings = { ...DEFAULT_SETTINGS, repeats };
  const sides = [before, after].map((drawing) => sideOfDrawing(drawing, settings));
  return compareSides(sides[0], sides[1], settings, PEN_ON_Z, 'test');
}

/** The drawing written stroke by stroke, as lines of text of which some are paths. */
function writtenStrokes(drawing: Drawing): { lines: string[]; paths: number[] } {
  const { program } = sideOfDrawing(drawing, DEFAULT_SETTINGS);
  const lines = writeSvg(program, { widthMm: drawing.widthMm, heightMm: drawing.heightMm }).split('\n');
  const paths = lines.flatMap((line, i) => (line.startsWith('<path') ? [i] : []));
  return { lines, paths };
}

function startOf(path: string): [number, number] {
  const [, x, y] = /d="M(-?[\d.]+) (-?[\d.]+)/.exec(path) ?? [];
  return [Number(x), Number(y)];
}

/** A spoilt text, and which of the codes must be found. */
const SPOILERS: Record<string, (lines: string[], at: number) => { lines: string[]; codes: string[] }> = {
  removed: (lines, at) => ({
    lines: lines.filter((_, i) => i !== at),
    codes: ['line-missing', 'dot-missing'],
  }),
  doubled: (lines, at) => ({
    lines: [...lines.slice(0, at), lines[at], ...lines.slice(at)],
    codes: ['line-doubled', 'dot-added'],
  }),
  moved: (lines, at) => ({
    lines: lines.map((line, i) =>
      i === at ? line.replace('<path', '<path transform="translate(0.12 -0.16)"') : line,
    ),
    codes: ['line-moved', 'dot-moved', 'line-missing', 'line-added'],
  }),
  // A short line from a stroke's start; where the stroke sets out that way too, it lies on it.
  added: (lines, at) => {
    const [x, y] = startOf(lines[at]);
    const extra = `<path d="M${x} ${y}l0.7 0.3"/>`;
    return {
      lines: [...lines.slice(0, at), extra, ...lines.slice(at)],
      codes: ['line-added', 'line-doubled'],
    };
  },
};

describe('a spoilt copy of a sample is told from the sample', () => {
  test.each(names)('%s', (name) => {
    const drawing = readDrawing(readFileSync(SAMPLES + name, 'utf8'), { name });
    const { lines, paths } = writtenStrokes(drawing);
    const whole = readDrawing(lines.join('\n'));
    expect(compare(drawing, whole)).toMatchObject({ same: true, differences: [] });
    const random = createRandom(name.length);
    for (const [kind, spoil] of Object.entries(SPOILERS)) {
      for (let k = 0; k < 3; k++) {
        const at = paths[Math.floor(random() * paths.length)];
        const spoilt = spoil(lines, at);
        const { same, differences } = compare(whole, readDrawing(spoilt.lines.join('\n')), 'keep');
        expect({ kind, at: lines[at], same }).toEqual({ kind, at: lines[at], same: false });
        expect(differences.some(({ code }) => spoilt.codes.includes(code))).toBe(true);
      }
    }
  });
});

describe('what compare says', () => {
  const svg = (body: string) =>
    readDrawing(
      `<svg xmlns="http://www.w3.org/2000/svg" width="50mm" height="50mm" viewBox="0 0 50 50" fill="none" stroke="#000">${body}</svg>`,
    );

  test('a moved line, with how far and where', () => {
    const { differences } = compare(
      svg('<path d="M0 0H10"/><path d="M0 9H10"/>'),
      svg('<path d="M0 0H10"/><path d="M10 9.2H0"/>'),
    );
    expect(differences.length).toBe(1);
    expect(differences[0]).toMatchObject({ code: 'line-moved', pen: '#000000' });
    expect(differences[0].movedMm).toBeCloseTo(0.2, 6);
    expect(differences[0].x).toBeCloseTo(5, 1);
    expect(differences[0].message).toMatch(/moved by 0\.2 mm/);
  });

  test('the same line with another pen is missing here and added there', () => {
    const { same, differences } = compare(
      svg('<path d="M0 0H10"/>'),
      svg('<path d="M0 0H10" stroke="red"/>'),
    );
    expect(same).toBe(false);
    expect(differences.map(({ code, pen }) => `${code} ${pen}`).sort()).toEqual([
      'line-added #ff0000',
      'line-missing #000000',
    ]);
  });

  test('two layers of one name are two pens, and a drawing is the same as itself', () => {
    const drawing = svg('<g id="cut"><path d="M0 0H10"/></g><g id="cut"><path d="M0 9H10"/></g>');
    const settings = { ...DEFAULT_SETTINGS, pens: 'layer' as const };
    const side = sideOfDrawing(drawing, settings);
    expect(side.program.pens.length).toBe(2);
    expect(compareSides(side, side, settings, PEN_ON_Z, 'test').same).toBe(true);
  });

  test('order, direction, pieces and pens in another order do not matter', () => {
    const { same } = compare(
      svg('<path d="M0 0H10V10"/><path d="M3 3C3 9 9 9 9 3" stroke="red"/>'),
      svg(
        '<path d="M9 3C9 9 3 9 3 3" stroke="red"/><path d="M10 10V4"/><path d="M10 4V0"/><path d="M0 0H10"/>',
      ),
    );
    expect(same).toBe(true);
  });
});
