import { createHash } from 'node:crypto';
import { describe, expect, test } from 'vitest';
import { ostermereYear } from '../../demo/ostermere-weather.ts';
import { readWeather, type WeatherYear, writePlainWeather } from '../../weather/index.ts';

const year = ostermereYear();
const text = writePlainWeather(year);
const sha256 = (of: string) => createHash('sha256').update(of).digest('hex');

const rad = Math.PI / 180;

/**
 * Sine of the sun's altitude over Ostermere, by the short series for declination and equation of time
 * (J. W. Spencer, "Fourier series representation of the position of the sun", Search 2 (1971), 172;
 * from memory). Good to about half a degree; none of the program's own formulae.
 */
function sineOfAltitude(hour: number): number {
  const day = (2 * Math.PI * (hour / 24)) / 365;
  const declination =
    0.006918 -
    0.399912 * Math.cos(day) +
    0.070257 * Math.sin(day) -
    0.006758 * Math.cos(2 * day) +
    0.000907 * Math.sin(2 * day);
  const equationMinutes =
    229.18 *
    (0.000075 +
      0.001868 * Math.cos(day) -
      0.032077 * Math.sin(day) -
      0.014615 * Math.cos(2 * day) -
      0.04089 * Math.sin(2 * day));
  const { latitudeDeg, longitudeDeg, utcOffsetH } = year.site;
  const solarH = (hour % 24) + equationMinutes / 60 + longitudeDeg / 15 - utcOffsetH;
  const angle = (solarH - 12) * 15 * rad;
  const latitude = latitudeDeg * rad;
  return (
    Math.sin(latitude) * Math.sin(declination) +
    Math.cos(latitude) * Math.cos(declination) * Math.cos(angle)
  );
}

const parts = 30;
const sinesOf = (hour: number) =>
  Array.from({ length: parts }, (_, i) => sineOfAltitude(hour + (i + 0.5) / parts));

const sun = Array.from({ length: 8760 }, (_, h) => {
  const sines = sinesOf(h);
  return {
    lowest: Math.min(...sines),
    highest: Math.max(...sines),
    mean: sines.reduce((a, b) => a + b, 0) / parts,
    ghi: year.ghiWPerM2.values[h],
    dni: year.dniWPerM2.values[h],
    dhi: year.dhiWPerM2.values[h],
  };
});

test('two runs of the script give the same bytes', () => {
  expect(sha256(writePlainWeather(ostermereYear()))).toBe(sha256(text));
});

test('the table has 8760 rows, numbered from 0', () => {
  const rows = text
    .trimEnd()
    .split('\n')
    .filter((line) => /^\d/.test(line));
  expect(rows).toHaveLength(8760);
  expect(rows.every((row, h) => row.startsWith(`${h},2025,`))).toBe(true);
});

test('the real reader gives back every value, with nothing to mend', () => {
  const read = readWeather(new TextEncoder().encode(text), { file: 'ostermere-weather.csv' });
  if (!read.ok) throw new Error(JSON.stringify(read.faults));
  const back: WeatherYear = read.value;
  expect(back.notes).toEqual([]);
  expect(back.site).toEqual(year.site);
  expect(back.hours).toBe(8760);
  expect(back.year).toBe(2025);
  for (const [name, column] of Object.entries(year)) {
    if (typeof column !== 'object' || !('values' in column)) continue;
    expect(back[name as keyof WeatherYear], name).toEqual(column);
  }
});

describe('the sun of the table', () => {
  test('gives nothing while it is down', () => {
    const down = sun.filter(({ highest }) => highest < Math.sin(-1 * rad));
    expect(down.length).toBeGreaterThan(3500);
    expect(down.filter(({ ghi, dni, dhi }) => ghi !== 0 || dni !== 0 || dhi !== 0)).toEqual([]);
  });

  test('gives light, under any cloud, whenever it is well up', () => {
    const up = sun.filter(({ lowest }) => lowest > Math.sin(5 * rad));
    expect(up.length).toBeGreaterThan(3500);
    expect(up.filter(({ ghi, dhi }) => !(ghi > 0 && dhi > 0))).toEqual([]);
  });

  test('global is beam times the sine of the altitude plus diffuse', () => {
    // Values are rounded to 1 W/m², which is 1.5 of doubt in the sum. Within an hour beam and sine rise
    // together, so that the mean of their product is not the product of their means: at most a twelfth
    // of the two ranges for what runs straight, where the beam's range is at most the sine's, in
    // proportion. The last term is the half degree that this file's altitude may be out.
    const up = sun.filter(({ lowest }) => lowest > Math.sin(8 * rad));
    for (const { ghi, dni, dhi, mean, lowest, highest } of up) {
      const range = highest - lowest;
      const doubt = 1.5 + (dni * range * range) / (12 * mean) + 0.009 * dni;
      expect(Math.abs(ghi - dhi - dni * mean)).toBeLessThanOrEqual(doubt);
    }
  });

  test('beam stays below the sun’s own irradiance, and the year’s sum is that of the latitude', () => {
    expect(Math.max(...sun.map(({ dni }) => dni))).toBeLessThan(1000);
    const yearKWhPerM2 = sun.reduce((sum, { ghi }) => sum + ghi, 0) / 1000;
    // Measured yearly sums on lowland at 50 to 51° north lie from 950 to 1250 kWh/m²; common practice,
    // no source.
    expect(yearKWhPerM2).toBeGreaterThan(950);
    expect(yearKWhPerM2).toBeLessThan(1250);
  });
});

describe('the air of the table', () => {
  const { values } = year.dryBulbC;
  const mean = (from: number, to: number) =>
    values.subarray(from * 24, to * 24).reduce((a, b) => a + b, 0) / ((to - from) * 24);

  test('is warmest in July or August and coldest in winter', () => {
    const months = [0, 31, 59, 90, 120, 151, 181, 212, 243, 273, 304, 334, 365];
    const means = months.slice(0, 12).map((day, i) => mean(day, months[i + 1] ?? 365));
    expect([6, 7]).toContain(means.indexOf(Math.max(...means)));
    expect([11, 0, 1]).toContain(means.indexOf(Math.min(...means)));
  });

  test('is warmer in the afternoon than before dawn', () => {
    const at = (hour: number) =>
      Array.from({ length: 365 }, (_, d) => values[d * 24 + hour]).reduce((a, b) => a + b, 0) / 365;
    expect(at(15) - at(4)).toBeGreaterThan(3);
    expect(at(15) - at(4)).toBeLessThan(10);
  });

  test('never holds more vapour than it can', () => {
    for (let h = 0; h < 8760; h++) expect(year.dewPointC.values[h]).toBeLessThanOrEqual(values[h]);
    const humidity = Array.from(year.relativeHumidity.values);
    expect(Math.max(...humidity)).toBeLessThanOrEqual(1);
    expect(Math.min(...humidity)).toBeGreaterThan(0.2);
  });
});
