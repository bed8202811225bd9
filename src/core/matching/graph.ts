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
    if (this.count === this.from.length) this.grow();
    const i = this.count++;
    this.from[i] = Math.min(u, v);
    this.to[i] = Math.max(u, v);
    this.cost[i] = cost;
  }

  private grow(): void {
    const capacity = 2 * this.from.length;
    const from = new Int32Array(capacity);
    const to = new Int32Array(capacity);
    const cost = new Float64Array(capacity);
    from.set(this.from);
    to.set(this.to);
    cost.set(this.cost);
    this.from = from;
    this.to = to;
    this.cost = cost;
  }
}

/** Every edge as two arcs: those leaving v are first[v] … first[v + 1] − 1. */
export interface Graph {
  readonly first: Int32Array;
  readonly tail: Int32Array;
  readonly head: Int32Array;
  readonly cost: Float64Array;
}

/** Lists the arcs by vertex. Puts the edges in the order of their lower ends and drops double ones. Linear time. */
export function buildGraph(n: number, edges: EdgeList): Graph {
  tidy(n, edges);
  const { from, to, cost, count } = edges;
  const first = new Int32Array(n + 1);
  for (let i = 0; i < count; i++) {
    first[from[i] + 1]++;
    first[to[i] + 1]++;
  }
  for (let v = 0; v < n; v++) first[v + 1] += first[v];
  const tail = new Int32Array(2 * count);
  const head = new Int32Array(2 * count);
  const arcCost = new Float64Array(2 * count);
  const at = first.slice(0, n);
  for (let i = 0; i < count; i++) {
    const u = from[i];
    const v = to[i];
    const there = at[u]++;
    const back = at[v]++;
    tail[there] = u;
    head[there] = v;
    arcCost[there] = cost[i];
    tail[back] = v;
    head[back] = u;
    arcCost[back] = cost[i];
  }
  return { first, tail, head, cost: arcCost };
}

function tidy(n: number, edges: EdgeList): void {
  const { from, to, cost, count } = edges;
  const bucket = bucketByFrom(n, from, count);
  const mark = new Int32Array(n).fill(-1);
  const tidied = new EdgeList(from.length);
  for (let i = 0; i < count; i++) {
    const edge = bucket[i];
    if (mark[to[edge]] === from[edge]) continue;
    mark[to[edge]] = from[edge];
    tidied.add(from[edge], to[edge], cost[edge]);
  }
  edges.from = tidied.from;
  edges.to = tidied.to;
  edges.cost = tidied.cost;
  edges.count = tidied.count;
}

function bucketByFrom(n: number, from: Int32Array, count: number): Int32Array {
  const at = new Int32Array(n + 1);
  for (let i = 0; i < count; i++) at[from[i] + 1]++;
  for (let v = 0; v < n; v++) at[v + 1] += at[v];
  const bucket = new Int32Array(count);
  for (let i = 0; i < count; i++) bucket[at[from[i]]++] = i;
  return bucket;
}
