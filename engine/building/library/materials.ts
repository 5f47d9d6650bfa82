// All generic materials.
import { insulationMaterials } from './materials-insulation.ts';
import { mineralMaterials } from './materials-mineral.ts';
import { sheetMaterials } from './materials-sheet.ts';
import { timberMaterials } from './materials-timber.ts';
import type { LibraryMaterial } from './types.ts';

export const libraryMaterials: readonly LibraryMaterial[] = [
  ...mineralMaterials,
  ...insulationMaterials,
  ...timberMaterials,
  ...sheetMaterials,
];

const byId = new Map(libraryMaterials.map((m) => [m.id, m]));

/** The generic material of an id, or `undefined`. */
export function libraryMaterial(id: string): LibraryMaterial | undefined {
  return byId.get(id);
}
