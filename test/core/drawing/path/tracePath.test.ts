import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  brokenPromises,
  codesOf,
  findingOf,
  readBody,
  readPath,
  textsOf,
} from '../../../support/readStrokes.ts';

describe('commands', () => {
  // SVG 2, "Path data": figures triangle01, cubic01, quad01 and arcs01, scaled to the page by a tenth.
  test.each([
    ['triangle01', 'M 10 10 L 30 10 L 20 30 z', ['10,10 L 30,10 L 20,30 L 10,10 Z']],
    [
      'cubic01: S mirrors the control point of C',
      'M10,20 C10,10 25,10 25,20 S40,30 40,20',
      ['10,20 C 10,10 25,10 25,20 C 25,30 40,30 40,20'],
    ],
    [
      'quad01: T mirrors the control point of Q; both raised to cubics',
      'M20,30 Q40,5 60,30 T100,30',
      [
        '20,30 C 33.333333,13.333333 46.666667,13.333333 60,30 C 73.333333,46.666667 86.666667,46.666667 100,30',
      ],
    ],
    [
      'arcs01: the pie',
      'M30,20 h-15 a15,15 0 1,0 15,-15 z',
      ['30,20 L 15,20 A 30,20 15,0 0,15 3.141593 -4.712389 30,5 L 30,20 Z'],
    ],
  ])('%s', (_, d, expected) => {
    expect(readPath(d)).toEqual(expected);
  });

  test('H, V and their relative forms', () => {
    expect(readPath('M1 2H5V6h-4v-3')).toEqual(['1,2 L 5,2 L 5,6 L 1,6 L 1,3']);
  });

  // SVG 2, "The cubic Bézier curve commands": without a curve before, the control point is the current one.
  test('a smooth command after another kind starts from the current point', () => {
    expect(readPath('M1 1S3 3 5 1')).toEqual(['1,1 C 1,1 3,3 5,1']);
    expect(readPath('M0 0Q3 3 6 0S9 3 12 0')).toEqual(['0,0 C 2,2 4,2 6,0 C 6,0 9,3 12,0']);
    expect(readPath('M0 0C1 1 2 1 3 0T6 0')).toEqual(['0,0 C 1,1 2,1 3,0 C 3,0 4,0 6,0']);
    expect(readPath('M0 0Q3 3 6 0L7 0T10 0')).toEqual(['0,0 C 2,2 4,2 6,0 L 7,0 C 7,0 8,0 10,0']);
  });

  // SVG 2, "The closepath command": the next sub-path starts where this one did.
  test('drawing goes on after Z from the start of the sub-path', () => {
    expect(readPath('M1 1h2v2zl-1 0')).toEqual(['1,1 L 3,1 L 3,3 L 1,1 Z', '1,1 L 0,1']);
    expect(readPath('M1 1h2v2zm4 0h1')).toEqual(['1,1 L 3,1 L 3,3 L 1,1 Z', '5,1 L 6,1']);
    expect(readPath('M1 1h2zzz')).toEqual(['1,1 L 3,1 L 1,1 Z']);
  });

  test('each moveto starts a stroke of its own, and pairs after it are lines', () => {
    expect(readPath('M1 1 2 2 3 1m1 1 1 1M9 9M8 8h1')).toEqual(['1,1 L 2,2 L 3,1', '4,2 L 5,3', '8,8 L 9,8']);
  });

  test('an open sub-path that ends where it started is not closed', () => {
    expect(readPath('M1 1h1v1h-1v-1')).toEqual(['1,1 L 2,1 L 2,2 L 1,2 L 1,1']);
    expect(readPath('M1 1h1v1h-1v-1z')).toEqual(['1,1 L 2,1 L 2,2 L 1,2 L 1,1 Z']);
  });

  // SVG 2, "Elliptical arc implementation notes", Out-of-range parameters.
  test('arcs out of range', () => {
    expect(readPath('M1 1A0 5 0 0 1 4 1')).toEqual(['1,1 L 4,1']);
    expect(readPath('M1 1A5 5 0 0 1 1 1H3')).toEqual(['1,1 L 3,1']);
    // Too small: scaled up until a half circle fits.
    expect(readPath('M0 10A1 1 0 0 1 10 10')).toEqual(readPath('M0 10A-5-5 0 0 1 10 10'));
  });
});

describe('ends that meet but for rounding', () => {
  // In doubles 0.1 + 0.2 - 0.3 is not 0: without care Z would add a line of 1e-17.
  test('are closed without a sliver', () => {
    const drawing = readBody('<path d="m.1 .1 .2 0 .1 .3 -.3 -.3z" fill="none" stroke="black"/>');
    expect(drawing.strokes.segments.count).toBe(3);
    expect(textsOf(drawing)).toEqual(['0.1,0.1 L 0.3,0.1 L 0.4,0.4 L 0.1,0.1 Z']);
    expect(brokenPromises(drawing)).toEqual([]);
  });

  test('a gap that a drawing really has is closed by a line', () => {
    expect(readPath('M1 1h2v2L1.001 1z')).toEqual(['1,1 L 3,1 L 3,3 L 1.001,1 L 1,1 Z']);
  });
});

