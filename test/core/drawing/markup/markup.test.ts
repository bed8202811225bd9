import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../../../src/core/drawing/readDrawing.ts';
import { codesOf, findingOf, IN_MM, readBody, textsOf } from '../../../support/readStrokes.ts';

const NS = 'xmlns="http://www.w3.org/2000/svg"';
const LINE = '<path d="M1 1h1" fill="none" stroke="black"/>';
const DRAWN = ['1,1 L 2,1'];

function expectLine(text: string): void {
  const drawing = readDrawing(text);
  expect(drawing.findings).toEqual([]);
  expect(textsOf(drawing)).toEqual(DRAWN);
}

describe('what XML allows is read', () => {
  test.each([
    ['a byte order mark', `\ufeff<svg ${IN_MM}>${LINE}</svg>`],
    ['white space around', `\n\t<svg ${IN_MM}>${LINE}</svg>\n\n`],
    ['a prolog', `<?xml version="1.0" encoding="UTF-8" standalone="no"?>\n<svg ${IN_MM}>${LINE}</svg>`],
    [
      'a document type',
      `<!DOCTYPE svg PUBLIC "-//W3C//DTD SVG 1.1//EN" "x.dtd">\n<svg ${IN_MM}>${LINE}</svg>`,
    ],
    [
      'an internal subset',
      `<!DOCTYPE svg [<!ATTLIST svg a CDATA #IMPLIED b (c|d) "c" e CDATA ">"><!-- > ] --><?x ]> ?><!ELEMENT g (a)><!NOTATION n SYSTEM "]>">]><svg ${IN_MM}>${LINE}</svg>`,
    ],
    [
      'comments with tags, before and inside',
      `<!-- <svg> --><svg ${IN_MM}><!-- </svg> <g -->${LINE}</svg><!-- & -->`,
    ],
    ['processing instructions', `<?a <svg> ?><svg ${IN_MM}><?b </svg> ?>${LINE}</svg><?c?>`],
    ['single quotes, and the other kind inside', `<svg ${IN_MM}><g id='a"b>'>${LINE}</g></svg>`],
    ['white space in tags', `<svg ${IN_MM} ><g\nid = "a"\t>${LINE}</g\n></svg >`],
    ['a backslash before a quote', `<svg ${IN_MM}><g id="a\\">${LINE}</g></svg>`],
    ['names with points and letters of any script', `<svg ${IN_MM}><g x.y="1" größe="2">${LINE}</g></svg>`],
    ['names that every object has', `<svg ${IN_MM}><g __proto__="1" constructor="2">${LINE}</g></svg>`],
    ['CDATA with tags', `<svg ${IN_MM}><desc><![CDATA[ </svg> & ]]></desc>${LINE}</svg>`],
    [
      'elements of other names, odd ones too',
      `<svg ${IN_MM} xmlns:e="urn:e"><e:a.b><e:c/></e:a.b>${LINE}</svg>`,
    ],
    [
      'a prefix for SVG',
      `<s:svg xmlns:s="http://www.w3.org/2000/svg" ${IN_MM}>${LINE.replace('<', '<s:')}</s:svg>`,
    ],
    ['windows line ends', `<svg\r\n${IN_MM}>\r\n${LINE}\r\n</svg>`],
  ])('%s', (_, text) => {
    expectLine(text);
  });

  test('values stay as they are written: numbers are not coerced', () => {
    const drawing = readBody('<g id="001"><path id="1e3" d="M1 1h1" fill="none" stroke="#000000"/></g>');
    expect(drawing.layers[0].id).toBe('001');
    expect(drawing.places[0].id).toBe('1e3');
  });

  test('an attribute of 8 MB', () => {
    const drawing = readBody(`<path d="M1 1${'L2 1 1 1 '.repeat(1_000_000)}" fill="none" stroke="black"/>`);
    expect(drawing.strokes.segments.count).toBe(2_000_000);
  });
});

