/** Temperature of freezing water, K. */
const FREEZING = 273.15;
/** Saturation pressure a exp(b t / (t + c)), t in degC, over water and over ice: Alduchov & Eskridge 1996. */
const OVER_WATER = { a: 610.94, b: 17.625, c: 243.04 };
const OVER_ICE = { a: 611.21, b: 22.587, c: 273.86 };

/**
 * Saturation pressure of water vapour: over water from 0 degC up, over ice below.
 *
 * p = a exp(b t / (t + c)), t in degC.
 *
 * @param temperature K, 233 to 333
 * @returns Pa
 * @source Alduchov & Eskridge 1996, J. Appl. Meteorol. 35, 601, equations 21 and 23
 */
export function saturationPressure(temperature: number): number {
  const t = temperature - FREEZING;
  const { a, b, c } = t < 0 ? OVER_ICE : OVER_WATER;
  return a * Math.exp((b * t) / (t + c));
}

/**
 * The temperature at which room air begins to wet a surface; below 0 degC the frost point.
 *
 * Inverse of the saturation pressure at RH p_sat(T). The result is never above the air temperature.
 *
 * @param temperature of the air, K, 233 to 333
 * @param relativeHumidity 0 to 1; 0 gives the lowest value the formula has, about 30 K
 * @returns K
 * @source Alduchov & Eskridge 1996, J. Appl. Meteorol. 35, 601
 */
export function dewPoint(temperature: number, relativeHumidity: number): number {
  const pressure = Math.max(relativeHumidity, 0) * saturationPressure(temperature);
  const { a, b, c } = pressure < OVER_WATER.a ? OVER_ICE : OVER_WATER;
  // log(p/a) = b t / (t + c); no vapour at all sends t to -c.
  if (pressure === 0) return Math.min(temperature, FREEZING - OVER_WATER.c);
  const exponent = Math.log(pressure) - Math.log(a);
  return Math.min(temperature, Math.max((c * exponent) / (b - exponent), -OVER_WATER.c) + FREEZING);
}
