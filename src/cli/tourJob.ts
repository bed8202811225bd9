import { basename, extname, join } from 'node:path';
import {
  findingLines,
  type MachineProfile,
  PEN_ON_Z,
  type Report,
  reportOf,
  reportTable,
  type Settings,
  tour,
  type Written,
  writeAudited,
} from '../core/index.js';
import { writeWhole } from '../node/files.js';
import { version } from '../node/version.js';
import { Ending, EXIT } from './exitCodes.js';
import { readText, reason, strokedDrawingFrom } from './input.js';
import { ProgressLine } from './progressLine.js';
import type { Reading } from './readingOptions.js';

/** One drawing to order, and what to do with the result. */
export interface TourJob {
  readonly input: string;
  /** Where to write; `-` is standard output. */
  readonly outputs: readonly string[];
  readonly settings: Settings;
  readonly reading: Reading;
  readonly showTravel: boolean;
  readonly json: boolean;
  readonly quiet: boolean;
}

export type OutputKind = 'svg' | 'gcode' | 'json';

const KIND_OF: Readonly<Record<string, OutputKind>> = {
  '.svg': 'svg',
  '.gcode': 'gcode',
  '.ngc': 'gcode',
  '.nc': 'gcode',
  '.tap': 'gcode',
  '.json': 'json',
};

/** The kind of an output by its extension; standard output takes SVG. Null where it is not known. */
export function outputKind(path: string): OutputKind | null {
  return path === '-' ? 'svg' : (KIND_OF[extname(path).toLowerCase()] ?? null);
}

/** Reads, orders, writes, audits and reports one drawing; throws an Ending where that cannot be done. */
export function runTourJob(job: TourJob): void {
  const drawing = strokedDrawingFrom(readText(job.input, job.reading), job.input, job.reading, job.settings);
  const progress = new ProgressLine(!job.quiet && process.stderr.isTTY === true);
  const { settings } = job;
  const until = performance.now() + 1000 * (settings.seconds ?? Number.POSITIVE_INFINITY);
  const profile: MachineProfile = { ...PEN_ON_Z, snapMm: settings.snapMm, accuracyMm: settings.accuracyMm };
  const ordered = tour(drawing, settings, profile, {
    onProgress: (step) => progress.show(step),
    shouldStop: () => performance.now() > until,
  });

  const written = new Map<OutputKind, Written>();
  const kinds = job.outputs.map((path) => outputKind(path) ?? 'svg');
  for (const kind of new Set<OutputKind>(['svg', ...kinds])) {
    if (kind !== 'json' && (kind !== 'svg' || kinds.includes('svg') || !kinds.includes('gcode'))) {
      progress.show({ doing: 'audit', share: written.size / kinds.length, costMm: null });
      written.set(kind, writeAudited(ordered, kind, job.showTravel));
    }
  }
  progress.clear();
  const audits = [...written.values()].map(({ audit }) => audit);
  const report = reportOf(ordered, audits, version());
  if (!report.audit.ok) throw refusal(report);

  const json = `${JSON.stringify(report, null, 2)}\n`;
  const textOf = (kind: OutputKind) => (kind === 'json' ? json : (written.get(kind)?.text ?? ''));
  const files = job.outputs.map((path, i) => ({ path, text: textOf(kinds[i]) }));
  save(files.filter(({ path }) => path !== '-'));
  for (const { path, text } of files) if (path === '-') process.stdout.write(text);
  if (job.json) process.stdout.write(json);
  else if (!job.quiet)
    tell(
      report,
      files.map(({ path }) => path),
      kinds.includes('gcode'),
    );
}

function refusal(report: Report): Ending {
  const first = report.findings.find((finding) => finding.severity === 'error');
  const { missingMm, extraMm } = report.audit;
  return new Ending(
    EXIT.refused,
    `${report.drawing.name}: the audit of the written text failed (${missingMm.toFixed(3)} mm missing, ${extraMm.toFixed(3)} mm added); nothing was written${first ? `\n  ${first.message}` : ''}`,
  );
}

function save(files: { path: string; text: string }[]): void {
  try {
    writeWhole(files);
  } catch (error) {
    throw new Ending(
      EXIT.notWritten,
      `could not write ${files.map((f) => f.path).join(', ')}: ${reason(error)}`,
    );
  }
}

/** Table and findings: beside a drawing on standard output they go to standard error. */
function tell(report: Report, outputs: string[], gcode: boolean): void {
  const lines = [reportTable(report), ...findingLines(report.findings)];
  for (const path of outputs) if (path !== '-') lines.push(`wrote ${path}`);
  if (gcode) {
    lines.push(
      'caution: check bounds, unit, zero and direction of Y, and make the first run with the pen clear of the sheet.',
      "  The machine's manual, local codes and licensed practice come first; the file's head says more.",
    );
  }
  const stream = outputs.includes('-') ? process.stderr : process.stdout;
  stream.write(`${lines.join('\n')}\n`);
}

/** The output of one of several drawings in a directory. */
export function inDirectory(directory: string, input: string): string {
  return join(directory, input === '-' ? 'drawing.svg' : `${basename(input, extname(input))}.svg`);
}
