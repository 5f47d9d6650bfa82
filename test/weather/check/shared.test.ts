// The checks on open tables: no false alarm on the originals, and every shift of the clock found.
// Reference: the tables themselves, which are right, and the shift that the test makes.
import { describe, expect } from 'vitest';
import {
  inspectSeries,
  seriesOfYear,
  sunTimeCheck,
  type WeatherYear,
} from '../../../weather/index.ts';
import {
  optionsFor,
  psmTable,
  pvgisTable,
  testTable,
  tmy3Tables,
  yearOf,
} from '../shared-tables.ts';

const all = [...tmy3Tables, pvgisTable, psmTable];

/** The year with its light moved later by whole hours, or by the half hour in between. */
function shifted(year: WeatherYear, minutes: number): WeatherYear {
  const hours = Math.floor(minutes / 60);
  const half = minutes - hours * 60 === 30;
  const { values, stands } = year.ghiWPerM2;
  const n = values.length;
  const at = (h: number) => values[(((h - hours) % n) + n) % n];
  const moved = values.map((_, h) => (half ? (at(h) + at(h - 1)) / 2 : at(h)));
  return { ...year, ghiWPerM2: { values: moved, stands, origin: 'read' } };
}

describe.each(all)('%s', (name) => {
  testTable('no check finds anything in an original, least of all its clock', name, (bytes) => {
    const year = yearOf(bytes, optionsFor(name));
    const { findings, sunTime, season } = inspectSeries(seriesOfYear(year, name));
    expect(findings.map(({ text }) => text)).toEqual([]);
    expect(season).toBe(null);
    expect(sunTime?.isSuspect).toBe(false);
  });

  testTable(
    'a clock shifted by 30 minutes or more is found to the quarter of an hour',
    name,
    (bytes) => {
      const year = yearOf(bytes, optionsFor(name));
      for (const minutes of [-720, -420, -120, -60, -30, 30, 60, 120, 300, 600]) {
        const check = sunTimeCheck(shifted(year, minutes));
        expect(check.isSuspect).toBe(true);
        const off = Math.abs((check.shiftMinutes ?? 0) - minutes);
        expect(Math.min(off, 1440 - off)).toBeLessThan(15);
      }
    },
  );

  testTable('a longitude of the other sign is found and named', name, (bytes) => {
    const year = yearOf(bytes, optionsFor(name));
    const site = { ...year.site, longitudeDeg: -year.site.longitudeDeg };
    const check = sunTimeCheck({ ...year, site });
    expect(check.isSuspect).toBe(true);
    expect(check.causes.join()).toContain('longitude has the wrong sign');
  });

  testTable('summer time in the stamps is found by the light', name, (bytes) => {
    const year = yearOf(bytes, optionsFor(name));
    const late = shifted(year, 60).ghiWPerM2.values;
    const values = year.ghiWPerM2.values.map((value, h) =>
      h >= 86 * 24 && h < 302 * 24 ? late[h] : value,
    );
    const series = seriesOfYear({ ...year, ghiWPerM2: { ...year.ghiWPerM2, values } }, name);
    const { season } = inspectSeries(series);
    expect(season).not.toBe(null);
    expect(Math.abs((season?.fromDay ?? 0) - 86)).toBeLessThan(16);
    expect(Math.abs((season?.toDay ?? 0) - 302)).toBeLessThan(16);
  });
});
