import { type BoxTree, buildBoxTree, LEAF } from '../structures/boxTree.js';
import type { MatchingProblem } from './problem.js';

/** The placed vertices not yet matched, in a box tree that knows the lowest index under every node. */
export class FreePoints {
  private readonly tree: BoxTree;
  private readonly weigh: (distance: number) => number;
  /** By position: the vertex, or `none` once it is gone. */
  private readonly free: Int32Array;
  private readonly position: Int32Array;
  private readonly lowest: Int32Array;
  private readonly parent: Int32Array;
  private readonly none: number;
  private readonly stack = new Int32Array(256);
  /** Cost of the pair that `nearest` found last. */
  cost = 0;

  constructor(problem: MatchingProblem) {
    const placed = problem.n - problem.special;
    const tree = buildBoxTree(problem.x.subarray(0, placed), problem.y.subarray(0, placed));
    this.tree = tree;
    this.weigh = (distance) => problem.weigh(distance);
    this.none = placed;
    this.free = tree.order.slice();
    this.position = new Int32Array(placed);
    for (let i = 0; i < placed; i++) this.position[tree.order[i]] = i;
    this.lowest = new Int32Array(tree.root + 1);
    this.parent = new Int32Array(tree.root + 1).fill(-1);
    for (let node = 0; node <= tree.root; node++) {
      this.lowest[node] = this.lowestUnder(node);
      if (node < tree.leaves) continue;
      this.parent[tree.left[node]] = node;
      if (tree.right[node] >= 0) this.parent[tree.right[node]] = node;
    }
  }

  remove(vertex: number): void {
    const at = this.position[vertex];
    this.free[at] = this.none;
    for (let node = Math.floor(at / LEAF); node >= 0; node = this.parent[node]) {
      const lowest = this.lowestUnder(node);
      if (lowest === this.lowest[node]) return;
      this.lowest[node] = lowest;
    }
  }

  /** The free vertex other than `vertex` with the cheapest pair, of equal ones the lowest; −1 where there is none. */
  nearest(vertex: number): number {
    const { tree, free, lowest, stack, none } = this;
    const at = this.position[vertex];
    const x = tree.x[at];
    const y = tree.y[at];
    let best = none;
    let bestCost = Number.POSITIVE_INFINITY;
    let depth = 0;
    stack[depth++] = tree.root;
    while (depth > 0) {
      const node = stack[--depth];
      if (lowest[node] === none) continue;
      const bound = this.weigh(distanceTo(tree, node, x, y));
      if (bound > bestCost || (bound === bestCost && lowest[node] >= best)) continue;
      if (node >= tree.leaves) {
        const left = tree.left[node];
        const right = tree.right[node];
        if (right < 0) stack[depth++] = left;
        else {
          const gap = distanceTo(tree, left, x, y) - distanceTo(tree, right, x, y);
          const leftFirst = gap < 0 || (gap === 0 && lowest[left] < lowest[right]);
          stack[depth++] = leftFirst ? right : left;
          stack[depth++] = leftFirst ? left : right;
        }
        continue;
      }
      const end = Math.min(free.length, LEAF * node + LEAF);
      for (let i = LEAF * node; i < end; i++) {
        const other = free[i];
        if (other === none || other === vertex) continue;
        const dx = tree.x[i] - x;
        const dy = tree.y[i] - y;
        const cost = this.weigh(Math.sqrt(dx * dx + dy * dy));
        if (cost < bestCost || (cost === bestCost && other < best)) {
          bestCost = cost;
          best = other;
        }
      }
    }
    this.cost = bestCost;
    return best === none ? -1 : best;
  }

  private lowestUnder(node: number): number {
    const { tree, free, lowest } = this;
    if (node >= tree.leaves) {
      const right = tree.right[node];
      return right < 0 ? lowest[tree.left[node]] : Math.min(lowest[tree.left[node]], lowest[right]);
    }
    let least = this.none;
    const end = Math.min(free.length, LEAF * node + LEAF);
    for (let i = LEAF * node; i < end; i++) if (free[i] < least) least = free[i];
    return least;
  }
}

function distanceTo(tree: BoxTree, node: number, x: number, y: number): number {
  const dx = Math.max(0, tree.minX[node] - x, x - tree.maxX[node]);
  const dy = Math.max(0, tree.minY[node] - y, y - tree.maxY[node]);
  return Math.sqrt(dx * dx + dy * dy);
}
