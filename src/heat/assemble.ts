import { type BandedFactor, factorBanded } from '../numerics/banded';
import { type ConductivityLaw, temperatureSlope } from './conductivity-law';
import { type EndExtrapolation, axisWeights, endExtrapolation } from './extrapolation';
import type { RodGrid } from './grid';
import type { ContactModel, RodHeatModel } from './model';

/**
 * Ways for heat out of a row of cells: `inner` from cell centre to surface (K/W, in the rod's potential), `outer` from
 * surface to what lies beyond (K/W; 0 fixed surface, Infinity insulated).
 */
export interface Links {
  inner: Float64Array;
  outer: Float64Array;
}

/** A rod on a grid, factored once for all heat sources, powers and boundary temperatures. */
export interface RodConduction {
  model: RodHeatModel;
  grid: RodGrid;
  law: ConductivityLaw;
  /** Barrel, length nz: to the base, or to the innermost cells of the ring. */
  side: Links;
  /** Pumped and far end, length nr. */
  front: Links;
  back: Links;
  /** Outer surface of the ring, length nz; null without a ring. */
  mountOut: Float64Array | null;
  /** Weights of the three innermost cells that give the axis value. */
  axis: Float64Array;
  frontFace: EndExtrapolation;
  backFace: EndExtrapolation;
  factor: BandedFactor;
}

/**
 * Builds and factors the conduction equations of a rod and its mount:
 * heat in a cell = sum of outward fluxes, radial 4 pi k r^2 dz (T_in - T_out) / (difference of r^2), axial k A (T - T') / dz.
 *
 * With a temperature-dependent conductivity the rod's unknown is Kirchhoff's potential, so the same factors serve.
 * @throws NumericalError when nothing fixes the temperature (insulated everywhere)
 */
export function assembleRod(model: RodHeatModel, grid: RodGrid): RodConduction {
  const law = { exponent: model.conductivityExponent ?? 0 };
  const side = sideLinks(model, grid);
  const front = endLinks(model, grid, 'front');
  const back = endLinks(model, grid, 'back');
  const mountOut = mountOutConductance(model, grid);
  const length = grid.axialFaces[grid.nz]!;
  const slope = (end: RodHeatModel['front']) =>
    end.kind === 'film' ? end.coefficient / model.conductivityAxial : 0;
  const fromBack = Float64Array.from([1, 2, 3], (k) => length - grid.axialCentres[grid.nz - k]!);
  const slopes = { side: temperatureSlope(law, 300), front: 1, back: 1 };
  return {
    model,
    grid,
    law,
    side,
    front,
    back,
    mountOut,
    axis: axisWeights(grid.centreSquares),
    frontFace: endExtrapolation(grid.axialCentres, slope(model.front)),
    backFace: endExtrapolation(fromBack, slope(model.back)),
    factor: factorWith(model, grid, { side, front, back, mountOut }, slopes),
  };
}

/** dT/dtheta at the surfaces: one number for all links of a surface, or one for each. */
export interface SurfaceSlopes {
  side: number | Float64Array;
  front: number | Float64Array;
  back: number | Float64Array;
}

type LinkSet = Pick<RodConduction, 'side' | 'front' | 'back' | 'mountOut'>;

/** Conductance of a link linearised at a surface where dT/dtheta = slope, W/K. */
export function linkConductance(links: Links, index: number, slope: number): number {
  const outer = links.outer[index]!;
  return outer === Infinity ? 0 : 1 / (links.inner[index]! + outer / slope);
}

/**
 * Fills the band and factors it, with the links linearised at the given surface slopes.
 * @param storage what a time step adds to the diagonal, W/K, length nRadial*nz; left out for the steady state
 */
