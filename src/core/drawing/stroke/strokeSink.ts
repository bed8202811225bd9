import { type Affine, IDENTITY } from '../../geometry/affine.js';
import { cutDashes, type DashPattern } from '../../geometry/dashes.js';
import { segmentLength } from '../../geometry/length.js';
import type { Region } from '../../geometry/region.js';
import { LINE, SegmentBuilder, type Segments } from '../../geometry/segments.js';
import { appendTransformed } from '../../geometry/transform.js';
import { Column } from '../column.js';
import type { Strokes } from '../drawing.js';
import { DEFAULT_LIMITS, type ReadingLimits } from '../readingLimits.js';
import { orTooLarge } from '../tooLarge.js';
import { type Clipping, nothingClipped, StrokeClipper } from './strokeClipper.js';
import { isDrawable, pastSegments } from './subPath.js';
import { SubPathSink } from './subPathSink.js';

/** What the strokes of one element have in common. */
export interface StrokeProperties {
  readonly colour: number;
  readonly layer: number;
  readonly element: number;
  readonly widthMm: number;
  /** What the lines are cut to; null where to the page at most. */
  readonly clip: Region | null;
  /** Sub-paths of zero length are dots: the caps are round or square. */
  readonly dots: boolean;
  /** The line is dashed in the drawing, whether or not it is drawn so. */
  readonly dashed: boolean;
  /** null where it is drawn in one piece. */
  readonly dash: Dash | null;
}

/** How a line is dashed. */
export interface Dash {
  /** In the element's user units, or in mm where the stroke does not scale. */
  readonly pattern: DashPattern;
  readonly inMm: boolean;
}

/** What became of one element. */
export interface Drawn {
  strokes: number;
  /** Sub-paths of zero length with butt caps, which nothing is drawn for. */
  buttDots: number;
  /** Sub-paths with a number that is not finite or too far out. */
  overflows: number;
  /** Sub-paths that would have been cut into more dashes than a drawing may have. */
  undashed: number;
  /** Length of what was measured instead of drawn. */
  outlineMm: number;
  readonly clipping: Clipping;
}

/** Gathers the strokes of a drawing: one per sub-path, in the order in which they come. */
export class StrokeSink extends SubPathSink {
  /** Segments drawn or measured so far. */
  segmentsSeen = 0;
  /** Something of the element has an inside: a curve, or more than one line in a row. */
  hasArea = false;
  readonly clipper = new StrokeClipper();
  private readonly builder = new SegmentBuilder();
  private readonly first = new Column();
  private readonly colour = new Column();
  private readonly layer = new Column();
  private readonly element = new Column();
  private readonly closed = new Column();
  private readonly dot = new Column();
  private readonly dashed = new Column();
  private readonly widthMm: number[] = [];
  private properties: StrokeProperties | null = null;
  private dash: Dash | null = null;
  private mapOfDashes: Affine | null = null;
  /** Dashes cut so far. */
  private dashes = 0;
  private drawn: Drawn = nothingDrawn();

  /** Throws Unreadable past the limit of segments, or where memory is short. */
  constructor(private readonly limits: Pick<ReadingLimits, 'segments' | 'dashes'> = DEFAULT_LIMITS) {
    super(limits.segments);
  }

  /** Begins an element; with `properties` null its paths are measured, not drawn. */
  begin(map: Affine, properties: StrokeProperties | null): void {
    const dash = properties?.dash ?? null;
    this.dash = dash;
    // A pattern in user units is laid along the line there, and the dashes are mapped then.
    this.mapOfDashes = dash && !dash.inMm ? map : null;
    this.sub.setMap(this.mapOfDashes ? IDENTITY : map);
    this.properties = properties;
    this.hasArea = false;
    this.drawn = nothingDrawn();
  }

  end(): Drawn {
    this.endSubPath();
    return this.drawn;
  }

