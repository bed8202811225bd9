import { page as anyPage, root as anyRoot, type Cases } from './make.ts';

/** Thin lines, since the end of a thick one at an edge is slanted in one picture and square in the other. */
const page = (body: string) => anyPage(body, 'stroke-width=".5"');
const root = (attributes: string, body: string) => anyRoot(`stroke-width=".5" ${attributes}`, body);

const RAYS = '<path d="M0 0L200 160M200 0L0 160M100 0V160M0 80H200"/><circle cx="100" cy="80" r="50"/>';
const clipped = (clip: string, body = RAYS, on = 'clip-path="url(#c)"') =>
  page(`<clipPath id="c">${clip}</clipPath><g ${on}>${body}</g>`);

/** What only a picture shows: lines that end at a clip path. */
export const CLIPS: Cases = {
  'clip by a rectangle': clipped('<rect x="30" y="40" width="90" height="70"/>'),
  'clip by a rectangle with round corners': clipped('<rect x="30" y="40" width="90" height="70" rx="30"/>'),
  'clip by a turned rectangle': clipped(
    '<rect x="30" y="40" width="90" height="70" transform="rotate(20 80 80)"/>',
  ),
  'clip by a circle': clipped('<circle cx="110" cy="70" r="45"/>'),
  'clip by an ellipse': clipped('<ellipse cx="110" cy="70" rx="70" ry="35"/>'),
  'clip by a polygon': clipped('<polygon points="20 20 180 60 120 150 90 60"/>'),
  'clip by a path with curves': clipped('<path d="M20 80C60 -40 120 200 180 60V150H20z"/>'),
  'clip by a path with a hole': clipped(
    '<path clip-rule="evenodd" d="M20 20h160v120h-160zM60 50h80v60h-80z"/>',
  ),
  'clip by a path that winds twice': clipped('<path d="M20 20h160v120h-160zM60 50h80v60h-80z"/>'),
  'clip by two shapes': clipped(
    '<rect x="20" y="20" width="60" height="55"/><circle cx="130" cy="100" r="40"/>',
  ),
  'clip by shapes that overlap': clipped(
    '<rect x="20" y="20" width="90" height="90"/><rect x="80" y="60" width="90" height="90"/>',
  ),
  'clip by a use': page(
    `<defs><circle id="r" cx="0" cy="0" r="40"/></defs><clipPath id="c"><use href="#r" x="95" y="75"/></clipPath><g clip-path="url(#c)">${RAYS}</g>`,
  ),
  'clip in shares of the box': clipped(
    '<rect x=".25" y=".25" width=".5" height=".5"/>',
    RAYS,
    'clip-path="url(#d)"',
  ).replace(
    '</clipPath>',
    '</clipPath><clipPath id="d" clipPathUnits="objectBoundingBox"><rect x=".25" y=".1" width=".5" height=".6"/></clipPath>',
  ),
  'clip under transforms': page(
    `<clipPath id="c" transform="translate(10 5)"><rect x="30" y="40" width="90" height="70"/></clipPath><g transform="rotate(10)scale(.8)" clip-path="url(#c)">${RAYS}</g>`,
  ),
  'clip of a single shape': page(
    '<clipPath id="c"><rect x="30" y="40" width="90" height="70"/></clipPath><circle clip-path="url(#c)" cx="100" cy="80" r="50"/><path d="M0 0L200 160" clip-path="url(#c)"/>',
  ),
  'clips in clips': page(
    `<clipPath id="c"><rect x="30" y="20" width="120" height="110"/></clipPath><clipPath id="d"><circle cx="120" cy="90" r="50"/></clipPath><g clip-path="url(#c)"><g transform="translate(-10 0)" clip-path="url(#d)">${RAYS}</g></g>`,
  ),
  'clip of a clip': page(
    `<clipPath id="d"><circle cx="120" cy="90" r="50"/></clipPath><clipPath id="c" clip-path="url(#d)"><rect x="30" y="20" width="120" height="110"/></clipPath><g clip-path="url(#c)">${RAYS}</g>`,
  ),
  'clip by a style': clipped(
    '<rect x="30" y="40" width="90" height="70"/>',
    RAYS,
    `style="clip-path:url('#c')"`,
  ),
  'clip by nothing': clipped('', RAYS),
  'clip by what is missing': page(`<g clip-path="url(#no)">${RAYS}</g>`),
  'clip of a copy': page(
    `<clipPath id="c"><rect x="30" y="40" width="90" height="70"/></clipPath><defs><g id="g" clip-path="url(#c)">${RAYS}</g></defs><use href="#g" x="20"/><use href="#g" y="60" x="70" transform="scale(.5)"/>`,
  ),
  'clip of dashes': page(
    `<clipPath id="c"><circle cx="110" cy="70" r="45"/></clipPath><g clip-path="url(#c)" stroke-dasharray="9 4">${RAYS}</g>`,
  ),
};

const NESTED = '<path d="M-20 -20L80 80M80 -20L-20 80M30 -20V80"/><circle cx="30" cy="30" r="36"/>';
const nested = (attributes: string) =>
  page(`<svg x="40" y="30" width="90" height="80" viewBox="0 0 60 60" ${attributes}>${NESTED}</svg>`);

/** What only a picture shows: lines that end at the edge of the page or of a viewport. */
export const EDGES: Cases = {
  'lines off the page': page(
    '<path d="M-50 20L250 140M100 -50V200M-10 100h50"/><circle cx="0" cy="80" r="50"/><path d="M-90 -90h50"/>',
  ),
  'a page that is a slice of its viewBox': root(
    'width="200" height="100" viewBox="0 0 60 60" preserveAspectRatio="xMidYMin slice"',
    NESTED,
  ),
  'a page larger than its viewBox': root('width="200" height="100" viewBox="0 0 60 60"', NESTED),
  'a page whose overflow is visible': root('width="200" height="160" overflow="visible"', RAYS),
  'nested svg cuts': nested(''),
  'nested svg that shows all': nested('overflow="visible"'),
  'nested svg with overflow by a style': nested('style="overflow:visible"'),
  'nested svg, overflow auto and scroll': page(
    `<svg x="10" y="30" width="60" height="60" overflow="auto">${NESTED}</svg><svg x="110" y="30" width="60" height="60" overflow="scroll">${NESTED}</svg>`,
  ),
  'nested svg, slice': nested('preserveAspectRatio="xMidYMid slice"'),
  'nested svg under a transform': page(
    `<g transform="translate(40 0)rotate(20)"><svg x="40" y="30" width="90" height="80" viewBox="0 0 60 60">${NESTED}</svg></g>`,
  ),
  'a symbol cuts': page(
    `<symbol id="s" viewBox="0 0 60 60">${NESTED}</symbol><use href="#s" x="40" y="30" width="90" height="80"/>`,
  ),
  'a symbol that shows all': page(
    `<symbol id="s" viewBox="0 0 60 60" overflow="visible">${NESTED}</symbol><use href="#s" x="40" y="30" width="90" height="80"/>`,
  ),
  'width only': root('width="200" viewBox="0 0 60 60"', NESTED),
  'height only': root('height="150" viewBox="0 0 60 60"', NESTED),
  'no size, a viewBox': root('viewBox="0 0 60 45"', NESTED),
  'viewBox of no size': root('width="200" height="160" viewBox="0 0 0 60"', NESTED),
};
