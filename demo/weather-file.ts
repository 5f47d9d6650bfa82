import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { need } from '../app/cli/stop.ts';
import { writeFolderWhole } from '../app/disk/index.ts';
import { writePlainWeather } from '../weather/index.ts';
import { ostermereYear } from './ostermere-weather.ts';
import { type Places, weatherName } from './places.ts';

/** Makes the invented weather year and writes it for the demo's project, if it is not there as it is. */
export async function writeDemoWeather({ out }: Places): Promise<string> {
  const file = join(out, weatherName);
  const text = writePlainWeather(ostermereYear());
  const held = await readFile(file, 'utf8').catch(() => null);
  if (held !== text) need(await writeFolderWhole(out, new Map([[weatherName, text]])));
  return file;
}
