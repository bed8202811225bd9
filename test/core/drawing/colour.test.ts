import { describe, expect, test } from 'vitest';
import { readColour } from '../../../src/core/drawing/colour.ts';
import { COLOUR_NAMES } from '../../../src/core/drawing/colourNames.ts';
import { readPaint } from '../../../src/core/drawing/paint.ts';

// CSS Color Module Level 4: §5 (sRGB), §6 (named), §7 (HSL), §8 (HWB), with its examples.
describe('colours', () => {
  test.each([
    ['#0f0', '#00ff00', 1],
    ['#0F08', '#00ff00', 0x88 / 255],
    ['#00FF00', '#00ff00', 1],
    ['#00ff0080', '#00ff00', 0x80 / 255],
    ['rgb(0, 255, 0)', '#00ff00', 1],
    ['RGB(0 255 0)', '#00ff00', 1],
    ['rgb(0%, 100%, 50.2%)', '#00ff80', 1],
    ['rgba(51, 170, 51, .4)', '#33aa33', 0.4],
    ['rgb(51 170 51 / 40%)', '#33aa33', 0.4],
    ['rgb(51 170 51/0)', '#33aa33', 0],
    ['rgb(-5, 300, 0)', '#00ff00', 1],
    ['hsl(120, 100%, 25%)', '#008000', 1],
    ['hsl(120deg 75% 75%)', '#8fef8f', 1],
    ['hsl(-240 100% 50%)', '#00ff00', 1],
    ['hsla(0.5turn, 100%, 50%, 0.5)', '#00ffff', 0.5],
    ['hwb(150 20% 10%)', '#33e68c', 1],
    ['hwb(45 40% 80%)', '#555555', 1],
    ['transparent', '#000000', 0],
    [' RebeccaPurple ', '#663399', 1],
    ['red', '#ff0000', 1],
  ])('%s', (text, hex, alpha) => {
    expect(readColour(text)).toEqual({ hex, alpha });
  });

  test.each([
    '',
    '#12',
    '#12345',
    '#ggg',
    'rgb(1,2)',
    'rgb(1 2 3 4 5)',
    'reddish',
    'rgb(a,b,c)',
    'constructor',
  ])('%j is none', (text) => {
    expect(readColour(text)).toBeNull();
  });

  // CSS Color 4 §6.1 has 148 names, grey spelled both ways among them.
  test('names', () => {
    expect(COLOUR_NAMES.size).toBe(148);
    for (const [name, hex] of COLOUR_NAMES) {
      expect(hex).toMatch(/^[0-9a-f]{6}$/);
      if (name.includes('grey')) expect(COLOUR_NAMES.get(name.replace('grey', 'gray'))).toBe(hex);
    }
  });
});

describe('paint', () => {
  const known = (id: string): boolean => id === 'g';
  const paint = (text: string): unknown => readPaint(text, known)?.paint ?? null;

  // SVG 2, "Specifying paint: the fill and stroke properties".
  test.each([
    ['none', { kind: 'none' }],
    ['currentColor', { kind: 'current' }],
    ['url(#g)', { kind: 'server', id: 'g' }],
    ['url( "#g" ) red', { kind: 'server', id: 'g' }],
    ['url(#missing)', { kind: 'none' }],
    ['url(#missing) none', { kind: 'none' }],
    ["url('#missing') #F00", { kind: 'colour', hex: '#ff0000', visible: true }],
    ['url(other.svg#g) currentColor', { kind: 'current' }],
    ['rgba(0,0,0,0)', { kind: 'colour', hex: '#000000', visible: false }],
    [
      '#CD853F icc-color(acmecmyk, 0.11, 0.48, 0.83, 0.00)',
      { kind: 'colour', hex: '#cd853f', visible: true },
    ],
    ['context-stroke', { kind: 'none' }],
    ['no-such-colour', null],
  ])('%s', (text, expected) => {
    expect(paint(text)).toEqual(expected);
  });

  test('a colour that is valid and not evaluated is drawn, in black, and said', () => {
    expect(readPaint('oklch(0.7 0.1 200)', known)).toEqual({
      paint: { kind: 'colour', hex: '#000000', visible: true },
      exact: false,
    });
  });
});
