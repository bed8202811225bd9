import { segmentBox } from './box.js';
import type { Work } from './boxChain.js';
import { pointAt } from './evaluate.js';
import { hullsApart } from './hullsApart.js';
import { intersectSegments } from './intersect.js';
import { segmentLength } from './length.js';
import { isShort } from './overlaps.js';
import { eachOutline, type Region, sideOf, sideOfBox } from './region.js';
import { ARC, SEGMENT_SIZE, SegmentBuilder, type Segments } from './segments.js';
import { appendSpan } from './split.js';

/** What lies no further outside is on the edge: rounding, on its way through files too. */
export const EDGE_TOLERANCE_MM = 1e-6;

/** About what one intersection costs, in steps of `Work`; what telling that two are apart does. */
const MEETING_WORK = 500;
const APART_WORK = 10;

/** What is left of a chain of segments. */
export interface Cut {
  readonly kept: 'all' | 'none' | 'some';
  /** The pieces, where some are kept: piece k owns segments first[k] up to first[k + 1]. */
  readonly segments: Segments;
  readonly first: readonly number[];
  readonly removedMm: number;
}

const NO_SEGMENTS: Segments = new SegmentBuilder().finish();

/**
 * The parts of a chain that lie in the region, lines on its edge among them. A chain that lies inside is
 * left as it is (`all`). Pieces follow one another as they do along the chain; of a closed one the piece
 * across its start is joined, and comes last. Their ends lie on the edge within 1e-9 mm or so.
 *
 * null where `work` is used up. Cost: a comparison of boxes where the region is a rectangle and the
 * chain lies inside or outside of its box; else O(n log m + crossings) for most outlines of m segments.
 */
export function cutByRegion(
  chain: Segments,
  closed: boolean,
  region: Region,
  work: Work,
  tolerance = EDGE_TOLERANCE_MM,
): Cut | null {
  const box = new Float64Array(4);
  looseBox(chain, box);
  const side = sideOfBox(region, box, tolerance, work);
  if (side === 1) return whole();
  if (side === -1) return { kept: 'none', segments: NO_SEGMENTS, first: [], removedMm: lengthOf(chain) };
  const spans = new Spans();
  let removedMm = 0;
  for (let i = 0; i < chain.count; i++) {
    segmentBox(chain, i, box);
    const here = sideOfBox(region, box, tolerance, work);
    if (here === 1) spans.add(i, 0, 1);
    else if (here === -1) removedMm += segmentLength(chain, i);
    else removedMm += cutSegment(chain, i, box, region, work, tolerance, spans);
    if (work.left < 0) return null;
  }
  if (spans.isWhole(chain.count)) return whole();
  if (spans.count === 0) return { kept: 'none', segments: NO_SEGMENTS, first: [], removedMm };
  return { kept: 'some', ...spans.pieces(chain, closed), removedMm };
}

/** Whether a dot is kept. */
export function isInRegion(
  region: Region,
  x: number,
  y: number,
  work: Work,
  tolerance = EDGE_TOLERANCE_MM,
): boolean {
  return sideOf(region, x, y, tolerance, work) >= 0;
}

function whole(): Cut {
  return { kept: 'all', segments: NO_SEGMENTS, first: [], removedMm: 0 };
}

/** The box of all control points, larger than need be where there are curves. */
function looseBox({ count, kind, offset, data }: Segments, box: Float64Array): void {
  box.fill(Number.POSITIVE_INFINITY, 0, 2);
  box.fill(Number.NEGATIVE_INFINITY, 2, 4);
  for (let i = 0; i < count; i++) {
    const o = offset[i];
    const size = kind[i] === ARC ? 4 : SEGMENT_SIZE[kind[i]];
    for (let k = 0; k < size; k += 2) include(box, data[o + k], data[o + k + 1], 0, 0);
    if (kind[i] !== ARC) continue;
    const reachX = Math.abs(data[o + 6]) + Math.abs(data[o + 8]);
    const reachY = Math.abs(data[o + 7]) + Math.abs(data[o + 9]);
    include(box, data[o + 4], data[o + 5], reachX, reachY);
  }
}

function include(box: Float64Array, x: number, y: number, reachX: number, reachY: number): void {
  box[0] = Math.min(box[0], x - reachX);
  box[1] = Math.min(box[1], y - reachY);
  box[2] = Math.max(box[2], x + reachX);
  box[3] = Math.max(box[3], y + reachY);
}

