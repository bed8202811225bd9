import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { PEN_ON_Z } from '../../../src/core/machine/penOnZ.ts';
import { readGcode } from '../../../src/core/program/readGcode.ts';
import { INTERPRETER, interpret } from '../../support/gcodeInterpreter.ts';
import { runStrictly } from '../../support/gcodeMachine.ts';
import { gcodeOf } from '../../support/gcodeOf.ts';
import { anyProgram, dot, programOf, withPen } from '../../support/programs.ts';

/**
 * Our G-code, and our reading of G-code, before an outside judge: the stand-alone interpreter in
 * Debian's linuxcnc-uspace package. test/support/fetchInterpreter.sh gets it. Without it these tests
 * cannot be made and say so; in CI that is a failure.
 */
const here = INTERPRETER !== null;
if (!here) console.warn('No interpreter here: run test/support/fetchInterpreter.sh for the outside check.');

test('in CI the interpreter is there', () => {
  expect(here || !process.env.CI, 'run test/support/fetchInterpreter.sh first').toBe(true);
});

/** Sums over canonical moves; the machine starts at its zero. */
function sums(moves: ReturnType<typeof interpret>['moves']) {
  let [x, y, z] = [0, 0, 0];
  let [feedMm, traverseMm, descents] = [0, 0, 0];
  for (const move of moves) {
    const length = Math.hypot(move.x - x, move.y - y);
    if (move.kind === 'feed') feedMm += length;
    else traverseMm += length;
    if (move.kind === 'feed' && move.z < z) descents++;
    [x, y, z] = [move.x, move.y, move.z];
  }
  return { feedMm, traverseMm, descents };
}

describe.runIf(here)('what we write', () => {
  test('runs without error and moves as written', () => {
    fc.assert(
      fc.property(anyProgram, (program) => {
        const gcode = gcodeOf(program);
        const judged = interpret(gcode);
        expect(judged.error).toBeNull();
        expect(judged.ended).toBe(true);
        const ours = runStrictly(gcode);
        expect(judged.stops).toBe(ours.stops.length);
        expect(judged.messages).toHaveLength(ours.stops.length);
        expect(judged.moves.map(({ kind, x, y, z }) => `${kind} ${x} ${y} ${z}`)).toEqual(
          ours.moves.map(({ feed, to }) => `${feed ? 'feed' : 'traverse'} ${to.join(' ')}`),
        );
        const sum = sums(judged.moves);
        expect(sum.feedMm).toBeCloseTo(ours.drawnMm, 6);
        expect(sum.traverseMm).toBeCloseTo(ours.travelMm, 6);
        expect(sum.descents).toBe(program.count);
      }),
      { numRuns: 10 },
    );
  });

  test('names of every kind stay comments', () => {
    const names = ['MSG, stop', 'debug, #5220', 'a) M30 (b', '%', '; G91', 'тушь', '\n', 'x'.repeat(400)];
    const program = programOf({
      pens: names.map((name) => ({ name, colour: '#123456' })),
      runs: names.map((_, pen) => withPen(pen, dot(pen, pen))),
    });
    const judged = interpret(gcodeOf(program, PEN_ON_Z, names.join(' ')));
    expect(judged.error).toBeNull();
    expect(judged.stops).toBe(names.length - 1);
    expect(sums(judged.moves).descents).toBe(names.length);
  });
});

