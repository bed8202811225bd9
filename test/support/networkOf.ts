import type { Drawing } from '../../src/core/drawing/drawing.ts';
import { readDrawing } from '../../src/core/drawing/readDrawing.ts';
import { buildNetwork } from '../../src/core/network/buildNetwork.ts';
import type { Network, NetworkOptions } from '../../src/core/network/network.ts';

const OPTIONS: NetworkOptions = {
  snapMm: 0.05,
  accuracyMm: 0.02,
  junctions: 'touching',
  repeats: 'once',
  repeatToleranceMm: 0.01,
};

/** A drawing of paths in mm, black, on a page of 100 by 100 that cuts none of them. */
export function drawingOfPaths(paths: readonly string[]): Drawing {
  const body = paths.map((d) => `<path d="${d}"/>`).join('');
  const text = `<svg xmlns="http://www.w3.org/2000/svg" width="100mm" height="100mm" viewBox="0 0 100 100" fill="none" stroke="black">${body}</svg>`;
  return readDrawing(text, { pageEdge: 'ignore' });
}

/** The network of all its strokes. */
export function networkOf(drawing: Drawing, options: Partial<NetworkOptions> = {}): Network {
  const all = Uint32Array.from({ length: drawing.strokes.count }, (_, i) => i);
  return buildNetwork(drawing, all, { ...OPTIONS, ...options });
}

/** The number of edge ends at each vertex, least first. */
export function degreesOf({ vertexCount, halfEdgeVertex }: Network): number[] {
  const degree = new Array<number>(vertexCount).fill(0);
  for (const v of halfEdgeVertex) degree[v]++;
  return degree.sort((a, b) => a - b);
}
