import type { Affine } from '../geometry/affine.js';
import type { ArcCentre } from '../geometry/arc.js';
import { segmentLength } from '../geometry/length.js';
import { SegmentBuilder } from '../geometry/segments.js';
import { Column } from './column.js';
import type { Strokes } from './drawing.js';
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

/** What the strokes of one element have in common. */
export interface StrokeProperties {
  readonly colour: number;
  readonly layer: number;
  readonly element: number;
  readonly widthMm: number;
  /** Sub-paths of zero length are dots: the caps are round or square. */
  readonly dots: boolean;
}

/** What became of one element. */
export interface Drawn {
  strokes: number;
  /** Sub-paths of zero length with butt caps, which nothing is drawn for. */
  buttDots: number;
  /** Sub-paths with a number that is not finite or too far out. */
  overflows: number;
  /** Length of what was measured instead of drawn. */
  outlineMm: number;
}

/** Gathers the strokes of a drawing: one per sub-path, in the order in which they come. */
export class StrokeSink implements PathSink {
  /** Segments drawn or measured so far. */
  segmentsSeen = 0;
  private readonly builder = new SegmentBuilder();
  private readonly sub = new SubPath();
  private readonly first = new Column();
  private readonly colour = new Column();
  private readonly layer = new Column();
  private readonly element = new Column();
  private readonly closed = new Column();
  private readonly dot = new Column();
  private readonly widthMm: number[] = [];
  private properties: StrokeProperties | null = null;
  private drawn: Drawn = { strokes: 0, buttDots: 0, overflows: 0, outlineMm: 0 };

  /** Begins an element; with `properties` null its paths are measured, not drawn. */
  begin(map: Affine, properties: StrokeProperties | null): void {
    this.sub.setMap(map);
    this.properties = properties;
    this.drawn = { strokes: 0, buttDots: 0, overflows: 0, outlineMm: 0 };
  }

  end(): Drawn {
    this.endSubPath();
    return this.drawn;
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

  finish(): Strokes {
    const count = this.closed.length;
    const first = new Uint32Array(count + 1);
    first.set(this.first.values.subarray(0, count));
    first[count] = this.builder.count;
    return {
      segments: this.builder.finish(),
      count,
      first,
      closed: Uint8Array.from(this.closed.values.subarray(0, count)),
      dot: Uint8Array.from(this.dot.values.subarray(0, count)),
      colour: this.colour.values.slice(0, count),
      layer: this.layer.values.slice(0, count),
      element: this.element.values.slice(0, count),
      widthMm: new Float64Array(this.widthMm),
    };
  }

  private endSubPath(): void {
    const { sub, drawn } = this;
    if (!sub.started) return;
    this.segmentsSeen += sub.count;
    if (!sub.drew) {
      // A lone moveto draws nothing, dots included (SVG 2, "Zero length path segments").
    } else if (!sub.isDrawable()) drawn.overflows++;
    else if (!this.properties) this.measure();
    else if (sub.count > 0) this.append(this.properties, false);
    else if (this.properties.dots) this.append(this.properties, true);
    else drawn.buttDots++;
    sub.clear();
  }

  private append(properties: StrokeProperties, dot: boolean): void {
    const { sub, builder } = this;
    this.drawn.strokes++;
    this.first.push(builder.count);
    if (dot) builder.line(sub.startX, sub.startY, sub.startX, sub.startY);
    else sub.appendTo(builder);
    this.closed.push(sub.closed && !dot ? 1 : 0);
    this.dot.push(dot ? 1 : 0);
    this.colour.push(properties.colour);
    this.layer.push(properties.layer);
    this.element.push(properties.element);
    this.widthMm.push(properties.widthMm);
  }

  private measure(): void {
    const segments = this.sub.view();
    for (let i = 0; i < segments.count; i++) this.drawn.outlineMm += segmentLength(segments, i);
  }
}
