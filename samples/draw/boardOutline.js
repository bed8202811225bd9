import { createRandom, shuffled } from './random.js';
import { n, path, svg } from './svg.js';

/**
 * By how much the end of each stroke misses the start of the next, in micrometres: 2 to 8 in length,
 * as if a board program had rounded the two differently.
 */
const MISSES = [
  [2, 1],
  [-3, 4],
  [1, -7],
  [5, 5],
  [-4, -1],
  [1, -2],
  [3, 6],
  [-7, 1],
  [-1, 3],
  [4, -4],
  [-2, -6],
  [6, 2],
  [-1, 5],
  [7, -3],
];

/** Strokes end to end: each is [start x, start y, way to the end: (x, y) => path data]; the last meets the first. */
const loops = () => {
  const to = (x, y) => `L${n(x)} ${n(y)}`;
  const arc = (r) => (x, y) => `A${r} ${r} 0 0 1 ${n(x)} ${n(y)}`;
  const [left, top, right, bottom, r] = [5, 5, 85, 55, 4];
  // Inside corners are round, as a cutter leaves them.
  const notch = (x, y) => `V10A1 1 0 0 0 38 11H52A1 1 0 0 0 53 10L${n(x)} ${n(y)}`;
  const edge = [
    [left + r, top, to],
    [37, top, notch],
    [53, top, to],
    [right - r, top, arc(r)],
    [right, top + r, to],
    [right, bottom - r, arc(r)],
    [right - r, bottom, to],
    [left + r, bottom, arc(r)],
    [left, bottom - r, to],
    [left, top + r, arc(r)],
  ];
  const lying = [
    [17, 41, (x, y) => `H33A1.5 1.5 0 0 1 ${n(x)} ${n(y)}`],
    [33, 44, (x, y) => `H17A1.5 1.5 0 0 1 ${n(x)} ${n(y)}`],
  ];
  const standing = [
    [74, 22, (x, y) => `V36A1.5 1.5 0 0 1 ${n(x)} ${n(y)}`],
    [71, 36, (x, y) => `V22A1.5 1.5 0 0 1 ${n(x)} ${n(y)}`],
  ];
  return [edge, lying, standing];
};

/** A board's edge with a notch and two slots: three loops in fourteen strokes whose ends just miss. */
export function boardOutline() {
  const misses = [...MISSES];
  const strokes = loops().flatMap((loop) =>
    loop.map(([x, y, way], i) => {
      const [nextX, nextY] = loop[(i + 1) % loop.length];
      const [dx, dy] = misses.shift();
      return path(`M${n(x)} ${n(y)}${way(nextX + dx / 1000, nextY + dy / 1000)}`);
    }),
  );
  return svg(
    90,
    60,
    "A board's edge, 80 x 50 mm, with a notch and two slots",
    shuffled(strokes, createRandom(14)),
    {
      stroke: '#1e6f5c',
      strokeWidth: 0.2,
    },
  );
}
