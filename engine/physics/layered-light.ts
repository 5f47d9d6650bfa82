// Looking up the tables of a layered glazing at an angle, for the hourly drivers.
import type { LayeredAngles } from './shaded-glazing.ts';

/** Angle of incidence [°] from its cosine; 90 where the sun is behind. */
export function incidenceDeg(cosine: number): number {
  return cosine <= 0 ? 90 : (Math.acos(Math.min(1, cosine)) * 180) / Math.PI;
}

/** Value at a fractional degree of a table with `width` columns, straight between degrees. */
function between(table: Float64Array, degrees: number, width: number, column: number): number {
  const k = Math.min(89, Math.floor(degrees));
  const low = table[k * width + column];
  return low + (degrees - k) * (table[(k + 1) * width + column] - low);
}

/** Share of a beam that passes as a beam. */
export const passedAt = (light: LayeredAngles, degrees: number): number =>
  between(light.transmittance, degrees, 1, 0);

/** Share of a beam that passes scattered. */
export const scatteredAt = (light: LayeredAngles, degrees: number): number =>
  light.scattered ? between(light.scattered, degrees, 1, 0) : 0;

/** Share of a beam that one layer absorbs, outermost 0. */
export const absorbedAt = (light: LayeredAngles, layer: number, degrees: number): number =>
  between(light.absorptance, degrees, light.layerCount, layer);
