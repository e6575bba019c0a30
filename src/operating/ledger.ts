import type { CoolerState } from '../cooling';
import type { PreparedDesign } from './prepare';
import type { LoopState } from './closed-loop';
import type { Flow } from './types';

/** Light and heat of one operating point that the ledger needs beside the loop's state, W. */
export interface LedgerInput {
  pumpPower: number;
  outputPower: number;
  /** Heat that the rod gives to the air at its end faces; negative where the air is warmer. */
  toAir: number;
  diodeHeat: number;
}

function diodeFlows(prepared: PreparedDesign, diodeHeat: number, separate: CoolerState | null): Flow[] {
  const { diode } = prepared.resolved;
  if (diode.circuit === 'shared') return [{ from: 'diode', to: 'base', power: diodeHeat }];
  const own: Flow = { from: 'diode', to: 'diode base', power: diodeHeat };
  if (!separate) return [{ ...own, to: 'diode cooler' }];
  const rename = (node: string) => (node === 'wall plug' || node === 'surroundings' ? node : `diode ${node}`);
  return [
    own,
    ...separate.flows.map(({ from, to, power }) => ({ from: rename(from), to: rename(to), power })),
  ];
}

/** Turns a negative flow round, so that every arrow points the way the power goes. */
const upright = ({ from, to, power }: Flow): Flow =>
  power < 0 ? { from: to, to: from, power: -power } : { from, to, power };

/**
 * Where every watt goes, from the wall plug to the surroundings. Every node but the first and the last gives what it
 * takes; what is radiated as light, output included, ends at a node of its own.
 */
export function ledgerOf(
  prepared: PreparedDesign,
  loop: LoopState,
  cooler: CoolerState,
  separate: CoolerState | null,
  input: LedgerInput,
): Flow[] {
  const { pump, mount } = prepared.resolved;
  const holder = mount.body ? 'mount' : 'barrel';
  const arriving = input.pumpPower * pump.entranceTransmission;
  const clipped = arriving * prepared.pump.clipped;
  const stimulated = loop.absorbedPower * loop.split.stimulated;
  const flows: Flow[] = [
    { from: 'wall plug', to: 'diode', power: input.pumpPower + input.diodeHeat },
    ...diodeFlows(prepared, input.diodeHeat, separate),
    { from: 'diode', to: 'pump light', power: input.pumpPower },
    { from: 'pump light', to: 'coupling loss', power: input.pumpPower - arriving },
    { from: 'pump light', to: holder, power: clipped },
    { from: 'pump light', to: 'residual pump', power: loop.enteringPower - loop.absorbedPower },
    { from: 'pump light', to: 'rod', power: loop.absorbedPower },
    { from: 'rod', to: 'laser output', power: input.outputPower },
    { from: 'rod', to: 'cavity loss', power: stimulated - input.outputPower },
    { from: 'rod', to: 'fluorescence', power: loop.absorbedPower * loop.split.fluorescence },
    { from: 'rod', to: holder, power: loop.mountHeat },
    { from: 'rod', to: 'air at the faces', power: input.toAir },
    { from: holder, to: 'base', power: loop.mountHeat + clipped },
    ...cooler.flows,
  ];
  return flows.filter((item) => item.power !== 0).map(upright);
}
