// Heat through the gas between two panes by EN 673: convection by Nusselt number, radiation between
// grey faces. The same functions serve the standard U-value and, with real temperatures, the hourly run.
import { parallelEmittance } from './air-layer.ts';
import { standardSigmaWPerM2K4 } from './conventional-film.ts';
import { gravityMPerS2 } from './dry-air.ts';
import type { GasProperties } from './fill-gas.ts';

/**
 * Nusselt number of a glazing gap with upward heat flow, 1 or more.
 *
 *   Nu = A · (Gr · Pr)^n;  A, n = 0.035, 0.38 upright; 0.10, 0.31 at 45°; 0.16, 0.28 lying flat
 *
 * Tilts in between are interpolated straight. Heat going down through a tilted gap does not convect:
 * use 1.
 *
 * @param rayleigh Gr·Pr of the gap
 * @param tiltDeg slope of the pane, 0 flat to 90 upright [°]
 *
 * Source: EN 673:2011, clause 5.3.2.
 */
export function gapNusselt(rayleigh: number, tiltDeg: number): number {
  const upright = Math.max(1, 0.035 * rayleigh ** 0.38);
  if (tiltDeg >= 90) return upright;
  const sloping = Math.max(1, 0.1 * rayleigh ** 0.31);
  if (tiltDeg >= 45) return sloping + ((tiltDeg - 45) / 45) * (upright - sloping);
  const flat = Math.max(1, 0.16 * rayleigh ** 0.28);
  return flat + (tiltDeg / 45) * (sloping - flat);
}

/**
 * Rayleigh number of a gap, Gr · Pr.
 *
 *   Gr = g · s³ · ΔT · ρ² / (T_m · μ²),  Pr = μ · c / λ
 *
 * @param meanK absolute mean temperature of the gas [K]
 *
 * Source: EN 673:2011, clause 5.3.2.
 */
export function gapRayleigh(
  gas: GasProperties,
  thicknessM: number,
  differenceK: number,
  meanK: number,
): number {
  const { densityKgPerM3: rho, viscosityPaS: mu } = gas;
  const grashof =
    (gravityMPerS2 * thicknessM ** 3 * Math.abs(differenceK) * rho * rho) / (meanK * mu * mu);
  return (grashof * mu * gas.specificHeatJPerKgK) / gas.conductivityWPerMK;
}

/**
 * Radiative conductance between two panes.
 *
 *   h_r = 4 · σ · T_m³ / (1/ε1 + 1/ε2 − 1)
 *
 * @param meanK absolute mean temperature; 283 K in the standard's own U-value [K]
 *
 * Source: EN 673:2011, clause 5.2.
 */
export function gapRadiativeWPerM2K(
  emissivity1: number,
  emissivity2: number,
  meanK: number,
): number {
  return 4 * standardSigmaWPerM2K4 * meanK ** 3 * parallelEmittance(emissivity1, emissivity2);
}

/**
 * Convective conductance of a gap, Nu · λ / s.
 *
 * Source: EN 673:2011, clause 5.3.
 */
export function gapConvectiveWPerM2K(
  gas: GasProperties,
  thicknessM: number,
  differenceK: number,
  meanK: number,
  tiltDeg: number,
): number {
  const rayleigh = gapRayleigh(gas, thicknessM, differenceK, meanK);
  return (gapNusselt(rayleigh, tiltDeg) * gas.conductivityWPerMK) / thicknessM;
}
