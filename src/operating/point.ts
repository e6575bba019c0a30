import { planeMode } from '../cavity';
import { dewPoint, type CoolerLimit, type CoolerState } from '../cooling';
import { NumericalError } from '../errors';
import { heatSource, meanWithin, solveRod, type RodField } from '../heat';
import {
  closeLoop,
  diodeHeatOf,
  stableBases,
  type LoopState,
  type Question,
  type RodTemperature,
} from './closed-loop';
import { elasticState } from './elastic-response';
import { ledgerOf } from './ledger';
import { photoelasticPart } from './photoelastic-part';
import { overlapRings, type PreparedDesign } from './prepare';
import { lase } from './rod-laser';
import { rodLens, type RodLens } from './rod-lens';
import { sectionStressEstimate } from './section-estimate';
import type { OperatingPoint } from './types';

const noRodState = 'the conductivity of the rod falls faster with temperature than this heat can leave it';

/** An operating point with what the studies and the drawings need beside its numbers. */
export interface SolvedPoint {
  point: OperatingPoint;
  coolerLimits: readonly CoolerLimit[];
  cooler: CoolerState;
  field: RodField;
  lens: RodLens;
  /** Greatest radial stress on the barrel, Pa; > 0 where a clamping bore would have to pull. */
  barrelTension: number;
}

/** The rod's temperatures; where its falling conductivity lets no heat of this size out, those at constant conductivity. */
function fieldOf(
  prepared: PreparedDesign,
  loop: LoopState,
): { field: RodField; cellHeat: Float64Array; exists: boolean } {
  const { grid, conduction, pump, resolved } = prepared;
  const inside = 1 - pump.clipped || 1;
  const heatPower = (loop.enteringPower * loop.split.heat) / inside;
  const source = heatSource(grid, pump.heatShares, loop.deposit, heatPower);
  const { ambient } = resolved.surroundings;
  const boundary = { side: loop.mountTemperature, front: ambient, back: ambient };
  const cellHeat = loop.deposit.map((share) => share * heatPower);
  if (conduction === prepared.linear)
    return { field: solveRod(conduction, source, boundary), cellHeat, exists: true };
  try {
    const field = solveRod(conduction, source, boundary);
    if (Number.isFinite(field.peakTemperature)) return { field, cellHeat, exists: true };
  } catch (reason) {
    if (!(reason instanceof NumericalError)) throw reason;
  }
  return { field: solveRod(prepared.linear, source, boundary), cellHeat, exists: false };
}

/**
 * The heat that reaches the base as the field itself has it. Inside the loop the share that the faces lose is that of
 * the conductivity at 300 K; what it errs by is a share of a share, and is put right here so that the ledger closes.
 */
function asSolved(prepared: PreparedDesign, loop: LoopState, field: RodField): LoopState {
  if (prepared.conduction === prepared.linear) return loop;
  const mountHeat = field.heatOut.side;
  return { ...loop, mountHeat, baseHeat: loop.baseHeat + mountHeat - loop.mountHeat };
}

/** The mean temperature of the pumped rod, for the Boltzmann shares of a quasi-three-level line. */
function rodTemperatureOf(prepared: PreparedDesign): RodTemperature {
  const { grid, conduction, pump, resolved } = prepared;
  if (!resolved.rod.laser.thermal) return () => resolved.surroundings.ambient;
  const inside = 1 - pump.clipped || 1;
  return (deposit, heatLoad, mountTemperature) => {
    const absorbed = deposit.reduce((sum, share) => sum + share, 0) || 1;
    const source = heatSource(grid, pump.heatShares, deposit, heatLoad / absorbed / inside);
    const { ambient } = resolved.surroundings;
    return meanWithin(
      solveRod(conduction, source, { side: mountTemperature, front: ambient, back: ambient }),
      resolved.pump.radius,
    );
  };
}

/** Geometric mean of the mode radii of both planes, m; null where a plane has no mode. */
const meanRadius = (a: number | null, b: number | null) =>
  a === null || b === null ? null : Math.sqrt(a * b);

interface Output {
  power: number;
  threshold: number | null;
}

function outputOf(
  prepared: PreparedDesign,
  question: Question,
  loop: LoopState,
  field: RodField,
  lens: RodLens,
  modeRadius: number | null,
): Output {
  const { resolved } = prepared;
  if (question.beam === 'blocked' || modeRadius === null || loop.absorbedPower <= 0)
    return { power: 0, threshold: null };
  const state = {
    absorbedPower: loop.absorbedPower,
    pumpWavelength: loop.wavelength,
    rodTemperature: resolved.rod.laser.thermal ? meanWithin(field, resolved.pump.radius) : 0,
    rings: overlapRings(prepared, loop.deposit),
  };
  const passes = resolved.cavity.kind === 'linear' ? 2 : 1;
  const result = lase(resolved, state, modeRadius, 1 - (1 - lens.aberrationLoss) ** passes);
  const absorbedShare = loop.absorbedPower / question.pumpPower;
  return {
    power: Math.min(result.outputPower, loop.absorbedPower * loop.split.stimulated),
    threshold: result.thresholdAbsorbedPower === null ? null : result.thresholdAbsorbedPower / absorbedShare,
  };
}

/**
 * One operating point: the closed loop's steady state, its temperature field, stress, lens, mode and output.
 * Every study, the page and the terminal ask this function and no other.
 * @param start base temperature to begin the loop at, K
 */
