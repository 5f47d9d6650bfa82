// Design heat load of a room in the form of EN 12831: transmission, ventilation, a supplement for
// reheating. A sizing aid: climate data, minimum air flows and supplements come from the national
// annex, and a licensed practitioner answers for the result.

/** Heat that a cubic metre of air carries per kelvin, as EN 12831 rounds it [Wh/(m³·K)]. */
const airWhPerM3K = 0.34;

/** An element on the way out of the room. */
export interface LossElement {
  readonly areaM2: number;
  readonly uValueWPerM2K: number;
  /** Flat supplement for thermal bridges. */
  readonly bridgesWPerM2K: number;
  /** 1 to outside air; else (θ_i − θ_other)/(θ_i − θ_e) for an unheated or differently heated room. */
  readonly temperatureFactor: number;
}

/** Σ A · (U + ΔU) · f. Source: EN 12831-1:2017, clause 6.3.2. */
export function designTransmissionWPerK(elements: readonly LossElement[]): number {
  return elements.reduce(
    (sum, e) => sum + e.areaM2 * (e.uValueWPerM2K + e.bridgesWPerM2K) * e.temperatureFactor,
    0,
  );
}

/** Yearly swing of the ground loss in EN 12831 (from memory). */
export const groundSwingFactor = 1.45;

/**
 * Design transmission to the ground, f_1 · f_2 · A · U_equiv · G_w with f_2 = (θ_i − θ_me)/(θ_i − θ_e).
 *
 * @param yearMeanC mean outside temperature of the year [°C]
 * @param waterFactor 1; 1.15 where ground water stands less than 1 m below the floor
 *
 * Source: EN 12831:2003, clause 7.1.3; EN 12831-1:2017, 6.3.2.5.
 */
export function designGroundWPerK(
  areaM2: number,
  equivalentWPerM2K: number,
  insideC: number,
  designC: number,
  yearMeanC: number,
  waterFactor: number,
  swingFactor = groundSwingFactor,
): number {
  const f2 = (insideC - yearMeanC) / (insideC - designC);
  return swingFactor * f2 * areaM2 * equivalentWPerM2K * waterFactor;
}

/**
 * Infiltration of a room on the design day, 2 · V · n_50 · e · ε.
 *
 * @param shieldFactor e; 0.02 to 0.05 by shelter and number of exposed faces
 * @param heightFactor ε; 1.0 up to 10 m above ground, 1.2 to 30 m, 1.5 above
 * @returns [m³/h]
 *
 * Source: EN 12831:2003, clause 7.2.2 (factor 2 from memory).
 */
export function designInfiltrationM3PerH(
  volumeM3: number,
  n50PerH: number,
  shieldFactor: number,
  heightFactor: number,
): number {
  return 2 * volumeM3 * n50PerH * shieldFactor * heightFactor;
}

/**
 * Design conductance of natural ventilation, 0.34 · max(infiltration, minimum flow).
 *
 * Source: EN 12831:2003, clause 7.2.
 */
export function designVentilationWPerK(infiltrationM3PerH: number, minimumM3PerH: number): number {
  return airWhPerM3K * Math.max(infiltrationM3PerH, minimumM3PerH);
}

export interface DesignLoad {
  readonly transmissionW: number;
  readonly ventilationW: number;
  readonly reheatW: number;
  readonly totalW: number;
}

/**
 * Design heat load of a room.
 *
 * @param transmissionWPerK to outside, unheated rooms and ground together [W/K]
 * @param reheatWPerM2 supplement f_RH for warming up after a set-back, 0 without one [W/m²]
 *
 * Source: EN 12831:2003, clause 7; EN 12831-1:2017, clause 6.3.
 */
export function designHeatLoad(
  transmissionWPerK: number,
  ventilationWPerK: number,
  insideC: number,
  designC: number,
  floorAreaM2: number,
  reheatWPerM2: number,
): DesignLoad {
  const difference = insideC - designC;
  const transmissionW = transmissionWPerK * difference;
  const ventilationW = ventilationWPerK * difference;
  const reheatW = floorAreaM2 * reheatWPerM2;
  return { transmissionW, ventilationW, reheatW, totalW: transmissionW + ventilationW + reheatW };
}
