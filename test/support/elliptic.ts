/**
 * The incomplete elliptic integral of the second kind, E(φ | m) = ∫₀^φ √(1 − m·sin² x) dx, by Carlson's
 * symmetric forms: DLMF 19.25.9, with the duplication theorem 19.26.18 and 19.26.21 run to convergence.
 */
export function ellipticE(phi: number, m: number): number {
  const halfTurns = Math.round(phi / Math.PI);
  return 2 * halfTurns * quarter(Math.PI / 2, m) + quarter(phi - halfTurns * Math.PI, m);
}

function quarter(phi: number, m: number): number {
  const s = Math.sin(phi);
  const x = Math.cos(phi) ** 2;
  const y = 1 - m * s * s;
  return s * carlsonF(x, y, 1) - (m / 3) * s ** 3 * carlsonD(x, y, 1);
}

function carlsonF(x0: number, y0: number, z0: number): number {
  let [x, y, z] = [x0, y0, z0];
  for (let k = 0; k < 50; k++) {
    const l = Math.sqrt(x * y) + Math.sqrt(y * z) + Math.sqrt(z * x);
    [x, y, z] = [(x + l) / 4, (y + l) / 4, (z + l) / 4];
  }
  return 1 / Math.sqrt((x + y + z) / 3);
}

function carlsonD(x0: number, y0: number, z0: number): number {
  let [x, y, z] = [x0, y0, z0];
  let sum = 0;
  let share = 1;
  for (let k = 0; k < 50; k++) {
    const l = Math.sqrt(x * y) + Math.sqrt(y * z) + Math.sqrt(z * x);
    sum += share / (Math.sqrt(z) * (z + l));
    share /= 4;
    [x, y, z] = [(x + l) / 4, (y + l) / 4, (z + l) / 4];
  }
  return 3 * sum + share * ((x + y + 3 * z) / 5) ** -1.5;
}
