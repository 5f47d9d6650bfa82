// Surface resistances by ISO 6946: the conventional table values and the formulas behind them.
// They serve U-values and heat loads; the hourly run uses its own convection and long-wave terms.

/** Stefan–Boltzmann constant as ISO 6946 and EN 673 round it [W/(m²·K⁴)]. */
export const standardSigmaWPerM2K4 = 5.67e-8;

/** Which way heat goes through an element: `horizontal` up to 30° from the level. */
export type HeatFlow = 'up' | 'horizontal' | 'down';

/** Conventional outside resistance. Source: ISO 6946:2017, Table 7 (from memory) [m²·K/W]. */
export const conventionalOutsideFilmM2KPerW = 0.04;

const insideTable: Readonly<Record<HeatFlow, number>> = { up: 0.1, horizontal: 0.13, down: 0.17 };

/**
 * Conventional inside surface resistance, still air and ordinary surfaces.
 * Also the outside resistance of a face behind a well ventilated air layer.
 *
 * Source: ISO 6946:2017, Table 7 (from memory).
 */
export function conventionalInsideFilmM2KPerW(flow: HeatFlow): number {
  return insideTable[flow];
}

/**
 * Direction of heat flow that ISO 6946 assigns to a losing element of the given tilt.
 *
 * @param tiltDeg slope of the outer face: 0 a flat roof, 90 a wall, 180 a floor over open air [°]
 * @returns `horizontal` within 30° of upright, else `up` for roofs and `down` for floors
 *
 * Source: ISO 6946:2017, clause 6.8 ("horizontal" holds ± 30° from the horizontal plane).
 */
export function losingHeatFlow(tiltDeg: number): HeatFlow {
  if (tiltDeg < 60) return 'up';
  return tiltDeg <= 120 ? 'horizontal' : 'down';
}

/**
 * Radiative coefficient between black surfaces, linearised at their mean temperature.
 *
 *   h_r0 = 4 · σ · T_m³
 *
 * @param meanC mean of the surface and of its surroundings [°C]
 *
 * Source: ISO 6946:2017, Annex C.
 */
export function blackRadiativeWPerM2K(meanC: number): number {
  return 4 * standardSigmaWPerM2K4 * (meanC + 273.15) ** 3;
}

const insideConvectionWPerM2K: Readonly<Record<HeatFlow, number>> = {
  up: 5,
  horizontal: 2.5,
  down: 0.7,
};

/**
 * Inside surface resistance from the surface's emissivity and temperature.
 *
 *   R_si = 1 / (h_c + ε · h_r0),  h_c = 5.0 up, 2.5 horizontal, 0.7 down
 *
 * Source: ISO 6946:2017, Annex C (coefficients from memory).
 */
export function insideFilmM2KPerW(flow: HeatFlow, emissivity: number, meanC: number): number {
  return 1 / (insideConvectionWPerM2K[flow] + emissivity * blackRadiativeWPerM2K(meanC));
}

/**
 * Outside surface resistance from the wind.
 *
 *   R_se = 1 / (4 + 4·v + ε · h_r0)
 *
 * @param windMPerS wind beside the surface, 0 or more [m/s]
 * @param emissivity long-wave emissivity of the surface, 0 to 1
 * @param meanC mean of the surface and of its surroundings [°C]
 *
 * Source: ISO 6946:2017, Annex C.
 */
export function outsideFilmM2KPerW(windMPerS: number, emissivity: number, meanC: number): number {
  return 1 / (4 + 4 * windMPerS + emissivity * blackRadiativeWPerM2K(meanC));
}
