import fc from 'fast-check';
import { SegmentBuilder } from '../../src/core/geometry/segments.ts';
import type { Program } from '../../src/core/program/program.ts';

/** What one run draws: the builder gets its segments; each must start where the last one ended. */
export interface RunSketch {
  readonly pen?: number;
  readonly draw: (builder: SegmentBuilder) => void;
}

export interface ProgramSketch {
  readonly runs: readonly RunSketch[];
  readonly pens?: readonly { readonly name: string; readonly colour: string }[];
  readonly homeX?: number;
  readonly homeY?: number;
  readonly endAtHome?: boolean;
}

/** A program from a sketch; without further words one black pen, home at (0, 100), ending at home. */
export function programOf(sketch: ProgramSketch): Program {
  const builder = new SegmentBuilder();
  const first = [0];
  for (const run of sketch.runs) {
    run.draw(builder);
    first.push(builder.count);
  }
  const segments = builder.finish();
  return {
    segments,
    count: sketch.runs.length,
    first: Uint32Array.from(first),
    bridge: new Uint8Array(segments.count),
    pen: Uint32Array.from(sketch.runs, (run) => run.pen ?? 0),
    pens: sketch.pens ?? [{ name: 'black', colour: '#000000' }],
    homeX: sketch.homeX ?? 0,
    homeY: sketch.homeY ?? 100,
    endAtHome: sketch.endAtHome ?? true,
  };
}

/** A run of straight lines through the points x0, y0, x1, y1, … */
export function polyline(...xy: readonly number[]): RunSketch {
  return {
    draw(builder) {
      for (let i = 0; i + 3 < xy.length; i += 2) builder.line(xy[i], xy[i + 1], xy[i + 2], xy[i + 3]);
    },
  };
}

export function dot(x: number, y: number): RunSketch {
  return polyline(x, y, x, y);
}

/** A circular arc; angles in radians, growing clockwise as seen on the page. */
export function circleArc(cx: number, cy: number, r: number, theta0: number, sweep: number): RunSketch {
  const at = (theta: number) => [cx + r * Math.cos(theta), cy + r * Math.sin(theta)] as const;
  const [x0, y0] = at(theta0);
  const [x1, y1] = Math.abs(sweep) === 2 * Math.PI ? [x0, y0] : at(theta0 + sweep);
  return { draw: (builder) => builder.arc(x0, y0, x1, y1, cx, cy, r, 0, 0, r, theta0, sweep) };
}

export function withPen(pen: number, run: RunSketch): RunSketch {
  return { pen, draw: run.draw };
}

/** Lines, cubics, arcs of circles and ellipses, closed runs and dots, on a page of 200 mm by 100 mm. */
export const anyProgram: fc.Arbitrary<Program> = fc
  .record({
    // At most 26 UTF-16 units: G-code comments cut longer names, which has its own test.
    pens: fc.uniqueArray(
      fc.string({ minLength: 1, maxLength: 12, unit: 'grapheme' }).filter((name) => name.length <= 26),
      { minLength: 1, maxLength: 3 },
    ),
    runs: fc.array(fc.array(fc.nat(), { minLength: 1, maxLength: 5 }), { maxLength: 8 }),
    seed: fc.nat(),
    endAtHome: fc.boolean(),
  })
  .map(({ pens, runs, seed, endAtHome }) => {
    const random = plainRandom(seed);
    const sketches = runs.map((choices) => ({
      pen: 0,
      draw: (builder: SegmentBuilder) => drawChoices(builder, choices, random),
    }));
    sketches.forEach((run, i) => {
      run.pen = Math.floor((i * pens.length) / sketches.length);
    });
    return programOf({
      runs: sketches,
      pens: pens.map((name, i) => ({ name, colour: ['#000000', '#c00000', '#0000c0'][i] })),
      endAtHome,
    });
  });

function drawChoices(builder: SegmentBuilder, choices: readonly number[], random: () => number): void {
  let x = random() * 200;
  let y = random() * 100;
  const [startX, startY] = [x, y];
  choices.forEach((choice, i) => {
    const [x0, y0] = [x, y];
    x = random() * 200;
    y = random() * 100;
    if (choice % 8 === 7 && choices.length === 1) {
      builder.line(x0, y0, x0, y0);
    } else if (choice % 4 === 1) {
      const control = () => random() * 100;
      builder.cubic(x0, y0, control(), control(), control(), control(), x, y);
    } else if (choice % 4 === 2) {
      // A centre is found for the start: the end follows from the angles.
      const [theta0, sweep] = [random() * 6, (random() - 0.5) * 12];
      const [ux, uy] = [(random() - 0.5) * 40, (random() - 0.5) * 40];
      const k = choice % 3 === 0 ? 1 : random() * 2 - 1;
      const [vx, vy] = [-uy * k, ux * k];
      const cx = x0 - ux * Math.cos(theta0) - vx * Math.sin(theta0);
      const cy = y0 - uy * Math.cos(theta0) - vy * Math.sin(theta0);
      x = cx + ux * Math.cos(theta0 + sweep) + vx * Math.sin(theta0 + sweep);
      y = cy + uy * Math.cos(theta0 + sweep) + vy * Math.sin(theta0 + sweep);
      builder.arc(x0, y0, x, y, cx, cy, ux, uy, vx, vy, theta0, sweep);
    } else {
      if (i === choices.length - 1 && choice % 8 === 4) [x, y] = [startX, startY];
      builder.line(x0, y0, x, y);
    }
  });
}

/** A plain generator for tests (mulberry32), apart from the one under test. */
export function plainRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}
