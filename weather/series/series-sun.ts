// The sun over the steps of a series, as radiation columns mean it: over the interval of a mean, over
// the interval centred on a reading.
import { isLeapYear } from '../calendar.ts';
import { dateOfDay, dayNumber } from '../map/date-text.ts';
import type { HourlySun } from '../steps/hourly-sun.ts';
import { sunTrack } from '../steps/sun-track.ts';
import type { Stands } from '../weather-year.ts';
import type { WeatherSeries } from './series.ts';

/** Steps shorter than this are taken at their middle; longer ones in parts of 5 minutes. */
const fineS = 600;

/** One value a step of the series. */
export function seriesSun(series: WeatherSeries, stands: Stands = { kind: 'mean' }): HourlySun {
  const { count, intervalS, startS, site } = series;
  const partS = intervalS < fineS ? Math.min(intervalS, 300) : 300;
  const parts = intervalS / partS;
  const offsetS =
    stands.kind === 'mean' ? 0 : Math.round(((stands.at - 0.5) * intervalS) / partS) * partS;
  const sun = {
    sunlitShare: new Float64Array(count),
    meanUp: new Float64Array(count),
    extraterrestrialWPerM2: new Float64Array(count),
    normalWPerM2: new Float64Array(count),
  };
  let trackYear = 0;
  let track: ReturnType<typeof sunTrack> | null = null;
  let yearStartS = 0;
  for (let k = 0; k < count; k++) {
    let lit = 0;
    let up = 0;
    let normal = 0;
    for (let p = 0; p < parts; p++) {
      const t = startS + offsetS + k * intervalS + p * partS;
      const year = yearAt(t, trackYear);
      if (track === null || year !== trackYear) {
        trackYear = year;
        yearStartS = dayNumber(year, 1, 1) * 86400;
        track = sunTrack(
          { site, hours: isLeapYear(year) ? 8784 : 8760, sourceYear: yearsOf(series, year, k) },
          partS,
        );
      }
      const at = Math.min(
        track.count - 1,
        Math.max(0, Math.floor((t - yearStartS) / partS + 1e-6)),
      );
      lit += track.sunlitShare[at];
      up += track.sunlitShare[at] * track.up[at];
      normal = track.extraterrestrialWPerM2[at];
    }
    sun.normalWPerM2[k] = normal;
    sun.sunlitShare[k] = lit / parts;
    sun.meanUp[k] = lit > 0 ? up / lit : 0;
    sun.extraterrestrialWPerM2[k] = (normal * up) / parts;
  }
  return sun;

  function yearAt(seconds: number, known: number): number {
    const days = Math.floor(seconds / 86400);
    if (known > 0 && days >= dayNumber(known, 1, 1) && days < dayNumber(known + 1, 1, 1))
      return known;
    return dateOfDay(days).year;
  }
}

/** Years that the days of a calendar year were measured in. */
function yearsOf(series: WeatherSeries, year: number, near: number): Int16Array {
  const hours = isLeapYear(year) ? 8784 : 8760;
  const years = new Int16Array(hours).fill(series.isStitched ? series.sourceYear[near] : year);
  if (!series.isStitched) return years;
  const fromS = dayNumber(year, 1, 1) * 86400;
  for (let h = 0; h < hours; h++) {
    const k = Math.floor((fromS + h * 3600 - series.startS) / series.intervalS);
    if (k >= 0 && k < series.count && series.sourceYear[k] > 0) years[h] = series.sourceYear[k];
  }
  return years;
}
