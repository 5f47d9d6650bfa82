// Yearly periodic heat flow through floors and basements by ISO 13370: the conductances that carry the
// yearly swing of the inside and of the outside temperature.
import { basementToOutsideWPerK, type UnheatedBasement } from './ground-basement.ts';

/** Length of the year in the standard's penetration depth [s]. */
export const yearS = 3.15e7;

/**
 * Depth at which the yearly wave has fallen to 1/e, δ = √(3.15·10⁷ · λ / (π·ρc)).
 *
 * @param soilJPerM3K volumetric heat capacity; 2·10⁶ sand and gravel, 3·10⁶ clay [J/(m³·K)]
 *
 * Source: ISO 13370:2017, Annex C (ISO 13370:2007, Annex A).
 */
export function yearlyPenetrationM(soilWPerMK: number, soilJPerM3K: number): number {
  return Math.sqrt((yearS * soilWPerMK) / (Math.PI * soilJPerM3K));
}

/**
 * Inside periodic conductance of a floor or wall against soil.
 *
 *   H_pi = A · (λ/d) · √(2 / ((1 + δ/d)² + 1))
 *
 * A basement is the sum of its floor (d) and its walls (z·P as area, d_w).
 *
 * Source: ISO 13370:2017, Annex C.
 */
export function insidePeriodicWPerK(
  areaM2: number,
  soilWPerMK: number,
  equivalentM: number,
  penetrationM: number,
): number {
  const ratio = 1 + penetrationM / equivalentM;
  return ((areaM2 * soilWPerMK) / equivalentM) * Math.sqrt(2 / (ratio * ratio + 1));
}

/**
 * Outside periodic conductance of a slab, H_pe = 0.37 · P · λ · ln(δ/d + 1).
 *
 * Source: ISO 13370:2017, Annex C.
 */
export function slabOutsidePeriodicWPerK(
  perimeterM: number,
  soilWPerMK: number,
  equivalentM: number,
  penetrationM: number,
): number {
  return 0.37 * perimeterM * soilWPerMK * Math.log(penetrationM / equivalentM + 1);
}

/**
 * Outside periodic conductance of a slab with edge insulation.
 *
 *   H_pe = 0.37·P·λ · ((1 − e^(−D/δ))·ln(δ/(d + d') + 1) + e^(−D/δ)·ln(δ/d + 1))
 *
 * @param reachM width D of a horizontal strip; for a vertical one twice its depth [m]
 * @param extraSoilM d' of the edge insulation [m]
 *
 * Source: ISO 13370:2017, Annex C.
 */
export function edgedSlabOutsidePeriodicWPerK(
  perimeterM: number,
  soilWPerMK: number,
  equivalentM: number,
  penetrationM: number,
  reachM: number,
  extraSoilM: number,
): number {
  const beyond = Math.exp(-reachM / penetrationM);
  const insulated = Math.log(penetrationM / (equivalentM + extraSoilM) + 1);
  const bare = Math.log(penetrationM / equivalentM + 1);
  return 0.37 * perimeterM * soilWPerMK * ((1 - beyond) * insulated + beyond * bare);
}

/**
 * Outside periodic conductance of a heated basement.
 *
 *   H_pe = 0.37·P·λ · (2·(1 − e^(−z/δ))·ln(δ/d_w + 1) + e^(−z/δ)·ln(δ/d + 1))
 *
 * Source: ISO 13370:2017, Annex C.
 */
export function basementOutsidePeriodicWPerK(
  perimeterM: number,
  depthM: number,
  soilWPerMK: number,
  floorEquivalentM: number,
  wallEquivalentM: number,
  penetrationM: number,
): number {
  const below = Math.exp(-depthM / penetrationM);
  const wall = 2 * (1 - below) * Math.log(penetrationM / wallEquivalentM + 1);
  const floor = below * Math.log(penetrationM / floorEquivalentM + 1);
  return 0.37 * perimeterM * soilWPerMK * (wall + floor);
}

/** The two periodic conductances of a floor over a void. */
export interface PeriodicPair {
  readonly insideWPerK: number;
  readonly outsideWPerK: number;
}

/**
 * Periodic conductances of a suspended floor.
 *
 *   H_pi = A / (1/U_f + 1/(λ/δ + U_x))
 *   H_pe = U_f · (0.37·P·λ·ln(δ/d_g + 1) + U_x·A) / (λ/δ + U_x + U_f)
 *
 * Source: ISO 13370:2017, Annex C.
 */
export function suspendedPeriodic(
  areaM2: number,
  perimeterM: number,
  soilWPerMK: number,
  baseEquivalentM: number,
  deckWPerM2K: number,
  voidToOutsideWPerM2K: number,
  penetrationM: number,
): PeriodicPair {
  const soil = soilWPerMK / penetrationM + voidToOutsideWPerM2K; // W/(m²·K)
  const edge = slabOutsidePeriodicWPerK(perimeterM, soilWPerMK, baseEquivalentM, penetrationM);
  return {
    insideWPerK: areaM2 / (1 / deckWPerM2K + 1 / soil),
    outsideWPerK: (deckWPerM2K * (edge + voidToOutsideWPerM2K * areaM2)) / (soil + deckWPerM2K),
  };
}

/**
 * Periodic conductances of a room over an unheated basement.
 *
 *   H_pi = 1 / (1/(A·U_f) + 1/((A + z·P)·λ/δ + h·P·U_w + 0.33·n·V))
 *   H_pe = A·U_f · (0.37·P·λ·(2 − e^(−z/δ))·ln(δ/d + 1) + h·P·U_w + 0.33·n·V)
 *          / ((A + z·P)·λ/δ + h·P·U_w + 0.33·n·V + A·U_f)
 *
 * Source: ISO 13370:2017, Annex C.
 */
export function unheatedBasementPeriodic(
  basement: UnheatedBasement,
  soilWPerMK: number,
  floorEquivalentM: number,
  penetrationM: number,
): PeriodicPair {
  const { areaM2, perimeterM, depthM, deckWPerM2K } = basement;
  const outside = basementToOutsideWPerK(basement);
  const soil = ((areaM2 + depthM * perimeterM) * soilWPerMK) / penetrationM + outside; // W/K
  const deck = areaM2 * deckWPerM2K;
  const share = 2 - Math.exp(-depthM / penetrationM);
  const edge = slabOutsidePeriodicWPerK(perimeterM, soilWPerMK, floorEquivalentM, penetrationM);
  return {
    insideWPerK: 1 / (1 / deck + 1 / soil),
    outsideWPerK: (deck * (share * edge + outside)) / (soil + deck),
  };
}
