// Drawings of about `n` segments as SVG texts, for the bench of the audit.
import { createRandom } from '../../dist/core/structures/random.js';

const f = (v) => `${Math.round(v * 1e4) / 1e4}`;

function sheet(side, body) {
  const size = `width="${side}mm" height="${side}mm" viewBox="0 0 ${side} ${side}"`;
  return `<svg xmlns="http://www.w3.org/2000/svg" ${size} fill="none" stroke="black">${body}</svg>`;
}

/** Patches of a hundred straight hatch lines, 0.08 mm apart. */
function hatch(n) {
  const random = createRandom(1);
  const side = Math.ceil(Math.sqrt(n / 100));
  const lines = [];
  let angle = 0;
  for (let k = 0; k < n; k++) {
    const patch = Math.floor(k / 100);
    if (k % 100 === 0) angle = 3.14 * random();
    const [c, s] = [Math.cos(angle), Math.sin(angle)];
    const [x, y] = [12 * (patch % side) + 6, 12 * Math.floor(patch / side) + 6];
    const off = ((k % 100) - 50) * 0.08;
    const [mx, my] = [x - s * off, y + c * off];
    lines.push(`M${f(mx - 4 * c)} ${f(my - 4 * s)}L${f(mx + 4 * c)} ${f(my + 4 * s)}`);
  }
  return sheet(12 * side, `<path d="${lines.join('')}"/>`);
}

/** Regions with borders of twelve segments, each drawn by both of its regions, point for point. */
function map(n) {
  const random = createRandom(2);
  const m = Math.max(1, Math.floor(Math.sqrt(n / 48)));
  const jitter = (by) => by * (random() - 0.5);
  const node = Array.from({ length: m + 1 }, (_, i) =>
    Array.from({ length: m + 1 }, (_, j) => [10 * j + jitter(3), 10 * i + jitter(3)]),
  );
  const border = (a, b) =>
    Array.from({ length: 11 }, (_, k) => {
      const t = (k + 1) / 12;
      return [a[0] + t * (b[0] - a[0]) + jitter(0.6), a[1] + t * (b[1] - a[1]) + jitter(0.6)];
    });
  const across = node.map((row) => row.slice(1).map((q, j) => border(row[j], q)));
  const down = node.slice(1).map((row, i) => row.map((q, j) => border(node[i][j], q)));
  const paths = [];
  for (let i = 0; i < m; i++) {
    for (let j = 0; j < m; j++) {
      const ring = [
        ...[node[i][j], ...across[i][j], node[i][j + 1], ...down[i][j + 1], node[i + 1][j + 1]],
        ...[...across[i + 1][j].slice().reverse(), node[i + 1][j], ...down[i][j].slice().reverse()],
      ];
      paths.push(`<path d="M${ring.map(([x, y]) => `${f(x)} ${f(y)}`).join('L')}Z"/>`);
    }
  }
  return sheet(10 * m, paths.join(''));
}

/** Smooth strokes of fifty cubics of about a mm. */
function curves(n) {
  const random = createRandom(3);
  const side = 4 * Math.ceil(Math.sqrt(n / 50));
  const paths = [];
  for (let c = 0; c < n / 50; c++) {
    let [x, y, angle] = [side * random(), side * random(), 6.28 * random()];
    let d = `M${f(x)} ${f(y)}`;
    for (let k = 0; k < 50; k++) {
      const next = angle + random() - 0.5;
      const length = 0.5 + random();
      const [dx, dy] = [length * Math.cos((angle + next) / 2), length * Math.sin((angle + next) / 2)];
      const third = length / 3;
      d += `C${f(x + third * Math.cos(angle))} ${f(y + third * Math.sin(angle))} `;
      d += `${f(x + dx - third * Math.cos(next))} ${f(y + dy - third * Math.sin(next))} ${f(x + dx)} ${f(y + dy)}`;
      [x, y, angle] = [x + dx, y + dy, next];
    }
    paths.push(`<path d="${d}"/>`);
  }
  return sheet(side, paths.join(''));
}

/** Dots at random. */
function dots(n) {
  const random = createRandom(4);
  const side = 1.5 * Math.ceil(Math.sqrt(n));
  const marks = Array.from({ length: n }, () => `M${f(side * random())} ${f(side * random())}h0`);
  return sheet(side, `<path stroke-linecap="round" d="${marks.join('')}"/>`);
}

export const KINDS = { hatch, map, curves, dots };
