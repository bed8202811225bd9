import { buildBoxTree } from '../structures/boxTree.js';
import { EdgeList } from './graph.js';
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
export function candidateEdges(layout: Layout, costs: IntegerCosts): EdgeList {
  const edges = new EdgeList(16 + Math.ceil(EXPECTED * layout.n));
  placeEdges(layout, edges);
  costs.fill(edges);
  wayEdges(layout, costs.scale, (u, v, cost) => edges.add(u, v, cost));
  const { hints } = layout.problem;
  if (hints !== undefined) hintEdges(layout, hints, costs, edges);
  else if (layout.placed < layout.n) specialPartners(layout, costs, edges);
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

function placeEdges(layout: Layout, edges: EdgeList): void {
  const { tree, first } = layout;
  const places = tree.x.length;
  const near = nearInQuadrants(tree);
  const odd: number[] = [];
  for (let p = 0; p < places; p++) {
    const size = first[p + 1] - first[p];
    if (size % 2 === 1) odd.push(p);
    joinNear(near, p, first, edges);
    if (size === 1 && p + 1 < places && joined(near, p, p + 1)) continue;
    // The copies on a place start as one odd set (start.ts): its cycle closes here.
    if (size >= 3) edges.join(first[p], first[p] + size - (size % 2 === 0 ? 2 : 1));
    for (let v = first[p]; v < first[p + 1] && v + 1 < layout.n; v++) edges.join(v, v + 1);
  }
  for (let v = layout.placed; v + 1 < layout.n; v++) edges.join(v, v + 1);
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

function joined(near: Int32Array, p: number, q: number): boolean {
  return lists(near, p, q) || lists(near, q, p);
}

function lists(near: Int32Array, p: number, q: number): boolean {
  const row = QUADRANT_NEIGHBOURS * p;
  for (let i = row; i < row + QUADRANT_NEIGHBOURS; i++) if (near[i] === q) return true;
  return false;
}

function specialPartners(layout: Layout, costs: IntegerCosts, edges: EdgeList): void {
  const { n, placed, place } = layout;
  const cheapest = new Float64Array(n).fill(Number.POSITIVE_INFINITY);
  for (let i = 0; i < edges.count; i++) {
    const { from, to, cost } = edges;
    if (from[i] >= placed || to[i] >= placed) continue;
    if (cost[i] < cheapest[from[i]]) cheapest[from[i]] = cost[i];
    if (cost[i] < cheapest[to[i]]) cheapest[to[i]] = cost[i];
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
