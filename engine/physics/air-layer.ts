// Resistance of air layers inside an element by ISO 6946: unventilated, divided into small voids,
// slightly and well ventilated.
import { blackRadiativeWPerM2K, type HeatFlow } from './conventional-film.ts';

/**
 * Conduction and convection across an unventilated air layer.
 *
 *   up          max(0.025/d, 1.95)            above 5 K  1.14·ΔT^(1/3)
 *   horizontal  max(0.025/d, 1.25)            above 5 K  0.73·ΔT^(1/3)
 *   down        max(0.025/d, 0.12·d^−0.44)    above 5 K  0.09·ΔT^0.187·d^−0.44
 *
 * @param thicknessM thickness in the direction of the heat, to 0.3 m; deeper is a room of its own [m]
 * @param differenceK temperature difference over the layer; up to 5 K the short forms hold [K]
 *
 * Source: ISO 6946:2017, Annex D, Tables D.1 and D.2 (coefficients from memory).
 */
export function airLayerConvectionWPerM2K(
  flow: HeatFlow,
  thicknessM: number,
  differenceK = 0,
): number {
  const still = 0.025 / thicknessM;
  const large = differenceK > 5;
  if (flow === 'up') return Math.max(still, large ? 1.14 * Math.cbrt(differenceK) : 1.95);
  if (flow === 'horizontal') return Math.max(still, large ? 0.73 * Math.cbrt(differenceK) : 1.25);
  const factor = large ? 0.09 * differenceK ** 0.187 : 0.12;
  return Math.max(still, factor * thicknessM ** -0.44);
}

/** Exchange factor of two wide parallel grey faces, 1 / (1/ε1 + 1/ε2 − 1). */
export function parallelEmittance(emissivity1: number, emissivity2: number): number {
  return 1 / (1 / emissivity1 + 1 / emissivity2 - 1);
}

/** An air layer between two faces. */
export interface AirLayer {
  readonly flow: HeatFlow;
  readonly thicknessM: number;
  /** Long-wave emissivities of the two faces; 0.9 for ordinary building surfaces. */
  readonly emissivity1: number;
  readonly emissivity2: number;
  /** Mean temperature of the layer; 10 °C where nothing better is known [°C]. */
  readonly meanC: number;
  /** Temperature difference over the layer; left out: no more than 5 K [K]. */
  readonly differenceK?: number;
}

/**
 * Resistance of an unventilated air layer, wide against its thickness.
 *
 *   R = 1 / (h_a + E · h_r0)
 *
 * Source: ISO 6946:2017, Annex D, D.2.
 */
export function airLayerResistanceM2KPerW(layer: AirLayer): number {
  const { flow, thicknessM, emissivity1, emissivity2, meanC, differenceK } = layer;
  const radiation = parallelEmittance(emissivity1, emissivity2) * blackRadiativeWPerM2K(meanC);
  return 1 / (airLayerConvectionWPerM2K(flow, thicknessM, differenceK) + radiation);
}

/**
 * Resistance of a small void (width less than ten times its thickness), radiation to its sides counted.
 *
 *   R = 1 / (h_a + ½ · E · h_r0 · (1 + √(1 + d²/b²) − d/b))
 *
 * @param widthM width b of the void across the heat flow [m]
 *
 * Source: ISO 6946:2007, Annex B, B.3 (from memory); E is 1 / (1/ε1 + 1/ε2 − 1).
 */
export function airVoidResistanceM2KPerW(layer: AirLayer, widthM: number): number {
  const { flow, thicknessM, emissivity1, emissivity2, meanC, differenceK } = layer;
  const slender = thicknessM / widthM;
  const view = (1 + Math.sqrt(1 + slender * slender) - slender) / 2;
  const emittance = parallelEmittance(emissivity1, emissivity2);
  const radiation = view * emittance * blackRadiativeWPerM2K(meanC);
  return 1 / (airLayerConvectionWPerM2K(flow, thicknessM, differenceK) + radiation);
}

/** Below this vent area the layer counts as unventilated [m² per m length or per m² face]. */
export const unventilatedVentAreaM2 = 500e-6;
/** From this vent area on, the layer and all outside of it are left out [m² per m or per m²]. */
export const wellVentilatedVentAreaM2 = 1500e-6;

/**
 * Total resistance of an element with a ventilated air layer, between the two limits by vent area.
 *
 * @param ventAreaM2 openings to outside: per metre length in walls, per m² in floors and roofs [m²]
 * @param closedM2KPerW total resistance with the layer unventilated [m²·K/W]
 * @param openM2KPerW total resistance with the layer and everything outside it left out, and the
 *   inside value of the surface resistance on the face behind it [m²·K/W]
 *
 * Source: ISO 6946:2017, clause 6.9.3, R = ((1500 − A)·R_closed + (A − 500)·R_open) / 1000.
 */
export function ventilatedElementM2KPerW(
  ventAreaM2: number,
  closedM2KPerW: number,
  openM2KPerW: number,
): number {
  const span = wellVentilatedVentAreaM2 - unventilatedVentAreaM2;
  const open = Math.min(1, Math.max(0, (ventAreaM2 - unventilatedVentAreaM2) / span));
  return (1 - open) * closedM2KPerW + open * openM2KPerW;
}
