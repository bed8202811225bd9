import { type BoxTree, LEAF } from './boxTree.js';

const QUADRANTS = 4;

/** Nearest points in a box tree; holds its own scratch space, so one searcher serves one loop. */
export class NearestSearch {
  private readonly tree: BoxTree;
  private readonly count: number;
  private readonly quadrants: number;
  private readonly stack = new Int32Array(256);
  private readonly distance: Float64Array;
  private readonly found: Int32Array;

  /** `count` nearest in each of `quadrants` sectors: 4 by the axes, or 1 for the plain nearest. */
  constructor(tree: BoxTree, count: number, quadrants: 1 | 4) {
    this.tree = tree;
    this.count = count;
    this.quadrants = quadrants;
    this.distance = new Float64Array(count * quadrants);
    this.found = new Int32Array(count * quadrants);
  }

  /**
   * Positions of the points nearest to (x, y), the position `skip` left out; within a sector nearest
   * first, equal distances in no set order; −1 where a sector holds fewer. A view that the next call
   * overwrites. A sector is half-open, so that each other point lies in exactly one; a point at (x, y)
   * itself counts in the first.
   */
  around(x: number, y: number, skip: number): Int32Array {
    const { tree, distance, found, stack, count, quadrants } = this;
    distance.fill(Number.POSITIVE_INFINITY);
    found.fill(-1);
    let depth = 0;
    if (tree.root >= 0) stack[depth++] = tree.root;
    while (depth > 0) {
      const node = stack[--depth];
      if (!this.mayHelp(node, x, y)) continue;
      if (node >= tree.leaves) {
        const left = tree.left[node];
        const right = tree.right[node];
        if (right < 0) stack[depth++] = left;
        else {
          const leftNearer = squaredToBox(tree, left, x, y) <= squaredToBox(tree, right, x, y);
          stack[depth++] = leftNearer ? right : left;
          stack[depth++] = leftNearer ? left : right;
        }
        continue;
      }
      const end = Math.min(tree.x.length, LEAF * node + LEAF);
      for (let i = LEAF * node; i < end; i++) {
        if (i === skip) continue;
        const dx = tree.x[i] - x;
        const dy = tree.y[i] - y;
        const squared = dx * dx + dy * dy;
        const first = quadrants === QUADRANTS ? quadrantOf(dx, dy) * count : 0;
        let place = first + count - 1;
        if (squared >= distance[place]) continue;
        while (place > first && distance[place - 1] > squared) {
          distance[place] = distance[place - 1];
          found[place] = found[place - 1];
          place--;
        }
        distance[place] = squared;
        found[place] = i;
      }
    }
    return found;
  }

  private mayHelp(node: number, x: number, y: number): boolean {
    const { tree, distance, count } = this;
    const squared = squaredToBox(tree, node, x, y);
    const last = count - 1;
    if (this.quadrants !== QUADRANTS) return squared < distance[last];
    // Strict where the sector is open: on a level line the empty sectors must not search it all.
    const { minX, minY, maxX, maxY } = tree;
    return (
      (maxX[node] >= x && maxY[node] >= y && squared < distance[last]) ||
      (minX[node] <= x && maxY[node] > y && squared < distance[count + last]) ||
      (minX[node] < x && minY[node] <= y && squared < distance[2 * count + last]) ||
      (maxX[node] >= x && minY[node] < y && squared < distance[3 * count + last])
    );
  }
}

function quadrantOf(dx: number, dy: number): number {
  if (dy > 0) return dx > 0 ? 0 : 1;
  if (dy < 0) return dx < 0 ? 2 : 3;
  return dx >= 0 ? 0 : 2;
}

function squaredToBox(tree: BoxTree, node: number, x: number, y: number): number {
  const dx = Math.max(0, tree.minX[node] - x, x - tree.maxX[node]);
  const dy = Math.max(0, tree.minY[node] - y, y - tree.maxY[node]);
  return dx * dx + dy * dy;
}
