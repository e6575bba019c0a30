import type { Plane, RodOptics } from './elements';
import { stepMatrix } from './mode';
import type { PreparedCavity } from './prepare';
import { identity, multiply, reverse } from './ray-matrix';
import type { RayMatrix } from './ray-matrix';

/**
 * Round-trip matrix from the entrance of any element back to it, element by element: the plain way, without
 * the half-trip of the fast path. For reading a cavity and for checking that half trace and determinant do not
 * depend on where one starts.
 *
 * @param start index of the element; linear: on the way from the first mirror to the last
 * @returns A, B, C, D for height and reduced angle
 */
export function roundTripMatrix(
  prepared: PreparedCavity,
  rod: RodOptics,
  plane: Plane,
  start: number,
): RayMatrix {
  const count = prepared.cavity.elements.length;
  const steps = Array.from({ length: count }, (_, index) => {
    const step = identity();
    stepMatrix(prepared, rod, plane, index, step);
    return step;
  });
  const sequence = prepared.cavity.kind === 'ring' ? steps : unfold(steps);
  const matrix = identity();
  for (let i = 0; i < sequence.length; i++) {
    multiply(sequence[(start + i) % sequence.length]!, 0, matrix, 0, matrix, 0);
  }
  return matrix;
}

/** There and back: both end mirrors whole, what lies between them passed backwards on the return. */
function unfold(steps: RayMatrix[]): RayMatrix[] {
  const whole = (half: RayMatrix) => {
    const matrix = identity();
    multiply(half, 0, half, 0, matrix, 0);
    return matrix;
  };
  const between = steps.slice(1, -1);
  return [whole(steps[0]!), ...between, whole(steps[steps.length - 1]!), ...between.map(reverse).reverse()];
}
