import { describe, expect, test } from 'vitest';
import { pointAt } from '../../../src/core/geometry/evaluate.ts';
import { DEFAULT_SETTINGS, PEN_ON_Z, reportOf, tour, writeAudited } from '../../../src/core/index.ts';
import type { Network } from '../../../src/core/network/network.ts';
import {
  degreesOf as degrees,
  networkOf as networkOfDrawing,
  drawingOfPaths as read,
} from '../../support/networkOf.ts';
import { plainRandom } from '../../support/programs.ts';

const OPTIONS = { snapMm: 1e-7, junctions: 'crossing', repeats: 'keep' } as const;

function networkOf(paths: readonly string[], snapMm: number = OPTIONS.snapMm): Network {
  return networkOfDrawing(read(paths), { ...OPTIONS, snapMm });
}

/** Faces of a plane drawing: cycles of "twin, then the next half-edge round its vertex". */
function faces(network: Network): number {
  const { halfEdgeVertex, halfEdgeDirection, edgeCount, vertexCount } = network;
  const around: number[][] = Array.from({ length: vertexCount }, () => []);
  halfEdgeVertex.forEach((v, h) => {
    around[v].push(h);
  });
  const next = new Int32Array(2 * edgeCount);
  const angle = (h: number) => Math.atan2(halfEdgeDirection[2 * h + 1], halfEdgeDirection[2 * h]);
  for (const fan of around) {
    fan.sort((a, b) => angle(a) - angle(b));
    fan.forEach((h, k) => {
      next[h ^ 1] = fan[(k + 1) % fan.length];
    });
  }
  const seen = new Uint8Array(2 * edgeCount);
  let count = 0;
  for (let h = 0; h < seen.length; h++) {
    if (seen[h]) continue;
    count++;
    for (let g = h; !seen[g]; g = next[g]) seen[g] = 1;
  }
  // Every component has counted its own outside.
  return count - network.componentCount + 1;
}

describe('where lines cross', () => {
  test("Euler's formula V - E + F = 1 + C on random lines, crossings counted one by one", () => {
    const random = plainRandom(11);
    for (let round = 0; round < 60; round++) {
      const n = 2 + Math.floor(40 * random());
      const lines = Array.from({ length: n }, () =>
        Array.from({ length: 4 }, () => Math.round(9e4 * random()) / 1e3),
      );
      let crossings = 0;
      for (let a = 0; a < n; a++) for (let b = a + 1; b < n; b++) if (cross(lines[a], lines[b])) crossings++;
      const network = networkOf(lines.map(([x0, y0, x1, y1]) => `M${x0} ${y0}L${x1} ${y1}`));
      expect(network.crossings).toBe(crossings);
      expect(network.vertexCount).toBe(2 * n + crossings);
      expect(network.edgeCount).toBe(n + 2 * crossings);
      expect(network.vertexCount - network.edgeCount + faces(network)).toBe(1 + network.componentCount);
    }
  });

  test("Euler's formula on random circles", () => {
    const random = plainRandom(12);
    for (let round = 0; round < 30; round++) {
      const n = 3 + Math.floor(12 * random());
      const circles = Array.from({ length: n }, () => [
        30 + 40 * random(),
        30 + 40 * random(),
        5 + 15 * random(),
      ]);
      let crossings = 0;
      for (let a = 0; a < n; a++) {
        for (let b = a + 1; b < n; b++) {
          const gap = Math.hypot(circles[a][0] - circles[b][0], circles[a][1] - circles[b][1]);
          if (gap < circles[a][2] + circles[b][2] && gap > Math.abs(circles[a][2] - circles[b][2]))
            crossings += 2;
        }
      }
      const network = networkOf(
        circles.map(
          ([x, y, r]) => `M${x + r} ${y}A${r} ${r} 0 0 1 ${x - r} ${y}A${r} ${r} 0 0 1 ${x + r} ${y}`,
        ),
      );
      expect(network.crossings).toBe(crossings);
      expect(network.vertexCount - network.edgeCount + faces(network)).toBe(1 + network.componentCount);
    }
  });

  test('the points of both lines agree to 1e-6 mm', () => {
    const random = plainRandom(13);
    const curve = () =>
      `M${Array.from({ length: 8 }, () => (100 * random()).toFixed(3))
        .join(' ')
        .replace(/^(\S+ \S+) /, '$1C')}`;
    const drawing = read(Array.from({ length: 24 }, curve));
    const network = networkOfDrawing(drawing, { ...OPTIONS, snapMm: 1e-6 });
    const { segments } = drawing.strokes;
    const at = new Float64Array(2);
    let worst = 0;
    for (let e = 0; e < network.edgeCount; e++) {
      for (const [segment, t, half] of [
        [network.startSegment[e], network.startT[e], 2 * e],
        [network.endSegment[e], network.endT[e], 2 * e + 1],
      ]) {
        pointAt(segments, segment, t, at);
        const v = network.halfEdgeVertex[half];
        worst = Math.max(worst, Math.hypot(at[0] - network.vertexX[v], at[1] - network.vertexY[v]));
      }
    }
    expect(network.crossings).toBeGreaterThan(100);
    expect(worst).toBeLessThan(1e-6);
    expect(degrees(network).filter((d) => d === 4).length).toBe(network.crossings);
  });

  test('one line that crosses itself: a loop of a cubic, a polyline, an arc', () => {
    expect(degrees(networkOf(['M20 50C110 10 -10 10 80 50']))).toEqual([1, 1, 4]);
    expect(degrees(networkOf(['M10 10H60V30H30V0']))).toEqual([1, 1, 4]);
    expect(degrees(networkOf(['M10 50H60A10 10 0 1 1 50 40V90']))).toEqual([1, 1, 4, 4, 4]);
  });

  test('through a joint, and at an end: one vertex', () => {
    expect(degrees(networkOf(['M10 10L50 50L90 30', 'M50 10V90']))).toEqual([1, 1, 1, 1, 4]);
    expect(degrees(networkOf(['M10 10L50 50L90 30', 'M10 90L50 50L90 90']))).toEqual([1, 1, 1, 1, 4]);
    expect(degrees(networkOf(['M10 50H90', 'M50 50V90']))).toEqual([1, 1, 1, 3]);
  });

  test('circles that touch meet in one vertex', () => {
    const circle = (x: number) => `M${x + 10} 50A10 10 0 0 1 ${x - 10} 50A10 10 0 0 1 ${x + 10} 50`;
    const network = networkOf([circle(20), circle(40)]);
    expect(network.componentCount).toBe(1);
    expect(degrees(network)).toContain(4);
  });
});

