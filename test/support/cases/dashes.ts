import { type Cases, page, root } from './make.ts';

const CURVE = '<path d="M10 30C40 -20 80 120 120 40S190 60 180 120"/>';
const dashed = (body: string, dashes: string, more = '') =>
  page(`<g stroke-dasharray="${dashes}" ${more}>${body}</g>`, 'stroke-width="1.5"');

/** What only a picture shows: dashes. */
export const DASHES: Cases = {
  'dashes on a line': dashed('<line x1="5" y1="20" x2="190" y2="150"/>', '12 7'),
  'dashes in an odd number': dashed(CURVE, '13 5 3'),
  'dashes of one number': dashed(CURVE, '9'),
  'dashes with commas and units': dashed(CURVE, '4mm,2mm , 1pt 5'),
  'dashes in percent': dashed(CURVE, '5% 2%'),
  'dashes in em': dashed(CURVE, '1em .5em', 'font-size="12"'),
  'dashes begun later': dashed(CURVE, '12 7', 'stroke-dashoffset="9"'),
  'dashes begun earlier': dashed(CURVE, '12 7', 'stroke-dashoffset="-31.5"'),
  'dashes begun much later, in percent': dashed(CURVE, '12 7 3', 'stroke-dashoffset="300%"'),
  'dashes by a style sheet': page(
    `<style>.d{stroke-dasharray:8px,4px;stroke-dashoffset:3px}</style><g class="d">${CURVE}</g>`,
  ),
  'dashes inherited and ended': dashed(
    `${CURVE}<path stroke-dasharray="none" d="M5 150h190"/><path style="stroke-dasharray:3" d="M5 140h190"/>`,
    '12 7',
  ),
  'dashes that are none': dashed(
    `<path d="M5 10h190"/><path stroke-dasharray="5 -2" d="M5 20h190"/><path stroke-dasharray="x" d="M5 30h190"/>`,
    '0 0',
  ),
  'dashes on every shape': dashed(
    '<rect x="5" y="5" width="50" height="40"/><rect x="65" y="5" width="50" height="40" rx="12"/><circle cx="150" cy="30" r="22"/><ellipse cx="40" cy="100" rx="34" ry="20"/><polygon points="90 70 120 120 80 140"/><polyline points="130 70 190 90 140 140"/>',
    '9 5',
  ),
  'dashes begin anew with each sub-path': dashed(
    '<path d="M10 10h73m5 0h73M10 30h47v20h-47zm80 5l31 20M10 90a20 15 0 0 1 90 5t30 20 10 20z"/>',
    '11 6',
  ),
  'dashes on a closed line': dashed('<path d="M30 30h130v100h-130z"/>', '37 9', 'stroke-dashoffset="17"'),
  'dashes by pathLength': page(
    `<path pathLength="100" stroke-dasharray="5 3" d="M10 30C40 -20 80 120 120 40S190 60 180 120"/><circle pathLength="12" stroke-dasharray=".5" cx="50" cy="110" r="30"/>`,
  ),
  'dashes under transforms': dashed(
    `<g transform="translate(20 -10)rotate(20)scale(.9)">${CURVE}</g><g transform="matrix(1 .2 -.3 1.1 40 30)"><circle cx="90" cy="60" r="30"/></g>`,
    '12 7',
  ),
  'dashes mirrored': dashed(`<g transform="translate(200 0)scale(-1 1)">${CURVE}</g>`, '15 7 2 7'),
  'dashes in a copied symbol': page(
    '<symbol id="s" viewBox="0 0 20 20"><path stroke-width=".3" stroke-dasharray="2 1" d="M2 2h15v15A12 12 0 0 1 2 2"/></symbol><use href="#s" width="120" height="120"/><use href="#s" x="110" y="60" width="80" height="80"/>',
  ),
  'dashes in percent of the viewport they are in': dashed(
    '<svg x="20" y="10" width="150" height="120" viewBox="0 0 40 30" stroke-width=".4"><path d="M1 1C40 0 0 30 38 28"/><path stroke-dasharray="inherit" d="M1 28L38 1"/></svg><path d="M5 150h190"/>',
    '4% 2%',
    'stroke-dashoffset="1%"',
  ),
  'dashes longer than the line': dashed(CURVE, '5000 10', 'stroke-dashoffset="20"'),
  'dashes that all fall in a gap': dashed(
    '<path d="M10 10h50"/><path d="M10 30h190"/>',
    '10 100',
    'stroke-dashoffset="20"',
  ),
  // At the size of the picture, since what does not scale in a drawing does when the drawing is enlarged.
  'dashes of a stroke that does not scale': root(
    'width="600" height="480" viewBox="0 0 100 80" stroke-width="4"',
    '<g transform="scale(.5)"><path vector-effect="non-scaling-stroke" stroke-dasharray="37 23" d="M10 30C140 -20 80 220 180 40"/></g>',
  ),
};

/** The same with round caps: dashes of no length are dots. */
export const ROUND_DASHES: Cases = {
  'dots as dashes': page(
    '<g stroke-linecap="round" stroke-width="2" stroke-dasharray="0 6"><path d="M10 30C40 -20 80 120 120 40S190 60 180 120"/><circle cx="50" cy="110" r="30"/></g>',
  ),
  'dashes and dots in turn': page(
    '<path stroke-linecap="round" stroke-width="2" stroke-dasharray="12 6 0 6" d="M10 30C40 -20 80 120 120 40S190 60 180 120"/>',
  ),
};
