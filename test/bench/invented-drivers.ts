// Drivers for the family where its own weather table is not there: times compare, results do not.

import type { Drivers } from './family-drivers.ts';

/** A year of sinusoids with the level and swing of a continental place. */
export function inventedDrivers(): Drivers {
  const hourly = (of: (yearTurn: number, dayTurn: number, sun: number) => number) =>
    Float64Array.from({ length: 8760 }, (_, k) => {
      const hour = (k % 24) + 0.5;
      const yearTurn = -Math.cos((2 * Math.PI * (k - 480)) / 8760);
      const sun = Math.max(0, Math.sin((Math.PI * (hour - 6)) / 12)) * (0.7 + 0.3 * yearTurn);
      return of(yearTurn, -Math.cos((2 * Math.PI * (hour - 3)) / 24), sun);
    });
  const outdoorC = hourly((year, day) => 10 + 12 * year + 5 * day);
  return {
    outdoorC,
    skyC: outdoorC.map((tempC) => 0.0552 * (tempC + 273.15) ** 1.5 - 273.15),
    groundC: hourly((year) => 10 + 4 * year),
    windMPerS: hourly((_, day) => 4 + day),
    south: hourly((_year, _day, sun) => 450 * sun),
    north: hourly((_year, _day, sun) => 150 * sun),
    west: hourly((_year, day, sun) => (300 + 100 * day) * sun),
    east: hourly((_year, day, sun) => (300 - 100 * day) * sun),
    roof: hourly((_year, _day, sun) => 650 * sun),
  };
}
