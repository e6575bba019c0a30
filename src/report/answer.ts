import type { Design } from '../design/schema';
import { resolve } from '../design/resolve';
import type { ResolvedDesign } from '../design/resolved';
import { steadyBases } from '../operating/point';
import { prepareDesign, type PreparedDesign } from '../operating/prepare';
import { cavityEdgeOf, type CavityEdge } from '../study/cavity-edge';
import type { CeilingResult } from '../study/ceiling';
import { ladderOf } from '../study/ladder';
import { compareMounts, ranked, type MountComparison } from '../study/mounts';
import { OptionBench } from '../study/option-bench';
import { sweepOf } from '../study/sweep';
import type { SweepPoint } from '../study/types';
import { zonesOf } from '../study/zones';
import { bandSteps, type BandResult } from './answer-band';
import { binAdvice } from './bin-advice';
import { accuracyOf } from './accuracy';
import { conductivityRemark } from './conductivity-remark';
import { cautionsOf } from './cautions';
import { comparisonsOf } from './comparisons';
import { picturesOf } from './pictures';
import { pointWarnings } from './point-warnings';
import type { Answer, OptionReport, Report } from './types';
import { verdictOf } from './verdict';

const sweepLevels = 60;
/** Lens power within which zones are always sought, 1/m. */
const leastReach = 40;

export type Step =
  { kind: 'progress'; share: number; what: string } | { kind: 'answer'; answer: Answer; final: boolean };

/** Everything the first answer rests on, kept for the band. */
export interface Findings {
  design: Design;
  resolved: ResolvedDesign;
  prepared: PreparedDesign;
  benches: OptionBench[];
  chosen: OptionBench;
  zones: ReturnType<typeof zonesOf>;
  edge: CavityEdge;
  ceilings: CeilingResult[];
  mounts: MountComparison[];
  sweep: SweepPoint[];
}

/** Zones and edge of one design with its chosen cooler. */
export function edgeOf(
  prepared: PreparedDesign,
  bench: OptionBench,
): { zones: Findings['zones']; edge: CavityEdge } {
  const { pump } = prepared.resolved;
  const top = bench.lasing(pump.searchTo);
  const reach = Math.max(leastReach, 1.3 * Math.abs(top.lens.power));
  const zones = zonesOf(prepared, top, reach);
  return { zones, edge: cavityEdgeOf((power) => bench.lasing(power).point, zones, pump.searchTo) };
}

/** A design without pump power is answered a hair above none, where every share is still defined. */
const askedPower = ({ pump }: ResolvedDesign) => Math.max(pump.power, 1e-6 * pump.searchTo);

/** Marks an operating point where the loop has a second steady state. */
function withStates(bench: OptionBench, report: Report['operating']): Report['operating'] {
  if (report.state !== 'steady') return report;
  const bases = steadyBases(bench.prepared, {
    pumpPower: report.pumpPower,
    cooler: bench.cooler,
    beam: 'lasing',
  });
  if (bases.length < 2) return report;
  const words = bases.map((base) => `${(base - 273.15).toFixed(1)} degC`).join(' and ');
  return {
    ...report,
    state: 'two',
    reason: `steady states with the base at ${words}; which one the laser settles in depends on where it comes from`,
  };
}

function optionReport(
  bench: OptionBench,
  result: CeilingResult,
  asked: number,
  band: BandResult | null,
): OptionReport {
  const { lasing, margins } = bench.at(asked);
  const point = withStates(bench, lasing.point);
  const { cooler } = bench;
  const ends = band?.ceilings.get(cooler.id);
  return {
    id: cooler.id,
    kind: cooler.kind,
    label: cooler.label,
    state: point.state,
    ...(point.reason ? { reason: point.reason } : {}),
    electricalPower: point.electricalPower,
    passes: margins.every((margin) => margin.holds),
    margins,
    ceiling: {
      pumpPower: result.pumpPower,
      setBy: result.setBy,
      low: ends?.low ?? null,
      high: ends?.high ?? null,
      reachesRange: result.reachesRange,
    },
    windows: result.windows.map(({ from, to }) => ({ fromPumpPower: from, toPumpPower: to })),
    limits: result.limits,
  };
}

function edgeReport({ edge, zones }: Findings, band: BandResult | null): Report['cavityEdge'] {
  return {
    pumpPower: edge.pumpPower,
    plane: edge.plane,
    dioptricPower: edge.dioptricPower,
    low: band?.edge?.low ?? null,
    high: band?.edge?.high ?? null,
    zones,
  };
}

