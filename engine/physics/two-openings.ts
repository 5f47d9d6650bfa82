// Air through two openings of one room: by buoyancy at two heights, by wind on two sides, and both.
import { dryAirKgPerM3, gravityMPerS2 } from './dry-air.ts';

/** Area of one opening that passes as much as two in a row, 1/A² = 1/A_1² + 1/A_2². */
export function seriesAreaM2(firstM2: number, secondM2: number): number {
  return 1 / Math.sqrt(1 / (firstM2 * firstM2) + 1 / (secondM2 * secondM2));
}

/**
 * Stack pressure between two heights, |ρ_e − ρ_i| · g · H.
 *
 * @param distanceM between the middles of both openings [m]
 */
export function stackPressurePa(distanceM: number, insideC: number, outsideC: number): number {
  const difference = dryAirKgPerM3(outsideC) - dryAirKgPerM3(insideC);
  return Math.abs(difference) * gravityMPerS2 * distanceM;
}

export interface StackFlow {
  readonly massKgPerS: number;
  /** Where inside and outside pressure are equal, above the lower opening [m]. */
  readonly neutralHeightM: number;
  /** True where a room colder than outside takes air in above and lets it out below. */
  readonly downward: boolean;
}

/**
 * Flow by buoyancy through a low and a high opening, mass balanced.
 *
 *   ṁ = C_d·A·√(2·ρ·Δp) in both, Δp by the height over the neutral level, ρ of the air that passes
 *
 * Source: closed form; orifice equation and mass balance.
 */
export function stackFlow(
  lowM2: number,
  highM2: number,
  distanceM: number,
  insideC: number,
  outsideC: number,
  discharge: number,
): StackFlow {
  const inside = dryAirKgPerM3(insideC);
  const outside = dryAirKgPerM3(outsideC);
  const downward = insideC < outsideC;
  const lowDensity = downward ? inside : outside; // of the air that passes the lower opening
  const highDensity = downward ? outside : inside;
  const low = lowM2 * lowM2 * lowDensity;
  const high = highM2 * highM2 * highDensity;
  const neutralHeightM = (distanceM * high) / (low + high);
  const pressure = Math.abs(outside - inside) * gravityMPerS2 * neutralHeightM; // Pa at the lower one
  const massKgPerS = discharge * lowM2 * Math.sqrt(2 * lowDensity * pressure);
  return { massKgPerS, neutralHeightM, downward };
}

/**
 * Flow by wind through two openings with different pressure coefficients.
 *
 *   q = C_d · A_eff · v · √ΔC_p
 *
 * @param windMPerS wind at the height to which the coefficients refer [m/s]
 * @param pressureDifference ΔC_p, 0 or more
 */
export function crossWindM3PerS(
  firstM2: number,
  secondM2: number,
  windMPerS: number,
  pressureDifference: number,
  discharge: number,
): number {
  return discharge * seriesAreaM2(firstM2, secondM2) * windMPerS * Math.sqrt(pressureDifference);
}

/** Two flows through the same openings by different causes: pressures add, so flows by squares. */
export function joinedFlowM3PerS(firstM3PerS: number, secondM3PerS: number): number {
  return Math.hypot(firstM3PerS, secondM3PerS);
}
