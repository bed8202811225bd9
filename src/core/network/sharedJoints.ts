import type { Drawing } from '../drawing/drawing.js';
import { LINE } from '../geometry/segments.js';
import { addSplit, type Marks } from './marks.js';

/** Joints this close are one point: what is left of rounding after transforms, far below any drawn gap. */
const SAME_POINT_MM = 1e-6;
/** Side of the cells joints are filed in; a joint looks into a neighbour cell only next to its border. */
const CELL_MM = 1e-3;

/**
 * Adds a split to `marks` at every joint inside a stroke where strokes that share the joint part: two
 * visits to the point with other neighbours on either side (as arcs are cut in a topology of shared
 * borders; Bostock 2013, from memory). Borders of neighbouring cells, drawn once for each, so fall into
 * the same pieces, and the second drawing of each is found as a repeat. Where all visits go the same
 * way nothing is split. O(joints).
 */
export function splitWhereJointsPart(marks: Marks, drawing: Drawing, strokes: Uint32Array): void {
  const visits = jointVisits(drawing, strokes);
  const point = pointNumbers(visits);
  const { count, before, after, segment, stroke } = visits;
  const lowSide = new Int32Array(count).fill(-1);
  const highSide = new Int32Array(count).fill(-1);
  const parts = new Uint8Array(count);
  const side = (v: number) => (v < 0 ? -1 : point[v]);
  const isStraight = (v: number) => drawing.strokes.segments.kind[segment[v]] === LINE;
  for (let v = 0; v < count; v++) {
    const p = point[v];
    const low = Math.min(side(before[v]), side(after[v]));
    const high = Math.max(side(before[v]), side(after[v]));
    // A straight stroke that turns back here draws the way back along the way there.
    if (low === high && low >= 0 && isStraight(before[v]) && isStraight(v)) parts[p] = 1;
    if (highSide[p] < 0) {
      lowSide[p] = low;
      highSide[p] = high;
    } else if (lowSide[p] !== low || highSide[p] !== high) parts[p] = 1;
  }
  for (let v = 0; v < count; v++) {
    const inside = before[v] >= 0 && after[v] >= 0 && segment[v] > drawing.strokes.first[stroke[v]];
    if (inside && parts[point[v]]) addSplit(marks, drawing, stroke[v], segment[v], 0);
  }
}

/**
 * Every place where a segment of a stroke starts or the stroke ends: the visit before and after it on
 * the stroke, -1 beyond an open end. A closed stroke comes round: its last visit is its first.
 */
interface Visits {
  readonly count: number;
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly stroke: Uint32Array;
  /** The segment that starts here; past the last one at an open end. */
  readonly segment: Uint32Array;
  readonly before: Int32Array;
  readonly after: Int32Array;
}

function jointVisits(drawing: Drawing, strokes: Uint32Array): Visits {
  const { first, closed, dot, segments } = drawing.strokes;
  let count = 0;
  for (const s of strokes) if (!dot[s]) count += first[s + 1] - first[s] + (closed[s] ? 0 : 1);
  const x = new Float64Array(count);
  const y = new Float64Array(count);
  const stroke = new Uint32Array(count);
  const segment = new Uint32Array(count);
  const before = new Int32Array(count);
  const after = new Int32Array(count);
  let v = 0;
  for (const s of strokes) {
    if (dot[s]) continue;
    const start = v;
    for (let i = first[s]; i < first[s + 1]; i++) {
      const o = segments.offset[i];
      x[v] = segments.data[o];
      y[v] = segments.data[o + 1];
      segment[v++] = i;
    }
    if (!closed[s]) {
      const o = segments.offset[first[s + 1] - 1];
      x[v] = segments.data[o + 2];
      y[v] = segments.data[o + 3];
      segment[v++] = first[s + 1];
    }
    for (let k = start; k < v; k++) {
      stroke[k] = s;
      before[k] = k > start ? k - 1 : closed[s] ? v - 1 : -1;
      after[k] = k + 1 < v ? k + 1 : closed[s] ? start : -1;
    }
  }
  return { count, x, y, stroke, segment, before, after };
}

/** For each visit the number of the first visit to the same point. */
function pointNumbers({ count, x, y }: Visits): Int32Array {
  const point = new Int32Array(count);
  const latest = new Map<number, number>();
  const next = new Int32Array(count).fill(-1);
  const key = (cx: number, cy: number) => cx * 0x4000000 + cy;
  const border = SAME_POINT_MM / CELL_MM;
  for (let v = 0; v < count; v++) {
    const [fx, fy] = [x[v] / CELL_MM, y[v] / CELL_MM];
    let found = -1;
    for (let cx = Math.floor(fx - border); cx <= Math.floor(fx + border) && found < 0; cx++) {
      for (let cy = Math.floor(fy - border); cy <= Math.floor(fy + border) && found < 0; cy++) {
        for (let w = latest.get(key(cx, cy)) ?? -1; w >= 0 && found < 0; w = next[w]) {
          if (Math.abs(x[w] - x[v]) <= SAME_POINT_MM && Math.abs(y[w] - y[v]) <= SAME_POINT_MM) found = w;
        }
      }
    }
    point[v] = found < 0 ? v : point[found];
    if (found >= 0) continue;
    const home = key(Math.floor(fx), Math.floor(fy));
    next[v] = latest.get(home) ?? -1;
    latest.set(home, v);
  }
  return point;
}
