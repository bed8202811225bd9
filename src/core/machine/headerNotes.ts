import { formatDecimal } from '../geometry/decimal.js';
import { fromComment, toComment } from './commentText.js';

/**
 * What a reader of the written program has to know and the moves do not say. They stand in comments
 * at its head, so that the program can be put back onto its page. Machine mm, y up.
 */
export interface HeaderNotes {
  readonly pageWidthMm: number;
  readonly pageHeightMm: number;
  readonly homeXMm: number;
  readonly homeYMm: number;
  readonly raisedHeightMm: number;
  readonly downHeightMm: number;
}

/** The notes as comment texts, without brackets. Page sizes keep six places: the flip depends on them. */
export function formatHeaderNotes(notes: HeaderNotes, decimals: number): string[] {
  const page = (value: number) => formatDecimal(value, 6);
  const at = (value: number) => formatDecimal(value, decimals);
  return [
    `placement: page ${page(notes.pageWidthMm)} x ${page(notes.pageHeightMm)} mm, zero at its bottom left corner, y up, scale 1`,
    `home: X${at(notes.homeXMm)} Y${at(notes.homeYMm)}`,
    `heights: raised Z${at(notes.raisedHeightMm)}, down Z${at(notes.downHeightMm)}`,
  ];
}

const NUMBER = '(-?\\d+(?:\\.\\d+)?)';
const PLACEMENT = new RegExp(
  `^placement: page ${NUMBER} x ${NUMBER} mm, zero at its bottom left corner, y up, scale 1$`,
);
const HOME = new RegExp(`^home: X${NUMBER} Y${NUMBER}$`);
const HEIGHTS = new RegExp(`^heights: raised Z${NUMBER}, down Z${NUMBER}$`);

/** What one comment says of the notes; nothing where it is another comment. */
export function readHeaderNote(comment: string): Partial<HeaderNotes> {
  const placement = PLACEMENT.exec(comment);
  if (placement) return { pageWidthMm: Number(placement[1]), pageHeightMm: Number(placement[2]) };
  const home = HOME.exec(comment);
  if (home) return { homeXMm: Number(home[1]), homeYMm: Number(home[2]) };
  const heights = HEIGHTS.exec(comment);
  if (heights) return { raisedHeightMm: Number(heights[1]), downHeightMm: Number(heights[2]) };
  return {};
}

/** The comment that opens a pen's part; `position` counts from 1. A very long name is cut. */
export function formatPenNote(
  position: number,
  count: number,
  pen: { readonly name: string; readonly colour: string },
): string {
  return `pen ${position} of ${count}: ${toComment(pen.colour, 50)}, name ${toComment(pen.name, 160)}`;
}

/** The pen that a comment of that form names, or null. */
export function readPenNote(comment: string): { name: string; colour: string } | null {
  const found = /^pen \d+ of \d+: (.*?), name (.*)$/.exec(comment);
  return found ? { colour: fromComment(found[1]), name: fromComment(found[2]) } : null;
}
