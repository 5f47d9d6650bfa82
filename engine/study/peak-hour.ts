// What the peak hour of a building is made of, cause by cause.
import { dayName, hourName, type RoomHours, type Simulation } from '../findings/index.ts';
import type { Side } from './room-plants.ts';

/** Mean heat into the rooms in that hour [W]; losses are negative, `storage` is what masses took up. */
export interface PeakHour {
  readonly hour: number;
  readonly at: string;
  readonly outdoorC: number;
  readonly totalW: number;
  readonly causesW: Causes;
  readonly rooms: readonly {
    readonly room: string;
    readonly powerW: number;
    readonly causesW: Causes;
  }[];
}

const causes = [
  'solar',
  'gains',
  'opaque',
  'glazing',
  'ground',
  'infiltration',
  'ventilation',
  'rooms',
  'storage',
] as const;
export type Causes = Readonly<Record<(typeof causes)[number], number>>;

/** The hour with the greatest power of all rooms together; null where there was none. */
export function peakHour(simulation: Simulation, side: Side): PeakHour | null {
  const { rooms, hours, year, outdoorC } = simulation;
  const powerOf = (room: RoomHours) => (side === 'heating' ? room.heatingW : room.coolingW);
  let totalW = 0;
  let hour = -1;
  for (let h = 0; h < hours; h++) {
    const sum = rooms.reduce((total, room) => total + powerOf(room)[h], 0);
    if (sum > totalW) [totalW, hour] = [sum, h];
  }
  if (hour < 0) return null;
  const at = hour;
  const of = (room: RoomHours) =>
    Object.fromEntries(causes.map((cause) => [cause, room.flowsW[cause][at]])) as Causes; // one a name
  const list = rooms.map((room) => ({
    room: room.id,
    powerW: powerOf(room)[at],
    causesW: of(room),
  }));
  return {
    hour,
    at: hourName(hour, hours, year),
    outdoorC: outdoorC[hour],
    totalW,
    causesW: Object.fromEntries(
      causes.map((cause) => [cause, list.reduce((sum, room) => sum + room.causesW[cause], 0)]),
    ) as Causes,
    rooms: list,
  };
}

export const dayOfYear = (day: number, hours: number, year: number): string =>
  dayName(24 * day, hours, year);
