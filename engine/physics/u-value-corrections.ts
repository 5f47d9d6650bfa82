// Corrections that ISO 6946 adds to a U-value: gaps in the insulation, fasteners through it, and rain
// that runs under the insulation of an inverted roof. Below 3 % of U in sum they may be left out.

/** Workmanship: 0 no gaps, 1 gaps that bridge the insulation, 2 gaps with air moving behind it. */
export type AirVoidLevel = 0 | 1 | 2;

const airVoidWPerM2K: readonly [number, number, number] = [0, 0.01, 0.04];

/**
 * Correction for air voids in or behind the insulation.
 *
 *   ΔU_g = ΔU'' · (R_1 / R_T)²,  ΔU'' = 0, 0.01, 0.04
 *
 * Source: ISO 6946:2017, Annex F, Table F.1 (levels from memory).
 */
export function airVoidCorrectionWPerM2K(
  level: AirVoidLevel,
  insulationM2KPerW: number,
  totalM2KPerW: number,
): number {
  return airVoidWPerM2K[level] * (insulationM2KPerW / totalM2KPerW) ** 2;
}

/** Fasteners such as wall ties and roof screws, of one kind. */
export interface Fasteners {
  readonly conductivityWPerMK: number;
  readonly sectionAreaM2: number;
  /** How many per square metre [1/m²]. */
  readonly perM2: number;
  /** Thickness of the insulation layer [m]. */
  readonly insulationM: number;
  /** How deep the fastener goes into it; the whole thickness where it is not recessed [m]. */
  readonly penetrationM: number;
}

/**
 * Correction for mechanical fasteners through the insulation.
 *
 *   ΔU_f = 0.8 · (d_1/d_0) · λ_f · A_f · n_f / d_0 · (R_1 / R_T)²
 *
 * Not for ties across an empty cavity, nor where both ends touch metal sheets.
 *
 * Source: ISO 6946:2017, Annex F, F.3.2 (factor 0.8 from memory).
 */
export function fastenerCorrectionWPerM2K(
  fasteners: Fasteners,
  insulationM2KPerW: number,
  totalM2KPerW: number,
): number {
  const { conductivityWPerMK, sectionAreaM2, perM2, insulationM, penetrationM } = fasteners;
  const alpha = 0.8 * (penetrationM / insulationM);
  const metal = (alpha * conductivityWPerMK * sectionAreaM2 * perM2) / insulationM;
  return metal * (insulationM2KPerW / totalM2KPerW) ** 2;
}

/**
 * Correction for rain between the insulation and the membrane of an inverted roof.
 *
 *   ΔU_r = p · f·x · (R_1 / R_T)²
 *
 * @param rainMmPerDay mean rain of the heating season [mm/d]
 * @param drainFactor f·x; 0.04 for butt joints and an open cover [W·d/(m²·K·mm)]
 *
 * Source: ISO 6946:2017, Annex F, F.4 (from memory).
 */
export function invertedRoofCorrectionWPerM2K(
  rainMmPerDay: number,
  drainFactor: number,
  insulationM2KPerW: number,
  totalM2KPerW: number,
): number {
  return rainMmPerDay * drainFactor * (insulationM2KPerW / totalM2KPerW) ** 2;
}
