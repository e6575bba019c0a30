import { checkDesign } from '../../src/design/check';
import { withValue } from '../../src/design/fields';
import type { Design } from '../../src/design/schema';
import { DesignError } from '../../src/errors';
import { demoDesign } from '../../src/design/demo';

/** A repeatable stream of numbers in 0..1 (Park & Miller 1988, minimal standard generator). */
export function seeded(seed: number): () => number {
  let state = seed % 2147483647;
  return () => {
    state = (state * 48271) % 2147483647;
    return (state - 1) / 2147483646;
  };
}

const crystalsTried = [
  { crystal: 'Nd:YAG', line: '1064 nm', pump: 808, isotropic: true },
  { crystal: 'Nd:YVO4', line: '1064 nm', pump: 808, isotropic: false },
  { crystal: 'Yb:YAG', line: '1030 nm', pump: 940, isotropic: true },
  { crystal: 'Pr:YLF', line: '640 nm', pump: 444, isotropic: false },
] as const;

/** Coolers of every kind, as in the demo design, with a plain K/W beside them. */
const coolers = [...demoDesign.coolers, { id: 'plain', kind: 'resistance' as const, resistance: '0.5 K/W' }];

/**
 * A design drawn from everything the schema offers: crystals, profiles, passes, caps, circuits, coolers, cavities.
 * The numbers stay where a laboratory's would.
 */
export function randomDesign(random: () => number): Design {
  const between = (low: number, high: number) => low + (high - low) * random();
  const pick = <T>(list: readonly T[]): T => list[Math.floor(random() * list.length)]!;
  const text = (value: number, unit: string) => `${value.toPrecision(6)} ${unit}`;
  const { crystal, line, pump, isotropic } = pick(crystalsTried);
  const side = between(2, 5);
  const power = between(1, 40);
  const entered = random() < 0.5;
  const changes: Record<string, unknown> = {
    coolers,
    chosenCooler: pick(coolers).id,
    'surroundings.ambient': text(between(5, 35), 'degC'),
    'surroundings.coldestAmbient': undefined,
    'surroundings.hottestAmbient': undefined,
    'surroundings.relativeHumidity': text(between(20, 80), '%'),
    'pump.power': text(power, 'W'),
    'pump.powerRange': ['0 W', text(power * between(1.5, 4), 'W')],
    'pump.wavelength': text(pump + between(-2, 2), 'nm'),
    'pump.linewidth': text(between(0.5, 4), 'nm'),
    'pump.radius': text(between(0.05, 0.28) * side * 1000, 'um'),
    'pump.profile': pick(['gaussian', 'flat-top', 'super-gaussian']),
    'pump.beamQuality': random() < 0.5 ? undefined : between(2, 60),
    'pump.polarisation': isotropic ? 'unpolarised' : pick(['unpolarised', 'pi', 'sigma']),
    'pump.passes': pick([1, 2]),
    'pump.diode.circuit': pick(['shared', 'separate']),
    'pump.diode.caseTemperature': random() < 0.2 ? '30 degC' : 'follows the base',
    'rod.crystal': crystal,
    'rod.laserLine': line,
    'rod.dopantConcentration': undefined,
    'rod.section':
      random() < 0.5
        ? { shape: 'round', diameter: text(side, 'mm') }
        : { shape: 'square', side: text(side, 'mm') },
    'rod.length': text(between(3, 15), 'mm'),
    'rod.endCaps': {
      front: text(pick([0, between(0.5, 4)]), 'mm'),
      back: text(pick([0, between(0.5, 4)]), 'mm'),
    },
    'rod.absorption': entered
      ? { coefficient: text(between(1, 8), 'cm^-1'), drift: pick(['ignored', 'follows the line']) }
      : 'from crystal',
    'rod.heatFraction': pick(['from laser', 'quantum defect', { lasing: '30 %' }]),
    'rod.faceFilm': pick(['0 W/(m^2 K)', '10 W/(m^2 K)', '500 W/(m^2 K)']),
    'mount.material': pick(['copper', 'aluminium 6061', 'stainless steel 304']),
    'mount.interface.conductance': text(between(0.1, 3), 'W/(cm^2 K)'),
    'mount.baseResistance': pick(['0 K/W', '0.4 K/W']),
    'cavity.elements.3.space': text(between(20, 200), 'mm'),
    'cavity.elements.4.mirror.radius': text(between(60, 400), 'mm'),
    uncertainty: {},
  };
  const input = Object.entries(changes).reduce<unknown>(
    (at, [path, value]) => withValue(at, path, value),
    demoDesign,
  );
  const checked = checkDesign(input);
  if (!checked.ok) throw new DesignError(checked.faults);
  return checked.design;
}
