import { boxDistance, LEAF } from '../structures/boxTree.js';
import { type Ancestry, commonBlossom } from './ancestry.js';
import type { Forest } from './forest.js';
import type { EdgeList } from './graph.js';
import type { IntegerCosts, Layout } from './layout.js';

/** At most this many new edges at a vertex in one round: the repair of a few mends many. */
const PER_VERTEX = 3;
/** The same for a pair of crowded places, whose copies stand for one another, and for a special vertex. */
const PER_PLACES = 30;
const PER_SPECIAL = 50;

/** What a group of vertices (a place, a box) has in common, to judge pairs of groups. */
interface Summary {
  readonly highest: Float64Array;
  readonly blossom: Int32Array;
}

/**
 * Adds to `edges` pairs of the complete graph with negative slack, and says how many; 0 proves that there are
 * none. Pairs of boxes are passed over where even the nearest and highest of their vertices have slack; special
 * vertices are priced one by one.
 */
export function priceAllPairs(
  f: Forest,
  layout: Layout,
  costs: IntegerCosts,
  nests: Ancestry,
  edges: EdgeList,
): number {
  const before = edges.count;
  const value = new Float64Array(f.n);
  for (let v = 0; v < f.n; v++) value[v] = f.pi[v] + f.off[f.set[v]];
  const pricer = new Pricer(layout, costs, nests, value, edges);
  if (layout.tree.root >= 0) pricer.walkBoxes();
  for (let s = layout.placed; s < f.n; s++) pricer.special(s);
  return edges.count - before;
}

class Pricer {
  private readonly places: Summary;
  private readonly boxes: Summary;
  private readonly added: Uint8Array;

  constructor(
    private readonly layout: Layout,
    private readonly costs: IntegerCosts,
    private readonly nests: Ancestry,
    private readonly value: Float64Array,
    private readonly edges: EdgeList,
  ) {
    this.added = new Uint8Array(layout.n);
    this.places = placeSummary(layout, nests, value);
    this.boxes = boxSummary(layout, nests, this.places);
  }

  walkBoxes(): void {
    const { tree } = this.layout;
    const { highest, blossom } = this.boxes;
    const { nests, costs } = this;
    const { zSum } = nests;
    const stack = [tree.root, tree.root];
    while (stack.length > 0) {
      const b = stack.pop() as number;
      const a = stack.pop() as number;
      const common = commonBlossom(nests, blossom[a], blossom[b]);
      const shared = common < 0 ? 0 : zSum[common];
      if (costs.atLeast(boxDistance(tree, a, b)) + shared >= highest[a] + highest[b]) continue;
      if (a < tree.leaves && b < tree.leaves) {
        this.leafPair(a, b, shared);
      } else if (a === b) {
        const left = tree.left[a];
        const right = tree.right[a];
        stack.push(left, left);
        if (right >= 0) stack.push(left, right, right, right);
      } else {
        // The higher node is the later one: split it.
        const high = Math.max(a, b);
        const low = Math.min(a, b);
        stack.push(tree.left[high], low);
        if (tree.right[high] >= 0) stack.push(tree.right[high], low);
      }
    }
  }

  private leafPair(a: number, b: number, shared: number): void {
    const { tree, first } = this.layout;
    const { highest } = this.places;
    const endA = Math.min(tree.x.length, LEAF * a + LEAF);
    const endB = Math.min(tree.x.length, LEAF * b + LEAF);
    for (let p = LEAF * a; p < endA; p++) {
      for (let q = a === b ? p : LEAF * b; q < endB; q++) {
        const cost = this.costs.between(first[p], first[q]);
        if (cost + shared < highest[p] + highest[q]) this.placePair(p, q, cost);
      }
    }
  }

  private placePair(p: number, q: number, cost: number): void {
    const { first } = this.layout;
    const { highest, blossom } = this.places;
    const { nests, value, added } = this;
    const common = commonBlossom(nests, blossom[p], blossom[q]);
    const shared = common < 0 ? 0 : nests.zSum[common];
    if (cost + shared >= highest[p] + highest[q]) return;
    let left = PER_PLACES;
    for (let u = first[p]; u < first[p + 1] && left > 0; u++) {
      if (cost + shared >= value[u] + highest[q]) continue;
      for (let v = p === q ? u + 1 : first[q]; v < first[q + 1] && left > 0; v++) {
        if (added[u] >= PER_VERTEX) break;
        if (added[v] < PER_VERTEX && cost + shared < value[u] + value[v] && this.offer(u, v, cost)) left--;
      }
    }
  }

  /** The worst pairs first: where one dual is too high everywhere, mending the worst mends all. */
  special(s: number): void {
    const { value, layout, costs } = this;
    const { placed, place } = layout;
    const worst: { v: number; slack: number }[] = [];
    for (let v = 0; v < s; v++) {
      const cost = costs.between(v, s);
      if (cost >= value[v] + value[s]) continue;
      const slack = this.slack(v, s, cost);
      if (slack >= 0) continue;
      // One edge a place is enough: its copies stand for one another.
      const last = worst.length - 1;
      if (v < placed && last >= 0 && worst[last].v < placed && place[worst[last].v] === place[v]) {
        if (slack < worst[last].slack) worst[last] = { v, slack };
      } else worst.push({ v, slack });
    }
    worst.sort((a, b) => a.slack - b.slack || a.v - b.v);
    for (const { v } of worst.slice(0, PER_SPECIAL)) this.edges.add(v, s, costs.between(v, s));
  }

  private slack(u: number, v: number, cost: number): number {
    const { nests, value } = this;
    const common = commonBlossom(nests, nests.inner[u], nests.inner[v]);
    return cost + (common < 0 ? 0 : nests.zSum[common]) - value[u] - value[v];
  }

  private offer(u: number, v: number, cost: number): boolean {
    if (this.slack(u, v, cost) >= 0) return false;
    this.added[u]++;
    this.added[v]++;
    this.edges.add(u, v, cost);
    return true;
  }
}

function placeSummary(layout: Layout, nests: Ancestry, value: Float64Array): Summary {
  const { first } = layout;
  const places = first.length - 1;
  const highest = new Float64Array(places);
  const blossom = new Int32Array(places);
  for (let p = 0; p < places; p++) {
    highest[p] = value[first[p]];
    blossom[p] = nests.inner[first[p]];
    for (let v = first[p] + 1; v < first[p + 1]; v++) {
      if (value[v] > highest[p]) highest[p] = value[v];
      blossom[p] = commonBlossom(nests, blossom[p], nests.inner[v]);
    }
  }
  return { highest, blossom };
}

function boxSummary(layout: Layout, nests: Ancestry, places: Summary): Summary {
  const { tree } = layout;
  const nodes = tree.root + 1;
  const highest = new Float64Array(nodes).fill(Number.NEGATIVE_INFINITY);
  const blossom = new Int32Array(nodes);
  for (let node = 0; node < nodes; node++) {
    if (node < tree.leaves) {
      const start = LEAF * node;
      const end = Math.min(tree.x.length, start + LEAF);
      blossom[node] = places.blossom[start];
      for (let p = start; p < end; p++) {
        if (places.highest[p] > highest[node]) highest[node] = places.highest[p];
        blossom[node] = commonBlossom(nests, blossom[node], places.blossom[p]);
      }
      continue;
    }
    const left = tree.left[node];
    const right = tree.right[node];
    highest[node] = highest[left];
    blossom[node] = blossom[left];
    if (right >= 0) {
      highest[node] = Math.max(highest[left], highest[right]);
      blossom[node] = commonBlossom(nests, blossom[left], blossom[right]);
    }
  }
  return { highest, blossom };
}
