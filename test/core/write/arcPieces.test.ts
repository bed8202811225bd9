import { expect, test } from 'vitest';
import { arcAsCubics, arcPieceCount, survivesRounding } from '../../../src/core/write/arcPieces.ts';

const circle = (radius: number, sweep: number) => ({
  cx: 0,
  cy: 0,
  ux: radius,
  uy: 0,
  vx: 0,
  vy: radius,
  theta0: 0.3,
  sweep,
});

test('no piece turns by more than a third of a turn', () => {
  expect(arcPieceCount(2 * Math.PI)).toBe(3);
  expect(arcPieceCount(-Math.PI)).toBe(2);
  expect(arcPieceCount(0.1)).toBe(1);
  expect(arcPieceCount(0)).toBe(1);
});

test('the cubics keep the accuracy that they were asked for, and hardly more pieces than needed', () => {
  for (const accuracy of [1e-2, 1e-3, 1e-5]) {
    for (const sweep of [0.5, 2, -6.2]) {
      let [x0, y0] = [50 * Math.cos(0.3), 50 * Math.sin(0.3)];
      let worst = 0;
      arcAsCubics(circle(50, sweep), accuracy, (ax, ay, bx, by, x1, y1) => {
        for (let k = 0; k <= 50; k++) {
          const t = k / 50;
          const s = 1 - t;
          const x = s ** 3 * x0 + 3 * s * s * t * ax + 3 * s * t * t * bx + t ** 3 * x1;
          const y = s ** 3 * y0 + 3 * s * s * t * ay + 3 * s * t * t * by + t ** 3 * y1;
          worst = Math.max(worst, Math.abs(Math.hypot(x, y) - 50));
        }
        [x0, y0] = [x1, y1];
      });
      expect(worst).toBeLessThan(accuracy);
      expect(x0).toBeCloseTo(50 * Math.cos(0.3 + sweep), 9);
      expect(y0).toBeCloseTo(50 * Math.sin(0.3 + sweep), 9);
    }
  }
});

test('one cubic for a quarter of the unit circle is off by 2.7e-4, as is well known', () => {
  let count = 0;
  arcAsCubics(circle(1, Math.PI / 2), 2.73e-4, () => count++);
  expect(count).toBe(1);
  arcAsCubics(circle(1, Math.PI / 2), 2.71e-4, () => count++);
  expect(count).toBe(3);
});

test('round arcs survive rounding, flat ones do not', () => {
  expect(survivesRounding(circle(50, 1), 1e-4)).toBe(true);
  expect(survivesRounding(circle(1e-4, 1), 1e-4)).toBe(false);
  expect(survivesRounding({ ...circle(50, 1), vy: 0.5 }, 1e-4)).toBe(false);
});
