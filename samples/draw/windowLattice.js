import { svg } from './svg.js';

/** Six by eight panes of 10 mm, each a closed rectangle: every bar inside stands there twice. */
export function windowLattice() {
  const panes = [];
  for (let row = 0; row < 8; row++) {
    for (let column = 0; column < 6; column++) {
      panes.push(`<rect x="${10 + 10 * column}" y="${10 + 10 * row}" width="10" height="10"/>`);
    }
  }
  return svg(80, 100, 'A window lattice, 6 x 8 panes of 10 mm', panes, { stroke: '#5b3a1a' });
}
