import type { CavityElement } from '../cavity';
import type { Warning } from '../errors';
import { crystalValue, findInterface, findMountMaterial } from '../materials';
import type { Limits } from './bounds';
import { ConstantBook, type Overrides } from './constants';
import { valueOf } from './quantity-field';
import { polarisationShares, resolveRod } from './resolve-rod';
import { resolveCoolers } from './resolve-coolers';
import type { ResolvedCavity, ResolvedDesign, ResolvedDiode, ResolvedMount, ResolvedPump } from './resolved';
import type { Design, ElementDesign } from './schema';

/** Without a range of its own a design is searched up to this multiple of its pump power. */
const usualSearch = 3;

function resolvePump(design: Design, crystalShares: { pi: number; sigma: number }): ResolvedPump {
  const { pump } = design;
  const power = valueOf(pump.power, 'power');
  const top = pump.powerRange ? valueOf(pump.powerRange[1], 'power') : usualSearch * power || 1;
  return {
    power,
    searchTo: Math.max(top, 1.02 * power),
    wavelength: valueOf(pump.wavelength, 'length'),
    referenceCaseTemperature: valueOf(pump.wavelengthAtCase, 'temperature'),
    drift: valueOf(pump.wavelengthDrift, 'wavelengthDrift'),
    linewidth: valueOf(pump.linewidth, 'length'),
    radius: valueOf(pump.radius, 'length'),
    profile: pump.profile === 'super-gaussian' ? { kind: 'super-gaussian', order: pump.profileOrder } : { kind: pump.profile },
    beamQuality: pump.beamQuality ?? null,
    waistPosition: valueOf(pump.waistPosition, 'length'),
    polarisationShares: crystalShares,
    passes: pump.passes === 2 ? 2 : 1,
    returnReflectivity: valueOf(pump.returnReflectivity, 'dimensionless'),
    entranceTransmission: valueOf(pump.entranceTransmission, 'dimensionless'),
  };
}

function resolveDiode({ pump: { diode } }: Design): ResolvedDiode {
  const follows = diode.caseTemperature.trim().toLowerCase() === 'follows the base';
  return {
    wallPlugEfficiency: valueOf(diode.wallPlugEfficiency, 'dimensionless'),
    circuit: diode.circuit,
    caseToBase: valueOf(diode.caseToBase, 'thermalResistance'),
    caseTemperature: follows ? null : valueOf(diode.caseTemperature, 'temperature'),
  };
}

function resolveMount(design: Design, perimeterRatio: number, book: ConstantBook): ResolvedMount {
  const { mount } = design;
  const material = findMountMaterial(mount.material)!;
  const contact = findInterface(mount.interface.kind)!;
  const own = mount.interface.conductance;
  const conductance = book.take('mount.interface.conductance', `Contact conductance, ${contact.name}`, contact.conductance, own === undefined ? undefined : valueOf(own, 'heatTransferCoefficient'), 'mount.interface.conductance');
  return {
    name: material.name,
    conductivity: book.take('mount.thermalConductivity', `Conductivity of ${material.name}`, material.values.thermalConductivity, undefined, 'mount.material'),
    outerRadius: valueOf(mount.shape.outerRadius, 'length'),
    contactConductance: conductance * perimeterRatio,
    baseResistance: valueOf(mount.baseResistance, 'thermalResistance'),
    expansion: material.values.expansion.nominal,
    density: material.values.density.nominal,
    ...(material.caution ? { caution: material.caution } : {}),
  };
}

function elementOf(element: ElementDesign): CavityElement {
  if (element.mirror) {
    const { radius, incidence, transmission } = element.mirror;
    return { kind: 'mirror', radius: valueOf(radius, 'length', { flat: Infinity }), incidence: valueOf(incidence, 'angle'), transmission: valueOf(transmission, 'dimensionless') };
  }
  if (element.space !== undefined) return { kind: 'space', length: valueOf(element.space, 'length') };
  if (element.lens !== undefined) return { kind: 'lens', focalLength: valueOf(element.lens, 'length') };
  if (element.plate) {
    const { thickness, index, incidence } = element.plate;
    return { kind: 'plate', thickness: valueOf(thickness, 'length'), refractiveIndex: index, incidence: valueOf(incidence, 'angle', { brewster: Math.atan(index) }) };
  }
  return { kind: 'rod' };
}

