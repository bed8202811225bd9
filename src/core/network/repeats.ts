import type { Drawing } from '../drawing/drawing.js';
import { pointAt } from '../geometry/evaluate.js';
import { flattenSegment } from '../geometry/flatten.js';
import type { Spans } from './spans.js';
import { walkSpan } from './walkSpan.js';

/**
 * Marks every span that draws again, in either direction, a span before it: same end vertices, and at
 * equal shares of their length never more than `toleranceMm` apart. The first in document order stays.
 *
 * Comparing at equal shares of the length is stricter than comparing the point sets: two lines that lie
 * on each other but run at different rates (one doubling back) are not taken for one. Both are flattened
 * to a quarter of the tolerance first. Cost: linear in the flattened points of spans that share both
 * vertices with another, times the distinct lines between those vertices.
 *
 * @returns 1 for each span to leave out.
 */
export function findRepeats(
  spans: Spans,
  drawing: Drawing,
  lengthMm: Float64Array,
  toleranceMm: number,
): Uint8Array {
  const repeated = new Uint8Array(spans.count);
  const groups = new Map<string, number[]>();
  for (let e = 0; e < spans.count; e++) {
    const a = spans.startVertex[e];
    const b = spans.endVertex[e];
    const key = a < b ? `${a} ${b}` : `${b} ${a}`;
    const group = groups.get(key);
    if (group) group.push(e);
    else groups.set(key, [e]);
  }
  for (const group of groups.values()) {
    if (group.length < 2) continue;
    const kept: { edge: number; shape: Shape }[] = [];
    for (const e of group) {
      const shape = flattened(spans, e, drawing, toleranceMm / 4);
      const again = kept.some(
        (k) =>
          Math.abs(lengthMm[k.edge] - lengthMm[e]) <= 4 * toleranceMm + 0.01 * lengthMm[e] &&
          (follows(k.shape, shape, toleranceMm, false) || follows(k.shape, shape, toleranceMm, true)),
      );
      if (again) repeated[e] = 1;
      else kept.push({ edge: e, shape });
    }
  }
  return repeated;
}

/** A polyline with the share of its length, 0 to 1, at every point. */
interface Shape {
  x: number[];
  y: number[];
  share: number[];
}

function flattened(spans: Spans, e: number, drawing: Drawing, accuracyMm: number): Shape {
  const { segments } = drawing.strokes;
  const at = new Float64Array(2);
  pointAt(segments, spans.startSegment[e], spans.startT[e], at);
  const shape: Shape = { x: [at[0]], y: [at[1]], share: [0] };
  let length = 0;
  walkSpan(spans.startSegment[e], spans.startT[e], spans.endSegment[e], spans.endT[e], (i, t0, t1) =>
    flattenSegment(segments, i, t0, t1, accuracyMm, (x, y) => {
      const dx = x - shape.x[shape.x.length - 1];
      const dy = y - shape.y[shape.y.length - 1];
      length += Math.sqrt(dx * dx + dy * dy);
      shape.x.push(x);
      shape.y.push(y);
      shape.share.push(length);
    }),
  );
  for (let i = 0; i < shape.share.length; i++) shape.share[i] = length > 0 ? shape.share[i] / length : 0;
  shape.share[shape.share.length - 1] = 1;
  return shape;
}

/** Whether b stays within `tolerance` of a at every corner of either, at equal shares of the length. */
function follows(a: Shape, b: Shape, tolerance: number, backwards: boolean): boolean {
  return cornersNear(a, b, tolerance, backwards) && cornersNear(b, a, tolerance, backwards);
}

function cornersNear(a: Shape, b: Shape, tolerance: number, backwards: boolean): boolean {
  const last = b.x.length - 1;
  let j = 0;
  for (let i = 0; i < a.x.length; i++) {
    const k = backwards ? a.x.length - 1 - i : i;
    const share = backwards ? 1 - a.share[k] : a.share[k];
    while (j < last - 1 && b.share[j + 1] < share) j++;
    const run = b.share[j + 1] - b.share[j];
    const w = run > 0 ? (share - b.share[j]) / run : 0;
    const dx = b.x[j] + w * (b.x[j + 1] - b.x[j]) - a.x[k];
    const dy = b.y[j] + w * (b.y[j + 1] - b.y[j]) - a.y[k];
    if (dx * dx + dy * dy > tolerance * tolerance) return false;
  }
  return true;
}
