import { describe, expect, test } from 'vitest';
import { demoDesign } from '../../src/design/demo';
import { polarisationShares } from '../../src/design/resolve-pump';
import { resolve } from '../../src/design/resolve';
import { withValue } from '../../src/design/fields';
import { findCrystal } from '../../src/materials';
import { checked, vanadate, vanadateWith } from './designs';

/** A design of another crystal at its own line, pumped at one of its absorption lines. */
function designOf(crystal: string, laserLine: string, wavelength: string, cut: 'a' | 'c' = 'a') {
  const changes: [string, unknown][] = [
    ['rod.crystal', crystal],
    ['rod.laserLine', laserLine],
    ['pump.wavelength', wavelength],
    ['rod.cut', cut],
    ['rod.dopantConcentration', undefined],
  ];
  return checked(changes.reduce<unknown>((at, [path, value]) => withValue(at, path, value), vanadate));
}

// 12 digits: the conversions are a few multiplications in double precision.
const digits = 12;

describe('a resolved design holds SI numbers: ', () => {
  const { pump, diode, rod, mount, cavity, limits, ...room } = resolve(
    vanadateWith({ 'rod.endCaps.front': '2 mm' }),
  );

  test.each([
    ['pump power', pump.power, 12],
    ['power searched', pump.searchTo, 30],
    ['wavelength', pump.wavelength, 808e-9],
    ['reference case temperature', pump.referenceCaseTemperature, 298.15],
    ['drift', pump.drift, 0.28e-9],
    ['linewidth', pump.linewidth, 3e-9],
    ['pump radius', pump.radius, 200e-6],
    ['waist position', pump.waistPosition, 0.5e-3],
    ['return reflectivity', pump.returnReflectivity, 0.95],
    ['entrance transmission', pump.entranceTransmission, 0.99],
    ['wall-plug efficiency', diode.wallPlugEfficiency, 0.48],
    ['case to base', diode.caseToBase, 0.35],
    ['front cap', rod.frontCap, 2e-3],
    ['doped length', rod.dopedLength, 10e-3],
    ['back cap', rod.backCap, 0],
    ['face film', rod.faceFilm, 10],
    ['section area', rod.sectionArea, 9e-6],
    ['mount radius', mount.body!.outerRadius, 12e-3],
    ['mount to base', mount.baseResistance, 0],
    ['passive loss', cavity.passiveLoss, 0.01],
    ['output coupling', cavity.outputCoupling, 0.05],
    ['other mirrors', cavity.otherTransmission, 0.001],
    ['lens radius as the pump radius', cavity.lensRadius, 200e-6],
    ['highest rod temperature', limits.rodPeakTemperature, 373.15],
    ['dew point guard', limits.dewPointGuard, 3],
    ['absorption share', limits.absorptionShare, 0.9],
    ['highest case temperature', limits.highestCaseTemperature, 323.15],
    ['ambient', room.surroundings.ambient, 295.15],
    ['coldest ambient, 7 K below', room.coldestAmbient, 288.15],
    ['hottest ambient, 8 K above', room.hottestAmbient, 303.15],
    ['humidity', room.surroundings.relativeHumidity, 0.5],
    ['air pressure', room.surroundings.airPressure, 101_300],
  ])('%s', (_, value, expected) => {
    expect(value).toBeCloseTo(expected, digits);
  });

  test('words give what they stand for', () => {
    expect(diode.caseTemperature).toBeNull();
    expect(cavity.elements[0]).toMatchObject({ kind: 'mirror', radius: Infinity });
    // Brewster, Phil. Trans. 105, 125 (1815): tan of the angle of incidence is the index.
    expect(cavity.elements[4]).toMatchObject({ kind: 'plate', incidence: Math.atan(1.45) });
    expect(
      resolve(vanadateWith({ 'pump.diode.caseTemperature': '30 degC' })).diode.caseTemperature,
    ).toBeCloseTo(303.15, 9);
  });

  test('coolers keep their order, and a TEC names whose help it needs', () => {
    expect(room.coolers.map(({ id, kind, demand }) => [id, kind, demand])).toEqual([
      ['fan', 'fan', 1],
      ['loop', 'liquid', 2],
      ['tec', 'tec', 4],
      ['plain', 'resistance', 0],
    ]);
    expect(room.coolers[2]!.label).toBe('tec (TEC over fan)');
    expect(room.chosenCooler).toBe('fan');
  });
});

