import { describe, expect, test } from 'vitest';
import type { Drawing } from '../../../../src/core/drawing/drawing.ts';
import { readDrawing } from '../../../../src/core/drawing/readDrawing.ts';
import { codesOf, findingOf, IN_MM, readBody } from '../../../support/readStrokes.ts';

const LINE = 'd="M1 1L5 1"';

function coloursOf(body: string): string[] {
  return strokeColours(readBody(body));
}

function strokeColours(drawing: Drawing): string[] {
  return Array.from(drawing.strokes.colour, (c) => drawing.colours[c]);
}

describe('which of several values holds', () => {
  // SVG 2, "Presentation attributes", and CSS Cascading and Inheritance Level 4, "Cascade Sorting Order".
  test.each([
    ['an attribute', `<path ${LINE} stroke="red"/>`, '#ff0000'],
    ['the parent', `<g stroke="red"><path ${LINE}/></g>`, '#ff0000'],
    ['the style attribute over the attribute', `<path ${LINE} stroke="red" style="stroke:blue"/>`, '#0000ff'],
    ['the last of a style', `<path ${LINE} style="stroke:red;stroke : blue ;"/>`, '#0000ff'],
    ['the important of a style', `<path ${LINE} style="stroke:red !important;stroke:blue"/>`, '#ff0000'],
    [
      'the attribute over the parent’s style',
      `<g style="stroke:red"><path ${LINE} stroke="blue"/></g>`,
      '#0000ff',
    ],
    ['inherit', `<g stroke="red"><path ${LINE} stroke="inherit"/></g>`, '#ff0000'],
    ['a value that is wrong does not count', `<g stroke="red"><path ${LINE} stroke="#12"/></g>`, '#ff0000'],
    ['comments in a style', `<path ${LINE} style="/*stroke:red;*/stroke:/**/blue"/>`, '#0000ff'],
    ['names in any case', `<path ${LINE} style="STROKE:Blue"/>`, '#0000ff'],
    ['currentColor', `<g color="red"><path ${LINE} stroke="currentColor"/></g>`, '#ff0000'],
    [
      'currentColor of the child',
      `<g color="red" stroke="currentColor"><path ${LINE} color="lime"/></g>`,
      '#00ff00',
    ],
    ['currentColor without color', `<path ${LINE} stroke="currentColor"/>`, '#000000'],
  ])('%s', (_, body, expected) => {
    expect(coloursOf(body)).toEqual([expected]);
  });

  test('initial is none for a stroke', () => {
    expect(coloursOf(`<g stroke="red"><path ${LINE} stroke="initial"/></g>`)).toEqual([]);
  });
});

