// Edits of constructions, as changes of the document. Layers run from outside to inside.

import {
  type Building,
  type Change,
  type Json,
  libraryConstructions,
  libraryMaterials,
  projectConstruction,
} from '../../engine/index.ts';
import type { ConstructionForm, LayerForm, ProjectForm } from './form.ts';
import { freeId } from './form.ts';
import type { Edit } from './story.ts';

/** Plain data of a form as the document holds it. */
const json = (value: unknown): Json => value as Json;

const has = (list: readonly { readonly id: string }[] | undefined, id: string) =>
  list?.some((one) => one.id === id) ?? false;

/** What is used from the library is copied into the document before it is edited. */
function owned(form: ProjectForm, building: Building, id: string): Change[] {
  if (has(form.constructions, id)) return [];
  const construction = building.constructions.find((one) => one.id === id);
  if (!construction) return [];
  const materials = construction.layers.flatMap((layer) =>
    'material' in layer ? materialChanges(form, building, layer.material) : [],
  );
  return [...materials, { path: 'constructions[+]', value: json(construction) }];
}

/** The material, where the document has none of that id: from what the building uses, or the library. */
function materialChanges(form: ProjectForm, building: Building, id: string): Change[] {
  if (has(form.materials, id)) return [];
  const material =
    building.materials.find((one) => one.id === id) ??
    libraryMaterials.find((one) => one.id === id);
  return material ? [{ path: 'materials[+]', value: json({ ...material }) }] : [];
}

const unique = (changes: readonly Change[]): Change[] => {
  const seen = new Set<string>();
  return changes.filter(({ path, value }) => {
    if (!path.endsWith('[+]')) return true;
    const key = `${path} ${JSON.stringify(value)}`;
    return !seen.has(key) && seen.add(key);
  });
};

export interface FabricAt {
  readonly form: ProjectForm;
  readonly building: Building;
  readonly construction: ConstructionForm;
}

/** Puts other layers in place of those there are. */
export function layersEdit(
  { form, building, construction }: FabricAt,
  layers: readonly LayerForm[],
  name: string,
  gesture?: string,
): Edit {
  const materials = layers.flatMap((layer) =>
    'material' in layer ? materialChanges(form, building, layer.material) : [],
  );
  return {
    name,
    changes: unique([
      ...owned(form, building, construction.id),
      ...materials,
      { path: `constructions[${construction.id}].layers`, value: json(layers) },
    ]),
    ...(gesture === undefined ? {} : { gesture }),
  };
}

/** A field of the construction itself. */
export function constructionEdit(
  { form, building, construction }: FabricAt,
  field: string,
  value: Json,
  name: string,
): Edit {
  return {
    name,
    changes: [
      ...owned(form, building, construction.id),
      { path: `constructions[${construction.id}].${field}`, value },
    ],
  };
}

/** A value of a material, wherever it is used. */
export function materialEdit(
  { form, building, construction }: FabricAt,
  id: string,
  field: string,
  value: number | undefined,
  name: string,
): Edit {
  return {
    name,
    changes: unique([
      ...owned(form, building, construction.id),
      ...materialChanges(form, building, id),
      { path: `materials[${id}].${field}`, value },
    ]),
  };
}

/** The layers of a library construction in place of those there are; id and name stay. */
export function swapEdit(at: FabricAt, libraryId: string): Edit | null {
  const entry = libraryConstructions.find((one) => one.id === libraryId);
  if (!entry) return null;
  const pieces = projectConstruction(entry);
  const materials = pieces.materials
    .filter(({ id }) => !has(at.form.materials, id))
    .map((material): Change => ({ path: 'materials[+]', value: json(material) }));
  const to = `constructions[${at.construction.id}]`;
  return {
    name: `${at.construction.name} swapped for ${entry.name}`,
    changes: unique([
      ...owned(at.form, at.building, at.construction.id),
      ...materials,
      { path: `${to}.layers`, value: json(pieces.construction.layers) },
      { path: `${to}.name`, value: entry.name },
      { path: `${to}.outsideSolarAbsorptance`, value: entry.outsideSolarAbsorptance },
      { path: `${to}.outsideRoughness`, value: entry.outsideRoughness },
    ]),
  };
}

/** A copy under a new id, to give some surfaces another build-up. */
export function copyEdit(at: FabricAt): { readonly edit: Edit; readonly id: string } {
  const { form, building, construction } = at;
  const taken = [...(form.constructions ?? []), ...building.constructions].map((one) => one.id);
  const id = freeId(construction.id, taken);
  return {
    id,
    edit: {
      name: `${construction.name} copied`,
      changes: [
        ...owned(form, building, construction.id),
        {
          path: 'constructions[+]',
          value: json({ ...construction, id, name: `${construction.name}, copy` }),
        },
      ],
    },
  };
}
