import { OverlapTable } from './overlapTable.js';
import type { Side } from './side.js';
import { findOverlap, newOverlap, type Overlap } from './sideBySide.js';
import type { Tolerances } from './tolerances.js';

/** Pieces that differ in direction by more than 60° are not paired. */
const LEAST_COSINE = 0.5;
/** Overlaps of a drawn piece that are kept, where many wanted lines lie about it. */
const MOST_OVERLAPS = 48;
/** Of a crowd of spans first about this many are looked at; so many good overlaps among them will do. */
const SAMPLE = 128;
const ENOUGH = 16;

/** Finds where unpaired drawn pieces run beside unpaired wanted ones of the same pen. */
export class OverlapFinder {
  /** Whether something was left out because too much lay on one place. */
  crowded = false;
  private readonly overlap: Overlap = newOverlap();
  private near: number[] = [];
  /** Overlaps of the piece at hand, of which the best go into the table. */
  private readonly found = new OverlapTable();
  private good = 0;

  /** @param round another number chooses others from crowds */
  constructor(
    private readonly wanted: Side,
    private readonly drawn: Side,
    private readonly tolerances: Tolerances,
    private readonly table: OverlapTable,
    private readonly round: number,
  ) {}

  /** Gathers the unpaired wanted spans about a drawn span; false where there are none. */
  lookAbout(span: number): boolean {
    const { wanted, drawn } = this;
    const { boxes } = drawn;
    const reach = this.tolerances.matchMm;
    const pen = drawn.penOf(span);
    const near: number[] = [];
    const o = 4 * span;
    let [v, line] = [-1, false];
    wanted.index.visit(
      boxes[o] - reach,
      boxes[o + 1] - reach,
      boxes[o + 2] + reach,
      boxes[o + 3] + reach,
      (w) => {
        if (wanted.whole[w] === 1 || wanted.penOf(w) !== pen) return false;
        if (v < 0) {
          v = drawn.flatten(span);
          line = drawn.pieceCount(span) === 1;
        }
        // The boxes of long lines say little.
        if (line && this.isAside(v, wanted.flatten(w), w)) return false;
        near.push(w);
        return false;
      },
    );
    this.near = near;
    return near.length > 0;
  }

  /** The rows of the overlaps of piece v of that span, in order along it. */
  along(span: number, v: number): number[] {
    const { near, found, table } = this;
    found.count = this.good = 0;
    if (near.length <= 2 * SAMPLE) {
      for (const w of near) this.compare(span, v, w);
    } else {
      const c = this.drawn.spans.chain[span];
      const share = (SAMPLE / near.length) * 0x100000000;
      for (const w of near) if (this.rank(c, w) < share) this.compare(span, v, w);
      if (this.good >= ENOUGH) this.crowded = true;
      else for (const w of near) if (this.rank(c, w) >= share) this.compare(span, v, w);
    }
    const rows: number[] = [];
    if (found.count <= MOST_OVERLAPS) for (let i = 0; i < found.count; i++) rows.push(table.addRow(found, i));
    else this.addBestChains(span, rows);
    if (rows.length > 1) rows.sort((a, b) => table.from0[a] - table.from0[b] || a - b);
    return rows;
  }

  /** Keeps the overlaps with the wanted chains that run beside the piece the longest. */
  private addBestChains(span: number, rows: number[]): void {
    const { found, table, wanted } = this;
    this.crowded = true;
    const c = this.drawn.spans.chain[span];
    const rowsOfChain = new Map<number, number[]>();
    const shareOfChain = new Map<number, number>();
    for (let i = 0; i < found.count; i++) {
      const w = found.wantedSpan[i];
      const other = wanted.spans.chain[w];
      const list = rowsOfChain.get(other);
      if (list === undefined) rowsOfChain.set(other, [i]);
      else list.push(i);
      // Chains of equals prefer each other differently, so that not all choose the same few.
      const share = (found.to0[i] - found.from0[i]) * (1 - this.rank(c, w) / 0x800000000);
      shareOfChain.set(other, (shareOfChain.get(other) ?? 0) + share);
    }
    const chains = [...shareOfChain].sort((a, b) => b[1] - a[1] || a[0] - b[0]);
    for (const [chain] of chains) {
      if (rows.length >= MOST_OVERLAPS) break;
      for (const i of rowsOfChain.get(chain) ?? []) rows.push(table.addRow(found, i));
    }
  }

  /** A number in [0, 2³²) as if drawn at random for every pair of chains. */
  private rank(drawnChain: number, wantedSpan: number): number {
    return mixed(drawnChain, this.wanted.spans.chain[wantedSpan], this.round);
  }

  /** Whether a wanted span of one piece lies beyond reach on one side of drawn piece v. */
  private isAside(v: number, p: number, w: number): boolean {
    const { wanted, drawn } = this;
    if (wanted.pieceCount(w) !== 1) return false;
    const ax = drawn.x[v];
    const ay = drawn.y[v];
    const ex = drawn.x[v + 1] - ax;
    const ey = drawn.y[v + 1] - ay;
    const a = (wanted.x[p] - ax) * ey - (wanted.y[p] - ay) * ex;
    const b = (wanted.x[p + 1] - ax) * ey - (wanted.y[p + 1] - ay) * ex;
    const { matchMm } = this.tolerances;
    const limit = matchMm * matchMm * (ex * ex + ey * ey);
    return a > 0 === b > 0 && a * a > limit && b * b > limit;
  }

  private compare(span: number, v: number, w: number): void {
    const { wanted, drawn, overlap } = this;
    const reach = this.tolerances.matchMm;
    const ax = drawn.x[v];
    const ay = drawn.y[v];
    const bx = drawn.x[v + 1];
    const by = drawn.y[v + 1];
    const minX = Math.min(ax, bx) - reach;
    const minY = Math.min(ay, by) - reach;
    const maxX = Math.max(ax, bx) + reach;
    const maxY = Math.max(ay, by) + reach;
    const { boxes } = wanted;
    if (boxes[4 * w] > maxX || boxes[4 * w + 2] < minX) return;
    if (boxes[4 * w + 1] > maxY || boxes[4 * w + 3] < minY) return;
    const first = wanted.flatten(w);
    const last = first + wanted.pieceCount(w);
    const { x, y } = wanted;
    for (let p = first; p < last; p++) {
      const cx = x[p];
      const dx = x[p + 1];
      if ((cx < minX && dx < minX) || (cx > maxX && dx > maxX)) continue;
      const cy = y[p];
      const dy = y[p + 1];
      if ((cy < minY && dy < minY) || (cy > maxY && dy > maxY)) continue;
      if (wanted.isPieceDone(p)) continue;
      if (!findOverlap(ax, ay, bx, by, cx, cy, dx, dy, reach, LEAST_COSINE, overlap)) continue;
      const { from0, to0, from1, to1, offsetFrom, offsetTo } = overlap;
      this.found.add(span, v, w, p, from0, to0, from1, to1, offsetFrom, offsetTo);
      if (to0 - from0 > 0.5 || Math.abs(to1 - from1) > 0.5) this.good++;
    }
  }
}

/** Three numbers stirred into one of 32 bits. */
function mixed(a: number, b: number, c: number): number {
  let h = Math.imul(a + 1, 0x9e3779b1) ^ Math.imul(b + 1, 0x85ebca6b) ^ Math.imul(c + 1, 0xc2b2ae35);
  h = Math.imul(h ^ (h >>> 16), 0x7feb352d);
  h = Math.imul(h ^ (h >>> 15), 0x846ca68b);
  return (h ^ (h >>> 16)) >>> 0;
}
