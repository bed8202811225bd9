import type { Drawing } from './drawing/drawing.js';
import type { Finding } from './finding.js';
import type { Bounds } from './measure/bounds.js';

/** Cutting at the edge of the page leaves ends that lie this near outside as they are. */
const LEAST_OVERHANG_MM = 0.005;

/** A warning where lines pass the edge of the page, with how far. */
export function overhang(lines: Bounds, { widthMm, heightMm }: Drawing): Finding[] {
  const overhangMm = Math.max(-lines.minX, -lines.minY, lines.maxX - widthMm, lines.maxY - heightMm);
  if (!(overhangMm > LEAST_OVERHANG_MM)) return [];
  return [{ code: 'off-page', severity: 'warning', place: null, values: { overhangMm } }];
}
