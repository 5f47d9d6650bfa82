// The calendar of a run: for every step the day, the weekday and the hour that people's clocks show.
import { civilAheadH, firstWeekday } from '../../weather/index.ts';
import type { Calendar } from '../building/index.ts';

export interface StepClock {
  readonly stepS: number;
  readonly count: number;
  /** Day of the year in civil time, 0 for 1 January. */
  readonly day: Int32Array;
  /** Civil hour of the day at the step's start, 0 to below 24. */
  readonly hourOfDay: Float64Array;
  /** 1 Monday to 7 Sunday, of each day of the year. */
  readonly weekday: Int8Array;
  /** "MM-DD" of each day of the year. */
  readonly monthDay: readonly string[];
  /** Schedules already laid out on these steps, by id and place in the step. */
  readonly laidOut: Map<string, Float64Array>;
}

const daysInMonth = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

/**
 * @param calendar the project's; its year decides weekdays and clock changes
 * @param weather year, standard-time offset and length of the weather table
 */
export function stepClock(
  calendar: Calendar,
  weather: { readonly year: number; readonly hours: number; readonly utcOffsetH: number },
  stepS: number,
): StepClock {
  const year = calendar.year ?? weather.year;
  const ahead = civilAheadH(year, weather.utcOffsetH, calendar.zone, weather.hours);
  const days = weather.hours / 24;
  const perHour = 3600 / stepS;
  const count = weather.hours * perHour;
  const day = new Int32Array(count);
  const hourOfDay = new Float64Array(count);
  for (let k = 0; k < count; k++) {
    const atH = k / perHour + ahead[Math.floor(k / perHour)];
    day[k] = (Math.floor(atH / 24) + days) % days;
    hourOfDay[k] = atH - Math.floor(atH / 24) * 24;
  }
  const monthDay: string[] = [];
  daysInMonth.forEach((length, m) => {
    const leap = m === 1 && days === 366 ? 1 : 0;
    for (let d = 1; d <= length + leap; d++)
      monthDay.push(`${String(m + 1).padStart(2, '0')}-${String(d).padStart(2, '0')}`);
  });
  const first = firstWeekday(year);
  const weekday = Int8Array.from({ length: days }, (_, d) => ((first - 1 + d) % 7) + 1);
  return { stepS, count, day, hourOfDay, weekday, monthDay, laidOut: new Map() };
}
