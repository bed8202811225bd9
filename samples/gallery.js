// Draws before/after pictures for the README from files that were written and read back: `npm run gallery`.
// Left: the drawing as it stands; right: as ordered. Travel in the air is the dashed line.
import { mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import {
  DEFAULT_SETTINGS,
  PEN_ON_Z,
  readDrawing,
  reportOf,
  sideOfDrawing,
  tour,
  writeAudited,
  writeSvg,
} from '../dist/core/index.js';

const samples = new URL('./', import.meta.url);
const gallery = new URL('./gallery/', import.meta.url);
mkdirSync(gallery, { recursive: true });
/** Those the README shows; others by name on the command line. */
const SHOWN =
  process.argv.length > 2 ? process.argv.slice(2) : ['hatched-leaf', 'motif-sheet', 'stippled-moon'];

for (const file of readdirSync(samples).filter((name) => name.endsWith('.svg'))) {
  const name = file.replace(/\.svg$/, '');
  if (!SHOWN.includes(name)) continue;
  const drawing = readDrawing(readFileSync(new URL(file, samples), 'utf8'), { name });
  const { widthMm, heightMm } = drawing;
  const ordered = tour(drawing, DEFAULT_SETTINGS, PEN_ON_Z);
  const before = writeSvg(sideOfDrawing(drawing, DEFAULT_SETTINGS).program, {
    widthMm,
    heightMm,
    travel: true,
  });
  const { text: after, audit } = writeAudited(ordered, 'svg', true);
  if (!audit.ok) throw new Error(`${name}: the audit failed`);
  const report = reportOf(ordered, [audit], '');
  writeFileSync(new URL(`${name}.svg`, gallery), sideBySide(before, after, widthMm, heightMm, report));
}

function sideBySide(before, after, width, height, report) {
  const gap = width * 0.06;
  const foot = width * 0.09;
  const letters = width * 0.045;
  const caption = (x, { travelMm, runs }) =>
    `<text x="${x}" y="${height + foot * 0.7}" font-family="sans-serif" font-size="${letters}" fill="#555555">${runs} runs, ${Math.round(travelMm)} mm in the air</text>`;
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${2 * width + gap} ${height + foot}" width="900">`,
    `<rect width="100%" height="100%" fill="#ffffff"/>`,
    placed(before, 0),
    placed(after, width + gap),
    caption(0, report.before),
    caption(width + gap, report.after),
    '</svg>',
    '',
  ].join('\n');

  function placed(svg, x) {
    const inner = svg
      .replace(/^<\?xml.*\n/, '')
      .replace('<svg ', `<svg x="${x}" y="0" overflow="visible" `)
      .replace(/width="[\d.]+mm" height="[\d.]+mm"/, `width="${width}" height="${height}"`)
      .replace('stroke="#808080"', 'stroke="#d9480f"')
      .trim();
    return inner;
  }
}
