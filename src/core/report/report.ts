import type { AuditResult } from '../audit/audit.js';
import type { Finding, Place, Severity } from '../finding.js';
import type { Measure } from '../measure/measure.js';
import { sentence } from './sentences.js';

/** What the report is made from; lengths in mm, times in seconds. */
export interface ReportFacts {
  readonly version: string;
  readonly settings: Readonly<Record<string, unknown>>;
  readonly drawing: Report['drawing'];
  readonly network: Report['network'];
  readonly before: Measure;
  readonly after: Measure;
  readonly bound: Report['bound'];
  readonly stopped: Report['stopped'];
  readonly audits: readonly AuditResult[];
  readonly findings: readonly Finding[];
}

/** The report as `--json` prints it: fixed field order, no clock time and no path. */
export interface Report {
  readonly schema: 'fewlift/1';
  readonly version: string;
  readonly settings: Readonly<Record<string, unknown>>;
  readonly drawing: {
    readonly name: string;
    readonly widthMm: number;
    readonly heightMm: number;
    readonly elements: number;
    readonly strokes: number;
    readonly drawnMm: number;
  };
  readonly network: {
    readonly vertices: number;
    readonly edges: number;
    readonly components: number;
    readonly oddVertices: number;
    readonly repeatedMm: number;
    readonly bridgedMm: number;
    readonly snapMaxMm: number;
  };
  readonly before: Totals;
  readonly after: Totals & { readonly retracedMm: number };
  readonly bound: {
    readonly objective: string;
    readonly value: number;
    readonly method: string;
    readonly exact: boolean;
  };
  /** After over bound − 1, in the objective's unit; null where the bound is 0 and after is not. */
  readonly gap: number | null;
  readonly stopped: 'proven' | 'effort' | 'clock' | 'interrupted';
  readonly audit: {
    readonly ok: boolean;
    readonly missingMm: number;
    readonly extraMm: number;
    readonly twiceMm: number;
    readonly maxDeviationMm: number;
  };
  readonly pens: readonly {
    readonly pen: string;
    readonly runs: number;
    readonly drawnMm: number;
    readonly travelMm: number;
    readonly seconds: number;
  }[];
  readonly findings: readonly {
    readonly code: string;
    readonly severity: Severity;
    readonly place: Place | null;
    readonly places?: readonly Place[];
    readonly values: Readonly<Record<string, string | number>>;
    readonly message: string;
  }[];
}

/** What one order of the lines comes to. */
export interface Totals {
  readonly runs: number;
  readonly travelMm: number;
  readonly drawnMm: number;
  readonly seconds: number;
}

/** Puts the facts into the report's fixed order. Several audits give the worst of each figure. */
export function makeReport(facts: ReportFacts): Report {
  const { after, bound, audits } = facts;
  const reached = bound.objective === 'lifts' ? after.runs : after.travelMm;
  const worst = (pick: (audit: AuditResult) => number) =>
    audits.reduce((most, a) => Math.max(most, pick(a)), 0);
  const findings = [...facts.findings, ...audits.flatMap((audit) => audit.findings)];
  return {
    schema: 'fewlift/1',
    version: facts.version,
    settings: facts.settings,
    drawing: facts.drawing,
    network: facts.network,
    before: totals(facts.before),
    after: { ...totals(after), retracedMm: 0 },
    bound,
    gap: gapOver(reached, bound.value, bound.exact),
    stopped: facts.stopped,
    audit: {
      ok: audits.every((audit) => audit.ok),
      missingMm: worst((a) => a.missingMm),
      extraMm: worst((a) => a.extraMm),
      twiceMm: worst((a) => a.twiceMm),
      maxDeviationMm: worst((a) => a.maxDeviationMm),
    },
    pens: after.perPen.map(({ pen, runs, drawnMm, travelMm, seconds }) => ({
      pen,
      runs,
      drawnMm,
      travelMm,
      seconds,
    })),
    findings: findings.map((finding) => ({
      code: finding.code,
      severity: finding.severity,
      place: finding.place,
      ...(finding.places ? { places: finding.places } : {}),
      values: finding.values,
      message: sentence(finding),
    })),
  };
}

/** 0 where the optimum is proven, else after over bound − 1; null where there is nothing to compare with. */
function gapOver(reached: number, bound: number, exact: boolean): number | null {
  if (exact || reached === 0) return 0;
  return bound > 0 ? reached / bound - 1 : null;
}

function totals({ runs, travelMm, drawnMm, seconds }: Measure): Totals {
  return { runs, travelMm, drawnMm, seconds };
}
