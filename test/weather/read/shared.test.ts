import { describe, expect, test } from 'vitest';
import { readWeather, sunTimeCheck, type WeatherYear } from '../../../weather/index.ts';
import {
  optionsFor,
  psmTable,
  pvgisTable,
  rawColumn,
  testTable,
  tmy3Tables,
  yearOf,
} from '../shared-tables.ts';

const total = (values: ArrayLike<number>) => Array.from(values).reduce((a, b) => a + b, 0);
const mean = (values: Float64Array) => total(values) / values.length;
type Column = 'ghiWPerM2' | 'dniWPerM2' | 'dhiWPerM2' | 'dryBulbC' | 'windMPerS' | 'pressurePa';

// Heading of each column in the file and what one unit of it is in SI; the sum by a plain split of the
// lines has to come out, so no row is lost, doubled or taken from the next column.
const headings: Record<string, readonly (readonly [Column, string, number])[]> = {
  TMY3: [
    ['ghiWPerM2', 'GHI (W/m^2)', 1],
    ['dniWPerM2', 'DNI (W/m^2)', 1],
    ['dhiWPerM2', 'DHI (W/m^2)', 1],
    ['dryBulbC', 'Dry-bulb (C)', 1],
    ['windMPerS', 'Wspd (m/s)', 1],
    ['pressurePa', 'Pressure (mbar)', 100],
  ],
  'NSRDB PSM': [
    ['ghiWPerM2', 'GHI', 1],
    ['dniWPerM2', 'DNI', 1],
    ['dhiWPerM2', 'DHI', 1],
    ['dryBulbC', 'Temperature', 1],
    ['windMPerS', 'Wind Speed', 1],
    ['pressurePa', 'Pressure', 100],
  ],
  'PVGIS TMY': [
    ['ghiWPerM2', 'G(h)', 1],
    ['dniWPerM2', 'Gb(n)', 1],
    ['dhiWPerM2', 'Gd(h)', 1],
    ['dryBulbC', 'T2m', 1],
    ['windMPerS', 'WS10m', 1],
    ['pressurePa', 'SP', 1],
  ],
};

