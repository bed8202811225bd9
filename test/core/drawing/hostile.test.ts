import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../../src/core/drawing/readDrawing.ts';
import { brokenPromises, codesOf, findingOf, IN_MM, readBody } from '../../support/readStrokes.ts';

const SAMPLE = `<?xml version="1.0"?><!DOCTYPE svg [<!ENTITY e "M1 1">]>
<svg ${IN_MM}><style>.a{stroke:red;fill:none}#b{stroke-linecap:round}</style><!-- c -->
<g id="b" clip-path="url(#k)" transform="rotate(30) scale(2 -1)" style="stroke:url(#g) blue"><path class="a" d="&e;l2,3c1-2 3.5.5 4 4z"/>
<rect width="50%" height="3mm" rx="1"/><circle r="2"/><polyline points="1 2 3,4 5 6"/><path d="M5 5h0A3 2 10 01 9 9"/></g>
<defs><symbol id="s" viewBox="0 0 9 9"><ellipse rx="2" ry="1" stroke="#123"/></symbol><linearGradient id="g"/><clipPath id="k"><circle r="90"/></clipPath></defs>
<use href="#s" x="1" width="4"/><switch><foreignObject/><g stroke="hsl(1 2% 3%)"><line x2="1e1"/></g></switch>
<svg viewBox="0 0 5 5" preserveAspectRatio="xMinYMax slice"><text>t</text></svg></svg>`;

describe('whatever the text is', () => {
  test('the sample draws', () => {
    expect(readDrawing(SAMPLE, { pageEdge: 'ignore' }).strokes.count).toBe(7);
    expect(brokenPromises(readDrawing(SAMPLE))).toEqual([]);
  });

  test('nothing is thrown and every promise holds: any characters', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 60 }), (text) => {
        const drawing = readDrawing(text);
        expect(drawing.strokes.count).toBe(0);
        expect(drawing.findings[0].severity).toBe('error');
      }),
      { numRuns: 300 },
    );
  });

  test('nothing is thrown and every promise holds: a drawing with random changes', () => {
    const piece = fc.oneof(
      fc.string({ unit: fc.constantFrom(...'<>&;"\'/=#()0123456789eE-.,% \nMLCAZzhu'), maxLength: 4 }),
      fc.constantFrom(
        '1e400',
        'NaN',
        '1e200',
        '-1',
        '0',
        '<g>',
        '</g>',
        'inherit',
        'url(#s)',
        '"',
        '%',
        '1e-320',
      ),
    );
    const changes = fc.array(fc.tuple(fc.nat(SAMPLE.length), fc.nat(3), piece), {
      minLength: 1,
      maxLength: 4,
    });
    fc.assert(
      fc.property(changes, (list) => {
        let text = SAMPLE;
        for (const [at, drop, put] of list) text = text.slice(0, at) + put + text.slice(at + drop);
        expect(brokenPromises(readDrawing(text))).toEqual([]);
      }),
      { numRuns: 1500 },
    );
  });

  test('extreme numbers anywhere: only finite ones come out', () => {
    const extreme = fc.constantFrom(
      '1e308',
      '-1e308',
      '1e-308',
      '5e-324',
      '1e999',
      'NaN',
      '0',
      '-0',
      '1',
      '1e154',
    );
    fc.assert(
      fc.property(fc.array(extreme, { minLength: 16, maxLength: 16 }), (n) => {
        const drawing = readBody(
          `<g fill="none" stroke="red" stroke-width="${n[0]}" transform="scale(${n[1]} ${n[2]}) translate(${n[3]})">
           <path d="M${n[4]} ${n[5]}A${n[6]} ${n[7]} ${n[8]} 0 1 ${n[9]} ${n[10]}Q${n[11]} 0 1 ${n[12]}z"/>
           <rect x="${n[13]}" width="${n[14]}" height="1" rx="${n[15]}"/><circle r="${n[4]}" cx="${n[5]}"/></g>`,
          `xmlns="http://www.w3.org/2000/svg" width="${n[0]}" height="10" viewBox="0 0 ${n[1]} ${n[2]}"`,
        );
        expect(brokenPromises(drawing)).toEqual([]);
      }),
      { numRuns: 500 },
    );
  });
});

describe('files that are something else', () => {
  test('a PNG picture read as text', () => {
    const drawing = readDrawing('\u0089PNG\r\n\u001a\n\u0000\u0000\u0000\rIHDR\u0000\u0000\u0001');
    expect(codesOf(drawing)).toEqual(['not-xml']);
    const found = String(findingOf(drawing, 'not-xml').values.found);
    for (const c of found) expect(c.charCodeAt(0)).toBeGreaterThanOrEqual(32);
  });

  test('the same bytes taken for UTF-8', () => {
    expect(codesOf(readDrawing('\ufffdPNG\r\n\u001a\n\u0000'))).toEqual(['not-xml']);
  });
});

