// The engine's results, under the names the window uses.

import type {
  HourlyFlows,
  RoomFindings,
  RoomHours,
  Simulation,
  SpaceFindings,
} from '../../engine/index.ts';

export type { Simulation };
/** One value an hour; index h is the hour h:00 to h+1:00 of local standard time from 1 January. */
export type RoomSeries = RoomHours;
export type RoomTotals = RoomFindings;
export type Totals = SpaceFindings;

/** A way that heat comes into a room or leaves it. */
export type Stream = Exclude<keyof HourlyFlows, 'storage'>;

export const streams = [
  'solar',
  'gains',
  'heating',
  'cooling',
  'opaque',
  'glazing',
  'ground',
  'infiltration',
  'ventilation',
  'rooms',
] as const satisfies readonly Stream[];
