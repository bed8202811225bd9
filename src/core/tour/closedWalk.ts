import { connectorCost, type TourGraph } from './problem.js';

/**
 * A closed walk as a cyclic array of half-edges, one for each edge, that can be changed by turning
 * stretches round.
 *
 * A **node** is an end of an edge, named by the half-edge that starts there. The walk joins every node
 * to a **partner**: the node it goes on with, or came from. The pair is a transition; it costs what a
 * connector between the two vertices costs, nothing where they are one. Nodes and partners do not
 * depend on which way round the walk is read.
 */
export class ClosedWalk {
  readonly order: Int32Array;
  private readonly position: Int32Array;
  private readonly turns: number[] = [];
  /** Sum of costs gained (negative) or lost since the last mark. */
  change = 0;

  constructor(
    readonly graph: TourGraph,
    order: Int32Array,
  ) {
    this.order = order.slice();
    this.position = new Int32Array(order.length);
    order.forEach((h, p) => {
      this.position[h >> 1] = p;
    });
  }

  get length(): number {
    return this.order.length;
  }

  /** Whether the walk, as it now reads, leaves its edge at this node. */
  isExit(node: number): boolean {
    return this.order[this.position[node >> 1]] !== node;
  }

  partner(node: number): number {
    const n = this.order.length;
    const p = this.position[node >> 1];
    if (this.order[p] !== node) return this.order[p + 1 === n ? 0 : p + 1];
    return this.order[p === 0 ? n - 1 : p - 1] ^ 1;
  }

  /** Steps from a to b in reading order, both taken as edges. */
  stepsBetween(a: number, b: number): number {
    const d = this.position[b >> 1] - this.position[a >> 1];
    return d < 0 ? d + this.order.length : d;
  }

  cost(a: number, b: number): number {
    const { halfEdgeVertex } = this.graph;
    return connectorCost(this.graph, halfEdgeVertex[a], halfEdgeVertex[b]);
  }

  /**
   * Joins a with c and their partners with each other (2-exchange, Croes 1958). Both must be exits, or
   * both entries. Turns the shorter side of the walk round.
   */
  exchange(a: number, c: number): void {
    const b = this.partner(a);
    const d = this.partner(c);
    this.change += this.cost(a, c) + this.cost(b, d) - this.cost(a, b) - this.cost(c, d);
    if (this.isExit(a)) this.turn(this.position[b >> 1], this.position[c >> 1]);
    else this.turn(this.position[a >> 1], this.position[d >> 1]);
  }

  /** What has been done so far stays; `change` counts from here. */
  mark(): void {
    this.turns.length = 0;
    this.change = 0;
  }

  /** Takes back everything since the last mark. */
  undo(): void {
    for (let k = this.turns.length - 2; k >= 0; k -= 2) this.reverse(this.turns[k], this.turns[k + 1]);
    this.mark();
  }

  totalCost(): number {
    let sum = 0;
    const n = this.order.length;
    for (let p = 0; p < n; p++) sum += this.cost(this.order[p] ^ 1, this.order[p + 1 === n ? 0 : p + 1]);
    return sum;
  }

  private turn(i: number, j: number): void {
    const n = this.order.length;
    let inside = j - i + 1;
    if (inside <= 0) inside += n;
    if (inside === n) return;
    const [from, to] = 2 * inside <= n ? [i, j] : [j + 1 === n ? 0 : j + 1, i === 0 ? n - 1 : i - 1];
    this.turns.push(from, to);
    this.reverse(from, to);
  }

  private reverse(i: number, j: number): void {
    const { order, position } = this;
    const n = order.length;
    let inside = j - i + 1;
    if (inside <= 0) inside += n;
    let a = i;
    let b = j;
    for (let k = inside >> 1; k > 0; k--) {
      const h = order[a] ^ 1;
      const g = order[b] ^ 1;
      order[a] = g;
      order[b] = h;
      position[g >> 1] = a;
      position[h >> 1] = b;
      a = a + 1 === n ? 0 : a + 1;
      b = b === 0 ? n - 1 : b - 1;
    }
    if (inside & 1) order[a] = order[a] ^ 1;
  }
}
