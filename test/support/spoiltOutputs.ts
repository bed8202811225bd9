import { type AuditResult, auditLines } from '../../src/core/audit/audit.ts';
import { lineSetOf, type Segment } from './chains.ts';
import { distanceTo, edited, OutputSheet, outlineOf, type Spot } from './outputSheet.ts';
import { OUTPUT_SPOILS } from './outputSpoils.ts';
import type { SampleOutput } from './sampleOutputs.ts';

/** How far from what was done its finding may lie, mm. */
const NEAR_MM = 0.5;
/** Spots of one audit are at least so far apart, mm. */
const APART_MM = 2;

export interface SpoilTally {
  /** Spots by kind of spoil. */
  readonly done: Map<string, number>;
  /** Kinds and numbers of spots of which the audit said nothing. */
  readonly missed: string[];
  audits: number;
}

interface NamedSpot extends Spot {
  readonly name: string;
}

/**
 * Spoils an output at `count` places, all kinds in turn, and asks the audit about each: it must name a
 * place near every one. `together` spots far apart from each other share an audit; where one of them has
 * no finding near it (there are at most twenty of a code), it gets an audit of its own.
 */
export function spoilMany(
  output: SampleOutput,
  random: () => number,
  count: number,
  together: number,
): SpoilTally {
  const sheet = new OutputSheet(output.wanted, output.drawn, output.tau, random);
  const tally: SpoilTally = { done: new Map(), missed: [], audits: 0 };
  const names = Object.keys(OUTPUT_SPOILS);
  const failures = new Map<string, number>();
  let left = count;
  let turn = 0;
  while (left > 0) {
    const spots: NamedSpot[] = [];
    for (let attempt = 0; spots.length < Math.min(together, left) && attempt < 4 * together; attempt++) {
      const name = names[turn++ % names.length];
      if ((failures.get(name) ?? 0) > 5 && !tally.done.has(name)) continue;
      const spot = OUTPUT_SPOILS[name](sheet);
      if (spot === null) failures.set(name, (failures.get(name) ?? 0) + 1);
      else if (spots.every((other) => areApart(spot, other))) spots.push({ ...spot, name });
    }
    for (const { name } of spots) tally.done.set(name, (tally.done.get(name) ?? 0) + 1);
    left -= spots.length;
    const result = auditOf(output, spots, tally);
    for (const spot of spots) {
      if (isNamed(result, spot)) continue;
      if (spots.length > 1 && isNamed(auditOf(output, [spot], tally), spot)) continue;
      tally.missed.push(`${spot.name} at ${spot.marks[0].data.map((v) => v.toFixed(4)).join(' ')}`);
    }
  }
  return tally;
}

function auditOf(output: SampleOutput, spots: readonly Spot[], tally: SpoilTally): AuditResult {
  tally.audits++;
  const edits = spots.flatMap((spot) => spot.edits);
  return auditLines(output.wanted, lineSetOf(edited(output.drawn, edits)), output.options);
}

/** Whether a finding lies near what was taken away or added. */
function isNamed(result: AuditResult, { marks }: Spot): boolean {
  if (result.ok) return false;
  const outline = outlineOf(marks);
  return result.findings.some(({ values }) =>
    outline.some((line) => distanceTo(line, Number(values.x), Number(values.y)) <= NEAR_MM),
  );
}

function areApart(a: Spot, b: Spot): boolean {
  for (const one of a.edits) {
    for (const other of b.edits) {
      if (one.chain === other.chain && one.chain >= 0 && one.from <= other.to && other.from <= one.to)
        return false;
    }
  }
  const [p, q] = [boxOf(a.marks), boxOf(b.marks)];
  return p[0] > q[2] + APART_MM || q[0] > p[2] + APART_MM || p[1] > q[3] + APART_MM || q[1] > p[3] + APART_MM;
}

function boxOf(marks: readonly Segment[]): [number, number, number, number] {
  const box: [number, number, number, number] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const { data: d } of outlineOf(marks)) {
    box[0] = Math.min(box[0], d[0], d[2]);
    box[1] = Math.min(box[1], d[1], d[3]);
    box[2] = Math.max(box[2], d[0], d[2]);
    box[3] = Math.max(box[3], d[1], d[3]);
  }
  return box;
}
