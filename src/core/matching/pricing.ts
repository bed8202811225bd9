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
/** Pairs of places put by before they are looked at one by one. */
const BATCH = 4096;
/** Steps of the walk over boxes in one go. */
const STEPS = 1024;

/** What a group of vertices (a place, a box) has in common, to judge pairs of groups. */
interface Summary {
  readonly highest: Float64Array;
  readonly blossom: Int32Array;
  readonly risen: Uint8Array;
}

/**
 * Looks for pairs of the complete graph with negative slack: `priceAllPairs` adds them to `edges`, which stays empty
 * only where there are none. Pairs of boxes are passed over where even the nearest and highest of their vertices
 * have slack; special vertices are priced one by one.
 *
 * A pair that had slack in an earlier round is looked at again only where one of its ends has risen since. While
 * both lie in one set their slack does not change: π rises or falls by t in both and z by 2t. While they lie in
 * two, it falls only where π rises in one of them, that is while that one is grown, and scanned (scan.ts).
 *
 * One pricer serves all rounds, and its loops are made of small steps: code once compiled then stays so.
 */
export class Pricer {
  private readonly n: number;
  private readonly value: Float64Array;
  private readonly risen: Uint8Array;
  private readonly places: Summary;
  private readonly boxes: Summary;
  private readonly added: Uint8Array;
  private readonly stack: number[] = [];
  /** Pairs of places that may hold a violating pair: p0 q0 p1 q1 … */
  private readonly pending = new Int32Array(2 * BATCH);
  private count = 0;

  constructor(
    private readonly f: Forest,
    private readonly layout: Layout,
    private readonly costs: IntegerCosts,
    private readonly nests: Ancestry,
    private readonly edges: EdgeList,
  ) {
    this.n = layout.n;
    this.value = new Float64Array(layout.n);
    this.risen = new Uint8Array(layout.n);
    this.added = new Uint8Array(layout.n);
    const places = layout.tree.x.length;
    this.places =
      places === layout.placed
        ? { highest: this.value, blossom: nests.inner, risen: this.risen }
        : roomForSummary(places);
    this.boxes = roomForSummary(layout.tree.root + 1);
  }

  /** Expects the nests as they are now. */
  priceAllPairs(): void {
    const { f, layout } = this;
    this.readValues();
    this.risen.set(f.risen);
    // What stays behind for the next round is marked again on the way.
    f.risen.fill(0);
    this.added.fill(0);
    this.summarise();
    this.stack.length = 0;
    if (layout.tree.root >= 0) this.stack.push(layout.tree.root, layout.tree.root);
    while (this.stack.length > 0) {
      this.walkOn();
      this.settle(f.risen);
    }
    for (let s = layout.placed; s < this.n; s++) this.special(s);
  }

  private readValues(): void {
    const { value } = this;
    const { pi, off, set } = this.f;
    for (let v = 0; v < value.length; v++) value[v] = pi[v] + off[set[v]];
  }

  private summarise(): void {
    const { tree } = this.layout;
    if (this.places.highest !== this.value) {
      for (let p = 0; p < tree.x.length; p++) this.summarisePlace(p);
    }
    for (let node = 0; node <= tree.root; node++) this.summariseBox(node);
  }

  /** Some steps of the walk; fewer where many pairs of places have been put by. */
  private walkOn(): void {
    const { stack } = this;
    for (let steps = STEPS; steps > 0 && stack.length > 0 && this.count <= BATCH - LEAF * LEAF; steps--) {
      const b = stack.pop() as number;
      const a = stack.pop() as number;
      this.boxPair(a, b);
    }
  }

  private summarisePlace(p: number): void {
    const { first } = this.layout;
    const vertices = { highest: this.value, blossom: this.nests.inner, risen: this.risen };
    take(this.places, p, vertices, first[p]);
    for (let v = first[p] + 1; v < first[p + 1]; v++) join(this.nests, this.places, p, vertices, v);
  }

  private summariseBox(node: number): void {
    const { tree } = this.layout;
    const { nests, boxes, places } = this;
    if (node >= tree.leaves) {
      take(boxes, node, boxes, tree.left[node]);
      if (tree.right[node] >= 0) join(nests, boxes, node, boxes, tree.right[node]);
      return;
    }
    const start = LEAF * node;
    const end = Math.min(tree.x.length, start + LEAF);
    take(boxes, node, places, start);
    for (let p = start + 1; p < end; p++) join(nests, boxes, node, places, p);
  }

