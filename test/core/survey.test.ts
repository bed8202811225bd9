import { describe, expect, test } from 'vitest';
import { DEFAULT_SETTINGS, type Survey, surveyDrawing, surveyTable } from '../../src/core/index.ts';
import { drawingOf, type StrokeSpec } from '../support/drawings.ts';

function surveyOf(specs: readonly StrokeSpec[], snapMm = 0.05): Survey {
  return surveyDrawing(drawingOf(specs), { ...DEFAULT_SETTINGS, snapMm }, 'test');
}

describe('survey', () => {
  test('counts strokes, pens, repeats and the fewest runs', () => {
    const survey = surveyOf([
      { line: [[0, 100] as const, [10, 100] as const] },
      { line: [[10, 100] as const, [0, 100] as const] },
      { circle: [50, 50, 10], colour: '#aa0000' },
      { dot: [80, 20], colour: '#aa0000' },
    ]);
    expect(survey.drawing).toMatchObject({ strokes: 4, closed: 1, dots: 1 });
    expect(survey.network).toMatchObject({ components: 3, oddVertices: 2, fewestRuns: 3 });
    expect(survey.network.repeatedMm).toBeCloseTo(10, 9);
    expect(survey.pens.map(({ pen, strokes }) => [pen, strokes])).toEqual([
      ['#000000', 2],
      ['#aa0000', 2],
    ]);
    // Home is where the first line starts: along it twice, 10 mm there and 10 mm back in the air.
    expect(survey.pens[0].boundMm).toBeCloseTo(10, 6);
    expect(survey.pens[0].nearestNeighbourMm).toBeCloseTo(0, 9);
  });

  test('the bound never passes the plainest ordering where no line stands twice', () => {
    const lines = Array.from({ length: 40 }, (_, i): StrokeSpec => {
      const x = (i * 37) % 90;
      const y = (i * 53) % 90;
      return { line: [[x, y] as const, [x + 3, y + 1] as const] };
    });
    const { boundMm, nearestNeighbourMm } = surveyOf(lines).network;
    expect(boundMm).toBeGreaterThan(0);
    expect(boundMm).toBeLessThanOrEqual(nearestNeighbourMm);
  });

  test('ends that nearly meet are named with gap and place, and are gone when snapped', () => {
    const specs: StrokeSpec[] = [
      { line: [[0, 0] as const, [10, 0] as const] },
      { line: [[10.2, 0] as const, [20, 0] as const] },
      { line: [[50, 50] as const, [50, 60] as const] },
    ];
    const { nearMisses } = surveyOf(specs);
    expect(nearMisses.count).toBe(1);
    expect(nearMisses.leastMm).toBeCloseTo(0.2, 9);
    expect([nearMisses.places[0].x, nearMisses.places[0].y]).toEqual([10, 0]);
    expect(surveyOf(specs, 0.25).nearMisses.count).toBe(0);
    expect(surveyTable(surveyOf(specs))).toMatch(/1 nearly meet, gaps of 0\.2000 mm; first at \(10, 0\)/);
  });

  test('and ends that stop just short of the middle of a line or curve', () => {
    const specs: StrokeSpec[] = [
      {
        line: [
          [10, 10],
          [50, 10],
        ],
      },
      {
        line: [
          [30, 10.2],
          [30, 40],
        ],
      },
      { circle: [70, 30, 10] },
      {
        line: [
          [70, 19.7],
          [70, 5],
        ],
      },
      {
        line: [
          [10, 60],
          [50, 60],
        ],
      },
    ];
    const { nearMisses } = surveyOf(specs);
    expect(nearMisses.count).toBe(2);
    expect(nearMisses.leastMm).toBeCloseTo(0.2, 9);
    expect(nearMisses.greatestMm).toBeCloseTo(0.3, 3);
    expect(surveyOf(specs, 0.35).nearMisses.count).toBe(0);
  });
});
