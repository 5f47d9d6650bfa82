// The comfort band and the set-points as one value an hour, for judging results.
import type { Building, Room } from '../building/index.ts';
import type { ComfortHours } from './room-parts.ts';
import { scheduledValues, scheduleValues } from './schedule-values.ts';
import type { StepClock } from './step-clock.ts';

/** Band and occupation of a room, each hour by its first step; null where the room has no band. */
export function comfortHours(
  building: Building,
  room: Room,
  clock: StepClock,
): ComfortHours | null {
  const { comfort } = room;
  if (!comfort) return null;
  const hourly = (values: Float64Array) => hourlySetPoint(values, clock);
  const occupied =
    comfort.occupied === undefined
      ? new Uint8Array((clock.count * clock.stepS) / 3600).fill(1)
      : Uint8Array.from(hourly(scheduleValues(building, comfort.occupied, clock)), (v) =>
          v > 0 ? 1 : 0,
        );
  return {
    bandLowC: hourly(scheduledValues(building, comfort.bandLowC, clock)),
    bandHighC: hourly(scheduledValues(building, comfort.bandHighC, clock)),
    occupied,
    votes: comfort.votes
      ? {
          clothingClo:
            comfort.votes.clothingClo === 'by-weather'
              ? null
              : hourly(scheduledValues(building, comfort.votes.clothingClo, clock)),
          metRate: hourly(scheduledValues(building, comfort.votes.metRate, clock)),
        }
      : null,
  };
}

/** Mean of the steps of each hour. */
export function hourlySetPoint(values: Float64Array, clock: StepClock): Float64Array {
  const perHour = 3600 / clock.stepS;
  const hours = new Float64Array(clock.count / perHour);
  for (let k = 0; k < clock.count; k++) hours[Math.floor(k / perHour)] += values[k] / perHour;
  return hours;
}
