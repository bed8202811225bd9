// Draws the samples, so that they can be redrawn and changed: `node samples/draw.js`.
// Everything here is invented; the same script gives the same bytes.
import { writeFileSync } from 'node:fs';

const here = (name) => new URL(name, import.meta.url);
const n = (value) => String(Math.round(value * 1000) / 1000);
const svg = (width, height, title, body) =>
  `<svg xmlns="http://www.w3.org/2000/svg" width="${width}mm" height="${height}mm" viewBox="0 0 ${width} ${height}" fill="none" stroke="#000000" stroke-width="0.3" stroke-linecap="round">\n<title>${title}</title>\n${body.join('\n')}\n</svg>\n`;
const line = (x0, y0, x1, y1) => `<line x1="${n(x0)}" y1="${n(y0)}" x2="${n(x1)}" y2="${n(y1)}"/>`;

/** The puzzle house, its eight lines in no good order. */
function oneStrokeHouse() {
  const [left, right, floor, eaves, ridge] = [10, 110, 170, 70, 20];
  const lines = [
    line(left, eaves, right, eaves),
    line(right, floor, left, eaves),
    line(60, ridge, left, eaves),
    line(left, floor, right, floor),
    line(right, eaves, 60, ridge),
    line(left, floor, left, eaves),
    line(right, eaves, left, floor),
    line(right, eaves, right, floor),
  ];
  return svg(120, 180, 'A house in one stroke', lines);
}

/** A leaf's outline and 120 slanted lines that end on it, drawn from the tip, all in one direction. */
function hatchedLeaf() {
  const curve = (x0, y0, ax, ay, bx, by, x1, y1) => (t) => {
    const u = 1 - t;
    const mix = (p, a, b, q) => u * u * u * p + 3 * u * u * t * a + 3 * u * t * t * b + t * t * t * q;
    return [mix(x0, ax, bx, x1), mix(y0, ay, by, y1)];
  };
  const upper = curve(10, 40, 35, 0, 85, 0, 110, 40);
  const lower = curve(10, 40, 35, 80, 85, 80, 110, 40);
  const slant = 0.45;
  // Where the slanted line through (x, 40) meets a curve: its x, sheared, grows along the curve.
  const meet = (at, x) => {
    let [a, b] = [0, 1];
    for (let i = 0; i < 60; i++) {
      const t = (a + b) / 2;
      const [px, py] = at(t);
      if (px - slant * (40 - py) < x) a = t;
      else b = t;
    }
    return at(a);
  };
  const hatch = [];
  for (let i = 1; i <= 120; i++) {
    const x = 10 + (100 * i) / 121;
    hatch.push(line(...meet(lower, x), ...meet(upper, x)));
  }
  return svg(120, 80, 'A hatched leaf', [
    '<path d="M10 40C35 0 85 0 110 40C85 80 35 80 10 40Z"/>',
    ...hatch,
    '<path d="M110 40C113 41 115 44 116 48"/>',
  ]);
}

/** A small board: tracks with ring pads, holes to drill, an edge with rounded corners. */
function boardThreeLayers() {
  const pads = [];
  for (let i = 0; i < 8; i++) pads.push([12 + 5 * i, 12], [12 + 5 * i, 28]);
  const pad = ([x, y]) => `<circle cx="${n(x)}" cy="${n(y)}" r="1"/>`;
  const track = (points) => `<polyline points="${points.map(([x, y]) => `${n(x)},${n(y)}`).join(' ')}"/>`;
  const tracks = [];
  // Six upper pads go to the lower pad two places on: down, 45 degrees, down.
  for (let i = 0; i < 6; i++) {
    const x = 12 + 5 * i;
    tracks.push(
      track([
        [x, 13],
        [x, 15],
        [x + 10, 25],
        [x + 10, 27],
      ]),
    );
  }
  // The pads left over are joined side by side, from ring to ring.
  for (const [x, y] of [
    [42, 12],
    [12, 28],
  ]) {
    tracks.push(
      track([
        [x + 1, y],
        [x + 4, y],
      ]),
    );
  }
  const drill = pads.map(([x, y]) => `<path d="M${n(x)} ${n(y)}h0"/>`);
  return svg(60, 40, 'A board in three layers', [
    '<g id="front" aria-label="front" stroke="#b03a2e">',
    ...pads.map(pad),
    ...tracks,
    '</g>',
    '<g id="drill" aria-label="drill" stroke="#1f618d">',
    ...drill,
    '</g>',
    '<g id="edge" aria-label="edge" stroke="#1e8449">',
    '<circle cx="5" cy="5" r="1.6"/>',
    '<circle cx="55" cy="35" r="1.6"/>',
    '<path d="M4 1H56A3 3 0 0 1 59 4V36A3 3 0 0 1 56 39H4A3 3 0 0 1 1 36V4A3 3 0 0 1 4 1Z"/>',
    '</g>',
  ]);
}

const samples = {
  'one-stroke-house.svg': oneStrokeHouse(),
  'hatched-leaf.svg': hatchedLeaf(),
  'board-three-layers.svg': boardThreeLayers(),
};
for (const [name, text] of Object.entries(samples)) writeFileSync(here(name), text);
