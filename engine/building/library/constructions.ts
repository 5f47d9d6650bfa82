// All generic constructions, and their U-values by ISO 6946.
import {
  airLayerResistanceM2KPerW,
  conventionalInsideFilmM2KPerW,
  conventionalOutsideFilmM2KPerW,
  type HeatFlow,
  totalResistanceM2KPerW,
} from '../../physics/index.ts';
import { floorConstructions, insideConstructions } from './constructions-inside.ts';
import { roofConstructions } from './constructions-roof.ts';
import { doorConstructions, wallConstructions } from './constructions-wall.ts';
import { libraryMaterial } from './materials.ts';
import type { ConstructionKind, LayerSpec, LibraryConstruction } from './types.ts';

export const libraryConstructions: readonly LibraryConstruction[] = [
  ...wallConstructions,
  ...doorConstructions,
  ...roofConstructions,
  ...floorConstructions,
  ...insideConstructions,
];

/** The way heat goes through an element of this kind when it is lost. */
export function heatFlowOf(kind: ConstructionKind): HeatFlow {
  if (kind === 'roof' || kind === 'intermediate floor') return 'up';
  return kind === 'floor' || kind === 'ground floor' ? 'down' : 'horizontal';
}

/** Resistance of one layer for heat going this way. */
export function layerSpecM2KPerW(layer: LayerSpec, flow: HeatFlow): number {
  if ('resistanceM2KPerW' in layer) return layer.resistanceM2KPerW;
  if ('airLayerM' in layer) {
    return airLayerResistanceM2KPerW({
      flow,
      thicknessM: Math.min(0.3, layer.airLayerM),
      emissivity1: 0.9,
      emissivity2: layer.foilEmissivity ?? 0.9,
      meanC: 10,
    });
  }
  const material = libraryMaterial(layer.materialId);
  if (material === undefined) throw new RangeError(`no material ${layer.materialId}`);
  return layer.thicknessM / material.conductivityWPerMK;
}

/**
 * U-value of an entry with the conventional films of its kind: inside twice between rooms; on the
 * ground the construction alone, as ISO 13370 adds the soil.
 *
 * Source: ISO 6946:2017, clause 6.
 */
export function libraryUValueWPerM2K(entry: LibraryConstruction): number {
  const flow = heatFlowOf(entry.kind);
  const inside = conventionalInsideFilmM2KPerW(flow);
  const between = entry.kind === 'partition' || entry.kind === 'intermediate floor';
  const outside = between ? inside : conventionalOutsideFilmM2KPerW;
  const layers = entry.layers.map((layer) => layerSpecM2KPerW(layer, flow));
  return 1 / totalResistanceM2KPerW(inside, layers, outside);
}
