import type { ResolvedDesign } from '../design/resolved';
import { prepareDesign, type PreparedDesign } from '../operating/prepare';
import { followCeiling } from '../study/follow-ceiling';
import { bandOf, type Band, type Effect } from '../study/band';
import { leversOf } from '../study/levers';
import { OptionBench } from '../study/option-bench';
import { variationsOf } from '../study/variation';
import { edgeOf, type Findings, type Step } from './answer';
import type { Report } from './types';

export interface BandResult {
  /** By option id; options without a ceiling have none. */
  ceilings: Map<string, Band>;
  edge: Band | null;
  levers: Report['levers'];
}

/** Ceiling of every option, and the cavity edge, of a design that differs in one value. */
interface Outcome {
  prepared: PreparedDesign;
  ceilings: Map<string, number | null>;
  edge: number | null;
}

/** @param known ceilings of the nominal design; options without one have none here either */
function outcomeOf(
  resolved: ResolvedDesign,
  known: ReadonlyMap<string, number | null>,
  like?: PreparedDesign,
): Outcome {
  const prepared = prepareDesign(resolved, 'coarse', like);
  const benches = resolved.coolers.map((cooler) => new OptionBench(prepared, cooler));
  const chosen = benches.find((bench) => bench.cooler.id === resolved.chosenCooler)!;
  const { edge } = edgeOf(prepared, chosen);
  const ceilings = new Map(
    benches.map((bench) => {
      const start = known.get(bench.cooler.id) ?? null;
      const at = (power: number) => bench.at(power).margins;
      return [bench.cooler.id, start === null ? null : followCeiling(at, start, resolved.pump.searchTo)];
    }),
  );
  // An edge beyond the searched range is at least the range.
  const beyond = edge.windows.length > 0 ? resolved.pump.searchTo : null;
  return { prepared, ceilings, edge: edge.pumpPower ?? beyond };
}

/**
 * The band by trying every uncertain value at both ends, and the levers by trying every step.
 * Ratios are taken on one and the same coarse grid, so that the grid's error drops out of them.
 */
export function* bandSteps({
  design,
  resolved,
  ceilings,
  benches,
  edge,
}: Findings): Generator<Step, BandResult> {
  const known = new Map(benches.map(({ cooler }, k) => [cooler.id, ceilings[k]!.pumpPower]));
  const nominal = outcomeOf(resolved, known);
  const variations = variationsOf(design, resolved);
  const levers = leversOf(design);
  const total = 2 * variations.length + levers.length;
  let done = 0;
  const outcomes: { path: string; label: string; low: Outcome; high: Outcome }[] = [];
  const advance = (what: string): Step => ({ kind: 'progress', share: (done += 1) / total, what });
  for (const { path, label, low, high } of variations) {
    const atLow = outcomeOf(low(), known, nominal.prepared);
    yield advance(`band: ${label}`);
    outcomes.push({ path, label, low: atLow, high: outcomeOf(high(), known, nominal.prepared) });
    yield advance(`band: ${label}`);
  }
  const effects = (
    read: (outcome: Outcome) => number | null,
    reference: number,
    computed: number,
  ): Effect[] => {
    const scaled = (value: number | null) => (value === null ? null : (value * computed) / reference);
    return outcomes.map(({ path, label, low, high }) => ({
      path,
      label,
      low: scaled(read(low)),
      high: scaled(read(high)),
    }));
  };
  const bands = new Map<string, Band>();
  benches.forEach(({ cooler }, k) => {
    const computed = ceilings[k]!.pumpPower;
    const reference = nominal.ceilings.get(cooler.id) ?? computed;
    if (computed === null || reference === null) return;
    bands.set(
      cooler.id,
      bandOf(
        computed,
        effects((outcome) => outcome.ceilings.get(cooler.id) ?? null, reference, computed),
      ),
    );
  });
  const reference = nominal.edge;
  const edgeBand =
    edge.pumpPower === null || reference === null
      ? null
      : bandOf(
          edge.pumpPower,
          effects((outcome) => outcome.edge, reference, edge.pumpPower),
        );
  const before = nominal.ceilings.get(resolved.chosenCooler) ?? null;
  const tried: Report['levers'] = [];
  for (const { path, label, change, design: turned } of levers) {
    const after = outcomeOf(turned, known, nominal.prepared).ceilings.get(resolved.chosenCooler) ?? null;
    yield advance(`lever: ${label}`);
    if (before !== null && before > 0) tried.push({ path, label, change, effect: (after ?? 0) / before - 1 });
  }
  return {
    ceilings: bands,
    edge: edgeBand,
    levers: tried.sort((a, b) => Math.abs(b.effect) - Math.abs(a.effect)),
  };
}
