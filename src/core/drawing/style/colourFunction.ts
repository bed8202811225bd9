import { angleOrNumber } from './angle.js';
import { evaluate } from './calc.js';
import { colourMix } from './colourMix.js';
import { fromPolar, labToSrgb, oklabToSrgb, SPACES, type Triple } from './colourSpaces.js';
import { splitOutside, wordsOf } from './cssText.js';

/** A colour in sRGB, not yet clipped to 0 to 1. */
export interface Rgb {
  readonly rgb: Triple;
  readonly alpha: number;
}

const CALL = /^([a-z][a-z-]*)\((.*)\)$/s;

/** A colour written as a function, in lower case; null where it is wrong or not one of those read here. */
export function colourFunction(text: string, read: (text: string) => Rgb | null): Rgb | null {
  const call = CALL.exec(text);
  if (!call) return null;
  const [, name, list] = call;
  if (name === 'light-dark') {
    const parts = splitOutside(list, ',').map((part) => read(part.trim()));
    return parts.length === 2 && parts[1] ? parts[0] : null;
  }
  if (name === 'color-mix') return colourMix(list, read);
  const given = componentsOf(list);
  if (!given) return null;
  const { words, alpha, legacy } = given;
  const opacity = alpha === null ? 1 : part(alpha, 1, !legacy);
  const rgb = name === 'color' ? inSpace(words) : FUNCTIONS.get(name)?.(words, legacy);
  if (!rgb || Number.isNaN(opacity) || !rgb.every(Number.isFinite)) return null;
  return { rgb, alpha: clamp(opacity, 0, 1) };
}

interface Components {
  readonly words: readonly string[];
  readonly alpha: string | null;
  /** With commas. */
  readonly legacy: boolean;
}

function componentsOf(list: string): Components | null {
  const commas = splitOutside(list, ',').map((part) => part.trim());
  if (commas.length > 1) {
    if (commas.length !== 3 && commas.length !== 4) return null;
    return { words: commas.slice(0, 3), alpha: commas[3] ?? null, legacy: true };
  }
  const [before, after, ...more] = splitOutside(list, '/').map((part) => part.trim());
  if (more.length > 0 || after === '') return null;
  return { words: wordsOf(before), alpha: after ?? null, legacy: false };
}

type Reader = (words: readonly string[], legacy: boolean) => Triple | null;

/** CSS Color Module Level 4, §§5, 7, 8, 9. */
const FUNCTIONS: ReadonlyMap<string, Reader> = new Map<string, Reader>([
  ['rgb', rgb],
  ['rgba', rgb],
  ['hsl', hslOf],
  ['hsla', hslOf],
  ['hwb', (words, legacy) => (legacy ? null : polar(words, true, hwb))],
  ['lab', (words, legacy) => rectangular(words, legacy, 100, 125, labToSrgb)],
  ['oklab', (words, legacy) => rectangular(words, legacy, 1, 0.4, oklabToSrgb)],
  ['lch', (words, legacy) => (legacy ? null : lightChromaHue(words, 100, 150, labToSrgb))],
  ['oklch', (words, legacy) => (legacy ? null : lightChromaHue(words, 1, 0.4, oklabToSrgb))],
]);

function rgb(words: readonly string[], legacy: boolean): Triple | null {
  if (words.length !== 3) return null;
  // The old spelling does not mix numbers and percentages.
  if (legacy && new Set(words.map((word) => word.endsWith('%'))).size > 1) return null;
  const channel = (word: string): number => {
    const value = part(word, 255, !legacy);
    return Number.isNaN(value) ? value : Math.round(clamp(value, 0, 255)) / 255;
  };
  return [channel(words[0]), channel(words[1]), channel(words[2])];
}

function hslOf(words: readonly string[], legacy: boolean): Triple | null {
  if (legacy && !(words[1].endsWith('%') && words[2].endsWith('%'))) return null;
  return polar(words, !legacy, hsl);
}

function polar(
  words: readonly string[],
  modern: boolean,
  convert: (hue: number, second: number, third: number) => Triple,
): Triple | null {
  if (words.length !== 3) return null;
  const angle = hue(words[0], modern);
  const second = part(words[1], 100, modern) / 100;
  const third = part(words[2], 100, modern) / 100;
  if (Number.isNaN(angle + second + third)) return null;
  const [r, g, b] = convert(angle, clamp(second, 0, 1), clamp(third, 0, 1));
  return [toByte(r), toByte(g), toByte(b)];
}

/** The nearest of the 256 values of a byte. */
function toByte(channel: number): number {
  return Math.round(channel * 255) / 255;
}

function rectangular(
  words: readonly string[],
  legacy: boolean,
  white: number,
  reach: number,
  convert: (lab: Triple) => Triple,
): Triple | null {
  if (legacy || words.length !== 3) return null;
  const light = clamp(part(words[0], white, true), 0, white);
  return convert([light, part(words[1], reach, true), part(words[2], reach, true)]);
}

function lightChromaHue(
  words: readonly string[],
  white: number,
  reach: number,
  convert: (lab: Triple) => Triple,
): Triple | null {
  if (words.length !== 3) return null;
  const light = clamp(part(words[0], white, true), 0, white);
  const chroma = Math.max(0, part(words[1], reach, true));
  return convert(fromPolar([light, chroma, hue(words[2], true)]));
}

function inSpace([space, ...words]: readonly string[]): Triple | null {
  const convert = SPACES.get(space);
  if (!convert || words.length !== 3) return null;
  return convert([part(words[0], 1, true), part(words[1], 1, true), part(words[2], 1, true)]);
}

/** A number, or a percentage of `whole`; NaN where it is neither. */
function part(word: string, whole: number, modern: boolean): number {
  if (word === 'none') return modern ? 0 : Number.NaN;
  const value = evaluate(word, (number, unit) =>
    unit === ''
      ? { kind: 'number', value: number }
      : unit === '%'
        ? { kind: 'number', value: (number / 100) * whole }
        : null,
  );
  return value?.value ?? Number.NaN;
}

function hue(word: string, modern: boolean): number {
  if (word === 'none') return modern ? 0 : Number.NaN;
  const value = evaluate(word, angleOrNumber);
  return value ? ((value.value % 360) + 360) % 360 : Number.NaN;
}

/** CSS Color 4, §7.1, "Converting HSL Colors to sRGB". */
function hsl(angle: number, saturation: number, light: number): Triple {
  const a = saturation * Math.min(light, 1 - light);
  const f = (n: number): number => {
    const k = (n + angle / 30) % 12;
    return light - a * Math.max(-1, Math.min(k - 3, 9 - k, 1));
  };
  return [f(0), f(8), f(4)];
}

/** CSS Color 4, §8.1, "Converting HWB Colors to sRGB". */
function hwb(angle: number, white: number, black: number): Triple {
  if (white + black >= 1) {
    const grey = white / (white + black);
    return [grey, grey, grey];
  }
  const [r, g, b] = hsl(angle, 1, 0.5);
  const scale = 1 - white - black;
  return [r * scale + white, g * scale + white, b * scale + white];
}

function clamp(v: number, low: number, high: number): number {
  return v < low ? low : Math.min(v, high);
}
