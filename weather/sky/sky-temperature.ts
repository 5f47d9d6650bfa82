// How cold the sky looks: the temperature of a black dome that sends the same long-wave radiation.

/** Stefan-Boltzmann constant [W/(m²·K⁴)], CODATA 2018. */
const sigma = 5.670374419e-8;
const kelvin = 273.15;

/** Temperature of a black sky that sends this infrared onto the horizontal [°C]. */
export function skyTemperatureFromInfraredC(infraredWPerM2: number): number {
  return (infraredWPerM2 / sigma) ** 0.25 - kelvin;
}

/** Infrared on the horizontal from a sky of an emissivity at air temperature [W/m²]. */
export function skyInfraredWPerM2(emissivity: number, dryBulbC: number): number {
  return emissivity * sigma * (dryBulbC + kelvin) ** 4;
}

/** Temperature of the sky from its emissivity: T_sky = ε^¼ · T_air [°C]. */
export function skyTemperatureFromEmissivityC(emissivity: number, dryBulbC: number): number {
  return emissivity ** 0.25 * (dryBulbC + kelvin) - kelvin;
}

/**
 * Emissivity of the clear sky, mean of day and night: 0.711 + 0.56·(t_dp/100) + 0.73·(t_dp/100)².
 * Source: P. Berdahl, M. Martin, "Emissivity of clear skies", Solar Energy 32 (1984), pp. 663-664.
 */
export function berdahlMartinEmissivity(dewPointTemperatureC: number): number {
  const x = dewPointTemperatureC / 100;
  return 0.711 + x * (0.56 + x * 0.73);
}

/**
 * The same with the terms for hour and pressure: + 0.013·cos(2π·hour/24) + 0.00012·(p − 1000 hPa).
 * @param hourOfDay counted from midnight
 */
export function berdahlMartinHourlyEmissivity(
  dewPointTemperatureC: number,
  hourOfDay: number,
  pressurePa: number,
): number {
  return (
    berdahlMartinEmissivity(dewPointTemperatureC) +
    0.013 * Math.cos((2 * Math.PI * hourOfDay) / 24) +
    0.00012 * (pressurePa / 100 - 1000)
  );
}

/** Height of the cloud base where the table reports none. */
export const unreportedCeilingM = 5000;

/**
 * Emissivity with cloud: ε + (1 − ε) · n · exp(−z / 8.2 km).
 * Source: M. Martin, P. Berdahl, "Characteristics of infrared sky radiation in the United States",
 * Solar Energy 33 (1984), pp. 321-336, with clouds as black bodies.
 * @param opaqueCover share of the sky, 0 to 1
 * @param ceilingM height of the cloud base; not finite: 5 km
 */
export function cloudySkyEmissivity(clear: number, opaqueCover: number, ceilingM: number): number {
  const heightM = Number.isFinite(ceilingM) ? ceilingM : unreportedCeilingM;
  return clear + (1 - clear) * opaqueCover * Math.exp(-heightM / 8200);
}

/**
 * Emissivity of the clear sky: 0.787 + 0.764 · ln((t_dp + 273) / 273).
 * Source: G. Clark, C. Allen, "The estimation of atmospheric radiation for clear and cloudy skies",
 * Proceedings of the 2nd National Passive Solar Conference (1978), pp. 675-678.
 */
export function clarkAllenEmissivity(dewPointTemperatureC: number): number {
  return 0.787 + 0.764 * Math.log((dewPointTemperatureC + 273) / 273);
}

/**
 * What cloud multiplies Clark and Allen's emissivity by: 1 + 0.0224·n − 0.0035·n² + 0.00028·n³ with
 * the opaque cover n in tenths. Source: G. Walton, NBSIR 83-2655 (1983).
 */
export function waltonCloudFactor(opaqueCover: number): number {
  const n = opaqueCover * 10;
  return 1 + n * (0.0224 + n * (-0.0035 + n * 0.00028));
}

/**
 * Emissivity of the clear sky from the vapour's pressure in hPa: 0.52 + 0.065·√e.
 * Source: D. Brunt, "Notes on radiation in the atmosphere", Quarterly Journal of the Royal
 * Meteorological Society 58 (1932), pp. 389-420.
 */
export function bruntEmissivity(vapourPa: number): number {
  return 0.52 + 0.065 * Math.sqrt(vapourPa / 100);
}

/** Clear sky from the air temperature alone: 0.0552 · T^1.5. Source: W. Swinbank (1963) [°C]. */
export function swinbankSkyC(dryBulbC: number): number {
  return 0.0552 * (dryBulbC + kelvin) ** 1.5 - kelvin;
}

/** Where nothing is known of humidity and cloud: air − 11 K, intermediate zones. Source: ISO 52016-1, annex B [°C]. */
export function plainSkyC(dryBulbC: number): number {
  return dryBulbC - 11;
}
