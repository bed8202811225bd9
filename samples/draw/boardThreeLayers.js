import { dot, n, path, polyline, svg } from './svg.js';

/** A small board: tracks with ring pads, holes to drill, an edge with rounded corners. */
export function boardThreeLayers() {
  const pads = [];
  for (let i = 0; i < 8; i++) pads.push([12 + 5 * i, 12], [12 + 5 * i, 28]);
  const pad = ([x, y]) => `<circle cx="${n(x)}" cy="${n(y)}" r="1"/>`;
  const tracks = [];
  // Six upper pads go to the lower pad two places on: down, 45 degrees, down.
  for (let i = 0; i < 6; i++) {
    const x = 12 + 5 * i;
    tracks.push(
      polyline([
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
      polyline([
        [x + 1, y],
        [x + 4, y],
      ]),
    );
  }
  const drill = pads.map(([x, y]) => dot(x, y));
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
    path('M4 1H56A3 3 0 0 1 59 4V36A3 3 0 0 1 56 39H4A3 3 0 0 1 1 36V4A3 3 0 0 1 4 1Z'),
    '</g>',
  ]);
}
