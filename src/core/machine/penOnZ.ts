import type { MachineProfile } from './profile.js';

/**
 * A pen carried by a Z axis, zeroed where the tip touches the sheet. All figures are common practice,
 * no source: slow enough for a fine-liner, and no pressure beyond touching. Set your own machine's.
 */
export const PEN_ON_Z: MachineProfile = {
  name: 'pen-on-z',
  drawSpeedMmPerS: 40,
  travelSpeedMmPerS: 100,
  plungeSpeedMmPerS: 10,
  liftSpeedMmPerS: 20,
  accelerationMmPerS2: 1000,
  junctionDeviationMm: 0.02,
  raisedHeightMm: 3,
  downHeightMm: 0,
  snapMm: 0.05,
  accuracyMm: 0.02,
  decimals: 3,
};
