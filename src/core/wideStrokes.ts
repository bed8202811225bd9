import type { Drawing } from './drawing/drawing.js';
import type { Finding } from './finding.js';

/** Where nobody has told the tool's width: wider than any fineliner's line (common practice, no source). */
const WIDE_MM = 1;
/** Widths are rounded where drawings are written. */
const ROUNDING = 1.001;

/**
 * Says where strokes are wider than the tool's line: each comes out as one line along its middle, and a
 * mill would take away a track that is meant to stay.
 */
export function wideStrokes({ strokes, places }: Drawing, penWidthMm: number | null): Finding[] {
  const penMm = penWidthMm ?? WIDE_MM;
  let count = 0;
  let widest = -1;
  for (let s = 0; s < strokes.count; s++) {
    if (strokes.widthMm[s] <= penMm * ROUNDING) continue;
    count++;
    if (widest < 0 || strokes.widthMm[s] > strokes.widthMm[widest]) widest = s;
  }
  if (count === 0) return [];
  return [
    {
      code: 'wider-than-pen',
      severity: penWidthMm === null ? 'note' : 'warning',
      place: places[strokes.element[widest]] ?? null,
      values: { count, penMm, widestMm: strokes.widthMm[widest] },
    },
  ];
}
