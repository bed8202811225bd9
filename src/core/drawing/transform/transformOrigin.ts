import { wordsOf } from '../style/cssText.js';
import { readLength, type WrittenLength } from '../style/length.js';

/** Where transforms have their middle, from the corner of the reference box. */
export interface Origin {
  readonly x: WrittenLength;
  readonly y: WrittenLength;
}

const ACROSS: Readonly<Record<string, number>> = { left: 0, center: 50, right: 100 };
const DOWN: Readonly<Record<string, number>> = { top: 0, center: 50, bottom: 100 };
const MIDDLE: WrittenLength = { value: 50, unit: '%' };

/**
 * A value of `transform-origin` (CSS Transforms Module Level 1, §6): one to three words, the third of which
 * is depth and of no use here. `unitless`: an attribute, where plain numbers are user units. null where it
 * is wrong.
 */
export function readTransformOrigin(text: string, unitless: boolean): Origin | null {
  const words = wordsOf(text).map((word) => word.toLowerCase());
  if (words.length < 1 || words.length > 3) return null;
  if (words.length === 3 && !lengthOf(words[2], unitless)) return null;
  const [first, second] = words;
  if (second === undefined) {
    const y = first === 'center' ? undefined : DOWN[first];
    if (y !== undefined) return { x: MIDDLE, y: { value: y, unit: '%' } };
    const x = position(first, ACROSS, unitless);
    return x && { x, y: MIDDLE };
  }
  const [x, y] = [position(first, ACROSS, unitless), position(second, DOWN, unitless)];
  if (x && y) return { x, y };
  // Two keywords may stand the other way round; a length may not.
  if (!(first in DOWN && second in ACROSS)) return null;
  return { x: { value: ACROSS[second], unit: '%' }, y: { value: DOWN[first], unit: '%' } };
}

function position(
  word: string,
  keywords: Readonly<Record<string, number>>,
  unitless: boolean,
): WrittenLength | null {
  if (Object.hasOwn(keywords, word)) return { value: keywords[word], unit: '%' };
  return lengthOf(word, unitless);
}

function lengthOf(word: string, unitless: boolean): WrittenLength | null {
  const length = readLength(word);
  return length && (length.unit !== '' || unitless || length.value === 0) ? length : null;
}
