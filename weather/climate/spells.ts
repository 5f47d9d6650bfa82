// Coldest and hottest stretches of days of a year or of a series of years.
import type { Spell } from './summary.ts';

/**
 * The run of so many days with the lowest or highest mean, by running sums.
 * @param dailyMeanC one value a day; NaN days are passed over
 */
export function spellOf(
  dailyMeanC: Float64Array,
  days: number,
  which: 'coldest' | 'hottest',
): Spell | null {
  let best: Spell | null = null;
  for (let d = 0; d + days <= dailyMeanC.length; d++) {
    let sum = 0;
    for (let k = 0; k < days; k++) sum += dailyMeanC[d + k];
    const meanDryBulbC = sum / days;
    if (Number.isNaN(meanDryBulbC)) continue;
    const isBetter =
      best === null ||
      (which === 'coldest' ? meanDryBulbC < best.meanDryBulbC : meanDryBulbC > best.meanDryBulbC);
    if (isBetter) best = { firstDay: d, days, meanDryBulbC };
  }
  return best;
}

/** Means of the days, from hourly values. */
export function dailyMeansC(hourlyC: Float64Array): Float64Array {
  return Float64Array.from({ length: Math.floor(hourlyC.length / 24) }, (_, d) => {
    let sum = 0;
    for (let h = 0; h < 24; h++) sum += hourlyC[d * 24 + h];
    return sum / 24;
  });
}
