// A weather year as a series, so that the checks of mapped tables serve data sets too.
import { isLeapYear } from '../calendar.ts';
import { dayNumber } from '../map/date-text.ts';
import { quantityWords } from '../map/mapping.ts';
import { quantities } from '../read/quantities.ts';
import type { WeatherYear } from '../weather-year.ts';
import type { SeriesColumn, WeatherSeries } from './series.ts';

/** Columns that were read; derived and assumed ones prove nothing. */
export function seriesOfYear(year: WeatherYear, file: string): WeatherSeries {
  const columns = quantities.flatMap((quantity): SeriesColumn[] => {
    const column = year[quantity];
    if (column?.origin !== 'read') return [];
    const { values, stands, origin } = column;
    return [{ quantity, heading: quantityWords[quantity], values, stands, origin }];
  });
  const isStitched = year.sourceYear.some((one) => one !== year.sourceYear[0]);
  const calendar = isLeapYear(year.year) === (year.hours === 8784) ? year.year : 2018;
  return {
    file,
    site: year.site,
    form: year.form,
    startS: dayNumber(calendar, 1, 1) * 86400,
    intervalS: 3600,
    count: year.hours,
    isStitched,
    sourceYear: year.sourceYear,
    rowOf: Int32Array.from({ length: year.hours }, (_, h) => h + 1),
    columns,
    notes: [],
  };
}
