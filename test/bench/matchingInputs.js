// Seeded point sets that pairing is measured on. Each function gives exactly n points, as columns.
import Delaunator from 'delaunator';
import { createRandom, randomBelow } from '../../dist/core/structures/random.js';

function filled(n, point) {
  const x = new Float64Array(n);
  const y = new Float64Array(n);
  for (let i = 0; i < n; i++) [x[i], y[i]] = point(i);
  return { x, y };
}

function shuffled(count, random) {
  const list = Int32Array.from({ length: count }, (_, i) => i);
  for (let i = count - 1; i > 0; i--) {
    const j = randomBelow(random, i + 1);
    [list[i], list[j]] = [list[j], list[i]];
  }
  return list;
}

/** n cells of a square grid, filled to `share`. */
function someCells(n, share, random) {
  const side = Math.ceil(Math.sqrt(n / share));
  const cells = shuffled(side * side, random);
  return filled(n, (i) => [cells[i] % side, Math.floor(cells[i] / side)]);
}

/** `size` points within `spread` of each of n / size random places. */
function groups(n, size, spread, random) {
  const places = Array.from({ length: Math.ceil(n / size) }, () => [random(), random()]);
  return filled(n, (i) => {
    const [px, py] = places[Math.floor(i / size)];
    return [px + spread * random(), py + spread * random()];
  });
}

const makers = {
  uniform: (n, random) => filled(n, () => [random(), random()]),

  clustered(n, random) {
    const centres = Array.from({ length: Math.ceil(Math.sqrt(n) / 3) }, () => [random(), random()]);
    const near = () => (random() + random() + random() + random() - 2) / 50;
    return filled(n, () => {
      const [cx, cy] = centres[randomBelow(random, centres.length)];
      return [cx + near(), cy + near()];
    });
  },

  lattice(n) {
    const side = Math.ceil(Math.sqrt(n));
    return filled(n, (i) => [i % side, Math.floor(i / side)]);
  },

  'broken lattice': (n, random) => someCells(n, 0.65, random),

  /** Corners of Voronoi cells: centres of the circles round the Delaunay triangles of random points. */
  voronoi(n, random) {
    const sites = Float64Array.from({ length: 2 * Math.ceil(0.52 * n + 40) }, random);
    const { triangles } = new Delaunator(sites);
    const found = [];
    for (let t = 0; t < triangles.length && found.length < n; t += 3) {
      const [a, b, c] = [triangles[t], triangles[t + 1], triangles[t + 2]];
      const ax = sites[2 * a];
      const ay = sites[2 * a + 1];
      const bx = sites[2 * b] - ax;
      const by = sites[2 * b + 1] - ay;
      const cx = sites[2 * c] - ax;
      const cy = sites[2 * c + 1] - ay;
      const twice = 2 * (bx * cy - by * cx);
      const x = ax + (cy * (bx * bx + by * by) - by * (cx * cx + cy * cy)) / twice;
      const y = ay + (bx * (cx * cx + cy * cy) - cx * (bx * bx + by * by)) / twice;
      if (x >= 0 && x <= 1 && y >= 0 && y <= 1) found.push([x, y]);
    }
    return filled(n, (i) => found[i]);
  },

  /** Ends of level lines 0.5 apart; each block a tilted shape of its own with an odd number of lines. */
  hatch(n, random) {
    const rows = 2 * Math.floor(Math.sqrt(n) / 8) + 1;
    let slope = 0;
    let left = 0;
    let width = 0;
    return filled(n, (i) => {
      const line = i >> 1;
      const row = line % rows;
      const block = Math.floor(line / rows);
      if (i % 2 === 0) {
        if (row === 0) {
          slope = random() - 0.5;
          left = 60 * (block % 20) + 10 * random();
        }
        width = 30 + random();
      }
      const y = rows * Math.floor(block / 20) + 0.5 * row;
      return [left + slope * row + (i % 2) * width, y];
    });
  },

  'on a line': (n, random) => filled(n, () => [random(), 3]),
  'even on a line': (n) => filled(n, (i) => [i, 0]),
  circle: (n) =>
    filled(n, (i) => [100 * Math.cos((2 * Math.PI * i) / n), 100 * Math.sin((2 * Math.PI * i) / n)]),
  'random on a circle': (n, random) =>
    filled(n, () => {
      const angle = 2 * Math.PI * random();
      return [100 * Math.cos(angle), 100 * Math.sin(angle)];
    }),
  'exponential spread': (n, random) => filled(n, () => [2 ** (-40 * random()), 2 ** (-40 * random())]),
  'odd tight clusters': (n, random) => groups(n, 7, 1e-6, random),
  'tight triples': (n, random) => groups(n, 3, 1e-6, random),
  'tight clusters of 101': (n, random) => groups(n, 101, 1e-4, random),
  'coincident, 100 a place': (n, random) => groups(n, 100, 0, random),
  'coincident triples': (n, random) => groups(n, 3, 0, random),
  'coincident, few or many'(n, random) {
    const places = Array.from({ length: Math.ceil(n / 3) }, () => [random(), random()]);
    return filled(n, () => places[randomBelow(random, places.length)]);
  },
  'two far clouds, odd': (n, random) =>
    filled(n, (i) => [random() + (i < 2 * Math.floor(n / 4) + 1 ? 0 : 1000), random()]),
  'triangular lattice'(n) {
    const side = Math.ceil(Math.sqrt(n));
    const height = Math.sqrt(3) / 2;
    return filled(n, (i) => {
      const row = Math.floor(i / side);
      return [(i % side) + (row % 2) / 2, row * height];
    });
  },
  'half-empty lattice': (n, random) => someCells(n, 0.5, random),
  'sparse lattice': (n, random) => someCells(n, 0.2, random),
  dashes: (n) => filled(n, (i) => [(i % 200) + 0.3 * (i % 2), Math.floor(i / 200) * 0.7]),
  'random walk'(n, random) {
    let x = 0;
    let y = 0;
    return filled(n, () => {
      x += random() - 0.5;
      y += random() - 0.5;
      return [x, y];
    });
  },
  spiral: (n) =>
    filled(n, (i) => {
      const turn = Math.sqrt(i);
      return [turn * Math.cos(turn), turn * Math.sin(turn)];
    }),
  'whole numbers': (n, random) => {
    const side = Math.ceil(Math.sqrt(n));
    return filled(n, () => [randomBelow(random, side), randomBelow(random, side)]);
  },
};

export const inputNames = Object.keys(makers);

/** n points of a kind; the same ones every time. */
export function makeInput(name, n, seed = 5) {
  if (!Object.hasOwn(makers, name)) throw new Error(`no such input: ${name}`);
  return makers[name](n, createRandom(seed));
}
