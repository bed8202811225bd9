import type { CertifiedMatching } from '../matching/problem.js';

/** What the tool draws, in order, for one network. */
export interface Tour {
  /** Run i draws `halfEdges[runFirst[i]]` up to `halfEdges[runFirst[i + 1]]` without lifting. */
  readonly runFirst: Uint32Array;
  readonly halfEdges: Int32Array;
  /** Cost of all connectors by the task's measure. */
  readonly cost: number;
  readonly bound: LowerBound;
  /** `proven`: the cost equals the bound; `effort`: the kicks were spent; `clock`: told to stop. */
  readonly stopped: 'proven' | 'effort' | 'clock';
}

/**
 * No tour over the same network costs less, whatever its connectors (from vertex to vertex).
 *
 * - `matching`: the dual of the minimum-weight perfect matching of the odd vertices with home;
 * - `tree`: a minimum spanning tree of the components and the way to and from home;
 * - `none`: not asked for.
 */
export interface LowerBound {
  readonly value: number;
  readonly method: 'matching' | 'tree' | 'none';
  /** Whether the tour found is proven to reach the least cost there is. */
  readonly exact: boolean;
  readonly certified: CertifiedMatching | null;
}
