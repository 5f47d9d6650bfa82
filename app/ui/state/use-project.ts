// The open document as the screens read it: the form that is edited, the whole building behind it with
// defaults and library filled in, and what is wrong with it.

import { useMemo } from 'react';
import {
  type Building,
  type BuildingExplained,
  explainBuilding,
  type Json,
  parseProjectDocument,
} from '../../../engine/index.ts';
import type { Fault } from '../../../weather/index.ts';
import { type ProjectForm, projectForm } from '../../project/index.ts';
import { useAppState } from './use-app.ts';

export interface ReadProject {
  /** Null where the file does not even fit the form. */
  readonly form: ProjectForm | null;
  /** Null while there are faults. */
  readonly building: Building | null;
  readonly faults: readonly Fault[];
}

const read = new WeakMap<object, ReadProject>();
const explained = new WeakMap<Building, BuildingExplained>();
/** The last building without faults: derived figures stay while a fault is mended. */
let lastGood: Building | null = null;

export function readProject(document: Json, file: string): ReadProject {
  if (typeof document !== 'object' || document === null) {
    return { form: null, building: null, faults: [] };
  }
  const known = read.get(document);
  if (known) return known;
  const parsed = parseProjectDocument(document, file);
  const found: ReadProject = parsed.ok
    ? { form: document as unknown as ProjectForm, building: parsed.value, faults: [] }
    : { form: projectForm(document), building: null, faults: parsed.faults };
  read.set(document, found);
  if (found.building) lastGood = found.building;
  return found;
}

const nothing: ReadProject = { form: null, building: null, faults: [] };

export function useProject(): ReadProject {
  const document = useAppState((state) => state.document?.story.now.document);
  const file = useAppState((state) => state.project?.file ?? '');
  return useMemo(
    () => (document === undefined ? nothing : readProject(document, file)),
    [document, file],
  );
}

export interface EditedProject {
  readonly form: ProjectForm;
  /** Of the present document, or of the last one without faults. */
  readonly building: Building;
}

/** For screens that edit; null where there is nothing to edit. */
export function useEditedProject(): EditedProject | null {
  const { form, building } = useProject();
  const held = building ?? lastGood;
  return useMemo(() => (form && held ? { form, building: held } : null), [form, held]);
}

export function explainedOf(building: Building): BuildingExplained {
  const known = explained.get(building);
  if (known) return known;
  const fresh = explainBuilding(building);
  explained.set(building, fresh);
  return fresh;
}
