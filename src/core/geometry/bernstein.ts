/**
 * Real roots of a polynomial of degree 5 given by its Bernstein coefficients on [low, high].
 *
 * A polynomial has no more roots in the interval than its coefficients change sign (Descartes' rule in
 * Bernstein form), so an interval without a change is dropped, one with a single change holds exactly
 * one root, found by Newton's method kept within its bracket, and any other is halved.
 * Source: Schneider, P. J. (1990), A Bézier curve-based root-finder, Graphics Gems, pp. 408–415
 * (from memory).
 *
 * Calls `visit` with each root that lies inside and where the sign changes; with the middle where the
 * polynomial is within ±noise; and sometimes with a point that is no root, where roots lie closer
 * together than 2⁻³⁰ of the interval. Coefficients are passed as numbers, so that nothing is allocated.
 */
export function bernstein5Roots(
  c0: number,
  c1: number,
  c2: number,
  c3: number,
  c4: number,
  c5: number,
  low: number,
  high: number,
  noise: number,
  visit: (t: number) => void,
  depth = 30,
): void {
  const changes = signChanges(c0, c1, c2, c3, c4, c5);
  if (changes === 0) return;
  const mid = (low + high) / 2;
  if (depth === 0 || isWithin(c0, c1, c2, c3, c4, c5, noise)) {
    visit(mid);
    return;
  }
  if (changes === 1) {
    visit(low + (high - low) * singleRoot(c0, c1, c2, c3, c4, c5));
    return;
  }
  // De Casteljau at the middle: row by row, the left edge and the right edge are the two halves.
  const d0 = (c0 + c1) / 2;
  const d1 = (c1 + c2) / 2;
  const d2 = (c2 + c3) / 2;
  const d3 = (c3 + c4) / 2;
  const d4 = (c4 + c5) / 2;
  const e0 = (d0 + d1) / 2;
  const e1 = (d1 + d2) / 2;
  const e2 = (d2 + d3) / 2;
  const e3 = (d3 + d4) / 2;
  const f0 = (e0 + e1) / 2;
  const f1 = (e1 + e2) / 2;
  const f2 = (e2 + e3) / 2;
  const g0 = (f0 + f1) / 2;
  const g1 = (f1 + f2) / 2;
  const h = (g0 + g1) / 2;
  if (Math.abs(h) <= noise) visit(mid);
  bernstein5Roots(c0, d0, e0, f0, g0, h, low, mid, noise, visit, depth - 1);
  bernstein5Roots(h, g1, f2, e3, d4, c5, mid, high, noise, visit, depth - 1);
}

/** Changes of sign along the coefficients, zeros left out. */
function signChanges(c0: number, c1: number, c2: number, c3: number, c4: number, c5: number): number {
  let sign = Math.sign(c0);
  let changes = 0;
  for (let k = 1; k < 6; k++) {
    const next = Math.sign(k === 1 ? c1 : k === 2 ? c2 : k === 3 ? c3 : k === 4 ? c4 : c5);
    if (next === 0) continue;
    if (sign !== 0 && next !== sign) changes++;
    sign = next;
  }
  return changes;
}

function isWithin(
  c0: number,
  c1: number,
  c2: number,
  c3: number,
  c4: number,
  c5: number,
  noise: number,
): boolean {
  return (
    Math.abs(c0) <= noise &&
    Math.abs(c1) <= noise &&
    Math.abs(c2) <= noise &&
    Math.abs(c3) <= noise &&
    Math.abs(c4) <= noise &&
    Math.abs(c5) <= noise
  );
}

/** The root in (0, 1) of a polynomial whose coefficients change sign once. */
function singleRoot(c0: number, c1: number, c2: number, c3: number, c4: number, c5: number): number {
  const rising = (c0 || c1 || c2 || c3 || c4) < 0;
  let low = 0;
  let high = 1;
  let x = 0.5;
  for (let step = 0; step < 80; step++) {
    const y = 1 - x;
    const d0 = y * c0 + x * c1;
    const d1 = y * c1 + x * c2;
    const d2 = y * c2 + x * c3;
    const d3 = y * c3 + x * c4;
    const d4 = y * c4 + x * c5;
    const e0 = y * d0 + x * d1;
    const e1 = y * d1 + x * d2;
    const e2 = y * d2 + x * d3;
    const e3 = y * d3 + x * d4;
    const f0 = y * e0 + x * e1;
    const f1 = y * e1 + x * e2;
    const f2 = y * e2 + x * e3;
    const g0 = y * f0 + x * f1;
    const g1 = y * f1 + x * f2;
    const value = y * g0 + x * g1;
    if (value === 0) return x;
    if (value > 0 === rising) high = x;
    else low = x;
    const newton = x - value / (5 * (g1 - g0));
    const next = newton > low && newton < high ? newton : (low + high) / 2;
    if (Math.abs(next - x) <= 1e-16) return next;
    x = next;
  }
  return x;
}
