import type { Finding } from '../finding.js';
import type { Drawing } from './drawing.js';
import { keepStrokes } from './keepStrokes.js';
import { isNamed } from './penName.js';
import { NO_PEN_NAMES, type PenNames, type PenRule, planPens } from './pens.js';

/** What is asked of the pens, by their names in the drawing, their new names, or any CSS colour. */
export interface PenWishes extends PenNames {
  /** The pens to draw; empty for all of them. */
  readonly onlyPens: readonly string[];
  /** Pens to leave out. */
  readonly skipPens: readonly string[];
}

export const NO_PEN_WISHES: PenWishes = { ...NO_PEN_NAMES, onlyPens: [], skipPens: [] };

/**
 * The drawing without the strokes of pens that are not to be drawn; the same object where all are. What
 * was left out, and names of pens that are not there, are findings. O(segments).
 */
export function choosePens(drawing: Drawing, rule: PenRule, wishes: PenWishes): Drawing {
  const { onlyPens, skipPens } = wishes;
  const unknown = unknownPens(drawing, rule, wishes);
  if (onlyPens.length + skipPens.length + unknown.length === 0) return drawing;
  const plan = planPens(drawing, rule, { ...NO_PEN_NAMES, penNames: wishes.penNames });
  const isKept = plan.pens.map(
    (pen) =>
      (onlyPens.length === 0 || onlyPens.some((name) => isNamed(pen, name))) &&
      !skipPens.some((name) => isNamed(pen, name)),
  );
  const left = plan.pens.filter((_, pen) => !isKept[pen]);
  const findings = [...drawing.findings, ...unknown];
  if (left.length === 0) return { ...drawing, findings };
  const strokes = keepStrokes(drawing.strokes, (s) => isKept[plan.penOfStroke[s]]);
  findings.push({
    code: 'pens-left-out',
    severity: 'note',
    place: null,
    values: { pens: left.map((pen) => pen.name).join(', '), count: drawing.strokes.count - strokes.count },
  });
  return { ...drawing, strokes, findings };
}

/** Names that no pen of the drawing goes by. */
function unknownPens(drawing: Drawing, rule: PenRule, wishes: PenWishes): Finding[] {
  const asked = [
    ...wishes.onlyPens,
    ...wishes.skipPens,
    ...wishes.penOrder,
    ...wishes.penNames.map(([old]) => old),
  ];
  if (asked.length === 0) return [];
  const pens = [
    ...planPens(drawing, rule, NO_PEN_NAMES).pens,
    ...planPens(drawing, rule, { ...NO_PEN_NAMES, penNames: wishes.penNames }).pens,
  ];
  const unknown = [...new Set(asked)].filter((name) => !pens.some((pen) => isNamed(pen, name)));
  const names = [...new Set(pens.map((pen) => pen.name))].join(', ');
  return unknown.map((pen) => ({
    code: 'pen-not-there',
    severity: 'warning',
    place: null,
    values: { pen, pens: names },
  }));
}
