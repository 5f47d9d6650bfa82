// Sky temperature for every hour of a weather year, by the best that its columns allow.
import { saturationPressurePa } from '../air/moist-air.ts';
import type { WeatherColumn, WeatherYear } from '../weather-year.ts';
import {
  berdahlMartinHourlyEmissivity,
  bruntEmissivity,
  clarkAllenEmissivity,
  cloudySkyEmissivity,
  plainSkyC,
  skyTemperatureFromEmissivityC,
  skyTemperatureFromInfraredC,
  waltonCloudFactor,
} from './sky-temperature.ts';

/**
 * `auto`: horizontal infrared where the table holds it, else Berdahl and Martin from dew point and
 * cloud. `air-11`: ISO 52016-1, for tables whose humidity is not to be trusted.
 */
export type SkyMethod = 'auto' | 'infrared' | 'berdahl-martin' | 'clark-allen' | 'brunt' | 'air-11';

export interface HourlySky {
  readonly temperatureC: Float64Array;
  /** Column whose moment in the hour the temperatures share. */
  readonly like: Pick<WeatherColumn, 'stands'>;
  /** What was used, for the report. */
  readonly method: string;
}

export function hourlySky(year: WeatherYear, method: SkyMethod = 'auto'): HourlySky {
  const infrared = year.horizontalInfraredWPerM2;
  if (infrared !== undefined && (method === 'auto' || method === 'infrared'))
    return {
      temperatureC: infrared.values.map(skyTemperatureFromInfraredC),
      like: infrared,
      method: 'horizontal infrared of the weather table',
    };
  const air = year.dryBulbC.values;
  const dew = year.dewPointC.values;
  const { stands } = year.dryBulbC;
  if (method === 'air-11')
    return {
      temperatureC: air.map(plainSkyC),
      like: year.dryBulbC,
      method: 'air temperature less 11 K (ISO 52016-1)',
    };
  const at = stands.kind === 'reading' ? stands.at : 0.5;
  const cover = year.opaqueSkyCover ?? year.skyCover;
  const which = year.opaqueSkyCover ? 'opaque cloud' : 'total cloud';
  const ceiling = year.ceilingM?.values;
  const temperatureC = new Float64Array(year.hours);
  for (let h = 0; h < year.hours; h++) {
    const n = cover ? cover.values[h] : 0;
    const height = ceiling ? ceiling[h] : Number.NaN;
    let emissivity: number;
    if (method === 'clark-allen') emissivity = clarkAllenEmissivity(dew[h]) * waltonCloudFactor(n);
    else if (method === 'brunt')
      emissivity = cloudySkyEmissivity(bruntEmissivity(saturationPressurePa(dew[h])), n, height);
    else {
      const hour = (h % 24) + at;
      const clear = berdahlMartinHourlyEmissivity(dew[h], hour, year.pressurePa.values[h]);
      emissivity = cloudySkyEmissivity(clear, n, height);
    }
    temperatureC[h] = skyTemperatureFromEmissivityC(emissivity, air[h]);
  }
  const name =
    method === 'clark-allen'
      ? 'Clark and Allen 1978'
      : method === 'brunt'
        ? 'Brunt 1932'
        : 'Berdahl and Martin 1984';
  const cloud = cover ? `with ${which}` : 'as if cloudless: the table has no cloud cover';
  return { temperatureC, like: year.dryBulbC, method: `${name} from dew point, ${cloud}` };
}
