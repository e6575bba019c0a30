import type { Warning } from '../errors';
import type { Crystal, LaserLine } from '../materials';
import type { AbsorptionModel } from '../pump';
import { valueOf } from './quantity-field';
import type { ChosenConstants, Choice } from './resolve-constants';
import type { HeatFractionRule, ResolvedLaser, ResolvedRod } from './resolved';
import type { Design } from './schema';

/** Conduction-equivalent radius of a square rod over its side: cylinder in a square, Incropera Table 4.1. */
const squareRadius = 0.54;
/** Beyond this share of the half side the pump feels the corners, which a round rod lacks (common practice, no source). */
const fullestSquare = 0.6;

/** Stark levels of a quasi-three-level line; null for a four-level line or where the catalogue has none. */
function thermalLevels({ levels }: Crystal, line: LaserLine): ResolvedLaser['thermal'] {
  if (line.scheme !== 'quasi-three-level' || !levels || line.lowerLevel === undefined) return null;
  const { ground, upper = [0] } = levels;
  const away = (level: number) => Math.abs(level - line.lowerLevel!);
  const lower = ground.reduce((best, level, place) => (away(level) < away(ground[best]!) ? place : best), 0);
  // The lines of the catalogue start from the lowest level of the upper manifold.
  return { ground, lower, upper, start: 0 };
}

function absorptionOf({ rod, pump }: Design, values: ChosenConstants): AbsorptionModel {
  const { absorption } = rod;
  if (absorption === 'from crystal')
    return { kind: 'lines', lines: values.absorptionLines, ionDensity: values.ionDensity };
  const coefficient = valueOf(absorption.coefficient, 'inverseLength');
  if (absorption.drift === 'ignored') return { kind: 'coefficient', coefficient };
  return {
    kind: 'scaled-coefficient',
    coefficient,
    referenceWavelength: valueOf(pump.wavelength, 'length'),
    referenceLinewidth: valueOf(pump.linewidth, 'length'),
    lines: values.absorptionLines,
  };
}

/** Rule of the heat fraction; without a stated blocked one, what does not leave as fluorescence is heat. */
function heatRule({ rod, pump }: Design, values: ChosenConstants): HeatFractionRule {
  const given = rod.heatFraction;
  if (given === 'from laser' || given === 'quantum defect') return { kind: given };
  const lasing = valueOf(given.lasing, 'dimensionless');
  const pumpWavelength = valueOf(pump.wavelength, 'length');
  const dark = 1 - (values.radiativeEfficiency * pumpWavelength) / values.fluorescenceWavelength;
  const blocked =
    given.blocked === undefined ? Math.max(lasing, dark) : valueOf(given.blocked, 'dimensionless');
  return { kind: 'measured', lasing, blocked };
}

function laserOf({ crystal, line, values }: Choice): ResolvedLaser {
  return {
    wavelength: line.wavelength,
    emissionCrossSection: values.emissionCrossSection,
    lifetime: values.lifetime,
    radiativeEfficiency: values.radiativeEfficiency,
    fluorescenceWavelength: values.fluorescenceWavelength,
    pumpQuantumEfficiency: values.pumpQuantumEfficiency,
    ionDensity: values.ionDensity,
    thermal: thermalLevels(crystal, line),
  };
}

/** The round rod that conducts like the section; its contact is scaled by the true perimeter. */
function sectionOf({
  rod: { section },
}: Design): Pick<ResolvedRod, 'radius' | 'perimeterRatio' | 'sectionArea'> {
  if (section.shape === 'round') {
    const radius = valueOf(section.diameter!, 'length') / 2;
    return { radius, perimeterRatio: 1, sectionArea: Math.PI * radius * radius };
  }
  const side = valueOf(section.side!, 'length');
  const radius = squareRadius * side;
  return { radius, perimeterRatio: (4 * side) / (2 * Math.PI * radius), sectionArea: side * side };
}

function sectionWarnings({ rod: { section }, pump }: Design): Warning[] {
  if (section.shape === 'round') return [];
  const round =
    'The square section is computed as a round rod of radius 0.54 of its side (conduction shape factor, Incropera Table 4.1), its contact scaled by the true perimeter.';
  const warnings = [{ where: 'rod.section', text: round }];
  if (valueOf(pump.radius, 'length') <= (fullestSquare * valueOf(section.side!, 'length')) / 2)
    return warnings;
  const full = `The pump fills more than ${fullestSquare} of the half side; there the round equivalent of a square rod is poor.`;
  return [...warnings, { where: 'pump.radius', text: full }];
}

function rodWarnings({ rod }: Design, crystal: Crystal, line: LaserLine): Warning[] {
  const warnings: Warning[] = [];
  const add = (where: string, text: string) => warnings.push({ where, text });
  if (rod.absorption !== 'from crystal' && rod.absorption.drift === 'ignored')
    add(
      'rod.absorption',
      'The absorption coefficient was entered and is held: the diode may drift without changing it. Choose "follows the line" or "from crystal" to let the diode temperature act on the absorption.',
    );
  if (line.scheme === 'quasi-three-level' && !thermalLevels(crystal, line))
    add(
      'rod.laserLine',
      `The catalogue has no energy levels for this line of ${crystal.name}; re-absorption is left out and the output is too high.`,
    );
  if (crystal.dopantBasis === 'none' && rod.dopantConcentration !== undefined)
    add(
      'rod.dopantConcentration',
      `The catalogue states the ion density of ${crystal.name} itself; the concentration entered has no effect.`,
    );
  if (crystal.symmetry === 'biaxial')
    add(
      'rod.crystal',
      `${crystal.name} is biaxial: heat is computed along its axes, light in the two polarisations of the catalogue; the cuts in use lie between.`,
    );
  return warnings;
}

/** The rod of a design in SI, with its constants chosen. */
export function resolveRod(design: Design, choice: Choice): { rod: ResolvedRod; warnings: Warning[] } {
  const { crystal, line, values } = choice;
  const { rod } = design;
  return {
    warnings: [...sectionWarnings(design), ...rodWarnings(design, crystal, line)],
    rod: {
      crystalName: crystal.name,
      isotropic: crystal.symmetry === 'isotropic',
      ...sectionOf(design),
      frontCap: valueOf(rod.endCaps.front, 'length'),
      dopedLength: valueOf(rod.length, 'length'),
      backCap: valueOf(rod.endCaps.back, 'length'),
      conductivityRadial: values.conductivityRadial,
      conductivityAxial: values.conductivityAxial,
      conductivityExponent: values.conductivityExponent,
      refractiveIndex: values.refractiveIndex,
      photoelastic: values.photoelastic,
      thermoOptic: values.thermoOptic,
      expansion: values.expansion,
      expansionAcross: values.expansionAcross,
      youngModulus: values.youngModulus,
      poissonRatio: values.poissonRatio,
      absorption: absorptionOf(design, values),
      heatFraction: heatRule(design, values),
      faceFilm: valueOf(rod.faceFilm, 'heatTransferCoefficient'),
      laser: laserOf(choice),
    },
  };
}
