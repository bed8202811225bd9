import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { PEN_ON_Z } from '../../../src/core/machine/penOnZ.ts';
import { measureProgram } from '../../../src/core/measure/measure.ts';
import type { Program } from '../../../src/core/program/program.ts';
import { type GcodeReadOptions, readGcode } from '../../../src/core/program/readGcode.ts';
import { runStrictly } from '../../support/gcodeMachine.ts';
import { gcodeOf } from '../../support/gcodeOf.ts';
import { anyProgram, dot, polyline, programOf, withPen } from '../../support/programs.ts';

/** Runs as lists of points; with the page's height 0, y is the machine's y with the sign turned. */
function runsOf(program: Program | null): number[][][] {
  if (program === null) throw new Error('no program');
  const { offset, data } = program.segments;
  return Array.from({ length: program.count }, (_, run) => {
    const from = program.first[run];
    const points = [[data[offset[from]], data[offset[from] + 1]]];
    for (let i = from; i < program.first[run + 1]; i++)
      points.push([data[offset[i] + 2], data[offset[i] + 3]]);
    return points.map(([x, y]) => [x + 0, 0 - y]);
  });
}

function read(lines: readonly string[], options: GcodeReadOptions = { pageHeightMm: 0 }) {
  return readGcode(`${lines.join('\n')}\n`, options);
}

function codes(lines: readonly string[]): string[] {
  return read(lines).findings.map((finding) => finding.code);
}

const DRAWS = ['G0 Z2', 'G0 X1 Y1', 'G1 Z-1 F100', 'G1 X2 Y1', 'G0 Z2', 'M2'];

describe('words (NISTIR 6556)', () => {
  test('§3.3: blanks and tabs mean nothing, nor does case: `g0x +0. 12 34y 7` is `g0 x+0.1234 y7`', () => {
    const { program } = read(['g0z2', 'g0x +0. 12 34y 7', 'g1z-1f100', 'g1\tx1y7', 'g0z2', 'm2']);
    expect(runsOf(program)).toEqual([
      [
        [0.1234, 7],
        [1, 7],
      ],
    ]);
  });

  test('§3.3.1: line numbers in any order; CR LF; blank lines', () => {
    const lines = DRAWS.map((line, i) => `N${9 - i} ${line}\r`);
    expect(runsOf(read(['', ...lines]).program)).toEqual([
      [
        [1, 1],
        [2, 1],
      ],
    ]);
  });

  test('§3.3.2.1: numbers have a sign, digits and one point, and no exponent', () => {
    const { program } = read(['G0 Z2', 'G0 X+.5 Y-0.25', 'G1 Z-1. F100', 'G1 X3.', 'G0 Z2', 'M2']);
    expect(runsOf(program)).toEqual([
      [
        [0.5, -0.25],
        [3, -0.25],
      ],
    ]);
    expect(read(['G0 X1e-3']).findings[0]).toEqual({
      code: 'gcode-bad-character',
      severity: 'error',
      place: { element: null, id: null, line: 1, column: 6 },
      values: { word: 'e', count: 1 },
    });
    for (const bad of ['G0 X', 'G0 X1.2.3', 'G0 X.', 'G0 X--1']) {
      expect(codes([bad])).toContain('gcode-bad-number');
    }
  });

  test('§3.3.2, §E.3: letters that the grammar does not know', () => {
    for (const bad of ['O100', 'E1', 'U1', 'G0 X1 *33', 'G0 X1-2', '\ufeffG21']) {
      expect(codes([bad])).toContain('gcode-bad-character');
    }
  });

  test('§3.3.4: comments anywhere, to the first closing bracket, never nested or open', () => {
    const { program } = read(['G0 Z2', 'G0 (x) X1 (y) Y1', 'G1 Z-1 F100 ; G0', 'G1 X2(M2)', 'G0 Z2', 'M2']);
    expect(runsOf(program)).toEqual([
      [
        [1, 1],
        [2, 1],
      ],
    ]);
    expect(codes(['G0 (a (b) X1'])).toContain('gcode-comment-open');
    expect(codes(['G0 X1 (a'])).toContain('gcode-comment-open');
  });

  test('§3.3.5: one word of each letter, one motion', () => {
    expect(codes(['G0 X1 X2'])).toContain('gcode-word-twice');
    expect(codes(['G0 G1 X1 F1'])).toContain('gcode-same-group');
  });

  test('§3.1: percent signs at both ends in place of M2', () => {
    const body = DRAWS.slice(0, -1);
    expect(read(['%', ...body, '%', 'rubbish']).findings).toEqual([]);
    expect(codes(body)).toEqual(['gcode-no-end']);
    expect(codes(['%', ...body])).toEqual(['gcode-no-end']);
    expect(read([...DRAWS, 'rubbish']).findings).toEqual([]);
    expect(codes(['% G0'])).toContain('gcode-bad-character');
  });

  test('expressions, offsets, cycles, other planes and rotary axes are refused, not misread', () => {
    for (const line of ['G0 X#1', 'G0 X[1+1]', '#1=2']) expect(codes([line])).toContain('gcode-expression');
    for (const line of ['G92 X0', 'G28', 'G81 X1 Y1 Z-1 R1', 'G18', 'G0 A90', 'G10 L2 P1 X1', 'G93', 'G55']) {
      expect(codes([line])).toContain('gcode-not-supported');
    }
    expect(read(['G28', ...DRAWS]).program).toBeNull();
  });

  test('words that move nothing are passed over; unknown M words are told', () => {
    const lines = ['G21 G17 G40 G49 G54 G64 G80 G90 G94 G98', 'T1 M3 S1000', 'G4 P0.5', 'M48', ...DRAWS];
    expect(read(lines).findings).toEqual([]);
    expect(read(['M62 P1', ...DRAWS]).findings).toMatchObject([
      { code: 'gcode-word-ignored', values: { word: 'M62', count: 1 } },
    ]);
    expect(codes([`/${DRAWS[0]}`, ...DRAWS])).toEqual(['gcode-optional-line']);
  });
});

