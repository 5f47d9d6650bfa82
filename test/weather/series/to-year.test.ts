// Any interval and length becomes a year of hours: energies are kept, states stay in order.
// References: sums of the table that the test writes; the definition of the mean.
import { describe, expect, test } from 'vitest';
import {
  faultText,
  type Inspection,
  inspectTable,
  type MappedTable,
  type Mapping,
  readMapped,
  type WeatherYear,
  weatherSteps,
  type YearChoice,
  yearOf,
} from '../../../weather/index.ts';
import { hillside, inventedYear } from '../invented-year.ts';

const source = inventedYear(hillside, { year: 2023 });
const steps5 = weatherSteps(source, 300);

const mapping: Mapping = {
  format: 'inglenook-weather-mapping',
  version: 1,
  name: 'test',
  table: { delimiter: ',', decimal: '.', thousands: '', headingRow: 1, firstRow: 2 },
  stamp: {
    parts: [{ column: 'time', reads: 'dateTime', order: 'ymd' }],
    marks: 'start',
    clock: { kind: 'site' },
  },
  columns: [
    { column: 't', quantity: 'dryBulbC', unit: '°C', stands: 'mean' },
    { column: 'td', quantity: 'dewPointC', unit: '°C', stands: 'mean' },
    { column: 'w', quantity: 'windMPerS', unit: 'm/s', stands: 'mean' },
    { column: 'g', quantity: 'ghiWPerM2', unit: 'W/m²', stands: 'mean' },
    { column: 'd', quantity: 'dhiWPerM2', unit: 'W/m²', stands: 'mean' },
  ],
  missing: [],
  site: hillside,
};

/** A table of the invented year every so many minutes, from its 5-minute course. */
function tableOf(minutes: number, fromDay = 0, days = 365, year = 2023): string {
  const lines = ['time,t,td,w,g,d'];
  const per = minutes / 5;
  const mean = (values: Float64Array, k: number) => {
    if (per < 1) return values[Math.floor(k * per) % values.length];
    let sum = 0;
    for (let s = 0; s < per; s++) sum += values[(k * per + s) % 105120];
    return sum / per;
  };
  for (let k = (fromDay * 1440) / minutes; k < ((fromDay + days) * 1440) / minutes; k++) {
    const at = new Date(Date.UTC(year, 0, 1) + k * minutes * 60000).toISOString().slice(0, 16);
    const cells = [
      steps5.dryBulbC,
      steps5.dewPointC,
      steps5.windMPerS,
      steps5.ghiWPerM2,
      steps5.dhiWPerM2,
    ].map((values) => mean(values, k).toFixed(4));
    lines.push(`${at},${cells.join(',')}`);
  }
  return lines.join('\n');
}

function table(text: string, how: Mapping = mapping): MappedTable {
  const read = readMapped(text, how);
  if (!read.ok) throw new Error(read.faults.map(faultText).join('\n'));
  return read.value;
}

function inspected(
  text: string,
  accepted: ReadonlySet<string> | 'all' = new Set(),
  how = mapping,
): Inspection {
  const found = inspectTable(table(text, how), accepted);
  if (!found.ok) throw new Error(found.faults.map(faultText).join('\n'));
  return found.value;
}

function year(text: string, choice: YearChoice = { kind: 'auto' }): WeatherYear {
  const made = yearOf(inspected(text), choice);
  if (!made.ok) throw new Error(made.faults.map(faultText).join('\n'));
  return made.value;
}

const isOrdered = (low: Float64Array, high: Float64Array) =>
  low.every((value, k) => value <= high[k] + 1e-9);
const sum = (values: Float64Array) => values.reduce((total, value) => total + value, 0);

describe.each([10, 30, 60, 90, 120, 180])('every %i minutes', (minutes) => {
  const text = tableOf(minutes);
  const read = table(text);
  const made = year(text);
  test('the energy of the year is that of the table', () => {
    const ghi =
      read.columns.find(({ quantity }) => quantity === 'ghiWPerM2')?.values ?? new Float64Array();
    const inTable = (sum(ghi) * minutes) / 60;
    expect(Math.abs(sum(made.ghiWPerM2.values) / inTable - 1)).toBeLessThan(1e-9);
  });
  test('no light comes while the sun is down, and none is negative', () => {
    const dark = Array.from(source.ghiWPerM2.values).flatMap((_, h, all) =>
      [h, h + 1, h + 8759].every((k) => all[k % 8760] === 0) ? [h] : [],
    );
    expect(dark.length).toBeGreaterThan(3000);
    expect([...dark].filter((h) => made.ghiWPerM2.values[h] !== 0)).toEqual([]);
    expect(made.ghiWPerM2.values.every((value) => value >= 0)).toBe(true);
  });
  test('the mean of the air is that of the table, and the dew point never lies above it', () => {
    const air =
      read.columns.find(({ quantity }) => quantity === 'dryBulbC')?.values ?? new Float64Array();
    expect(Math.abs(sum(made.dryBulbC.values) / 8760 - sum(air) / air.length)).toBeLessThan(0.01);
    expect(isOrdered(made.dewPointC.values, made.dryBulbC.values)).toBe(true);
  });
  test('at every step of a run the energy is still that of the table', () => {
    const inTable = sum(made.ghiWPerM2.values);
    for (const stepS of [600, 900]) {
      const steps = weatherSteps(made, stepS);
      expect(Math.abs((sum(steps.ghiWPerM2) * stepS) / 3600 / inTable - 1)).toBeLessThan(1e-9);
      expect(isOrdered(steps.dewPointC, steps.dryBulbC)).toBe(true);
    }
  });
});

