/**
 * One number with its spread and where it comes from; SI.
 * `seen`: the nominal value was read in the source; false: from memory, practice, or derived.
 */
export interface Sourced {
  nominal: number;
  /** null where no spread is known. */
  low: number | null;
  high: number | null;
  unit: string;
  /** Kelvin, where the source says at which temperature it holds. */
  temperature?: number;
  /** Key into `sources`. */
  source: string;
  seen: boolean;
  confidence: string;
  note?: string;
  /** Other printed values that were not chosen. */
  alternatives?: { value: number; source: string }[];
}

export interface Source {
  cite: string;
  /** Whether the document itself was read; false: cited from memory. */
  seen: boolean;
}

/** pi: E along the axis named by the crystal's `polarisationAxes.pi` (the c axis of a uniaxial crystal). */
export type Polarisation = 'pi' | 'sigma' | 'none';
export type CrystalAxis = 'a' | 'b' | 'c';

type IndexAxis = '' | 'Ordinary' | 'Extraordinary' | 'P' | 'M' | 'G' | 'A' | 'B' | 'C';

/** Names of the values a crystal may hold; a value that is not known is left out. */
export type CrystalProperty =
  | `refractiveIndex${IndexAxis}`
  | `thermoOptic${IndexAxis}`
  | `thermalConductivity${'' | 'A' | 'B' | 'C'}`
  | `expansion${'' | 'A' | 'B' | 'C'}`
  | 'conductivityExponent'
  | 'youngModulus'
  | 'poissonRatio'
  | 'density'
  | 'specificHeat'
  | 'fractureStrength'
  | 'thermalShockResistance'
  | `photoelastic${'11' | '12' | '44' | 'Radial' | 'Tangential'}`
  | 'ionDensityPerShare'
  | 'ionDensity'
  | 'dopantShare'
  | 'upperLevelLifetime'
  | 'halfLifetimeTemperature'
  | 'meanFluorescenceWavelength'
  | 'radiativeEfficiency'
  | 'pumpQuantumYield'
  | 'heatFractionLasing'
  | 'heatFractionLasing888'
  | 'heatFractionBlocked'
  | 'absorptionTemperatureCoefficient'
  | 'highestPeakTemperature';

/** An absorption line or a point of a band; polarisation 'none' holds for every polarisation. */
export interface AbsorptionLine {
  /** m */
  centre: number;
  polarisation: Polarisation;
  /** Field direction as the literature names it, where it is neither pi nor sigma of a uniaxial crystal. */
  axis?: string;
  /** Already averaged over a diode spectrum: not to be added to the narrow lines. */
  averaged?: boolean;
  /** A point on a broad band that another entry describes: a check value, not to be added to it. */
  bandPoint?: boolean;
  /** Peak, m^2 */
  crossSection: Sourced;
  /** Full width at half maximum, m */
  fwhm: Sourced;
}

export interface LaserLine {
  /** m */
  wavelength: number;
  polarisation: Polarisation;
  axis?: string;
  scheme: 'four-level' | 'quasi-three-level';
  /** Broad, phonon-assisted emission (tunable). */
  vibronic?: boolean;
  /** Energy of the lower laser level above the ground level, 1/m */
  lowerLevel?: number;
  emissionCrossSection: Sourced;
  /** Share of the ground manifold in the lower laser level at 300 K. */
  lowerShare?: Sourced;
  /** Share of the upper manifold in the upper laser level at 300 K. */
  upperShare?: Sourced;
}

/** Energies of the Stark levels, 1/m, with one source for all of them. */
export interface LevelScheme {
  ground: number[];
  upper?: number[];
  unit: string;
  source: string;
  seen: boolean;
  confidence: string;
  note?: string;
}

/** Thermal conductivity against temperature, W/(m K) and K. */
export interface ConductivityTable {
  temperatures: number[];
  thermalConductivity?: number[];
  thermalConductivityA?: number[];
  thermalConductivityC?: number[];
  unit: string;
  source: string;
  seen: boolean;
  confidence: string;
  note?: string;
}

export interface Crystal {
  id: string;
  /** As written in a design file, "Nd:YVO4". */
  name: string;
  aliases: string[];
  host: string;
  ion: string;
  symmetry: 'isotropic' | 'uniaxial' | 'biaxial';
  /** What a person must know before handling it. */
  caution?: string;
  /** Which refractive-index axis each polarisation sees; absent in an isotropic crystal. */
  polarisationAxes?: { pi: IndexAxis; sigma: IndexAxis };
  /** What a dopant concentration is a share of; 'none': the ion density is stated directly. */
  dopantBasis: 'atoms' | 'mass' | 'none';
  conductivityTable?: ConductivityTable;
  values: Partial<Record<CrystalProperty, Sourced>>;
  levels?: LevelScheme;
  absorption: AbsorptionLine[];
  lines: LaserLine[];
  notes: string[];
  /** What is not known, in words: answers that need it are not available. */
  missing: string[];
}

export interface MountMaterial {
  id: string;
  name: string;
  aliases: string[];
  caution?: string;
  values: {
    thermalConductivity: Sourced;
    expansion: Sourced;
    density: Sourced;
    specificHeat: Sourced;
    /** Across the sheet, where the material is layered. */
    thermalConductivityThrough?: Sourced;
    expansionThrough?: Sourced;
  };
  notes: string[];
}

export interface Interface {
  id: string;
  name: string;
  aliases: string[];
  caution?: string;
  /** W/(m^2 K), both contact faces and the layer together */
  conductance: Sourced;
  thermalConductivity?: Sourced;
  /** Thickness of the layer, m */
  bondLine?: Sourced;
  /** Names of mount materials it must not touch. */
  incompatible?: string[];
  notes: string[];
  missing: string[];
}

export interface FluidTable {
  temperature: number[];
  density: number[];
  specificHeat: number[];
  thermalConductivity: number[];
  dynamicViscosity: number[];
}

export interface Coolant {
  id: string;
  name: string;
  aliases: string[];
  caution?: string;
  /** K */
  freezingTemperature?: number;
  /** Pa, at which the table holds */
  pressure: number;
  table: FluidTable;
  units: Record<keyof FluidTable, string>;
  source: string;
  seen: boolean;
  confidence: string;
  notes: string[];
}

export interface Emissivity {
  id: string;
  surface: string;
  emissivity: Sourced;
}

/** A class of pump diode; a design overrides every number with the data of its own diode. */
export interface PumpDiode {
  /** m */
  wavelength: number;
  technology: string;
  use: string;
  wallPlugEfficiency: Sourced;
  wavelengthDrift: Sourced;
  linewidth: Sourced;
  highestCaseTemperature: Sourced;
  beam: string;
  notes: string[];
}

/** c0 + c1 T + c2 T^2 with T in kelvin. */
export interface Polynomial {
  coefficients: number[];
  unit: string;
  source: string;
  seen: boolean;
  confidence: string;
}

export interface ThermoelectricMaterial {
  id: string;
  name: string;
  polynomials: { seebeck: Polynomial; resistivity: Polynomial; thermalConductivity: Polynomial };
  /** K; outside this range the polynomials are held at its ends. */
  lowestTemperature: number;
  highestTemperature: number;
  atRoomTemperature: { seebeck: Sourced; resistivity: Sourced; thermalConductivity: Sourced };
  /** Electrical, per joint of a leg, ohm m^2 */
  jointResistance: Sourced;
  /** Usual module sizes; lengths in m. */
  modules: { id: string; couples: number; legSide: number; legHeight: number; source: string }[];
}
