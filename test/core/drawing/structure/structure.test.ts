import { describe, expect, test } from 'vitest';
import { NO_LAYER } from '../../../../src/core/drawing/drawing.ts';
import { readDrawing } from '../../../../src/core/drawing/readDrawing.ts';
import {
  brokenPromises,
  codesOf,
  findingOf,
  IN_MM,
  readBody,
  textsOf,
} from '../../../support/readStrokes.ts';

const STROKED = 'fill="none" stroke="black"';

function drawn(body: string): string[] {
  const drawing = readBody(`<g ${STROKED}>${body}</g>`);
  expect(brokenPromises(drawing)).toEqual([]);
  return textsOf(drawing);
}

/** Two bodies that a browser draws alike. */
function expectSame(body: string, plain: string): void {
  const expected = drawn(plain);
  expect(expected.length).toBeGreaterThan(0);
  expect(drawn(body)).toEqual(expected);
}

describe('groups and transforms', () => {
  test('nest', () => {
    expectSame(
      '<g transform="translate(10 0)"><a transform="scale(2)"><path transform="rotate(90)" d="M1 1h2"/></a></g>',
      '<path d="M8 2v4"/>',
    );
  });

  test('a circle under a skew stays an arc, its centre and half-diameters mapped', () => {
    expect(drawn('<circle r="2" transform="matrix(1 0 1 1 10 20)"/>')[0]).toMatch(
      /^12,20 A 10,20 2,0 2,2 0 1\.570796 12,22 A /,
    );
  });

  test('a transform that is wrong is left aside, and said', () => {
    const drawing = readBody(`<path ${STROKED} d="M1 1h1" transform="rotate(1 2)"/>`);
    expect(textsOf(drawing)).toEqual(['1,1 L 2,1']);
    expect(findingOf(drawing, 'transform-error').values.transform).toBe('rotate(1 2)');
  });

  test('a transform in the style, with units', () => {
    expectSame('<path style="transform:translate(2px,3px) rotate(90deg)" d="M1 1h1"/>', '<path d="M1 4v1"/>');
  });
});

describe('nested svg', () => {
  test('x, y, width, height and viewBox', () => {
    expectSame(
      '<svg x="10" y="20" width="20" height="10" viewBox="0 0 40 20"><path d="M2 2h4"/></svg>',
      '<path d="M11 21h2"/>',
    );
  });

  // 30 × 30 in 60 × 30, xMaxYMin: 30 units free at the left.
  test('preserveAspectRatio', () => {
    expectSame(
      '<svg width="60" height="30" viewBox="0 0 30 30" preserveAspectRatio="xMaxYMin"><path d="M2 2h4"/></svg>',
      '<path d="M32 2h4"/>',
    );
    expectSame(
      '<svg width="60" height="30" viewBox="0 0 30 30" preserveAspectRatio="xMidYMax slice"><path d="M2 20h4"/></svg>',
      '<path d="M4 10h8"/>',
    );
  });

  test('is as large as what it stands in, and percentages inside are of itself', () => {
    expectSame('<svg x="10"><line x2="50%" y2="1"/></svg>', '<path d="M10 0L60 1"/>');
    expectSame('<svg width="50%" height="10"><line x2="50%" y2="50%"/></svg>', '<path d="M0 0L25 5"/>');
    expectSame(
      '<svg viewBox="0 0 10 10" width="20" height="20"><line x2="50%"/></svg>',
      '<path d="M0 0H10"/>',
    );
  });

  test('without a size draws nothing', () => {
    const drawing = readBody(`<svg width="0" ${STROKED}><path d="M1 1h1"/></svg>`);
    expect(drawing.strokes.count).toBe(0);
    expect(codesOf(drawing)).toEqual(['nothing-to-draw']);
  });
});

