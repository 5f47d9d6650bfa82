// The open weather tables beside the repository. They are not part of it: a test that needs one is
// skipped by name where the folder is absent.
import { existsSync, readFileSync } from 'node:fs';
import { test } from 'vitest';
import {
  faultText,
  type ReadWeatherOptions,
  readWeather,
  type WeatherYear,
} from '../../weather/index.ts';

const folder = new URL('../../../shared/weather/', import.meta.url);

export const tmy3Tables = [
  'tmy3-723170-original.csv',
  'tmy3-723860.csv',
  'tmy3-725090.csv',
  'tmy3-725650.csv',
  'tmy3-727530.csv',
];
export const pvgisTable = 'pvgis-tmy-45N-8E.csv';
export const psmTable = 'nsrdb-psm-tmy-2017.csv';

/** A site for the PSM table, which states none: the longitude is where its own sun stands at noon. */
export const psmSite = { latitudeDeg: 38, longitudeDeg: -108.6, elevationM: 2000, utcOffsetH: -7 };

export const optionsFor = (name: string): ReadWeatherOptions =>
  name === psmTable ? { file: name, site: psmSite } : { file: name };

/** A test on a table; skipped with the table's name where it is absent. */
export function testTable(
  claim: string,
  name: string,
  run: (bytes: Uint8Array) => void | Promise<void>,
) {
  const place = new URL(name, folder);
  test.skipIf(!existsSync(place))(`${claim} [${name}]`, () => run(readFileSync(place)));
}

/** The year that a table holds; fails with its faults where it has any. */
export function yearOf(bytes: Uint8Array | string, options: ReadWeatherOptions): WeatherYear {
  const read = readWeather(bytes, options);
  if (!read.ok) throw new Error(read.faults.map(faultText).join('\n'));
  return read.value;
}

/** The cells of a column as the file writes them, by a plain split: independent of the reader. */
export function rawColumn(bytes: Uint8Array, heading: string): number[] {
  const lines = new TextDecoder().decode(bytes).split(/\r?\n/);
  const row = lines.findIndex((line) => line.split(',').includes(heading));
  const at = lines[row].split(',').indexOf(heading);
  const values: number[] = [];
  for (const line of lines.slice(row + 1)) {
    const cells = line.split(',');
    if (cells.length > at && /^[-+.\d]/.test(cells[at])) values.push(Number(cells[at]));
  }
  return values;
}
