// Dry air as the air-exchange formulas need it.

/** Gas constant of dry air [J/(kg·K)]. */
export const dryAirGasJPerKgK = 287.055;
/** Specific heat of dry air at constant pressure [J/(kg·K)]. */
export const dryAirHeatJPerKgK = 1006;
/** Standard pressure at sea level [Pa]. */
export const seaLevelPa = 101325;
export const gravityMPerS2 = 9.81;

/** Density of dry air, p / (R·T). Source: ideal gas. */
export function dryAirKgPerM3(tempC: number, pressurePa = seaLevelPa): number {
  return pressurePa / (dryAirGasJPerKgK * (tempC + 273.15));
}
