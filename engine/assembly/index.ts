// The front door: building and weather in, a network problem with provenance out.

export type { AirFlow, AirSite } from './air-site.ts';
export { type Assembly, type AssemblyOptions, assemble } from './assemble.ts';
export { physicsLayers } from './fabric.ts';
export { type DrawnHours, type PeopleHours, referenceVapourPa } from './gains.ts';
export { groundPart } from './ground-part.ts';
export { emptyMemory, type Memory } from './memory.ts';
export { type HumidityDevice, type RoomVapour, roomVapours } from './moisture.ts';
export type { Provenance } from './network-builder.ts';
export type { PlantParts } from './plant.ts';
export type { Face, RoomMeters, RoomParts } from './room-parts.ts';
export { scheduledValues } from './schedule-values.ts';
export { stepClock } from './step-clock.ts';
export type { RoomDrawn, WindowHours } from './window-hours.ts';
export { bareLight, coveredLight } from './window-optics.ts';
export { windowSize } from './window-size.ts';
