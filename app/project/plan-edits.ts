// Edits of the drawing: the plan changes, and the rooms follow from it in the same step.

import type { Json } from '../../engine/index.ts';
import { freeId, type OpeningForm, type ProjectForm, type RoomForm } from './form.ts';
import {
  type Plan,
  type PlanRoom,
  piecesOf,
  type Side,
  type Storey,
  touchM,
} from './plan-geometry.ts';
import { type PlanFabric, roomsOfPlan } from './plan-to-rooms.ts';
import { removeRoom } from './room-edits.ts';
import { beginStory, type Edit, tell } from './story.ts';
import { newRoom, usualFabric, usualGlazing } from './template.ts';

const json = (value: unknown): Json => value as Json;

/** The drawing, with what the file leaves out filled in; null where there is none. */
export function planOf({ plan }: ProjectForm): Plan | null {
  if (!plan) return null;
  return {
    topAzimuthDeg: plan.topAzimuthDeg ?? 0,
    storeys: plan.storeys ?? [],
    rooms: plan.rooms ?? [],
  };
}

/** New surfaces are made of what the house is made of most, by area. */
function fabricOf({ rooms }: ProjectForm): PlanFabric {
  const most = (is: (surface: RoomForm['surfaces'][number]) => boolean, usual: string) => {
    const areas = new Map<string, number>();
    for (const surface of rooms.flatMap((room) => room.surfaces)) {
      if (!is(surface)) continue;
      areas.set(surface.construction, (areas.get(surface.construction) ?? 0) + surface.areaM2);
    }
    return [...areas].sort((a, b) => b[1] - a[1])[0]?.[0] ?? usual;
  };
  const isWall = (tilt: number) => tilt > 60 && tilt < 120;
  return {
    outside: most((s) => isWall(s.tiltDeg) && s.boundary.kind === 'outdoors', usualFabric.outside),
    partition: most((s) => isWall(s.tiltDeg) && s.boundary.kind === 'room', usualFabric.partition),
    roof: most((s) => s.tiltDeg < 60 && s.boundary.kind === 'outdoors', usualFabric.roof),
    between: most((s) => s.tiltDeg > 120 && s.boundary.kind === 'room', usualFabric.between),
    ground: most(
      (s) => s.tiltDeg > 120 && s.boundary.kind.startsWith('ground'),
      usualFabric.ground,
    ),
    exposed: most((s) => s.tiltDeg > 120 && s.boundary.kind === 'outdoors', usualFabric.exposed),
  };
}

/** Puts another drawing in place; `rooms` may hold new rooms that are not surfaced yet. */
function planEdit(
  form: ProjectForm,
  plan: Plan,
  name: string,
  rooms: readonly RoomForm[] = form.rooms,
  gesture?: string,
): Edit {
  const drawn = roomsOfPlan(plan, rooms, fabricOf(form));
  const words = drawn.lost.length > 0 ? `${name}; no wall left for ${drawn.lost.join(', ')}` : name;
  return {
    name: words,
    changes: [
      { path: 'plan', value: json(plan) },
      { path: 'rooms', value: json(drawn.rooms) },
    ],
    ...(gesture === undefined ? {} : { gesture }),
  };
}

const firstStorey: Storey = { id: 'ground', name: 'Ground storey', heightM: 2.5 };

export function startPlan(form: ProjectForm): Edit {
  return planEdit(form, { topAzimuthDeg: 0, storeys: [firstStorey], rooms: [] }, 'Drawing started');
}

export function addStorey(
  form: ProjectForm,
  plan: Plan,
): { readonly edit: Edit; readonly id: string } {
  const names = ['Ground storey', 'First storey', 'Second storey', 'Third storey'];
  const name = names[plan.storeys.length] ?? `Storey ${plan.storeys.length}`;
  const id = freeId(
    name.replace(' storey', ''),
    plan.storeys.map((one) => one.id),
  );
  const heightM = plan.storeys.at(-1)?.heightM ?? firstStorey.heightM;
  const next = { ...plan, storeys: [...plan.storeys, { id, name, heightM }] };
  return { id, edit: planEdit(form, next, `${name} added`) };
}

export function storeyHeightEdit(form: ProjectForm, plan: Plan, id: string, heightM: number): Edit {
  const storeys = plan.storeys.map((one) => (one.id === id ? { ...one, heightM } : one));
  return planEdit(form, { ...plan, storeys }, 'Storey height');
}

export function turnEdit(form: ProjectForm, plan: Plan, topAzimuthDeg: number): Edit {
  return planEdit(form, { ...plan, topAzimuthDeg }, 'House turned');
}

export function addPlanRoom(
  form: ProjectForm,
  plan: Plan,
  place: Omit<PlanRoom, 'room'>,
): { readonly edit: Edit; readonly id: string } {
  const name = `Room ${form.rooms.length + 1}`;
  const id = freeId(
    name,
    form.rooms.map((one) => one.id),
  );
  const next = { ...plan, rooms: [...plan.rooms, { ...place, room: id }] };
  return { id, edit: planEdit(form, next, `${name} drawn`, [...form.rooms, newRoom(id, name)]) };
}

export function placeEdit(
  form: ProjectForm,
  plan: Plan,
  places: readonly PlanRoom[],
  name: string,
  gesture?: string,
): Edit {
  const moved = new Map(places.map((place) => [place.room, place]));
  const rooms = plan.rooms.map((one) => moved.get(one.room) ?? one);
  return planEdit(form, { ...plan, rooms }, name, form.rooms, gesture);
}

