/** What happens, in order, by kind. */
export const RAPID = 0;
export const FEED = 1;
/** G2: clockwise where y points up. */
export const CLOCKWISE = 2;
/** G3. */
export const COUNTERCLOCKWISE = 3;
/** A stop at which the pen may be changed. */
export const STOP = 4;
/** A comment names the pen: the next of `pens`. */
export const PEN = 5;

/** The moves of the tool as columns, in machine mm, y up. */
export interface GcodeMoves {
  readonly kind: number[];
  /** Where the move ends; z is +Infinity until the file states a height. */
  readonly x: number[];
  readonly y: number[];
  readonly z: number[];
  /** The line that it stands on, from 1. */
  readonly line: number[];
  /** Centres of the arcs, one for each, in order. */
  readonly centreX: number[];
  readonly centreY: number[];
  readonly pens: { readonly name: string; readonly colour: string }[];
}

export function newGcodeMoves(): GcodeMoves {
  return { kind: [], x: [], y: [], z: [], line: [], centreX: [], centreY: [], pens: [] };
}
