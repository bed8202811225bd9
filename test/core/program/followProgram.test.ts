import fc from 'fast-check';
import { expect, test } from 'vitest';
import { followProgram } from '../../../src/core/program/followProgram.ts';
import type { Program } from '../../../src/core/program/program.ts';
import { anyProgram, dot, polyline, programOf, withPen } from '../../support/programs.ts';

function story(program: Program): string[] {
  const told: string[] = [];
  followProgram(program, {
    beginPen: (pen) => told.push(`pen ${pen}`),
    travel: (x0, y0, x1, y1) => told.push(`${x0},${y0} to ${x1},${y1}`),
    run: (run) => told.push(`run ${run}`),
    endPen: (pen) => told.push(`end ${pen}`),
  });
  return told;
}

const twoPens = {
  pens: [
    { name: 'red', colour: '#ff0000' },
    { name: 'unused', colour: '#00ff00' },
    { name: 'blue', colour: '#0000ff' },
  ],
  runs: [withPen(0, polyline(1, 1, 2, 1)), withPen(0, polyline(2, 1, 3, 3)), withPen(2, dot(5, 5))],
  homeX: 0,
  homeY: 9,
};

test('each pen starts at home and comes back to it', () => {
  expect(story(programOf(twoPens))).toEqual([
    'pen 0',
    '0,9 to 1,1',
    'run 0',
    '2,1 to 2,1',
    'run 1',
    '3,3 to 0,9',
    'end 0',
    'pen 2',
    '0,9 to 5,5',
    'run 2',
    '5,5 to 0,9',
    'end 2',
  ]);
});

test('only the last pen stays where it ends, when told so', () => {
  const told = story(programOf({ ...twoPens, endAtHome: false }));
  expect(told).toContain('3,3 to 0,9');
  expect(told.slice(-2)).toEqual(['run 2', 'end 2']);
});

test('an empty program does nothing', () => {
  expect(story(programOf({ runs: [] }))).toEqual([]);
});

test('every leg starts where the last thing ended', () => {
  fc.assert(
    fc.property(anyProgram, (program) => {
      const { offset, data } = program.segments;
      let [x, y] = [program.homeX, program.homeY];
      let runs = 0;
      followProgram(program, {
        beginPen: () => expect([x, y]).toEqual([program.homeX, program.homeY]),
        travel: (x0, y0, x1, y1) => {
          expect([x0, y0]).toEqual([x, y]);
          [x, y] = [x1, y1];
        },
        run: (run) => {
          expect(run).toBe(runs++);
          const start = offset[program.first[run]];
          expect([x, y]).toEqual([data[start], data[start + 1]]);
          const end = offset[program.first[run + 1] - 1];
          [x, y] = [data[end + 2], data[end + 3]];
        },
        endPen: () => {},
      });
      expect(runs).toBe(program.count);
    }),
  );
});
