import { createRandom } from '../structures/random.js';
import { ClosedWalk } from './closedWalk.js';
import { nodesAtVertices, shortenAt } from './moves.js';
import type { NearVertices } from './nearPairs.js';
import type { TourGraph } from './problem.js';

export interface Effort {
  /** Kicks for each end of a connector (small walks get more); 0 only descends to a local optimum. */
  readonly kicksPerEnd: number;
  readonly seed: number;
  /** Asked now and then; true ends the search with the best so far. */
  readonly shouldStop: () => boolean;
  /** Told now and then: share of the kicks done, and the cost so far. */
  readonly onProgress: (share: number, cost: number) => void;
}

/** How many connectors apart, at most, the three of a kick stand in the walk. */
const KICK_SPAN = 30;
const ASK_EVERY = 256;
/** Small walks get at least this many: they cost nothing. */
const FEWEST_KICKS = 500;

/**
 * Shortens a closed walk by iterated local search (Lourenço, Martin & Stützle 2003): descend by the
 * moves of `shortenAt`; then kick (swap two neighbouring stretches of a few runs: a local double bridge,
 * Martin, Otto & Felten 1991), descend again around the kick, and take it back unless the walk came out
 * no longer. Never returns a longer walk than it was given. The same seed gives the same walk unless
 * `shouldStop` cut it short.
 *
 * @returns the walk's half-edges in order, and whether it was stopped early
 */
export function improveWalk(
  graph: TourGraph,
  order: Int32Array,
  near: NearVertices,
  effort: Effort,
): { order: Int32Array; stopped: boolean } {
  const walk = new ClosedWalk(graph, order);
  const nodes = nodesAtVertices(graph.vertexCount, graph.halfEdgeVertex);
  const queue = new NodeQueue(2 * walk.length);
  const touched = (node: number) => queue.push(node);
  for (const h of walk.order) {
    queue.push(h);
    queue.push(h ^ 1);
  }
  let asked = 0;
  let stopped = false;
  const stopNow = () => {
    if (++asked % ASK_EVERY === 0 && effort.shouldStop()) stopped = true;
    return stopped;
  };
  const descend = () => {
    for (let node = queue.shift(); node >= 0 && !stopNow(); node = queue.shift()) {
      while (shortenAt(walk, near, nodes, node, touched)) if (stopNow()) return;
    }
  };

  descend();
  walk.mark();
  const random = createRandom(effort.seed);
  const kicks = kicksFor(walk, effort.kicksPerEnd);
  let cost = walk.totalCost();
  for (let k = 0; k < kicks && !stopped; k++) {
    if (k % (4 * ASK_EVERY) === 0) effort.onProgress(k / kicks, cost);
    if (!kick(walk, random, touched)) continue;
    descend();
    if (walk.change > 0) walk.undo();
    cost += walk.change;
    walk.mark();
    queue.clear();
  }
  return { order: walk.order, stopped };
}

/** Each connector of the walk has two ends. */
function kicksFor(walk: ClosedWalk, kicksPerEnd: number): number {
  if (kicksPerEnd === 0) return 0;
  let connectors = 0;
  for (const h of walk.order) if (walk.cost(h ^ 1, walk.partner(h ^ 1)) > 0) connectors++;
  return Math.max(FEWEST_KICKS, Math.round(2 * kicksPerEnd * connectors));
}

/** Swaps two neighbouring stretches between three connectors chosen near each other in the walk. */
function kick(walk: ClosedWalk, random: () => number, touched: (node: number) => void): boolean {
  const start = walk.order[Math.floor(random() * walk.length)] ^ 1;
  const a = nextConnector(walk, start, 0);
  const c = a < 0 ? -1 : nextConnector(walk, walk.partner(a) ^ 1, skewed(random));
  const e = c < 0 ? -1 : nextConnector(walk, walk.partner(c) ^ 1, skewed(random));
  if (e < 0) return false;
  const [b, d, f] = [walk.partner(a), walk.partner(c), walk.partner(e)];
  const inOrder = walk.stepsBetween(a, c) <= walk.stepsBetween(a, e) && a !== c && c !== e && a !== e;
  if (!inOrder) return false;
  walk.exchange(a, e);
  walk.exchange(a, d);
  walk.exchange(e, b);
  for (const node of [a, b, c, d, e, f]) touched(node);
  return true;
}

function skewed(random: () => number): number {
  const r = random();
  return Math.floor(r * r * KICK_SPAN);
}

/** The exit of the connector that stands `skip` connectors further on; -1 where none is near. */
function nextConnector(walk: ClosedWalk, exit: number, skip: number): number {
  let node = exit;
  let left = skip;
  for (let steps = 0; steps < 4 * KICK_SPAN; steps++) {
    const next = walk.partner(node);
    if (walk.cost(node, next) > 0 && left-- === 0) return node;
    node = next ^ 1;
  }
  return -1;
}

/** First in, first out, each node at most once. */
class NodeQueue {
  private readonly ring: Int32Array;
  private readonly waiting: Uint8Array;
  private head = 0;
  private size = 0;

  constructor(nodes: number) {
    this.ring = new Int32Array(nodes);
    this.waiting = new Uint8Array(nodes);
  }

  push(node: number): void {
    if (this.waiting[node]) return;
    this.waiting[node] = 1;
    this.ring[(this.head + this.size++) % this.ring.length] = node;
  }

  shift(): number {
    if (this.size === 0) return -1;
    const node = this.ring[this.head];
    this.head = (this.head + 1) % this.ring.length;
    this.size--;
    this.waiting[node] = 0;
    return node;
  }

  clear(): void {
    while (this.shift() >= 0);
  }
}
