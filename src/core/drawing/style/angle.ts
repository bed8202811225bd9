import type { Quantity } from './calc.js';

const DEGREES_IN: ReadonlyMap<string, number> = new Map([
  ['deg', 1],
  ['grad', 0.9],
  ['rad', 180 / Math.PI],
  ['turn', 360],
]);

/** Reads units for `evaluate`: angles in degrees (CSS Values and Units Module Level 4, §7.1), plain numbers. */
export function angleOrNumber(value: number, unit: string): Quantity | null {
  if (unit === '') return { kind: 'number', value };
  const degrees = DEGREES_IN.get(unit);
  return degrees === undefined ? null : { kind: 'angle', value: value * degrees };
}
