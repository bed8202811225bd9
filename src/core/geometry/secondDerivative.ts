import { CUBIC, LINE, type Segments } from './segments.js';
import { sinCos } from './trig.js';

/** The second derivative of segment i by t: out[0] = d²x/dt², out[1] = d²y/dt². */
export function secondDerivativeAt(segments: Segments, i: number, t: number, out: Float64Array): void {
  const d = segments.data;
  const o = segments.offset[i];
  const kind = segments.kind[i];
  if (kind === LINE) {
    out[0] = 0;
    out[1] = 0;
  } else if (kind === CUBIC) {
    out[0] = 6 * ((1 - t) * (d[o] - 2 * d[o + 4] + d[o + 6]) + t * (d[o + 4] - 2 * d[o + 6] + d[o + 2]));
    out[1] = 6 * ((1 - t) * (d[o + 1] - 2 * d[o + 5] + d[o + 7]) + t * (d[o + 5] - 2 * d[o + 7] + d[o + 3]));
  } else {
    const w = d[o + 11];
    sinCos(d[o + 10] + t * w, out);
    const sin = out[0];
    const cos = out[1];
    out[0] = -w * w * (d[o + 6] * cos + d[o + 8] * sin);
    out[1] = -w * w * (d[o + 7] * cos + d[o + 9] * sin);
  }
}