describe('the section', () => {
  test('of a square rod conducts like a round one of 0.54 of its side, Incropera Table 4.1, with the true perimeter', () => {
    const { rod, mount, warnings } = resolve(checked(vanadate));
    expect(rod.radius).toBeCloseTo(0.54 * 3e-3, digits);
    // Perimeter 4 a over 2 pi 0.54 a.
    expect(rod.perimeterRatio).toBeCloseTo(4 / (2 * Math.PI * 0.54), digits);
    expect(mount.contactConductance).toBeCloseTo(9000 * rod.perimeterRatio, 6);
    expect(warnings.map((warning) => warning.where)).toContain('rod.section');
  });

  test('of a round rod is itself', () => {
    const { rod } = resolve(checked(demoDesign));
    expect([rod.radius, rod.perimeterRatio]).toEqual([2e-3, 1]);
    expect(rod.sectionArea).toBeCloseTo(Math.PI * 4e-6, digits);
  });
});

describe('the crystal axes', () => {
  const values = findCrystal('Nd:YVO4')!.values;
  const a = resolve(designOf('Nd:YVO4', '1064 nm', '808 nm', 'a')).rod;
  const c = resolve(designOf('Nd:YVO4', '1064 nm', '808 nm', 'c')).rod;

  test('of an a-cut rod: a along it, the geometric mean of a and c across it', () => {
    const [kA, kC] = [values.thermalConductivityA!.nominal, values.thermalConductivityC!.nominal];
    expect(a.conductivityAxial).toBe(kA);
    expect(a.conductivityRadial).toBeCloseTo(Math.sqrt(kA * kC), digits);
    expect(a.expansion).toBe(values.expansionA!.nominal);
    expect(a.expansionAcross).toBeCloseTo(
      (values.expansionA!.nominal + values.expansionC!.nominal) / 2,
      digits,
    );
  });

  test('of a c-cut rod: c along it, a in every direction across it', () => {
    expect(c.conductivityAxial).toBe(values.thermalConductivityC!.nominal);
    expect(c.conductivityRadial).toBe(values.thermalConductivityA!.nominal);
    expect(c.expansionAcross).toBe(values.expansionA!.nominal);
  });

  test('decide the polarisation of the laser, and with it index, dn/dT and cross-section', () => {
    expect(a.refractiveIndex).toBe(values.refractiveIndexExtraordinary!.nominal);
    expect(a.thermoOptic).toBe(values.thermoOpticExtraordinary!.nominal);
    expect(c.refractiveIndex).toBe(values.refractiveIndexOrdinary!.nominal);
    expect(c.thermoOptic).toBe(values.thermoOpticOrdinary!.nominal);
    // The pi line of vanadate is the stronger one, which is why it is cut along a.
    expect(a.laser.emissionCrossSection).toBeGreaterThan(c.laser.emissionCrossSection);
  });

  test.each([
    ['a', 'unpolarised', 0.5, 0.5],
    ['a', 'pi', 1, 0],
    ['a', 'sigma', 0, 1],
    ['c', 'unpolarised', 0, 1],
    ['c', 'pi', 0, 1],
  ] as const)('let a %s-cut rod see %s pump light as %f pi and %f sigma', (cut, polarisation, pi, sigma) => {
    const design = vanadateWith({ 'rod.cut': cut, 'pump.polarisation': polarisation });
    expect(polarisationShares(findCrystal('Nd:YVO4')!, design)).toEqual({ pi, sigma });
  });
});

describe('the laser line', () => {
  test('of Nd:YAG at 946 nm ends on the fifth ground level; at 1064 nm it is four-level', () => {
    // Koechner, Solid-State Laser Engineering: the 946 nm line ends on the uppermost Stark level of the ground state.
    const { thermal } = resolve(designOf('Nd:YAG', '946 nm', '808 nm')).rod.laser;
    expect(thermal).toMatchObject({ lower: 4, start: 0 });
    expect(thermal!.ground).toHaveLength(5);
    expect(resolve(designOf('Nd:YAG', '1064 nm', '808 nm')).rod.laser.thermal).toBeNull();
  });

  test('of Yb:YAG at 1030 nm ends on the third ground level, 612 cm^-1 up', () => {
    const { thermal } = resolve(designOf('Yb:YAG', '1030 nm', '940 nm')).rod.laser;
    expect([thermal!.lower, thermal!.ground[thermal!.lower]]).toEqual([2, 61_200]);
  });

  test('without levels in the catalogue is answered with a warning', () => {
    const { rod, warnings } = resolve(designOf('Yb:CaF2', '1030 nm', '980 nm'));
    expect(rod.laser.thermal).toBeNull();
    expect(warnings.map((warning) => warning.where)).toContain('rod.laserLine');
  });
});

