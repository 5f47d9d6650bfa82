// The generic library: materials, constructions, glazings, gases, usage profiles. Starting points for a
// project, not product data; every entry says where its numbers come from.
export {
  heatFlowOf,
  layerSpecM2KPerW,
  libraryConstructions,
  libraryUValueWPerM2K,
} from './constructions.ts';
export { type ProjectPieces, projectConstruction } from './for-project.ts';
export { libraryGases } from './gases.ts';
export { libraryGlazings } from './glazings.ts';
export { libraryMaterial, libraryMaterials } from './materials.ts';
export {
  type ConstructionKind,
  type DayShares,
  type LayerSpec,
  type LibraryConstruction,
  type LibraryGas,
  type LibraryGlazing,
  type LibraryMaterial,
  type UsageDay,
  type UsageProfile,
  vapourTight,
} from './types.ts';
export { libraryUsages } from './usages.ts';
