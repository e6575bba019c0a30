import { absorptionLines, conductivity, crystalValue, expansion, findCrystal, ionDensity, refractiveIndex, thermoOptic, type Crystal, type LaserLine, type Polarisation } from '../materials';
import type { Warning } from '../errors';
import type { AbsorptionModel, PumpLine } from '../pump';
import { acrossMean, type ConstantBook } from './constants';
import { valueOf } from './quantity-field';
import type { HeatFractionRule, ResolvedLaser, ResolvedRod } from './resolved';
import type { Design } from './schema';

/** Conduction-equivalent radius of a square rod: cylinder in a square, Incropera Table 4.1. */
const squareRadius = 0.54;
/** A band wider than this is no single homogeneous line; its wings fall off as a Gaussian's (common practice, no source). */
const widestLorentzian = 6e-9;

const own = (text: string | undefined, dimension: Parameters<typeof valueOf>[1]) =>
  text === undefined ? undefined : valueOf(text, dimension);

/** Directions across the rod and along it. */
function axesOf(crystal: Crystal, cut: 'a' | 'c') {
  if (crystal.symmetry === 'isotropic') return { along: 'a', across: ['a', 'a'] } as const;
  return cut === 'a' ? ({ along: 'a', across: ['a', 'c'] } as const) : ({ along: 'c', across: ['a', 'b'] } as const);
}

function lineOf(crystal: Crystal, design: Design): LaserLine {
  const wanted = valueOf(design.rod.laserLine, 'length');
  const close = crystal.lines.filter((line) => Math.abs(line.wavelength - wanted) < 0.004 * wanted);
  const possible = close.filter((line) => !(crystal.symmetry === 'uniaxial' && design.rod.cut === 'c' && line.polarisation === 'pi'));
  const among = possible.length > 0 ? possible : close;
  const nearest = Math.min(...among.map((line) => Math.abs(line.wavelength - wanted)));
  return among
    .filter((line) => Math.abs(line.wavelength - wanted) < nearest + 0.2e-9)
    .reduce((best, line) => (line.emissionCrossSection.nominal > best.emissionCrossSection.nominal ? line : best));
}

const opticalPolarisation = (crystal: Crystal, line: LaserLine, cut: 'a' | 'c'): Polarisation => {
  if (!crystal.polarisationAxes) return 'none';
  if (line.polarisation !== 'none') return line.polarisation;
  return cut === 'c' ? 'sigma' : 'pi';
};

function thermalLevels(crystal: Crystal, line: LaserLine): ResolvedLaser['thermal'] {
  const { levels } = crystal;
  if (line.scheme !== 'quasi-three-level' || !levels || line.lowerLevel === undefined) return null;
  const target = line.lowerLevel;
  const lower = levels.ground.reduce((best, level, k) => (Math.abs(level - target) < Math.abs(levels.ground[best]! - target) ? k : best), 0);
  return { ground: levels.ground, lower, upper: levels.upper ?? [0], start: 0 };
}

function absorptionOf(crystal: Crystal, design: Design, density: number, book: ConstantBook): AbsorptionModel {
  const { absorption } = design.rod;
  const lines = (): PumpLine[] =>
    absorptionLines(crystal).map((line, k) => {
      const nm = (line.centre * 1e9).toFixed(1);
      const path = `material.absorption.${k}.crossSection`;
      const label = `Absorption cross-section at ${nm} nm${line.polarisation === 'none' ? '' : `, ${line.polarisation}`}`;
      return {
        polarisation: line.polarisation,
        centre: line.centre,
        fwhm: line.fwhm.nominal,
        shape: line.fwhm.nominal > widestLorentzian ? 'gaussian' : 'lorentzian',
        crossSection: book.take(path, label, line.crossSection, undefined, 'rod.absorption'),
      };
    });
  if (absorption === 'from crystal') return { kind: 'lines', lines: lines(), ionDensity: density };
  const coefficient = valueOf(absorption.coefficient, 'inverseLength');
  if (absorption.drift === 'ignored') return { kind: 'coefficient', coefficient };
  return {
    kind: 'scaled-coefficient',
    coefficient,
    referenceWavelength: valueOf(design.pump.wavelength, 'length'),
    referenceLinewidth: valueOf(design.pump.linewidth, 'length'),
    lines: lines(),
  };
}

