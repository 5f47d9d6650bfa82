// Steady heat loss through floors on the ground by ISO 13370: the slab, its edge insulation, and the
// suspended floor. Ground is counted through an equivalent thickness of soil.

/**
 * Characteristic dimension of a floor, B = A / (P/2).
 *
 * @param perimeterM exposed perimeter; edges against heated rooms do not count [m]
 *
 * Source: ISO 13370:2017, clause 6.3.
 */
export function characteristicDimensionM(areaM2: number, perimeterM: number): number {
  return areaM2 / (0.5 * perimeterM);
}

/**
 * Thickness of soil with the resistance of wall, construction and films together.
 *
 *   d = w + λ · (R_si + R + R_se)
 *
 * @param wallThicknessM full thickness of the walls above; 0 for a basement wall [m]
 * @param soilWPerMK conductivity of the ground; 2.0 where it is not known [W/(m·K)]
 *
 * Source: ISO 13370:2017, clause 6.5.
 */
export function equivalentSoilM(
  wallThicknessM: number,
  soilWPerMK: number,
  insideFilmM2KPerW: number,
  constructionM2KPerW: number,
  outsideFilmM2KPerW: number,
): number {
  return (
    wallThicknessM + soilWPerMK * (insideFilmM2KPerW + constructionM2KPerW + outsideFilmM2KPerW)
  );
}

/** 2λ/(πB + d) · ln(πB/d + 1): the floor that insulates less than the ground. */
export function moderateFloorWPerM2K(
  dimensionM: number,
  soilWPerMK: number,
  equivalentM: number,
): number {
  const width = Math.PI * dimensionM;
  return ((2 * soilWPerMK) / (width + equivalentM)) * Math.log(width / equivalentM + 1);
}

/**
 * Mean U-value of a slab on the ground, uninsulated or insulated all over.
 *
 *   d < B   U = 2λ/(πB + d) · ln(πB/d + 1)
 *   d ≥ B   U = λ / (0.457·B + d)
 *
 * Source: ISO 13370:2017, clause 7.1 (ISO 13370:2007, 9.1).
 */
export function slabUValueWPerM2K(
  dimensionM: number,
  soilWPerMK: number,
  equivalentM: number,
): number {
  if (equivalentM < dimensionM) return moderateFloorWPerM2K(dimensionM, soilWPerMK, equivalentM);
  return soilWPerMK / (0.457 * dimensionM + equivalentM);
}

/**
 * Extra equivalent thickness of an edge insulation, d' = λ · (R_n − d_n/λ).
 *
 * Source: ISO 13370:2017, Annex B.
 */
export function edgeInsulationSoilM(
  edgeM2KPerW: number,
  edgeThicknessM: number,
  soilWPerMK: number,
): number {
  return soilWPerMK * edgeM2KPerW - edgeThicknessM;
}

/**
 * Linear transmittance that edge insulation adds to a slab, 0 or negative.
 *
 *   ψ = −(λ/π) · (ln(D/d + 1) − ln(D/(d + d') + 1))
 *
 * @param reachM width D of a horizontal strip; for a vertical one twice its depth [m]
 * @returns to be added as P · ψ, or as 2ψ/B on the U-value [W/(m·K)]
 *
 * Source: ISO 13370:2017, Annex B.
 */
export function edgeInsulationPsiWPerMK(
  reachM: number,
  soilWPerMK: number,
  equivalentM: number,
  extraSoilM: number,
): number {
  const bare = Math.log(reachM / equivalentM + 1);
  const insulated = Math.log(reachM / (equivalentM + extraSoilM) + 1);
  return (-soilWPerMK / Math.PI) * (bare - insulated);
}

/** A floor over a void that outside air sweeps. */
export interface SuspendedFloor {
  /** Height of the floor above the outside ground [m]. */
  readonly floorHeightM: number;
  /** U-value of the walls of the void above ground. */
  readonly voidWallWPerM2K: number;
  /** Vent openings per metre of perimeter [m²/m]. */
  readonly ventAreaM2PerM: number;
  /** Mean wind at 10 m height. */
  readonly windMPerS: number;
  /** Shelter: 0.02 town centre, 0.05 suburb, 0.10 open country (from memory). */
  readonly shieldFactor: number;
}

/**
 * Conductance from the void to outside by its walls and its air, per square metre of floor.
 *
 *   U_x = 2·h·U_w/B + 1450 · ε · v · f_w / B
 *
 * Source: ISO 13370:2017, clause 7.2 (ISO 13370:2007, 9.2).
 */
export function voidToOutsideWPerM2K(floor: SuspendedFloor, dimensionM: number): number {
  const walls = (2 * floor.floorHeightM * floor.voidWallWPerM2K) / dimensionM;
  const air = (1450 * floor.ventAreaM2PerM * floor.windMPerS * floor.shieldFactor) / dimensionM;
  return walls + air;
}

/**
 * Mean U-value of a suspended floor, 1/U = 1/U_f + 1/(U_g + U_x).
 *
 * @param deckWPerM2K U_f of the deck between room and void, 0.17 m²·K/W on both faces [W/(m²·K)]
 * @param groundWPerM2K U_g through the void's base; `moderateFloorWPerM2K`, or where the base lies more
 *   than 0.5 m deep (A·U_bf + z·P·U_bw)/A of a basement [W/(m²·K)]
 * @param outsideWPerM2K U_x from `voidToOutsideWPerM2K` [W/(m²·K)]
 *
 * Source: ISO 13370:2017, clause 7.2.
 */
export function suspendedFloorUValueWPerM2K(
  deckWPerM2K: number,
  groundWPerM2K: number,
  outsideWPerM2K: number,
): number {
  return 1 / (1 / deckWPerM2K + 1 / (groundWPerM2K + outsideWPerM2K));
}
