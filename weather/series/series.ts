// Weather on an even time axis of any interval from 1 minute to 3 hours and any length: what a mapped
// table becomes before a year is taken from it. Values may be missing (NaN).

import type { MappedQuantity } from '../map/mapping.ts';
import type { Quantity } from '../read/quantities.ts';
import type { Site, Stands, WeatherNote } from '../weather-year.ts';

export interface SeriesColumn {
  readonly quantity: MappedQuantity;
  readonly heading: string;
  /** `at` counted in intervals: 0 start, 1 end of its own. */
  readonly stands: Stands;
  readonly origin: 'read' | 'derived' | 'assumed';
  readonly values: Float64Array;
}

export interface WeatherSeries {
  readonly file: string;
  readonly site: Site;
  readonly form: string;
  /** Start of step 0: local standard time, seconds since 1970-01-01 00:00. */
  readonly startS: number;
  readonly intervalS: number;
  readonly count: number;
  /** Months put together from several years, on the calendar of one: joins between months may jump. */
  readonly isStitched: boolean;
  /** Year that each step was measured in; the sun follows it. */
  readonly sourceYear: Int16Array;
  /** Row in the file of each step, 0 where it has none. */
  readonly rowOf: Int32Array;
  readonly columns: readonly SeriesColumn[];
  readonly notes: readonly WeatherNote[];
}

export function columnOf(
  series: WeatherSeries,
  quantity: MappedQuantity,
): SeriesColumn | undefined {
  return series.columns.find((column) => column.quantity === quantity);
}

/** The series with other columns in place of those of the same quantity, or beside them. */
export function withColumns(series: WeatherSeries, next: readonly SeriesColumn[]): WeatherSeries {
  const kept = series.columns.filter(
    (column) => !next.some(({ quantity }) => quantity === column.quantity),
  );
  return { ...series, columns: [...kept, ...next] };
}

const pad = (n: number) => String(n).padStart(2, '0');

/** "2023-08-14 02:00" of a moment on the series' clock. */
export function momentText(seconds: number): string {
  const date = new Date(Math.round(seconds) * 1000);
  const day = `${date.getUTCFullYear()}-${pad(date.getUTCMonth() + 1)}-${pad(date.getUTCDate())}`;
  return `${day} ${pad(date.getUTCHours())}:${pad(date.getUTCMinutes())}`;
}

export function stepText(series: WeatherSeries, k: number): string {
  return momentText(series.startS + k * series.intervalS);
}

export type { Quantity };