describe('the open tables', () => {
  for (const name of [...tmy3Tables, psmTable, pvgisTable]) {
    testTable('reads 8760 finite hours whose sums are those of the file', name, (bytes) => {
      const year = yearOf(bytes, optionsFor(name));
      expect(year.hours).toBe(8760);
      expect(year.sourceYear.length).toBe(8760);
      for (const [column, heading, scale] of headings[year.form]) {
        const { values } = year[column];
        expect(values.length).toBe(8760);
        expect(values.every(Number.isFinite)).toBe(true);
        const raw = rawColumn(bytes, heading);
        expect(raw.length).toBe(8760);
        const sum = total(raw) * scale;
        expect(Math.abs(total(values) - sum)).toBeLessThanOrEqual(1e-9 * Math.abs(sum));
      }
      expect(year.relativeHumidity.values.every((v) => v >= 0 && v <= 1)).toBe(true);
      expect(year.dewPointC.values.every(Number.isFinite)).toBe(true);
    });
  }

  testTable(
    'Denver has the means and sums of the fabric suite, section 1',
    'tmy3-725650.csv',
    (bytes) => {
      // test/reference/fabric-cases.md, section 1: figures to check the reading of the table, each to
      // its last printed digit.
      const year = yearOf(bytes, { file: 'denver' });
      expect(year.site).toEqual({
        name: 'DENVER INTL AP, CO',
        latitudeDeg: 39.833,
        longitudeDeg: -104.65,
        elevationM: 1650,
        utcOffsetH: -7,
      });
      expect(Math.abs(mean(year.dryBulbC.values) - 10.88)).toBeLessThan(0.005);
      expect(Math.min(...year.dryBulbC.values)).toBe(-19.4);
      expect(Math.max(...year.dryBulbC.values)).toBe(40);
      expect(Math.abs(mean(year.dewPointC.values) + 1.07)).toBeLessThan(0.005);
      expect(Math.abs(mean(year.windMPerS.values) - 3.92)).toBeLessThan(0.005);
      expect(Math.abs(mean(year.pressurePa.values) - 83460)).toBeLessThan(5);
      expect(Math.round(total(year.ghiWPerM2.values) / 1000)).toBe(1670);
      expect(Math.round(total(year.dniWPerM2.values) / 1000)).toBe(1978);
      expect(Math.round(total(year.dhiWPerM2.values) / 1000)).toBe(556);
    },
  );

  testTable(
    'TMY3 in its own form and as a spreadsheet saves it give the same values',
    'tmy3-723170-original.csv',
    (bytes) => {
      const text = new TextDecoder().decode(bytes);
      const mangled = text
        .split('\n')
        .map((line, i) => {
          if (i === 0) return `${line.replaceAll('"', '')},,,,,`;
          return line
            .replace(/^0(\d\/)/, '$1')
            .replace(/^(\d+\/)0(\d\/)/, '$1$2')
            .replace(',24:00,', ',24:00:00,')
            .replace(/,0(\d:00),/, ',$1,');
        })
        .join('\r\n');
      expect(mangled).toContain('24:00:00');
      const [one, two] = [yearOf(text, {}), yearOf(mangled, {})];
      expect(two.dryBulbC).toEqual(one.dryBulbC);
      expect(two.ghiWPerM2).toEqual(one.ghiWPerM2);
      expect(two.sourceYear).toEqual(one.sourceYear);
    },
  );

  testTable(
    'TMY3 stamps the end of the hour: 01:00 is hour 0, a reading at its end',
    'tmy3-725650.csv',
    (bytes) => {
      const year = yearOf(bytes, {});
      expect(year.dryBulbC.values[0]).toBe(-18); // row 3, 1/1/1995 1:00
      expect(year.dryBulbC.values[8759]).toBe(-19.4); // last row, 12/31/1994 24:00:00
      expect(year.dryBulbC.stands).toEqual({ kind: 'reading', at: 1 });
      expect(year.ghiWPerM2.values[7]).toBe(9); // row 10, 8:00
      expect(year.ghiWPerM2.stands).toEqual({ kind: 'mean' });
      expect(year.sourceYear[0]).toBe(1995);
      expect(year.ceilingM?.values[8759]).toBe(Number.POSITIVE_INFINITY);
      expect(year.opaqueSkyCover?.values[0]).toBe(0.2);
    },
  );

  testTable('PVGIS is moved from UTC to standard time by its longitude', pvgisTable, (bytes) => {
    const year = yearOf(bytes, { file: pvgisTable });
    expect(year.site.utcOffsetH).toBe(1);
    expect(year.dryBulbC.values[1]).toBe(2.04); // 20180101:0000 UTC is 01:00 here
    expect(year.dryBulbC.values[0]).toBe(2.1); // 20161231:2300 UTC comes to the start
    expect(year.dryBulbC.stands).toEqual({ kind: 'reading', at: 0 });
    expect(year.ghiWPerM2.stands).toEqual({ kind: 'reading', at: 0.1761 });
    expect(year.horizontalInfraredWPerM2?.values[1]).toBe(283.58);
    expect(year.dniWPerM2.values.some((v) => Object.is(v, -0))).toBe(false);
    expect(year.sourceYear[0]).toBe(2016);
    expect(year.sourceYear[24 * 45]).toBe(2007);
    expect(
      year.notes.some((note) => note.text.includes('UTC+1 was taken from the longitude')),
    ).toBe(true);
    const given = yearOf(bytes, { site: { utcOffsetH: 2.5 } });
    expect(given.dryBulbC.values[2]).toBe(2.04);
    expect(given.dryBulbC.stands).toEqual({ kind: 'reading', at: 0.5 });
  });

  testTable('the PSM table lacks a site, and each field is asked for', psmTable, (bytes) => {
    const read = readWeather(bytes, { file: psmTable });
    expect(read.ok).toBe(false);
    if (read.ok) return;
    expect(read.faults.map((fault) => ('path' in fault.place ? fault.place.path : ''))).toEqual([
      'site.latitudeDeg',
      'site.longitudeDeg',
      'site.elevationM',
      'site.utcOffsetH',
    ]);
    const year = yearOf(bytes, optionsFor(psmTable));
    expect(year.dryBulbC.stands).toEqual({ kind: 'reading', at: 0.5 });
    expect(year.relativeHumidity.origin).toBe('derived');
  });

  testTable('reading costs under 250 ms of the processor', 'tmy3-725650.csv', (bytes) => {
    // Best of five: other work on the machine only ever adds.
    const costs = Array.from({ length: 5 }, () => {
      const before = process.cpuUsage();
      yearOf(bytes, {});
      const used = process.cpuUsage(before);
      return (used.user + used.system) / 1000;
    });
    expect(Math.min(...costs)).toBeLessThan(250);
  });
});

describe('the clock of the open tables agrees with the sun', () => {
  const shifted = (year: WeatherYear, hours: number) =>
    sunTimeCheck({ ...year, site: { ...year.site, utcOffsetH: year.site.utcOffsetH + hours } });
  for (const name of [...tmy3Tables, pvgisTable]) {
    testTable('as it is; half an hour or more off is found', name, (bytes) => {
      const year = yearOf(bytes, optionsFor(name));
      const right = sunTimeCheck(year);
      expect(right.isSuspect, right.text).toBe(false);
      expect(Math.abs(right.shiftMinutes ?? 99)).toBeLessThan(5);
      for (const hours of [-2, -1, -0.5, 0.5, 1, 2]) {
        const wrong = shifted(year, hours);
        expect(wrong.isSuspect, `${hours} h: ${wrong.text}`).toBe(true);
        expect(Math.abs((wrong.shiftMinutes ?? 99) + hours * 60)).toBeLessThan(8);
      }
    });
  }
  test('a year without sun is not judged', () => {
    const dark = sunTimeCheck({
      site: { name: 'x', latitudeDeg: 0, longitudeDeg: 0, elevationM: 0, utcOffsetH: 0 },
      hours: 8760,
      sourceYear: new Int16Array(8760).fill(2018),
      ghiWPerM2: { values: new Float64Array(8760), stands: { kind: 'mean' }, origin: 'read' },
    });
    expect(dark.shiftMinutes).toBeNull();
    expect(dark.isSuspect).toBe(false);
  });
});
