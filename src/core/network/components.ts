import { DisjointSet } from '../structures/disjointSet.js';

/** Components numbered in the order of their lowest vertex, and the vertices of odd degree. */
export function findComponents(
  vertexCount: number,
  halfEdgeVertex: Int32Array,
): { componentCount: number; componentOfVertex: Int32Array; oddVertices: Int32Array } {
  const sets = new DisjointSet(vertexCount);
  const degree = new Int32Array(vertexCount);
  for (let h = 0; h < halfEdgeVertex.length; h += 2) {
    const a = halfEdgeVertex[h];
    const b = halfEdgeVertex[h + 1];
    sets.union(a, b);
    degree[a] = degree[a] + 1;
    degree[b] = degree[b] + 1;
  }
  const numberOfRoot = new Int32Array(vertexCount).fill(-1);
  const componentOfVertex = new Int32Array(vertexCount);
  const odd: number[] = [];
  let componentCount = 0;
  for (let v = 0; v < vertexCount; v++) {
    const root = sets.find(v);
    if (numberOfRoot[root] < 0) numberOfRoot[root] = componentCount++;
    componentOfVertex[v] = numberOfRoot[root];
    if (degree[v] % 2 === 1) odd.push(v);
  }
  return { componentCount, componentOfVertex, oddVertices: Int32Array.from(odd) };
}