describe.runIf(here)('what we read', () => {
  const coordinate = fc.integer({ min: -50000, max: 50000 }).map((n) => n / 1000);

  test('arcs by I and J: the same centre, ends and turn', () => {
    fc.assert(
      fc.property(
        fc.array(
          fc.record({
            dx: coordinate,
            dy: coordinate,
            angle: fc.double({ min: 0.01, max: 6.2, noNaN: true }),
            code: fc.constantFrom('G2', 'g3', 'G02', 'G 3'),
          }),
          { minLength: 30, maxLength: 60 },
        ),
        fc.constantFrom('G21', 'G20'),
        (arcs, unit) => {
          const lines = [unit, 'G90', 'G0 Z3', 'G0 X0 Y0', 'G1 Z-1 F900'];
          let [x, y] = [0, 0];
          for (const { dx, dy, angle, code } of arcs) {
            const [i, j] = [dx.toFixed(4), dy.toFixed(4)];
            const [cx, cy] = [x + Number(i), y + Number(j)];
            const turn = /2/.test(code) ? -angle : angle;
            const [c, s] = [Math.cos(turn), Math.sin(turn)];
            const [rx, ry] = [x - cx, y - cy];
            if (Math.hypot(rx, ry) < 1) continue;
            x = Number((cx + rx * c - ry * s).toFixed(4));
            y = Number((cy + rx * s + ry * c).toFixed(4));
            lines.push(`${code} X${x.toFixed(4)} Y${y.toFixed(4)} I${i} J${j}`);
          }
          lines.push('G0 Z3', 'M2', '');
          compareArcs(lines.join('\n'), unit === 'G20' ? 25.4 : 1);
        },
      ),
      { numRuns: 3 },
    );
  });

  test('arcs by R: the same centre, short way and long way', () => {
    fc.assert(
      fc.property(
        fc.array(
          fc.record({
            dx: coordinate,
            dy: coordinate,
            share: fc.double({ min: 0.55, max: 3, noNaN: true }),
            code: fc.constantFrom('G2', 'G3'),
            long: fc.boolean(),
          }),
          { minLength: 30, maxLength: 60 },
        ),
        (arcs) => {
          const lines = ['G21', 'G91', 'G0 Z3', 'G1 Z-4 F900'];
          for (const { dx, dy, share, code, long } of arcs) {
            const chord = Math.hypot(dx, dy);
            if (chord < 1) continue;
            const radius = (long ? -1 : 1) * chord * share;
            lines.push(`${code} X${dx.toFixed(3)} Y${dy.toFixed(3)} R${radius.toFixed(4)}`);
          }
          lines.push('G0 Z4', 'M2', '');
          compareArcs(lines.join('\n').replace('G91\n', 'G90\nG0 X0 Y0 Z0\nG91\n'), 1);
        },
      ),
      { numRuns: 3 },
    );
  });

  test('a full circle, and half circles either way', () => {
    compareArcs('G21 G90\nG0 Z2\nG0 X10 Y10\nG1 Z-1 F100\nG2 X10 Y10 I5 J0\nG3 X20 I5\nG0 Z2\nM2\n', 1);
  });

  function compareArcs(gcode: string, mmPerUnit: number): void {
    const judged = interpret(gcode);
    expect(judged.error).toBeNull();
    const wanted = judged.moves.filter((move) => move.kind === 'arc');
    const { program, findings } = readGcode(gcode, { pageHeightMm: 0 });
    expect(findings.filter((finding) => finding.severity === 'error')).toEqual([]);
    const { offset, data, kind, count } = program!.segments;
    const arcs = Array.from({ length: count }, (_, i) => i).filter((i) => kind[i] === 2);
    expect(arcs).toHaveLength(wanted.length);
    arcs.forEach((i, k) => {
      const o = offset[i];
      const [x1, y1, cx, cy] = [data[o + 2], -data[o + 3], data[o + 4], -data[o + 5]];
      const tolerance = 1.1e-4 * mmPerUnit;
      expect(Math.abs(x1 - wanted[k].x * mmPerUnit)).toBeLessThan(tolerance);
      expect(Math.abs(y1 - wanted[k].y * mmPerUnit)).toBeLessThan(tolerance);
      expect(Math.abs(cx - wanted[k].centreX * mmPerUnit)).toBeLessThan(tolerance);
      expect(Math.abs(cy - wanted[k].centreY * mmPerUnit)).toBeLessThan(tolerance);
      // Rotation 1 is counter-clockwise with y up: on the page, y down, that is a negative sweep.
      expect(Math.sign(data[o + 11])).toBe(-wanted[k].rotation);
    });
  }

  test('our runs are its feeds, whatever way they are written', () => {
    fc.assert(
      fc.property(anyProgram, (program) => {
        const plain = gcodeOf(program);
        const rough = roughen(plain);
        const judged = interpret(rough);
        expect(judged.error).toBeNull();
        const read = readGcode(rough).program;
        expect(read?.count).toBe(program.count);
        expect(read?.count).toBe(sums(judged.moves).descents);
      }),
      { numRuns: 5 },
    );
  });
});

/** The same program with line numbers, small letters, blanks inside numbers, CR LF, and text after M2. */
function roughen(gcode: string): string {
  return `${gcode
    .split('\n')
    .map((line, i) =>
      line === '' || line.startsWith('(')
        ? line
        : `N${i} ${line
            .toLowerCase()
            .replace(/(\d)(\d)/g, '$1 $2')
            .replace(/ x/, '\tX +')
            .replace('+-', '-')}`,
    )
    .join('\r\n')}g0 x1\r\n`;
}
