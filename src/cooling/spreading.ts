import type { Attachment, Footprint } from './cooler';

/** A base plate that spreads heat from a footprint on one face to a uniform film on the other. */
export interface BasePlate {
  /** Radius of the circle with the plate's area, m. */
  radius: number;
  /** m */
  thickness: number;
  /** W/(m K) */
  conductivity: number;
}

/** Radius of the circle that has the footprint's area, m. */
function equivalentRadius(footprint: Footprint): number {
  return 'radius' in footprint ? footprint.radius : footprint.side / Math.sqrt(Math.PI);
}

/**
 * Temperature under a footprint above the mean of its plate, per watt of uniform heat.
 *
 * eps = a/b, tau = t/b, Bi = h b/k, lambda = pi + 1/(sqrt(pi) eps),
 * phi = [tanh(lambda tau) + lambda/Bi] / [1 + (lambda/Bi) tanh(lambda tau)];
 * peak (1 - eps) phi / (pi k a), mean (1 - eps)^(3/2) phi / (2 sqrt(pi) k a). Against the exact series the peak is within 7 %
 * and the mean within 8 % while the film's Biot number h b/k is below about 0.3 and a plate is at least
 * three times as wide as its footprint; square plates by the circles of equal area.
 *
 * @param sourceRadius a, m; at or above the plate's radius there is nothing to spread
 * @param plate b, t, k
 * @param filmCoefficient h on the far face, W/(m2 K), above 0
 * @returns K/W, peak (middle of the footprint) and mean over it
 * @source Lee, Song, Au & Moran 1995, ASME/JSME Thermal Engineering Conf. 4, 199 (from memory)
 */
export function spreadingResistance(
  sourceRadius: number,
  plate: BasePlate,
  filmCoefficient: number,
): { peak: number; mean: number } {
  const ratio = sourceRadius / plate.radius;
  if (ratio >= 1) return { peak: 0, mean: 0 };
  const lambda = Math.PI + 1 / (Math.sqrt(Math.PI) * ratio);
  const shallow = Math.tanh((lambda * plate.thickness) / plate.radius);
  const stiffness = (lambda * plate.conductivity) / (filmCoefficient * plate.radius);
  // Divided through by lambda/Bi, so that a vanishing film is no trouble.
  const phi = (shallow / stiffness + 1) / (1 / stiffness + shallow);
  const scale = phi / (plate.conductivity * sourceRadius);
  return {
    peak: ((1 - ratio) * scale) / Math.PI,
    mean: ((1 - ratio) ** 1.5 * scale) / (2 * Math.sqrt(Math.PI)),
  };
}

/**
 * Everything between the mount base and the mean of the sink's plate: interface and spreading. The peak under
 * the footprint is taken, the cautious one.
 *
 * @param sinkResistance of the sink from its plate to the surroundings, K/W; fixes the film the plate sees
 * @returns K/W
 */
export function attachmentResistance(
  attachment: Attachment,
  plate: BasePlate | undefined,
  sinkResistance: number,
): number {
  const joint = attachment.interfaceResistance ?? 0;
  if (attachment.footprint === undefined || plate === undefined) return joint;
  const film = 1 / (sinkResistance * Math.PI * plate.radius * plate.radius);
  return joint + spreadingResistance(equivalentRadius(attachment.footprint), plate, film).peak;
}
