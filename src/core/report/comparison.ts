import type { Finding } from '../finding.js';
import type { Totals } from './report.js';
import { sentence } from './sentences.js';

/** Two drawings held against each other, as `fewlift compare --json` prints it; mm and seconds. */
export interface Comparison {
  readonly schema: 'fewlift-comparison/1';
  readonly version: string;
  readonly before: Totals & { readonly name: string };
  readonly after: Totals & { readonly name: string };
  /** Whether the same lines are drawn, each as often as it should be. */
  readonly same: boolean;
  readonly missingMm: number;
  readonly extraMm: number;
  readonly twiceMm: number;
  readonly bridgedMm: number;
  readonly maxDeviationMm: number;
  readonly differences: readonly Difference[];
}

export interface Difference {
  readonly code: string;
  readonly pen: string;
  readonly x: number;
  readonly y: number;
  readonly lengthMm: number;
  /** How far a moved line went; 0 for the others. */
  readonly movedMm: number;
  readonly message: string;
}

/** A line counts as moved when an equally long one appears at most this far from where it is missing … */
const MOVED_REACH_MM = 5;
/** … and their lengths differ by no more than this share. */
const SAME_LENGTH = 0.02;

/**
 * What an audit found, in a person's words: a missing line with an added one of the same length near it
 * has moved. Each added line is taken once, the nearest first.
 */
export function pairMoved(findings: readonly Finding[], pens: readonly string[]): Difference[] {
  const added = findings.filter(({ code }) => code === 'line-added' || code === 'dot-added');
  const taken = new Set<Finding>();
  const differences: Difference[] = [];
  for (const finding of findings) {
    if (finding.code !== 'line-missing' && finding.code !== 'dot-missing') continue;
    const twin = nearestTwin(finding, added, taken);
    if (twin) taken.add(twin.finding);
    differences.push(twin ? differenceOf(moved(finding, twin.movedMm), pens) : differenceOf(finding, pens));
  }
  for (const finding of findings) {
    if (taken.has(finding) || finding.code === 'line-missing' || finding.code === 'dot-missing') continue;
    differences.push(differenceOf(finding, pens));
  }
  return differences;
}

function nearestTwin(
  missing: Finding,
  added: readonly Finding[],
  taken: ReadonlySet<Finding>,
): { finding: Finding; movedMm: number } | null {
  const want = missing.values;
  let best: { finding: Finding; movedMm: number } | null = null;
  for (const finding of added) {
    const { x, y, lengthMm, pen } = finding.values;
    if (taken.has(finding) || pen !== want.pen) continue;
    if (missing.code.startsWith('dot') !== finding.code.startsWith('dot')) continue;
    if (Math.abs(Number(lengthMm) - Number(want.lengthMm)) > SAME_LENGTH * Number(want.lengthMm)) continue;
    const dx = Number(x) - Number(want.x);
    const dy = Number(y) - Number(want.y);
    const movedMm = Math.sqrt(dx * dx + dy * dy);
    if (movedMm <= MOVED_REACH_MM && (best === null || movedMm < best.movedMm)) best = { finding, movedMm };
  }
  return best;
}

function moved(finding: Finding, movedMm: number): Finding {
  const code = finding.code === 'dot-missing' ? 'dot-moved' : 'line-moved';
  return { ...finding, code, values: { ...finding.values, movedMm } };
}

function differenceOf(finding: Finding, pens: readonly string[]): Difference {
  const { x, y, lengthMm, pen, movedMm = 0 } = finding.values;
  return {
    code: finding.code,
    pen: pens[Number(pen)] ?? '',
    x: Number(x),
    y: Number(y),
    lengthMm: Number(lengthMm),
    movedMm: Number(movedMm),
    message: sentence({ ...finding, values: { ...finding.values, penName: pens[Number(pen)] ?? '' } }),
  };
}
