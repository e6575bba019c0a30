/** Planck constant, J s (exact, SI 2019). */
export const PLANCK = 6.62607015e-34;
/** Speed of light in vacuum, m/s (exact). */
export const LIGHT_SPEED = 299792458;
/** Boltzmann constant, J/K (exact, SI 2019). */
export const BOLTZMANN = 1.380649e-23;

/** Energy of a photon of a vacuum wavelength (m), J. */
export function photonEnergy(wavelength: number): number {
  return (PLANCK * LIGHT_SPEED) / wavelength;
}
