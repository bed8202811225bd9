import type { ClosedWalk } from './closedWalk.js';
import type { NearVertices } from './nearPairs.js';

/** Costs closer than this share are taken as equal, so that rounding never counts as a gain. */
const LEAST_GAIN = 1e-9;
/** A stretch that may be moved elsewhere holds at most this many runs … */
const RUNS_MOVED = 3;
/** … and this many edges. */
const EDGES_MOVED = 50;
/** A closed run of at most this many edges is tried at each of its vertices as entry. */
const ENTRIES_TRIED = 64;

/** The nodes at each vertex: `node[first[v]]` up to `node[first[v + 1]]`. */
export interface NodesAt {
  readonly first: Uint32Array;
  readonly node: Int32Array;
}

export function nodesAtVertices(vertexCount: number, halfEdgeVertex: Int32Array): NodesAt {
  const first = new Uint32Array(vertexCount + 1);
  for (const v of halfEdgeVertex) first[v + 1] = first[v + 1] + 1;
  for (let v = 0; v < vertexCount; v++) first[v + 1] = first[v + 1] + first[v];
  const fill = first.slice(0, vertexCount);
  const node = new Int32Array(halfEdgeVertex.length);
  halfEdgeVertex.forEach((v, h) => {
    node[fill[v]] = h;
    fill[v] = fill[v] + 1;
  });
  return { first, node };
}

/**
 * Tries to shorten the walk at one transition, t and its partner: by exchanging two connectors (2-opt,
 * Croes 1958), by moving a stretch of a few runs that begins here to another place, either way round
 * (relocation, Or 1976), or by entering a closed run elsewhere. The first gain is applied.
 *
 * Connectors to put in are sought among the near vertices and the own one, and only while shorter than
 * the one taken out. `touched` receives the nodes whose transitions changed.
 */
export function shortenAt(
  walk: ClosedWalk,
  near: NearVertices,
  nodes: NodesAt,
  t: number,
  touched: (node: number) => void,
): boolean {
  const partner = walk.partner(t);
  const paid = walk.cost(t, partner);
  if (!(paid > 0)) return false;
  const least = LEAST_GAIN * paid;
  const exit = walk.isExit(t);
  const { halfEdgeVertex } = walk.graph;
  const vertex = halfEdgeVertex[t];
  const stretches = stretchesFrom(walk, t);

  for (let k = near.first[vertex] - 1; k < near.first[vertex + 1]; k++) {
    const w = k < near.first[vertex] ? vertex : near.near[k];
    let price = -1;
    for (let i = nodes.first[w]; i < nodes.first[w + 1]; i++) {
      const c = nodes.node[i];
      if (c === t || c === partner) continue;
      if (price < 0) {
        price = walk.cost(t, c);
        if (price >= paid - least) break;
      }
      const d = walk.partner(c);
      const freed = walk.cost(c, d);
      if (walk.isExit(c) === exit) {
        if (paid + freed - price - walk.cost(partner, d) > least) {
          walk.exchange(t, c);
          for (const node of [t, partner, c, d]) touched(node);
          return true;
        }
      }
      for (const far of stretches) {
        const q = walk.partner(far);
        if (c === far || d === far || insideStretch(walk, t, far, c)) continue;
        const gain = paid + walk.cost(far, q) + freed - walk.cost(partner, q) - price - walk.cost(far, d);
        if (gain > least) {
          moveStretch(walk, t, far, c);
          for (const node of [t, partner, far, q, c, d]) touched(node);
          return true;
        }
      }
    }
    if (price >= paid - least) break;
  }
  return enterElsewhere(walk, t, paid, least, touched);
}

/** Far ends of the stretches of one to RUNS_MOVED runs that begin at t and lead away from its partner. */
function stretchesFrom(walk: ClosedWalk, t: number): number[] {
  const ends: number[] = [];
  let far = t ^ 1;
  for (let edges = 1; edges <= EDGES_MOVED && ends.length < RUNS_MOVED; edges++) {
    const next = walk.partner(far);
    if (next === t) break;
    if (walk.cost(far, next) > 0) ends.push(far);
    far = next ^ 1;
  }
  return ends;
}

/** Whether node c lies on the stretch from t to far. */
function insideStretch(walk: ClosedWalk, t: number, far: number, c: number): boolean {
  const [from, to] = walk.isExit(t) ? [far, t] : [t, far];
  return walk.stepsBetween(from, c) <= walk.stepsBetween(from, to);
}

/** Takes the stretch from t to far out, closes the gap, and puts it between c and its partner, t next to c. */
function moveStretch(walk: ClosedWalk, t: number, far: number, c: number): void {
  const p = walk.partner(t);
  const q = walk.partner(far);
  const d = walk.partner(c);
  if (walk.isExit(c) === walk.isExit(t)) {
    walk.exchange(p, d);
    walk.exchange(p, q);
  } else {
    walk.exchange(p, c);
    walk.exchange(p, q);
    walk.exchange(c, t);
  }
}

/**
 * Where t opens a run that ends at the vertex it begins at, enters and leaves it at another of its
 * vertices: the same edges in the same order, begun elsewhere.
 */
function enterElsewhere(
  walk: ClosedWalk,
  t: number,
  paid: number,
  least: number,
  touched: (node: number) => void,
): boolean {
  const partner = walk.partner(t);
  const { halfEdgeVertex } = walk.graph;
  let last = t ^ 1;
  let edges = 1;
  while (walk.cost(last, walk.partner(last)) === 0 && edges <= ENTRIES_TRIED && walk.partner(last) !== t) {
    last = walk.partner(last) ^ 1;
    edges++;
  }
  if (edges === 1 || edges > ENTRIES_TRIED) return false;
  if (halfEdgeVertex[last] !== halfEdgeVertex[t]) return false;
  const after = walk.partner(last);
  const now = paid + walk.cost(last, after);
  let best = -1;
  let bestGain = least;
  for (let end = t ^ 1; end !== last; end = walk.partner(end) ^ 1) {
    const start = walk.partner(end);
    if (halfEdgeVertex[start] !== halfEdgeVertex[end]) continue;
    const gain = now - walk.cost(partner, start) - walk.cost(end, after);
    if (gain > bestGain) {
      bestGain = gain;
      best = end;
    }
  }
  if (best < 0) return false;
  const start = walk.partner(best);
  moveStretch(walk, t, best, last);
  for (const node of [t, partner, last, after, best, start]) touched(node);
  return true;
}
