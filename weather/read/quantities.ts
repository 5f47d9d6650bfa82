// What a weather table may hold: the columns of a WeatherYear, with the limits of what nature does.
import type { WeatherYear } from '../weather-year.ts';

export const quantities = [
  'dryBulbC',
  'dewPointC',
  'relativeHumidity',
  'pressurePa',
  'windMPerS',
  'windFromDeg',
  'ghiWPerM2',
  'dniWPerM2',
  'dhiWPerM2',
  'horizontalInfraredWPerM2',
  'skyCover',
  'opaqueSkyCover',
  'ceilingM',
  'albedo',
] as const satisfies readonly (keyof WeatherYear)[];

export type Quantity = (typeof quantities)[number];

/** Columns without which a table still serves: dropped with a note where they have long gaps. */
export const spareQuantities: ReadonlySet<Quantity> = new Set<Quantity>([
  'horizontalInfraredWPerM2',
  'skyCover',
  'opaqueSkyCover',
  'ceilingM',
  'albedo',
]);

export const radiationQuantities: ReadonlySet<Quantity> = new Set<Quantity>([
  'ghiWPerM2',
  'dniWPerM2',
  'dhiWPerM2',
]);

/**
 * Least and greatest hourly value that is believed, in SI. Air: records on land are -89.2 and
 * 56.7 °C, 1084.8 hPa, 113 m/s in a gust (WMO archive of weather extremes). Radiation: below the
 * extraterrestrial 1412 W/m² with a margin for light thrown back by clouds.
 */
export const limits: Readonly<Record<Quantity, readonly [number, number]>> = {
  dryBulbC: [-90, 65],
  dewPointC: [-100, 45],
  relativeHumidity: [0, 1],
  pressurePa: [30000, 110000],
  windMPerS: [0, 115],
  windFromDeg: [0, 360],
  ghiWPerM2: [0, 1600],
  dniWPerM2: [0, 1420],
  dhiWPerM2: [0, 1200],
  horizontalInfraredWPerM2: [40, 700],
  skyCover: [0, 1],
  opaqueSkyCover: [0, 1],
  ceilingM: [0, 30000],
  albedo: [0, 1],
};

/**
 * How far outside its limits a value is taken for an instrument's error and drawn back, counted in a
 * note: zero offsets of pyranometers at night, humidity sensors above saturation.
 */
export const slack: Readonly<Partial<Record<Quantity, number>>> = {
  relativeHumidity: 0.1,
  ghiWPerM2: 10,
  dniWPerM2: 10,
  dhiWPerM2: 10,
};
