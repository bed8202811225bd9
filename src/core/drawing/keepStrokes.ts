import { SegmentBuilder } from '../geometry/segments.js';
import type { Strokes } from './drawing.js';

/** The strokes for which `isKept` holds, in their order. O(segments). */
export function keepStrokes(strokes: Strokes, isKept: (stroke: number) => boolean): Strokes {
  const kept: number[] = [];
  for (let s = 0; s < strokes.count; s++) if (isKept(s)) kept.push(s);
  const { segments } = strokes;
  const builder = new SegmentBuilder();
  const first = new Uint32Array(kept.length + 1);
  kept.forEach((s, k) => {
    first[k] = builder.count;
    builder.append(segments, strokes.first[s], strokes.first[s + 1]);
  });
  first[kept.length] = builder.count;
  return {
    segments: builder.finish(),
    count: kept.length,
    first,
    closed: Uint8Array.from(kept, (s) => strokes.closed[s]),
    dot: Uint8Array.from(kept, (s) => strokes.dot[s]),
    dashed: Uint8Array.from(kept, (s) => strokes.dashed[s]),
    colour: Uint32Array.from(kept, (s) => strokes.colour[s]),
    layer: Uint32Array.from(kept, (s) => strokes.layer[s]),
    element: Uint32Array.from(kept, (s) => strokes.element[s]),
    widthMm: Float64Array.from(kept, (s) => strokes.widthMm[s]),
  };
}
