// Edits of glazings, as changes of the document.

import { type Change, type Json, libraryGlazings } from '../../engine/index.ts';
import { freeId, type GlazingForm, type ProjectForm } from './form.ts';
import type { Edit } from './story.ts';

const json = (value: unknown): Json => value as Json;

/** The glazing with other values; one of the library is copied into the document by it. */
export function glazingEdit(form: ProjectForm, next: GlazingForm, name: string): Edit {
  const isOwn = form.glazings?.some(({ id }) => id === next.id) ?? false;
  const change: Change = isOwn
    ? { path: `glazings[${next.id}]`, value: json(next) }
    : { path: 'glazings[+]', value: json(next) };
  return { name, changes: [change] };
}

/** A library glazing's panes in place of those there are; the id stays, so that windows keep it. */
export function swapGlazingEdit(
  form: ProjectForm,
  glazing: GlazingForm,
  libraryId: string,
): Edit | null {
  const entry = libraryGlazings.find((one) => one.glazing.id === libraryId);
  if (!entry) return null;
  const words = `${glazing.name} swapped for ${entry.glazing.name}`;
  return glazingEdit(form, { ...entry.glazing, id: glazing.id }, words);
}

export function copyGlazingEdit(form: ProjectForm, glazing: GlazingForm, taken: readonly string[]) {
  const id = freeId(glazing.id, [...taken, ...(form.glazings ?? []).map((one) => one.id)]);
  const next = { ...glazing, id, name: `${glazing.name}, copy` };
  return { id, edit: glazingEdit(form, next, `${glazing.name} copied`) };
}
