import { fanCooler, liquidCooler, passiveCooler, resistanceCooler, tecCooler, type Cooler, type PlateFinSink } from '../cooling';
import { findCoolant, findMountMaterial } from '../materials';
import { valueOf } from './quantity-field';
import type { ResolvedCooler } from './resolved';
import type { CoolerDesign, Design } from './schema';

type Sink = Extract<CoolerDesign, { kind: 'passive' }>['sink'];

function finsOf(sink: Sink): PlateFinSink {
  return {
    width: valueOf(sink.width, 'length'),
    height: valueOf(sink.height, 'length'),
    finHeight: valueOf(sink.finHeight, 'length'),
    finCount: sink.finCount,
    finThickness: valueOf(sink.finThickness, 'length'),
    conductivity: findMountMaterial(sink.material)!.values.thermalConductivity.nominal,
  };
}

function plainCooler(cooler: Exclude<CoolerDesign, { kind: 'tec' }>): Cooler {
  switch (cooler.kind) {
    case 'passive':
      return passiveCooler({ ...finsOf(cooler.sink), emissivity: cooler.sink.emissivity, orientation: cooler.sink.orientation });
    case 'fan': {
      const { freeFlow, shutOffPressure, power } = cooler.fan;
      const fan = { freeFlow: valueOf(freeFlow, 'volumeFlow'), shutOffPressure: valueOf(shutOffPressure, 'pressure'), power: valueOf(power, 'power') };
      return fanCooler({ ...finsOf(cooler.sink), fan });
    }
    case 'liquid': {
      const { channel, supply } = cooler;
      return liquidCooler({
        coolant: findCoolant(cooler.coolant)!,
        channel: { diameter: valueOf(channel.diameter, 'length'), length: valueOf(channel.length, 'length'), parallel: channel.parallel },
        flow: valueOf(cooler.flow, 'volumeFlow'),
        supply:
          supply.kind === 'chiller'
            ? { kind: 'chiller', setPoint: valueOf(supply.setPoint, 'temperature'), capacity: valueOf(supply.capacity, 'power') }
            : { kind: 'air', resistance: valueOf(supply.resistance, 'thermalResistance') },
      });
    }
    case 'resistance':
      return resistanceCooler({ resistance: valueOf(cooler.resistance, 'thermalResistance') });
  }
}

const plainWords = (cooler: CoolerDesign): string =>
  ({ passive: 'bare fins', fan: 'fan on fins', liquid: 'liquid loop', resistance: 'plain K/W', tec: 'TEC' })[cooler.kind];

/** How much a way of cooling asks of a laboratory: fins, a fan, a liquid loop, then a TEC over each of them. */
const demand: Record<CoolerDesign['kind'], number> = { resistance: 0, passive: 0, fan: 1, liquid: 2, tec: 3 };

/** Builds every cooler of a design; a TEC is built over the cooler that takes its hot side. */
export function resolveCoolers(design: Design, currentShare: number): ResolvedCooler[] {
  const plain = new Map<string, ResolvedCooler>();
  for (const cooler of design.coolers) {
    if (cooler.kind === 'tec') continue;
    const words = plainWords(cooler);
    plain.set(cooler.id, { id: cooler.id, kind: cooler.kind, label: `${cooler.id} (${words})`, demand: demand[cooler.kind], cooler: plainCooler(cooler) });
  }
  return design.coolers.map((cooler) => {
    if (cooler.kind !== 'tec') return plain.get(cooler.id)!;
    const hot = plain.get(cooler.hotSide)!;
    const { module } = cooler;
    const legs = { kind: 'legs' as const, couples: module.couples, legSide: valueOf(module.legSide, 'length'), legHeight: valueOf(module.legHeight, 'length'), count: module.count };
    const spec = {
      module: legs,
      setTemperature: valueOf(cooler.setTemperature, 'temperature'),
      highestCurrent: valueOf(cooler.highestCurrent, 'current'),
      currentShare,
    };
    return { id: cooler.id, kind: 'tec', label: `${cooler.id} (TEC over ${hot.id})`, demand: demand.tec + hot.demand, cooler: tecCooler(spec, hot.cooler) };
  });
}
