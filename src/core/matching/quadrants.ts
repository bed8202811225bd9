import { type BoxTree, LEAF } from '../structures/boxTree.js';

/** Nearest in all directions alone starve between clusters: this many are looked for in each quadrant. */
const PER_QUADRANT = 2;
/** Neighbours a position may have. */
export const QUADRANT_NEIGHBOURS = 4 * PER_QUADRANT;

/**
 * For every position of the tree the two nearest others in each quadrant, as `QUADRANT_NEIGHBOURS` positions,
 * −1 where a quadrant holds fewer. Quadrants are half-open, so that each other place lies in exactly one; of
 * places at equal distance any may be left out, always the same. Places must be distinct.
 *
 * A leaf's points look round together: nodes near first, up from the leaf to the root. About linear.
 */
export function nearInQuadrants(tree: BoxTree): Int32Array {
  const near = new Int32Array(QUADRANT_NEIGHBOURS * tree.x.length).fill(-1);
  const parent = parentsOf(tree);
  const search = new LeafSearch(tree, near);
  for (let leaf = 0; leaf < tree.leaves; leaf++) {
    search.begin(leaf);
    for (let node = leaf; node !== tree.root; node = parent[node]) {
      const { left, right } = tree;
      const up = parent[node];
      const other = left[up] === node ? right[up] : left[up];
      if (other >= 0) search.lookUnder(other);
    }
  }
  return near;
}

function parentsOf(tree: BoxTree): Int32Array {
  const parent = new Int32Array(tree.root + 1).fill(-1);
  for (let node = tree.leaves; node <= tree.root; node++) {
    parent[tree.left[node]] = node;
    if (tree.right[node] >= 0) parent[tree.right[node]] = node;
  }
  return parent;
}

class LeafSearch {
  private readonly stack = new Int32Array(256);
  /** Squared distances found, nearest first, by point of the leaf and quadrant; side by side with `near`. */
  private readonly squared = new Float64Array(LEAF * QUADRANT_NEIGHBOURS);
  /** By quadrant, the farthest that any point of the leaf still looks. */
  private readonly reach = new Float64Array(4);
  private leaf = 0;
  private start = 0;
  private end = 0;

  constructor(
    private readonly tree: BoxTree,
    private readonly near: Int32Array,
  ) {}

  begin(leaf: number): void {
    this.leaf = leaf;
    this.start = LEAF * leaf;
    this.end = Math.min(this.tree.x.length, this.start + LEAF);
    this.squared.fill(Number.POSITIVE_INFINITY);
    this.reach.fill(Number.POSITIVE_INFINITY);
    this.lookAt(leaf);
  }

  lookUnder(top: number): void {
    const { stack } = this;
    const { left, right, leaves } = this.tree;
    let depth = 0;
    stack[depth++] = top;
    while (depth > 0) {
      const node = stack[--depth];
      if (!this.mayHelp(node)) continue;
      if (node < leaves) {
        this.lookAt(node);
        continue;
      }
      const a = left[node];
      const b = right[node];
      const nearFirst = b < 0 || this.squaredTo(a) <= this.squaredTo(b);
      if (b >= 0) stack[depth++] = nearFirst ? b : a;
      stack[depth++] = nearFirst ? a : b;
    }
  }

  private squaredTo(node: number): number {
    const { leaf } = this;
    const { minX, minY, maxX, maxY } = this.tree;
    const dx = Math.max(0, minX[node] - maxX[leaf], minX[leaf] - maxX[node]);
    const dy = Math.max(0, minY[node] - maxY[leaf], minY[leaf] - maxY[node]);
    return dx * dx + dy * dy;
  }

