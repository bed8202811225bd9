import { page, root, SQUIGGLE } from './cases/make.ts';

/** A line of its own length in its own row, so that strokes that are mixed up show. */
const line = (row: number, attributes = ''): string =>
  `<path d="M1 ${2 * row + 1}h${row + 5}" ${attributes}/>`;

/** A line for each of these attributes. */
const lines = (...attributes: readonly string[]): string =>
  attributes.map((text, row) => line(row, text)).join('');

const escaped = (css: string): string => css.replace(/&/g, '&amp;').replace(/</g, '&lt;');

const sheet = (css: string, ...attributes: readonly string[]): string =>
  page(`<style>${escaped(css)}</style><g>${lines(...attributes)}</g>`);

const styles = (...values: readonly string[]): string => page(lines(...values.map((v) => `style="${v}"`)));

const strokes = (...colours: readonly string[]): string =>
  page(lines(...colours.map((c) => `stroke="${c}"`)));

const transforms = (...values: readonly string[]): string =>
  page(values.map((v) => `<g style="transform:${v}">${SQUIGGLE}</g>`).join(''));

const RECT = 'x="20" y="30" width="40" height="20"';

/** Small drawings, each with one thing of style, read as Chromium shows them: strokes, places and colours. */
export const STYLE_CASES: Readonly<Record<string, string>> = {
  // Selectors.
  'type, universal, class, id': sheet(
    '*{stroke:red}path{stroke:blue}.a{stroke:lime}#b{stroke:none}',
    ...['', 'class="a"', 'id="b" class="a"', 'class="A"'],
  ),
  'attribute: presence and equality': sheet(
    '[data-x]{stroke:red}[data-x="1"]{stroke:blue}[data-x=two]{stroke:none}',
    ...['data-x=""', 'data-x="1"', 'data-x="two"', 'data-X="1"'],
  ),
  'attribute: words and dashes': sheet(
    '[data-x~=b]{stroke:red}[data-x|=en]{stroke:none}',
    ...['data-x="a b c"', 'data-x="ab"', 'data-x="en-GB"', 'data-x="en"', 'data-x="enx"'],
  ),
  'attribute: beginning, end, part': sheet(
    '[data-x^=ab]{stroke:red}[data-x$=yz]{stroke:lime}[data-x*="m n"]{stroke:none}[data-x^=""]{stroke:blue}',
    ...['data-x="abc"', 'data-x="xyz"', 'data-x="lm no"', 'data-x=""', 'data-x="q"'],
  ),
  'attribute: flags i and s': sheet(
    '[data-x="ab" i]{stroke:red}[data-y="ab" s]{stroke:none}',
    ...['data-x="AB"', 'data-y="ab"', 'data-y="AB"'],
  ),
  'attribute: of the drawing itself': sheet(
    '[stroke-width="3"]{stroke:red}[d^="M1 3"]{stroke:none}path[transform]{stroke:blue}',
    ...['stroke-width="3"', '', 'transform="scale(2)"'],
  ),
  'namespaces in selectors': page(
    '<style>@namespace x url(http://www.w3.org/1999/xlink);@namespace s "http://www.w3.org/2000/svg";[x|href]{stroke:red}s|path.a{stroke:none}*|path[*|href].b{stroke:blue}|path{stroke:none}</style>' +
      lines('', 'xlink:href="q"', 'class="a"', 'class="b" xlink:href="q"', 'class="b" href="q"'),
  ),
  'default namespace': page(
    '<style>@namespace "http://www.w3.org/1999/xhtml";path{stroke:none}*|path.a{stroke:red}</style>' +
      lines('', 'class="a"'),
  ),
  'descendant and child': page(
    '<style>g path{stroke:red}g&gt;path{stroke:blue}svg&gt;path{stroke:none}#o g .a{stroke:lime}</style>' +
      `${line(0)}<g id="o">${line(1)}<a>${line(2)}</a><g>${line(3, 'class="a"')}</g></g>`,
  ),
  'siblings: next and subsequent': page(
    `<style>rect+path{stroke:red}rect~path.a{stroke:none}path+path+path{stroke:blue}</style><rect/>${lines('', '', '', 'class="a"', 'class="a"')}`,
  ),
  'combinators mixed': page(
    `<style>svg>g.k~g path+path:not(.n)>*,g.k + g > path:last-child{stroke:red}g g+path{stroke:none}</style><g class="k">${line(0)}</g><g>${line(1)}<g/>${line(2)}${line(3)}</g>`.replace(
      /svg>g/,
      'svg&gt;g',
    ),
  ),
  ':first-child, :last-child, :only-child': page(
    `<style>path:first-child{stroke:red}path:last-child{stroke:blue}path:only-child{stroke:none}</style><g>${lines('', '', '')}</g><g>${line(4)}</g>`,
  ),
  ':nth-child': sheet(
    'path:nth-child(2n+1){stroke:red}path:nth-child(-n+2){stroke:blue}path:nth-child(4){stroke:none}path:nth-child(EVEN){stroke-width:3}',
    ...Array.from({ length: 9 }, () => ''),
  ),
  ':nth-child with spaces and signs': sheet(
    'path:nth-child( 3n - 1 ){stroke:red}path:nth-child(n+7){stroke:none}path:nth-child(0n+3){stroke:blue}path:nth-child(+5){stroke:lime}',
    ...Array.from({ length: 9 }, () => ''),
  ),
  ':nth-last-child': sheet(
    'path:nth-last-child(2){stroke:none}path:nth-last-child(odd){stroke:red}',
    ...Array.from({ length: 6 }, () => ''),
  ),
  ':nth-of-type and its like': page(
    `<style>path:nth-of-type(2){stroke:red}path:nth-last-of-type(2){stroke:none}rect:first-of-type{stroke:blue}rect:last-of-type{stroke:lime}circle:only-of-type{stroke:none}</style><rect width="4" height="4"/>${line(1)}<rect width="5" height="5"/>${line(3)}<circle r="4"/>${line(5)}${line(6)}<rect width="7" height="7"/>`,
  ),
  ':nth-child of a selector': sheet(
    'path:nth-child(2 of .a){stroke:red}path:nth-last-child(1 of .a,.b){stroke:none}',
    ...['class="a"', '', 'class="a"', 'class="b"', 'class="a"', ''],
  ),
  ':not': sheet(
    'path:not(.a){stroke:red}path:not(.a,.b):not(#c){stroke:none}',
    ...['class="a"', 'class="b"', 'id="c"', ''],
  ),
  ':is and :where': sheet(
    ':is(#q,.a){stroke:red}.a.a{stroke:blue}:where(#c){stroke:none}.a{stroke:lime}:is(:nope,.b){stroke:none}',
    ...['class="a"', 'id="c"', 'class="b"', 'id="c" stroke="red"'],
  ),
  ':has': page(
    `<style>g:has(> rect) path{stroke:red}g:has(.n){stroke:none}path:has(+ circle){stroke:blue}</style><g><rect/>${line(0)}</g><g>${line(1)}<a><g class="n"/></a></g><g>${line(2)}<circle/>${line(3)}</g>`.replace(
      '(> ',
      '(&gt; ',
    ),
  ),
  ':root and :empty': page(
    `<style>:root{stroke:blue}g:empty+path{stroke:red}path:root{stroke:none}g:not(:empty){stroke:lime}</style><g/>${line(0)}${line(1)}<g>${line(2)}</g><g><!-- c --></g>${line(3)}`,
  ),
  ':lang and :dir': page(
    `<style>:lang(de){stroke:red}:lang("fr"){stroke:none}path:dir(ltr){stroke-width:2}path:dir(rtl){stroke:none}</style><g xml:lang="de-AT">${line(0)}</g><g xml:lang="fr">${line(1)}</g>${line(2, 'lang="de"')}`,
  ),
  'states never met': sheet(
    'path:hover,path:focus{stroke:none}path:not(:hover){stroke:red}path:target{stroke:none}path:enabled{stroke:none}',
    '',
  ),
  'pseudo-elements': sheet('path::before{stroke:none}path:after,.a{stroke:red}', '', 'class="a"'),
  'a list with one that is wrong': sheet(
    '.a,:nope(1){stroke:none}.b,a::nope{stroke:none}',
    'class="a"',
    'class="b"',
  ),
  specificity: sheet(
    '#a{stroke:red}path.b.c{stroke:none}.b.c{stroke:blue}path[class]{stroke:lime}path.b:nth-child(n){stroke:tan}:not(#z){stroke:navy}',
    ...['id="a" class="b c"', 'class="b c"', 'class="b"', 'class="x"', ''],
  ),
  'escapes in names': sheet(
    '.md\\:x{stroke:red}#\\31 a{stroke:none}.\\62 {stroke:blue}',
    ...['class="md:x"', 'id="1a"', 'class="b"'],
  ),
  'letters of any script in names': sheet('.größe{stroke:red}#線{stroke:none}', 'class="größe"', 'id="線"'),
  'names are as written': page(
    '<style>PATH{stroke:none}clippath{stroke:none}.A{stroke:none}#B{stroke:none}[D]{stroke:none}</style>' +
      lines('', 'class="a"', 'id="b"'),
  ),

  // Sheets.
  'rules in rules': page(
    `<style>g{stroke:blue;.a{stroke:red}&gt;.b{stroke:lime}stroke:gray;&amp;.c{stroke:pink}path&amp;{stroke:none}.z &amp; .e{stroke:tan}}</style><g>${lines('class="a"', 'class="b"', '')}</g><g class="c">${line(5)}</g><g class="z"><g>${line(6, 'class="e"')}</g></g>`,
  ),
  'media in rules': sheet(
    'path{@media screen{stroke:red}@media print{stroke:none}&.a{@media all{stroke:blue}}}',
    '',
    'class="a"',
  ),
  '@media types': sheet(
    '@media all{.a{stroke:red}}@media print{.a{stroke:none}}@media screen, print{.b{stroke:red}}@media not print{.c{stroke:red}}@media only screen{.d{stroke:red}}@media not all{.d{stroke:none}}@media tv{.d{stroke:none}}',
    ...['class="a"', 'class="b"', 'class="c"', 'class="d"'],
  ),
  '@media features': sheet(
    '@media (prefers-color-scheme:dark){.a{stroke:none}}@media (prefers-color-scheme:light) and (hover){.a{stroke:red}}@media screen and (not (prefers-color-scheme:dark)){.b{stroke:red}}@media (prefers-reduced-motion:reduce) or (color){.c{stroke:red}}@media (prefers-reduced-motion){.c{stroke:none}}',
    ...['class="a"', 'class="b"', 'class="c"'],
  ),
  '@supports': sheet(
    '@supports (stroke:red){.a{stroke:red}}@supports not (stroke:red){.a{stroke:none}}@supports (stroke:nope(1)){.b{stroke:none}}@supports (x:1px) and ((rx:2px) or (r:nope)){.b{stroke:blue}}@supports selector(a:has(b)){.c{stroke:lime}}@supports selector(:nope){.c{stroke:none}}',
    ...['class="a"', 'class="b"', 'class="c"'],
  ),
  '@layer: order': sheet(
    '@layer p,q;@layer q{.a{stroke:red}.b{stroke:red}}@layer p{path.a{stroke:none}}.b{stroke:blue}@layer r{.b{stroke:none}}',
    ...['class="a"', 'class="b"'],
  ),
  '@layer: important turns round': sheet(
    '@layer p{.a{stroke:red!important}}@layer q{.a{stroke:none!important}}.a{stroke:none!important}',
    'class="a"',
  ),
  '@layer: nested and without a name': sheet(
    '@layer p.q{.a{stroke:none}}@layer p{.a{stroke:red}@layer q{.a{stroke:none}}}@layer{.b{stroke:none}}@layer{.b{stroke:red}}',
    ...['class="a"', 'class="b"'],
  ),
  'revert-layer': sheet(
    '@layer p{.a{stroke:red}}@layer q{.a{stroke:none}.a{stroke:revert-layer}}.b{stroke:revert-layer}',
    ...['class="a"', 'class="b" stroke="blue"', 'style="stroke:revert-layer" stroke="lime"'],
  ),
  'at-rules without lines': sheet(
    '@charset "x";@font-face{font-family:f;src:url(x)}@keyframes k{from{stroke:none}}@page{margin:0}.a{stroke:red}@counter-style c{system:cyclic}.b{stroke:none}',
    ...['class="a"', 'class="b"'],
  ),
  'comments, CDO and CDC, CDATA': page(
    `<style><![CDATA[<!-- /* .a{} */ .a/**/{/*x*/stroke/**/:/**/red/**/} --> .b{stroke:/* ; */none}]]></style>${lines('class="a"', 'class="b"')}`,
  ),
  'broken declarations': sheet(
    '.a{stroke red;:;stroke:;{stroke:none}stroke:blue}.b{stroke:red;;stroke:none none}.c{stroke:lime;stroke',
    ...['class="a"', 'class="b"', 'class="c"'],
  ),
  'broken rules': sheet(
    '.a{stroke:red}}.b{stroke:none}.c{stroke:blue}@nope;.d{stroke:none}@nope x{.e{stroke:none}}.f[{stroke:none}]{stroke:none}.g{stroke:none}',
    ...'abcdefg'.split('').map((name) => `class="${name}"`),
  ),
  'a sheet that is cut off': sheet('.a{stroke:red;.b{stroke:none', 'class="a"', 'class="b"', 'class="a"'),
  'several sheets': page(
    `<style>.a{stroke:none}</style>${lines('class="a"', 'class="b"')}<defs><style type="text/css" media="screen">.a{stroke:red}</style><style media="print">.b{stroke:none}</style></defs>`,
  ),
  'strings and brackets in values': sheet(
    '.a{font-family:"a;b}c";stroke:red}.b{background:url(data:x;y:{z});stroke:none}',
    ...['class="a"', 'class="b"'],
  ),

  // Cascade and inheritance.
  'attribute, rule, style, important': sheet(
    '.a{stroke:red}.b{stroke:red!important}.c{stroke:blue!important}',
    ...['class="a" stroke="none"', 'class="a" style="stroke:none"', 'class="b" style="stroke:none"'],
    'class="c" style="stroke:none!important"',
  ),
  'wrong values leave the ones before': sheet(
    '.a{stroke:red;stroke:nope}.a{stroke:12px}.b{stroke-width:0;stroke-width:-4}.c{display:none;display:nope}.d{opacity:0;opacity:x}',
    ...['class="a"', 'class="b"', 'class="c"', 'class="d"', 'stroke="red blue"'],
  ),
  'inherit of what is not inherited': page(
    `<g style="transform:translate(20px,0);opacity:.5">${line(0, 'style="transform:inherit"')}</g><g transform="translate(30)">${line(1, 'style="transform:inherit"')}</g><g style="width:44px"><rect height="5" style="width:inherit"/></g><g opacity="0.5" style="d:path('M5 60h9')"><path style="d:inherit"/></g>`,
  ),
  'initial, unset, revert of what is not inherited': page(
    `<rect width="10" height="9" style="width:initial"/><rect width="10" height="9" transform="scale(2)" style="transform:initial"/><rect y="30" width="10" height="9" style="y:unset"/><rect display="none" width="30" height="9" style="display:revert"/><circle r="5" style="r:unset"/>`,
  ),
  all: page(
    `<g stroke="red">${line(0, 'stroke="none" style="all:unset"')}${line(1, 'style="all:initial"')}${line(2, 'stroke="blue" style="all:revert"')}</g><rect width="9" height="9" style="all:initial;stroke:red;width:3px;height:4px"/>`,
  ),
  'custom properties': page(
    `<style>svg{--a:red;--b:var(--a);--n:none}.a{stroke:var(--b)}.b{stroke:var(--n)}.c{--a:lime;stroke:var( --a )}.d{stroke:var(--q, var(--a))}.e{stroke:blue;stroke:var(--q)}.f{stroke:VAR(--A,tan)}</style>${lines(...'abcdef'.split('').map((name) => `class="${name}"`))}`,
  ),
  'custom properties that refer to themselves': page(
    `<g style="--a:var(--b);--b:var(--a);--c:initial;--d:;--e:inherit">${lines('style="stroke:var(--a)"', 'style="stroke:var(--a,red)"', 'style="stroke:var(--c,blue)"', 'style="stroke:var(--d) none"', 'stroke="var(--c,lime)"')}</g>`,
  ),
  'custom properties in lengths': page(
    `<g style="--w:30px;--k:2"><rect height="9" style="width:var(--w)"/><rect y="20" height="9" style="width:calc(var(--w)*var(--k) + 1px)"/><g style="transform:translate(var(--w),calc(var(--k)*10px))"><rect y="40" width="9" height="9"/></g></g>`,
  ),
  'currentColor by style': page(
    `<style>.k{color:red}.m{color:nope;stroke:currentcolor}</style><g class="k">${lines('stroke="currentColor"', 'class="m"', 'style="color:blue;stroke:CurrentColor"', 'style="color:inherit" stroke="currentColor"')}</g>`,
  ),
  'visible in a hidden group': page(
    `<style>.h{visibility:hidden}.v{visibility:visible}</style><g class="h">${lines('', 'class="v"', 'style="visibility:initial"', 'style="visibility:inherit"')}</g>`,
  ),
  'display in all its words': page(
    lines(
      ...[
        'style="display:block"',
        'display="NONE"',
        'display="none" style="display:inline"',
        'style="display:grid"',
      ],
      ...['style="display:none;display:block flow"', 'display="nope"', 'style="display:NONE"'],
    ),
  ),
  'display: contents': page(
    `<g style="display:contents;transform:translate(20px);stroke:red">${line(0)}</g>${line(1, 'style="display:contents"')}<g transform="scale(2)" display="contents">${line(2)}</g>`,
  ),
  'opacity in all its forms': styles(
    ...[
      'opacity:0%',
      'opacity:calc(.5 - .5)',
      'opacity:-3',
      'opacity:50%',
      'opacity:nope',
      'stroke-opacity:0%',
    ],
    ...['stroke-opacity:1e-2', 'opacity:0;opacity:1', 'stroke-opacity:calc(0*1)'],
  ),
  'stroke-width in all its forms': styles(
    ...[
      'stroke-width:0',
      'stroke-width:0px',
      'stroke-width:-2',
      'stroke-width:calc(1px - 3px)',
      'stroke-width:thin',
    ],
    ...['stroke-width:5%', 'stroke-width:1e-2mm', 'stroke-width:2 px'],
  ),
  'caps by style': page(
    '<style>.r{stroke-linecap:round}</style><path class="r" d="M5 5z"/><path style="stroke-linecap:SQUARE" d="M15 5z"/><path class="r" style="stroke-linecap:butt" d="M25 5z"/><path style="stroke-linecap:nope" d="M35 5z"/>',
  ),
  'paint with a server and a fallback': page(
    `<linearGradient id="g"/>${strokesOf('url(#g) red', 'url(#none) red', "url('#none') none", 'url(#none) nope', 'url(#none', 'red none')}`,
  ),
  'font sizes for em': page(
    ['12px', 'x-large', '150%', '2em', 'larger', 'calc(1em + 4px)', '10pt', 'nope', '-3px', '1.5rem']
      .map(
        (size, i) =>
          `<g font-size="10"><rect y="${9 * i}" height="5" style="font-size:${size};width:3em"/></g>`,
      )
      .join(''),
  ),
  'font shorthand for em': page(
    ['bold 12px/2 serif', 'italic 700 150% "A B", c', '20px', 'inherit', 'x-small sans-serif']
      .map(
        (font, i) =>
          `<g font-size="10"><rect y="${9 * i}" height="5" style="font:${font.replace(/"/g, "'")};width:3em"/></g>`,
      )
      .join(''),
  ),

  // Colours.
  'colours: hex': strokes('#f00', '#F008', '#00ff00', '#0000ff80', '#12', '#12345', '#ggg'),
  'colours: names': strokes(
    'red',
    'RebeccaPurple',
    'DARKSLATEGREY',
    'lightgoldenrodyellow',
    'reddish',
    'transparent',
  ),
  'colours: system': strokes(
    'CanvasText',
    'LinkText',
    'graytext',
    'ButtonFace',
    'Highlight',
    'WindowText',
    'Mark',
  ),
  'colours: rgb': strokes(
    ...['rgb(1,2,3)', 'rgba(255, 0, 10, .5)', 'rgb(10% 20% 30%)', 'rgb(300 -5 127.5)', 'rgb(1 2 3/40%)'],
    ...[
      'rgb(none 7 9)',
      'rgb(10%, 20, 30)',
      'rgb(1,2,3/4)',
      'rgb (1,2,3)',
      'rgb(calc(255/2) 0 0)',
      'rgb(1 2 3 / 0)',
    ],
  ),
  'colours: hsl and hwb': strokes(
    ...['hsl(120,50%,50%)', 'hsl(0.5turn 30% 40%)', 'hsl(-100grad 80% 30%)', 'hsla(1rad, 20%, 70%, 0.3)'],
    ...['hsl(120 100 25)', 'hsl(120, 100, 25)', 'hwb(90 10% 10%)', 'hwb(200 60% 80%)', 'hwb(90,10%,10%)'],
  ),
  'colours: lab and lch': strokes(
    ...[
      'lab(50% 40 59)',
      'lab(29 39 20)',
      'lch(52% 72 56)',
      'lch(80 130 200)',
      'lab(none 0 0)',
      'lab(100 0 0)',
    ],
  ),
  'colours: oklab and oklch': strokes(
    ...[
      'oklab(40% 0.1 0.05)',
      'oklch(0.7 0.1 200)',
      'oklch(60% 50% 0.5turn)',
      'oklch(1.2 0.1 20)',
      'oklab(0 0 0)',
    ],
  ),
  'colours: color()': strokes(
    ...[
      'color(srgb 1 .5 0)',
      'color(srgb-linear .5 .2 .1)',
      'color(display-p3 0 1 0)',
      'color(a98-rgb .3 .6 .9)',
    ],
    ...[
      'color(prophoto-rgb .4 .5 .2)',
      'color(rec2020 .2 .6 .4)',
      'color(xyz .3 .4 .5)',
      'color(xyz-d50 .3 .4 .5)',
    ],
    ...['color(srgb 1 2)', 'color(nope 1 1 1)'],
  ),
  'colours: mixed and by scheme': strokes(
    ...['color-mix(in srgb, red, blue)', 'color-mix(in srgb, red 30%, lime)', 'light-dark(red, blue)'],
    ...[
      'color-mix(in oklab, tan, navy 10%)',
      'color-mix(in srgb-linear, red, white)',
      'color-mix(in srgb, red -1%, blue)',
    ],
  ),
  'colours: in style and sheet': sheet(
    '.a{stroke:rgb(1 2 3)}.b{stroke:#F0F}.c{color:hsl(40 50% 50%);stroke:currentcolor}',
    ...[
      'class="a"',
      'class="b"',
      'class="c"',
      'style="stroke:oklch(.6 .2 30)"',
      'style="stroke:hwb(9 9% 9%)!important"',
    ],
  ),

  // Transforms.
  'transform: functions in a plane': transforms(
    ...[
      'translate(10px)',
      'translate(10px,5%)',
      'translateX(1cm)',
      'translateY(10%)',
      'scale(2)',
      'scale(50%,2)',
    ],
    ...['scaleX(1.5)', 'scaleY(.5)', 'rotate(20deg)', 'rotateZ(-.1turn)', 'skew(10deg)', 'skew(5deg,10deg)'],
    ...['skewX(15deg)', 'skewY(5grad)', 'matrix(1,.2,.1,1,5,6)', 'none', 'NONE', 'ROTATE(0.2RAD)'],
  ),
  'transform: lists': transforms(
    ...[
      'translate(10px) rotate(20deg) scale(1.2)',
      'rotate(20deg)translate(10px)',
      'scale(2) translate(calc(1px + 2%))',
    ],
    'rotate(0) translate(0,5px)',
  ),
  'transform: wrong in CSS': transforms(
    ...[
      'rotate(45)',
      'translate(5)',
      'translate(5px 6px)',
      'rotate(1deg),scale(2)',
      'rotate(9deg,3px,4px)',
      'skewX(9)',
    ],
    ...['matrix(1 0 0 1 5 6)', 'scale(2) nope(1)', 'translate(1px,2px,3px)', 'scale()'],
  ),
  'transform: style over attribute': page(
    `<g transform="scale(2)" style="transform:translate(5px)">${SQUIGGLE}</g><g transform="scale(2)" style="transform:nope">${SQUIGGLE}</g><g transform="scale(2)" style="transform:none">${SQUIGGLE}</g><style>.t{transform:rotate(9deg)}</style><g class="t" transform="scale(.5)">${SQUIGGLE}</g>`,
  ),
  'transform: three dimensions': transforms(
    ...['translate3d(10px,5px,7px)', 'translateZ(5px)', 'scale3d(2,.5,3)', 'rotateX(40deg)', 'rotateY(1rad)'],
    ...[
      'rotate3d(1,1,0,30deg)',
      'rotate3d(0,0,1,30deg)',
      'matrix3d(1,.2,0,0,.1,1,0,0,0,0,1,0,5,6,0,1)',
      'scaleZ(3)',
    ],
    ...['rotateX(60deg) translateZ(20px) rotateX(-60deg)', 'perspective(100px) translateX(5px)'],
  ),
  'transform-origin: words and lengths': page(
    [
      'center',
      'top left',
      'bottom',
      'right 10px',
      '10px',
      '25% 75%',
      '10px 20px 5px',
      'bottom right',
      '1em 2mm',
      'top 10px',
      '10 20',
      'nope',
    ]
      .map(
        (origin) => `<g style="transform:rotate(10deg) scale(.9);transform-origin:${origin}">${SQUIGGLE}</g>`,
      )
      .join(''),
  ),
  'transform-origin: attribute': page(
    ['20 30', '20px 30px', '50% 50%', 'center', '20', '20,30', 'right 4']
      .map((origin) => `<g transform="rotate(10)" transform-origin="${origin}">${SQUIGGLE}</g>`)
      .join(''),
  ),
  'transform-origin in a viewBox': root(
    'width="200" height="160" viewBox="10 10 50 40"',
    `<g style="transform:rotate(10deg);transform-origin:50% 50%">${SQUIGGLE}</g><g style="transform:translate(10%,10%)">${SQUIGGLE}</g>`,
  ),
  'transform-origin in a nested svg': page(
    `<svg x="20" y="10" width="120" height="100" viewBox="0 0 60 50"><g style="transform:rotate(10deg);transform-origin:center">${SQUIGGLE}</g></svg>`,
  ),
  'transform-box: fill-box': page(
    `<rect ${RECT} style="transform:rotate(30deg);transform-origin:center;transform-box:fill-box"/><rect ${RECT} style="transform:scale(.5);transform-box:fill-box"/><path d="M10 90c20 -30 40 30 60 0" style="transform:rotate(45deg);transform-origin:100% 0;transform-box:fill-box"/><circle cx="100" cy="60" r="20" style="transform:translate(50%,-25%);transform-box:fill-box"/>`,
  ),
  'transform-box: fill-box of a group': page(
    `<g style="transform:rotate(30deg);transform-origin:center;transform-box:fill-box"><rect ${RECT}/><circle cx="90" cy="90" r="9" display="none"/><g transform="translate(50)"><circle cx="90" cy="20" r="10" visibility="hidden"/></g>${SQUIGGLE}</g>`,
  ),
  'transform-box: fill-box of a copy': page(
    `<defs><rect id="r" width="20" height="10"/></defs><use href="#r" x="30" y="40" style="transform:rotate(30deg);transform-origin:center;transform-box:fill-box"/>`,
  ),
  'transform-box: stroke-box': page(
    `<rect ${RECT} stroke-width="6" style="transform:rotate(30deg);transform-origin:center;transform-box:stroke-box"/><circle cx="90" cy="60" r="9" stroke-width="4" style="transform:scale(2);transform-box:border-box"/><rect ${RECT} stroke="none" style="transform:scale(2);transform-box:stroke-box"/>`,
  ),
  'transform-box: content-box and in the attribute': page(
    `<rect ${RECT} style="transform:rotate(30deg);transform-origin:50% 0;transform-box:content-box"/><rect ${RECT} transform="rotate(30)" transform-origin="center" transform-box="fill-box"/>`,
  ),
  'translate, rotate and scale': page(
    `<rect ${RECT} style="translate:5px 10%;rotate:20deg;scale:1.5 .5;transform:skewX(5deg);transform-origin:10px 10px"/><rect ${RECT} style="scale:50%"/><rect ${RECT} style="rotate:z .1turn"/><rect ${RECT} style="translate:10px"/><rect ${RECT} style="rotate:1 0 0 40deg"/><rect ${RECT} style="translate:none;rotate:none;scale:none"/>`,
  ),
  'translate, rotate and scale are no attributes': page(
    `<rect ${RECT} translate="5px" rotate="20deg" scale="2"/>`,
  ),
  'translate over a transform attribute': page(
    `<rect ${RECT} transform="scale(1.5)" style="translate:9px 4px"/>`,
  ),
  'transform of the root by style': root(
    'width="100" height="100" viewBox="0 0 50 50" style="transform:rotate(9deg) translate(10%)"',
    SQUIGGLE,
  ),
  'transform-origin of the root': root(
    'width="100" height="80" viewBox="0 0 50 40" style="transform:rotate(9deg);transform-origin:0 0"',
    SQUIGGLE,
  ),
  'transform that flattens by style': page(
    `<g style="transform:rotateY(90deg) scale(1)">${line(0)}</g><g style="transform:scale(0)">${line(1)}</g>${line(2)}`,
  ),

  // Geometry in style.
  'rect by style': page(
    '<style>.a{x:10px;y:8px;width:30px;height:calc(10px + 4mm);rx:3px}.b{width:-5px}.c{width:25}.d{width:auto}</style><rect class="a"/><rect class="b" width="9" height="60"/><rect class="c" width="9" height="70"/><rect class="d" width="9" height="80"/><rect width="9" height="90" style="width:35"/>',
  ),
  'circle and ellipse by style': page(
    '<style>circle{cx:40px;cy:30px;r:12px}ellipse{cx:90px;cy:50px;rx:20px;ry:auto}.n{r:-3px}.p{r:1em}.u{r:7}</style><circle/><ellipse/><circle class="n"/><circle class="p"/><circle class="u"/><ellipse style="rx:9;ry:4"/>',
  ),
  'path by style': page(
    `<path style="d:path('M10 10H50V40z')"/><path d="M0 0h9" style="d:none"/><path d="M0 5h9" style="d:path('M1 1 x')"/><path d="M0 9h9" style="d:path(evenodd, 'M1 1h1')"/><style>.p{d:path("m5 60 h20 a5 5 0 0 1 9 9")}</style><path class="p"/>`,
  ),
  'use by style': page(
    '<defs><rect id="r" width="20" height="10"/></defs><symbol id="s" viewBox="0 0 10 10"><rect width="10" height="10"/></symbol><use href="#s" width="20" height="20" style="width:50px;height:9px;x:70px"/>',
  ),
  'viewports inside by style': page(
    '<svg width="50" height="40" style="width:20px;x:7px" viewBox="0 0 10 10"><rect width="10" height="10"/></svg>',
  ),
  'size of the root by style': root('style="width:300px;height:3in" viewBox="0 0 20 16"', SQUIGGLE),
  'size of the root by style over attributes': root(
    'width="10" height="10" style="width:calc(2in + 8px);height:160px"',
    SQUIGGLE,
  ),
  'what is no property': page(
    '<style>line{x1:50px;x2:60px}polyline{points:none}</style><line x2="10" y2="10"/><polyline points="1 1 9 9"/>',
  ),
  'sums in lengths': page(
    [
      'calc(10px + 5%)',
      'calc(2*(3px + 1mm))',
      'min(20px,10%)',
      'max(1em,12px)',
      'clamp(5px,50%,30px)',
      'calc(30px/2)',
      'calc(1px+2px)',
      'calc(3*4)',
      'calc(10px - 20px)',
      'calc(pi * 5px)',
    ]
      .map((width, i) => `<rect y="${9 * i}" height="5" width="7" style="width:${width}"/>`)
      .join(''),
  ),
  'sums in attributes': page(
    '<rect width="calc(10% + 5px)" height="10"/><circle r="calc(1cm / 2)" cx="50" cy="50"/>',
  ),
};

function strokesOf(...colours: readonly string[]): string {
  return lines(...colours.map((c) => `stroke="${c}"`));
}

/** What we read otherwise than the browser draws it; then a finding has to say so, with this code. */
export const STYLE_SAID_OTHERWISE: ReadonlyMap<string, string> = new Map();
