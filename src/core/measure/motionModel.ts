/** What the estimate of time needs to know of a machine; a machine profile says all of it. */
export interface MotionModel {
  readonly drawSpeedMmPerS: number;
  readonly travelSpeedMmPerS: number;
  readonly plungeSpeedMmPerS: number;
  readonly liftSpeedMmPerS: number;
  readonly accelerationMmPerS2: number;
  readonly raisedHeightMm: number;
  readonly downHeightMm: number;
}