function heatRule(design: Design, laser: ResolvedLaser): HeatFractionRule {
  const rule = design.rod.heatFraction;
  if (rule === 'from laser' || rule === 'quantum defect') return { kind: rule };
  const lasing = valueOf(rule.lasing, 'dimensionless');
  const dark = 1 - (laser.radiativeEfficiency * valueOf(design.pump.wavelength, 'length')) / laser.fluorescenceWavelength;
  return { kind: 'measured', lasing, blocked: rule.blocked === undefined ? Math.max(lasing, dark) : valueOf(rule.blocked, 'dimensionless') };
}

function laserOf(crystal: Crystal, line: LaserLine, design: Design, density: number, book: ConstantBook): ResolvedLaser {
  const { values } = design.rod;
  const take = book.take.bind(book);
  return {
    wavelength: line.wavelength,
    emissionCrossSection: take('material.emissionCrossSection', 'Emission cross-section', line.emissionCrossSection, own(values.emissionCrossSection, 'area'), 'rod.values.emissionCrossSection'),
    lifetime: take('material.lifetime', 'Fluorescence lifetime', crystalValue(crystal, 'upperLevelLifetime'), own(values.lifetime, 'time'), 'rod.values.lifetime'),
    radiativeEfficiency: take('material.radiativeEfficiency', 'Radiative efficiency', crystalValue(crystal, 'radiativeEfficiency'), own(values.radiativeEfficiency, 'dimensionless'), 'rod.values.radiativeEfficiency'),
    fluorescenceWavelength: take('material.fluorescenceWavelength', 'Mean fluorescence wavelength', crystalValue(crystal, 'meanFluorescenceWavelength'), own(values.fluorescenceWavelength, 'length'), 'rod.values.fluorescenceWavelength'),
    pumpQuantumEfficiency: crystalValue(crystal, 'pumpQuantumYield') ? take('material.pumpQuantumYield', 'Excitations per pump photon', crystalValue(crystal, 'pumpQuantumYield'), undefined, 'rod.crystal') : 1,
    ionDensity: density,
    thermal: thermalLevels(crystal, line),
  };
}

function sectionOf(design: Design) {
  const { section } = design.rod;
  if (section.shape === 'round') {
    const radius = valueOf(section.diameter!, 'length') / 2;
    return { radius, perimeterRatio: 1, sectionArea: Math.PI * radius * radius };
  }
  const side = valueOf(section.side!, 'length');
  const radius = squareRadius * side;
  return { radius, perimeterRatio: (4 * side) / (2 * Math.PI * radius), sectionArea: side * side };
}

function rodWarnings(crystal: Crystal, line: LaserLine, design: Design): Warning[] {
  const warnings: Warning[] = [];
  const add = (where: string, text: string) => warnings.push({ where, text });
  const { section } = design.rod;
  if (section.shape === 'square') {
    add('rod.section', 'The square section is computed as a round rod of radius 0.54 of its side (conduction shape factor, Incropera Table 4.1), its contact scaled by the true perimeter.');
    if (valueOf(design.pump.radius, 'length') > 0.3 * valueOf(section.side!, 'length'))
      add('pump.radius', 'The pump fills more than 0.6 of the half side; there the round equivalent of a square rod is poor.');
  }
  if (design.rod.absorption !== 'from crystal' && design.rod.absorption.drift === 'ignored')
    add('rod.absorption', 'The absorption coefficient was entered and is held: the diode may drift without changing it. Choose "follows the line" or "from crystal" to let the diode temperature act on the absorption.');
  if (line.scheme === 'quasi-three-level' && !thermalLevels(crystal, line))
    add('rod.laserLine', `The catalogue has no energy levels for this line of ${crystal.name}; re-absorption is left out and the output is too high.`);
  if (crystal.symmetry === 'biaxial') add('rod.crystal', `${crystal.name} is biaxial; it is computed with the axes a and c.`);
  add('lens.photoelastic', 'The photoelastic part of the lens is not computed; it is taken as zero.');
  return warnings;
}

