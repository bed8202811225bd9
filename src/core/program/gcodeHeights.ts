import { type GcodeMoves, RAPID, STOP } from './gcodeMoves.js';

/**
 * The height at or below which the tool marks the sheet, or null where the file never goes up and down.
 *
 * Halfway between the highest feed along the sheet and the lowest rapid along it, where they lie apart:
 * so neither low hops nor several depths mislead. Else halfway between the lowest and highest height.
 * O(moves).
 */
export function markingHeight(moves: GcodeMoves): number | null {
  let lowest = Infinity;
  let highest = -Infinity;
  let highestFeed = -Infinity;
  let lowestRapid = Infinity;
  for (let i = 0; i < moves.kind.length; i++) {
    const z = moves.z[i];
    if (z === Infinity || moves.kind[i] >= STOP) continue;
    lowest = Math.min(lowest, z);
    highest = Math.max(highest, z);
    const sameSpot = i > 0 && moves.x[i] === moves.x[i - 1] && moves.y[i] === moves.y[i - 1];
    if (sameSpot || (i > 0 && moves.z[i - 1] !== z)) continue;
    if (moves.kind[i] === RAPID) lowestRapid = Math.min(lowestRapid, z);
    else highestFeed = Math.max(highestFeed, z);
  }
  if (!(lowest < highest)) return null;
  if (highestFeed > -Infinity && highestFeed < lowestRapid && lowestRapid < Infinity) {
    return (highestFeed + lowestRapid) / 2;
  }
  return (lowest + highest) / 2;
}