describe('absorption and heat', () => {
  test('a coefficient entered is held, or follows the line, or the lines of the crystal are taken', () => {
    const at = (absorption: unknown) => resolve(vanadateWith({ 'rod.absorption': absorption }));
    expect(at({ coefficient: '4.5 cm^-1' }).rod.absorption).toEqual({
      kind: 'coefficient',
      coefficient: 450,
    });
    expect(at({ coefficient: '4.5 cm^-1', drift: 'follows the line' }).rod.absorption).toMatchObject({
      kind: 'scaled-coefficient',
      coefficient: 450,
      referenceWavelength: 808e-9,
    });
    const lines = at('from crystal').rod;
    expect(lines.absorption).toMatchObject({ kind: 'lines', ionDensity: lines.laser.ionDensity });
    // Sites of YVO4 per volume, 1.255e28 m^-3 from its cell (a 0.712 nm, c 0.629 nm, four formulas; common data), 2 %.
    expect(lines.laser.ionDensity / (0.003 * 1.255e28)).toBeCloseTo(1, 1);
  });

  test('a heat fraction stated for lasing alone is no less with the beam blocked', () => {
    const rule = resolve(checked(vanadate)).rod.heatFraction;
    expect(rule).toMatchObject({ kind: 'measured', lasing: 0.27 });
    expect(rule.kind === 'measured' && rule.blocked).toBeGreaterThanOrEqual(0.27);
    const stated = resolve(vanadateWith({ 'rod.heatFraction.blocked': '20 %' })).rod.heatFraction;
    expect(stated).toEqual({ kind: 'measured', lasing: 0.27, blocked: 0.2 });
  });
});

describe('mirrors', () => {
  test('inside a linear cavity are met twice in a round trip, in a ring once', () => {
    const fold = { mirror: { radius: '500 mm', transmission: '2 %', incidence: '10 deg' } };
    const line = [
      { mirror: { radius: 'flat', transmission: '0 %' } },
      { rod: true },
      { space: '50 mm' },
      fold,
      { space: '50 mm' },
      { mirror: { radius: 'flat', transmission: '1 %' } },
    ];
    expect(resolve(vanadateWith({ cavity: { elements: line } })).cavity.outputCoupling).toBeCloseTo(
      1 - 0.98 ** 2,
      digits,
    );
    const ring = resolve(
      vanadateWith({ cavity: { kind: 'ring', elements: [...line.slice(1), line[0]] } }),
    ).cavity;
    expect([ring.outputCoupling, ring.otherTransmission]).toEqual([
      expect.closeTo(0.02, digits),
      expect.closeTo(0.01, digits),
    ]);
  });
});

describe('what a person should know of the design', () => {
  test('is said: a room whose ends lie on the wrong side, an interface that attacks the mount, a concentration of no effect', () => {
    const where = (changes: Record<string, unknown>) =>
      resolve(vanadateWith(changes)).warnings.map((warning) => warning.where);
    expect(where({ 'surroundings.coldestAmbient': '25 degC' })).toContain('surroundings.coldestAmbient');
    expect(where({ 'surroundings.hottestAmbient': '10 degC' })).toContain('surroundings.hottestAmbient');
    expect(where({ 'mount.material': 'aluminium 6061', 'mount.interface.kind': 'liquid metal' })).toContain(
      'mount.interface.kind',
    );
    expect(where({})).toContain('rod.absorption');
  });

  test('a power beyond the range stated is searched all the same', () => {
    expect(resolve(vanadateWith({ 'pump.power': '40 W' })).pump.searchTo).toBeGreaterThan(40);
    expect(resolve(vanadateWith({ 'pump.powerRange': undefined })).pump.searchTo).toBe(36);
  });
});