  /** Whether a node can hold a point of some quadrant nearer than what is known; strict where quadrants are open. */
  private mayHelp(node: number): boolean {
    const { leaf, reach } = this;
    const { minX, minY, maxX, maxY } = this.tree;
    const right = minX[node] - maxX[leaf];
    const left = minX[leaf] - maxX[node];
    const below = minY[node] - maxY[leaf];
    const above = minY[leaf] - maxY[node];
    const dx = Math.max(0, right, left);
    const dy = Math.max(0, below, above);
    const squared = dx * dx + dy * dy;
    return (
      (squared < reach[0] && left <= 0 && above <= 0) ||
      (squared < reach[1] && right <= 0 && above < 0) ||
      (squared < reach[2] && right < 0 && below <= 0) ||
      (squared < reach[3] && left <= 0 && below < 0)
    );
  }

  private lookAt(node: number): void {
    const { squared, start, end } = this;
    const { x, y, minX, minY, maxX, maxY } = this.tree;
    const x0 = minX[node];
    const y0 = minY[node];
    const x1 = maxX[node];
    const y1 = maxY[node];
    let changed = false;
    for (let p = start; p < end; p++) {
      const px = x[p];
      const py = y[p];
      const row = QUADRANT_NEIGHBOURS * (p - start);
      const dx = x0 > px ? x0 - px : x1 < px ? x1 - px : 0;
      const dy = y0 > py ? y0 - py : y1 < py ? y1 - py : 0;
      const least = dx * dx + dy * dy;
      if (dx !== 0 && dy !== 0) {
        // The node lies in one quadrant of the point.
        const at = row + PER_QUADRANT * quadrantOf(dx, dy);
        if (least < squared[at + 1] && this.lookInQuadrant(p, node, at)) changed = true;
      } else if (
        (dx >= 0 && (least < squared[row + 1] || least < squared[row + 7])) ||
        (dx <= 0 && (least < squared[row + 3] || least < squared[row + 5]))
      ) {
        if (this.lookAround(p, node, row)) changed = true;
      }
    }
    if (changed) this.measureReach();
  }

  private lookInQuadrant(p: number, node: number, at: number): boolean {
    const { squared } = this;
    const { x, y } = this.tree;
    const px = x[p];
    const py = y[p];
    const to = Math.min(x.length, LEAF * node + LEAF);
    let changed = false;
    for (let q = LEAF * node; q < to; q++) {
      const dx = x[q] - px;
      const dy = y[q] - py;
      if (dx * dx + dy * dy >= squared[at + 1]) continue;
      this.insert(at, q, dx * dx + dy * dy);
      changed = true;
    }
    return changed;
  }

  private lookAround(p: number, node: number, row: number): boolean {
    const { squared } = this;
    const { x, y } = this.tree;
    const px = x[p];
    const py = y[p];
    const to = Math.min(x.length, LEAF * node + LEAF);
    let changed = false;
    for (let q = LEAF * node; q < to; q++) {
      const dx = x[q] - px;
      const dy = y[q] - py;
      const at = row + PER_QUADRANT * quadrantOf(dx, dy);
      if (dx * dx + dy * dy >= squared[at + 1] || q === p) continue;
      this.insert(at, q, dx * dx + dy * dy);
      changed = true;
    }
    return changed;
  }

  private insert(at: number, q: number, distance: number): void {
    const { near, squared } = this;
    const place = at + QUADRANT_NEIGHBOURS * this.start;
    if (distance < squared[at]) {
      squared[at + 1] = squared[at];
      near[place + 1] = near[place];
      squared[at] = distance;
      near[place] = q;
    } else {
      squared[at + 1] = distance;
      near[place + 1] = q;
    }
  }

  private measureReach(): void {
    const { squared, reach } = this;
    const rows = QUADRANT_NEIGHBOURS * (this.end - this.start);
    for (let quadrant = 0; quadrant < 4; quadrant++) {
      let most = 0;
      for (let i = PER_QUADRANT * quadrant + 1; i < rows; i += QUADRANT_NEIGHBOURS) {
        if (squared[i] > most) most = squared[i];
      }
      reach[quadrant] = most;
    }
  }
}

function quadrantOf(dx: number, dy: number): number {
  if (dy > 0) return dx > 0 ? 0 : 1;
  if (dy < 0) return dx < 0 ? 2 : 3;
  return dx >= 0 ? 0 : 2;
}
