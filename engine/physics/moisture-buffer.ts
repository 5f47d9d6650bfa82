// Hygroscopic linings and furniture as a store beside the room's air: its size as an air volume, so
// that `TwoStores` with the room's own volume gives the damped swing of the humidity.
import { hygricSaturationPa } from './surface-humidity.ts';

const vapourGasJPerKgK = 461.5;

/** Vapour concentration of saturated air, p_sat / (R_v·T). Source: ideal gas. */
export function saturatedVapourKgPerM3(tempC: number): number {
  return hygricSaturationPa(tempC) / (vapourGasJPerKgK * (tempC + 273.15));
}

/**
 * Air volume that takes up as much vapour as a buffering surface, for the same swing of concentration.
 *
 *   B = A · MBV / (0.01 · v_sat)
 *
 * @param bufferKgPerM2Percent practical moisture buffer value, 0.0002 poor to 0.002 very good
 *   [kg/(m²·%RH)]
 * @returns equivalent volume [m³]
 *
 * Source: C. Rode et al., "Moisture buffering of building materials", BYG·DTU R-126, 2005.
 */
export function bufferVolumeM3(
  areaM2: number,
  bufferKgPerM2Percent: number,
  tempC: number,
): number {
  return (areaM2 * bufferKgPerM2Percent) / (0.01 * saturatedVapourKgPerM3(tempC));
}
