/** Of what we read otherwise than a browser, reading has to say so, with one of these codes. */
export const SAID_OTHERWISE: ReadonlyMap<string, string> = new Map([
  ['a transform in a style, in turns and radians', 'transform-error'],
  ['transform-origin', 'transform-origin-ignored'],
  ['transform-box and origin in a style', 'transform-origin-ignored'],
  ['path by style', 'nothing-to-draw'],
  ['sibling selectors', 'style-rule-not-read'],
  ['attribute selectors', 'style-rule-not-read'],
  ['pseudo-classes', 'style-rule-not-read'],
  ['custom properties', 'colour-not-read'],
]);

/** A root of 200 px × 160 px. */
const r = (body: string, attributes = '') =>
  `<svg xmlns="http://www.w3.org/2000/svg" xmlns:xlink="http://www.w3.org/1999/xlink" width="200" height="160" fill="none" stroke="black" ${attributes}>${body}</svg>`;
const root = (attributes: string, body: string) =>
  `<svg xmlns="http://www.w3.org/2000/svg" fill="none" stroke="black" ${attributes}>${body}</svg>`;
const LINE = '<path d="M10 20L40 60"/>';
const SQUIGGLE = '<path d="M5 5q10 20 20 0t20 0s5 9 9 3a6 4 20 1 1 8 8z"/>';

