/** A focused pump beam inside the rod. */
export interface FocusedBeam {
  /** beam radius at the waist, m (1/e2 for a Gaussian, edge for a flat-top) */
  waistRadius: number;
  /** distance of the waist behind the rod's front face, inside the rod, m */
  waistPosition: number;
  /** M2; null: collimated, the radius is the same everywhere */
  beamQuality: number | null;
  /** vacuum wavelength, m */
  wavelength: number;
  /** refractive index of the rod */
  refractiveIndex: number;
}

/**
 * Radius of the pump beam at depth z: w^2 = w0^2 [1 + (M2 lambda (z - z0) / (pi n w0^2))^2].
 * Left out: the thermal lens acting on the pump itself.
 * @param z distance behind the rod's front face, m
 * @returns m
 * @source Siegman, Lasers (1986), with the beam quality of ISO 11146
 */
export function beamRadius(z: number, beam: FocusedBeam): number {
  if (beam.beamQuality === null) return beam.waistRadius;
  const w0 = beam.waistRadius;
  const spread =
    (beam.beamQuality * beam.wavelength * (z - beam.waistPosition)) /
    (Math.PI * beam.refractiveIndex * w0 * w0);
  return w0 * Math.sqrt(1 + spread * spread);
}

/**
 * Beam radius in the middle of each axial cell.
 * @param axialFaces faces of the cells, m behind the rod's front face
 * @returns length axialFaces.length - 1, m
 */
export function beamRadii(axialFaces: Float64Array, beam: FocusedBeam): Float64Array {
  const radii = new Float64Array(axialFaces.length - 1);
  for (let j = 0; j < radii.length; j++)
    radii[j] = beamRadius((axialFaces[j]! + axialFaces[j + 1]!) / 2, beam);
  return radii;
}
