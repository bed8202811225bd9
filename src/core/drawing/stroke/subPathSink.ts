import type { ArcCentre } from '../../geometry/arc.js';
import { SubPath } from './subPath.js';

/** What draws a path: points in the element's user units. */
export interface PathSink {
  moveTo(x: number, y: number): void;
  lineTo(x: number, y: number): void;
  cubicTo(ax: number, ay: number, bx: number, by: number, x: number, y: number): void;
  arcTo(arc: ArcCentre, x: number, y: number): void;
  /** `onlyRounding`: the end is where the start is but for rounding. */
  closePath(onlyRounding: boolean): void;
}

/** Gathers a path sub-path by sub-path, mapped; `endSubPath` takes each from `sub` and clears it. */
export abstract class SubPathSink implements PathSink {
  protected readonly sub: SubPath;

  /** Throws Unreadable past `limit` segments in one sub-path. */
  constructor(limit?: number) {
    this.sub = new SubPath(limit);
  }

  /** Called where a sub-path may have ended: `sub.started` says whether there is one. */
  protected abstract endSubPath(): void;

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
}
