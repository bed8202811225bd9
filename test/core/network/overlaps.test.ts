import { describe, expect, test } from 'vitest';
import { drawingOfPaths, networkOf as networkOfDrawing } from '../../support/networkOf.ts';
import { plainRandom } from '../../support/programs.ts';

function networkOf(...paths: string[]) {
  return networkOfDrawing(drawingOfPaths(paths));
}

function repeated(...paths: string[]): number {
  return networkOf(...paths).repeatedMm;
}

describe('lines that run on each other for a while', () => {
  test('a corner on the inside of a line', () => {
    expect(repeated('M10 10H60', 'M20 30V10H40V30')).toBeCloseTo(20, 9);
    expect(repeated('M20 30V10H40V30', 'M60 10H10')).toBeCloseTo(20, 9);
    expect(repeated('M10 10L60 35', 'M20 30L20 15L40 25L40 90')).toBeCloseTo(Math.sqrt(500), 9);
  });

  test('what they have in common is between two vertices, at the corners', () => {
    const network = networkOf('M10 10H60', 'M20 30V10H40V30');
    const at = Array.from(network.vertexX, (x, v) => `${x} ${network.vertexY[v]}`);
    expect(at.sort()).toEqual(['10 10', '20 10', '20 30', '40 10', '40 30', '60 10']);
    expect(network.edgeCount).toBe(5);
  });

  test('an arc that leaves a circle, either way round', () => {
    const circle = 'M58 50A8 8 0 0 1 42 50A8 8 0 0 1 58 50';
    expect(repeated(circle, 'M50 58A8 8 0 0 1 50 42L80 42')).toBeCloseTo(8 * Math.PI, 6);
    expect(repeated(circle, 'M80 42L50 42A8 8 0 0 0 50 58')).toBeCloseTo(8 * Math.PI, 6);
    expect(repeated(circle, 'M50 30V42A8 8 0 0 1 58 50H70')).toBeCloseTo(4 * Math.PI, 6);
  });

  test('a line that leaves another smoothly', () => {
    expect(repeated('M10 50H100', 'M20 20V50H60A20 20 0 0 1 80 70')).toBeCloseTo(40, 9);
  });

  test('lines that only touch, or part at a small angle, have nothing in common', () => {
    expect(repeated('M10 50H100', 'M50 90A20 20 0 0 1 50 50A20 20 0 0 1 50 90')).toBe(0);
    expect(repeated('M10 10L90 10', 'M10 10L90 10.5')).toBe(0);
    expect(repeated('M10 10L90 10', 'M5 9.8L90 10.5')).toBe(0);
  });

  test('part of a cubic, cut by itself', () => {
    // De Casteljau at 1/2 of 0,0 30,60 60,-60 90,0: the second half is 45,0 60,-15 75,-30 90,0.
    expect(repeated('M0 0C30 60 60 -60 90 0', 'M45 20V0C60 -15 75 -30 90 0L120 0')).toBeGreaterThan(48);
    const part = repeated('M0 0C30 60 60 -60 90 0', 'M45 20V0C60 -15 75 -30 90 0L120 0');
    expect(part).toBeCloseTo(repeated('M45 0C60 -15 75 -30 90 0', 'M45 0C60 -15 75 -30 90 0'), 6);
  });

  test('a stroke that runs on itself', () => {
    expect(repeated('M10 10H60V30H20V10H40V50')).toBeCloseTo(20, 9);
    expect(repeated('M10 10H60V20H80V10H30V0')).toBeCloseTo(30, 9);
  });

  test('three layers are drawn once', () => {
    expect(repeated('M10 10H60', 'M20 30V10H40V30', 'M25 5V10H50V5')).toBeCloseTo(20 + 25, 9);
  });

  test('the first in the drawing stays, whichever way the others run', () => {
    const network = networkOf('M20 30V10H40V30', 'M60 10H10');
    const drawnOfFirst = network.edgeLengthMm.filter((_, e) => network.edgeStroke[e] === 0);
    expect(drawnOfFirst.reduce((sum, length) => sum + length, 0)).toBeCloseTo(60, 9);
  });

  test('crossing, touching and hatching at 0.05 mm are no repeats', () => {
    expect(repeated('M10 10L90 90', 'M10 90L90 10', 'M10 12L90 91')).toBe(0);
    expect(repeated('M10 50A20 20 0 1 1 50 50', 'M30 10A20 20 0 1 1 70 10')).toBe(0);
    const hatch = Array.from({ length: 40 }, (_, k) => `M${10 + k} ${(10 + 0.05 * k).toFixed(2)}h50v5`);
    expect(repeated(...hatch)).toBe(0);
  });
});

describe('chains against chains', () => {
  test('the same border with other points between is drawn once', () => {
    const random = plainRandom(7);
    let wrong = 0;
    for (let round = 0; round < 60; round++) {
      const points: [number, number][] = [[20 + 5 * random(), 100]];
      while (points.length < 12) {
        const [x, y] = points[points.length - 1];
        points.push([x + 4 + 8 * random(), y + 20 * (random() - 0.5)]);
      }
      const [from, to] = [1 + Math.floor(3 * random()), 7 + Math.floor(4 * random())];
      const shared = points.slice(from, to + 1);
      const lengthMm = shared
        .slice(1)
        .reduce((sum, p, i) => sum + Math.hypot(p[0] - shared[i][0], p[1] - shared[i][1]), 0);
      const dense = shared.flatMap((p, i) => (i === 0 ? [p] : [between(shared[i - 1], p, random()), p]));
      if (random() < 0.5) dense.reverse();
      const [first, last] = [dense[0], dense[dense.length - 1]];
      const other = [[first[0], first[1] + 40], ...dense, [last[0], last[1] + 40]];
      const found = repeated(pathOf(points), pathOf(other));
      if (Math.abs(found - lengthMm) > 0.02) wrong++;
    }
    expect(wrong).toBe(0);
  });
});

function between(a: readonly number[], b: readonly number[], share: number): [number, number] {
  return [a[0] + share * (b[0] - a[0]), a[1] + share * (b[1] - a[1])];
}

function pathOf(points: readonly (readonly number[])[]): string {
  return `M${points.map(([x, y]) => `${x} ${y}`).join('L')}`;
}