function assemble(findings: Findings, band: BandResult | null): Answer {
  const { resolved, prepared, benches, chosen, ceilings, edge } = findings;
  const asked = askedPower(resolved);
  const level = chosen.at(asked);
  const options = benches.map((bench, k) => optionReport(bench, ceilings[k]!, asked, band));
  const to = resolved.pump.searchTo;
  const rungs = benches.map(({ cooler }, k) => ({
    id: cooler.id,
    demand: cooler.demand,
    windows: ceilings[k]!.windows,
  }));
  const ladder = ladderOf(rungs, to).map(({ from, to: end, option }) => ({
    fromPumpPower: from,
    toPumpPower: end,
    option,
  }));
  const cavityEdge = edgeReport(findings, band);
  const operating = withStates(chosen, level.lasing.point);
  const usableWindow = edge.windows.map(({ from, to: end }) => ({ fromPumpPower: from, toPumpPower: end }));
  const parts = {
    options,
    chosenCooler: resolved.chosenCooler,
    cavityEdge,
    ladder,
    bandComplete: band !== null,
    usableWindow,
    pumpPower: resolved.pump.power,
    bin: binAdvice(resolved, options, prepared.caseWindow.best),
  };
  const report: Report = {
    format: 'pump-ceiling/report',
    version: 1,
    title: resolved.title,
    warnings: [
      ...resolved.warnings,
      ...pointWarnings(prepared, level.lasing),
      ...(band ? conductivityRemark(findings.design, chosen, level.lasing) : []),
    ],
    verdict: verdictOf(parts),
    chosenCooler: resolved.chosenCooler,
    operating,
    blocked: level.blocked.point,
    options,
    ladder,
    cavityEdge,
    usableWindow,
    mounts: ranked(findings.mounts),
    levers: band?.levers ?? [],
    contributors: {
      ceiling: band?.ceilings.get(resolved.chosenCooler)?.contributors ?? [],
      cavityEdge: band?.edge?.contributors ?? [],
    },
    sweep: findings.sweep,
    accuracy: band ? accuracyOf(resolved, chosen, level.lasing) : null,
    comparisons: comparisonsOf(prepared, level.lasing, cavityEdge),
    constants: resolved.constants,
    cautions: cautionsOf(resolved, options, operating.outputPower),
    searchedTo: to,
    bandComplete: band !== null,
  };
  return { report, pictures: picturesOf(prepared, level.lasing, level.blocked) };
}

const progress = (share: number, what: string): Step => ({ kind: 'progress', share, what });

function* find(design: Design): Generator<Step, Findings> {
  const resolved = resolve(design);
  const prepared = prepareDesign(resolved);
  yield progress(0.02, 'cavity edge');
  const benches = resolved.coolers.map((cooler) => new OptionBench(prepared, cooler));
  const chosen = benches.find((bench) => bench.cooler.id === resolved.chosenCooler)!;
  const { zones, edge } = edgeOf(prepared, chosen);
  const ceilings: CeilingResult[] = [];
  for (const bench of benches) {
    yield progress(0.05 + (0.45 * ceilings.length) / benches.length, `ceiling of ${bench.cooler.label}`);
    ceilings.push(bench.ceiling(edge.crossings));
  }
  const mounts: MountComparison[] = [];
  for (const mount of compareMounts(chosen, ceilings[benches.indexOf(chosen)]!, edge.crossings)) {
    mounts.push(mount);
    yield progress(0.5 + 0.04 * mounts.length, 'mount comparison');
  }
  const sweep: SweepPoint[] = [];
  for (const point of sweepOf(chosen, resolved.pump.searchTo, sweepLevels)) {
    sweep.push(point);
    yield progress(0.85 + 0.0025 * sweep.length, 'sweep');
  }
  return { design, resolved, prepared, benches, chosen, zones, edge, ceilings, mounts, sweep };
}

/**
 * Answers a design step by step: first the whole answer at nominal values, then the same with the band, the levers and
 * what contributes most. A caller may stop after any step.
 * @throws DesignError where the catalogue lacks a value, NumericalError where a method fails
 */
export function* answerSteps(design: Design): Generator<Step> {
  const findings = yield* find(design);
  yield { kind: 'answer', answer: assemble(findings, null), final: false };
  const band = yield* bandSteps(findings);
  yield { kind: 'answer', answer: assemble(findings, band), final: true };
}