describe('names and namespaces', () => {
  test('no namespace: read, with a warning', () => {
    const drawing = readDrawing(`<svg width="10mm" height="10mm" viewBox="0 0 10 10">${LINE}</svg>`);
    expect(textsOf(drawing)).toEqual(DRAWN);
    expect(drawing.findings).toMatchObject([
      {
        code: 'svg-namespace-missing',
        severity: 'warning',
        values: { element: 'svg', isRoot: 1, count: 2 },
      },
    ]);
  });

  test('undeclared prefixes: read where it is svg, with a warning', () => {
    const drawing = readBody(`${LINE.replace('<', '<svg:')}<ed:path d="M1 1h1" ed:x="1"/>`);
    expect(textsOf(drawing)).toEqual(DRAWN);
    expect(findingOf(drawing, 'undeclared-prefix').values).toEqual({ prefix: 'svg', count: 3 });
  });

  test('elements of another namespace draw nothing, and neither does what is in them', () => {
    const drawing = readBody(`<g xmlns="urn:other">${LINE}</g>`);
    expect(drawing.strokes.count).toBe(0);
  });
});

describe('what is not well formed is an error with its place', () => {
  test.each([
    ['', 'empty-input', null, null],
    [' \n ', 'empty-input', null, null],
    ['\ufeff', 'empty-input', null, null],
    ['hello', 'not-xml', 1, 1],
    ['\n {"a": 1}', 'not-xml', 2, 2],
    ['G0 X1 Y2', 'not-xml', 1, 1],
    ['<!-- only -->', 'not-xml', 1, 1],
    ['<html><body/></html>', 'not-svg', 1, 1],
    ['<g xmlns="http://www.w3.org/2000/svg"/>', 'not-svg', 1, 1],
    ['<svg xmlns="urn:other"/>', 'not-svg', 1, 1],
    [`<svg ${NS}>\n <g></svg>`, 'xml-tag-mismatch', 2, 5],
    [`<svg ${NS}></svg></g>`, 'xml-unopened-tag', 1, 47],
    [`<svg ${NS}/>\n<svg ${NS}/>`, 'xml-two-roots', 2, 1],
    [`<svg ${NS}/>x`, 'xml-text-outside-root', 1, 42],
    ['<svg a=1/>', 'xml-bad-attribute', 1, 6],
    ['<svg a/>', 'xml-bad-attribute', 1, 6],
    ['<svg a="1" a="2"/>', 'xml-duplicate-attribute', 1, 12],
    ['<svg a="1>\n<g b="2"/></svg>', 'xml-bad-attribute', 1, 6],
    ['<svg a="1"b="2"/>', 'xml-bad-tag', 1, 1],
    ['<svg>< g/></svg>', 'xml-bad-tag', 1, 6],
    ['<svg><1/></svg>', 'xml-bad-tag', 1, 6],
    ['<svg><!ELEMENT a></svg>', 'xml-bad-tag', 1, 6],
    ['<svg>\u0000</svg>', 'xml-bad-character', 1, 6],
  ])('%j: %s', (text, code, line, column) => {
    const drawing = readDrawing(text);
    expect(drawing.strokes.count).toBe(0);
    const [finding] = drawing.findings;
    expect(finding).toMatchObject({ code, severity: 'error' });
    expect([finding.place?.line ?? null, finding.place?.column ?? null]).toEqual([line, column]);
  });

  test.each([
    ['<svg><a$b/></svg>', 'xml-bad-tag', 6],
    ['<svg><a:b:c/></svg>', 'xml-bad-tag', 6],
    ['<svg><g a$="1"/></svg>', 'xml-bad-attribute', 9],
    ['<svg><g a:b:c="1"/></svg>', 'xml-bad-attribute', 9],
    ['<svg><? x?></svg>', 'xml-bad-tag', 6],
    ['<svg><?a+b?></svg>', 'xml-bad-tag', 6],
    ['<svg></ svg>', 'xml-bad-tag', 6],
    ['<svg></svg a="1">', 'xml-bad-tag', 6],
    ['<svg><g / ></svg>', 'xml-bad-tag', 6],
    ['<svg/>\u00a0', 'xml-text-outside-root', 7],
    ['<![CDATA[ ]]><svg/>', 'xml-text-outside-root', 1],
    ['<!DOCTYPE svg [<!ENTITY e " ">]>&e;<svg/>', 'xml-text-outside-root', 33],
    ['<!DOCTYPE svg><!DOCTYPE svg><svg/>', 'xml-bad-tag', 15],
    ['<!doctype svg><svg/>', 'xml-bad-tag', 1],
    ['<!DOCTYPE><svg/>', 'xml-bad-doctype', 10],
    ['<!DOCTYPE svg PUBLIC "a"><svg/>', 'xml-bad-doctype', 25],
    ['<!DOCTYPE svg [ foo ]><svg/>', 'xml-bad-doctype', 17],
    ['<!DOCTYPE svg [<!FOO a>]><svg/>', 'xml-bad-doctype', 16],
    ['<!DOCTYPE svg [<!ENTITY a "50%">]><svg/>', 'xml-bad-doctype', 30],
    ['<!DOCTYPE svg [<!ENTITY a"b">]><svg/>', 'xml-bad-doctype', 26],
    ['<!DOCTYPE svg [<!ENTITY % p "%p;">%p;]><svg/>', 'xml-bad-doctype', 30],
    ['<!DOCTYPE svg [<!ATTLIST g a FOO "1">]><svg/>', 'xml-bad-doctype', 30],
    ['<!DOCTYPE svg [<!ATTLIST g a CDATA "<">]><svg/>', 'xml-bad-doctype', 28],
    ['<svg xmlns:a="u" xmlns:b="u" a:x="1" b:x="2"/>', 'xml-duplicate-attribute', 1],
    ['<svg>\ud800</svg>', 'xml-bad-character', 6],
  ])('%j: %s, as a browser has it', (text, code, column) => {
    const [finding] = readDrawing(text).findings;
    expect(finding).toMatchObject({ code, severity: 'error', place: { line: 1, column } });
  });

  test.each([
    ['a double hyphen in a comment', `<svg ${IN_MM}><!-- a -- b --->${LINE}</svg>`],
    [']]> in text', `<svg ${IN_MM}><desc>a ]]> b</desc>${LINE}</svg>`],
    ['an XML declaration not at the very start', `\n<?xml version="1.0"?><svg ${IN_MM}>${LINE}</svg>`],
    [
      'the XML declaration',
      `<?xml version="1.0" standalone="no" encoding="utf-8"?><svg ${IN_MM}>${LINE}</svg>`,
    ],
    ['a reserved prefix declared', `<svg ${IN_MM} xmlns:xml="u">${LINE}</svg>`],
  ])('%s is read with a warning, since a browser refuses it', (what, text) => {
    const drawing = readDrawing(text);
    expect(drawing.findings).toMatchObject([
      { code: 'xml-not-strict', severity: 'warning', values: { what } },
    ]);
    expect(textsOf(drawing)).toEqual(DRAWN);
  });

  test('a file that is cut off anywhere', () => {
    const whole = `<?xml version="1.0"?><!DOCTYPE svg [<!ENTITY a "b">]>\n<svg ${IN_MM}>\n<!-- c --><g id="a">\n<![CDATA[x]]>${LINE}</g></svg>`;
    expect(readDrawing(whole).strokes.count).toBe(1);
    for (let length = 1; length < whole.length; length++) {
      const drawing = readDrawing(whole.slice(0, length));
      expect(drawing.strokes.count).toBe(0);
      expect(drawing.findings[0].severity).toBe('error');
      if (length > whole.indexOf('<svg')) expect(codesOf(drawing)[0]).toBe('xml-cut-off');
    }
  });

  test('the place of a cut is the end of the text; the values say what is open', () => {
    const drawing = readDrawing(`<svg ${NS}>\n  <g id="a">\n    <path d="M1 1`);
    expect(drawing.findings).toEqual([
      {
        code: 'xml-cut-off',
        severity: 'error',
        place: { element: 'g', id: null, line: 3, column: 18 },
        values: { inside: 'attribute', open: 2, startLine: 3, startColumn: 5 },
      },
    ]);
  });
});

