/**
 * What a machine can do and how its program is to be written. Lengths in mm, heights from the sheet
 * upwards. A profile is plain data: JSON holds all of it.
 */
export interface MachineProfile {
  readonly name: string;
  /** Speed along the paper while drawing. */
  readonly drawSpeedMmPerS: number;
  /** Speed between runs, lifted. The machine's own rapid speed decides; this one is for the estimate. */
  readonly travelSpeedMmPerS: number;
  /** Speed at which the tool goes down. */
  readonly plungeSpeedMmPerS: number;
  /** Speed at which the tool goes up, for the estimate. */
  readonly liftSpeedMmPerS: number;
  readonly accelerationMmPerS2: number;
  /** How far a rounded corner may pass from the corner; sets the speed there. */
  readonly junctionDeviationMm: number;
  /** Height of the tool while travelling. */
  readonly raisedHeightMm: number;
  /** Height of the tool while drawing. */
  readonly downHeightMm: number;
  /** Ends closer than this meet. */
  readonly snapMm: number;
  /** Largest distance between a curve and the lines written for it, rounding included. */
  readonly accuracyMm: number;
  /** Decimal places of a coordinate. */
  readonly decimals: number;
  /** Reach of the machine from its zero; absent where not known. */
  readonly bedWidthMm?: number;
  readonly bedHeightMm?: number;
}
