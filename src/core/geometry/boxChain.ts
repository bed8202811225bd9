/** Children of a node. */
const FAN = 8;

/**
 * Boxes in an order in which neighbours lie near one another, as the segments of an outline do: every
 * eight in a row have a box of their own, every eight of these, and so on. Building is O(n), a search
 * O(log n + found) where the order is good, O(n) at worst.
 */
export class BoxChain {
  /** From the single boxes up; minX, minY, maxX, maxY each. */
  private readonly levels: Float64Array[];

  constructor(boxes: Float64Array) {
    this.levels = [boxes];
    for (let level = boxes; level.length > 4 * FAN; ) {
      const next = new Float64Array(4 * Math.ceil(level.length / (4 * FAN)));
      for (let k = 0; k < next.length; k += 4) join(level, FAN * k, next, k);
      this.levels.push(next);
      level = next;
    }
  }

  /** Calls `visit` for each box that meets the given one, in order, until it returns true. */
  search(
    minX: number,
    minY: number,
    maxX: number,
    maxY: number,
    work: Work,
    visit: (item: number) => boolean,
  ): boolean {
    const top = this.levels.length - 1;
    const count = this.levels[top].length / 4;
    return this.searchRow(top, 0, count, minX, minY, maxX, maxY, work, visit);
  }

  private searchRow(
    level: number,
    from: number,
    to: number,
    minX: number,
    minY: number,
    maxX: number,
    maxY: number,
    work: Work,
    visit: (item: number) => boolean,
  ): boolean {
    const boxes = this.levels[level];
    work.left -= to - from;
    for (let k = from; k < to; k++) {
      const o = 4 * k;
      if (boxes[o] > maxX || boxes[o + 2] < minX || boxes[o + 1] > maxY || boxes[o + 3] < minY) continue;
      if (level === 0) {
        if (visit(k)) return true;
        continue;
      }
      const end = Math.min(FAN * (k + 1), this.levels[level - 1].length / 4);
      if (this.searchRow(level - 1, FAN * k, end, minX, minY, maxX, maxY, work, visit)) return true;
    }
    return false;
  }
}

/** What may still be done, in steps of about ten nanoseconds; below 0 it is time to give up. */
export interface Work {
  left: number;
}

function join(level: Float64Array, from: number, out: Float64Array, at: number): void {
  const end = Math.min(from + 4 * FAN, level.length);
  out[at] = level[from];
  out[at + 1] = level[from + 1];
  out[at + 2] = level[from + 2];
  out[at + 3] = level[from + 3];
  for (let k = from + 4; k < end; k += 4) {
    out[at] = Math.min(out[at], level[k]);
    out[at + 1] = Math.min(out[at + 1], level[k + 1]);
    out[at + 2] = Math.max(out[at + 2], level[k + 2]);
    out[at + 3] = Math.max(out[at + 3], level[k + 3]);
  }
}
