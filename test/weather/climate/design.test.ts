// Design conditions, design day, morphed year and stored year. References: closed forms on invented
// years, and the formulas of the papers worked by hand in the test.
import { describe, expect, test } from 'vitest';
import {
  checkChanges,
  designDayHours,
  designTable,
  extremeRun,
  kastenYoungAirMass,
  morph,
  packYear,
  saturationPressurePa,
  seriesOfYear,
  turbiditySky,
  unpackYear,
  type WeatherYear,
} from '../../../weather/index.ts';
import { hillside, inventedYear } from '../invented-year.ts';
import { optionsFor, pvgisTable, testTable, tmy3Tables, yearOf } from '../shared-tables.ts';

const year = inventedYear();
const air = year.dryBulbC.values;
const mean = (values: ArrayLike<number>) =>
  Array.from(values).reduce((sum, v) => sum + v, 0) / values.length;

describe('design conditions', () => {
  const table = designTable(year);
  test('a percentile is exceeded in its share of the hours', () => {
    for (const { share, valueC } of [...table.heating, ...table.cooling]) {
      const above = air.filter((t) => t > valueC).length / 8760;
      expect(Math.abs(above - share)).toBeLessThan(1.5 / 8760); // between two ranks
    }
  });
  test('what comes with it is the mean of the hours within half a kelvin', () => {
    const [point] = table.cooling;
    const hours = Array.from(air.keys()).filter((h) => Math.abs(air[h] - point.valueC) <= 0.5);
    expect(point.hours).toBe(hours.length);
    expect(point.coincident.windMPerS).toBeCloseTo(
      mean(hours.map((h) => year.windMPerS.values[h])),
      9,
    );
    expect(point.coincident.wetBulbC).toBeLessThan(point.coincident.dryBulbC);
  });
  test('a cold day put into the year is the coldest spell of 1 day, and winter design finds it', () => {
    const values = air.map((t, h) => (h >= 2400 && h < 2424 ? -25 : t));
    const cold = designTable({ ...year, dryBulbC: { ...year.dryBulbC, values } });
    expect(cold.coldest[0]).toEqual({ firstDay: 100, days: 1, meanDryBulbC: -25 });
    expect(cold.winter[0].spell.meanDryBulbC).toBe(-25);
    expect(cold.coldest.map(({ days }) => days)).toEqual([1, 3, 5]);
    expect(cold.winter.map(({ days }) => days)).toEqual([1, 2, 3, 4]);
  });
  test('degree days over and under a base differ by the mean: Σ(base − t) = heating − cooling', () => {
    for (const { baseC, heatingKd, coolingKd } of table.degreeDays)
      expect(heatingKd - coolingKd).toBeCloseTo((baseC - mean(air)) * 365, 6);
  });
});

describe('a design day', () => {
  const day = {
    month: 7,
    day: 21,
    maxDryBulbC: 34,
    rangeK: 12,
    wetBulbC: 21,
    windMPerS: 3,
    windFromDeg: 200,
    linkeTurbidity: 3,
  };
  const hours = designDayHours(hillside, day);
  test('runs from the highest value to the range below it', () => {
    expect(Math.max(...hours.dryBulbC)).toBe(34);
    expect(Math.min(...hours.dryBulbC)).toBe(22);
    expect(hours.dewPointC.every((dew, h) => dew <= hours.dryBulbC[h])).toBe(true);
  });
  test('its sun is the clear sky of Ineichen and Perez, closed and highest at noon', () => {
    const noon = hours.ghiWPerM2.indexOf(Math.max(...hours.ghiWPerM2));
    expect([11, 12]).toContain(noon);
    // Zenith at solar noon of 21 July at 47.5° N: 47.5 − 20.5 = 27°, as the almanac has the declination.
    const mass = kastenYoungAirMass(27) * (1 - 2.25577e-5 * 480) ** 5.2559;
    const sky = turbiditySky(27, 1366.1 * 0.968, mass, 3, 480);
    expect(Math.abs(hours.ghiWPerM2[noon] / sky.ghiWPerM2 - 1)).toBeLessThan(0.02);
    expect(
      designDayHours(hillside, { ...day, linkeTurbidity: null }).ghiWPerM2.every((g) => g === 0),
    ).toBe(true);
  });
});

