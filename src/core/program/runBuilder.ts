import { pointAt } from '../geometry/evaluate.js';
import { SegmentBuilder, type Segments } from '../geometry/segments.js';
import { appendSpan } from '../geometry/split.js';

/**
 * Collects runs out of pieces of a drawing's segments. Pieces of one segment that follow each other are
 * joined again, so a stroke that was split and drawn through comes out as it was.
 */
export class RunBuilder {
  private readonly builder = new SegmentBuilder();
  private readonly bridge: number[] = [];
  private readonly first: number[] = [0];
  private readonly at = new Float64Array(2);
  /** Where the tool stands; NaN before a run begins. */
  private x = Number.NaN;
  private y = Number.NaN;
  private pending: { segment: number; from: number; to: number } | null = null;

  constructor(private readonly segments: Segments) {}

  /** Draws the piece of a segment from parameter `from` to `to`; the tool must stand at its start. */
  piece(segment: number, from: number, to: number): void {
    const p = this.pending;
    if (p && p.segment === segment && p.to === from && to > from === p.to > p.from) p.to = to;
    else {
      this.flush();
      this.pending = { segment, from, to };
    }
    pointAt(this.segments, segment, to, this.at);
    this.x = this.at[0];
    this.y = this.at[1];
  }

  /** Starts drawing at a point, or draws a bridge there where the tool stands elsewhere. */
  reach(x: number, y: number): void {
    if (Number.isNaN(this.x)) {
      this.x = x;
      this.y = y;
      return;
    }
    if (this.x === x && this.y === y) return;
    this.flush();
    this.builder.line(this.x, this.y, x, y);
    this.bridge.push(1);
    this.x = x;
    this.y = y;
  }

  standsAt(x: number, y: number): boolean {
    return this.x === x && this.y === y;
  }

  /** A dot: one line from a point to itself, a run of its own. */
  dot(x: number, y: number): void {
    this.builder.line(x, y, x, y);
    this.bridge.push(0);
  }

  endRun(): void {
    this.flush();
    this.first.push(this.builder.count);
    this.x = this.y = Number.NaN;
  }

  finish(): { segments: Segments; count: number; first: Uint32Array; bridge: Uint8Array } {
    return {
      segments: this.builder.finish(),
      count: this.first.length - 1,
      first: Uint32Array.from(this.first),
      bridge: Uint8Array.from(this.bridge),
    };
  }

  private flush(): void {
    const p = this.pending;
    if (!p) return;
    appendSpan(this.builder, this.segments, p.segment, p.from, p.to);
    this.bridge.push(0);
    this.pending = null;
  }
}
