import type { Place } from '../finding.js';
import { count, fineMm, mm, sideBySide, size } from './figures.js';
import type { Report } from './report.js';

/** Gaps below a tenth of a micrometre are rounding, not gaps. */
const SHOWN_GAP_MM = 1e-4;

/** The report in a few lines for a terminal: before and after, bound and gap, findings, audit. */
export function reportTable(report: Report): string {
  const { before, after, bound, gap, drawing, network } = report;
  const lines = [
    `${drawing.name}: ${size(drawing.widthMm)} x ${size(drawing.heightMm)} mm, ${count(drawing.strokes, 'stroke')}, ${count(network.components, 'component')}, ${count(network.oddVertices, 'odd vertex', 'odd vertices')}, ${count(report.pens.length, 'pen')}`,
    ...sideBySide(before, after),
    `  bound   ${boundText(bound, gap)}`,
    `  audit   ${auditText(report)}`,
  ];
  if (network.bridgedMm > 0 && network.snapMaxMm >= SHOWN_GAP_MM) {
    lines.push(
      `  gaps    ${mm(network.bridgedMm)} drawn across gaps, none wider than ${fineMm(network.snapMaxMm)}`,
    );
  }
  for (const pen of report.pens.length > 1 ? report.pens : []) {
    lines.push(
      `  pen ${pen.pen}: ${count(pen.runs, 'run')}, drawn ${mm(pen.drawnMm)}, travel ${mm(pen.travelMm)}`,
    );
  }
  return lines.join('\n');
}

/** One line for each finding; `places` further lines, at most, say where else it was met. */
export function findingLines(findings: Report['findings'], places = 0): string[] {
  return findings.flatMap(({ severity, message, place, places: all = [] }) => {
    const where = place?.line ? ` (${placeText(place)})` : '';
    const others = places > 0 ? all.slice(1) : [];
    const lines = others.slice(0, places).map((other) => `    also ${placeText(other)}`);
    if (others.length > places) lines.push(`    and ${others.length - places} more; --json lists them`);
    return [`${severity}: ${message}${where}`, ...lines];
  });
}

function placeText({ element, id, line, column }: Place): string {
  const what = element === null ? '' : `, <${element}>${id === null ? '' : ` id ${id}`}`;
  return `line ${line}, column ${column}${what}`;
}

function boundText(bound: Report['bound'], gap: number | null): string {
  if (bound.method === 'none') return 'not asked for';
  const value = bound.objective === 'lifts' ? count(bound.value, 'run') : mm(bound.value);
  if (bound.exact && bound.objective === 'lifts') return `${value}, reached: no order has fewer`;
  if (bound.exact) return `${value}, reached: no order that lifts at ends and joints travels less`;
  const far = gap === null ? '' : `, at most ${(100 * gap).toFixed(1)} % above the least possible`;
  return `${value}${far}`;
}

function auditText(report: Report): string {
  const { audit } = report;
  const often = report.settings.repeats === 'keep' ? 'as often as in the drawing' : 'once';
  if (audit.ok) return `every line is there ${often}; largest deviation ${fineMm(audit.maxDeviationMm)}`;
  return `FAILED: ${mm(audit.missingMm)} missing, ${mm(audit.extraMm)} added, ${mm(audit.twiceMm)} drawn again`;
}
