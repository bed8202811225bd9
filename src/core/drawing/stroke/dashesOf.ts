import type { Affine } from '../../geometry/affine.js';
import { IDENTITY } from '../../geometry/affine.js';
import type { Context, Session } from '../session.js';
import type { Style } from '../style/computedStyle.js';
import type { Dash } from './strokeSink.js';

/**
 * How a shape's line is dashed, null where it is drawn in one piece. With `pathLength` the pattern is
 * scaled by the true length of the whole path over the one given (SVG 2, "The pathLength attribute"; 0
 * makes all dashes 0, which is a solid line). A stroke that does not scale has its pattern in px.
 */
export function dashesOf(
  session: Session,
  style: Style,
  pathLength: string | undefined,
  nonScaling: boolean,
  context: Context,
  lengthUnder: (map: Affine) => number,
  map: Affine,
): Dash | null {
  if (!style.dashes || session.rules.dashes === 'solid') return null;
  const unit = nonScaling ? 25.4 / context.pxPerInch : 1;
  let scale = unit;
  const given = pathLength === undefined ? Number.NaN : Number(pathLength);
  if (given >= 0 && pathLength?.trim() !== '') {
    if (given === 0) return null;
    scale = lengthUnder(nonScaling ? map : IDENTITY) / given;
    if (!(scale > 0 && Number.isFinite(scale))) return null;
  }
  const lengths = style.dashes.map((length) => length * scale);
  return { pattern: { lengths, offset: style.dashOffset * scale }, inMm: nonScaling };
}