describe('dots', () => {
  // SVG 2, "Implementation notes", Zero length path segments.
  test.each([
    ['M5 5h0', ['5,5 .']],
    ['M5 5z', ['5,5 .']],
    ['M5 5L5 5 5 5', ['5,5 .']],
    ['M5 5C5 5 5 5 5 5', ['5,5 .']],
    ['M5 5', []],
    ['M5 5M6 6', []],
    ['M5 5h.01', ['5,5 L 5.01,5']],
    ['M5 5h0v2', ['5,5 L 5,7']],
    ['M1 1h2M5 5h0M7 7h1', ['1,1 L 3,1', '5,5 .', '7,7 L 8,7']],
  ])('%s with round or square caps', (d, expected) => {
    for (const cap of ['round', 'square']) {
      const drawing = readBody(`<path d="${d}" stroke="black" fill="none" stroke-linecap="${cap}"/>`);
      expect(textsOf(drawing)).toEqual(expected);
      expect(brokenPromises(drawing)).toEqual([]);
    }
  });

  test('with butt caps draw nothing, and are counted', () => {
    const drawing = readBody('<path d="M5 5h0M6 6zM7 7h1" stroke="black" fill="none"/>');
    expect(textsOf(drawing)).toEqual(['7,7 L 8,7']);
    expect(findingOf(drawing, 'butt-dots-not-drawn').values.count).toBe(2);
  });
});

describe('numbers that are none', () => {
  test('end the path where they stand', () => {
    for (const bad of ['1e400', '-1e999', 'NaN', 'Infinity']) {
      const drawing = readBody(`<path d="M1 1L2 2L3 ${bad}L4 4" stroke="black" fill="none"/>`);
      expect(textsOf(drawing)).toEqual(['1,1 L 2,2']);
      expect(findingOf(drawing, 'path-error').values).toMatchObject({ offset: 11, count: 1 });
    }
  });

  test('made by adding or by a transform leave the stroke out', () => {
    const added = readBody('<path d="M1e308 0l1e308 0 1 1M1 1h1" stroke="black" fill="none"/>');
    expect(textsOf(added)).toEqual(['1,1 L 2,1']);
    expect(findingOf(added, 'coordinate-overflow').values.count).toBe(1);
    const scaled = readBody('<path transform="scale(1e200)" d="M1e200 0h1" stroke="black" fill="none"/>');
    expect(scaled.strokes.count).toBe(0);
    expect(codesOf(scaled)).toContain('coordinate-overflow');
  });
});

/** Whole numbers, so that sums are exact and both spellings must give the same bits. */
const whole = fc.integer({ min: -50, max: 50 });
const step = fc.oneof(
  fc.record({ letter: fc.constantFrom('L', 'T'), numbers: fc.array(whole, { minLength: 2, maxLength: 2 }) }),
  fc.record({ letter: fc.constantFrom('H', 'V'), numbers: fc.array(whole, { minLength: 1, maxLength: 1 }) }),
  fc.record({ letter: fc.constant('C'), numbers: fc.array(whole, { minLength: 6, maxLength: 6 }) }),
  fc.record({ letter: fc.constantFrom('S', 'Q'), numbers: fc.array(whole, { minLength: 4, maxLength: 4 }) }),
  fc.record({ letter: fc.constant('M'), numbers: fc.array(whole, { minLength: 2, maxLength: 2 }) }),
  fc.record({ letter: fc.constant('A'), numbers: fc.array(whole, { minLength: 2, maxLength: 2 }) }),
  fc.record({ letter: fc.constant('Z'), numbers: fc.constant([] as number[]) }),
);

function spellings(steps: readonly { letter: string; numbers: number[] }[]): [string, string] {
  let [x, y, startX, startY] = [0, 0, 0, 0];
  let absolute = 'M0 0';
  let relative = 'm0 0';
  for (const { letter, numbers } of steps) {
    const arc = letter === 'A' ? '9 4 30 0 1 ' : '';
    absolute += `${letter}${arc}${numbers.join(' ')}`;
    const from = (k: number): number => (letter === 'V' || (letter !== 'H' && k % 2 === 1) ? y : x);
    relative += `${letter.toLowerCase()}${arc}${numbers.map((n, k) => n - from(k)).join(' ')}`;
    if (letter === 'H') x = numbers[0];
    else if (letter === 'V') y = numbers[0];
    else if (letter === 'Z') [x, y] = [startX, startY];
    else [x, y] = numbers.slice(-2);
    if (letter === 'M') [startX, startY] = [x, y];
  }
  return [absolute, relative];
}

describe('laws', () => {
  test('relative and absolute spellings draw the same, bit for bit', () => {
    fc.assert(
      fc.property(fc.array(step, { maxLength: 20 }), (steps) => {
        const [absolute, relative] = spellings(steps).map((d) => readBody(`<path d="${d}" stroke="#000"/>`));
        expect(relative.strokes).toEqual(absolute.strokes);
        expect(brokenPromises(absolute)).toEqual([]);
      }),
      { numRuns: 300 },
    );
  });

  test('a path in two elements draws what it draws in one', () => {
    fc.assert(
      fc.property(fc.array(step, { maxLength: 10 }), fc.array(step, { maxLength: 10 }), (a, b) => {
        const [first] = spellings(a);
        const [second] = spellings(b);
        const one = readBody(`<path d="${first}${second}" stroke="#000"/>`);
        const two = readBody(`<path d="${first}" stroke="#000"/><path d="${second}" stroke="#000"/>`);
        expect(two.strokes.segments).toEqual(one.strokes.segments);
        expect(two.strokes.first).toEqual(one.strokes.first);
      }),
      { numRuns: 150 },
    );
  });
});