export function factorWith(
  model: RodHeatModel,
  grid: RodGrid,
  links: LinkSet,
  slopes: SurfaceSlopes,
  storage: Float64Array = new Float64Array(grid.nRadial * grid.nz),
): BandedFactor {
  const { nr, nz, nRadial, nMount } = grid;
  const diagonal = Float64Array.from(storage);
  const lower = new Float64Array(nRadial * nz * nRadial);
  const join = (p: number, q: number, conductance: number) => {
    diagonal[p] = diagonal[p]! + conductance;
    diagonal[q] = diagonal[q]! + conductance;
    lower[q * nRadial + p - q + nRadial] = -conductance;
  };
  const leave = (p: number, conductance: number) => (diagonal[p] = diagonal[p]! + conductance);
  const at = (slope: number | Float64Array, k: number) => (typeof slope === 'number' ? slope : slope[k]!);
  for (let j = 0; j < nz; j++) {
    const row = j * nRadial;
    const dz = grid.axialFaces[j + 1]! - grid.axialFaces[j]!;
    const gap = j + 1 < nz ? grid.axialCentres[j + 1]! - grid.axialCentres[j]! : 0;
    for (let i = 0; i < nRadial; i++) {
      if (i + 1 < nRadial && i !== nr - 1) join(row + i, row + i + 1, dz * radialConductance(model, grid, i));
      if (gap > 0) join(row + i, row + i + nRadial, axialConductivity(model, grid, i) / gap);
    }
    const contact = linkConductance(links.side, j, at(slopes.side, j));
    if (nMount > 0) {
      join(row + nr - 1, row + nr, contact);
      leave(row + nRadial - 1, links.mountOut![j]!);
    } else leave(row + nr - 1, contact);
  }
  for (let i = 0; i < nr; i++) {
    leave(i, linkConductance(links.front, i, at(slopes.front, i)));
    leave((nz - 1) * nRadial + i, linkConductance(links.back, i, at(slopes.back, i)));
  }
  return factorBanded(diagonal, lower, nRadial);
}

/** Radial conductance between neighbouring cells of the rod or of the ring, per length, W/(m K): 2 pi k / ln(r_out/r_in). */
function radialConductance(model: RodHeatModel, grid: RodGrid, i: number): number {
  const inRod = i < grid.nr;
  const radii = inRod ? grid.radialCentres : grid.mountCentres;
  const k = inRod ? i : i - grid.nr;
  const conductivity =
    inRod || model.side.kind !== 'ring' ? model.conductivityRadial : model.side.conductivity;
  return (2 * Math.PI * conductivity) / Math.log(radii[k + 1]! / radii[k]!);
}

/** Axial conductivity times area of a ring of cells, W m/K. */
function axialConductivity(model: RodHeatModel, grid: RodGrid, i: number): number {
  if (i < grid.nr) return model.conductivityAxial * ringArea(grid, i);
  const k = i - grid.nr;
  const conductivity = model.side.kind === 'ring' ? model.side.conductivity : 0;
  return conductivity * Math.PI * (grid.mountFaces[k + 1]! ** 2 - grid.mountFaces[k]! ** 2);
}

/** Area of ring i of the rod, m^2. */
export function ringArea(grid: RodGrid, i: number): number {
  return Math.PI * (grid.faceSquares[i + 1]! - grid.faceSquares[i]!);
}

function sideLinks(model: RodHeatModel, grid: RodGrid): Links {
  const { nr, nz } = grid;
  const last = grid.radialCentres[nr - 1]!;
  const inner = new Float64Array(nz);
  const outer = new Float64Array(nz);
  for (let j = 0; j < nz; j++) {
    const dz = grid.axialFaces[j + 1]! - grid.axialFaces[j]!;
    inner[j] = Math.log(model.radius / last) / (2 * Math.PI * model.conductivityRadial * dz);
    if (model.side.kind === 'ring') {
      const intoRing =
        Math.log(grid.mountCentres[0]! / model.radius) / (2 * Math.PI * model.side.conductivity * dz);
      outer[j] = 1 / (model.side.contactConductance * 2 * Math.PI * model.radius * dz) + intoRing;
    } else outer[j] = contactResistance(model.side, 2 * Math.PI * model.radius * dz);
  }
  return { inner, outer };
}

function contactResistance(contact: ContactModel, area: number): number {
  return contact.kind === 'fixed' ? 0 : 1 / (contact.conductance * area);
}

function endLinks(model: RodHeatModel, grid: RodGrid, which: 'front' | 'back'): Links {
  const end = model[which];
  const j = which === 'front' ? 0 : grid.nz - 1;
  const half = (grid.axialFaces[j + 1]! - grid.axialFaces[j]!) / 2;
  const areas = Float64Array.from({ length: grid.nr }, (_, i) => ringArea(grid, i));
  return {
    inner: areas.map((area) => half / (model.conductivityAxial * area)),
    outer: areas.map((area) => (end.kind === 'film' ? 1 / (end.coefficient * area) : Infinity)),
  };
}

function mountOutConductance(model: RodHeatModel, grid: RodGrid): Float64Array | null {
  const ring = model.side;
  if (ring.kind !== 'ring') return null;
  const last = grid.mountCentres[grid.nMount - 1]!;
  return Float64Array.from({ length: grid.nz }, (_, j) => {
    const dz = grid.axialFaces[j + 1]! - grid.axialFaces[j]!;
    const inRing = Math.log(ring.outerRadius / last) / (2 * Math.PI * ring.conductivity * dz);
    return 1 / (inRing + contactResistance(ring.outer, 2 * Math.PI * ring.outerRadius * dz));
  });
}
