import { describe, expect, test } from 'vitest';
import { readColour } from '../../src/core/drawing/style/colour.ts';
import { COLOUR_NAMES } from '../../src/core/drawing/style/colourNames.ts';
import { SYSTEM_COLOURS } from '../../src/core/drawing/style/systemColours.ts';
import { createRandom } from '../../src/core/structures/random.ts';
import { askBrowser, CHROMIUM, useBrowser } from '../support/browser.ts';

/** Fills one pixel with each colour and reads its bytes; `invalid` where the browser refuses the text. */
const bytesOf = (colours: readonly string[]): string => `(() => {
  const canvas = document.createElementNS('http://www.w3.org/1999/xhtml', 'canvas');
  canvas.width = canvas.height = 1;
  const context = canvas.getContext('2d', { willReadFrequently: true });
  const shape = document.createElementNS('http://www.w3.org/2000/svg', 'path');
  document.documentElement.append(shape);
  return ${JSON.stringify(colours)}.map((colour) => {
    shape.style.stroke = '';
    shape.style.stroke = colour;
    if (shape.style.stroke === '') return 'invalid';
    context.fillStyle = getComputedStyle(shape).stroke.replace(/^rgba\\((.*), [^,]*\\)$/, 'rgb($1)');
    context.fillRect(0, 0, 1, 1);
    const bytes = [...context.getImageData(0, 0, 1, 1).data].slice(0, 3);
    return '#' + bytes.map((byte) => byte.toString(16).padStart(2, '0')).join('');
  });
})()`;

const random = createRandom(4);
const between = (low: number, high: number, digits = 3): string =>
  (low + (high - low) * random()).toFixed(digits);
const b = (): string => between(0, 255, 0);

/** In bytes by the standard itself, so that they have to agree exactly. */
const EXACT: Readonly<Record<string, () => string>> = {
  hex: () => `#${between(0x100000, 0xffffff, 0).slice(0, 6)}`,
  rgb: () => `rgb(${between(-20, 280, 1)} ${between(0, 255, 1)} ${between(0, 255, 1)})`,
  'rgb of old': () => `rgb(${between(0, 100, 1)}%, ${between(0, 100, 1)}%, ${between(0, 100, 1)}%)`,
  hsl: () => `hsl(${between(-400, 800, 1)} ${between(-10, 120, 1)}% ${between(-10, 110, 1)}%)`,
};

/** Worked out by the browser in single precision: a byte may come out next to ours. */
const NEAR: Readonly<Record<string, () => string>> = {
  hwb: () => `hwb(${between(0, 360)} ${between(0, 100)}% ${between(0, 100)}%)`,
  lab: () => `lab(${between(0, 100)} ${between(-125, 125)} ${between(-125, 125)})`,
  lch: () => `lch(${between(0, 100)}% ${between(0, 150)} ${between(0, 360)})`,
  oklab: () => `oklab(${between(0, 1)} ${between(-0.4, 0.4)} ${between(-0.4, 0.4)})`,
  oklch: () => `oklch(${between(0, 1)} ${between(0, 0.4)} ${between(0, 360)}deg)`,
  ...Object.fromEntries(
    ['srgb', 'srgb-linear', 'display-p3', 'a98-rgb', 'prophoto-rgb', 'rec2020', 'xyz', 'xyz-d50'].map(
      (space) => [space, () => `color(${space} ${between(0, 1)} ${between(0, 1)} ${between(0, 1)})`],
    ),
  ),
  ...Object.fromEntries(
    ['srgb', 'srgb-linear', 'oklab'].map((space) => [
      `mixed in ${space}`,
      () =>
        `color-mix(in ${space}, rgb(${b()} ${b()} ${b()}) ${between(0, 100, 0)}%, rgb(${b()} ${b()} ${b()}))`,
    ]),
  ),
};

const EACH = 200;
const browser = useBrowser();

describe.runIf(CHROMIUM !== null)('colours as a browser shows them', () => {
  const ask = async (colours: readonly string[]): Promise<string[]> => {
    const [bytes] = await askBrowser<string[]>(
      browser(),
      ['<svg xmlns="http://www.w3.org/2000/svg"/>'],
      bytesOf(colours),
    );
    return bytes;
  };

  test('names, the colours of the system and whole bytes: exactly', async () => {
    const written = Object.values(EXACT).flatMap((make) => Array.from({ length: EACH }, make));
    const colours = [...COLOUR_NAMES.keys(), ...SYSTEM_COLOURS.keys(), ...written];
    const seen = await ask(colours);
    // The browser gives the highlight behind text as a translucent colour.
    const differ = colours.filter(
      (colour, i) => readColour(colour)?.hex !== seen[i] && colour !== 'highlight',
    );
    expect(differ).toEqual([]);
  });

  test('other spaces: to the byte, or next to it', async () => {
    const colours = Object.values(NEAR).flatMap((make) => Array.from({ length: EACH }, make));
    const seen = await ask(colours);
    let exact = 0;
    const far = colours.filter((colour, i) => {
      const hex = readColour(colour)?.hex ?? '#';
      if (hex === seen[i]) exact++;
      return [1, 3, 5].some(
        (at) =>
          !(
            Math.abs(
              Number.parseInt(hex.slice(at, at + 2), 16) - Number.parseInt(seen[i].slice(at, at + 2), 16),
            ) <= 1
          ),
      );
    });
    expect(far).toEqual([]);
    console.log(`${colours.length} colours of other spaces, ${exact} to the byte`);
    expect(exact / colours.length).toBeGreaterThan(0.95);
  });
});