describe('style sheets', () => {
  const sheet = (css: string, element: string): string[] =>
    coloursOf(`<style>${css}</style><g stroke="green">${element}</g>`);

  test.each([
    ['.a{stroke:red}', `<path ${LINE} class="b a"/>`, '#ff0000'],
    ['path{stroke:red}', `<path ${LINE}/>`, '#ff0000'],
    ['#x{stroke:red}', `<path ${LINE} id="x"/>`, '#ff0000'],
    ['*{stroke:red}', `<path ${LINE}/>`, '#ff0000'],
    ['.a,.b{stroke:red}', `<path ${LINE} class="b"/>`, '#ff0000'],
    ['path.a.b{stroke:red}', `<path ${LINE} class="b a"/>`, '#ff0000'],
    ['path.a.b{stroke:red}', `<path ${LINE} class="a"/>`, '#008000'],
    ['.a{stroke:red}.a{stroke:blue}', `<path ${LINE} class="a"/>`, '#0000ff'],
    ['#x{stroke:red}.a{stroke:blue}path{stroke:lime}', `<path ${LINE} class="a" id="x"/>`, '#ff0000'],
    ['.a{stroke:red}', `<path ${LINE} class="a" stroke="blue"/>`, '#ff0000'],
    ['.a{stroke:red}', `<path ${LINE} class="a" style="stroke:blue"/>`, '#0000ff'],
    ['.a{stroke:red!important}', `<path ${LINE} class="a" style="stroke:blue"/>`, '#ff0000'],
    ['/*x*/ .a { stroke : red ; } ', `<path ${LINE} class="a"/>`, '#ff0000'],
    ['<![CDATA[ .a{stroke:red} ]]>', `<path ${LINE} class="a"/>`, '#ff0000'],
    ['@font-face{font-family:x;src:url(y)}.a{stroke:red}', `<path ${LINE} class="a"/>`, '#ff0000'],
    ['@media screen{.a{stroke:red}}@media print{.a{stroke:blue}}', `<path ${LINE} class="a"/>`, '#ff0000'],
    ['.a:hover{stroke:blue}.a{stroke:red}', `<path ${LINE} class="a"/>`, '#ff0000'],
  ])('%s on %s', (css, element, expected) => {
    expect(sheet(css, element)).toEqual([expected]);
  });

  // Selectors Level 3, §8.1 and §8.2.
  test.each([
    ['g path{stroke:red}', '#ff0000'],
    ['svg > g > g > .a{stroke:red}', '#ff0000'],
    ['svg>path{stroke:red}', '#008000'],
    ['svg path{stroke:red}', '#ff0000'],
    ['#o .m > .a{stroke:red}', '#ff0000'],
    ['#o > .a{stroke:red}', '#008000'],
    ['.m .m .a{stroke:red}', '#008000'],
    ['g > * .a{stroke:red}', '#ff0000'],
    ['.a{stroke:blue}g .a{stroke:red}', '#ff0000'],
    ['.a.a{stroke:blue}g .a{stroke:red}', '#0000ff'],
  ])('descendants and children: %s', (css, expected) => {
    const body = `<style>${css}</style><g stroke="green" id="o"><g class="m"><path ${LINE} class="a"/></g></g>`;
    expect(coloursOf(body)).toEqual([expected]);
  });

  // SVG 2, "The use-element shadow tree": selectors match inside the copy only.
  test('ancestors of the use, and of what it copies, do not count', () => {
    const defs = `<defs class="d"><g id="q" class="k"><path ${LINE} class="a"/></g></defs>`;
    const use = '<g class="u" stroke="green"><use href="#q"/></g>';
    expect(coloursOf(`<style>.d .a,.u .a{stroke:red}</style>${defs}${use}`)).toEqual(['#008000']);
    expect(coloursOf(`<style>.k .a{stroke:red}</style>${defs}${use}`)).toEqual(['#ff0000']);
  });

  test('rules that are not read are counted with their places, the others hold', () => {
    const drawing = readBody(
      `<style>\n@media (width &gt; 9px){.c{stroke:blue}}\n.c{stroke:red} .c, a:nope{stroke:blue}
       @import "x.css"; .c{stroke:foo(1)}</style><path ${LINE} class="c"/>`,
    );
    expect(strokeColours(drawing)).toEqual(['#ff0000']);
    const { values, places } = findingOf(drawing, 'style-rule-not-read');
    expect(values).toEqual({ rule: '@media (width > 9px)', count: 2 });
    expect(places?.map(({ line, column }) => [line, column])).toEqual([
      [2, 1],
      [3, 16],
    ]);
    expect(findingOf(drawing, 'style-sheet-not-read').values).toEqual({ type: '@import "x.css"', count: 1 });
    expect(findingOf(drawing, 'colour-not-read').values).toEqual({ found: 'foo(1)', count: 1 });
  });

  test('a sheet for other media does not hold', () => {
    const sheet = (media: string) => `<style media="${media}">path{stroke:red}</style>`;
    expect(coloursOf(`${sheet('print')}<path ${LINE} stroke="blue"/>`)).toEqual(['#0000ff']);
    expect(coloursOf(`${sheet('screen')}<path ${LINE} stroke="blue"/>`)).toEqual(['#ff0000']);
  });

  test('sheets elsewhere are named, not fetched', () => {
    const drawing = readDrawing(
      `<?xml version="1.0"?><?xml-stylesheet href="a.css" type="text/css"?>\n<svg ${IN_MM}><style>@import url(b.css);</style><path ${LINE} stroke="red"/></svg>`,
    );
    const { values, places } = findingOf(drawing, 'style-sheet-not-read');
    expect(values).toEqual({ type: 'xml-stylesheet href="a.css" type="text/css"', count: 2 });
    expect(places?.map(({ line }) => line)).toEqual([1, 2]);
  });

  test('what is wrong or beyond this reader is said', () => {
    const drawing = readBody(
      `<style>.a{stroke-width:3vw}\n.b{stroke:rgb(from red r g b)}@property --x{syntax:"*"}</style>
       <path ${LINE} class="a" stroke="red"/><path ${LINE} class="b" style="width:1px;offset-path:path('M0 0h9');transform:nope(2)"/>`,
    );
    expect(
      drawing.findings.map(({ code, values, place }) => [code, values.found ?? values.rule, place?.line]),
    ).toEqual([
      ['style-value-not-read', '3vw', 1],
      ['style-rule-not-read', '@property --x', 2],
      ['colour-not-read', 'rgb(from red r g b)', 3],
      ['motion-path-not-applied', undefined, 3],
    ]);
    expect(findingOf(drawing, 'style-value-not-read').values).toEqual({
      property: 'stroke-width',
      found: '3vw',
      count: 2,
    });
  });

  test('a sheet in another language is not read', () => {
    const drawing = readBody(`<style type="text/less">.a{stroke:red}</style><path class="a" ${LINE}/>`);
    expect(findingOf(drawing, 'style-sheet-not-read').severity).toBe('warning');
  });
});