export function solvePoint(prepared: PreparedDesign, question: Question, start?: number): SolvedPoint {
  const { resolved } = prepared;
  const { surroundings, rod, limits } = resolved;
  const { pumpPower } = question;
  const { state: closed, converged } = closeLoop(
    prepared,
    question,
    start ?? surroundings.ambient + 10,
    rodTemperatureOf(prepared),
  );
  const { field, cellHeat, exists } = fieldOf(prepared, closed);
  const loop = asSolved(prepared, closed, field);
  const cooler = question.cooler.cooler.settle(loop.baseHeat, surroundings);
  const diodeHeat = diodeHeatOf(prepared, pumpPower);
  const separate =
    resolved.diode.circuit === 'separate' && resolved.diode.caseTemperature === null
      ? question.cooler.cooler.settle(diodeHeat, surroundings)
      : null;
  const elastic = elasticState(prepared.elastic, rod.refractiveIndex, field, cellHeat);
  const { weights, section } = prepared.elastic.base;
  const stressed = photoelasticPart(resolved, elastic.along, weights, section);
  const lens = rodLens(resolved, prepared.lens, field, elastic, stressed);
  const sagittal = planeMode(prepared.cavity, lens.optics, 'sagittal', rod.laser.wavelength);
  const tangential = planeMode(prepared.cavity, lens.optics, 'tangential', rod.laser.wavelength);
  const modeRadius = meanRadius(sagittal.modeRadiusInRod, tangential.modeRadiusInRod);
  const output = outputOf(prepared, question, loop, field, lens, modeRadius);
  const steady =
    converged && exists && cooler.state === 'steady' && (separate === null || separate.state === 'steady');
  const reason =
    cooler.reason ??
    separate?.reason ??
    (!converged ? 'no base temperature below 700 K takes this heat' : exists ? undefined : noRodState);
  const ledger = ledgerOf(prepared, loop, cooler, separate, {
    pumpPower,
    outputPower: output.power,
    toAir: loop.heatLoad - loop.mountHeat,
    diodeHeat,
  });
  const meanPumped = meanWithin(field, resolved.pump.radius);
  const allowed = limits.fractureStrength;
  const point: OperatingPoint = {
    state: steady ? 'steady' : 'none',
    ...(steady || reason === undefined ? {} : { reason }),
    pumpPower,
    absorbedPower: loop.absorbedPower,
    heatFraction: loop.split.heat,
    heatLoad: loop.heatLoad,
    outputPower: output.power,
    thresholdPumpPower: output.threshold,
    electricalPower: pumpPower + diodeHeat + cooler.electricalPower + (separate?.electricalPower ?? 0),
    rod: {
      peakTemperature: field.peakTemperature,
      peakPosition: field.peakPosition,
      edgeTemperature: field.edgeTemperature,
      meanPumpedTemperature: meanPumped,
      baseTemperature: loop.baseTemperature,
    },
    stress: {
      peakTensile: elastic.peakTensile.value,
      position: { r: elastic.peakTensile.r, z: elastic.peakTensile.z },
      fractureShare: elastic.peakTensile.value / allowed,
      estimate: sectionStressEstimate(rod, field),
    },
    lens: {
      dioptricPower: lens.power,
      focalLength: lens.power === 0 ? null : 1 / lens.power,
      axisDioptricPower: lens.axisPower,
      thermoOptic: lens.thermoOptic,
      bulge: lens.bulge,
      photoelastic: stressed.mean,
      photoelasticRadial: stressed.radial,
      photoelasticTangential: stressed.tangential,
      photoelasticUnknown: stressed.unknown,
      depolarisedShare: stressed.depolarisedShare,
      residualPath: lens.residualPath,
      quarticTerm: lens.quarticTerm,
      aberrationLoss: lens.aberrationLoss,
      weightRadius: resolved.cavity.lensRadius,
      estimate: lens.estimate,
    },
    cavity: {
      sagittal: {
        stability: sagittal.stability,
        stable: sagittal.stable,
        modeRadiusInRod: sagittal.modeRadiusInRod,
      },
      tangential: {
        stability: tangential.stability,
        stable: tangential.stable,
        modeRadiusInRod: tangential.modeRadiusInRod,
      },
    },
    diode: {
      caseTemperature: loop.caseTemperature,
      wavelength: loop.wavelength,
      caseWindow: {
        low: prepared.caseWindow.low,
        high: prepared.caseWindow.high,
        best: prepared.caseWindow.best,
      },
      heat: diodeHeat,
    },
    cooler: {
      id: question.cooler.id,
      coldestTemperature: Math.min(cooler.coldestTemperature, separate?.coldestTemperature ?? Infinity),
      dewPoint: dewPoint(surroundings.ambient, surroundings.relativeHumidity),
      details: cooler.details,
    },
    ledger,
  };
  return {
    point,
    coolerLimits: [...cooler.limits, ...(separate?.limits ?? [])],
    cooler,
    field,
    lens,
    barrelTension: elastic.barrelTension,
  };
}

/** Base temperatures of all stable steady states at one question, K; see `stableBases`. */
export const steadyBases = (prepared: PreparedDesign, question: Question): number[] =>
  prepared.drifts ? stableBases(prepared, question, rodTemperatureOf(prepared)) : [];
