import { COLOUR_NAMES } from './colourNames.js';

/** A colour as `#rrggbb`, and how opaque it is, 0 to 1. */
export interface Colour {
  readonly hex: string;
  readonly alpha: number;
}

/** Longer than any colour in earnest; matching takes time with the square of a hostile one. */
const LONGEST = 400;
const HEX = /^#(?:[0-9a-f]{3,4}|[0-9a-f]{6}|[0-9a-f]{8})$/;
const FUNCTION = /^(rgba?|hsla?|hwb)\(([^()]*)\)$/;

/**
 * A colour of CSS Color Module Level 4: hex, names, rgb(), hsl(), hwb(), in the old spelling with
 * commas and the new one; `transparent` is black with alpha 0. null for anything else.
 */
export function readColour(text: string): Colour | null {
  const t = text.trim().toLowerCase();
  if (t.length > LONGEST) return null;
  if (HEX.test(t)) return hexColour(t.slice(1));
  if (t === 'transparent') return { hex: '#000000', alpha: 0 };
  const named = COLOUR_NAMES.get(t);
  if (named !== undefined) return { hex: `#${named}`, alpha: 1 };
  const match = FUNCTION.exec(t);
  return match ? functionColour(match[1], match[2]) : null;
}

function hexColour(digits: string): Colour {
  let full = digits;
  if (digits.length <= 4) full = [...digits].map((d) => d + d).join('');
  const alpha = full.length === 8 ? Number.parseInt(full.slice(6), 16) / 255 : 1;
  return { hex: `#${full.slice(0, 6)}`, alpha };
}

const COMPONENT = /^([+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?)(%|deg|grad|rad|turn)?$/;
const DEGREES_IN: Readonly<Record<string, number>> = { deg: 1, grad: 0.9, rad: 180 / Math.PI, turn: 360 };

interface Component {
  readonly value: number;
  readonly unit: string;
}

function functionColour(name: string, list: string): Colour | null {
  const parts = list.includes(',') ? list.split(',') : list.replace('/', ' / ').trim().split(/\s+/);
  const words = parts.map((p) => p.trim());
  if (words.length === 5 && words[3] === '/') words.splice(3, 1);
  if (words.length !== 3 && words.length !== 4) return null;
  const components: Component[] = [];
  for (const word of words) {
    const match = COMPONENT.exec(word === 'none' ? '0' : word);
    if (!match) return null;
    components.push({ value: Number(match[1]), unit: match[2] ?? '' });
  }
  const [a, b, c, d] = components as [Component, Component, Component, Component?];
  const alpha = d ? clamp01(d.unit === '%' ? d.value / 100 : d.value) : 1;
  if (name.startsWith('rgb')) {
    return { hex: toHex(channel(a), channel(b), channel(c)), alpha };
  }
  const hue = (((a.value * (DEGREES_IN[a.unit] ?? 1)) % 360) + 360) % 360;
  const second = clamp01(b.value / 100);
  const third = clamp01(c.value / 100);
  const rgb = name === 'hwb' ? hwb(hue, second, third) : hsl(hue, second, third);
  return { hex: toHex(rgb[0], rgb[1], rgb[2]), alpha };
}

function channel(component: Component): number {
  return component.unit === '%' ? component.value / 100 : component.value / 255;
}

/** CSS Color 4, §7.1, "Converting HSL Colors to sRGB". */
function hsl(hue: number, saturation: number, light: number): [number, number, number] {
  const a = saturation * Math.min(light, 1 - light);
  const f = (n: number): number => {
    const k = (n + hue / 30) % 12;
    return light - a * Math.max(-1, Math.min(k - 3, 9 - k, 1));
  };
  return [f(0), f(8), f(4)];
}

/** CSS Color 4, §8.1, "Converting HWB Colors to sRGB". */
function hwb(hue: number, white: number, black: number): [number, number, number] {
  if (white + black >= 1) {
    const grey = white / (white + black);
    return [grey, grey, grey];
  }
  const [r, g, b] = hsl(hue, 1, 0.5);
  const scale = 1 - white - black;
  return [r * scale + white, g * scale + white, b * scale + white];
}

function toHex(r: number, g: number, b: number): string {
  const byte = (v: number): string =>
    Math.round(clamp01(v) * 255)
      .toString(16)
      .padStart(2, '0');
  return `#${byte(r)}${byte(g)}${byte(b)}`;
}

function clamp01(v: number): number {
  return v > 0 ? Math.min(v, 1) : 0;
}
