// Operative, mean radiant and globe temperature.

/** Share of the air in the operative temperature by air speed. Source: ASHRAE 55, appendix on it. */
export function airShare(airMPerS: number): number {
  if (airMPerS < 0.2) return 0.5;
  return airMPerS < 0.6 ? 0.6 : 0.7;
}

/**
 * Operative temperature by a share of the air.
 *
 *   t_o = A·t_air + (1 − A)·t_radiant
 *
 * @param share of the air, 0 to 1; 0.5 up to 0.2 m/s
 *
 * Source: ASHRAE 55-2020, appendix on the operative temperature; ISO 7730:2005, 3.6 for one half.
 */
export function operativeC(airC: number, meanRadiantC: number, share = 0.5): number {
  return share * airC + (1 - share) * meanRadiantC;
}

/**
 * Operative temperature by the body's coefficients.
 *
 *   t_o = (h_c·t_air + h_r·t_radiant)/(h_c + h_r)
 *
 * Source: ISO 7726:1998, Annex G.
 */
export function weightedOperativeC(
  airC: number,
  meanRadiantC: number,
  convectiveWPerM2K: number,
  radiantWPerM2K: number,
): number {
  const share = convectiveWPerM2K / (convectiveWPerM2K + radiantWPerM2K);
  return operativeC(airC, meanRadiantC, share);
}

/**
 * Mean radiant temperature as the weighted mean of surface temperatures; close where they differ by
 * a few kelvin.
 *
 * @param weights angle factors, or areas for the middle of a plain room
 *
 * Source: ISO 7726:1998, Annex B.
 */
export function meanRadiantC(weights: ArrayLike<number>, surfaceC: ArrayLike<number>): number {
  let sum = 0;
  let total = 0;
  for (let i = 0; i < weights.length; i++) {
    sum += weights[i] * surfaceC[i];
    total += weights[i];
  }
  return sum / total;
}

/**
 * Mean radiant temperature by the fourth powers, exact for black surfaces.
 *
 *   T_r⁴ = Σ F·T⁴/Σ F
 *
 * Source: ISO 7726:1998, Annex B.
 */
export function meanRadiantByPowersC(
  weights: ArrayLike<number>,
  surfaceC: ArrayLike<number>,
): number {
  let sum = 0;
  let total = 0;
  for (let i = 0; i < weights.length; i++) {
    sum += weights[i] * (surfaceC[i] + 273.15) ** 4;
    total += weights[i];
  }
  return (sum / total) ** 0.25 - 273.15;
}

/**
 * Mean radiant temperature from a globe thermometer in moving air.
 *
 *   T_r⁴ = T_g⁴ + 1.1e8·v^0.6/(ε·D^0.4)·(t_g − t_a)
 *
 * @param diameterM 0.15 for the standard globe, @param emissivity 0.95 when black
 *
 * Source: ISO 7726:1998, Annex B, equation (B.7).
 */
export function radiantFromGlobeForcedC(
  globeC: number,
  airC: number,
  airMPerS: number,
  diameterM = 0.15,
  emissivity = 0.95,
): number {
  const convection = (1.1e8 * airMPerS ** 0.6) / (emissivity * diameterM ** 0.4);
  return ((globeC + 273) ** 4 + convection * (globeC - airC)) ** 0.25 - 273;
}

/**
 * Mean radiant temperature from a globe thermometer in still air.
 *
 *   T_r⁴ = T_g⁴ + (0.25e8/ε)·(|t_g − t_a|/D)^(1/4)·(t_g − t_a)
 *
 * Source: ISO 7726:1998, Annex B, equation (B.6).
 */
export function radiantFromGlobeStillC(
  globeC: number,
  airC: number,
  diameterM = 0.15,
  emissivity = 0.95,
): number {
  const difference = globeC - airC;
  const convection = (0.25e8 / emissivity) * (Math.abs(difference) / diameterM) ** 0.25;
  return ((globeC + 273) ** 4 + convection * difference) ** 0.25 - 273;
}
