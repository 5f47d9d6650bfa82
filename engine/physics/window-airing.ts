// Air exchange through openings of one facade: EN 16798-7's airing form and the orifice integral.
import { gravityMPerS2 } from './dry-air.ts';

/** Coefficients of EN 16798-7 for single-sided airing (from memory). */
const windFactor = 0.001; // 1/(m/s)
const stackFactor = 0.0035; // (m/s)/(m·K)

/**
 * Air flow through the open windows of one facade.
 *
 *   q = A/2 · √(max(0.001·v², 0.0035·h·|ΔT|))
 *
 * The larger of wind and buoyancy counts. The standard's density ratio is left out (within 10 % from
 * −5 to 30 °C).
 *
 * @param areaM2 free area of the openings [m²]
 * @param heightM height of the opening, or from the lowest edge to the highest [m]
 * @param windMPerS reference wind at 10 m [m/s]
 *
 * Source: EN 16798-7:2017, clause 6.4.3.5.4 (coefficients from memory).
 */
export function singleSidedM3PerS(
  areaM2: number,
  heightM: number,
  insideC: number,
  outsideC: number,
  windMPerS: number,
): number {
  const wind = windFactor * windMPerS * windMPerS;
  const stack = stackFactor * heightM * Math.abs(insideC - outsideC);
  return (areaM2 / 2) * Math.sqrt(Math.max(wind, stack));
}

/**
 * Flow in each direction through one tall opening or doorway between two air temperatures.
 *
 *   q = C_d · (A/3) · √(g · h · |ΔT| / T_m)
 *
 * Warm air leaves above, as much cold air enters below. Also the exchange of two rooms through an
 * open door.
 *
 * @param discharge C_d; 0.6 sharp edges, down to 0.4 for doors between rooms
 * @returns one of the two equal flows [m³/s]
 *
 * Source: closed form, Bernoulli along the height of the opening (Brown & Solvason 1962).
 */
export function tallOpeningM3PerS(
  areaM2: number,
  heightM: number,
  oneC: number,
  otherC: number,
  discharge: number,
): number {
  const meanK = (oneC + otherC) / 2 + 273.15;
  const drive = (gravityMPerS2 * heightM * Math.abs(oneC - otherC)) / meanK;
  return ((discharge * areaM2) / 3) * Math.sqrt(drive);
}

/**
 * Coefficient of the heat exchanged through an open doorway, q = K · |ΔT|^1.5.
 *
 *   K = ρ·c · C_d · (A/3) · √(g·h / T_m)
 *
 * The conductance K · |ΔT|^½ is a power law without a pole at equal rooms, as a solver wants it.
 *
 * @param meanC mean of both rooms; its choice hardly matters [°C]
 * @param heatJPerM3K ρ·c of the air
 * @returns K [W/K^1.5]
 *
 * Source: `tallOpeningM3PerS` times ρ·c·ΔT.
 */
export function doorwayExchangeWPerK15(
  areaM2: number,
  heightM: number,
  meanC: number,
  discharge: number,
  heatJPerM3K: number,
): number {
  const speed = Math.sqrt((gravityMPerS2 * heightM) / (meanC + 273.15));
  return ((heatJPerM3K * discharge * areaM2) / 3) * speed;
}

/**
 * Share of a window's area that a bottom-hung sash opens, by its angle.
 *
 *   C_k = 2.60·10⁻⁷·α³ − 1.19·10⁻⁴·α² + 1.86·10⁻²·α
 *
 * @param angleDeg opening angle, 0 shut to 90 [°]
 *
 * Source: EN 16798-7:2017, Annex B (coefficients from memory).
 */
export function sashOpeningShare(angleDeg: number): number {
  return ((2.6e-7 * angleDeg - 1.19e-4) * angleDeg + 1.86e-2) * angleDeg;
}
