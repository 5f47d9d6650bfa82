// A library construction as a project holds it: the entry itself and the materials it needs.
import type { Construction, Layer, Material } from '../schema-fabric.ts';
import { heatFlowOf, layerSpecM2KPerW } from './constructions.ts';
import { libraryMaterial } from './materials.ts';
import type { LayerSpec, LibraryConstruction } from './types.ts';

export interface ProjectPieces {
  readonly construction: Construction;
  readonly materials: readonly Material[];
}

function layerName(layer: LayerSpec): string {
  if ('airLayerM' in layer) return `air layer ${Math.round(layer.airLayerM * 1000)} mm`;
  return 'name' in layer ? layer.name : 'resistance';
}

/** Air layers become resistances by ISO 6946 at 10 °C for heat on its way out. */
export function projectConstruction(entry: LibraryConstruction): ProjectPieces {
  const materials = new Map<string, Material>();
  const flow = heatFlowOf(entry.kind);
  const layers: Layer[] = entry.layers.map((layer) => {
    if (!('materialId' in layer)) {
      const resistance = Number(layerSpecM2KPerW(layer, flow).toFixed(4));
      return { name: layerName(layer), resistanceM2KPerW: resistance };
    }
    const material = libraryMaterial(layer.materialId);
    if (material === undefined) throw new RangeError(`no material ${layer.materialId}`);
    materials.set(material.id, { ...material });
    return { material: material.id, thicknessM: layer.thicknessM };
  });
  return {
    construction: {
      id: entry.id,
      name: entry.name,
      layers,
      outsideSolarAbsorptance: entry.outsideSolarAbsorptance,
      insideSolarAbsorptance: 0.6,
      outsideEmissivity: 0.9,
      insideEmissivity: 0.9,
      outsideRoughness: entry.outsideRoughness,
    },
    materials: [...materials.values()],
  };
}
