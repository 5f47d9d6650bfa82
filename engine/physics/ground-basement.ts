// Steady heat loss of basements by ISO 13370: floor and walls below ground, heated or not.
import { moderateFloorWPerM2K } from './ground-floor.ts';

/**
 * U-value of a basement floor at depth z.
 *
 *   d + z/2 < B   2λ/(πB + d + z/2) · ln(πB/(d + z/2) + 1),  else λ / (0.457·B + d + z/2)
 *
 * @param depthM depth z of the floor below ground [m]
 * @param equivalentM equivalent thickness d of the floor [m]
 *
 * Source: ISO 13370:2017, clause 7.3 (ISO 13370:2007, 9.3.2).
 */
export function basementFloorWPerM2K(
  dimensionM: number,
  depthM: number,
  soilWPerMK: number,
  equivalentM: number,
): number {
  const path = equivalentM + depthM / 2;
  if (path < dimensionM) return moderateFloorWPerM2K(dimensionM, soilWPerMK, path);
  return soilWPerMK / (0.457 * dimensionM + path);
}

/**
 * U-value of basement walls below ground.
 *
 *   U = 2λ/(πz) · (1 + 0.5·d/(d + z)) · ln(z/d_w + 1)
 *
 * @param floorEquivalentM d of the floor; where the wall insulates less, d_w takes its place [m]
 * @param wallEquivalentM d_w = λ·(R_si + R_w + R_se), inside film 0.13 [m]
 *
 * Source: ISO 13370:2017, clause 7.3 (ISO 13370:2007, 9.3.3).
 */
export function basementWallWPerM2K(
  depthM: number,
  soilWPerMK: number,
  floorEquivalentM: number,
  wallEquivalentM: number,
): number {
  const d = Math.min(floorEquivalentM, wallEquivalentM);
  const corner = 1 + (0.5 * d) / (d + depthM);
  return ((2 * soilWPerMK) / (Math.PI * depthM)) * corner * Math.log(depthM / wallEquivalentM + 1);
}

/**
 * Steady ground conductance of a heated basement, A·U_bf + z·P·U_bw.
 *
 * Source: ISO 13370:2017, clause 7.3.
 */
export function heatedBasementWPerK(
  areaM2: number,
  perimeterM: number,
  depthM: number,
  floorWPerM2K: number,
  wallWPerM2K: number,
): number {
  return areaM2 * floorWPerM2K + depthM * perimeterM * wallWPerM2K;
}

/** An unheated basement under a heated room. */
export interface UnheatedBasement {
  readonly areaM2: number;
  readonly perimeterM: number;
  readonly depthM: number;
  /** Height of the basement's walls above ground [m]. */
  readonly wallAboveM: number;
  /** U-value of the floor between room and basement. */
  readonly deckWPerM2K: number;
  /** U-value of the basement walls above ground. */
  readonly wallAboveWPerM2K: number;
  readonly airChangesPerH: number;
  readonly volumeM3: number;
}

/** Conductance of an unheated basement to outside air: h·P·U_w + 0.33·n·V (0.33 Wh/(m³·K) for air). */
export function basementToOutsideWPerK(basement: UnheatedBasement): number {
  const { wallAboveM, perimeterM, wallAboveWPerM2K, airChangesPerH, volumeM3 } = basement;
  return wallAboveM * perimeterM * wallAboveWPerM2K + 0.33 * airChangesPerH * volumeM3;
}

/**
 * U-value between a heated room and outside through an unheated basement.
 *
 *   1/U = 1/U_f + A / (A·U_bf + z·P·U_bw + h·P·U_w + 0.33·n·V)
 *
 * Source: ISO 13370:2017, clause 7.4 (ISO 13370:2007, 9.4).
 */
export function unheatedBasementUValueWPerM2K(
  basement: UnheatedBasement,
  floorWPerM2K: number,
  wallWPerM2K: number,
): number {
  const { areaM2, perimeterM, depthM } = basement;
  const ground = heatedBasementWPerK(areaM2, perimeterM, depthM, floorWPerM2K, wallWPerM2K);
  return 1 / (1 / basement.deckWPerM2K + areaM2 / (ground + basementToOutsideWPerK(basement)));
}
