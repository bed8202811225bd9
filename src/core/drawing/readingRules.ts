/** What is asked of the reading where a drawing can be taken in more than one way. */
export interface ReadingRules {
  /**
   * How many user units of the drawing make an inch: 96 by CSS, 90 or 72 in some older editors. Null
   * where nobody has said: then 96.
   */
  readonly pxPerInch: number | null;
  /** Dashed lines as their dashes, or in one piece. */
  readonly dashes: 'cut' | 'solid';
  /** Lines end at the edge of a clip path or viewport, or go on. */
  readonly clips: 'cut' | 'ignore';
  /** The same for the edge of the page. */
  readonly pageEdge: 'cut' | 'ignore';
  /** Shapes with a fill and no stroke: left out, or their outline is drawn. */
  readonly fills: 'skip' | 'outline';
}

export const DEFAULT_READING: ReadingRules = {
  pxPerInch: null,
  dashes: 'cut',
  clips: 'cut',
  pageEdge: 'cut',
  fills: 'skip',
};

/** The defaults where nothing is asked. Throws RangeError where `pxPerInch` is not a positive finite number. */
export function rulesFrom(asked: Partial<ReadingRules>): ReadingRules {
  const pxPerInch = asked.pxPerInch ?? DEFAULT_READING.pxPerInch;
  if (pxPerInch !== null && !(pxPerInch > 0 && Number.isFinite(pxPerInch))) {
    throw new RangeError(`pxPerInch must be a positive number, not ${pxPerInch}`);
  }
  return {
    pxPerInch,
    dashes: asked.dashes ?? DEFAULT_READING.dashes,
    clips: asked.clips ?? DEFAULT_READING.clips,
    pageEdge: asked.pageEdge ?? DEFAULT_READING.pageEdge,
    fills: asked.fills ?? DEFAULT_READING.fills,
  };
}
