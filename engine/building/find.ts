// Looking things up by id in a building that has been checked.

import type { Construction, Glazing, Material } from './schema-fabric.ts';
import type { GroundContact } from './schema-ground.ts';
import type { Building } from './schema-project.ts';
import type { Room, Surface } from './schema-room.ts';
import type { Profile, Schedule } from './schema-use.ts';
import type { Covering } from './schema-window.ts';

function found<T extends { readonly id: string }>(list: readonly T[], id: string, what: string): T {
  const item = list.find((one) => one.id === id);
  if (!item) throw new Error(`${what} "${id}" is not in the building`); // the parser has checked it
  return item;
}

export const materialOf = (b: Building, id: string): Material => found(b.materials, id, 'material');
export const constructionOf = (b: Building, id: string): Construction =>
  found(b.constructions, id, 'construction');
export const coveringOf = (b: Building, id: string): Covering => found(b.coverings, id, 'covering');
export const glazingOf = (b: Building, id: string): Glazing => found(b.glazings, id, 'glazing');
export const profileOf = (b: Building, id: string): Profile => found(b.profiles, id, 'profile');
export const scheduleOf = (b: Building, id: string): Schedule => found(b.schedules, id, 'schedule');
export const roomOf = (b: Building, id: string): Room => found(b.rooms, id, 'room');
export const surfaceOf = (room: Room, id: string): Surface => found(room.surfaces, id, 'surface');
export const groundContactOf = (b: Building, id: string): GroundContact =>
  found(b.groundContacts, id, 'ground contact');
