import { describe, expect, test } from 'vitest';
import { readColour } from '../../../../src/core/drawing/style/colour.ts';
import { COLOUR_NAMES } from '../../../../src/core/drawing/style/colourNames.ts';
import { readPaint } from '../../../../src/core/drawing/style/paint.ts';

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
    // CSS Color 4 §§9 and 10: its examples, with the bytes that a browser shows.
    ['lab(29.2345% 39.3825 20.0664)', '#7d2329', 1],
    ['lch(52.2345% 72.2 56.2)', '#c65d06', 1],
    ['oklab(40.101% 0.1147 0.0453)', '#7d2329', 1],
    ['oklch(59.69% 0.156 49.77)', '#c65d07', 1],
    ['color(srgb 1 50% 0 / 30%)', '#ff8000', 0.3],
    ['color(display-p3 1 0 0)', '#ff0000', 1],
    ['color(xyz 0.9505 1 1.089)', '#ffffff', 1],
    ['rgb(none 255 none)', '#00ff00', 1],
    ['rgb(calc(255 / 2) max(0, 3) 0)', '#800300', 1],
    ['light-dark(red, blue)', '#ff0000', 1],
    ['color-mix(in srgb, red, blue)', '#800080', 1],
    ['CanvasText', '#000000', 1],
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
    // The old spelling with commas does not mix, and has no "none".
    'rgb(10%, 20, 30)',
    'rgb(none, 1, 2)',
    'hsl(120, 100, 50)',
    'hwb(120, 0%, 0%)',
    'rgb(1, 2, 3 / 4)',
    'rgb (1 2 3)',
    'color(srgb 1 0.5)',
    'color(nowhere 1 1 1)',
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
    expect(readPaint('rgb(from red r g b)', known)).toEqual({
      paint: { kind: 'colour', hex: '#000000', visible: true },
      exact: false,
    });
  });
});
