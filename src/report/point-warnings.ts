import { planeMode, type RodOptics } from '../cavity';
import type { ResolvedDesign } from '../design/resolved';
import type { Warning } from '../errors';
import { peakExcitedShare } from '../laser';
import type { SolvedPoint } from '../operating/point';
import type { PreparedDesign } from '../operating/prepare';
import { absorbedShare, absorptionWarnings, beamRadii, clippingWarnings, pumpChannels } from '../pump';

/** More than this share of the ions excited bleaches the absorption that the model takes as unchanged. */
const mostExcited = 0.1;
const perMetre = (power: number) => `${Number(power.toPrecision(3))} /m`;

/** The rod's optics with its lens scaled to another power and sign, its shape along the rod kept. */
function scaledOptics(optics: RodOptics, factor: number): RodOptics {
  const scale = (values: Float64Array) => values.map((value) => value * factor);
  return {
    ...optics,
    slicePowers: {
      sagittal: scale(optics.slicePowers.sagittal),
      tangential: scale(optics.slicePowers.tangential),
    },
    frontPower: {
      sagittal: optics.frontPower.sagittal * factor,
      tangential: optics.frontPower.tangential * factor,
    },
    backPower: {
      sagittal: optics.backPower.sagittal * factor,
      tangential: optics.backPower.tangential * factor,
    },
  };
}

/** The net lens can come out either way: the bulk's dn/dT and the bulge of the faces pull apart. */
function signWarning({ cavity, resolved }: PreparedDesign, { lens }: SolvedPoint): Warning[] {
  const ends = [lens.thermoOptic, lens.power, lens.estimate];
  if (Math.max(...ends) <= 0 || Math.min(...ends) >= 0) return [];
  const described = (power: number) => {
    if (lens.power === 0) return perMetre(power);
    const optics = scaledOptics(lens.optics, power / lens.power);
    const planes = (['sagittal', 'tangential'] as const).map((plane) =>
      planeMode(cavity, optics, plane, resolved.rod.laser.wavelength),
    );
    return `${perMetre(power)} (cavity ${planes.every((plane) => plane.stable) ? 'stable' : 'not stable'})`;
  };
  return [
    {
      where: 'lens',
      text: `The sign of the lens is not settled: dn/dT alone gives ${described(lens.thermoOptic)}, with the bulge from the elastic solution ${described(lens.power)}, with the bulge of freely expanding discs ${described(lens.estimate)}. Build a cavity that bears a lens of either sign, or measure it.`,
    },
  ];
}

/** Absorbed shares of the two polarisations that differ by less than this need no remark. */
const alikeShares = 0.05;

/** What each polarisation of the pump finds in a crystal that absorbs them differently. */
function polarisationRemark({ resolved }: PreparedDesign, { point }: SolvedPoint): Warning[] {
  const { pump, rod } = resolved;
  const { pi, sigma } = pump.polarisationShares;
  if (rod.isotropic || rod.absorption.kind === 'coefficient' || !(pi > 0 && sigma > 0)) return [];
  const taken = (shares: { pi: number; sigma: number }) =>
    absorbedShare(
      pumpChannels({ centre: point.diode.wavelength, linewidth: pump.linewidth }, shares, rod.absorption),
      rod.dopedLength,
      pump.passes,
      pump.returnReflectivity,
    );
  const along = taken({ pi: 1, sigma: 0 });
  const across = taken({ pi: 0, sigma: 1 });
  if (Math.abs(along - across) < alikeShares) return [];
  const percent = (share: number) => `${(100 * share).toFixed(0)} %`;
  return [
    {
      where: 'pump.polarisation',
      text: `The crystal absorbs ${percent(along)} of the pump light polarised along its optic axis (pi) and ${percent(across)} of that across it (sigma): turn pump or crystal towards the stronger.`,
    },
  ];
}

