import { n } from './svg.js';

/**
 * Single-line letters built from upright lines and quarter circles, drawn for these samples. Units: x-height 20,
 * capitals 30, ascenders 34, descenders 12; y grows downwards, the base line is 0. A glyph is its width and its
 * strokes in the path commands M, L, C and A (circular: radius, sweep, end; `A!` takes the longer way).
 */
const GLYPHS = {
  a: [17, 'M14 -20 L14 -3 A3 0 17 0', 'M14 -13 A7 0 0 -13 L0 -7 A7 0 14 -7'],
  b: [14, 'M0 -34 L0 0', 'M0 -13 A7 1 14 -13 L14 -7 A7 1 0 -7'],
  c: [13, 'M12.6 -17.2 A7 0 0 -13 L0 -7 A7 0 12.6 -2.8'],
  d: [17, 'M14 -34 L14 -3 A3 0 17 0', 'M14 -13 A7 0 0 -13 L0 -7 A7 0 14 -7'],
  e: [14, 'M0 -10 L14 -10 L14 -13 A7 0 0 -13 L0 -7 A7 0 12.6 -2.8'],
  f: [11, 'M11 -34 A7 0 4 -27 L4 0', 'M0 -20 L10 -20'],
  g: [14, 'M14 -20 L14 5 A7 1 1.4 9.2', 'M14 -13 A7 0 0 -13 L0 -7 A7 0 14 -7'],
  h: [14, 'M0 -34 L0 0', 'M0 -13 A7 1 14 -13 L14 0'],
  i: [3, 'M0 -20 L0 -3 A3 0 3 0', 'M0 -28 L0 -28'],
  j: [6, 'M6 -20 L6 6 A6 1 0 12', 'M6 -28 L6 -28'],
  k: [13, 'M0 -34 L0 0', 'M12 -20 L0 -8', 'M4 -12 L13 0'],
  l: [3, 'M0 -34 L0 -3 A3 0 3 0'],
  m: [24, 'M0 -20 L0 0', 'M0 -14 A6 1 12 -14 L12 0', 'M12 -14 A6 1 24 -14 L24 0'],
  n: [14, 'M0 -20 L0 0', 'M0 -13 A7 1 14 -13 L14 0'],
  o: [14, 'M0 -13 A7 1 14 -13 L14 -7 A7 1 0 -7 L0 -13'],
  p: [14, 'M0 -20 L0 12', 'M0 -13 A7 1 14 -13 L14 -7 A7 1 0 -7'],
  q: [17, 'M14 -20 L14 9 A3 0 17 12', 'M14 -13 A7 0 0 -13 L0 -7 A7 0 14 -7'],
  r: [9, 'M0 -20 L0 0', 'M0 -13 A7 1 7 -20 L9 -20'],
  s: [13, 'M11 -18 A5 0 7 -20 L5 -20 A5 0 5 -10 L8 -10 A5 1 8 0 L5 0 A5 1 1 -2'],
  t: [10, 'M4 -28 L4 -5 A5 0 9 0 L10 0', 'M0 -20 L10 -20'],
  u: [17, 'M0 -20 L0 -7 A7 0 14 -7', 'M14 -20 L14 -3 A3 0 17 0'],
  v: [14, 'M0 -20 L7 0 L14 -20'],
  w: [20, 'M0 -20 L5 0 L10 -16 L15 0 L20 -20'],
  x: [13, 'M0 -20 L13 0', 'M13 -20 L0 0'],
  y: [14, 'M0 -20 L0 -7 A7 0 14 -7', 'M14 -20 L14 5 A7 1 1.4 9.2'],
  z: [13, 'M0 -20 L13 -20 L0 0 L13 0'],
  A: [20, 'M0 0 L10 -30 L20 0', 'M4 -12 L16 -12'],
  B: [18, 'M10 -16 A8 1 10 0 L0 0 L0 -30 L10 -30 A7 1 10 -16 L0 -16'],
  C: [17, 'M16.2 -26.4 A9 0 0 -21 L0 -9 A9 0 16.2 -3.6'],
  D: [18, 'M0 0 L0 -30 L8 -30 A10 1 18 -20 L18 -10 A10 1 8 0 L0 0'],
  E: [15, 'M15 -30 L0 -30 L0 0 L15 0', 'M0 -16 L12 -16'],
  F: [15, 'M15 -30 L0 -30 L0 0', 'M0 -16 L12 -16'],
  G: [18, 'M16.2 -26.4 A9 0 0 -21 L0 -9 A9 0 18 -9 L18 -14 L10 -14'],
  H: [18, 'M0 -30 L0 0', 'M18 -30 L18 0', 'M0 -16 L18 -16'],
  I: [0, 'M0 -30 L0 0'],
  J: [12, 'M12 -30 L12 -6 A6 1 6 0 L5 0 A5 1 0 -5'],
  K: [17, 'M0 -30 L0 0', 'M15 -30 L0 -15', 'M5 -20 L17 0'],
  L: [14, 'M0 -30 L0 0 L14 0'],
  M: [22, 'M0 0 L0 -30 L11 -10 L22 -30 L22 0'],
  N: [18, 'M0 0 L0 -30 L18 0 L18 -30'],
  O: [18, 'M0 -21 A9 1 18 -21 L18 -9 A9 1 0 -9 L0 -21'],
  P: [17, 'M0 0 L0 -30 L9 -30 A8 1 9 -14 L0 -14'],
  Q: [20, 'M0 -21 A9 1 18 -21 L18 -9 A9 1 0 -9 L0 -21', 'M11 -8 L20 2'],
  R: [17, 'M0 0 L0 -30 L9 -30 A8 1 9 -14 L0 -14', 'M9 -14 L17 0'],
  S: [17, 'M14.6 -27.2 A7 0 9 -30 L7 -30 A7 0 7 -16 L9 -16 A8 1 9 0 L7 0 A8 1 0.6 -3.2'],
  T: [18, 'M0 -30 L18 -30', 'M9 -30 L9 0'],
  U: [18, 'M0 -30 L0 -9 A9 0 18 -9 L18 -30'],
  V: [18, 'M0 -30 L9 0 L18 -30'],
  W: [28, 'M0 -30 L7 0 L14 -24 L21 0 L28 -30'],
  X: [17, 'M0 -30 L17 0', 'M17 -30 L0 0'],
  Y: [18, 'M0 -30 L9 -14 L18 -30', 'M9 -14 L9 0'],
  Z: [16, 'M0 -30 L16 -30 L0 0 L16 0'],
  0: [14, 'M0 -23 A7 1 14 -23 L14 -7 A7 1 0 -7 L0 -23'],
  1: [7, 'M0 -24 L7 -30 L7 0'],
  2: [14, 'M0 -23 A!7 1 12.6 -18.8 L0 0 L14 0'],
  3: [15, 'M1.4 -27.2 A!7 1 7 -16 A!8 1 0.6 -3.2'],
  4: [15, 'M11 0 L11 -30 L0 -9 L15 -9'],
  5: [14, 'M13 -30 L1 -30 L1 -18 L5 -18 A9 1 5 0 L0 0'],
  6: [14, 'M10 -30 C3 -25 0 -17 0 -9 L0 -7 A7 0 14 -7 L14 -9 A7 0 0 -9'],
  7: [14, 'M0 -30 L14 -30 L5 0'],
  8: [16, 'M8 -16 A7 1 8 -30 A7 1 8 -16 A8 1 8 0 A8 1 8 -16'],
  9: [14, 'M4 0 C11 -5 14 -13 14 -21 L14 -23 A7 0 0 -23 L0 -21 A7 0 14 -21'],
  '.': [0, 'M0 0 L0 0'],
  ',': [2, 'M2 -2 L0 4'],
  ':': [0, 'M0 -16 L0 -16', 'M0 -2 L0 -2'],
  ';': [2, 'M2 -16 L2 -16', 'M2 -2 L0 4'],
  '-': [8, 'M0 -11 L8 -11'],
  "'": [0, 'M0 -34 L0 -28'],
  '/': [10, 'M0 3 L10 -33'],
  '(': [6, 'M6 -35 C-2 -25 -2 -7 6 3'],
  ')': [6, 'M0 -35 C8 -25 8 -7 0 3'],
};
const GAP = 6;
const SPACE = 13;

