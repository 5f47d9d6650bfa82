// Humidity at cold inside surfaces by ISO 13788: saturation, the temperature factor f_Rsi and the
// surface temperature below which mould may grow or water condense. An estimate from steady states:
// thermal bridges need the f_Rsi of their own 2-D or 3-D calculation, and local rules decide.

/**
 * Saturation pressure of water vapour, over ice below 0 °C.
 *
 *   θ ≥ 0  610.5 · exp(17.269·θ / (237.3 + θ));  θ < 0  610.5 · exp(21.875·θ / (265.5 + θ))
 *
 * Source: ISO 13788:2012, Annex E, E.7 and E.8.
 */
export function hygricSaturationPa(tempC: number): number {
  if (tempC >= 0) return 610.5 * Math.exp((17.269 * tempC) / (237.3 + tempC));
  return 610.5 * Math.exp((21.875 * tempC) / (265.5 + tempC));
}

/**
 * Temperature at which a vapour pressure saturates, the inverse of `hygricSaturationPa`.
 *
 * Source: ISO 13788:2012, Annex E, E.9 and E.10.
 */
export function hygricDewPointC(vapourPa: number): number {
  const x = Math.log(vapourPa / 610.5);
  return x >= 0 ? (237.3 * x) / (17.269 - x) : (265.5 * x) / (21.875 - x);
}

/**
 * Temperature factor of a plane element, f_Rsi = 1 − U·R_si.
 *
 * @param uValueWPerM2K with the same R_si in it [W/(m²·K)]
 * @param insideFilmM2KPerW 0.25 for mould on opaque parts, 0.13 on glass and frames [m²·K/W]
 *
 * Source: ISO 13788:2012, clause 5.3.
 */
export function planeTemperatureFactor(uValueWPerM2K: number, insideFilmM2KPerW: number): number {
  return 1 - uValueWPerM2K * insideFilmM2KPerW;
}

/** Surface temperature by its factor, θ_e + f_Rsi·(θ_i − θ_e). Source: ISO 13788:2012, 3.1.2. */
export function surfaceByFactorC(factor: number, insideC: number, outsideC: number): number {
  return outsideC + factor * (insideC - outsideC);
}

/** Temperature factor that a surface shows. Source: ISO 13788:2012, 3.1.2. */
export function temperatureFactor(surfaceC: number, insideC: number, outsideC: number): number {
  return (surfaceC - outsideC) / (insideC - outsideC);
}

/**
 * Lowest surface temperature that keeps the relative humidity at the surface below the critical one.
 *
 * @param relativeHumidity of the room air, 0 to 1
 * @param criticalHumidity at the surface, 0 to 1: 0.8 mould, 1 condensation, 0.6 corrosion
 *
 * Source: ISO 13788:2012, clause 5.2.
 */
export function lowestSurfaceC(
  insideC: number,
  relativeHumidity: number,
  criticalHumidity: number,
): number {
  return hygricDewPointC((hygricSaturationPa(insideC) * relativeHumidity) / criticalHumidity);
}

/** Relative humidity at a surface, share; more than 1 means water on it. */
export function surfaceHumidity(vapourPa: number, surfaceC: number): number {
  return vapourPa / hygricSaturationPa(surfaceC);
}

/** Use of a building by its vapour load, 1 stores to 5 laundries and pools (ISO 13788 classes). */
export type HumidityClass = 1 | 2 | 3 | 4 | 5;

// Upper limit of each class at 0 °C and below. Source: ISO 13788:2012, Annex A (from memory). [kg/m³]
const classExcessKgPerM3: Readonly<Record<HumidityClass, number>> = {
  1: 0.002,
  2: 0.004,
  3: 0.006,
  4: 0.008,
  5: 0.01,
};

/**
 * Vapour that a room holds more than the outside air, upper limit of its humidity class.
 *
 * Full up to 0 °C outside, from there straight to nothing at 20 °C.
 *
 * Source: ISO 13788:2012, Annex A (values from memory).
 */
export function classVapourExcessKgPerM3(use: HumidityClass, outsideC: number): number {
  const share = Math.min(1, Math.max(0, 1 - outsideC / 20));
  return classExcessKgPerM3[use] * share;
}