describe('use', () => {
  test('of a shape, before and after it is defined, with x, y and transform', () => {
    expectSame(
      '<use href="#p" x="10" y="5" transform="scale(2)"/><path id="p" d="M1 1h1"/><use href="#p"/>',
      '<path d="M22 12h2"/><path d="M1 1h1"/><path d="M1 1h1"/>',
    );
  });

  test('of a group in defs, through the older attribute', () => {
    expectSame(
      '<defs><g id="q" transform="translate(3)"><path d="M1 1h1"/><path d="M2 2h1"/></g></defs>' +
        '<use xmlns:xlink="http://www.w3.org/1999/xlink" xlink:href="#q" x="1"/>',
      '<path d="M5 1h1"/><path d="M6 2h1"/>',
    );
  });

  test('style comes from where the use stands', () => {
    const drawing = readBody(
      '<defs><path id="p" d="M1 1h1"/></defs><use href="#p" stroke="red"/><use href="#p" stroke="blue"/>',
    );
    expect(drawing.colours).toEqual(['#ff0000', '#0000ff']);
  });

  // SVG 2, "The symbol element": it establishes a viewport, 100 % by default, sized by the use.
  test('of a symbol with a viewBox', () => {
    const symbol = '<symbol id="s" viewBox="0 0 10 10"><path d="M1 1h1"/></symbol>';
    expectSame(`${symbol}<use href="#s" x="5" y="6" width="20" height="20"/>`, '<path d="M7 8h2"/>');
    expectSame(`${symbol}<use href="#s"/>`, '<path d="M10 10h10"/>');
    expectSame(`${symbol}<use href="#s" width="40" height="20"/>`, '<path d="M12 2h2"/>');
    expectSame('<symbol id="s"><path d="M1 1h1"/></symbol><use href="#s" x="1"/>', '<path d="M2 1h1"/>');
  });

  test('of an svg, whose size it may override', () => {
    const svg =
      '<defs><svg id="v" x="1" width="10" height="10" viewBox="0 0 10 10"><path d="M1 1h1"/></svg></defs>';
    expectSame(`${svg}<use href="#v"/>`, '<path d="M2 1h1"/>');
    expectSame(`${svg}<use href="#v" width="20" height="20"/>`, '<path d="M3 2h2"/>');
    // SVG 2, "The use element": auto is as if the use said nothing.
    expectSame(`${svg}<use href="#v" width="auto" height="20"/>`, '<path d="M2 6h1"/>');
  });

  test('in use, eight deep: 2⁸ copies', () => {
    let defs = '<path id="u0" d="M1 1h1"/>';
    for (let i = 1; i <= 8; i++)
      defs += `<g id="u${i}"><use href="#u${i - 1}"/><use href="#u${i - 1}" y="1"/></g>`;
    const drawing = readBody(`<defs>${defs}</defs><g ${STROKED}><use href="#u8"/></g>`);
    expect(drawing.strokes.count).toBe(256);
    expect(drawing.elementCount).toBe(256);
    expect(drawing.places).toHaveLength(1);
  });

  test('the first of several elements with one id is meant', () => {
    expectSame(
      '<defs><path id="p" d="M1 1h1"/><path id="p" d="M5 5h5"/></defs><use href="#p"/>',
      '<path d="M1 1h1"/>',
    );
  });

  test('ids that look like numbers or like members of every object', () => {
    for (const id of ['001', '1e3', '__proto__', 'constructor', 'toString']) {
      expectSame(`<defs><path id="${id}" d="M1 1h1"/></defs><use href="#${id}"/>`, '<path d="M1 1h1"/>');
    }
  });

  test.each([
    ['use-missing', '<use href="#nowhere"/>'],
    ['use-missing', '<use/>'],
    ['use-external', '<use href="other.svg#a"/>'],
    ['use-loop', '<g id="a"><use href="#a"/></g>'],
    ['use-loop', '<use id="a" href="#a"/>'],
    ['use-loop', '<defs><g id="a"><use href="#b"/></g><g id="b"><use href="#a"/></g></defs><use href="#a"/>'],
  ])('%s: %s', (code, body) => {
    const drawing = readBody(body);
    expect(drawing.strokes.count).toBe(0);
    expect(codesOf(drawing)).toEqual([code]);
  });

  test('what a loop stands beside is still drawn', () => {
    expectSame('<g id="a"><path d="M1 1h1"/><use href="#a"/></g>', '<path d="M1 1h1"/>');
  });
});

