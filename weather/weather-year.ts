// A weather table after reading: hourly typed arrays in SI on one time axis, with every repair and
// assumption beside it.
//
// Time axis: index h covers the hour h:00 to h+1:00 of local standard time (a fixed offset from UTC,
// no daylight saving), counted from 1 January 00:00. Readers shift their file's stamps to it. Tables of another interval are
// brought to hours with their energy kept (series/to-year.ts); where theirs is shorter, `fine` holds it.

/** Where the weather was taken, and the clock it is written in. */
export interface Site {
  readonly name: string;
  /** North positive, -90 to 90. */
  readonly latitudeDeg: number;
  /** East positive, -180 to 180. */
  readonly longitudeDeg: number;
  readonly elevationM: number;
  /** Local standard time minus UTC, -12 to 14. */
  readonly utcOffsetH: number;
}

/**
 * What one value of a column says about its hour: the mean over it, or a reading at one moment,
 * `at` = 0 at its start, 0.5 in its middle, 1 at its end; a little outside where a file's moments are.
 * A radiation reading stands for the hour centred on its moment.
 */
export type Stands = { readonly kind: 'mean' } | { readonly kind: 'reading'; readonly at: number };

/** One column: value of hour h is `values[h]`, always finite. */
export interface WeatherColumn {
  readonly values: Float64Array;
  readonly stands: Stands;
  /** Whether the file held it, or it was computed from other columns, or a default was taken. */
  readonly origin: 'read' | 'derived' | 'assumed';
}

/** Something that was mended or assumed, for the results and the report. */
export interface WeatherNote {
  readonly kind: 'repair' | 'assumption';
  /** What was done, with counts and rows, as a sentence. */
  readonly text: string;
  /** How many hourly values it touched. */
  readonly count: number;
}

/**
 * The same weather at the shorter interval that the table holds, for steps finer than an hour. The
 * hourly columns are its means, so that whoever knows hours only is served by them.
 */
export interface FineWeather {
  /** Seconds; divides 3600. */
  readonly intervalS: number;
  /** `hours * 3600 / intervalS` values each; `at` of a reading counts in intervals. */
  readonly columns: Readonly<Partial<Record<FineQuantity, WeatherColumn>>>;
}

export type FineQuantity =
  | 'dryBulbC'
  | 'dewPointC'
  | 'pressurePa'
  | 'windMPerS'
  | 'windFromDeg'
  | 'ghiWPerM2'
  | 'dniWPerM2'
  | 'dhiWPerM2';

export interface WeatherYear {
  readonly site: Site;
  /** Data-set form the file was recognised as, for example "TMY3". */
  readonly form: string;
  /** The calendar that weekdays follow. */
  readonly year: number;
  /** 8760, or 8784 in a leap year that the file really holds. */
  readonly hours: number;
  /** The year each hour was taken from (a typical year is stitched from several): the sun follows it. */
  readonly sourceYear: Int16Array;
  readonly dryBulbC: WeatherColumn;
  readonly dewPointC: WeatherColumn;
  /** Share, 0 to 1. */
  readonly relativeHumidity: WeatherColumn;
  readonly pressurePa: WeatherColumn;
  readonly windMPerS: WeatherColumn;
  /** Direction the wind comes from, clockwise from north. */
  readonly windFromDeg: WeatherColumn;
  readonly ghiWPerM2: WeatherColumn;
  readonly dniWPerM2: WeatherColumn;
  readonly dhiWPerM2: WeatherColumn;
  /** Absent where the file has none; then the sky's temperature comes from the columns below. */
  readonly horizontalInfraredWPerM2?: WeatherColumn;
  /** Share of the sky, 0 to 1. */
  readonly skyCover?: WeatherColumn;
  readonly opaqueSkyCover?: WeatherColumn;
  /** Height of the cloud base; `Infinity` where the sky is unlimited. */
  readonly ceilingM?: WeatherColumn;
  /** Ground reflectance, 0 to 1. */
  readonly albedo?: WeatherColumn;
  readonly fine?: FineWeather;
  /** Hours that the table covers, where it is a part of the year; the rest repeats its ends. */
  readonly covers?: { readonly fromHour: number; readonly toHour: number };
  readonly notes: readonly WeatherNote[];
}
