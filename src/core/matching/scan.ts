import { BEST, type Forest, TIME } from './forest.js';

/**
 * Looks along the arcs of the vertices `from` … `to` (a chain) of the grown set s: promises the times at
 * which their slack is used up, if that is before the search would end anyway.
 */
export function scanGrown(f: Forest, from: number, to: number, s: number): void {
  const { pi, set, off, sign, mateOut, next, reach, reachRound, round, clock, events, risen } = f;
  const { first, head, cost } = f.graph;
  const time = clock[TIME];
  let best = clock[BEST];
  const lift = off[s] + time;
  for (let v = from; ; v = next[v]) {
    const value = pi[v] + lift;
    risen[v] = 1;
    const end = first[v + 1];
    for (let arc = first[v]; arc < end; arc++) {
      const w = head[arc];
      const r = set[w];
      if (r === s) continue;
      const side = sign[r];
      if (side < 0) continue;
      const slack = cost[arc] - value - pi[w] - off[r];
      if (side > 0) {
        // The other end has grown by `time` too: half of what is left, from now.
        const when = (time + slack) / 2;
        if (when >= best) continue;
        events.key = when;
        events.put(f.promises++, arc);
        continue;
      }
      const when = time + slack;
      if (when >= best) continue;
      if (mateOut[r] < 0) {
        best = when;
        f.bestInner = v;
        f.bestOuter = w;
      } else if (reachRound[r] !== round || when < reach[r]) {
        reachRound[r] = round;
        reach[r] = when;
        events.key = when;
        events.put(f.promises++, arc);
      }
    }
    if (v === to) break;
  }
  clock[BEST] = best;
}

/** The same seen from a set just put out of the tree: when will a grown neighbour reach it? */
export function scanReleased(f: Forest, s: number): void {
  const { pi, set, off, sign, next, reach, reachRound, round, clock, events } = f;
  const { first, head, cost } = f.graph;
  const time = clock[TIME];
  const node = f.node[s];
  let earliest = clock[BEST];
  for (let v = f.firstVertex[node]; ; v = next[v]) {
    const value = pi[v] + off[s];
    const end = first[v + 1];
    for (let arc = first[v]; arc < end; arc++) {
      const w = head[arc];
      const r = set[w];
      if (sign[r] <= 0) continue;
      const when = cost[arc] - value - pi[w] - off[r];
      if (when < earliest) {
        earliest = when;
        reachRound[s] = round;
        reach[s] = when;
        events.key = when;
        events.put(f.promises++, arc);
      }
    }
    if (v === f.lastVertex[node]) break;
  }
  // A promise before now cannot be: the slack of a tight or loose edge is never negative.
  if (earliest < time) throw new Error('a candidate edge has negative slack');
}
