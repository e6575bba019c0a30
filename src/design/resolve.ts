import type { Surroundings } from '../cooling';
import { DesignError, type Warning } from '../errors';
import type { Limits } from './bounds';
import type { Overrides } from './constants';
import { valueOf } from './quantity-field';
import { resolveCavity } from './resolve-cavity';
import { chooseConstants } from './resolve-constants';
import { resolveCoolers } from './resolve-coolers';
import { resolveMount } from './resolve-mount';
import { pumpWarnings, resolveDiode, resolvePump } from './resolve-pump';
import { resolveRod } from './resolve-rod';
import type { ResolvedDesign } from './resolved';
import type { Design } from './schema';

/** How far a room may go below and above its present temperature where nothing is stated, K (common practice, no source). */
const colderBy = 7;
const hotterBy = 8;

function resolveLimits({ limits, pump }: Design, ambient: number, fractureStrength: number): Limits {
  return {
    rodPeakTemperature: valueOf(limits.rodPeakTemperature, 'temperature'),
    fractureSafetyFactor: limits.fractureSafetyFactor,
    stabilityMargin: limits.stabilityMargin,
    absorptionShare: valueOf(limits.absorptionShare, 'dimensionless'),
    dewPointGuard: valueOf(limits.dewPointGuard, 'temperatureDifference'),
    tecCurrentShare: valueOf(limits.tecCurrentShare, 'dimensionless'),
    aberrationLoss: valueOf(limits.aberrationLoss, 'dimensionless'),
    highestCaseTemperature: valueOf(pump.diode.highestCaseTemperature, 'temperature'),
    fractureStrength,
    ambient,
  };
}

interface Room {
  surroundings: Surroundings;
  coldestAmbient: number;
  hottestAmbient: number;
  warnings: Warning[];
}

/** The room now and at its ends; ends on the wrong side of now are set to now, with a warning. */
function resolveRoom({ surroundings: given }: Design): Room {
  const ambient = valueOf(given.ambient, 'temperature');
  const endOr = (text: string | undefined, usual: number) =>
    text === undefined ? usual : valueOf(text, 'temperature');
  const coldest = endOr(given.coldestAmbient, ambient - colderBy);
  const hottest = endOr(given.hottestAmbient, ambient + hotterBy);
  const warnings: Warning[] = [];
  const add = (where: string, end: string) =>
    warnings.push({ where, text: `${end} the ambient "${given.ambient}".` });
  if (coldest > ambient)
    add('surroundings.coldestAmbient', `The coldest ambient "${given.coldestAmbient}" is warmer than`);
  if (hottest < ambient)
    add('surroundings.hottestAmbient', `The hottest ambient "${given.hottestAmbient}" is colder than`);
  return {
    surroundings: {
      ambient,
      relativeHumidity: valueOf(given.relativeHumidity, 'dimensionless'),
      airPressure: valueOf(given.airPressure, 'pressure'),
    },
    coldestAmbient: Math.min(ambient, coldest),
    hottestAmbient: Math.max(ambient, hottest),
    warnings,
  };
}

/**
 * Turns a checked design into SI numbers with material values chosen.
 * @param overrides constants to stand at another value, by path, for the band
 * @throws DesignError where the catalogue lacks a value that the design does not give
 */
export function resolve(design: Design, overrides: Overrides = {}): ResolvedDesign {
  const choice = chooseConstants(design, overrides);
  if (choice.missing.length > 0) throw new DesignError(choice.missing);
  const { rod, warnings: ofRod } = resolveRod(design, choice);
  const { mount, warnings: ofMount } = resolveMount(design, rod, choice.values);
  const { warnings: ofRoom, ...room } = resolveRoom(design);
  const pump = resolvePump(design, choice.crystal);
  const limits = resolveLimits(design, room.surroundings.ambient, choice.values.fractureStrength);
  return {
    title: design.title,
    ...room,
    pump,
    diode: resolveDiode(design),
    rod,
    mount,
    coolers: resolveCoolers(design, limits.tecCurrentShare),
    chosenCooler: design.chosenCooler ?? design.coolers[0]!.id,
    cavity: resolveCavity(design, pump.radius),
    limits,
    constants: choice.used,
    warnings: [...ofRod, ...ofMount, ...pumpWarnings(design, pump), ...ofRoom],
  };
}
