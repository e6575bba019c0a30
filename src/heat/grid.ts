import {
  type Attractor,
  anchoredRadii,
  cellDemand,
  gradeFaces,
  logarithmicMean,
} from '../numerics/graded-grid';
import type { RodHeatModel } from './model';

/**
 * Cells of rod and mount. Cell (i, j) is at j*nRadial + i; i out from the axis, j in from the pumped face; the rod's
 * cells are i < nr, those of the mount ring follow.
 */
export interface RodGrid {
  nr: number;
  nz: number;
  nMount: number;
  /** nr + nMount. */
  nRadial: number;
  /** Rod, m: nr + 1 faces from 0 to the barrel, nr centres. */
  radialFaces: Float64Array;
  radialCentres: Float64Array;
  /** Their squares, m^2: radial fluxes are differences in r^2. */
  faceSquares: Float64Array;
  centreSquares: Float64Array;
  /** Centres are scale * sinh((i + 1/2) step): the coordinate in which fields are interpolated. */
  radialScale: number;
  radialStep: number;
  /** Mount ring, m: nMount + 1 faces (none without a ring), nMount centres. */
  mountFaces: Float64Array;
  mountCentres: Float64Array;
  /** m: nz + 1 faces from the pumped face to the far one, nz centres half-way between them. */
  axialFaces: Float64Array;
  axialCentres: Float64Array;
  /** Doped cells are dopedFrom <= j < dopedTo. */
  dopedFrom: number;
  dopedTo: number;
}

/** Number of cells across and along the rod. */
export interface CellCount {
  nr: number;
  nz: number;
}

/** Ready-made cell counts; their measured errors are in the README of this room. */
export const cellPresets = {
  coarse: { nr: 12, nz: 14 },
  study: { nr: 16, nz: 20 },
  standard: { nr: 24, nz: 32 },
  fine: { nr: 40, nz: 60 },
} as const satisfies Record<string, CellCount>;

/** What the grid has to resolve. */
export interface GridWish {
  /** Smallest 1/e2 radius or edge of the pump, m. */
  pumpRadius: number;
  /** Largest absorption coefficient that matters, 1/m. */
  absorptionCoefficient: number;
  cells: keyof typeof cellPresets | CellCount;
  /** Light also enters or returns at the far end, so that end is resolved like the pumped one. */
  bothEnds?: boolean;
}

/**
 * Lays the grid: radii graded towards the axis with one centre exactly at the pump radius (a flat-top has a kink
 * there), faces at the logarithmic mean of neighbouring r^2 (so that the two-point flux is exact for uniform heating
 * and for no heating alike), lengths graded towards the pumped end of the doped part, faces on the caps' ends.
 */
export function makeRodGrid(model: RodHeatModel, wish: GridWish): RodGrid {
  const { nr, nz } = typeof wish.cells === 'string' ? cellPresets[wish.cells] : wish.cells;
  const inside = Math.max(2, Math.round(0.4375 * nr - 0.5));
  const { scale, step, radii } = anchoredRadii(nr, model.radius, wish.pumpRadius, inside);
  const centreSquares = radii.map((r) => r * r);
  const faceSquares = new Float64Array(nr + 1);
  for (let i = 1; i < nr; i++) faceSquares[i] = logarithmicMean(centreSquares[i - 1]!, centreSquares[i]!);
  faceSquares[nr] = model.radius ** 2;
  const mount = mountRadii(model, nr);
  const axial = axialCells(model, wish, nz);
  return {
    nr,
    nz: axial.axialCentres.length,
    nMount: mount.centres.length,
    nRadial: nr + mount.centres.length,
    radialFaces: faceSquares.map((s) => Math.sqrt(s)),
    radialCentres: radii,
    faceSquares,
    centreSquares,
    radialScale: scale,
    radialStep: step,
    mountFaces: mount.faces,
    mountCentres: mount.centres,
    ...axial,
  };
}

/** The ring needs few cells: its flux is exact for a field that varies with ln r only. */
function mountRadii(model: RodHeatModel, nr: number): { faces: Float64Array; centres: Float64Array } {
  if (model.side.kind !== 'ring') return { faces: new Float64Array(0), centres: new Float64Array(0) };
  const count = Math.max(3, Math.round(nr / 5));
  const growth = Math.log(model.side.outerRadius / model.radius) / count;
  const centres = Float64Array.from({ length: count }, (_, i) => model.radius * Math.exp((i + 0.5) * growth));
  const faces = new Float64Array(count + 1);
  faces[0] = model.radius;
  for (let i = 1; i < count; i++)
    faces[i] = Math.sqrt(logarithmicMean(centres[i - 1]! ** 2, centres[i]! ** 2));
  faces[count] = model.side.outerRadius;
  return { faces, centres };
}

type AxialCells = Pick<RodGrid, 'axialFaces' | 'axialCentres' | 'dopedFrom' | 'dopedTo'>;

/**
 * Shares the cells out among cap, doped part and cap, each in proportion to what it asks for. A rod with caps gets half
 * as many again, because its heat flows both ways from the doped part's end.
 */
function axialCells(model: RodHeatModel, wish: GridWish, wantedCells: number): AxialCells {
  const { frontCap, dopedLength, backCap } = model;
  const length = frontCap + dopedLength + backCap;
  const nz = frontCap + backCap > 0 ? Math.round(1.5 * wantedCells) : wantedCells;
  const attractors = axialAttractors(model, wish);
  const ends = [0, frontCap, frontCap + dopedLength, length];
  const total = cellDemand(0, length, attractors);
  const counts = [0, 1, 2].map((region) => {
    const from = ends[region]!;
    const to = ends[region + 1]!;
    return to > from ? Math.max(2, Math.round((nz * cellDemand(from, to, attractors)) / total)) : 0;
  });
  // Rounding is made up in the doped part, which is never left with fewer than four cells.
  counts[1] = Math.max(4, nz - counts[0]! - counts[2]!);
  const cells = counts[0]! + counts[1]! + counts[2]!;
  const axialFaces = new Float64Array(cells + 1);
  let offset = 0;
  counts.forEach((count, region) => {
    if (count > 0) gradeFaces(axialFaces, offset, count, ends[region]!, ends[region + 1]!, attractors);
    offset += count;
  });
  const axialCentres = Float64Array.from(
    { length: cells },
    (_, j) => (axialFaces[j]! + axialFaces[j + 1]!) / 2,
  );
  return { axialFaces, axialCentres, dopedFrom: counts[0]!, dopedTo: counts[0]! + counts[1]! };
}

/**
 * Near the ends of the doped part the field varies over the pump radius or the absorption length, whichever is shorter.
 * The far end of a rod pumped from the front gets the less, the less light reaches it.
 */
function axialAttractors(model: RodHeatModel, wish: GridWish): Attractor[] {
  const { frontCap, dopedLength } = model;
  const pumpLength = wish.pumpRadius * Math.sqrt(model.conductivityAxial / model.conductivityRadial);
  const depth = wish.absorptionCoefficient * dopedLength;
  const size = 0.75 * Math.min(pumpLength, dopedLength / Math.max(depth, 1));
  const farSize = wish.bothEnds ? size : 2 * pumpLength * Math.exp(Math.min(depth, 20) / 4);
  return [
    { at: frontCap, size: Math.min(size, dopedLength / 4) },
    { at: frontCap + dopedLength, size: Math.min(farSize, dopedLength / 2) },
  ];
}
