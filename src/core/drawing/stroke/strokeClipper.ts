import type { Work } from '../../geometry/boxChain.js';
import { cutByRegion, EDGE_TOLERANCE_MM, isInRegion } from '../../geometry/cutByRegion.js';
import type { Region } from '../../geometry/region.js';
import type { Segments } from '../../geometry/segments.js';

/** Some seconds: a drawing in earnest takes a fraction of one. */
const MOST_WORK = 5e8;

/**
 * Lines this near outside the page are on its edge: a frame that was written with four decimals, as ours
 * are, must not be lost on being read again.
 */
const PAGE_TOLERANCE_MM = 1e-3;

/** What one kind of edge took away. */
export interface Removed {
  /** Strokes touched: cut, or left out. */
  strokes: number;
  mm: number;
}

/** What became of the strokes of one element at the edges of clip paths and viewports, and of the page. */
export interface Clipping {
  readonly byClip: Removed;
  readonly byPage: Removed;
  /** Strokes left whole because cutting took too long. */
  gaveUp: number;
}

export function nothingClipped(): Clipping {
  return { byClip: { strokes: 0, mm: 0 }, byPage: { strokes: 0, mm: 0 }, gaveUp: 0 };
}

type Keep = (segments: Segments, closed: boolean) => void;

/** Cuts strokes at the edge of their clip and of the page. */
export class StrokeClipper {
  /** null where lines may go on past the edge of the page. */
  page: Region | null = null;
  readonly work: Work = { left: MOST_WORK };

  /** Calls `keep` with each part of a stroke that is left; with the stroke itself where nothing is cut. */
  clip(
    segments: Segments,
    closed: boolean,
    dot: boolean,
    clip: Region | null,
    sums: Clipping,
    keep: Keep,
  ): void {
    this.cut(segments, closed, dot, clip, EDGE_TOLERANCE_MM, sums.byClip, sums, (inside, insideClosed) =>
      this.cut(inside, insideClosed, dot, this.page, PAGE_TOLERANCE_MM, sums.byPage, sums, keep),
    );
  }

  private cut(
    segments: Segments,
    closed: boolean,
    dot: boolean,
    region: Region | null,
    tolerance: number,
    removed: Removed,
    sums: Clipping,
    keep: Keep,
  ): void {
    if (!region) {
      keep(segments, closed);
      return;
    }
    if (dot) {
      const { data, offset } = segments;
      if (isInRegion(region, data[offset[0]], data[offset[0] + 1], this.work, tolerance))
        keep(segments, closed);
      else removed.strokes++;
      return;
    }
    const cut = this.work.left < 0 ? null : cutByRegion(segments, closed, region, this.work, tolerance);
    if (!cut) sums.gaveUp++;
    if (!cut || cut.kept === 'all') {
      keep(segments, closed);
      return;
    }
    removed.strokes++;
    removed.mm += cut.removedMm;
    for (let k = 1; k < cut.first.length; k++)
      keep(slice(cut.segments, cut.first[k - 1], cut.first[k]), false);
  }
}

function slice(segments: Segments, from: number, to: number): Segments {
  return {
    count: to - from,
    kind: segments.kind.subarray(from, to),
    offset: segments.offset.subarray(from, to),
    data: segments.data,
  };
}
