import { PathReader } from '../path/pathReader.js';
import { isTransform } from '../transform/cssTransform.js';
import { readTransformOrigin } from '../transform/transformOrigin.js';
import { readColour } from './colour.js';
import { dashWords, unescaped, wordsOf } from './cssText.js';
import { readLength } from './length.js';
import { readPaint } from './paint.js';

/** A property that reading looks at. */
export interface Property {
  readonly inherited: boolean;
  /**
   * Whether a value, its keywords in any case, is valid and understood. `inAttribute`: it stands in a style
   * attribute, where browsers take plain numbers for user units.
   */
  reads(value: string, inAttribute: boolean): boolean;
}

type Check = (value: string, inAttribute: boolean) => boolean;

function keywords(text: string): (value: string) => boolean {
  const known = new Set(text.split(' '));
  return (value) => known.has(value.toLowerCase());
}

/** `numbers`: plain numbers are user units, as in properties that SVG had before CSS. */
function lengths(options: { numbers?: boolean; negative?: boolean; auto?: boolean } = {}): Check {
  return (value, inAttribute) => {
    if (options.auto && value.toLowerCase() === 'auto') return true;
    const length = readLength(value);
    if (!length || (length.value < 0 && !options.negative)) return false;
    if (length.isNumber) return options.numbers === true;
    return length.unit !== '' || length.value === 0 || inAttribute || options.numbers === true;
  };
}

const isNumberOrPercentage: Check = (value) => {
  const length = readLength(value);
  return length !== null && ['', '%', 'calc'].includes(length.unit);
};
const isPaint: Check = (value) => readPaint(value, () => true) !== null;
const isColour: Check = (value) => value.toLowerCase() === 'currentcolor' || readColour(value) !== null;
const dash = lengths({ numbers: true });
const isDashes: Check = (value) =>
  value.toLowerCase() === 'none' || dashWords(value).every((word) => dash(word, false));
const isReference: Check = (value) => /^(?:none|url\(.*\))$/is.test(value);
const anything: Check = (value) => value !== '';
const FONT_SIZES = keywords(
  'xx-small x-small small medium large x-large xx-large xxx-large larger smaller math',
);
const fontLength = lengths();
const isFontSize: Check = (value, inAttribute) => FONT_SIZES(value) || fontLength(value, inAttribute);
const DISPLAYS = keywords(
  'none contents inline block inline-block list-item flow-root flex inline-flex grid inline-grid table ' +
    'inline-table table-row table-cell table-row-group table-header-group table-footer-group table-column ' +
    'table-column-group table-caption ruby ruby-text math -webkit-box -webkit-inline-box ' +
    '-webkit-flex -webkit-inline-flex',
);
const DISPLAY_PAIRS = keywords('block inline flow flow-root flex grid table ruby math list-item');
const isDisplay: Check = (value) => DISPLAYS(value) || wordsOf(value).every(DISPLAY_PAIRS);
const OVERFLOWS = keywords('visible hidden scroll auto clip overlay');

const inherited = (reads: Check): Property => ({ inherited: true, reads });
const own = (reads: Check): Property => ({ inherited: false, reads });

/** Properties that reading looks at; others are passed over. */
export const PROPERTIES: ReadonlyMap<string, Property> = new Map([
  ['stroke', inherited(isPaint)],
  ['fill', inherited(isPaint)],
  ['color', inherited(isColour)],
  ['stroke-width', inherited(lengths({ numbers: true }))],
  ['stroke-linecap', inherited(keywords('butt round square'))],
  ['stroke-opacity', inherited(isNumberOrPercentage)],
  ['fill-opacity', inherited(isNumberOrPercentage)],
  ['stroke-dasharray', inherited(isDashes)],
  ['stroke-dashoffset', inherited(lengths({ numbers: true, negative: true }))],
  ['visibility', inherited(keywords('visible hidden collapse'))],
  ['font-size', inherited(isFontSize)],
  ['marker-start', inherited(isReference)],
  ['marker-mid', inherited(isReference)],
  ['marker-end', inherited(isReference)],
  ['clip-rule', inherited(keywords('nonzero evenodd'))],
  ['fill-rule', inherited(keywords('nonzero evenodd'))],
  ['display', own(isDisplay)],
  ['opacity', own(isNumberOrPercentage)],
  ['vector-effect', own(keywords('none non-scaling-stroke'))],
  ['overflow', own((value) => wordsOf(value).every(OVERFLOWS))],
  ['clip-path', own(anything)],
  ['mask', own(anything)],
  ['filter', own(anything)],
  ['mix-blend-mode', own(anything)],
  ['transform', own((value) => isTransform('list', value))],
  ['translate', own((value) => isTransform('translate', value))],
  ['rotate', own((value) => isTransform('rotate', value))],
  ['scale', own((value) => isTransform('scale', value))],
  ['transform-origin', own((value) => readTransformOrigin(value, false) !== null)],
  ['transform-box', own(keywords('view-box fill-box stroke-box content-box border-box'))],
  ['offset-path', own(anything)],
  ['x', own(lengths({ numbers: true, negative: true }))],
  ['y', own(lengths({ numbers: true, negative: true }))],
  ['cx', own(lengths({ numbers: true, negative: true }))],
  ['cy', own(lengths({ numbers: true, negative: true }))],
  ['r', own(lengths({ numbers: true }))],
  ['width', own(lengths({ auto: true }))],
  ['height', own(lengths({ auto: true }))],
  ['rx', own(lengths({ numbers: true, auto: true }))],
  ['ry', own(lengths({ numbers: true, auto: true }))],
  ['d', own((value) => pathDataIn(value) !== null)],
]);

const PATH = /^path\(\s*(?:"((?:[^"\\]|\\[\s\S])*)"|'((?:[^'\\]|\\[\s\S])*)')\s*\)$/i;

/** The data in a value of the property `d`; '' where it is `none`, null where it is no path. */
export function pathDataIn(value: string): string | null {
  if (value.toLowerCase() === 'none') return '';
  const match = value.endsWith(')') ? PATH.exec(value) : null;
  if (!match) return null;
  const data = unescaped(match[1] ?? match[2] ?? '');
  // Unlike the attribute, a value with an error in it is not valid at all.
  return new PathReader().read(data) < 0 ? data : null;
}
