/** All quantities SI, temperatures kelvin. */

/** All quantities SI, temperatures kelvin. Positions: r out from the axis, z in from the pumped face. */
export interface Position {
  r: number;
  z: number;
}

export interface PlaneReport {
  /** m = (A + D)/2 of the round trip; stable strictly inside -1..1. */
  stability: number;
  stable: boolean;
  /** 1/e2 intensity radius in the middle of the rod; null where there is no mode. */
  modeRadiusInRod: number | null;
}

export interface Flow {
  from: string;
  to: string;
  power: number;
}

/** One operating point, lasing or blocked. Where `state` is "none" the numbers are those of the last point tried. */
export interface OperatingPoint {
  state: 'steady' | 'none' | 'two';
  /** Why there is no steady state, or what the second one is. */
  reason?: string;
  /** Pump power of the diode, before the entrance face. */
  pumpPower: number;
  absorbedPower: number;
  heatFraction: number;
  /** Heat made in the rod. */
  heatLoad: number;
  outputPower: number;
  thresholdPumpPower: number | null;
  electricalPower: number;
  rod: {
    peakTemperature: number;
    peakPosition: Position;
    edgeTemperature: number;
    meanPumpedTemperature: number;
    baseTemperature: number;
  };
  stress: { peakTensile: number; position: Position; fractureShare: number; estimate: number };
  lens: {
    /** Fitted with the mode weight exp(-2 r2/w2), w = `weightRadius`; > 0 converging. */
    dioptricPower: number;
    focalLength: number | null;
    axisDioptricPower: number;
    thermoOptic: number;
    bulge: number;
    /** Mean of both polarisations; zero where the coefficients are not known. */
    photoelastic: number;
    photoelasticRadial: number;
    photoelasticTangential: number;
    /** Where the coefficients are not known: how far the part may lie from zero, an order of magnitude. */
    photoelasticUnknown: number;
    /** Share of a linearly polarised mode in the crossed polarisation after one pass; null where not known. */
    depolarisedShare: number | null;
    /** Root mean square of the optical path that the parabola leaves over the mode, m. */
    residualPath: number;
    /** The r4 term of the optical path over the mode, 1/m3. */
    quarticTerm: number;
    aberrationLoss: number;
    weightRadius: number;
    /** Closed-form estimate on the same heat, for comparison. */
    estimate: number;
  };
  cavity: { sagittal: PlaneReport; tangential: PlaneReport };
  diode: {
    caseTemperature: number;
    wavelength: number;
    caseWindow: { low: number | null; high: number | null; best: number | null };
    heat: number;
  };
  cooler: {
    id: string;
    coldestTemperature: number;
    dewPoint: number;
    details: Record<string, number>;
  };
  ledger: Flow[];
}
