/**
 * The integral from a to b of a function that is analytic but for branch points like √(t − z) at
 * z = re ± im·i, given as pairs re, im (not finite = none).
 *
 * Ten-point Gauss–Legendre quadrature errs by about ρ⁻²⁰ of the function's size, where a branch point
 * lies on the ellipse with foci a and b whose axes are ρ + 1/ρ and ρ − 1/ρ times (b − a)/2 (Trefethen,
 * L. N. (2008), Is Gauss quadrature better than Clenshaw–Curtis?, SIAM Review 50(1), theorem 4.5). So
 * the interval is cut at each `re` and halved until ρ ≥ 3.5: no comparing of estimates, which a dip
 * between the nodes can fool. A branch point within 10⁻⁶ of the interval's length of the real line is
 * a corner of |t − re|, harmless once the interval is cut there; that costs some 10⁻¹¹.
 *
 * Accuracy: relative 1e-10. Cost: 10 values where no branch point is near, else 10 more for each
 * halving towards one, at most 20 on either side.
 */
export function integrate(
  f: (t: number) => number,
  a: number,
  b: number,
  branches: readonly number[],
): number {
  const cuts = [a, b];
  const near: number[] = [];
  for (let k = 0; k < branches.length; k += 2) {
    const re = branches[k];
    const im = branches[k + 1];
    if (!Number.isFinite(re) || !Number.isFinite(im)) continue;
    if (re > a && re < b) cuts.push(re);
    if (Math.abs(im) > CORNER * (b - a)) near.push(re, im);
  }
  cuts.sort((x, y) => x - y);
  let total = 0;
  for (let k = 1; k < cuts.length; k++) total += graded(f, cuts[k - 1], cuts[k], near, DEEPEST);
  return total;
}

const CORNER = 1e-6;
const DEEPEST = 30;
/** ρ + 1/ρ for ρ = 3.5, less a little. */
const ELLIPSE = 3.78;

function graded(
  f: (t: number) => number,
  a: number,
  b: number,
  near: readonly number[],
  depth: number,
): number {
  if (depth === 0 || isClear(a, b, near)) return gauss(f, a, b);
  const m = (a + b) / 2;
  return graded(f, a, m, near, depth - 1) + graded(f, m, b, near, depth - 1);
}

function isClear(a: number, b: number, near: readonly number[]): boolean {
  for (let k = 0; k < near.length; k += 2) {
    // In units of the interval, which may be as short as it likes.
    const fromA = (near[k] - a) / (b - a);
    const fromB = (near[k] - b) / (b - a);
    const im = near[k + 1] / (b - a);
    const sum = Math.sqrt(fromA * fromA + im * im) + Math.sqrt(fromB * fromB + im * im);
    if (sum < ELLIPSE / 2) return false;
  }
  return true;
}

// Abramowitz, M., Stegun, I. A. (1964), Handbook of Mathematical Functions, table 25.4, n = 10.
const NODES = [
  0.1488743389816312, 0.4333953941292472, 0.6794095682990244, 0.8650633666889845, 0.9739065285171717,
] as const;
const WEIGHTS = [
  0.2955242247147529, 0.2692667193099964, 0.219086362515982, 0.1494513491505806, 0.0666713443086881,
] as const;

function gauss(f: (t: number) => number, a: number, b: number): number {
  const m = (a + b) / 2;
  const h = (b - a) / 2;
  let sum = 0;
  for (let k = 0; k < 5; k++) sum += WEIGHTS[k] * (f(m - h * NODES[k]) + f(m + h * NODES[k]));
  return h * sum;
}
