import fc from 'fast-check';
import { pathText } from './pathTexts.ts';

/** An attribute once in `rarity` times. */
const some = (name: string, values: readonly string[], rarity = 3) =>
  fc
    .tuple(fc.nat(rarity - 1), fc.constantFrom(...values))
    .map(([n, v]) => (n === 0 ? ` ${name}="${v}"` : ''));
const allOf = (parts: readonly fc.Arbitrary<string>[]) => fc.tuple(...parts).map((texts) => texts.join(''));

const TRANSFORMS = [
  ...['translate(12)', 'translate(-5 7.5)', 'rotate(30)', 'rotate(-75 10,20)', 'scale(-1 1)', 'scale(.5)'],
  ...['skewX(25)', 'skewY(-10)', 'matrix(.8 .3 -.2 1.1 4 -3)', 'translate(3,4)rotate(90)scale(1.5,.5)'],
  ...['', 'rotate(20) , scale(.9)', 'translate(1e1-3)', 'rotate(5 5)', 'turn(3)', 'scale(1 0)'],
];
const PAINTS = [
  ...['none', 'red', 'inherit', 'currentColor', 'url(#no) blue', 'url(#no)', 'rgb(10%,20%,30%)'],
  ...['#0f08', 'transparent', 'url(#lg)', 'url(#lg) none', 'hsl(120deg 50% 50%)', 'nonsense'],
];
const STYLES = [
  ...['stroke:none', 'stroke:green;fill:none', 'visibility:hidden', 'visibility:visible', 'display:none'],
  ...['opacity:0', 'stroke-width:0', 'stroke-opacity:0', 'stroke-linecap:round', 'color:transparent'],
  ...['stroke:inherit', 'stroke:red!important', 'x:5px;cx:20px;r:4px', 'font-size:2em', 'stroke:blue;;x'],
  ...['transform:rotate(12deg)', 'transform:translate(3px,10%)', 'width:20px;height:25%;rx:2px'],
];
const paint = allOf([
  some('stroke', PAINTS, 5),
  some('style', STYLES, 8),
  some('class', ['a', 'b', 'a b', 'c', 'd'], 5),
  some('visibility', ['hidden', 'visible', 'inherit'], 12),
  some('stroke-width', ['0', '2mm', '1%', '3', '.5em'], 6),
  some('stroke-linecap', ['round', 'butt', 'square', 'inherit'], 3),
  some('font-size', ['20', '150%', '.5em', '2rem'], 12),
  some('transform', TRANSFORMS),
  some('stroke-dasharray', ['5 2', '3,1,1', '2%', 'none'], 12),
  some('clip-path', ['url(#c)', 'url(#b)', 'url(#no)'], 20),
]);
const LENGTHS = [
  ...['0', '5', '12.5', '2mm', '10%', '1em', '.2in', '-4', '1e1', '+3', ' 6 ', '3PT', '1.5pc', '10Q', '1rem'],
  ...['25%', '7.', '5 px', 'x', '', 'calc(10% + 2px)'],
];
/** Chromium takes an rx or ry that is no length for 0, where SVG 2 takes it for missing. */
const RADII = LENGTHS.filter((text) => !['7.', '5 px', 'x', ''].includes(text));
const geometry = (...names: string[]) =>
  allOf(
    names.map((name) =>
      some(name, name.startsWith('r') ? RADII : LENGTHS, 2).map((t) => t || ` ${name}="7"`),
    ),
  );
const path = fc.oneof(
  fc.constantFrom(
    'M5 5L40 30',
    'm1 1h9v9zm20 0h9',
    'M10 10a9 5 30 1 0 20 5',
    'M7 7z',
    'M3 3',
    'M1 1L9 9,l3-8 x',
  ),
  pathText,
);
const POINTS = ['1,2 30,4 5,26', '3 3', '1 1 9 9', '0 0 9', '5-5.5.5,3', '1,1,20,4,,5'];