describe('references', () => {
  test('the five, and characters by number', () => {
    expect(readBody('<g id="&lt;&gt;&amp;&quot;&apos;&#65;&#x42;&#x1F600;"/>').layers[0].id).toBe(
      '<>&"\'AB\u{1F600}',
    );
  });

  test('entities of the document, as older editors write their namespaces', () => {
    expectLine(
      `<!DOCTYPE svg [<!ENTITY ns_svg "http://www.w3.org/2000/svg"><!ENTITY d "M1 1&h;"><!ENTITY h 'h1'>]>
       <svg ${IN_MM.replace(/xmlns="[^"]*"/, 'xmlns="&ns_svg;"')}>${LINE.replace('M1 1h1', '&d;')}</svg>`,
    );
  });

  test('unknown ones stay as they are, and are said', () => {
    const drawing = readBody('<g id="a&nbsp;b & c&#0;"/>');
    expect(drawing.layers[0].id).toBe('a&nbsp;b & c&#0;');
    expect(findingOf(drawing, 'unknown-entity').values).toEqual({ entity: '&nbsp;', count: 1 });
  });

  test('external entities are not fetched', () => {
    const drawing = readDrawing(
      `<!DOCTYPE svg [<!ENTITY x SYSTEM "file:///etc/hosts">]><svg ${IN_MM}><text>&x;</text></svg>`,
    );
    expect(codesOf(drawing)).toEqual(['external-entity', 'text-not-drawn']);
  });

  // XML 1.0 §4.3.2, §4.4.2: an entity's text is read as content where its reference stands.
  test('entities with markup are read where they stand', () => {
    const drawing = readDrawing(
      `<!DOCTYPE svg [<!ENTITY x "<g id='i'>&y;</g>&y;"><!ENTITY y "&#60;path d='M1 1h1' stroke='red'/>">]><svg ${IN_MM}>\n &x;</svg>`,
    );
    expect(drawing.findings).toEqual([]);
    expect(textsOf(drawing)).toEqual([...DRAWN, ...DRAWN]);
    expect(drawing.layers[0].id).toBe('i');
    expect(drawing.places[0]).toMatchObject({ element: 'path', line: 2, column: 2 });
  });

  test.each([
    ['opens and does not close', '<!ENTITY x "<g>"><!ENTITY y "</g>">', '&x;&y;', 'xml-bad-entity'],
    ['closes what it did not open', '<!ENTITY x "</g><g>">', '<g>&x;</g>', 'xml-unopened-tag'],
    ['is cut off', '<!ENTITY x "<g">', '&x;', 'xml-cut-off'],
    ['holds itself in markup', '<!ENTITY x "<g>&x;</g>">', '&x;', 'entity-loop'],
    ['holds markup in a value', '<!ENTITY x "<g/>">', '<g id="&x;"/>', 'xml-bad-attribute'],
    ['holds a < in a value', '<!ENTITY x "&#60;">', '<g id="&x;"/>', 'xml-bad-attribute'],
  ])('an entity that %s is refused', (_, declared, body, code) => {
    const drawing = readDrawing(`<!DOCTYPE svg [${declared}]>\n<svg ${IN_MM}>${body}</svg>`);
    expect(drawing.findings).toMatchObject([{ code, severity: 'error' }]);
    expect(drawing.findings[0].place?.line).toBe(2);
  });

  test('a < written twice over is a character', () => {
    const drawing = readDrawing(
      `<!DOCTYPE svg [<!ENTITY x "&#38;#60;">]><svg ${IN_MM}><title>&x;</title><g id="&x;"/></svg>`,
    );
    expect([drawing.title, drawing.layers[0].id]).toEqual(['<', '<']);
  });

  test('parameter entities', () => {
    const drawing = readDrawing(
      `<!DOCTYPE svg [<!ENTITY % p "<!ENTITY q 'hello'>"> %p; <!ENTITY % e SYSTEM "x.ent"> %e; %no;]><svg ${IN_MM}><title>&q;</title></svg>`,
    );
    expect(drawing.title).toBe('hello');
    expect(findingOf(drawing, 'external-entity').values).toMatchObject({ entity: '%e;' });
    expect(findingOf(drawing, 'unknown-entity').values).toMatchObject({ entity: '%no;' });
  });

  // XML 1.0 §3.3.2: defaults hold where a tag leaves the attribute out, and the first declaration of it.
  test('default values of attributes', () => {
    const drawing = readDrawing(
      `<!DOCTYPE svg [<!ENTITY c "#ff0000"><!ATTLIST svg xmlns CDATA #FIXED "http://www.w3.org/2000/svg">
       <!ATTLIST path stroke CDATA "&c;" fill CDATA "none" stroke CDATA "blue" stroke-linecap (round|butt) #IMPLIED>]>
       <svg width="10mm" height="10mm" viewBox="0 0 10 10"><path d="M1 1h1"/><path stroke="#00ff00" d="M1 1h1"/></svg>`,
    );
    expect(drawing.findings).toEqual([]);
    expect(drawing.colours).toEqual(['#ff0000', '#00ff00']);
  });

  test('a document cannot grow by default values without limit', () => {
    const defaults = Array.from({ length: 2000 }, (_, i) => `a${i} CDATA "${'x'.repeat(100)}"`).join(' ');
    const text = `<!DOCTYPE svg [<!ATTLIST g ${defaults}>]><svg ${IN_MM}>${'<g/>'.repeat(1000)}</svg>`;
    expect(readDrawing(text).findings).toMatchObject([
      { code: 'entity-limit', values: { limit: 'entityCharacters', value: 4_000_000 } },
    ]);
  });

  test('an entity that holds itself is refused', () => {
    const drawing = readDrawing(
      `<!DOCTYPE svg [<!ENTITY a "&b;"><!ENTITY b "&a;">]><svg ${IN_MM}>\n<g id="&a;"/></svg>`,
    );
    expect(drawing.findings).toMatchObject([{ code: 'entity-loop', severity: 'error', place: { line: 2 } }]);
  });

  test('an entity that explodes is refused at once', () => {
    const levels = Array.from({ length: 40 }, (_, i) => `<!ENTITY a${i + 1} "${`&a${i};`.repeat(10)}">`).join(
      '',
    );
    const text = `<!DOCTYPE svg [<!ENTITY a0 "lol">${levels}]><svg ${IN_MM}><text>&a40;</text></svg>`;
    const drawing = readDrawing(text);
    expect(drawing.findings).toMatchObject([{ code: 'entity-limit', severity: 'error' }]);
  });
});

