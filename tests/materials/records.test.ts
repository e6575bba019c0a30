import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import * as materials from '../../src/materials';
import type { Crystal, Sourced } from '../../src/materials';
import { convertTo, type Dimension } from '../../src/quantity';

const tables: Record<string, unknown> = {
  crystals: materials.crystals,
  mountMaterials: materials.mountMaterials,
  interfaces: materials.interfaces,
  coolants: materials.coolants,
  emissivities: materials.emissivities,
  pumpDiodes: materials.pumpDiodes,
  thermoelectric: materials.thermoelectric,
};

/** Every object in a record, with where it stands. */
function* objects(node: unknown, path: string): Generator<[string, Record<string, unknown>]> {
  if (node === null || typeof node !== 'object') return;
  if (!Array.isArray(node)) yield [path, node as Record<string, unknown>];
  for (const [key, child] of Object.entries(node)) yield* objects(child, `${path}.${key}`);
}
const everything = Object.entries(tables).flatMap(([name, table]) => [...objects(table, name)]);
const sourced = everything.filter(([, object]) => 'nominal' in object) as unknown as [string, Sourced][];

/** Each number may stand alone only where it is covered by the source of the object that holds it. */
const COVERED = new Set(
  ['centre', 'wavelength', 'lowerLevel', 'ground', 'upper', 'temperatures', 'value', 'coefficients']
    .concat([
      'thermalConductivity',
      'thermalConductivityA',
      'thermalConductivityC',
      'temperature',
      'temperature',
    ])
    .concat(['density', 'specificHeat', 'dynamicViscosity', 'freezingTemperature', 'pressure'])
    .concat(['couples', 'legSide', 'legHeight', 'lowestTemperature', 'highestTemperature']),
);

describe('the material records', () => {
  test('hold 17 crystals, 22 mount materials, 10 interfaces and 5 coolants', () => {
    expect(materials.crystals).toHaveLength(17);
    expect(materials.mountMaterials).toHaveLength(22);
    expect(materials.interfaces).toHaveLength(10);
    expect(materials.coolants).toHaveLength(5);
    expect(sourced.length).toBeGreaterThan(500);
  });

  test('every number has a source that is listed', () => {
    for (const [path, object] of everything) {
      if ('source' in object) expect(materials.sources, path).toHaveProperty([object['source'] as string]);
      if ('nominal' in object) expect(object, path).toHaveProperty('source');
      for (const [key, value] of Object.entries(object)) {
        const bare = typeof value === 'number' || (Array.isArray(value) && typeof value[0] === 'number');
        if (bare && !('nominal' in object)) expect(COVERED, `${path}.${key}`).toContain(key);
      }
    }
  });

  test('every listed source is used by a number', () => {
    const used = new Set(everything.map(([, object]) => object['source']));
    expect(Object.keys(materials.sources).filter((key) => !used.has(key))).toEqual([]);
  });

  test('every nominal value lies between its low and high', () => {
    for (const [path, { nominal, low, high }] of sourced) {
      expect(Number.isFinite(nominal), path).toBe(true);
      if (low !== null) expect(low, path).toBeLessThanOrEqual(nominal);
      if (high !== null) expect(high, path).toBeGreaterThanOrEqual(nominal);
    }
  });

  test('every unit is an SI unit without a factor', () => {
    const dimensions: Record<string, Dimension> = {
      '1': 'dimensionless',
      '1/K': 'expansion',
      'W/(m K)': 'thermalConductivity',
      'W/(m^2 K)': 'heatTransferCoefficient',
      Pa: 'stress',
      'kg/m^3': 'density',
      'J/(kg K)': 'specificHeat',
      'W/m': 'powerPerLength',
      '1/m^3': 'numberDensity',
      'm^2': 'area',
      m: 'length',
      s: 'time',
      K: 'temperatureDifference',
      'm/K': 'wavelengthDrift',
      'V/K': 'seebeck',
      'ohm m': 'electricalResistivity',
    };
    for (const [path, { unit }] of sourced) {
      if (unit === 'ohm m^2') continue; // the joint of a thermoelectric leg, a dimension nobody enters
      expect(dimensions, path).toHaveProperty([unit]);
      expect(convertTo(1, unit === '1' ? '' : unit, dimensions[unit]!), path).toBe(1);
    }
  });

  test('a value from memory or practice never claims high confidence unless it is a handbook constant', () => {
    for (const [path, { seen, confidence, source }] of sourced) {
      if (!seen && confidence === 'high') expect(source, path).toBe('handbooks');
    }
  });

  test('names, ids and aliases are unique within a list', () => {
    for (const list of [
      materials.crystals,
      materials.mountMaterials,
      materials.interfaces,
      materials.coolants,
    ]) {
      const names = list.flatMap((record) => [
        ...new Set([record.name, ...record.aliases].map((n) => n.toLowerCase())),
      ]);
      expect(new Set(names).size).toBe(names.length);
      expect(new Set(list.map((record) => record.id)).size).toBe(list.length);
      for (const record of list) expect(record.id).toMatch(/^[a-z0-9_]+$/);
    }
  });

  test('what can hurt carries its caution', () => {
    expect(materials.findMountMaterial('beryllium oxide')?.caution).toMatch(/never machine/);
    expect(materials.findCrystal('Pr:YLF')?.caution).toMatch(/brittle/);
    expect(materials.findInterface('direct water')?.caution).toMatch(/water near current/);
    for (const crystal of materials.crystals) {
      if (/F/.test(crystal.host.replace('Fe', '')))
        expect(crystal.caution, crystal.name).toMatch(/brittle fluoride/);
      if (crystal.host.startsWith('Be')) expect(crystal.caution).toMatch(/beryllium/);
    }
  });

  test('an interface that attacks a mount material names one that exists', () => {
    for (const { incompatible = [] } of materials.interfaces) {
      for (const name of incompatible) expect(materials.findMountMaterial(name)?.name).toBe(name);
    }
  });
});