  finish(): Strokes {
    const count = this.closed.length;
    const first = new Uint32Array(count + 1);
    first.set(this.first.values.subarray(0, count));
    first[count] = this.builder.count;
    return {
      segments: orTooLarge(() => this.builder.finish()),
      count,
      first,
      closed: Uint8Array.from(this.closed.values.subarray(0, count)),
      dot: Uint8Array.from(this.dot.values.subarray(0, count)),
      dashed: Uint8Array.from(this.dashed.values.subarray(0, count)),
      colour: this.colour.values.slice(0, count),
      layer: this.layer.values.slice(0, count),
      element: this.element.values.slice(0, count),
      widthMm: new Float64Array(this.widthMm),
    };
  }

  protected override endSubPath(): void {
    const { sub, drawn } = this;
    if (!sub.started) return;
    this.segmentsSeen += sub.count;
    if (this.segmentsSeen > this.limits.segments) throw pastSegments(this.limits.segments);
    if (sub.count > 1 || (sub.count === 1 && sub.view().kind[0] !== LINE)) this.hasArea = true;
    if (!sub.drew) {
      // A lone moveto draws nothing, dots included (SVG 2, "Zero length path segments").
    } else if (!isDrawable(sub.view(), sub.startX, sub.startY)) drawn.overflows++;
    else if (!this.properties) this.measure();
    else if (sub.count > 0) this.line(this.properties);
    else if (this.properties.dots) this.lone(this.properties);
    else drawn.buttDots++;
    sub.clear();
  }

  private line(properties: StrokeProperties): void {
    const { sub, dash, drawn } = this;
    const dashes = dash && cutDashes(sub.view(), sub.closed, dash.pattern, this.limits.dashes - this.dashes);
    if (dash && !dashes) drawn.undashed++;
    if (!dashes || dashes.whole) {
      this.stroke(properties, this.mapped(sub.view(), 0, sub.count), sub.closed, false);
      return;
    }
    const { first, dot, segments } = dashes;
    this.dashes += dot.length;
    this.segmentsSeen += dashes.segments.count;
    if (this.segmentsSeen > this.limits.segments) throw pastSegments(this.limits.segments);
    for (let k = 0; k < dot.length; k++) {
      if (dot[k] && !properties.dots) continue;
      this.stroke(properties, this.mapped(segments, first[k], first[k + 1]), false, dot[k]);
    }
  }

  /** A sub-path of zero length. */
  private lone(properties: StrokeProperties): void {
    const { startX: x, startY: y } = this.sub;
    const point = new SegmentBuilder();
    point.line(x, y, x, y);
    this.stroke(properties, this.mapped(point.finish(), 0, 1), false, true);
  }

  private mapped(segments: Segments, from: number, to: number): Segments {
    if (!this.mapOfDashes && from === 0 && to === segments.count) return segments;
    const builder = new SegmentBuilder();
    if (this.mapOfDashes) appendTransformed(builder, segments, from, to, this.mapOfDashes);
    else builder.append(segments, from, to);
    return builder.finish();
  }

  private stroke(properties: StrokeProperties, segments: Segments, closed: boolean, dot: boolean): void {
    if (this.mapOfDashes && !isDrawable(segments, 0, 0)) {
      this.drawn.overflows++;
      return;
    }
    this.clipper.clip(segments, closed, dot, properties.clip, this.drawn.clipping, (left, leftClosed) =>
      this.append(properties, left, leftClosed, dot),
    );
  }

  private append(properties: StrokeProperties, segments: Segments, closed: boolean, dot: boolean): void {
    const { builder } = this;
    this.drawn.strokes++;
    this.first.push(builder.count);
    addTo(builder, segments);
    this.closed.push(closed ? 1 : 0);
    this.dot.push(dot ? 1 : 0);
    this.dashed.push(properties.dashed ? 1 : 0);
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

function nothingDrawn(): Drawn {
  return { strokes: 0, buttDots: 0, overflows: 0, undashed: 0, outlineMm: 0, clipping: nothingClipped() };
}

function addTo(builder: SegmentBuilder, segments: Segments): void {
  orTooLarge(() => builder.append(segments));
}
