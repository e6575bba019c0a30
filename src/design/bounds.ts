/** The bounds a person sets, SI. */
export interface Limits {
  rodPeakTemperature: number;
  /** Fracture strength over this factor is the greatest tensile stress allowed. */
  fractureSafetyFactor: number;
  /** What must remain of 1 - |m|. */
  stabilityMargin: number;
  absorptionShare: number;
  dewPointGuard: number;
  tecCurrentShare: number;
  aberrationLoss: number;
  highestCaseTemperature: number;
  fractureStrength: number;
  /** Reference for the room a temperature has. */
  ambient: number;
}
