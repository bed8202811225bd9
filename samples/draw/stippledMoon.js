import { createRandom, shuffled } from './random.js';
import { dot, svg } from './svg.js';

const CENTRE = 50;
const RADIUS = 42;
const DOTS = 1500;
/** Towards the light, of length one: from the upper left, in front. */
const LIGHT = [-0.6, -0.48, 0.64];
/** Craters: centre and radius in radii of the moon. */
const CRATERS = [
  [-0.34, -0.3, 0.25],
  [0.2, -0.02, 0.19],
  [-0.36, 0.33, 0.17],
  [0.08, -0.6, 0.15],
];

/** How dark the sphere is at (u, v) within the unit circle: 0 white, 1 black. */
function darkness(u, v) {
  const lit = u * LIGHT[0] + v * LIGHT[1] + Math.sqrt(1 - u * u - v * v) * LIGHT[2];
  const shade = 1 - Math.max(0, lit);
  let dark = 0.04 + 0.96 * shade * shade * shade;
  for (const [cx, cy, r] of CRATERS) {
    const [du, dv] = [(u - cx) / r, (v - cy) / r];
    // Towards the light the wall lies in its own shadow; away from it, it is lit.
    const across = (du * LIGHT[0] + dv * LIGHT[1]) / 0.768;
    if (du * du + dv * dv < 1) dark = across > 0 ? dark + (1 - dark) * across : dark * (1 + across);
  }
  return Math.max(dark, 0.03);
}

/**
 * Dots strewn until no more fit, each keeping a distance that grows with the light; then the distance
 * shrinks a little (dart throwing with a shrinking radius, after McCool & Fiume 1992).
 */
export function stippledMoon() {
  const random = createRandom(1500);
  const dots = [];
  let reach = 9;
  let missed = 0;
  while (dots.length < DOTS) {
    const [u, v] = [2 * random() - 1, 2 * random() - 1];
    if (u * u + v * v > 1) continue;
    const [x, y] = [CENTRE + RADIUS * u, CENTRE + RADIUS * v];
    const square = (reach * reach) / darkness(u, v);
    if (dots.some(([px, py]) => (x - px) * (x - px) + (y - py) * (y - py) < square)) {
      if (++missed % 1000 === 0) reach *= 0.96;
    } else dots.push([x, y]);
  }
  return svg(
    100,
    100,
    'A moon of 1,500 dots',
    shuffled(dots, random).map(([x, y]) => dot(x, y)),
    {
      stroke: '#1d2b53',
      strokeWidth: 0.6,
    },
  );
}
