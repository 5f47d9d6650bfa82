// Whether the table's clock agrees with the sun: a table in daylight-saving time, in UTC, or stamped
// at the other end of the hour has its light too early or too late.
//
// On each month's clearest days the centre of the day's light (phase of its first harmonic, so that no
// shift is too large) is compared with that of a clear day in the site's own geometry. The median over
// the year is the shift. Afternoon clouds pull the centre
// forward by minutes, not by half an hour; the clearest days keep them out.

import { monthStarts } from '../calendar.ts';
import { haurwitzWPerM2 } from '../sky/clear-sky.ts';
import { windowStartH } from '../steps/spread.ts';
import { sunTrack } from '../steps/sun-track.ts';
import type { Site, Stands, WeatherYear } from '../weather-year.ts';
import { shiftCauses } from './shift-causes.ts';
import { type DayShift, dayShifts, middleOf } from './sun-phase.ts';

export interface SunTimeCheck {
  /** How late the table's light is against the sun, negative: early. `null` where too few days have sun. */
  readonly shiftMinutes: number | null;
  /** Half the range that holds the middle half of the days. */
  readonly spreadMinutes: number;
  readonly daysUsed: number;
  readonly isSuspect: boolean;
  /** What would make this shift, the likeliest first; empty where nothing is suspected. */
  readonly causes: readonly string[];
  /** The finding as a sentence, with what to do. */
  readonly text: string;
}

/** Shift from which the clock is doubted; tables that are right lie within 2 minutes. */
export const suspectShiftMinutes = 10;
const daysPerMonth = 6;

export function sunTimeCheck(
  year: Pick<WeatherYear, 'site' | 'hours' | 'sourceYear' | 'ghiWPerM2'>,
): SunTimeCheck {
  const { values, stands } = year.ghiWPerM2;
  const starts = monthStarts(year.hours).map((hour) => hour / 24);
  const monthOf = (day: number) =>
    starts.findIndex((from, m) => day >= from && day < starts[m + 1]);
  return sunTimeOf(dayShifts(values, clearCourse(year, stands), 24), monthOf, year.site);
}

/** Global radiation of the clear sky in the hours that a column stands for. */
function clearCourse(
  year: Pick<WeatherYear, 'site' | 'hours' | 'sourceYear'>,
  stands: Stands,
): Float64Array {
  const perHour = 12;
  const track = sunTrack(year, 3600 / perHour);
  const offset = Math.round(windowStartH(stands) * perHour);
  return Float64Array.from({ length: year.hours }, (_, h) => {
    let sum = 0;
    for (let s = 0; s < perHour; s++) {
      const k = (h * perHour + s + offset + track.count) % track.count;
      sum += track.sunlitShare[k] * haurwitzWPerM2(90 - track.altitudeDeg[k]);
    }
    return sum / perHour;
  });
}

/**
 * The verdict from the days' shifts: of every month its clearest days.
 * @param groupOf month, or any other group, of a day
 */
export function sunTimeOf(
  days: readonly DayShift[],
  groupOf: (day: number) => number,
  site: Site,
): SunTimeCheck {
  return verdict(
    clearestDays(days, groupOf).map(({ shiftMinutes }) => shiftMinutes),
    site,
  );
}

/** The clearest days of every group, in order. */
export function clearestDays(
  days: readonly DayShift[],
  groupOf: (day: number) => number,
): readonly DayShift[] {
  const groups = new Map<number, DayShift[]>();
  for (const day of days) {
    const group = groupOf(day.day);
    const list = groups.get(group);
    if (list) list.push(day);
    else groups.set(group, [day]);
  }
  return [...groups.values()]
    .flatMap((list) => list.sort((a, b) => b.clearness - a.clearness).slice(0, daysPerMonth))
    .sort((a, b) => a.day - b.day);
}

function verdict(shifts: readonly number[], site: Site): SunTimeCheck {
  const daysUsed = shifts.length;
  if (daysUsed < 12)
    return {
      shiftMinutes: null,
      spreadMinutes: 0,
      daysUsed,
      isSuspect: false,
      causes: [],
      text: 'Too few days with sun to compare the clock of the table with the sun.',
    };
  const { minutes: shiftMinutes, spreadMinutes } = middleOf(shifts);
  const isSuspect = Math.abs(shiftMinutes) >= suspectShiftMinutes;
  const minutes = Math.round(Math.abs(shiftMinutes));
  const way = shiftMinutes < 0 ? 'before' : 'after';
  const causes = isSuspect ? shiftCauses(shiftMinutes, site).map((cause) => cause.text) : [];
  const perhaps =
    causes.length > 0 ? ` It would fit that ${causes.slice(0, 3).join(', or that ')}.` : '';
  const text = isSuspect
    ? `The light of the table comes ${minutes} minutes ${way} the sun of this site (${daysUsed} clear days, ±${Math.round(spreadMinutes)}): check the offset from UTC, daylight saving, the longitude's sign, and whether rows are stamped at the start or the end of their hour.${perhaps}`
    : `The light of the table agrees with the sun of this site: ${minutes} minutes ${way} it on ${daysUsed} clear days (±${Math.round(spreadMinutes)}).`;
  return { shiftMinutes, spreadMinutes, daysUsed, isSuspect, causes, text };
}