describe('motion (NISTIR 6556)', () => {
  test('§3.5.7, §3.5.17: inches, steps, modal motion', () => {
    const { program } = read([
      'G20',
      'G0 Z0.1',
      'X1 Y1',
      'G91',
      'G1 Z-0.2 F10',
      'X1',
      'Y-.5',
      'G90',
      'G0 Z0.1',
      'M2',
    ]);
    expect(runsOf(program)).toEqual([
      [
        [25.4, 25.4],
        [50.8, 25.4],
        [50.8, 12.7],
      ],
    ]);
  });

  test('§3.8: units and distance mode act before the motion of their line, stops after it', () => {
    const { program } = read(['G0 Z2', 'X1 Y1 G20', 'G1 Z-1 F10', 'X2 M0', 'G0 Z2', 'M2']);
    expect(runsOf(program)[0]).toEqual([
      [25.4, 25.4],
      [50.8, 25.4],
    ]);
  });

  test('§3.5.3.2: I and J are steps from the start also in absolute mode; a circle may end at its start', () => {
    const { program } = read(['G90', 'G0 Z2', 'G0 X10 Y10', 'G1 Z-1 F9', 'G2 X10 Y10 I5 J0', 'G0 Z2', 'M2']);
    const d = program!.segments.data;
    expect([...d.slice(0, 10)]).toEqual([10, -10, 10, -10, 15, -10, 5, 0, 0, 5]);
    expect(d[11]).toBe(2 * Math.PI);
    expect(measureProgram(program!, PEN_ON_Z).drawnMm).toBeCloseTo(10 * Math.PI, 9);
  });

  test('§3.5.3.2: an arc whose radii differ by more than 0.002 mm is told', () => {
    const arc = (x: string) => ['G0 Z2', 'G0 X0 Y0', 'G1 Z-1 F9', `G2 X${x} Y0 I5 J0`, 'G0 Z2', 'M2'];
    expect(codes(arc('10.0019'))).toEqual([]);
    expect(codes(arc('10.0021'))).toEqual(['gcode-arc-radii']);
  });

  test('§3.5.3.1: R above 0 the short way, below 0 the long way; equal ends are an error', () => {
    const sweep = (arc: string) => {
      const { program } = read(['G0 Z2', 'G0 X0 Y0', 'G1 Z-1 F9', arc, 'G0 Z2', 'M2']);
      return program!.segments.data[11];
    };
    // On the page, y down, clockwise is positive.
    expect(sweep('G2 X5 Y5 R5')).toBeCloseTo(Math.PI / 2, 9);
    expect(sweep('G3 X5 Y5 R5')).toBeCloseTo(-Math.PI / 2, 9);
    expect(sweep('G2 X5 Y5 R-5')).toBeCloseTo((3 * Math.PI) / 2, 9);
    expect(sweep('G3 X10 Y0 R5')).toBeCloseTo(-Math.PI, 9);
    for (const bad of [
      'G2 X0 Y0 R5',
      'G2 X10 Y0 R4',
      'G2 X10 Y0',
      'G2 X10 Y0 R5 I5',
      'G2 X10 I0 J0',
      'G3 X1 K1',
    ]) {
      expect(codes(['G0 X0 Y0', bad])).toContain('gcode-arc-error');
    }
  });
});

