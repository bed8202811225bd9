/** A growing list of undirected edges with their integer costs. */
export class EdgeList {
  from = new Int32Array(1024);
  to = new Int32Array(1024);
  cost = new Float64Array(1024);
  count = 0;

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

/** Lists the arcs by vertex, an edge given twice only once. Linear time. */
export function buildGraph(n: number, edges: EdgeList): Graph {
  const { from, to, cost, count } = edges;
  const bucket = bucketByFrom(n, from, count);
  const mark = new Int32Array(n).fill(-1);
  const keep = new Int32Array(count);
  const first = new Int32Array(n + 1);
  let kept = 0;
  for (let i = 0; i < count; i++) {
    const edge = bucket[i];
    const u = from[edge];
    const v = to[edge];
    if (mark[v] === u) continue;
    mark[v] = u;
    keep[kept++] = edge;
    first[u + 1]++;
    first[v + 1]++;
  }
  for (let v = 0; v < n; v++) first[v + 1] += first[v];
  const tail = new Int32Array(2 * kept);
  const head = new Int32Array(2 * kept);
  const arcCost = new Float64Array(2 * kept);
  const at = first.slice(0, n);
  for (let i = 0; i < kept; i++) {
    const edge = keep[i];
    const u = from[edge];
    const v = to[edge];
    tail[at[u]] = u;
    head[at[u]] = v;
    arcCost[at[u]++] = cost[edge];
    tail[at[v]] = v;
    head[at[v]] = u;
    arcCost[at[v]++] = cost[edge];
  }
  return { first, tail, head, cost: arcCost };
}

function bucketByFrom(n: number, from: Int32Array, count: number): Int32Array {
  const at = new Int32Array(n + 1);
  for (let i = 0; i < count; i++) at[from[i] + 1]++;
  for (let v = 0; v < n; v++) at[v + 1] += at[v];
  const bucket = new Int32Array(count);
  for (let i = 0; i < count; i++) bucket[at[from[i]]++] = i;
  return bucket;
}
