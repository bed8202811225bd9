/**
 * The cost of a connector as a function of its length in mm: nondecreasing, 0 at 0, and concave above 0,
 * hence a metric on the plane (a detour through a third point never costs less).
 */
export type Weigh = (distanceMm: number) => number;

export type Objective = 'travel' | 'lifts';

/** Length in the plane, mm. */
export const travelCost: Weigh = (distanceMm) => distanceMm;

/**
 * Lifts first, then length: a constant per connector that outweighs any saving in length. A leg to or
 * from home costs it even at distance 0 (`weighHome`), so that the number of runs is what is counted.
 * `reachMm` bounds the length of one connector, `connectors` their number.
 */
export function liftsFirst(
  reachMm: number,
  connectors: number,
): { weigh: Weigh; weighHome: Weigh; liftCost: number } {
  let liftCost = 1;
  while (liftCost < reachMm * (connectors + 2)) liftCost *= 2;
  return {
    weigh: (distanceMm) => (distanceMm > 0 ? liftCost + distanceMm : 0),
    weighHome: (distanceMm) => liftCost + distanceMm,
    liftCost,
  };
}