describe('copies of each other', () => {
  // SVG 2, "The use element": a reference to an ancestor, copies counted, makes none. Chromium draws these four.
  test('stop where what is copied would stand in itself', () => {
    expectSame(
      '<g id="a"><path d="M1 1h9"/><use href="#b" x="9"/></g><g id="b"><path d="M1 5h9"/><use href="#a" y="9"/></g>',
      '<path d="M1 1h9"/><path d="M10 5h9"/><path d="M1 5h9"/><path d="M1 10h9"/>',
    );
  });
});

describe('switch', () => {
  // SVG 2, "The switch element": the first child whose conditions hold, whatever it is; Chromium does so too.
  test('a title or defs before all others is chosen, and nothing drawn', () => {
    for (const first of ['<title>t</title>', '<defs/>']) {
      const drawing = readBody(`<switch>${first}<g ${STROKED}><path d="M1 1h1"/></g></switch>`);
      expect(drawing.strokes.count).toBe(0);
      expect(codesOf(drawing)).toContain('switch-without-match');
    }
  });

  test('draws the first child whose conditions hold', () => {
    expectSame(
      '<switch><path systemLanguage="xx" d="M9 9h1"/><path systemLanguage="xx, en-GB" d="M1 1h1"/><path d="M2 2h1"/></switch>',
      '<path d="M1 1h1"/>',
    );
  });

  // As some editors wrap a whole drawing: their own data first, the drawing beside it.
  test('passes over a foreignObject', () => {
    const body =
      '<switch><foreignObject requiredExtensions="urn:x"><p xmlns="urn:y"/></foreignObject><g><path d="M1 1h1"/></g></switch>';
    expectSame(body, '<path d="M1 1h1"/>');
    expect(codesOf(readBody(`<g ${STROKED}>${body}</g>`))).toEqual([]);
    const unconditional = body.replace(' requiredExtensions="urn:x"', '');
    expectSame(unconditional, '<path d="M1 1h1"/>');
    expect(codesOf(readBody(`<g ${STROKED}>${unconditional}</g>`))).toEqual(['foreign-object-not-drawn']);
  });

  test('without a child that holds draws nothing, and says so', () => {
    const drawing = readBody('<switch><g requiredExtensions="urn:x"/></switch>');
    expect(codesOf(drawing)).toEqual(['switch-without-match']);
  });
});

test('what is only there to be referred to is not drawn', () => {
  const inner = `<path ${STROKED} d="M1 1h1"/>`;
  for (const name of [
    'defs',
    'symbol',
    'clipPath',
    'mask',
    'pattern',
    'marker',
    'linearGradient',
    'metadata',
  ]) {
    const drawing = readBody(`<${name}>${inner}</${name}>`);
    expect(drawing.strokes.count).toBe(0);
    expect(drawing.findings).toEqual([]);
  }
});

describe('layers', () => {
  test('are the groups below the root, with id and label', () => {
    const drawing = readDrawing(
      `<svg ${IN_MM} xmlns:ed="urn:editor" ${STROKED}><g id="a" ed:label=" Cut\n lines "><path d="M1 1h1"/><g><path d="M1 2h1"/></g></g>
       <path d="M1 3h1"/><g display="none"><title>Fold</title><path d="M1 4h1"/></g><g id="c"><path d="M1 5h1"/></g></svg>`,
    );
    expect(drawing.layers).toEqual([
      { id: 'a', label: 'Cut lines' },
      { id: null, label: 'Fold' },
      { id: 'c', label: null },
    ]);
    expect([...drawing.strokes.layer]).toEqual([0, 0, NO_LAYER, 2]);
    expect(findingOf(drawing, 'hidden').values.count).toBe(1);
  });
});

test('title, description, name and places', () => {
  const drawing = readDrawing(
    `<svg ${IN_MM}>\n <title>A &amp; B</title><desc>two\n lines</desc>\n  <path id="p" ${STROKED} d="M1 1h1"/>\n</svg>`,
    { name: 'plan.svg' },
  );
  expect(drawing).toMatchObject({ name: 'plan.svg', title: 'A & B', description: 'two lines' });
  expect(drawing.places).toEqual([{ element: 'path', id: 'p', line: 4, column: 3 }]);
});
