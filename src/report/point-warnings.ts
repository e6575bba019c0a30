import type { Warning } from '../errors';
import { peakExcitedShare } from '../laser';
import type { SolvedPoint } from '../operating/point';
import type { PreparedDesign } from '../operating/prepare';
import { absorptionWarnings, beamRadii, clippingWarnings } from '../pump';

/** More than this share of the ions excited bleaches the absorption that the model takes as unchanged. */
const mostExcited = 0.1;
const perMetre = (power: number) => `${Number(power.toPrecision(3))} /m`;

/** The net lens can come out either way: the bulk's dn/dT and the bulge of the faces pull apart. */
function signWarning({ lens }: SolvedPoint): Warning[] {
  const ends = [lens.thermoOptic, lens.power, lens.estimate];
  if (Math.max(...ends) <= 0 || Math.min(...ends) >= 0) return [];
  return [
    {
      where: 'lens',
      text: `The sign of the lens is not settled: dn/dT alone gives ${perMetre(lens.thermoOptic)}, with the bulge from the elastic solution ${perMetre(lens.power)}, with the bulge of freely expanding discs ${perMetre(lens.estimate)}. Check the cavity for a lens of either sign.`,
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
    ...signWarning(lasing),
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
