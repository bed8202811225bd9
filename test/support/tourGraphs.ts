import { buildNetwork } from '../../src/core/network/buildNetwork.ts';
import { type TourGraph, type TourTask, withHome } from '../../src/core/tour/problem.ts';
import { drawingOf, type StrokeSpec } from './drawings.ts';

/** Strokes and home as a tour is sought over them, by length; repeats are kept. */
export function graphOf(specs: readonly StrokeSpec[], home: Omit<TourTask, 'weigh'>): TourGraph {
  const drawing = drawingOf(specs);
  const all = Uint32Array.from({ length: drawing.strokes.count }, (_, i) => i);
  const network = buildNetwork(drawing, all, {
    snapMm: 0.05,
    accuracyMm: 0.02,
    junctions: 'touching',
    repeats: 'keep',
    repeatToleranceMm: 0.01,
  });
  return withHome(network, { ...home, weigh: (d) => d });
}
