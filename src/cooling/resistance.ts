import { completeState, type Cooler, flow } from './cooler';

/** A sink given as a plain number. */
export interface ResistanceSpec {
  /** From base to ambient, or to the fluid, K/W. */
  resistance: number;
  /** K; the ambient when left out. */
  fluidTemperature?: number;
}

/** A sink given as K/W: base = fluid (or ambient) temperature + heat x resistance. */
export function resistanceCooler({ resistance, fluidTemperature }: ResistanceSpec): Cooler {
  return {
    kind: 'resistance',
    baseTemperature: (heat, { ambient }) => (fluidTemperature ?? ambient) + heat * resistance,
    settle(heat, surroundings) {
      const baseTemperature = this.baseTemperature(heat, surroundings);
      return completeState({
        heat,
        baseTemperature,
        electricalPower: 0,
        coldestTemperature: Math.min(baseTemperature, fluidTemperature ?? surroundings.ambient),
        limits: [],
        details: { thermalResistance: resistance },
        flows: [flow('base', 'heat sink', heat), flow('heat sink', 'surroundings', heat)],
        warnings: [],
      });
    },
  };
}
