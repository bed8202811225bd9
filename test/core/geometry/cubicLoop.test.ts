import { expect, test } from 'vitest';
import { selfIntersections } from '../../../src/core/geometry/cubicLoop.ts';
import { createRandom } from '../../../src/core/structures/random.ts';
import { build, type Curve, circle, place } from '../../support/curves.ts';

function loop(curve: Curve): [number, number] | null {
  let found: [number, number] | null = null;
  selfIntersections(build(curve), 0, (s, t) => {
    expect(found).toBeNull();
    found = [s, t];
  });
  return found;
}

const cubic = (...points: number[]): Curve => ({ kind: 'cubic', points });

test('a symmetric loop crosses on its axis, where the closed form says', () => {
  // x(t) = t (1 − t)(… ) is symmetric about t = 1/2: control points (0,0) (30,20) (−10,20) (20,0).
  // x(t) − 10 = −10 + 90 t − 210 t² + 140 t³ with roots 1/2 and (1/2 ± √(3/28)).
  const found = loop(cubic(0, 0, 30, 20, -10, 20, 20, 0));
  expect(found?.[0]).toBeCloseTo(0.5 - Math.sqrt(3 / 28), 14);
  expect(found?.[1]).toBeCloseTo(0.5 + Math.sqrt(3 / 28), 14);
});

test('an S, an arch, a cusp, a quadratic, a line and an arc have no loop', () => {
  expect(loop(cubic(0, 0, 10, 40, 20, -40, 30, 0))).toBeNull();
  expect(loop(cubic(0, 0, 10, 20, 20, 20, 30, 0))).toBeNull();
  expect(loop(cubic(0, 0, 30, 10, 0, 10, 30, 0))).toBeNull();
  expect(loop(cubic(0, 0, 10, 10, 20, 10, 30, 0))).toBeNull();
  expect(loop(cubic(0, 0, 20, 0, -10, 0, 10, 0))).toBeNull();
  expect(loop({ kind: 'line', points: [0, 0, 1, 1] })).toBeNull();
  expect(loop(circle(0, 0, 1))).toBeNull();
});

test('a closed cubic does not cross itself at its joint', () => {
  expect(loop(cubic(0, 0, 30, 30, -30, 30, 0, 0))).toBeNull();
});

test('2,000 random cubics against dense chords', () => {
  const random = createRandom(5);
  let loops = 0;
  for (let n = 0; n < 2000; n++) {
    const curve = cubic(...Array.from({ length: 8 }, () => (random() - 0.5) * 100));
    const found = loop(curve);
    const points = Array.from({ length: 101 }, (_, k) => place(curve, k / 100));
    let chords: [number, number] | null = null;
    for (let k = 0; k < 100; k++) {
      for (let l = k + 2; l < 100; l++) {
        if (cross(points[k], points[k + 1], points[l], points[l + 1])) chords = [k / 100, l / 100];
      }
    }
    if (found) {
      const [s, t] = found;
      const [p, q] = [place(curve, s), place(curve, t)];
      expect(Math.hypot(p[0] - q[0], p[1] - q[1])).toBeLessThan(1e-10);
    }
    // Chords may miss a loop smaller than they are, or one that just closes at an end.
    const sure = found ? found[1] - found[0] > 0.05 && found[0] > 0.02 && found[1] < 0.98 : false;
    if (sure) expect(chords, `cubic ${n}`).not.toBeNull();
    if (chords) {
      expect(found, `cubic ${n}`).not.toBeNull();
      expect(Math.abs((found?.[0] ?? 0) - chords[0])).toBeLessThan(0.03);
      expect(Math.abs((found?.[1] ?? 0) - chords[1])).toBeLessThan(0.03);
      loops++;
    }
  }
  expect(loops).toBeGreaterThan(50);
});

type Point = readonly [number, number];

function cross(p: Point, q: Point, r: Point, s: Point): boolean {
  const side = (a: Point, b: Point, c: Point): number =>
    (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
  return side(p, q, r) * side(p, q, s) < 0 && side(r, s, p) * side(r, s, q) < 0;
}
