import type { Affine } from '../../geometry/affine.js';
import { SegmentBuilder, type Segments } from '../../geometry/segments.js';
import { isDrawable } from './subPath.js';
import { SubPathSink } from './subPathSink.js';

/** Gathers what a path encloses, mapped: every sub-path closed by a line, as filling does. */
export class OutlineSink extends SubPathSink {
  /** A number is not finite or too far out. */
  overflows = false;
  private readonly builder = new SegmentBuilder();

  constructor(map: Affine) {
    super();
    this.sub.setMap(map);
  }

  finish(): Segments {
    this.endSubPath();
    return this.builder.finish();
  }

  protected override endSubPath(): void {
    const { sub } = this;
    if (!sub.started) return;
    if (!sub.closed) sub.close(false);
    if (!isDrawable(sub.view(), sub.startX, sub.startY)) this.overflows = true;
    else this.builder.append(sub.view());
    sub.clear();
  }
}
