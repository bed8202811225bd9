/**
 * The strokes of one pen as an undirected multigraph with vertices in the plane.
 *
 * Half-edge h = 2e or 2e + 1 starts at `halfEdgeVertex[h]`; its twin is h ^ 1. Edge e is the piece of
 * stroke `edgeStroke[e]` from segment `startSegment[e]` at `startT[e]` to segment `endSegment[e]` at
 * `endT[e]` (indices into the drawing's segments, start before end); half-edge 2e runs along it as drawn.
 * A dot is a loop of length 0 at a vertex of its own. Every vertex has at least one edge.
 *
 * A vertex has one position. Where the curve's end lies off it (by at most the snap distance) the tool
 * draws a straight bridge: curves never move.
 */
export interface Network {
  readonly vertexCount: number;
  readonly vertexX: Float64Array;
  readonly vertexY: Float64Array;
  readonly edgeCount: number;
  readonly halfEdgeVertex: Int32Array;
  /** Unit vector in which the curve leaves the start of each half-edge: x at 2h, y at 2h + 1; 0, 0 for dots. */
  readonly halfEdgeDirection: Float64Array;
  readonly edgeStroke: Uint32Array;
  readonly startSegment: Uint32Array;
  readonly startT: Float64Array;
  readonly endSegment: Uint32Array;
  readonly endT: Float64Array;
  readonly edgeLengthMm: Float64Array;
  readonly componentCount: number;
  readonly componentOfVertex: Int32Array;
  /** Vertices of odd degree, ascending. Their number is even in every component. */
  readonly oddVertices: Int32Array;
  /** Length left out because the same line is drawn already, mm. */
  readonly repeatedMm: number;
  /** Largest distance from a curve's end to its vertex, mm. */
  readonly snapMaxMm: number;
  /** Dots left out because a line of the same pen passes over them. */
  readonly dotsOnLines: number;
  /** Dots left out because they stand on another dot. */
  readonly repeatedDots: number;
  /** Places found where lines cross, 0 where they were not looked for. */
  readonly crossings: number;
}

/** Where lines join: at their ends, also where an end touches another line, also where lines cross. */
export type JunctionRule = 'ends' | 'touching' | 'crossing';

/** How lines hang together. */
export interface NetworkOptions {
  /** Ends at most this far apart meet, mm. */
  readonly snapMm: number;
  /** Chord error of the flattened pieces that the search goes through, mm. */
  readonly accuracyMm: number;
  readonly junctions: JunctionRule;
  readonly repeats: 'once' | 'keep';
  /** Lines at most this far apart all along are one line drawn again, mm. */
  readonly repeatToleranceMm: number;
}
