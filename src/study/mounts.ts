import { findMountMaterial, type MountMaterial } from '../materials';
import type { MountBody, ResolvedDesign } from '../design/resolved';
import type { LimitName } from '../limits/types';
import { worstOf } from '../limits/margins';
import { prepareDesign } from '../operating/prepare';
import type { CeilingResult } from './ceiling';
import { followCeiling } from './follow-ceiling';
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

export interface MountComparison {
  material: string;
  ceiling: number | null;
  setBy: LimitName | null;
  peakTemperature: number;
  dioptricPower: number;
  /** Mount minus rod, across the rod, 1/K; null where the expansion is unknown. */
  expansionMismatch: number | null;
  /** Of a mount as long as the rod, kg; 0 without one. */
  mass: number;
  /** null where there is no mount: the barrel itself is cooled. */
  thermalConductivity: number | null;
  caution?: string;
  current: boolean;
}

function withMount(resolved: ResolvedDesign, body: MountBody, material: MountMaterial): ResolvedDesign {
  const { thermalConductivity, expansion, density } = material.values;
  const { caution } = material;
  return {
    ...resolved,
    mount: {
      ...resolved.mount,
      name: material.name,
      body: { ...body, conductivity: thermalConductivity.nominal, density: density.nominal },
      expansion: expansion.nominal,
      caution,
    },
  };
}

type Ceiling = Pick<CeilingResult, 'pumpPower' | 'setBy'>;

/** The ceiling of a design that differs in its mount alone, found from the ceiling of the design as it stands. */
function ceilingNear(bench: OptionBench, known: Ceiling, edges: readonly number[]): Ceiling {
  if (known.pumpPower === null) return bench.ceiling(edges);
  const to = bench.prepared.resolved.pump.searchTo;
  const at = (power: number) => bench.at(power).margins;
  const pumpPower = followCeiling(at, known.pumpPower, to, 1e-5);
  if (pumpPower === null) return bench.ceiling(edges);
  const beyond = at(Math.min(pumpPower * 1.001, to));
  const worst = worstOf(beyond);
  return { pumpPower, setBy: worst.holds ? null : worst.limit };
}

function compare(bench: OptionBench, current: boolean, { pumpPower, setBy }: Ceiling): MountComparison {
  const { mount, rod, pump } = bench.prepared.resolved;
  const { point } = bench.lasing(Math.max(pump.power, 1e-6 * pump.searchTo));
  const length = rod.frontCap + rod.dopedLength + rod.backCap;
  return {
    material: mount.name,
    ceiling: pumpPower,
    setBy,
    peakTemperature: point.rod.peakTemperature,
    dioptricPower: point.lens.dioptricPower,
    expansionMismatch: mount.expansion === null ? null : mount.expansion - rod.expansionAcross,
    mass: mount.body ? mount.body.density * length * mount.body.sectionArea : 0,
    thermalConductivity: mount.body?.conductivity ?? null,
    ...(mount.caution ? { caution: mount.caution } : {}),
    current,
  };
}

/**
 * The same design in every mount material, with the design's chosen cooler; one material at a time. Without a mount there is
 * nothing to compare: the one row says what holds without it.
 * @param bench of the design as it stands
 * @param known its ceiling
 * @param edges powers near which the cavity gains or loses stability, W
 */
export function* compareMounts(
  bench: OptionBench,
  known: Ceiling,
  edges: readonly number[],
): Generator<MountComparison> {
  const { prepared, cooler } = bench;
  const { body, name: own } = prepared.resolved.mount;
  yield compare(bench, true, known);
  if (!body) return;
  for (const name of comparedMounts) {
    const material = findMountMaterial(name)!;
    if (material.name === own) continue;
    const other = new OptionBench(
      prepareDesign(withMount(prepared.resolved, body, material), 'standard', prepared),
      cooler,
    );
    yield compare(other, false, ceilingNear(other, known, edges));
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
