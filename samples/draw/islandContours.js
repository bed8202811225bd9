import { createRandom, shuffled } from './random.js';
import { n, path, svg } from './svg.js';

/** Bumps of the form height / (1 + q), q a quadratic form about (x, y): no function that engines round differently. */
const BUMPS = [
  { x: 56, y: 53, height: 10, a: 1 / 420, b: -1 / 1500, c: 1 / 260 },
  { x: 106, y: 39, height: 7.4, a: 1 / 300, b: 1 / 1400, c: 1 / 340 },
  // Spurs and bays, which keep the coast from being two ovals.
  { x: 80, y: 75, height: 2.2, a: 1 / 260, b: 0, c: 1 / 180 },
  { x: 30, y: 31, height: 1.5, a: 1 / 200, b: 1 / 600, c: 1 / 160 },
  { x: 86, y: 17, height: -1.1, a: 1 / 180, b: 0, c: 1 / 140 },
  { x: 118, y: 67, height: 1.1, a: 1 / 150, b: -1 / 500, c: 1 / 150 },
];

const COAST = 3;
const STEP = 0.262;

/** Height and slope at a point. */
function hill(x, y) {
  let [f, fx, fy] = [0, 0, 0];
  for (const bump of BUMPS) {
    const [dx, dy] = [x - bump.x, y - bump.y];
    const w = 1 / (1 + bump.a * dx * dx + 2 * bump.b * dx * dy + bump.c * dy * dy);
    f += bump.height * w;
    fx -= 2 * bump.height * w * w * (bump.a * dx + bump.b * dy);
    fy -= 2 * bump.height * w * w * (bump.b * dx + bump.c * dy);
  }
  return { f, fx, fy };
}

/** Moves a point along the slope onto the level (Newton). */
function onto(level, x, y) {
  for (let i = 0; i < 4; i++) {
    const { f, fx, fy } = hill(x, y);
    const step = (level - f) / (fx * fx + fy * fy);
    x += step * fx;
    y += step * fy;
  }
  return [x, y];
}

/** The summit near a point: uphill in small steps. */
function summit(x, y) {
  for (let i = 0; i < 4000; i++) {
    const { fx, fy } = hill(x, y);
    x += 0.5 * fx;
    y += 0.5 * fy;
  }
  return [x, y];
}

/** Points 0.25 mm apart around the contour that the walk due west from (x, y) meets first. */
function trace(level, x, y) {
  while (hill(x, y).f > level) x -= 0.05;
  const points = [onto(level, x, y)];
  const [x0, y0] = points[0];
  for (;;) {
    const [px, py] = points[points.length - 1];
    const { fx, fy } = hill(px, py);
    const slope = Math.sqrt(fx * fx + fy * fy);
    const next = onto(level, px - (0.25 * fy) / slope, py + (0.25 * fx) / slope);
    const [dx, dy] = [next[0] - x0, next[1] - y0];
    if (points.length > 10 && dx * dx + dy * dy < 0.25 * 0.25) return points;
    points.push(next);
  }
}

/** A closed smooth curve through some of the points, tangents across the slope. */
function smooth(points, start) {
  const parts = Math.max(8, Math.round(points.length / 22));
  const knots = Array.from(
    { length: parts },
    (_, i) => points[(start + Math.floor((i * points.length) / parts)) % points.length],
  );
  const d = [`M${n(knots[0][0])} ${n(knots[0][1])}`];
  const tangent = ([x, y]) => {
    const { fx, fy } = hill(x, y);
    const slope = Math.sqrt(fx * fx + fy * fy);
    return [-fy / slope, fx / slope];
  };
  knots.forEach(([x, y], i) => {
    const end = knots[(i + 1) % parts];
    const [dx, dy] = [end[0] - x, end[1] - y];
    const chord = Math.sqrt(dx * dx + dy * dy);
    const [t0, t1] = [tangent([x, y]), tangent(end)];
    // Handles as for a circular arc that leaves its chord at half the angle between the tangents.
    const turn = (t) => (2 * chord) / (3 * (1 + (t[0] * dx + t[1] * dy) / chord));
    const [h0, h1] = [turn(t0), turn(t1)];
    d.push(
      `C${n(x + h0 * t0[0])} ${n(y + h0 * t0[1])} ${n(end[0] - h1 * t1[0])} ${n(end[1] - h1 * t1[1])} ${n(end[0])} ${n(end[1])}`,
    );
  });
  return `${d.join('')}Z`;
}

/** Forty closed contour lines of a hill with two tops and the saddle between, in no order, none touching. */
export function islandContours() {
  const random = createRandom(40);
  const [west, east] = [summit(56, 53), summit(106, 39)];
  const contours = [];
  for (let level = COAST; level < hill(...west).f; level += STEP) contours.push(trace(level, ...west));
  for (let level = COAST; level < hill(...east).f; level += STEP) {
    const contour = trace(level, ...east);
    // Below the saddle both tops share one line.
    const twin = contours.some((other) =>
      other.some(([x, y]) => {
        const [dx, dy] = [x - contour[0][0], y - contour[0][1]];
        return dx * dx + dy * dy < 0.2 * 0.2;
      }),
    );
    if (!twin) contours.push(contour);
  }
  const curves = contours.map((points) => path(smooth(points, Math.floor(random() * points.length))));
  return svg(148, 105, 'Contour lines of an island', shuffled(curves, random), {
    stroke: '#7a4a21',
    strokeWidth: 0.25,
  });
}
