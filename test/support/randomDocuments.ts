import fc from 'fast-check';

/** An attribute once in `rarity` times. */
const some = (name: string, values: readonly string[], rarity = 3) =>
  fc
    .tuple(fc.nat(rarity - 1), fc.constantFrom(...values))
    .map(([n, v]) => (n === 0 ? ` ${name}="${v}"` : ''));
const allOf = (parts: readonly fc.Arbitrary<string>[]) => fc.tuple(...parts).map((texts) => texts.join(''));

const TRANSFORMS = [
  ...['translate(12)', 'translate(-5 7.5)', 'rotate(30)', 'rotate(-75 10,20)', 'scale(-1 1)', 'scale(.5)'],
  ...['skewX(25)', 'skewY(-10)', 'matrix(.8 .3 -.2 1.1 4 -3)', 'translate(3,4)rotate(90)scale(1.5,.5)'],
];
const PAINTS = [
  'none',
  'red',
  'inherit',
  'currentColor',
  'url(#no) blue',
  'url(#no)',
  'rgb(10%,20%,30%)',
  '#0f08',
  'transparent',
];
const STYLES = [
  ...[
    'stroke:none',
    'stroke:green;fill:none',
    'visibility:hidden',
    'visibility:visible',
    'display:none',
    'opacity:0',
  ],
  ...['stroke-width:0', 'stroke-opacity:0', 'stroke-linecap:round', 'color:transparent', 'stroke:inherit'],
];
const paint = allOf([
  some('stroke', PAINTS, 5),
  some('style', STYLES, 12),
  some('class', ['a', 'b', 'a b', 'c'], 5),
  some('visibility', ['hidden', 'visible', 'inherit'], 12),
  some('stroke-width', ['0', '2mm', '1%', '3'], 6),
  some('stroke-linecap', ['round', 'butt', 'square', 'inherit']),
  some('transform', TRANSFORMS),
]);
const LENGTHS = ['0', '5', '12.5', '2mm', '10%', '1em', '.2in', '-4'];
const geometry = (...names: string[]) =>
  allOf(names.map((name) => some(name, LENGTHS, 2).map((text) => text || ` ${name}="7"`)));
const PATHS = [
  'M5 5L40 30',
  'm1 1h9v9zm20 0h9',
  'M10 10a9 5 30 1 0 20 5',
  'M0 0q9 30 20 5t9 9z',
  'M7 7z',
  'M3 3',
];

const shape = fc.oneof(
  fc.tuple(fc.constantFrom(...PATHS), paint).map(([d, rest]) => `<path d="${d}"${rest}/>`),
  fc.tuple(geometry('x', 'y', 'rx', 'ry'), paint).map((t) => `<rect width="30" height="20"${t.join('')}/>`),
  fc.tuple(geometry('width', 'height', 'x'), paint).map((t) => `<rect rx="3"${t.join('')}/>`),
  fc.tuple(geometry('cx', 'cy', 'r'), paint).map((t) => `<circle${t.join('')}/>`),
  fc.tuple(geometry('cx', 'cy', 'rx', 'ry'), paint).map((t) => `<ellipse${t.join('')}/>`),
  fc.tuple(geometry('x1', 'y1', 'x2', 'y2'), paint).map((t) => `<line${t.join('')}/>`),
  fc
    .tuple(fc.constantFrom('1,2 30,4 5,26', '3 3', '1 1 9 9'), paint)
    .map(([p, rest]) => `<polygon points="${p}"${rest}/>`),
);

const viewport = allOf([
  some('x', LENGTHS),
  some('y', LENGTHS),
  some('width', ['60', '50%', '2cm', '0']),
  some('height', ['40', '80%', '100%']),
  some('viewBox', ['0 0 30 30', '-5 -5 80 20', '0,0,10,40']),
  some('preserveAspectRatio', ['none', 'xMinYMax', 'xMaxYMin slice', 'xMidYMid meet']),
  some('overflow', ['visible', 'hidden']),
]);
const conditions = allOf([
  some('requiredExtensions', ['', 'http://example.org/x'], 9),
  some('systemLanguage', ['en', 'xx', ''], 9),
]);

const { node } = fc.letrec<{ node: string }>((tie) => {
  const children = fc.array(tie('node'), { minLength: 1, maxLength: 3 }).map((list) => list.join(''));
  return {
    node: fc.oneof(
      { depthSize: 'small', withCrossShrink: true },
      shape,
      fc
        .tuple(paint, shape, children)
        .map(([a, hidden, inner]) => `<g${a}><defs>${hidden}</defs>${inner}</g>`),
      fc.tuple(paint, conditions, children).map(([a, b, inner]) => `<g${a}${b}>${inner}</g>`),
      fc.tuple(viewport, paint, children).map(([a, b, inner]) => `<svg${a}${b}>${inner}</svg>`),
      fc.tuple(paint, shape).map(([a, inner]) => `<a${a}>${inner}</a>`),
      fc.tuple(paint, children).map(([a, inner]) => `<switch${a}>${inner}</switch>`),
      fc
        .tuple(
          geometry('x', 'y'),
          some('width', ['30', '50%']),
          some('height', ['20', '10%']),
          paint,
          fc.constantFrom('s', 't', 'p', 'q', 'no'),
        )
        .map(([a, w, h, b, id]) => `<use href="#${id}"${a}${w}${h}${b}/>`),
    ),
  };
});

const SHEET =
  '.a{stroke:blue}.b{stroke-width:0}path.b{stroke-width:2}.c{visibility:hidden}g .a{stroke:none}svg>.c{visibility:visible}';
const DEFINED =
  '<defs><symbol id="s" viewBox="0 0 20 10" preserveAspectRatio="xMinYMin"><path d="M1 1h9v5z"/></symbol><svg id="t" width="20" height="30" viewBox="0 0 10 10"><circle cx="5" cy="5" r="4"/></svg><path id="p" d="M2 2l9 4"/><g id="q" transform="rotate(10)"><use href="#p" x="4"/><rect class="a" width="8" height="6"/></g></defs>';

/** A document of what drawings are made of, put together by chance. */
export const anyDocument: fc.Arbitrary<string> = fc
  .tuple(
    fc.constantFrom(
      'width="240" height="160"',
      'width="240" height="160" viewBox="0 0 120 100"',
      'width="2.5in" height="192" viewBox="-10 -10 60 70" preserveAspectRatio="none"',
    ),
    fc.array(node, { minLength: 6, maxLength: 12 }),
  )
  .map(
    ([root, nodes]) =>
      `<svg xmlns="http://www.w3.org/2000/svg" ${root} fill="none" stroke="black" font-size="10"><style>${SHEET}</style>${DEFINED}${nodes.join('')}</svg>`,
  );
