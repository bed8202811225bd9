/**
 * Disjoint sets of 0 … n − 1 under union (Tarjan 1975; path halving, Tarjan & van Leeuwen 1984).
 * Memory 8 bytes an element; nearly constant time a call. No recursion.
 */
export class DisjointSet {
  private readonly parent: Int32Array;
  private readonly weight: Int32Array;
  /** How many sets there are now. */
  count: number;

  constructor(n: number) {
    this.parent = new Int32Array(n);
    this.weight = new Int32Array(n).fill(1);
    for (let i = 0; i < n; i++) this.parent[i] = i;
    this.count = n;
  }

  /** The element that stands for i's set. */
  find(i: number): number {
    const parent = this.parent;
    let at = i;
    while (parent[at] !== at) {
      parent[at] = parent[parent[at]];
      at = parent[at];
    }
    return at;
  }

  /** Joins the sets of i and j; false where they are one already. */
  union(i: number, j: number): boolean {
    let a = this.find(i);
    let b = this.find(j);
    if (a === b) return false;
    if (this.weight[a] < this.weight[b]) [a, b] = [b, a];
    this.parent[b] = a;
    this.weight[a] += this.weight[b];
    this.count--;
    return true;
  }

  /** How many elements i's set holds. */
  size(i: number): number {
    return this.weight[this.find(i)];
  }
}
