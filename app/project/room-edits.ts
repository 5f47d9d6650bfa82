// Edits of rooms as plain tables of surfaces. A partition is one wall with two faces: what is changed
// on one is changed on the other.

import type { Change, Json } from '../../engine/index.ts';
import {
  type BoundaryForm,
  freeId,
  type OpeningForm,
  type ProjectForm,
  type RoomForm,
  type SurfaceForm,
} from './form.ts';
import type { Edit } from './story.ts';

const json = (value: unknown): Json => value as Json;
const at = (room: RoomForm, surface: SurfaceForm) => `rooms[${room.id}].surfaces[${surface.id}]`;
export const nameOf = (one: { readonly id: string; readonly name?: string | undefined }) =>
  one.name || one.id.charAt(0).toUpperCase() + one.id.slice(1).replace(/-/g, ' ');

/** The other face of a partition; null where it is none, or where it names nothing that is there. */
function otherFace(form: ProjectForm, { boundary }: SurfaceForm) {
  if (boundary.kind !== 'room') return null;
  const room = form.rooms.find(({ id }) => id === boundary.room);
  const surface = room?.surfaces.find(({ id }) => id === boundary.surface);
  return room && surface ? { room, surface } : null;
}

type Mirrored = 'construction' | 'areaM2' | 'tiltDeg' | 'azimuthDeg';

/** The same field of the other face. */
function mirrored(field: Mirrored, value: string | number): string | number {
  if (field === 'tiltDeg') return 180 - Number(value);
  if (field === 'azimuthDeg') return (Number(value) + 180) % 360;
  return value;
}

export function surfaceEdit(
  form: ProjectForm,
  room: RoomForm,
  surface: SurfaceForm,
  field: Mirrored,
  value: string | number,
  name: string,
): Edit {
  const other = otherFace(form, surface);
  const changes: Change[] = [{ path: `${at(room, surface)}.${field}`, value }];
  if (other) {
    changes.push({
      path: `${at(other.room, other.surface)}.${field}`,
      value: mirrored(field, value),
    });
  }
  return { name, changes };
}

/** Gives a surface another side; the face it had behind it until now looks outdoors from then on. */
export function boundaryEdit(
  form: ProjectForm,
  room: RoomForm,
  surface: SurfaceForm,
  kind: string,
): Edit {
  const changes: Change[] = [];
  const other = otherFace(form, surface);
  const path = at(room, surface);
  if (other) {
    changes.push({
      path: `${at(other.room, other.surface)}.boundary`,
      value: { kind: 'outdoors' },
    });
    changes.push({ path: `${at(other.room, other.surface)}.reversed`, value: undefined });
  }
  changes.push({ path: `${path}.reversed`, value: undefined });
  const neighbour = kind.startsWith('room:')
    ? form.rooms.find(({ id }) => `room:${id}` === kind)
    : null;
  if (neighbour) {
    // The neighbour gets the other face, unless it has one that names this surface already.
    const id = freeId(
      `${surface.id}-${room.id}`,
      neighbour.surfaces.map((one) => one.id),
    );
    const face: SurfaceForm = {
      id,
      construction: surface.construction,
      areaM2: surface.areaM2,
      tiltDeg: 180 - surface.tiltDeg,
      azimuthDeg: ((surface.azimuthDeg ?? 0) + 180) % 360,
      boundary: { kind: 'room', room: room.id, surface: surface.id },
      reversed: true,
    };
    changes.push({ path: `${path}.openings`, value: undefined });
    changes.push({
      path: `${path}.boundary`,
      value: { kind: 'room', room: neighbour.id, surface: id },
    });
    changes.push({ path: `rooms[${neighbour.id}].surfaces[+]`, value: json(face) });
  } else {
    changes.push({ path: `${path}.boundary`, value: json(plainBoundary(form, kind)) });
  }
  return { name: `${nameOf(room)}, ${nameOf(surface)}: what lies behind`, changes };
}

function plainBoundary(form: ProjectForm, kind: string): BoundaryForm {
  if (kind.startsWith('contact:')) return { kind: 'ground-contact', contact: kind.slice(8) };
  if (kind === 'ground') return { kind, temperatureC: 10 };
  if (kind === 'fixed') return { kind, temperatureC: 15 };
  const [contact] = form.groundContacts ?? [];
  if (kind === 'ground-contact' && contact) return { kind, contact: contact.id };
  return kind === 'adiabatic' ? { kind } : { kind: 'outdoors' };
}

export function addSurface(room: RoomForm, construction: string): Edit {
  const id = freeId(
    'surface',
    room.surfaces.map((one) => one.id),
  );
  const surface: SurfaceForm = {
    id,
    name: 'New surface',
    construction,
    areaM2: 10,
    tiltDeg: 90,
    azimuthDeg: 180,
    boundary: { kind: 'outdoors' },
  };
  const change = { path: `rooms[${room.id}].surfaces[+]`, value: json(surface) };
  return { name: `Surface added to ${nameOf(room)}`, changes: [change] };
}

