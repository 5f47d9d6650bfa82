// Hourly radiation onto steps: each hour's energy is laid evenly over the part of the hour with the
// sun up, so that none falls before sunrise and none is lost.
import type { Stands, WeatherColumn } from '../weather-year.ts';
import type { SunTrack } from './sun-track.ts';

/** With less sun than this in its hour, 3 minutes, light is laid over the whole hour instead. */
export const leastSunlitShareOfHour = 0.05;

/**
 * Start of the hour that a radiation value stands for, before or after the hour's own start [h].
 * A mean covers its own hour; a reading at one moment stands for the hour centred on that moment.
 */
export function windowStartH(stands: Stands): number {
  return stands.kind === 'mean' ? 0 : stands.at - 0.5;
}

/**
 * Means over the steps of an hourly radiation column; their sum is that of the column times the steps
 * per hour, hour by hour.
 *
 * Low-sun guard: an hour with radiation but under 3 minutes of sun (or none: refraction, rounding,
 * clocks) is laid evenly over the hour. Its beam then meets planes only while the sun is up.
 * @returns the means and how many hours the guard touched
 */
export function spreadRadiation(
  column: WeatherColumn,
  track: SunTrack,
): { readonly means: Float64Array; readonly guardedHours: number } {
  const { values } = column;
  const { count, sunlitFrom, sunlitTo } = track;
  const perHour = 3600 / track.stepS;
  const startH = windowStartH(column.stands);
  const means = new Float64Array(count);
  const share = new Float64Array(perHour + 2);
  let guardedHours = 0;
  for (let h = 0; h < values.length; h++) {
    const value = values[h];
    if (value === 0) continue;
    const from = (h + startH) * perHour;
    const to = from + perHour;
    const first = Math.floor(from + 1e-9);
    const last = Math.ceil(to - 1e-9);
    let sunlit = 0;
    for (let j = first; j < last; j++) {
      const k = (j + count) % count;
      const lit = Math.min(sunlitTo[k], to - j) - Math.max(sunlitFrom[k], from - j);
      share[j - first] = Math.max(0, lit);
      sunlit += share[j - first];
    }
    if (sunlit < leastSunlitShareOfHour * perHour) {
      guardedHours++;
      sunlit = 0;
      for (let j = first; j < last; j++) {
        share[j - first] = Math.min(1, to - j) - Math.max(0, from - j);
        sunlit += share[j - first];
      }
    }
    const strength = (value * perHour) / sunlit;
    for (let j = first; j < last; j++) means[(j + count) % count] += strength * share[j - first];
  }
  return { means, guardedHours };
}
