// Hours and degree hours outside the comfort band, while somebody is there.

import { dayName } from './hour-name.ts';
import type { RoomHours, WorstWeek } from './simulation.ts';

export interface BandFindings {
  readonly occupiedHours: number;
  readonly hoursBelowBand: number;
  readonly hoursAboveBand: number;
  readonly degreeHoursBelow: number;
  readonly degreeHoursAbove: number;
  readonly worstWeekBelow: WorstWeek | null;
  readonly worstWeekAbove: WorstWeek | null;
}

type Hours = Pick<RoomHours, 'operativeC' | 'bandLowC' | 'bandHighC' | 'occupied'>;

/**
 * Judges hourly means of the operative temperature (ISO 7726) against the band in occupied hours; an
 * hour counts whole, a degree hour is a kelvin outside for an hour (EN 16798-2, method B).
 *
 * @param year names the days of the worst weeks
 */
export function bandFindings(hours: Hours, year: number): BandFindings {
  const { operativeC, bandLowC, bandHighC, occupied } = hours;
  const count = operativeC.length;
  const below = new Float64Array(count);
  const above = new Float64Array(count);
  let occupiedHours = 0;
  let hoursBelowBand = 0;
  let hoursAboveBand = 0;
  for (let h = 0; h < count; h++) {
    if (occupied[h] === 0) continue;
    occupiedHours++;
    if (operativeC[h] < bandLowC[h]) {
      hoursBelowBand++;
      below[h] = bandLowC[h] - operativeC[h];
    }
    if (operativeC[h] > bandHighC[h]) {
      hoursAboveBand++;
      above[h] = operativeC[h] - bandHighC[h];
    }
  }
  const sum = (values: Float64Array) => values.reduce((total, value) => total + value, 0);
  return {
    occupiedHours,
    hoursBelowBand,
    hoursAboveBand,
    degreeHoursBelow: sum(below),
    degreeHoursAbove: sum(above),
    worstWeekBelow: worstWeek(below, year),
    worstWeekAbove: worstWeek(above, year),
  };
}

/** The seven days on end with the greatest sum, or null where all is 0. */
function worstWeek(degreeHours: Float64Array, year: number): WorstWeek | null {
  const days = degreeHours.length / 24;
  const ofDay = Float64Array.from({ length: days }, (_, d) =>
    degreeHours.subarray(24 * d, 24 * d + 24).reduce((total, value) => total + value, 0),
  );
  let best = 0;
  let first = -1;
  for (let d = 0; d + 7 <= days; d++) {
    let total = 0;
    for (let i = d; i < d + 7; i++) total += ofDay[i];
    if (total > best + 1e-9) [best, first] = [total, d];
  }
  if (first < 0) return null;
  const firstHour = first * 24;
  return { from: dayName(firstHour, degreeHours.length, year), firstHour, degreeHours: best };
}
