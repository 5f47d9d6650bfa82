// An invented weather year from simple curves, for tests that need no real table: the sun's own
// geometry at a place, an even haze, warm afternoons.
import {
  dewPointFromHumidityC,
  relativeHumidityFromDewPoint,
  type Site,
  type Stands,
  sunTrack,
  type WeatherColumn,
  type WeatherYear,
} from '../../weather/index.ts';

export const hillside: Site = {
  name: 'Hillside',
  latitudeDeg: 47.5,
  longitudeDeg: 9,
  elevationM: 480,
  utcOffsetH: 1,
};

export function inventedYear(
  site: Site = hillside,
  options: { readonly hours?: number; readonly year?: number; readonly readAt?: number } = {},
): WeatherYear {
  const { hours = 8760, year = 2019, readAt } = options;
  const sourceYear = new Int16Array(hours).fill(year);
  const track = sunTrack({ site, hours, sourceYear }, 3600);
  const air: Stands = readAt === undefined ? { kind: 'mean' } : { kind: 'reading', at: readAt };
  const column = (value: (h: number) => number, stands: Stands = air): WeatherColumn => ({
    values: Float64Array.from({ length: hours }, (_, h) => value(h)),
    stands,
    origin: 'read',
  });
  const season = (h: number) => -Math.cos((2 * Math.PI * (h - 480)) / hours);
  const daily = (h: number) => -Math.cos((2 * Math.PI * ((h % 24) - 3)) / 24);
  const dryBulbC = (h: number) => 9 + 10 * season(h) + 4 * daily(h);
  const dewPoint = (h: number) => dewPointFromHumidityC(dryBulbC(h), 0.7 - 0.15 * daily(h));
  const mean: Stands = { kind: 'mean' };
  const lit = (h: number) => track.sunlitShare[h];
  const up = (h: number) => Math.max(0, track.up[h]);
  const dni = (h: number) => Math.round(lit(h) * 700 * Math.exp(-0.15 / Math.max(up(h), 0.02)));
  const dhi = (h: number) => Math.round(lit(h) * 150 * Math.sqrt(up(h)));
  return {
    site,
    form: 'plain table',
    year,
    hours,
    sourceYear,
    dryBulbC: column(dryBulbC),
    dewPointC: column(dewPoint),
    relativeHumidity: column((h) => relativeHumidityFromDewPoint(dryBulbC(h), dewPoint(h))),
    pressurePa: column((h) => 95700 + 300 * season(h * 7)),
    windMPerS: column((h) => 3 + 1.5 * daily(h)),
    windFromDeg: column((h) => (h * 7) % 360),
    ghiWPerM2: column((h) => dni(h) * up(h) + dhi(h), mean),
    dniWPerM2: column(dni, mean),
    dhiWPerM2: column(dhi, mean),
    notes: [],
  };
}
