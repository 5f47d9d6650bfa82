// The plainer skies, and the light that the ground throws back.
import { radPerDeg } from '../sun/ephemeris.ts';

/**
 * Diffuse irradiance that a tilted plane receives from a uniformly bright sky [W/m²].
 *
 *   I = DHI · (1 + cos β) / 2
 *
 * Close under an overcast sky; too low under a clear one for planes that face the sun.
 * Source: J. Duffie, W. Beckman, "Solar Engineering of Thermal Processes", equation 2.15.1.
 */
export function isotropicSkyWPerM2(dhiWPerM2: number, tiltDeg: number): number {
  return (dhiWPerM2 * (1 + Math.cos(tiltDeg * radPerDeg))) / 2;
}

/** Least cosine of the zenith by which Hay and Davies' beam ratio divides: 89 degrees. */
export const hayDaviesLeastCosZenith = 0.01745;

/**
 * Diffuse irradiance on a tilted plane with a patch around the sun but no horizon band [W/m²].
 *
 *   I = DHI · (A·Rb + (1 − A)·(1 + cos β)/2),  A = DNI / I0,  Rb = max(0, cos i) / cos z
 *
 * Source: J. Hay, J. Davies, "Calculation of the solar radiation incident on an inclined surface",
 * Proceedings of the First Canadian Solar Radiation Data Workshop (1980), pp. 59-72.
 */
export function hayDaviesSkyWPerM2(
  dhiWPerM2: number,
  dniWPerM2: number,
  extraterrestrialWPerM2: number,
  cosZenith: number,
  cosIncidence: number,
  tiltDeg: number,
): number {
  const index = dniWPerM2 / extraterrestrialWPerM2;
  const ratio = Math.max(0, cosIncidence) / Math.max(cosZenith, hayDaviesLeastCosZenith);
  return dhiWPerM2 * index * ratio + isotropicSkyWPerM2(dhiWPerM2 * (1 - index), tiltDeg);
}

/**
 * Total irradiance on a tilted plane after Hay, Davies, Klucher and Reindl: as above, with the dome
 * brightened towards the horizon by 1 + √(beam/global)·sin³(β/2) [any unit of energy or power].
 * Source: J. Duffie, W. Beckman, as above, equation 2.16.7.
 */
export function hdkrTotal(hour: {
  readonly beam: number;
  readonly diffuse: number;
  readonly extraterrestrial: number;
  readonly beamRatio: number;
  readonly tiltDeg: number;
  readonly groundReflectance: number;
}): number {
  const { beam, diffuse, beamRatio } = hour;
  const global = beam + diffuse;
  const index = beam / hour.extraterrestrial;
  const tilt = hour.tiltDeg * radPerDeg;
  const brightening = 1 + Math.sqrt(global > 0 ? beam / global : 0) * Math.sin(tilt / 2) ** 3;
  return (
    (beam + diffuse * index) * beamRatio +
    diffuse * (1 - index) * ((1 + Math.cos(tilt)) / 2) * brightening +
    (global * hour.groundReflectance * (1 - Math.cos(tilt))) / 2
  );
}

/**
 * Irradiance that a tilted plane receives from ground that scatters evenly [W/m²].
 *
 *   I = ρ · GHI · (1 − cos β) / 2
 *
 * Source: J. Duffie, W. Beckman, as above, equation 2.15.1.
 */
export function groundReflectedWPerM2(
  ghiWPerM2: number,
  tiltDeg: number,
  groundReflectance: number,
): number {
  return (groundReflectance * ghiWPerM2 * (1 - Math.cos(tiltDeg * radPerDeg))) / 2;
}
