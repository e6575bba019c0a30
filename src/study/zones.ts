import { stabilityZones, type Plane, type RodOptics } from '../cavity';
import type { SolvedPoint } from '../operating/point';
import type { PreparedDesign } from '../operating/prepare';
import type { Interval } from './ceiling';

/** The rod's optics scaled so that its whole lens has unit power, 1/m. */
function unitShape({ lens }: SolvedPoint): RodOptics | null {
  const { optics, power } = lens;
  if (Math.abs(power) < 1e-9) return null;
  const scale = (values: Float64Array) => values.map((value) => value / power);
  const both = <T>(read: (plane: Plane) => T) => ({
    sagittal: read('sagittal'),
    tangential: read('tangential'),
  });
  return {
    ...optics,
    slicePowers: both((plane) => scale(optics.slicePowers[plane])),
    frontPower: both((plane) => optics.frontPower[plane] / power),
    backPower: both((plane) => optics.backPower[plane] / power),
  };
}

/**
 * Lens powers for which each plane of the cavity is stable, for a lens of the shape it has at one operating point.
 * @param reach zones are sought from minus to plus this lens power, 1/m
 */
export function zonesOf(
  prepared: PreparedDesign,
  point: SolvedPoint,
  reach: number,
): Record<Plane, Interval[]> {
  const shape = unitShape(point);
  if (!shape) return { sagittal: [], tangential: [] };
  const zones = (plane: Plane) =>
    stabilityZones(prepared.cavity, shape, plane, -reach, reach).map(({ from, to }) => ({ from, to }));
  return { sagittal: zones('sagittal'), tangential: zones('tangential') };
}
