import { buildBoxTree } from '../structures/boxTree.js';
import { NearestSearch } from '../structures/nearest.js';
import { EdgeList } from './graph.js';
import type { IntegerCosts, Layout } from './layout.js';

/** Nearest places per quadrant. Nearest in all directions alone starve between clusters. */
const PER_QUADRANT = 2;
/** Up to this many vertices a special vertex is a candidate for every other one. */
const COMPLETE = 2048;
/** Beyond that, this many cheapest partners of a special vertex, and as many by cost less the partner's dual. */
const SPECIAL_PARTNERS = 48;

/**
 * Candidate edges among which a perfect matching certainly exists: two nearest places in each quadrant
 * (once more among the places with an odd number of vertices),
 * a path through all vertices in working order, and partners for the special vertices.
 */
export function candidateEdges(layout: Layout, costs: IntegerCosts): EdgeList {
  const edges = new EdgeList();
  const add = (u: number, v: number): void => edges.add(u, v, costs.between(u, v));
  nearPlaces(layout, add);
  for (let v = 0; v + 1 < layout.n; v++) add(v, v + 1);
  if (layout.placed < layout.n) specialPartners(layout, costs, edges);
  return edges;
}

function nearPlaces(layout: Layout, add: (u: number, v: number) => void): void {
  const { tree, first } = layout;
  const search = new NearestSearch(tree, PER_QUADRANT, 4);
  const odd: number[] = [];
  for (let p = 0; p < tree.x.length; p++) {
    const size = first[p + 1] - first[p];
    if (size % 2 === 1) odd.push(p);
    // The copies on a place start as one odd set (start.ts): its cycle closes here.
    if (size >= 3) add(first[p], first[p] + size - (size % 2 === 0 ? 2 : 1));
    for (const q of search.around(tree.x[p], tree.y[p], p)) if (q >= 0) joinPlaces(first, p, q, add);
  }
  if (odd.length < tree.x.length) nearOddPlaces(layout, odd, add);
}

/**
 * Where the triangle inequality holds, the copies on a place with an even number of them may as well be mates:
 * the other places see one another as if these were not there, lest every way lead through them.
 */
function nearOddPlaces(layout: Layout, odd: readonly number[], add: (u: number, v: number) => void): void {
  const { tree, first } = layout;
  const oddTree = buildBoxTree(
    odd.map((p) => tree.x[p]),
    odd.map((p) => tree.y[p]),
  );
  const search = new NearestSearch(oddTree, PER_QUADRANT, 4);
  for (let i = 0; i < odd.length; i++) {
    for (const j of search.around(oddTree.x[i], oddTree.y[i], i)) {
      if (j >= 0) add(first[odd[oddTree.order[i]]], first[odd[oddTree.order[j]]]);
    }
  }
}

/** An odd number of copies acts as one vertex, an even number as two: the first and the last. */
function joinPlaces(first: Int32Array, p: number, q: number, add: (u: number, v: number) => void): void {
  const lastP = (first[p + 1] - first[p]) % 2 === 0 ? first[p + 1] - 1 : first[p];
  const lastQ = (first[q + 1] - first[q]) % 2 === 0 ? first[q + 1] - 1 : first[q];
  add(first[p], first[q]);
  if (lastP !== first[p]) add(lastP, first[q]);
  if (lastQ !== first[q]) add(first[p], lastQ);
  if (lastP !== first[p] && lastQ !== first[q]) add(lastP, lastQ);
}

function specialPartners(layout: Layout, costs: IntegerCosts, edges: EdgeList): void {
  const { n, placed, place } = layout;
  const cheapest = new Float64Array(n).fill(Number.POSITIVE_INFINITY);
  for (let i = 0; i < edges.count; i++) {
    const { from, to, cost } = edges;
    if (to[i] >= placed) continue;
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
