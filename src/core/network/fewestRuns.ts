import type { Network } from './network.js';

/**
 * The fewest runs that draw every edge once: half the odd vertices of each component, and one for a
 * component that has none (Listing 1847, for one component). Linear in vertices.
 */
export function fewestRuns(network: Network): number {
  const odd = new Int32Array(network.componentCount);
  for (const v of network.oddVertices) odd[network.componentOfVertex[v]]++;
  let runs = 0;
  for (const count of odd) runs += Math.max(1, count / 2);
  return runs;
}
