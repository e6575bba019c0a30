import {
  type Cooler,
  fanCooler,
  liquidCooler,
  passiveCooler,
  resistanceCooler,
  type Surroundings,
  tecCooler,
} from '../../src/cooling';
import { findCoolant } from '../../src/materials';

/** The surroundings and coolers of the starting design. */
export const room: Surroundings = { ambient: 295.15, relativeHumidity: 0.5, airPressure: 101325 };

export const finSpec = {
  width: 0.1,
  height: 0.1,
  finHeight: 0.03,
  finCount: 14,
  finThickness: 1.5e-3,
  conductivity: 167,
  emissivity: 0.85,
  orientation: 'vertical' as const,
};

export const fanSpec = {
  width: 0.08,
  height: 0.08,
  finHeight: 0.025,
  finCount: 28,
  finThickness: 0.8e-3,
  conductivity: 167,
  fan: { freeFlow: 60 / 3600, shutOffPressure: 45, power: 3 },
};

export const waterSpec = {
  coolant: findCoolant('water')!,
  channel: { diameter: 4e-3, length: 0.16, parallel: 1 },
  flow: 1e-3 / 60,
  supply: { kind: 'chiller' as const, setPoint: 293.15, capacity: 300 },
};

export const legs = { kind: 'legs' as const, couples: 127, legSide: 1.4e-3, legHeight: 1.6e-3, count: 1 };

export const tecSpec = { module: legs, setTemperature: 293.15, highestCurrent: 5 };

const antifreeze = { ...waterSpec, coolant: findCoolant('pg50')! };
const airCooled = { ...antifreeze, supply: { kind: 'air' as const, resistance: 0.08, power: 4 } };

/** One of each, and the awkward ones: transitional flow, generating TEC, cascade, leak. */
export const everyCooler: Record<string, Cooler> = {
  'fins in still air': passiveCooler({ ...finSpec, footprint: { side: 0.03 }, interfaceResistance: 0.02 }),
  'level fins': passiveCooler({ ...finSpec, orientation: 'horizontal' }),
  'fins under a fan': fanCooler({ ...fanSpec, footprint: { radius: 0.015 } }),
  'chilled water': liquidCooler(waterSpec),
  'antifreeze on an air exchanger': liquidCooler(airCooled),
  'antifreeze between laminar and turbulent flow': liquidCooler({ ...airCooled, flow: 9e-3 / 60 }),
  'a sink of 0.6 K/W': resistanceCooler({ resistance: 0.6 }),
  'a sink in a bath': resistanceCooler({ resistance: 0.1, fluidTemperature: 285 }),
  'a TEC on fins': tecCooler(
    { ...tecSpec, leakConductance: 0.05, ceramicResistance: 0.05 },
    passiveCooler(finSpec),
  ),
  'a TEC on a fan sink': tecCooler(tecSpec, fanCooler(fanSpec)),
  'a TEC on water': tecCooler({ ...tecSpec, setTemperature: 288.15 }, liquidCooler(waterSpec)),
  'a warm TEC': tecCooler({ ...tecSpec, setTemperature: 313.15, leakConductance: 0.3 }, fanCooler(fanSpec)),
  'a TEC on a TEC': tecCooler(
    { ...tecSpec, setTemperature: 258.15 },
    tecCooler({ ...tecSpec, module: { ...legs, count: 4 }, setTemperature: 283.15 }, liquidCooler(waterSpec)),
  ),
};