const shape = fc.oneof(
  fc.tuple(path, paint).map(([d, rest]) => `<path d="${d}"${rest}/>`),
  fc.tuple(geometry('x', 'y', 'rx', 'ry'), paint).map((t) => `<rect width="30" height="20"${t.join('')}/>`),
  fc.tuple(geometry('width', 'height', 'x'), paint).map((t) => `<rect rx="3"${t.join('')}/>`),
  fc.tuple(geometry('cx', 'cy', 'r'), paint).map((t) => `<circle${t.join('')}/>`),
  fc.tuple(geometry('cx', 'cy', 'rx', 'ry'), paint).map((t) => `<ellipse${t.join('')}/>`),
  fc.tuple(geometry('x1', 'y1', 'x2', 'y2'), paint).map((t) => `<line${t.join('')}/>`),
  fc
    .tuple(fc.constantFrom('polygon', 'polyline'), fc.constantFrom(...POINTS.slice(0, 5)), paint)
    .map(([name, points, rest]) => `<${name} points="${points}"${rest}/>`),
);
const aside = fc.constantFrom(
  ...['<!-- <path d="M0 0h9"/> -->', 'text', '<title>t</title>', '<metadata><path d="M0 0h9"/></metadata>'],
  ...['<x:path xmlns:x="http://example.org/x" d="M0 0h9"/>', '<other><path d="M0 0h9"/></other>', '<g/>'],
);

const viewBox = some('viewBox', ['0 0 30 30', '-5 -5 80 20', '0,0,10,40', '0 0 9', '1e1 0 20.5 30']);
const aspect = some('preserveAspectRatio', [
  ...['none', 'xMinYMax', 'xMaxYMin slice', 'xMidYMid meet', 'xMidYMax slice', 'defer xMaxYMax', 'xminymin'],
]);
const viewport = allOf([
  some('x', LENGTHS),
  some('y', LENGTHS),
  some('width', ['60', '50%', '2cm', '0', 'auto', '8em']),
  some('height', ['40', '80%', '100%', '3em']),
  viewBox,
  aspect,
  some('overflow', ['visible', 'hidden']),
]);
const conditions = allOf([
  some('requiredExtensions', ['', 'http://example.org/x'], 9),
  some('systemLanguage', ['en', 'xx', '', 'de,en-GB'], 9),
  some('requiredFeatures', ['http://example.org/y'], 12),
]);
const ids = fc.constantFrom('s', 't', 'p', 'q', 'no', 'r', 'u', 'v', 'w', 'y', 'z', 'late', 'k');

const { node } = fc.letrec<{ node: string }>((tie) => {
  const children = fc.array(tie('node'), { minLength: 1, maxLength: 3 }).map((list) => list.join(''));
  return {
    node: fc.oneof(
      { depthSize: 'small', withCrossShrink: true },
      shape,
      fc.tuple(aside, shape).map((t) => t.join('')),
      fc
        .tuple(paint, shape, children)
        .map(([a, hidden, inner]) => `<g${a}><defs>${hidden}</defs>${inner}</g>`),
      fc.tuple(paint, conditions, children).map(([a, b, inner]) => `<g${a}${b}>${inner}</g>`),
      fc.tuple(viewport, paint, children).map(([a, b, inner]) => `<svg${a}${b}>${inner}</svg>`),
      fc.tuple(paint, shape).map(([a, inner]) => `<a${a}>${inner}</a>`),
      fc.tuple(paint, aside, conditions, shape, children).map(([a, first, b, one, rest]) => {
        return `<switch${a}>${first}<g${b}>${one}</g>${rest}</switch>`;
      }),
      fc.tuple(paint, children).map(([a, inner]) => `<switch${a}>${inner}</switch>`),
      fc
        .tuple(
          geometry('x', 'y'),
          some('width', ['30', '50%', '0']),
          some('height', ['20', '10%']),
          fc.tuple(paint, conditions).map((t) => t.join('')),
          ids,
          fc.constantFrom('href', 'xlink:href'),
        )
        .map(([a, w, h, b, id, href]) => `<use ${href}="#${id}"${a}${w}${h}${b}/>`),
    ),
  };
});

