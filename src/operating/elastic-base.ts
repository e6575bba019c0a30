import type { ResolvedDesign } from '../design/resolved';
import {
  assembleElastic,
  curvatureWeights,
  elasticPresets,
  makeElasticMesh,
  rodTemperatureMap,
} from '../elastic';
import type { RodConduction, RodGrid } from '../heat';
import { modeSection, type ModeSection } from '../lens';

/** Stiffness and maps, which depend on the rod alone. */
export interface ElasticBase {
  key: string;
  assembled: ReturnType<typeof assembleElastic>;
  map: ReturnType<typeof rodTemperatureMap>;
  weights: Float64Array;
  section: ModeSection;
}

/** Assembles the rod as an elastic body, held as its mount holds it. */
export function elasticBase(resolved: ResolvedDesign, conduction: RodConduction): ElasticBase {
  const { grid } = conduction;
  const { rod, cavity, pump, mount, surroundings } = resolved;
  const mesh = makeElasticMesh({
    radius: rod.radius,
    length: rod.frontCap + rod.dopedLength + rod.backCap,
    heatedFrom: rod.frontCap,
    heatedTo: rod.frontCap + rod.dopedLength,
    pumpRadius: pump.radius,
    ...elasticPresets.study,
  });
  const constants = {
    youngsModulus: rod.youngModulus,
    poissonRatio: rod.poissonRatio,
    expansion: rod.expansionAcross,
    axialExpansion: rod.expansion,
  };
  const linear = conduction.law.exponent === 0;
  const clamped = mount.grip === 'clamped';
  // Linear answers are taken one by one, above the air; a field that is solved by itself has it all in one.
  const barrel = clamped
    ? ({ kind: 'clamped' } as const)
    : ({ kind: 'free', pressure: linear ? 0 : mount.clampingPressure } as const);
  const referenceTemperature = clamped && !linear ? surroundings.ambient : 0;
  const assembled = assembleElastic({ constants, referenceTemperature, barrel }, mesh);
  return {
    key: keyOf(resolved, grid),
    assembled,
    map: rodTemperatureMap(assembled, conduction),
    weights: curvatureWeights(mesh, cavity.lensRadius),
    section: modeSection(mesh.radialNodes, cavity.lensRadius),
  };
}

/** What the stiffness, its mesh and its maps depend on. */
export function keyOf({ rod, pump, cavity, mount, surroundings }: ResolvedDesign, grid: RodGrid): string {
  const { radius, frontCap, dopedLength, backCap, youngModulus, poissonRatio, expansion, expansionAcross } =
    rod;
  const places = [grid.nRadial, ...grid.radialCentres, ...grid.axialCentres];
  return [
    radius,
    frontCap,
    dopedLength,
    backCap,
    youngModulus,
    poissonRatio,
    expansion,
    expansionAcross,
    pump.radius,
    cavity.lensRadius,
    rod.conductivityAxial,
    rod.faceFilm,
    mount.grip,
    rod.conductivityExponent === 0 ? '' : `${mount.clampingPressure} ${surroundings.ambient}`,
    ...places,
  ].join();
}
