// The hottest or coldest stretch of a series of years: a calendar year, or any twelve months.

import { spellOf } from '../climate/spells.ts';
import { dateOfDay } from '../map/date-text.ts';
import { columnOf, type WeatherSeries } from '../series/series.ts';
import type { YearChoice } from '../series/span.ts';

export interface ExtremeRun {
  readonly choice: YearChoice;
  readonly meanDryBulbC: number;
  /** First day, and how many. */
  readonly year: number;
  readonly month: number;
  readonly day: number;
  readonly days: number;
}

/**
 * @param days length of the run, 365 for a year
 * @returns null where the series is shorter, or has no air temperature
 */
export function extremeRun(
  series: WeatherSeries,
  which: 'hottest' | 'coldest',
  days = 365,
): ExtremeRun | null {
  const air = columnOf(series, 'dryBulbC');
  if (!air) return null;
  const perDay = 86400 / series.intervalS;
  const firstDay = Math.ceil(series.startS / 86400 - 1e-9);
  const lead = Math.round((firstDay * 86400 - series.startS) / series.intervalS);
  const daily = Float64Array.from(
    { length: Math.floor((series.count - lead) / perDay) },
    (_, d) => {
      let sum = 0;
      for (let s = 0; s < perDay; s++) sum += air.values[lead + d * perDay + s];
      return sum / perDay;
    },
  );
  const spell = spellOf(daily, days, which);
  if (!spell) return null;
  const date = dateOfDay(firstDay + spell.firstDay);
  return { choice: { kind: 'from', ...date }, meanDryBulbC: spell.meanDryBulbC, days, ...date };
}
