import type { Report } from './report.js';

/** The report in a few lines for a terminal: before and after, bound and gap, findings, audit. */
export function reportTable(report: Report): string {
  const { before, after, bound, gap, drawing, network } = report;
  const rows: [string, string, string, string][] = [
    ['', 'before', 'after', 'change'],
    ['runs', `${before.runs}`, `${after.runs}`, change(before.runs, after.runs)],
    ['travel', mm(before.travelMm), mm(after.travelMm), change(before.travelMm, after.travelMm)],
    ['drawn', mm(before.drawnMm), mm(after.drawnMm), change(before.drawnMm, after.drawnMm)],
    ['time', seconds(before.seconds), seconds(after.seconds), change(before.seconds, after.seconds)],
  ];
  const width = [0, 1, 2, 3].map((c) => Math.max(...rows.map((row) => row[c].length)));
  const lines = [
    `${drawing.name}: ${round(drawing.widthMm)} x ${round(drawing.heightMm)} mm, ${count(drawing.strokes, 'stroke')}, ${count(network.components, 'component')}, ${count(network.oddVertices, 'odd vertex', 'odd vertices')}, ${count(report.pens.length, 'pen')}`,
    ...rows.map((row) =>
      `  ${row[0].padEnd(width[0])}  ${row
        .slice(1)
        .map((cell, c) => cell.padStart(width[c + 1]))
        .join('  ')}`.trimEnd(),
    ),
    `  bound   ${boundText(bound, gap)}`,
    `  audit   ${auditText(report)}`,
  ];
  if (network.bridgedMm > 0) {
    lines.push(
      `  gaps    ${mm(network.bridgedMm)} drawn across gaps, none wider than ${fine(network.snapMaxMm)} mm`,
    );
  }
  for (const pen of report.pens.length > 1 ? report.pens : []) {
    lines.push(
      `  pen ${pen.pen}: ${count(pen.runs, 'run')}, drawn ${mm(pen.drawnMm)}, travel ${mm(pen.travelMm)}`,
    );
  }
  return lines.join('\n');
}

/** One line for each finding. */
export function findingLines(findings: Report['findings']): string[] {
  return findings.map(({ severity, message, place }) => {
    const where = place?.line ? ` (line ${place.line}${place.id ? `, id ${place.id}` : ''})` : '';
    return `${severity}: ${message}${where}`;
  });
}

function boundText(bound: Report['bound'], gap: number | null): string {
  if (bound.method === 'none') return 'not asked for';
  const value = bound.objective === 'lifts' ? count(bound.value, 'run') : mm(bound.value);
  if (bound.exact) return `${value}: no order can do with less`;
  const far = gap === null ? '' : `, at most ${(100 * gap).toFixed(1)} % above the least possible`;
  return `${value}${far}`;
}

function auditText({ audit }: Report): string {
  if (audit.ok) return `every line is there once; largest deviation ${fine(audit.maxDeviationMm)} mm`;
  return `FAILED: ${mm(audit.missingMm)} missing, ${mm(audit.extraMm)} added, ${mm(audit.twiceMm)} drawn again`;
}

function change(before: number, after: number): string {
  if (before === 0) return '';
  const percent = (100 * (after - before)) / before;
  return `${percent > 0 ? '+' : ''}${percent.toFixed(1)} %`;
}

function mm(value: number): string {
  return `${value.toFixed(1)} mm`;
}

function seconds(value: number): string {
  if (value < 100) return `${value.toFixed(1)} s`;
  const whole = Math.round(value / 60);
  return whole < 60 ? `${whole} min` : `${Math.floor(whole / 60)} h ${whole % 60} min`;
}

function round(value: number): string {
  return String(Math.round(value * 100) / 100);
}

function fine(value: number): string {
  return value.toFixed(4);
}

function count(n: number, one: string, many = `${one}s`): string {
  return `${n} ${n === 1 ? one : many}`;
}
