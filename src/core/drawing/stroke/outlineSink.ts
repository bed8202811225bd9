import type { Affine } from '../../geometry/affine.js';
import type { ArcCentre } from '../../geometry/arc.js';
import { SegmentBuilder, type Segments } from '../../geometry/segments.js';
import type { PathSink } from './strokeSink.js';
import { isDrawable, SubPath } from './subPath.js';

/** Gathers what a path encloses, mapped: every sub-path closed by a line, as filling does. */
export class OutlineSink implements PathSink {
  /** A number is not finite or too far out. */
  overflows = false;
  private readonly builder = new SegmentBuilder();
  private readonly sub = new SubPath();

  constructor(map: Affine) {
    this.sub.setMap(map);
  }

  moveTo(x: number, y: number): void {
    this.endSubPath();
    this.sub.begin(x, y);
  }

  lineTo(x: number, y: number): void {
    this.sub.lineTo(x, y);
  }

  cubicTo(ax: number, ay: number, bx: number, by: number, x: number, y: number): void {
    this.sub.cubicTo(ax, ay, bx, by, x, y);
  }

  arcTo(arc: ArcCentre, x: number, y: number): void {
    this.sub.arcTo(arc, x, y);
  }

  closePath(onlyRounding: boolean): void {
    this.sub.close(onlyRounding);
    this.endSubPath();
  }

  finish(): Segments {
    this.endSubPath();
    return this.builder.finish();
  }

  private endSubPath(): void {
    const { sub } = this;
    if (!sub.started) return;
    if (!sub.closed) sub.close(false);
    if (!isDrawable(sub.view(), sub.startX, sub.startY)) this.overflows = true;
    else this.builder.append(sub.view());
    sub.clear();
  }
}
