// A clock that is put forward for a part of the year, seen in the light alone: the days' shifts fall into
// a level inside a stretch of days and another outside, about an hour apart.
import { type DayShift, middleOf } from '../repair/sun-phase.ts';

export interface SunSeason {
  /** Days of the table, from 0: the stretch within which the light comes later. */
  readonly fromDay: number;
  readonly toDay: number;
  readonly shiftMinutes: number;
  /** Shifts of the days outside it. */
  readonly outside: readonly number[];
}

const median = (values: readonly number[]) => {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)];
};

const spread = (values: readonly number[], level: number) =>
  values.reduce((sum, value) => sum + Math.min(40, Math.abs(value - level)), 0);

/** @param days clearest days of every month, in order */
export function seasonOf(days: readonly DayShift[]): SunSeason | null {
  const n = days.length;
  if (n < 24) return null;
  const shifts = days.map((day) => day.shiftMinutes);
  const about = middleOf(shifts).minutes;
  if (shifts.some((shift) => Math.abs(shift - about) > 360)) return null;
  const flat = spread(shifts, median(shifts));
  let best = flat;
  let found: SunSeason | null = null;
  for (let from = 3; from < n - 6; from += 1)
    for (let to = from + 6; to <= n - 3; to += 1) {
      const inside = shifts.slice(from, to);
      const outside = [...shifts.slice(0, from), ...shifts.slice(to)];
      const [one, two] = [median(inside), median(outside)];
      if (Math.abs(Math.abs(one - two) - 60) > 20) continue;
      const cost = spread(inside, one) + spread(outside, two);
      if (cost >= best) continue;
      best = cost;
      found =
        one > two
          ? { fromDay: days[from].day, toDay: days[to].day, shiftMinutes: one, outside }
          : { fromDay: days[from].day, toDay: days[to].day, shiftMinutes: two, outside: inside };
    }
  // Two levels have to explain the days far better than one.
  return found && best < flat * 0.45 ? found : null;
}
