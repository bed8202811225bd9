import { PairHeap } from '../structures/heap.js';
import type { Graph } from './graph.js';

/** Places in `Forest.clock`. */
export const TIME = 0;
export const BEST = 1;

/**
 * The state of the blossom method: a laminar forest of odd sets over the vertices, their duals, the
 * matching between the outermost sets, and the one alternating tree that is being grown.
 *
 * Nodes are the vertices 0 … n − 1 and the blossoms from n on; an outermost node goes by a **set** id, and
 * every vertex knows its set, so nothing ever climbs a nest of blossoms.
 *
 * Duals (Edmonds 1965) in the form of Galil, ACM Computing Surveys 18, 1986: the slack of an edge is
 * c − π(u) − π(v) + Σ z(B) over the blossoms B that hold both ends. They are lazy: while the tree grows,
 * π(v) = pi[v] + off[set] + sign[set]·time, and an outermost blossom's z is z[B] + 2·sign[set]·time.
 */
export class Forest {
  readonly n: number;
  graph: Graph;

  /** By vertex. */
  readonly pi: Float64Array;
  readonly set: Int32Array;
  /** 1 where π may have risen, against that of vertices in other sets, since the last pricing. */
  readonly risen: Uint8Array;
  /** The vertices of a node as a chain from firstVertex to lastVertex. */
  readonly next: Int32Array;

  /** By set: its node, and +1 where grown (even distance from the root), −1 where shrinking, 0 outside the tree. */
  readonly node: Int32Array;
  readonly sign: Int8Array;
  readonly off: Float64Array;
  /** The matched edge's end in the set and its end outside; −1 where the set is exposed. */
  readonly mateIn: Int32Array;
  readonly mateOut: Int32Array;
  /** The tree edge to a shrinking set: its end in the parent and its end in the set. */
  readonly parentEnd: Int32Array;
  readonly childEnd: Int32Array;
  /** Earliest time a set outside the tree was promised to be reached, in search `reachRound`. */
  readonly reach: Float64Array;
  readonly reachRound: Int32Array;
  readonly mark: Int32Array;

  /** By node. */
  readonly z: Float64Array;
  readonly firstVertex: Int32Array;
  readonly lastVertex: Int32Array;
  readonly size: Int32Array;
  readonly firstChild: Int32Array;
  /** The next child round the odd cycle, and the tight edge to it: its end here and its end there. */
  readonly sibling: Int32Array;
  readonly linkHere: Int32Array;
  readonly linkThere: Int32Array;

  private readonly freeSets: Int32Array;
  private freeSetCount = 0;
  private readonly freeBlossoms: Int32Array;
  private freeBlossomCount: number;

  /** The search: time and the earliest augmenting edge (its end in the tree and its exposed end). */
  readonly clock = new Float64Array(2);
  bestInner = -1;
  bestOuter = -1;
  /** What is to happen when: (time, order of promising, arc or ~vertex of a blossom). First come, first served keeps trees round. */
  readonly events = new PairHeap();
  promises = 0;
  round = 0;
  marks = 0;
  labelled = 0;
  readonly touched: number[] = [];
  readonly ring: number[] = [];

  constructor(n: number, graph: Graph) {
    this.n = n;
    this.graph = graph;
    const nodes = n + (n >> 1);
    this.pi = new Float64Array(n);
    this.set = identity(n);
    this.risen = new Uint8Array(n).fill(1);
    this.next = new Int32Array(n).fill(-1);
    this.node = identity(n);
    this.sign = new Int8Array(n);
    this.off = new Float64Array(n);
    this.mateIn = new Int32Array(n).fill(-1);
    this.mateOut = new Int32Array(n).fill(-1);
    this.parentEnd = new Int32Array(n);
    this.childEnd = new Int32Array(n);
    this.reach = new Float64Array(n);
    this.reachRound = new Int32Array(n);
    this.mark = new Int32Array(n);
    this.z = new Float64Array(nodes);
    this.firstVertex = identity(nodes);
    this.lastVertex = identity(nodes);
    this.size = new Int32Array(nodes).fill(1);
    this.firstChild = new Int32Array(nodes).fill(-1);
    this.sibling = new Int32Array(nodes);
    this.linkHere = new Int32Array(nodes);
    this.linkThere = new Int32Array(nodes);
    this.freeSets = new Int32Array(n);
    this.freeBlossoms = Int32Array.from({ length: n >> 1 }, (_, i) => nodes - 1 - i);
    this.freeBlossomCount = n >> 1;
  }

  takeSet(): number {
    return this.freeSets[--this.freeSetCount];
  }

  dropSet(set: number): void {
    this.freeSets[this.freeSetCount++] = set;
  }

  takeBlossom(): number {
    return this.freeBlossoms[--this.freeBlossomCount];
  }

  dropBlossom(blossom: number): void {
    this.freeBlossoms[this.freeBlossomCount++] = blossom;
  }
}

/** Puts a set on another side of the tree (or out of it) now: its duals keep their present values. */
export function relabel(f: Forest, set: number, sign: number): void {
  const shift = (f.sign[set] - sign) * f.clock[TIME];
  f.off[set] += shift;
  if (f.node[set] >= f.n) f.z[f.node[set]] += 2 * shift;
  f.sign[set] = sign;
}

/** Joins the children of a node's cycle in pairs, all but `base`, along their tight links. */
export function pairRing(f: Forest, base: number): void {
  const { set, firstVertex, sibling, linkHere, linkThere, mateIn, mateOut } = f;
  for (let child = sibling[base]; child !== base; child = sibling[sibling[child]]) {
    const s = set[firstVertex[child]];
    const t = set[firstVertex[sibling[child]]];
    mateIn[s] = linkHere[child];
    mateOut[s] = linkThere[child];
    mateIn[t] = linkThere[child];
    mateOut[t] = linkHere[child];
  }
}

/**
 * Takes the outermost blossom of a set apart: each child gets a set of its own, on the side of the tree
 * where the blossom was and without a mate; the largest keeps the set's id, so that a vertex changes its
 * set at most log₂ n times on the way down. The cycle can be read until the next blossom is formed.
 */
export function split(f: Forest, s: number): void {
  const { set, node, off, sign, z, firstVertex, lastVertex, next, size, sibling, mateIn, mateOut } = f;
  const blossom = node[s];
  const start = f.firstChild[blossom];
  let largest = start;
  for (let child = sibling[start]; child !== start; child = sibling[child]) {
    if (size[child] > size[largest]) largest = child;
  }
  const frozen = 2 * sign[s] * f.clock[TIME];
  let child = start;
  do {
    let id = s;
    if (child !== largest) {
      id = f.takeSet();
      off[id] = off[s];
      sign[id] = sign[s];
      for (let v = firstVertex[child]; ; v = next[v]) {
        set[v] = id;
        if (v === lastVertex[child]) break;
      }
    }
    node[id] = child;
    if (child >= f.n) z[child] -= frozen;
    mateIn[id] = -1;
    mateOut[id] = -1;
    f.reachRound[id] = 0;
    child = sibling[child];
  } while (child !== start);
  f.dropBlossom(blossom);
}

function identity(n: number): Int32Array {
  const ids = new Int32Array(n);
  for (let i = 0; i < n; i++) ids[i] = i;
  return ids;
}
