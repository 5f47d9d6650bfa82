// How one kind of table is read: which column holds what, in which unit, and on which clock. Plain
// JSON, so that it can be saved beside a project, named, and offered again for tables of its shape.
import { type Quantity, quantities } from '../read/quantities.ts';
import type { Site } from '../weather-year.ts';

/** What a column may hold beside the columns of a weather year: turned into one of those at reading. */
export const sourceQuantities = [
  'wetBulbC',
  'humidityRatio',
  'vapourPressurePa',
  'seaLevelPressurePa',
  'beamHorizontalWPerM2',
] as const;

export type SourceQuantity = (typeof sourceQuantities)[number];
export type MappedQuantity = Quantity | SourceQuantity;
export const mappedQuantities: readonly MappedQuantity[] = [...quantities, ...sourceQuantities];

/** A column by its heading, or by its number, counted from 1. */
export type ColumnRef = string | number;

/** What a cell of the stamp says. */
export const stampReads = [
  'dateTime',
  'date',
  'time',
  'year',
  'month',
  'day',
  'hour',
  'minute',
  'hourMinute',
  'dayOfYear',
  'hourOfYear',
  'epochSeconds',
  'epochMilliseconds',
  'spreadsheetDay',
] as const;
export type StampReads = (typeof stampReads)[number];

export const dateOrders = ['ymd', 'dmy', 'mdy'] as const;
export type DateOrder = (typeof dateOrders)[number];

export interface StampPart {
  readonly column: ColumnRef;
  readonly reads: StampReads;
  /** For dates: year, month and day in this order. */
  readonly order?: DateOrder;
}

/**
 * The clock of the stamps: local standard time of the site, a fixed offset from UTC, or the civil time
 * of a zone, which the clock change of summer moves.
 */
export type Clock =
  | { readonly kind: 'site' }
  | { readonly kind: 'offset'; readonly utcOffsetH: number }
  | { readonly kind: 'zone'; readonly zone: string };

export interface StampMapping {
  readonly parts: readonly StampPart[];
  /** The end of its interval that a stamp marks. Hours counted from 1 to 24 mark the end. */
  readonly marks: 'start' | 'middle' | 'end';
  readonly clock: Clock;
  /** For stamps that state no year. */
  readonly year?: number;
}

/** What a value says about its interval: the mean over it, or a reading at its stamp. */
export type MappedStands = 'mean' | 'reading';

export interface ColumnMapping {
  readonly column: ColumnRef;
  readonly quantity: MappedQuantity;
  /** Name of the unit as `unitsOf(quantity)` lists it. */
  readonly unit: string;
  readonly stands: MappedStands;
  /** Missing codes of this column only: numbers as in the file, or texts. */
  readonly missing?: readonly (number | string)[];
}

export const delimiters = [',', ';', '\t', '|', ' '] as const;
export type Delimiter = (typeof delimiters)[number];
export const thousandsMarks = ['', ',', '.', "'", ' '] as const;
export type ThousandsMark = (typeof thousandsMarks)[number];

export interface TableMapping {
  /** Between cells; a blank stands for any run of blanks. */
  readonly delimiter: Delimiter;
  readonly decimal: '.' | ',';
  readonly thousands: ThousandsMark;
  /** Row of the headings, counted from 1; 0: the table has none. */
  readonly headingRow: number;
  /** First row of values, counted from 1. */
  readonly firstRow: number;
}

export const mappingFormat = 'inglenook-weather-mapping';
export const mappingVersion = 1;

export interface Mapping {
  readonly format: typeof mappingFormat;
  readonly version: typeof mappingVersion;
  readonly name: string;
  /** Fingerprint of the tables it was made for, as `tableShape` writes it. */
  readonly shape?: string;
  readonly table: TableMapping;
  readonly stamp: StampMapping;
  readonly columns: readonly ColumnMapping[];
  /** Missing codes of all columns. An empty cell is missing always. */
  readonly missing: readonly (number | string)[];
  readonly site?: Partial<Site>;
}

/** What a quantity is called in sentences. */
export const quantityWords: Readonly<Record<MappedQuantity, string>> = {
  dryBulbC: 'air temperature',
  dewPointC: 'dew point',
  relativeHumidity: 'relative humidity',
  pressurePa: 'air pressure',
  windMPerS: 'wind speed',
  windFromDeg: 'wind direction',
  ghiWPerM2: 'global radiation',
  dniWPerM2: 'direct normal radiation',
  dhiWPerM2: 'diffuse radiation',
  horizontalInfraredWPerM2: 'infrared from the sky',
  skyCover: 'cloud cover',
  opaqueSkyCover: 'opaque cloud cover',
  ceilingM: 'height of the cloud base',
  albedo: 'ground reflectance',
  wetBulbC: 'wet bulb',
  humidityRatio: 'humidity ratio',
  vapourPressurePa: 'vapour pressure',
  seaLevelPressurePa: 'air pressure reduced to sea level',
  beamHorizontalWPerM2: 'direct radiation on the horizontal',
};
