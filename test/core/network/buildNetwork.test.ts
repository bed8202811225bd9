import { describe, expect, test } from 'vitest';
import type { Drawing } from '../../../src/core/drawing/drawing.ts';
import { buildNetwork } from '../../../src/core/network/buildNetwork.ts';
import { fewestRuns } from '../../../src/core/network/fewestRuns.ts';
import type { Network, NetworkOptions } from '../../../src/core/network/network.ts';
import { createRandom } from '../../../src/core/structures/random.ts';
import { drawingOf, type StrokeSpec } from '../../support/drawings.ts';

const OPTIONS: NetworkOptions = {
  snapMm: 0.05,
  accuracyMm: 0.02,
  junctions: 'touching',
  repeats: 'once',
  repeatToleranceMm: 0.01,
};

function networkOf(specs: readonly StrokeSpec[], options: Partial<NetworkOptions> = {}): Network {
  const drawing = drawingOf(specs);
  return buildNetwork(drawing, allStrokes(drawing), { ...OPTIONS, ...options });
}

function allStrokes(drawing: Drawing): Uint32Array {
  return Uint32Array.from({ length: drawing.strokes.count }, (_, i) => i);
}

const square = (x: number, y: number): StrokeSpec => ({
  line: [
    [x, y],
    [x + 10, y],
    [x + 10, y + 10],
    [x, y + 10],
  ],
  closed: true,
});

const lengthOf = (network: Network) => network.edgeLengthMm.reduce((sum, length) => sum + length, 0);

describe('junctions', () => {
  test('two lines that meet at an end share a vertex', () => {
    const n = networkOf([
      {
        line: [
          [0, 0],
          [10, 0],
        ],
      },
      {
        line: [
          [10, 0],
          [10, 10],
        ],
      },
    ]);
    expect([n.vertexCount, n.edgeCount, n.componentCount, n.oddVertices.length]).toEqual([3, 2, 1, 2]);
  });

  test('an end on the inside of a line splits it there', () => {
    const specs: StrokeSpec[] = [
      {
        line: [
          [0, 0],
          [10, 0],
        ],
      },
      {
        line: [
          [4, 0.03],
          [4, 10],
        ],
      },
    ];
    const n = networkOf(specs);
    expect([n.vertexCount, n.edgeCount, n.componentCount]).toEqual([4, 3, 1]);
    // The line stays where it is: the vertex is on it, and the other line is led to it.
    expect(Array.from(n.vertexY)).toContain(0);
    expect(Array.from(n.vertexY)).not.toContain(0.03);
    expect(n.snapMaxMm).toBeCloseTo(0.03, 12);
    expect(networkOf(specs, { junctions: 'ends' }).componentCount).toBe(2);
    expect(networkOf(specs, { snapMm: 0.02 }).componentCount).toBe(2);
  });

  test('an end on an arc and an end on a cubic split them on the exact curve', () => {
    const angle = 0.7;
    const arc = networkOf([
      { circle: [50, 50, 20] },
      {
        line: [
          [50 + 20 * Math.cos(angle), 50 + 20 * Math.sin(angle)],
          [90, 90],
        ],
      },
    ]);
    expect(arc.componentCount).toBe(1);
    const spoke = Math.hypot(40 - 20 * Math.cos(angle), 40 - 20 * Math.sin(angle));
    expect(lengthOf(arc)).toBeCloseTo(2 * Math.PI * 20 + spoke, 9);
    const onCircle = Array.from(arc.vertexX, (x, v) => Math.hypot(x - 50, arc.vertexY[v] - 50));
    expect(onCircle.filter((r) => Math.abs(r - 20) < 1e-9).length).toBe(2);

    // The middle of this cubic is (50, 75).
    const cubic = networkOf([
      {
        cubic: [
          [0, 0],
          [0, 100],
          [100, 100],
          [100, 0],
        ],
      },
      {
        line: [
          [50, 75],
          [50, 90],
        ],
      },
    ]);
    expect([cubic.componentCount, cubic.edgeCount]).toEqual([1, 3]);
    const split = Array.from(cubic.startT).filter((t) => t > 0 && t < 1);
    expect(split.length).toBe(1);
    expect(split[0]).toBeCloseTo(0.5, 9);
  });

  test("an end on its own stroke's inside closes a loop, as in a 6", () => {
    const n = networkOf([
      {
        line: [
          [0, 0],
          [0, 10],
          [5, 10],
          [5, 5],
          [0, 5],
        ],
      },
    ]);
    expect([n.edgeCount, n.componentCount]).toEqual([2, 1]);
    expect(n.oddVertices.length).toBe(2);
  });

  test('hatching at a pitch of just the snap distance, at any angle, is never split at its own ends', () => {
    const random = createRandom(8);
    for (let k = 0; k < 400; k++) {
      const angle = 6.28 * random();
      const [c, s] = [Math.cos(angle), Math.sin(angle)];
      const [x0, y0] = [20 + 10 * random(), 20 + 10 * random()];
      const hatch = Array.from({ length: 12 }, (_, i): StrokeSpec => {
        const [x, y] = [x0 - s * 0.05 * i, y0 + c * 0.05 * i];
        return {
          line: [
            [x, y],
            [x + 8 * c, y + 8 * s],
          ],
        };
      });
      const n = networkOf(hatch);
      expect(n.edgeCount).toBe(12);
      expect(Math.min(...n.edgeLengthMm)).toBeGreaterThan(7.9);
    }
  });

  test('an end that only passes near the start of another snaps to that end and splits nothing', () => {
    const n = networkOf([
      {
        line: [
          [0, 0],
          [10, 0],
        ],
      },
      {
        line: [
          [9.98, 0.01],
          [9.98, 9],
        ],
      },
    ]);
    expect([n.edgeCount, n.vertexCount]).toEqual([2, 3]);
  });

  test('ends that touch a line within a hair of each other split it once', () => {
    const teeth = [4, 4.02, 4.04].map(
      (x): StrokeSpec => ({
        line: [
          [x, 0],
          [x, 5],
        ],
      }),
    );
    const n = networkOf([
      {
        line: [
          [0, 0],
          [10, 0],
        ],
      },
      ...teeth,
    ]);
    expect(n.edgeCount).toBe(5);
    expect(Math.min(...n.edgeLengthMm)).toBeGreaterThan(3);
    expect(n.componentCount).toBe(1);
  });

  test('three hatch lines that end on both sides of a frame make twelve ends odd or even as they should', () => {
    const frame: StrokeSpec = {
      line: [
        [0, 0],
        [10, 0],
        [10, 10],
        [0, 10],
      ],
      closed: true,
    };
    const hatch = [2, 4, 6].map(
      (x): StrokeSpec => ({
        line: [
          [x, 0],
          [x, 10],
        ],
      }),
    );
    const n = networkOf([frame, ...hatch]);
    expect(n.componentCount).toBe(1);
    expect(n.oddVertices.length).toBe(6);
    expect(n.edgeCount).toBe(7 + 3);
    expect(fewestRuns(n)).toBe(3);
  });
});

