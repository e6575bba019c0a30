import type { Surroundings } from '../cooling';
import type { CavityElement } from '../cavity';
import type { Cooler } from '../cooling';
import type { Warning } from '../errors';
import type { Limits } from './bounds';
import type { AbsorptionModel, BeamProfile } from '../pump';

/** A constant the design rests on: which value was taken, its range, where it comes from. */
export interface Constant {
  /** "material.thermoOptic"; the key under which its ends can be tried. */
  path: string;
  label: string;
  nominal: number;
  low: number | null;
  high: number | null;
  unit: string;
  source: string;
  standing: 'read' | 'from memory' | 'own' | 'common practice';
  note?: string;
}

export type HeatFractionRule =
  { kind: 'from laser' } | { kind: 'quantum defect' } | { kind: 'measured'; lasing: number; blocked: number };

export interface ResolvedPump {
  /** Light from the diode, before the entrance face, W. */
  power: number;
  /** Range that the studies search, W. */
  searchTo: number;
  /** Vacuum wavelength at `referenceCaseTemperature`, m. */
  wavelength: number;
  referenceCaseTemperature: number;
  /** m/K. */
  drift: number;
  /** Full width at half maximum, m. */
  linewidth: number;
  /** Waist radius in the rod: 1/e2 of a Gaussian, edge of a flat-top, 86.5 % of the power of a table, m. */
  radius: number;
  profile: BeamProfile;
  /** null: collimated inside the rod. */
  beamQuality: number | null;
  waistPosition: number;
  polarisationShares: { pi: number; sigma: number };
  passes: 1 | 2;
  /** Share of the light that enters at the far face, 0..1. */
  backShare: number;
  returnReflectivity: number;
  entranceTransmission: number;
}

export interface ResolvedDiode {
  wallPlugEfficiency: number;
  circuit: 'shared' | 'separate';
  caseToBase: number;
  /** A held case temperature, or null: it follows the base. */
  caseTemperature: number | null;
}

export interface ResolvedRod {
  crystalName: string;
  isotropic: boolean;
  /** Radius of the round rod that conducts like this section, m. */
  radius: number;
  /** True perimeter over that of the equivalent round rod. */
  perimeterRatio: number;
  /** True cross-section, m2. */
  sectionArea: number;
  frontCap: number;
  dopedLength: number;
  backCap: number;
  conductivityRadial: number;
  conductivityAxial: number;
  /** m of k(T) = k (300 K / T)^m; 0: constant. */
  conductivityExponent: number;
  refractiveIndex: number;
  /** Coefficients of a cubic crystal; null where they are not known. */
  photoelastic: { p11: number; p12: number; p44: number } | null;
  thermoOptic: number;
  /** Along the rod, 1/K. */
  expansion: number;
  /** Across the rod, 1/K. */
  expansionAcross: number;
  youngModulus: number;
  poissonRatio: number;
  absorption: AbsorptionModel;
  heatFraction: HeatFractionRule;
  /** Film coefficient of the end faces, W/(m2 K). */
  faceFilm: number;
  laser: ResolvedLaser;
}

export interface ResolvedLaser {
  wavelength: number;
  emissionCrossSection: number;
  lifetime: number;
  radiativeEfficiency: number;
  fluorescenceWavelength: number;
  /** Excitations of the upper level per absorbed pump photon. */
  pumpQuantumEfficiency: number;
  /** Ions per m3. */
  ionDensity: number;
  /** Quasi-three-level: levels of both manifolds, 1/m, and which one the line ends and starts on; null: four-level. */
  thermal: { ground: number[]; lower: number; upper: number[]; start: number } | null;
}

/** The body that holds the rod, as the ring it is computed as. */
export interface MountBody {
  shape: 'ring' | 'block';
  conductivity: number;
  /** m. */
  outerRadius: number;
  /** 2 pi k times the resistance per length from the ring to the base; 0: the ring's outer surface is the base. */
  beyondRing: number;
  /** Cross-section without the bore, m2. */
  sectionArea: number;
  density: number;
}

export interface ResolvedMount {
  /** Of the material; "no mount" where there is none. */
  name: string;
  /** null: the barrel itself is cooled. */
  body: MountBody | null;
  /** Contact conductance per area of the equivalent round barrel, W/(m2 K). */
  contactConductance: number;
  baseResistance: number;
  /** Clamped: a rigid, slippery bore that fitted without force at the ambient temperature. */
  grip: 'free' | 'clamped';
  /** Even pressure on a free barrel, Pa; 0 where it is clamped. */
  clampingPressure: number;
  /** null where it is not known or there is no mount. */
  expansion: number | null;
  caution?: string;
}

export interface ResolvedCooler {
  id: string;
  kind: string;
  label: string;
  demand: number;
  cooler: Cooler;
}

export interface ResolvedCavity {
  kind: 'linear' | 'ring';
  elements: CavityElement[];
  passiveLoss: number;
  /** Product of the transmission over the round trip: the share that leaves through the strongest coupler. */
  outputCoupling: number;
  /** Round-trip loss through all other mirrors. */
  otherTransmission: number;
  /** 1/e2 radius of the mode that weighs the lens, m. */
  lensRadius: number;
}

/** A design in SI numbers with material values chosen: all the operating room needs. */
export interface ResolvedDesign {
  title: string;
  surroundings: Surroundings;
  coldestAmbient: number;
  hottestAmbient: number;
  pump: ResolvedPump;
  diode: ResolvedDiode;
  rod: ResolvedRod;
  mount: ResolvedMount;
  coolers: ResolvedCooler[];
  chosenCooler: string;
  cavity: ResolvedCavity;
  limits: Limits;
  constants: Constant[];
  warnings: Warning[];
}
