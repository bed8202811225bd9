import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

/**
 * Open sets of stroke icons in the npm registry, drawn by many hands on a grid of 24 px: development
 * dependencies only. Icons are chosen by plain rule, and no check names one.
 */
export const ICON_SETS = {
  lucide: { package: 'lucide-static 1.62.0', licence: 'ISC, parts of it MIT', folder: 'icons' },
  heroicons: { package: 'heroicons 2.2.0', licence: 'MIT', folder: '24/outline' },
  iconoir: { package: 'iconoir 7.12.1', licence: 'MIT', folder: 'icons/regular' },
} as const;
const CELL_PX = 40;

export interface Icon {
  readonly name: string;
  /** The file as it is, with its size where it does not say: a grid of 24 px. */
  readonly text: string;
  /** What stands inside its root element. */
  readonly body: string;
}

export function readIcons(set: keyof typeof ICON_SETS = 'lucide'): Icon[] {
  const { package: named, folder } = ICON_SETS[set];
  const path = fileURLToPath(new URL(`../../node_modules/${named.split(' ')[0]}/${folder}`, import.meta.url));
  return readdirSync(path)
    .filter((file) => file.endsWith('.svg'))
    .sort()
    .map((file) => {
      const read = readFileSync(join(path, file), 'utf8');
      const text = /<svg[^>]*\swidth=/.test(read)
        ? read
        : read.replace('<svg', '<svg width="24" height="24"');
      const body = text.slice(text.indexOf('>', text.indexOf('<svg')) + 1, text.lastIndexOf('</svg>'));
      return { name: file.slice(0, -'.svg'.length), text, body };
    });
}

/** Every n-th icon, so that `count` of them come from all over the alphabet. */
export function spread(icons: readonly Icon[], count: number): Icon[] {
  return Array.from({ length: count }, (_, i) => icons[Math.floor((i * icons.length) / count)]);
}

/** Left upper corner of the cell of icon i. */
export function cellPx(i: number, columns: number): [number, number] {
  return [CELL_PX * (i % columns), CELL_PX * Math.floor(i / columns)];
}

/** The number of the cell in which the middle of a box lies. */
export function cellOf([x0, y0, x1, y1]: readonly number[], columns: number): number {
  return Math.floor((x0 + x1) / 2 / CELL_PX) + columns * Math.floor((y0 + y1) / 2 / CELL_PX);
}

/** The icon files as they are, each a nested `svg` in a cell of its own. */
export function sheetAsTheyAre(icons: readonly Icon[], columns: number): string {
  const cells = icons.map(({ text }, i) => {
    const [x, y] = cellPx(i, columns);
    return text.replace('<svg', `<svg x="${x}" y="${y}"`);
  });
  return sheet(cells, icons.length, columns);
}

/** The icons by turns under each of the ways in which drawings move, turn, bend and copy things. */
export function sheetTransformed(icons: readonly Icon[], columns: number): string {
  const style = 'fill="none" stroke="currentColor" stroke-width="2" stroke-linecap="round"';
  const cells = icons.map(({ body }, i) => {
    const [x, y] = cellPx(i, columns);
    const group = (transform: string) =>
      `<g ${style} transform="translate(${x + 20} ${y + 20}) ${transform} translate(-12,-12)">${body}</g>`;
    const nested = (rest: string) =>
      `<svg ${style} x="${x + 2}" y="${y + 4}" width="36" height="30" viewBox="0 0 24 24" ${rest}>${body}</svg>`;
    const use = (rest: string) =>
      `<use href="#icon-${i}" ${style} x="${x + 1}" y="${y + 2}" width="38" height="30" ${rest}/>`;
    switch (i % 10) {
      case 0:
        return group(`rotate(${7 * i})`);
      case 1:
        return group('matrix(-1 0 0 1 0 0)');
      case 2:
        return group('scale(1.25,.75)');
      case 3:
        return group('skewX(20)');
      case 4:
        return group('rotate(30)skewY(-15)scale(.9)');
      case 5:
        return nested('preserveAspectRatio="none"');
      case 6:
        return nested('preserveAspectRatio="xMaxYMid meet"');
      case 7:
        return nested('preserveAspectRatio="xMinYMin slice" overflow="visible"');
      case 8:
        return `${use('')}<symbol id="icon-${i}" viewBox="0 0 24 24">${body}</symbol>`;
      default:
        return `<defs><g id="icon-${i}">${body}</g></defs>${use('transform="rotate(4) translate(2e0-3)"')}`;
    }
  });
  return sheet(cells, icons.length, columns);
}

function sheet(cells: readonly string[], count: number, columns: number): string {
  const [width, height] = [columns * CELL_PX, Math.ceil(count / columns) * CELL_PX];
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}">\n${cells.join('\n')}\n</svg>\n`;
}
