// Convection between an outside face and the outdoor air: a wind term, a natural term, and how the
// two join. Long-wave radiation is not in these values.

/** Roughness of an outside face, and with it the factor on the wind's surplus over still air. */
export type Roughness =
  | 'very rough'
  | 'rough'
  | 'medium rough'
  | 'medium smooth'
  | 'smooth'
  | 'very smooth';

/**
 * Factor by roughness class, with an example: stucco; brick; concrete; clear pine; smooth plaster;
 * glass or paint on pine.
 *
 * Source: G. N. Walton, NBSIR 83-2655, 1983, after the ASHRAE Handbook's curves of 1981 (from memory).
 */
export const roughnessFactor: Readonly<Record<Roughness, number>> = {
  'very rough': 2.17,
  rough: 1.67,
  'medium rough': 1.52,
  'medium smooth': 1.13,
  smooth: 1.11,
  'very smooth': 1,
};

const leewardCosine = Math.cos((100 * Math.PI) / 180) - 1e-9; // 100° itself is windward

/**
 * Whether the wind blows at a face: angle between the wind and the face's normal up to 100°.
 *
 *   cos θ = sin β·cos(wind − azimuth)
 *
 * So a roof up to 10° steep is windward in every wind, and a wall within 100° of its azimuth.
 *
 * @param windFromDeg direction the wind comes from, clockwise from north [°]
 * @param faceAzimuthDeg direction the face looks, clockwise from north [°]
 * @param faceTiltDeg 0 flat roof, 90 wall [°]
 *
 * Source: G. N. Walton, NBSIR 83-2655, 1983.
 */
export function isWindward(
  windFromDeg: number,
  faceAzimuthDeg: number,
  faceTiltDeg: number,
): boolean {
  const turned = ((windFromDeg - faceAzimuthDeg) * Math.PI) / 180;
  return Math.sin((faceTiltDeg * Math.PI) / 180) * Math.cos(turned) >= leewardCosine;
}

/**
 * Wind term on a smooth face of a low building.
 *
 *   windward  h = 3.26·V^0.89          leeward  h = 3.55·V^0.617
 *
 * @param windMPerS free wind at the height of the face, 0 to about 12 [m/s]
 * @returns forced coefficient of a very smooth face [W/(m²·K)]
 *
 * Source: M. Yazdanian, J. H. Klems, "Measurement of the exterior convective film coefficient for
 * windows in low-rise buildings", ASHRAE Transactions 100 (1994), pp. 1087–1096.
 */
export function forcedFilmWPerM2K(windMPerS: number, windward: boolean): number {
  return windward ? 3.26 * windMPerS ** 0.89 : 3.55 * windMPerS ** 0.617;
}

/**
 * Joins natural and wind term, with the roughness on what the wind adds.
 *
 *   h = hn + R·(√(hn² + hf²) − hn)
 *
 * @param naturalWPerM2K natural term hn [W/(m²·K)]
 * @param forcedWPerM2K wind term hf of a smooth face [W/(m²·K)]
 * @param roughness factor R, 1 for glass
 *
 * Source: Yazdanian & Klems 1994 for the root of squares; roughness on the surplus after Walton 1983.
 */
export function joinedFilmWPerM2K(
  naturalWPerM2K: number,
  forcedWPerM2K: number,
  roughness: number,
): number {
  const smooth = Math.hypot(naturalWPerM2K, forcedWPerM2K);
  return naturalWPerM2K + roughness * (smooth - naturalWPerM2K);
}

/**
 * Fixed law of the building standards, h = 4 + 4·V.
 *
 * @param windMPerS wind near the face [m/s]
 *
 * Source: ISO 6946:2017, Annex C, equation (C.7).
 */
export function standardOutsideFilmWPerM2K(windMPerS: number): number {
  return 4 + 4 * windMPerS;
}

/**
 * Flow along a rough plate.
 *
 *   V < 4.88 m/s  h = 5.678·(1.09 + 0.23·V/0.3048)     else  h = 5.678·0.53·(V/0.3048)^0.78
 *
 * Jumps by 3 % where the branches meet, as published.
 *
 * @param windMPerS wind near the face [m/s]
 *
 * Source: W. H. McAdams, Heat Transmission, 3rd ed., 1954 (rough plate; constants from memory).
 */
export function roughPlateFilmWPerM2K(windMPerS: number): number {
  const feet = windMPerS / 0.3048;
  return 5.678 * (windMPerS < 4.88 ? 1.09 + 0.23 * feet : 0.53 * feet ** 0.78);
}