describe('morphing', () => {
  const twelve = (value: number) => Array.from({ length: 12 }, () => value);
  const january = (values: Float64Array) => values.subarray(0, 744);
  test('the means of the months move by what was asked for, the day is stretched by its range', () => {
    const warm = morph(year, {
      name: 'warmer',
      meanDryBulbK: twelve(2),
      maxDryBulbK: twelve(3),
      minDryBulbK: twelve(1),
    });
    expect(mean(january(warm.dryBulbC.values)) - mean(january(air))).toBeCloseTo(2, 9);
    const range = (values: Float64Array) =>
      mean(
        Array.from(
          { length: 31 },
          (_, d) =>
            Math.max(...values.subarray(d * 24, d * 24 + 24)) -
            Math.min(...values.subarray(d * 24, d * 24 + 24)),
        ),
      );
    expect(range(warm.dryBulbC.values) - range(air)).toBeCloseTo(2, 9);
    expect(warm.dryBulbC.origin).toBe('derived');
    expect(warm.notes.at(-1)?.text).toContain('Belcher');
  });
  test('radiation stays closed, wind and vapour take their factors', () => {
    const changed = morph(year, {
      name: 'x',
      radiationFactor: twelve(0.9),
      windFactor: twelve(1.1),
      vapourFactor: twelve(1.05),
    });
    expect(changed.ghiWPerM2.values[4380]).toBeCloseTo(0.9 * year.ghiWPerM2.values[4380], 9);
    expect(changed.dniWPerM2.values[4380]).toBeCloseTo(0.9 * year.dniWPerM2.values[4380], 9);
    expect(changed.windMPerS.values[10]).toBeCloseTo(1.1 * year.windMPerS.values[10], 9);
    const vapour = (one: WeatherYear) => saturationPressurePa(one.dewPointC.values[4000]);
    expect(vapour(changed) / vapour(year)).toBeCloseTo(1.05, 6);
  });
  test('changes that cannot be meant are named, all together', () => {
    const said = checkChanges({
      name: 'x',
      meanDryBulbK: [1, 2],
      windFactor: twelve(-1),
      maxDryBulbK: twelve(1),
    });
    expect(said.join(' ')).toContain('meanDryBulbK: found 2 values, expected 12');
    expect(said.join(' ')).toContain('windFactor[0]: found -1');
    expect(said.join(' ')).toContain('go together');
    expect(() => morph(year, { name: 'x', windFactor: twelve(9) })).toThrow('windFactor[0]');
  });
});

test('the hottest run of days is found where it was put', () => {
  const values = air.map((t, h) => (h >= 4800 && h < 4968 ? t + 15 : t));
  const series = seriesOfYear({ ...year, dryBulbC: { ...year.dryBulbC, values } }, 'x');
  expect(extremeRun(series, 'hottest', 7)).toMatchObject({ month: 7, day: 20, days: 7 });
  expect(extremeRun(series, 'hottest', 400)).toBe(null);
});

describe('a stored year', () => {
  test('comes back to the last bit', () => {
    const withMore: WeatherYear = {
      ...year,
      site: { ...year.site, name: 'Übersee "Süd" 𝛼' },
      ceilingM: {
        ...year.dryBulbC,
        values: air.map((t, h) => (h % 3 === 0 ? Number.POSITIVE_INFINITY : Math.round(t))),
      },
      covers: { fromHour: 24, toHour: 48 },
      fine: {
        intervalS: 1800,
        columns: { dryBulbC: { ...year.dryBulbC, values: new Float64Array(17520).fill(4.25) } },
      },
    };
    expect(unpackYear(packYear(withMore))).toEqual(withMore);
  });
  test('bytes that are none, or were cut off, give nothing', () => {
    const packed = packYear(year);
    for (const bytes of [
      new Uint8Array(0),
      new Uint8Array(64),
      packed.slice(0, 300),
      packed.slice(0, packed.length - 64),
    ])
      expect(unpackYear(bytes)).toBe(null);
  });
  testTable(
    'of a data set opens in 50 ms of processor time, in less than half the space',
    tmy3Tables[1],
    (bytes) => {
      const read = yearOf(bytes, optionsFor(tmy3Tables[1]));
      const packed = packYear(read);
      unpackYear(packed);
      const before = process.cpuUsage();
      const back = unpackYear(packed);
      const { user, system } = process.cpuUsage(before);
      console.info(
        `${packed.length} bytes for ${bytes.length}, opened in ${(user + system) / 1000} ms`,
      );
      expect(back).toEqual(read);
      expect((user + system) / 1000).toBeLessThan(50);
      expect(packed.length).toBeLessThan(bytes.length / 2);
    },
  );
  testTable('of a table with infrared comes back too', pvgisTable, (bytes) => {
    const read = yearOf(bytes, optionsFor(pvgisTable));
    expect(unpackYear(packYear(read))).toEqual(read);
  });
});
