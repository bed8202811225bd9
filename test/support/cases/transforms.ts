import { type Cases, LINE, page, root, SQUIGGLE } from './make.ts';

const WELL_SPELT = [
  'translate(5-6)',
  'translate(1e1,2E0)',
  'scale(2)translate(3)',
  'rotate (20)',
  'rotate(30 5 5)',
  'rotate(30,5,5)',
  'scale(-2)',
  'translate(+5,+6)',
  'translate(5 , 6)',
  'rotate(20 )  scale( 2 )',
  'none',
];
const MISSPELT = [
  'translate(5. 6)',
  'translate(5,6,)',
  'translate(,5)',
  'rotate(20),',
  ',rotate(20)',
  'rotate(20),,scale(2)',
  'Rotate(20)',
  'matrix(1 0 0 1 5)',
  'matrix(1,0,0,1,5,6,7)',
  'skew(10)',
  'skewX(10 5)',
  'translate(5 6) junk',
  'translate(5 6',
  'translate(5,,6)',
  'rotate(20)/**/',
  'inherit',
];
/** Of CSS, where the attribute is read as CSS reads it. */
const SPELT_AS_IN_STYLES = [
  'rotate(20deg)',
  'translate(5px)',
  'translate(5%)',
  'rotate(.5turn)',
  'rotateZ(20)',
  'translate3d(5,6,0)',
  'scale(50%)',
  'translateX(5)',
  'scaleX(2)',
];
const each = (lists: readonly string[]) =>
  page(lists.map((list, i) => `<g transform="${list}"><path d="M${9 * i} 9h9v9"/></g>`).join(''));

export const TRANSFORMS: Cases = {
  'transform lists that are right': each(WELL_SPELT),
  'transform lists that are wrong': each(MISSPELT),
  'transform lists as in styles': each(SPELT_AS_IN_STYLES),
  'every transform': page(
    `<g transform="translate(30)scale(1.5),rotate(20 10 10)skewX(10) skewY(-5)matrix(1 .1 0 .9 2 3)">${SQUIGGLE}</g>`,
  ),
  'transforms nested': page(
    `<g transform="rotate(-30)"><g transform="translate(-20,60)"><g transform="scale(-1 2)">${SQUIGGLE}</g></g></g>`,
  ),
  'transform of the root': root(
    'width="100" height="100" viewBox="0 0 50 50" transform="translate(3 4)"',
    LINE,
  ),
  'transform of a shape': page(
    '<rect transform="rotate(15, 40, 30)" x="20" y="20" width="40" height="20" rx="4"/>',
  ),
  'transform in a style': page(
    `<g style="transform: translate(10px, 5px) rotate(15deg) scale(1.2)">${SQUIGGLE}</g>`,
  ),
  'transform in a style, in turns and radians': page(
    `<g style="transform: rotate(0.05turn) rotate(0.1rad) rotate(10grad) translateX(1cm)">${SQUIGGLE}</g>`,
  ),
  'transform that is wrong': page(`<g transform="rotate(20) nonsense(3)">${LINE}</g>`),
  'transform with a number too many': page(
    `<g transform="translate(5 6 7)">${LINE}</g><g transform="rotate(20 5)">${LINE}</g><g transform="scale()">${LINE}</g>`,
  ),
  'transform of nothing': page(`<g transform="">${LINE}</g><g transform="none">${LINE}</g>`),
  'transform with units in the attribute': page(`<g transform="translate(5px 6px)">${LINE}</g>`),
  'transform that flattens': page(`<g transform="scale(0 1)">${LINE}</g>${LINE}`),
  'transform-origin': page(`<g transform="rotate(45)" transform-origin="20 30">${SQUIGGLE}</g>`),
  'transform-box and origin in a style': page(
    '<rect x="20" y="20" width="40" height="20" style="transform: rotate(30deg); transform-origin: center; transform-box: fill-box"/>',
  ),
};
