import type { Fault, Warning } from '../errors';
import { shareWithin, type BeamProfile } from '../pump';
import { faultAt } from './fault';
import { valueOf } from './quantity-field';
import type { Design } from './schema';

type Table = NonNullable<Design['pump']['profileTable']>;

/** Share of its power that a Gaussian has inside its 1/e2 radius; that of any other beam inside its equivalent radius. */
const shareInside = 1 - Math.exp(-2);
/** A stretch of less than this needs no remark: a beam is hardly ever measured better. */
const alike = 0.02;
const bisections = 60;

const radiiOf = (table: Table) => table.map(([radius]) => valueOf(radius, 'length'));

/** What is wrong with a measured profile beyond its single values. */
export function tableFaults({ pump: { profile, profileTable } }: Design): Fault[] {
  const path = 'pump.profileTable';
  if (!profileTable) {
    const sentence =
      'missing; the profile "table" needs its points, such as [["0 um", 1], ["100 um", 0.6], ["200 um", 0]]';
    return profile === 'table' ? [faultAt(path, 'missing', sentence)] : [];
  }
  const radii = radiiOf(profileTable);
  const got = (k: number) => `got "${profileTable[k]![0]}"`;
  if (radii[0] !== 0)
    return [faultAt(`${path}.0.0`, 'inconsistent', `${got(0)}; the first point lies on the axis, at "0 um"`)];
  const back = radii.findIndex((radius, k) => k > 0 && radius <= radii[k - 1]!);
  if (back > 0) {
    const sentence = `${got(back)}; the radii must rise from point to point, and the one before is "${profileTable[back - 1]![0]}"`;
    return [faultAt(`${path}.${back}.0`, 'inconsistent', sentence)];
  }
  if (profileTable.some(([, intensity]) => intensity > 0)) return [];
  const dark = `got ${profileTable.length} intensities of 0; at least one must be more than 0`;
  return [faultAt(path, 'inconsistent', dark)];
}

/** Radius inside which a table has the share of its power that a Gaussian has inside its 1/e2 radius, m. */
function equivalentRadius(profile: BeamProfile & { kind: 'table' }): number {
  let [low, high] = [0, profile.radii[profile.radii.length - 1]!];
  for (let step = 0; step < bisections; step++) {
    const middle = (low + high) / 2;
    if (shareWithin(profile, 1, middle) < shareInside) low = middle;
    else high = middle;
  }
  return high;
}

/** A measured profile that stretches with the beam radius, as every other profile does. */
export function measuredProfile(table: Table): BeamProfile & { kind: 'table'; measuredRadius: number } {
  const intensities = table.map(([, intensity]) => intensity);
  const highest = Math.max(...intensities);
  const profile = {
    kind: 'table' as const,
    radii: Float64Array.from(radiiOf(table)),
    intensities: Float64Array.from(intensities, (intensity) => intensity / highest),
  };
  return { ...profile, measuredRadius: equivalentRadius(profile) };
}

/** What becomes of a table whose own width is not the pump radius. */
export function stretchWarning({ pump }: Design, profile: BeamProfile): Warning[] {
  if (profile.kind !== 'table' || profile.measuredRadius === undefined) return [];
  const stretch = valueOf(pump.radius, 'length') / profile.measuredRadius;
  if (Math.abs(stretch - 1) <= alike) return [];
  const own = `${Number((profile.measuredRadius * 1e6).toPrecision(4))} um`;
  const text = `The measured profile has 86.5 % of its power within ${own}; it is stretched ${stretch.toPrecision(3)} times so that this is the pump radius "${pump.radius}". Enter "${own}" as the pump radius to take the profile as measured.`;
  return [{ where: 'pump.radius', text }];
}
