import type { Drawing } from '../../src/core/drawing/drawing.ts';
import { NO_LAYER } from '../../src/core/drawing/drawing.ts';
import { DEFAULT_READING } from '../../src/core/drawing/readingRules.ts';
import { SegmentBuilder } from '../../src/core/geometry/segments.ts';

/** One stroke for a made-up drawing; points in mm. */
export type StrokeSpec =
  | {
      readonly line: readonly (readonly [number, number])[];
      readonly closed?: boolean;
      readonly colour?: string;
    }
  | { readonly cubic: readonly (readonly [number, number])[]; readonly colour?: string }
  | { readonly circle: readonly [number, number, number]; readonly colour?: string }
  | { readonly dot: readonly [number, number]; readonly colour?: string };

/** A drawing made without reading any text, so that tests of later parts do not rest on the reader. */
export function drawingOf(specs: readonly StrokeSpec[], widthMm = 100, heightMm = 100): Drawing {
  const builder = new SegmentBuilder();
  const first = [0];
  const colours: string[] = [];
  const column = { closed: [] as number[], dot: [] as number[], colour: [] as number[] };
  for (const spec of specs) {
    const isDot = 'dot' in spec;
    const closed = 'circle' in spec || ('line' in spec && spec.closed === true);
    if ('dot' in spec) builder.line(...spec.dot, ...spec.dot);
    else if ('line' in spec) addLine(builder, spec.line, closed);
    else if ('cubic' in spec) addCubic(builder, spec.cubic);
    else addCircle(builder, ...spec.circle);
    first.push(builder.count);
    column.closed.push(closed ? 1 : 0);
    column.dot.push(isDot ? 1 : 0);
    const colour = spec.colour ?? '#000000';
    if (!colours.includes(colour)) colours.push(colour);
    column.colour.push(colours.indexOf(colour));
  }
  const count = specs.length;
  return {
    name: 'made up',
    title: null,
    description: null,
    widthMm,
    heightMm,
    elementCount: count,
    strokes: {
      segments: builder.finish(),
      count,
      first: Uint32Array.from(first),
      closed: Uint8Array.from(column.closed),
      dot: Uint8Array.from(column.dot),
      dashed: new Uint8Array(count),
      colour: Uint32Array.from(column.colour),
      layer: new Uint32Array(count).fill(NO_LAYER),
      element: Uint32Array.from({ length: count }, (_, i) => i),
      widthMm: new Float64Array(count).fill(0.3),
    },
    colours,
    layers: [],
    places: specs.map(() => ({ element: 'path', id: null, line: null, column: null })),
    findings: [],
    reading: DEFAULT_READING,
  };
}

function addLine(
  builder: SegmentBuilder,
  points: readonly (readonly [number, number])[],
  closed: boolean,
): void {
  const all = closed ? [...points, points[0]] : points;
  for (let i = 1; i < all.length; i++) builder.line(...all[i - 1], ...all[i]);
}

function addCubic(builder: SegmentBuilder, points: readonly (readonly [number, number])[]): void {
  for (let i = 0; i + 3 < points.length; i += 3) {
    builder.cubic(...points[i], ...points[i + 1], ...points[i + 2], ...points[i + 3]);
  }
}

/** Four quarter arcs from 3 o'clock. */
function addCircle(builder: SegmentBuilder, cx: number, cy: number, r: number): void {
  const at: [number, number][] = [
    [cx + r, cy],
    [cx, cy + r],
    [cx - r, cy],
    [cx, cy - r],
  ];
  for (let q = 0; q < 4; q++) {
    builder.arc(...at[q], ...at[(q + 1) % 4], cx, cy, r, 0, 0, r, (q * Math.PI) / 2, Math.PI / 2);
  }
}