const widthOf = (character) => (character === ' ' ? SPACE - GAP : GLYPHS[character][0]);

/** The width of a line of text, in units. */
export const textWidth = (text) => [...text].reduce((sum, character) => sum + widthOf(character) + GAP, -GAP);

/** Path data of one glyph with its base line at (x, y), `scale` mm to a unit, written in relative commands. */
function glyphData(strokes, x, y, scale) {
  const micro = (value) => Math.round(value * 1000);
  let d = '';
  for (const stroke of strokes) {
    let [px, py] = [0, 0];
    for (const [, command, numbers] of stroke.matchAll(/([MLCA]!?)([^MLCA]*)/g)) {
      const v = numbers.trim().split(/ +/).map(Number);
      const at = v.slice(-2);
      const [ex, ey] = [micro(x + scale * at[0]), micro(y + scale * at[1])];
      // From micrometres already written, so that nothing adds up.
      const by = (ax, ay) => joined(n((ax - px) / 1000), n((ay - py) / 1000));
      if (command === 'M') d += `M${joined(n(ex / 1000), n(ey / 1000))}`;
      else if (command === 'C') {
        const handle = (i) => by(micro(x + scale * v[i]), micro(y + scale * v[i + 1]));
        d += `c${handle(0)} ${handle(2)} ${by(ex, ey)}`;
      } else if (command.startsWith('A')) {
        const r = n(scale * v[0]);
        d += `a${r} ${r} 0 ${command === 'A!' ? 1 : 0} ${v[1]} ${by(ex, ey)}`;
      } else if (ey === py) d += `h${n((ex - px) / 1000)}`;
      else if (ex === px) d += `v${n((ey - py) / 1000)}`;
      else d += `l${by(ex, ey)}`;
      [px, py] = [ex, ey];
    }
  }
  return d;
}

const joined = (a, b) => (b.startsWith('-') ? `${a}${b}` : `${a} ${b}`);

/** One path for each letter of a line of text that begins at (x, y). */
export function letters(text, x, y, scale) {
  const paths = [];
  let at = x;
  for (const character of text) {
    if (character !== ' ') {
      const strokes = GLYPHS[character].slice(1);
      paths.push(`<path d="${glyphData(strokes, at, y, scale)}"/>`);
    }
    at += scale * (widthOf(character) + GAP);
  }
  return paths;
}
