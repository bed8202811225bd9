import { type BoxTree, buildBoxTree } from '../structures/boxTree.js';
import { type PairCost, pairCostOf } from './cost.js';
import type { MatchingProblem } from './problem.js';

/**
 * The problem with its vertices in working order: placed vertices along a k-d order of their places,
 * vertices on one place next to one another, special vertices last.
 */
export interface Layout {
  readonly problem: MatchingProblem;
  readonly n: number;
  readonly placed: number;
  /** Working vertex → the problem's vertex. */
  readonly original: Int32Array;
  /** The tree over the distinct places, by position. */
  readonly tree: BoxTree;
  /** The place at position i of the tree holds the vertices first[i] … first[i + 1] − 1. */
  readonly first: Int32Array;
  /** Position of each placed vertex's place. */
  readonly place: Int32Array;
}

export function layOut(problem: MatchingProblem): Layout {
  const { n, special } = problem;
  const placed = n - special;
  const { representative, nextOnPlace } = groupByPlace(problem, placed);
  const places = representative.length;
  const tree = buildBoxTree(pick(problem.x, representative), pick(problem.y, representative));
  const original = new Int32Array(n);
  const first = new Int32Array(places + 1);
  const place = new Int32Array(placed);
  let at = 0;
  for (let i = 0; i < places; i++) {
    first[i] = at;
    for (let v = representative[tree.order[i]]; v >= 0; v = nextOnPlace[v]) {
      place[at] = i;
      original[at++] = v;
    }
  }
  first[places] = at;
  for (; at < n; at++) original[at] = at;
  return { problem, n, placed, original, tree, first, place };
}

function pick(column: Float64Array, vertices: Int32Array): Float64Array {
  const picked = new Float64Array(vertices.length);
  for (let i = 0; i < vertices.length; i++) picked[i] = column[vertices[i]];
  return picked;
}

/** The first vertex on each place, and for each vertex the next one on its place or −1. Expected linear time. */
function groupByPlace(
  problem: MatchingProblem,
  placed: number,
): { representative: Int32Array; nextOnPlace: Int32Array } {
  let capacity = 16;
  while (capacity < 2 * placed) capacity *= 2;
  const slots = new Int32Array(capacity).fill(-1);
  const representative = new Int32Array(placed);
  const nextOnPlace = new Int32Array(placed).fill(-1);
  const lastOnPlace = new Int32Array(placed);
  const bits = new Float64Array(2);
  const words = new Int32Array(bits.buffer);
  let places = 0;
  for (let v = 0; v < placed; v++) {
    // Adding 0 turns −0 into 0: one place, one pattern of bits.
    bits[0] = problem.x[v] + 0;
    bits[1] = problem.y[v] + 0;
    let hash = 0;
    for (let i = 0; i < 4; i++) {
      hash = Math.imul(hash ^ words[i], 0x85ebca6b);
      hash ^= hash >>> 15;
    }
    let slot = hash & (capacity - 1);
    for (;;) {
      const other = slots[slot];
      if (other < 0) {
        slots[slot] = v;
        lastOnPlace[v] = v;
        representative[places++] = v;
        break;
      }
      if (problem.x[other] === problem.x[v] && problem.y[other] === problem.y[v]) {
        nextOnPlace[lastOnPlace[other]] = v;
        lastOnPlace[other] = v;
        break;
      }
      slot = (slot + 1) & (capacity - 1);
    }
  }
  return { representative: representative.slice(0, places), nextOnPlace };
}

/** Integer costs of working vertices: even, so that half a slack between two grown sets stays whole. */
export class IntegerCosts {
  private readonly layout: Layout;
  readonly scale: number;
  /** Places of the working vertices. */
  readonly px: Float64Array;
  readonly py: Float64Array;
  private readonly pairCost: PairCost;

  constructor(layout: Layout, scale: number) {
    this.layout = layout;
    this.scale = scale;
    this.pairCost = pairCostOf(layout.problem);
    const { original, placed, problem } = layout;
    const alone = layout.tree.x.length === placed;
    this.px = alone ? layout.tree.x : pick(problem.x, original.subarray(0, placed));
    this.py = alone ? layout.tree.y : pick(problem.y, original.subarray(0, placed));
  }

  /** c(u, v) = 2·floor(scale·cost); of placed vertices without regard to other ways. */
  between(u: number, v: number): number {
    const { layout, px, py, scale } = this;
    if (u >= layout.placed || v >= layout.placed) {
      return 2 * Math.floor(scale * this.pairCost(layout.original[u], layout.original[v]));
    }
    const dx = px[u] - px[v];
    const dy = py[u] - py[v];
    return 2 * Math.floor(scale * layout.problem.weigh(Math.sqrt(dx * dx + dy * dy)));
  }

  /** Fills in the costs of edges whose ends are known, all at once: in one loop a tenth of a call for each. */
  fill(edges: { from: Int32Array; to: Int32Array; cost: Float64Array; count: number }): void {
    const { layout, px, py, scale } = this;
    const { placed, problem } = layout;
    const { from, to, cost, count } = edges;
    for (let i = 0; i < count; i++) {
      const u = from[i];
      const v = to[i];
      if (u >= placed || v >= placed) cost[i] = this.between(u, v);
      else {
        const dx = px[u] - px[v];
        const dy = py[u] - py[v];
        cost[i] = 2 * Math.floor(scale * problem.weigh(Math.sqrt(dx * dx + dy * dy)));
      }
    }
  }
}
