import type { Forest } from './forest.js';
import { search } from './search.js';

/** Sets a tree may hold in the first pass, and how much more in each pass after it. */
const FIRST_LIMIT = 30;
const WIDEN = 4;
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
 * blossoms and duals to the next. False where the watch said stop.
 */
export function matchExposed(f: Forest, exposed: readonly number[], watch: Watch): boolean {
  const done = new Int32Array(f.n);
  let waiting = exposed;
  let limit = FIRST_LIMIT;
  let searches = 0;
  for (let pass = 1; waiting.length > 0; pass++) {
    const left: number[] = [];
    for (const v of waiting) {
      if (f.mateOut[f.set[v]] >= 0 || done[f.set[v]] === pass) continue;
      if (searches++ % BETWEEN_LOOKS === 0 && watch.stop()) return false;
      if (search(f, f.set[v], limit)) continue;
      done[f.set[v]] = pass;
      left.push(v);
    }
    waiting = left;
    watch.progress(left.length);
    limit = limit > f.n ? Number.POSITIVE_INFINITY : limit * WIDEN;
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
