import { readNests, roomForNests } from './ancestry.js';
import { candidateGraph } from './candidates.js';
import { largestCost, powerScale } from './cost.js';
import { certificateOf, matesOf, provenTotal } from './extract.js';
import { Forest } from './forest.js';
import { addEdges, EdgeList } from './graph.js';
import { interrupted } from './interrupted.js';
import { IntegerCosts, type Layout, layOut } from './layout.js';
import { exposedSets, matchExposed, type Watch } from './passes.js';
import { Pricer } from './pricing.js';
import type { CertifiedMatching, MatchingProblem } from './problem.js';
import { makeRoom } from './repair.js';
import { contractPlaces, firstDuals, raiseExposed } from './start.js';
import { augmentTight } from './tight.js';

/** Bits of the largest cost; the rest of 53 is room for duals to grow beyond it. Fewer where that is too little. */
const COST_BITS = [43, 33, 23, 13];

export interface ExactOptions {
  /** Told the share of the work done so far, 0 … 1, from time to time. */
  readonly onProgress?: (share: number) => void;
  /** Asked from time to time; true ends the work early. */
  readonly shouldStop?: () => boolean;
}

/**
 * A minimum-weight perfect matching of the complete graph with the proof that none is cheaper.
 *
 * Method: the blossom method (Edmonds 1965) on a few candidate edges a vertex, then pricing of all pairs and
 * warm repair until no pair has negative slack, as in Cook & Rohe, INFORMS J. on Computing 11, 1999. Costs are
 * made even integers, 2·floor(scale·cost), so every dual is exact. In true costs the matching is within
 * n/2 / scale of the optimum, scale being 2⁴² to 2⁴³ over the largest cost; `lowerBound` is rounded down.
 *
 * `weigh` must be nondecreasing as computed in doubles, and costs finite; otherwise, or where n is odd, a
 * RangeError is thrown. Where `shouldStop` ends the work, the matching is the greedy one, the certificate is
 * valid but weaker, and `optimal` is false. About n·log n in practice; memory about 1 kB a vertex.
 */
export function exactMatching(problem: MatchingProblem, options: ExactOptions = {}): CertifiedMatching {
  const largest = largestCost(problem);
  const layout = layOut(problem);
  for (const bits of COST_BITS) {
    const costs = new IntegerCosts(layout, powerScale(largest, bits));
    const found = solve(layout, costs, options);
    if (found === 'stopped') return interrupted(layout, costs);
    if (found !== 'inexact') return found;
  }
  throw new Error('the duals of this problem outgrow whole numbers');
}

function solve(
  layout: Layout,
  costs: IntegerCosts,
  options: ExactOptions,
): CertifiedMatching | 'stopped' | 'inexact' {
  const { n, placed } = layout;
  const f = new Forest(n, candidateGraph(layout, costs));
  firstDuals(f, placed);
  contractPlaces(f, layout, costs);
  raiseExposed(f);
  let ties = augmentTight(f);
  let exposed = exposedSets(f);
  const watch = watchOf(options, exposed.length);
  const nests = roomForNests(f);
  const missed = new EdgeList();
  const pricer = new Pricer(f, layout, costs, nests, missed);
  for (;;) {
    if (!matchExposed(f, exposed, watch, ties)) return 'stopped';
    ties = false;
    readNests(f, nests);
    missed.count = 0;
    pricer.priceAllPairs();
    if (missed.count === 0) {
      const certificate = certificateOf(f, layout, costs.scale, nests);
      const mate = matesOf(f, layout);
      const total = provenTotal(certificate, mate, layout.problem);
      if (total === null) return 'inexact';
      options.onProgress?.(1);
      return { mate, total, certificate, optimal: true };
    }
    if (watch.stop()) return 'stopped';
    exposed = [];
    for (let i = 0; i < missed.count; i++) {
      makeRoom(f, missed.from[i], missed.to[i], missed.cost[i], exposed);
    }
    addEdges(f.graph, missed);
  }
}

/** The first matching is most of the work: what is left of it is told; the rounds of repair add little. */
function watchOf(options: ExactOptions, exposed: number): Watch {
  let least = exposed;
  return {
    progress(left) {
      least = Math.min(least, left);
      options.onProgress?.(exposed === 0 ? 0.9 : 0.9 * (1 - least / exposed));
    },
    stop: () => options.shouldStop?.() ?? false,
  };
}
