import Flatbush from 'flatbush';

/** Knots of the scale that spreads unevenly placed boxes. */
const KNOTS = 256;
const SAMPLES = 4096;

/**
 * Boxes that can be asked which of them touch another box. None at all is allowed. Coordinates finite.
 *
 * The index underneath sorts boxes on a grid of 2¹⁶ steps over their whole extent, so a far outlier
 * would put all the others into one step. Where the middle four fifths of the boxes take up less than
 * 1/256 of an axis, that axis is rescaled through its quantiles; a monotone scale keeps what touches.
 */
export class BoxIndex {
  private readonly index: Flatbush | null;
  private readonly scaleX: Scale | null;
  private readonly scaleY: Scale | null;

  /** @param boxes minX, minY, maxX, maxY of each. */
  constructor(boxes: Float64Array) {
    const count = boxes.length >> 2;
    this.scaleX = scaleFor(boxes, 0);
    this.scaleY = scaleFor(boxes, 1);
    if (count === 0) {
      this.index = null;
      return;
    }
    const index = new Flatbush(count);
    for (let i = 0; i < boxes.length; i += 4) {
      index.add(
        place(this.scaleX, boxes[i]),
        place(this.scaleY, boxes[i + 1]),
        place(this.scaleX, boxes[i + 2]),
        place(this.scaleY, boxes[i + 3]),
      );
    }
    index.finish();
    this.index = index;
  }

  /** Calls `visit` with every box that may touch the given one, until it returns true. */
  visit(minX: number, minY: number, maxX: number, maxY: number, visit: (i: number) => boolean): void {
    this.index?.collides(
      place(this.scaleX, minX),
      place(this.scaleY, minY),
      place(this.scaleX, maxX),
      place(this.scaleY, maxY),
      visit,
    );
  }
}

type Scale = Float64Array;

function scaleFor(boxes: Float64Array, axis: number): Scale | null {
  const count = boxes.length >> 2;
  if (count < 64) return null;
  const size = Math.min(count, SAMPLES);
  const sample = new Float64Array(size);
  for (let i = 0; i < size; i++) sample[i] = boxes[4 * Math.floor((i * count) / size) + axis];
  sample.sort();
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  for (let i = axis; i < boxes.length; i += 4) {
    if (boxes[i] < low) low = boxes[i];
    if (boxes[i + 2] > high) high = boxes[i + 2];
  }
  const middle = sample[Math.floor(0.9 * (size - 1))] - sample[Math.floor(0.1 * (size - 1))];
  if (!(high - low > 256 * middle)) return null;
  const knots = [low];
  for (let k = 1; k < KNOTS; k++) {
    const at = sample[Math.floor((k * (size - 1)) / KNOTS)];
    if (at > knots[knots.length - 1]) knots.push(at);
  }
  if (high > knots[knots.length - 1]) knots.push(high);
  return Float64Array.from(knots);
}

/** Knot k at k, linear between, held fast outside: computed so that it never falls. */
function place(scale: Scale | null, v: number): number {
  if (!scale) return v;
  let low = 0;
  let high = scale.length - 1;
  if (v <= scale[0]) return 0;
  if (v >= scale[high]) return high;
  while (high - low > 1) {
    const mid = (low + high) >> 1;
    if (scale[mid] <= v) low = mid;
    else high = mid;
  }
  return low + Math.min(1, (v - scale[low]) / (scale[high] - scale[low]));
}
