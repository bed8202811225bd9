import { buildBoxTree } from '../structures/boxTree.js';
import { addEdges, buildGraph, EdgeList, type Graph, graphWithRoom, layEdge } from './graph.js';
import type { IntegerCosts, Layout } from './layout.js';
import { nearInQuadrants, QUADRANT_NEIGHBOURS } from './quadrants.js';

/** Up to this many vertices a special vertex is a candidate for every other one. */
const COMPLETE = 2048;
/** Beyond that, this many cheapest partners of a special vertex, and as many by cost less the partner's dual. */
const SPECIAL_PARTNERS = 48;
/** Edges to make room for, per vertex; uniform points have 5.4. */
const EXPECTED = 5.5;

/**
 * Candidate edges among which a perfect matching certainly exists: two nearest places in each quadrant
 * (once more among the places with an odd number of vertices),
 * a path through all vertices in working order, and partners for the special vertices.
 */
export function candidateGraph(layout: Layout, costs: IntegerCosts): Graph {
  const { n, placed, tree } = layout;
  const near = nearInQuadrants(tree);
  const alone = tree.x.length === placed && placed > 0;
  const edges = new EdgeList(alone ? 1024 : 16 + Math.ceil(EXPECTED * n));
  const graph = alone ? graphOfNear(n, near, costs) : null;
  if (!alone) placeEdges(layout, near, edges);
  for (let v = Math.max(0, placed - 1); v + 1 < n; v++) edges.join(v, v + 1);
  costs.fill(edges);
  wayEdges(layout, costs.scale, (u, v, cost) => edges.add(u, v, cost));
  const { hints } = layout.problem;
  if (hints !== undefined) hintEdges(layout, hints, costs, edges);
  else if (placed < n) specialPartners(layout, costs, near, edges);
  if (graph === null) return buildGraph(n, edges);
  addEdges(graph, edges);
  return graph;
}

/** The same edges as a list, lower end first. */
export function edgesOf(graph: Graph): EdgeList {
  const { first, tail, head, cost } = graph;
  const edges = new EdgeList(first[first.length - 1] / 2 + 1);
  for (let arc = 0; arc < first[first.length - 1]; arc++) {
    if (tail[arc] < head[arc]) edges.add(tail[arc], head[arc], cost[arc]);
  }
  return edges;
}

/** The working vertex of each of the problem's vertices. */
function workingOf(layout: Layout): Int32Array {
  const working = new Int32Array(layout.n);
  for (let v = 0; v < layout.n; v++) working[layout.original[v]] = v;
  return working;
}

/** Calls back for the problem's other ways, as working vertices with whole costs. */
export function wayEdges(
  layout: Layout,
  scale: number,
  add: (u: number, v: number, cost: number) => void,
): void {
  const { ways } = layout.problem;
  if (ways === undefined || ways.cost.length === 0) return;
  const working = workingOf(layout);
  for (let i = 0; i < ways.cost.length; i++) {
    add(working[ways.u[i]], working[ways.v[i]], 2 * Math.floor(scale * ways.cost[i]));
  }
}

function hintEdges(layout: Layout, hints: Int32Array, costs: IntegerCosts, edges: EdgeList): void {
  const working = workingOf(layout);
  for (let i = 0; i < hints.length; i += 2) {
    const u = working[hints[i]];
    const v = working[hints[i + 1]];
    edges.add(u, v, costs.between(u, v));
  }
}

/** Where no two vertices are on one place, places are vertices: the arcs are laid straight from the lists. */
function graphOfNear(n: number, near: Int32Array, costs: IntegerCosts): Graph {
  const places = near.length / QUADRANT_NEIGHBOURS;
  const first = new Int32Array(n + 1);
  const along = new Uint8Array(places);
  for (let p = 0; p < places; p++) countArcs(near, p, places, first, along);
  const graph = graphWithRoom(first);
  for (let p = places - 1; p >= 0; p--) layArcs(graph, near, p, along, costs);
  return graph;
}

/** Strikes out of the list of p whoever lists p and comes first, and says whether the path to p + 1 is wanting. */
function countArcs(near: Int32Array, p: number, places: number, first: Int32Array, along: Uint8Array): void {
  const row = QUADRANT_NEIGHBOURS * p;
  let joined = p + 1 === places;
  for (let i = row; i < row + QUADRANT_NEIGHBOURS; i++) {
    const q = near[i];
    if (q < 0) continue;
    if (q === p + 1) joined = true;
    // A lower one's list still stands as it was where it names p: only lower names are struck out.
    if (q < p && lists(near, q, p)) near[i] = -1;
    else {
      first[p]++;
      first[q]++;
    }
  }
  if (joined || lists(near, p + 1, p)) return;
  along[p] = 1;
  first[p]++;
  first[p + 1]++;
}

function layArcs(graph: Graph, near: Int32Array, p: number, along: Uint8Array, costs: IntegerCosts): void {
  const row = QUADRANT_NEIGHBOURS * p;
  for (let i = row; i < row + QUADRANT_NEIGHBOURS; i++) {
    if (near[i] >= 0) layEdge(graph, p, near[i], costs.between(p, near[i]));
  }
  if (along[p] === 1) layEdge(graph, p, p + 1, costs.between(p, p + 1));
}

