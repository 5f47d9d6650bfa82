// What a new project starts from: one drawn room that runs as soon as a weather table is read. Its
// fabric comes from the generic library by id, so that the file stays short.

import type { ProjectForm, RoomForm } from './form.ts';
import type { Plan } from './plan-geometry.ts';
import { type PlanFabric, roomsOfPlan } from './plan-to-rooms.ts';

/** What new surfaces are made of until the user says otherwise; ids of the generic library. */
export const usualFabric: PlanFabric = {
  outside: 'wall-render-eps-160',
  partition: 'partition-block-100',
  roof: 'roof-flat-timber',
  between: 'between-timber',
  ground: 'ground-slab-80',
  exposed: 'floor-exposed-timber-200',
};
export const usualGlazing = 'double-warm-argon';

/** A room that has not been drawn yet, used as most rooms are. */
export function newRoom(id: string, name: string): RoomForm {
  return {
    id,
    name,
    floorAreaM2: 1,
    volumeM3: 1,
    surfaces: [],
    infiltration: { airChangesPerH: 0.5 },
    heating: { setPointC: 20 },
    comfort: { bandLowC: 19, bandHighC: 26 },
  };
}

/** One room of 5 m by 4 m, 2.6 m high, with a window to the south, heated to 20 °C. */
export function emptyProject(name: string): ProjectForm {
  const plan: Plan = {
    topAzimuthDeg: 0,
    storeys: [{ id: 'ground', name: 'Ground storey', heightM: 2.6 }],
    rooms: [{ room: 'room', storey: 'ground', xM: 0, yM: 0, widthM: 5, depthM: 4 }],
  };
  const { rooms } = roomsOfPlan(plan, [newRoom('room', 'Room')], usualFabric);
  return {
    format: 'inglenook-project',
    version: 1,
    name,
    plan: { ...plan, storeys: [...plan.storeys], rooms: [...plan.rooms] },
    rooms: rooms.map((room) => ({
      ...room,
      surfaces: room.surfaces.map((surface) =>
        surface.id === 'bottom' ? { ...surface, openings: [southWindow] } : surface,
      ),
    })),
  };
}

const southWindow = {
  id: 'window',
  name: 'Window',
  glazing: usualGlazing,
  areaM2: 2.1,
  rectangle: { leftM: 1.75, bottomM: 0.9, widthM: 1.5, heightM: 1.4 },
};
