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