/** Small drawings, each with one thing that a browser and we must see alike. */
export const BROWSER_CASES: Readonly<Record<string, string>> = {
  // Size and viewBox.
  'no viewBox': r(LINE),
  'viewBox of another shape': root('width="200" height="100" viewBox="0 0 50 50"', SQUIGGLE),
  'viewBox with an origin': root('width="96" height="96" viewBox="-10 -20 48 48"', SQUIGGLE),
  'size in mm': root('width="96mm" height="48mm" viewBox="0 0 96 48"', SQUIGGLE),
  'size in inches': root('width="2in" height="1.5in" viewBox="0 0 40 30"', SQUIGGLE),
  'size in pt and pc': root('width="72pt" height="6pc" viewBox="0 0 96 96"', SQUIGGLE),
  'size in cm, no viewBox': root('width="5cm" height="4cm"', LINE),
  'size in q': root('width="200Q" height="160q" viewBox="0 0 50 40"', SQUIGGLE),
  'preserveAspectRatio none': root(
    'width="200" height="100" viewBox="0 0 50 50" preserveAspectRatio="none"',
    SQUIGGLE,
  ),
  'preserveAspectRatio slice': root(
    'width="200" height="100" viewBox="0 0 90 90" preserveAspectRatio="xMidYMin slice"',
    LINE,
  ),
  'preserveAspectRatio max': root(
    'width="100" height="200" viewBox="0 0 50 50" preserveAspectRatio="xMinYMax"',
    SQUIGGLE,
  ),
  'transform on the root': root(
    'width="100" height="100" viewBox="0 0 50 50" transform="translate(3 4)"',
    LINE,
  ),

  // Transforms.
  'every transform': r(
    `<g transform="translate(30)scale(1.5),rotate(20 10 10)skewX(10) skewY(-5)matrix(1 .1 0 .9 2 3)">${SQUIGGLE}</g>`,
  ),
  'transforms nested': r(
    `<g transform="rotate(-30)"><g transform="translate(-20,60)"><g transform="scale(-1 2)">${SQUIGGLE}</g></g></g>`,
  ),
  'a transform in a style': r(
    `<g style="transform: translate(10px, 5px) rotate(15deg) scale(1.2)">${SQUIGGLE}</g>`,
  ),
  'a transform in a style, in turns and radians': r(
    `<g style="transform: rotate(0.05turn) rotate(0.1rad) rotate(10grad) translateX(1cm)">${SQUIGGLE}</g>`,
  ),
  'a transform that is wrong': r(`<g transform="rotate(20) nonsense(3)">${LINE}</g>`),
  'a transform that flattens': r(`<g transform="scale(0 1)">${LINE}</g>${LINE}`),
  'transform-origin': r(`<g transform="rotate(45)" transform-origin="20 30">${SQUIGGLE}</g>`),
  'transform-box and origin in a style': r(
    '<rect x="20" y="20" width="40" height="20" style="transform: rotate(30deg); transform-origin: center; transform-box: fill-box"/>',
  ),
  'a mirrored arc': r('<path transform="scale(1 -1) translate(0 -80)" d="M10 40A30 20 25 0 1 60 50"/>'),

  // Shapes.
  'every shape': r(
    '<line x1="1" y1="2" x2="30" y2="40"/><rect x="4" y="5" width="30" height="20"/><circle cx="40" cy="30" r="9"/><ellipse cx="70" cy="40" rx="20" ry="7"/><polyline points="0,0 10,5 20,0"/><polygon points="50 50 60,55 70 , 50"/>',
  ),
  'rect with one radius': r('<rect x="4" y="5" width="30" height="20" ry="6"/>'),
  'rect with radii too large': r(
    '<rect x="4" y="5" width="30" height="20" rx="50" ry="4"/><rect x="44" y="5" width="30" height="20" rx="50"/>',
  ),
  'rect with a radius of 0': r('<rect x="4" y="5" width="30" height="20" rx="0" ry="6"/>'),
  'rect with a negative radius': r('<rect x="4" y="5" width="30" height="20" rx="-3" ry="6"/>'),
  'shapes without size': r(
    '<rect x="4" y="5" width="0" height="20"/><circle cx="9" cy="9" r="0"/><ellipse cx="9" cy="9" rx="0" ry="3"/><circle cx="9" cy="9" r="-3"/>',
  ),
  'ellipse with one radius': r('<ellipse cx="40" cy="30" rx="12"/>'),
  'ellipse with auto': r('<ellipse cx="40" cy="30" ry="12" style="rx:auto"/>'),
  'lengths in units': r(
    '<rect x="1mm" y="2pt" width="1cm" height=".5in" rx="1pc"/><line x1="0" y1="1em" x2="5em" y2="40" font-size="20"/>',
  ),
  'lengths in percent': r(
    '<rect x="10%" y="10%" width="50%" height="25%"/><circle cx="50%" cy="50%" r="10%"/><line x1="0" y1="0" x2="100%" y2="50%"/>',
  ),
  'percent of a viewBox': root(
    'width="200" height="100" viewBox="10 10 60 40"',
    '<circle cx="50%" cy="50%" r="25%"/>',
  ),
  'shapes by style': r(
    '<circle style="cx: 40px; cy: 30px; r: 12px"/><rect style="x:80px;y:10px;width:30px;height:20px;rx:5px"/>',
  ),
  'path by style': r('<path style="d: path(&quot;M10 10H50V40z&quot;)"/>'),
  'points that are odd': r('<polyline points="0,0 10,5 20,0 7"/>'),
  'polygon of one point and of two': r('<polygon points="5 5"/><polygon points="5 5 20 30"/>'),

  // Path data.
  'path: all commands': r(SQUIGGLE),
  'path: packed numbers': r('<path d="M10-5.5.5 20l1e1-1E+1.5.5-.5e1 3"/>'),
  'path: joined flags': r('<path d="M20 40a15 10 0 0110 10 15 10 30 1020-5"/>'),
  'path: on after z': r('<path d="M10 10h20v20z l-5 40 m5 5 h9 v-8 z z h3"/>'),
  'path: several m': r('<path d="m10 10 5 0 m5 5 5 5 10 0 m 0 10 z m 5 5"/>'),
  'path: an error': r('<path d="M10 10L30 40 50 x60 70"/>'),
  'path: an error in a flag': r('<path d="M10 10L30 40A5 5 0 2 1 60 70L5 5"/>'),
  'path: does not begin with M': r('<path d="L10 10 20 20"/>'),
  'path: arc with a radius of 0': r('<path d="M10 10A0 5 0 0 1 40 30"/>'),
  'path: arc with radii too small': r('<path d="M10 10A5 3 20 0 1 60 30"/>'),
  'path: arc with negative radii': r('<path d="M10 10A-25 -15 20 1 1 60 30"/>'),
  'path: arc to where it is': r('<path d="M10 10A25 15 20 1 1 10 10L40 30"/>'),
  'path: none': r('<path d="none"/><path/><path d=""/>'),
  'path: white space of every kind': r('<path d="&#9;M&#10;10&#13;10 L20,30,&#10;40 50"/>'),
  'path: commas too many': r('<path d="M10 10L20 20,,30 30"/>'),
  'path: round dots': r(
    '<path stroke-linecap="round" d="M10 10zM20 20h0M30 30L30 30M40 40M50 50h.01M60 60a5 5 0 1 1 0 0"/>',
  ),
  'shapes that are dots': r(
    '<g stroke-linecap="round"><polygon points="60 60"/><polyline points="60 60"/><polyline points="6 6 6 6"/><line x1="60" x2="60" y1="9" y2="9"/><rect width="0" height="0"/><circle r="0"/></g>',
  ),
  'path: butt dots': r('<path d="M10 10zM20 20h0M30 30L30 30M40 40M50 50h.01"/>'),
  'path: square dots': r('<path stroke-linecap="square" d="M10 10zM20 20h0M30 30h5"/>'),
  'path: a lone z after m': r('<path stroke-linecap="round" d="M10 10h9zm5 5zm3 3"/>'),

  // Style.
  'style over attribute': r(
    '<path d="M1 1h9" stroke="none" style="stroke:red"/><path d="M1 3h9" style="stroke:none"/>',
  ),
  inherit: r(
    '<g stroke="none"><path d="M1 1h9"/><path d="M1 3h9" stroke="blue"/><g stroke="red"><path d="M1 5h9" stroke="inherit"/></g></g>',
  ),
  'initial, unset and revert': r(
    '<path d="M1 1h9" style="stroke:initial"/><path d="M1 3h9" style="stroke:unset"/><path d="M1 5h9" stroke="red" style="stroke:revert"/>',
  ),
  'classes, ids, types': r(
    '<style>path{stroke:none}.a{stroke:red}#b{stroke:blue}line.a,rect{stroke:none}</style><path d="M1 1h9"/><path class="c a" d="M1 3h9"/><path id="b" d="M1 5h9"/><line class="a" x2="9" y2="9"/><rect width="5" height="5"/>',
  ),
  'later rules and more specific ones': r(
    '<style>.a{stroke:none}.b{stroke:red}path.b{stroke:none}path{stroke:red}</style><path class="a b" d="M1 1h9"/><path class="b a" d="M1 3h9"/><path class="a" d="M1 5h9"/>',
  ),
  important: r(
    '<style>.a{stroke:none!important}</style><path class="a" style="stroke:red" d="M1 1h9"/><path class="a" style="stroke:red ! important" d="M1 3h9"/>',
  ),
  'child and descendant selectors': r(
    '<style>g path{stroke:none}g&gt;path.a{stroke:red}g g path{stroke:blue}</style><path d="M1 1h9"/><g><path d="M1 3h9"/><path class="a" d="M1 5h9"/><g><path d="M1 7h9"/></g></g>',
  ),
  'sibling selectors': r(
    '<style>rect+path{stroke:none}rect~path.a{stroke:red}</style><rect width="3" height="3"/><path d="M1 3h9"/><path class="a" d="M1 5h9"/>',
  ),
  'attribute selectors': r(
    '<style>[data-x]{stroke:none}[data-y="1"]{stroke:none}</style><path data-x="" d="M1 1h9"/><path data-y="1" d="M1 3h9"/><path data-y="2" d="M1 5h9"/>',
  ),
  'pseudo-classes': r(
    '<style>path:first-child{stroke:none}path:nth-child(2){stroke:none}path:not(.a){opacity:1}</style><g><path d="M1 1h9"/><path d="M1 3h9"/><path d="M1 5h9"/></g>',
  ),
  'a rule for all': r(
    '<style>*{stroke:none}.a{stroke:red}</style><path d="M1 1h9"/><path class="a" d="M1 3h9"/>',
  ),
  'media rules': r(
    '<style>@media screen{.a{stroke:none}}@media print{.b{stroke:none}}</style><path class="a" d="M1 1h9"/><path class="b" d="M1 3h9"/>',
  ),
  'comments and CDATA': r(
    '<style><![CDATA[/* .a{} */.a{/*x*/stroke:none}]]></style><path class="a" d="M1 1h9"/><path d="M1 3h9"/>',
  ),
  'custom properties': r(
    '<style>.a{--c:none;stroke:var(--c)}.b{stroke:var(--none,red)}</style><path class="a" d="M1 1h9"/><path class="b" d="M1 3h9"/>',
  ),
  'colours of every form': r(
    [
      '#f00',
      '#f008',
      '#ff000080',
      'rgb(1,2,3)',
      'rgb(10% 20% 30% / 50%)',
      'hsl(120,50%,50%)',
      'hwb(90 10% 10%)',
      'lab(50% 40 59)',
      'color(display-p3 1 0 0)',
      'RebeccaPurple',
      'CURRENTCOLOR',
      'nonsense',
      '#ff',
      'icc-color(x)',
    ]
      .map((colour, i) => `<path d="M1 ${i}h${i + 5}" stroke="${colour}"/>`)
      .join(''),
  ),
  'strokes that are transparent': r(
    '<path d="M1 1h9" stroke="transparent"/><path d="M1 3h9" stroke="rgba(0,0,0,0)"/><path d="M1 5h9" stroke="#0000"/><path d="M1 7h9" stroke-opacity="0"/><path d="M1 9h9" stroke="rgb(0 0 0/0%)"/><path d="M1 11h9" stroke-opacity="0%"/>',
  ),
  'stroke widths': r(
    '<path d="M1 1h9" stroke-width="0"/><path d="M1 3h9" stroke-width="-1"/><path d="M1 5h9" stroke-width="1%"/><path d="M1 7h9" stroke-width="2mm"/><path d="M1 9h9" stroke-width="nonsense"/>',
  ),
  'paint servers': r(
    '<linearGradient id="g"><stop stop-color="red"/></linearGradient><path d="M1 1h9" stroke="url(#g)"/><path d="M1 3h9" stroke="url(#missing)"/><path d="M1 5h9" stroke="url(#missing) red"/><path d="M1 7h9" stroke="url(#missing) none"/>',
  ),
  'display and visibility': r(
    '<g display="none"><path d="M1 1h9" display="inline"/></g><g visibility="hidden"><path d="M1 3h9"/><path d="M1 5h9" visibility="visible"/></g><path d="M1 7h9" visibility="collapse"/><path d="M1 9h9" style="display:none"/>',
  ),
  opacity: r(
    '<g opacity="0"><path d="M1 1h9"/></g><path d="M1 3h9" opacity="0"/><path d="M1 5h9" opacity=".1"/><path d="M1 7h9" opacity="0%"/><g opacity="-1"><path d="M1 9h9"/></g>',
  ),
  currentColor: r(
    '<g color="red"><path d="M1 1h9" stroke="currentColor"/></g><g color="transparent"><path d="M1 3h9" stroke="currentColor"/></g>',
  ),

  // Structure.
  'nested svg': r(
    `<svg x="20" y="10" width="80" height="60" viewBox="0 0 70 70">${SQUIGGLE}</svg><svg x="100"><circle cx="50%" cy="20" r="5"/></svg>`,
  ),
  'nested svg of no size': r(`<svg width="0" height="10">${LINE}</svg>${LINE}`),
  'nested svg with a transform': r(
    `<svg x="20" y="10" width="80" height="60" viewBox="0 0 70 70" transform="rotate(10)">${SQUIGGLE}</svg>`,
  ),
  use: r(
    '<defs><path id="p" d="M1 1h9v9"/></defs><use href="#p"/><use xlink:href="#p" x="20" y="30" transform="rotate(20)"/><use href="#missing"/>',
  ),
  'use of a symbol': r(
    `<symbol id="s" viewBox="0 0 70 70">${SQUIGGLE}</symbol><use href="#s" x="10" y="5" width="60" height="50"/><use href="#s" x="80" y="5" width="35" height="70"/>`,
  ),
  'use of a symbol without size': r(
    `<symbol id="s" viewBox="0 0 70 70">${SQUIGGLE}</symbol><use href="#s"/>`,
  ),
  'use of a symbol with refX': r(
    '<symbol id="s" viewBox="0 0 20 20" refX="10" refY="center"><path d="M2 2h9v9"/></symbol><use href="#s" x="40" y="40" width="20" height="20"/>',
  ),
  'use of a nested svg': r(
    `<defs><svg id="s" width="30" height="20" viewBox="0 0 70 70">${SQUIGGLE}</svg></defs><use href="#s" x="10" y="5"/><use href="#s" x="80" y="5" width="70" height="50"/>`,
  ),
  'use in use': r(
    '<defs><path id="p" d="M1 1h9v9"/><g id="q" transform="translate(5 5)"><use href="#p"/><use href="#p" x="20"/></g></defs><use href="#q"/><use href="#q" y="30" transform="scale(2)"/>',
  ),
  'use takes the style of its place': r(
    '<defs><path id="p" d="M1 1h9v9"/><path id="q" stroke="red" d="M1 1h9v9"/></defs><g stroke="none"><use href="#p"/><use href="#q"/><use href="#p" stroke="blue" x="20"/></g>',
  ),
  'use before what it uses': r('<use href="#p" x="30"/><path id="p" d="M1 1h9v9"/>'),
  'use of the first of two': r(
    '<path id="p" d="M1 1h9v9"/><path id="p" d="M1 30h50"/><use href="#p" x="30"/>',
  ),
  switch: r(
    '<switch><path requiredExtensions="http://example.org/x" d="M1 1h9"/><g systemLanguage="xx"><path d="M1 3h9"/></g><g><path d="M1 5h9"/><path d="M1 6h9"/></g><path d="M1 7h9"/></switch>',
  ),
  'conditions outside switch': r(
    '<path requiredExtensions="" d="M1 1h9"/><path requiredExtensions="http://example.org/x" d="M1 3h9"/><path systemLanguage="" d="M1 5h9"/><path requiredFeatures="http://example.org/y" d="M1 7h9"/>',
  ),
  'what is never drawn': r(
    '<defs><path d="M1 1h9"/></defs><symbol><path d="M1 3h9"/></symbol><clipPath id="c"><path d="M1 5h9"/></clipPath><mask id="m"><path d="M1 7h9"/></mask><pattern id="n"><path d="M1 9h9"/></pattern><marker id="k"><path d="M1 11h9"/></marker><path d="M1 13h9"/>',
  ),
  'elements of no language': r(
    '<unknown><path d="M1 1h9"/></unknown><g><path d="M1 3h9"/></g><x:path xmlns:x="http://example.org/" d="M1 5h9"/>',
  ),
  'links and groups': r('<a href="#x"><path d="M1 1h9"/></a><g><a><g><path d="M1 3h9"/></g></a></g>'),
  'prefixes for SVG':
    '<s:svg xmlns:s="http://www.w3.org/2000/svg" width="100" height="100"><s:path stroke="red" d="M1 1h9"/></s:svg>',
  'a document type with entities': `<?xml version="1.0"?><!DOCTYPE svg [<!ENTITY st "stroke:red"><!ENTITY n "9">]>${root('width="100" height="100"', '<path style="&st;" d="M1 1h&n;"/><path stroke="none" d="M1 3h&n;"/>').replace('<?xml version="1.0"?>', '')}`,
  'character references': r('<path d="M&#49;0 10&#x4c;20 30"/>'),
  'non-scaling strokes and paint order': r(
    '<g transform="scale(3)"><path vector-effect="non-scaling-stroke" paint-order="stroke" d="M1 1h9"/></g>',
  ),
  'attributes in capitals': r('<path D="M1 1h9"/><path d="M1 3h9" STROKE="none"/>'),
  'styles in capitals': r('<path d="M1 1h9" style="STROKE:NONE"/><path d="M1 3h9" stroke="NONE"/>'),
  'styles with errors': r(
    '<path d="M1 1h9" style="stroke:none;;x;:y;fill"/><path d="M1 3h9" style="stroke none"/><path d="M1 5h9" style="stroke:red none"/>',
  ),
  'a style sheet of another type': r('<style type="text/less">path{stroke:none}</style><path d="M1 1h9"/>'),
};