function resolveCavity(design: Design, pumpRadius: number): ResolvedCavity {
  const { cavity } = design;
  const elements = cavity.elements.map(elementOf);
  const last = elements.length - 1;
  // In a linear cavity the light meets an inner mirror twice in a round trip, an end mirror once.
  const losses = elements.flatMap((element, place) => {
    if (element.kind !== 'mirror') return [];
    const hits = cavity.kind === 'linear' && place > 0 && place < last ? 2 : 1;
    return [1 - (1 - element.transmission) ** hits];
  });
  const outputCoupling = Math.max(...losses);
  const output = losses.indexOf(outputCoupling);
  const others = losses.reduce((kept, loss, place) => (place === output ? kept : kept * (1 - loss)), 1);
  const radius = valueOf(cavity.lensRadius, 'length', { 'pump radius': pumpRadius });
  return { kind: cavity.kind, elements, passiveLoss: valueOf(cavity.passiveLoss, 'dimensionless'), outputCoupling, otherTransmission: 1 - others, lensRadius: radius };
}

function resolveLimits(design: Design, ambient: number, fractureStrength: number): Limits {
  const { limits } = design;
  return {
    rodPeakTemperature: valueOf(limits.rodPeakTemperature, 'temperature'),
    fractureSafetyFactor: limits.fractureSafetyFactor,
    stabilityMargin: limits.stabilityMargin,
    absorptionShare: valueOf(limits.absorptionShare, 'dimensionless'),
    dewPointGuard: valueOf(limits.dewPointGuard, 'temperatureDifference'),
    tecCurrentShare: valueOf(limits.tecCurrentShare, 'dimensionless'),
    aberrationLoss: valueOf(limits.aberrationLoss, 'dimensionless'),
    highestCaseTemperature: valueOf(design.pump.diode.highestCaseTemperature, 'temperature'),
    fractureStrength,
    ambient,
  };
}

function ambientWarnings(design: Design): Warning[] {
  const { ambient, coldestAmbient, hottestAmbient } = design.surroundings;
  const now = valueOf(ambient, 'temperature');
  const warnings: Warning[] = [];
  if (coldestAmbient !== undefined && valueOf(coldestAmbient, 'temperature') > now)
    warnings.push({ where: 'surroundings.coldestAmbient', text: `The coldest ambient "${coldestAmbient}" is warmer than the ambient "${ambient}".` });
  if (hottestAmbient !== undefined && valueOf(hottestAmbient, 'temperature') < now)
    warnings.push({ where: 'surroundings.hottestAmbient', text: `The hottest ambient "${hottestAmbient}" is colder than the ambient "${ambient}".` });
  return warnings;
}

/**
 * Turns a checked design into SI numbers with material values chosen.
 * @param overrides constants to stand at another value, by path, for the band
 * @throws DesignError where the catalogue lacks a value that the design does not give
 */
export function resolve(design: Design, overrides: Overrides = {}): ResolvedDesign {
  const book = new ConstantBook(overrides);
  const { rod, warnings, crystal } = resolveRod(design, book);
  const mount = resolveMount(design, rod.perimeterRatio, book);
  const pump = resolvePump(design, polarisationShares(crystal, design));
  const ambient = valueOf(design.surroundings.ambient, 'temperature');
  const ownStrength = design.rod.values.fractureStrength;
  const fractureStrength = book.take('material.fractureStrength', 'Fracture strength', crystalValue(crystal, 'fractureStrength'), ownStrength === undefined ? undefined : valueOf(ownStrength, 'pressure'), 'rod.values.fractureStrength');
  book.refuseMissing(crystal.name);
  const limits = resolveLimits(design, ambient, fractureStrength);
  const surroundings = {
    ambient,
    relativeHumidity: valueOf(design.surroundings.relativeHumidity, 'dimensionless'),
    airPressure: valueOf(design.surroundings.airPressure, 'pressure'),
  };
  const at = (text: string | undefined, usual: number) => (text === undefined ? usual : valueOf(text, 'temperature'));
  return {
    title: design.title,
    surroundings,
    coldestAmbient: Math.min(ambient, at(design.surroundings.coldestAmbient, ambient - 7)),
    hottestAmbient: Math.max(ambient, at(design.surroundings.hottestAmbient, ambient + 8)),
    pump,
    diode: resolveDiode(design),
    rod,
    mount,
    coolers: resolveCoolers(design, limits.tecCurrentShare),
    chosenCooler: design.chosenCooler ?? design.coolers[0]!.id,
    cavity: resolveCavity(design, pump.radius),
    limits,
    constants: book.used,
    warnings: [...warnings, ...ambientWarnings(design)],
  };
}
