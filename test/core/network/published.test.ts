import { expect, test } from 'vitest';
import { fewestRuns } from '../../../src/core/network/fewestRuns.ts';
import { degreesOf, drawingOfPaths, networkOf as networkOfDrawing } from '../../support/networkOf.ts';

function networkOf(...paths: string[]) {
  const network = networkOfDrawing(drawingOfPaths(paths));
  return { network, degrees: degreesOf(network).reverse() };
}

test('the bridges of Koenigsberg: degrees 5, 3, 3, 3 (Euler 1736, E53), so two runs', () => {
  // A the island on the left, D on the right, B the upper bank, C the lower one.
  const { network, degrees } = networkOf(
    'M20 50Q20 20 50 15', // A-B
    'M20 50Q45 40 50 15', // A-B
    'M20 50Q20 80 50 85', // A-C
    'M20 50Q45 60 50 85', // A-C
    'M20 50H80', // A-D
    'M50 15L80 50', // B-D
    'M50 85L80 50', // C-D
  );
  expect(degrees).toEqual([5, 3, 3, 3]);
  expect([network.componentCount, network.edgeCount, network.oddVertices.length]).toEqual([1, 7, 4]);
  expect(fewestRuns(network)).toBe(2);
});

test('a route-inspection graph: A, D, E and H are odd (worked example, students’ notes, recomputed)', () => {
  const at: Record<string, string> = {
    A: '10 10',
    B: '40 10',
    C: '70 10',
    D: '40 30',
    E: '30 60',
    F: '70 60',
    G: '90 80',
    H: '50 80',
  };
  const edges = ['AB', 'AC', 'AD', 'BC', 'CD', 'CF', 'DE', 'EF', 'FG', 'GH', 'FH', 'EH'];
  // Bowed a little, each by itself, so that none runs through another's end.
  const { network, degrees } = networkOf(
    ...edges.map(([a, b], k) => {
      const [x0, y0] = at[a].split(' ').map(Number);
      const [x1, y1] = at[b].split(' ').map(Number);
      return `M${at[a]}Q${(x0 + x1) / 2 + 1 + k / 5} ${(y0 + y1) / 2 + 2} ${at[b]}`;
    }),
  );
  expect(degrees).toEqual([4, 4, 3, 3, 3, 3, 2, 2]);
  const odd = [...network.oddVertices].map((v) => `${network.vertexX[v]} ${network.vertexY[v]}`);
  expect(odd.sort()).toEqual([at.A, at.D, at.E, at.H].sort());
});