test('steps of 5 minutes follow a table of 5 minutes: a cloud of ten minutes is seen', () => {
  const lines = tableOf(5).split('\n');
  const noon = lines.findIndex((line) => line.startsWith('2023-06-21T12:00'));
  for (const i of [noon, noon + 1]) lines[i] = lines[i].replace(/,[\d.]+,([\d.]+)$/, ',$1,$1');
  const made = year(lines.join('\n'));
  const steps = weatherSteps(made, 300);
  const k = noon - 1;
  expect(steps.ghiWPerM2[k]).toBeLessThan(steps.ghiWPerM2[k + 3] * 0.5);
  expect(steps.ghiWPerM2[k - 1]).toBeGreaterThan(steps.ghiWPerM2[k] * 2);
});

describe('length', () => {
  const three = [
    tableOf(60, 0, 365, 2021),
    ...[2022, 2023].map((y) => tableOf(60, 0, 365, y).split('\n').slice(1).join('\n')),
  ].join('\n');
  test('of several years one has to be chosen', () => {
    const made = yearOf(inspected(three));
    expect(made.ok ? '' : made.faults.map(faultText).join()).toContain(
      'several whole years: 2021 (100 %), 2022 (100 %), 2023 (100 %)',
    );
    expect(year(three, { kind: 'year', year: 2022 }).year).toBe(2022);
  });
  test('twelve months from a day are laid on the calendar, each hour with its own year', () => {
    const made = year(three, { kind: 'from', year: 2021, month: 7, day: 1 });
    expect(made.sourceYear[0]).toBe(2022);
    expect(made.sourceYear[8759]).toBe(2021);
    expect(made.ghiWPerM2.values[4380]).toBeCloseTo(
      year(three, { kind: 'year', year: 2021 }).ghiWPerM2.values[4380],
      3,
    );
  });
  test('a part of a year is refused, and taken with its ends repeated when asked for', () => {
    const part = tableOf(60, 120, 60);
    const refused = yearOf(inspected(part));
    expect(refused.ok ? '' : refused.faults.map(faultText).join()).toContain(
      'no whole calendar year',
    );
    const made = year(part, { kind: 'part' });
    expect(made.covers).toEqual({ fromHour: 120 * 24, toHour: 180 * 24 });
    expect(made.dryBulbC.values[12]).toBe(made.dryBulbC.values[120 * 24 + 12]);
    expect(made.notes.map(({ text }) => text).join()).toContain(
      'results hold between these days alone',
    );
  });
  test('a year in UTC comes round from its other end', () => {
    const utc = {
      ...mapping,
      stamp: { ...mapping.stamp, clock: { kind: 'offset' as const, utcOffsetH: 0 } },
    };
    const made = yearOf(inspected(tableOf(60), new Set(), utc));
    if (!made.ok) throw new Error(made.faults.map(faultText).join());
    const plain = year(tableOf(60));
    expect(made.value.dryBulbC.values[1000]).toBe(plain.dryBulbC.values[999]);
    expect(made.value.dryBulbC.values[0]).toBe(plain.dryBulbC.values[8759]);
  });
});

test('a zone with a clock change is read by its own rules, every hour once', () => {
  const zone = {
    ...mapping,
    stamp: { ...mapping.stamp, clock: { kind: 'zone' as const, zone: 'Europe/Berlin' } },
  };
  const lines = tableOf(60)
    .split('\n')
    .map((line, i) => {
      if (i === 0) return line;
      const utc = new Date(Date.UTC(2023, 0, 1) + (i - 1) * 3600000 - 3600000);
      const summer = utc >= new Date('2023-03-26T01:00Z') && utc < new Date('2023-10-29T01:00Z');
      const civil = new Date(utc.getTime() + (summer ? 2 : 1) * 3600000).toISOString().slice(0, 16);
      return `${civil}${line.slice(16)}`;
    });
  const civil = table(lines.join('\n'), zone);
  const plain = table(tableOf(60));
  expect(Array.from(civil.startS)).toEqual(Array.from(plain.startS));
  // The same stamps taken for standard time: the missing and the double hour tell.
  const found = inspected(lines.join('\n'));
  expect(found.findings.map(({ id }) => id)).toContain('summer-time');
  const mended = yearOf(inspected(lines.join('\n'), new Set(['summer-time'])));
  if (!mended.ok) throw new Error(mended.faults.map(faultText).join());
  expect(mended.value.ghiWPerM2.values).toEqual(year(tableOf(60)).ghiWPerM2.values);
});
