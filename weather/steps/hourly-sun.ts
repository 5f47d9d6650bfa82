// The sun of each hour of a weather table as its radiation columns mean it.
import type { Stands, WeatherYear } from '../weather-year.ts';
import { windowStartH } from './spread.ts';
import { sunTrack } from './sun-track.ts';

export interface HourlySun {
  /** Share of the hour with the sun up, 0 to 1. */
  readonly sunlitShare: Float64Array;
  /** Mean sine of the altitude over the sunlit part; 0 at night. */
  readonly meanUp: Float64Array;
  /** Extraterrestrial irradiance on the horizontal, mean over the hour. */
  readonly extraterrestrialWPerM2: Float64Array;
  /** Extraterrestrial irradiance facing the sun. */
  readonly normalWPerM2: Float64Array;
}

/** Sun over the hour that the radiation stands for, from steps of 5 minutes. */
export function hourlySun(
  year: Pick<WeatherYear, 'site' | 'hours' | 'sourceYear'>,
  stands: Stands,
): HourlySun {
  const perHour = 12;
  const track = sunTrack(year, 3600 / perHour);
  const offset = Math.round(windowStartH(stands) * perHour);
  const { hours } = year;
  const sun = {
    sunlitShare: new Float64Array(hours),
    meanUp: new Float64Array(hours),
    extraterrestrialWPerM2: new Float64Array(hours),
    normalWPerM2: new Float64Array(hours),
  };
  for (let h = 0; h < hours; h++) {
    let lit = 0;
    let up = 0;
    for (let s = 0; s < perHour; s++) {
      const k = (h * perHour + s + offset + track.count) % track.count;
      lit += track.sunlitShare[k];
      up += track.sunlitShare[k] * track.up[k];
    }
    const normal = track.extraterrestrialWPerM2[h * perHour + perHour / 2];
    sun.normalWPerM2[h] = normal;
    sun.sunlitShare[h] = lit / perHour;
    sun.meanUp[h] = lit > 0 ? up / lit : 0;
    sun.extraterrestrialWPerM2[h] = (normal * up) / perHour;
  }
  return sun;
}
