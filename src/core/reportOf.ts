import type { AuditResult } from './audit/audit.js';
import type { Finding } from './finding.js';
import { segmentLength } from './geometry/length.js';
import { programBounds } from './measure/bounds.js';
import { MOST_CROSSINGS } from './network/crossings.js';
import { fewestRuns } from './network/fewestRuns.js';
import { overhang } from './overhang.js';
import type { Crossings, Ordered } from './pipeline.js';
import { makeReport, type Report } from './report/report.js';
import { ROUNDING } from './tour/lowerBound.js';
import { wideStrokes } from './wideStrokes.js';

/** Gaps may make up this share of what is drawn before it looks like a mistake. */
const MUCH_BRIDGED = 0.02;

/** The report on a drawing put in order and on the audits of what was written. */
export function reportOf(ordered: Ordered, audits: readonly AuditResult[], version: string): Report {
  const { drawing, settings, profile, networks, tours, before, after } = ordered;
  const { strokes } = drawing;
  const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
  let drawnMm = 0;
  for (let i = 0; i < strokes.segments.count; i++) drawnMm += segmentLength(strokes.segments, i);
  const bound = boundOf(ordered);
  return makeReport({
    version,
    settings: {
      ...drawing.reading,
      ...settings,
      homeMm: [before.program.homeX, before.program.homeY],
      machine: profile.name,
    },
    drawing: {
      name: drawing.name,
      widthMm: drawing.widthMm,
      heightMm: drawing.heightMm,
      elements: drawing.elementCount,
      strokes: strokes.count,
      drawnMm,
    },
    network: {
      vertices: sum(networks.map((n) => n.vertexCount)),
      edges: sum(networks.map((n) => n.edgeCount)),
      components: sum(networks.map((n) => n.componentCount)),
      oddVertices: sum(networks.map((n) => n.oddVertices.length)),
      repeatedMm: sum(networks.map((n) => n.repeatedMm)),
      bridgedMm: after.measure.bridgedMm,
      snapMaxMm: networks.reduce((most, n) => Math.max(most, n.snapMaxMm), 0),
    },
    before: before.measure,
    after: after.measure,
    bound,
    stopped: bound.exact ? 'proven' : tours.some((tour) => tour.stopped === 'clock') ? 'clock' : 'effort',
    audits,
    findings: [...drawing.findings, ...findingsOf(ordered)],
  });
}

/**
 * The pens' bounds added up: each pen is a tour of its own. The bound speaks of snapped ends; where the
 * drawing kept its own order it runs between the ends as drawn and may travel a hair less.
 */
function boundOf({ settings, networks, tours, before, after }: Ordered): Report['bound'] {
  const objective = settings.minimise;
  if (settings.bound === 'none') return { objective, value: 0, method: 'none', exact: false };
  if (objective === 'lifts') {
    const value = networks.reduce((runs, network) => runs + fewestRuns(network), 0);
    return { objective, value, method: 'degrees', exact: after.measure.runs === value };
  }
  const sum = tours.reduce((total, tour) => total + tour.bound.value, 0);
  const method = [...new Set(tours.map((tour) => tour.bound.method))].join('+');
  const { travelMm } = after.measure;
  const reached = Math.abs(travelMm - sum) <= ROUNDING * (1 + sum);
  const exact = tours.every((tour) => tour.bound.exact) && (after !== before || reached);
  return { objective, value: Math.min(sum, travelMm), method, exact };
}

/** What the network and the program have to say besides the figures. */
function findingsOf({ drawing, settings, networks, before, after, crossings }: Ordered): Finding[] {
  const findings: Finding[] = [];
  const note = (code: string, values: Finding['values']) =>
    findings.push({ code, severity: 'note', place: null, values });
  const repeatedMm = networks.reduce((total, n) => total + n.repeatedMm, 0);
  if (repeatedMm > 0) note('repeats-drawn-once', { lengthMm: repeatedMm });
  const dots = networks.reduce((total, n) => total + n.dotsOnLines, 0);
  if (dots > 0) note('dots-on-lines', { count: dots });
  const repeatedDots = networks.reduce((total, n) => total + n.repeatedDots, 0);
  if (repeatedDots > 0) note('dots-drawn-once', { count: repeatedDots });
  const { bridgedMm, drawnMm } = after.measure;
  if (bridgedMm > MUCH_BRIDGED * drawnMm) {
    findings.push({ code: 'much-bridged', severity: 'warning', place: null, values: { bridgedMm, drawnMm } });
  }
  const { drawn } = programBounds(after.program);
  if (drawn) findings.push(...overhang(drawn, drawing));
  findings.push(...wideStrokes(drawing, settings.penWidthMm));
  if (crossings) findings.push(crossingNote(crossings));
  if (after === before) note('order-kept', {});
  return findings;
}

/** What junctions at crossings saved. */
function crossingNote({ count, kept, without, with: crossed }: Crossings): Finding {
  const note = { severity: 'note', place: null } as const;
  if (count > MOST_CROSSINGS) {
    return { code: 'too-many-crossings', ...note, values: { limit: MOST_CROSSINGS } };
  }
  const values = {
    count,
    runs: without.runs - crossed.runs,
    travelMm: without.travelMm - crossed.travelMm,
  };
  return kept
    ? { code: 'crossings-paid', ...note, values }
    : { code: 'crossings-not-worth', ...note, values };
}
