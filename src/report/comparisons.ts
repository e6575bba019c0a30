import { estimateZones, type Plane } from '../cavity';
import type { SolvedPoint } from '../operating/point';
import type { PreparedDesign } from '../operating/prepare';
import type { Comparison, Report } from './types';

/** Axis lens of a heated beam from its heat alone: P_h dn/dT / (pi k w2), half of it for a flat-top. */
function axisLens(prepared: PreparedDesign, { point, lens }: SolvedPoint): Comparison[] {
  const { rod, pump } = prepared.resolved;
  if (pump.profile.kind === 'super-gaussian' || pump.profile.kind === 'table' || lens.power === 0) return [];
  const half = pump.profile.kind === 'flat-top' ? 0.5 : 1;
  const estimate =
    (half * point.heatLoad * rod.thermoOptic) / (Math.PI * rod.conductivityRadial * pump.radius ** 2);
  const rate = lens.thermoOptic / lens.power;
  return [
    {
      name: 'Lens on the axis, dn/dT alone',
      computed: lens.axisPower * rate,
      estimate,
      unit: '1/m',
      source: 'Innocenzi et al., Appl. Phys. Lett. 56, 1831 (1990): collimated pump, insulated faces',
    },
  ];
}

function edgeLens(prepared: PreparedDesign, { lens }: SolvedPoint, edge: Report['cavityEdge']): Comparison[] {
  if (edge.dioptricPower === null || lens.power === 0) return [];
  const plane: Plane = edge.plane === 'tangential' ? 'tangential' : 'sagittal';
  const zones = estimateZones(prepared.cavity, lens.optics, plane);
  if (!zones) return [];
  const edges = zones.flatMap((zone) => [zone.from, zone.to]).filter(Number.isFinite);
  const target = edge.dioptricPower;
  const estimate = edges.reduce((best, value) =>
    Math.abs(value - target) < Math.abs(best - target) ? value : best,
  );
  return [
    {
      name: 'Lens at the cavity edge',
      computed: target,
      estimate,
      unit: '1/m',
      source: 'Magni, J. Opt. Soc. Am. A 4, 1962 (1987): the rod as one thin lens',
    },
  ];
}

/** The closed form knows a barrel free of force alone. */
function stressEstimate(prepared: PreparedDesign, { point }: SolvedPoint): Comparison[] {
  const { grip, clampingPressure } = prepared.resolved.mount;
  if (grip === 'clamped' || clampingPressure > 0) return [];
  return [
    {
      name: 'Greatest tensile stress',
      computed: point.stress.peakTensile,
      estimate: point.stress.estimate,
      unit: 'Pa',
      source: 'Timoshenko & Goodier, Theory of Elasticity: long rod heated like its hottest section',
    },
  ];
}

/** Computed numbers beside their closed-form estimates, so that a person can judge both. */
export function comparisonsOf(
  prepared: PreparedDesign,
  lasing: SolvedPoint,
  edge: Report['cavityEdge'],
): Comparison[] {
  const { lens } = lasing;
  return [
    ...axisLens(prepared, lasing),
    {
      name: 'Lens with face bulge, mode-weighted',
      computed: lens.thermoOptic + lens.bulge,
      estimate: lens.estimate,
      unit: '1/m',
      source:
        'Koechner, Solid-State Laser Engineering: every slice a disc free to bulge (plane stress), an upper bound for long rods',
    },
    ...stressEstimate(prepared, lasing),
    ...edgeLens(prepared, lasing, edge),
  ];
}
