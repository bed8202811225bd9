import { sinCos } from './trig.js';

/**
 * An affine map [a b c d e f], as in SVG's matrix(): x' = a·x + c·y + e, y' = b·x + d·y + f.
 */
export type Affine = readonly [number, number, number, number, number, number];

export const IDENTITY: Affine = [1, 0, 0, 1, 0, 0];

/** m after n: the result maps by n first, then by m, as nested SVG transforms do. */
export function multiply(m: Affine, n: Affine): Affine {
  return [
    m[0] * n[0] + m[2] * n[1],
    m[1] * n[0] + m[3] * n[1],
    m[0] * n[2] + m[2] * n[3],
    m[1] * n[2] + m[3] * n[3],
    m[0] * n[4] + m[2] * n[5] + m[4],
    m[1] * n[4] + m[3] * n[5] + m[5],
  ];
}

export function translation(x: number, y: number): Affine {
  return [1, 0, 0, 1, x, y];
}

export function scaling(sx: number, sy: number): Affine {
  return [sx, 0, 0, sy, 0, 0];
}

/** Turns x towards y: clockwise on a page whose y points down. */
export function rotation(radians: number): Affine {
  const sc = new Float64Array(2);
  sinCos(radians, sc);
  return [sc[1], sc[0], -sc[0], sc[1], 0, 0];
}

export function applyX(m: Affine, x: number, y: number): number {
  return m[0] * x + m[2] * y + m[4];
}

export function applyY(m: Affine, x: number, y: number): number {
  return m[1] * x + m[3] * y + m[5];
}

/** The factor by which m scales areas; negative where it mirrors, 0 where it flattens. */
export function determinant(m: Affine): number {
  return m[0] * m[3] - m[1] * m[2];
}
