import { colourFunction, type Rgb } from './colourFunction.js';
import { COLOUR_NAMES } from './colourNames.js';
import { SYSTEM_COLOURS } from './systemColours.js';

/** A colour as `#rrggbb`, and how opaque it is, 0 to 1. */
export interface Colour {
  readonly hex: string;
  readonly alpha: number;
}

/** Longer than any colour in earnest; matching takes time with the square of a hostile one. */
const LONGEST = 400;
const HEX = /^#(?:[0-9a-f]{3,4}|[0-9a-f]{6}|[0-9a-f]{8})$/;

/**
 * A colour of CSS Color Module Level 4 in any of its forms, and of Level 5 light-dark() and color-mix() in
 * the commonest spaces; those outside sRGB are clipped to it channel by channel, as browsers show them on a
 * common screen. `transparent` is black with alpha 0. null for anything else.
 */
export function readColour(text: string): Colour | null {
  const t = text.trim().toLowerCase();
  if (t.length > LONGEST) return null;
  const plain = plainColour(t);
  if (plain || !t.endsWith(')')) return plain;
  const colour = colourFunction(t, rgbOf);
  return colour && { hex: toHex(colour), alpha: colour.alpha };
}

/** A colour by its digits or its name. */
function plainColour(t: string): Colour | null {
  if (HEX.test(t)) return hexColour(t.slice(1));
  if (t === 'transparent') return { hex: '#000000', alpha: 0 };
  const named = COLOUR_NAMES.get(t) ?? SYSTEM_COLOURS.get(t);
  return named === undefined ? null : { hex: `#${named}`, alpha: 1 };
}

/** For the colours that others are mixed of: not rounded, and each worked out once, however deep. */
function rgbOf(t: string): Rgb | null {
  const plain = plainColour(t);
  if (!plain) return t.endsWith(')') ? colourFunction(t, rgbOf) : null;
  const channel = (at: number): number => Number.parseInt(plain.hex.slice(at, at + 2), 16) / 255;
  return { rgb: [channel(1), channel(3), channel(5)], alpha: plain.alpha };
}

function hexColour(digits: string): Colour {
  let full = digits;
  if (digits.length <= 4) full = [...digits].map((d) => d + d).join('');
  const alpha = full.length === 8 ? Number.parseInt(full.slice(6), 16) / 255 : 1;
  return { hex: `#${full.slice(0, 6)}`, alpha };
}

function toHex({ rgb }: Rgb): string {
  const byte = (v: number): string =>
    Math.round((v > 0 ? Math.min(v, 1) : 0) * 255)
      .toString(16)
      .padStart(2, '0');
  return `#${byte(rgb[0])}${byte(rgb[1])}${byte(rgb[2])}`;
}
