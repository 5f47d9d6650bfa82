// Drivers of the benchmark family from a TMY3 table: hourly, held constant over the hour.

import Papa from 'papaparse';
import type { Series } from '../../engine/network/index.ts';

/** Hourly values, 8760 each. */
export interface Drivers {
  readonly outdoorC: Float64Array;
  readonly skyC: Float64Array;
  readonly groundC: Float64Array;
  readonly windMPerS: Float64Array;
  readonly south: Float64Array;
  readonly north: Float64Array;
  readonly west: Float64Array;
  readonly east: Float64Array;
  readonly roof: Float64Array;
}

const rad = Math.PI / 180;

/** Drivers after the family's formulas (Swinbank's sky, Cooper's declination). */
export function readDrivers(text: string): Drivers {
  const rows = Papa.parse<string[]>(text.trim()).data;
  const zone = Number(rows[0][3]);
  const latitude = Number(rows[0][4]) * rad;
  const longitude = Number(rows[0][5]);
  const column = (start: string) => {
    const at = rows[1].findIndex((name) => name.startsWith(start));
    return Float64Array.from(rows.slice(2), (row) => Number(row[at]));
  };
  const outdoorC = column('Dry-bulb');
  const wind = column('Wspd');
  const ghi = column('GHI (');
  const dni = column('DNI (');
  const dhi = column('DHI (');
  const mean = outdoorC.reduce((a, b) => a + b, 0) / 8760;
  const fresh = () => new Float64Array(8760);
  const [south, north, west, east] = [fresh(), fresh(), fresh(), fresh()];
  for (let k = 0; k < 8760; k++) {
    const day = Math.floor(k / 24) + 1;
    const declination = 23.45 * rad * Math.sin((2 * Math.PI * (284 + day)) / 365);
    const b = (2 * Math.PI * (day - 81)) / 364;
    const eot = 9.87 * Math.sin(2 * b) - 7.53 * Math.cos(b) - 1.5 * Math.sin(b);
    const hour = (k % 24) + 0.5 + eot / 60 + (longitude - 15 * zone) / 15;
    const angle = 15 * rad * (hour - 12);
    const up =
      Math.sin(latitude) * Math.sin(declination) +
      Math.cos(latitude) * Math.cos(declination) * Math.cos(angle);
    const toEast = -Math.cos(declination) * Math.sin(angle);
    const toNorth =
      Math.cos(latitude) * Math.sin(declination) -
      Math.sin(latitude) * Math.cos(declination) * Math.cos(angle);
    const beam = up > 0.03 ? dni[k] : 0;
    const diffuse = 0.5 * dhi[k] + 0.1 * ghi[k];
    south[k] = beam * Math.max(0, -toNorth) + diffuse;
    north[k] = beam * Math.max(0, toNorth) + diffuse;
    west[k] = beam * Math.max(0, -toEast) + diffuse;
    east[k] = beam * Math.max(0, toEast) + diffuse;
  }
  return {
    outdoorC,
    skyC: outdoorC.map((t) => 0.0552 * (t + 273.15) ** 1.5 - 273.15),
    groundC: outdoorC.map((_, k) => mean + 4 * Math.cos((2 * Math.PI * (k + 0.5 - 5500)) / 8760)),
    windMPerS: wind,
    south,
    north,
    west,
    east,
    roof: ghi,
  };
}

export const driverNames = [
  'outdoor',
  'sky',
  'ground',
  'south',
  'north',
  'west',
  'east',
  'roof',
  'film',
  'leak',
  'heat',
  'cool',
  'heaterMax',
  'chillerMax',
] as const;

/** All drivers that rooms share, step by step, in the order of `driverNames`. */
export function driverSeries(d: Drivers, stepsPerHour: number, hours: number): Series[] {
  const isDay = (hour: number) => hour >= 6 && hour <= 21;
  const hourly: Record<(typeof driverNames)[number], (hour: number) => number> = {
    outdoor: (h) => d.outdoorC[h],
    sky: (h) => d.skyC[h],
    ground: (h) => d.groundC[h],
    south: (h) => d.south[h],
    north: (h) => d.north[h],
    west: (h) => d.west[h],
    east: (h) => d.east[h],
    roof: (h) => d.roof[h],
    film: (h) => 4 + 4 * d.windMPerS[h],
    leak: (h) => 0.4 + 0.08 * d.windMPerS[h],
    heat: (h) => (isDay(h % 24) ? 20 : 16),
    cool: (h) => (isDay(h % 24) ? 26 : 30),
    heaterMax: () => 1500,
    chillerMax: () => 1000,
  };
  return driverNames.map((name) => ({
    name,
    hold: 'step',
    values: Float64Array.from({ length: hours * stepsPerHour }, (_, k) =>
      hourly[name](Math.floor(k / stepsPerHour)),
    ),
  }));
}
