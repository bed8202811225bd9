import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { withoutTravel, writeSvg } from '../../../src/core/write/svg.ts';
import { farthestFrom } from '../../support/closeness.ts';
import { anyProgram, circleArc, dot, polyline, programOf, withPen } from '../../support/programs.ts';
import { groupsOf, segmentsOfPath } from '../../support/writtenSvg.ts';

const PAGE = { widthMm: 200, heightMm: 100 };

function pathsOf(...runs: Parameters<typeof programOf>[0]['runs']): string[] {
  return groupsOf(writeSvg(programOf({ runs }), PAGE)).flatMap((group) => group.paths);
}

describe('the frame', () => {
  test('the whole text of a small program', () => {
    const program = programOf({
      pens: [
        { name: 'red', colour: '#ff0000' },
        { name: 'fine & "blue"', colour: '#0000ff' },
      ],
      runs: [withPen(0, polyline(10, 10, 20, 10)), withPen(1, polyline(30, 10, 30, 20))],
    });
    expect(writeSvg(program, { ...PAGE, title: 'A < B', description: 'two\nlines', travel: true })).toBe(
      [
        '<?xml version="1.0" encoding="UTF-8"?>',
        '<svg xmlns="http://www.w3.org/2000/svg" xmlns:fewlift="urn:fewlift:1" version="1.1" width="200mm" height="100mm" viewBox="0 0 200 100" fill="none" stroke-width="0.3" stroke-linecap="round" stroke-linejoin="round">',
        '<title>A &lt; B</title>',
        '<desc>two&#10;lines</desc>',
        '<g id="pen-1" fewlift:label="red" stroke="#ff0000">',
        '<title>red</title>',
        '<path d="M10 10H20"/>',
        '</g>',
        '<g id="pen-2" fewlift:label="fine &amp; &quot;blue&quot;" stroke="#0000ff">',
        '<title>fine &amp; &quot;blue&quot;</title>',
        '<path d="M30 10V20"/>',
        '</g>',
        '<g id="travel" fewlift:label="travel" stroke="#808080" stroke-width="0.15" stroke-dasharray="1 1" stroke-linecap="butt">',
        '<path d="M0 100L10 10"/>',
        '<path d="M20 10L0 100"/>',
        '<path d="M0 100L30 10"/>',
        '<path d="M30 20L0 100"/>',
        '</g>',
        '</svg>',
        '',
      ].join('\n'),
    );
  });

  test('without the travel it is the same text as written without it', () => {
    fc.assert(
      fc.property(anyProgram, (program) => {
        const plain = writeSvg(program, { ...PAGE, title: '<g id="travel"' });
        const shown = writeSvg(program, { ...PAGE, title: '<g id="travel"', travel: true });
        expect(withoutTravel(shown)).toBe(plain);
        expect(withoutTravel(plain)).toBe(plain);
      }),
      { numRuns: 50 },
    );
  });

  test('what XML cannot hold becomes U+FFFD (XML 1.0 §2.2)', () => {
    const name = `a\u0000\u000b\ud800b\u{1f58a}\t`;
    const pens = [{ name, colour: 'url(#gradient)' }];
    const [group] = groupsOf(writeSvg(programOf({ pens, runs: [dot(1, 1)] }), PAGE));
    expect(group.attributes.get('fewlift:label')).toBe('a\ufffd\ufffd\ufffdb\u{1f58a}&#9;');
    expect(group.attributes.get('stroke')).toBe('#000000');
  });
});

