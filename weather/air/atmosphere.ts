// Pressure, temperature and density with height, and wind over the ground.

/** Pressure of the standard atmosphere (ASHRAE Handbook of Fundamentals, Psychrometrics, equation 3) [Pa]. */
export function standardPressurePa(elevationM: number): number {
  return 101325 * (1 - 2.25577e-5 * elevationM) ** 5.2559;
}

/** Temperature of the standard atmosphere (same chapter, equation 4) [°C]. */
export function standardTemperatureC(elevationM: number): number {
  return 15 - 0.0065 * elevationM;
}

/** Density of dry air as a perfect gas with R = 287.055 J/(kg·K) [kg/m³]. */
export function dryAirDensityKgPerM3(dryBulbC: number, pressurePa: number): number {
  return pressurePa / (287.055 * (dryBulbC + 273.15));
}
