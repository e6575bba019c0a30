import { findMountMaterial, type MountMaterial } from '../materials';
import type { ResolvedDesign } from '../design/resolved';
import type { LimitName } from '../limits/types';
import { prepareDesign, type PreparedDesign } from '../operating/prepare';
import { OptionBench } from './option-bench';

/** Mounts that a workshop can get, from the best conductor to the worst. */
export const comparedMounts = [
  'CVD diamond',
  'copper',
  'silicon carbide',
  'copper-tungsten W80',
  'aluminium nitride',
  'aluminium 6061',
  'brass',
  'stainless steel 304',
] as const;

/** Powers looked at for each mount; the limits are those of the design itself, only moved a little. */
const mountLevels = [4, 10, 18, 28, 40, 60];

export interface MountComparison {
  material: string;
  ceiling: number | null;
  setBy: LimitName | null;
  peakTemperature: number;
  dioptricPower: number;
  /** Mount minus rod, across the rod, 1/K. */
  expansionMismatch: number | null;
  /** Of a ring as long as the rod, kg. */
  mass: number;
  thermalConductivity: number;
  caution?: string;
  current: boolean;
}

function withMount(resolved: ResolvedDesign, material: MountMaterial): ResolvedDesign {
  const { thermalConductivity, expansion, density } = material.values;
  const { caution } = material;
  return {
    ...resolved,
    mount: {
      ...resolved.mount,
      name: material.name,
      conductivity: thermalConductivity.nominal,
      expansion: expansion.nominal,
      density: density.nominal,
      ...(caution ? { caution } : {}),
    },
  };
}

function compare(
  resolved: ResolvedDesign,
  current: boolean,
  edges: readonly number[],
  like: PreparedDesign,
  known?: OptionBench,
): MountComparison {
  const { mount, rod, pump } = resolved;
  const bench =
    known ??
    new OptionBench(
      prepareDesign(resolved, 'standard', like),
      resolved.coolers.find((item) => item.id === resolved.chosenCooler)!,
    );
  const { pumpPower, setBy } = bench.ceiling(edges, known ? undefined : mountLevels);
  const { point } = bench.lasing(Math.max(pump.power, 1e-6 * pump.searchTo));
  const length = rod.frontCap + rod.dopedLength + rod.backCap;
  return {
    material: mount.name,
    ceiling: pumpPower,
    setBy,
    peakTemperature: point.rod.peakTemperature,
    dioptricPower: point.lens.dioptricPower,
    expansionMismatch: mount.expansion === null ? null : mount.expansion - rod.expansionAcross,
    mass: mount.density * length * (Math.PI * mount.outerRadius ** 2 - rod.sectionArea),
    thermalConductivity: mount.conductivity,
    ...(mount.caution ? { caution: mount.caution } : {}),
    current,
  };
}

/**
 * The same design in every mount material, with the design's chosen cooler; one material at a time.
 * @param bench of the design as it stands
 * @param edges powers near which the cavity gains or loses stability, W
 */
export function* compareMounts(bench: OptionBench, edges: readonly number[]): Generator<MountComparison> {
  const { resolved } = bench.prepared;
  yield compare(resolved, true, edges, bench.prepared, bench);
  for (const name of comparedMounts) {
    const material = findMountMaterial(name)!;
    if (material.name === resolved.mount.name) continue;
    yield compare(withMount(resolved, material), false, edges, bench.prepared);
  }
}

/** Ceilings closer than this are as good as equal. */
const likeShare = 0.005;

/** Highest ceiling first; among ceilings as good as equal, the coolest rod first. */
export function ranked(mounts: readonly MountComparison[]): MountComparison[] {
  const byCeiling = [...mounts].sort((a, b) => (b.ceiling ?? -1) - (a.ceiling ?? -1));
  const groups: MountComparison[][] = [];
  for (const mount of byCeiling) {
    const best = groups.at(-1)?.[0]?.ceiling ?? null;
    const like =
      mount.ceiling === null ? best === null : best !== null && mount.ceiling > best * (1 - likeShare);
    if (groups.length > 0 && like) groups.at(-1)!.push(mount);
    else groups.push([mount]);
  }
  return groups.flatMap((group) => group.sort((a, b) => a.peakTemperature - b.peakTemperature));
}