/** The rooms after the move of one side; neighbours that share it move along. */
export function movedSide(plan: Plan, room: PlanRoom, side: Side, byM: number): PlanRoom[] {
  const neighbours = new Set(piecesOf(plan, room, side).flatMap(({ behind }) => behind ?? []));
  const outward = side === 'top' || side === 'right' ? byM : -byM;
  const opposite = ({ top: 'bottom', bottom: 'top', left: 'right', right: 'left' } as const)[side];
  const changed = [stretched(room, side, outward)];
  for (const other of plan.rooms) {
    if (neighbours.has(other.room)) changed.push(stretched(other, opposite, -outward));
  }
  return changed.some(({ widthM, depthM }) => widthM < leastM || depthM < leastM) ? [] : changed;
}

const leastM = 0.3;
const round = (value: number) => Number(value.toFixed(4));

/** A room whose side was moved outward. */
function stretched(room: PlanRoom, side: Side, byM: number): PlanRoom {
  const { xM, yM, widthM, depthM } = room;
  if (side === 'right') return { ...room, widthM: round(widthM + byM) };
  if (side === 'top') return { ...room, depthM: round(depthM + byM) };
  if (side === 'left') return { ...room, xM: round(xM - byM), widthM: round(widthM + byM) };
  return { ...room, yM: round(yM - byM), depthM: round(depthM + byM) };
}

/** The room goes from the drawing and from the house. */
export function removePlanRoom(form: ProjectForm, plan: Plan, id: string): Edit | null {
  const room = form.rooms.find((one) => one.id === id);
  if (!room || form.rooms.length === 1) return null;
  const removal = removeRoom(form, room);
  const told = tell(beginStory(json(form)), removal);
  if (!told.ok) return null;
  const without = told.story.now.document as unknown as ProjectForm;
  const next = { ...plan, rooms: plan.rooms.filter((one) => one.room !== id) };
  const drawn = planEdit(without, next, removal.name);
  return { ...drawn, changes: [...removal.changes, ...drawn.changes] };
}

const windowM = { widthM: 1.2, heightM: 1.2, bottomM: 0.9 };

/** A window of usual size with its middle at a place of a side; null where no outside wall is there. */
export function addWindow(
  form: ProjectForm,
  plan: Plan,
  place: PlanRoom,
  side: Side,
  middleM: number,
): Edit | null {
  const room = form.rooms.find(({ id }) => id === place.room);
  if (!room) return null;
  const pieces = piecesOf(plan, place, side).filter(({ behind }) => behind === null);
  const index = pieces.findIndex(
    ({ fromM, toM }) => middleM > fromM - touchM && middleM < toM + touchM,
  );
  const piece = pieces[index];
  const surfaceId = `${side}${index <= 0 ? '' : `-${index + 1}`}`;
  const surface = room.surfaces.find(({ id }) => id === surfaceId);
  if (!piece || !surface) return null;
  const widthM = Math.min(windowM.widthM, piece.toM - piece.fromM);
  const leftM = Math.max(piece.fromM, Math.min(middleM - widthM / 2, piece.toM - widthM));
  const rectangle = { ...windowM, widthM: round(widthM), leftM: round(leftM) };
  const taken = room.surfaces.flatMap((one) => (one.openings ?? []).map(({ id }) => id));
  const opening: OpeningForm = {
    id: freeId('window', taken),
    name: 'Window',
    glazing: mostGlazing(form),
    areaM2: round(rectangle.widthM * rectangle.heightM),
    rectangle,
  };
  return {
    name: `Window placed in ${room.name}`,
    changes: [
      { path: `rooms[${room.id}].surfaces[${surface.id}].openings[+]`, value: json(opening) },
    ],
  };
}

function mostGlazing({ rooms }: ProjectForm): string {
  const counts = new Map<string, number>();
  for (const { openings } of rooms.flatMap((room) => room.surfaces))
    for (const { glazing } of openings ?? []) counts.set(glazing, (counts.get(glazing) ?? 0) + 1);
  return [...counts].sort((a, b) => b[1] - a[1])[0]?.[0] ?? usualGlazing;
}

/** A window moved along its side. */
export function moveWindow(
  plan: Plan,
  place: PlanRoom,
  room: RoomForm,
  side: Side,
  openingId: string,
  leftM: number,
): Edit | null {
  const surface = room.surfaces.find(({ openings }) =>
    openings?.some(({ id }) => id === openingId),
  );
  const opening = surface?.openings?.find(({ id }) => id === openingId);
  if (!surface || !opening?.rectangle) return null;
  const { widthM } = opening.rectangle;
  const middle = opening.rectangle.leftM + widthM / 2;
  const piece = piecesOf(plan, place, side).find(
    ({ fromM, toM, behind }) => behind === null && middle >= fromM && middle <= toM,
  );
  if (!piece) return null;
  const next = round(Math.max(piece.fromM, Math.min(leftM, piece.toM - widthM)));
  return {
    name: `${opening.name ?? 'Window'} of ${room.name} moved`,
    gesture: `window ${room.id} ${openingId}`,
    changes: [
      {
        path: `rooms[${room.id}].surfaces[${surface.id}].openings[${openingId}].rectangle.leftM`,
        value: next,
      },
    ],
  };
}
