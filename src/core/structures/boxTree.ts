/** How many points a leaf holds. */
export const LEAF = 8;

/**
 * A k-d tree (Bentley 1975) kept as an order of the points and a box for every node: leaf i holds the
 * positions 8i … 8i + 7, and every split falls on a multiple of 8·2^j, so the nodes of a level are
 * blocks of equal length. Points near one another come near one another in the order.
 */
export interface BoxTree {
  /** Which point stands at each position. */
  readonly order: Int32Array;
  /** The points' coordinates in that order. */
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly leaves: number;
  /** The last node; −1 without points. Nodes below `leaves` are leaves. */
  readonly root: number;
  /** Children of a node that is no leaf; right is −1 where there is only one. */
  readonly left: Int32Array;
  readonly right: Int32Array;
  readonly minX: Float64Array;
  readonly minY: Float64Array;
  readonly maxX: Float64Array;
  readonly maxY: Float64Array;
}

/** Builds the tree over finite coordinates. Time n·log n; no recursion. */
export function buildBoxTree(x: ArrayLike<number>, y: ArrayLike<number>): BoxTree {
  const n = x.length;
  const sorter = new KdSorter(x, y);
  sorter.sort();
  const levels = [Math.ceil(n / LEAF)];
  while (levels[levels.length - 1] > 1) levels.push(Math.ceil(levels[levels.length - 1] / 2));
  const nodes = n === 0 ? 0 : levels.reduce((sum, count) => sum + count, 0);
  const tree: BoxTree = {
    order: sorter.order,
    x: sorter.x,
    y: sorter.y,
    leaves: levels[0],
    root: nodes - 1,
    left: new Int32Array(nodes).fill(-1),
    right: new Int32Array(nodes).fill(-1),
    minX: new Float64Array(nodes).fill(Number.POSITIVE_INFINITY),
    minY: new Float64Array(nodes).fill(Number.POSITIVE_INFINITY),
    maxX: new Float64Array(nodes).fill(Number.NEGATIVE_INFINITY),
    maxY: new Float64Array(nodes).fill(Number.NEGATIVE_INFINITY),
  };
  boxLeaves(tree);
  let below = 0;
  for (let level = 1; level < levels.length; level++) {
    const start = below + levels[level - 1];
    joinChildren(tree, below, start, levels[level]);
    below = start;
  }
  return tree;
}

function boxLeaves(tree: BoxTree): void {
  const { x, y, minX, minY, maxX, maxY } = tree;
  for (let i = 0; i < x.length; i++) {
    const leaf = (i / LEAF) | 0;
    if (x[i] < minX[leaf]) minX[leaf] = x[i];
    if (y[i] < minY[leaf]) minY[leaf] = y[i];
    if (x[i] > maxX[leaf]) maxX[leaf] = x[i];
    if (y[i] > maxY[leaf]) maxY[leaf] = y[i];
  }
}

/** Makes the nodes of one level, from `start` on, over those of the level below. */
function joinChildren(tree: BoxTree, below: number, start: number, count: number): void {
  const { left, right, minX, minY, maxX, maxY } = tree;
  for (let i = 0; i < count; i++) {
    const node = start + i;
    const a = below + 2 * i;
    const b = a + 1 < start ? a + 1 : a;
    left[node] = a;
    if (b > a) right[node] = b;
    minX[node] = Math.min(minX[a], minX[b]);
    minY[node] = Math.min(minY[a], minY[b]);
    maxX[node] = Math.max(maxX[a], maxX[b]);
    maxY[node] = Math.max(maxY[a], maxY[b]);
  }
}

/** The distance of two nodes' boxes, at most the distance of any two of their points as computed. */
export function boxDistance(tree: BoxTree, a: number, b: number): number {
  const dx = Math.max(0, tree.minX[b] - tree.maxX[a], tree.minX[a] - tree.maxX[b]);
  const dy = Math.max(0, tree.minY[b] - tree.maxY[a], tree.minY[a] - tree.maxY[b]);
  return Math.sqrt(dx * dx + dy * dy);
}

/** Puts points into k-d order; their coordinates move along, so that every look is at a neighbour. */
class KdSorter {
  readonly order: Int32Array;
  readonly x: Float64Array;
  readonly y: Float64Array;

  constructor(x: ArrayLike<number>, y: ArrayLike<number>) {
    this.x = new Float64Array(x);
    this.y = new Float64Array(y);
    this.order = new Int32Array(x.length);
    for (let i = 0; i < x.length; i++) this.order[i] = i;
  }

  sort(): void {
    const { x, y } = this;
    const stack = [0, x.length];
    while (stack.length > 0) {
      const end = stack.pop() as number;
      const start = stack.pop() as number;
      if (end - start <= LEAF) continue;
      let block = LEAF;
      while (2 * block < end - start) block *= 2;
      const wide = extent(x, start, end) >= extent(y, start, end);
      if (wide) select(this.order, x, y, start + block, start, end - 1);
      else select(this.order, y, x, start + block, start, end - 1);
      stack.push(start, start + block, start + block, end);
    }
  }
}

function extent(key: Float64Array, start: number, end: number): number {
  let least = key[start];
  let most = least;
  for (let i = start + 1; i < end; i++) {
    if (key[i] < least) least = key[i];
    else if (key[i] > most) most = key[i];
  }
  return most - least;
}

/** Quickselect (Hoare 1961), the pivot the middle of three places drawn by a congruential generator. */
function select(
  ids: Int32Array,
  key: Float64Array,
  other: Float64Array,
  k: number,
  from: number,
  to: number,
): void {
  let low = from;
  let high = to;
  let draw = 1;
  while (low < high) {
    draw = (Math.imul(draw, 1664525) + 1013904223) | 0;
    const span = high - low + 1;
    const a = key[low + ((draw >>> 8) % span)];
    const b = key[low + ((draw >>> 4) % span)];
    const c = key[(low + high) >> 1];
    const pivot = Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
    let i = low;
    let j = high;
    while (i <= j) {
      while (key[i] < pivot) i++;
      while (key[j] > pivot) j--;
      if (i <= j) {
        const id = ids[i];
        ids[i] = ids[j];
        ids[j] = id;
        const first = key[i];
        key[i] = key[j];
        key[j] = first;
        const second = other[i];
        other[i] = other[j];
        other[j] = second;
        i++;
        j--;
      }
    }
    if (k <= j) high = j;
    else if (k >= i) low = i;
    else return;
  }
}
