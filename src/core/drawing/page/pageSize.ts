import { toMm } from '../../geometry/unit.js';
import { readLength, toUserUnits } from '../style/length.js';
import type { ViewBox } from './viewBox.js';

/** CSS gives this size to a replaced element that says nothing of its own, px. */
const DEFAULT_WIDTH = 300;
const DEFAULT_HEIGHT = 150;

/** How large the page is, and how that is known. */
export interface PageSize {
  readonly widthMm: number;
  readonly heightMm: number;
  readonly widthGiven: boolean;
  readonly heightGiven: boolean;
  /** What the size was guessed from where the drawing does not say; null where it does. */
  readonly guess: 'viewBox' | 'extent' | null;
  /** Width or height is given in a physical unit. */
  readonly physical: boolean;
}

/**
 * The page's size from the root's width, height and viewBox. A side that is missing follows the
 * viewBox's proportions; percentages are of the viewBox; without a viewBox the size has to be taken from
 * what is drawn (`extent`), and the size here only serves percentages meanwhile.
 */
export function pageSize(
  width: string | null,
  height: string | null,
  viewBox: ViewBox | null,
  pxPerInch: number,
  fontSize = 16,
): PageSize {
  const w = side(width, viewBox?.width, pxPerInch, fontSize);
  const h = side(height, viewBox?.height, pxPerInch, fontSize);
  const known = {
    widthGiven: w.given !== null,
    heightGiven: h.given !== null,
    physical: w.physical || h.physical,
  };
  const px = (value: number): number => toMm(value, 'px', pxPerInch);
  const box = viewBox !== null && viewBox.width > 0 && viewBox.height > 0 ? viewBox : null;
  let widthMm = w.given;
  let heightMm = h.given;
  let guess: PageSize['guess'] = null;
  if (box && widthMm !== null) heightMm ??= (widthMm * box.height) / box.width;
  else if (box && heightMm !== null) widthMm = (heightMm * box.width) / box.height;
  else if (box) {
    widthMm = w.share ?? px(box.width);
    heightMm = h.share ?? px(box.height);
    guess = 'viewBox';
  }
  if (isUsable(widthMm) && isUsable(heightMm)) return { widthMm, heightMm, guess, ...known };
  return {
    widthMm: w.given ?? px(DEFAULT_WIDTH),
    heightMm: h.given ?? px(DEFAULT_HEIGHT),
    guess: 'extent',
    ...known,
  };
}

/** Neither too large nor too small to be a page at all. */
function isUsable(mm: number | null): mm is number {
  return mm !== null && mm > 1e-6 && mm < 1e9;
}

interface Side {
  /** mm, where a usable absolute length is given. */
  readonly given: number | null;
  /** mm, where a usable percentage of the viewBox is given. */
  readonly share: number | null;
  readonly physical: boolean;
}

function side(
  text: string | null,
  viewBoxSide: number | undefined,
  pxPerInch: number,
  fontSize: number,
): Side {
  const nothing = { given: null, share: null, physical: false };
  const length = text === null ? null : readLength(text);
  if (!length || (length.value <= 0 && length.unit !== 'calc')) return nothing;
  const { value, unit } = length;
  if (unit === '%') {
    if (viewBoxSide === undefined) return nothing;
    return { ...nothing, share: (toMm(viewBoxSide, 'px', pxPerInch) * value) / 100 };
  }
  let mm: number;
  if (unit === 'calc') {
    // A sum with percentages has nothing to be a share of, and is not usable.
    const nowhere = { viewportWidth: Number.NaN, viewportHeight: Number.NaN, pxPerInch };
    mm = toMm(toUserUnits(length, 'x', nowhere, fontSize), 'px', pxPerInch);
  } else if (unit === 'em' || unit === 'rem') mm = toMm(value * fontSize, 'px', pxPerInch);
  else if (unit === 'ex' || unit === 'ch') mm = toMm((value * fontSize) / 2, 'px', pxPerInch);
  else mm = toMm(value, unit === '' ? 'px' : unit, pxPerInch);
  if (!isUsable(mm)) return nothing;
  return { given: mm, share: null, physical: ['mm', 'cm', 'in', 'pt', 'pc', 'Q'].includes(unit) };
}