describe('copies', () => {
  // SVG 2, "The use-element shadow tree": inherited from the use, matched within the copy.
  test('custom properties and inherit come from the use', () => {
    const defs = `<defs style="--c:blue"><path id="p" ${LINE} style="stroke:var(--c);opacity:inherit"/></defs>`;
    const use = '<use href="#p" style="--c:red"/><g style="--c:lime"><use href="#p"/></g>';
    expect(coloursOf(`${defs}${use}`)).toEqual(['#ff0000', '#00ff00']);
    expect(coloursOf(`${defs}<use href="#p" style="opacity:0"/>`)).toEqual([]);
  });

  test('the copied element is the first and only child', () => {
    const defs = `<defs><rect/><path id="p" class="a" ${LINE}/></defs>`;
    expect(
      coloursOf(`<style>.a:only-child{stroke:red}rect+.a{stroke:blue}</style>${defs}<use href="#p"/>`),
    ).toEqual(['#ff0000']);
  });
});

describe('what is not drawn is counted', () => {
  test.each([
    ['filled-not-stroked', `<path ${LINE}/>`],
    ['filled-not-stroked', `<path ${LINE} stroke="none"/>`],
    ['filled-not-stroked', `<path ${LINE} stroke="url(#missing)"/>`],
    ['invisible', `<path ${LINE} fill="none"/>`],
    ['invisible', `<line x2="5"/>`],
    ['invisible', `<path ${LINE} stroke="red" stroke-width="0"/>`],
    ['invisible', `<path ${LINE} stroke="red" stroke-opacity="0"/>`],
    ['invisible', `<path ${LINE} stroke="transparent" fill="none"/>`],
    ['invisible', `<path ${LINE} stroke="#f000"/>`],
    ['invisible', `<path ${LINE} stroke="red" opacity="0"/>`],
    ['invisible', `<g opacity="0%"><path ${LINE} stroke="red"/></g>`],
    ['invisible', `<g visibility="hidden"><path ${LINE} stroke="red"/></g>`],
    ['invisible', `<path ${LINE} stroke="red" visibility="collapse"/>`],
    ['hidden', `<path ${LINE} stroke="red" display="none"/>`],
    ['hidden', `<g style="display:none"><g display="inline"><path ${LINE} stroke="red"/></g></g>`],
    ['condition-not-met', `<path ${LINE} stroke="red" systemLanguage="xx"/>`],
    ['flattened-to-nothing', `<path ${LINE} stroke="red" transform="scale(0)"/>`],
  ])('%s: %s', (code, body) => {
    const drawing = readBody(body);
    expect(drawing.strokes.count).toBe(0);
    expect(codesOf(drawing)).toEqual([code]);
    expect(findingOf(drawing, code).values.count).toBe(1);
    expect(drawing.elementCount).toBe(1);
  });

  // SVG 2, "The visibility property": a child may be visible again; under display:none it may not.
  test('a visible child of a hidden group is drawn', () => {
    expect(
      coloursOf(`<g visibility="hidden"><path ${LINE} stroke="red" visibility="visible"/></g>`),
    ).toHaveLength(1);
  });

  test('below full opacity is drawn in full', () => {
    expect(coloursOf(`<path ${LINE} stroke="rgba(255,0,0,.1)" opacity=".1" stroke-opacity="10%"/>`)).toEqual([
      '#ff0000',
    ]);
  });

  test('10,000 filled squares are one finding, with the whole outline', () => {
    const drawing = readBody(`<g>\n${'<rect width="2" height="3"/>'.repeat(10_000)}</g>`);
    expect(drawing.findings).toHaveLength(1);
    expect(drawing.findings[0]).toMatchObject({
      code: 'filled-not-stroked',
      place: { element: 'rect', id: null, line: 2, column: 1 },
      values: { count: 10_000 },
    });
    expect(drawing.findings[0].values.outlineMm).toBeCloseTo(100_000, 6);
  });

  test('texts, images and the like, with the first of them', () => {
    const drawing = readBody(
      '<text x="1">Hello,\n <tspan>world</tspan></text><text>again</text>' +
        '<image href="photo.png"/><foreignObject/><wobble/>',
    );
    expect(drawing.findings.map((f) => [f.code, f.values])).toEqual([
      ['text-not-drawn', { text: 'Hello, world', count: 2 }],
      ['image-not-drawn', { href: 'photo.png', count: 1 }],
      ['foreign-object-not-drawn', { count: 1 }],
      ['unknown-element', { name: 'wobble', count: 1 }],
    ]);
  });

  test('masks and markers are said where a stroke is drawn without them', () => {
    const drawing = readBody(
      `<marker id="m"/><mask id="k"/><g stroke="red" fill="none"><path ${LINE} mask="url(#k)"/>
       <path ${LINE} marker-end="url(#m)"/><path ${LINE} style="marker:url(#m)"/><path ${LINE} marker="url(#m)"/>
       <path ${LINE} stroke-dasharray="0 0" marker-end="url(#missing)" clip-path="url(#missing)"/></g>`,
    );
    expect(drawing.strokes.count).toBe(5);
    expect(drawing.findings.map((f) => [f.code, f.values.count])).toEqual([
      ['mask-not-applied', 1],
      ['markers-not-drawn', 2],
    ]);
  });
});

