import type { Constant } from '../design/resolved';
import type { Warning } from '../errors';
import type { LimitName, Margin } from '../limits/types';
import type { OperatingPoint as OperatingReport } from '../operating/types';
import type { MountComparison } from '../study/mounts';
import type { Contributor, SweepPoint } from '../study/types';

export type { Constant } from '../design/resolved';
export type { LimitName, Margin } from '../limits/types';
export type { Flow, OperatingPoint as OperatingReport, PlaneReport, Position } from '../operating/types';
export type { MountComparison } from '../study/mounts';
export type { Contributor, SweepPoint } from '../study/types';

export interface OptionReport {
  id: string;
  kind: string;
  label: string;
  state: 'steady' | 'none' | 'two';
  reason?: string;
  electricalPower: number;
  /** Every limit holds at the design's pump power. */
  passes: boolean;
  margins: Margin[];
  ceiling: {
    /** First pump power at which a limit is broken; the end of the searched range where none is (`reachesRange`). */
    pumpPower: number | null;
    setBy: LimitName | null;
    low: number | null;
    high: number | null;
    /** True where no limit was broken up to the end of the searched range: the ceiling is at least `pumpPower`. */
    reachesRange: boolean;
  };
  /** Pump powers over which every limit holds. */
  windows: { fromPumpPower: number; toPumpPower: number }[];
  /** Where each limit is first broken, ascending; null if it holds throughout. */
  limits: { limit: LimitName; pumpPower: number | null }[];
}

/** A computed number beside its closed-form estimate. */
export interface Comparison {
  name: string;
  computed: number;
  estimate: number;
  unit: string;
  source: string;
}

export interface Report {
  format: 'pump-ceiling/report';
  version: 1;
  title: string;
  warnings: Warning[];
  /** One sentence with the ceiling, its band, the limit and what would help. */
  verdict: { text: string; holds: boolean };
  chosenCooler: string;
  operating: OperatingReport;
  blocked: OperatingReport;
  options: OptionReport[];
  ladder: { fromPumpPower: number; toPumpPower: number; option: string | null }[];
  cavityEdge: {
    pumpPower: number | null;
    plane: 'sagittal' | 'tangential' | 'both' | null;
    dioptricPower: number | null;
    low: number | null;
    high: number | null;
    /** Lens powers of the whole rod for which each plane is stable, 1/m. */
    zones: Record<'sagittal' | 'tangential', { from: number; to: number }[]>;
  };
  usableWindow: { fromPumpPower: number; toPumpPower: number }[];
  mounts: MountComparison[];
  levers: { path: string; label: string; change: string; effect: number }[];
  /** Contributors to the band of the chosen option's ceiling and of the cavity edge, largest first. */
  contributors: { ceiling: Contributor[]; cavityEdge: Contributor[] };
  sweep: SweepPoint[];
  comparisons: Comparison[];
  /** Estimated error of the grid at the operating point, 1/m, K and Pa; null until it is computed. */
  accuracy: { dioptricPower: number; peakTemperature: number; peakTensile: number } | null;
  constants: Constant[];
  cautions: string[];
  /** Pump power up to which ceilings were searched. */
  searchedTo: number;
  /** True once the band (`low`, `high`) has been computed. */
  bandComplete: boolean;
}

/** Arrays for the page's drawings; not part of the report file. */
export interface Pictures {
  rod: Record<'lasing' | 'blocked', RodPicture>;
  cavity: CavityPicture;
}

export interface RodPicture {
  /** Faces of the cells: radialFaces from the axis through rod and mount, axialFaces from the pumped face. */
  radialFaces: Float64Array;
  axialFaces: Float64Array;
  rodCells: number;
  /** Cell (i, j) at j * nr + i. */
  temperatures: Float64Array;
  lowest: number;
  highest: number;
  rodRadius: number;
  /** What holds the rod; a block is drawn as the ring it is computed as. */
  mount: { name: string; shape: 'ring' | 'block' | 'none' };
  pumpRadius: number;
  /** Share of the pump light that enters at the back face. */
  backShare: number;
  frontCap: number;
  backCap: number;
  /** Profiles: temperature against r at the hottest plane, and against z on the axis. */
  radialProfile: { r: Float64Array; temperature: Float64Array; z: number };
  axialProfile: { z: Float64Array; temperature: Float64Array };
}

export interface CavityPicture {
  /** Elements in order with the geometric position along the axis. */
  elements: {
    index: number;
    kind: 'mirror' | 'space' | 'lens' | 'plate' | 'rod';
    from: number;
    to: number;
    radius?: number;
    label: string;
  }[];
  length: number;
  /** Envelopes at the operating pump power; empty where the plane has no mode. */
  envelopes: Record<'sagittal' | 'tangential', { position: number; radius: number }[]>;
}

export interface Answer {
  report: Report;
  pictures: Pictures;
}
