import { describe, expect, it } from 'vitest';
import { solveRod } from '../../src/heat';
import { elasticState } from '../../src/operating/elastic-response';
import { pointWarnings } from '../../src/report/point-warnings';
import { benchOf, changed, trial } from '../trials/trial';

const garnet = changed(trial('garnet'), { 'rod.faceFilm': '0 W/(m^2 K)' });
const benchWith = (changes: Record<string, unknown>) => benchOf(changed(garnet, changes), undefined, 'study');

/** Stress of the cold rod whose base stands above the air, no pump. */
function unpumped(changes: Record<string, unknown>, above: number) {
  const { prepared } = benchWith(changes);
  const { grid, elastic, linear, resolved } = prepared;
  const { ambient } = resolved.surroundings;
  const boundary = { side: ambient + above, front: ambient, back: ambient };
  const field = solveRod(linear, new Float64Array(grid.nRadial * grid.nz), boundary);
  const { rod } = resolved;
  const length = rod.frontCap + rod.dopedLength + rod.backCap;
  const state = elasticState(elastic, rod.refractiveIndex, field, new Float64Array(grid.nz));
  return { state, rod, length };
}

/** Water of 5 degC under an ambient of 20 degC. */
const chilled = {
  id: 'water',
  kind: 'liquid',
  channel: { diameter: '4 mm', length: '160 mm' },
  flow: '2 L/min',
  supply: { kind: 'chiller', setPoint: '5 degC', capacity: '300 W' },
};
const clamped = { 'mount.grip': 'clamped' };
const pressed = { 'mount.clampingPressure': '5 MPa' };

describe('A clamped rod warmed evenly', () => {
  const { state, rod, length } = unpumped(clamped, 20);

  it('is pressed by E alpha dT / (1 - nu) across and not along (Timoshenko & Goodier, from memory)', () => {
    const expected = (-rod.youngModulus * rod.expansionAcross * 20) / (1 - rod.poissonRatio);
    for (const place of state.along.radii.keys()) {
      expect(state.along.radial[place]! / length / expected).toBeCloseTo(1, 6);
      expect(state.along.hoop[place]! / length / expected).toBeCloseTo(1, 6);
      expect(Math.abs(state.along.axial[place]! / length / expected)).toBeLessThan(1e-6);
    }
    expect(state.barrelTension / expected).toBeCloseTo(1, 6);
  });

  it('does not bulge: it only gets longer', () => {
    expect(Math.abs(state.front) + Math.abs(state.back)).toBeLessThan(1e-6);
  });

  it('feels nothing while the base is at the temperature of assembly, the ambient', () => {
    const cold = unpumped(clamped, 0).state;
    expect(Math.abs(cold.barrelTension)).toBeLessThan(1e-3);
  });
});

describe('A rod pressed evenly', () => {
  it('has the pressure in every direction across it and none along it (Lame, thick cylinders; from memory)', () => {
    const { state, length } = unpumped(pressed, 0);
    for (const place of state.along.radii.keys()) {
      expect(state.along.radial[place]! / length).toBeCloseTo(-5e6, -1);
      expect(state.along.hoop[place]! / length).toBeCloseTo(-5e6, -1);
      expect(Math.abs(state.along.axial[place]! / length)).toBeLessThan(10);
    }
    expect(Math.abs(state.front) + Math.abs(state.back)).toBeLessThan(1e-6);
  });
});

describe('At 25 W', () => {
  const at = (changes: Record<string, unknown>) => {
    const bench = benchWith(changes);
    return { bench, ...bench.lasing(25) };
  };
  const free = at({});

  it('a pressure takes just itself off the hoop tension of the barrel and leaves lens and bulge', () => {
    const { point } = at(pressed);
    // The largest tension of the free rod lies on the pumped face, which the pressure reaches as evenly as all else.
    expect((free.point.stress.peakTensile - point.stress.peakTensile) / 5e6).toBeCloseTo(1, 3);
    expect(point.lens.dioptricPower / free.point.lens.dioptricPower).toBeCloseTo(1, 6);
  });

  it('a clamped rod has less tension; under a narrow pump its faces bulge as those of a free one do, to a tenth', () => {
    const { point } = at(clamped);
    expect(point.stress.peakTensile).toBeLessThan(free.point.stress.peakTensile);
    expect(point.lens.thermoOptic).toBe(free.point.lens.thermoOptic);
    expect(Math.abs(point.lens.bulge / free.point.lens.bulge - 1)).toBeLessThan(0.1);
  });

  it.each([
    ['clamped', clamped],
    ['pressed', pressed],
  ])('a %s rod whose answers are added up is the rod whose field is solved by itself', (_, grip) => {
    // A conductivity that hardly falls takes the other way through the program; 1e-6 of m moves a few micro of the rise.
    const coldBase = { ...grip, coolers: [chilled], chosenCooler: 'water' };
    const law = { 'rod.conductivityLaw': 'falls with temperature', 'rod.values.conductivityExponent': 1e-6 };
    const [added, solved] = [at(coldBase).point, at({ ...coldBase, ...law }).point];
    expect(solved.stress.peakTensile / added.stress.peakTensile).toBeCloseTo(1, 4);
    expect(solved.lens.bulge / added.lens.bulge).toBeCloseTo(1, 4);
    expect(solved.lens.photoelastic / added.lens.photoelastic).toBeCloseTo(1, 4);
  });

  it('a clamped rod on a base far below the ambient is said to come loose', () => {
    const cold = at({ ...clamped, coolers: [chilled], chosenCooler: 'water' });
    const texts = pointWarnings(cold.bench.prepared, cold).map(({ text }) => text);
    expect(texts.join(' ')).toMatch(/bore would have to pull the rod by up to \d+ MPa/);
    const warm = at(clamped);
    expect(
      pointWarnings(warm.bench.prepared, warm)
        .map(({ text }) => text)
        .join(' '),
    ).not.toMatch(/pull the rod/);
  });

  it('clamping without a mount, or a pressure on a clamped rod, has no effect and is said', () => {
    const where = (changes: Record<string, unknown>) =>
      benchWith(changes).prepared.resolved.warnings.map((warning) => warning.where);
    const bare = benchWith({ ...clamped, 'mount.shape': { kind: 'none' } }).prepared.resolved.mount;
    expect(bare.grip).toBe('free');
    expect(where({ ...clamped, 'mount.shape': { kind: 'none' } })).toContain('mount.grip');
    expect(where({ ...clamped, ...pressed })).toContain('mount.clampingPressure');
    expect(where(pressed)).toContain('mount.clampingPressure');
    expect(where({})).not.toContain('mount.grip');
  });
});
