// A weather year changed by the user's own monthly changes, from a file of JSON.

import {
  checkChanges,
  type Fault,
  type MonthlyChanges,
  morph,
  type WeatherYear,
} from '../../weather/index.ts';
import { readText } from '../disk/index.ts';
import { InputFaults, need } from './stop.ts';

/** The file: {"name": "warmer 2050", "meanDryBulbK": [12 values], "radiationFactor": [12 values] …}. */
export async function changedYear(file: string, year: WeatherYear): Promise<WeatherYear> {
  const expected = 'monthly changes as JSON, each a list of 12 values, January first';
  const { text } = need(await readText(file, { expected, limitBytes: 1_000_000 }));
  const fault = (found: string): Fault => ({
    file,
    place: { path: '' },
    found,
    expected,
    mend: 'Correct the file.',
  });
  let data: unknown;
  try {
    data = JSON.parse(text);
  } catch (error) {
    throw new InputFaults([fault(error instanceof Error ? error.message : 'no JSON')]);
  }
  if (typeof data !== 'object' || data === null || Array.isArray(data))
    throw new InputFaults([fault('no object')]);
  const name = 'name' in data && typeof data.name === 'string' ? data.name : 'own changes';
  const changes: MonthlyChanges = { ...data, name };
  const wrong = checkChanges(changes);
  if (wrong.length > 0) throw new InputFaults(wrong.map((one) => fault(one.replace(/\.$/, ''))));
  return morph(year, changes);
}