describe('runs', () => {
  test('a way down and up without a move is a dot; two descents in one place are two', () => {
    const { program } = read(['G0 Z2', 'G0 X5 Y5', 'G1 Z-1 F9', 'G0 Z2', 'G1 Z-1', 'G0 Z2', 'M2']);
    expect(runsOf(program)).toEqual([
      [
        [5, 5],
        [5, 5],
      ],
      [
        [5, 5],
        [5, 5],
      ],
    ]);
  });

  test('low hops and several depths are told apart by what moves there', () => {
    const lines = [
      'G0 Z20',
      'G0 X0 Y0',
      'G0 Z1',
      'G1 Z-1 F9',
      'G1 X1',
      'G1 Z-2',
      'G1 X0',
      'G0 Z1',
      'G0 X9',
      'G1 Z-1',
      'G1 X8',
      'G0 Z20',
      'M2',
    ];
    expect(runsOf(read(lines).program)).toEqual([
      [
        [0, 0],
        [1, 0],
        [0, 0],
      ],
      [
        [9, 0],
        [8, 0],
      ],
    ]);
  });

  test('the height can be given', () => {
    const { program, findings } = read(DRAWS, { pageHeightMm: 0, markingHeightMm: -5 });
    expect(program?.count).toBe(0);
    expect(findings.map((finding) => finding.code)).toEqual(['gcode-nothing-drawn']);
  });

  test('a file that never goes up and down is refused', () => {
    expect(read(['G1 X1 Y1 F9', 'G0 X2', 'M2'])).toMatchObject({
      program: null,
      findings: [{ code: 'gcode-no-heights' }],
    });
    expect(codes(['G1 Z1 F9', 'G1 X1', 'M2'])).toEqual(['gcode-no-heights']);
    expect(codes(['G91', 'G1 Z1 F9', 'M2'])).toContain('gcode-no-heights');
  });

  test('doubtful moves are drawn, and said', () => {
    const slanted = read(['G0 Z2', 'G0 X0 Y0', 'G1 X1 Z-1 F9', 'G1 X2', 'G0 X3 Z2', 'M2']);
    expect(runsOf(slanted.program)).toEqual([
      [
        [0, 0],
        [1, 0],
        [2, 0],
        [3, 0],
      ],
    ]);
    expect(slanted.findings.map(({ code, values }) => [code, values.count])).toEqual([
      ['gcode-slanted-move', 2],
      ['gcode-rapid-down', 1],
    ]);
    expect(codes(['G0 Z2', 'G1 Z-1 F9', 'G1 X2', 'M0', 'G1 X3', 'G0 Z2', 'M2'])).toEqual(['gcode-stop-down']);
    expect(codes(['G1 X3 F9', ...DRAWS])).toEqual(['gcode-height-unknown']);
  });

  test('travel counts every leg as moved', () => {
    const { travelMm, program } = read([
      'G0 Z2',
      'G0 X3',
      'G0 Y4',
      'G1 Z-1 F9',
      'G1 X9',
      'G0 Z2',
      'G0 X0',
      'M2',
    ]);
    expect(travelMm).toBe(3 + 4 + 9);
    expect(program?.endAtHome).toBe(false);
    expect(measureProgram(program!, PEN_ON_Z).travelMm).toBe(5);
  });

  test('a stop begins a pen where runs follow', () => {
    const run = DRAWS.slice(0, -1);
    const { program } = read(['M0', ...run, 'M0', 'M0', ...run, ...run, 'T2 M6', ...run, 'M0', 'M2']);
    expect(program?.pens.map((pen) => pen.name)).toEqual(['pen 1', 'pen 2', 'pen 3']);
    expect([...program!.pen]).toEqual([0, 1, 1, 2]);
  });
});

