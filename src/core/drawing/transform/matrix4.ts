import type { Affine } from '../../geometry/affine.js';
import { sinCosDegrees } from '../../geometry/trig.js';

/** Sixteen numbers, column by column, as in matrix3d(). */
export type Matrix4 = readonly number[];

/** An affine map of the plane, which leaves z as it is. */
export function fromAffine([a, b, c, d, e, f]: Affine): Matrix4 {
  return [a, b, 0, 0, c, d, 0, 0, 0, 0, 1, 0, e, f, 0, 1];
}

/** What is left of it on a flat element: z is dropped, and so is perspective, as browsers draw SVG elements. */
export function flattened(m: Matrix4): Affine {
  return [m[0], m[1], m[4], m[5], m[12], m[13]];
}

/** First n, then m. */
export function multiply4(m: Matrix4, n: Matrix4): Matrix4 {
  const product: number[] = [];
  for (let column = 0; column < 4; column++) {
    for (let row = 0; row < 4; row++) {
      let sum = 0;
      for (let k = 0; k < 4; k++) sum += m[4 * k + row] * n[4 * column + k];
      product.push(sum);
    }
  }
  return product;
}

export function translation4(x: number, y: number, z: number): Matrix4 {
  return [1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0, x, y, z, 1];
}

export function scaling4(x: number, y: number, z: number): Matrix4 {
  return [x, 0, 0, 0, 0, y, 0, 0, 0, 0, z, 0, 0, 0, 0, 1];
}

export function perspective4(distance: number): Matrix4 {
  // Distances below 1 px count as 1 px (CSS Transforms Module Level 2, "perspective()").
  return [1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, -1 / Math.max(1, distance), 0, 0, 0, 1];
}

/** About the axis x, y, z; the identity where that has no length (CSS Transforms Module Level 2, §13). */
export function rotation4(x: number, y: number, z: number, degrees: number): Matrix4 {
  const length = Math.sqrt(x * x + y * y + z * z);
  if (!(length > 0)) return scaling4(1, 1, 1);
  const [u, v, w] = [x / length, y / length, z / length];
  const sc = new Float64Array(2);
  sinCosDegrees(degrees, sc);
  const [s, c] = sc;
  const t = 1 - c;
  return [
    ...[t * u * u + c, t * u * v + s * w, t * u * w - s * v, 0],
    ...[t * u * v - s * w, t * v * v + c, t * v * w + s * u, 0],
    ...[t * u * w + s * v, t * v * w - s * u, t * w * w + c, 0],
    ...[0, 0, 0, 1],
  ];
}