const POLARISATIONS = ['pi', 'sigma', 'none'];

describe('every crystal', () => {
  test.each(materials.crystals.map((crystal) => [crystal.name, crystal] as const))(
    '%s is complete',
    (_, crystal) => {
      expect(['isotropic', 'uniaxial', 'biaxial']).toContain(crystal.symmetry);
      expect(['atoms', 'mass', 'none']).toContain(crystal.dopantBasis);
      expect(crystal.polarisationAxes === undefined).toBe(crystal.symmetry === 'isotropic');
      for (const line of [...crystal.lines, ...crystal.absorption])
        expect(POLARISATIONS).toContain(line.polarisation);
      for (const line of crystal.lines) {
        expect(['four-level', 'quasi-three-level']).toContain(line.scheme);
        expect(line.wavelength).toBeGreaterThan(400e-9);
        expect(line.wavelength).toBeLessThan(3e-6);
        if (crystal.symmetry !== 'isotropic') expect(line.polarisation).not.toBe('none');
        expect(materials.refractiveIndex(crystal, line.polarisation)?.nominal).toBeGreaterThan(1.3);
        expect(materials.thermoOptic(crystal, line.polarisation)).toBeDefined();
        if (line.scheme === 'quasi-three-level') expect(line.lowerShare?.nominal).toBeGreaterThan(0);
      }
      for (const axis of ['a', 'b', 'c'] as const) {
        expect(materials.conductivity(crystal, axis)?.nominal).toBeGreaterThan(0);
        expect(materials.expansion(crystal, axis)).toBeDefined();
      }
      for (const property of [
        'youngModulus',
        'poissonRatio',
        'density',
        'specificHeat',
        'fractureStrength',
      ] as const) {
        expect(crystal.values[property]?.nominal, property).toBeGreaterThan(0);
      }
      expect(crystal.lines.length).toBeGreaterThan(0);
      expect(materials.absorptionLines(crystal).length).toBeGreaterThan(0);
      expect(materials.ionDensity(crystal, 0.01)?.nominal).toBeGreaterThan(1e24);
      if (crystal.levels === undefined) expect(crystal.missing).toContain('Stark levels');
      if (materials.conductivityExponent(crystal) === undefined) {
        expect(crystal.missing).toContain('thermal conductivity against temperature');
      }
    },
  );
});

describe('adding a crystal is one record', () => {
  const added: Crystal = {
    ...structuredClone(materials.findCrystal('Nd:YVO4')!),
    id: 'xx_host',
    name: 'Xx:host',
    aliases: ['test host'],
  };
  added.values.thermoOpticExtraordinary = { ...added.values.thermoOpticExtraordinary!, nominal: 1e-6 };

  test('every helper reads the record it is given and nothing else', () => {
    expect(materials.thermoOptic(added, 'pi')?.nominal).toBe(1e-6);
    expect(materials.nearestName([...materials.crystals, added], 'Xx:hots')).toBe('Xx:host');
  });

  test('no room of physics knows a crystal by name', () => {
    const rooms = [
      'pump',
      'cooling',
      'cavity',
      'heat',
      'elastic',
      'lens',
      'laser',
      'operating',
      'limits',
      'study',
    ];
    const named = materials.crystals.flatMap(({ id, name }) => [`'${name}'`, `'${id}'`, `"${name}"`]);
    const root = join(import.meta.dirname, '../../src');
    for (const room of readdirSync(root).filter((entry) => rooms.includes(entry))) {
      for (const file of readdirSync(join(root, room)).filter((entry) => entry.endsWith('.ts'))) {
        const text = readFileSync(join(root, room, file), 'utf8');
        expect(
          named.filter((name) => text.includes(name)),
          `${room}/${file}`,
        ).toEqual([]);
      }
    }
  });
});