const SHEET =
  '.a{stroke:blue}.b{stroke-width:0}path.b{stroke-width:2}.c{visibility:hidden}g .a{stroke:none}svg>.c{visibility:visible}.d{transform:scale(.8)}line+rect.d,[rx="3"]{stroke:red}circle:first-child{stroke:none}';
const DEFINED = [
  '<symbol id="s" viewBox="0 0 20 10" preserveAspectRatio="xMinYMin"><path d="M1 1h9v5z"/></symbol>',
  '<svg id="t" width="20" height="30" viewBox="0 0 10 10"><circle cx="5" cy="5" r="4"/></svg>',
  '<path id="p" d="M2 2l9 4"/>',
  '<g id="q" transform="rotate(10)"><use href="#p" x="4"/><rect class="a" width="8" height="6"/></g>',
  '<symbol id="r" x="3" y="10%" width="50%" height="20"><line x2="50%" y2="50%"/><use href="#q"/></symbol>',
  '<use id="u" href="#q" y="5"/>',
  '<g id="v" stroke="blue"><path d="M1 1h9"/><use href="#w" x="2"/></g>',
  '<g id="w"><path d="M1 5v9"/><use href="#v" y="2"/></g>',
  '<switch id="y"><path systemLanguage="xx" d="M1 1h9"/><ellipse rx="5%" ry="2"/></switch>',
  '<symbol id="z" viewBox="0 0 20 20" refX="10" refY="25%" overflow="visible"><use href="#s" width="9" height="50%"/></symbol>',
  '<clipPath id="c"><circle cx="20" cy="15" r="25"/></clipPath>',
  '<clipPath id="b" clipPathUnits="objectBoundingBox"><path d="M0 0h.9l-.2.7z"/></clipPath>',
  '<linearGradient id="lg"><stop/></linearGradient>',
  '<a id="k" class="d"><path class="d" d="M1 1h5a3 3 0 1 1 2 2z"/></a>',
];
const DEFS = `<defs>${DEFINED.join('')}</defs>`;
const LATE =
  '<g id="late" visibility="hidden"><path d="M2 2h5v5"/><path visibility="visible" d="M2 9h5"/></g>';

/** A document of what drawings are made of, put together by chance. */
export const anyDocument: fc.Arbitrary<string> = fc
  .tuple(
    fc.constantFrom(
      'width="240" height="160"',
      'width="240" height="160" viewBox="0 0 120 100"',
      'width="2.5in" height="192" viewBox="-10 -10 60 70" preserveAspectRatio="none"',
      'width="20em" height="15em" font-size="8" viewBox="0 0 90 90" preserveAspectRatio="xMaxYMin slice"',
      'style="width:3in;height:144px" width="1" viewBox="5,5,80,80" preserveAspectRatio="xMinYMax"',
    ),
    fc.array(node, { minLength: 3, maxLength: 7 }),
    fc.boolean(),
  )
  .map(([root, nodes, first]) => {
    const drawn = nodes.join('');
    return `<svg xmlns="http://www.w3.org/2000/svg" xmlns:xlink="http://www.w3.org/1999/xlink" ${root} fill="none" stroke="black"><style>${SHEET}</style>${first ? DEFS + drawn : drawn + DEFS}${LATE}</svg>`;
  });

/**
 * The same with thin lines that all end alike, so that pictures tell places and not widths; and without
 * viewports of width 0, in which Chromium draws where overflow is visible, and SVG 2 nothing.
 */
export function withThinLines(text: string): string {
  const wide = text.replace(/(<(?:svg|use)\b[^>]*) width="0"/g, '$1');
  return wide.replace('</style>', '*{stroke-width:.4px!important;stroke-linecap:butt!important}</style>');
}
