/**
 * Weights of the three innermost cells that give the value on the axis: the quadratic in r^2 through them, so the
 * extrapolation is of third order in r^2.
 */
export function axisWeights(centreSquares: Float64Array): Float64Array {
  const [a, b, c] = [centreSquares[0]!, centreSquares[1]!, centreSquares[2]!];
  return Float64Array.of(
    (b * c) / ((b - a) * (c - a)),
    (a * c) / ((a - b) * (c - b)),
    (a * b) / ((a - c) * (b - c)),
  );
}

/** Face value = sum of cells[k] * (value in the kth cell from the face) + air * (air value). */
export interface EndExtrapolation {
  cells: Float64Array;
  air: number;
}

/**
 * Value on an end face from the three cells next to it: the cubic through them that meets the face with the slope the
 * film asks for, dT/dz = slope (T_face - T_air) inwards.
 *
 * @param depths distance of the cell centres from the face, ascending, m; the first three are used
 * @param slope film coefficient over conductivity, 1/m; 0 for an insulated face
 */
export function endExtrapolation(depths: Float64Array, slope: number): EndExtrapolation {
  const [a, b, c] = [depths[0]!, depths[1]!, depths[2]!];
  // Rows A (1 + slope z) + C z^2 + D z^3 = T + slope z T_air; C and D are eliminated with the minors of z^2 and z^3.
  const minors = [b * b * c * c * (c - b), -a * a * c * c * (c - a), a * a * b * b * (b - a)];
  const depth = [a, b, c];
  let determinant = 0;
  let air = 0;
  minors.forEach((minor, k) => {
    determinant += minor * (1 + slope * depth[k]!);
    air += minor * slope * depth[k]!;
  });
  return { cells: Float64Array.from(minors, (minor) => minor / determinant), air: air / determinant };
}
