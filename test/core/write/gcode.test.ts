import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { PEN_ON_Z } from '../../../src/core/machine/penOnZ.ts';
import { programBounds } from '../../../src/core/measure/bounds.ts';
import { measureProgram } from '../../../src/core/measure/measure.ts';
import { CAUTIONS } from '../../../src/core/write/cautions.ts';
import { writeGcode } from '../../../src/core/write/gcode.ts';
import { runStrictly } from '../../support/gcodeMachine.ts';
import { codeOf, gcodeOf, PAGE } from '../../support/gcodeOf.ts';
import { anyProgram, circleArc, dot, polyline, programOf, withPen } from '../../support/programs.ts';

const TWO_PENS = {
  pens: [
    { name: 'red', colour: '#ff0000' },
    { name: 'Tusche (schwarz) 100 %', colour: '#000000' },
  ],
  runs: [withPen(0, polyline(10, 90, 20, 90, 20, 80)), withPen(1, dot(30, 30))],
};

describe('the moves', () => {
  test('the whole code of two pens', () => {
    expect(codeOf(gcodeOf(programOf(TWO_PENS)))).toEqual([
      'G21',
      'G90',
      'G17',
      'G94',
      'G0 Z3',
      'G0 X10 Y10',
      'G1 Z0 F600',
      'G1 X20 Y10 F2400',
      'G1 X20 Y20',
      'G0 Z3',
      'G0 X0 Y0',
      'M0',
      'G0 Z3',
      'G0 X30 Y70',
      'G1 Z0 F600',
      'G0 Z3',
      'G0 X0 Y0',
      'M2',
    ]);
  });

  test('the last pen stays where it is when told so', () => {
    const code = codeOf(gcodeOf(programOf({ ...TWO_PENS, endAtHome: false })));
    expect(code.slice(-3)).toEqual(['G1 Z0 F600', 'G0 Z3', 'M2']);
  });

  test('two runs that meet are two descents with no travel between', () => {
    const code = codeOf(gcodeOf(programOf({ runs: [polyline(0, 100, 5, 100), polyline(5, 100, 9, 100)] })));
    expect(code.slice(4)).toEqual([
      'G0 Z3',
      'G0 X0 Y0',
      'G1 Z0 F600',
      'G1 X5 Y0 F2400',
      'G0 Z3',
      'G1 Z0 F600',
      'G1 X9 Y0 F2400',
      'G0 Z3',
      'G0 X0 Y0',
      'M2',
    ]);
  });

  test('points written alike are one point; a run that shrinks to one still marks', () => {
    const tiny = polyline(50, 50, 50.0001, 50, 50.0002, 50.0001);
    const code = codeOf(gcodeOf(programOf({ runs: [tiny] })));
    expect(code.slice(5, 8)).toEqual(['G0 X50 Y50', 'G1 Z0 F600', 'G0 Z3']);
  });

  test('an empty program raises the pen and ends', () => {
    const gcode = gcodeOf(programOf({ runs: [] }));
    expect(codeOf(gcode)).toEqual(['G21', 'G90', 'G17', 'G94', 'G0 Z3', 'M2']);
    expect(runStrictly(gcode).descents).toBe(0);
  });

  test('a circle keeps the accuracy of the profile, and no more lines than that takes', () => {
    const { moves } = runStrictly(gcodeOf(programOf({ runs: [circleArc(100, 50, 10, 0, 2 * Math.PI)] })));
    const sides = moves.filter((move) => move.feed && move.from[2] === move.to[2]);
    // n = ⌈π / acos(1 − e/r)⌉, the sagitta's formula, with e less the rounding.
    const e = PEN_ON_Z.accuracyMm - Math.SQRT1_2 / 1000;
    expect(sides).toHaveLength(Math.ceil(Math.PI / Math.acos(1 - e / 10)));
    for (const { from, to } of sides) {
      const middle = Math.hypot((from[0] + to[0]) / 2 - 100, (from[1] + to[1]) / 2 - 50);
      expect(10 - middle).toBeLessThanOrEqual(PEN_ON_Z.accuracyMm);
    }
  });
});

