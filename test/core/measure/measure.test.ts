import { describe, expect, test } from 'vitest';
import { programBounds } from '../../../src/core/measure/bounds.ts';
import { measureProgram } from '../../../src/core/measure/measure.ts';
import { circleArc, dot, polyline, programOf, withPen } from '../../support/programs.ts';

const MODEL = {
  drawSpeedMmPerS: 50,
  travelSpeedMmPerS: 200,
  plungeSpeedMmPerS: 10,
  liftSpeedMmPerS: 20,
  accelerationMmPerS2: 1000,
  raisedHeightMm: 3,
  downHeightMm: 0,
};

// Rest to rest: d/v + v/a where d ≥ v²/a, else 2√(d/a). Biagiotti, Melchiorri (2008), ch. 3 (from
// memory); worked: d = 100, v = 50, a = 1000 takes 2.05 s, d = 1 takes 0.063246 s.
const DOWN = 3 / 10 + 10 / 1000;
const UP = 3 / 20 + 20 / 1000;

describe('lengths', () => {
  test('a 3-4-5 triangle: travel from and to home, drawn length, runs', () => {
    const program = programOf({ runs: [polyline(0, 60, 30, 60, 30, 100)], homeX: 0, homeY: 100 });
    const measure = measureProgram(program, MODEL);
    expect(measure).toMatchObject({ runs: 1, travelMm: 40 + 30, drawnMm: 30 + 40, bridgedMm: 0 });
    const open = measureProgram({ ...program, endAtHome: false }, MODEL);
    expect(open).toMatchObject({ runs: 1, travelMm: 40, drawnMm: 70 });
  });

  test('a circle is its circumference, a dot nothing but a run', () => {
    const runs = [circleArc(50, 50, 10, 0, 2 * Math.PI), dot(60, 50)];
    const measure = measureProgram(programOf({ runs, homeX: 60, homeY: 50 }), MODEL);
    expect(measure.drawnMm).toBeCloseTo(20 * Math.PI, 9);
    expect(measure.travelMm).toBe(0);
    expect(measure.runs).toBe(2);
  });

  test('bridges are drawn, and counted apart', () => {
    const program = programOf({ runs: [polyline(0, 0, 10, 0, 10, 0.5, 20, 0.5)] });
    program.bridge[1] = 1;
    expect(measureProgram(program, MODEL)).toMatchObject({ drawnMm: 20.5, bridgedMm: 0.5 });
  });

  test('each pen has its own legs home; the sums are those of the pens', () => {
    const program = programOf({
      pens: ['a', 'b', 'c'].map((name) => ({ name, colour: '#000000' })),
      runs: [withPen(2, polyline(10, 0, 20, 0)), withPen(0, polyline(0, 5, 0, 6))],
      homeX: 0,
      homeY: 0,
      endAtHome: false,
    });
    const measure = measureProgram(program, MODEL);
    expect(measure.perPen.map(({ pen, runs, travelMm, drawnMm }) => [pen, runs, travelMm, drawnMm])).toEqual([
      ['a', 1, 5, 1],
      ['b', 0, 0, 0],
      ['c', 1, 30, 10],
    ]);
    expect(measure.travelMm).toBe(35);
    expect(measure.seconds).toBe(measure.perPen.reduce((sum, pen) => sum + pen.seconds, 0));
  });
});

describe('time', () => {
  test('a drawn move, its travels, one way down and one up', () => {
    const program = programOf({ runs: [polyline(0, 0, 100, 0)], homeX: 0, homeY: 0 });
    // Home leg back: 100 mm at 200 mm/s: 100/200 + 200/1000 = 0.7 s; the leg out has no length.
    expect(measureProgram(program, MODEL).seconds).toBeCloseTo(2.05 + 0.7 + DOWN + UP, 12);
  });

  test('a run is one move however many segments it has', () => {
    const one = programOf({ runs: [polyline(0, 0, 100, 0)] });
    const many = programOf({ runs: [polyline(0, 0, 10, 0, 50, 0, 51, 0, 100, 0)] });
    expect(measureProgram(many, MODEL).seconds).toBe(measureProgram(one, MODEL).seconds);
  });

  test('a dot costs the ways down and up; a short move never reaches its speed', () => {
    const program = programOf({
      runs: [dot(0, 0), polyline(0, 0, 1, 0)],
      homeX: 0,
      homeY: 0,
      endAtHome: false,
    });
    expect(measureProgram(program, MODEL).seconds).toBeCloseTo(2 * (DOWN + UP) + 2 * Math.sqrt(1 / 1000), 12);
    expect(2 * Math.sqrt(1 / 1000)).toBeCloseTo(0.06324555320336758, 15);
  });

  test('an empty program takes none', () => {
    expect(measureProgram(programOf({ runs: [] }), MODEL)).toMatchObject({
      runs: 0,
      travelMm: 0,
      drawnMm: 0,
      seconds: 0,
    });
  });
});

describe('bounds', () => {
  test('a curve reaches beyond its ends', () => {
    const { drawn, reached } = programBounds(
      programOf({ runs: [circleArc(50, 50, 10, 0, Math.PI)], homeX: 0, homeY: 100 }),
    );
    expect(drawn?.minX).toBeCloseTo(40, 9);
    expect(drawn?.minY).toBeCloseTo(50, 9);
    expect(drawn?.maxX).toBeCloseTo(60, 9);
    expect(drawn?.maxY).toBeCloseTo(60, 9);
    expect(reached).toEqual({ minX: 0, minY: drawn?.minY, maxX: drawn?.maxX, maxY: 100 });
  });

  test('without runs only home is reached', () => {
    const bounds = programBounds(programOf({ runs: [], homeX: 1, homeY: 2 }));
    expect(bounds).toEqual({ drawn: null, reached: { minX: 1, minY: 2, maxX: 1, maxY: 2 } });
  });
});
