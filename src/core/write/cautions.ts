/**
 * Cautions for the head of a machine program, one comment each, in our own words. They only inform:
 * information for use is the last of the three steps of ISO 12100:2010 §6.1. What they rest on stands
 * beside each.
 */
export const CAUTIONS: readonly string[] = [
  // ISO 12100:2010 §6.1; 29 CFR 1910.212(a).
  "CAUTION: comments in a file replace no guard. The machine's manual, local codes and licensed or competent persons come first.",
  // NISTIR 6556 §3.6.1: cycle start goes on at the next line; ISO 13850:2015 on emergency stops.
  'CAUTION: M0, M2 and a pause are no emergency stop and cut no power off. Motion can start again at once.',
  // 29 CFR 1910.147.
  'CAUTION: put hands in for a pen change only when all parts are at rest. For servicing, cut off and lock out the power.',
  // Common practice, no source.
  'CAUTION: before the first run compare the bounds with sheet and clamps, check unit, zero and direction of Y, then run it with the pen clear of the sheet and a hand at the stop.',
  // Common practice, no source; eye protection: 29 CFR 1910.133.
  'CAUTION: moving parts pinch, nibs and knives are sharp, the carriage may pass the edge of the sheet. Keep clear, protect eyes. Follow the data sheets of inks and solvents and air the room.',
  'CAUTION: lengths and time come from a model. The limits of this machine were not known when the file was written.',
];
