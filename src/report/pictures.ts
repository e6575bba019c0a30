import { modeEnvelope, rodLength, type CavityElement } from '../cavity';
import type { SolvedPoint } from '../operating/point';
import type { PreparedDesign } from '../operating/prepare';
import { temperatureAt } from '../heat';
import type { CavityPicture, Pictures, RodPicture } from './types';

const profilePoints = 81;

function rodPicture(prepared: PreparedDesign, { field }: SolvedPoint): RodPicture {
  const { grid, temperatures, peakPosition } = field;
  const { rod, pump, mount } = prepared.resolved;
  const length = grid.axialFaces[grid.nz]!;
  const along = (end: number) =>
    Float64Array.from({ length: profilePoints }, (_, k) => (end * k) / (profilePoints - 1));
  const r = along(rod.radius);
  const z = along(length);
  const mountFaces = grid.nMount > 0 ? grid.mountFaces.subarray(1) : new Float64Array(0);
  let lowest = Infinity;
  for (const value of temperatures) lowest = Math.min(lowest, value);
  return {
    radialFaces: Float64Array.from([...grid.radialFaces, ...mountFaces]),
    axialFaces: Float64Array.from(grid.axialFaces),
    rodCells: grid.nr,
    temperatures: Float64Array.from(temperatures),
    lowest,
    highest: field.peakTemperature,
    rodRadius: rod.radius,
    mount: { name: mount.name, shape: mount.body?.shape ?? 'none' },
    pumpRadius: pump.radius,
    backShare: pump.backShare,
    frontCap: rod.frontCap,
    backCap: rod.backCap,
    radialProfile: {
      r,
      temperature: r.map((at) => temperatureAt(field, at, peakPosition.z)),
      z: peakPosition.z,
    },
    axialProfile: { z, temperature: z.map((at) => temperatureAt(field, 0, at)) },
  };
}

function lengthOf(element: CavityElement, rod: number): number {
  if (element.kind === 'space') return element.length;
  if (element.kind === 'plate') {
    const sine = Math.sin(element.incidence) / element.refractiveIndex;
    return element.thickness / Math.sqrt(1 - sine * sine);
  }
  return element.kind === 'rod' ? rod : 0;
}

function labelOf(element: CavityElement): string {
  switch (element.kind) {
    case 'mirror':
      return Number.isFinite(element.radius)
        ? `mirror R ${(element.radius * 1e3).toPrecision(4).replace(/\.?0+$/, '')} mm`
        : 'flat mirror';
    case 'lens':
      return `lens f ${(element.focalLength * 1e3).toPrecision(4).replace(/\.?0+$/, '')} mm`;
    default:
      return element.kind;
  }
}

function cavityPicture(prepared: PreparedDesign, solved: SolvedPoint): CavityPicture {
  const { optics } = solved.lens;
  const { wavelength } = prepared.resolved.rod.laser;
  let at = 0;
  const elements = prepared.resolved.cavity.elements.map((element, index) => {
    const from = at;
    at += lengthOf(element, rodLength(optics));
    const radius =
      element.kind === 'mirror' && Number.isFinite(element.radius) ? { radius: element.radius } : {};
    return { index, kind: element.kind, from, to: at, ...radius, label: labelOf(element) };
  });
  const envelope = (plane: 'sagittal' | 'tangential') =>
    modeEnvelope(prepared.cavity, optics, plane, wavelength, 24).map(({ position, radius }) => ({
      position,
      radius,
    }));
  return {
    elements,
    length: at,
    envelopes: { sagittal: envelope('sagittal'), tangential: envelope('tangential') },
  };
}

/** What the page draws of one operating point, lasing and blocked. */
export function picturesOf(prepared: PreparedDesign, lasing: SolvedPoint, blocked: SolvedPoint): Pictures {
  return {
    rod: { lasing: rodPicture(prepared, lasing), blocked: rodPicture(prepared, blocked) },
    cavity: cavityPicture(prepared, lasing),
  };
}
