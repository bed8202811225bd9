import type { LineSet } from '../../src/core/audit/lineSet.ts';
import { flattenSegment } from '../../src/core/geometry/flatten.ts';
import { CUBIC, LINE, SegmentBuilder, type Segments } from '../../src/core/geometry/segments.ts';
import { appendSpan } from '../../src/core/geometry/split.ts';
import { appendTransformed } from '../../src/core/geometry/transform.ts';

/** One segment: its kind and its numbers, as in `Segments`. */
export interface Segment {
  readonly kind: number;
  readonly data: readonly number[];
}

/** One chain of segments, easy to take apart and put together again. */
export interface Chain {
  readonly pen: number;
  readonly segments: readonly Segment[];
  readonly dot?: boolean;
}

export function lineSetOf(chains: readonly Chain[]): LineSet {
  const kind: number[] = [];
  const offset: number[] = [];
  const data: number[] = [];
  const first = [0];
  for (const chain of chains) {
    for (const segment of chain.segments) {
      kind.push(segment.kind);
      offset.push(data.length);
      for (const value of segment.data) data.push(value);
    }
    first.push(kind.length);
  }
  const segments = {
    count: kind.length,
    kind: Uint8Array.from(kind),
    offset: Uint32Array.from(offset),
    data: Float64Array.from(data),
  };
  return {
    segments,
    count: chains.length,
    first: Uint32Array.from(first),
    pen: Uint32Array.from(chains, (c) => c.pen),
    dot: Uint8Array.from(chains, (c) => (c.dot ? 1 : 0)),
  };
}

export function segmentsOf(built: Segments): Segment[] {
  return Array.from(built.kind, (kind, i) => ({
    kind,
    data: Array.from(built.data.slice(built.offset[i], built.offset[i + 1] ?? built.data.length)),
  }));
}

/** The chains of a line set, to take apart. */
export function chainsOf({ segments, count, first, pen, dot }: LineSet): Chain[] {
  const all = segmentsOf(segments);
  return Array.from({ length: count }, (_, c) => {
    const chain = { pen: pen[c], segments: all.slice(first[c], first[c + 1]) };
    return dot[c] ? { ...chain, dot: true } : chain;
  });
}

/** The segments that `build` adds. */
export function built(build: (builder: SegmentBuilder) => void): Segment[] {
  const builder = new SegmentBuilder();
  build(builder);
  return segmentsOf(builder.finish());
}

export function polyline(points: readonly (readonly [number, number])[], pen = 0): Chain {
  return {
    pen,
    segments: points.slice(1).map((p, i) => ({ kind: LINE, data: [...points[i], ...p] })),
  };
}

export function dotAt(x: number, y: number, pen = 0): Chain {
  return { pen, dot: true, segments: [{ kind: LINE, data: [x, y, x, y] }] };
}

export function cubic(points: readonly (readonly [number, number])[], pen = 0): Chain {
  const [p, a, b, q] = points;
  return { pen, segments: [{ kind: CUBIC, data: [...p, ...q, ...a, ...b] }] };
}

/** An arc of an ellipse with half-axes rx, ry along x and y, in `pieces` segments. */
export function ellipseArc(
  cx: number,
  cy: number,
  rx: number,
  ry: number,
  theta0: number,
  sweep: number,
  pieces = 1,
  pen = 0,
): Chain {
  const at = (theta: number) => [cx + rx * Math.cos(theta), cy + ry * Math.sin(theta)] as const;
  const whole = Math.abs(sweep) === 2 * Math.PI;
  const segments: Segment[] = [];
  let from = at(theta0);
  for (let k = 0; k < pieces; k++) {
    const to = whole && k === pieces - 1 ? at(theta0) : at(theta0 + (sweep * (k + 1)) / pieces);
    segments.push({
      kind: 2,
      data: [...from, ...to, cx, cy, rx, 0, 0, ry, theta0 + (sweep * k) / pieces, sweep / pieces],
    });
    from = to;
  }
  return { pen, segments };
}

export function startOf(chain: Chain): [number, number] {
  const { data } = chain.segments[0];
  return [data[0], data[1]];
}

export function endOf(chain: Chain): [number, number] {
  const { data } = chain.segments[chain.segments.length - 1];
  return [data[2], data[3]];
}

export function isClosed(chain: Chain): boolean {
  const [a, b] = [startOf(chain), endOf(chain)];
  return !chain.dot && a[0] === b[0] && a[1] === b[1];
}

/** The piece of a segment from t0 to t1, backwards where t1 < t0. */
export function spanOf(segment: Segment, t0: number, t1: number): Segment {
  const { segments } = lineSetOf([{ pen: 0, segments: [segment] }]);
  return built((b) => appendSpan(b, segments, 0, t0, t1))[0];
}

export function reversed(chain: Chain): Chain {
  return { ...chain, segments: chain.segments.map((s) => spanOf(s, 1, 0)).reverse() };
}

export function moved(chain: Chain, dx: number, dy: number): Chain {
  const { segments } = lineSetOf([chain]);
  return {
    ...chain,
    segments: built((b) => appendTransformed(b, segments, 0, segments.count, [1, 0, 0, 1, dx, dy])),
  };
}

/** Lines that stay within `accuracyMm` of the chain. */
export function flattened(chain: Chain, accuracyMm: number): Chain {
  if (chain.dot) return chain;
  const { segments } = lineSetOf([chain]);
  const points: [number, number][] = [startOf(chain)];
  for (let i = 0; i < segments.count; i++) {
    flattenSegment(segments, i, 0, 1, accuracyMm, (x, y) => points.push([x, y]));
  }
  return polyline(points, chain.pen);
}

/** Every number of lines and cubics, and the ends of arcs, rounded to a step. */
export function rounded(chain: Chain, step: number): Chain {
  const round = (v: number) => Math.round(v / step) * step;
  return {
    ...chain,
    segments: chain.segments.map(({ kind, data }) => ({
      kind,
      data: kind === 2 ? [...data.slice(0, 4).map(round), ...data.slice(4)] : data.map(round),
    })),
  };
}

/** A line as the cubic with the same points at the same speed. */
export function asCubic({ kind, data }: Segment): Segment {
  if (kind !== LINE) return { kind, data };
  const [x0, y0, x1, y1] = data;
  const along = (t: number) => [x0 + t * (x1 - x0), y0 + t * (y1 - y0)];
  return { kind: CUBIC, data: [x0, y0, x1, y1, ...along(1 / 3), ...along(2 / 3)] };
}
