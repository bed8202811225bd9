/** Newton's method from above ends where rounding stops it from falling. */
function root(x: number, degree: 3 | 5): number {
  if (!(x > 0) || x === Infinity) return x;
  let y = Math.max(x, 1);
  for (;;) {
    const power = degree === 3 ? y * y : y * y * y * y;
    const next = ((degree - 1) * y + x / power) / degree;
    if (!(next < y)) return y;
    y = next;
  }
}

/** The cube root, of either sign, by exactly rounded operations, so that every engine gives the same bits. */
export function cubeRoot(x: number): number {
  return x < 0 ? -root(-x, 3) : root(x, 3);
}

/** x to the power 12/5, x not negative. */
export function powerTwelveFifths(x: number): number {
  const square = x * x;
  return square * root(square, 5);
}

/** x to the power 5/12, x not negative. */
export function powerFiveTwelfths(x: number): number {
  return Math.sqrt(Math.sqrt(root(x * x * x * x * x, 3)));
}

/** x to the power 9/5, x not negative. */
export function powerNineFifths(x: number): number {
  const fifth = root(x, 5);
  return x * fifth * fifth * fifth * fifth;
}

/** x to the power 563/256, x not negative: the digits of 51/256 in binary are square roots of square roots. */
export function power563Over256(x: number): number {
  let result = x * x;
  let part = x;
  for (let bit = 128; bit >= 1; bit /= 2) {
    part = Math.sqrt(part);
    if (51 & bit) result *= part;
  }
  return result;
}

/** x to the power 20/9, x not negative. */
export function powerTwentyNinths(x: number): number {
  const square = x * x;
  return square * root(root(square, 3), 3);
}
