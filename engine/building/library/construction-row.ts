import type { ConstructionKind, LayerSpec, LibraryConstruction } from './types.ts';

/** A layer of a material, thickness in millimetres as drawings have it. */
export function mm(materialId: string, thicknessMm: number): LayerSpec {
  return { materialId, thicknessM: thicknessMm / 1000 };
}

/** A still air layer, thickness in millimetres. */
export function air(thicknessMm: number): LayerSpec {
  return { airLayerM: thicknessMm / 1000 };
}

interface Face {
  /** Of the outer face; 0.6 where nothing is said. */
  readonly sun?: number;
  readonly rough?: LibraryConstruction['outsideRoughness'];
}

/** An entry; the range is the U-value that such a build-up has in the trade. */
export function construction(
  kind: ConstructionKind,
  id: string,
  name: string,
  typicalUWPerM2K: readonly [number, number],
  layers: readonly LayerSpec[],
  face: Face = {},
): LibraryConstruction {
  return {
    id,
    name,
    kind,
    layers,
    typicalUWPerM2K,
    outsideSolarAbsorptance: face.sun ?? 0.6,
    outsideRoughness: face.rough ?? 'medium rough',
    source: 'build-up and typical U-value: common practice, no source',
  };
}