/** The rod of a design in SI, with its constants chosen. */
export function resolveRod(design: Design, book: ConstantBook): { rod: ResolvedRod; warnings: Warning[]; crystal: Crystal } {
  const crystal = findCrystal(design.rod.crystal)!;
  const { rod } = design;
  const { values } = rod;
  const line = lineOf(crystal, design);
  const polarisation = opticalPolarisation(crystal, line, rod.cut);
  const axes = axesOf(crystal, rod.cut);
  const [one, two] = axes.across;
  const take = book.take.bind(book);
  const dopant = own(rod.dopantConcentration, 'dimensionless') ?? take('material.dopantShare', 'Dopant concentration', crystalValue(crystal, 'dopantShare'), undefined, 'rod.dopantConcentration');
  const density = take('material.ionDensity', 'Ion density', ionDensity(crystal, dopant), undefined, 'rod.crystal');
  const laser = laserOf(crystal, line, design, density, book);
  const index = refractiveIndex(crystal, polarisation) ?? crystal.values.refractiveIndex;
  return {
    crystal,
    warnings: rodWarnings(crystal, line, design),
    rod: {
      crystalName: crystal.name,
      isotropic: crystal.symmetry === 'isotropic',
      ...sectionOf(design),
      frontCap: valueOf(rod.endCaps.front, 'length'),
      dopedLength: valueOf(rod.length, 'length'),
      backCap: valueOf(rod.endCaps.back, 'length'),
      conductivityRadial: take('material.thermalConductivityRadial', 'Conductivity across the rod', acrossMean(conductivity(crystal, one), conductivity(crystal, two), 'geometric'), own(values.thermalConductivityRadial, 'thermalConductivity'), 'rod.values.thermalConductivityRadial'),
      conductivityAxial: take('material.thermalConductivityAxial', 'Conductivity along the rod', conductivity(crystal, axes.along), own(values.thermalConductivityAxial, 'thermalConductivity') ?? own(values.thermalConductivityRadial, 'thermalConductivity'), 'rod.values.thermalConductivityAxial'),
      refractiveIndex: take('material.refractiveIndex', 'Refractive index', index, values.refractiveIndex, 'rod.values.refractiveIndex'),
      thermoOptic: take('material.thermoOptic', 'dn/dT', thermoOptic(crystal, polarisation) ?? crystal.values.thermoOptic, own(values.thermoOptic, 'expansion'), 'rod.values.thermoOptic'),
      expansion: take('material.expansionAlong', 'Expansion along the rod', expansion(crystal, axes.along), own(values.expansion, 'expansion'), 'rod.values.expansion'),
      expansionAcross: take('material.expansionAcross', 'Expansion across the rod', acrossMean(expansion(crystal, one), expansion(crystal, two), 'arithmetic'), own(values.expansion, 'expansion'), 'rod.values.expansion'),
      youngModulus: take('material.youngModulus', "Young's modulus", crystalValue(crystal, 'youngModulus'), own(values.youngModulus, 'pressure'), 'rod.values.youngModulus'),
      poissonRatio: take('material.poissonRatio', "Poisson's ratio", crystalValue(crystal, 'poissonRatio'), values.poissonRatio, 'rod.values.poissonRatio'),
      absorption: absorptionOf(crystal, design, density, book),
      heatFraction: heatRule(design, laser),
      faceFilm: valueOf(rod.faceFilm, 'heatTransferCoefficient'),
      laser,
    },
  };
}

/** Shares of the pump light along the optic axis and across it, as the rod's cut lets it see them. */
export function polarisationShares(crystal: Crystal, design: Design): { pi: number; sigma: number } {
  if (crystal.symmetry !== 'isotropic' && design.rod.cut === 'c') return { pi: 0, sigma: 1 };
  if (design.pump.polarisation === 'pi') return { pi: 1, sigma: 0 };
  return design.pump.polarisation === 'sigma' ? { pi: 0, sigma: 1 } : { pi: 0.5, sigma: 0.5 };
}
