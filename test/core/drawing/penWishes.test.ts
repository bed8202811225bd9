import { describe, expect, test } from 'vitest';
import { NO_PEN_NAMES, planPens } from '../../../src/core/drawing/pens.ts';
import { choosePens, NO_PEN_WISHES, type PenWishes } from '../../../src/core/drawing/penWishes.ts';
import { readDrawing } from '../../../src/core/drawing/readDrawing.ts';

const LAYERED =
  readDrawing(`<svg xmlns="http://www.w3.org/2000/svg" xmlns:e="urn:editor" width="100mm" height="50mm" viewBox="0 0 100 50" fill="none">
  <g e:label="Cut, outer" stroke="red"><path d="M0 5H10"/><path d="M0 6H10" stroke="#00f"/></g>
  <g id="fold" stroke="red"><path d="M0 7H10" stroke-dasharray="2 1"/></g>
  <path d="M0 9H10" stroke="lime"/></svg>`);

function wishes(some: Partial<PenWishes>): PenWishes {
  return { ...NO_PEN_WISHES, ...some };
}

function pensAfter(rule: 'colour' | 'layer' | 'one', some: Partial<PenWishes>) {
  const chosen = choosePens(LAYERED, rule, wishes(some));
  return planPens(chosen, rule, wishes(some)).pens.map((pen) => pen.name);
}

describe('choosing pens', () => {
  test('by colour, in whatever way CSS spells it', () => {
    expect(pensAfter('colour', {})).toEqual(['#ff0000', '#0000ff', '#ff0000 dashed', '#00ff00']);
    expect(pensAfter('colour', { onlyPens: ['rgb(255 0 0)', 'hsl(240 100% 50%)'] })).toEqual([
      '#ff0000',
      '#0000ff',
    ]);
    expect(pensAfter('colour', { skipPens: ['Red dashed', 'LIME'] })).toEqual(['#ff0000', '#0000ff']);
  });

  test('by layer: label or id, upper and lower case alike', () => {
    expect(pensAfter('layer', { onlyPens: ['cut, OUTER'] })).toEqual(['Cut, outer']);
    expect(pensAfter('layer', { skipPens: ['Fold', 'no layer'] })).toEqual(['Cut, outer']);
  });

  test('all there is leaves the same object, findings and all', () => {
    expect(choosePens(LAYERED, 'colour', NO_PEN_WISHES)).toBe(LAYERED);
    expect(choosePens(LAYERED, 'colour', wishes({ penOrder: ['lime'] }))).toBe(LAYERED);
  });

  test('what was left out is said with its strokes, and a pen that is not there with those that are', () => {
    const chosen = choosePens(LAYERED, 'colour', wishes({ skipPens: ['red', 'pink'] }));
    expect(chosen.findings.slice(LAYERED.findings.length).map((f) => [f.code, f.values])).toEqual([
      ['pen-not-there', { pen: 'pink', pens: '#ff0000, #0000ff, #ff0000 dashed, #00ff00' }],
      ['pens-left-out', { pens: '#ff0000', count: 1 }],
    ]);
    expect(chosen.strokes.count).toBe(LAYERED.strokes.count - 1);
  });

  test('strokes that stay are the same curves, with all their columns', () => {
    const { strokes } = choosePens(LAYERED, 'colour', wishes({ onlyPens: ['lime'] }));
    const last = LAYERED.strokes.count - 1;
    expect(strokes.count).toBe(1);
    expect([...strokes.segments.data]).toEqual([0, 9, 10, 9]);
    for (const column of ['closed', 'dot', 'dashed', 'colour', 'layer', 'element', 'widthMm'] as const) {
      expect(strokes[column][0]).toBe(LAYERED.strokes[column][last]);
    }
  });
});

describe('naming and ordering pens', () => {
  test('pens named first come first, the others as first met', () => {
    expect(pensAfter('colour', { penOrder: ['lime', 'blue'] })).toEqual([
      '#00ff00',
      '#0000ff',
      '#ff0000',
      '#ff0000 dashed',
    ]);
  });

  test('pens given the same name become one, and are known by either name', () => {
    const penNames: PenWishes['penNames'] = [
      ['red', 'thick'],
      ['red dashed', 'thick'],
    ];
    expect(pensAfter('colour', { penNames })).toEqual(['thick', '#0000ff', '#00ff00']);
    expect(pensAfter('colour', { penNames, skipPens: ['THICK'] })).toEqual(['#0000ff', '#00ff00']);
    expect(pensAfter('colour', { penNames, penOrder: ['lime', 'red'] })).toEqual([
      '#00ff00',
      'thick',
      '#0000ff',
    ]);
  });

  test('every stroke keeps its pen when pens change places', () => {
    const before = planPens(LAYERED, 'colour');
    const after = planPens(LAYERED, 'colour', { ...NO_PEN_NAMES, penOrder: ['lime', 'red dashed'] });
    for (let s = 0; s < LAYERED.strokes.count; s++) {
      expect(after.pens[after.penOfStroke[s]].name).toBe(before.pens[before.penOfStroke[s]].name);
    }
  });
});