function lengthOf(chain: Segments): number {
  let sum = 0;
  for (let i = 0; i < chain.count; i++) sum += segmentLength(chain, i);
  return sum;
}

/** Adds what is kept of segment i to `spans`; returns the length of the rest. */
function cutSegment(
  chain: Segments,
  i: number,
  box: Float64Array,
  region: Region,
  work: Work,
  tolerance: number,
  spans: Spans,
): number {
  const cuts = [0, 1];
  const meet = (t: number): void => {
    cuts.push(t);
  };
  eachOutline(region, (outline) => {
    for (const j of outline.segmentsNear(box, tolerance, work)) {
      work.left -= APART_WORK;
      if (work.left < 0) return;
      if (hullsApart(chain, i, outline.segments, j, 4 * tolerance)) continue;
      work.left -= MEETING_WORK;
      intersectSegments(chain, i, outline.segments, j, tolerance, meet, (a0, a1) => cuts.push(a0, a1));
    }
  });
  cuts.sort((s, t) => s - t);
  let removedMm = 0;
  let from = 0;
  for (let k = 1; k < cuts.length; k++) {
    const isLast = k === cuts.length - 1;
    // Pieces within the tolerance go with what follows, at the end with what came before.
    if (!isLast && isShort(chain, i, from, cuts[k], 2 * tolerance)) continue;
    if (!isLast && isShort(chain, i, cuts[k], 1, 2 * tolerance)) continue;
    if (isInside(chain, i, from, cuts[k], region, work, tolerance)) spans.add(i, from, cuts[k]);
    else removedMm += segmentLength(chain, i, from, cuts[k]);
    from = cuts[k];
  }
  return removedMm;
}

/** Places on a piece at which it is asked for; one may by chance be a place where it touches the edge. */
const PROBES = [0.5, 0.31, 0.73];

/** Whether a piece that crosses no edge lies inside, or all along an edge. */
function isInside(
  chain: Segments,
  i: number,
  t0: number,
  t1: number,
  region: Region,
  work: Work,
  tolerance: number,
): boolean {
  const p = new Float64Array(2);
  for (const share of PROBES) {
    pointAt(chain, i, t0 + share * (t1 - t0), p);
    const side = sideOf(region, p[0], p[1], tolerance, work);
    if (side !== 0) return side > 0;
  }
  return true;
}

/** Spans of segments in the order of the chain, those that follow one another joined. */
class Spans {
  count = 0;
  private readonly segment: number[] = [];
  private readonly t0: number[] = [];
  private readonly t1: number[] = [];
  /** The span does not follow the one before it. */
  private readonly begins: boolean[] = [];

  add(i: number, t0: number, t1: number): void {
    const last = this.count - 1;
    if (last >= 0 && this.segment[last] === i && this.t1[last] === t0) {
      this.t1[last] = t1;
      return;
    }
    const follows = last >= 0 && this.segment[last] === i - 1 && this.t1[last] === 1 && t0 === 0;
    this.segment.push(i);
    this.t0.push(t0);
    this.t1.push(t1);
    this.begins.push(!follows);
    this.count++;
  }

  isWhole(segments: number): boolean {
    return (
      this.count === segments &&
      this.t0.every((t) => t === 0) &&
      this.t1.every((t) => t === 1) &&
      this.begins.lastIndexOf(true) <= 0
    );
  }

  pieces(chain: Segments, closed: boolean): { segments: Segments; first: number[] } {
    const end = this.count - 1;
    const startsAtStart = this.segment[0] === 0 && this.t0[0] === 0;
    const endsAtEnd = this.segment[end] === chain.count - 1 && this.t1[end] === 1;
    const second = this.begins.indexOf(true, 1);
    const joins = closed && startsAtStart && endsAtEnd && second > 0;
    const builder = new SegmentBuilder();
    const first: number[] = [];
    for (let k = joins ? second : 0; k < this.count; k++) this.append(builder, chain, k, first);
    if (joins) {
      for (let k = 0; k < second; k++) this.append(builder, chain, k, k === 0 ? null : first);
    }
    first.push(builder.count);
    return { segments: builder.finish(), first };
  }

  private append(builder: SegmentBuilder, chain: Segments, k: number, first: number[] | null): void {
    if (first && this.begins[k]) first.push(builder.count);
    const i = this.segment[k];
    if (this.t0[k] === 0 && this.t1[k] === 1) builder.append(chain, i, i + 1);
    else appendSpan(builder, chain, i, this.t0[k], this.t1[k]);
  }
}