describe('placement', () => {
  test('without it y = 0 is the top, and that is said', () => {
    const { program, placement, findings } = read(DRAWS, {});
    expect(placement).toBeNull();
    expect(findings.map((finding) => finding.code)).toEqual(['gcode-no-placement']);
    expect(program?.segments.data[1]).toBe(-1);
  });

  test('options go before the head of the file', () => {
    const gcode = gcodeOf(programOf({ runs: [polyline(10, 20, 30, 20)] }));
    const asIs = readGcode(gcode);
    expect(asIs.placement).toEqual({ pageWidthMm: 200, pageHeightMm: 100 });
    expect(asIs.program).toMatchObject({ homeX: 0, homeY: 100, endAtHome: true });
    const moved = readGcode(gcode, { pageHeightMm: 110, homeX: 0, homeY: 0 });
    expect(moved.placement).toEqual({ pageWidthMm: 200, pageHeightMm: 110 });
    expect(moved.program).toMatchObject({ homeX: 0, homeY: 0, endAtHome: false });
    expect(moved.program?.segments.data[1]).toBe(30);
  });

  test('a note after the head is a comment like any other', () => {
    const gcode = gcodeOf(programOf({ runs: [dot(1, 1)] })).replace(/\nM2\n$/, '\n(home: X5 Y5)\nM2\n');
    expect(readGcode(gcode).program?.homeX).toBe(0);
  });
});

describe('what we wrote', () => {
  test('reads back: the same pens, runs, points as written, lengths, home', () => {
    fc.assert(
      fc.property(anyProgram, (program) => {
        const gcode = gcodeOf(program);
        const { program: back, travelMm, findings } = readGcode(gcode);
        expect(findings.map((finding) => finding.code)).toEqual(
          program.count === 0 ? ['gcode-nothing-drawn'] : [],
        );
        const strict = runStrictly(gcode);
        const measure = measureProgram(back!, PEN_ON_Z);
        expect(back!.count).toBe(program.count);
        expect(measure.drawnMm).toBeCloseTo(strict.drawnMm, 6);
        expect(measure.travelMm).toBeCloseTo(strict.travelMm, 6);
        expect(travelMm).toBeCloseTo(strict.travelMm, 6);
        const used = program.pens.filter((_, pen) => program.pen.includes(pen));
        expect(back!.pens).toEqual(used);
        expect([...back!.pen].map((pen) => back!.pens[pen])).toEqual(
          [...program.pen].map((pen) => program.pens[pen]),
        );
        for (let run = 0; run < program.count; run++) {
          for (const end of [0, 1]) {
            const [a, b] = [program, back!].map((p) => {
              const i = end === 0 ? p.first[run] : p.first[run + 1] - 1;
              const o = p.segments.offset[i] + 2 * end;
              return [p.segments.data[o], p.segments.data[o + 1]];
            });
            expect(Math.abs(a[0] - b[0])).toBeLessThan(0.000501);
            expect(Math.abs(a[1] - b[1])).toBeLessThan(0.000501);
          }
        }
      }),
      { numRuns: 80 },
    );
  });

  test('written again from what was read it is the same but for the head', () => {
    fc.assert(
      fc.property(anyProgram, (program) => {
        const once = gcodeOf(program);
        const back = readGcode(once).program!;
        const twice = gcodeOf({ ...back, endAtHome: program.endAtHome });
        expect(twice.slice(twice.indexOf('G21'))).toBe(once.slice(once.indexOf('G21')));
      }),
      { numRuns: 40 },
    );
  });

  test('the heights at its head tell dots from nothing even where they are all there is', () => {
    const program = programOf({
      pens: [{ name: 'a, name b', colour: '#000000' }],
      runs: [withPen(0, dot(1, 1)), withPen(0, dot(2, 2))],
    });
    const { program: back } = readGcode(gcodeOf(program));
    expect(back?.count).toBe(2);
    expect(back?.pens).toEqual(program.pens);
  });
});
