import { checkDesign } from '../../src/design/check';
import { demoDesign } from '../../src/design/demo';
import { withValue } from '../../src/design/fields';
import type { Design, DesignInput } from '../../src/design/schema';
import type { Fault } from '../../src/errors';

/** A vanadate laser that uses what the demo does not: a square section, a coefficient of its own, an entered contact. */
export const vanadate: DesignInput = {
  format: 'pump-ceiling/design',
  version: 1,
  title: 'Vanadate bench laser, 12 W',
  surroundings: { ambient: '22 degC', relativeHumidity: '50 %' },
  pump: {
    power: '12 W',
    powerRange: ['0 W', '30 W'],
    wavelength: '808 nm',
    radius: '200 um',
    profile: 'flat-top',
    beamQuality: 40,
    waistPosition: '0.5 mm',
  },
  rod: {
    crystal: 'Nd:YVO4',
    dopantConcentration: '0.3 %',
    cut: 'a',
    section: { shape: 'square', side: '3 mm' },
    length: '10 mm',
    laserLine: '1064 nm',
    absorption: { coefficient: '4.5 cm^-1' },
    heatFraction: { lasing: '27 %' },
  },
  mount: {
    material: 'copper',
    shape: { outerRadius: '12 mm' },
    interface: { kind: 'indium foil', conductance: '0.9 W/(cm^2 K)' },
  },
  coolers: [
    {
      id: 'fan',
      kind: 'fan',
      sink: { width: '80 mm', height: '80 mm', finHeight: '25 mm', finCount: 28, finThickness: '0.8 mm' },
      fan: { freeFlow: '60 m^3/h', shutOffPressure: '45 Pa', power: '3 W' },
    },
    {
      id: 'loop',
      kind: 'liquid',
      channel: { diameter: '4 mm', length: '160 mm' },
      flow: '1 L/min',
      supply: { kind: 'air', resistance: '0.02 K/W' },
    },
    {
      id: 'tec',
      kind: 'tec',
      module: { couples: 127, legSide: '1.4 mm', legHeight: '1.6 mm' },
      setTemperature: '20 degC',
      highestCurrent: '5 A',
      hotSide: 'fan',
    },
    { id: 'plain', kind: 'resistance', resistance: '0.4 K/W' },
  ],
  cavity: {
    kind: 'linear',
    elements: [
      { mirror: { radius: 'flat' } },
      { rod: true },
      { space: '30 mm' },
      { lens: '400 mm' },
      { plate: { thickness: '3 mm', index: 1.45, incidence: 'Brewster' } },
      { space: '30 mm' },
      { mirror: { radius: '200 mm', transmission: '5 %' } },
    ],
  },
  uncertainty: { 'pump.radius': '5 %', 'mount.interface.conductance': '30 %' },
};

/** The vanadate rod held in a block, with a measured pump profile. */
export const blockMounted: DesignInput = {
  ...vanadate,
  title: 'Vanadate in a block',
  pump: {
    ...vanadate.pump,
    radius: '220 um',
    profile: 'table',
    profileTable: [
      ['0 um', 1],
      ['100 um', 0.9],
      ['0.2 mm', 0.4],
      ['300 um', 0],
    ],
  },
  mount: { ...vanadate.mount, shape: { kind: 'block', width: '30 mm', depth: '10 mm', cover: '8 mm' } },
  uncertainty: {},
};

/** A design that must be in order. */
export function checked(input: unknown): Design {
  const found = checkDesign(input);
  if (!found.ok) throw new Error(found.faults.map((fault) => fault.message).join('\n'));
  return found.design;
}

export const faultsOf = (input: unknown): Fault[] => {
  const found = checkDesign(input);
  return found.ok ? [] : found.faults;
};

/** The vanadate design with values at other paths replaced, checked. */
export function vanadateWith(changes: Record<string, unknown>): Design {
  return checked(
    Object.entries(changes).reduce<unknown>((at, [path, value]) => withValue(at, path, value), vanadate),
  );
}

export const inputs: [string, DesignInput][] = [
  ['the demo design', demoDesign],
  ['the vanadate design', vanadate],
  ['the block-mounted design', blockMounted],
];
