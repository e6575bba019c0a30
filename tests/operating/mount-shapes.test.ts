import { describe, expect, it } from 'vitest';
import { resolve } from '../../src/design/resolve';
import { blockResistance } from '../../src/heat';
import { compareMounts } from '../../src/study/mounts';
import { picturesOf } from '../../src/report/pictures';
import { imbalanceOf } from '../trials/ledger';
import { benchOf, changed, trial } from '../trials/trial';

const held = {
  'rod.absorption': { coefficient: '3 cm^-1' },
  'rod.heatFraction': { lasing: '25 %', blocked: '25 %' },
  'rod.faceFilm': '0 W/(m^2 K)',
};
const garnet = changed(trial('garnet'), held);
const pointWith = (changes: Record<string, unknown>) => {
  const bench = benchOf(changed(garnet, changes), undefined, 'coarse');
  return { bench, ...bench.lasing(bench.prepared.resolved.pump.power) };
};
const block = { kind: 'block', width: '30 mm', depth: '10 mm', cover: '8 mm' };
const { rod, mount } = resolve(changed(garnet, { 'mount.shape': block }));

/** Mean of the barrel over its length, above the base, K: conduction along the rod is even where no face loses heat. */
function meanBarrelRise({ field }: ReturnType<typeof pointWith>): number {
  const { grid, temperatures, boundary } = field;
  const { nr, nz, nRadial, axialFaces } = grid;
  let sum = 0;
  for (let j = 0; j < nz; j++)
    sum += (temperatures[j * nRadial + nr]! - boundary.side) * (axialFaces[j + 1]! - axialFaces[j]!);
  return sum / axialFaces[nz]!;
}

describe('A block mount', () => {
  it('weighs its metal without the bore and lets no more heat along it than its own section does', () => {
    const { outerRadius, sectionArea } = mount.body!;
    expect(sectionArea).toBeCloseTo(30e-3 * 18e-3 - rod.sectionArea, 12);
    expect(Math.PI * outerRadius ** 2).toBeLessThanOrEqual(30e-3 * 18e-3 * (1 + 1e-12));
    expect(resolve(changed(garnet, { 'mount.shape': block })).warnings.map(({ where }) => where)).toContain(
      'mount.shape',
    );
  });

  it('lies between bore and base with the resistance of the row of pipes and its images', () => {
    const length = rod.frontCap + rod.dopedLength + rod.backCap;
    const perLength = (conductivity: number) =>
      blockResistance({ boreRadius: rod.radius, width: 30e-3, depth: 10e-3, cover: 8e-3, conductivity });
    const { outerRadius, beyondRing } = mount.body!;
    const { conductivity } = mount.body!;
    const ring = Math.log(outerRadius / rod.radius) + beyondRing;
    expect(ring / (2 * Math.PI * conductivity) / perLength(conductivity)).toBeCloseTo(1, 10);
    const point = pointWith({ 'mount.shape': block });
    const inner =
      Math.log(point.field.grid.mountCentres[0]! / rod.radius) / (2 * Math.PI * mount.body!.conductivity);
    const expected = (point.field.heatOut.side / length) * (perLength(mount.body!.conductivity) - inner);
    // The mean over the length of the innermost ring: heat along the mount evens out, its mean does not change.
    expect(meanBarrelRise(point) / expected).toBeCloseTo(1, 6);
  });

  it('that is very wide and deep is a ring of twice its depth: a pipe under a plane (Incropera, Table 4.1, from memory)', () => {
    const wide = pointWith({
      'mount.shape': { kind: 'block', width: '1.9 m', depth: '12 mm', cover: '900 mm' },
    });
    const ring = pointWith({ 'mount.shape': { kind: 'ring', outerRadius: '24 mm' } });
    // ln(2 d / a) of the pipe holds to (a / 2 d)^2 and (d / W): one per cent of the small rise across the mount.
    const rise = (at: typeof ring) => at.point.rod.peakTemperature - at.point.rod.baseTemperature;
    expect(rise(wide) / rise(ring)).toBeCloseTo(1, 3);
  });
});