describe('what is large', () => {
  test('a long title is kept, and cut at a limit with a word about it', () => {
    expect(readBody(`<title>${'word '.repeat(10_000)}</title>`).title).toHaveLength(49_999);
    const drawing = readDrawing(`<svg ${IN_MM}><desc>${'x'.repeat(50)}</desc></svg>`, {
      limits: { textCharacters: 20 },
    });
    expect(drawing.description).toBe('x'.repeat(20));
    expect(findingOf(drawing, 'text-cut').values).toMatchObject({
      element: 'desc',
      limit: 'textCharacters',
      value: 20,
    });
  });

  test.each([
    ['depth', 3, '<g><g><g/></g></g>', 'past-limit'],
    ['elements', 3, '<g/><g/><g/>', 'past-limit'],
    ['attributeCharacters', 60, `<g id="${'i'.repeat(61)}"/>`, 'past-limit'],
    ['segments', 3, '<path d="M1 1h1v1h1v1" stroke="red"/>', 'past-limit'],
    ['copies', 1, '<use href="#a"/><use href="#a"/><defs><g id="a"/></defs>', 'use-limit'],
    ['copyDepth', 1, '<use href="#a"/><defs><use id="a" href="#b"/><g id="b"/></defs>', 'use-limit'],
    ['copiedElements', 1, '<use href="#a"/><defs><g id="a"><g/></g></defs>', 'use-limit'],
  ] as const)('the limit %s of %i is named where it is passed', (limit, value, body, code) => {
    const drawing = readDrawing(`<svg ${IN_MM}>${body}</svg>`, { limits: { [limit]: value } });
    expect(findingOf(drawing, code).values).toMatchObject({ limit, value });
    const lifted = readDrawing(`<svg ${IN_MM}>${body}</svg>`, { limits: { [limit]: value + 100 } });
    expect(codesOf(lifted)).not.toContain(code);
  });

  test('a limit that is no number is misuse', () => {
    expect(() => readDrawing('<svg/>', { limits: { depth: Number.NaN } })).toThrow(RangeError);
  });

  // More elements than a piece of the skeleton has, opened and closed on both sides of its ends.
  test('a tree read in pieces is the same tree', () => {
    let body = '';
    let want = 0;
    for (let i = 0; i < 9000; i++) {
      body += `<g id="g${i}"><title>t${i}</title>${i % 3 === 0 ? `<g>${LINE}</g>${LINE}` : '<g/>'}</g>`;
      if (i % 3 === 0) want += 2;
    }
    const drawing = readBody(body);
    expect(drawing.strokes.count).toBe(want);
    expect(drawing.layers.map((layer) => layer.label)).toEqual(
      Array.from({ length: 9000 }, (_, i) => `t${i}`),
    );
  });

  test('depth beyond a piece', () => {
    const text = `<svg ${IN_MM}>${'<g>'.repeat(20_000)}${LINE}${'</g>'.repeat(20_000)}</svg>`;
    expect(readDrawing(text, { limits: { depth: 100_000 } }).strokes.count).toBe(1);
  });
});
