import type { Finding } from '../finding.js';
import { BridgeInspector } from './bridges.js';
import { coveredOtherwise, matchSpecks, specksOf } from './dots.js';
import { exchangeLeftovers } from './exchange.js';
import { totalLength } from './intervals.js';
import { Ledger } from './ledger.js';
import type { LineSet } from './lineSet.js';
import { nearParts } from './nearness.js';
import { pairAlongThreads } from './pairing.js';
import { drawnAgainMm, excuseRepeats } from './repeats.js';
import { pairSections } from './sections.js';
import { Side } from './side.js';
import { middleOf, type Stretch, unpairedStretches } from './stretches.js';
import { type AuditOptions, fringeMm, type Tolerances, tolerancesFor } from './tolerances.js';
import { pairWholeSegments } from './wholeSegments.js';

export type { AuditOptions } from './tolerances.js';

/** What an audit found. Lengths in mm, good to about the accuracy asked for at either end of a place. */
export interface AuditResult {
  /** Every wanted line and dot is drawn, by its pen and as often as it must be, and nothing else. */
  readonly ok: boolean;
  readonly missingMm: number;
  /** Drawn where nothing is wanted, bridges apart. */
  readonly extraMm: number;
  /** Drawn on a place where something is drawn already, whether wanted so or not. */
  readonly twiceMm: number;
  /** Largest distance of lines and dots that were paired. */
  readonly maxDeviationMm: number;
  /** Length of the bridges over gaps that snapping closed. */
  readonly bridgedMm: number;
  /** Errors only: `line-missing`, `line-added`, `line-doubled`, `dot-missing`, `dot-added`. */
  readonly findings: readonly Finding[];
}

/**
 * Holds drawn lines against wanted ones, pen by pen: every wanted line must be drawn along its whole
 * length, exactly once (where `repeats` is 'once' and lines repeat each other: at least once together,
 * and no more often than they stand), and nothing else but bridges may be drawn.
 *
 * How: whole segments that agree are paired at once; the rest is flattened and paired along threads,
 * stretches of a drawn line that follow a wanted one. No point of either side is paired twice, so
 * neighbours cannot stand in for each other. Whatever stays unpaired must be explained: as a repeat, as
 * a bridge, or as measurement fringe that lies within the tolerance of the other side all along; if not,
 * it is a finding.
 *
 * What an `ok` rests on: every wanted point is within `accuracyMm` + 2 chord errors of drawn ink of its
 * pen, every drawn point likewise of a wanted line or on a bridge, and the two are paired one to one but
 * for fringes (`fringeMm`). Lines closer together than that tolerance may be exchanged unseen.
 *
 * Time: about linear in segments and in the overlaps of lines that are closer than the tolerance.
 * RangeError for tolerances out of range or coordinates that are not finite.
 */
export function auditLines(wanted: LineSet, drawn: LineSet, options: AuditOptions): AuditResult {
  const tolerances = tolerancesFor(options);
  requireFinite(wanted);
  requireFinite(drawn);
  const whole = pairWholeSegments(wanted, drawn, tolerances.sameMm);
  pairSections(wanted, drawn, whole, tolerances);
  const wantedSide = new Side(wanted, whole.wanted, tolerances);
  const drawnSide = new Side(drawn, whole.drawn, tolerances);
  const once = options.repeats === 'once';

  const deviations = [0, pairAlongThreads(wantedSide, drawnSide, tolerances)];
  for (const deviation of whole.drawn) if (deviation > deviations[0]) deviations[0] = deviation;
  exchangeLeftovers(wantedSide, drawnSide, tolerances);
  const drawnAgain = drawnAgainMm(wantedSide, tolerances);
  if (once) excuseRepeats(wantedSide, drawnSide, tolerances);

  const ledger = new Ledger();
  const settled = settleSpecks(wantedSide, drawnSide, once, tolerances, ledger);
  deviations.push(settled.deviation);
  const missingMm = settleWanted(wantedSide, drawnSide, settled.wantedChains, tolerances, ledger);
  const excess = settleDrawn(wantedSide, drawnSide, settled.drawnChains, tolerances, ledger);
  return {
    ok: ledger.isClean,
    missingMm,
    extraMm: excess.extraMm,
    twiceMm: drawnAgain + excess.twiceMm,
    maxDeviationMm: Math.max(...deviations),
    bridgedMm: excess.bridgedMm,
    findings: ledger.findings(),
  };
}

