import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import type { AuditOptions } from '../../src/core/audit/audit.ts';
import type { LineSet } from '../../src/core/audit/lineSet.ts';
import { linesOfDrawing, linesOfProgram } from '../../src/core/audit/lines.ts';
import { planPens } from '../../src/core/drawing/pens.ts';
import { readDrawing } from '../../src/core/drawing/readDrawing.ts';
import { PEN_ON_Z } from '../../src/core/machine/penOnZ.ts';
import { orderDrawing } from '../../src/core/pipeline.ts';
import { readGcode } from '../../src/core/program/readGcode.ts';
import { DEFAULT_SETTINGS, REPEAT_TOLERANCE_MM } from '../../src/core/settings.ts';
import { writeGcode } from '../../src/core/write/gcode.ts';
import { withoutTravel, writeSvg } from '../../src/core/write/svg.ts';
import { type Chain, chainsOf } from './chains.ts';

const SAMPLES = fileURLToPath(new URL('../../samples/', import.meta.url));

export const SAMPLE_NAMES = readdirSync(SAMPLES).filter((name) => name.endsWith('.svg'));

/** One sample and what was written for it in one format. */
export interface SampleOutput {
  readonly medium: 'svg' | 'gcode';
  readonly wanted: LineSet;
  /** The runs as read back from the written text. */
  readonly drawn: readonly Chain[];
  readonly options: AuditOptions;
  /** Accuracy and two chord errors, as the docstring of auditLines says. */
  readonly tau: number;
}

/** A sample put in order and written, without improvement: which order is drawn does not matter here. */
export function outputsOf(name: string): SampleOutput[] {
  const drawing = readDrawing(readFileSync(SAMPLES + name, 'utf8'), { name });
  const ordered = orderDrawing(drawing, { ...DEFAULT_SETTINGS, effort: 0, bound: 'none' }, PEN_ON_Z);
  const wanted = linesOfDrawing(ordered.drawing, ordered.plan);
  const common = { snapMm: 0.05, repeats: 'once' as const, repeatToleranceMm: REPEAT_TOLERANCE_MM };
  const { program, measure: facts } = ordered.after;
  const { widthMm, heightMm, title, description } = drawing;
  const text = writeSvg(program, { widthMm, heightMm, title, description, travel: false });
  const svg = readDrawing(withoutTravel(text));
  const page = { pageWidthMm: widthMm, pageHeightMm: heightMm, name, facts };
  const gcode = readGcode(writeGcode(program, PEN_ON_Z, page)).program;
  return [
    {
      medium: 'svg',
      wanted,
      drawn: chainsOf(linesOfDrawing(svg, planPens(svg, 'layer'))),
      options: { ...common, accuracyMm: 0.002 },
      tau: 0.003,
    },
    {
      medium: 'gcode',
      wanted,
      drawn: chainsOf(linesOfProgram(gcode)),
      options: { ...common, accuracyMm: PEN_ON_Z.accuracyMm },
      tau: PEN_ON_Z.accuracyMm + 0.004,
    },
  ];
}
