import type { Fault } from '../errors';
import { findMountMaterial, mountMaterials, nearestName } from '../materials';
import { nearestName as nearestOf } from '../quantity';
import { findLiquid, liquids } from './cooler-schema';
import { faultAt, unknownName } from './fault';
import { given, listed } from './field-note';
import { valueOf } from './quantity-field';
import type { CoolerDesign, Design } from './schema';

type Sink = Extract<CoolerDesign, { kind: 'passive' }>['sink'];

const namesOf = (list: readonly { name: string }[]) => list.map((item) => item.name);

function sinkFaults(sink: Sink, path: string): Fault[] {
  const faults: Fault[] = [];
  const { material, finCount, finThickness, width } = sink;
  if (!findMountMaterial(material)) {
    const near = nearestName(mountMaterials, material);
    faults.push(unknownName(`${path}.material`, material, namesOf(mountMaterials), near));
  }
  if (finCount * valueOf(finThickness, 'length') >= valueOf(width, 'length')) {
    const sentence = `got ${finCount}; so many fins of "${finThickness}" leave no air in a width of "${width}"`;
    faults.push(faultAt(`${path}.finCount`, 'inconsistent', sentence));
  }
  return faults;
}

function hotSideFaults(hotSide: string, coolers: readonly CoolerDesign[], path: string): Fault[] {
  const hot = coolers.find((cooler) => cooler.id === hotSide);
  const able = coolers.filter((cooler) => cooler.kind !== 'tec').map((cooler) => cooler.id);
  if (able.length === 0) {
    const sentence = `got ${given(hotSide)}; there is no cooler without a TEC that could take the hot side`;
    return [faultAt(path, 'inconsistent', sentence)];
  }
  if (!hot) return [unknownName(path, hotSide, able)];
  if (hot.kind !== 'tec') return [];
  const sentence = `got ${given(hotSide)}, which is itself a TEC; it can be ${listed(able)}`;
  return [faultAt(path, 'inconsistent', sentence)];
}

function faultsOfOne(cooler: CoolerDesign, coolers: readonly CoolerDesign[], path: string): Fault[] {
  if ('sink' in cooler) return sinkFaults(cooler.sink, `${path}.sink`);
  if (cooler.kind === 'tec') return hotSideFaults(cooler.hotSide, coolers, `${path}.hotSide`);
  if (cooler.kind !== 'liquid' || findLiquid(cooler.coolant)) return [];
  return [
    unknownName(`${path}.coolant`, cooler.coolant, namesOf(liquids), nearestName(liquids, cooler.coolant)),
  ];
}

/** Faults of coolers, of their names, and of who takes whose heat. */
export function coolerFaults({ coolers, chosenCooler }: Design): Fault[] {
  const ids = coolers.map((cooler) => cooler.id);
  const faults = coolers.flatMap((cooler, place) => {
    const path = `coolers.${place}`;
    const taken = ids.indexOf(cooler.id) < place;
    const sentence = `got "${cooler.id}", which is used twice; each cooler needs a name of its own`;
    const twice = taken ? [faultAt(`${path}.id`, 'inconsistent', sentence)] : [];
    return [...twice, ...faultsOfOne(cooler, coolers, path)];
  });
  if (chosenCooler === undefined || ids.includes(chosenCooler)) return faults;
  return [...faults, unknownName('chosenCooler', chosenCooler, ids, nearestOf(ids, chosenCooler))];
}
