/** What an audit is asked to allow. Lengths in mm. */
export interface AuditOptions {
  /** Longest distance between a stroke's end and the vertex that it was snapped to; a bridge may be twice that. */
  readonly snapMm: number;
  /** How far drawn lines may deviate: chord error of flattened output and rounding of written numbers. */
  readonly accuracyMm: number;
  /** Whether lines that repeat others need to be drawn once, or as often as they stand. */
  readonly repeats: 'once' | 'keep';
  /** Lines at most this far apart are the same line again. */
  readonly repeatToleranceMm: number;
}

/** The distances that decide, all derived from the options. */
export interface Tolerances {
  readonly snapMm: number;
  /** Chord error of the audit's own polylines. */
  readonly flatMm: number;
  /**
   * Lines farther apart than this are different lines: the accuracy, and the chord error of both
   * polylines that are held against each other. Independent of the snap distance, since curves do not
   * move when ends are snapped: neighbours within the snap distance are told apart.
   */
  readonly matchMm: number;
  /** Segments that agree to this in every control point are taken as one, unflattened. */
  readonly sameMm: number;
  /** Lengths below this are not looked at on their own: what rounding does to an end. */
  readonly hairMm: number;
  /** Lines at most this far apart, both flattened, repeat each other. */
  readonly repeatMm: number;
}

export function tolerancesFor(options: AuditOptions): Tolerances {
  const { snapMm, accuracyMm, repeatToleranceMm } = options;
  if (!(accuracyMm > 0)) throw new RangeError('audit: accuracyMm must be greater than 0');
  if (!(snapMm >= 0)) throw new RangeError('audit: snapMm must not be negative');
  if (!(repeatToleranceMm >= 0)) throw new RangeError('audit: repeatToleranceMm must not be negative');
  const flatMm = Math.min(accuracyMm / 4, 0.002);
  const matchMm = accuracyMm + 2 * flatMm;
  return {
    snapMm,
    flatMm,
    matchMm,
    sameMm: matchMm / 8,
    hairMm: matchMm / 16,
    repeatMm: repeatToleranceMm + 2 * flatMm,
  };
}

/**
 * The longest stretch beside a paired one that may stay unpaired while everything on it lies within
 * `matchMm` of the other side's lines: measurement fringe.
 *
 * An end may be off by the tolerance along its line as well as across, so a stretch may be unpaired for
 * that much at either end. Two polylines at most `deviation` apart, paired by projection on the bisector
 * of their pieces, leave at most `deviation` unpaired before and after a corner, whatever its angle.
 * Where pieces turn by more than the 60° up to which they are paired, the curve is about as small as the
 * deviation itself: a chord within the accuracy stands for a loop or a cusp no wider than twice that,
 * whose length is below 2π deviations. Eight deviations cover both.
 */
export function fringeMm(deviation: number, tolerances: Tolerances): number {
  return Math.max(2 * tolerances.matchMm, 8 * deviation);
}
