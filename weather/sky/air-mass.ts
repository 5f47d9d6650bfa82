// How much more air a slanting ray meets than one from straight above.
import { radPerDeg } from '../sun/ephemeris.ts';

/**
 * Relative optical air mass: m = 1 / (cos z + 0.50572·(96.07995 − z)^−1.6364), z in degrees.
 * Source: F. Kasten, A. Young, "Revised optical air mass tables and approximation formula", Applied
 * Optics 28 (1989), pp. 4735-4738.
 */
export function kastenYoungAirMass(zenithDeg: number): number {
  const z = Math.min(zenithDeg, 90);
  return 1 / (Math.cos(z * radPerDeg) + 0.50572 * (96.07995 - z) ** -1.6364);
}

/** The earlier form, 1 / (cos z + 0.15·(93.885 − z)^−1.253). Source: F. Kasten (1966). */
export function kastenAirMass(zenithDeg: number): number {
  const z = Math.min(zenithDeg, 90);
  return 1 / (Math.cos(z * radPerDeg) + 0.15 * (93.885 - z) ** -1.253);
}