describe('Without a mount', () => {
  const bare = pointWith({ 'mount.shape': { kind: 'none' }, 'mount.interface.conductance': '1 W/(cm^2 K)' });

  it('the mean barrel stands above the base by its heat over area and conductance', () => {
    const area = 2 * Math.PI * rod.radius * (rod.frontCap + rod.dopedLength + rod.backCap);
    const { field } = bare;
    const { nr, nz, nRadial, axialFaces, radialCentres } = field.grid;
    let mean = 0;
    for (let j = 0; j < nz; j++)
      mean += field.temperatures[j * nRadial + nr - 1]! * (axialFaces[j + 1]! - axialFaces[j]!);
    mean /= axialFaces[nz]!;
    // The outermost cell centre lies a little inside the barrel.
    const heat = field.heatOut.side;
    const inside =
      (heat * Math.log(rod.radius / radialCentres[nr - 1]!)) /
      (2 * Math.PI * rod.conductivityRadial * axialFaces[nz]!);
    expect((mean - inside - field.boundary.side) / (heat / (area * 1e4))).toBeCloseTo(1, 6);
  });

  it('the rod is as in a mount that conducts without end, and the lens hardly knows the difference', () => {
    const diamond = pointWith({
      'mount.material': 'CVD diamond',
      'mount.shape': { kind: 'ring', outerRadius: '2.1 mm' },
      'mount.interface.conductance': '1 W/(cm^2 K)',
    });
    expect(bare.point.rod.peakTemperature).toBeCloseTo(diamond.point.rod.peakTemperature, 0);
    expect(bare.point.lens.thermoOptic / diamond.point.lens.thermoOptic).toBeCloseTo(1, 2);
  });

  it('the comparison has one row, which says that no mount conducts', () => {
    const rows = [...compareMounts(bare.bench, { pumpPower: 5, setBy: null }, [])];
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({
      material: 'no mount',
      thermalConductivity: null,
      mass: 0,
      current: true,
    });
  });

  it('no constant of a mount is used, and its heat goes from rod to barrel to base', () => {
    const { constants } = bare.bench.prepared.resolved;
    expect(constants.map(({ path }) => path)).not.toContain('mount.thermalConductivity');
    expect(bare.point.ledger.map(({ to }) => to)).toContain('barrel');
  });

  it.each([
    ['none', { 'mount.shape': { kind: 'none' } }],
    ['a block', { 'mount.shape': block }],
    ['both ends pumped', { 'pump.backShare': '40 %' }],
    [
      'a measured profile wider than the rod',
      {
        'pump.radius': '1.2 mm',
        'pump.profile': 'table',
        'pump.profileTable': [
          ['0 mm', 1],
          ['1 mm', 0.8],
          ['2 mm', 0],
        ],
      },
    ],
  ])('with %s every watt is still accounted for', (_, changes) => {
    const { point } = pointWith({ ...changes, 'rod.faceFilm': '500 W/(m^2 K)' });
    expect(imbalanceOf(point.ledger)).toBeLessThan(1e-9 * point.electricalPower);
  });

  it('the picture ends at the barrel; a block is drawn as the ring it is computed as', () => {
    const drawn = (at: typeof bare) => picturesOf(at.bench.prepared, at, at).rod.lasing;
    expect(drawn(bare)).toMatchObject({ mount: { shape: 'none', name: 'no mount' } });
    expect(drawn(bare).radialFaces.at(-1)).toBe(rod.radius);
    const blocky = drawn(pointWith({ 'mount.shape': block }));
    expect(blocky.mount.shape).toBe('block');
    expect(blocky.radialFaces.at(-1)).toBeCloseTo(mount.body!.outerRadius, 12);
  });
});