describe('what is drawn once', () => {
  const shared: StrokeSpec[] = [
    {
      line: [
        [0, 0],
        [10, 0],
      ],
    },
    {
      line: [
        [10, 0],
        [0, 0],
      ],
    },
    {
      line: [
        [0, 0.004],
        [10, 0.004],
      ],
    },
  ];

  test('an exact repeat, in either direction and within the repeat tolerance, is left out', () => {
    const n = networkOf(shared);
    expect(n.edgeCount).toBe(1);
    expect(n.edgeStroke[0]).toBe(0);
    expect(n.repeatedMm).toBeCloseTo(20, 9);
  });

  test('repeats are kept on request', () => {
    expect(networkOf(shared, { repeats: 'keep' }).edgeCount).toBe(3);
  });

  test('hatching at a pitch of 0.05 mm is no repeat, whatever the snap distance', () => {
    const hatch = Array.from(
      { length: 20 },
      (_, i): StrokeSpec => ({
        line: [
          [0, 0.05 * i],
          [10, 0.05 * i],
        ],
      }),
    );
    const n = networkOf(hatch);
    expect(n.edgeCount).toBe(20);
    expect(n.repeatedMm).toBe(0);
  });

  test('two curves between the same ends that differ are both drawn', () => {
    const n = networkOf([
      {
        cubic: [
          [0, 0],
          [0, 5],
          [10, 5],
          [10, 0],
        ],
      },
      {
        cubic: [
          [0, 0],
          [0, -5],
          [10, -5],
          [10, 0],
        ],
      },
      {
        cubic: [
          [10, 0],
          [10, 5],
          [0, 5],
          [0, 0],
        ],
      },
    ]);
    expect(n.edgeCount).toBe(2);
    expect(n.oddVertices.length).toBe(0);
  });

  test('sides shared by frames are drawn once', () => {
    const n = networkOf([square(0, 0), square(10, 0), square(10, 10), square(0, 10)]);
    expect(n.repeatedMm).toBeCloseTo(40, 9);
    expect(lengthOf(n)).toBeCloseTo(120, 9);
    // The five inner points, and the corner where the first frame starts.
    expect([n.vertexCount, n.edgeCount, n.oddVertices.length]).toEqual([6, 9, 4]);
  });

  test('a lattice of 6 x 8 panes, each a closed frame, falls into single sides', () => {
    const panes: StrokeSpec[] = [];
    for (let i = 0; i < 6; i++) for (let j = 0; j < 8; j++) panes.push(square(10 * i, 10 * j));
    const n = networkOf(panes);
    expect(n.repeatedMm).toBeCloseTo(820, 6);
    expect(lengthOf(n)).toBeCloseTo(1100, 6);
    expect(n.oddVertices.length).toBe(24);
  });

  test('a border of many points shared by two areas is one piece', () => {
    const border = Array.from({ length: 30 }, (_, i) => [20 + Math.sin(i), 2 * i] as const);
    const left: StrokeSpec = { line: [[0, 0], ...border, [0, 58]], closed: true };
    const right: StrokeSpec = { line: [[40, 58], ...[...border].reverse(), [40, 0]], closed: true };
    const n = networkOf([left, right]);
    const single = border
      .slice(1)
      .reduce((sum, [x, y], i) => sum + Math.hypot(x - border[i][0], y - border[i][1]), 0);
    expect(n.repeatedMm).toBeCloseTo(single, 6);
    expect([n.edgeCount, n.oddVertices.length]).toEqual([5, 2]);
  });

  test('the same ring again, begun elsewhere and the other way round, is drawn once', () => {
    const ring = Array.from({ length: 12 }, (_, i) => [20 + 9 * Math.cos(i), 20 + 9 * Math.sin(i)] as const);
    const again = [...ring.slice(5), ...ring.slice(0, 5)].reverse();
    const n = networkOf([
      { line: ring, closed: true },
      { line: again, closed: true },
    ]);
    expect(n.repeatedMm).toBeCloseTo(lengthOf(n), 6);
  });

  test('a stroke that goes back on itself is drawn one way', () => {
    const n = networkOf([
      {
        line: [
          [10, 10],
          [90, 10],
        ],
        closed: true,
      },
    ]);
    expect([n.edgeCount, n.oddVertices.length]).toEqual([1, 2]);
    expect(n.repeatedMm).toBeCloseTo(80, 9);
  });

  test('two lines that cross at a joint of both are joined there', () => {
    const n = networkOf([
      {
        line: [
          [0, 5],
          [5, 5],
          [10, 5],
        ],
      },
      {
        line: [
          [5, 0],
          [5, 5],
          [5, 10],
        ],
      },
    ]);
    expect([n.componentCount, n.edgeCount, n.vertexCount]).toEqual([1, 4, 5]);
  });
});

