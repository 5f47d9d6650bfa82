// The document as the file holds it, with its defaults left out. What the window edits.

import { type Json, projectSchema } from '../../engine/index.ts';

/** A project document that fits the schema; references and sizes may still be wrong. */
export type ProjectForm = (typeof projectSchema)['_zod']['input'];
export type RoomForm = ProjectForm['rooms'][number];
export type SurfaceForm = RoomForm['surfaces'][number];
export type OpeningForm = NonNullable<SurfaceForm['openings']>[number];
export type ConstructionForm = NonNullable<ProjectForm['constructions']>[number];
export type LayerForm = ConstructionForm['layers'][number];
export type MaterialForm = NonNullable<ProjectForm['materials']>[number];
export type GlazingForm = NonNullable<ProjectForm['glazings']>[number];
export type ProfileForm = NonNullable<ProjectForm['profiles']>[number];
export type ScheduleForm = NonNullable<ProjectForm['schedules']>[number];
export type BoundaryForm = SurfaceForm['boundary'];
export type HeatingForm = NonNullable<RoomForm['heating']>;

/** The document, where the screens can edit it; null where its file is faulty in form. */
export function projectForm(document: Json): ProjectForm | null {
  return projectSchema.safeParse(document).success ? (document as unknown as ProjectForm) : null;
}

/** The text of a file as a document; null where it is no JSON. */
export function readDocument(text: string): Json | null {
  try {
    const value: Json = JSON.parse(text);
    return value;
  } catch {
    return null;
  }
}

/** An id that no other has: `wall`, `wall-2`, … Letters and digits of the name are kept. */
export function freeId(name: string, taken: Iterable<string>): string {
  const held = new Set(taken);
  const plain = name
    .toLowerCase()
    .normalize('NFKD')
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 50);
  const stem = plain === '' ? 'part' : plain;
  if (!held.has(stem)) return stem;
  for (let n = 2; ; n++) if (!held.has(`${stem}-${n}`)) return `${stem}-${n}`;
}