describe('files made to hurt', () => {
  test('2,000 groups in one another are refused', () => {
    const drawing = readBody('<g>'.repeat(2000) + '</g>'.repeat(2000));
    expect(drawing.findings).toMatchObject([
      { code: 'past-limit', severity: 'error', values: { limit: 'depth', value: 1024 } },
    ]);
  });

  test('1,000 are read', () => {
    const drawing = readBody(`${'<g>'.repeat(1000)}<path d="M1 1h1" stroke="red"/>${'</g>'.repeat(1000)}`);
    expect(drawing.strokes.count).toBe(1);
  });

  // 10²⁰ copies in 4 kB.
  test('copies of copies stop at a limit', () => {
    let defs = '<path id="u0" d="M1 1h1" stroke="red"/>';
    for (let i = 1; i <= 20; i++) defs += `<g id="u${i}">${`<use href="#u${i - 1}"/>`.repeat(10)}</g>`;
    const drawing = readBody(`<defs>${defs}</defs><use href="#u20"/>`);
    expect(drawing.strokes.count).toBeLessThanOrEqual(100_000);
    expect(findingOf(drawing, 'use-limit').values).toMatchObject({ limit: 'copies', value: 100_000 });
  });

  test('a chain of 3,000 uses stops at a depth', () => {
    let defs = '<path id="c3000" d="M1 1h1" stroke="red"/>';
    for (let i = 0; i < 3000; i++) defs += `<use id="c${i}" href="#c${i + 1}"/>`;
    const deep = readBody(`<defs>${defs}</defs><use href="#c0"/>`);
    expect(findingOf(deep, 'use-limit').values).toMatchObject({ limit: 'copyDepth', value: 256 });
    expect(readBody(`<defs>${defs}</defs><use href="#c2900"/>`).strokes.count).toBe(1);
  });

  test.each([
    ['spaces in a length', (n: number) => `<rect width="1${' '.repeat(n)}!" height="1" stroke="red"/>`],
    ['digits in a length', (n: number) => `<rect width="${'1'.repeat(n)}!" height="1" stroke="red"/>`],
    ['fallbacks in a paint', (n: number) => `<path d="M1 1" stroke="${'url(#a) '.repeat(n / 10)}"/>`],
    [
      'spaces in a style',
      (n: number) => `<path d="M1 1" style="stroke:a${' '.repeat(n)}b !${' '.repeat(n)}x"/>`,
    ],
    ['spaces in a transform', (n: number) => `<path d="M1 1" transform="${' '.repeat(n)}x"/>`],
    ['ampersands', (n: number) => `<g id="${'&'.repeat(n)}"/>`],
    ['attributes', (n: number) => `<g ${Array.from({ length: n / 10 }, (_, i) => `a${i}=""`).join(' ')}/>`],
    ['closepaths', (n: number) => `<path stroke="red" d="M1 1${'z'.repeat(n)}"/>`],
    ['rules', (n: number) => `<style>${'*{fill:red}'.repeat(n / 100)}</style>${'<path/>'.repeat(n / 100)}`],
    ['rules that are wrong', (n: number) => `<style>${'a:::{x:y}'.repeat(n / 10)}</style>`],
    ['declarations that are wrong', (n: number) => `<style>a{${'x;'.repeat(n / 2)}}</style>`],
    ['compounds', (n: number) => `<style>${'a '.repeat(n / 2)}{fill:red}</style><path/>`],
    ['selectors', (n: number) => `<style>${'.a,'.repeat(n / 10)}b{fill:red}</style><path/>`],
    [
      'ancestors asked for',
      (n: number) =>
        `<style>${'g '.repeat(30)}.a{fill:red}</style>${'<g>'.repeat(900)}${'<path/>'.repeat(n / 1000)}${'</g>'.repeat(900)}`,
    ],
    [
      'rules in rules',
      () => `<style>${'.a,.b,&amp;{'.repeat(30)}fill:red${'}'.repeat(30)}</style><path class="a"/>`,
    ],
    [
      'variables',
      () =>
        `<style>path{${Array.from({ length: 30 }, (_, i) => `--a${i}:${`var(--a${i + 1})`.repeat(10)}`).join(';')};--a30:x;stroke:var(--a0)}</style><path/>`,
    ],
    ['layers', (n: number) => `<style>@layer ${'a.'.repeat(n / 2)}b{a{fill:red}}</style>`],
    [
      'boxes in boxes',
      () =>
        `<style>g{transform-box:fill-box;transform:rotate(3deg)}</style>${'<g>'.repeat(300)}<path d="M1 1h9"/>${'</g>'.repeat(300)}`,
    ],
    [
      'colours mixed of colours',
      () => `<path d="M1 1h9" stroke="${'color-mix(red,'.repeat(26)}red${')'.repeat(26)}"/>`,
    ],
    ['open braces', (n: number) => `<style>${'a{'.repeat(n)}</style>`],
  ])('ends long before the square of the text would: %s', (_, make) => {
    // Quadratic time takes minutes here, and is ended by the time limit that every test has.
    expect(brokenPromises(readBody(make(400_000)))).toEqual([]);
  });
});
