import Flatbush from 'flatbush';
import type { Marks } from './marks.js';

export interface Snapped {
  readonly vertexCount: number;
  readonly vertexX: Float64Array;
  readonly vertexY: Float64Array;
  readonly vertexOfMark: Int32Array;
  /** Largest distance of a mark from its vertex, mm. */
  readonly snapMaxMm: number;
}

/**
 * Gathers marks into vertices: every mark lies within `snapMm` of its vertex, and the vertex stands on
 * one of its own marks.
 *
 * Marks at the same point form a site. Sites are taken by the number of edge ends on them, then by x,
 * then by y; one that is still free becomes a vertex and takes the free sites within `snapMm` of it.
 * Membership is by distance from the vertex, never from another member, so a row of near ends cannot
 * drift together; and since the order is by position alone, the order of the strokes cannot matter.
 * O(n log n) for bounded crowding.
 */
export function snapMarks(marks: Marks, snapMm: number): Snapped {
  const { siteOfMark, siteX, siteY, siteEnds } = gatherSites(marks);
  const sites = siteX.length;
  const vertexOfSite = new Int32Array(sites).fill(-1);
  const order = Array.from({ length: sites }, (_, i) => i).sort(
    (a, b) => siteEnds[b] - siteEnds[a] || siteX[a] - siteX[b] || siteY[a] - siteY[b],
  );
  const index = snapMm > 0 && sites > 1 ? pointIndex(siteX, siteY) : null;
  const vertexX: number[] = [];
  const vertexY: number[] = [];
  let furthest = 0;
  for (const leader of order) {
    if (vertexOfSite[leader] >= 0) continue;
    const vertex = vertexX.length;
    const x = siteX[leader];
    const y = siteY[leader];
    vertexX.push(x);
    vertexY.push(y);
    vertexOfSite[leader] = vertex;
    if (!index) continue;
    for (const site of index.search(x - snapMm, y - snapMm, x + snapMm, y + snapMm)) {
      if (vertexOfSite[site] >= 0) continue;
      const dx = siteX[site] - x;
      const dy = siteY[site] - y;
      const squared = dx * dx + dy * dy;
      if (squared > snapMm * snapMm) continue;
      vertexOfSite[site] = vertex;
      if (squared > furthest) furthest = squared;
    }
  }
  const vertexOfMark = new Int32Array(marks.count);
  for (let m = 0; m < marks.count; m++) vertexOfMark[m] = vertexOfSite[siteOfMark[m]];
  return {
    vertexCount: vertexX.length,
    vertexX: Float64Array.from(vertexX),
    vertexY: Float64Array.from(vertexY),
    vertexOfMark,
    snapMaxMm: Math.sqrt(furthest),
  };
}

interface Sites {
  siteOfMark: Int32Array;
  siteX: number[];
  siteY: number[];
  siteEnds: number[];
}

/** Marks at the same point are one site. Two strokes split where they touch lie on one site. */
export function gatherSites(marks: Marks): Sites {
  const siteOfMark = new Int32Array(marks.count);
  const siteX: number[] = [];
  const siteY: number[] = [];
  const siteEnds: number[] = [];
  const { x, y, ends } = marks;
  const order = Array.from({ length: marks.count }, (_, i) => i).sort((a, b) => x[a] - x[b] || y[a] - y[b]);
  for (const m of order) {
    const last = siteX.length - 1;
    if (last >= 0 && siteX[last] === x[m] && siteY[last] === y[m]) {
      siteOfMark[m] = last;
      siteEnds[last] = siteEnds[last] + ends[m];
    } else {
      siteOfMark[m] = siteX.length;
      siteX.push(x[m]);
      siteY.push(y[m]);
      siteEnds.push(ends[m]);
    }
  }
  return { siteOfMark, siteX, siteY, siteEnds };
}

/** A flatbush of points; it must not be asked for none. */
export function pointIndex(x: ArrayLike<number>, y: ArrayLike<number>): Flatbush {
  const index = new Flatbush(x.length);
  for (let i = 0; i < x.length; i++) index.add(x[i], y[i], x[i], y[i]);
  index.finish();
  return index;
}
