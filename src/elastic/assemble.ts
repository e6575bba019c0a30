import type { BandedFactor } from '../numerics/banded';
import { axialExpansion, type ElasticConstants } from './closed-forms';
import type { LineOperator } from './line-operator';
import type { ElasticMesh } from './mesh';
import { lineLoad, quadraticLine, type QuadraticLine } from './quadratic-line';
import { slopeOperators, type SlopeOperators } from './slopes';
import { factorStiffness, type Constraints } from './stiffness';

/** What holds the barrel. */
type Barrel =
  /** no displacement is prevented; the mount may press on it evenly (pressure in Pa, > 0 inwards) */
  | { kind: 'free'; pressure?: number }
  /** a rigid, slippery bore: u_r = 0, free to slide along the axis */
  | { kind: 'clamped' };

/** The rod as an elastic body; its size is in the mesh. */
export interface ElasticModel {
  constants: ElasticConstants;
  /** K, uniform temperature at which the rod is free of stress; matters for displacements and for a clamped barrel only */
  referenceTemperature: number;
  barrel: Barrel;
}

/** Stiffness factored once, and the operators that every solution needs. */
export interface AssembledElastic {
  model: ElasticModel;
  mesh: ElasticMesh;
  moduli: ElasticModuli;
  radialLine: QuadraticLine;
  axialLine: QuadraticLine;
  factors: BandedFactor;
  constraints: Constraints;
  loads: LoadOperators;
  slopes: SlopeOperators;
}

/** Pa, and Pa/K for the thermal pair: stress = C strain - thermal (T - T_reference). */
export interface ElasticModuli {
  /** lambda + 2 mu */
  direct: number;
  /** lambda */
  cross: number;
  /** mu */
  shear: number;
  /** Pa/K, of the radial and hoop stress */
  thermalAcross: number;
  /** Pa/K, of the axial stress */
  thermalAlong: number;
}

/** From temperatures at the integration points to the load; the product of an operator per direction. */
interface LoadOperators {
  /** radial load: int (r dN/dr + N) theta dr */
  acrossRadial: LineOperator;
  /** its axial factor, and the radial factor of the axial load: int N theta dz, int N theta r dr */
  alongRadial: LineOperator;
  acrossAxial: LineOperator;
  /** axial load: int dN/dz theta dz */
  alongAxial: LineOperator;
}

/**
 * Assembles and factors the stiffness of a rod. It depends on constants, mesh and on whether the barrel is clamped, not
 * on temperatures: one assembly serves all of them.
 * @throws NumericalError when the stiffness is not positive (constants out of range)
 */
export function assembleElastic(model: ElasticModel, mesh: ElasticMesh): AssembledElastic {
  const radialLine = quadraticLine(mesh.radialNodes);
  const axialLine = quadraticLine(mesh.axialNodes);
  const moduli = elasticModuli(model.constants);
  const { factors, constraints } = factorStiffness(
    moduli,
    radialLine,
    axialLine,
    model.barrel.kind === 'clamped',
  );
  return {
    model,
    mesh,
    moduli,
    radialLine,
    axialLine,
    factors,
    constraints,
    loads: {
      acrossRadial: lineLoad(radialLine, (r, shape, slope) => r * slope + shape),
      alongRadial: lineLoad(axialLine, (_, shape) => shape),
      acrossAxial: lineLoad(radialLine, (r, shape) => r * shape),
      alongAxial: lineLoad(axialLine, (_, __, slope) => slope),
    },
    slopes: slopeOperators(radialLine, axialLine),
  };
}

/** Lame's constants and the stresses per kelvin of prevented expansion. */
function elasticModuli(constants: ElasticConstants): ElasticModuli {
  const { youngsModulus, poissonRatio, expansion } = constants;
  const shear = youngsModulus / (2 * (1 + poissonRatio));
  const cross = (2 * shear * poissonRatio) / (1 - 2 * poissonRatio);
  const along = axialExpansion(constants);
  const volume = cross * (2 * expansion + along);
  return {
    direct: cross + 2 * shear,
    cross,
    shear,
    thermalAcross: volume + 2 * shear * expansion,
    thermalAlong: volume + 2 * shear * along,
  };
}
