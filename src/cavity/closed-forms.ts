/** A two-mirror cavity with one thin lens inside; lengths and radii m, radii > 0 concave, Infinity flat. */
interface LensCavity {
  radius1: number;
  radius2: number;
  /** From mirror 1 to the lens. */
  length1: number;
  /** From the lens to mirror 2. */
  length2: number;
  /** 1/m, > 0 converging. */
  lensPower: number;
}

/**
 * Kogelnik and Li's g parameters with a thin lens inside: g1* = 1 - L2 D - L0/R1, g2* = 1 - L1 D - L0/R2,
 * L0 = L1 + L2 - L1 L2 D. Stable while 0 < g1* g2* < 1; m = 2 g1* g2* - 1.
 *
 * @returns g1, g2 without unit and the effective length L0, m
 * @source Kogelnik & Li, Appl. Opt. 5, 1550 (1966)
 */
export function gStar(cavity: LensCavity): { g1: number; g2: number; effectiveLength: number } {
  const { radius1, radius2, length1, length2, lensPower } = cavity;
  const effectiveLength = length1 + length2 - length1 * length2 * lensPower;
  return {
    g1: 1 - length2 * lensPower - effectiveLength / radius1,
    g2: 1 - length1 * lensPower - effectiveLength / radius2,
    effectiveLength,
  };
}

/**
 * Mode radii on the two mirrors of a cavity with a thin lens inside:
 * w1^4 = (lambda L0 / pi)^2 g2* / (g1* (1 - g1* g2*)), and the same with 1 and 2 exchanged.
 *
 * @param wavelength m
 * @returns 1/e2 radii, m; null when unstable or on the edge
 * @source Kogelnik & Li, Appl. Opt. 5, 1550 (1966)
 */
export function mirrorRadii(
  cavity: LensCavity,
  wavelength: number,
): { mirror1: number; mirror2: number } | null {
  const { g1, g2, effectiveLength } = gStar(cavity);
  const product = g1 * g2;
  if (!(product > 0 && product < 1)) return null;
  const unit = (wavelength * Math.abs(effectiveLength)) / Math.PI;
  return {
    mirror1: Math.sqrt(unit * Math.sqrt(g2 / (g1 * (1 - product)))),
    mirror2: Math.sqrt(unit * Math.sqrt(g1 / (g2 * (1 - product)))),
  };
}

/**
 * Waist of an empty two-mirror cavity:
 * w0^4 = (lambda L / pi)^2 g1 g2 (1 - g1 g2) / (g1 + g2 - 2 g1 g2)^2 at z1 = L g2 (1 - g1) / (g1 + g2 - 2 g1 g2).
 *
 * @param length between the mirrors, m
 * @param wavelength m
 * @returns radius and distance from mirror 1 (negative when behind it), m; null when unstable or on the edge
 * @source Kogelnik & Li, Appl. Opt. 5, 1550 (1966); Siegman, Lasers (1986), section 19.1
 */
export function waist(
  radius1: number,
  radius2: number,
  length: number,
  wavelength: number,
): { radius: number; position: number } | null {
  const g1 = 1 - length / radius1;
  const g2 = 1 - length / radius2;
  const product = g1 * g2;
  const confocal = g1 === 0 && g2 === 0;
  if (!confocal && !(product > 0 && product < 1)) return null;
  const unit = (wavelength * length) / Math.PI;
  if (confocal) return { radius: Math.sqrt(unit / 2), position: length / 2 };
  const sum = g1 + g2 - 2 * product;
  const quarter = (product * (1 - product)) / (sum * sum);
  return { radius: Math.sqrt(unit * Math.sqrt(quarter)), position: (length * g2 * (1 - g1)) / sum };
}

/**
 * The two stability zones of one thin lens between two optical trains, in closed form. On each side there are
 * two points that the mirror returns to themselves: its vertex and its centre of curvature. The cavity is on
 * the edge when the lens images one of the left pair onto one of the right pair, D = a + b, with a and b the
 * vergences the lens sees: for two bare arms 1/L1, 1/(L1 - R1) and 1/L2, 1/(L2 - R2). The four sums in order
 * bound two zones of equal width, and both have the same least mode radius at the lens,
 * w^2 = 2 lambda / (pi width).
 *
 * @param left vergences on the left, 1/m
 * @param right vergences on the right, 1/m
 * @returns the two zones, 1/m; empty (from = to) when a pair coincides
 * @source Magni, J. Opt. Soc. Am. A 4, 1962 (1987), from memory
 */
export function thinLensZones(
  left: readonly [number, number],
  right: readonly [number, number],
): [{ from: number; to: number }, { from: number; to: number }] {
  const edges = left.flatMap((a) => right.map((b) => a + b)).sort((one, other) => one - other);
  return [
    { from: edges[0]!, to: edges[1]! },
    { from: edges[2]!, to: edges[3]! },
  ];
}

/** The vergences of {@link thinLensZones} for a bare arm of length m that ends in a mirror of radius m. */
export function armVergences(length: number, mirrorRadius: number): [number, number] {
  return [1 / length, 1 / (length - mirrorRadius)];
}

/**
 * Least mode radius at the lens over a stability zone: w^2 = 2 lambda / (pi width).
 *
 * @param zoneWidth 1/m
 * @param wavelength m
 * @returns 1/e2 radius, m
 * @source Magni, J. Opt. Soc. Am. A 4, 1962 (1987), from memory
 */
export function leastModeRadius(zoneWidth: number, wavelength: number): number {
  return Math.sqrt((2 * wavelength) / (Math.PI * zoneWidth));
}

/**
 * Angle of incidence at which a concave fold mirror undoes the astigmatism of a Brewster plate (a rod between
 * Brewster faces): R sin(theta) tan(theta) = 2 t sqrt(n^2 + 1) (n^2 - 1) / n^4.
 *
 * @param mirrorRadius m, > 0
 * @param thickness of the plate, m
 * @returns rad
 * @source Kogelnik, Ippen, Dienes & Shank, IEEE J. Quantum Electron. 8, 373 (1972), from memory
 */
export function foldCompensationAngle(
  mirrorRadius: number,
  thickness: number,
  refractiveIndex: number,
): number {
  const square = refractiveIndex * refractiveIndex;
  const wanted = (2 * thickness * Math.sqrt(square + 1) * (square - 1)) / (square * square) / mirrorRadius;
  // sin tan = (1 - cos^2) / cos = wanted, so cos^2 + wanted cos - 1 = 0.
  return Math.acos(2 / (wanted + Math.sqrt(wanted * wanted + 4)));
}
