import type { PenRule } from './drawing/pens.js';
import { NO_PEN_WISHES, type PenWishes } from './drawing/penWishes.js';
import type { Objective } from './metric/metric.js';
import type { JunctionRule } from './network/network.js';
import type { MatchingRule } from './tour/pairing.js';

/** Everything that decides the result. Lengths in mm, the place of home in page mm from the top left. */
export interface Settings extends PenWishes {
  readonly snapMm: number;
  /** Largest chord error where curves are written or searched as lines. */
  readonly accuracyMm: number;
  readonly junctions: JunctionRule;
  readonly repeats: 'once' | 'keep';
  readonly matching: MatchingRule;
  readonly minimise: Objective;
  /** Null: the page's bottom left corner. */
  readonly homeMm: readonly [number, number] | null;
  readonly end: 'home' | 'anywhere';
  readonly pens: PenRule;
  /** Width of the tool's line, to tell wider strokes by; null where nobody has said. */
  readonly penWidthMm: number | null;
  /** Kicks for each end of a connector in the improvement of the tour. */
  readonly effort: number;
  /** Cap on the search in seconds of wall time, null for none; kept by whoever gives `shouldStop`. */
  readonly seconds: number | null;
  readonly bound: 'none' | 'quick';
  readonly seed: number;
}

/** Lines at most this far apart all along are one line drawn again: finer than any hatching. */
export const REPEAT_TOLERANCE_MM = 0.01;

export const DEFAULT_SETTINGS: Settings = {
  snapMm: 0.05,
  accuracyMm: 0.02,
  junctions: 'touching',
  repeats: 'once',
  matching: 'exact',
  minimise: 'travel',
  homeMm: null,
  end: 'home',
  pens: 'colour',
  ...NO_PEN_WISHES,
  penWidthMm: null,
  effort: 10,
  seconds: null,
  bound: 'quick',
  seed: 1,
};

/** What a long run tells of itself; all of it may be left out. */
export interface Hooks {
  /** What is being done, how far it is (0 to 1), and the travel of the current pen so far where known. */
  readonly onProgress?: (step: Step) => void;
  /** Asked now and then during improvement; true keeps the best so far. */
  readonly shouldStop?: () => boolean;
}

/** Where a long run stands. */
export interface Step {
  readonly doing: 'network' | 'pairing' | 'improve' | 'audit';
  readonly share: number;
  readonly costMm: number | null;
}
