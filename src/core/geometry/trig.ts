/**
 * Sine, cosine and arc tangent from exactly rounded operations only (+ − × ÷), so that every engine
 * gives the same bits; ECMAScript leaves Math.sin and the like to the implementation.
 *
 * Source: the kernels of fdlibm 5.3 (Sun Microsystems 1993, freely distributable): minimax polynomials
 * on [−π/4, π/4], Cody–Waite reduction by π/2 in three parts. Accuracy: below 1 ulp.
 */

const TWO_OVER_PI = 2 / Math.PI;

// π/2 as a sum of parts of 33 bits: n × part is exact for n < 2^20.
const HALF_PI_1 = 1.5707963267341256;
const HALF_PI_2 = 6.077100506303966e-11;
const HALF_PI_3 = 2.0222662487111665e-21;
const HALF_PI_3_TAIL = 8.4784276603689e-32;

/** Largest angle, in radians, for which the reduction keeps its full accuracy. */
const LARGEST_ANGLE = 8e5;

/**
 * out[0] = sin(angle), out[1] = cos(angle); angle in radians.
 *
 * Accuracy: below 1 ulp for |angle| ≤ 8e5; larger angles are first taken modulo the double nearest 2π.
 * NaN for an angle that is not finite.
 */
export function sinCos(angle: number, out: Float64Array): void {
  const x = Math.abs(angle) > LARGEST_ANGLE ? angle % (2 * Math.PI) : angle;
  const n = Math.round(x * TWO_OVER_PI);
  const a = x - n * HALF_PI_1;
  const w2 = n * HALF_PI_2;
  const b = a - w2;
  const lost2 = a - b - w2;
  const w3 = n * HALF_PI_3;
  const c = b - w3;
  const tail = n * HALF_PI_3_TAIL - (b - c - w3) - lost2;
  const high = c - tail;
  const low = c - high - tail;
  turn(n, kernelSin(high, low), kernelCos(high, low), out);
}

/**
 * As `sinCos` for an angle in degrees: whole turns are taken off exactly, and multiples of 90° give
 * exactly 0, 1 or −1.
 */
export function sinCosDegrees(degrees: number, out: Float64Array): void {
  const d = degrees % 360;
  const n = Math.round(d / 90);
  // Exact by Sterbenz's lemma: d and 90 n are within a factor of two, or n is 0.
  const r = ((d - 90 * n) * Math.PI) / 180;
  turn(n, kernelSin(r, 0), kernelCos(r, 0), out);
}

function turn(quarters: number, sin: number, cos: number, out: Float64Array): void {
  switch (((quarters % 4) + 4) % 4) {
    case 1:
      out[0] = cos;
      out[1] = 0 - sin;
      return;
    case 2:
      out[0] = 0 - sin;
      out[1] = 0 - cos;
      return;
    case 3:
      out[0] = 0 - cos;
      out[1] = sin;
      return;
    default:
      out[0] = sin;
      out[1] = cos;
  }
}

function kernelSin(x: number, tail: number): number {
  const z = x * x;
  const v = z * x;
  const r =
    8.33333333332249e-3 +
    z *
      (-1.984126982985795e-4 +
        z * (2.7557313707070068e-6 + z * (-2.5050760253406863e-8 + z * 1.58969099521155e-10)));
  return x - (z * (0.5 * tail - v * r) - tail - v * -0.16666666666666632);
}

function kernelCos(x: number, tail: number): number {
  const z = x * x;
  const w = z * z;
  const r =
    z * (4.1666666666666602e-2 + z * (-1.388888888887411e-3 + z * 2.480158728947673e-5)) +
    w * w * (-2.7557314351390663e-7 + z * (2.087572321298175e-9 + z * -1.1359647557788195e-11));
  const half = 0.5 * z;
  const top = 1 - half;
  return top + (1 - top - half + (z * r - x * tail));
}

/** Beyond this slope an angle is π/2 to the last bit. */
const LARGEST_SLOPE = 2 ** 60;
/** π minus the double nearest it. */
const PI_LOW = 1.2246467991473532e-16;

const ATAN_HIGH = [0.4636476090008061, Math.PI / 4, 0.982793723247329, Math.PI / 2] as const;
const ATAN_LOW = [
  2.2698777452961687e-17, 3.061616997868383e-17, 1.3903311031230998e-17, 6.123233995736766e-17,
] as const;

/** The angle of (x, y) in radians, in [−π, π], signs of zero as in ECMAScript. Accuracy: below 1 ulp or so. */
export function atan2(y: number, x: number): number {
  if (Number.isNaN(x) || Number.isNaN(y)) return Number.NaN;
  const left = x < 0 || Object.is(x, -0);
  const below = y < 0 || Object.is(y, -0);
  const ay = Math.abs(y);
  const ax = Math.abs(x);
  const steep = ay > ax * LARGEST_SLOPE || (ay > 0 && ax === 0);
  if (steep) return below ? -Math.PI / 2 : Math.PI / 2;
  const a = ay === Number.POSITIVE_INFINITY ? Math.PI / 4 : ay === 0 ? 0 : atan(ay / ax);
  const turned = left ? Math.PI - (a - PI_LOW) : a;
  return below ? -turned : turned;
}

function atan(x: number): number {
  if (x < 0.4375) return x - x * atanSeries(x);
  const id = x < 0.6875 ? 0 : x < 1.1875 ? 1 : x < 2.4375 ? 2 : 3;
  const r =
    id === 0
      ? (2 * x - 1) / (2 + x)
      : id === 1
        ? (x - 1) / (x + 1)
        : id === 2
          ? (x - 1.5) / (1 + 1.5 * x)
          : -1 / x;
  return ATAN_HIGH[id] - (r * atanSeries(r) - ATAN_LOW[id] - r);
}

/** 1 − atan(x)/x for |x| < 7/16. */
function atanSeries(x: number): number {
  const z = x * x;
  const w = z * z;
  const even =
    z *
    (0.3333333333333293 +
      w *
        (0.14285714272503466 +
          w *
            (9.090887133436507e-2 +
              w * (6.661073137387531e-2 + w * (4.976877994615932e-2 + w * 1.6285820115365782e-2)))));
  const odd =
    w *
    (-0.19999999999876483 +
      w *
        (-0.11111110405462356 +
          w * (-7.69187620504483e-2 + w * (-5.833570133790573e-2 + w * -3.6531572744216916e-2))));
  return even + odd;
}
