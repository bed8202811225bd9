import type { Rgb } from './colourFunction.js';
import { linearSrgbToSrgb, oklabToSrgb, srgbToLinearSrgb, srgbToOklab, type Triple } from './colourSpaces.js';
import { splitOutside, wordsOf } from './cssText.js';

interface Space {
  readonly from: (rgb: Triple) => Triple;
  readonly to: (mixed: Triple) => Triple;
}

const MIXED_IN: ReadonlyMap<string, Space> = new Map([
  ['srgb', { from: (c: Triple) => c, to: (c: Triple) => c }],
  ['srgb-linear', { from: srgbToLinearSrgb, to: linearSrgbToSrgb }],
  ['oklab', { from: srgbToOklab, to: oklabToSrgb }],
]);

/**
 * The arguments of color-mix() (CSS Color Module Level 5, §3) in a rectangular space of sRGB or in Oklab;
 * null for other spaces, and where they are wrong.
 */
export function colourMix(list: string, read: (text: string) => Rgb | null): Rgb | null {
  const parts = splitOutside(list, ',').map((part) => part.trim());
  const named = /^in\s+([a-z0-9-]+)$/.exec(parts[0] ?? '');
  const space = MIXED_IN.get(named ? named[1] : 'oklab');
  if (named) parts.shift();
  if (!space || parts.length !== 2) return null;
  const shares = parts.map(shareOf);
  const colours = parts.map((part) =>
    read(
      wordsOf(part)
        .filter((word) => !isShare(word))
        .join(' '),
    ),
  );
  const [a, b] = colours;
  if (!a || !b || shares.some((share) => share !== null && !(share >= 0 && share <= 1))) return null;
  const first = shares[0] ?? (shares[1] === null ? 0.5 : 1 - shares[1]);
  const second = shares[1] ?? 1 - first;
  const sum = first + second;
  if (sum === 0) return null;
  return mixed(a, b, second / sum, Math.min(1, sum), space);
}

function mixed(a: Rgb, b: Rgb, share: number, opacity: number, { from, to }: Space): Rgb {
  const alpha = a.alpha * (1 - share) + b.alpha * share;
  const [x, y] = [from(a.rgb), from(b.rgb)];
  const channel = (i: 0 | 1 | 2): number =>
    alpha > 0 ? (x[i] * a.alpha * (1 - share) + y[i] * b.alpha * share) / alpha : 0;
  return { rgb: to([channel(0), channel(1), channel(2)]), alpha: alpha * opacity };
}

function isShare(word: string): boolean {
  return /^[+-]?[\d.]+%$/.test(word);
}

/** null where none is given. */
function shareOf(part: string): number | null {
  const word = wordsOf(part).find(isShare);
  return word === undefined ? null : Number.parseFloat(word) / 100;
}
