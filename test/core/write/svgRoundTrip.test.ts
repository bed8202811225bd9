import fc from 'fast-check';
import { expect, test } from 'vitest';
import { planPens } from '../../../src/core/drawing/pens.ts';
import { readDrawing } from '../../../src/core/drawing/readDrawing.ts';
import { withoutTravel, writeSvg } from '../../../src/core/write/svg.ts';
import { farthestFrom } from '../../support/closeness.ts';
import { anyProgram, dot, polyline, programOf, withPen } from '../../support/programs.ts';

const PAGE = { widthMm: 200, heightMm: 100 };

test('what we write our reader reads: runs in order, their curves, dots, pens, page', () => {
  fc.assert(
    fc.property(anyProgram, (program) => {
      const svg = writeSvg(program, { ...PAGE, travel: true });
      const drawing = readDrawing(withoutTravel(svg), { pageEdge: 'ignore' });
      expect(drawing.findings.filter(({ code }) => code !== 'nothing-to-draw')).toEqual([]);
      expect([drawing.widthMm, drawing.heightMm]).toEqual([200, 100]);
      const { strokes } = drawing;
      expect(strokes.count).toBe(program.count);
      const plan = planPens(drawing, 'layer');
      const used = program.pens.filter((_, pen) => program.pen.includes(pen));
      expect(plan.pens.map((pen) => pen.colour)).toEqual(used.map((pen) => pen.colour));
      for (let run = 0; run < program.count; run++) {
        const [from, to] = [program.first[run], program.first[run + 1]];
        const ours = { segments: program.segments, from, to };
        const back = { segments: strokes.segments, from: strokes.first[run], to: strokes.first[run + 1] };
        expect(farthestFrom(ours, back)).toBeLessThan(0.002);
        expect(farthestFrom(back, ours)).toBeLessThan(0.002);
        const { data, offset } = program.segments;
        const a = offset[from];
        const isDot = to - from === 1 && data[a] === data[a + 2] && data[a + 1] === data[a + 3];
        expect(strokes.dot[run]).toBe(isDot && program.segments.kind[from] === 0 ? 1 : 0);
      }
    }),
    { numRuns: 60 },
  );
});

test('names, title and description come back, however odd', () => {
  const names = ['plain', 'a <b> & "c"', 'тушь 🖊', "it's"];
  const program = programOf({
    pens: names.map((name, i) => ({ name, colour: `#00000${i}` })),
    runs: names.map((_, pen) => withPen(pen, pen % 2 ? dot(pen, 1) : polyline(pen, 1, 9, 9, 1, 9, pen, 1))),
  });
  const drawing = readDrawing(writeSvg(program, { ...PAGE, title: 'T & <U>', description: 'd "q"' }));
  expect(drawing.title).toBe('T & <U>');
  expect(drawing.description).toBe('d "q"');
  expect(planPens(drawing, 'layer').pens.map(({ name, colour }) => ({ name, colour }))).toEqual(program.pens);
  expect([...drawing.strokes.closed]).toEqual([1, 0, 1, 0]);
});

test('a drawing without a title takes none from its pens', () => {
  const drawing = readDrawing(writeSvg(programOf({ runs: [dot(1, 1)] }), PAGE));
  expect([drawing.title, drawing.description]).toEqual([null, null]);
});