  private boxPair(a: number, b: number): void {
    const { stack, nests } = this;
    const { tree, problem } = this.layout;
    const { highest, blossom, risen } = this.boxes;
    if (risen[a] === 0 && risen[b] === 0) return;
    const most = highest[a] + highest[b];
    const least = 2 * Math.floor(this.costs.scale * problem.weigh(boxDistance(tree, a, b)));
    if (least >= most) return;
    const common = commonBlossom(nests, blossom[a], blossom[b]);
    const shared = common < 0 ? 0 : nests.zSum[common];
    if (least + shared >= most) return;
    const { left, right, leaves } = tree;
    if (a < leaves && b < leaves) {
      this.leafPair(a, b, shared);
    } else if (a === b) {
      stack.push(left[a], left[a]);
      if (right[a] >= 0) stack.push(left[a], right[a], right[a], right[a]);
    } else {
      // The higher node is the later one: split it.
      const high = Math.max(a, b);
      const low = Math.min(a, b);
      stack.push(left[high], low);
      if (right[high] >= 0) stack.push(right[high], low);
    }
  }

  private leafPair(a: number, b: number, shared: number): void {
    const { tree, problem } = this.layout;
    const { x, y } = tree;
    const { highest, risen } = this.places;
    const { pending } = this;
    const { scale } = this.costs;
    const endA = Math.min(x.length, LEAF * a + LEAF);
    const endB = Math.min(x.length, LEAF * b + LEAF);
    let count = this.count;
    for (let p = LEAF * a; p < endA; p++) {
      for (let q = a === b ? p : LEAF * b; q < endB; q++) {
        const dx = x[p] - x[q];
        const dy = y[p] - y[q];
        const cost = 2 * Math.floor(scale * problem.weigh(Math.sqrt(dx * dx + dy * dy)));
        if (cost + shared >= highest[p] + highest[q] || (risen[p] === 0 && risen[q] === 0)) continue;
        pending[2 * count] = p;
        pending[2 * count + 1] = q;
        count++;
      }
    }
    this.count = count;
  }

  /** Marks in `behind` the vertices that may have more such pairs than this round takes. */
  private settle(behind: Uint8Array): void {
    const { pending } = this;
    const { first } = this.layout;
    for (let i = 0; i < this.count; i++) {
      const p = pending[2 * i];
      const q = pending[2 * i + 1];
      if (this.placePair(p, q)) continue;
      for (let v = first[p]; v < first[p + 1]; v++) behind[v] = 1;
      for (let v = first[q]; v < first[q + 1]; v++) behind[v] = 1;
    }
    this.count = 0;
  }

  /** Adds violating pairs of two places; false where there may be more than it was free to add. */
  private placePair(p: number, q: number): boolean {
    const { highest, blossom } = this.places;
    const { nests } = this;
    const { first } = this.layout;
    const common = commonBlossom(nests, blossom[p], blossom[q]);
    const cost = this.costs.between(first[p], first[q]);
    const least = cost + (common < 0 ? 0 : nests.zSum[common]);
    return least >= highest[p] + highest[q] || this.addFrom(p, q, cost, least);
  }

  private addFrom(p: number, q: number, cost: number, least: number): boolean {
    const { first } = this.layout;
    const { highest } = this.places;
    const { value, added } = this;
    let left = PER_PLACES;
    let all = true;
    for (let u = first[p]; u < first[p + 1]; u++) {
      if (least >= value[u] + highest[q]) continue;
      for (let v = p === q ? u + 1 : first[q]; v < first[q + 1]; v++) {
        if (least >= value[u] + value[v]) continue;
        if (left === 0) return false;
        if (added[u] >= PER_VERTEX || added[v] >= PER_VERTEX) all = false;
        else if (this.offer(u, v, cost)) left--;
        if (added[u] >= PER_VERTEX && v + 1 < first[q + 1]) {
          all = false;
          break;
        }
      }
    }
    return all;
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

function roomForSummary(groups: number): Summary {
  return {
    highest: new Float64Array(groups),
    blossom: new Int32Array(groups),
    risen: new Uint8Array(groups),
  };
}

function take(into: Summary, i: number, from: Summary, j: number): void {
  into.highest[i] = from.highest[j];
  into.blossom[i] = from.blossom[j];
  into.risen[i] = from.risen[j];
}

function join(nests: Ancestry, into: Summary, i: number, from: Summary, j: number): void {
  if (from.highest[j] > into.highest[i]) into.highest[i] = from.highest[j];
  into.blossom[i] = commonBlossom(nests, into.blossom[i], from.blossom[j]);
  into.risen[i] |= from.risen[j];
}
