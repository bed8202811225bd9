/**
 * Numbers as text that every reader takes: plain digits with at most `decimals` places, no exponent,
 * no "-0", no trailing zeros. A coordinate is first made a whole number of steps of 10^-decimals, so
 * that "the same as written" is equality of whole numbers.
 */

const MOST_DECIMALS = 9;
const POWER = Float64Array.from({ length: MOST_DECIMALS + 1 }, (_, i) => Number(`1e${i}`));

/**
 * The nearest whole number of steps of 10^-decimals; never -0. Throws RangeError where that is no
 * exact integer (not finite, or beyond 2^53 steps).
 */
export function toSteps(value: number, decimals: number): number {
  const steps = Math.round(value * POWER[decimals]) + 0;
  if (!Number.isSafeInteger(steps)) throw new RangeError(`cannot write ${value} with ${decimals} decimals`);
  return steps;
}

/** Steps of 10^-decimals as text, exactly. */
export function formatSteps(steps: number, decimals: number): string {
  const power = POWER[decimals];
  const size = Math.abs(steps);
  const whole = Math.floor(size / power);
  const rest = size - whole * power;
  const sign = steps < 0 ? '-' : '';
  if (rest === 0) return `${sign}${whole}`;
  let digits = String(rest).padStart(decimals, '0');
  let end = digits.length;
  while (digits.charCodeAt(end - 1) === 48) end--;
  digits = digits.slice(0, end);
  return `${sign}${whole}.${digits}`;
}

/** `value` rounded to `decimals` places, as text. */
export function formatDecimal(value: number, decimals: number): string {
  return formatSteps(toSteps(value, decimals), decimals);
}
