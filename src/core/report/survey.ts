import type { Finding } from '../finding.js';

/** What is in a drawing, as `fewlift survey --json` prints it; lengths in mm. */
export interface Survey {
  readonly schema: 'fewlift-survey/1';
  readonly version: string;
  readonly drawing: {
    readonly name: string;
    readonly title: string | null;
    readonly widthMm: number;
    readonly heightMm: number;
    readonly elements: number;
    readonly strokes: number;
    readonly closed: number;
    readonly dots: number;
    readonly drawnMm: number;
  };
  readonly network: {
    readonly snapMm: number;
    readonly components: number;
    readonly oddVertices: number;
    readonly repeatedMm: number;
    readonly repeatedDots: number;
    readonly fewestRuns: number;
    /** No order travels less: the pens' bounds added up. */
    readonly boundMm: number;
    /** What the plainest ordering, always on to the nearest end, would travel: for orientation. */
    readonly nearestNeighbourMm: number;
  };
  /** Loose ends that stop just short of another end. */
  readonly nearMisses: {
    readonly count: number;
    readonly leastMm: number;
    readonly greatestMm: number;
    readonly places: readonly { readonly gapMm: number; readonly x: number; readonly y: number }[];
  };
  readonly pens: readonly {
    readonly pen: string;
    readonly strokes: number;
    readonly drawnMm: number;
    readonly repeatedMm: number;
    readonly components: number;
    readonly oddVertices: number;
    readonly fewestRuns: number;
    readonly boundMm: number;
    readonly nearestNeighbourMm: number;
  }[];
  /** Null: strokes outside all layers. */
  readonly layers: readonly { readonly layer: string | null; readonly strokes: number }[];
  readonly findings: readonly (Finding & { readonly message: string })[];
}
