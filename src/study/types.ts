export interface SweepPoint {
  pumpPower: number;
  absorbedPower: number;
  state: 'steady' | 'none' | 'two';
  peakTemperature: number;
  blockedPeakTemperature: number;
  edgeTemperature: number;
  dioptricPower: number;
  axisDioptricPower: number;
  sagittalStability: number;
  tangentialStability: number;
  modeRadius: number | null;
  modeToPumpRatio: number | null;
  outputPower: number;
  heatLoad: number;
  caseTemperature: number;
  baseTemperature: number;
  wavelength: number;
  electricalPower: number;
  fractureShare: number;
  aberrationLoss: number;
  /** Smallest margin of all limits, as a share of the room. */
  worstShare: number;
}

export interface Contributor {
  path: string;
  label: string;
  /** Factor on the answer when the value stands at its low and at its high end. */
  atLow: number;
  atHigh: number;
}