describe('the path of a run', () => {
  test('lines, a closed run, a dot', () => {
    expect(pathsOf(polyline(0, 0, 1.23456, -0.00001))).toEqual(['M0 0H1.2346']);
    // SVG 2: only closepath joins the ends; it draws the last line too.
    expect(pathsOf(polyline(0, 0, 10, 0, 10, 10, 0, 0))).toEqual(['M0 0H10V10Z']);
    // SVG 2: a zero-length subpath with round caps is a dot.
    expect(pathsOf(dot(5, 5.5))).toEqual(['M5 5.5h0']);
  });

  test('there and back again is not shortened to a dot', () => {
    expect(pathsOf(polyline(0, 0, 10, 0, 0, 0))).toEqual(['M0 0H10Z']);
  });

  test('collinear points stay; points written alike are one', () => {
    expect(pathsOf(polyline(0, 0, 5, 0, 5.00001, 0, 10, 0))).toEqual(['M0 0H5H10']);
  });

  test('a run that shrinks to a point stays as a dot', () => {
    expect(pathsOf(polyline(3, 3, 3.00001, 3, 3, 3.00002))).toEqual(['M3 3h0']);
  });

  test('cubics are kept, a loop that ends where it starts too', () => {
    const loop = { draw: (b: { cubic: (...n: number[]) => void }) => b.cubic(0, 0, 10, 5, -10, 5, 0, 0) };
    expect(pathsOf(loop as never)).toEqual(['M0 0C10 5-10 5 0 0Z']);
  });

  test('arcs turn the right way; a circle is cut in three', () => {
    // A quarter turn clockwise as seen (y down), from 3 o'clock to 6: sweep flag 1.
    expect(pathsOf(circleArc(10, 10, 5, 0, Math.PI / 2))).toEqual(['M15 10A5 5 0 0 1 10 15']);
    expect(pathsOf(circleArc(10, 10, 5, 0, -Math.PI / 2))).toEqual(['M15 10A5 5 0 0 0 10 5']);
    const [circle] = pathsOf(circleArc(10, 10, 5, 0, 2 * Math.PI));
    expect(circle).toBe('M15 10a5 5 0 0 1-7.5 4.3301a5 5 0 0 1 0-8.6602A5 5 0 0 1 15 10Z');
  });

  test('a mirrored arc turns the other way', () => {
    // v points against the usual direction: growing angles go counter-clockwise as seen.
    const run = {
      draw: (b: import('../../../src/core/geometry/segments.ts').SegmentBuilder) =>
        b.arc(15, 10, 10, 5, 10, 10, 5, 0, 0, -5, 0, Math.PI / 2),
    };
    expect(pathsOf(run)).toEqual(['M15 10A5 5 0 0 0 10 5']);
  });

  test('a flat ellipse is written as cubics, and not bent into a line', () => {
    const run = {
      draw: (b: import('../../../src/core/geometry/segments.ts').SegmentBuilder) =>
        b.arc(10, 50, 190, 50, 100, 50, 90, 0, 0, 0.00001, Math.PI, Math.PI),
    };
    const [d] = pathsOf(run);
    expect(d).not.toContain('A');
    expect(d.match(/C/g)?.length).toBeGreaterThan(1);
  });
});

describe('laws', () => {
  test('every run reads back within 20 steps of its curves, in order, end to end', () => {
    fc.assert(
      fc.property(anyProgram, fc.integer({ min: 2, max: 5 }), (program, decimals) => {
        const paths = groupsOf(writeSvg(program, { ...PAGE, decimals })).flatMap((group) => group.paths);
        expect(paths).toHaveLength(program.count);
        paths.forEach((d, run) => {
          const { segments } = segmentsOfPath(d);
          const written = { segments, from: 0, to: segments.count };
          const from = program.first[run];
          const to = program.first[run + 1];
          const ours = { segments: program.segments, from, to };
          const tolerance = 20 * 10 ** -decimals;
          expect(farthestFrom(ours, written)).toBeLessThan(tolerance);
          expect(farthestFrom(written, ours)).toBeLessThan(tolerance);
          const { offset, data } = program.segments;
          const half = 0.5000001 * 10 ** -decimals;
          expect(Math.abs(segments.data[0] - data[offset[from]])).toBeLessThan(half);
          const last = segments.offset[segments.count - 1];
          expect(Math.abs(segments.data[last + 3] - data[offset[to - 1] + 3])).toBeLessThan(half);
        });
      }),
      { numRuns: 60 },
    );
  });

  test('numbers are plain and short, text is the same each time', () => {
    fc.assert(
      fc.property(anyProgram, (program) => {
        const svg = writeSvg(program, { ...PAGE, travel: true });
        expect(writeSvg(program, { ...PAGE, travel: true })).toBe(svg);
        for (const { paths } of groupsOf(svg)) {
          for (const d of paths) {
            expect(d).toMatch(/^M[-\d.ACHLSVachlsvZ ]*$/);
            expect(d).not.toMatch(/\d\.\d{5}|-0(?![.\d])|\.(?!\d)/);
          }
        }
      }),
      { numRuns: 50 },
    );
  });

  test('runs stand under their pen, once each', () => {
    fc.assert(
      fc.property(anyProgram, (program) => {
        const groups = groupsOf(writeSvg(program, PAGE));
        const runsOfPen = program.pens.map((_, pen) => program.pen.filter((p) => p === pen).length);
        expect(groups.map((group) => [group.attributes.get('id'), group.paths.length])).toEqual(
          runsOfPen.flatMap((runs, pen) => (runs > 0 ? [[`pen-${pen + 1}`, runs]] : [])),
        );
      }),
      { numRuns: 50 },
    );
  });
});