describe('colours and widths of strokes', () => {
  test('colours are canonical and in the order met', () => {
    const drawing = readBody(
      `<path ${LINE} stroke="RED"/><path ${LINE} stroke="blue"/><path ${LINE} stroke="rgb(255,0,0)"/>`,
    );
    expect(drawing.colours).toEqual(['#ff0000', '#0000ff']);
    expect([...drawing.strokes.colour]).toEqual([0, 1, 0]);
  });

  test('a gradient’s strokes are drawn as lines under its name', () => {
    const drawing = readBody(`<path ${LINE} stroke="url(#sky)"/><defs><linearGradient id="sky"/></defs>`);
    expect(drawing.colours).toEqual(['sky']);
    expect(findingOf(drawing, 'paint-server-drawn-as-line').values).toEqual({ paint: 'sky', count: 1 });
  });

  test('white is a colour like others, and said', () => {
    const drawing = readBody(`<path ${LINE} stroke="#FFF" fill="none"/>`);
    expect(drawing.colours).toEqual(['#ffffff']);
    expect(codesOf(drawing)).toEqual(['white-strokes']);
  });

  test('widths follow the transforms, unless they are told not to', () => {
    const drawing = readBody(
      `<g transform="scale(2 8)"><path ${LINE} stroke="red" stroke-width="3"/>
       <path ${LINE} stroke="red" stroke-width="96" vector-effect="non-scaling-stroke"/></g>
       <path ${LINE} stroke="red" stroke-width="10%"/><path ${LINE} stroke="red"/>`,
    );
    // 3 × √(2·8); 96 px; a tenth of √((100² + 100²)/2); the initial value 1.
    expect([...drawing.strokes.widthMm]).toEqual([12, 25.4, 10, 1]);
  });
});
