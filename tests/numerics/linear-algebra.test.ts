import { describe, expect, it } from 'vitest';
import { NumericalError } from '../../src/errors';
import { factorBanded, solveBanded } from '../../src/numerics/banded';
import { eigenTridiagonal, solveTridiagonal } from '../../src/numerics/tridiagonal';

/** The five-point Laplacian of a unit square with nx by ny cells and a fixed rim: a banded matrix with known eigenvectors. */
function fivePoint(nx: number, ny: number): { diagonal: Float64Array; lower: Float64Array } {
  const size = nx * ny;
  const diagonal = new Float64Array(size).fill(4);
  const lower = new Float64Array(size * nx);
  for (let p = 0; p < size; p++) {
    if (p % nx > 0) lower[p * nx + nx - 1] = -1;
    if (p >= nx) lower[p * nx] = -1;
  }
  return { diagonal, lower };
}

describe('banded LDLT', () => {
  it('returns the sine mode of the five-point Laplacian over its eigenvalue 4 - 2cos - 2cos (Golub & Van Loan, section 4.8, from memory)', () => {
    for (const [nx, ny] of [
      [1, 7],
      [2, 3],
      [5, 4],
      [24, 24],
      [13, 31],
    ] as const) {
      const { diagonal, lower } = fivePoint(nx, ny);
      const factor = factorBanded(diagonal, lower, nx);
      const mode = Float64Array.from({ length: nx * ny }, (_, p) => {
        return (
          Math.sin((Math.PI * ((p % nx) + 1)) / (nx + 1)) *
          Math.sin((2 * Math.PI * (Math.floor(p / nx) + 1)) / (ny + 1))
        );
      });
      const eigenvalue = 4 - 2 * Math.cos(Math.PI / (nx + 1)) - 2 * Math.cos((2 * Math.PI) / (ny + 1));
      const x = solveBanded(factor, Float64Array.from(mode));
      // Condition numbers stay below 1e4 here, so twelve digits survive.
      x.forEach((value, p) => expect(Math.abs(value * eigenvalue - mode[p]!)).toBeLessThan(1e-12));
    }
  });

  it('refuses a matrix that is not positive definite', () => {
    expect(() => factorBanded(Float64Array.of(1, 1), Float64Array.of(0, 2), 1)).toThrow(NumericalError);
  });
});

describe('tridiagonal systems', () => {
  it('a source of one between two cold ends gives the parabola p(n+1-p)/2', () => {
    const n = 9;
    const side = new Float64Array(n).fill(-1);
    const x = solveTridiagonal(side, new Float64Array(n).fill(2), side, new Float64Array(n).fill(1));
    x.forEach((value, p) => expect(value).toBeCloseTo(((p + 1) * (n - p)) / 2, 12));
  });

  it('refuses a vanishing pivot', () => {
    const zero = new Float64Array(2);
    expect(() => solveTridiagonal(zero, zero, zero, zero)).toThrow(NumericalError);
  });

  it('a chain of equal springs has the eigenvalues 2 - 2cos(m pi/(n+1)) (Golub & Van Loan, section 4.8, from memory)', () => {
    const n = 17;
    const { values, vectors } = eigenTridiagonal(
      new Float64Array(n).fill(2),
      new Float64Array(n - 1).fill(-1),
    );
    values.forEach((value, m) =>
      expect(value).toBeCloseTo(2 - 2 * Math.cos(((m + 1) * Math.PI) / (n + 1)), 13),
    );
    for (let a = 0; a < n; a++)
      for (let b = 0; b < n; b++) {
        let product = 0;
        for (let k = 0; k < n; k++) product += vectors[a * n + k]! * vectors[b * n + k]!;
        expect(product).toBeCloseTo(a === b ? 1 : 0, 12);
      }
  });
});
