import {
  fanCooler,
  liquidCooler,
  passiveCooler,
  resistanceCooler,
  tecCooler,
  type Cooler,
  type PlateFinSink,
} from '../cooling';
import { findMountMaterial } from '../materials';
import { findLiquid } from './cooler-schema';
import { valueOf } from './quantity-field';
import type { ResolvedCooler } from './resolved';
import type { CoolerDesign, Design } from './schema';

type Of<K extends CoolerDesign['kind']> = Extract<CoolerDesign, { kind: K }>;
type Plain = Exclude<CoolerDesign, { kind: 'tec' }>;

function finsOf(sink: Of<'passive'>['sink']): PlateFinSink {
  return {
    width: valueOf(sink.width, 'length'),
    height: valueOf(sink.height, 'length'),
    finHeight: valueOf(sink.finHeight, 'length'),
    finCount: sink.finCount,
    finThickness: valueOf(sink.finThickness, 'length'),
    conductivity: findMountMaterial(sink.material)!.values.thermalConductivity.nominal,
  };
}

function fanOf({ sink, fan }: Of<'fan'>): Cooler {
  return fanCooler({
    ...finsOf(sink),
    fan: {
      freeFlow: valueOf(fan.freeFlow, 'volumeFlow'),
      shutOffPressure: valueOf(fan.shutOffPressure, 'pressure'),
      power: valueOf(fan.power, 'power'),
    },
  });
}

function liquidOf({ coolant, channel, flow, supply }: Of<'liquid'>): Cooler {
  return liquidCooler({
    coolant: findLiquid(coolant)!,
    channel: {
      diameter: valueOf(channel.diameter, 'length'),
      length: valueOf(channel.length, 'length'),
      parallel: channel.parallel,
    },
    flow: valueOf(flow, 'volumeFlow'),
    supply:
      supply.kind === 'chiller'
        ? {
            kind: 'chiller',
            setPoint: valueOf(supply.setPoint, 'temperature'),
            capacity: valueOf(supply.capacity, 'power'),
          }
        : { kind: 'air', resistance: valueOf(supply.resistance, 'thermalResistance') },
  });
}

function plainCooler(cooler: Plain): Cooler {
  switch (cooler.kind) {
    case 'passive': {
      const { emissivity, orientation } = cooler.sink;
      return passiveCooler({ ...finsOf(cooler.sink), emissivity, orientation });
    }
    case 'fan':
      return fanOf(cooler);
    case 'liquid':
      return liquidOf(cooler);
    case 'resistance':
      return resistanceCooler({ resistance: valueOf(cooler.resistance, 'thermalResistance') });
  }
}

function tecOver(
  { module, setTemperature, highestCurrent }: Of<'tec'>,
  hot: Cooler,
  currentShare: number,
): Cooler {
  return tecCooler(
    {
      module: {
        kind: 'legs',
        couples: module.couples,
        legSide: valueOf(module.legSide, 'length'),
        legHeight: valueOf(module.legHeight, 'length'),
        count: module.count,
      },
      setTemperature: valueOf(setTemperature, 'temperature'),
      highestCurrent: valueOf(highestCurrent, 'current'),
      currentShare,
    },
    hot,
  );
}

const words: Record<Plain['kind'], string> = {
  passive: 'bare fins',
  fan: 'fan on fins',
  liquid: 'liquid loop',
  resistance: 'plain K/W',
};

/** How much a way of cooling asks of a laboratory: fins, a fan, a liquid loop, then a TEC over each of them. */
const demand: Record<CoolerDesign['kind'], number> = { resistance: 0, passive: 0, fan: 1, liquid: 2, tec: 3 };

function resolvePlain(cooler: Plain): ResolvedCooler {
  const { id, kind } = cooler;
  return { id, kind, label: `${id} (${words[kind]})`, demand: demand[kind], cooler: plainCooler(cooler) };
}

/** Builds every cooler of a design; a TEC is built over the cooler that takes its hot side. */
export function resolveCoolers(design: Design, currentShare: number): ResolvedCooler[] {
  const plain = new Map(
    design.coolers.flatMap((cooler) =>
      cooler.kind === 'tec' ? [] : [[cooler.id, resolvePlain(cooler)] as const],
    ),
  );
  return design.coolers.map((cooler) => {
    if (cooler.kind !== 'tec') return plain.get(cooler.id)!;
    const hot = plain.get(cooler.hotSide)!;
    return {
      id: cooler.id,
      kind: 'tec',
      label: `${cooler.id} (TEC over ${hot.id})`,
      demand: demand.tec + hot.demand,
      cooler: tecOver(cooler, hot.cooler, currentShare),
    };
  });
}