/** The part of the lens that nobody can compute for want of coefficients. */
function stressLensWarning({ rod }: ResolvedDesign, { point }: SolvedPoint): Warning[] {
  const size = point.lens.photoelasticUnknown;
  if (size === 0 || size < 0.01 * Math.abs(point.lens.dioptricPower)) return [];
  return [
    {
      where: 'lens.photoelastic',
      text: `The photoelastic coefficients of ${rod.crystalName} are not known well enough to compute with: this part of the lens is taken as zero; it may be of the order of plus or minus ${perMetre(size)}.`,
    },
  ];
}

function bleachingWarning(prepared: PreparedDesign, { point }: SolvedPoint): Warning[] {
  const { pump, rod } = prepared.resolved;
  const { laser } = rod;
  if (!(laser.ionDensity > 0) || point.absorbedPower <= 0) return [];
  const volume = Math.PI * pump.radius ** 2 * rod.dopedLength;
  const share = peakExcitedShare(
    {
      pumpWavelength: pump.wavelength,
      upperLifetime: laser.lifetime,
      pumpQuantumEfficiency: laser.pumpQuantumEfficiency,
    },
    point.absorbedPower / volume,
    laser.ionDensity,
  );
  if (share < mostExcited) return [];
  return [
    {
      where: 'pump',
      text: `Without lasing about ${(100 * Math.min(share, 1)).toFixed(0)} % of the ions would be excited: the absorption bleaches, which is left out.`,
    },
  ];
}

/** A pull of the bore beyond this is more than rounding or a trifle, Pa. */
const noticedPull = 1e5;

/** A rod colder than it was when clamped shrinks away from its bore, which the model does not let go. */
function pullWarning({ mount }: ResolvedDesign, { barrelTension }: SolvedPoint): Warning[] {
  if (mount.grip !== 'clamped' || barrelTension < noticedPull) return [];
  const text = `The clamping bore would have to pull the rod by up to ${(barrelTension / 1e6).toPrecision(2)} MPa, since the barrel is colder there than at assembly: unless it is bonded it comes loose, and loses its contact.`;
  return [{ where: 'mount.grip', text }];
}

/** What a person should know beside the numbers of the design's operating point. */
export function pointWarnings(prepared: PreparedDesign, lasing: SolvedPoint): Warning[] {
  const { resolved, grid } = prepared;
  const { pump, rod } = resolved;
  const beam = {
    waistRadius: pump.radius,
    waistPosition: pump.waistPosition,
    beamQuality: pump.beamQuality,
    wavelength: pump.wavelength,
    refractiveIndex: rod.refractiveIndex,
  };
  const { point, cooler } = lasing;
  const mode = point.cavity.sagittal.modeRadiusInRod;
  const ratio = mode === null ? null : mode / pump.radius;
  const warnings: Warning[] = [
    ...absorptionWarnings({ centre: point.diode.wavelength, linewidth: pump.linewidth }, rod.absorption),
    ...clippingWarnings(pump.profile, Math.max(...beamRadii(grid.axialFaces, beam)), rod.radius),
    ...bleachingWarning(prepared, lasing),
    ...stressLensWarning(resolved, lasing),
    ...pullWarning(resolved, lasing),
    ...signWarning(prepared, lasing),
    ...polarisationRemark(prepared, lasing),
    ...cooler.warnings,
  ];
  if (ratio !== null && ratio < 0.7)
    warnings.push({
      where: 'cavity',
      text: `The mode in the rod has ${ratio.toFixed(2)} of the pump radius: higher transverse modes lase too; the output is that of the lowest mode alone.`,
    });
  if (!point.cavity.sagittal.stable || !point.cavity.tangential.stable)
    warnings.push({
      where: 'cavity',
      text: 'At the design pump power the cavity holds no mode: the output is given as zero, the heat as that of a lasing rod; the blocked-beam state bounds it.',
    });
  if (point.state === 'none')
    warnings.push({
      where: 'operating',
      text: `There is no steady state at the design pump power: ${point.reason ?? 'the cooler finds no balance'}. The numbers shown are those of the last point tried.`,
    });
  return warnings;
}