function placeEdges(layout: Layout, near: Int32Array, edges: EdgeList): void {
  const { tree, first } = layout;
  const places = tree.x.length;
  const odd: number[] = [];
  for (let p = 0; p < places; p++) {
    const size = first[p + 1] - first[p];
    if (size % 2 === 1) odd.push(p);
    joinNear(near, p, first, edges);
    // The copies on a place start as one odd set (start.ts): its cycle closes here.
    if (size >= 3) edges.join(first[p], first[p] + size - (size % 2 === 0 ? 2 : 1));
    for (let v = first[p]; v < first[p + 1] && v + 1 < layout.placed; v++) edges.join(v, v + 1);
  }
  if (odd.length < places) joinOdd(layout, odd, edges);
}

/** To the neighbours of p; of two positions that are neighbours of one another only from the lower one. */
function joinNear(near: Int32Array, p: number, first: Int32Array, edges: EdgeList): void {
  const row = QUADRANT_NEIGHBOURS * p;
  const alone = first[p + 1] - first[p] === 1;
  for (let i = row; i < row + QUADRANT_NEIGHBOURS; i++) {
    const q = near[i];
    if (q < p && (q < 0 || lists(near, q, p))) continue;
    if (alone && first[q + 1] - first[q] === 1) edges.join(first[p], first[q]);
    else joinPlaces(first, p, q, edges);
  }
}

/** An odd number of copies acts as one vertex, an even number as two: the first and the last. */
function joinPlaces(first: Int32Array, p: number, q: number, edges: EdgeList): void {
  const lastP = (first[p + 1] - first[p]) % 2 === 0 ? first[p + 1] - 1 : first[p];
  const lastQ = (first[q + 1] - first[q]) % 2 === 0 ? first[q + 1] - 1 : first[q];
  edges.join(first[p], first[q]);
  if (lastP !== first[p]) edges.join(lastP, first[q]);
  if (lastQ !== first[q]) edges.join(first[p], lastQ);
  if (lastP !== first[p] && lastQ !== first[q]) edges.join(lastP, lastQ);
}

/**
 * Where the triangle inequality holds, the copies on a place with an even number of them may as well be mates:
 * the other places see one another as if these were not there, lest every way lead through them.
 */
function joinOdd(layout: Layout, odd: readonly number[], edges: EdgeList): void {
  const { tree, first } = layout;
  const oddTree = buildBoxTree(
    odd.map((p) => tree.x[p]),
    odd.map((p) => tree.y[p]),
  );
  const near = nearInQuadrants(oddTree);
  for (let p = 0; p < odd.length; p++) {
    const u = first[odd[oddTree.order[p]]];
    for (let i = QUADRANT_NEIGHBOURS * p; i < QUADRANT_NEIGHBOURS * (p + 1); i++) {
      const q = near[i];
      if (q > p || (q >= 0 && !lists(near, q, p))) edges.join(u, first[odd[oddTree.order[q]]]);
    }
  }
}

function lists(near: Int32Array, p: number, q: number): boolean {
  const row = QUADRANT_NEIGHBOURS * p;
  for (let i = row; i < row + QUADRANT_NEIGHBOURS; i++) if (near[i] === q) return true;
  return false;
}

function specialPartners(layout: Layout, costs: IntegerCosts, near: Int32Array, edges: EdgeList): void {
  const { n, placed, place, first } = layout;
  const cheapest = new Float64Array(n).fill(Number.POSITIVE_INFINITY);
  for (let v = 0; n > COMPLETE && v < placed; v++) {
    const row = QUADRANT_NEIGHBOURS * place[v];
    for (let i = row; i < row + QUADRANT_NEIGHBOURS; i++) {
      if (near[i] < 0) continue;
      const w = first[near[i]];
      cheapest[v] = Math.min(cheapest[v], costs.between(v, w));
      cheapest[w] = Math.min(cheapest[w], costs.between(v, w));
    }
    if (first[place[v] + 1] - first[place[v]] > 1) cheapest[v] = costs.between(v, v);
  }
  const cost = new Float64Array(n);
  const rank = new Float64Array(n);
  for (let s = placed; s < n; s++) {
    for (let v = 0; v < n; v++) cost[v] = v === s ? Number.POSITIVE_INFINITY : costs.between(s, v);
    if (n <= COMPLETE) {
      for (let v = 0; v < s; v++) edges.add(s, v, cost[v]);
      continue;
    }
    // Of the vertices on one place the last will do.
    for (let v = 0; v + 1 < placed; v++) if (place[v] === place[v + 1]) cost[v] = Number.POSITIVE_INFINITY;
    addLowest(edges, s, cost, cost);
    // A lonely vertex is the likeliest partner: what it saves is about the way to its nearest neighbour.
    for (let v = 0; v < n; v++) rank[v] = v < placed ? cost[v] - cheapest[v] : Number.POSITIVE_INFINITY;
    addLowest(edges, s, rank, cost);
  }
}

function addLowest(edges: EdgeList, s: number, rank: Float64Array, cost: Float64Array): void {
  const limit = rank.slice().sort()[SPECIAL_PARTNERS - 1];
  let left = SPECIAL_PARTNERS;
  for (const strict of [true, false]) {
    for (let v = 0; v < rank.length && left > 0; v++) {
      if (!Number.isFinite(cost[v]) || (strict ? rank[v] >= limit : rank[v] !== limit)) continue;
      edges.add(s, v, cost[v]);
      left--;
    }
  }
}