/** With the other face, where it is a partition. */
export function removeSurface(form: ProjectForm, room: RoomForm, surface: SurfaceForm): Edit {
  const other = otherFace(form, surface);
  const changes: Change[] = [{ path: at(room, surface) }];
  if (other) changes.push({ path: at(other.room, other.surface) });
  return { name: `${nameOf(surface)} removed from ${nameOf(room)}`, changes };
}

export function addOpening(room: RoomForm, surface: SurfaceForm, glazing: string): Edit {
  const taken = room.surfaces.flatMap((one) => (one.openings ?? []).map(({ id }) => id));
  const opening: OpeningForm = {
    id: freeId('window', taken),
    name: 'Window',
    glazing,
    areaM2: 1.5,
  };
  const change = { path: `${at(room, surface)}.openings[+]`, value: json(opening) };
  return { name: `Window added to ${nameOf(room)}`, changes: [change] };
}

export function removeOpening(room: RoomForm, surface: SurfaceForm, opening: OpeningForm): Edit {
  const change = { path: `${at(room, surface)}.openings[${opening.id}]` };
  return { name: `${nameOf(opening)} removed from ${nameOf(room)}`, changes: [change] };
}

/** Area, and the rectangle with it: the width follows, as the height is what the wall allows. */
export function openingAreaEdit(
  room: RoomForm,
  surface: SurfaceForm,
  opening: OpeningForm,
  areaM2: number,
): Edit {
  const path = `${at(room, surface)}.openings[${opening.id}]`;
  const { rectangle } = opening;
  const changes: Change[] = [{ path: `${path}.areaM2`, value: areaM2 }];
  if (rectangle) {
    const widthM = Number((areaM2 / rectangle.heightM).toFixed(6));
    changes.push({ path: `${path}.rectangle.widthM`, value: widthM });
  }
  return { name: `${nameOf(opening)} of ${nameOf(room)}, area`, changes };
}

/** One side of the rectangle, and the area with it. */
export function openingSizeEdit(
  room: RoomForm,
  surface: SurfaceForm,
  opening: OpeningForm,
  size: {
    readonly widthM?: number;
    readonly heightM?: number;
    readonly bottomM?: number;
    readonly leftM?: number;
  },
): Edit {
  const path = `${at(room, surface)}.openings[${opening.id}]`;
  const old = opening.rectangle ?? { leftM: 0, bottomM: 0.9, widthM: opening.areaM2, heightM: 1 };
  const rectangle = { ...old, ...size };
  return {
    name: `${nameOf(opening)} of ${nameOf(room)}, size`,
    changes: [
      { path: `${path}.rectangle`, value: json(rectangle) },
      { path: `${path}.areaM2`, value: Number((rectangle.widthM * rectangle.heightM).toFixed(6)) },
    ],
  };
}

/** A room like this one beside it, all of its own; partitions of the copy look outdoors. */
export function copyRoom(
  form: ProjectForm,
  room: RoomForm,
): { readonly edit: Edit; readonly id: string } {
  const id = freeId(
    room.id,
    form.rooms.map((one) => one.id),
  );
  const surfaces = room.surfaces.map((surface): SurfaceForm => {
    if (surface.boundary.kind !== 'room') return surface;
    const { reversed: _, ...rest } = surface;
    return { ...rest, boundary: { kind: 'outdoors' } };
  });
  const copy: RoomForm = { ...room, id, name: `${room.name}, copy`, surfaces };
  return {
    id,
    edit: { name: `${room.name} copied`, changes: [{ path: 'rooms[+]', value: json(copy) }] },
  };
}

/** What lay behind the room's partitions looks outdoors then; air that passed through it is gone. */
export function removeRoom(form: ProjectForm, room: RoomForm): Edit {
  const changes: Change[] = [];
  for (const other of form.rooms) {
    if (other.id === room.id) continue;
    for (const surface of other.surfaces) {
      if (surface.boundary.kind !== 'room' || surface.boundary.room !== room.id) continue;
      changes.push({ path: `${at(other, surface)}.boundary`, value: { kind: 'outdoors' } });
      changes.push({ path: `${at(other, surface)}.reversed`, value: undefined });
    }
  }
  const keep = <T>(list: readonly T[] | undefined, path: string, isOf: (one: T) => boolean) => {
    if (list?.some(isOf)) changes.push({ path, value: json(list.filter((one) => !isOf(one))) });
  };
  keep(form.airPaths, 'airPaths', ({ from, to }) => from === room.id || to === room.id);
  keep(form.airExchanges, 'airExchanges', ({ rooms }) => rooms.includes(room.id));
  keep(form.doorways, 'doorways', ({ rooms }) => rooms.includes(room.id));
  changes.push({ path: `rooms[${room.id}]` });
  return { name: `${room.name} removed`, changes };
}
