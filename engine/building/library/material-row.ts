import type { LibraryMaterial } from './types.ts';

/** Table 3 of the standard lists design values of materials that are not insulation or masonry. */
export const table3 = 'ISO 10456:2007 Table 3';
/** Table 4 gives density, specific heat and vapour resistance only; the conductivity is the trade's. */
export const table4 = 'ISO 10456:2007 Table 4 but conductivity: common practice, no source';
export const practice = 'common practice, no source';
export const memory = 'from memory';

/** One line of a material table: id, name, λ [W/(m·K)], ρ [kg/m³], c [J/(kg·K)], dry μ, source. */
export type MaterialRow = readonly [string, string, number, number, number, number, string];

/** A table of rows as material entries. */
export function materialsOf(rows: readonly MaterialRow[]): readonly LibraryMaterial[] {
  return rows.map(([id, name, conductivity, density, specificHeat, mu, source]) => ({
    id,
    name,
    conductivityWPerMK: conductivity,
    densityKgPerM3: density,
    specificHeatJPerKgK: specificHeat,
    vapourResistanceFactor: mu,
    source,
  }));
}