describe('joining at crossings', () => {
  const ring = (x: number, y: number) =>
    `M${x + 12} ${y}A12 12 0 0 1 ${x - 12} ${y}A12 12 0 0 1 ${x + 12} ${y}`;
  const settings = { ...DEFAULT_SETTINGS, junctions: 'crossing' } as const;

  test('saves lifts where closed lines overlap, and says how many', () => {
    const ordered = tour(read([ring(30, 30), ring(45, 30), ring(60, 30), ring(60, 45)]), settings, PEN_ON_Z);
    expect(ordered.after.measure.runs).toBe(1);
    const svg = writeAudited(ordered, 'svg');
    const report = reportOf(ordered, [svg.audit, writeAudited(ordered, 'gcode').audit], 'test');
    expect(report.audit.ok).toBe(true);
    expect(report.findings.find((f) => f.code === 'crossings-paid')?.values).toMatchObject({
      count: 8,
      runs: 5,
    });
  });

  test('is given up where it saves nothing', () => {
    const ordered = tour(read(['M10 10H90']), settings, PEN_ON_Z);
    expect(ordered.crossings).toMatchObject({ count: 0, kept: false });
    expect(ordered.settings.junctions).toBe('crossing');
  });

  test('is never slower than joining where ends touch', () => {
    const random = plainRandom(14);
    for (let round = 0; round < 12; round++) {
      const paths = Array.from({ length: 10 }, () =>
        random() < 0.5
          ? ring(20 + 60 * random(), 20 + 60 * random())
          : `M${90 * random()} ${90 * random()}L${90 * random()} ${90 * random()}`,
      );
      const drawing = read(paths);
      const crossing = tour(drawing, settings, PEN_ON_Z).after.measure;
      const touching = tour(drawing, DEFAULT_SETTINGS, PEN_ON_Z).after.measure;
      expect(crossing.seconds).toBeLessThanOrEqual(touching.seconds * (1 + 1e-9));
    }
  });
});

/** Whether two lines cross strictly inside both, by the signs of four areas. */
function cross(p: readonly number[], q: readonly number[]): boolean {
  const side = (a: readonly number[], x: number, y: number) =>
    Math.sign((a[2] - a[0]) * (y - a[1]) - (a[3] - a[1]) * (x - a[0]));
  return side(p, q[0], q[1]) * side(p, q[2], q[3]) < 0 && side(q, p[0], p[1]) * side(q, p[2], p[3]) < 0;
}
