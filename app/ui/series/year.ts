// Sums and orderings of hourly series for drawing: by month, by week, by size. No physics: what an
// hour holds was computed by the engine.

import type { Month } from '../format/index.ts';
import type { RoomSeries, Simulation, Stream } from '../simulation.ts';
import { streams } from '../simulation.ts';

/** Whether an occupied hour lies outside its band, and on which side. */
export function outsideBand(room: RoomSeries, hour: number): -1 | 0 | 1 {
  if (!room.occupied[hour]) return 0;
  if (room.operativeC[hour] < room.bandLowC[hour]) return -1;
  return room.operativeC[hour] > room.bandHighC[hour] ? 1 : 0;
}

export function monthlyHours(rooms: readonly RoomSeries[], months: readonly Month[], side: -1 | 1) {
  return months.map((month) => {
    let count = 0;
    for (const room of rooms) {
      for (let h = month.firstHour; h < month.endHour; h++) {
        if (outsideBand(room, h) === side) count++;
      }
    }
    return count;
  });
}

/** Largest first: value i was reached or passed in i + 1 hours. */
export function byDuration(series: Float64Array): Float64Array {
  return Float64Array.from(series).sort().reverse();
}

export interface Week {
  readonly firstHour: number;
  readonly endHour: number;
}

/** Weeks of seven days from the first Monday on (from 1 January where weekdays are unknown). */
export function weeksOf(hours: number, firstWeekday: number | null): Week[] {
  const offsetDays = firstWeekday === null ? 0 : (8 - firstWeekday) % 7;
  const starts: number[] = offsetDays > 0 ? [0] : [];
  for (let h = offsetDays * 24; h < hours; h += 168) starts.push(h);
  return starts.map((start) => {
    const firstHour = Math.max(0, Math.min(start, hours - 168));
    return { firstHour, endHour: Math.min(firstHour + 168, hours) };
  });
}

export function weekAt(weeks: readonly Week[], hour: number): number {
  const at = weeks.findIndex((week) => hour >= week.firstHour && hour < week.endHour);
  return Math.max(0, at);
}

/**
 * The week with the most degree hours outside the band; where there is none, the week with the
 * hottest hour.
 */
export function worstWeek(room: RoomSeries, weeks: readonly Week[]): number {
  const score = (week: Week, of: (hour: number) => number) => {
    let sum = 0;
    for (let h = week.firstHour; h < week.endHour; h++) sum += of(h);
    return sum;
  };
  const beyond = (h: number) => {
    if (!room.occupied[h]) return 0;
    const t = room.operativeC[h];
    return Math.max(0, t - room.bandHighC[h], room.bandLowC[h] - t);
  };
  const scores = weeks.map((week) => score(week, beyond));
  const most = Math.max(...scores);
  if (most > 0) return scores.indexOf(most);
  let hottest = 0;
  room.operativeC.forEach((t, h) => {
    if (t > room.operativeC[hottest]) hottest = h;
  });
  return weekAt(weeks, hottest);
}

export type Flows = Readonly<Record<Stream | 'storage', number>>;

/** Heat of one hour in W. */
export function flowsOfHour(room: RoomSeries, hour: number): Flows {
  const flows = Object.fromEntries(streams.map((key) => [key, room.flowsW[key][hour]]));
  return { ...(flows as Record<Stream, number>), storage: room.flowsW.storage[hour] };
}

/** Heat of the whole house in one hour in W; what goes from room to room cancels out. */
export function houseFlowsOfHour({ rooms }: Simulation, hour: number): Flows {
  const sum: Record<Stream | 'storage', number> = { ...flowsOfNothing };
  for (const room of rooms) {
    const flows = flowsOfHour(room, hour);
    for (const key of streams) sum[key] += flows[key];
    sum.storage += flows.storage;
  }
  return { ...sum, rooms: 0 };
}

const flowsOfNothing: Flows = {
  ...(Object.fromEntries(streams.map((key) => [key, 0])) as Record<Stream, number>),
  storage: 0,
};
