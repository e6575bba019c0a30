import type { Fault } from '../errors';
import {
  absorptionLines,
  conductivity,
  conductivityExponent,
  crystalValue,
  expansion,
  findCrystal,
  findInterface,
  findMountMaterial,
  ionDensity,
  refractiveIndex,
  thermoOptic,
  type Crystal,
  type LaserLine,
  type Sourced,
} from '../materials';
import type { PumpLine } from '../pump';
import { lineNote } from './constant-list';
import { acrossMean, ConstantBook, type Overrides } from './constants';
import { laserLine, laserPolarisation } from './laser-line';
import { ownValue, valueOf } from './quantity-field';
import type { Constant } from './resolved';
import type { Design } from './schema';

/** A band wider than this is no single homogeneous line; its wings fall off as a Gaussian's (common practice, no source). */
const widestLorentzian = 6e-9;

/** Crystal axes across the rod and along it; the b axis of a uniaxial crystal is like its a axis. */
function axesOf(crystal: Crystal, cut: 'a' | 'c') {
  if (crystal.symmetry === 'isotropic') return { along: 'a', one: 'a', two: 'a' } as const;
  return cut === 'a'
    ? ({ along: 'a', one: 'b', two: 'c' } as const)
    : ({ along: 'c', one: 'a', two: 'b' } as const);
}

/**
 * The strength that the finish of the surfaces leaves, within the range of the catalogue; the range stays. That finish
 * rules strength is common practice, no source; published ruptures of one garnet span 133 MPa ground to 530 MPa etched.
 */
function ofFinish(strength: Sourced | undefined, finish: Design['rod']['surfaceFinish']) {
  if (!strength || finish === 'polished') return strength;
  const end = finish === 'ground' ? strength.low : strength.high;
  const which =
    end === null
      ? `no range is known, so that a ${finish} surface counts as a polished one`
      : `${finish === 'ground' ? 'low' : 'high'} end of the range, for ${finish === 'etched' ? 'an' : 'a'} ${finish} surface`;
  const note = strength.note ? `${which}; ${strength.note}` : which;
  return { ...strength, nominal: end ?? strength.nominal, note };
}

/** How heat and stress go through the rod. */
function bodyConstants(crystal: Crystal, design: Design, book: ConstantBook) {
  const { along, one, two } = axesOf(crystal, design.rod.cut);
  const { values } = design.rod;
  const ownAxial = values.thermalConductivityAxial ?? values.thermalConductivityRadial;
  const acrossConductivity = acrossMean(conductivity(crystal, one), conductivity(crystal, two), 'geometric');
  const acrossExpansion = acrossMean(expansion(crystal, one), expansion(crystal, two), 'arithmetic');
  return {
    conductivityRadial: book.take('material.thermalConductivityRadial', acrossConductivity),
    conductivityAxial: book.take(
      'material.thermalConductivityAxial',
      conductivity(crystal, along),
      ownValue(ownAxial, 'thermalConductivity'),
    ),
    conductivityExponent:
      design.rod.conductivityLaw === 'constant'
        ? 0
        : book.take('material.conductivityExponent', conductivityExponent(crystal)),
    expansion: book.take('material.expansionAlong', expansion(crystal, along)),
    expansionAcross: book.take('material.expansionAcross', acrossExpansion),
    youngModulus: book.take('material.youngModulus', crystalValue(crystal, 'youngModulus')),
    poissonRatio: book.take('material.poissonRatio', crystalValue(crystal, 'poissonRatio')),
    fractureStrength: book.take(
      'material.fractureStrength',
      ofFinish(crystalValue(crystal, 'fractureStrength'), design.rod.surfaceFinish),
    ),
  };
}

/** Photoelastic coefficients of a cubic crystal, where all three are known. */
function photoelasticConstants(crystal: Crystal, book: ConstantBook) {
  const [p11, p12, p44] = (['11', '12', '44'] as const).map((of) =>
    crystalValue(crystal, `photoelastic${of}`),
  );
  if (crystal.symmetry !== 'isotropic' || !p11 || !p12 || !p44) return null;
  return {
    p11: book.take('material.photoelastic11', p11),
    p12: book.take('material.photoelastic12', p12),
    p44: book.take('material.photoelastic44', p44),
  };
}

