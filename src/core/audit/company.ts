import { LINE } from '../geometry/segments.js';
import type { Side } from './side.js';
import { findOverlap, newOverlap } from './sideBySide.js';

/** Cells of the grid at most, for each span: long lines and wide sheets get larger cells. */
const CELLS_EACH = 4;
/** Spans of one cell that are compared with each other; in a crowd all may have company. */
const CROWD = 48;

/**
 * Which spans of which something is paired may run beside another such one within `reach`, at an angle whose cosine is `leastCosine` at
 * least: 1 for each that may. Lines are compared; of others whose boxes touch `counts` is asked. Never 0
 * where there is company.
 *
 * Spans are sorted into the cells of a grid and compared within each. O(spans), where few share a cell.
 */
export function spansWithCompany(
  side: Side,
  reach: number,
  leastCosine: number,
  counts: (span: number, other: number) => boolean,
): Uint8Array {
  const { boxes, lines, spans } = side;
  const { segment, chain } = spans;
  const { kind, offset, data: d } = lines.segments;
  const company = new Uint8Array(spans.count);
  const { start, items } = new SpanGrid(boxes, side.touched, reach);
  const overlap = newOverlap();
  const isBeside = (a: number, b: number): boolean => {
    if (boxes[4 * a] > boxes[4 * b + 2] + reach || boxes[4 * b] > boxes[4 * a + 2] + reach) return false;
    if (boxes[4 * a + 1] > boxes[4 * b + 3] + reach || boxes[4 * b + 1] > boxes[4 * a + 3] + reach)
      return false;
    const [i, j] = [segment[a], segment[b]];
    if (i === j || lines.pen[chain[a]] !== lines.pen[chain[b]]) return false;
    if (kind[i] === LINE && kind[j] === LINE) {
      const [o, q] = [offset[i], offset[j]];
      const [ex, ey] = [d[o + 2] - d[o], d[o + 3] - d[o + 1]];
      const [fx, fy] = [d[q + 2] - d[q], d[q + 3] - d[q + 1]];
      const dot = ex * fx + ey * fy;
      const least = leastCosine * leastCosine * (ex * ex + ey * ey) * (fx * fx + fy * fy);
      if (dot * dot < 0.999 * least) return false;
      const [ax, ay, bx, by] = [d[o], d[o + 1], d[q], d[q + 1]];
      if (!findOverlap(ax, ay, ax + ex, ay + ey, bx, by, bx + fx, by + fy, reach, 0, overlap)) return false;
      // Rounding apart, lines that follow each other overlap nowhere.
      return overlap.lengthMm > 1e-9;
    }
    return counts(a, b);
  };
  for (let cell = 0; cell + 1 < start.length; cell++) {
    const [from, to] = [start[cell], start[cell + 1]];
    if (to - from > CROWD) {
      for (let k = from; k < to; k++) company[items[k]] = 1;
      continue;
    }
    for (let k = from + 1; k < to; k++) {
      for (let m = from; m < k; m++) {
        const [a, b] = [items[k], items[m]];
        if ((company[a] === 1 && company[b] === 1) || !isBeside(a, b)) continue;
        company[a] = company[b] = 1;
      }
    }
  }
  return company;
}

/** Spans by the cells that their boxes touch: cell c holds `items[start[c]]` up to `items[start[c + 1]]`. */
class SpanGrid {
  readonly start: Uint32Array;
  readonly items: Uint32Array;
  private readonly columns: number;
  private readonly rows: number;
  private readonly minX: number;
  private readonly minY: number;
  private readonly cell: number;

  constructor(
    private readonly boxes: Float64Array,
    belongs: Uint8Array,
    private readonly reach: number,
  ) {
    const count = belongs.length;
    let [minX, minY, maxX, maxY] = [Infinity, Infinity, -Infinity, -Infinity];
    let sizes = 0;
    let counted = 0;
    for (let k = 0; k < count; k++) {
      if (belongs[k] === 0) continue;
      minX = Math.min(minX, boxes[4 * k]);
      minY = Math.min(minY, boxes[4 * k + 1]);
      maxX = Math.max(maxX, boxes[4 * k + 2]);
      maxY = Math.max(maxY, boxes[4 * k + 3]);
      sizes += boxes[4 * k + 2] - boxes[4 * k] + boxes[4 * k + 3] - boxes[4 * k + 1];
      counted++;
    }
    const most = CELLS_EACH * Math.max(1, counted);
    const [width, height] = counted > 0 ? [maxX - minX, maxY - minY] : [0, 0];
    let cell = Math.max(2 * reach, counted > 0 ? sizes / counted : 1);
    while ((width / cell + 1) * (height / cell + 1) > most) cell *= 1.5;
    this.cell = cell;
    this.minX = counted > 0 ? minX - reach : 0;
    this.minY = counted > 0 ? minY - reach : 0;
    this.columns = Math.floor((width + 2 * reach) / cell) + 1;
    this.rows = Math.floor((height + 2 * reach) / cell) + 1;
    this.start = new Uint32Array(this.columns * this.rows + 1);
    for (let k = 0; k < count; k++) if (belongs[k] === 1) this.eachCell(k, (c) => this.start[c + 1]++);
    for (let c = 1; c < this.start.length; c++) this.start[c] += this.start[c - 1];
    this.items = new Uint32Array(this.start[this.start.length - 1]);
    const at = this.start.slice();
    for (let k = 0; k < count; k++) {
      if (belongs[k] === 1) {
        this.eachCell(k, (c) => {
          this.items[at[c]++] = k;
        });
      }
    }
  }

  private eachCell(k: number, visit: (cell: number) => void): void {
    const { boxes, cell, minX, minY, reach, columns, rows } = this;
    // Only one of two neighbours needs to reach over to the other's cell: each by half of it, and a bit.
    const half = 0.51 * reach;
    const x1 = Math.min(columns - 1, Math.floor((boxes[4 * k + 2] + half - minX) / cell));
    const y1 = Math.min(rows - 1, Math.floor((boxes[4 * k + 3] + half - minY) / cell));
    for (let y = Math.max(0, Math.floor((boxes[4 * k + 1] - half - minY) / cell)); y <= y1; y++) {
      for (let x = Math.max(0, Math.floor((boxes[4 * k] - half - minX) / cell)); x <= x1; x++) {
        visit(y * columns + x);
      }
    }
  }
}