/** Dots and the like, one by one. Returns the chains that are settled by it on either side. */
function settleSpecks(
  wanted: Side,
  drawn: Side,
  once: boolean,
  tolerances: Tolerances,
  ledger: Ledger,
): { wantedChains: Set<number>; drawnChains: Set<number>; deviation: number } {
  const wantedSpecks = specksOf(wanted, tolerances);
  const drawnSpecks = specksOf(drawn, tolerances);
  const { mate, taken, deviation } = matchSpecks(wantedSpecks, drawnSpecks, tolerances);
  const covered = coveredOtherwise(wantedSpecks, mate, drawn, once, tolerances);
  for (let i = 0; i < mate.length; i++) {
    if (mate[i] >= 0 || covered[i] === 1) continue;
    const code = wantedSpecks.isDot[i] ? 'dot-missing' : 'line-missing';
    ledger.add(code, wantedSpecks.x[i], wantedSpecks.y[i], 0, wantedSpecks.pen[i]);
  }
  for (let j = 0; j < taken.length; j++) {
    if (taken[j] === 1) continue;
    ledger.add('dot-added', drawnSpecks.x[j], drawnSpecks.y[j], 0, drawnSpecks.pen[j]);
  }
  return {
    wantedChains: new Set(wantedSpecks.chain),
    drawnChains: new Set(drawnSpecks.chain),
    deviation,
  };
}

function settleWanted(
  wanted: Side,
  drawn: Side,
  settled: Set<number>,
  tolerances: Tolerances,
  ledger: Ledger,
): number {
  let missingMm = 0;
  for (const stretch of unpairedStretches(wanted, tolerances.hairMm)) {
    if (settled.has(stretch.chain)) continue;
    if (!isLost(stretch, drawn, tolerances)) continue;
    missingMm += stretch.lengthMm;
    const { x, y } = middleOf(stretch);
    ledger.add('line-missing', x, y, stretch.lengthMm, stretch.pen);
  }
  return missingMm;
}

/**
 * A stroke with nothing paired is lost even where other lines pass; else fringe is allowed for. Corners of
 * what repeats another line leave fringe as far from it as the repeat is; where the repeat ends, no more
 * than that.
 */
function isLost(stretch: Stretch, drawn: Side, tolerances: Tolerances): boolean {
  if (stretch.atStart && stretch.atEnd) return true;
  if (stretch.lengthMm > fringeMm(stretch.deviation, tolerances)) return true;
  const { matchMm, repeatMm, hairMm } = tolerances;
  const amid = stretch.excusedEnds === 2 || (stretch.excusedEnds === 1 && stretch.lengthMm <= repeatMm);
  const reach = amid ? matchMm + repeatMm : matchMm;
  return stretch.lengthMm - totalLength(nearParts(stretch, drawn, reach)) > hairMm;
}

function settleDrawn(
  wanted: Side,
  drawn: Side,
  settled: Set<number>,
  tolerances: Tolerances,
  ledger: Ledger,
): { extraMm: number; twiceMm: number; bridgedMm: number } {
  const inspector = new BridgeInspector(wanted, drawn, tolerances);
  let extraMm = 0;
  let twiceMm = 0;
  let bridgedMm = 0;
  for (const stretch of unpairedStretches(drawn, tolerances.hairMm)) {
    if (settled.has(stretch.chain)) continue;
    if (inspector.isBridge(stretch)) {
      bridgedMm += stretch.lengthMm;
      continue;
    }
    const near = nearParts(stretch, wanted, tolerances.matchMm);
    const far = stretch.lengthMm - totalLength(near);
    const attached = !(stretch.atStart && stretch.atEnd);
    const fringe = fringeMm(stretch.deviation, tolerances);
    if (attached && far <= tolerances.hairMm && stretch.lengthMm <= fringe) continue;
    const doubled = doubledLength(near, far, tolerances);
    const added = stretch.lengthMm - doubled;
    twiceMm += doubled;
    const { x, y } = middleOf(stretch);
    if (doubled > 0) ledger.add('line-doubled', x, y, doubled, stretch.pen);
    if (added > tolerances.hairMm) {
      extraMm += added;
      ledger.add('line-added', x, y, added, stretch.pen);
    }
  }
  return { extraMm, twiceMm, bridgedMm };
}

/** What lies along wanted lines, rather than just crossing them. */
function doubledLength(near: readonly number[], far: number, tolerances: Tolerances): number {
  let sum = 0;
  for (let i = 0; i < near.length; i += 2) {
    const length = near[i + 1] - near[i];
    if (far <= tolerances.hairMm || length > 8 * tolerances.matchMm) sum += length;
  }
  return sum;
}

function requireFinite(lines: LineSet): void {
  for (const value of lines.segments.data) {
    if (!Number.isFinite(value)) throw new RangeError('audit: coordinates must be finite');
  }
}
