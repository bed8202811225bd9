/**
 * A minimum-weight perfect matching problem over n vertices (n even), on the complete graph.
 *
 * Vertices 0 … n − special − 1 are placed at (x, y): the cost of a pair of them is `weigh(distance)`,
 * where `weigh` is nondecreasing and at least 0, so that boxes of points can be priced. The last
 * `special` vertices have costs of their own, given by `specialCost` (either index may be special);
 * they are few (home, its copy, the free end) and are priced one by one.
 *
 * `ways` lists pairs of placed vertices that may also be had at another price (an edge path drawn again in
 * place of a lift): such a pair costs the lower of the two.
 */
export interface MatchingProblem {
  readonly n: number;
  readonly x: Float64Array;
  readonly y: Float64Array;
  weigh(distance: number): number;
  readonly special: number;
  specialCost(i: number, j: number): number;
  readonly ways?: Ways;
  /** Pairs to look at first, u0 v0 u1 v1 …: they save time where costs are a table, and never change the optimum. */
  readonly hints?: Int32Array;
}

/** Pair i joins u[i] and v[i] at cost[i]. */
export interface Ways {
  readonly u: Int32Array;
  readonly v: Int32Array;
  readonly cost: Float64Array;
}

/** A perfect matching: `mate[v]` is v's partner; `total` the sum of costs in the problem's own unit. */
export interface Matching {
  readonly mate: Int32Array;
  readonly total: number;
}

/**
 * Proof that no perfect matching is cheaper (linear-programming duality, Edmonds 1965).
 * Integer costs are c(u, v) = 2·floor(scale·cost); duals are in the same unit.
 */
export interface Certificate {
  readonly scale: number;
  /** Free dual y of every vertex. */
  readonly vertexDual: Float64Array;
  /**
   * Odd sets with their duals ≥ 0: set i holds `setMembers[setFirst[i]]` up to, not including,
   * `setMembers[setEnd[i]]`. Runs may lie in one another, as the sets do: nests thousands deep then take no
   * more room than the vertices.
   */
  readonly setDual: Float64Array;
  readonly setFirst: Uint32Array;
  readonly setEnd: Uint32Array;
  readonly setMembers: Uint32Array;
  /** Sum of all duals / (2·scale), rounded down: no perfect matching costs less, in the problem's unit. */
  readonly lowerBound: number;
}

export interface CertifiedMatching extends Matching {
  readonly certificate: Certificate;
  /** False only where the caller ended the work early: the certificate is then valid, but below the total. */
  readonly optimal: boolean;
}
