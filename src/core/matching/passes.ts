import type { Forest } from './forest.js';
import { search } from './search.js';

/** Sets a tree may hold in the first pass, and how much more in each pass after it. */
const FIRST_LIMIT = 30;
const WIDEN = 4;
/** The same in the pass that leaves odd cycles exposed: they end most trees sooner. */
const TIES_LIMIT = 480;
/** Searches between two looks at the caller's wish to stop. */
const BETWEEN_LOOKS = 64;

export interface Watch {
  /** Told after every pass how many sets are still exposed. */
  progress(exposedLeft: number): void;
  stop(): boolean;
}

/**
 * Matches every exposed set; `exposed` holds a vertex of each (more than one does no harm). Many small trees
 * come first and large ones last: most sets find a partner close by, and a tree that stopped early leaves its
 * blossoms and duals to the next. Where there are many ties, a pass before these leaves odd cycles exposed as it
 * meets them, as a fractional matching would: the trees stay small, and most of the cycles meet one another's.
 * False where the watch said stop.
 */
export function matchExposed(f: Forest, exposed: readonly number[], watch: Watch, ties = false): boolean {
  const done = new Int32Array(f.n);
  let waiting = exposed;
  let limit = ties ? TIES_LIMIT : FIRST_LIMIT;
  let searches = 0;
  for (let pass = 1; waiting.length > 0; pass++) {
    const left: number[] = [];
    for (const v of waiting) {
      if (f.mateOut[f.set[v]] >= 0 || done[f.set[v]] === pass) continue;
      if (searches++ % BETWEEN_LOOKS === 0 && watch.stop()) return false;
      const still = search(f, f.set[v], limit, ties && pass === 1);
      if (still < 0) continue;
      done[f.set[still]] = pass;
      left.push(still);
    }
    waiting = left;
    watch.progress(left.length);
    if (ties && pass === 1) limit = FIRST_LIMIT;
    else limit = limit > f.n ? Number.POSITIVE_INFINITY : limit * WIDEN;
  }
  return true;
}

/** The first vertex of every exposed set. */
export function exposedSets(f: Forest): number[] {
  const found: number[] = [];
  for (let v = 0; v < f.n; v++) {
    if (f.mateOut[f.set[v]] < 0 && f.firstVertex[f.node[f.set[v]]] === v) found.push(v);
  }
  return found;
}
