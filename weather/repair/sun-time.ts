// Whether the table's clock agrees with the sun: a table in daylight-saving time, in UTC, or stamped
// at the other end of the hour has its light too early or too late.
//
// On each month's clearest days the centre of the day's light is compared with that of a clear day in
// the site's own geometry. The median over the year is the shift. Afternoon clouds pull the centre
// forward by minutes, not by half an hour; the clearest days keep them out.

import { monthStarts } from '../calendar.ts';
import { haurwitzWPerM2 } from '../sky/clear-sky.ts';
import { windowStartH } from '../steps/spread.ts';
import { sunTrack } from '../steps/sun-track.ts';
import type { WeatherYear } from '../weather-year.ts';

export interface SunTimeCheck {
  /** How late the table's light is against the sun, negative: early. `null` where too few days have sun. */
  readonly shiftMinutes: number | null;
  /** Half the range that holds the middle half of the days. */
  readonly spreadMinutes: number;
  readonly daysUsed: number;
  readonly isSuspect: boolean;
  /** The finding as a sentence, with what to do. */
  readonly text: string;
}

/** Shift from which the clock is doubted; tables that are right lie within 2 minutes. */
export const suspectShiftMinutes = 10;
const daysPerMonth = 6;

export function sunTimeCheck(
  year: Pick<WeatherYear, 'site' | 'hours' | 'sourceYear' | 'ghiWPerM2'>,
): SunTimeCheck {
  const perHour = 12;
  const track = sunTrack(year, 3600 / perHour);
  const { values, stands } = year.ghiWPerM2;
  const offset = Math.round(windowStartH(stands) * perHour);
  const days = year.hours / 24;
  const clearness = new Float64Array(days);
  const shift = new Float64Array(days).fill(Number.NaN);
  for (let d = 0; d < days; d++) {
    let light = 0;
    let moment = 0;
    let clear = 0;
    let clearMoment = 0;
    for (let h = d * 24; h < d * 24 + 24; h++) {
      light += values[h];
      moment += values[h] * (h - d * 24 + 0.5);
      let hour = 0;
      for (let s = 0; s < perHour; s++) {
        const k = (h * perHour + s + offset + track.count) % track.count;
        hour += track.sunlitShare[k] * haurwitzWPerM2(90 - track.altitudeDeg[k]);
      }
      clear += hour / perHour;
      clearMoment += (hour / perHour) * (h - d * 24 + 0.5);
    }
    if (clear < 500 || light < 250) continue; // Wh/m²: polar night, or a day without a shadow
    clearness[d] = light / clear;
    shift[d] = (moment / light - clearMoment / clear) * 60;
  }
  const used: number[] = [];
  const starts = monthStarts(year.hours);
  for (let m = 0; m < 12; m++) {
    const month: number[] = [];
    for (let d = starts[m] / 24; d < starts[m + 1] / 24; d++)
      if (!Number.isNaN(shift[d])) month.push(d);
    month.sort((a, b) => clearness[b] - clearness[a]);
    for (const d of month.slice(0, daysPerMonth)) used.push(shift[d]);
  }
  return verdict(used.sort((a, b) => a - b));
}

function verdict(shifts: readonly number[]): SunTimeCheck {
  const daysUsed = shifts.length;
  if (daysUsed < 12)
    return {
      shiftMinutes: null,
      spreadMinutes: 0,
      daysUsed,
      isSuspect: false,
      text: 'Too few days with sun to compare the clock of the table with the sun.',
    };
  const at = (share: number) => shifts[Math.round(share * (daysUsed - 1))];
  const shiftMinutes = at(0.5);
  const spreadMinutes = (at(0.75) - at(0.25)) / 2;
  const isSuspect = Math.abs(shiftMinutes) >= suspectShiftMinutes;
  const minutes = Math.round(Math.abs(shiftMinutes));
  const way = shiftMinutes < 0 ? 'before' : 'after';
  const text = isSuspect
    ? `The light of the table comes ${minutes} minutes ${way} the sun of this site (${daysUsed} clear days, ±${Math.round(spreadMinutes)}): check the offset from UTC, daylight saving, the longitude's sign, and whether rows are stamped at the start or the end of their hour.`
    : `The light of the table agrees with the sun of this site: ${minutes} minutes ${way} it on ${daysUsed} clear days (±${Math.round(spreadMinutes)}).`;
  return { shiftMinutes, spreadMinutes, daysUsed, isSuspect, text };
}
