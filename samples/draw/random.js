/**
 * Numbers in [0, 1) that are the same in every engine: a linear congruential generator modulo 2³²
 * (multiplier and increment as in Press et al., Numerical Recipes, 2nd ed. 1992, section 7.1).
 */
export function createRandom(seed) {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 0x100000000;
  };
}

/** A shuffled copy (Fisher & Yates 1938). */
export function shuffled(items, random) {
  const copy = [...items];
  for (let i = copy.length - 1; i > 0; i--) {
    const j = Math.floor(random() * (i + 1));
    [copy[i], copy[j]] = [copy[j], copy[i]];
  }
  return copy;
}