describe('dots and small things', () => {
  test('dots survive, each at its own place, whatever the snap distance', () => {
    const dots = Array.from({ length: 10 }, (_, i): StrokeSpec => ({ dot: [5 + 0.03 * i, 5] }));
    const n = networkOf(dots);
    expect([n.edgeCount, n.vertexCount, n.componentCount]).toEqual([10, 10, 10]);
    expect(n.oddVertices.length).toBe(0);
  });

  test('the same dot again is drawn once, or as often as it stands', () => {
    const dots: StrokeSpec[] = [{ dot: [5, 5] }, { dot: [5, 5] }, { dot: [5.004, 5] }];
    expect(networkOf(dots).edgeCount).toBe(1);
    expect(networkOf(dots, { repeats: 'keep' }).edgeCount).toBe(3);
  });

  test('a dot on a line is drawn with the line', () => {
    const n = networkOf([
      {
        line: [
          [0, 0],
          [10, 0],
        ],
      },
      { dot: [5, 0.01] },
      { dot: [5, 0.04] },
      { dot: [5, 1] },
      { dot: [5, 1] },
    ]);
    // Within the repeat tolerance, not the snap distance: a dot beside a line is a dot.
    expect([n.edgeCount, n.dotsOnLines, n.repeatedDots]).toEqual([3, 1, 1]);
  });

  test('a closed curve and a line smaller than the snap distance survive', () => {
    const n = networkOf([
      { circle: [5, 5, 0.01] },
      {
        line: [
          [8, 8],
          [8.02, 8],
        ],
      },
    ]);
    expect(n.componentCount).toBe(2);
    expect(lengthOf(n)).toBeCloseTo(2 * Math.PI * 0.01 + 0.02, 9);
  });
});

describe('closed curves', () => {
  test('a circle that touches nothing may be entered at eight places', () => {
    const n = networkOf([{ circle: [50, 50, 20] }]);
    expect([n.vertexCount, n.edgeCount, n.componentCount, n.oddVertices.length]).toEqual([8, 8, 1, 0]);
    expect(lengthOf(n)).toBeCloseTo(2 * Math.PI * 20, 9);
  });

  test('a triangle may be entered at its corners only', () => {
    const n = networkOf([
      {
        line: [
          [0, 0],
          [10, 0],
          [5, 8],
        ],
        closed: true,
      },
    ]);
    expect([n.vertexCount, n.edgeCount]).toEqual([3, 3]);
  });

  test('a closed line of 500 points gets 32 places, well spread', () => {
    const ring = Array.from({ length: 500 }, (_, i) => {
      const a = (2 * Math.PI * i) / 500;
      return [50 + 30 * Math.cos(a), 50 + 30 * Math.sin(a)] as const;
    });
    const n = networkOf([{ line: ring, closed: true }]);
    expect(n.edgeCount).toBe(32);
    const mean = lengthOf(n) / 32;
    for (const length of n.edgeLengthMm) expect(Math.abs(length - mean)).toBeLessThan(0.2 * mean);
  });
});