describe('the comments', () => {
  test('the head says what a reader needs, and no clock or path', () => {
    const gcode = gcodeOf(programOf(TWO_PENS), PEN_ON_Z, 'Wappen (groß)');
    const head = gcode.slice(0, gcode.indexOf('G21')).trimEnd().split('\n');
    expect(head.slice(0, 12)).toEqual([
      '(Fewlift: the strokes of Wappen \\u0028gro\\u00df\\u0029)',
      '(language: word address format in the family of ISO 6983-1, as NISTIR 6556 describes RS-274/NGC)',
      '(placement: page 200 x 100 mm, zero at its bottom left corner, y up, scale 1)',
      '(home: X0 Y0)',
      '(heights: raised Z3, down Z0)',
      '(bounds: X0 to X30, Y0 to Y70, in mm from the zero)',
      '(counts: 2 pens, 2 runs)',
      '(lengths in mm: drawn 20, of that across gaps 0, travel 194.7)',
      '(time: about 3.8 s, pen changes not counted)',
      '(time assumes: drawing 40 mm per s, travel 100 mm per s, down 10 mm per s, up 20 mm per s, acceleration 1000 mm per s squared, each run and travel from rest to rest)',
      '(curves: lines within 0.02 mm)',
      '(end: pen raised, at home)',
    ]);
    expect(head.slice(12)).toEqual(CAUTIONS.map((caution) => `(${caution})`));
  });

  test('pens and runs are named; the change of pen is asked for before it stops', () => {
    const lines = gcodeOf(programOf(TWO_PENS)).split('\n');
    expect(lines).toContain('(pen 1 of 2: #ff0000, name red)');
    expect(lines).toContain('(run 1)');
    const stop = lines.indexOf('M0');
    expect(lines[stop - 2]).toBe('G0 X0 Y0');
    expect(lines[stop - 1]).toBe(
      '(MSG, fit pen 2 of 2, Tusche \\u0028schwarz\\u0029 100 \\u0025 #000000, then start again)',
    );
    expect(lines[stop + 1]).toMatch(/^\(pen 2 of 2: /);
  });

  test('cautions defer to manual, codes and people, and promise nothing', () => {
    const all = CAUTIONS.join(' ');
    expect(all).toMatch(/manual, local codes and licensed or competent persons/);
    expect(all).not.toMatch(/\b(safe|safely|certified|compliant|approved|guarantee)/i);
  });
});

describe('laws', () => {
  test('every program obeys the rules of the strict machine, with its lengths and runs', () => {
    fc.assert(
      fc.property(anyProgram, (program) => {
        const gcode = gcodeOf(program);
        expect(gcodeOf(program)).toBe(gcode);
        const ran = runStrictly(gcode);
        const measure = measureProgram(program, PEN_ON_Z);
        expect(ran.descents).toBe(measure.runs);
        const pens = measure.perPen.filter((pen) => pen.runs > 0).length;
        expect(ran.stops).toHaveLength(Math.max(0, pens - 1));
        // The machine starts at its zero, which is home here; every end is off by half a step at most.
        const step = 10 ** -PEN_ON_Z.decimals;
        expect(Math.abs(ran.travelMm - measure.travelMm)).toBeLessThanOrEqual(
          1.42 * step * (program.count + 2 * program.pens.length),
        );
        const { reached } = programBounds(program);
        const outside = ran.moves.filter(
          ({ to: [x, y] }) =>
            x < reached.minX - step ||
            x > reached.maxX + step ||
            100 - y < reached.minY - step ||
            100 - y > reached.maxY + step,
        );
        expect(outside).toEqual([]);
        // Rounding moves each end. A chord with sagitta e is shorter than its arc by about e/3 times the
        // angle (arc less chord: θ²/6, sagitta: θ²/2, relative to the half angle θ): far below 0.1 mm.
        const rounding = 1.42 * step * ran.moves.length;
        expect(ran.drawnMm).toBeLessThanOrEqual(measure.drawnMm + rounding);
        expect(ran.drawnMm).toBeGreaterThanOrEqual(measure.drawnMm - 0.1 * program.segments.count - rounding);
      }),
      { numRuns: 80 },
    );
  });

  test('the bounds in the head are those of the moves', () => {
    fc.assert(
      fc.property(anyProgram, (program) => {
        const gcode = gcodeOf(program);
        const { moves } = runStrictly(gcode);
        const along = moves.filter(({ from, to }) => from[2] === to[2]);
        const words = /bounds: X(\S+) to X(\S+), Y(\S+) to Y(\S+),/.exec(gcode);
        if (program.count === 0) expect(words).toBeNull();
        else {
          const [xs, ys] = [along.map(({ to }) => to[0]), along.map(({ to }) => to[1])];
          expect(words?.slice(1).map(Number)).toEqual([
            Math.min(...xs),
            Math.max(...xs),
            Math.min(...ys),
            Math.max(...ys),
          ]);
        }
      }),
      { numRuns: 50 },
    );
  });
});

test('the strict machine refuses what it is there to refuse', () => {
  const right = gcodeOf(programOf({ runs: [polyline(10, 90, 20, 90)] }));
  expect(runStrictly(right).descents).toBe(1);
  const wrongs: [string, string, RegExp][] = [
    ['\nG0 Z3\n(pen', '\n(pen', /does not raise/],
    ['G0 X10 Y10', 'G1 X10 Y10 F100', /feed while raised/],
    ['G1 X20 Y10 F2400', 'G0 X20 Y10', /rapid while down/],
    ['G1 Z0 F600', 'G1 Z0', /without a feed rate/],
    ['G21\n', '', /before the modes/],
    ['G90\n', 'G90\nG20\n', /a mode twice/],
    ['(run 1)', '(run (1))', /bracket/],
    ['(run 1)', '(run 1 %)', /act on/],
    ['(run 1)', `(${'x'.repeat(250)})`, /250/],
    ['(run 1)', '(é)', /ASCII/],
    ['X20 Y10', 'X2e1 Y10', /plain numbers/],
    ['X20 Y10', 'X-0.0 Y10', /minus zero/],
    ['\nM2\n', '\n', /end with M2/],
    ['\nM2\n', '\nM2\nG0 X0 Y0\n', /after M2/],
    ['\nG0 Z3\nG0 X0 Y0\nM2', '\nM2', /pen down/],
  ];
  for (const [from, to, rule] of wrongs) {
    const wrong = right.replace(from, to);
    expect(wrong).not.toBe(right);
    expect(() => runStrictly(wrong)).toThrow(rule);
  }
});

describe('profiles', () => {
  test('heights, feeds and decimals are the profile’s', () => {
    const profile = {
      ...PEN_ON_Z,
      raisedHeightMm: 2.5,
      downHeightMm: -0.25,
      drawSpeedMmPerS: 12.5,
      decimals: 2,
    };
    const code = codeOf(gcodeOf(programOf({ runs: [polyline(1.236, 90, 2, 90)] }), profile));
    expect(code.slice(4, 9)).toEqual([
      'G0 Z2.5',
      'G0 X1.24 Y10',
      'G1 Z-0.25 F600',
      'G1 X2 Y10 F750',
      'G0 Z2.5',
    ]);
  });

  test('a profile that cannot be written is refused', () => {
    const program = programOf({ runs: [polyline(0, 0, 1, 1)] });
    for (const wrong of [
      { raisedHeightMm: 0 },
      { raisedHeightMm: Number.NaN },
      { accuracyMm: 0.0005 },
      { drawSpeedMmPerS: 0 },
      { plungeSpeedMmPerS: Number.NaN },
    ]) {
      const options = { ...PAGE, name: '', facts: measureProgram(program, PEN_ON_Z) };
      expect(() => writeGcode(program, { ...PEN_ON_Z, ...wrong }, options)).toThrow(RangeError);
    }
  });
});
