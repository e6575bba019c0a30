import type { Report } from '../../src/report/types';
import { lensPower } from '../format/quantities';
import { significant } from '../format/number';

interface Fact {
  name: string;
  value: string;
  note?: string;
}

/** What the lens is made of, and what stress does to polarised light, for the facts beside the cavity. */
export function lensParts(lens: Report['operating']['lens']): Fact[] {
  const known = lens.depolarisedShare !== null;
  const stress = known
    ? {
        value: lensPower(lens.photoelastic),
        note: `${lensPower(lens.photoelasticRadial)} radial, ${lensPower(lens.photoelasticTangential)} tangential`,
      }
    : { value: 'not known', note: `taken as 0, of the order of ±${lensPower(lens.photoelasticUnknown)}` };
  const facts: Fact[] = [
    { name: 'dn/dT part of the lens', value: lensPower(lens.thermoOptic) },
    { name: 'bulge part', value: lensPower(lens.bulge) },
    { name: 'stress part', ...stress },
    { name: 'aberration loss per pass', value: `${significant(100 * lens.aberrationLoss)}\u00a0%` },
  ];
  if (known)
    facts.push({
      name: 'depolarised per pass',
      value: `${significant(100 * lens.depolarisedShare!)}\u00a0%`,
    });
  return facts;
}
