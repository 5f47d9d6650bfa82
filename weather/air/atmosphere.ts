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

/** How the ground slows the wind: exponent of the power law and depth of the slowed layer. */
export interface WindLayer {
  readonly exponent: number;
  readonly depthM: number;
}

/**
 * Layers by terrain. Source: ASHRAE Handbook of Fundamentals, chapter "Airflow around buildings",
 * table of atmospheric boundary layer parameters (values from memory).
 */
export const windLayers = {
  city: { exponent: 0.33, depthM: 460 },
  suburb: { exponent: 0.22, depthM: 370 },
  open: { exponent: 0.14, depthM: 270 },
  water: { exponent: 0.1, depthM: 210 },
} as const satisfies Record<string, WindLayer>;

/**
 * Wind at a height over other ground than the weather station's [m/s].
 *
 *   v = v_met · (δ_met / z_met)^a_met · (z / δ)^a
 *
 * Source: same chapter, equation 4.
 */
export function localWindMPerS(
  stationMPerS: number,
  heightM: number,
  layer: WindLayer,
  station: WindLayer & { readonly heightM: number } = { ...windLayers.open, heightM: 10 },
): number {
  return (
    stationMPerS *
    (station.depthM / station.heightM) ** station.exponent *
    (heightM / layer.depthM) ** layer.exponent
  );
}
