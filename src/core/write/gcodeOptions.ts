import type { Measure } from '../measure/measure.js';

export interface GcodeOptions {
  readonly pageWidthMm: number;
  readonly pageHeightMm: number;
  /** Name of the drawing, for the head of the file. */
  readonly name: string;
  /** Counts, lengths and time, for the head of the file. */
  readonly facts: Measure;
}
