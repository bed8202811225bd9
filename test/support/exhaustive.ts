import type { Network } from '../../src/core/network/network.ts';

/**
 * The least cost of connectors over all orders and directions of a network's edges, by dynamic
 * programming over subsets (Held & Karp 1962, with edges for cities): exact, and written without
 * anything of the tour's own code. For up to about 13 edges; O(2ⁿ n²).
 */
export function leastCost(
  network: Network,
  home: readonly [number, number],
  end: 'home' | 'anywhere',
  weigh: (distance: number) => number,
  weighHome: (distance: number) => number = (d) => (d === 0 ? 0 : weigh(d)),
): number {
  const n = network.edgeCount;
  const x = (h: number) => network.vertexX[network.halfEdgeVertex[h]];
  const y = (h: number) => network.vertexY[network.halfEdgeVertex[h]];
  const between = (ax: number, ay: number, bx: number, by: number) => {
    const d = Math.hypot(ax - bx, ay - by);
    return d === 0 ? 0 : weigh(d);
  };
  // least[mask * 2n + h]: edges of mask drawn, the last along half-edge h.
  const least = new Float64Array(2 ** n * 2 * n).fill(Number.POSITIVE_INFINITY);
  for (let h = 0; h < 2 * n; h++) {
    least[(1 << (h >> 1)) * 2 * n + h] = weighHome(Math.hypot(home[0] - x(h), home[1] - y(h)));
  }
  const link = Array.from({ length: 2 * n }, (_, h) =>
    Array.from({ length: 2 * n }, (_, g) => between(x(h ^ 1), y(h ^ 1), x(g), y(g))),
  );
  for (let mask = 1; mask < 2 ** n; mask++) {
    for (let h = 0; h < 2 * n; h++) {
      const cost = least[mask * 2 * n + h];
      if (cost === Number.POSITIVE_INFINITY) continue;
      for (let g = 0; g < 2 * n; g++) {
        if (mask & (1 << (g >> 1))) continue;
        const at = (mask | (1 << (g >> 1))) * 2 * n + g;
        const longer = cost + link[h][g];
        if (longer < least[at]) least[at] = longer;
      }
    }
  }
  let best = Number.POSITIVE_INFINITY;
  for (let h = 0; h < 2 * n; h++) {
    const back = end === 'home' ? weighHome(Math.hypot(home[0] - x(h ^ 1), home[1] - y(h ^ 1))) : 0;
    best = Math.min(best, least[(2 ** n - 1) * 2 * n + h] + back);
  }
  return best;
}
