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
  const order = kdOrder(x, y);
  const levels = [Math.ceil(n / LEAF)];
  while (levels[levels.length - 1] > 1) levels.push(Math.ceil(levels[levels.length - 1] / 2));
  const nodes = n === 0 ? 0 : levels.reduce((sum, count) => sum + count, 0);
  const tree: BoxTree = {
    order,
    x: Float64Array.from(order, (i) => x[i]),
    y: Float64Array.from(order, (i) => y[i]),
    leaves: levels[0],
    root: nodes - 1,
    left: new Int32Array(nodes).fill(-1),
    right: new Int32Array(nodes).fill(-1),
    minX: new Float64Array(nodes).fill(Number.POSITIVE_INFINITY),
    minY: new Float64Array(nodes).fill(Number.POSITIVE_INFINITY),
    maxX: new Float64Array(nodes).fill(Number.NEGATIVE_INFINITY),
    maxY: new Float64Array(nodes).fill(Number.NEGATIVE_INFINITY),
  };
  for (let i = 0; i < n; i++) widen(tree, Math.floor(i / LEAF), tree.x[i], tree.y[i], tree.x[i], tree.y[i]);
  let below = 0;
  for (let level = 1; level < levels.length; level++) {
    const start = below + levels[level - 1];
    for (let i = 0; i < levels[level]; i++) {
      const node = start + i;
      for (let child = below + 2 * i; child < Math.min(below + 2 * i + 2, start); child++) {
        if (tree.left[node] < 0) tree.left[node] = child;
        else tree.right[node] = child;
        widen(tree, node, tree.minX[child], tree.minY[child], tree.maxX[child], tree.maxY[child]);
      }
    }
    below = start;
  }
  return tree;
}

/** The distance of two nodes' boxes, at most the distance of any two of their points as computed. */
export function boxDistance(tree: BoxTree, a: number, b: number): number {
  const dx = Math.max(0, tree.minX[b] - tree.maxX[a], tree.minX[a] - tree.maxX[b]);
  const dy = Math.max(0, tree.minY[b] - tree.maxY[a], tree.minY[a] - tree.maxY[b]);
  return Math.sqrt(dx * dx + dy * dy);
}

function widen(tree: BoxTree, node: number, x0: number, y0: number, x1: number, y1: number): void {
  if (x0 < tree.minX[node]) tree.minX[node] = x0;
  if (y0 < tree.minY[node]) tree.minY[node] = y0;
  if (x1 > tree.maxX[node]) tree.maxX[node] = x1;
  if (y1 > tree.maxY[node]) tree.maxY[node] = y1;
}

function kdOrder(x: ArrayLike<number>, y: ArrayLike<number>): Int32Array {
  const n = x.length;
  const order = new Int32Array(n);
  for (let i = 0; i < n; i++) order[i] = i;
  const stack = [0, n];
  while (stack.length > 0) {
    const end = stack.pop() as number;
    const start = stack.pop() as number;
    if (end - start <= LEAF) continue;
    let block = LEAF;
    while (2 * block < end - start) block *= 2;
    select(order, widerAxis(order, x, y, start, end), start + block, start, end - 1);
    stack.push(start, start + block, start + block, end);
  }
  return order;
}

function widerAxis(
  order: Int32Array,
  x: ArrayLike<number>,
  y: ArrayLike<number>,
  start: number,
  end: number,
): ArrayLike<number> {
  let x0 = x[order[start]];
  let x1 = x0;
  let y0 = y[order[start]];
  let y1 = y0;
  for (let i = start + 1; i < end; i++) {
    const px = x[order[i]];
    const py = y[order[i]];
    if (px < x0) x0 = px;
    else if (px > x1) x1 = px;
    if (py < y0) y0 = py;
    else if (py > y1) y1 = py;
  }
  return x1 - x0 >= y1 - y0 ? x : y;
}

/** Quickselect (Hoare 1961), the pivot the middle of three places drawn by a congruential generator. */
function select(ids: Int32Array, key: ArrayLike<number>, k: number, from: number, to: number): void {
  let low = from;
  let high = to;
  let draw = 1;
  while (low < high) {
    draw = (Math.imul(draw, 1664525) + 1013904223) | 0;
    const span = high - low + 1;
    const a = key[ids[low + ((draw >>> 8) % span)]];
    const b = key[ids[low + ((draw >>> 4) % span)]];
    const c = key[ids[(low + high) >> 1]];
    const pivot = Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
    let i = low;
    let j = high;
    while (i <= j) {
      while (key[ids[i]] < pivot) i++;
      while (key[ids[j]] > pivot) j--;
      if (i <= j) {
        const swap = ids[i];
        ids[i] = ids[j];
        ids[j] = swap;
        i++;
        j--;
      }
    }
    if (k <= j) high = j;
    else if (k >= i) low = i;
    else return;
  }
}
