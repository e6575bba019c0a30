import type { CellCount } from './grid';

/** A number and how far the grid may have moved it. */
export interface GridError {
  /** On the grid asked for. */
  value: number;
  /** Estimated bound of the error of `value`, in its own unit, >= 0. */
  error: number;
}

/**
 * Estimates what the grid does to any answers. The discretisation is of second order, so the error that the cells of one
 * direction make is the difference to a grid with two thirds as many of them, over 1.5^2 - 1. Both directions are added
 * without sign, because they often cancel by chance.
 *
 * @param answersOn answers, always the same ones in the same order, with so many cells; called three times
 * @source Richardson's extrapolation; Roache, J. Fluids Eng. 116, 405 (1994) (from memory)
 */
export function estimateGridError(answersOn: (cells: CellCount) => number[], cells: CellCount): GridError[] {
  const fewerAcross = Math.round((2 * cells.nr) / 3);
  const fewerAlong = Math.round((2 * cells.nz) / 3);
  const values = answersOn(cells);
  const across = answersOn({ nr: fewerAcross, nz: cells.nz });
  const along = answersOn({ nr: cells.nr, nz: fewerAlong });
  const excess = (more: number, fewer: number) => (more / fewer) ** 2 - 1;
  return values.map((value, k) => ({
    value,
    error:
      Math.abs(across[k]! - value) / excess(cells.nr, fewerAcross) +
      Math.abs(along[k]! - value) / excess(cells.nz, fewerAlong),
  }));
}
