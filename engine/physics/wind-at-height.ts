// Wind at the height of a face, from the wind that a weather station measures.

/** Power law of the mean wind over a kind of terrain. */
export interface Terrain {
  readonly exponent: number;
  /** Height above which the ground no longer slows the wind. */
  readonly layerM: number;
}

export type TerrainName = 'water' | 'open' | 'suburban' | 'city';

/** Source: ASHRAE Handbook of Fundamentals, chapter on airflow around buildings, table 1. */
export const terrains: Readonly<Record<TerrainName, Terrain>> = {
  water: { exponent: 0.1, layerM: 210 },
  open: { exponent: 0.14, layerM: 270 },
  suburban: { exponent: 0.22, layerM: 370 },
  city: { exponent: 0.33, layerM: 460 },
};

/**
 * Mean wind at a height over a terrain.
 *
 *   V = V_met · (δ_met/z_met)^a_met · (z/δ)^a
 *
 * @param stationMPerS wind at the station [m/s]
 * @param heightM height above ground, above 0 [m]
 * @param terrain around the building
 * @param station terrain around the station's mast; open, and its height 10 m, by custom
 *
 * Source: ASHRAE Handbook of Fundamentals, chapter on airflow around buildings, equation (4).
 */
export function windAtHeightMPerS(
  stationMPerS: number,
  heightM: number,
  terrain: Terrain = terrains.open,
  station: Terrain = terrains.open,
  stationHeightM = 10,
): number {
  const free = stationMPerS * (station.layerM / stationHeightM) ** station.exponent;
  return free * (heightM / terrain.layerM) ** terrain.exponent;
}
