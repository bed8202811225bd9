import { line, path, svg } from './svg.js';

/** A leaf's outline and 120 slanted lines that end on it, drawn from the tip, all in one direction. */
export function hatchedLeaf() {
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
    path('M10 40C35 0 85 0 110 40C85 80 35 80 10 40Z'),
    ...hatch,
    path('M110 40C113 41 115 44 116 48'),
  ]);
}