/** What the laser's light sees, in its own polarisation. */
function lightConstants(crystal: Crystal, line: LaserLine, design: Design, book: ConstantBook) {
  const polarisation = laserPolarisation(crystal, line, design.rod.cut);
  const yieldOfPump = crystalValue(crystal, 'pumpQuantumYield');
  return {
    refractiveIndex: book.take('material.refractiveIndex', refractiveIndex(crystal, polarisation)),
    photoelastic: photoelasticConstants(crystal, book),
    thermoOptic: book.take('material.thermoOptic', thermoOptic(crystal, polarisation)),
    emissionCrossSection: book.take('material.emissionCrossSection', line.emissionCrossSection),
    lifetime: book.take('material.lifetime', crystalValue(crystal, 'upperLevelLifetime')),
    radiativeEfficiency: book.take(
      'material.radiativeEfficiency',
      crystalValue(crystal, 'radiativeEfficiency'),
    ),
    fluorescenceWavelength: book.take(
      'material.fluorescenceWavelength',
      crystalValue(crystal, 'meanFluorescenceWavelength'),
    ),
    pumpQuantumEfficiency: yieldOfPump
      ? book.take('material.pumpQuantumYield', yieldOfPump)
      : book.assume('material.pumpQuantumYield', 1),
  };
}

function pumpLines(crystal: Crystal, book: ConstantBook): PumpLine[] {
  return absorptionLines(crystal).map((line, place) => {
    const { polarisation, centre } = line;
    const field = polarisation === 'none' ? '' : `, ${polarisation}`;
    const note = lineNote(`Absorption cross-section at ${(centre * 1e9).toFixed(1)} nm${field}`);
    const crossSection = book.choose(`material.absorption.${place}.crossSection`, note, line.crossSection);
    const fwhm = line.fwhm.nominal;
    return {
      polarisation,
      centre,
      fwhm,
      shape: fwhm > widestLorentzian ? 'gaussian' : 'lorentzian',
      crossSection,
    };
  });
}

/** Ions and the lines they absorb in; the lines only where the design rests on them. */
function absorptionConstants(crystal: Crystal, design: Design, book: ConstantBook) {
  const { absorption } = design.rod;
  const dopant =
    crystal.dopantBasis === 'none'
      ? 1
      : book.take('material.dopantShare', crystalValue(crystal, 'dopantShare'));
  const usesLines = absorption === 'from crystal' || absorption.drift === 'follows the line';
  return {
    ionDensity: book.take('material.ionDensity', ionDensity(crystal, dopant)),
    absorptionLines: usesLines ? pumpLines(crystal, book) : [],
  };
}

function mountConstants({ mount }: Design, book: ConstantBook) {
  const material = findMountMaterial(mount.material)!;
  const contact = findInterface(mount.interface.kind)!;
  const conductivity = material.values.thermalConductivity;
  const label = `Conductivity of ${material.name}`;
  return {
    mountConductivity:
      mount.shape.kind === 'none'
        ? null
        : book.take('mount.thermalConductivity', conductivity, undefined, label),
    contactConductance: book.take(
      'mount.interface.conductance',
      contact.conductance,
      ownValue(mount.interface.conductance, 'heatTransferCoefficient'),
      `Contact conductance, ${contact.name}`,
    ),
  };
}

export type ChosenConstants = ReturnType<typeof bodyConstants> &
  ReturnType<typeof lightConstants> &
  ReturnType<typeof absorptionConstants> &
  ReturnType<typeof mountConstants>;

export interface Choice {
  crystal: Crystal;
  line: LaserLine;
  /** SI. */
  values: ChosenConstants;
  /** What was taken, with range and source. */
  used: Constant[];
  /** What the catalogue lacks and the design does not give; `values` are then of no use. */
  missing: Fault[];
}

/**
 * Chooses every constant a design rests on, from the catalogue or as entered.
 * @param design one whose names are all in the catalogue
 * @param overrides constants to stand at another value, by path
 */
export function chooseConstants(design: Design, overrides: Overrides = {}): Choice {
  const book = new ConstantBook(design, overrides);
  const crystal = findCrystal(design.rod.crystal)!;
  const line = laserLine(crystal, valueOf(design.rod.laserLine, 'length'), design.rod.cut);
  const values = {
    ...absorptionConstants(crystal, design, book),
    ...lightConstants(crystal, line, design, book),
    ...bodyConstants(crystal, design, book),
    ...mountConstants(design, book),
  };
  return { crystal, line, values, used: book.used, missing: book.missing };
}
