/** A growing list of undirected edges with their integer costs. */
export class EdgeList {
  from: Int32Array;
  to: Int32Array;
  cost: Float64Array;
  count = 0;

  constructor(capacity = 1024) {
    this.from = new Int32Array(capacity);
    this.to = new Int32Array(capacity);
    this.cost = new Float64Array(capacity);
  }

  add(u: number, v: number, cost: number): void {
    this.join(u, v);
    this.cost[this.count - 1] = cost;
  }

  /** An edge whose cost is not known yet. */
  join(u: number, v: number): void {
    const i = this.count;
    if (i === this.from.length) this.grow();
    this.count = i + 1;
    this.from[i] = u;
    this.to[i] = v;
  }

  private grow(): void {
    const capacity = 2 * this.from.length;
    const { from, to, cost } = this;
    this.from = new Int32Array(capacity);
    this.to = new Int32Array(capacity);
    this.cost = new Float64Array(capacity);
    this.from.set(from);
    this.to.set(to);
    this.cost.set(cost);
  }
}

/** Every edge as two arcs: those leaving v are first[v] … first[v + 1] − 1. The columns have room to spare. */
export interface Graph {
  first: Int32Array;
  tail: Int32Array;
  head: Int32Array;
  cost: Float64Array;
}

/** Arcs the first graph leaves room for, as a share of those it has. */
const SPARE = 1 / 32;

/** Lists the arcs by vertex. Linear time. */
export function buildGraph(n: number, edges: EdgeList): Graph {
  const { from, to, cost, count } = edges;
  const first = new Int32Array(n + 1);
  for (let i = 0; i < count; i++) {
    first[from[i]]++;
    first[to[i]]++;
  }
  const graph = graphWithRoom(first);
  for (let i = count - 1; i >= 0; i--) layEdge(graph, from[i], to[i], cost[i]);
  return graph;
}

/** Takes the number of arcs at each vertex, and turns it into where its block ends: `layEdge` fills it from behind. */
export function graphWithRoom(first: Int32Array): Graph {
  let sum = 0;
  for (let v = 0; v < first.length; v++) {
    sum += first[v];
    first[v] = sum;
  }
  const capacity = sum + Math.ceil(sum * SPARE);
  return {
    first,
    tail: new Int32Array(capacity),
    head: new Int32Array(capacity),
    cost: new Float64Array(capacity),
  };
}

export function layEdge(graph: Graph, u: number, v: number, edgeCost: number): void {
  const { first, tail, head, cost } = graph;
  const there = --first[u];
  tail[there] = u;
  head[there] = v;
  cost[there] = edgeCost;
  const back = --first[v];
  tail[back] = v;
  head[back] = u;
  cost[back] = edgeCost;
}

/** Adds edges: the blocks of arcs behind each new one move up. Time in the size of the graph, at the speed of copying. */
export function addEdges(graph: Graph, edges: EdgeList): void {
  const { first } = graph;
  const n = first.length - 1;
  const { from, to, cost, count } = edges;
  reserve(graph, first[n] + 2 * count);
  const { tail, head, cost: arcCost } = graph;
  const fresh = new EdgeList(2 * count);
  for (let i = 0; i < count; i++) {
    fresh.add(from[i], to[i], cost[i]);
    fresh.add(to[i], from[i], cost[i]);
  }
  const order = Int32Array.from({ length: 2 * count }, (_, i) => i);
  order.sort((a, b) => fresh.from[a] - fresh.from[b] || a - b);
  let end = first[n];
  for (let i = order.length - 1; i >= 0; i--) {
    const arc = order[i];
    const v = fresh.from[arc];
    const start = first[v + 1];
    tail.copyWithin(start + i + 1, start, end);
    head.copyWithin(start + i + 1, start, end);
    arcCost.copyWithin(start + i + 1, start, end);
    tail[start + i] = v;
    head[start + i] = fresh.to[arc];
    arcCost[start + i] = fresh.cost[arc];
    end = start;
  }
  let added = 0;
  for (let v = 0; v <= n; v++) {
    first[v] += added;
    while (added < order.length && fresh.from[order[added]] === v) added++;
  }
}

function reserve(graph: Graph, arcs: number): void {
  if (arcs <= graph.head.length) return;
  const capacity = arcs + Math.ceil(arcs * SPARE);
  const { tail, head, cost } = graph;
  graph.tail = new Int32Array(capacity);
  graph.head = new Int32Array(capacity);
  graph.cost = new Float64Array(capacity);
  graph.tail.set(tail);
  graph.head.set(head);
  graph.cost.set(cost);
}
