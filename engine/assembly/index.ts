// The front door: building and weather in, a network problem with provenance out.
export { type Assembly, type AssemblyOptions, assemble } from './assemble.ts';
export { type DrawnHours, type PeopleHours, referenceVapourPa } from './gains.ts';
export type { Provenance } from './network-builder.ts';
export type { PlantParts } from './plant.ts';
export type { RoomDrawn, WindowHours } from './window-hours.ts';
export { bareLight, coveredLight } from './window-optics.ts';
export type { Face, RoomMeters, RoomParts } from './room-parts.ts';
