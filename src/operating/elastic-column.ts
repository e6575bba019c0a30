import type { ResolvedDesign } from '../design/resolved';
import { bulgePower, rodTemperature, solveElastic } from '../elastic';
import { solveRod, type RodConduction, type RodField } from '../heat';
import { stressAlongRod, type StressAlongRod } from '../lens';
import type { ElasticBase } from './elastic-base';

/** Stress and bulge that one cause makes, per unit of it: a watt of heat in a stretch of the rod, a kelvin of the base. */
export interface Column {
  /** Radial, hoop, axial, shear at node n at 4 n. */
  stress: Float64Array;
  along: StressAlongRod;
  front: number;
  back: number;
}

/** What the mount adds whatever the heat, and how much of it a field asks for. */
export interface HeldColumn {
  column: Column;
  weight: (field: RodField) => number;
}

/** @param field temperatures in kelvin above those at which the rod is free of force */
export function answerTo(
  base: ElasticBase,
  assembled: ElasticBase['assembled'],
  index: number,
  field: RodField,
): Column {
  const solution = solveElastic(assembled, rodTemperature(base.map, field));
  const { radial, hoop, axial, shear } = solution;
  const stress = new Float64Array(4 * radial.length);
  for (let n = 0; n < radial.length; n++) {
    stress[4 * n] = radial[n]!;
    stress[4 * n + 1] = hoop[n]!;
    stress[4 * n + 2] = axial[n]!;
    stress[4 * n + 3] = shear[n]!;
  }
  return {
    stress,
    along: stressAlongRod(solution),
    ...bulgePower(solution.displacement, index, base.weights),
  };
}

/** Answers to what the mount does by itself, where conduction is linear. */
export function heldBy(base: ElasticBase, resolved: ResolvedDesign, conduction: RodConduction): HeldColumn[] {
  const { mount, rod } = resolved;
  const { grid } = conduction;
  const unheated = (side: number) =>
    solveRod(conduction, new Float64Array(grid.nRadial * grid.nz), { side, front: 0, back: 0 });
  const { assembled } = base;
  if (mount.grip === 'clamped')
    return [
      {
        column: answerTo(base, assembled, rod.refractiveIndex, unheated(1)),
        weight: ({ boundary }) => boundary.side - boundary.front,
      },
    ];
  if (mount.clampingPressure === 0) return [];
  const barrel = { kind: 'free', pressure: mount.clampingPressure } as const;
  const pressed = { ...assembled, model: { ...assembled.model, barrel } };
  return [{ column: answerTo(base, pressed, rod.refractiveIndex, unheated(0)), weight: () => 1 }];
}
